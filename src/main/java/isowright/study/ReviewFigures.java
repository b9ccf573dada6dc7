package isowright.study;

import isowright.estimation.EstimatedTechnology;
import isowright.inference.Estimate;
import isowright.inference.ReplicatedIntervals;
import isowright.inference.Support;
import isowright.leastcost.Plan;
import isowright.records.Panel;
import isowright.review.Condition;
import isowright.review.Conditions;
import isowright.review.EfficientScale;
import isowright.review.FiledCost;
import isowright.review.Gap;
import isowright.review.GapEstimate;
import isowright.review.GapEstimates;
import isowright.study.Findings.Said;
import isowright.study.PlanFindings.Detail;
import isowright.study.PlanFindings.Efficiency;
import isowright.study.PlanFindings.Needed;
import isowright.study.PlanFindings.Reviewed;
import isowright.study.PlanFindings.Scale;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/** Turns filings held against one technology in one period into findings. */
final class ReviewFigures {

  /** Of more filings in all the gaps are not worked out again for every refit. */
  static final int MOST_REFITTED = 2_000;

  private final Candidate candidate;
  private final String period;
  private final Support support;
  private final EfficientScale scale;
  private final Conditions conditions;
  private final GapEstimates estimates;
  private final Optional<ReplicatedIntervals> refits;

  ReviewFigures(
      Panel panel,
      Candidate candidate,
      int period,
      EstimatedTechnology reference,
      GapEstimates estimates,
      Support support,
      boolean refitted,
      double level) {
    this.candidate = candidate;
    this.period = panel.periods().get(period);
    this.support = support;
    double smallest = Double.POSITIVE_INFINITY;
    double largest = 0;
    for (int r = 0; r < panel.rows(); r++) {
      smallest = Math.min(smallest, panel.output().get(r));
      largest = Math.max(largest, panel.output().get(r));
    }
    this.scale = EfficientScale.of(reference, level, smallest, largest);
    this.conditions = Conditions.on(reference, level);
    this.estimates = estimates;
    this.refits = refitted ? ReplicatedIntervals.of(reference, level) : Optional.empty();
  }

  /**
   * A filing as it stands in the findings.
   *
   * @param needed whether it is asked what would have to be true
   */
  Reviewed reviewed(HeldFiling held, boolean needed) {
    FilingRows.Filing filing = held.filing();
    if (held.estimate().isEmpty()) {
      return without(
          held,
          "infeasible",
          List.of(
              Said.of(
                  "warning",
                  "missing-price-or-cost",
                  "A price or the filed cost of this plant and period is missing, so it cannot be"
                      + " reviewed.")));
    }
    GapEstimate estimate = held.gap();
    Gap gap = estimate.gap();
    List<Said> remarks = new ArrayList<>();
    if (!gap.reason().isEmpty()) {
      remarks.add(Said.of(gap.complete() ? "note" : "warning", "review", gap.reason()));
    }
    if (!gap.answered()) {
      return without(
          held, gap.status() == Plan.Status.INFEASIBLE ? "infeasible" : "irregular", remarks);
    }
    boolean inside = support.inside(estimate.plan().mix());
    List<Estimate> four = refitted(filing, estimate);
    ResamplingWords.failed(four.stream().map(this::figure)).ifPresent(remarks::add);
    return new Reviewed(
        held.plant(),
        period,
        candidate.name(),
        gap.filed(),
        gap.atPrices(),
        Optional.of(figure(four.get(0))),
        Optional.of(figure(four.get(1))),
        gap.unreconciled(),
        split(gap, four.get(2)),
        split(gap, four.get(3)),
        inside ? "solved" : "outside-records",
        Optional.of(detail(filing, estimate, needed)),
        remarks);
  }

