package isowright.inference;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import isowright.cost.CostArguments;
import isowright.cost.CostForm;
import isowright.estimation.CostData;
import isowright.estimation.CostEstimation;
import isowright.estimation.CostFit;
import isowright.estimation.CostFixtures;
import isowright.estimation.CostSpecification;
import isowright.estimation.CostSpecification.Equations;
import isowright.regression.Groups;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import org.junit.jupiter.api.Test;

/** Tests of cost functions against published statistics and against R. */
class CostHypothesesTest {

  private static CostFit fit(CostData data, CostForm form, Equations equations) {
    int last = data.arguments().inputs().size() - 1;
    return CostEstimation.fit(
        data, new CostSpecification(form, equations, true, List.of(), false, false, last, 0.95));
  }

  private static Verdict verdict(CostData data, CostFit fit, String name) {
    return CostHypotheses.of(data, fit).stream()
        .filter(v -> v.name().equals(name))
        .findFirst()
        .orElseThrow();
  }

  /** Berndt and Wood (1975): likelihood ratio of symmetry 12.84, three degrees of freedom. */
  @Test
  void symmetryOfManufacturing() throws IOException {
    CostData data = CostFixtures.manufacturing();
    Verdict verdict =
        verdict(data, fit(data, CostForm.TRANSLOG, Equations.SHARES), "symmetric-shares");
    assertThat(verdict.statistic()).isCloseTo(12.84, within(0.5e-2));
    assertThat(verdict.law().degreesOfFreedom()).containsExactly(3.0);
    assertThat(verdict.rejects()).isTrue();
  }

  /** The tests that apply, each with restrictions counted by hand for three prices, one output. */
  @Test
  void testsOfElectricity() throws IOException {
    CostData data = CostFixtures.electricity();
    List<Verdict> verdicts =
        CostHypotheses.of(data, fit(data, CostForm.TRANSLOG, Equations.SYSTEM));
    assertThat(verdicts)
        .extracting(Verdict::name)
        .containsExactly(
            "price-homogeneity",
            "symmetric-shares",
            "homothetic",
            "homogeneous-in-output",
            "constant-returns",
            "unit-substitution");
    assertThat(verdicts)
        .extracting(v -> v.law().degreesOfFreedom().get(0))
        // 1 + 3 + 1; shares of capital and labour: 2 × (constant, two prices, output); two
        // products with output; the square as well; its coefficient as well; three of prices
        .containsExactly(5.0, 8.0, 2.0, 3.0, 4.0, 3.0);
    assertThat(verdicts).allSatisfy(v -> assertThat(v.p()).isBetween(0.0, 1.0));
  }

  /** One equation: F of homogeneity equals what least squares with and without it gives. */
  @Test
  void homogeneityOfTheCostEquation() throws IOException {
    CostData data = CostFixtures.electricity();
    CostFit held = fit(data, CostForm.COBB_DOUGLAS_SQUARED_OUTPUT, Equations.COST);
    Verdict verdict = verdict(data, held, "price-homogeneity");
    double reference =
        Files.readAllLines(Path.of("src/test/resources/reference/equation-systems.csv")).stream()
            .map(line -> line.split(",", -1))
            .filter(row -> row[1].equals("homogeneity F"))
            .mapToDouble(row -> Double.parseDouble(row[2]))
            .findFirst()
            .orElseThrow();
    // the difference of two sums of squares that agree to three digits
    assertThat(verdict.statistic()).isCloseTo(reference, within(1e-9));
    assertThat(verdict.law().degreesOfFreedom()).containsExactly(1.0, 117.0);
  }

