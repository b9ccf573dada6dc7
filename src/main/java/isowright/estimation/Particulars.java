package isowright.estimation;

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
}
