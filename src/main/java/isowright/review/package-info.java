/**
 * Filed or recorded cost held against least cost, and where the gap comes from.
 *
 * <p><b>Comes in:</b> a technology, the mix a plant used, the prices it paid and the cost it filed.
 * <b>Goes out:</b> the gap in parts that add up exactly: unreconciled, technical, mix.
 *
 * <p><b>Read first:</b> {@link isowright.review.FiledCost}, {@link isowright.review.Gap}.
 *
 * <p><b>Does not belong here:</b> any verdict that an unexplained cost is waste; allowances;
 * wording.
 */
@NullMarked
package isowright.review;

import org.jspecify.annotations.NullMarked;
