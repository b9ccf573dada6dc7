package isowright.regression;

/**
 * Residuals y − Xβ of a block in twice the working precision, and exact-product sums over them:
 * what lets one step of refinement recover the digits that an ill-conditioned design loses.
 *
 * <p>A product x·b is split into its rounded value and its exact error by a fused multiply-add, a
 * sum by the two-sum of Knuth. Source: T. Ogita, S. M. Rump and S. Oishi, "Accurate sum and dot
 * product", SIAM Journal on Scientific Computing 26 (2005), algorithms 3.1 and 5.3.
 */
final class Residuals {

  private final double[] high;
  private final double[] low;

  Residuals(int longest) {
    this.high = new double[longest];
    this.low = new double[longest];
  }

  /**
   * The residuals of the first {@code rows} rows of a filled block, valid until the next call.
   *
   * @param block K regressors and the response
   */
  double[] of(double[][] block, int rows, double[] coefficients) {
    int columns = coefficients.length;
    System.arraycopy(block[columns], 0, high, 0, rows);
    for (int i = 0; i < rows; i++) {
      low[i] = 0;
    }
    for (int k = 0; k < columns; k++) {
      if (coefficients[k] != 0) {
        subtract(block[k], coefficients[k], rows);
      }
    }
    for (int i = 0; i < rows; i++) {
      high[i] += low[i];
    }
    return high;
  }

  private void subtract(double[] x, double b, int rows) {
    double minus = -b;
    for (int i = 0; i < rows; i++) {
      double product = minus * x[i];
      double error = Math.fma(minus, x[i], -product);
      double before = high[i];
      double sum = before + product;
      double virtual = sum - before;
      double rounding = (before - (sum - virtual)) + (product - virtual);
      high[i] = sum;
      low[i] += rounding + error;
    }
  }

  /** A sum kept in two parts. */
  static final class Sum {
    private double high;
    private double low;

    /** Adds Σ a_i b_i over the first rows. */
    void addProducts(double[] a, double[] b, int rows) {
      double h = high;
      double l = low;
      for (int i = 0; i < rows; i++) {
        double product = a[i] * b[i];
        double error = Math.fma(a[i], b[i], -product);
        double sum = h + product;
        double virtual = sum - h;
        l += (h - (sum - virtual)) + (product - virtual) + error;
        h = sum;
      }
      high = h;
      low = l;
    }

    void add(Sum other) {
      double sum = high + other.high;
      double virtual = sum - high;
      low += (high - (sum - virtual)) + (other.high - virtual) + other.low;
      high = sum;
    }

    double value() {
      return high + low;
    }
  }
}
