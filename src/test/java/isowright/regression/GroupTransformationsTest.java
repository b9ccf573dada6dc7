package isowright.regression;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatIllegalArgumentException;
import static org.assertj.core.api.Assertions.within;

import java.util.Arrays;
import java.util.List;
import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;

/**
 * Group means alone, in part, beside the rows, and differences, against the same written out. The
 * designs are long enough to be read in several blocks.
 */
class GroupTransformationsTest {

  private static final int ROWS = 9000;

  /** Sums of at most nine values of size ten. */
  private static final double ROUNDING = 1e-13;

  private final ArrayDesign design = RandomDesigns.grouped(new SplittableRandom(71), ROWS, 3, 9);

  private final double[][] rows = RandomDesigns.rows(design);

  private double mean(int column, int group) {
    Groups groups = design.groups();
    return Arrays.stream(rows[column], groups.start(group), groups.end(group))
        .average()
        .orElseThrow();
  }

  @Test
  void betweenIsOneMeanAGroup() {
    Design between = Effects.between(design);
    assertThat(between.rows()).isEqualTo(design.groups().count());
    assertThat(between.groups().count()).isEqualTo(between.rows());
    double[][] means = RandomDesigns.rows(between);
    double[][] weighted = RandomDesigns.rows(Effects.betweenByRows(design));
    for (int g = 0; g < between.rows(); g++) {
      double size = design.groups().end(g) - design.groups().start(g);
      for (int k = 0; k < 4; k++) {
        assertThat(means[k][g]).isCloseTo(mean(k, g), within(ROUNDING * 10));
        assertThat(weighted[k][g]).isCloseTo(Math.sqrt(size) * mean(k, g), within(ROUNDING * 30));
      }
    }
    // a constant stays exactly one
    assertThat(Arrays.stream(means[0]).allMatch(v -> v == 1)).isTrue();
  }

  @Test
  void aShareOfTheMeanIsTakenOff() {
    SplittableRandom random = new SplittableRandom(72);
    double[] shares = random.doubles(design.groups().count()).toArray();
    Design partly = Effects.partlyWithin(design, shares);
    double[][] moved = RandomDesigns.rows(partly);
    for (int i = 0; i < ROWS; i++) {
      int g = design.groups().of(i);
      for (int k = 0; k < 4; k++) {
        assertThat(moved[k][i])
            .isCloseTo(rows[k][i] - shares[g] * mean(k, g), within(ROUNDING * 10));
      }
    }
    assertThat(partly.absorbed()).isZero();
    assertThatIllegalArgumentException()
        .isThrownBy(() -> Effects.partlyWithin(design, new double[] {.5}))
        .withMessageContaining("1 shares");
    shares[3] = 1.5;
    assertThatIllegalArgumentException()
        .isThrownBy(() -> Effects.partlyWithin(design, shares))
        .withMessageContaining("group 3 is 1.5");
  }

  /** Nothing taken off is the design itself, and the whole mean taken off is within. */
  @Test
  void theEndsArePooledAndWithin() {
    double[] shares = new double[design.groups().count()];
    LinearFit pooled = LeastSquares.fit(Effects.partlyWithin(design, shares));
    assertThat(pooled.coefficients()).isEqualTo(LeastSquares.fit(design).coefficients());
    Arrays.fill(shares, 1);
    LinearFit whole = LeastSquares.fit(Effects.partlyWithin(design, shares));
    LinearFit within = LeastSquares.fit(Effects.within(design));
    for (int k = 1; k < 3; k++) {
      assertThat(whole.coefficients()[k]).isCloseTo(within.coefficients()[k], within(1e-12));
    }
    assertThat(whole.estimated()).containsExactly(false, true, true);
  }

  @Test
  void meansStandBesideTheRows() {
    Design beside = Effects.withGroupMeans(design, List.of("x2", "x1"), "mean of ");
    assertThat(beside.columns())
        .containsExactly("constant", "x1", "x2", "mean of x2", "mean of x1");
    double[][] all = RandomDesigns.rows(beside);
    for (int i = 0; i < ROWS; i++) {
      int g = design.groups().of(i);
      assertThat(all[3][i]).isCloseTo(mean(2, g), within(ROUNDING * 10));
      assertThat(all[4][i]).isCloseTo(mean(1, g), within(ROUNDING * 10));
      assertThat(all[5][i]).isEqualTo(rows[3][i]);
    }
    assertThatIllegalArgumentException()
        .isThrownBy(() -> Effects.withGroupMeans(design, List.of("x9"), ""))
        .withMessageContaining("x9");
  }

  /** Differences end at the rows that follow, and at no first row of a group. */
  @Test
  void differencesAreTakenWhereRowsFollow() {
    Differences differences = Effects.differences(design, row -> row % 3 != 0);
    double[][] all = RandomDesigns.rows(differences);
    int at = 0;
    int groups = 0;
    for (int g = 0; g < design.groups().count(); g++) {
      int before = at;
      for (int row = design.groups().start(g) + 1; row < design.groups().end(g); row++) {
        if (row % 3 != 0) {
          assertThat(differences.end(at)).isEqualTo(row);
          for (int k = 0; k < 4; k++) {
            assertThat(all[k][at]).isEqualTo(rows[k][row] - rows[k][row - 1]);
          }
          at++;
        }
      }
      if (at > before) {
        assertThat(differences.groups().start(groups++)).isEqualTo(before);
      }
    }
    assertThat(differences.rows()).isEqualTo(at);
    assertThat(differences.groups().count()).isEqualTo(groups);
    LinearFit fit = LeastSquares.fit(differences);
    assertThat(fit.collinearities())
        .containsExactly(new Collinearity("constant", List.of(Collinearity.GROUP_EFFECTS)));
  }

  @Test
  void noRowFollowsAnother() {
    Differences none = Effects.differences(design, row -> false);
    assertThat(none.rows()).isZero();
    assertThat(none.groups().count()).isZero();
  }

  @Test
  void separateFitsAreThoseOfEachGroup() {
    SeparateFits all = SeparateFits.of(design);
    double ssr = 0;
    int parameters = 0;
    for (int g = 0; g < design.groups().count(); g++) {
      int from = design.groups().start(g);
      int size = design.groups().end(g) - from;
      double[][] own = new double[3][];
      for (int k = 0; k < 3; k++) {
        own[k] = Arrays.copyOfRange(rows[k], from, from + size);
      }
      LinearFit fit =
          LeastSquares.fit(
              ArrayDesign.of(
                  design.columns(), own, Arrays.copyOfRange(rows[3], from, from + size)));
      parameters += fit.rank();
      ssr += size > fit.rank() ? fit.ssr() : 0;
    }
    assertThat(all.parameters()).isEqualTo(parameters);
    // some two thousand small regressions, each good to its condition of a few hundred
    assertThat(all.ssr()).isCloseTo(ssr, within(1e-9 * ssr));
  }
}
