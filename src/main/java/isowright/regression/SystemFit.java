package isowright.regression;

import java.util.List;

/**
 * A system of equations fitted to rows.
 *
 * <p>Notation: N rows, M equations, K parameters θ. Arrays are copied in and out.
 *
 * @param system the equations
 * @param coefficients θ, shape K; zero where not estimated
 * @param estimated which parameters were estimated, shape K
 * @param covariance (Σ_i X_i′ Σ̂⁻¹ X_i)⁻¹, K × K, zero where nothing was estimated
 * @param residualCovariance Σ̂ = E′E/N, M × M
 * @param logLikelihood of the normal law at Σ̂: −N/2 (M (1 + ln 2π) + ln det Σ̂)
 * @param rows N
 * @param absorbed group constants removed, in all equations together
 * @param iterations how often Σ̂ was renewed
 * @param converged whether the last renewal moved no parameter by more than its tolerance
 * @param collinearities the parameters that the rows cannot tell from others
 */
public record SystemFit(
    EquationSystem system,
    double[] coefficients,
    boolean[] estimated,
    double[][] covariance,
    double[][] residualCovariance,
    double logLikelihood,
    int rows,
    int absorbed,
    int iterations,
    boolean converged,
    List<Collinearity> collinearities) {

  /** Copies the arrays. */
  public SystemFit {
    coefficients = coefficients.clone();
    estimated = estimated.clone();
    covariance = Matrices.copy(covariance);
    residualCovariance = Matrices.copy(residualCovariance);
    collinearities = List.copyOf(collinearities);
  }

  @Override
  public double[] coefficients() {
    return coefficients.clone();
  }

  @Override
  public boolean[] estimated() {
    return estimated.clone();
  }

  @Override
  public double[][] covariance() {
    return Matrices.copy(covariance);
  }

  @Override
  public double[][] residualCovariance() {
    return Matrices.copy(residualCovariance);
  }

  /**
   * The place of a parameter.
   *
   * @throws IllegalArgumentException if there is none of that name
   */
  public int index(String parameter) {
    int at = system.parameters().indexOf(parameter);
    if (at < 0) {
      throw new IllegalArgumentException(
          "no parameter \"" + parameter + "\" among " + system.parameters());
    }
    return at;
  }

  /** The estimate of a parameter. */
  public double coefficient(String parameter) {
    return coefficients[index(parameter)];
  }

  /** Its standard error under equal covariance of the equations in all rows. */
  public double standardError(String parameter) {
    int k = index(parameter);
    return Math.sqrt(covariance[k][k]);
  }

  /** How many parameters were estimated, group constants not counted. */
  public int rank() {
    int rank = 0;
    for (boolean each : estimated) {
      rank += each ? 1 : 0;
    }
    return rank;
  }
}
