package isowright.review;

import isowright.estimation.EstimatedTechnology;
import isowright.inference.DeltaMethod;
import isowright.inference.ParameterDraws;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.Comparator;
import java.util.List;
import java.util.Objects;
import java.util.function.ToDoubleFunction;
import java.util.stream.IntStream;

/**
 * In which order do plants stand by filed over least cost, and how sure is it? Rank 1 has the
 * lowest ratio.
 *
 * <p>The parameters of the technology are drawn ({@link ParameterDraws}), least cost is found anew
 * for every plant and draw, and the plants are ranked in each: the share of draws in which a plant
 * has a rank is the probability of that rank, and the band of ranks holds the middle {@code level}
 * of them. Where that would be too many plans, or too many draws have no answer for some plant, ln
 * C is moved to first order instead; {@link #simulation} says which. The level of the technology is
 * common to all plants and moves none of them past another.
 *
 * <p>That is the uncertainty of the technology alone. A single year also has its chance: output
 * that was higher or lower than usual for reasons outside the records. The second band adds to
 * every plant an independent draw with the spread of the fit's residuals, carried to cost.
 *
 * <p>Groups that cannot be told apart are runs of the order in which no pair differs by
 * simultaneous comparison: pair i, j is told apart where |ln r_i − ln r_j| / s_ij exceeds the
 * {@code level} quantile of the largest such ratio over all pairs under no difference, found from
 * the same draws. Runs may overlap: two plants can each be near a third and yet apart.
 *
 * <p>Sources: Hothorn, T., Bretz, F. and Westfall, P. (2008), Simultaneous Inference in General
 * Parametric Models, <i>Biometrical Journal</i> 50, 346–363, section 3 (the maximum of studentised
 * statistics); Marshall, E. C. and Spiegelhalter, D. J. (1998), League Tables of In Vitro
 * Fertilisation Clinics: How Confident Can We Be About the Rankings?, <i>British Medical
 * Journal</i> 316, 1701–1705 (bands of ranks from simulation). Tested in {@code OrderingTest}.
 */
public final class Ordering {

  /** So many plans may be found anew; beyond, ln C moves to first order. */
  static final int MOST_PLANS = 100_000;

  /** Where more than this share of draws has no answer for some plant, the rest would mislead. */
  private static final double MOST_WITHOUT = 0.2;

  /** Groups of more plants than this cannot be read, and their pairs are too many. */
  public static final int MOST_GROUPED = 200;

  /** Probabilities of every rank are kept for at most so many plants. */
  public static final int MOST_PROBABILITIES = 60;

  /** How least cost was moved with the parameters. */
  public enum Simulation {
    /** Found anew for every draw. */
    SOLVED("least cost solved anew in every draw"),
    /** To first order in logs. */
    FIRST_ORDER("least cost moved to first order in logs"),
    /** There is nothing to draw: the technology is taken as known. */
    EXACT("the technology is taken as known");

    private final String word;

    Simulation(String word) {
      this.word = word;
    }

    /** In words. */
    public String word() {
      return word;
    }
  }

  /**
   * A plant in its place.
   *
   * @param entrant the plant
   * @param rank its rank, from 1
   * @param band its band of ranks by the technology's uncertainty alone
   * @param bandWithYear its band with the chance of the year; empty where none is known
   * @param probabilities the probability of each rank; empty beyond {@link #MOST_PROBABILITIES}
   */
  public record Ranked(
      Entrant entrant,
      int rank,
      RankBands.Band band,
      List<RankBands.Band> bandWithYear,
      List<Double> probabilities) {
    /** Copies the lists. */
    public Ranked {
      bandWithYear = List.copyOf(bandWithYear);
      probabilities = List.copyOf(probabilities);
    }
  }

  private final Simulation simulation;
  private final int without;
  private final List<Ranked> ranked;
  private final ToldApart apart;
  private final ToldApart apartWithYear;

  private Ordering(
      Simulation simulation,
      int without,
      List<Ranked> ranked,
      ToldApart apart,
      ToldApart apartWithYear) {
    this.simulation = simulation;
    this.without = without;
    this.ranked = List.copyOf(ranked);
    this.apart = apart;
    this.apartWithYear = apartWithYear;
  }

  /**
   * Orders plants.
   *
   * @param entrants the plants, in any order
   * @param reference the technology their least costs come from
   * @param draws how many draws
   * @param seed where they begin
   * @param level of bands and comparisons, such as 0.95
   */
  public static Ordering of(
      List<Entrant> entrants, EstimatedTechnology reference, int draws, long seed, double level) {
    boolean known =
        Arrays.stream(reference.covariance()).flatMapToDouble(Arrays::stream).allMatch(v -> v == 0);
    int count = known ? 1 : draws;
    Simulation simulation =
        known
            ? Simulation.EXACT
            : (long) entrants.size() * count <= MOST_PLANS
                ? Simulation.SOLVED
                : Simulation.FIRST_ORDER;
    DeltaMethod delta = DeltaMethod.of(reference, level);
    return of(
        entrants,
        ParameterDraws.of(reference, count, seed),
        simulation,
        delta::standardError,
        level);
  }

