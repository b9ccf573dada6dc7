package isowright.study;

import isowright.estimation.EstimatedTechnology;
import isowright.estimation.Productivity;
import isowright.inference.DeltaMethod;
import isowright.inference.Estimate;
import isowright.inference.Support;
import isowright.leastcost.Minimiser;
import isowright.leastcost.Plan;
import isowright.leastcost.Question;
import isowright.records.Panel;
import isowright.review.FiledCost;
import isowright.review.Gap;
import isowright.study.Findings.Said;
import isowright.study.PlanFindings.Reviewed;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/** Holds the filed costs of a study against least cost, plant by plant and period by period. */
final class ReviewStage {

  private final Study study;
  private final Study.Filing filing;
  private final Panel panel;
  private final List<Candidate> candidates;
  private final Support support;

  ReviewStage(Study study, Study.Filing filing, Panel panel, List<Candidate> candidates) {
    this.study = study;
    this.filing = filing;
    this.panel = panel;
    this.candidates = candidates.stream().filter(Candidate::usable).toList();
    this.support = Support.of(panel);
  }

  List<Reviewed> reviews() {
    int last = panel.periods().size() - 1;
    int from = filing.firstPeriod().map(panel.periods()::indexOf).orElse(last);
    int to = filing.lastPeriod().map(panel.periods()::indexOf).orElse(last);
    Productivity reference = PlanStage.productivity(filing.against(), Optional.of(panel));
    List<Reviewed> reviews = new ArrayList<>();
    for (Candidate candidate : candidates) {
      for (int period = from; period <= to; period++) {
        EstimatedTechnology technology = candidate.at(period, reference);
        for (int r = 0; r < panel.rows(); r++) {
          if (panel.rowPeriods().get(r) == period) {
            reviews.add(review(candidate, technology, r));
          }
        }
      }
    }
    return reviews;
  }

  private Reviewed review(Candidate candidate, EstimatedTechnology estimated, int row) {
    int n = study.inputs().size();
    double[] mix = new double[n];
    double[] prices = new double[n];
    double atPrices = 0;
    for (int i = 0; i < n; i++) {
      mix[i] = panel.quantities().get(i).get(row);
      prices[i] = panel.prices().get(i).orElseThrow().get(row);
      atPrices += mix[i] * prices[i];
    }
    double filed = filing.cost().isPresent() ? panel.filedCost().orElseThrow().get(row) : atPrices;
    String plant = panel.plants().get(panel.plantOf(row));
    String period = panel.periods().get(panel.rowPeriods().get(row));
    if (!Double.isFinite(atPrices) || !Double.isFinite(filed)) {
      return unanswered(plant, period, candidate.name(), filed, atPrices);
    }
    Question question = Question.of(panel.output().get(row), prices);
    Gap gap = FiledCost.against(estimated.technology()).gap(mix, question, filed);
    List<Said> remarks = new ArrayList<>();
    if (!gap.reason().isEmpty()) {
      remarks.add(Said.of(gap.complete() ? "note" : "warning", "review", gap.reason()));
    }
    if (!gap.complete()) {
      return new Reviewed(
          plant,
          period,
          candidate.name(),
          filed,
          atPrices,
          Optional.empty(),
          Optional.empty(),
          filed - atPrices,
          Optional.empty(),
          Optional.empty(),
          gap.status() == Plan.Status.INFEASIBLE ? "infeasible" : "irregular",
          remarks);
    }
    double[] least = Minimiser.of(estimated.technology()).mix(question);
    boolean inside = support.inside(least);
    List<Figure> figures = figures(candidate, estimated, question, mix, gap);
    return new Reviewed(
        plant,
        period,
        candidate.name(),
        filed,
        atPrices,
        Optional.of(figures.get(0)),
        Optional.of(figures.get(1)),
        gap.unreconciled(),
        Optional.of(figures.get(2)),
        Optional.of(figures.get(3)),
        inside ? "solved" : "outside-records",
        remarks);
  }

  private List<Figure> figures(
      Candidate candidate,
      EstimatedTechnology estimated,
      Question question,
      double[] mix,
      Gap gap) {
    double filed = gap.filed();
    double[] values = {gap.leastCost(), gap.gap(), gap.technical(), gap.mix()};
    List<Figure> figures = new ArrayList<>();
    if (candidate.fit().isEmpty()) {
      for (double value : values) {
        figures.add(Figure.exact(value));
      }
      return figures;
    }
    DeltaMethod delta = DeltaMethod.of(estimated, study.estimation().confidence());
    List<Estimate> estimates =
        delta.estimates(
            t -> {
              Gap moved = FiledCost.against(t).gap(mix, question, filed);
              return new double[] {moved.leastCost(), moved.gap(), moved.technical(), moved.mix()};
            },
            DeltaMethod.Scale.LINEAR);
    Estimate least =
        delta.estimate(
            estimates.get(0).value(), estimates.get(0).standardError(), DeltaMethod.Scale.LOG);
    figures.add(FitStage.figure(least));
    // Filed cost is exact, so the gap's interval is that of least cost, turned round.
    figures.add(
        Figure.estimated(
            filed - least.value(),
            least.standardError(),
            filed - least.high(),
            filed - least.low(),
            least.method().word()));
    figures.add(FitStage.figure(estimates.get(2)));
    figures.add(FitStage.figure(estimates.get(3)));
    return figures;
  }

  private static Reviewed unanswered(
      String plant, String period, String technology, double filed, double atPrices) {
    return new Reviewed(
        plant,
        period,
        technology,
        filed,
        atPrices,
        Optional.empty(),
        Optional.empty(),
        filed - atPrices,
        Optional.empty(),
        Optional.empty(),
        "infeasible",
        List.of(
            Said.of(
                "warning",
                "missing-price-or-cost",
                "A price or the filed cost of this plant and period is missing, so it cannot be"
                    + " reviewed.")));
  }
}
