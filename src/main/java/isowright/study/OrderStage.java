package isowright.study;

import isowright.estimation.EstimatedTechnology;
import isowright.review.Entrant;
import isowright.review.Ordering;
import isowright.review.RankBands;
import isowright.review.ToldApart;
import isowright.study.ReviewFindings.Band;
import isowright.study.ReviewFindings.Groups;
import isowright.study.ReviewFindings.Order;
import isowright.study.ReviewFindings.Placed;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/** Orders the plants of one technology and period by filed over least cost. */
final class OrderStage {

  private final Study.Simulation simulation;
  private final double level;

  OrderStage(Study.Simulation simulation, double level) {
    this.simulation = simulation;
    this.level = level;
  }

  /** The order; absent where no filing has an answer. */
  Optional<Order> order(
      Candidate candidate, String period, EstimatedTechnology reference, List<HeldFiling> held) {
    List<HeldFiling> answered = held.stream().filter(HeldFiling::answered).toList();
    if (answered.isEmpty()) {
      return Optional.empty();
    }
    double residual =
        candidate.fit().map(fit -> fit.numbers().statistics().residualStandardError()).orElse(0.0);
    Map<String, Figure> ratios = new HashMap<>();
    List<Entrant> entrants =
        answered.stream()
            .map(h -> Entrant.of(h.plant(), h.filing().question(), h.gap(), residual))
            .toList();
    answered.forEach(h -> ratios.put(h.plant(), ReviewFigures.figure(candidate, h.gap().ratio())));
    Ordering ordering =
        Ordering.of(entrants, reference, simulation.draws(), simulation.seed(), level);
    return Optional.of(order(candidate.name(), period, ordering, residual > 0, ratios));
  }

  /**
   * An order as it stands in the findings.
   *
   * @param year whether the chance of the year is known
   * @param ratios filed over least cost, by plant
   */
  Order order(
      String technology,
      String period,
      Ordering ordering,
      boolean year,
      Map<String, Figure> ratios) {
    return new Order(
        technology,
        period,
        ordering.simulation().word(),
        simulation.draws(),
        simulation.seed(),
        ordering.without(),
        ordering.ranked().stream().map(r -> placed(r, ratios)).toList(),
        groups(ordering.apart()),
        year ? Optional.of(groups(ordering.apartWithYear())) : Optional.empty());
  }

  private static Placed placed(Ordering.Ranked ranked, Map<String, Figure> ratios) {
    String plant = ranked.entrant().plant();
    return new Placed(
        plant,
        ranked.rank(),
        Optional.ofNullable(ratios.get(plant)).orElseThrow(),
        band(ranked.band()),
        ranked.bandWithYear().stream().findFirst().map(OrderStage::band),
        ranked.probabilities());
  }

  private static Band band(RankBands.Band band) {
    return new Band(band.low(), band.high());
  }

  private static Groups groups(ToldApart apart) {
    return new Groups(
        apart.critical().isPresent()
            ? Optional.of(apart.critical().getAsDouble())
            : Optional.empty(),
        apart.groups());
  }
}
