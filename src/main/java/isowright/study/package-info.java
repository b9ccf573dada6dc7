/**
 * The study: what was asked, read and checked; the pipeline that runs the stages in order; and the
 * findings, the one immutable tree of results from which every view is made.
 *
 * <p><b>Comes in:</b> a study file (YAML 1.2). <b>Goes out:</b> {@link isowright.study.Findings}.
 *
 * <p><b>Read first:</b> {@link isowright.study.Study} (what can be asked), {@link
 * isowright.study.StudyFile} (how it is read), {@link isowright.study.Pipeline} (the stages),
 * {@link isowright.study.Findings} (the results).
 *
 * <p><b>Does not belong here:</b> formulas of economics or statistics, drawing, writing of files.
 */
@NullMarked
package isowright.study;

import org.jspecify.annotations.NullMarked;
