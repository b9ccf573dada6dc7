package isowright.estimation;

import isowright.regression.Design;
import isowright.regression.Effects;
import isowright.regression.Groups;
import isowright.regression.NonlinearModel;
import isowright.technology.NonlinearForm;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

/**
 * The regression of a nonlinear form: parameters are a constant (if any), the inner parameters, the
 * curvatures that are not held, the circumstances.
 *
 * <p>A single curvature is searched as ρ itself, and may step out of the economic region, which is
 * how its edge is seen. Of several, each is searched as ln σ, so that none leaves the region while
 * another is walked; far out it stays at σ = {@link #FARTHEST} or its inverse.
 */
final class ProfiledModel implements NonlinearModel {

  /** A σ beyond which isoquants are straight, and below whose inverse they are corners. */
  private static final double FARTHEST = 1e4;

  private final ProfiledProblem problem;
  private final NonlinearForm form;
  private final boolean constant;
  private final double[] held;
  private final boolean inLogs;
  private final int inner;
  private final List<String> parameters;

  /**
   * @param held shape K, NaN where free
   */
  ProfiledModel(ProfiledProblem problem, double[] held) {
    this.problem = problem;
    this.form = problem.form();
    this.constant = !problem.within();
    this.held = held.clone();
    this.inLogs = held.length > 1;
    List<String> names = new ArrayList<>();
    if (constant) {
      names.add("constant");
    }
    names.addAll(form.innerNames(problem.inputs()));
    this.inner = form.innerNames(problem.inputs()).size();
    for (int k = 0; k < held.length; k++) {
      if (Double.isNaN(held[k])) {
        String name = form.curvatureNames(problem.inputs()).get(k);
        names.add(inLogs ? "ln(substitution of " + name + ")" : name);
      }
    }
    names.addAll(problem.circumstances().names());
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

  /** The curvatures ρ: those among all, and those that are held; shape K. */
  double[] curvatures(double[] all) {
    double[] curvatures = held.clone();
    int at = innerOffset() + inner;
    for (int k = 0; k < held.length; k++) {
      if (Double.isNaN(held[k])) {
        curvatures[k] = inLogs ? fromLog(all[at++]) : all[at++];
      }
    }
    return curvatures;
  }

  /** What the search moves for a curvature ρ. */
  double searched(double curvature) {
    return inLogs ? Math.log(form.substitution(curvature)) : curvature;
  }

  /** ∂ρ/∂(what the search moves). */
  double slope(double curvature) {
    return inLogs ? -(1 + curvature) : 1;
  }

  private double fromLog(double logSubstitution) {
    double most = Math.log(FARTHEST);
    return form.curvature(Math.exp(Math.min(Math.max(logSubstitution, -most), most)));
  }

  @Override
  public Design linearisedAt(double[] all) {
    Design raw = rawAt(all);
    return problem.within() ? Effects.within(raw) : raw;
  }

  /** The linearisation before plant means are removed. */
  Design rawAt(double[] all) {
    return new Linearised(all.clone());
  }

  private final class Linearised implements Design {

    private final double[] all;
    private final double[] curvatures;

    Linearised(double[] all) {
      this.all = all;
      this.curvatures = curvatures(all);
    }

    @Override
    public int rows() {
      return problem.rows().count();
    }

    @Override
    public List<String> columns() {
      return parameters;
    }

    @Override
    public Groups groups() {
      return problem.rows().groups();
    }

    @Override
    public void fill(int from, int to, double[][] into) {
      int size = to - from;
      if (constant) {
        Arrays.fill(into[0], 0, size, 1);
      }
      double[] value = new double[size];
      double[][] z = problem.rows().logInputs(from, to);
      form.evaluate(z, size, inner(all), curvatures, value, derivatives(into, size));
      int rest = innerOffset() + inner;
      for (int k = 0; k < held.length; k++) {
        if (Double.isNaN(held[k])) {
          rescale(into[rest++], size, slope(curvatures[k]));
        }
      }
      problem.circumstances().fill(from, to, z, into, rest);
      double[] residual = into[parameters.size()];
      problem.rows().logOutput(from, to, residual);
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

    /** The columns of the block into which the form writes its derivatives. */
    private double[][] derivatives(double[][] into, int size) {
      double[][] derivatives = new double[inner + held.length][];
      int at = innerOffset();
      for (int k = 0; k < derivatives.length; k++) {
        boolean kept = k < inner || Double.isNaN(held[k - inner]);
        derivatives[k] = kept ? into[at++] : new double[size];
      }
      return derivatives;
    }

    private void rescale(double[] column, int size, double by) {
      for (int r = 0; by != 1 && r < size; r++) {
        column[r] *= by;
      }
    }
  }
}
