package isowright.review;

import isowright.estimation.EstimatedTechnology;
import isowright.inference.DeltaMethod;
import isowright.inference.DeltaMethod.Scale;
import isowright.inference.Estimate;
import isowright.leastcost.LeastCost;
import isowright.leastcost.Minimiser;
import isowright.leastcost.Plan;
import isowright.leastcost.Question;
import java.util.List;
import java.util.Optional;

/**
 * How sure is the gap between a filed cost and least cost, and how sure are its parts? First-order
 * propagation of the technology's parameter covariance ({@link DeltaMethod}) with the closed
 * derivatives of {@link CostSlopes}:
 *
 * <pre>
 *   d technical = −Σ w x · dθ,    d mix = Σ w x · dθ − dC,    d gap = −dC
 * </pre>
 *
 * <p>Least cost and the ratio of filed to least cost are positive, so their intervals are symmetric
 * in logs; that of the gap is least cost's, turned round; that of the technical part is symmetric.
 * The mix part is never negative and, near the least-cost mix, quadratic in how far the mix lies
 * from it, so its root is what moves evenly with the parameters: its interval is (√m ± t
 * se/(2√m))², cut at zero. The parts' standard errors do not add up, because the parts move
 * together.
 *
 * <p>Assumptions: the filing, the quantities and the prices are exact; the parameters' estimated
 * covariance holds. The chance of a single year in a plant's own output is part of the gap, not of
 * its interval. Tested in {@code GapEstimatesTest} (against differences) and, for coverage, in
 * {@code GapCoverageTest}.
 */
public final class GapEstimates {

  private final FiledCost filedCost;
  private final LeastCost leastCost;
  private final CostSlopes slopes;
  private final DeltaMethod delta;

  private GapEstimates(EstimatedTechnology reference, double level) {
    this.filedCost = FiledCost.against(reference.technology());
    this.leastCost = Minimiser.of(reference.technology());
    this.slopes = new CostSlopes(reference.technology());
    this.delta = DeltaMethod.of(reference, level);
  }

  /** Against a reference technology, at a confidence level such as 0.95. */
  public static GapEstimates against(EstimatedTechnology reference, double level) {
    return new GapEstimates(reference, level);
  }

  /**
   * The gap of one plant in one period.
   *
   * @param mix the inputs used x, shape n, positive
   * @param question output and prices
   * @param filed the filed cost
   */
  public GapEstimate of(double[] mix, Question question, double filed) {
    FiledCost.Measured measured = filedCost.measured(mix, question, filed);
    Gap gap = measured.gap();
    double[] cost = slopes.ofCost(question, measured.plan());
    double error = delta.standardError(cost);
    Estimate least = delta.estimate(gap.leastCost(), error, Scale.LOG);
    double[] inLogs = new double[cost.length];
    for (int k = 0; k < cost.length; k++) {
      inLogs[k] = cost[k] / gap.leastCost();
    }
    double[] contraction = slopes.ofContraction(mix, gap.contraction());
    double[] technical = new double[cost.length];
    double[] inMix = new double[cost.length];
    ofParts(gap, cost, contraction, technical, inMix);
    double ratio = filed / gap.leastCost();
    double relative = error / gap.leastCost();
    return new GapEstimate(
        gap,
        measured.plan(),
        least,
        turnedRound(gap, least),
        delta.estimate(gap.technical(), delta.standardError(technical), Scale.LINEAR),
        onTheRoot(delta.estimate(gap.mix(), delta.standardError(inMix), Scale.LINEAR)),
        delta.estimate(gap.remainder(), gap.complete() ? 0 : error, Scale.LINEAR),
        delta.estimate(ratio, ratio * relative, Scale.LOG),
        efficiency(gap, contraction, inLogs, relative),
        inLogs);
  }

  private static void ofParts(
      Gap gap, double[] cost, double[] contraction, double[] technical, double[] inMix) {
    for (int k = 0; k < cost.length; k++) {
      double saved = gap.atPrices() * gap.contraction() * contraction[k];
      technical[k] = -saved;
      inMix[k] = saved - cost[k];
    }
  }

  /**
   * How least cost, the gap, its technical and its mix part move with the parameters; [4][p].
   *
   * @param mix the inputs used
   * @param estimate the gap of that mix
   */
  public double[][] gradients(double[] mix, GapEstimate estimate) {
    Gap gap = estimate.gap();
    double[] cost = estimate.slopes();
    double[] ofGap = new double[cost.length];
    for (int k = 0; k < cost.length; k++) {
      cost[k] *= gap.leastCost();
      ofGap[k] = -cost[k];
    }
    double[] technical = new double[cost.length];
    double[] inMix = new double[cost.length];
    ofParts(gap, cost, slopes.ofContraction(mix, gap.contraction()), technical, inMix);
    return new double[][] {cost, ofGap, technical, inMix};
  }

