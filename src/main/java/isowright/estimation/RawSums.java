package isowright.estimation;

import isowright.records.Panel;
import isowright.technology.LinearForm;
import java.util.Arrays;

/**
 * Sums of regressors and logged output of a form linear in its parameters, by plant and by period:
 * what the mean level over all rows but some becomes under other slopes, without reading a row.
 */
final class RawSums {

  private static final int BLOCK = 4096;

  private final double[][] byPlant;
  private final double[][] byPeriod;
  private final double[] total;

  private RawSums(double[][] byPlant, double[][] byPeriod, double[] total) {
    this.byPlant = byPlant;
    this.byPeriod = byPeriod;
    this.total = total;
  }

  /**
   * The sums of a linear fit over the columns of the form without restriction, whose coefficients
   * are the reported parameters; each row of them K slopes, the response, and the number of rows.
   */
  static RawSums of(Fit fit, LinearForm form) {
    Panel panel = fit.panel();
    LinearDesign raw =
        new LinearDesign(
            PanelRows.of(panel, fit.base()),
            form.unrestricted(),
            panel.inputs(),
            Circumstances.of(panel, fit.specification().time()),
            false);
    int size = raw.columns().size() + 1;
    double[][] byPlant = new double[panel.plants().size()][size + 1];
    double[][] byPeriod = new double[panel.periods().size()][size + 1];
    double[][] block = new double[size][BLOCK];
    for (int from = 0; from < panel.rows(); from += BLOCK) {
      int to = Math.min(panel.rows(), from + BLOCK);
      raw.fill(from, to, block);
      int plant = panel.plantOf(from);
      for (int row = from; row < to; row++) {
        plant += row >= panel.plantEnd(plant) ? 1 : 0;
        double[] own = byPlant[plant];
        double[] then = byPeriod[panel.rowPeriods().get(row)];
        for (int k = 0; k < size; k++) {
          own[k] += block[k][row - from];
          then[k] += block[k][row - from];
        }
        own[size]++;
        then[size]++;
      }
    }
    double[] total = new double[size + 1];
    for (double[] own : byPlant) {
      for (int k = 0; k <= size; k++) {
        total[k] += own[k];
      }
    }
    return new RawSums(byPlant, byPeriod, total);
  }

  /** The mean level of all rows but those of a plant. */
  double withoutPlant(double[] reported, int plant) {
    return level(reported, byPlant[plant]);
  }

  /** The mean level of all rows but those of a period. */
  double withoutPeriod(double[] reported, int period) {
    return level(reported, byPeriod[period]);
  }

  private double level(double[] reported, double[] out) {
    int size = total.length - 1;
    double sum = total[size - 1] - out[size - 1];
    double[] slopes = Arrays.copyOfRange(reported, 1, reported.length);
    for (int k = 0; k < slopes.length; k++) {
      sum -= slopes[k] * (total[k] - out[k]);
    }
    return sum / (total[size] - out[size]);
  }
}
