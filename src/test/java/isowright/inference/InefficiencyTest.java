package isowright.inference;

import static isowright.inference.FrontierHypothesesTest.frontier;
import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import isowright.estimation.Estimator.OverTime;
import isowright.estimation.Fit;
import isowright.estimation.FrontierPanels;
import isowright.estimation.PanelFixtures;
import isowright.inference.Inefficiency.Variances;
import isowright.regression.OneSidedLaw;
import java.util.Locale;
import org.apache.commons.math3.analysis.integration.IterativeLegendreGaussIntegrator;
import org.apache.commons.statistics.distribution.NormalDistribution;
import org.junit.jupiter.api.Test;

/** How much inefficiency there is and where, against quadrature, differences and R. */
class InefficiencyTest {

  private static final NormalDistribution NORMAL = NormalDistribution.of(0, 1);

  private static double integral(
      org.apache.commons.math3.analysis.UnivariateFunction function, double from, double to) {
    return new IterativeLegendreGaussIntegrator(20, 1e-12, 1e-14)
        .integrate(1_000_000, function, from, to);
  }

  /**
   * One row by Bayes' rule: the law of u times the normal density of the residual plus u, with no
   * completed square. Integrals are good to about 1e-10 of their size.
   */
  @Test
  void rowsAgainstQuadrature() {
    for (OneSidedLaw law : OneSidedLaw.values()) {
      Fit fit =
          frontier(
              FrontierPanels.draw(3, 60, 3, law, .1, .25, false, 0).panel(),
              law,
              OverTime.EACH_ROW);
      Variances v = Inefficiency.of(fit).orElseThrow().variances().orElseThrow();
      // The law itself, with no parameter uncertain.
      Inefficiency all = Inefficiency.of(fit).orElseThrow();
      Inefficiency found =
          new Inefficiency(all.variances(), all.known(), all.known(), all.mean(), all.byEffects());
      for (int row : new int[] {0, 40, 91, 170}) {
        double error = fit.numbers().residuals()[row] - v.mean().value();
        double noise = v.noise().value();
        double scale = v.inefficiency().value();
        org.apache.commons.math3.analysis.UnivariateFunction density =
            u ->
                (law == OneSidedLaw.HALF_NORMAL ? NORMAL.density(u / scale) : Math.exp(-u / scale))
                    * NORMAL.density((error + u) / noise);
        double most = 15 * Math.max(scale, noise);
        double whole = integral(density, 0, most);
        double mean = integral(u -> u * density.value(u), 0, most) / whole;
        double square = integral(u -> u * u * density.value(u), 0, most) / whole;
        Estimate estimate = found.ofRow(row, .95);
        assertThat(estimate.value()).isCloseTo(mean, within(1e-8));
        assertThat(estimate.standardError())
            .isCloseTo(Math.sqrt(square - mean * mean), within(1e-7));
        assertThat(integral(density, 0, estimate.low()) / whole).isCloseTo(.025, within(1e-8));
        assertThat(integral(density, 0, estimate.high()) / whole).isCloseTo(.975, within(1e-8));
        double reached = integral(u -> Math.exp(-u) * density.value(u), 0, most) / whole;
        double twice = integral(u -> Math.exp(-2 * u) * density.value(u), 0, most) / whole;
        Estimate efficiency = found.efficiency(row, .95);
        assertThat(efficiency.value()).isCloseTo(reached, within(1e-8));
        assertThat(efficiency.standardError())
            .isCloseTo(Math.sqrt(twice - reached * reached), within(1e-7));
        assertThat(efficiency.low()).isCloseTo(Math.exp(-estimate.high()), within(1e-12));
        double above = integral(density, v.mean().value(), most) / whole;
        assertThat(found.probabilityAbove(row, v.mean().value())).isCloseTo(above, within(1e-8));
      }
    }
  }

  /** Shares and ratios from their definitions; standard errors from differences of the logs. */
  @Test
  void variancesByTheirDefinitions() {
    for (OneSidedLaw law : OneSidedLaw.values()) {
      Fit fit = frontier(PanelFixtures.glassworks(), law, OverTime.CONSTANT);
      Variances v = Inefficiency.of(fit).orElseThrow().variances().orElseThrow();
      double[][] covariance = fit.numbers().covarianceSource().matrix();
      int first = fit.numbers().linear().columns().size();
      double noise = v.noise().value();
      double scale = v.inefficiency().value();
      double part = law == OneSidedLaw.HALF_NORMAL ? 1 - 2 / Math.PI : 1;
      double[][] values = new double[3][3];
      double h = 1e-5;
      for (int k = 0; k < 3; k++) {
        double s = noise * Math.exp(k == 1 ? h : 0);
        double u = scale * Math.exp(k == 2 ? h : 0);
        values[k] =
            new double[] {u / s, u * u / (u * u + s * s), part * u * u / (part * u * u + s * s)};
      }
      Estimate[] found = {v.ratio(), v.gamma(), v.share()};
      for (int f = 0; f < 3; f++) {
        double byNoise = (values[1][f] - values[0][f]) / h;
        double byScale = (values[2][f] - values[0][f]) / h;
        double variance =
            byNoise * byNoise * covariance[first][first]
                + 2 * byNoise * byScale * covariance[first][first + 1]
                + byScale * byScale * covariance[first + 1][first + 1];
        assertThat(found[f].value()).isCloseTo(values[0][f], within(1e-12));
        // One-sided differences with a step of 1e-5 are good to that.
        assertThat(found[f].standardError())
            .isCloseTo(Math.sqrt(variance), within(1e-4 * Math.sqrt(variance)));
        assertThat(found[f].low()).isPositive().isLessThan(found[f].value());
      }
      assertThat(v.gamma().high()).isLessThan(1);
      assertThat(v.mean().value())
          .isCloseTo(
              law == OneSidedLaw.HALF_NORMAL ? scale * Math.sqrt(2 / Math.PI) : scale,
              within(1e-12));
    }
  }

  /** Against a regression with a dummy for each state in R, to its rounding. */
  @Test
  void byEffectsAgainstR() {
    Fit fit = frontier(PanelFixtures.usStates(), OneSidedLaw.HALF_NORMAL, OverTime.CONSTANT);
    Inefficiency.ByEffects by = Inefficiency.of(fit).orElseThrow().byEffects().orElseThrow();
    ReferenceValues reference = ReferenceValues.of("frontier-effects.csv");
    for (int p = 0; p < by.plants().size(); p++) {
      String state = fit.panel().plants().get(p).toUpperCase(Locale.ROOT);
      double[] expected = reference.numbers("states", state);
      assertThat(by.plants().get(p).value()).as(state).isCloseTo(expected[0], within(1e-8));
      assertThat(by.plants().get(p).standardError()).as(state).isCloseTo(expected[1], within(1e-8));
    }
    assertThat(fit.panel().plants().get(by.best())).isEqualTo("WYOMING");
    assertThat(by.plants().get(by.best()).value()).isZero();
  }

  @Test
  void whereNothingWasFoundNothingIsSaid() {
    Fit metals =
        frontier(PanelFixtures.primaryMetals(), OneSidedLaw.HALF_NORMAL, OverTime.EACH_ROW);
    Inefficiency none = Inefficiency.of(metals).orElseThrow();
    assertThat(none.variances()).isEmpty();
    assertThat(none.known()).isEmpty();
    assertThat(none.mean()).isZero();
    assertThat(none.byEffects()).isEmpty();
  }
}