  /** Least cost, the gap, its technical part, that of the mix: with their refits, where any are. */
  private List<Estimate> refitted(FilingRows.Filing filing, GapEstimate estimate) {
    List<Estimate> four =
        List.of(estimate.leastCost(), estimate.difference(), estimate.technical(), estimate.mix());
    return refits
        .map(
            r ->
                r.refitted(
                    four,
                    t ->
                        FiledCost.against(t)
                            .parts(
                                filing.mix(), filing.question(), filing.filed(), estimate.plan()),
                    () -> estimates.gradients(filing.mix(), estimate)))
        .orElse(four);
  }

  private Reviewed without(HeldFiling held, String status, List<Said> remarks) {
    FilingRows.Filing filing = held.filing();
    return new Reviewed(
        held.plant(),
        period,
        candidate.name(),
        filing.filed(),
        filing.atPrices(),
        Optional.empty(),
        Optional.empty(),
        filing.filed() - filing.atPrices(),
        Optional.empty(),
        Optional.empty(),
        status,
        remarks);
  }

  private Detail detail(FilingRows.Filing filing, GapEstimate estimate, boolean needed) {
    Gap gap = estimate.gap();
    GapEstimate.Efficiency ratios = estimate.efficiency();
    return new Detail(
        figure(estimate.ratio()),
        gap.complete() ? Figure.exact(gap.remainder()) : figure(estimate.remainder()),
        gap.complete()
            ? Optional.of(
                new Efficiency(
                    figure(ratios.technical()), figure(ratios.mix()), figure(ratios.cost())))
            : Optional.empty(),
        Optional.of(scale(scale.at(filing.question(), estimate.plan()))),
        needed
            ? conditions.of(filing.question(), estimate.plan(), gap.filed()).stream()
                .map(this::needed)
                .toList()
            : List.of());
  }

  private Scale scale(EfficientScale.Found found) {
    return new Scale(
        found.state().word(),
        figure(found.elasticity()),
        found.output().map(this::figure),
        found.part().map(this::figure));
  }

  private Needed needed(Condition condition) {
    return needed(condition, condition.value().map(this::figure));
  }

  /** A condition as it stands in the findings. */
  static Needed needed(Condition condition, Optional<Figure> value) {
    return new Needed(
        condition.kind().word(),
        condition.input(),
        condition.asIs(),
        value,
        condition.low(),
        condition.high(),
        condition.end(),
        condition.costAtEnd(),
        condition.regular());
  }

  private Optional<Figure> split(Gap gap, Estimate part) {
    return gap.complete() ? Optional.of(figure(part)) : Optional.empty();
  }

  /** A technology taken as known gives exact figures. */
  Figure figure(Estimate estimate) {
    return figure(candidate, estimate);
  }

  static Figure figure(Candidate candidate, Estimate estimate) {
    return candidate.fit().isPresent() ? FitStage.figure(estimate) : Figure.exact(estimate.value());
  }

  /** What must be said of the split by this technology; nothing where it is the same everywhere. */
  Optional<Said> direction(List<HeldFiling> held) {
    List<Gap> split =
        held.stream()
            .flatMap(h -> h.estimate().stream())
            .map(GapEstimate::gap)
            .filter(Gap::complete)
            .toList();
    long depends = split.stream().filter(Gap::splitDependsOnDirection).count();
    if (depends == 0) {
      return Optional.empty();
    }
    double most =
        split.stream()
            .filter(Gap::splitDependsOnDirection)
            .mapToDouble(g -> Math.abs(g.mixRatioAtOwnOutput() - g.mixRatio()))
            .max()
            .orElse(0);
    return Optional.of(
        Said.of(
            "note",
            "split-depends-on-direction",
            String.format(
                java.util.Locale.ROOT,
                "By %s the isoquants of %s are not parallel in %d of %d filings, so the split of"
                    + " the gap into technical and mix is that of shrinking inputs at the recorded"
                    + " output; judged at the output that the inputs would yield, the efficiency of"
                    + " the mix would differ by up to %.4f. The gap itself does not depend on it"
                    + " (Kopp and Diewert 1982).",
                candidate.name(),
                period,
                depends,
                split.size(),
                most)));
  }
}
