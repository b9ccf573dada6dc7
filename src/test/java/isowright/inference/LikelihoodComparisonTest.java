package isowright.inference;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;
import static org.assertj.core.api.Assertions.withinPercentage;

import isowright.estimation.PanelFixtures;
import isowright.records.Panel;
import isowright.regression.ArrayDesign;
import isowright.regression.Design;
import isowright.regression.Groups;
import isowright.regression.LeastSquares;
import isowright.regression.LikelihoodComparison;
import isowright.regression.LikelihoodComparison.Correction;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import java.util.SplittableRandom;
import java.util.random.RandomGenerator;
import java.util.stream.IntStream;
import org.apache.commons.statistics.distribution.ChiSquaredDistribution;
import org.junit.jupiter.api.Tag;
import org.junit.jupiter.api.Test;

/** Vuong's comparison of two regressions against R, by hand, and by simulation. */
class LikelihoodComparisonTest {

  private static final ReferenceValues REFERENCE = ReferenceValues.of("comparisons.csv");

  private static LikelihoodComparison compared(Design first, Design second, boolean grouped) {
    return grouped
        ? LikelihoodComparison.byGroups(
            first, LeastSquares.fit(first), second, LeastSquares.fit(second))
        : LikelihoodComparison.byRows(
            first, LeastSquares.fit(first), second, LeastSquares.fit(second));
  }

  /** Primary metals: logs of labour and capital against capital with its square (R). */
  @Test
  void twoLinearModelsOfPrimaryMetals() {
    Panel panel = PanelFixtures.primaryMetals();
    double[] labour = panel.logQuantities().get(0).toArray();
    double[] capital = panel.logQuantities().get(1).toArray();
    double[] square = Arrays.stream(capital).map(k -> k * k).toArray();
    double[] ones = new double[labour.length];
    Arrays.fill(ones, 1);
    double[] output = panel.logOutput().toArray();
    LikelihoodComparison found =
        compared(
            ArrayDesign.of(List.of("1", "l", "k"), new double[][] {ones, labour, capital}, output),
            ArrayDesign.of(List.of("1", "k", "kk"), new double[][] {ones, capital, square}, output),
            false);
    // direct solutions of well-conditioned problems on both sides
    assertThat(found.distance())
        .isCloseTo(REFERENCE.numbers("metals", "vuong-alike")[0], withinPercentage(1e-6));
    assertThat(Arrays.stream(found.weights()).sum())
        .isCloseTo(REFERENCE.numbers("metals", "weights")[0], withinPercentage(1e-6));
    for (Correction correction : Correction.values()) {
      // equal numbers of parameters: the corrections are nothing
      assertThat(found.statistic(correction))
          .isCloseTo(REFERENCE.numbers("metals", "vuong")[0], withinPercentage(1e-6));
    }
  }

  /** Exchanging the two changes signs and nothing else. */
  @Test
  void theOrderOfTheTwoDoesNotMatter() {
    Drawn drawn = draw(3, 60, 4, .6);
    LikelihoodComparison one = compared(drawn.first(), drawn.second(), true);
    LikelihoodComparison other = compared(drawn.second(), drawn.first(), true);
    assertThat(one.ratio()).isCloseTo(-other.ratio(), within(1e-9));
    assertThat(one.distance()).isCloseTo(other.distance(), within(1e-9));
    assertThat(one.statistic(Correction.SCHWARZ))
        .isCloseTo(-other.statistic(Correction.SCHWARZ), within(1e-9));
    assertThat(one.weights()).hasSameSizeAs(other.weights());
  }

  /** One weight is a chi-squared law itself: its tail to three standard errors of the draws. */
  @Test
  void tailsOfAWeightedSum() {
    for (double x : new double[] {.5, 2, 3.84, 6.63}) {
      double exact = ChiSquaredDistribution.of(1).survivalProbability(x);
      double error = Math.sqrt(exact * (1 - exact) / 20_000);
      assertThat(LikelihoodComparison.weightedSumBeyond(new double[] {2}, 2 * x))
          .isCloseTo(exact, within(3 * error));
      double three = ChiSquaredDistribution.of(3).survivalProbability(x);
      assertThat(LikelihoodComparison.weightedSumBeyond(new double[] {1, 1, 1}, x))
          .isCloseTo(three, within(3 * Math.sqrt(three * (1 - three) / 20_000)));
    }
  }

  private record Drawn(Design first, Design second) {}

  /**
   * Two regressions that are equally near to the truth by symmetry: y = c + b x₁ + b x₂ + u, of
   * which each has one of the two regressors. With b = 0 both hold the truth and are alike.
   */
  private static Drawn draw(int seed, int groups, int rows, double b) {
    SplittableRandom source = new SplittableRandom(90_000 + seed);
    RandomGenerator random = source;
    int n = groups * rows;
    double[] ones = new double[n];
    Arrays.fill(ones, 1);
    double[][] x = new double[2][n];
    double[] y = new double[n];
    int[] starts = new int[groups];
    int r = 0;
    for (int g = 0; g < groups; g++) {
      starts[g] = r;
      double shared = random.nextGaussian();
      double[] own = {random.nextGaussian(), random.nextGaussian()};
      for (int t = 0; t < rows; t++, r++) {
        x[0][r] = own[0] + random.nextGaussian();
        x[1][r] = own[1] + random.nextGaussian();
        y[r] = 1 + b * x[0][r] + b * x[1][r] + (rows > 1 ? shared : 0) + random.nextGaussian();
      }
    }
    Groups of = Groups.startingAt(n, starts);
    return new Drawn(
        ArrayDesign.of(List.of("1", "a"), new double[][] {ones, x[0]}, y, of),
        ArrayDesign.of(List.of("1", "b"), new double[][] {ones, x[1]}, y, of));
  }

  /**
   * Sizes at 5 %, three thousand draws each (binomial standard error .004): nearer, rows and groups
   * as units; alike, rows and groups as units.
   */
  @Test
  @Tag("slow")
  void sizesLieNearFivePerCent() {
    StringBuilder table = new StringBuilder();
    double[] sizes = new double[4];
    String[] names = {
      "nearer, rows", "nearer, groups", "alike, rows", "alike, groups",
    };
    for (int setting = 0; setting < 4; setting++) {
      boolean grouped = setting % 2 == 1;
      boolean alike = setting >= 2;
      double b = alike ? 0 : .5;
      sizes[setting] =
          IntStream.range(0, 3000)
                  .parallel()
                  .filter(
                      draw -> {
                        Drawn drawn = grouped ? draw(draw, 100, 4, b) : draw(draw, 400, 1, b);
                        LikelihoodComparison found =
                            compared(drawn.first(), drawn.second(), grouped);
                        return alike
                            ? LikelihoodComparison.weightedSumBeyond(
                                    found.weights(), found.distance())
                                < .05
                            : law(found).p(found.statistic(Correction.NONE)) < .05;
                      })
                  .count()
              / 3000.0;
      table.append(String.format(Locale.ROOT, "%-16s %.4f%n", names[setting], sizes[setting]));
    }
    SimulationTable.write("sizes-vuong", table.toString());
    for (double size : sizes) {
      assertThat(size).isBetween(.03, .07);
    }
  }

  private static Law law(LikelihoodComparison found) {
    return found.grouped() ? new Law.Student(found.units() - 1) : new Law.Normal();
  }
}
