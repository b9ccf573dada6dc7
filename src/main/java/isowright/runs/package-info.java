/**
 * Runs as they lie in their folders: the record of how one was made, whether it can be made again,
 * and what changed between two.
 *
 * <p><b>Comes in:</b> folders that a run wrote, findings files made anew. <b>Goes out:</b> a {@link
 * isowright.runs.Verification} or a {@link isowright.runs.Comparison}.
 *
 * <p><b>Read first:</b> {@link isowright.runs.StoredRun}, then {@link isowright.runs.Comparison}.
 *
 * <p><b>Does not belong here:</b> estimation of any kind: figures are read from findings files, as
 * an opponent would read them; words for readers of a page.
 */
@NullMarked
package isowright.runs;

import org.jspecify.annotations.NullMarked;
