package isowright.regression;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;
import static org.assertj.core.api.Assertions.withinPercentage;

import java.util.List;
import java.util.SplittableRandom;
import java.util.function.UnaryOperator;
import org.junit.jupiter.api.Test;

/** Designs worked out from others, and what follows from a column's moments. */
class DerivedColumnsTest {

  private static final int ROWS = 5_003;

  private final double[] x = new double[ROWS];
  private final double[] y = new double[ROWS];
  private final double[] square = new double[ROWS];
  private final Groups groups;

  DerivedColumnsTest() {
    SplittableRandom random = new SplittableRandom(11);
    int[] starts = new int[ROWS / 7 + 1];
    for (int g = 0; g < starts.length; g++) {
      starts[g] = 7 * g;
    }
    groups = Groups.startingAt(ROWS, starts);
    for (int r = 0; r < ROWS; r++) {
      x[r] = 1e3 + random.nextDouble();
      square[r] = x[r] * x[r];
      y[r] = random.nextDouble() + x[r];
    }
  }

  private Design plain() {
    return ArrayDesign.of(List.of("x"), new double[][] {x}, y, groups);
  }

  private Design derived() {
    return DerivedColumns.of(
        plain(),
        List.of("x", "square"),
        (from, to, regressors, into) -> {
          for (int i = 0; i < to - from; i++) {
            into[0][i] = regressors[0][i];
            into[1][i] = regressors[0][i] * regressors[0][i];
          }
        });
  }

  /** The same numbers in arrays give the same fit, to the last digit. */
  @Test
  void aDerivedDesignIsTheDesignOfItsColumns() {
    Design arrays = ArrayDesign.of(List.of("x", "square"), new double[][] {x, square}, y, groups);
    assertThat(LeastSquares.fit(derived()).coefficients())
        .isEqualTo(LeastSquares.fit(arrays).coefficients());
  }

  @Test
  void whatWasRemovedFromOneDesignIsRemovedFromTheOther() {
    Design within = Effects.within(plain());
    Design arrays = ArrayDesign.of(List.of("x", "square"), new double[][] {x, square}, y, groups);
    LinearFit one = LeastSquares.fit(within.likewise(derived()));
    LinearFit other = LeastSquares.fit(Effects.within(arrays));
    assertThat(one.coefficients()).isEqualTo(other.coefficients());
    assertThat(one.absorbed()).isEqualTo(groups.count());
    assertThat(within.before().columns()).containsExactly("x");
    assertThat(plain().before().absorbed()).isZero();
    assertThat(plain().likewise(derived()).absorbed()).isZero();
  }

  /** Whatever is done to a design can be done to another one of the same rows. */
  @Test
  void everyTreatmentIsDoneLikewise() {
    Design arrays = ArrayDesign.of(List.of("x", "square"), new double[][] {x, square}, y, groups);
    double[] shares = new double[groups.count()];
    java.util.Arrays.fill(shares, .4);
    List<UnaryOperator<Design>> treatments =
        List.of(
            design -> Effects.partlyWithin(design, shares),
            Effects::between,
            design -> Effects.differences(design, row -> row % 3 != 0));
    for (UnaryOperator<Design> treatment : treatments) {
      Design one = treatment.apply(plain()).likewise(derived());
      Design other = treatment.apply(arrays);
      assertThat(one.rows()).isEqualTo(other.rows());
      assertThat(LeastSquares.fit(one).coefficients())
          .isEqualTo(LeastSquares.fit(other).coefficients());
      assertThat(treatment.apply(plain()).before().rows()).isEqualTo(ROWS);
    }
  }

  @Test
  void anotherResponse() {
    Design answered = AnotherResponse.of(plain(), row -> 3 * x[row]);
    // exact up to the rounding of one division per row
    assertThat(LeastSquares.fit(answered).coefficients()[0]).isCloseTo(3, within(1e-14));
  }

  /** Uniform numbers on [1000, 1001): mean and spread by their definition, in plain sums. */
  @Test
  void momentsKeepTheirDigitsAtALargeLevel() {
    ColumnMoments moments = ColumnMoments.of(plain());
    double sum = 0;
    double squares = 0;
    for (double value : x) {
      sum += value - 1e3;
      squares += (value - 1e3) * (value - 1e3);
    }
    double mean = sum / ROWS;
    // sums of five thousand numbers of size one: some 1e-13
    assertThat(moments.means()[0]).isCloseTo(1e3 + mean, within(1e-12));
    assertThat(moments.spreads()[0])
        .isCloseTo(Math.sqrt(squares / ROWS - mean * mean), withinPercentage(1e-9));
    double[] constant = new double[ROWS];
    java.util.Arrays.fill(constant, 0.1);
    ColumnMoments none =
        ColumnMoments.of(ArrayDesign.of(List.of("c"), new double[][] {constant}, y, groups));
    assertThat(none.spreads()[0]).isZero();
  }
}
