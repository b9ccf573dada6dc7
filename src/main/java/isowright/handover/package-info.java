/**
 * What is handed over beside the page: the report as a document for a word processor, rendered from
 * the same document model, so that they cannot disagree; and workpapers, a workbook that works the
 * figures out again from the records.
 *
 * <p><b>Comes in:</b> {@link isowright.report.Document}, findings, the rows used. <b>Goes out:</b>
 * the bytes of a file.
 *
 * <p><b>Read first:</b> {@link isowright.handover.WordReport}, {@link
 * isowright.handover.Workpapers}.
 *
 * <p><b>Does not belong here:</b> a sentence of its own (what a report says is decided in {@code
 * report}); a figure that is computed here: workpapers hold formulas.
 */
@NullMarked
package isowright.handover;

import org.jspecify.annotations.NullMarked;
