/**
 * What a cost function <i>is</i>: the least cost of outputs at given prices, as an immutable value
 * in logs, and all economics that follows from its value, gradient and Hessian (shares, demands,
 * elasticities, scale economies, whether it is a cost function at all).
 *
 * <p><b>Comes in:</b> names, parameters. <b>Goes out:</b> a {@link isowright.cost.CostFunction} and
 * what is asked of it at a point.
 *
 * <p><b>Read first:</b> {@link isowright.cost.CostFunction}, {@link isowright.cost.TranslogCost},
 * {@link isowright.cost.CostElasticities}; for the short and the long run {@link
 * isowright.cost.RationedCost} and {@link isowright.cost.LongRunCost}.
 *
 * <p><b>Does not belong here:</b> data, estimation, production functions (see {@code technology}),
 * which describe the same technology from its other side.
 */
@NullMarked
package isowright.cost;

import org.jspecify.annotations.NullMarked;
