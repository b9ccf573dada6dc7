package isowright.regression;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.Comparator;
import java.util.List;
import java.util.PriorityQueue;

/**
 * How far would the fit move without this row?
 *
 * <p>With leverage h (absorbed effects included), residual r, s² = SSR / (N − K − a), p = K + a
 * parameters and s₍ᵢ₎² = (SSR − r²/(1 − h)) / (N − p − 1), the variance without the row:
 *
 * <ul>
 *   <li>studentised residual, internally t = r / (s √(1 − h)), externally t* = r / (s₍ᵢ₎ √(1 − h));
 *   <li>Cook's distance D = t² h / ((1 − h) p). R. D. Cook 1977, Technometrics 19, 15–18;
 *   <li>DFFITS = t* √(h / (1 − h)), the move of the row's own fitted value in its standard errors;
 *   <li>DFBETAS of column k = ((X′X)⁻¹ x r / (1 − h))_k / (s₍ᵢ₎ √(X′X)⁻¹_kk), the move of a
 *       coefficient in its standard errors;
 *   <li>covariance ratio = (s₍ᵢ₎/s)^(2p) / (1 − h), the determinant of the classical covariance of
 *       all p parameters without the row over that with it.
 * </ul>
 *
 * The last three: D. A. Belsley, E. Kuh and R. E. Welsch, <i>Regression Diagnostics</i>, 1980,
 * section 2.1, with the cut-offs of {@link Cutoffs}. A row of leverage one is fitted exactly:
 * without it some coefficient could not be estimated at all, so its distance is infinite and the
 * rest undefined (NaN); where the leverage is that of the absorbed effects alone, the coefficients
 * do not depend on the row and its distance is 0. Tested in {@code InfluenceTest} by leaving rows
 * out, and against R.
 *
 * @param row the row, counted from 0
 * @param cooksDistance D
 * @param leverage h
 * @param studentisedResidual t
 * @param deletedResidual t*
 * @param dffits DFFITS
 * @param covarianceRatio the covariance ratio
 * @param dfbetas DFBETAS, shape K, zero where nothing was estimated; copied
 */
