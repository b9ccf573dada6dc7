package isowright.regression;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import isowright.regression.ComposedErrors.Sharing;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Objects;
import java.util.Random;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/**
 * One-sided errors: derivatives against differences; estimates, standard errors and what is said of
 * single rows against log-likelihoods written out in R 4.2.2 in the papers' own parameters ({@code
 * reference/one-sided-errors.R}).
 */
class ComposedErrorsTest {

  /** R's optimum is polished by Newton steps on differences, good to about 1e-8. */
  private static final double AGREEMENT = 1e-6;

  private static final Path REFERENCE =
      Path.of("src/test/resources/reference/one-sided-errors.csv");

  private static Map<String, Double> reference() throws IOException {
    Map<String, Double> values = new HashMap<>();
    for (String line : Files.readAllLines(REFERENCE)) {
      if (!line.startsWith("#") && !line.startsWith("model")) {
        String[] parts = line.split(",");
        values.put(parts[0] + "," + parts[1] + "," + parts[2], Double.parseDouble(parts[3]));
      }
    }
    assertThat(values).hasSizeGreaterThan(200);
    return values;
  }

  private static double value(Map<String, Double> reference, String name) {
    return Objects.requireNonNull(reference.get(name), name);
  }

  private static void near(Map<String, Double> reference, String name, double found) {
    double expected = value(reference, name);
    // Relative to the figure, or to one hundredth where the figure is smaller than that. R takes
    // standard errors from differences of differences, which are good to five digits.
    double size = Math.max(Math.abs(expected), 0.01);
    double agreement = name.contains(",se,") ? 1e-5 : AGREEMENT;
    assertThat(found).as(name).isCloseTo(expected, within(agreement * size));
  }

  private static ComposedErrors states(OneSidedLaw law, Sharing sharing) throws IOException {
    Times years = PublishedDesigns.years();
    double[] since = new double[years.rows()];
    Arrays.setAll(since, r -> years.of(r) - 16);
    return new ComposedErrors(PublishedDesigns.states(), law, sharing, since);
  }

  static Stream<ComposedErrors> models() throws IOException {
    List<ComposedErrors> models = new ArrayList<>();
    for (OneSidedLaw law : OneSidedLaw.values()) {
      for (Sharing sharing : Sharing.values()) {
        models.add(states(law, sharing));
      }
    }
    return models.stream();
  }

  private static double[] somewhere(ComposedErrors model, int draw) {
    double[] at = {2.2, 0.05, 0.3, 0.65, -0.006, Math.log(0.08), Math.log(0.15), 0.03};
    Random random = new Random(draw);
    double[] moved = Arrays.copyOf(at, model.parameters());
    for (int k = 0; k < moved.length; k++) {
      moved[k] += 0.02 * random.nextGaussian() * (k == 0 ? 5 : k > 4 ? 3 : 1);
    }
    return moved;
  }

  @ParameterizedTest
  @MethodSource("models")
  void gradientAndHessianAreThoseOfTheLikelihood(ComposedErrors model) {
    for (int draw = 0; draw < 3; draw++) {
      double[] at = somewhere(model, draw);
      ComposedLikelihood here = model.at(at);
      double[] gradient = here.gradient();
      double[][] hessian = here.hessian();
      for (int k = 0; k < at.length; k++) {
        double h = 1e-4;
        double[] values = new double[4];
        double[][] gradients = new double[4][];
        double[] steps = {-2 * h, -h, h, 2 * h};
        for (int i = 0; i < 4; i++) {
          double[] moved = at.clone();
          moved[k] += steps[i];
          values[i] = model.at(moved).value();
          gradients[i] = model.at(moved).gradient();
        }
        double slope = (8 * (values[2] - values[1]) - (values[3] - values[0])) / (12 * h);
        // Of the size of the likelihood's own curvature, so that no parameter's unit decides; far
        // from
        // the rows the exponential law has none in the constant, hence the rows beside it.
        double unit = Math.sqrt(Math.abs(hessian[k][k]) + model.design().rows());
        assertThat(gradient[k] / unit)
            .as("gradient " + k)
            .isCloseTo(slope / unit, within(1e-7 * Math.max(1, Math.abs(slope / unit))));
        for (int l = 0; l < at.length; l++) {
          double bend =
              (8 * (gradients[2][l] - gradients[1][l]) - (gradients[3][l] - gradients[0][l]))
                  / (12 * h);
          double size = unit * Math.sqrt(Math.abs(hessian[l][l]) + model.design().rows());
          assertThat(hessian[k][l] / size)
              .as("hessian " + k + ", " + l)
              .isCloseTo(bend / size, within(1e-7));
        }
      }
    }
  }

