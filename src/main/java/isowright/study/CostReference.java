package isowright.study;

import isowright.cost.CostFunction;
import isowright.cost.LevelledCost;
import isowright.estimation.CostData;
import isowright.estimation.CostFit;
import isowright.estimation.EstimatedCost;
import isowright.inference.Propagation;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.function.Function;
import java.util.stream.Stream;

/**
 * Against which level of a fitted cost function filed costs are held: whose cost, and whether it is
 * the median (as a fit in logs has it) or the mean, which is the median times Duan's smearing
 * factor mean exp(residual) (Duan 1983), taken as it is.
 *
 * @param against whose cost
 * @param smearing whether it is the mean
 */
record CostReference(Study.Productivity against, boolean smearing) {

  /** What is asked; the typical plant where that is a frontier, which cost functions have not. */
  static CostReference asked(Study.Filing filing) {
    return new CostReference(
        frontier(filing) ? Study.Productivity.TYPICAL : filing.against(), filing.smearing());
  }

  /** Whether a frontier is asked for, which is estimated of production functions alone. */
  static boolean frontier(Study.Filing filing) {
    return filing.against().kind() == Study.Productivity.Kind.FRONTIER;
  }

  /** The one that is asked, then the others. */
  static List<CostReference> all(CostReference asked) {
    return Stream.concat(
            Stream.of(asked),
            Stream.of(Study.Productivity.Kind.TYPICAL, Study.Productivity.Kind.BEST_QUARTER)
                .map(kind -> new Study.Productivity(kind, Optional.empty()))
                .flatMap(
                    whose -> Stream.of(false, true).map(mean -> new CostReference(whose, mean)))
                .filter(other -> !other.equals(asked)))
        .toList();
  }

  /**
   * A cost function at that level, and how sure it is.
   *
   * @param function the cost function at the estimate
   * @param propagation its parameters and their covariance
   * @param covariance the same covariance
   * @param degreesOfFreedom of Student's law
   * @param chance the standard deviation of ln C by the chance of a row
   */
  record Levelled(
      CostFunction function,
      Propagation<CostFunction> propagation,
      double[][] covariance,
      double degreesOfFreedom,
      double chance) {}

  Levelled of(CostData data, CostFit fit) {
    EstimatedCost estimated =
        EstimatedCost.of(data, fit, PlanCircumstances.productivity(against, Optional.empty()));
    double[] chances = estimated.chances();
    double shift =
        smearing ? Math.log(Arrays.stream(chances).map(Math::exp).average().orElse(1)) : 0;
    Function<double[], CostFunction> at = p -> new LevelledCost(estimated.at(p), shift);
    int plants = fit.specification().plantEffects() ? data.groups().count() : 0;
    double left = Math.max(1, data.rows() - fit.free() - plants);
    return new Levelled(
        at.apply(estimated.centre()),
        new Propagation<>(
            estimated.centre(),
            estimated.covariance(),
            fit.degreesOfFreedom(),
            fit.specification().confidence(),
            at),
        estimated.covariance(),
        fit.degreesOfFreedom(),
        Math.sqrt(Arrays.stream(chances).map(c -> c * c).sum() / left));
  }

  private boolean typical() {
    return against.kind() == Study.Productivity.Kind.TYPICAL;
  }

  /** A short, stable name. */
  String code() {
    return (typical() ? "typical" : "best-quarter") + (smearing ? "-mean" : "");
  }

  /** In words. */
  String words() {
    return (typical()
            ? "the typical plant"
            : "the plant at the lower quartile of cost at equal prices")
        + (smearing
            ? ", at the mean of its cost (smearing factor)"
            : ", at the median of its cost (no smearing factor)");
  }
}
