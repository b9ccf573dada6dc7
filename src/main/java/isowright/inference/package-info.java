/**
 * What can be concluded from a fit: intervals for any derived quantity, and tests.
 *
 * <p><b>Comes in:</b> a {@link isowright.estimation.Fit} and functions of its technology. <b>Goes
 * out:</b> {@link isowright.inference.Estimate}s and {@link isowright.inference.Verdict}s, each
 * with its method.
 *
 * <p><b>Read first:</b> {@link isowright.inference.Estimate}, {@link
 * isowright.inference.DeltaMethod}, {@link isowright.inference.Hypotheses}.
 *
 * <p><b>Does not belong here:</b> estimation itself, wording of reports beyond a verdict's
 * sentence.
 */
@NullMarked
package isowright.inference;

import org.jspecify.annotations.NullMarked;
