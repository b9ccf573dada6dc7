/**
 * The pipeline from code: what a study file and the command line do, step by step, for Java and
 * JShell.
 *
 * <p><b>Comes in:</b> a study in the words of the study file. <b>Goes out:</b> findings, charts and
 * reports as values.
 *
 * <p><b>Read first:</b> {@link isowright.workbench.Workbench}; a walk through it stands in {@code
 * notebooks-data/walk-through.jsh}.
 *
 * <p><b>Does not belong here:</b> a second way to say what a study is, or anything computed.
 */
@NullMarked
package isowright.workbench;

import org.jspecify.annotations.NullMarked;
