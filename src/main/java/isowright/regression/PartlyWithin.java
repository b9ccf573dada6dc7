package isowright.regression;

import java.util.List;
import java.util.Locale;

/** A design less shares of its group means; see {@link Effects#partlyWithin}. */
final class PartlyWithin implements Design {

  private final Design design;
  private final double[] shares;

  PartlyWithin(Design design, double[] shares) {
    this.design = design;
    this.shares = shares.clone();
    if (shares.length != design.groups().count()) {
      throw new IllegalArgumentException(
          shares.length + " shares for " + design.groups().count() + " groups");
    }
    for (int g = 0; g < shares.length; g++) {
      if (!(shares[g] >= 0 && shares[g] <= 1)) {
        throw new IllegalArgumentException(
            String.format(
                Locale.ROOT, "the share of group %d is %s, not from 0 to 1", g, shares[g]));
      }
    }
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
    remove(from, to, into);
  }

  @Override
  public void fill(int from, int to, double[][] into, double[] squares) {
    design.fill(from, to, into, squares);
    remove(from, to, into);
  }

  private void remove(int from, int to, double[][] into) {
    Groups groups = design.groups();
    int columns = design.columns().size() + 1;
    int end;
    for (int start = from, g = from < to ? groups.of(from) : 0; start < to; start = end, g++) {
      end = groups.end(g);
      if (shares[g] == 0) {
        continue;
      }
      for (int k = 0; k < columns; k++) {
        double[] values = into[k];
        double part = shares[g] * BetweenGroups.mean(values, start - from, end - start);
        for (int i = start - from; i < end - from; i++) {
          values[i] -= part;
        }
      }
    }
  }

  @Override
  public Design before() {
    return design.before();
  }

  @Override
  public Design likewise(Design other) {
    return new PartlyWithin(design.likewise(other), shares);
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
