package isowright.technology;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.stream.IntStream;
import org.apache.commons.math3.linear.Array2DRowRealMatrix;
import org.apache.commons.math3.linear.ArrayRealVector;
import org.apache.commons.math3.linear.DecompositionSolver;
import org.apache.commons.math3.linear.QRDecomposition;

/**
 * A form linear in its parameters, held exactly to linear restrictions R β = r: β = p + N γ with γ
 * those coefficients that stay free.
 *
 * <p>An orthogonal decomposition of R with pivoting chooses as many coefficients β_B as R has rows,
 * such that R_B is well conditioned; these follow from the others, β_B = R_B⁻¹ (r − R_F γ). The
 * rows of N for the free coefficients are those of the identity, so a regressor keeps the name of
 * its coefficient: that of coefficient k becomes r_k − Σ_B (R_B⁻¹ R_F)_bk r_b. The covariance N V
 * N′ of all coefficients is singular in the directions of R, as it must be.
 *
 * <p>Source: Lawson, C. L. and Hanson, R. J. (1974), <i>Solving Least Squares Problems</i>, chapter
 * 21 (elimination of equality constraints). Tested in {@code FurtherFormsTest}.
 */
final class RestrictedLinearForm implements LinearForm {

  private final LinearForm whole;
  private final Restriction restriction;

  RestrictedLinearForm(LinearForm whole, Restriction restriction) {
    this.whole = whole;
    this.restriction = restriction;
  }

  @Override
  public String name() {
    return whole.name();
  }

  @Override
  public Form restricted(Restriction further) {
    return obeys(further) ? this : whole.restricted(further);
  }

  @Override
  public boolean obeys(Restriction other) {
    return other.ordinal() <= restriction.ordinal() || whole.obeys(other);
  }

  @Override
  public LinearForm unrestricted() {
    return whole;
  }

  @Override
  public List<String> coefficientNames(List<String> inputs) {
    List<String> all = whole.coefficientNames(inputs);
    List<String> free = new ArrayList<>();
    for (int k : elimination(inputs).free) {
      free.add(all.get(k));
    }
    return List.copyOf(free);
  }

  @Override
  public void regressors(double[][] z, int rows, double[][] into, int offset) {
    Elimination elimination = elimination(placeholders(z.length));
    double[][] all = allRegressors(z, rows, elimination);
    for (int f = 0; f < elimination.free.length; f++) {
      double[] column = into[offset + f];
      System.arraycopy(all[elimination.free[f]], 0, column, 0, rows);
      for (int b = 0; b < elimination.bound.length; b++) {
        subtract(all[elimination.bound[b]], elimination.weights[b][f], rows, column);
      }
    }
  }

  @Override
  public void subtractFixed(double[][] z, int rows, double[] from) {
    Elimination elimination = elimination(placeholders(z.length));
    if (Arrays.stream(elimination.fixed).allMatch(value -> value == 0)) {
      return;
    }
    double[][] all = allRegressors(z, rows, elimination);
    for (int b = 0; b < elimination.bound.length; b++) {
      subtract(all[elimination.bound[b]], elimination.fixed[b], rows, from);
    }
  }

  private double[][] allRegressors(double[][] z, int rows, Elimination elimination) {
    double[][] all = new double[elimination.free.length + elimination.bound.length][rows];
    whole.regressors(z, rows, all, 0);
    return all;
  }

  private static void subtract(double[] column, double times, int rows, double[] from) {
    for (int r = 0; times != 0 && r < rows; r++) {
      from[r] -= times * column[r];
    }
  }

  @Override
  public Technology technology(
      List<String> inputs, double[] base, double constant, double[] coefficients) {
    return whole.technology(inputs, base, constant, elimination(inputs).all(coefficients));
  }

  @Override
  public double[][] reported(List<String> inputs) {
    Elimination elimination = elimination(inputs);
    int free = elimination.free.length;
    double[][] jacobian = new double[1 + free + elimination.bound.length][1 + free];
    jacobian[0][0] = 1;
    for (int f = 0; f < free; f++) {
      jacobian[1 + elimination.free[f]][1 + f] = 1;
      for (int b = 0; b < elimination.bound.length; b++) {
        jacobian[1 + elimination.bound[b]][1 + f] = -elimination.weights[b][f];
      }
    }
    return jacobian;
  }

