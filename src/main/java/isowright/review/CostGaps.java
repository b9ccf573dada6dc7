package isowright.review;

import isowright.cost.CostFunction;
import isowright.inference.DeltaMethod.Scale;
import isowright.inference.Estimate;
import isowright.inference.Propagation;
import isowright.review.GapEstimates.Total;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;

/**
 * How do filed costs compare with an estimated cost function at the same outputs and prices, and
 * how sure is that?
 *
 * <pre>  gap = filed − C(w, y) = (filed − recorded) + (recorded − C(w, y)) </pre>
 *
 * <p>The first part is unreconciled and exact. The second divides where the shares of inputs in
 * recorded cost are known, hence quantities x, by the factor θ that draws x onto the isoquant
 * ({@link DualContraction}):
 *
 * <pre>  recorded − C = (1 − θ) recorded + (θ recorded − C) </pre>
 *
 * <p>Without shares, or where no prices make the mix least cost while the function is a cost
 * function, it stands undivided.
 *
 * <p>Uncertainty: first-order propagation of the parameters' covariance. ∂ln C/∂θ by differences of
 * fourth order, exact but for rounding where ln C is linear in its parameters; all filings share
 * the functions moved. Filing, prices and outputs are taken as exact. Tested in {@code
 * CostGapsTest} and, for coverage, in {@code CostGapCoverageTest}.
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
   * A filing.
   *
   * @param point the arguments of the cost function
   * @param filed filed cost
   * @param recorded recorded cost
   * @param shares the shares of the inputs in it; empty where not known
   */
  public record Filed(double[] point, double filed, double recorded, double[] shares) {

    /** Shares that add up to one to this are shares: four printed decimals of several inputs. */
    private static final double ROUNDING = 5e-4;

    /**
     * Quantities x_i = s_i recorded / w_i, the rounding of shares spread in proportion; absent
     * where shares are not known or do not add up.
     */
    Optional<double[]> mix() {
      double sum = Arrays.stream(shares).sum();
      double[] mix = new double[shares.length];
      for (int i = 0; i < mix.length; i++) {
        mix[i] = shares[i] / sum * recorded / Math.exp(point[i]);
      }
      boolean known = Math.abs(sum - 1) <= ROUNDING && Arrays.stream(mix).allMatch(x -> x > 0);
      return known ? Optional.of(mix) : Optional.empty();
    }
  }

  /**
   * The gaps of filings.
   *
   * @param function the cost function at the estimate
   */
  public List<CostGap> of(List<Filed> filings, CostFunction function) {
    List<double[]> points = filings.stream().map(Filed::point).toList();
    double[][] slopes = propagation.gradients(f -> logCosts(f, points));
    double[] logCosts = logCosts(function, points);
    List<Optional<DualContraction>> drawn =
        filings.parallelStream()
            .map(f -> f.mix().flatMap(x -> DualContraction.of(function, f.point(), x)))
            .toList();
    List<double[]> there =
        drawn.stream().flatMap(d -> d.stream().map(DualContraction::point)).toList();
    double[][] thetaSlopes =
        there.isEmpty() ? new double[0][] : propagation.gradients(f -> logCosts(f, there));
    List<CostGap> gaps = new ArrayList<>();
    int next = 0;
    for (int r = 0; r < filings.size(); r++) {
      Filed filing = filings.get(r);
      double cost = Math.exp(logCosts[r]);
      double relative = propagation.standardError(slopes[r]);
      Estimate least = propagation.estimate(cost, cost * relative, Scale.LOG);
      double ratio = filing.filed() / cost;
      Optional<CostGap.Parts> parts = Optional.empty();
      if (drawn.get(r).isPresent()) {
        double theta = drawn.get(r).get().theta();
        parts = Optional.of(parts(filing.recorded(), least, theta, slopes[r], thetaSlopes[next++]));
      }
      gaps.add(
          new CostGap(
              filing.filed(),
              filing.recorded(),
              least,
              turnedRound(filing.filed(), least),
              turnedRound(filing.recorded(), least),
              parts,
              propagation.estimate(ratio, ratio * relative, Scale.LOG),
              slopes[r]));
    }
    return gaps;
  }

  /** By ∂ln C and ∂ln θ: d technical = −θ R ∂ln θ, d mix = θ R ∂ln θ − C ∂ln C. */
  private CostGap.Parts parts(
      double recorded, Estimate least, double theta, double[] ofCost, double[] ofTheta) {
    double cost = least.value();
    double[] inMix = new double[ofCost.length];
    double[] mixRatio = new double[ofCost.length];
    for (int k = 0; k < inMix.length; k++) {
      inMix[k] = theta * recorded * ofTheta[k] - cost * ofCost[k];
      mixRatio[k] = ofCost[k] - ofTheta[k];
    }
    double thetaError = propagation.standardError(ofTheta);
    double mix = cost / (theta * recorded);
    double all = cost / recorded;
    return new CostGap.Parts(
        propagation.estimate(
            recorded - theta * recorded, theta * recorded * thetaError, Scale.LINEAR),
        GapEstimates.onTheRoot(
            propagation.estimate(
                theta * recorded - cost, propagation.standardError(inMix), Scale.LINEAR)),
        new GapEstimate.Efficiency(
            propagation.estimate(theta, theta * thetaError, Scale.LOG),
            GapEstimates.atMostOne(
                propagation.estimate(mix, mix * propagation.standardError(mixRatio), Scale.LOG)),
            propagation.estimate(all, all * propagation.standardError(ofCost), Scale.LOG)));
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
