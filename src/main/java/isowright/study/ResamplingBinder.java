package isowright.study;

import isowright.estimation.Replication.Drawing;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;

/** Reads how the headline figures are resampled. */
final class ResamplingBinder {

  /** As in the example of the format; (draws + 1) × 2.5 % is a whole number. */
  private static final int USUAL_DRAWS = 999;

  private static final int USUAL_SEED = 1;

  /** Fewer draws have no value beyond the ends of a 95 % interval to speak of. */
  private static final int FEWEST_DRAWS = 99;

  private static final int MOST_DRAWS = 99_999;

  private ResamplingBinder() {}

  /**
   * The drawing under {@code resampling}, if it is there.
   *
   * @param fitted whether any technology is fitted
   */
  static Optional<Drawing> read(YamlSection estimation, boolean fitted) {
    Optional<YamlSection> written = estimation.section("resampling");
    if (written.isEmpty()) {
      return Optional.empty();
    }
    YamlSection section = written.get();
    section.allow("`resampling`", List.of("draws", "seed"), List.of());
    if (!fitted) {
      estimation.refuse(
          "resampling",
          "technologies that are fitted are resampled, but there are no `technologies`; name some or"
              + " take this out");
    }
    int draws = section.get("draws").map(ResamplingBinder::draws).orElse(USUAL_DRAWS);
    int seed =
        section
            .get("seed")
            .map(value -> value.whole(0, Integer.MAX_VALUE).orElse(USUAL_SEED))
            .orElse(USUAL_SEED);
    return Optional.of(new Drawing(draws, seed));
  }

  private static int draws(YamlValue value) {
    OptionalDouble number = value.number();
    if (number.isEmpty()) {
      return USUAL_DRAWS;
    }
    double draws = number.getAsDouble();
    if (draws != Math.rint(draws) || draws < FEWEST_DRAWS || draws > MOST_DRAWS) {
      value.refuse(
          "expects a whole number from "
              + FEWEST_DRAWS
              + " to "
              + MOST_DRAWS
              + ", found "
              + value.found()
              + (draws < FEWEST_DRAWS
                  ? "; from fewer draws no interval can be read, and " + USUAL_DRAWS + " are usual"
                  : ""));
      return USUAL_DRAWS;
    }
    return (int) draws;
  }
}
