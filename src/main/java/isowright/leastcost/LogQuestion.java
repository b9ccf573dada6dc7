package isowright.leastcost;

/**
 * A question in logs. Shapes: n; arrays are shared within the package and not modified after
 * construction.
 */
final class LogQuestion {

  final Question asked;
  final int n;
  final double logTarget;
  final double[] logPrice;
  final double[] logLow;
  final double[] logHigh;

  LogQuestion(Question asked) {
    this.asked = asked;
    n = asked.dimension();
    logTarget = Math.log(asked.target());
    logPrice = new double[n];
    logLow = new double[n];
    logHigh = new double[n];
    for (int i = 0; i < n; i++) {
      logPrice[i] = Math.log(asked.price(i));
      logLow[i] = Math.log(asked.low(i));
      logHigh[i] = Math.log(asked.high(i));
    }
  }

  /** Whether any input is held or has a limit. */
  static boolean limited(Question asked) {
    for (int i = 0; i < asked.dimension(); i++) {
      if (asked.low(i) > 0 || asked.high(i) < Double.POSITIVE_INFINITY) {
        return true;
      }
    }
    return false;
  }

  boolean capped(int i) {
    return logHigh[i] < Double.POSITIVE_INFINITY;
  }

  /** Whether every input has a finite upper limit or is held. */
  boolean allCapped() {
    for (int i = 0; i < n; i++) {
      if (!capped(i)) {
        return false;
      }
    }
    return true;
  }

  /** Whether every input has a positive lower limit or is held. */
  boolean allFloored() {
    for (int i = 0; i < n; i++) {
      if (!(asked.low(i) > 0)) {
        return false;
      }
    }
    return true;
  }
}
