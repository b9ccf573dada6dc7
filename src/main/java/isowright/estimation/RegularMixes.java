package isowright.estimation;

import isowright.regression.Inequalities;
import isowright.technology.LinearForm;
import isowright.technology.RegularityMargins;
import isowright.technology.Technology;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.TreeSet;
import java.util.stream.IntStream;

/**
 * The mixes at which a form linear in its parameters is held to be regular, as inequalities in the
 * coefficients of its regression: at each mix e_i ≥ m for every input and −λ_j ≥ m for every
 * curvature of the isoquant ({@link RegularityMargins}).
 *
 * <p>Only the mixes that are watched enter the inequalities; which others are missed is asked of
 * all of them ({@link #missed}), and those are watched from then on. Gradient and Hessian are
 * linear in the coefficients, so their slopes at a mix are those of the technology with one
 * coefficient of one.
 */
final class RegularMixes implements Inequalities {

  /**
   * m: what the margins are held to in place of zero, so that rounding cannot turn a row that binds
   * into one that fails; a thousandth of the third digit of an elasticity.
   */
  static final double MARGIN = 1e-6;

  /** By how much a mix may miss its margin and not be watched. */
  private static final double SLACK = 1e-8;

  /** How many mixes of a kind are taken under watch at once. */
  private static final int AT_ONCE = 5;

  private final LinearForm form;
  private final List<String> inputs;
  private final double[] base;
  private final double[][] logs;
  private final int first;
  private final int count;
  private final Technology zero;
  private final Technology[] units;
  private final List<Mix> watched = new ArrayList<>();
  private final RegularityMargins margins;

  /** A mix under watch: gradient and Hessian without coefficients, and what one of each adds. */
  private record Mix(int row, double[] logs, double[][] gradients, double[][][] hessians) {}

  /**
   * @param logs {@code logs[i][row]}, logs of inputs in their own units
   * @param first the column of the regression that holds the form's first coefficient
   */
  RegularMixes(LinearForm form, List<String> inputs, double[] base, double[][] logs, int first) {
    this.form = form;
    this.inputs = inputs;
    this.base = base;
    this.logs = logs;
    this.first = first;
    this.count = form.coefficientNames(inputs).size();
    this.margins = new RegularityMargins(inputs.size());
    this.zero = form.technology(inputs, base, 0, new double[count]);
    this.units = new Technology[count];
    for (int k = 0; k < count; k++) {
      double[] one = new double[count];
      one[k] = 1;
      units[k] = form.technology(inputs, base, 0, one);
    }
  }

  private RegularMixes(RegularMixes other) {
    this.form = other.form;
    this.inputs = other.inputs;
    this.base = other.base;
    this.logs = other.logs;
    this.first = other.first;
    this.count = other.count;
    this.margins = new RegularityMargins(other.inputs.size());
    this.zero = other.zero;
    this.units = other.units;
    this.watched.addAll(other.watched);
  }

  /** The same mixes, with those under watch, for another thread. */
  RegularMixes again() {
    return new RegularMixes(this);
  }

  /** How many mixes there are. */
  int rows() {
    return logs[0].length;
  }

  /** The rows under watch, in order of being taken in. */
  List<Integer> watched() {
    return watched.stream().map(Mix::row).toList();
  }

  /** Takes rows under watch that are not yet. */
  void watch(Iterable<Integer> rows) {
    List<Integer> already = watched();
    for (int row : rows) {
      if (!already.contains(row)) {
        watched.add(mix(row));
      }
    }
  }

  private Mix mix(int row) {
    int n = logs.length;
    double[] at = new double[n];
    Arrays.setAll(at, i -> logs[i][row]);
    double[] gradient = new double[n];
    double[][] hessian = new double[n][n];
    zero.logGradient(at, gradient);
    zero.logHessian(at, hessian);
    double[][] gradients = new double[count][n];
    double[][][] hessians = new double[count][n][n];
    for (int k = 0; k < count; k++) {
      units[k].logGradient(at, gradients[k]);
      units[k].logHessian(at, hessians[k]);
      for (int i = 0; i < n; i++) {
        gradients[k][i] -= gradient[i];
        for (int j = 0; j < n; j++) {
          hessians[k][i][j] -= hessian[i][j];
        }
      }
    }
    return new Mix(row, at, gradients, hessians);
  }

  /** The coefficients that bend isoquants or elasticities, by column of the regression. */
  int[] bending() {
    Mix any = mix(0);
    return IntStream.range(0, count)
        .filter(
            k ->
                Arrays.stream(any.hessians[k])
                    .flatMapToDouble(Arrays::stream)
                    .anyMatch(entry -> entry != 0))
        .map(k -> first + k)
        .toArray();
  }

