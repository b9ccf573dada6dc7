package isowright.regression;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import isowright.regression.EquationSystem.Equation;
import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.Test;

/** Wald tests of systems against what algebra says they are. */
class SystemRestrictionsTest {

  private static final int ROWS = 90;

  /** Columns one, x, z, first response; second response last. */
  private static Design design() {
    Random random = new Random(61);
    double[][] columns = new double[4][ROWS];
    double[] last = new double[ROWS];
    for (int r = 0; r < ROWS; r++) {
      columns[0][r] = 1;
      columns[1][r] = random.nextGaussian();
      columns[2][r] = random.nextGaussian();
      double shared = random.nextGaussian();
      columns[3][r] = 1 + 0.5 * columns[1][r] + 0.2 * columns[2][r] + shared;
      last[r] = 2 + 0.3 * columns[1][r] - columns[2][r] + shared + random.nextGaussian();
    }
    return ArrayDesign.of(List.of("one", "x", "z", "first"), columns, last);
  }

  private static Equation equation(String name, int explained, int first, int... columns) {
    double[] offsets = new double[5];
    offsets[explained] = 1;
    double[][] load = new double[5][6];
    for (int k = 0; k < columns.length; k++) {
      load[columns[k]][first + k] = 1;
    }
    return new Equation(name, offsets, load, false);
  }

  private static EquationSystem wide() {
    return new EquationSystem(
        List.of("a0", "ax", "az", "b0", "bx", "bz"),
        List.of(equation("a", 3, 0, 0, 1, 2), equation("b", 4, 3, 0, 1, 2)));
  }

  /** ax = bz + 0.7 and az = 0: parameters a0, bz, b0, bx. */
  private static EquationSystem narrow() {
    double[] oa = {0, -0.7, 0, 1, 0};
    double[][] la = new double[5][4];
    la[0][0] = 1;
    la[1][1] = 1;
    double[] ob = {0, 0, 0, 0, 1};
    double[][] lb = new double[5][4];
    lb[0][2] = 1;
    lb[1][3] = 1;
    lb[2][1] = 1;
    return new EquationSystem(
        List.of("a0", "bz", "b0", "bx"),
        List.of(new Equation("a", oa, la, false), new Equation("b", ob, lb, false)));
  }

  /** The same restrictions written out by hand: (ax − bz − 0.7, az). */
  @Test
  void restrictionsAreThoseWrittenOut() {
    Design design = design();
    SystemFit fit = SeeminglyUnrelated.fit(design, wide());
    double[][] v = SystemCovariance.clustered(design, fit).matrix();
    WaldTest test = SystemRestrictions.test(fit, v, 89, narrow());
    double[] t = fit.coefficients();
    double r0 = t[1] - t[5] - 0.7;
    double r1 = t[2];
    double v00 = v[1][1] - 2 * v[1][5] + v[5][5];
    double v01 = v[1][2] - v[5][2];
    double v11 = v[2][2];
    double det = v00 * v11 - v01 * v01;
    double f = (r0 * r0 * v11 - 2 * r0 * r1 * v01 + r1 * r1 * v00) / det / 2;
    assertThat(test.restrictions()).isEqualTo(2);
    // a dozen products of numbers of order one
    assertThat(test.f()).isCloseTo(f, within(1e-10 * f));
    assertThat(test.degreesOfFreedom()).isEqualTo(89);
  }

  /** A system against itself supposes nothing. */
  @Test
  void nothingIsRestricted() {
    SystemFit fit = SeeminglyUnrelated.fit(design(), wide());
    assertThat(SystemRestrictions.test(fit, fit.covariance(), 89, wide()).restrictions()).isZero();
  }

  /**
   * The same rows many times over leave the estimates and divide the covariance, but for its
   * factor, by how often: also where the rows are read in many blocks.
   */
  @Test
  void clusteredCovarianceOfManyBlocks() {
    int times = 400;
    Design once = design();
    double[][] buffer = new double[5][ROWS];
    once.fill(0, ROWS, buffer);
    double[][] columns = new double[5][times * ROWS];
    for (int k = 0; k < 5; k++) {
      for (int t = 0; t < times; t++) {
        System.arraycopy(buffer[k], 0, columns[k], t * ROWS, ROWS);
      }
    }
    double[][] four = {columns[0], columns[1], columns[2], columns[3]};
    Design many = ArrayDesign.of(List.of("one", "x", "z", "first"), four, columns[4]);
    double[][] v = SystemCovariance.clustered(once, SeeminglyUnrelated.fit(once, wide())).matrix();
    double[][] w = SystemCovariance.clustered(many, SeeminglyUnrelated.fit(many, wide())).matrix();
    double n = (double) times * ROWS;
    // factors G/(G − 1) (N − 1)/(N − K/M) = N/(N − 3)
    double ratio = (n / (n - 3)) / (ROWS / (ROWS - 3.0)) / times;
    for (int i = 0; i < 6; i++) {
      for (int j = 0; j < 6; j++) {
        assertThat(w[i][j]).isCloseTo(v[i][j] * ratio, within(1e-9 * v[i][i] * ratio));
      }
    }
  }
}
