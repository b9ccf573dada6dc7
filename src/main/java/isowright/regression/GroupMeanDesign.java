package isowright.regression;

import java.util.List;

/**
 * The group means of a design, each times the square root of the size of its group, so that sums of
 * products over groups are those over rows with every row at the mean of its group. One row a
 * group.
 */
final class GroupMeanDesign implements Design {

  private final Design design;
  private final Groups groups;

  GroupMeanDesign(Design design) {
    this.design = design;
    this.groups = design.groups();
  }

  @Override
  public int rows() {
    return groups.count();
  }

  @Override
  public List<String> columns() {
    return design.columns();
  }

  @Override
  public Groups groups() {
    return Groups.ofSingleRows(groups.count());
  }

  @Override
  public void fill(int from, int to, double[][] into) {
    if (from == to) {
      return;
    }
    int first = groups.start(from);
    int last = groups.end(to - 1);
    double[][] rows = new double[design.columns().size() + 1][last - first];
    design.fill(first, last, rows);
    for (int k = 0; k < rows.length; k++) {
      for (int g = from; g < to; g++) {
        double sum = 0;
        for (int i = groups.start(g); i < groups.end(g); i++) {
          sum += rows[k][i - first];
        }
        into[k][g - from] = sum / Math.sqrt(groups.end(g) - groups.start(g));
      }
    }
  }
}
