package isowright.inference;

import isowright.estimation.Fit;
import isowright.regression.GroupProducts;
import isowright.regression.WildBootstrap;
import isowright.technology.LinearForm;
import java.util.Arrays;
import java.util.List;

/**
 * A test of a fit repeated by the wild cluster bootstrap, which does not rest on the law of a
 * statistic with many plants.
 *
 * @param name the name of the test, as of a {@link Verdict}
 * @param nullHypothesis the null in words
 * @param test the statistic and its p-value
 */
public record WildVerdict(String name, String nullHypothesis, WildBootstrap test) {

  /** With more plants than this the law of the statistic is not in doubt, and time is saved. */
  private static final int MOST_PLANTS = 10_000;

  /**
   * The tests that are linear in the parameters of a usable fit: constant returns, and Cobb-Douglas
   * within a richer form. None for forms that are searched for, and for estimators under which
   * plants do not stand for themselves.
   *
   * @param returnsToScale the degree of homogeneity under the null
   */
  public static List<WildVerdict> of(Fit fit, double returnsToScale, int draws, long seed) {
    List<Hypotheses.Null> nulls = Hypotheses.linear(fit, returnsToScale);
    if (!fit.plantsStandAlone()
        || !(fit.specification().form() instanceof LinearForm form)
        || nulls.isEmpty()
        || fit.numbers().design().groups().count() > MOST_PLANTS) {
      return List.of();
    }
    GroupProducts products = GroupProducts.of(fit.numbers().design(), fit.numbers().linear());
    double[][] reported = form.reported(fit.panel().inputs());
    double[] b = fit.numbers().linear().coefficients();
    return nulls.stream()
        .map(
            tested -> {
              double[][] rows = rows(tested.jacobian(), reported, b.length);
              double[] values = new double[rows.length];
              for (int i = 0; i < rows.length; i++) {
                values[i] = -tested.departure()[i];
                for (int k = 0; k < b.length; k++) {
                  values[i] += rows[i][k] * b[k];
                }
              }
              return new WildVerdict(
                  tested.name(),
                  tested.nullHypothesis(),
                  WildBootstrap.test(products, rows, values, draws, seed));
            })
        .toList();
  }

  /**
   * R over the columns of the regression: the Jacobian over reported parameters, carried to the
   * parameters that the form leaves free, without a constant that the regression does not have.
   *
   * @param reported the technology's parameters by the free ones, p × f
   * @param columns of the regression
   */
  private static double[][] rows(double[][] jacobian, double[][] reported, int columns) {
    int p = reported.length;
    int f = reported[0].length;
    double[][] rows = new double[jacobian.length][];
    for (int i = 0; i < rows.length; i++) {
      double[] free = new double[f + jacobian[i].length - p];
      for (int k = 0; k < f; k++) {
        for (int j = 0; j < p; j++) {
          free[k] += jacobian[i][j] * reported[j][k];
        }
      }
      System.arraycopy(jacobian[i], p, free, f, jacobian[i].length - p);
      rows[i] = Arrays.copyOfRange(free, free.length - columns, free.length);
    }
    return rows;
  }

  /** The verdict in words at the level that belongs to a confidence. */
  public String sentence(double confidence) {
    return Hypotheses.sentence(nullHypothesis, test.p(), Verdict.level(confidence));
  }
}
