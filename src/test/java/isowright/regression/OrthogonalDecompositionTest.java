package isowright.regression;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;

class OrthogonalDecompositionTest {

  /** R′R = [X y]′[X y]: sums of some thousand products agree to thousands of units of 1e-16. */
  private static final double ROUNDING = 1e-12;

  @Test
  void factorHoldsTheCrossProducts() {
    SplittableRandom random = new SplittableRandom(1);
    for (int columns : new int[] {1, 2, 3, 5, 8, 13}) {
      Design design = RandomDesigns.grouped(random, 3000 + columns, columns, 4);
      OrthogonalDecomposition whole = OrthogonalDecomposition.of(design);
      assertSameCrossProducts(whole.factor(), RandomDesigns.rows(design));
    }
  }

  @Test
  void blockSizeDoesNotMatter() {
    Design design = RandomDesigns.grouped(new SplittableRandom(2), 5000, 4, 3);
    double[][] rows = RandomDesigns.rows(design);
    for (int most : new int[] {3, 7, 100, 256, 257, 5000}) {
      OrthogonalDecomposition some =
          OrthogonalDecomposition.of(design, Blocks.of(design.groups(), most));
      assertSameCrossProducts(some.factor(), rows);
    }
  }

  @Test
  void factorsMergeAsRowsDo() {
    Design design = RandomDesigns.grouped(new SplittableRandom(3), 2500, 5, 2);
    double[][] rows = RandomDesigns.rows(design);
    List<String> names = design.columns();
    OrthogonalDecomposition merged = part(names, rows, 0, 2);
    double[][] before = merged.factor();
    for (int[] cut : new int[][] {{2, 700}, {700, 701}, {701, 2500}}) {
      merged = merged.merged(part(names, rows, cut[0], cut[1]));
    }
    assertSameCrossProducts(merged.factor(), rows);
    assertThat(part(names, rows, 0, 2).factor()).isDeepEqualTo(before);
  }

  @Test
  void fewerRowsThanColumnsLeaveZeros() {
    double[][] x = {{1, 1}, {2, 3}, {5, 4}, {1, 0}};
    ArrayDesign design = ArrayDesign.of(List.of("a", "b", "c", "d"), x, new double[] {1, 2});
    double[][] factor = OrthogonalDecomposition.of(design).factor();
    assertThat(factor[2][2]).isCloseTo(0, within(1e-14));
    assertThat(factor[4][4]).isCloseTo(0, within(1e-14));
    assertSameCrossProducts(factor, RandomDesigns.rows(design));
  }

  /** Columns that differ in rounding alone are reduced again and again, below any usable length. */
  @Test
  void whatIsLeftOfColumnsThatCoincideDoesNotSpoilTheRest() {
    int rows = 3000;
    double[][] x = new double[4][rows];
    double[] y = new double[rows];
    for (int r = 0; r < rows; r++) {
      x[0][r] = 1;
      x[1][r] = r % 13 == 0 ? 1e-160 : 0;
      x[2][r] = 3e-163 * (r % 7);
      x[3][r] = r;
      y[r] = 2 + 0.5 * r;
    }
    double[][] factor =
        OrthogonalDecomposition.of(ArrayDesign.of(List.of("a", "b", "c", "d"), x, y)).factor();
    for (double[] row : factor) {
      assertThat(row).doesNotContain(Double.NaN);
      assertThat(java.util.Arrays.stream(row).allMatch(Double::isFinite)).isTrue();
    }
    // an exact line: nothing is left of the response but rounding of numbers up to 1,500
    assertThat(factor[4][4]).isCloseTo(0, within(1e-9));
  }

  private static OrthogonalDecomposition part(
      List<String> names, double[][] rows, int from, int to) {
    double[][] some = new double[rows.length][];
    for (int k = 0; k < rows.length; k++) {
      some[k] = java.util.Arrays.copyOfRange(rows[k], from, to);
    }
    return OrthogonalDecomposition.of(
        RandomDesigns.design(names, some, Groups.ofSingleRows(to - from)));
  }

  private static void assertSameCrossProducts(double[][] factor, double[][] rows) {
    for (int j = 0; j < rows.length; j++) {
      for (int k = 0; k <= j; k++) {
        double expected = 0;
        double size = 0;
        for (int i = 0; i < rows[0].length; i++) {
          expected += rows[j][i] * rows[k][i];
          size += Math.abs(rows[j][i] * rows[k][i]);
        }
        double actual = 0;
        for (int i = 0; i <= k; i++) {
          actual += factor[i][j] * factor[i][k];
        }
        assertThat(actual).isCloseTo(expected, within(ROUNDING * size));
      }
    }
  }
}
