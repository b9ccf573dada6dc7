package isowright.regression;

import java.util.ArrayList;
import java.util.List;
import java.util.SplittableRandom;

/** Random regressions for tests, the same for the same seed. */
final class RandomDesigns {

  private RandomDesigns() {}

  /** Groups of 1 to {@code most} rows. */
  static Groups groups(SplittableRandom random, int rows, int most) {
    List<Integer> starts = new ArrayList<>();
    for (int at = 0; at < rows; at += 1 + random.nextInt(most)) {
      starts.add(at);
    }
    return Groups.startingAt(rows, starts.stream().mapToInt(Integer::intValue).toArray());
  }

  /** A constant and {@code columns − 1} random regressors that differ between groups. */
  static ArrayDesign grouped(SplittableRandom random, int rows, int columns, int mostInGroup) {
    Groups groups = groups(random, rows, mostInGroup);
    double[][] x = new double[columns][rows];
    double[] y = new double[rows];
    List<String> names = new ArrayList<>();
    for (int k = 0; k < columns; k++) {
      names.add(k == 0 ? "constant" : "x" + k);
    }
    for (int g = 0; g < groups.count(); g++) {
      double effect = 3 * random.nextDouble(-1, 1);
      for (int i = groups.start(g); i < groups.end(g); i++) {
        x[0][i] = 1;
        y[i] = effect + (1 + random.nextDouble()) * random.nextDouble(-1, 1);
        for (int k = 1; k < columns; k++) {
          x[k][i] = 5 * k + effect + random.nextDouble(-2, 2);
          y[i] += 0.3 * k * x[k][i];
        }
      }
    }
    return ArrayDesign.of(names, x, y, groups);
  }

  /** All rows of a design, K + 1 columns. */
  static double[][] rows(Design design) {
    double[][] all = new double[design.columns().size() + 1][design.rows()];
    design.fill(0, design.rows(), all);
    return all;
  }

  /** The same rows under other groups or none. */
  static ArrayDesign design(List<String> names, double[][] all, Groups groups) {
    int columns = names.size();
    double[][] x = new double[columns][];
    System.arraycopy(all, 0, x, 0, columns);
    return ArrayDesign.of(names, x, all[columns], groups);
  }
}
