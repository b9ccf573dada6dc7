/**
 * The written results: report, findings file, technology file. Written from findings, computing
 * nothing.
 *
 * <p><b>Comes in:</b> {@link isowright.study.Findings} and charts. <b>Goes out:</b> HTML and JSON
 * files.
 *
 * <p><b>Read first:</b> {@link isowright.report.HtmlReport}.
 *
 * <p><b>Does not belong here:</b> any computation of a result; a sentence that does not follow from
 * a figure.
 */
@NullMarked
package isowright.report;

import org.jspecify.annotations.NullMarked;