  /** Those of the whole form that are not held already. */
  @Override
  public double[][] restrictions(Restriction which, List<String> inputs) {
    double[][] held = whole.restrictions(restriction, inputs);
    return Arrays.stream(whole.restrictions(which, inputs))
        .filter(row -> Arrays.stream(held).noneMatch(other -> Arrays.equals(row, other)))
        .toArray(double[][]::new);
  }

  @Override
  public int[] firstOrder(int inputs) {
    return whole.firstOrder(inputs);
  }

  @Override
  public int[] secondOrder(int inputs) {
    return whole.secondOrder(inputs);
  }

  private Elimination elimination(List<String> inputs) {
    return Elimination.of(whole.restrictions(restriction, inputs));
  }

  /** Names for inputs where only their number matters. */
  private static List<String> placeholders(int inputs) {
    return IntStream.range(0, inputs).mapToObj(i -> "input " + i).toList();
  }

  /**
   * Which coefficients follow from which.
   *
   * @param free the coefficients that stay free, ascending
   * @param bound those that follow
   * @param weights R_B⁻¹ R_F, one row for each bound coefficient
   * @param fixed R_B⁻¹ r
   */
  private record Elimination(int[] free, int[] bound, double[][] weights, double[] fixed) {

    /** From rows (R | r). */
    static Elimination of(double[][] rows) {
      int count = rows.length;
      int size = rows[0].length - 1;
      int[] bound = pivots(rows, size);
      Arrays.sort(bound);
      int[] free = new int[size - count];
      int at = 0;
      for (int k = 0; k < size; k++) {
        if (Arrays.binarySearch(bound, k) < 0) {
          free[at++] = k;
        }
      }
      double[][] ofBound = columns(rows, bound);
      double[] right = new double[count];
      Arrays.setAll(right, i -> rows[i][size]);
      DecompositionSolver solver =
          new QRDecomposition(new Array2DRowRealMatrix(ofBound, false)).getSolver();
      double[][] weights =
          solver.solve(new Array2DRowRealMatrix(columns(rows, free), false)).getData();
      double[] fixed = solver.solve(new ArrayRealVector(right, false)).toArray();
      return new Elimination(free, bound, weights, fixed);
    }

    /** Columns that elimination with the largest entry as pivot goes through: independent ones. */
    private static int[] pivots(double[][] rows, int size) {
      double[][] left = Arrays.stream(rows).map(double[]::clone).toArray(double[][]::new);
      int[] pivots = new int[left.length];
      for (int step = 0; step < left.length; step++) {
        int row = step;
        int column = 0;
        for (int i = step; i < left.length; i++) {
          for (int k = 0; k < size; k++) {
            if (Math.abs(left[i][k]) > Math.abs(left[row][column])) {
              row = i;
              column = k;
            }
          }
        }
        double[] pivot = left[row];
        left[row] = left[step];
        left[step] = pivot;
        pivots[step] = column;
        for (int i = step + 1; i < left.length; i++) {
          double part = left[i][column] / pivot[column];
          for (int k = 0; k < size; k++) {
            left[i][k] -= part * pivot[k];
          }
          left[i][column] = 0;
        }
      }
      return pivots;
    }

    private static double[][] columns(double[][] rows, int[] which) {
      double[][] columns = new double[rows.length][which.length];
      for (int i = 0; i < rows.length; i++) {
        for (int k = 0; k < which.length; k++) {
          columns[i][k] = rows[i][which[k]];
        }
      }
      return columns;
    }

    /** All coefficients from the free ones. */
    double[] all(double[] coefficients) {
      double[] all = new double[free.length + bound.length];
      for (int f = 0; f < free.length; f++) {
        all[free[f]] = coefficients[f];
      }
      for (int b = 0; b < bound.length; b++) {
        all[bound[b]] = fixed[b];
        for (int f = 0; f < free.length; f++) {
          all[bound[b]] -= weights[b][f] * coefficients[f];
        }
      }
      return all;
    }
  }
}
