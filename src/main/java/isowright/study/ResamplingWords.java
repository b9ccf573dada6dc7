package isowright.study;

import isowright.inference.Resampled;
import isowright.study.Figure.Drawn;
import isowright.study.Findings.Said;
import java.util.Comparator;
import java.util.Locale;
import java.util.Optional;
import java.util.stream.Stream;

/** What must be said of draws that have no value. */
final class ResamplingWords {

  private ResamplingWords() {}

  /** A remark on the figures of one owner, by the figure that most draws lack. */
  static Optional<Said> failed(Stream<Figure> figures) {
    return figures
        .map(figure -> figure.refits().drawn())
        .flatMap(Optional::stream)
        .max(Comparator.comparingInt(Drawn::failed))
        .filter(worst -> worst.failed() > 0)
        .map(ResamplingWords::said);
  }

  private static Said said(Drawn worst) {
    String share =
        String.format(
            Locale.ROOT,
            "In %d of %d draws of plants (%.0f %%) a figure here has no value: the drawn plants"
                + " cannot tell the parameters apart, give no optimum, or give a technology that is"
                + " irregular where the figure is asked for.",
            worst.failed(),
            worst.draws(),
            100.0 * worst.failed() / worst.draws());
    String limit = String.format(Locale.ROOT, "%.0f %%", 100 * Resampled.MOST_FAILED);
    return Double.isNaN(worst.standardError())
        ? Said.of(
            "warning",
            "resampling-failed",
            share
                + " That is more than "
                + limit
                + ", so those that have one are no sample of all, and no interval is given.")
        : Said.of(
            "note",
            "resampling-incomplete",
            share + " They are left out; above " + limit + " no interval would be given.");
  }
}
