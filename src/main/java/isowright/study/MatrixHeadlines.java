package isowright.study;

import isowright.estimation.EstimatedTechnology;
import isowright.estimation.Fit;
import isowright.estimation.Productivity;
import isowright.estimation.Specification.Time;
import isowright.leastcost.PlanTask;
import isowright.records.Panel;
import isowright.review.GapEstimates;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalInt;

/**
 * The money figures that every combination of a specification matrix is asked for: the answer to
 * the first least-cost question, and the gap of the last period reviewed. Prices, outputs and
 * filings are those of the whole records in every combination, so that figures differ by the
 * technology alone.
 */
final class MatrixHeadlines {

  private final Study study;
  private final Optional<Asked> asked;
  private final Optional<Held> held;

  private record Asked(Study.LeastCostQuestion question, Optional<PlanTask> task, String period) {}

  private record Held(Study.Filing filing, List<FilingRows.Filing> rows, String period) {}

  MatrixHeadlines(Study study, Panel panel) {
    this.study = study;
    PlanCircumstances circumstances = new PlanCircumstances(study, Optional.of(panel));
    this.asked =
        study.leastCost().stream()
            .findFirst()
            .map(
                q ->
                    new Asked(
                        q,
                        q.terms().across().isEmpty()
                            ? Optional.of(circumstances.task(q))
                            : Optional.empty(),
                        panel.periods().get(circumstances.period(q))));
    this.held = study.filing().map(filing -> held(filing, panel));
  }

  private static Held held(Study.Filing filing, Panel panel) {
    int[] periods = ReviewStage.periods(filing, panel);
    int last = periods[periods.length - 1];
    FilingRows rows = FilingRows.of(filing, panel);
    List<FilingRows.Filing> known = new ArrayList<>();
    for (int row : FilingRows.of(panel, last)) {
      FilingRows.Filing filed = rows.filing(row);
      if (filed.known()) {
        known.add(filed);
      }
    }
    return new Held(filing, known, panel.periods().get(last));
  }

  /** What the answer to the question is called; empty where none is asked. */
  Optional<String> costWords() {
    return asked.map(
        a ->
            a.question()
                    .terms()
                    .goal()
                    .fold(target -> "least cost", budget -> "most output", price -> "most profit")
                + " of “"
                + a.question().name()
                + "”");
  }

  /** The unit of the answer. */
  String costUnit() {
    boolean output =
        asked
            .map(a -> a.question().terms().goal().fold(t -> false, budget -> true, price -> false))
            .orElse(false);
    return output ? study.outputUnit().orElse("") : study.money().words();
  }

  /** What the gap is called; empty where nothing is reviewed. */
  Optional<String> gapWords() {
    return held.map(
        h ->
            "cost gap of "
                + h.rows().size()
                + (h.rows().size() == 1 ? " filing" : " filings")
                + " in "
                + h.period()
                + ", share of what was filed");
  }

  /** Adds the answer to the question, or why there is none. */
  void cost(Fit fit, Map<String, Figure> figures, Map<String, String> without) {
    if (asked.isEmpty()) {
      return;
    }
    Asked a = asked.get();
    Study.LeastCostQuestion question = a.question();
    if (a.task().isEmpty()) {
      without.put(
          MatrixFindings.LEAST_COST,
          "the question is split across plants, which this table does not repeat");
      return;
    }
    OptionalInt period = period(fit, a.period());
    Optional<String> plant = question.productivity().plant();
    if (period.isEmpty()) {
      without.put(MatrixFindings.LEAST_COST, noPeriod(a.period()));
    } else if (plant.isPresent() && !fit.panel().plants().contains(plant.get())) {
      without.put(
          MatrixFindings.LEAST_COST,
          "plant " + plant.get() + ", whose productivity is asked, is not in the sample");
    } else {
      Productivity productivity =
          PlanCircumstances.productivity(question.productivity(), Optional.of(fit.panel()));
      answer(fit, a, fit.at(period.getAsInt(), productivity), figures, without);
    }
  }

  private void answer(
      Fit fit,
      Asked a,
      EstimatedTechnology estimated,
      Map<String, Figure> figures,
      Map<String, String> without) {
    PlanAnswer answer =
        PlanAnswer.of(
            study,
            a.question(),
            Candidate.fitted(fit, Optional.empty()),
            estimated,
            a.task().orElseThrow());
    PlanFigures.Main main = new PlanFigures(answer, study.estimation().confidence()).main();
    Optional<Figure> figure =
        a.question()
            .terms()
            .goal()
            .fold(target -> main.cost(), budget -> main.output(), price -> main.profit());
    if (figure.isPresent() && answer.outcome().planned()) {
      figures.put(MatrixFindings.LEAST_COST, figure.get());
    } else {
      String reason = answer.outcome().plan().reason();
      without.put(
          MatrixFindings.LEAST_COST,
          reason.isBlank() ? "the question has no answer by this technology" : reason);
    }
  }

  /** The rows of the filings of the last period reviewed, in the whole records. */
  int[] filings() {
    return held.map(h -> h.rows().stream().mapToInt(FilingRows.Filing::row).toArray())
        .orElse(new int[0]);
  }

  /**
   * Adds the gap, or why there is none.
   *
   * @return the gap of each filing as a share of what was filed; NaN where it has no least cost
   */
  double[] gap(Fit fit, Map<String, Figure> figures, Map<String, String> without) {
    if (held.isEmpty() || held.get().rows().isEmpty()) {
      return new double[0];
    }
    Held h = held.get();
    OptionalInt period = period(fit, h.period());
    if (period.isEmpty()) {
      without.put(MatrixFindings.GAP, noPeriod(h.period()));
      return FigureMaker.missing(h.rows().size());
    }
    Candidate candidate = Candidate.fitted(fit, Optional.empty());
    GapEstimates estimates =
        GapEstimates.against(
            ReviewReference.asked(h.filing()).of(candidate, period.getAsInt()),
            study.estimation().confidence());
    List<GapEstimates.Least> answered = new ArrayList<>();
    double[] shares = FigureMaker.missing(h.rows().size());
    for (int f = 0; f < shares.length; f++) {
      FilingRows.Filing filed = h.rows().get(f);
      Optional<GapEstimates.Least> least =
          estimates.least(filed.question(), filed.filed(), Optional.empty());
      if (least.isPresent()) {
        answered.add(least.get());
        shares[f] = 1 - least.get().leastCost() / filed.filed();
      }
    }
    int lost = h.rows().size() - answered.size();
    if (lost == 0) {
      figures.put(
          MatrixFindings.GAP, ReviewFigures.figure(candidate, estimates.total(answered).share()));
    } else {
      without.put(
          MatrixFindings.GAP,
          lost
              + " of "
              + h.rows().size()
              + " filings have no least cost by this technology, so that the total would not be"
              + " that of the others");
    }
    return shares;
  }

  /**
   * The index in the sample of a period of the whole records; where time moves nothing, any period
   * will do.
   */
  private static OptionalInt period(Fit fit, String name) {
    int at = fit.panel().periods().indexOf(name);
    if (at >= 0) {
      return OptionalInt.of(at);
    }
    return fit.specification().time() == Time.NONE
        ? OptionalInt.of(fit.panel().periods().size() - 1)
        : OptionalInt.empty();
  }

  private static String noPeriod(String period) {
    return "the sample does not hold " + period + ", at which the figure is asked";
  }
}
