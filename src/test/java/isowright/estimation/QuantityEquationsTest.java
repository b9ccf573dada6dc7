package isowright.estimation;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import isowright.cost.CostElasticities;
import isowright.cost.CostForm;
import isowright.estimation.CostSpecification.Concavity;
import isowright.estimation.CostSpecification.Equations;
import isowright.estimation.CostSpecification.Restriction;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import org.junit.jupiter.api.Test;

/**
 * Cost functions in levels fitted to input quantities, held against R (the script stands beside the
 * values; the formulas there are written anew).
 */
class QuantityEquationsTest {

  static CostSpecification specification(CostForm form, Concavity concavity) {
    return new CostSpecification(
        form, Equations.QUANTITIES, true, List.of(), false, false, 0, 0.95, concavity);
  }

  private static void agrees(CostFit fit, String form, double tolerance) throws IOException {
    int met = 0;
    for (String line :
        Files.readAllLines(Path.of("src/test/resources/reference/cost-forms-in-levels.csv"))) {
      String[] row = line.split(",", -1);
      if (!row[0].equals(form)) {
        continue;
      }
      double value = Double.parseDouble(row[2]);
      if (row[1].equals("logLikelihood")) {
        assertThat(fit.system().logLikelihood()).isCloseTo(value, within(1e-8));
        continue;
      }
      int k = place(fit, Integer.parseInt(row[1]));
      double se = Math.sqrt(fit.covariance()[k][k]);
      assertThat(fit.values()[k]).as(fit.names().get(k)).isCloseTo(value, within(tolerance * se));
      if (!row[3].isEmpty()) {
        double reference = Double.parseDouble(row[3]);
        assertThat(se).isCloseTo(reference, within(tolerance * reference));
      }
      met++;
    }
    assertThat(met).isEqualTo(21);
  }

  /** The script writes parameters in the order of {@code GeneralisedCost}. */
  private static int place(CostFit fit, int inScript) {
    assertThat(fit.names()).hasSize(21);
    return inScript;
  }

  /** Iterated to 1e-10 of standard errors there, to 1e-9 here; twelve digits are written. */
  @Test
  void leontief() throws IOException {
    CostFit fit =
        CostEstimation.fit(
            CostFixtures.manufacturingOfOutput(),
            specification(CostForm.GENERALISED_LEONTIEF, Concavity.FREE));
    assertThat(fit.system().converged()).isTrue();
    agrees(fit, "leontief", 1e-6);
  }

  @Test
  void mcfaddenAsTheRecordsHaveIt() throws IOException {
    CostFit fit =
        CostEstimation.fit(
            CostFixtures.manufacturingOfOutput(), specification(CostForm.MCFADDEN, Concavity.FREE));
    agrees(fit, "mcfadden-free", 1e-6);
  }

  /**
   * With curvature imposed: a general search of the concentrated likelihood from eight starts ends
   * where slopes are of order 1e-4 per standard error, so that it meets parameters to some 1e-4 of
   * theirs.
   */
  @Test
  void mcfaddenConcave() throws IOException {
    CostData data = CostFixtures.manufacturingOfOutput();
    CostFit fit = CostEstimation.fit(data, specification(CostForm.MCFADDEN, Concavity.EVERYWHERE));
    assertThat(fit.system().converged()).isTrue();
    agrees(fit, "mcfadden", 1e-4);
    assertThat(fit.system().logLikelihood())
        .isLessThan(fit.imposed().orElseThrow().logLikelihood());
    for (int row = 0; row < data.rows(); row++) {
      assertThat(CostElasticities.at(fit.function(), data.point(row)).concave()).isTrue();
    }
  }

  /** Constant returns hold exactly where they are imposed, and lower the likelihood. */
  @Test
  void constantReturns() throws IOException {
    CostData data = CostFixtures.manufacturingOfOutput();
    CostSpecification free = specification(CostForm.GENERALISED_LEONTIEF, Concavity.FREE);
    CostFit held = CostEstimation.fit(data, free.restricted(List.of(Restriction.CONSTANT_RETURNS)));
    for (int row = 0; row < data.rows(); row++) {
      assertThat(CostElasticities.at(held.function(), data.point(row)).scaleEconomies())
          .isCloseTo(1, within(1e-12));
    }
    assertThat(held.system().logLikelihood())
        .isLessThan(CostEstimation.fit(data, free).system().logLikelihood());
  }
}
