package isowright.estimation;

import isowright.regression.ComposedFit;
import isowright.regression.InstrumentedFit;
import isowright.regression.Times;
import java.util.List;

/** What belongs to one estimator alone, for its tests and for what is said of it. */
public sealed interface Particulars {

  /** Nothing beside the solution. */
  record None() implements Particulars {}

  /**
   * Of two-stage least squares.
   *
   * @param fit both stages
   * @param times when each row of them was observed
   * @param series what stands in for inputs, as it enters: {@code ln wage}, {@code lag ln labour}
   * @param rowsUnknown how many rows of the panel were not used because an instrument is unknown
   * @param periodsUnknown periods without any row used, whose constants stand at that of the next
   */
  record OfInstruments(
      InstrumentedFit fit,
      Times times,
      List<String> series,
      int rowsUnknown,
      List<String> periodsUnknown)
      implements Particulars {
    /** Copies the lists. */
    public OfInstruments {
      series = List.copyOf(series);
      periodsUnknown = List.copyOf(periodsUnknown);
    }
  }

  /**
   * Of a frontier.
   *
   * @param fit the fit by maximum likelihood, or by least squares where no inefficiency was found
   * @param scale c, by which σ_u is multiplied for the mean of the inefficiency
   */
  record OfFrontier(ComposedFit fit, double scale) implements Particulars {

    /** The parameters that follow those of least squares: {@code frontier:noise} and so on. */
    static final List<String> NAMES =
        List.of("frontier:noise", "frontier:inefficiency", "frontier:decay");

    /** How many of them there are; none where no inefficiency was found. */
    int count() {
      return fit.parameters().length - fit.coefficients().length;
    }

    /**
     * The mean of the inefficiency, c σ_u e^(−ητ).
     *
     * @param own the parameters that follow those of least squares, shape {@link #count}
     * @param since τ, the time since the last period of the records
     */
    double mean(double[] own, double since) {
      double share = own.length > 2 ? Math.exp(-own[2] * since) : 1;
      return own.length < 2 ? 0 : scale * own[1] * share;
    }

    /** Its derivatives in those parameters. */
    double[] slopes(double[] own, double since) {
      double[] slopes = new double[own.length];
      if (own.length > 1) {
        slopes[1] = scale * (own.length > 2 ? Math.exp(-own[2] * since) : 1);
      }
      if (own.length > 2) {
        slopes[2] = -since * mean(own, since);
      }
      return slopes;
    }
  }
}
