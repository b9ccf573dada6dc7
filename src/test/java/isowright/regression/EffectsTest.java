package isowright.regression;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;

class EffectsTest {

  /** Deviations and dummies differ by rounding only; the condition is below 1e3 here. */
  private static final double ROUNDING = 1e-10;

  @Test
  void withinIsTheRegressionOnDummies() {
    SplittableRandom random = new SplittableRandom(21);
    for (int trial = 0; trial < 25; trial++) {
      ArrayDesign design =
          RandomDesigns.grouped(random, 40 + random.nextInt(150), 2 + random.nextInt(4), 9);
      Design within = Effects.within(design);
      LinearFit slopes = LeastSquares.fit(within);
      Design dummies = dummies(design);
      LinearFit all = LeastSquares.fit(dummies);
      int groups = design.groups().count();

      assertThat(all.rank()).isEqualTo(slopes.rank() + groups);
      assertThat(slopes.absorbed()).isEqualTo(groups);
      assertThat(slopes.residualDegreesOfFreedom()).isEqualTo(all.residualDegreesOfFreedom());
      assertClose(slopes.ssr(), all.ssr());
      for (Covariance.Kind kind :
          List.of(Covariance.Kind.CLASSICAL, Covariance.Kind.HC1, Covariance.Kind.HC3)) {
        Covariance mine = Covariance.estimate(within, slopes, kind);
        Covariance theirs = Covariance.estimate(dummies, all, kind);
        assertThat(mine.degreesOfFreedom()).isEqualTo(theirs.degreesOfFreedom());
        for (int k = 1; k < design.columns().size(); k++) {
          assertClose(slopes.coefficients()[k], all.coefficients()[groups + k - 1]);
          assertClose(mine.standardError(k), theirs.standardError(groups + k - 1));
        }
      }
    }
  }

  @Test
  void whatDoesNotVaryWithinGroupsIsTakenUp() {
    SplittableRandom random = new SplittableRandom(22);
    ArrayDesign design = RandomDesigns.grouped(random, 3000, 3, 8);
    double[][] rows = RandomDesigns.rows(design);
    Groups groups = design.groups();
    double[] fixed = new double[3000];
    double[] almost = new double[3000];
    double[] little = new double[3000];
    for (int i = 0; i < fixed.length; i++) {
      double level = Math.log(0.1 + groups.of(i));
      fixed[i] = level;
      // Equal within groups but for the last two bits, as a computed column may come out.
      almost[i] = level * (1 + random.nextInt(3) * Math.ulp(1.0));
      little[i] = level + 1e-6 * random.nextDouble();
    }
    Design wide =
        Effects.within(
            ArrayDesign.of(
                List.of("constant", "fixed", "almost", "x1", "little", "x2"),
                new double[][] {rows[0], fixed, almost, rows[1], little, rows[2]},
                rows[3],
                groups));
    LinearFit fit = LeastSquares.fit(wide);
    List<String> taken = List.of(Collinearity.GROUP_EFFECTS);
    assertThat(fit.collinearities())
        .containsExactly(
            new Collinearity("constant", taken),
            new Collinearity("fixed", taken),
            new Collinearity("almost", taken));
    assertThat(fit.collinearities().get(1).words())
        .isEqualTo("fixed does not vary within groups, so the group effects take it up");
    assertThat(fit.estimated()).containsExactly(false, false, false, true, true, true);
    double[][] filled = RandomDesigns.rows(wide);
    assertThat(Arrays.stream(filled[1]).allMatch(v -> v == 0)).isTrue();
  }

  @Test
  void withinTwiceIsWithinOnce() {
    Design once = Effects.within(RandomDesigns.grouped(new SplittableRandom(23), 100, 2, 5));
    assertThat(Effects.within(once)).isSameAs(once);
  }

  @Test
  void groupsOfOneRowLeaveNothingAndSaySo() {
    Design design = RandomDesigns.grouped(new SplittableRandom(24), 50, 3, 1);
    Design within = Effects.within(design);
    LinearFit fit = LeastSquares.fit(within);
    assertThat(fit.rank()).isZero();
    assertThat(fit.residualDegreesOfFreedom()).isZero();
    assertThat(fit.ssr()).isZero();
    Covariance none = Covariance.estimate(within, fit, Covariance.Kind.CLASSICAL);
    assertThat(none.matrix()[1]).containsOnly(0);
    assertThat(none.words()).contains("no degrees of freedom are left");
  }

  @Test
  void leverageIsOneOverTheSizeOfTheGroup() {
    Groups groups = Groups.startingAt(6, new int[] {0, 1, 4});
    double[][] x = {{1, 2, 3, 4, 5, 7}};
    Design within =
        Effects.within(ArrayDesign.of(List.of("x"), x, new double[] {1, 2, 3, 5, 8, 9}, groups));
    assertThat(within.absorbed()).isEqualTo(3);
    double[] leverages = new double[6];
    for (int i = 0; i < 6; i++) {
      leverages[i] = within.absorbedLeverage(i);
    }
    assertThat(leverages)
        .containsExactly(new double[] {1, 1 / 3.0, 1 / 3.0, 1 / 3.0, 0.5, 0.5}, within(0.0));
  }

  /** One dummy a group before the regressors but the constant. */
  static Design dummies(ArrayDesign design) {
    double[][] rows = RandomDesigns.rows(design);
    Groups groups = design.groups();
    int columns = design.columns().size();
    List<String> names = new ArrayList<>();
    double[][] x = new double[groups.count() + columns - 1][];
    for (int g = 0; g < groups.count(); g++) {
      names.add("group " + g);
      x[g] = new double[design.rows()];
      Arrays.fill(x[g], groups.start(g), groups.end(g), 1);
    }
    for (int k = 1; k < columns; k++) {
      names.add(design.columns().get(k));
      x[groups.count() + k - 1] = rows[k];
    }
    return ArrayDesign.of(names, x, rows[columns], groups);
  }

  private static void assertClose(double actual, double expected) {
    assertThat(actual).isCloseTo(expected, within(ROUNDING * (Math.abs(expected) + 1e-3)));
  }
}
