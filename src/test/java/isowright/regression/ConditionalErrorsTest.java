package isowright.regression;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import isowright.regression.ComposedErrors.Sharing;
import java.io.IOException;
import java.util.Arrays;
import org.apache.commons.math3.analysis.UnivariateFunction;
import org.apache.commons.math3.analysis.integration.IterativeLegendreGaussIntegrator;
import org.apache.commons.statistics.distribution.NormalDistribution;
import org.junit.jupiter.api.Test;

/**
 * What rows say of a shared one-sided error against Bayes' rule by quadrature: law of w times the
 * normal densities of the rows, with no completed square.
 */
class ConditionalErrorsTest {

  @Test
  void sharedErrorsAreThoseOfBayesRule() throws IOException {
    for (OneSidedLaw law : OneSidedLaw.values()) {
      Times years = PublishedDesigns.years();
      double[] since = new double[years.rows()];
      Arrays.setAll(since, r -> years.of(r) - 16);
      ComposedErrors model =
          new ComposedErrors(PublishedDesigns.states(), law, Sharing.GROUP_WITH_DECAY, since);
      ComposedFit fit = ComposedFit.of(model);
      assertThat(fit.state()).isEqualTo(ComposedFit.State.FOUND);
      ConditionalErrors rows = fit.conditional();
      for (int group : new int[] {0, 31}) {
        check(fit, rows, group);
      }
    }
  }

  private static void check(ComposedFit fit, ConditionalErrors rows, int group) {
    ComposedErrors model = fit.model();
    int start = model.design().groups().start(group);
    int end = model.design().groups().end(group);
    double[][] block = new double[6][end - start];
    model.design().fill(start, end, block);
    double[] errors = block[5];
    for (int k = 0; k < 5; k++) {
      for (int r = 0; r < errors.length; r++) {
        errors[r] -= fit.coefficients()[k] * block[k][r];
      }
    }
    int row = start + 3;
    double share = Math.exp(-fit.decay() * model.since(row));
    double centre = rows.mean(row) / share;
    UnivariateFunction density =
        w -> {
          double log =
              model.law() == OneSidedLaw.HALF_NORMAL
                  ? NormalDistribution.of(0, fit.scale()).logDensity(w)
                  : -w / fit.scale();
          for (int r = 0; r < errors.length; r++) {
            double g = Math.exp(-fit.decay() * model.since(start + r));
            double away = (errors[r] + g * w) / fit.noise();
            double there = (errors[r] + g * centre) / fit.noise();
            log -= 0.5 * (away * away - there * there);
          }
          return Math.exp(log);
        };
    double total = integral(density, 0, 1.2);
    double mean = integral(w -> share * w * density.value(w), 0, 1.2) / total;
    double survival = integral(w -> Math.exp(-share * w) * density.value(w), 0, 1.2) / total;
    assertThat(rows.mean(row)).isCloseTo(mean, within(1e-8));
    assertThat(rows.survival(row)).isCloseTo(survival, within(1e-8));
    for (double probability : new double[] {0.975, 0.5, 0.025}) {
      double from = rows.exceeded(row, probability) / share;
      assertThat(integral(density, from, 1.2) / total).isCloseTo(probability, within(1e-7));
    }
  }

  private static double integral(UnivariateFunction function, double from, double to) {
    // In pieces, since the density is narrow.
    double sum = 0;
    int pieces = 60;
    IterativeLegendreGaussIntegrator integrator =
        new IterativeLegendreGaussIntegrator(10, 1e-12, 1e-300);
    for (int i = 0; i < pieces; i++) {
      double a = from + (to - from) * i / pieces;
      sum += integrator.integrate(100_000, function, a, a + (to - from) / pieces);
    }
    return sum;
  }

  /**
   * One row: μ = −ε σ_w²/(σ_w² + σ_v²), so an uncertain constant with variance s² adds (s
   * σ_w²/(σ_w² + σ_v²))² to the variance; no uncertainty adds nothing. Exact but for rounding, μ
   * being linear.
   */
  @Test
  void uncertainConstantWidens() throws IOException {
    ComposedFit fit =
        ComposedFit.of(
            new ComposedErrors(
                PublishedDesigns.electricity(),
                OneSidedLaw.HALF_NORMAL,
                Sharing.NONE,
                new double[0]));
    int size = fit.parameters().length;
    ConditionalErrors known = fit.conditional();
    ConditionalErrors same = fit.conditional(new double[size][size]);
    double[][] covariance = new double[size][size];
    covariance[0][0] = .05 * .05;
    ConditionalErrors wide = fit.conditional(covariance);
    double u = fit.scale() * fit.scale();
    double v = fit.noise() * fit.noise();
    double deviation = Math.sqrt(u * v / (u + v) + Math.pow(.05 * u / (u + v), 2));
    double[][] block = new double[6][123];
    PublishedDesigns.electricity().fill(0, 123, block);
    for (int row : new int[] {0, 50, 122}) {
      double error = block[5][row];
      for (int k = 0; k < 5; k++) {
        error -= fit.coefficients()[k] * block[k][row];
      }
      double mean = -error * u / (u + v);
      assertThat(same.exceeded(row, .3)).isEqualTo(known.exceeded(row, .3));
      assertThat(wide.exceeded(row, .3))
          .isCloseTo(NormalTail.exceeded(.3, mean, deviation), within(1e-10));
    }
  }
}
