package isowright.study;

import isowright.estimation.EstimatedTechnology;
import isowright.estimation.Fit;
import isowright.estimation.Productivity;
import isowright.estimation.Replicas.Technologies;
import isowright.estimation.Replication;
import isowright.leastcost.LeastCost;
import isowright.leastcost.Minimiser;
import isowright.records.Panel;
import isowright.study.ReviewFindings.Omission;
import isowright.technology.Technology;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.stream.IntStream;

/**
 * How the gaps of one technology and period move when a plant is left out of the estimation: the
 * technology is refitted without it, and every filing, that of the plant itself among them, is held
 * against the refit.
 */
final class OmissionStage {

  /** Of more plants one alone moves little, and the refits are many. */
  static final int MOST_PLANTS = 200;

  private final Panel panel;
  private final GapSpread spread;
  private final Map<String, Replication> replications = new HashMap<>();

  OmissionStage(Panel panel, GapSpread spread) {
    this.panel = panel;
    this.spread = spread;
  }

  /** The gaps without each plant; none for a technology taken as known or for too many plants. */
  List<Omission> omissions(
      Candidate candidate, int period, ReviewReference reference, List<HeldFiling> held) {
    boolean possible =
        candidate.fit().isPresent()
            && panel.repeats()
            && panel.plants().size() <= MOST_PLANTS
            && panel.plants().size() > 2;
    List<HeldFiling> answered = held.stream().filter(HeldFiling::answered).toList();
    if (!possible || answered.isEmpty()) {
      return List.of();
    }
    Technologies refits = refits(candidate, period, reference);
    List<double[]> shares =
        IntStream.range(0, refits.count())
            .parallel()
            .mapToObj(p -> refits.get(p).map(t -> shares(t, candidate, reference, answered)))
            .map(found -> found.orElse(new double[0]))
            .toList();
    int[] rows = answered.stream().mapToInt(h -> h.filing().row()).toArray();
    List<Omission> omissions = new ArrayList<>();
    for (int p = 0; p < shares.size(); p++) {
      double[] own = shares.get(p);
      if (own.length > 0) {
        String plant = panel.plants().get(p);
        spread.note(candidate.name(), "estimated without " + plant, rows, own);
        omission(candidate, period, plant, answered, own).ifPresent(omissions::add);
      }
    }
    return omissions;
  }

  private Technologies refits(Candidate candidate, int period, ReviewReference reference) {
    Productivity productivity =
        PlanCircumstances.productivity(reference.against(), Optional.empty());
    EstimatedTechnology known = candidate.at(period, productivity);
    if (known.replicas().withoutPlants().count() > 0) {
      return known.replicas().withoutPlants();
    }
    Fit fit = candidate.fit().orElseThrow();
    return replications
        .computeIfAbsent(candidate.name(), name -> Replication.of(fit, Optional.empty()))
        .at(period, productivity)
        .replicas()
        .withoutPlants();
  }

  /** The gap of every filing as a share of what is filed; NaN where there is none. */
  private static double[] shares(
      Technology refit, Candidate candidate, ReviewReference reference, List<HeldFiling> answered) {
    LeastCost leastCost = Minimiser.of(refit.shifted(reference.shift(candidate)));
    return answered.stream()
        .mapToDouble(
            h ->
                1
                    - leastCost.plan(h.filing().question(), h.gap().plan()).cost()
                        / h.gap().gap().filed())
        .toArray();
  }

  private Optional<Omission> omission(
      Candidate candidate, int period, String plant, List<HeldFiling> answered, double[] shares) {
    double filed = 0;
    double gap = 0;
    for (int i = 0; i < shares.length; i++) {
      double own = answered.get(i).gap().gap().filed();
      filed += own;
      gap += own * shares[i];
    }
    return Double.isNaN(gap)
        ? Optional.empty()
        : Optional.of(
            new Omission(candidate.name(), panel.periods().get(period), plant, gap, gap / filed));
  }
}