  /**
   * Orders plants whose least costs come from a cost function, whose log moves with its parameters
   * as the entrants' slopes say.
   *
   * @param draws of its parameters
   * @param standardError that of a function of the parameters with this gradient
   */
  public static Ordering of(
      List<Entrant> entrants,
      ParameterDraws draws,
      ToDoubleFunction<double[]> standardError,
      double level) {
    return of(entrants, draws, Simulation.FIRST_ORDER, standardError, level);
  }

  private static Ordering of(
      List<Entrant> entrants,
      ParameterDraws parameters,
      Simulation simulation,
      ToDoubleFunction<double[]> standardError,
      double level) {
    List<Entrant> order =
        entrants.stream()
            .sorted(Comparator.comparingDouble(Entrant::logRatio).thenComparing(Entrant::plant))
            .toList();
    ParameterDraws.Draw[] made =
        IntStream.range(0, parameters.count())
            .parallel()
            .mapToObj(parameters::draw)
            .toArray(ParameterDraws.Draw[]::new);
    RatioDraws ratios = RatioDraws.of(order, parameters, made, simulation);
    boolean year = order.stream().anyMatch(e -> e.yearSpread() > 0);
    RankBands bands = RankBands.of(ratios.ranks(), level);
    List<RankBands> withYear =
        year ? List.of(RankBands.of(ratios.ranksWithYear(), level)) : List.<RankBands>of();
    List<Ranked> ranked = new ArrayList<>();
    for (int i = 0; i < order.size(); i++) {
      int place = i;
      ranked.add(
          new Ranked(
              order.get(i),
              i + 1,
              bands.band(i),
              withYear.stream().map(b -> b.band(place)).toList(),
              bands.probabilities(i)));
    }
    return new Ordering(
        ratios.simulation(),
        ratios.without(),
        ranked,
        ToldApart.of(order, standardError, made, level, false),
        year ? ToldApart.of(order, standardError, made, level, true) : ToldApart.NONE);
  }

  /** How least cost was moved with the parameters. */
  public Simulation simulation() {
    return simulation;
  }

  /** How many draws were left out because some plant had no answer. */
  public int without() {
    return without;
  }

  /** The plants, the lowest ratio first. */
  public List<Ranked> ranked() {
    return ranked;
  }

  /** Groups that cannot be told apart by the technology's uncertainty alone. */
  public ToldApart apart() {
    return apart;
  }

  /** Groups that cannot be told apart with the chance of the year; none where none is known. */
  public ToldApart apartWithYear() {
    return apartWithYear;
  }

  /** Draws of ln ratio, as ranks. */
  private record RatioDraws(
      Simulation simulation, int without, int[][] ranks, int[][] ranksWithYear) {

    /** So many draws share their work space. */
    private static final int TOGETHER = 64;

    static RatioDraws of(
        List<Entrant> order,
        ParameterDraws draws,
        ParameterDraws.Draw[] made,
        Simulation simulation) {
      RatioDraws ranked = of(RatioRow.of(order, draws, simulation), made);
      return ranked.without > MOST_WITHOUT * made.length
          ? of(RatioRow.of(order, draws, Simulation.FIRST_ORDER), made)
          : ranked;
    }

    /** Ranks of all draws in which every plant has an answer. */
    private static RatioDraws of(RatioRow rows, ParameterDraws.Draw[] made) {
      int[][] plain = new int[made.length][];
      int[][] year = new int[made.length][];
      IntStream.range(0, (made.length + TOGETHER - 1) / TOGETHER)
          .parallel()
          .forEach(
              block -> {
                Ranks ranks = new Ranks(rows.plants());
                int end = Math.min(made.length, (block + 1) * TOGETHER);
                for (int r = block * TOGETHER; r < end; r++) {
                  double[] row = rows.of(made[r]);
                  if (row.length > 0) {
                    plain[r] = ranks.of(row);
                    rows.addYear(row, made[r]);
                    year[r] = ranks.of(row);
                  }
                }
              });
      int[][] kept = Arrays.stream(plain).filter(Objects::nonNull).toArray(int[][]::new);
      return new RatioDraws(
          rows.simulation(),
          made.length - kept.length,
          kept,
          Arrays.stream(year).filter(Objects::nonNull).toArray(int[][]::new));
    }
  }
}
