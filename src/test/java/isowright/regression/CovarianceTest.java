package isowright.regression;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.Arrays;
import java.util.List;
import java.util.SplittableRandom;
import org.apache.commons.math3.linear.Array2DRowRealMatrix;
import org.apache.commons.math3.linear.LUDecomposition;
import org.apache.commons.math3.linear.RealMatrix;
import org.junit.jupiter.api.Test;

class CovarianceTest {

  /** Against dense formulas with an explicit inverse of cross-products, condition about 1e4. */
  private static final double ROUNDING = 1e-9;

  private static final List<Covariance.Kind> WITHOUT_TIMES =
      Arrays.stream(Covariance.Kind.values()).filter(kind -> !kind.needsTimes()).toList();

  @Test
  void agreesWithTheFormulasWrittenOutDensely() {
    SplittableRandom random = new SplittableRandom(31);
    for (int trial = 0; trial < 20; trial++) {
      ArrayDesign design =
          RandomDesigns.grouped(random, 60 + random.nextInt(300), 2 + random.nextInt(4), 7);
      for (Covariance.Kind kind : WITHOUT_TIMES) {
        LinearFit fit = LeastSquares.fit(design);
        assertSame(Covariance.estimate(design, fit, kind).matrix(), dense(design, fit, kind));
      }
    }
  }

  @Test
  void blocksAddUpOnLongDesigns() {
    ArrayDesign design = RandomDesigns.grouped(new SplittableRandom(32), 9000, 3, 5);
    LinearFit fit = LeastSquares.fit(design);
    for (Covariance.Kind kind : List.of(Covariance.Kind.HC3, Covariance.Kind.CLUSTERED)) {
      assertSame(Covariance.estimate(design, fit, kind).matrix(), dense(design, fit, kind));
    }
  }

  @Test
  void wordsStateEstimatorFactorAndFreedom() {
    ArrayDesign design =
        ArrayDesign.of(
            List.of("one", "x"),
            new double[][] {{1, 1, 1, 1, 1, 1}, {1, 2, 3, 4, 5, 7}},
            new double[] {1, 3, 2, 5, 4, 8},
            Groups.startingAt(6, new int[] {0, 2, 4}));
    LinearFit fit = LeastSquares.fit(design);
    assertThat(Covariance.estimate(design, fit, Covariance.Kind.CLASSICAL).words())
        .isEqualTo(
            "Classical covariance (equal variance, independent rows): SSR/N times the factor"
                + " N/(N − K) = 6/4; t with 4 degrees of freedom.");
    assertThat(Covariance.estimate(design, fit, Covariance.Kind.HC1).words())
        .isEqualTo(
            "Heteroskedasticity-consistent covariance HC1: factor N/(N − K) = 6/4; t with 4"
                + " degrees of freedom.");
    assertThat(Covariance.estimate(design, fit, Covariance.Kind.HC3).words())
        .isEqualTo(
            "Heteroskedasticity-consistent covariance HC3: residuals divided by one minus their"
                + " leverage, no further factor; t with 4 degrees of freedom.");
    Covariance clustered = Covariance.estimate(design, fit, Covariance.Kind.CLUSTERED);
    assertThat(clustered.words())
        .isEqualTo(
            "Covariance clustered by group (CR1): factor G/(G − 1) · (N − 1)/(N − K) = 3/2 · 5/4 ="
                + " 1.87500; t with 2 degrees of freedom.");
    assertThat(clustered.clusters()).hasValue(3);
    assertThat(clustered.factor()).isEqualTo(1.875);
    Design within = Effects.within(design);
    assertThat(
            Covariance.estimate(within, LeastSquares.fit(within), Covariance.Kind.CLUSTERED)
                .words())
        .contains("5/5 = 1.50000, group effects not counted in K;");
  }

