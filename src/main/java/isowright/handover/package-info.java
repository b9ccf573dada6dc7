/**
 * What is handed over beside the page: the report as a document for a word processor. Rendered from
 * the same document model as the page, so that they cannot disagree.
 *
 * <p><b>Comes in:</b> {@link isowright.report.Document}. <b>Goes out:</b> the bytes of a file.
 *
 * <p><b>Read first:</b> {@link isowright.handover.WordReport}.
 *
 * <p><b>Does not belong here:</b> a sentence or a figure of its own: what a report says is decided
 * in {@code report}.
 */
@NullMarked
package isowright.handover;

import org.jspecify.annotations.NullMarked;
