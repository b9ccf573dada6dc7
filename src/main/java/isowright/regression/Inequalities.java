package isowright.regression;

/** Smooth inequalities g_j(β) ≥ 0 that coefficients have to meet. */
public interface Inequalities {

  /** How many there are. */
  int count();

  /**
   * Values and slopes at β.
   *
   * @param coefficients β, shape K; not modified
   * @param values g_j, overwritten, shape m
   * @param gradients ∂g_j/∂β, overwritten, m × K
   */
  void at(double[] coefficients, double[] values, double[][] gradients);
}
