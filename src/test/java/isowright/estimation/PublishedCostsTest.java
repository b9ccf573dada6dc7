package isowright.estimation;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import isowright.cost.CostElasticities;
import isowright.cost.CostForm;
import isowright.estimation.CostSpecification.Equations;
import isowright.estimation.CostSpecification.Restriction;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Map;
import org.junit.jupiter.api.Test;

/** Cost functions held against published tables; six decimals where a table is carried on by R. */
class PublishedCostsTest {

  private static final double SIX_DECIMALS = 0.5e-6;

  /** R iterates to 1e-12 and writes 15 digits; coefficients are of order one to ten. */
  private static final double REFERENCE = 1e-8;

  static CostSpecification specification(CostForm form, Equations equations, int leftOut) {
    return new CostSpecification(form, equations, true, List.of(), false, false, leftOut, 0.95);
  }

  /**
   * Christensen and Greene (1976); Greene, 5th ed., example 5.6: ln(C/p_fuel) on ln Q, ½ ln²Q and
   * relative prices.
   */
  @Test
  void electricityCostEquation() throws IOException {
    CostFit fit =
        CostEstimation.fit(
            CostFixtures.electricity(),
            specification(CostForm.COBB_DOUGLAS_SQUARED_OUTPUT, Equations.COST, 2));
    Map<String, double[]> published =
        Map.of(
            "constant", new double[] {-7.294021, .344277},
            "power", new double[] {.390909, .036988},
            "power*power", new double[] {.062413, .005155},
            "capital", new double[] {.074787, .061645},
            "labour", new double[] {.260785, .068109});
    published.forEach(
        (name, numbers) -> {
          assertThat(fit.value(name)).as(name).isCloseTo(numbers[0], within(SIX_DECIMALS));
          assertThat(fit.standardError(name)).as(name).isCloseTo(numbers[1], within(SIX_DECIMALS));
        });
    double ssr = fit.system().residualCovariance()[0][0] * 123;
    assertThat(ssr).isCloseTo(2.443509, within(SIX_DECIMALS));
    // two printed coefficients, half a unit of the sixth decimal each
    assertThat(fit.value("fuel")).isCloseTo(1 - .074787 - .260785, within(1e-6));
    double scale = Math.exp((1 - fit.value("power")) / fit.value("power*power"));
    assertThat(scale).isCloseTo(17_309.9, within(.05));
  }

  /** The translog system of the same sample, iterated; R with the script beside the values. */
  @Test
  void electricitySystem() throws IOException {
    CostFit fit =
        CostEstimation.fit(
            CostFixtures.electricity(), specification(CostForm.TRANSLOG, Equations.SYSTEM, 2));
    assertThat(fit.system().converged()).isTrue();
    Map<String, String> names =
        Map.of(
            "C_(Intercept)",
            "constant",
            "C_y",
            "power",
            "C_yy",
            "power*power",
            "C_k",
            "capital",
            "C_l",
            "labour",
            "C_kk",
            "capital*capital",
            "C_ll",
            "labour*labour",
            "C_kl",
            "capital*labour",
            "C_yk",
            "capital*power",
            "C_yl",
            "labour*power");
    int met = 0;
    for (String line :
        Files.readAllLines(Path.of("src/test/resources/reference/equation-systems.csv"))) {
      String[] row = line.split(",", -1);
      String name = row[0].equals("electricity") ? names.get(row[1]) : null;
      if (name != null) {
        assertThat(fit.value(name))
            .as(name)
            .isCloseTo(Double.parseDouble(row[2]), within(REFERENCE));
        assertThat(fit.standardError(name))
            .as("se of " + name)
            .isCloseTo(Double.parseDouble(row[3]), within(REFERENCE));
        met++;
      }
    }
    assertThat(met).isEqualTo(10);
    assertThat(fit.system().logLikelihood()).as("printed").isCloseTo(508.81, within(0.5e-2));
  }

