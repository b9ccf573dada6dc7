package isowright.regression;

import java.util.List;

/**
 * Group means of a design, one row a group; see {@link Effects#between}. Tested in {@code
 * GroupTransformationsTest}.
 */
final class BetweenGroups implements Design {

  /** Rows of the design read at once: a block of group means may stand for very many rows. */
  private static final int ROWS = 4096;

  private final Design design;
  private final boolean byRows;
  private final Groups groups;

  /**
   * @param byRows whether a row is multiplied by the root of the number of rows it stands for
   */
  BetweenGroups(Design design, boolean byRows) {
    this.design = design;
    this.byRows = byRows;
    this.groups = Groups.ofSingleRows(design.groups().count());
  }

  @Override
  public int rows() {
    return groups.rows();
  }

  @Override
  public List<String> columns() {
    return design.columns();
  }

  @Override
  public Groups groups() {
    return groups;
  }

  @Override
  public Design before() {
    return design;
  }

  @Override
  public Design likewise(Design other) {
    return new BetweenGroups(other, byRows);
  }

  @Override
  public void fill(int from, int to, double[][] into) {
    Groups of = design.groups();
    int columns = design.columns().size() + 1;
    double[][] block = new double[columns][0];
    int first = from;
    while (first < to) {
      int last = first + 1;
      int start = of.start(first);
      while (last < to && of.end(last) - start <= ROWS) {
        last++;
      }
      int rows = of.end(last - 1) - start;
      if (block[0].length < rows) {
        block = new double[columns][rows];
      }
      design.fill(start, start + rows, block);
      for (int g = first; g < last; g++) {
        int size = of.end(g) - of.start(g);
        double weight = byRows ? Math.sqrt(size) : 1;
        for (int k = 0; k < columns; k++) {
          into[k][g - from] = weight * mean(block[k], of.start(g) - start, size);
        }
      }
      first = last;
    }
  }

  /** The mean of a stretch; exact where all its values are equal. */
  static double mean(double[] values, int from, int size) {
    double level = values[from];
    double sum = 0;
    for (int i = from + 1; i < from + size; i++) {
      sum += values[i] - level;
    }
    return level + sum / size;
  }
}
