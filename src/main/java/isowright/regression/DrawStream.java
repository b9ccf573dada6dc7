package isowright.regression;

/**
 * Random numbers that belong to one draw: the same for the same seed, draw and purpose, whichever
 * thread makes them and in whatever order draws are made.
 *
 * <p>The generator is written out here, so that a seed means the same digits under every version of
 * Java. Source: G. L. Steele, D. Lea and C. H. Flood, "Fast splittable pseudorandom number
 * generators", OOPSLA 2014, figure 17 (SplitMix64); bounded integers without bias: D. Lemire 2019,
 * ACM Transactions on Modeling and Computer Simulation 29(1), algorithm 5. Tested in {@code
 * DrawStreamTest}.
 */
public final class DrawStream {

  private static final long STEP = 0x9e3779b97f4a7c15L;
  private static final long HALF = 0xffffffffL;

  /** 2^−53. */
  private static final double UNIT = 0x1p-53;

  private long state;

  /**
   * A stream of numbers.
   *
   * @param seed of the whole
   * @param draw which draw
   * @param purpose what the numbers are for, so that two purposes of one draw share none
   */
  public DrawStream(long seed, long draw, long purpose) {
    // Each part is mixed before the next comes in: neighbours start far apart.
    this(mix(mix(mix(seed + STEP) + draw) + STEP * (purpose + 1)));
  }

  private DrawStream(long state) {
    this.state = state;
  }

  /** A stream from a state of the generator. */
  static DrawStream from(long state) {
    return new DrawStream(state);
  }

  private static long mix(long z) {
    long a = (z ^ (z >>> 30)) * 0xbf58476d1ce4e5b9L;
    long b = (a ^ (a >>> 27)) * 0x94d049bb133111ebL;
    return b ^ (b >>> 31);
  }

  /** 64 random bits. */
  public long next() {
    state += STEP;
    return mix(state);
  }

  /** A uniform number strictly between 0 and 1. */
  public double uniform() {
    return ((next() >>> 11) + 0.5) * UNIT;
  }

  /** A uniform whole number from 0 to {@code bound} − 1. */
  public int below(int bound) {
    long least = least(bound);
    while (true) {
      long product = (next() >>> 32) * bound;
      if ((product & HALF) >= least) {
        return (int) (product >>> 32);
      }
    }
  }

  /** Below this, the low half of a product would favour some numbers. */
  private static long least(int bound) {
    return (1L << 32) % bound;
  }

  /**
   * Draws {@code counts.length} numbers below {@code counts.length} and counts how often each
   * comes: how often each group stands in a sample of as many groups with replacement. Counts are
   * bytes: for up to 127 groups no count can be larger; for more, a count above 127 has a chance of
   * 1e-200.
   *
   * @param counts overwritten
   */
  void multinomial(byte[] counts) {
    int bound = counts.length;
    java.util.Arrays.fill(counts, (byte) 0);
    long least = least(bound);
    long at = state;
    int left = bound;
    while (left > 0) {
      at += STEP;
      long bits = mix(at);
      long first = (bits >>> 32) * bound;
      if ((first & HALF) >= least) {
        counts[(int) (first >>> 32)]++;
        left--;
      }
      long second = (bits & HALF) * bound;
      if (left > 0 && (second & HALF) >= least) {
        counts[(int) (second >>> 32)]++;
        left--;
      }
    }
    state = at;
  }
}
