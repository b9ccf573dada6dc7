package isowright.study;

import isowright.cost.CostElasticities;
import isowright.cost.CostFunction;
import isowright.estimation.CostData;
import isowright.estimation.CostFit;
import isowright.estimation.CostSpecification.Equations;
import isowright.inference.ParameterDraws;
import isowright.records.Panel;
import isowright.review.CostConditions;
import isowright.review.CostGap;
import isowright.review.CostGaps;
import isowright.review.Entrant;
import isowright.review.Ordering;
import isowright.study.CostReference.Levelled;
import isowright.study.Findings.Said;
import isowright.study.PlanFindings.Detail;
import isowright.study.PlanFindings.Efficiency;
import isowright.study.PlanFindings.Needed;
import isowright.study.PlanFindings.Reviewed;
import isowright.study.ReviewFindings.Allowed;
import isowright.study.ReviewFindings.Order;
import isowright.study.ReviewFindings.Variant;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.Comparator;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.stream.IntStream;

/**
 * Holds the filed costs of a study against its fitted cost functions at the same outputs and
 * prices: gaps in parts where shares of inputs are recorded, the order of plants, the same against
 * other references, allowances.
 */
final class CostReviewStage {

  /** For about so many filings of a cost function it is asked what would have to be true. */
  private static final int MOST_NEEDED = 500;

  private static final Said UNDIVIDED =
      Said.of(
          "note",
          ReviewFindings.UNDIVIDED,
          "Technical part and mix part cannot be told apart: the shares of the inputs are not known"
              + " or do not add up, or no prices at which the fitted function is a cost function"
              + " make the mix used the least-cost one. What recorded cost holds beyond least cost"
              + " stands as remainder.");

  private static final Said HOW =
      Said.of(
          "note",
          "parts-from-cost-function",
          "On the cost side quantities are those that recorded shares and prices imply, and the mix"
              + " used is drawn onto the isoquant at the prices that would make it the least-cost"
              + " mix (Kopp and Diewert 1982). Where there are none, the gap beyond recorded cost"
              + " stands undivided, as remainder.");

  private static final Said NO_FRONTIER =
      Said.of(
          "warning",
          "no-frontier-of-cost",
          "A frontier is estimated of production functions alone, so on the cost side costs are"
              + " held against the typical plant.");

  private final Study study;
  private final Study.Filing filing;
  private final CostFilings filings;
  private final CostData data;
  private final CostCircumstances circumstances;

  private final List<Reviewed> reviews = new ArrayList<>();
  private final List<Order> orders = new ArrayList<>();
  private final List<Variant> variants = new ArrayList<>();
  private final List<Allowed> allowances = new ArrayList<>();
  private final GapSpread spread = new GapSpread();

  private CostReviewStage(
      Study study, Costs costs, Study.Filing filing, Panel panel, CostData data) {
    this.study = study;
    this.filing = filing;
    this.filings = new CostFilings(filing, panel);
    this.data = data;
    this.circumstances = new CostCircumstances(study, costs, panel, data);
  }

  /** The review of these fits; nothing where none is asked or none explains cost. */
  static ReviewStage.Review of(
      Study study, Costs costs, Panel panel, CostData data, List<CostFit> fits) {
    List<CostFit> explaining =
        fits.stream().filter(f -> f.specification().equations() != Equations.SHARES).toList();
    if (study.filing().isEmpty() || explaining.isEmpty()) {
      return ReviewStage.Review.NONE;
    }
    return new CostReviewStage(study, costs, study.filing().get(), panel, data).review(explaining);
  }

  private ReviewStage.Review review(List<CostFit> fits) {
    CostReference asked = CostReference.asked(filing);
    int[] periods = filings.periods();
    for (CostFit fit : fits) {
      List<Choice> choices =
          CostReference.all(asked).stream().map(r -> new Choice(r, r.of(data, fit))).toList();
      for (int period : periods) {
        review(choices, period, period == periods[periods.length - 1]);
      }
    }
    List<Said> remarks = new ArrayList<>(List.of(HOW));
    if (CostReference.frontier(filing)) {
      remarks.add(NO_FRONTIER);
    }
    return new ReviewStage.Review(
        reviews,
        new ReviewFindings(
            asked.words(),
            orders,
            variants,
            List.of(),
            spread.spreads(filings.panel()),
            allowances,
            filing.allowance(),
            remarks));
  }

