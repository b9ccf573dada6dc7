package isowright.study;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import isowright.study.PlanDetail.Envelope;
import isowright.study.PlanDetail.EnvelopePoint;
import isowright.study.PlanFindings.Planned;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Locale;
import java.util.Objects;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/**
 * Least-cost questions to fitted cost functions, on invented records without chance, so that every
 * answer is known: variable cost V = e^0.2 w^0.6 m^0.4 Q^1.5 K^−0.5 of plants that differ by 10 %
 * steps, with labour at w, materials at m and a kiln K.
 */
class CostPlansTest {

  @TempDir private Path folder;

  private static final String STUDY =
      """
      title: Kilns
      records: {file: kilns.csv, plant: works, period: year}
      costs:
        variable: cost
        outputs: {bricks: {column: bricks, unit: t}}
        fixed-inputs: {kiln: {column: kiln, unit: m3}}
        inputs:
          labour: {price: wage}
          materials: {price: clay}
        technologies: [cobb-douglas-cost]
        system: false
      estimation: {plant-effects: %s}
      least-cost:
        - %s
      """;

  private static double variable(double wage, double clay, double bricks, double kiln) {
    return Math.exp(0.2)
        * Math.pow(wage, 0.6)
        * Math.pow(clay, 0.4)
        * Math.pow(bricks, 1.5)
        / Math.sqrt(kiln);
  }

  private Planned only(String effects, String question) throws Exception {
    return findings(effects, question).plans().get(0);
  }

  private Findings findings(String effects, String question) throws Exception {
    Random random = new Random(3);
    StringBuilder csv = new StringBuilder("works,year,cost,wage,clay,bricks,kiln\n");
    for (int plant = 0; plant < 9; plant++) {
      for (int year = 2018; year < 2024; year++) {
        double wage = 20 * Math.exp(0.2 * random.nextGaussian());
        double clay = 5 * Math.exp(0.3 * random.nextGaussian());
        double bricks = 400 * Math.exp(0.5 * random.nextGaussian());
        double kiln = 100 * Math.exp(0.5 * random.nextGaussian());
        double level = Math.exp(0.1 * (plant - 4));
        csv.append(
            String.format(
                Locale.ROOT,
                "W%d,%d,%.12g,%.12g,%.12g,%.12g,%.12g%n",
                plant,
                year,
                level * variable(wage, clay, bricks, kiln),
                wage,
                clay,
                bricks,
                kiln));
      }
    }
    Files.writeString(folder.resolve("kilns.csv"), csv);
    Path file =
        Files.writeString(
            folder.resolve("study.yaml"), String.format(Locale.ROOT, STUDY, effects, question));
    return Pipeline.run(StudyFile.read(file), Progress.SILENT);
  }

  /** Held without a price: variable cost, said to be so; figures written to twelve digits. */
  @Test
  void shortRunOfVariableCost() throws Exception {
    Planned plan =
        only(
            "within",
            "{name: Now, target: 400, prices: {labour: 20, materials: 5}, hold: {kiln: 80}}");
    double expected = variable(20, 5, 400, 80);
    assertThat(plan.status()).isEqualTo("solved");
    assertThat(value(plan.cost())).isCloseTo(expected, within(1e-8 * expected));
    assertThat(value(plan.marginalCost())).isCloseTo(1.5 * expected / 400, within(1e-8 * expected));
    assertThat(Objects.requireNonNull(plan.mix().get("labour")).value())
        .isCloseTo(0.6 * expected / 20, within(1e-8 * expected));
    assertThat(plan.mix().get("kiln")).isEqualTo(Figure.exact(80));
    assertThat(plan.limits()).containsEntry("kiln", "held at 80 m3");
    assertThat(plan.remarks()).extracting(Findings.Said::code).containsExactly("variable-cost");
    assertThat(plan.productivity()).isEqualTo("the typical plant");
  }

  /** The level of one plant: two 10 % steps above the typical. */
  @Test
  void theCostOfOnePlant() throws Exception {
    Planned plan =
        only(
            "within",
            "{name: Now, target: 400, prices: {labour: 20, materials: 5}, hold: {kiln: 80},"
                + " productivity: {plant: W6}}");
    double expected = Math.exp(0.2) * variable(20, 5, 400, 80);
    assertThat(value(plan.cost())).isCloseTo(expected, within(1e-8 * expected));
    assertThat(plan.productivity()).isEqualTo("plant W6");
  }

