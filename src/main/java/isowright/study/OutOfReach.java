package isowright.study;

import isowright.leastcost.PlanOutcome;
import isowright.leastcost.PlanTask;
import isowright.leastcost.Planner;
import isowright.leastcost.PlantOption;
import isowright.leastcost.PlantSplit;
import isowright.leastcost.SplitOutcome;
import isowright.records.Panel;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/**
 * Goals that cannot be achieved, as far as that is known before anything is estimated: where all
 * technologies asked are taken as known and none of them can, the question is a mistake. Of an
 * estimated technology it is a finding.
 */
final class OutOfReach {

  private final Study study;
  private final PlanCircumstances circumstances;

  OutOfReach(Study study, Optional<Panel> panel) {
    this(study, new PlanCircumstances(study, panel));
  }

  OutOfReach(Study study, PlanCircumstances circumstances) {
    this.study = study;
    this.circumstances = circumstances;
  }

  List<Mistake> mistakes() {
    List<Mistake> mistakes = new ArrayList<>();
    for (Study.LeastCostQuestion asked : study.leastCost()) {
      String key = "least-cost[" + asked.terms().place() + "]";
      if (!asked.terms().across().isEmpty()) {
        split(key, asked).ifPresent(mistakes::add);
        continue;
      }
      List<Candidate> known = known(asked);
      if (!known.isEmpty()) {
        single(key, asked, known).ifPresent(mistakes::add);
      }
    }
    return mistakes;
  }

  /** The technologies asked, if all of them are taken as known; none otherwise. */
  private List<Candidate> known(Study.LeastCostQuestion asked) {
    List<String> wanted = asked.technologies();
    boolean fitted =
        wanted.isEmpty()
            ? !study.technologies().isEmpty()
            : wanted.stream().anyMatch(study.technologies()::contains);
    return fitted
        ? List.of()
        : study.given().stream()
            .filter(given -> wanted.isEmpty() || wanted.contains(given.name()))
            .map(Candidate::given)
            .toList();
  }

  private Optional<Mistake> single(
      String key, Study.LeastCostQuestion asked, List<Candidate> known) {
    PlanTask task = circumstances.task(asked);
    List<String> reasons = new ArrayList<>();
    boolean unbounded = false;
    for (Candidate candidate : known) {
      PlanOutcome outcome = Planner.of(candidate.given().orElseThrow()).plan(task);
      boolean wholes =
          outcome.state() == PlanOutcome.State.UNBOUNDED && !asked.terms().whole().isEmpty();
      if (outcome.state() != PlanOutcome.State.INFEASIBLE && !wholes) {
        return Optional.empty();
      }
      unbounded |= wholes;
      reasons.add(candidate.name() + ": " + outcome.plan().reason());
    }
    String said = String.join("; ", reasons);
    return Optional.of(
        unbounded
            ? new Mistake(
                0,
                0,
                key + ".whole",
                "whole units cannot be counted where there is no best plan ("
                    + said
                    + "); state a"
                    + " target, a budget or limits")
            : new Mistake(0, 0, key + "." + PlanCircumstances.goalKey(asked.terms()), said));
  }

  /** A split whose plants all have technologies taken as known. */
  private Optional<Mistake> split(String key, Study.LeastCostQuestion asked) {
    List<Candidate> known = known(asked);
    SplitStage stage =
        new SplitStage(study, circumstances, study.given().stream().map(Candidate::given).toList());
    if (stage.namesEveryTechnology(asked)) {
      known = stage.first(asked).stream().toList();
    }
    for (Candidate candidate : known) {
      Optional<List<PlantOption>> options = stage.options(asked, candidate);
      if (options.isEmpty()) {
        return Optional.empty();
      }
      SplitOutcome outcome = PlantSplit.of(options.get(), asked.target());
      if (outcome.state() == PlanOutcome.State.INFEASIBLE) {
        return Optional.of(new Mistake(0, 0, key + ".target", outcome.reason()));
      }
    }
    return Optional.empty();
  }
}
