/**
 * Charts drawn from findings with XChart, one file a family of charts.
 *
 * <p><b>Comes in:</b> {@link isowright.study.Findings}. <b>Goes out:</b> SVG and PNG pictures, each
 * with a title that states its finding, a text alternative and the table of what it shows.
 *
 * <p><b>Read first:</b> {@link isowright.charts.Chart}.
 *
 * <p><b>Does not belong here:</b> any computation of a result.
 */
@NullMarked
package isowright.charts;

import org.jspecify.annotations.NullMarked;
