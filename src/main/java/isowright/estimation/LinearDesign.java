package isowright.estimation;

import isowright.regression.Design;
import isowright.regression.Groups;
import isowright.technology.LinearForm;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

/**
 * The design of a form linear in its parameters: a constant (if any), the form, the circumstances.
 */
final class LinearDesign implements Design {

  private final PanelRows rows;
  private final LinearForm form;
  private final Circumstances circumstances;
  private final boolean constant;
  private final List<String> columns;
  private final int formColumns;

  LinearDesign(
      PanelRows rows,
      LinearForm form,
      List<String> inputs,
      Circumstances circumstances,
      boolean constant) {
    this.rows = rows;
    this.form = form;
    this.circumstances = circumstances;
    this.constant = constant;
    List<String> coefficientNames = form.coefficientNames(inputs);
    this.formColumns = coefficientNames.size();
    List<String> names = new ArrayList<>();
    if (constant) {
      names.add("constant");
    }
    names.addAll(coefficientNames);
    names.addAll(circumstances.names());
    this.columns = List.copyOf(names);
  }

  @Override
  public int rows() {
    return rows.count();
  }

  @Override
  public List<String> columns() {
    return columns;
  }

  @Override
  public Groups groups() {
    return rows.groups();
  }

  @Override
  public void fill(int from, int to, double[][] into) {
    int offset = 0;
    if (constant) {
      Arrays.fill(into[0], 0, to - from, 1);
      offset = 1;
    }
    double[][] z = rows.logInputs(from, to);
    form.regressors(z, to - from, into, offset);
    circumstances.fill(from, to, z, into, offset + formColumns);
    rows.logOutput(from, to, into[columns.size()]);
    form.subtractFixed(z, to - from, into[columns.size()]);
  }
}
