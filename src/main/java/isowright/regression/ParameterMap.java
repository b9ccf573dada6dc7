package isowright.regression;

import java.util.List;

/**
 * Parameters θ of a system that are a smooth function of other parameters φ: a matrix that is held
 * definite by writing it as a square, say.
 */
public interface ParameterMap {

  /** The names of φ, F of them. */
  List<String> names();

  /** Where to start, given the θ that would be chosen freely; shape F. */
  double[] start(double[] theta);

  /** θ(φ), shape K. */
  double[] parameters(double[] phi);

  /** ∂θ/∂φ, K × F. */
  double[][] jacobian(double[] phi);

  /** Σ_k g_k ∂²θ_k/∂φ∂φ′, F × F, symmetric. */
  double[][] curvature(double[] phi, double[] g);
}
