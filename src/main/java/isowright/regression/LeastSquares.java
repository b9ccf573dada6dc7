package isowright.regression;

import java.util.Locale;

/**
 * Linear least squares: which coefficients β make Σ (y − Xβ)² least?
 *
 * <p>The design is read twice. The first reading reduces it to the triangular factor R of [X y]
 * ({@link OrthogonalDecomposition}); R decides the rank and gives β = R⁻¹Q′y. The second computes
 * the residuals in twice the working precision and corrects β by (R′R)⁻¹X′(y − Xβ), one step of
 * iterative refinement. Nothing of the size of the data is stored.
 *
 * <p>Fewer rows than columns, or columns that depend on others, are not errors: the columns that
 * the rows cannot tell apart are dropped and named in the fit.
 *
 * <p>Source: Å. Björck, <i>Numerical Methods for Least Squares Problems</i>, 1996, sections 2.4 and
 * 6.6 (corrected semi-normal equations). Tested with certified values in {@code NistTest}.
 */
public final class LeastSquares {

  private LeastSquares() {}

  /** Fits with {@link RankRule#STANDARD}. */
  public static LinearFit fit(Design design) {
    return fit(design, RankRule.STANDARD);
  }

  /**
   * Fits with a rank rule.
   *
   * @throws IllegalArgumentException if a value is not finite; says which
   */
  public static LinearFit fit(Design design, RankRule rule) {
    Blocks blocks = Blocks.of(design.groups());
    Reading first = Reading.of(design, blocks);
    if (!first.finite()) {
      throw new IllegalArgumentException(firstNotFinite(design, blocks));
    }
    RankAnalysis analysis = first.analysis(design.columns(), rule);
    double[] coefficients = analysis.coefficients();
    SecondReading second = SecondReading.of(design, blocks, coefficients);
    double[] fall = new double[1];
    double[] correction = analysis.correction(second.products(), fall);
    for (int k = 0; k < coefficients.length; k++) {
      coefficients[k] += correction[k];
    }
    double ssr = Math.max(0, second.sumOfSquares() - fall[0]);
    return fit(design, analysis, rule, coefficients, ssr, first.responseSumOfSquares());
  }

  /** The record of a fit with these coefficients. */
  static LinearFit fit(
      Design design,
      RankAnalysis analysis,
      RankRule rule,
      double[] coefficients,
      double ssr,
      double totalSumOfSquares) {
    return new LinearFit(
        design.columns(),
        coefficients,
        analysis.estimated(),
        analysis.inverseFactor(),
        ssr,
        totalSumOfSquares,
        design.rows(),
        design.absorbed(),
        analysis.rank(),
        analysis.collinearities(),
        rule,
        analysis.pivots());
  }

  /** The residuals y − Xβ of a fit, row by row; shape N. */
  public static double[] residuals(Design design, LinearFit fit) {
    Blocks blocks = Blocks.of(design.groups());
    double[] coefficients = fit.coefficients();
    double[] all = new double[design.rows()];
    blocks.gather(
        coefficients.length + 1,
        () -> new Residuals(blocks.longest()),
        (residuals, from, to, buffer) -> {
          design.fill(from, to, buffer);
          double[] some = residuals.of(buffer, to - from, coefficients);
          System.arraycopy(some, 0, all, from, to - from);
        },
        (a, b) -> {});
    return all;
  }

  private static String firstNotFinite(Design design, Blocks blocks) {
    int size = design.columns().size() + 1;
    double[][] buffer = new double[size][blocks.longest()];
    for (int b = 0; b < blocks.count(); b++) {
      int from = blocks.start(b);
      int to = blocks.end(b);
      design.fill(from, to, buffer);
      for (int i = 0; i < to - from; i++) {
        for (int k = 0; k < size; k++) {
          if (!Double.isFinite(buffer[k][i])) {
            String column = k < size - 1 ? "column " + design.columns().get(k) : "the response";
            return String.format(
                Locale.ROOT,
                "%s is %s at row %d (the first row is 0); every value must be finite",
                column,
                buffer[k][i],
                from + i);
          }
        }
      }
    }
    return "the squares of the values are too large for a number; divide the columns by a constant";
  }

  /** What the second reading gathers: X′r and r′r in twice the working precision. */
  private static final class SecondReading {
    private final Residuals residuals;
    private final Residuals.Sum[] products;
    private final Residuals.Sum squares = new Residuals.Sum();

    SecondReading(int columns, int longest) {
      residuals = new Residuals(longest);
      products = new Residuals.Sum[columns];
      for (int k = 0; k < columns; k++) {
        products[k] = new Residuals.Sum();
      }
    }

    static SecondReading of(Design design, Blocks blocks, double[] coefficients) {
      int columns = coefficients.length;
      return blocks.gather(
          columns + 1,
          () -> new SecondReading(columns, blocks.longest()),
          (reading, from, to, buffer) -> {
            design.fill(from, to, buffer);
            double[] r = reading.residuals.of(buffer, to - from, coefficients);
            for (int k = 0; k < columns; k++) {
              reading.products[k].addProducts(buffer[k], r, to - from);
            }
            reading.squares.addProducts(r, r, to - from);
          },
          SecondReading::add);
    }

    void add(SecondReading other) {
      for (int k = 0; k < products.length; k++) {
        products[k].add(other.products[k]);
      }
      squares.add(other.squares);
    }

    double[] products() {
      double[] values = new double[products.length];
      for (int k = 0; k < values.length; k++) {
        values[k] = products[k].value();
      }
      return values;
    }

    double sumOfSquares() {
      return squares.value();
    }
  }
}
