/**
 * Filed or recorded cost held against least cost, and where the gap comes from.
 *
 * <p><b>Comes in:</b> a technology, the mix a plant used, the prices it paid and the cost it filed.
 * <b>Goes out:</b> the gap in parts that add up exactly (unreconciled, technical, mix, remainder),
 * with intervals; where output stands against the efficient scale; the order of plants and who can
 * be told apart; what would have to be true; the arithmetic of an allowance; the user cost of
 * capital.
 *
 * <p><b>Read first:</b> {@link isowright.review.FiledCost}, {@link isowright.review.Gap}, {@link
 * isowright.review.GapEstimates}, then {@link isowright.review.Ordering}, {@link
 * isowright.review.Conditions}, {@link isowright.review.AllowancePath}.
 *
 * <p><b>Does not belong here:</b> any verdict that an unexplained cost is waste; any choice of how
 * much is allowed; wording.
 */
@NullMarked
package isowright.review;

import org.jspecify.annotations.NullMarked;
