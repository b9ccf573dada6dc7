package isowright.estimation;

import isowright.regression.Design;
import isowright.regression.Effects;
import isowright.regression.Groups;
import isowright.regression.NonlinearModel;
import isowright.technology.ProfiledForm;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.OptionalDouble;

/**
 * The regression of a profiled form: parameters are a constant (if any), the inner parameters, the
 * curvature ρ (unless it is held), the circumstances.
 */
final class ProfiledModel implements NonlinearModel {

  private final PanelRows rows;
  private final ProfiledForm form;
  private final Circumstances circumstances;
  private final boolean constant;
  private final boolean within;
  private final OptionalDouble heldCurvature;
  private final int inner;
  private final List<String> parameters;

  ProfiledModel(
      PanelRows rows,
      ProfiledForm form,
      List<String> inputs,
      Circumstances circumstances,
      boolean within,
      OptionalDouble heldCurvature) {
    this.rows = rows;
    this.form = form;
    this.circumstances = circumstances;
    this.within = within;
    this.constant = !within;
    this.heldCurvature = heldCurvature;
    List<String> names = new ArrayList<>();
    if (constant) {
      names.add("constant");
    }
    names.addAll(form.innerNames(inputs));
    this.inner = form.innerNames(inputs).size();
    if (heldCurvature.isEmpty()) {
      names.add("rho");
    }
    names.addAll(circumstances.names());
    this.parameters = List.copyOf(names);
  }

  @Override
  public List<String> parameters() {
    return parameters;
  }

  /** The number of parameters before the inner ones. */
  int innerOffset() {
    return constant ? 1 : 0;
  }

  /** The inner parameters among all. */
  double[] inner(double[] all) {
    return Arrays.copyOfRange(all, innerOffset(), innerOffset() + inner);
  }

  /** The curvature among all, or the one that is held. */
  double curvature(double[] all) {
    return heldCurvature.orElseGet(() -> all[innerOffset() + inner]);
  }

  @Override
  public Design linearisedAt(double[] all) {
    Design raw = rawAt(all);
    return within ? Effects.within(raw) : raw;
  }

  /** The linearisation before plant means are removed. */
  Design rawAt(double[] all) {
    return new Linearised(all.clone());
  }

  private final class Linearised implements Design {

    private final double[] all;

    Linearised(double[] all) {
      this.all = all;
    }

    @Override
    public int rows() {
      return rows.count();
    }

    @Override
    public List<String> columns() {
      return parameters;
    }

    @Override
    public Groups groups() {
      return rows.groups();
    }

    @Override
    public void fill(int from, int to, double[][] into) {
      int size = to - from;
      int offset = innerOffset();
      if (constant) {
        Arrays.fill(into[0], 0, size, 1);
      }
      boolean free = heldCurvature.isEmpty();
      double[][] derivatives = new double[inner + 1][];
      for (int k = 0; k < inner; k++) {
        derivatives[k] = into[offset + k];
      }
      derivatives[inner] = free ? into[offset + inner] : new double[size];
      double[] value = new double[size];
      form.evaluate(rows.logInputs(from, to), size, inner(all), curvature(all), value, derivatives);
      int rest = offset + inner + (free ? 1 : 0);
      circumstances.fill(from, to, into, rest);
      double[] residual = into[parameters.size()];
      rows.logOutput(from, to, residual);
      double level = constant ? all[0] : 0;
      for (int r = 0; r < size; r++) {
        residual[r] -= level + value[r];
      }
      for (int k = rest; k < parameters.size(); k++) {
        double[] column = into[k];
        for (int r = 0; r < size; r++) {
          residual[r] -= all[k] * column[r];
        }
      }
    }
  }
}