  /** With a price of the kiln: K where ½ V/K = p, so K = (V₁/(2p))^⅔ with V₁ = V √K. */
  @Test
  void longRunOfVariableCost() throws Exception {
    Planned plan =
        only("within", "{name: Later, target: 400, prices: {labour: 20, materials: 5, kiln: 50}}");
    double unit = variable(20, 5, 400, 1);
    double kiln = Math.pow(unit / 100, 2.0 / 3);
    double expected = unit / Math.sqrt(kiln) + 50 * kiln;
    assertThat(value(plan.cost())).isCloseTo(expected, within(1e-8 * expected));
    assertThat(Objects.requireNonNull(plan.mix().get("kiln")).value())
        .isCloseTo(kiln, within(1e-7 * kiln));
    // V ~ Q^1.5 K^-0.5 makes constant returns to scale in the long run
    assertThat(value(plan.marginalCost())).isCloseTo(expected / 400, within(1e-8 * expected));
    assertThat(Objects.requireNonNull(plan.shares().get("kiln")).value())
        .isCloseTo(1.0 / 3, within(1e-8));
    assertThat(plan.remarks()).isEmpty();
    PlanDetail.Checks checks = plan.detail().checks().orElseThrow();
    // central differences of relative step 1e-4
    assertThat(checks.shephard()).isLessThan(1e-7);
    assertThat(checks.homogeneity()).isLessThan(1e-9);
    assertThat(checks.marginalCost()).isLessThan(1e-7);
  }

  /** Short run never below long run; they touch where the kiln is that of the long run. */
  @Test
  void envelope() throws Exception {
    Planned plan =
        only(
            "within",
            "{name: Held, target: 400, prices: {labour: 20, materials: 5, kiln: 50},"
                + " hold: {kiln: 80}, curve: {from: 100, to: 900, points: 17}}");
    double expected = variable(20, 5, 400, 80) + 50 * 80;
    assertThat(value(plan.cost())).isCloseTo(expected, within(1e-8 * expected));
    Envelope envelope = plan.detail().envelope().orElseThrow();
    assertThat(envelope.points()).hasSize(17);
    for (EnvelopePoint point : envelope.points()) {
      // rounding of costs of order 1e5
      assertThat(point.shortRun().value()).isGreaterThanOrEqualTo(point.longRun().value() - 1e-6);
    }
    double touch = 80 / Math.pow(variable(20, 5, 1, 1) / 100, 2.0 / 3);
    assertThat(envelope.touch().orElseThrow().value()).isCloseTo(touch, within(1e-7 * touch));
  }

  /** Rows carried to the same prices: average variable cost of one plant moves with Q^0.5 alone. */
  @Test
  void averageCostAtMeanPrices() throws Exception {
    CostRows rows =
        findings("within", "{name: Now, target: 400, prices: {labour: 20, materials: 5}}")
            .costs()
            .fits()
            .get(0)
            .rows();
    for (int k = 1; k < 6; k++) {
      CostRows.Row one = rows.rows().get(0);
      CostRows.Row other = rows.rows().get(k);
      assertThat(other.plant()).isEqualTo(one.plant());
      double ratio = Math.sqrt(other.output() / one.output());
      // figures written to twelve digits
      assertThat(other.averageCost() / one.averageCost()).isCloseTo(ratio, within(1e-9));
    }
    assertThat(rows.fixed()).containsExactly("kiln");
    // the typical plant is the fifth, so that its rows lie on the curve at the same power
    CostRows.Row typical = rows.rows().get(4 * 6);
    CostRows.AveragePoint point = rows.average().get(0);
    assertThat(typical.averageCost() / point.cost().value())
        .isCloseTo(Math.sqrt(typical.output() / point.output()), within(1e-9));
  }

  /** Neither held nor priced: at the mean of the period, and said so. */
  @Test
  void neitherHeldNorPriced() throws Exception {
    Planned plan = only("none", "{name: Now, target: 400, prices: {labour: 20, materials: 5}}");
    assertThat(plan.limits().get("kiln")).startsWith("at the mean of the period, ").endsWith("m3");
  }

  /** A price that no quantity is worth: said, not answered. */
  @Test
  void noLongRun() throws Exception {
    Planned plan =
        only(
            "none", "{name: Never, target: 400, prices: {labour: 20, materials: 5, kiln: 0.0001}}");
    assertThat(plan.status()).isEqualTo("infeasible");
    assertThat(plan.remarks())
        .singleElement()
        .satisfies(said -> assertThat(said.message()).contains("no least in kiln"));
  }

  @Test
  void whatIsNoInputIsRefused() {
    assertThatThrownBy(() -> only("none", "{name: Now, target: 400, hold: {oven: 80}}"))
        .isInstanceOfSatisfying(
            StudyRefused.class,
            refused ->
                assertThat(refused.mistakes())
                    .singleElement()
                    .satisfies(mistake -> assertThat(mistake.message()).contains("oven", "kiln")));
  }

  private static double value(java.util.Optional<Figure> figure) {
    return figure.orElseThrow().value();
  }
}
