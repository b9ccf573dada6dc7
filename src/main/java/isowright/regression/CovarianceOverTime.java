package isowright.regression;

import java.util.Locale;
import java.util.OptionalInt;

/** The covariance estimators that know when each row was observed; see {@link Covariance}. */
final class CovarianceOverTime {

  private final Design design;
  private final LinearFit fit;
  private final Times times;

  private CovarianceOverTime(Design design, LinearFit fit, Times times) {
    this.design = design;
    this.fit = fit;
    this.times = times;
  }

  static Covariance estimate(Design design, LinearFit fit, Covariance.Kind kind, Times times) {
    if (times.rows() != design.rows()) {
      throw new IllegalArgumentException(
          "there are times of " + times.rows() + " rows, the design has " + design.rows());
    }
    CovarianceOverTime estimator = new CovarianceOverTime(design, fit, times);
    if (kind == Covariance.Kind.CLUSTERED_TWO_WAY) {
      return estimator.clusteredTwoWay();
    }
    return kind == Covariance.Kind.NEWEY_WEST ? estimator.neweyWest() : estimator.driscollKraay();
  }

  /** ⌊4 (T/100)^(2/9)⌋, and less than T. */
  static int lag(int times) {
    return Math.max(0, Math.min(times - 1, (int) Math.floor(4 * Math.pow(times / 100.0, 2 / 9.0))));
  }

  private Covariance clusteredTwoWay() {
    TimeMiddle middle = TimeMiddle.of(design, fit, times, 0);
    int groups = design.groups().count();
    int count = times.count();
    double common = Covariance.ratio(fit.rows() - 1.0, fit.rows() - fit.rank());
    double[][] sum =
        middle.bothWays(
            Covariance.ratio(groups, groups - 1.0),
            Covariance.ratio(count, count - 1.0),
            Covariance.ratio(middle.cells(), middle.cells() - 1.0));
    int negative = TimeMiddle.withoutNegativeParts(sum);
    int clusters = Math.min(groups, count);
    String words =
        String.format(
            Locale.ROOT,
            "Covariance clustered by group and by time: by group, plus by time, less by cells of"
                + " both, factors G/(G − 1) = %d/%d, %d/%d and %d/%d, in common (N − 1)/(N − K) ="
                + " %d/%d%s%s; %s (the smaller number of clusters less one).",
            groups,
            groups - 1,
            count,
            count - 1,
            middle.cells(),
            middle.cells() - 1,
            fit.rows() - 1,
            fit.rows() - fit.rank(),
            fit.absorbed() > 0 ? ", group effects not counted in K" : "",
            negative == 0
                ? ""
                : "; it was not positive semi-definite, and "
                    + negative
                    + (negative == 1 ? " negative eigenvalue was" : " negative eigenvalues were")
                    + " set to zero in the orthogonal basis of the columns",
            Covariance.freedom(clusters - 1));
    return covariance(
        Covariance.Kind.CLUSTERED_TWO_WAY,
        sum,
        common,
        clusters - 1,
        OptionalInt.of(clusters),
        words);
  }

  private Covariance neweyWest() {
    // A single series, one row a time, is one chain although each row is a group of its own.
    boolean series = times.count() == fit.rows() && design.groups().count() == fit.rows();
    int longest = series ? times.count() : longestGroup();
    int lag = lag(longest);
    TimeMiddle middle = TimeMiddle.of(design, fit, times, lag);
    double factor = Covariance.ratio(fit.rows(), fit.residualDegreesOfFreedom());
    String words =
        String.format(
            Locale.ROOT,
            "Newey-West covariance %s: weights 1 − l/(m + 1) up to lag m = %d, the whole part of"
                + " 4(T/100)^(2/9) with T = %d times%s; factor %s; %s.",
            series ? "of a single series" : "by group",
            lag,
            longest,
            series ? "" : " of the longest group",
            Covariance.residualFactor(fit),
            Covariance.freedom(fit.residualDegreesOfFreedom()));
    return covariance(
        Covariance.Kind.NEWEY_WEST,
        series ? middle.alongTimes() : middle.alongGroups(),
        factor,
        fit.residualDegreesOfFreedom(),
        OptionalInt.empty(),
        words);
  }

  private Covariance driscollKraay() {
    int count = times.count();
    int lag = lag(count);
    int freedom = fit.residualDegreesOfFreedom();
    double factor =
        Covariance.ratio(count, count - 1.0) * Covariance.ratio(fit.rows() - 1.0, freedom);
    String words =
        String.format(
            Locale.ROOT,
            "Driscoll-Kraay covariance (rows of all groups may move together): weights 1 − l/(m +"
                + " 1) up to lag m = %d, the whole part of 4(T/100)^(2/9) with T = %d times; factor"
                + " T/(T − 1) · (N − 1)/(N − K%s) = %d/%d · %d/%d = %.6g; %s.",
            lag,
            count,
            fit.absorbed() > 0 ? " − group effects" : "",
            count,
            count - 1,
            fit.rows() - 1,
            freedom,
            factor,
            Covariance.freedom(count - 1));
    return covariance(
        Covariance.Kind.DRISCOLL_KRAAY,
        TimeMiddle.of(design, fit, times, lag).alongTimes(),
        factor,
        count - 1,
        OptionalInt.of(count),
        words);
  }

  private Covariance covariance(
      Covariance.Kind kind,
      double[][] middle,
      double factor,
      int freedom,
      OptionalInt clusters,
      String words) {
    double[][] matrix = Matrices.sandwich(fit.inverseFactor(), middle);
    Covariance.scale(matrix, fit, factor);
    return new Covariance(kind, matrix, factor, freedom, clusters, words);
  }

  /** The most times at which one group was observed. */
  private int longestGroup() {
    Groups groups = design.groups();
    int most = 0;
    for (int g = 0; g < groups.count(); g++) {
      int count = 1;
      for (int row = groups.start(g) + 1; row < groups.end(g); row++) {
        count += times.of(row) != times.of(row - 1) ? 1 : 0;
      }
      most = Math.max(most, count);
    }
    return most;
  }
}
