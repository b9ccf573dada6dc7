package isowright.regression;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.withinPercentage;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/**
 * Variance inflation by its definition 1/(1 − R²), R² from regressions of each column on the
 * others, over random designs. Held against R in the tests of specification.
 */
class VarianceInflationTest {

  private static final int ROWS = 120;

  private static double[][] columns(int seed) {
    SplittableRandom random = new SplittableRandom(seed);
    double[][] x = new double[4][ROWS];
    for (int r = 0; r < ROWS; r++) {
      x[0][r] = 1;
      double shared = random.nextDouble();
      x[1][r] = 5 + shared;
      x[2][r] = shared + random.nextDouble();
      x[3][r] = shared * shared + random.nextDouble();
    }
    return x;
  }

  @ParameterizedTest
  @ValueSource(ints = {1, 2, 3, 4, 5})
  void isWhatTheOtherColumnsExplain(int seed) {
    double[][] x = columns(seed);
    double[] y = x[2];
    List<String> names = List.of("constant", "a", "b", "c");
    Design design = ArrayDesign.of(names, x, y);
    List<VarianceInflation> factors = VarianceInflation.of(design, LeastSquares.fit(design));
    assertThat(factors).extracting(VarianceInflation::column).containsExactly("a", "b", "c");
    for (int k = 1; k < 4; k++) {
      LinearFit on = onOthers(x, k, names);
      double squares = Arrays.stream(x[k]).map(v -> v * v).sum();
      // c_k = 1/SSR_k; two routes through orthogonal decompositions of a mild design
      assertThat(factors.get(k - 1).raw()).isCloseTo(squares / on.ssr(), withinPercentage(1e-9));
      assertThat(factors.get(k - 1).centred())
          .isCloseTo(on.totalSumOfSquares() / on.ssr(), withinPercentage(1e-9));
    }
  }

  private static LinearFit onOthers(double[][] x, int k, List<String> names) {
    List<double[]> others = new ArrayList<>();
    List<String> otherNames = new ArrayList<>();
    for (int j = 0; j < x.length; j++) {
      if (j != k) {
        others.add(x[j]);
        otherNames.add(names.get(j));
      }
    }
    return LeastSquares.fit(ArrayDesign.of(otherNames, others.toArray(double[][]::new), x[k]));
  }

  @Test
  void nothingIsSaidWhereAColumnWasDropped() {
    double[][] x = columns(9);
    x[3] = x[2];
    Design design = ArrayDesign.of(List.of("constant", "a", "b", "b again"), x, x[1]);
    assertThat(VarianceInflation.of(design, LeastSquares.fit(design))).isEmpty();
  }
}