  @Test
  void scoresAddUpToTheGradientSquares() throws IOException {
    ComposedErrors model = states(OneSidedLaw.HALF_NORMAL, Sharing.NONE);
    ComposedLikelihood here = model.at(somewhere(model, 1));
    double[][] rows = here.scoreSquares(false);
    double[][] groups = here.scoreSquares(true);
    assertThat(rows[1][1]).isPositive().isNotEqualTo(groups[1][1]);
    // With one row a group both sums are the same.
    ComposedErrors single =
        new ComposedErrors(
            PublishedDesigns.electricity(), OneSidedLaw.EXPONENTIAL, Sharing.NONE, new double[0]);
    ComposedLikelihood there = single.at(new double[] {7.5, -.4, -.06, -.05, -.26, -2.2, -2});
    assertThat(there.scoreSquares(false)).isDeepEqualTo(there.scoreSquares(true));
  }

  @ParameterizedTest
  @MethodSource("laws")
  void oneRowAUnitAgainstR(OneSidedLaw law) throws IOException {
    Map<String, Double> reference = reference();
    String name =
        "electricity " + (law == OneSidedLaw.HALF_NORMAL ? "half-normal," : "exponential,");
    ComposedFit fit =
        ComposedFit.of(
            new ComposedErrors(PublishedDesigns.electricity(), law, Sharing.NONE, new double[0]));
    assertThat(fit.state()).isEqualTo(ComposedFit.State.FOUND);
    double[][] covariance = fit.covariance(Covariance.Kind.CLASSICAL).matrix();
    for (int k = 0; k < 5; k++) {
      near(reference, name + "coefficient," + k, fit.coefficients()[k]);
      near(reference, name + "se," + k, Math.sqrt(covariance[k][k]));
    }
    near(reference, name + "noise,0", fit.noise());
    near(reference, name + "scale,0", fit.scale());
    near(reference, name + "logLikelihood,0", fit.logLikelihood());
    ConditionalErrors rows = fit.conditional();
    for (int i = 0; i < 25; i++) {
      near(reference, name + "mean," + i, rows.mean(5 * i));
      near(reference, name + "survival," + i, rows.survival(5 * i));
      near(reference, name + "low," + i, rows.exceeded(5 * i, 0.975));
      near(reference, name + "high," + i, rows.exceeded(5 * i, 0.025));
    }
  }

  static Stream<OneSidedLaw> laws() {
    return Stream.of(OneSidedLaw.values());
  }

  /**
   * Half-normal estimates for these data as printed in W. H. Greene 1990, Journal of Econometrics
   * 46, 141–163 (recalled from memory, to the digits recalled): constant −7.494, ln Q .411, ½ ln² Q
   * .0606, log-likelihood 66.865. Signs are turned, for here the response is −ln cost.
   */
  @Test
  void halfNormalOfElectricityAsPrinted() throws IOException {
    ComposedFit fit =
        ComposedFit.of(
            new ComposedErrors(
                PublishedDesigns.electricity(),
                OneSidedLaw.HALF_NORMAL,
                Sharing.NONE,
                new double[0]));
    assertThat(fit.coefficients()[0]).isCloseTo(7.494, within(5e-4));
    assertThat(fit.coefficients()[1]).isCloseTo(-0.411, within(5e-4));
    assertThat(fit.coefficients()[2]).isCloseTo(-0.0606, within(5e-5));
    assertThat(fit.logLikelihood()).isCloseTo(66.865, within(5e-4));
  }

  @ParameterizedTest
  @MethodSource("sharings")
  void sharedAgainstR(Sharing sharing) throws IOException {
    Map<String, Double> reference = reference();
    boolean decay = sharing == Sharing.GROUP_WITH_DECAY;
    String name = "states half-normal " + (decay ? "decay," : "constant,");
    ComposedFit fit = ComposedFit.of(states(OneSidedLaw.HALF_NORMAL, sharing));
    assertThat(fit.state()).isEqualTo(ComposedFit.State.FOUND);
    double[][] covariance = fit.covariance(Covariance.Kind.CLASSICAL).matrix();
    for (int k = 0; k < 5; k++) {
      near(reference, name + "coefficient," + k, fit.coefficients()[k]);
      near(reference, name + "se," + k, Math.sqrt(covariance[k][k]));
    }
    near(reference, name + "noise,0", fit.noise());
    near(reference, name + "scale,0", fit.scale());
    near(reference, name + "logLikelihood,0", fit.logLikelihood());
    if (decay) {
      near(reference, name + "decay,0", fit.decay());
    }
  }

  static Stream<Sharing> sharings() {
    return Stream.of(Sharing.GROUP, Sharing.GROUP_WITH_DECAY);
  }

  /** R integrates the one-sided error out numerically, group by group. */
  @Test
  void sharedExponentialIsTheIntegral() throws IOException {
    Map<String, Double> reference = reference();
    double[] constant = {2.5, 0.05, 0.3, 0.65, -0.006, Math.log(0.04), Math.log(0.2)};
    double[] decay = {2.4, 0.1, 0.28, 0.6, -0.005, Math.log(0.05), Math.log(0.1), 0.02};
    near(
        reference,
        "states exponential,logLikelihood with 2 beside,0",
        states(OneSidedLaw.EXPONENTIAL, Sharing.GROUP).at(constant).value());
    near(
        reference,
        "states exponential,logLikelihood with 3 beside,0",
        states(OneSidedLaw.EXPONENTIAL, Sharing.GROUP_WITH_DECAY).at(decay).value());
    for (Sharing sharing : List.of(Sharing.GROUP, Sharing.GROUP_WITH_DECAY)) {
      ComposedFit fit = ComposedFit.of(states(OneSidedLaw.EXPONENTIAL, sharing));
      assertThat(fit.state()).isEqualTo(ComposedFit.State.FOUND);
      assertThat(fit.logLikelihood()).isGreaterThan(1306);
    }
  }

