package isowright.inference;

import isowright.estimation.Estimator;
import isowright.estimation.Fit;
import isowright.estimation.Solution;
import isowright.estimation.Specification.RegularityImposed;
import isowright.regression.ColumnMoments;
import isowright.regression.DerivedColumns;
import isowright.regression.Design;
import isowright.regression.LeastSquares;
import isowright.technology.LinearForm;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/**
 * Does a fit describe its rows as it claims? Tests of the specification: RESET, heteroskedasticity
 * after Breusch and Pagan and after White, normality after Jarque and Bera. The first three are
 * made of forms linear in their parameters.
 *
 * <p>RESET adds the square and the cube of the fitted value to the regressors and asks whether they
 * help, with the assumption about errors that the fit makes (see {@link AddedTerms}). Where plant
 * effects were removed, the fitted value is that of the regressors alone, without the plant's
 * constant (which a few periods estimate, so that its powers would carry its error), and plant
 * effects are removed from its powers in turn.
 *
 * <p>Jarque-Bera: N/6 (S² + (K − 3)²/4) for skewness S and kurtosis K of the residuals, chi-squared
 * with two degrees of freedom in large samples; rows are taken as independent. Residuals from which
 * effects were removed are first divided by √(1 − 1/T), T the rows of the plant.
 *
 * <p>Sources: J. B. Ramsey 1969, Journal of the Royal Statistical Society B 31, 350–371; C. M.
 * Jarque and A. K. Bera 1987, International Statistical Review 55, 163–172; for the other two see
 * {@link Heteroskedasticity}. Tested in {@code SpecificationTestsTest} against R, and for size in
 * {@code SpecificationSizeTest}.
 */
public final class SpecificationTests {

  /** The names of the tests. */
  public static final List<String> NAMES =
      List.of("reset", "breusch-pagan", "white", "jarque-bera");

  /** With fewer rows no test of normality is made: common practice asks for more still. */
  private static final int FEWEST_ROWS = 8;

  private static final double NO_ROOM = 1e-10;

  private final Fit fit;
  private final Solution numbers;

  private SpecificationTests(Fit fit) {
    this.fit = fit;
    this.numbers = fit.numbers();
  }

  /**
   * The tests of a usable fit; none where the residuals are not those of least squares free of
   * constraints (other estimators, regularity imposed).
   */
  public static List<Verdict> of(Fit fit) {
    SpecificationTests tests = new SpecificationTests(fit);
    List<Verdict> verdicts = new ArrayList<>();
    if (!(fit.specification().estimator() instanceof Estimator.LeastSquares)
        || fit.specification().regularity() != RegularityImposed.FREE) {
      return verdicts;
    }
    if (fit.specification().form() instanceof LinearForm) {
      verdicts.add(tests.reset());
      verdicts.addAll(Heteroskedasticity.of(fit));
    }
    tests.normality().ifPresent(verdicts::add);
    return List.copyOf(verdicts);
  }

  private Verdict reset() {
    Design design = numbers.design();
    Design before = design.before();
    int own = before.columns().size();
    double[] coefficients = numbers.linear().coefficients();
    Index index = Index.of(before, coefficients);
    List<String> columns = new ArrayList<>(before.columns());
    columns.add("fitted squared");
    columns.add("fitted cubed");
    Design powers =
        DerivedColumns.of(
            before,
            columns,
            (from, to, regressors, into) -> {
              for (int k = 0; k < own; k++) {
                System.arraycopy(regressors[k], 0, into[k], 0, to - from);
              }
              index.fill(regressors, to - from, into[own]);
              for (int i = 0; i < to - from; i++) {
                double value = into[own][i];
                into[own][i] = value * value;
                into[own + 1][i] = value * value * value;
              }
            });
    AddedTerms added =
        AddedTerms.of(
            fit, AddedTerms.Narrow.of(design, numbers.linear()), design.likewise(powers), own);
    return Verdict.of(
        "reset",
        "the form is rich enough: the square and the cube of the fitted value add nothing",
        added.statistic(),
        added.law());
  }

  private Optional<Verdict> normality() {
    Design design = numbers.design();
    double[] residuals = LeastSquares.residuals(design, numbers.linear());
    // With two rows a plant, residuals come in pairs of opposite sign and have no skewness at all.
    boolean pairs = 2 * design.absorbed() >= residuals.length;
    if (pairs || residuals.length < FEWEST_ROWS) {
      return Optional.empty();
    }
    int count = 0;
    for (int r = 0; r < residuals.length; r++) {
      double room = 1 - design.absorbedLeverage(r);
      if (room > NO_ROOM) {
        residuals[count++] = residuals[r] / Math.sqrt(room);
      }
    }
    return Optional.of(
        Verdict.of(
            "jarque-bera",
            "the errors follow a normal law, rows being taken as independent",
            jarqueBera(residuals, count),
            new Law.ChiSquared(2)));
  }

  /** N/6 (S² + (K − 3)²/4) of the first {@code count} values. */
  static double jarqueBera(double[] values, int count) {
    double mean = 0;
    for (int i = 0; i < count; i++) {
      mean += values[i] / count;
    }
    double second = 0;
    double third = 0;
    double fourth = 0;
    for (int i = 0; i < count; i++) {
      double d = values[i] - mean;
      second += d * d / count;
      third += d * d * d / count;
      fourth += d * d * d * d / count;
    }
    double skewness = third / Math.pow(second, 1.5);
    double kurtosis = fourth / (second * second);
    return count / 6.0 * (skewness * skewness + (kurtosis - 3) * (kurtosis - 3) / 4);
  }

  /**
   * The fitted value Σ_k b_k x_k, less its mean and divided by its spread, so that powers of it
   * stay apart from one another; with a constant and the regressors the powers span the same space.
   */
  record Index(double[] coefficients, double mean, double spread) {

    static Index of(Design design, double[] coefficients) {
      Design alone =
          DerivedColumns.of(
              design,
              List.of("fitted"),
              (from, to, regressors, into) ->
                  new Index(coefficients, 0, 1).fill(regressors, to - from, into[0]));
      ColumnMoments moments = ColumnMoments.of(alone);
      double spread = moments.spreads()[0];
      return new Index(coefficients, moments.means()[0], spread > 0 ? spread : 1);
    }

    void fill(double[][] regressors, int rows, double[] into) {
      for (int i = 0; i < rows; i++) {
        double sum = 0;
        for (int k = 0; k < coefficients.length; k++) {
          sum += coefficients[k] * regressors[k][i];
        }
        into[i] = (sum - mean) / spread;
      }
    }
  }
}