  /** A reference, and the cost function at it. */
  private record Choice(CostReference reference, Levelled levelled) {}

  /** Of one period; the first choice is the one asked for. */
  private void review(List<Choice> choices, int period, boolean last) {
    Levelled levelled = choices.get(0).levelled();
    int[] rows = filings.rows(period);
    List<CostGap> gaps = gaps(levelled, rows);
    List<String> irregular =
        Arrays.stream(rows).parallel().mapToObj(r -> irregular(levelled.function(), r)).toList();
    List<Integer> answered =
        IntStream.range(0, rows.length).filter(i -> irregular.get(i).isEmpty()).boxed().toList();
    double smallest = smallest(answered.stream().map(gaps::get).toList());
    reviews.addAll(
        IntStream.range(0, rows.length)
            .parallel()
            .mapToObj(i -> reviewed(levelled, rows[i], gaps.get(i), irregular.get(i), smallest))
            .toList());
    if (answered.isEmpty()) {
      return;
    }
    order(levelled, period, rows, gaps, answered);
    int[] own = answered.stream().mapToInt(i -> rows[i]).toArray();
    vary(choices.get(0), period, true, own, answered.stream().map(gaps::get).toList());
    for (Choice choice : choices.subList(1, choices.size())) {
      vary(choice, period, false, own, undivided(choice.levelled(), own));
    }
    if (last && filing.allowance().isPresent()) {
      CostGaps engine = CostGaps.against(levelled.propagation());
      double quantile = filing.allowance().get().quantile();
      allowances.addAll(
          new AllowanceStage(filing.allowance().get())
              .allowed(
                  levelled.function().form(),
                  filings.period(period),
                  answered.stream()
                      .map(
                          i ->
                              new AllowanceStage.Carried(
                                  filings.plant(rows[i]),
                                  gaps.get(i).filed(),
                                  gaps.get(i).difference().value(),
                                  engine.quantile(gaps.get(i), quantile)))
                      .toList()));
    }
  }

  private List<CostGap> gaps(Levelled levelled, int[] rows) {
    return CostGaps.against(levelled.propagation())
        .of(Arrays.stream(rows).mapToObj(this::filed).toList(), levelled.function());
  }

  /** The same without the parts, which take most of the work. */
  private List<CostGap> undivided(Levelled levelled, int[] rows) {
    return CostGaps.against(levelled.propagation())
        .of(
            Arrays.stream(rows)
                .mapToObj(
                    r ->
                        new CostGaps.Filed(
                            data.point(r), filings.filed(r), filings.recorded(r), new double[0]))
                .toList(),
            levelled.function());
  }

  private CostGaps.Filed filed(int row) {
    double[] shares = Arrays.stream(data.shares()).mapToDouble(share -> share[row]).toArray();
    return new CostGaps.Filed(data.point(row), filings.filed(row), filings.recorded(row), shares);
  }

  /** The size of the gap below which it is not asked what would have to be true. */
  private double smallest(List<CostGap> gaps) {
    return gaps.stream()
        .map(gap -> Math.abs(gap.difference().value()))
        .sorted(Comparator.reverseOrder())
        .mapToDouble(size -> size)
        .limit(Math.max(1, MOST_NEEDED / filings.periods().length))
        .min()
        .orElse(0);
  }

  /** Why the fitted function is no cost function at a row; empty where it is one. */
  private String irregular(CostFunction function, int row) {
    CostElasticities at = CostElasticities.at(function, data.point(row));
    if (at.monotone() && at.concave()) {
      return "";
    }
    return at.monotone()
        ? "it is not concave in prices"
        : "a share or marginal cost is not positive";
  }