public record Influence(
    int row,
    double cooksDistance,
    double leverage,
    double studentisedResidual,
    double deletedResidual,
    double dffits,
    double covarianceRatio,
    double[] dfbetas) {

  private static final Comparator<Influence> LEAST_FIRST =
      Comparator.comparingDouble(Influence::cooksDistance)
          .thenComparing(Comparator.comparingInt(Influence::row).reversed());

  /** Copies the array. */
  public Influence {
    dfbetas = dfbetas.clone();
  }

  @Override
  public double[] dfbetas() {
    return dfbetas.clone();
  }

  /**
   * Sizes from which a measure calls for a look at the row: of Belsley, Kuh and Welsch 1980, pages
   * 17 (leverage 2p/N), 20 (studentised residual 2), 28 (DFFITS 2√(p/N), DFBETAS 2/√N) and 23
   * (covariance ratio 1 ± 3p/N). They do not call a row wrong: among well-behaved rows some one in
   * twenty passes each.
   */
  public record Cutoffs(
      double leverage,
      double deletedResidual,
      double dffits,
      double dfbetas,
      double covarianceRatio) {

    /** How many measures make a row one that several speak of. */
    public static final int SEVERAL = 3;

    /** The cut-offs for a fit. */
    public static Cutoffs of(LinearFit fit) {
      double share = (fit.rank() + fit.absorbed()) / (double) fit.rows();
      return new Cutoffs(2 * share, 2, 2 * Math.sqrt(share), 2 / Math.sqrt(fit.rows()), 3 * share);
    }

    /** How many of the five measures of a row lie beyond; DFBETAS count once, by the largest. */
    public int beyond(Influence one) {
      return beyond(one.leverage, one.deletedResidual, one.dffits, one.covarianceRatio)
          + (Math.abs(one.largestDfbetas()) > dfbetas ? 1 : 0);
    }

    private int beyond(double h, double deleted, double fits, double ratio) {
      return (h > leverage ? 1 : 0)
          + (Math.abs(deleted) > deletedResidual ? 1 : 0)
          + (Math.abs(fits) > dffits ? 1 : 0)
          + (Math.abs(ratio - 1) > covarianceRatio ? 1 : 0);
    }
  }

  /**
   * What a reading of all rows found.
   *
   * @param most the rows of largest Cook's distance, largest first
   * @param beyondSeveral how many rows lie beyond at least {@link Cutoffs#SEVERAL} cut-offs
   * @param worst those among them of largest Cook's distance, largest first
   */
  public record Survey(List<Influence> most, int beyondSeveral, List<Influence> worst) {
    /** Copies the lists. */
    public Survey {
      most = List.copyOf(most);
      worst = List.copyOf(worst);
    }
  }

  /** The column whose coefficient the row moves most, in standard errors. */
  public int largestColumn() {
    int largest = 0;
    for (int k = 1; k < dfbetas.length; k++) {
      if (Math.abs(dfbetas[k]) > Math.abs(dfbetas[largest])) {
        largest = k;
      }
    }
    return largest;
  }

  private double largestDfbetas() {
    return dfbetas.length == 0 ? 0 : dfbetas[largestColumn()];
  }

  /**
   * The rows of largest Cook's distance, largest first (ties in row order); empty where no degrees
   * of freedom are left.
   */
  public static List<Influence> most(Design design, LinearFit fit, int howMany) {
    return survey(design, fit, howMany).most();
  }

  /**
   * Reads the design once, in parallel, and keeps twice {@code howMany} rows a segment; finds
   * nothing where no degrees of freedom are left or the fit is exact.
   */
  public static Survey survey(Design design, LinearFit fit, int howMany) {
    if (howMany <= 0 || fit.residualDegreesOfFreedom() <= 0 || !(fit.ssr() > 0)) {
      return new Survey(List.of(), 0, List.of());
    }
    Blocks blocks = Blocks.of(design.groups());
    Gatherer all =
        blocks.gather(
            fit.columns().size() + 1,
            () -> new Gatherer(fit, howMany, blocks.longest()),
            (gatherer, from, to, buffer) -> gatherer.visit(design, from, to, buffer),
            Gatherer::add);
    return new Survey(sorted(all.most), all.beyondSeveral, sorted(all.worst));
  }

  private static List<Influence> sorted(PriorityQueue<Influence> queue) {
    List<Influence> sorted = new ArrayList<>(queue);
    sorted.sort(LEAST_FIRST.reversed());
    return List.copyOf(sorted);
  }

  private static final class Gatherer {
    private final PriorityQueue<Influence> most = new PriorityQueue<>(LEAST_FIRST);
    private final PriorityQueue<Influence> worst = new PriorityQueue<>(LEAST_FIRST);
    private final int howMany;
    private final LinearFit fit;
    private final double[] coefficients;
    private final double[][] factor;
    private final double[] lengths;
    private final int[] kept;
    private final double variance;
    private final int parameters;
    private final Cutoffs cutoffs;
    private final Residuals residuals;
    private final double[] leverage;
    private int beyondSeveral;

    Gatherer(LinearFit fit, int howMany, int longest) {
      this.howMany = howMany;
      this.fit = fit;
      this.coefficients = fit.coefficients();
      this.factor = fit.inverseFactor();
      this.lengths = new double[coefficients.length];
      for (int k = 0; k < lengths.length; k++) {
        lengths[k] = Math.sqrt(Matrices.dot(factor[k], factor[k]));
      }
      this.kept = fit.kept();
      this.variance = fit.residualVariance();
      this.parameters = fit.rank() + fit.absorbed();
      this.cutoffs = Cutoffs.of(fit);
      this.residuals = new Residuals(longest);
      this.leverage = new double[longest];
    }

    void visit(Design design, int from, int to, double[][] buffer) {
      design.fill(from, to, buffer);
      double[] r = residuals.of(buffer, to - from, coefficients);
      Leverage.rotate(buffer, to - from, factor, kept);
      Leverage.of(buffer, from, to - from, kept, design, leverage);
      for (int i = 0; i < to - from; i++) {
        if (1 - leverage[i] > Covariance.LEVERAGE_ONE) {
          ordinary(from + i, leverage[i], r[i], buffer, i);
        } else {
          take(exact(design, from + i, leverage[i]));
        }
      }
    }

    private void ordinary(int row, double h, double r, double[][] rotated, int i) {
      double left = 1 - h;
      double distance = r * r / (variance * left) * h / (left * parameters);
      int freedom = fit.residualDegreesOfFreedom() - 1;
      double without = freedom > 0 ? Math.max(0, fit.ssr() - r * r / left) / freedom : Double.NaN;
      double deleted = r / Math.sqrt(without * left);
      double dffits = deleted * Math.sqrt(h / left);
      double ratio = Math.pow(without / variance, parameters) / left;
      boolean several = cutoffs.beyond(h, deleted, dffits, ratio) >= Cutoffs.SEVERAL - 1;
      if (!several && most.size() == howMany && distance < most.element().cooksDistance) {
        return; // the usual case, in which nothing need be made for the row
      }
      double[] dfbetas = new double[coefficients.length];
      double step = r / (left * Math.sqrt(without));
      for (int p = 0; p < kept.length; p++) {
        double sum = 0;
        for (int q = p; q < kept.length; q++) {
          sum += factor[kept[p]][kept[q]] * rotated[kept[q]][i];
        }
        dfbetas[kept[p]] = sum * step / lengths[kept[p]];
      }
      double t = r / Math.sqrt(variance * left);
      take(new Influence(row, distance, h, t, deleted, dffits, ratio, dfbetas));
    }

    private void take(Influence one) {
      offer(most, one);
      if (cutoffs.beyond(one) >= Cutoffs.SEVERAL) {
        beyondSeveral++;
        offer(worst, one);
      }
    }

    private Influence exact(Design design, int row, double h) {
      boolean absorbedAlone =
          design.absorbed() > 0 && 1 - design.absorbedLeverage(row) <= Covariance.LEVERAGE_ONE;
      double[] unknown = new double[coefficients.length];
      Arrays.fill(unknown, absorbedAlone ? 0 : Double.NaN);
      return new Influence(
          row,
          absorbedAlone ? 0 : Double.POSITIVE_INFINITY,
          h,
          Double.NaN,
          Double.NaN,
          Double.NaN,
          Double.NaN,
          unknown);
    }

    private void offer(PriorityQueue<Influence> queue, Influence one) {
      if (queue.size() < howMany) {
        queue.add(one);
      } else if (LEAST_FIRST.compare(one, queue.element()) > 0) {
        queue.remove();
        queue.add(one);
      }
    }

    void add(Gatherer other) {
      other.most.forEach(one -> offer(most, one));
      other.worst.forEach(one -> offer(worst, one));
      beyondSeveral += other.beyondSeveral;
    }
  }
}
