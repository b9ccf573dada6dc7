/**
 * What a production technology is, and everything economic that follows from it.
 *
 * <p><b>Comes in:</b> parameters of a form (estimated, or printed in a filing). <b>Goes out:</b>
 * immutable {@link isowright.technology.Technology} values, and functions of them: output and scale
 * elasticities, marginal rates of substitution, elasticities of substitution, regularity.
 *
 * <p><b>Read first:</b> {@link isowright.technology.Technology} (three derivatives in logs; all
 * else follows), then {@link isowright.technology.Form} (how a form presents itself to an
 * estimator), then one form, say {@link isowright.technology.CobbDouglas}; then {@link
 * isowright.technology.Elasticities} and {@link isowright.technology.Regularity}, which no form
 * knows. {@link isowright.technology.Ces} keeps its numerical kernels in files of their own.
 *
 * <p><b>Does not belong here:</b> data, estimation, prices of a question, files, printing. A new
 * functional form is one file in this package and one word in the {@code permits} clause of {@code
 * Technology}.
 */
@NullMarked
package isowright.technology;

import org.jspecify.annotations.NullMarked;