  /**
   * Residuals skewed to the right: least squares is the maximum (Waldman 1982), and is said to be.
   */
  @Test
  void wrongSkewIsSaidAndIsTheMaximum() throws IOException {
    ArrayDesign design = PublishedDesigns.primaryMetals();
    for (OneSidedLaw law : OneSidedLaw.values()) {
      ComposedErrors model = new ComposedErrors(design, law, Sharing.NONE, new double[0]);
      ComposedFit fit = ComposedFit.of(model);
      assertThat(fit.state()).isEqualTo(ComposedFit.State.WRONG_SKEW);
      assertThat(fit.skewness())
          .isCloseTo(0.8463348, within(1e-6)); // R 4.2.2, mean(e^3)/mean(e^2)^1.5
      assertThat(fit.scale()).isZero();
      assertThat(fit.likelihoodRatio()).isZero();
      assertThat(fit.coefficients()).isEqualTo(LeastSquares.fit(design).coefficients());
      assertThat(fit.logLikelihood())
          .isCloseTo(8.350541, within(5e-7)); // published/README, Cobb-Douglas
      assertThat(fit.conditional().mean(3)).isZero();
      assertThat(fit.conditional().survival(3)).isEqualTo(1);
      for (double scale : new double[] {1e-3, 0.01, 0.05, 0.2}) {
        double[] beside = Arrays.copyOf(fit.coefficients(), 5);
        beside[0] += law.mean(scale);
        beside[3] = Math.log(fit.noise());
        beside[4] = Math.log(scale);
        assertThat(model.at(beside).value()).isLessThan(fit.logLikelihood());
      }
    }
  }

  /** The order of groups and of their rows, and the unit of the response, change nothing. */
  @Test
  void reversedRowsAndOtherUnits() throws IOException {
    ComposedFit fit = ComposedFit.of(states(OneSidedLaw.HALF_NORMAL, Sharing.GROUP));
    ArrayDesign design = PublishedDesigns.states();
    double[][] block = new double[6][design.rows()];
    design.fill(0, design.rows(), block);
    double[][] turned = new double[6][design.rows()];
    for (int k = 0; k < 6; k++) {
      for (int r = 0; r < design.rows(); r++) {
        turned[k][r] = block[k][design.rows() - 1 - r] + (k == 5 ? 3 : 0);
      }
    }
    int[] starts = new int[48];
    Arrays.setAll(starts, g -> 17 * g);
    ComposedFit again =
        ComposedFit.of(
            new ComposedErrors(
                ArrayDesign.of(
                    design.columns(),
                    Arrays.copyOf(turned, 5),
                    turned[5],
                    Groups.startingAt(design.rows(), starts)),
                OneSidedLaw.HALF_NORMAL,
                Sharing.GROUP,
                new double[0]));
    assertThat(again.coefficients()[0]).isCloseTo(fit.coefficients()[0] + 3, within(1e-7));
    assertThat(again.coefficients()[3]).isCloseTo(fit.coefficients()[3], within(1e-7));
    assertThat(again.scale()).isCloseTo(fit.scale(), within(1e-7));
  }

  /**
   * Ends of profiles against R's own search ({@code reference/frontier-effects.R}); halving stops
   * at a relative 1.3e-4.
   */
  @Test
  void profilesAgainstR() throws IOException {
    ComposedFit fit =
        ComposedFit.of(
            new ComposedErrors(
                PublishedDesigns.electricity(),
                OneSidedLaw.HALF_NORMAL,
                Sharing.NONE,
                new double[0]));
    int seen = 0;
    for (String line :
        Files.readAllLines(Path.of("src/test/resources/reference/frontier-effects.csv"))) {
      String[] cells = line.split(",");
      if (!cells[0].equals("profile")) {
        continue;
      }
      ComposedProfile.Held held =
          cells[1].equals("scale") ? ComposedProfile.Held.SCALE : ComposedProfile.Held.RATIO;
      double[] ends = ComposedProfile.interval(fit, held, 0.5);
      for (int k = 0; k < 2; k++) {
        double expected = Double.parseDouble(cells[2 + k]);
        assertThat(ends[k]).as(line).isCloseTo(expected, within(1.5e-4 * expected));
        seen++;
      }
    }
    assertThat(seen).isEqualTo(4);
    // Where no one-sided error at all is not spoken against, the interval begins at zero.
    double all = fit.likelihoodRatio() + 1e-6;
    assertThat(ComposedProfile.interval(fit, ComposedProfile.Held.SCALE, all)[0]).isZero();
  }
}
