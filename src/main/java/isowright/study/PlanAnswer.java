package isowright.study;

import isowright.estimation.EstimatedTechnology;
import isowright.inference.DeltaMethod;
import isowright.inference.Intervals;
import isowright.leastcost.Minimiser;
import isowright.leastcost.Plan;
import isowright.leastcost.PlanOutcome;
import isowright.leastcost.PlanTask;
import isowright.leastcost.Planner;
import isowright.leastcost.Question;
import isowright.technology.Technology;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * One question answered by one technology, with what is needed to say more of the answer.
 *
 * @param asked the question
 * @param inputs the inputs, in order
 * @param estimated the technology, with its covariance where it was estimated
 * @param figures how numbers become figures
 * @param task what is planned
 * @param outcome the answer
 */
record PlanAnswer(
    Study.LeastCostQuestion asked,
    List<String> inputs,
    EstimatedTechnology estimated,
    FigureMaker figures,
    PlanTask task,
    PlanOutcome outcome) {

  static PlanAnswer of(
      Study study,
      Study.LeastCostQuestion asked,
      Candidate candidate,
      EstimatedTechnology estimated,
      PlanTask task) {
    double confidence = study.estimation().confidence();
    FigureMaker figures =
        new FigureMaker(
            Optional.of(estimated)
                .filter(e -> candidate.estimated())
                .map(e -> Intervals.of(e, confidence)),
            Optional.of(estimated)
                .filter(e -> candidate.estimated())
                .map(e -> DeltaMethod.of(e, confidence)));
    return new PlanAnswer(
        asked,
        study.inputs(),
        estimated,
        figures,
        task,
        Planner.of(estimated.technology()).plan(task));
  }

  Technology technology() {
    return estimated.technology();
  }

  Plan plan() {
    return outcome.plan();
  }

  /** Whether the answer moves smoothly with the technology: no bands, no whole units. */
  boolean smooth() {
    return task.plain();
  }

  /** Whether a target is to be reached at least cost with single prices. */
  boolean leastCost() {
    return smooth() && asked.terms().goal().fold(target -> true, b -> false, p -> false);
  }

  /** Prices and limits around the answer, at its output. */
  Question settled() {
    return outcome.settled();
  }

  /** The settled question answered by a technology nearby. */
  Plan near(Technology technology, Question question) {
    return Minimiser.of(technology).plan(question, plan());
  }

  /** Numbers by the names of the inputs. */
  Map<String, Figure> named(List<Figure> figures) {
    Map<String, Figure> named = new LinkedHashMap<>();
    for (int i = 0; i < inputs.size(); i++) {
      named.put(inputs.get(i), figures.get(i));
    }
    return named;
  }
}
