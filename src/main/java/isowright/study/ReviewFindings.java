package isowright.study;

import isowright.study.Findings.Said;
import java.util.List;
import java.util.Optional;
import java.util.stream.Stream;

/**
 * What was found of filed costs beyond plant and period: orders of plants, how far the gap depends
 * on what was chosen, and allowances.
 *
 * @param reference against what costs were held, in words; empty where nothing was reviewed
 * @param orders the plants in order, for each technology and period
 * @param variants totals under other choices, for each technology and period
 * @param omissions the gap when a plant is left out of the estimation
 * @param spreads for each plant and period, the lowest and highest gap under any choice
 * @param allowances what each plant would be allowed year by year
 * @param terms the terms of the allowances
 * @param remarks what must be said of the whole review
 */
public record ReviewFindings(
    String reference,
    List<Order> orders,
    List<Variant> variants,
    List<Omission> omissions,
    List<Spread> spreads,
    List<Allowed> allowances,
    Optional<Study.Allowance> terms,
    List<Said> remarks) {

  /** The code of the remark that technical and mix part cannot be told apart. */
  public static final String UNDIVIDED = "parts-not-told-apart";

  /** Nothing reviewed. */
  public static final ReviewFindings NONE =
      new ReviewFindings(
          "", List.of(), List.of(), List.of(), List.of(), List.of(), Optional.empty(), List.of());

  /** Copies the lists. */
  public ReviewFindings {
    orders = List.copyOf(orders);
    variants = List.copyOf(variants);
    omissions = List.copyOf(omissions);
    spreads = List.copyOf(spreads);
    allowances = List.copyOf(allowances);
    remarks = List.copyOf(remarks);
  }

  /** These and those of the cost side. */
  ReviewFindings and(ReviewFindings other) {
    return new ReviewFindings(
        reference + "; on the cost side " + other.reference,
        joined(orders, other.orders),
        joined(variants, other.variants),
        joined(omissions, other.omissions),
        joined(spreads, other.spreads),
        joined(allowances, other.allowances),
        terms,
        joined(remarks, other.remarks));
  }

  private static <T> List<T> joined(List<T> first, List<T> second) {
    return Stream.concat(first.stream(), second.stream()).toList();
  }

  /**
   * Plants in order of filed over least cost, the lowest first.
   *
   * @param technology the technology
   * @param period the period
   * @param simulation how ranks were drawn, in words
   * @param draws how many draws
   * @param seed where they began
   * @param without how many draws were left out because some plant had no answer
   * @param plants the plants
   * @param groups what cannot be told apart by the technology's uncertainty alone
   * @param groupsWithYear the same with the chance of the year counted; absent where none is known
   */
  public record Order(
      String technology,
      String period,
      String simulation,
      int draws,
      long seed,
      int without,
      List<Placed> plants,
      Groups groups,
      Optional<Groups> groupsWithYear) {
    /** Copies the plants. */
    public Order {
      plants = List.copyOf(plants);
    }
  }

  /**
   * Groups of plants that cannot be told apart, all pairs being compared at once.
   *
   * @param critical the value that a studentised difference must exceed; absent where the plants
   *     were too many or too few to compare
   * @param plants the plants of each group; groups may overlap
   */
  public record Groups(Optional<Double> critical, List<List<String>> plants) {
    /** Copies the groups. */
    public Groups {
      plants = plants.stream().map(List::copyOf).toList();
    }

    /** The numbers of the groups of a plant, from 1. */
    public List<Integer> of(String plant) {
      return java.util.stream.IntStream.range(0, plants.size())
          .filter(g -> plants.get(g).contains(plant))
          .mapToObj(g -> g + 1)
          .toList();
    }
  }

  /**
   * A plant in its place.
   *
   * @param plant the plant
   * @param rank its rank, from 1
   * @param ratio filed over least cost
   * @param band between which ranks it lies by the technology's uncertainty alone
   * @param bandWithYear the same with the chance of the year counted; absent where none is known
   * @param probabilities the probability of each rank, from 1; empty where the plants are many
   */
  public record Placed(
      String plant,
      int rank,
      Figure ratio,
      Band band,
      Optional<Band> bandWithYear,
      List<Double> probabilities) {
    /** Copies the probabilities. */
    public Placed {
      probabilities = List.copyOf(probabilities);
    }
  }

  /**
   * A band of ranks.
   *
   * @param low the lower
   * @param high the higher
   */
  public record Band(int low, int high) {}

  /**
   * Totals over the filings of a period under one set of choices.
   *
   * @param technology the technology
   * @param period the period
   * @param choice a short, stable name: {@code as-asked}, {@code typical}, {@code typical-mean},
   *     {@code best-quarter}, {@code best-quarter-mean}, {@code without-deflator}, {@code
   *     without-owner}, {@code recorded-prices}
   * @param words the same in words
   * @param money the money of the figures, in words
   * @param filings how many filings have an answer
   * @param filed their filed cost
   * @param leastCost their least cost
   * @param gap the gap
   * @param share the gap as a share of filed cost
   */
  public record Variant(
      String technology,
      String period,
      String choice,
      String words,
      String money,
      int filings,
      double filed,
      Figure leastCost,
      Figure gap,
      Figure share) {}

  /**
   * The total gap by a technology that was estimated without one plant; the filings stay the same.
   * A value to set beside the gap and its interval, as it says how much hangs on one plant.
   *
   * @param technology the technology
   * @param period the period
   * @param plant the plant left out of the estimation
   * @param gap the gap
   * @param share the gap as a share of filed cost
   */
  public record Omission(
      String technology, String period, String plant, double gap, double share) {}

  /**
   * The lowest and highest gap of a filing under any technology and choice, as shares of filed
   * cost.
   *
   * @param plant the plant
   * @param period the period
   * @param choices how many technologies and choices gave an answer
   * @param low the lowest
   * @param lowBy under which technology and choice
   * @param high the highest
   * @param highBy under which
   */
  public record Spread(
      String plant,
      String period,
      int choices,
      double low,
      String lowBy,
      double high,
      String highBy) {}

  /**
   * An allowance, year by year.
   *
   * @param plant the plant; empty for the sum over all plants
   * @param period the period of the filing, year 0
   * @param technology the technology by which the gap was found
   * @param filed the filed cost
   * @param gap the gap, whose interval stands with the review
   * @param gapUsed the quantile of it that is used
   * @param margin the gap less that
   * @param controllableGap what is removed over the years
   * @param years year by year, year 0 as filed
   */
  public record Allowed(
      String plant,
      String period,
      String technology,
      double filed,
      double gap,
      double gapUsed,
      double margin,
      double controllableGap,
      List<Year> years) {
    /** Copies the years. */
    public Allowed {
      years = List.copyOf(years);
    }
  }

  /**
   * One year of an allowance.
   *
   * @param year the year, 0 as filed
   * @param rest what cannot be influenced
   * @param removed the part of the gap removed by then
   * @param controllable what can be influenced, after that
   * @param shift frontier shift
   * @param index what rising prices add
   * @param allowance the sum of rest, controllable, shift and index
   */
  public record Year(
      int year,
      double rest,
      double removed,
      double controllable,
      double shift,
      double index,
      double allowance) {}
}
