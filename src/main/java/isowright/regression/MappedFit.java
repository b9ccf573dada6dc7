package isowright.regression;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

/**
 * A system fitted over parameters φ of which its own parameters θ are a function.
 *
 * @param fit the fit of the equations made linear in φ at the solution; a φ that no longer moves θ
 *     (a column of a factor that went to zero) is not estimated
 * @param theta θ(φ̂), shape K
 * @param jacobian ∂θ/∂φ there, K × F; empty where the free system could not be fitted
 * @param free the fit without the map
 */
public record MappedFit(SystemFit fit, double[] theta, double[][] jacobian, SystemFit free) {

  /**
   * A φ counts as without effect where it moves θ by less than this share of what the others do.
   */
  private static final double WITHOUT_EFFECT = 1e-7;

  static MappedFit unfitted(SystemFit free) {
    return new MappedFit(free, free.coefficients(), new double[0][], free);
  }

  /** Whether θ could be mapped at all. */
  public boolean mapped() {
    return jacobian.length > 0;
  }

  /** How many of φ are at the edge of what the map allows. */
  public int bound() {
    return mapped() ? fit.system().parameters().size() - fit.rank() : 0;
  }

  /** Which φ the information of the rows tells, the others having no effect on θ. */
  static boolean[] kept(double[][] information) {
    double most = 0;
    for (int k = 0; k < information.length; k++) {
      most = Math.max(most, information[k][k]);
    }
    boolean[] kept = new boolean[information.length];
    for (int k = 0; k < kept.length; k++) {
      // nothing is kept where a search went astray and left no number
      kept[k] = Math.sqrt(information[k][k]) > WITHOUT_EFFECT * Math.sqrt(most);
    }
    return kept;
  }

  static boolean any(boolean[] kept) {
    boolean any = false;
    for (boolean each : kept) {
      any |= each;
    }
    return any;
  }

  /** The inverse over what is kept, zero elsewhere. */
  static double[][] inverse(double[][] information, boolean[] kept) {
    int[] places = new int[kept.length];
    int count = 0;
    for (int k = 0; k < kept.length; k++) {
      if (kept[k]) {
        places[count++] = k;
      }
    }
    places = Arrays.copyOf(places, count);
    if (count == 0) {
      return new double[kept.length][kept.length];
    }
    double[][] part = new double[count][count];
    for (int i = 0; i < count; i++) {
      for (int j = 0; j < count; j++) {
        part[i][j] = information[places[i]][places[j]];
      }
    }
    double[][] inverse = SeeminglyUnrelated.inverse(part);
    double[][] all = new double[kept.length][kept.length];
    for (int i = 0; i < count; i++) {
      for (int j = 0; j < count; j++) {
        all[places[i]][places[j]] = inverse[i][j];
      }
    }
    return all;
  }

  /** e = o − D θ(φ̂) − D J (φ − φ̂), as equations in φ. */
  static EquationSystem linear(
      EquationSystem system,
      List<String> names,
      double[] theta,
      double[][] jacobian,
      double[] phi) {
    double[] rest = theta.clone();
    for (int k = 0; k < rest.length; k++) {
      rest[k] -= Matrices.dot(jacobian[k], phi);
    }
    List<EquationSystem.Equation> equations = new ArrayList<>();
    for (EquationSystem.Equation equation : system.equations()) {
      double[] offsets = equation.offsets();
      double[][] loadings = equation.loadings();
      double[][] load = new double[offsets.length][phi.length];
      for (int c = 0; c < offsets.length; c++) {
        offsets[c] -= Matrices.dot(loadings[c], rest);
        for (int k = 0; k < rest.length; k++) {
          for (int f = 0; f < phi.length && loadings[c][k] != 0; f++) {
            load[c][f] += loadings[c][k] * jacobian[k][f];
          }
        }
      }
      equations.add(
          new EquationSystem.Equation(equation.name(), offsets, load, equation.effects()));
    }
    return new EquationSystem(names, equations);
  }
}
