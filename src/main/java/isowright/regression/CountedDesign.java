package isowright.regression;

import java.util.List;

/**
 * A design in which each group stands as often as it is counted: least squares on it is least
 * squares on so many copies of the groups, each with effects of its own.
 *
 * <p>Rows are multiplied by the square root of their group's count, so no row is copied; the number
 * of rows stays that of the design. Use it on a design whose groups do not depend on one another
 * (plain rows, deviations from group means). Tested in {@code CountedDesignTest}.
 */
public final class CountedDesign implements Design {

  private final Design design;
  private final double[] roots;

  private CountedDesign(Design design, double[] roots) {
    this.design = design;
    this.roots = roots;
  }

  /**
   * Counts the groups of a design.
   *
   * @param counts shape G, not negative
   */
  public static CountedDesign of(Design design, int[] counts) {
    if (counts.length != design.groups().count()) {
      throw new IllegalArgumentException(
          counts.length + " counts for " + design.groups().count() + " groups");
    }
    double[] roots = new double[counts.length];
    for (int g = 0; g < roots.length; g++) {
      roots[g] = Math.sqrt(counts[g]);
    }
    return new CountedDesign(design, roots);
  }

  @Override
  public int rows() {
    return design.rows();
  }

  @Override
  public List<String> columns() {
    return design.columns();
  }

  @Override
  public Groups groups() {
    return design.groups();
  }

  @Override
  public void fill(int from, int to, double[][] into) {
    design.fill(from, to, into);
    scale(from, to, into);
  }

  @Override
  public void fill(int from, int to, double[][] into, double[] squares) {
    double[] before = new double[squares.length];
    design.fill(from, to, into, before);
    double most = scale(from, to, into);
    // At least the size of what was there before anything was removed, and that is all it is for.
    for (int k = 0; k < squares.length; k++) {
      squares[k] += most * most * before[k];
    }
  }

  /** Multiplies the rows; the largest root among them. */
  private double scale(int from, int to, double[][] into) {
    Groups groups = design.groups();
    double most = 0;
    for (int g = groups.of(from); g < groups.count() && groups.start(g) < to; g++) {
      double root = roots[g];
      most = Math.max(most, root);
      for (int k = 0; root != 1 && k <= design.columns().size(); k++) {
        for (int i = groups.start(g) - from; i < groups.end(g) - from; i++) {
          into[k][i] *= root;
        }
      }
    }
    return most;
  }

  @Override
  public int absorbed() {
    return design.absorbed();
  }

  @Override
  public double absorbedLeverage(int row) {
    return design.absorbedLeverage(row);
  }
}
