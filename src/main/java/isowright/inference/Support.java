package isowright.inference;

import isowright.records.Column;
import isowright.records.Panel;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import org.apache.commons.math3.linear.Array2DRowRealMatrix;
import org.apache.commons.math3.linear.RealMatrix;
import org.apache.commons.math3.linear.SingularValueDecomposition;

/**
 * Where the records lie, so that a mix outside them is called a guess.
 *
 * <p>A mix is inside when each input lies between its least and greatest record and, in logs, its
 * distance from the mean of the records, d² = (z − z̄)′ S^-1 (z − z̄) with S the covariance of the
 * logs, is no larger than that of the farthest record: the leverage of a record in a regression on
 * logs is a linear function of d². The ranges catch a single input gone too far, the distance an
 * unseen combination of usual amounts.
 *
 * <p>Source: leverage and its reading as hidden extrapolation: Cook, R. D. and Weisberg, S. (1982),
 * <i>Residuals and Influence in Regression</i>, section 2.2. Tested in {@code SupportTest}.
 */
public final class Support {

  private final List<String> names;
  private final double[] mean;
  private final double[] least;
  private final double[] most;
  private final double[][] inverse;
  private final double farthest;

  private Support(
      List<String> names,
      double[] mean,
      double[] least,
      double[] most,
      double[][] inverse,
      double farthest) {
    this.names = List.copyOf(names);
    this.mean = mean;
    this.least = least;
    this.most = most;
    this.inverse = inverse;
    this.farthest = farthest;
  }

  /** The support of a panel's inputs. */
  public static Support of(Panel panel) {
    List<Column> logs = panel.logQuantities();
    return of(panel.inputs(), panel.rows(), (i, r) -> logs.get(i).get(r));
  }

  /**
   * What a support consists of, all in logs.
   *
   * @param mean z̄
   * @param least by input
   * @param most by input
   * @param inverse S^-1
   * @param farthest the greatest d² of a record
   */
  public record Parts(
      double[] mean, double[] least, double[] most, double[][] inverse, double farthest) {}

  /** The support of these parts. */
  public static Support of(List<String> names, Parts parts) {
    return new Support(
        names, parts.mean(), parts.least(), parts.most(), parts.inverse(), parts.farthest());
  }

  /** What this support consists of. */
  public Parts parts() {
    return new Parts(mean, least, most, inverse, farthest);
  }

  /** A logged quantity of a row. */
  @FunctionalInterface
  public interface Logs {
    /** The log of quantity i in a row. */
    double get(int i, int row);
  }

  /** The support of any quantities, in logs. */
  public static Support of(List<String> names, int rows, Logs logs) {
    int n = names.size();
    double[] mean = new double[n];
    double[] least = new double[n];
    double[] most = new double[n];
    for (int i = 0; i < n; i++) {
      least[i] = Double.POSITIVE_INFINITY;
      most[i] = Double.NEGATIVE_INFINITY;
      for (int r = 0; r < rows; r++) {
        double z = logs.get(i, r);
        mean[i] += z / rows;
        least[i] = Math.min(least[i], z);
        most[i] = Math.max(most[i], z);
      }
    }
    double[][] spread = new double[n][n];
    for (int r = 0; r < rows; r++) {
      for (int i = 0; i < n; i++) {
        for (int j = 0; j <= i; j++) {
          spread[i][j] += (logs.get(i, r) - mean[i]) * (logs.get(j, r) - mean[j]) / rows;
          spread[j][i] = spread[i][j];
        }
      }
    }
    RealMatrix inverse =
        new SingularValueDecomposition(new Array2DRowRealMatrix(spread)).getSolver().getInverse();
    Support support = new Support(names, mean, least, most, inverse.getData(), 0);
    double farthest = 0;
    double[] z = new double[n];
    for (int r = 0; r < rows; r++) {
      for (int i = 0; i < n; i++) {
        z[i] = logs.get(i, r);
      }
      farthest = Math.max(farthest, support.distance(z));
    }
    return new Support(names, mean, least, most, inverse.getData(), farthest);
  }

  /** Whether a mix (in its own units) lies inside the records. */
  public boolean inside(double[] mix) {
    return reasons(mix).isEmpty();
  }

  /** Why a mix lies outside the records, in words; empty where it lies inside. */
  public List<String> reasons(double[] mix) {
    List<String> reasons = new ArrayList<>();
    double[] z = new double[mix.length];
    for (int i = 0; i < mix.length; i++) {
      z[i] = Math.log(mix[i]);
      boolean below = z[i] < least[i] - TINY;
      boolean above = z[i] > most[i] + TINY;
      if (below || above) {
        reasons.add(
            String.format(
                Locale.ROOT,
                "%s of %,.4g lies %s the records (%,.4g to %,.4g)",
                names.get(i),
                mix[i],
                below ? "below" : "above",
                Math.exp(least[i]),
                Math.exp(most[i])));
      }
    }
    if (reasons.isEmpty() && distance(z) > farthest * (1 + TINY)) {
      reasons.add(
          "each input lies within its own range, but no record comes near this combination of"
              + " them");
    }
    return reasons;
  }

  /** Rounding in logs that must not call a record an outsider. */
  private static final double TINY = 1e-9;

  private double distance(double[] z) {
    double sum = 0;
    for (int i = 0; i < z.length; i++) {
      for (int j = 0; j < z.length; j++) {
        sum += (z[i] - mean[i]) * inverse[i][j] * (z[j] - mean[j]);
      }
    }
    return sum;
  }
}
