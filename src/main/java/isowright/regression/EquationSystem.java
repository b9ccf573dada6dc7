package isowright.regression;

import java.util.List;
import java.util.Objects;

/**
 * Several equations over the columns of one design that share parameters: demand equations beside
 * the function they are derivatives of, say.
 *
 * <p>The design has C regressors and a response, C + 1 columns d = (d_0, …, d_C) in all; which of
 * them an equation explains, and by which, is the equation's own affair. With parameters θ, shape
 * K, the residual of equation m in a row is
 *
 * <pre>  e_m = Σ_j d_j (o_mj − Σ_k D_mjk θ_k) </pre>
 *
 * so that what is explained stands in the offsets o (1 for the column explained, minus a known
 * coefficient for a column whose coefficient is known) and what explains it in the loadings D.
 * Restrictions within and between equations are thus part of the loadings, and equations that share
 * a parameter load on it both.
 *
 * @param parameters the names of the K parameters
 * @param equations the M equations
 */
public record EquationSystem(List<String> parameters, List<Equation> equations) {

  /**
   * One equation.
   *
   * @param name its name
   * @param offsets o, shape C + 1; copied in
   * @param loadings D, (C + 1) × K; copied in, not to be modified by anyone
   * @param effects whether each group of rows has a constant of its own in this equation
   */
  public record Equation(String name, double[] offsets, double[][] loadings, boolean effects) {

    /** Copies the arrays. */
    public Equation {
      Objects.requireNonNull(name);
      offsets = offsets.clone();
      loadings = Matrices.copy(loadings);
    }

    @Override
    public double[] offsets() {
      return offsets.clone();
    }
  }

  /** Copies the lists and checks that all shapes agree. */
  public EquationSystem {
    parameters = List.copyOf(parameters);
    equations = List.copyOf(equations);
    for (Equation equation : equations) {
      if (equation.loadings().length != equation.offsets().length) {
        throw new IllegalArgumentException(
            "equation "
                + equation.name()
                + " has "
                + equation.offsets().length
                + " offsets and loadings of "
                + equation.loadings().length
                + " columns");
      }
      for (double[] row : equation.loadings()) {
        if (row.length != parameters.size()) {
          throw new IllegalArgumentException(
              "equation "
                  + equation.name()
                  + " loads on "
                  + row.length
                  + " parameters of "
                  + parameters.size());
        }
      }
    }
  }

  /** The number of equations, M. */
  public int size() {
    return equations.size();
  }
}
