package isowright.estimation;

import isowright.technology.Technology;

/**
 * A technology with the covariance of its parameters: all that is needed to carry uncertainty to
 * anything computed from it; and, where the fit was repeated, the technologies of the refits.
 *
 * @param technology the point estimate
 * @param covariance p × p, in the order of {@link Technology#parameters()}; not modified by anyone
 * @param degreesOfFreedom of the t distribution for intervals
 * @param replicas the same technology from refits
 */
public record EstimatedTechnology(
    Technology technology, double[][] covariance, double degreesOfFreedom, Replicas replicas) {

  /** Without refits. */
  public EstimatedTechnology(
      Technology technology, double[][] covariance, double degreesOfFreedom) {
    this(technology, covariance, degreesOfFreedom, Replicas.NONE);
  }

  /** The same with refits. */
  public EstimatedTechnology with(Replicas others) {
    return new EstimatedTechnology(technology, covariance, degreesOfFreedom, others);
  }

  /**
   * The technology, and those of its refits, with output exp(shift) times as large at every mix.
   */
  public EstimatedTechnology shifted(double logShift) {
    return new EstimatedTechnology(
        technology.shifted(logShift), covariance, degreesOfFreedom, replicas.shifted(logShift));
  }
}
