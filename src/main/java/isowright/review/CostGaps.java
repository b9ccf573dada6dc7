package isowright.review;

import isowright.cost.CostFunction;
import isowright.inference.DeltaMethod.Scale;
import isowright.inference.Estimate;
import isowright.inference.Propagation;
import isowright.review.GapEstimates.Total;
import java.util.ArrayList;
import java.util.List;

/**
 * How do filed costs compare with an estimated cost function at the same outputs and prices, and
 * how sure is that?
 *
 * <pre>  gap = filed − C(w, y) = (filed − recorded) + (recorded − C(w, y)) </pre>
 *
 * <p>The first part is unreconciled and exact; the second is the remainder: a cost function knows
 * no quantities, so a technical and a mix part cannot be told apart in it.
 *
 * <p>Uncertainty: first-order propagation of the parameters' covariance. The log of the forms
 * fitted is linear in their parameters, so ∂ln C/∂θ by differences is right to rounding, and all
 * filings share the functions moved. Filing, prices and outputs are taken as exact. Tested in
 * {@code CostGapsTest}.
 */
public final class CostGaps {

  private final Propagation<CostFunction> propagation;

  private CostGaps(Propagation<CostFunction> propagation) {
    this.propagation = propagation;
  }

  /** Against the cost function that these parameters describe. */
  public static CostGaps against(Propagation<CostFunction> propagation) {
    return new CostGaps(propagation);
  }

  /**
   * The gaps of filings.
   *
   * @param points the arguments of the cost function, one array a filing
   * @param function the cost function at the estimate
   * @param filed filed costs
   * @param recorded recorded costs
   */
  public List<CostGap> of(
      List<double[]> points, CostFunction function, double[] filed, double[] recorded) {
    double[][] slopes = propagation.gradients(f -> logCosts(f, points));
    double[] logCosts = logCosts(function, points);
    List<CostGap> gaps = new ArrayList<>();
    for (int r = 0; r < filed.length; r++) {
      double cost = Math.exp(logCosts[r]);
      double relative = propagation.standardError(slopes[r]);
      Estimate least = propagation.estimate(cost, cost * relative, Scale.LOG);
      double ratio = filed[r] / cost;
      gaps.add(
          new CostGap(
              filed[r],
              recorded[r],
              least,
              turnedRound(filed[r], least),
              turnedRound(recorded[r], least),
              propagation.estimate(ratio, ratio * relative, Scale.LOG),
              slopes[r]));
    }
    return gaps;
  }

  private static double[] logCosts(CostFunction function, List<double[]> points) {
    double[] logs = new double[points.size()];
    for (int r = 0; r < logs.length; r++) {
      logs[r] = function.logCost(points.get(r));
    }
    return logs;
  }

  /** Several filings together, whose parameters are the same. */
  public Total total(List<CostGap> gaps) {
    double filed = 0;
    double least = 0;
    double[] moved = new double[gaps.get(0).slopes().length];
    for (CostGap gap : gaps) {
      filed += gap.filed();
      least += gap.leastCost().value();
      double[] own = gap.slopes();
      for (int k = 0; k < moved.length; k++) {
        moved[k] += own[k] * gap.leastCost().value();
      }
    }
    Estimate cost = propagation.estimate(least, propagation.standardError(moved), Scale.LOG);
    Estimate gap = turnedRound(filed, cost);
    Estimate share =
        new Estimate(
            gap.value() / filed,
            gap.standardError() / filed,
            gap.low() / filed,
            gap.high() / filed,
            gap.level(),
            gap.method());
    return new Total(filed, cost, gap, share);
  }

  /** The standard error of a function of the parameters with this gradient. */
  public double standardError(double[] gradient) {
    return propagation.standardError(gradient);
  }

  /** The quantile of the gap's sampling distribution. */
  public double quantile(CostGap gap, double probability) {
    Estimate least = gap.leastCost();
    return gap.filed()
        - propagation.quantile(least.value(), least.standardError(), Scale.LOG, 1 - probability);
  }

  private static Estimate turnedRound(double money, Estimate least) {
    return new Estimate(
        money - least.value(),
        least.standardError(),
        money - least.high(),
        money - least.low(),
        least.level(),
        least.method());
  }
}