  /** Greene, 5th ed., on the same estimates: 116 of 123 companies with economies of scale. */
  @Test
  void economiesOfScaleInElectricity() throws IOException {
    CostData data = CostFixtures.electricity();
    CostFit fit = CostEstimation.fit(data, specification(CostForm.TRANSLOG, Equations.SYSTEM, 2));
    int economies = 0;
    for (int row = 0; row < data.rows(); row++) {
      economies +=
          CostElasticities.at(fit.function(), data.point(row)).scaleEconomies() > 1 ? 1 : 0;
    }
    assertThat(economies).isEqualTo(116);
  }

  /** Berndt and Wood (1975), 1959: fitted shares, Allen and own-price elasticities, as printed. */
  @Test
  void manufacturingIn1959() throws IOException {
    CostData data = CostFixtures.manufacturing();
    CostFit fit = CostEstimation.fit(data, specification(CostForm.TRANSLOG, Equations.SHARES, 3));
    assertThat(fit.system().logLikelihood()).isCloseTo(344.467, within(0.5e-3));
    // The printed six decimals come from an iteration that stopped at 1e-5: R, run to 1e-12,
    // departs
    // from them by up to 1e-6 as well (SeeminglyUnrelatedTest meets it to 1e-8).
    assertThat(fit.value("materials")).isCloseTo(.645260, within(1e-6));
    assertThat(fit.value("materials*materials")).isCloseTo(.092297, within(1e-6));
    CostElasticities at = CostElasticities.at(fit.function(), data.point(1959 - 1947));
    assertThat(at.shares())
        .containsExactly(new double[] {.0564, .2745, .0439, .6252}, within(0.5e-4));
    double[][] allen = {
      {-7.462, .997, -3.313, .468}, {0, -1.642, .605, .588}, {0, 0, -12.264, .894}, {0, 0, 0, -.363}
    };
    double[] own = {-.4208, -.4507, -.5383, -.2272};
    for (int i = 0; i < 4; i++) {
      for (int j = i; j < 4; j++) {
        assertThat(at.allen(i, j)).as(i + "," + j).isCloseTo(allen[i][j], within(0.5e-3));
      }
      assertThat(at.demand(i, i)).isCloseTo(own[i], within(0.5e-4));
    }
  }

  /** Concave and monotone in all 25 years, as published. */
  @Test
  void manufacturingIsRegularInEveryYear() throws IOException {
    CostData data = CostFixtures.manufacturing();
    CostFit fit = CostEstimation.fit(data, specification(CostForm.TRANSLOG, Equations.SHARES, 3));
    for (int row = 0; row < 25; row++) {
      CostElasticities at = CostElasticities.at(fit.function(), data.point(row));
      assertThat(at.concave()).as("row " + row).isTrue();
      assertThat(at.monotone()).as("row " + row).isTrue();
    }
  }

  /** Restrictions nest: imposing more never raises the likelihood, and they hold exactly. */
  @Test
  void restrictionsHoldExactly() throws IOException {
    CostData data = CostFixtures.electricity();
    CostSpecification free = specification(CostForm.TRANSLOG, Equations.SYSTEM, 2);
    double before = CostEstimation.fit(data, free).system().logLikelihood();
    for (List<Restriction> imposed :
        List.of(
            List.of(Restriction.HOMOTHETIC),
            List.of(Restriction.HOMOGENEOUS_IN_OUTPUT),
            List.of(Restriction.CONSTANT_RETURNS),
            List.of(Restriction.CONSTANT_RETURNS, Restriction.UNIT_SUBSTITUTION))) {
      CostFit fit = CostEstimation.fit(data, free.restricted(imposed));
      assertThat(fit.system().logLikelihood()).as("" + imposed).isLessThan(before);
      before = fit.system().logLikelihood();
      assertThat(fit.value("capital*power")).isZero();
      assertThat(fit.value("fuel*power")).isZero();
    }
    CostFit last = CostEstimation.fit(data, free.restricted(List.of(Restriction.CONSTANT_RETURNS)));
    assertThat(last.value("power")).isEqualTo(1);
    assertThat(last.standardError("power")).isZero();
  }
}
