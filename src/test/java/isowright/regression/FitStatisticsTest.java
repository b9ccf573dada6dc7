package isowright.regression;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.SplittableRandom;
import org.apache.commons.math3.distribution.NormalDistribution;
import org.junit.jupiter.api.Test;

class FitStatisticsTest {

  @Test
  void rSquaredOfNorrisIsCertified() {
    LinearFit fit = LeastSquares.fit(NistSet.read("Norris").linearDesign());
    // NIST StRD, Norris: R-squared 0.999993745883712, fifteen digits.
    assertThat(FitStatistics.of(fit).rSquared()).isCloseTo(0.999993745883712, within(2e-15));
    assertThat(FitStatistics.of(fit).residualStandardError())
        .isCloseTo(0.884796396144373, within(1e-13));
  }

  @Test
  void logLikelihoodIsThatOfNormalErrors() {
    ArrayDesign design = RandomDesigns.grouped(new SplittableRandom(51), 120, 3, 4);
    LinearFit fit = LeastSquares.fit(design);
    NormalDistribution errors = new NormalDistribution(0, Math.sqrt(fit.ssr() / fit.rows()));
    double sum = 0;
    for (double residual : LeastSquares.residuals(design, fit)) {
      sum += errors.logDensity(residual);
    }
    FitStatistics statistics = FitStatistics.of(fit);
    // 120 terms of size one.
    assertThat(statistics.logLikelihood()).isCloseTo(sum, within(1e-11));
    assertThat(statistics.parameters()).isEqualTo(4);
    assertThat(statistics.aic()).isCloseTo(8 - 2 * sum, within(1e-11));
    assertThat(statistics.bic()).isCloseTo(4 * Math.log(120) - 2 * sum, within(1e-11));
  }

  @Test
  void everyGroupEffectIsAParameter() {
    ArrayDesign design = RandomDesigns.grouped(new SplittableRandom(52), 120, 3, 4);
    FitStatistics within = FitStatistics.of(LeastSquares.fit(Effects.within(design)));
    FitStatistics dummies = FitStatistics.of(LeastSquares.fit(EffectsTest.dummies(design)));
    assertThat(within.parameters()).isEqualTo(dummies.parameters());
    assertThat(within.aic()).isCloseTo(dummies.aic(), within(1e-9));
    assertThat(within.rSquared()).isLessThan(dummies.rSquared());
  }
}
