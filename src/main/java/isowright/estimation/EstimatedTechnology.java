package isowright.estimation;

import isowright.technology.Technology;

/**
 * A technology with the covariance of its parameters: all that is needed to carry uncertainty to
 * anything computed from it.
 *
 * @param technology the point estimate
 * @param covariance p × p, in the order of {@link Technology#parameters()}; not modified by anyone
 * @param degreesOfFreedom of the t distribution for intervals
 */
public record EstimatedTechnology(
    Technology technology, double[][] covariance, double degreesOfFreedom) {}
