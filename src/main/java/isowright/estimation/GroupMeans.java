package isowright.estimation;

import isowright.regression.Design;
import isowright.regression.Groups;

/**
 * Means over the groups of a design: of the response less what given coefficients explain, and, for
 * any weighting of the groups, of the regressors.
 */
final class GroupMeans {

  private static final int BLOCK = 4096;

  private final Design design;
  private final double[] means;

  private GroupMeans(Design design, double[] means) {
    this.design = design;
    this.means = means;
  }

  /**
   * Means of response − Σ_k coefficient_k × regressor_k.
   *
   * @param coefficients shape K
   */
  static GroupMeans of(Design design, double[] coefficients) {
    double[] means = new double[design.groups().count()];
    eachGroup(
        design,
        (g, block, at, size) -> {
          double[] response = block[coefficients.length];
          double sum = 0;
          for (int r = at; r < at + size; r++) {
            double explained = 0;
            for (int k = 0; k < coefficients.length; k++) {
              explained += coefficients[k] * block[k][r];
            }
            sum += response[r] - explained;
          }
          means[g] = sum / size;
        });
    return new GroupMeans(design, means);
  }

  /** The mean of group g. */
  double get(int g) {
    return means[g];
  }

  /** The number of groups. */
  int count() {
    return means.length;
  }

  /** The number of rows of group g. */
  int size(int g) {
    return design.groups().end(g) - design.groups().start(g);
  }

  /** Weights of the groups by their rows; shape G, summing to one. */
  double[] byRows() {
    double[] weights = new double[means.length];
    for (int g = 0; g < weights.length; g++) {
      weights[g] = size(g) / (double) design.rows();
    }
    return weights;
  }

  /**
   * Σ_g weight_g² shrinkage_g / rows of g: with shrinkages of one, the variance of the weighted
   * mean of independent unit-variance rows.
   */
  double unitVariance(double[] weights, double[] shrinkage) {
    double sum = 0;
    for (int g = 0; g < means.length; g++) {
      sum += weights[g] * weights[g] * shrinkage[g] / size(g);
    }
    return sum;
  }

  /** The weighted means of the regressors; shape K. */
  double[] regressors(double[] weights) {
    int columns = design.columns().size();
    double[] sums = new double[columns];
    eachGroup(
        design,
        (g, block, at, size) -> {
          if (weights[g] == 0) {
            return;
          }
          for (int k = 0; k < columns; k++) {
            double sum = 0;
            for (int r = at; r < at + size; r++) {
              sum += block[k][r];
            }
            sums[k] += weights[g] * sum / size;
          }
        });
    return sums;
  }

  private interface Visitor {
    void visit(int group, double[][] block, int at, int size);
  }

  private static void eachGroup(Design design, Visitor visitor) {
    Groups groups = design.groups();
    int columns = design.columns().size() + 1;
    double[][] block = new double[columns][Math.min(BLOCK, design.rows())];
    int first = 0;
    while (first < groups.count()) {
      int from = groups.start(first);
      int last = first;
      while (last + 1 < groups.count() && groups.end(last + 1) - from <= BLOCK) {
        last++;
      }
      int to = groups.end(last);
      if (to - from > block[0].length) {
        block = new double[columns][to - from];
      }
      design.fill(from, to, block);
      for (int g = first; g <= last; g++) {
        visitor.visit(g, block, groups.start(g) - from, groups.end(g) - groups.start(g));
      }
      first = last + 1;
    }
  }
}