  private Reviewed reviewed(
      Levelled levelled, int row, CostGap gap, String irregular, double smallest) {
    String form = levelled.function().form();
    if (!irregular.isEmpty()) {
      return new Reviewed(
          filings.plant(row),
          filings.periodOf(row),
          form,
          gap.filed(),
          gap.recorded(),
          Optional.empty(),
          Optional.empty(),
          gap.unreconciled(),
          Optional.empty(),
          Optional.empty(),
          "irregular",
          List.of(
              Said.of(
                  "warning",
                  "irregular",
                  "At these prices and outputs the fitted function is no cost function ("
                      + irregular
                      + "), so there is no least cost.")));
    }
    List<String> outside = circumstances.outside(data.point(row));
    boolean asked = Math.abs(gap.difference().value()) >= smallest;
    return new Reviewed(
        filings.plant(row),
        filings.periodOf(row),
        form,
        gap.filed(),
        gap.recorded(),
        Optional.of(FitStage.figure(gap.leastCost())),
        Optional.of(FitStage.figure(gap.difference())),
        gap.unreconciled(),
        gap.parts().map(p -> FitStage.figure(p.technical())),
        gap.parts().map(p -> FitStage.figure(p.mix())),
        outside.isEmpty() ? "solved" : "outside-records",
        Optional.of(detail(levelled, row, gap, asked)),
        gap.parts().isPresent() ? List.of() : List.of(UNDIVIDED));
  }

  private Detail detail(Levelled levelled, int row, CostGap gap, boolean asked) {
    return new Detail(
        FitStage.figure(gap.ratio()),
        gap.parts().isPresent() ? Figure.exact(0) : FitStage.figure(gap.remainder()),
        gap.parts()
            .map(CostGap.Parts::efficiency)
            .map(
                e ->
                    new Efficiency(
                        FitStage.figure(e.technical()),
                        FitStage.figure(e.mix()),
                        FitStage.figure(e.cost()))),
        Optional.empty(),
        asked ? needed(levelled, row, gap) : List.of());
  }

  private List<Needed> needed(Levelled levelled, int row, CostGap gap) {
    return CostConditions.on(levelled.function(), levelled.propagation())
        .of(data.point(row), gap.filed())
        .stream()
        .map(c -> ReviewFigures.needed(c, c.value().map(FitStage::figure)))
        .toList();
  }

  private void order(
      Levelled levelled, int period, int[] rows, List<CostGap> gaps, List<Integer> answered) {
    Map<String, Figure> ratios = new HashMap<>();
    List<Entrant> entrants = new ArrayList<>();
    for (int i : answered) {
      CostGap gap = gaps.get(i);
      ratios.put(filings.plant(rows[i]), FitStage.figure(gap.ratio()));
      entrants.add(
          new Entrant(
              filings.plant(rows[i]),
              gap.filed(),
              gap.leastCost().value(),
              gap.slopes(),
              levelled.chance(),
              Optional.empty()));
    }
    Study.Simulation simulation = filing.simulation();
    double level = study.estimation().confidence();
    Ordering ordering =
        Ordering.of(
            entrants,
            ParameterDraws.of(
                levelled.covariance(),
                levelled.degreesOfFreedom(),
                simulation.draws(),
                simulation.seed()),
            levelled.propagation()::standardError,
            level);
    orders.add(
        new OrderStage(simulation, level)
            .order(
                levelled.function().form(),
                filings.period(period),
                ordering,
                levelled.chance() > 0,
                ratios));
  }

  private void vary(Choice choice, int period, boolean asAsked, int[] own, List<CostGap> gaps) {
    CostReference reference = choice.reference();
    Levelled levelled = choice.levelled();
    String form = levelled.function().form();
    spread.note(
        form,
        asAsked ? "as asked" : "against " + reference.words(),
        own,
        gaps.stream().mapToDouble(g -> g.difference().value() / g.filed()).toArray());
    var total = CostGaps.against(levelled.propagation()).total(gaps);
    variants.add(
        new Variant(
            form,
            filings.period(period),
            asAsked ? "as-asked" : reference.code(),
            asAsked ? "as asked" : "against " + reference.words(),
            study.money().words(),
            own.length,
            total.filed(),
            FitStage.figure(total.leastCost()),
            FitStage.figure(total.gap()),
            FitStage.figure(total.share())));
  }
}
