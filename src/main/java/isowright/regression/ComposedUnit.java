package isowright.regression;

/**
 * What one unit of {@link ComposedErrors} adds to the log-likelihood, as a function F of its sums
 * S₁ = Σ g ε and S₂ = Σ g² and of s = ln σ_v and r = ln σ_w. First and second derivatives, without
 * those of −½ Σ ε²/σ_v², follow from those of A, B and q = B/√A by the chain rule, one loop over
 * the four variables.
 */
final class ComposedUnit {

  /** The order of the variables: S₁, S₂, s, r. */
  static final int SUM = 0;

  static final int SQUARES = 1;
  static final int NOISE = 2;
  static final int SCALE = 3;
  private static final int VARIABLES = 4;

  private static final double LOG_TWO_PI = Math.log(2 * Math.PI);

  private final OneSidedLaw law;
  private final double s;
  private final double r;
  private final double noisePrecision;
  private final double scalePrecision;
  private final double rate;

  private double a;
  private double b;
  private double q;
  private double excess;
  final double[] first = new double[VARIABLES];
  final double[][] second = new double[VARIABLES][VARIABLES];

  /**
   * @param s ln σ_v
   * @param r ln σ_w
   */
  ComposedUnit(OneSidedLaw law, double s, double r) {
    this.law = law;
    this.s = s;
    this.r = r;
    boolean halfNormal = law == OneSidedLaw.HALF_NORMAL;
    this.noisePrecision = Math.exp(-2 * s);
    this.scalePrecision = halfNormal ? Math.exp(-2 * r) : 0;
    this.rate = halfNormal ? 0 : Math.exp(-r);
  }

  /** Places the unit. */
  void place(double sum, double squares) {
    a = squares * noisePrecision + scalePrecision;
    b = -sum * noisePrecision - rate;
    q = b / Math.sqrt(a);
  }

  /**
   * Places the unit; its part of the log-likelihood, −½ Σ ε²/σ_v² included.
   *
   * @param apart Σ (ε − g S₁/S₂)², what the rows differ by; zero with one row
   */
  double value(int rows, double sum, double squares, double apart) {
    place(sum, squares);
    double constant = law == OneSidedLaw.HALF_NORMAL ? Math.log(2) : 0.5 * LOG_TWO_PI;
    return -0.5 * rows * LOG_TWO_PI
        - rows * s
        - r
        + constant
        - 0.5 * Math.log(a)
        - 0.5 * apart * noisePrecision
        + together(sum, squares);
  }

  /**
   * ½ q² + ln Φ(q) − ½ S₁²/(S₂ σ_v²). As the noise goes to zero both squares grow beyond what a
   * double holds of their difference, so it is written out: −½ S₁²/S₂ · σ_v⁻² σ_w⁻²/A for the
   * half-normal law, S₁/(S₂ σ_w) + ½ σ_v²/(S₂ σ_w²) for the exponential one.
   */
  private double together(double sum, double squares) {
    if (NormalTail.far(q)) {
      return NormalTail.logScaled(q) - 0.5 * sum * sum / squares * noisePrecision;
    }
    double rest =
        law == OneSidedLaw.HALF_NORMAL
            ? -0.5 * sum * sum / squares * noisePrecision * (scalePrecision / a)
            : rate / squares * (sum + 0.5 * rate / noisePrecision);
    return NormalTail.logProbability(q) + rest;
  }

  /** The mean of the normal law that, cut off at zero, is that of w given the rows. */
  double mean() {
    return b / a;
  }

  /** Its standard deviation. */
  double deviation() {
    return 1 / Math.sqrt(a);
  }

  /** Works out {@link #first} and {@link #second} where the unit was placed last. */
  void derive(int rows, double sum, double squares) {
    double[] da = {
      0, noisePrecision, -2 * squares * noisePrecision, -2 * scalePrecision,
    };
    double[] db = {-noisePrecision, 0, 2 * sum * noisePrecision, rate};
    double root = 1 / Math.sqrt(a);
    excess = NormalTail.excess(q);
    double bend = NormalTail.curvature(q);
    double[] dq = new double[VARIABLES];
    for (int x = 0; x < VARIABLES; x++) {
      dq[x] = root * (db[x] - 0.5 * b / a * da[x]);
      first[x] = -0.5 * da[x] / a + excess * dq[x];
    }
    first[NOISE] -= rows;
    first[SCALE] -= 1;
    for (int x = 0; x < VARIABLES; x++) {
      for (int y = 0; y <= x; y++) {
        double daa = secondOfA(x, y, squares);
        double dqq =
            root
                * (secondOfB(x, y, sum)
                    - 0.5 / a * (db[x] * da[y] + db[y] * da[x])
                    - 0.5 * b / a * daa
                    + 0.75 * b / (a * a) * da[x] * da[y]);
        second[x][y] =
            -0.5 * (daa / a - da[x] * da[y] / (a * a)) + bend * dq[x] * dq[y] + excess * dqq;
        second[y][x] = second[x][y];
      }
    }
  }

  private double secondOfA(int x, int y, double squares) {
    if (x == NOISE) {
      return y == NOISE ? 4 * squares * noisePrecision : y == SQUARES ? -2 * noisePrecision : 0;
    }
    return x == SCALE && y == SCALE ? 4 * scalePrecision : 0;
  }

  private double secondOfB(int x, int y, double sum) {
    if (x == NOISE) {
      return y == NOISE ? -4 * sum * noisePrecision : y == SUM ? 2 * noisePrecision : 0;
    }
    return x == SCALE && y == SCALE ? -rate : 0;
  }
}
