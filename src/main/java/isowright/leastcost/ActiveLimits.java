package isowright.leastcost;

import isowright.technology.Technology;

/**
 * Which limits are active in the least-cost mix? Inputs are free, held, at their lower or at their
 * upper limit; with μ = λ Q and e_i the output elasticities, the mix is least cost where
 *
 * <pre>
 *   free: w_i x_i = μ e_i    at the upper limit: w_i x_i ≤ μ e_i    at the lower: w_i x_i ≥ μ e_i
 * </pre>
 *
 * <p>All limits that are overstepped are made active, and all that hold an input back for nothing
 * released, in rounds. Where rounds come back on themselves, one limit at a time is changed (the
 * first that offends), and at last every pattern of limits is tried: there are few inputs, and for
 * a regular technology the pattern that meets the conditions is the only one.
 */
final class ActiveLimits {

  /** An input that can move. */
  static final byte FREE = 0;

  /** An input held at one quantity. */
  static final byte HELD = 1;

  /** An input at its lower limit. */
  static final byte LOW = 2;

  /** An input at its upper limit. */
  static final byte HIGH = 3;

  /** A sign condition is met within the rounding of the logs it is computed from. */
  private static final double SIGN = 1e-11;

  /** Patterns tried at most one by one: eleven inputs with two limits each. */
  private static final int PATTERNS = 200_000;

  private final Technology technology;
  private final LogQuestion question;
  private final FreeMix inner;
  private final int n;

  /** ln x, the answer. */
  final double[] z;

  /** What every input is in the answer. */
  final byte[] at;

  /** Output elasticities of all inputs in the answer. */
  final double[] elasticities;

  /** ln μ in the answer; infinite where no input can give more. */
  double logMultiplier;

  private final boolean[] fixed;
  private final double[] start;

  /**
   * Prepares a search.
   *
   * @param start ln x near the answer; copied
   */
  ActiveLimits(Technology technology, LogQuestion question, FreeMix inner, double[] start) {
    this.technology = technology;
    this.question = question;
    this.inner = inner;
    this.start = start.clone();
    n = question.n;
    z = start.clone();
    at = new byte[n];
    elasticities = new double[n];
    fixed = new boolean[n];
  }

  /** Searches; the fields hold the answer where it is found. */
  FreeMix.Outcome search() {
    for (int i = 0; i < n; i++) {
      at[i] = question.asked.held(i) ? HELD : FREE;
    }
    int together = 2 * n + 4;
    int rounds = together + 6 * n + 10;
    for (int round = 0; round < rounds; round++) {
      FreeMix.Outcome outcome = solve();
      switch (outcome) {
        case FOUND -> {
          if (revise(round >= together) == 0) {
            return outcome;
          }
        }
        case TOO_LITTLE -> {
          if (!release(LOW)) {
            return outcome;
          }
        }
        case TOO_MUCH -> {
          if (!release(HIGH)) {
            return outcome;
          }
        }
        case NOT_FOUND -> round = rounds;
      }
    }
    return everyPattern();
  }

  /** Solves with the present pattern. */
  private FreeMix.Outcome solve() {
    int free = 0;
    for (int i = 0; i < n; i++) {
      fixed[i] = at[i] != FREE;
      if (fixed[i]) {
        z[i] = at[i] == LOW ? question.logLow[i] : question.logHigh[i];
      } else {
        free++;
        z[i] = Math.min(Math.max(start[i], question.logLow[i]), question.logHigh[i]);
      }
    }
    if (free == 0) {
      return corner();
    }
    FreeMix.Outcome outcome = inner.solve(question, fixed, z);
    if (outcome == FreeMix.Outcome.FOUND) {
      technology.logGradient(z, elasticities);
      logMultiplier = multiplier();
    }
    return outcome;
  }

  /** ln μ from the sum of the conditions of the free inputs: Σ w_i x_i = μ Σ e_i. */
  private double multiplier() {
    double cost = 0;
    double sum = 0;
    for (int i = 0; i < n; i++) {
      if (!fixed[i]) {
        cost += question.asked.price(i) * Math.exp(z[i]);
        sum += elasticities[i];
      }
    }
    return Math.log(cost / sum);
  }

  /** All inputs at limits: the target is met exactly, or limits have to be released. */
  private FreeMix.Outcome corner() {
    double excess = technology.logOutput(z) - question.logTarget;
    if (excess > SIGN) {
      return FreeMix.Outcome.TOO_MUCH;
    }
    if (!(excess > -SIGN)) {
      return FreeMix.Outcome.TOO_LITTLE;
    }
    technology.logGradient(z, elasticities);
    // What more output would cost: the cheapest of the inputs that can still be raised.
    logMultiplier = Double.POSITIVE_INFINITY;
    for (int i = 0; i < n; i++) {
      if (at[i] == LOW && elasticities[i] > 0) {
        logMultiplier =
            Math.min(logMultiplier, question.logPrice[i] + z[i] - Math.log(elasticities[i]));
      }
    }
    return FreeMix.Outcome.FOUND;
  }

  /** Changes what offends, all or only the first; returns how many were changed. */
  private int revise(boolean one) {
    int changes = 0;
    for (int i = 0; i < n && !(one && changes > 0); i++) {
      byte now = revised(i);
      if (now != at[i]) {
        at[i] = now;
        changes++;
      }
    }
    return changes;
  }

  private byte revised(int i) {
    return switch (at[i]) {
      case FREE -> z[i] > question.logHigh[i] ? HIGH : z[i] < question.logLow[i] ? LOW : FREE;
      case LOW -> residual(i) < -SIGN ? FREE : LOW;
      case HIGH -> residual(i) > SIGN ? FREE : HIGH;
      default -> at[i];
    };
  }

  /** ln(w_i x_i) − ln(μ e_i): positive where the input costs more than it is worth. */
  private double residual(int i) {
    if (!(elasticities[i] > 0)) {
      return Double.POSITIVE_INFINITY;
    }
    return question.logPrice[i] + z[i] - logMultiplier - Math.log(elasticities[i]);
  }

  private boolean release(byte side) {
    boolean any = false;
    for (int i = 0; i < n; i++) {
      if (at[i] == side) {
        at[i] = FREE;
        any = true;
      }
    }
    return any;
  }

  /** Tries every pattern of limits until one meets all conditions. */
  private FreeMix.Outcome everyPattern() {
    byte[][] choices = new byte[n][];
    long patterns = 1;
    for (int i = 0; i < n; i++) {
      boolean low = question.asked.low(i) > 0;
      choices[i] =
          question.asked.held(i)
              ? new byte[] {HELD}
              : low && question.capped(i)
                  ? new byte[] {FREE, LOW, HIGH}
                  : low
                      ? new byte[] {FREE, LOW}
                      : question.capped(i) ? new byte[] {FREE, HIGH} : new byte[] {FREE};
      patterns = Math.min(patterns * choices[i].length, PATTERNS + 1L);
    }
    if (patterns > PATTERNS) {
      return FreeMix.Outcome.NOT_FOUND;
    }
    for (long pattern = 0; pattern < patterns; pattern++) {
      long rest = pattern;
      for (int i = 0; i < n; i++) {
        at[i] = choices[i][(int) (rest % choices[i].length)];
        rest /= choices[i].length;
      }
      if (solve() == FreeMix.Outcome.FOUND && revise(true) == 0) {
        return FreeMix.Outcome.FOUND;
      }
    }
    return FreeMix.Outcome.NOT_FOUND;
  }
}