  Technology technology(double[] coefficients) {
    return form.technology(inputs, base, 0, Arrays.copyOfRange(coefficients, first, first + count));
  }

  private int perMix() {
    return 2 * inputs.size() - 1;
  }

  /** The row to which an inequality belongs. */
  int rowOf(int inequality) {
    return watched.get(inequality / perMix()).row;
  }

  /** Whether an inequality is one of a marginal product (and not of curvature). */
  boolean ofProduct(int inequality) {
    return inequality % perMix() < inputs.size();
  }

  @Override
  public int count() {
    return watched.size() * perMix();
  }

  @Override
  public void at(double[] coefficients, double[] values, double[][] gradients) {
    Technology technology = technology(coefficients);
    int n = inputs.size();
    int at = 0;
    for (Mix mix : watched) {
      margins.at(technology, mix.logs);
      for (int i = 0; i < n; i++) {
        values[at] = margins.elasticity(i) - MARGIN;
        for (int k = 0; k < count; k++) {
          gradients[at][first + k] = mix.gradients[k][i];
        }
        at++;
      }
      for (int j = 0; j < n - 1; j++) {
        values[at] = -margins.curvature(j) - MARGIN;
        double[] v = margins.direction(j);
        double kappa = margins.multiplier(v);
        for (int k = 0; k < count; k++) {
          gradients[at][first + k] =
              -RegularityMargins.slope(v, kappa, mix.gradients[k], mix.hessians[k]);
        }
        at++;
      }
    }
  }

  /** The number of inputs. */
  int inputs() {
    return inputs.size();
  }

  /** e_i − least at the first mix, as inequalities written from a place on. */
  void products(
      double least, double[] coefficients, double[] values, double[][] gradients, int place) {
    Mix mix = mix(0);
    margins.at(technology(coefficients), mix.logs);
    for (int i = 0; i < inputs.size(); i++) {
      values[place + i] = margins.elasticity(i) - least;
      for (int k = 0; k < count; k++) {
        gradients[place + i][first + k] = mix.gradients[k][i];
      }
    }
  }

  /** The rows that miss their margins by most, a few of each kind; empty where none does. */
  TreeSet<Integer> missed(double[] coefficients) {
    Technology technology = technology(coefficients);
    int n = inputs.size();
    Worst[] worst = new Worst[n + 1];
    Arrays.setAll(worst, i -> new Worst());
    double[] row = new double[n];
    for (int r = 0; r < rows(); r++) {
      for (int i = 0; i < n; i++) {
        row[i] = logs[i][r];
      }
      margins.at(technology, row);
      for (int i = 0; i < n; i++) {
        worst[i].take(r, margins.elasticity(i) - MARGIN);
      }
      worst[n].take(r, -margins.largestCurvature() - MARGIN);
    }
    TreeSet<Integer> rows = new TreeSet<>();
    for (Worst each : worst) {
      each.into(rows);
    }
    return rows;
  }

  /** At how many rows a margin is used up: an input adds nothing, or an isoquant is straight. */
  int[] binding(double[] coefficients) {
    Technology technology = technology(coefficients);
    int n = inputs.size();
    double[] row = new double[n];
    double used = MARGIN + 10 * SLACK;
    int[] binding = new int[3];
    for (int r = 0; r < rows(); r++) {
      for (int i = 0; i < n; i++) {
        row[i] = logs[i][r];
      }
      margins.at(technology, row);
      boolean product = IntStream.range(0, n).anyMatch(i -> margins.elasticity(i) < used);
      boolean curvature = -margins.largestCurvature() < used;
      binding[0] += product || curvature ? 1 : 0;
      binding[1] += product ? 1 : 0;
      binding[2] += curvature ? 1 : 0;
    }
    return binding;
  }

  /** The few rows of least value below zero. */
  private static final class Worst {
    private final int[] rows = new int[AT_ONCE];
    private final double[] values = new double[AT_ONCE];
    private int count;

    void take(int row, double value) {
      if (value >= -SLACK || (count == AT_ONCE && value >= values[count - 1])) {
        return;
      }
      int at = count < AT_ONCE ? count++ : AT_ONCE - 1;
      for (; at > 0 && values[at - 1] > value; at--) {
        values[at] = values[at - 1];
        rows[at] = rows[at - 1];
      }
      values[at] = value;
      rows[at] = row;
    }

    void into(TreeSet<Integer> all) {
      for (int i = 0; i < count; i++) {
        all.add(rows[i]);
      }
    }
  }
}
