package isowright.estimation;

import isowright.records.Panel;
import isowright.technology.Technology;
import java.util.Arrays;
import java.util.function.IntPredicate;
import java.util.stream.IntStream;

/**
 * Plants' levels under any reported parameters, row by row: the mean of ln Q less what technology
 * (without its constant) and circumstances explain. For fits by least squares, pooled or within
 * plants.
 */
final class RowLevels {

  private final Panel panel;
  private final Technology first;
  private final Circumstances circumstances;
  private final PanelRows rows;

  RowLevels(Fit fit) {
    this.panel = fit.panel();
    this.rows = PanelRows.of(panel, fit.base());
    this.first = fit.numbers().technology();
    this.circumstances = Circumstances.of(panel, fit.specification().time());
  }

  /** The level of each plant over the rows kept; NaN where it has none. Shape as the plants. */
  double[] ofPlants(double[] reported, IntPredicate keep) {
    return IntStream.range(0, panel.plants().size())
        .parallel()
        .mapToDouble(
            p -> {
              Sum sum = sum(reported, panel.plantStart(p), panel.plantEnd(p), keep);
              return sum.total / sum.rows;
            })
        .toArray();
  }

  /** The level over all rows kept, each row counting once. */
  double ofAll(double[] reported, IntPredicate keep) {
    double total = 0;
    long rows = 0;
    for (int p = 0; p < panel.plants().size(); p++) {
      Sum sum = sum(reported, panel.plantStart(p), panel.plantEnd(p), keep);
      total += sum.total;
      rows += sum.rows;
    }
    return total / rows;
  }

  /** The level of one plant over the rows kept. */
  double ofPlant(double[] reported, int plant, IntPredicate keep) {
    Sum sum = sum(reported, panel.plantStart(plant), panel.plantEnd(plant), keep);
    return sum.total / sum.rows;
  }

  /** Σ ω_p c_p over the plants that have a weight. */
  double weighted(double[] reported, double[] weights) {
    double total = 0;
    for (int p = 0; p < weights.length; p++) {
      if (weights[p] != 0) {
        total += weights[p] * ofPlant(reported, p, row -> true);
      }
    }
    return total;
  }

  /** A sum over rows and how many there were. */
  private record Sum(double total, int rows) {}

  private Sum sum(double[] reported, int from, int to, IntPredicate keep) {
    double[] levels = ofRows(reported, from, to);
    double total = 0;
    int kept = 0;
    for (int row = from; row < to; row++) {
      if (keep.test(row)) {
        total += levels[row - from];
        kept++;
      }
    }
    return new Sum(total, kept);
  }

  /** ln Q less what technology (without its constant) and circumstances explain, row by row. */
  double[] ofRows(double[] reported, int from, int to) {
    int p = first.parameters().length;
    Technology technology = first.withParameters(Arrays.copyOf(reported, p));
    double[][] columns = new double[circumstances.count()][to - from];
    circumstances.fill(from, to, rows.logInputs(from, to), columns, 0);
    double[] logs = new double[panel.logQuantities().size()];
    double[] levels = new double[to - from];
    for (int row = from; row < to; row++) {
      for (int i = 0; i < logs.length; i++) {
        logs[i] = rows.logQuantity(i, row);
      }
      double explained = technology.logOutput(logs) - reported[0];
      for (int c = 0; c < columns.length; c++) {
        explained += reported[p + c] * columns[c][row - from];
      }
      levels[row - from] = panel.logOutput().get(row) - explained;
    }
    return levels;
  }
}
