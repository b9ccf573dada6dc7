/**
 * What least squares is: designs, orthogonal decomposition, linear and nonlinear fits, effects
 * removed from a design, covariance estimators, influence.
 *
 * <p><b>Comes in:</b> a {@link isowright.regression.Design}, rows of regressors and a response
 * handed over block by block. <b>Goes out:</b> coefficients, sums of squares, ranks, covariance
 * matrices, each with how it was obtained.
 *
 * <p><b>Read first:</b> {@link isowright.regression.Design}, then {@link
 * isowright.regression.LeastSquares} and {@link isowright.regression.LinearFit}, {@link
 * isowright.regression.Effects}, {@link isowright.regression.Covariance}, and {@link
 * isowright.regression.NonlinearLeastSquares}.
 *
 * <p><b>Does not belong here:</b> any economics. No word such as labour, cost, output or plant
 * appears; rows come in groups, and that is all this package knows of them.
 */
@NullMarked
package isowright.regression;

import org.jspecify.annotations.NullMarked;
