package isowright.estimation;

import isowright.cost.TranslogCost.Term;
import isowright.regression.Design;
import isowright.regression.Groups;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

/**
 * The columns of cost and share equations: one, the scaled arguments, second-order products,
 * controls, then what is explained, shares and (last) ln C, or the last share where costs are not
 * known. Computed as they are read.
 */
final class CostDesign implements Design {

  private final CostData data;
  private final List<Term> products;
  private final double[] logBase;
  private final List<String> columns;
  private final int firstProduct;
  private final int firstControl;
  private final int firstShare;

  CostDesign(CostData data, List<Term> terms) {
    this.data = data;
    this.products = terms.stream().filter(Term::secondOrder).toList();
    double[] base = data.arguments().base();
    this.logBase = new double[data.arguments().size()];
    for (int k = 0; k < base.length; k++) {
      logBase[k] = Math.log(base[k]);
    }
    List<String> names = new ArrayList<>(List.of("one"));
    names.addAll(data.arguments().names());
    this.firstProduct = names.size();
    List<String> all = data.arguments().names();
    products.forEach(term -> names.add(all.get(term.first()) + "*" + all.get(term.second())));
    this.firstControl = names.size();
    names.addAll(data.controlNames());
    this.firstShare = names.size();
    if (data.shares().length > 0) {
      data.arguments().inputs().forEach(input -> names.add("share of " + input));
    }
    if (data.logCost().length > 0) {
      names.add("cost");
    }
    this.columns = List.copyOf(names.subList(0, names.size() - 1));
  }

  /** Columns in all, with the last. */
  int size() {
    return columns.size() + 1;
  }

  /** The column of argument k. */
  int argument(int k) {
    return 1 + k;
  }

  /** The column by which a term enters the cost equation. */
  int column(Term term) {
    if (term.constant()) {
      return 0;
    }
    return term.secondOrder() ? firstProduct + products.indexOf(term) : argument(term.first());
  }

  /** The column of control c. */
  int control(int c) {
    return firstControl + c;
  }

  /** The column of the share of input i. */
  int share(int i) {
    return firstShare + i;
  }

  /** The column of ln C, the last. */
  int cost() {
    return columns.size();
  }

  @Override
  public int rows() {
    return data.rows();
  }

  @Override
  public List<String> columns() {
    return columns;
  }

  @Override
  public Groups groups() {
    return data.groups();
  }

  @Override
  public void fill(int from, int to, double[][] into) {
    int rows = to - from;
    Arrays.fill(into[0], 0, rows, 1);
    for (int k = 0; k < logBase.length; k++) {
      double[] column = data.points()[k];
      for (int r = 0; r < rows; r++) {
        into[1 + k][r] = column[from + r] - logBase[k];
      }
    }
    for (int p = 0; p < products.size(); p++) {
      double[] first = into[argument(products.get(p).first())];
      double[] second = into[argument(products.get(p).second())];
      double factor = products.get(p).first() == products.get(p).second() ? 0.5 : 1;
      for (int r = 0; r < rows; r++) {
        into[firstProduct + p][r] = factor * first[r] * second[r];
      }
    }
    for (int c = 0; c < data.controls().length; c++) {
      System.arraycopy(data.controls()[c], from, into[control(c)], 0, rows);
    }
    for (int i = 0; i < data.shares().length; i++) {
      System.arraycopy(data.shares()[i], from, into[share(i)], 0, rows);
    }
    if (data.logCost().length > 0) {
      System.arraycopy(data.logCost(), from, into[cost()], 0, rows);
    }
  }
}
