/**
 * A technology form fitted to a panel.
 *
 * <p><b>Comes in:</b> a {@link isowright.records.Panel} and a {@link
 * isowright.estimation.Specification}. <b>Goes out:</b> a {@link isowright.estimation.Fit}:
 * technology, parameter covariance, residuals, and how they were obtained, or the reason why there
 * is none.
 *
 * <p><b>Read first:</b> {@link isowright.estimation.Specification}, {@link
 * isowright.estimation.Estimation}, {@link isowright.estimation.Fit}.
 *
 * <p><b>Does not belong here:</b> tests, prices, reports; formulas of a concrete form.
 */
@NullMarked
package isowright.estimation;

import org.jspecify.annotations.NullMarked;
