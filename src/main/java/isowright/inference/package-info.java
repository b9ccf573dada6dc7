/**
 * What can be concluded from a fit: intervals for any derived quantity, tests, comparisons.
 *
 * <p><b>Comes in:</b> a {@link isowright.estimation.Fit} and a function of its technology. <b>Goes
 * out:</b> {@link isowright.inference.Estimate}s and verdicts, each with its method.
 *
 * <p><b>Read first:</b> {@link isowright.inference.Estimate}.
 *
 * <p><b>Does not belong here:</b> estimation itself, wording of reports.
 */
@NullMarked
package isowright.inference;

import org.jspecify.annotations.NullMarked;