  /** Shares printed with a slip in row 62 depend on the one left out; rescaled ones do not. */
  @Test
  void dependenceOnTheShareLeftOutShowsSlips() throws IOException {
    CostData data = CostFixtures.electricity();
    CostFit fit = fit(data, CostForm.TRANSLOG, Equations.SYSTEM);
    assertThat(CostEstimation.dependenceOnLeftOut(data, fit)).isGreaterThan(1e-3);
    double[][] shares = new double[3][data.rows()];
    for (int row = 0; row < data.rows(); row++) {
      double sum = data.shares()[0][row] + data.shares()[1][row] + data.shares()[2][row];
      for (int i = 0; i < 3; i++) {
        shares[i][row] = data.shares()[i][row] / sum;
      }
    }
    CostData mended =
        new CostData(
            data.arguments(),
            data.points(),
            data.logCost(),
            shares,
            data.controls(),
            data.controlNames(),
            data.groups());
    CostFit again = fit(mended, CostForm.TRANSLOG, Equations.SYSTEM);
    // renewals end at 1e-9 of standard errors, which reach 0.2
    assertThat(CostEstimation.dependenceOnLeftOut(mended, again)).isLessThan(1e-8);
  }

  private static CostFit clustered(CostData data, CostForm form, Equations equations) {
    int last = data.arguments().inputs().size() - 1;
    return CostEstimation.fit(
        data, new CostSpecification(form, equations, true, List.of(), false, true, last, 0.95));
  }

  /** Clustered: Wald tests in their F form, with the same counts of restrictions. */
  @Test
  void clusteredTestsOfElectricity() throws IOException {
    CostData data = CostFixtures.electricity();
    List<Verdict> verdicts =
        CostHypotheses.of(data, clustered(data, CostForm.TRANSLOG, Equations.SYSTEM));
    assertThat(verdicts)
        .extracting(v -> v.law().name() + v.law().degreesOfFreedom())
        .containsExactly(
            "F[5.0, 122.0]",
            "F[8.0, 122.0]",
            "F[2.0, 122.0]",
            "F[3.0, 122.0]",
            "F[4.0, 122.0]",
            "F[3.0, 122.0]");
  }

  /**
   * One restriction: the Wald statistic is the square of t, here of the product of price and price
   * that unit substitution sets to zero with two prices, by the clustered standard error.
   */
  @Test
  void oneRestrictionIsTheSquareOfT() throws IOException {
    CostData own = CostFixtures.electricity();
    CostData two =
        new CostData(
            CostArguments.ownUnits(List.of("capital", "fuel"), List.of("power"), List.of(), false),
            new double[][] {own.points()[0], own.points()[2], own.points()[3]},
            own.logCost(),
            new double[][] {own.shares()[0], own.shares()[2]},
            own.controls(),
            own.controlNames(),
            own.groups());
    CostFit fit = clustered(two, CostForm.TRANSLOG, Equations.SYSTEM);
    double t = fit.value("capital*capital") / fit.standardError("capital*capital");
    Verdict verdict = verdict(two, fit, "unit-substitution");
    assertThat(verdict.law().degreesOfFreedom()).containsExactly(1.0, 122.0);
    // the same numbers in another order of operations
    assertThat(verdict.statistic()).isCloseTo(t * t, within(1e-8 * t * t));
  }

  /** Restrictions that more than use up the firms are left out, not made up. */
  @Test
  void moreRestrictionsThanFirmsCanBear() throws IOException {
    CostData own = CostFixtures.electricity();
    CostData few =
        new CostData(
            own.arguments(),
            own.points(),
            own.logCost(),
            own.shares(),
            own.controls(),
            own.controlNames(),
            Groups.startingAt(123, new int[] {0, 30, 60, 90}));
    List<Verdict> verdicts =
        CostHypotheses.of(few, clustered(few, CostForm.TRANSLOG, Equations.SYSTEM));
    // four firms bear three restrictions at most: 5, 8 and 4 are left out
    assertThat(verdicts)
        .extracting(Verdict::name)
        .isSubsetOf("homothetic", "homogeneous-in-output", "unit-substitution")
        .contains("homothetic");
  }
}
