package isowright.technology;

import java.util.List;

/**
 * A form linear in its parameters: ln Q = constant + Σ_k β_k r_k(z), with z the logged, divided
 * inputs.
 */
public non-sealed interface LinearForm extends Form {

  /** The names of the coefficients β for these inputs (without {@code constant}), shape k. */
  List<String> coefficientNames(List<String> inputs);

  /**
   * The regressors r_k for many rows at once, column by column.
   *
   * @param z the logged inputs divided by the base, {@code z[i][row]}, n columns; not modified
   * @param rows how many rows of each column to use
   * @param into {@code into[offset + k][row]}, overwritten
   * @param offset the first column to write
   */
  void regressors(double[][] z, int rows, double[][] into, int offset);

  /**
   * For each input the coefficient of its own log among {@link Technology#parameters()}, by index:
   * what a change of technology that works through that input adds to. Empty for a form that has no
   * such terms.
   */
  default int[] firstOrder(int inputs) {
    return new int[0];
  }

  /**
   * Subtracts from a response what the form adds to it without any free coefficient: nothing,
   * unless a restriction fixes something.
   *
   * @param z as for {@link #regressors}
   * @param from {@code from[row]}, changed
   */
  default void subtractFixed(double[][] z, int rows, double[] from) {}

  /** The form without its restriction; this form where it has none. */
  default LinearForm unrestricted() {
    return this;
  }

  /** The technology with these coefficients (shape k) and constant. */
  Technology technology(List<String> inputs, double[] base, double constant, double[] coefficients);

  /**
   * The Jacobian of {@link Technology#parameters()} in (constant, coefficients…): p rows, 1 + k
   * columns; the identity, unless some parameters follow from others.
   */
  default double[][] reported(List<String> inputs) {
    int size = 1 + coefficientNames(inputs).size();
    double[][] identity = new double[size][size];
    for (int k = 0; k < size; k++) {
      identity[k][k] = 1;
    }
    return identity;
  }

  /**
   * The coefficients among {@link Technology#parameters()} that vanish when this form is
   * Cobb-Douglas, by index; empty where it is Cobb-Douglas already.
   */
  int[] secondOrder(int inputs);
}
