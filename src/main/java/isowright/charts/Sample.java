package isowright.charts;

import java.util.List;
import java.util.stream.IntStream;

/** Clouds of observations thinned to what an eye can take in. */
final class Sample {

  /** The most dots of one cloud. */
  static final int MOST = 600;

  private Sample() {}

  /** All of a list, or {@link #MOST} of it, evenly spaced, the first and the last among them. */
  static <T> List<T> of(List<T> all) {
    int n = all.size();
    if (n <= MOST) {
      return all;
    }
    return IntStream.range(0, MOST)
        .mapToObj(i -> all.get((int) ((long) i * (n - 1) / (MOST - 1))))
        .toList();
  }

  /** What a caption says of thinning; empty where all are drawn. */
  static String words(int all) {
    return all <= MOST
        ? ""
        : " Of "
            + Numbers.stated(all)
            + " rows "
            + MOST
            + " are drawn and listed, evenly spaced in the order of the records.";
  }
}
