package isowright.review;

import java.util.function.DoubleUnaryOperator;

/**
 * Where does a monotone function of the log of something cross zero, going out from where the thing
 * is now? Steps that double until the sign changes, a bound is met or the function has no value;
 * then false position with the Illinois rule, halving where that is slow.
 *
 * <p>Source: Dowell, M. and Jarratt, P. (1971), A modified regula falsi method for computing the
 * root of an equation, <i>BIT</i> 11, 168–174. Tested in {@code LogRootTest}.
 *
 * @param state how the search ended
 * @param at the root; where there is none, the last place at which the function has a value
 * @param value the function there
 */
record LogRoot(State state, double at, double value) {

  /** How a search ended. */
  enum State {
    /** The root. */
    FOUND,
    /** No sign change up to the bound. */
    BOUND,
    /** Beyond the last place the function has no value. */
    NO_VALUE
  }

  private static final double FIRST_STEP = 0.05;

  /** A root this near, in logs, is the root to every printed digit. */
  private static final double NEAR = 1e-12;

  private static final int HALVINGS = 12;
  private static final int ITERATIONS = 200;

  /**
   * Searches in one direction.
   *
   * @param function a function of the log; NaN where it has no value
   * @param start the log from which the search goes out; the function must have a value there
   * @param bound the log at which it ends
   */
  static LogRoot from(DoubleUnaryOperator function, double start, double bound) {
    return from(function, start, function.applyAsDouble(start), bound, FIRST_STEP);
  }

  /**
   * The same where something is known already.
   *
   * @param value the function at the start
   * @param firstStep by how much to go out first
   */
  static LogRoot from(
      DoubleUnaryOperator function, double start, double value, double bound, double firstStep) {
    double at = start;
    if (value == 0 || Double.isNaN(value)) {
      return new LogRoot(value == 0 ? State.FOUND : State.NO_VALUE, at, value);
    }
    double direction = Math.signum(bound - start);
    double step = Math.max(FIRST_STEP, firstStep);
    int halvings = 0;
    while (at != bound) {
      double next = at + direction * step;
      if ((bound - next) * direction < 0) {
        next = bound;
      }
      double there = function.applyAsDouble(next);
      if (Double.isNaN(there)) {
        if (++halvings > HALVINGS) {
          return new LogRoot(State.NO_VALUE, at, value);
        }
        step /= 2;
        continue;
      }
      if (there == 0) {
        return new LogRoot(State.FOUND, next, 0);
      }
      if (Math.signum(there) != Math.signum(value)) {
        return within(function, at, value, next, there);
      }
      at = next;
      value = there;
      step = halvings == 0 ? 2 * step : step;
    }
    return new LogRoot(State.BOUND, at, value);
  }

  private static LogRoot within(
      DoubleUnaryOperator function, double a, double atA, double b, double atB) {
    double left = a;
    double right = b;
    double atLeft = atA;
    double atRight = atB;
    int side = 0;
    double middle = left;
    double value = atLeft;
    for (int k = 0; k < ITERATIONS && Math.abs(right - left) > NEAR; k++) {
      boolean slow = k % 8 == 7;
      middle = slow ? 0.5 * (left + right) : (left * atRight - right * atLeft) / (atRight - atLeft);
      value = function.applyAsDouble(middle);
      if (Double.isNaN(value)) {
        return new LogRoot(State.NO_VALUE, left, atLeft);
      }
      if (Math.abs(value) <= NEAR) {
        return new LogRoot(State.FOUND, middle, value);
      }
      if (Math.signum(value) == Math.signum(atRight)) {
        right = middle;
        atRight = value;
        atLeft = side == -1 ? atLeft / 2 : atLeft;
        side = -1;
      } else {
        left = middle;
        atLeft = value;
        atRight = side == 1 ? atRight / 2 : atRight;
        side = 1;
      }
    }
    return new LogRoot(State.FOUND, middle, value);
  }
}
