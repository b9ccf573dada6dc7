package isowright.regression;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

/** A design with group means of some columns beside it; see {@link Effects#withGroupMeans}. */
final class WithGroupMeans implements Design {

  private final Design design;
  private final int[] which;
  private final List<String> columns;

  WithGroupMeans(Design design, List<String> which, String prefix) {
    this.design = design;
    this.which = which.stream().mapToInt(design.columns()::indexOf).toArray();
    List<String> names = new ArrayList<>(design.columns());
    for (int m = 0; m < this.which.length; m++) {
      if (this.which[m] < 0) {
        throw new IllegalArgumentException(
            "no column \"" + which.get(m) + "\" among " + design.columns());
      }
      names.add(prefix + which.get(m));
    }
    this.columns = List.copyOf(names);
  }

  @Override
  public int rows() {
    return design.rows();
  }

  @Override
  public List<String> columns() {
    return columns;
  }

  @Override
  public Groups groups() {
    return design.groups();
  }

  @Override
  public void fill(int from, int to, double[][] into) {
    int own = design.columns().size();
    double[][] block = Arrays.copyOf(into, own + 1);
    block[own] = into[columns.size()];
    design.fill(from, to, block);
    Groups groups = design.groups();
    int end;
    for (int start = from, g = from < to ? groups.of(from) : 0; start < to; start = end, g++) {
      end = groups.end(g);
      for (int m = 0; m < which.length; m++) {
        double mean = BetweenGroups.mean(into[which[m]], start - from, end - start);
        Arrays.fill(into[own + m], start - from, end - from, mean);
      }
    }
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
