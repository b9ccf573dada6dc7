/**
 * The least-cost input mix for a target at given prices, under limits; cost curves and the
 * expansion path.
 *
 * <p><b>Comes in:</b> a {@link isowright.technology.Technology} and a {@link
 * isowright.leastcost.Question}. <b>Goes out:</b> a {@link isowright.leastcost.Plan}: mix, cost,
 * marginal cost, shares, multipliers, the departure from the first-order conditions, and a status
 * that never hides a corner, an irregular technology or an infeasible question.
 *
 * <p><b>Read first:</b> {@link isowright.leastcost.Question}, {@link isowright.leastcost.Plan},
 * {@link isowright.leastcost.LeastCost} (who can say what a target costs), {@link
 * isowright.leastcost.Minimiser} (how a technology does), then {@link
 * isowright.leastcost.CostCurve} and {@link isowright.leastcost.Isoquant}.
 *
 * <p><b>Does not belong here:</b> data, estimates, intervals. This package depends on {@code
 * technology} alone.
 */
@NullMarked
package isowright.leastcost;

import org.jspecify.annotations.NullMarked;
