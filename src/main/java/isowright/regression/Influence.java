package isowright.regression;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.PriorityQueue;

/**
 * How far would the fit move without this row?
 *
 * <p>With leverage h (absorbed effects included), residual r, s² = SSR / (N − K − a) and p = K + a
 * parameters: internally studentised residual t = r / (s √(1 − h)), Cook's distance D = t² h / ((1
 * − h) p). Source: R. D. Cook 1977, Technometrics 19, 15–18. A row of leverage one is fitted
 * exactly: without it some coefficient could not be estimated at all, so its distance is infinite
 * and t undefined (NaN); where the leverage is that of the absorbed effects alone, the coefficients
 * do not depend on the row and its distance is 0. Tested in {@code InfluenceTest} by leaving rows
 * out.
 *
 * @param row the row, counted from 0
 * @param cooksDistance D
 * @param leverage h
 * @param studentisedResidual t
 */
public record Influence(
    int row, double cooksDistance, double leverage, double studentisedResidual) {

  private static final Comparator<Influence> LEAST_FIRST =
      Comparator.comparingDouble(Influence::cooksDistance)
          .thenComparing(Comparator.comparingInt(Influence::row).reversed());

  /**
   * The rows of largest Cook's distance, largest first (ties in row order); empty where no degrees
   * of freedom are left. Reads the design once, in parallel, and keeps {@code howMany} rows a
   * segment.
   */
  public static List<Influence> most(Design design, LinearFit fit, int howMany) {
    if (howMany <= 0 || fit.residualDegreesOfFreedom() <= 0 || !(fit.ssr() > 0)) {
      return List.of();
    }
    Blocks blocks = Blocks.of(design.groups());
    Gatherer all =
        blocks.gather(
            fit.columns().size() + 1,
            () -> new Gatherer(fit, howMany, blocks.longest()),
            (gatherer, from, to, buffer) -> gatherer.visit(design, from, to, buffer),
            Gatherer::add);
    List<Influence> sorted = new ArrayList<>(all.queue);
    sorted.sort(LEAST_FIRST.reversed());
    return List.copyOf(sorted);
  }

  private static final class Gatherer {
    private final PriorityQueue<Influence> queue = new PriorityQueue<>(LEAST_FIRST);
    private final int howMany;
    private final double[] coefficients;
    private final double[][] factor;
    private final int[] kept;
    private final double variance;
    private final int parameters;
    private final Residuals residuals;
    private final double[] leverage;

    Gatherer(LinearFit fit, int howMany, int longest) {
      this.howMany = howMany;
      this.coefficients = fit.coefficients();
      this.factor = fit.inverseFactor();
      this.kept = fit.kept();
      this.variance = fit.residualVariance();
      this.parameters = fit.rank() + fit.absorbed();
      this.residuals = new Residuals(longest);
      this.leverage = new double[longest];
    }

    void visit(Design design, int from, int to, double[][] buffer) {
      design.fill(from, to, buffer);
      double[] r = residuals.of(buffer, to - from, coefficients);
      Leverage.rotate(buffer, to - from, factor, kept);
      Leverage.of(buffer, from, to - from, kept, design, leverage);
      boolean absorbs = design.absorbed() > 0;
      for (int i = 0; i < to - from; i++) {
        double h = leverage[i];
        double left = 1 - h;
        if (left > Covariance.LEVERAGE_ONE) {
          double square = r[i] * r[i] / (variance * left);
          offer(from + i, square * h / (left * parameters), h, r[i] / Math.sqrt(variance * left));
        } else {
          boolean absorbedAlone =
              absorbs && 1 - design.absorbedLeverage(from + i) <= Covariance.LEVERAGE_ONE;
          offer(from + i, absorbedAlone ? 0 : Double.POSITIVE_INFINITY, h, Double.NaN);
        }
      }
    }

    private void offer(int row, double distance, double h, double t) {
      if (queue.size() < howMany) {
        queue.add(new Influence(row, distance, h, t));
        return;
      }
      Influence least = queue.element();
      if (distance > least.cooksDistance || (distance == least.cooksDistance && row < least.row)) {
        queue.remove();
        queue.add(new Influence(row, distance, h, t));
      }
    }

    void add(Gatherer other) {
      for (Influence one : other.queue) {
        offer(one.row, one.cooksDistance, one.leverage, one.studentisedResidual);
      }
    }
  }
}