  /** Ratios on the log scale; that of the mix is cut at one, which it cannot pass. */
  private GapEstimate.Efficiency efficiency(
      Gap gap, double[] contraction, double[] inLogs, double relative) {
    double[] inMix = new double[inLogs.length];
    for (int k = 0; k < inMix.length; k++) {
      inMix[k] = inLogs[k] - contraction[k];
    }
    double technical = gap.technicalRatio();
    double mix = gap.mixRatio();
    Estimate ofMix = delta.estimate(mix, mix * delta.standardError(inMix), Scale.LOG);
    return new GapEstimate.Efficiency(
        delta.estimate(technical, technical * delta.standardError(contraction), Scale.LOG),
        atMostOne(ofMix),
        delta.estimate(gap.costRatio(), gap.costRatio() * relative, Scale.LOG));
  }

  /**
   * Filed cost and least cost alone.
   *
   * @param filed what is filed
   * @param leastCost least cost
   * @param slopes how ln of least cost moves with the parameters, shape p
   */
  public record Least(double filed, double leastCost, double[] slopes) {}

  /**
   * Least cost alone, without the parts of the gap; absent where there is none, or no interval.
   *
   * @param near a plan of the same filing by a technology not far away, where one is known
   */
  public Optional<Least> least(Question question, double filed, Optional<Plan> near) {
    Plan plan =
        near.filter(Plan::answered)
            .map(known -> leastCost.plan(question, known))
            .orElseGet(() -> leastCost.plan(question));
    if (!plan.answered()) {
      return Optional.empty();
    }
    double[] moved = slopes.ofCost(question, plan);
    for (int k = 0; k < moved.length; k++) {
      moved[k] /= plan.cost();
    }
    return Double.isFinite(delta.standardError(moved))
        ? Optional.of(new Least(filed, plan.cost(), moved))
        : Optional.empty();
  }

  /** The total over several filings in one period, whose parameters are the same. */
  public Total total(List<Least> filings) {
    double filed = 0;
    double least = 0;
    double[] moved = new double[slopes.parameters()];
    for (Least each : filings) {
      filed += each.filed();
      least += each.leastCost();
      for (int k = 0; k < moved.length; k++) {
        moved[k] += each.slopes()[k] * each.leastCost();
      }
    }
    Estimate cost = delta.estimate(least, delta.standardError(moved), Scale.LOG);
    return new Total(filed, cost, shifted(filed, 1, cost), shifted(1, 1 / filed, cost));
  }

  /**
   * Several filings together.
   *
   * @param filed what is filed
   * @param leastCost least cost
   * @param gap the gap
   * @param share the gap as a share of what is filed
   */
  public record Total(double filed, Estimate leastCost, Estimate gap, Estimate share) {}

  /** a − b C with the interval of C turned round. */
  private static Estimate shifted(double a, double b, Estimate cost) {
    return new Estimate(
        a - b * cost.value(),
        b * cost.standardError(),
        a - b * cost.high(),
        a - b * cost.low(),
        cost.level(),
        cost.method());
  }

  /**
   * The quantile of the gap's sampling distribution: filed less the opposite quantile of least
   * cost.
   */
  public double quantile(GapEstimate estimate, double probability) {
    return estimate.gap().filed()
        - delta.quantile(
            estimate.leastCost().value(),
            estimate.leastCost().standardError(),
            Scale.LOG,
            1 - probability);
  }

  /** The interval of a ratio that cannot pass one, cut there. */
  static Estimate atMostOne(Estimate ratio) {
    return new Estimate(
        ratio.value(),
        ratio.standardError(),
        ratio.low(),
        ratio.high() > 1 ? Math.max(1, ratio.value()) : ratio.high(),
        ratio.level(),
        ratio.method());
  }

  /** (√m ± h)² from m ± 2 h √m, cut at zero. */
  static Estimate onTheRoot(Estimate linear) {
    double root = Math.sqrt(Math.max(linear.value(), 0));
    if (root == 0 || Double.isNaN(linear.high())) {
      return linear;
    }
    double half = (linear.high() - linear.value()) / (2 * root);
    double low = Math.max(root - half, 0);
    double high = root + half;
    return new Estimate(
        linear.value(),
        linear.standardError(),
        low * low,
        high * high,
        linear.level(),
        linear.method());
  }

  private static Estimate turnedRound(Gap gap, Estimate least) {
    return new Estimate(
        gap.gap(),
        least.standardError(),
        gap.filed() - least.high(),
        gap.filed() - least.low(),
        least.level(),
        least.method());
  }
}