  @Test
  void oneClusterGivesNoEstimate() {
    ArrayDesign design =
        ArrayDesign.of(
            List.of("one"),
            new double[][] {{1, 1, 1}},
            new double[] {1, 2, 4},
            Groups.startingAt(3, new int[] {0}));
    Covariance none =
        Covariance.estimate(design, LeastSquares.fit(design), Covariance.Kind.CLUSTERED);
    assertThat(none.standardError(0)).isNaN();
    assertThat(none.degreesOfFreedom()).isZero();
    assertThat(none.words()).contains("no degrees of freedom are left");
  }

  @Test
  void rowsOfLeverageOneAreSaid() {
    double[][] x = {{1, 1, 1, 1}, {0, 0, 0, 1}};
    ArrayDesign design = ArrayDesign.of(List.of("one", "only"), x, new double[] {1, 2, 4, 9});
    Covariance third = Covariance.estimate(design, LeastSquares.fit(design), Covariance.Kind.HC3);
    assertThat(third.words()).contains("1 row has leverage one");
    // The other three rows estimate a mean: Σ r²/(1 − 1/3)² / 9, residuals −4/3, −1/3, 5/3.
    assertThat(third.matrix()[0][0]).isCloseTo((16 + 1 + 25) / 9.0 / (4 / 9.0) / 9, within(1e-14));
  }

  static double[][] dense(Design design, LinearFit fit, Covariance.Kind kind) {
    double[][] rows = RandomDesigns.rows(design);
    int columns = rows.length - 1;
    int n = rows[0].length;
    RealMatrix x = new Array2DRowRealMatrix(n, columns);
    double[] r = new double[n];
    for (int i = 0; i < n; i++) {
      r[i] = rows[columns][i];
      for (int k = 0; k < columns; k++) {
        x.setEntry(i, k, rows[k][i]);
        r[i] -= rows[k][i] * fit.coefficients()[k];
      }
    }
    RealMatrix inverse = new LUDecomposition(x.transpose().multiply(x)).getSolver().getInverse();
    RealMatrix middle = new Array2DRowRealMatrix(columns, columns);
    Groups groups = kind == Covariance.Kind.CLUSTERED ? design.groups() : Groups.ofSingleRows(n);
    double ssr = 0;
    for (int g = 0; g < groups.count(); g++) {
      double[] u = new double[columns];
      for (int i = groups.start(g); i < groups.end(g); i++) {
        double h = dot(inverse.operate(x.getRow(i)), x.getRow(i));
        double weight = kind == Covariance.Kind.HC3 ? r[i] / (1 - h) : r[i];
        ssr += r[i] * r[i];
        for (int k = 0; k < columns; k++) {
          u[k] += weight * x.getEntry(i, k);
        }
      }
      for (int k = 0; k < columns; k++) {
        for (int l = 0; l < columns; l++) {
          middle.addToEntry(k, l, u[k] * u[l]);
        }
      }
    }
    double count = groups.count();
    return switch (kind) {
      case CLASSICAL -> inverse.scalarMultiply(ssr / (n - columns)).getData();
      case HC1 ->
          inverse
              .multiply(middle)
              .multiply(inverse)
              .scalarMultiply(n / (double) (n - columns))
              .getData();
      case HC3 -> inverse.multiply(middle).multiply(inverse).getData();
      case CLUSTERED ->
          inverse
              .multiply(middle)
              .multiply(inverse)
              .scalarMultiply(count / (count - 1) * (n - 1) / (n - columns))
              .getData();
      default -> throw new IllegalArgumentException(kind + " is tested elsewhere");
    };
  }

  private static double dot(double[] a, double[] b) {
    double sum = 0;
    for (int k = 0; k < a.length; k++) {
      sum += a[k] * b[k];
    }
    return sum;
  }

  private static void assertSame(double[][] actual, double[][] expected) {
    for (int k = 0; k < expected.length; k++) {
      for (int l = 0; l < expected.length; l++) {
        double size = Math.sqrt(expected[k][k] * expected[l][l]);
        assertThat(actual[k][l]).isCloseTo(expected[k][l], within(ROUNDING * size));
        assertThat(actual[k][l]).isEqualTo(actual[l][k]);
      }
    }
  }
}
