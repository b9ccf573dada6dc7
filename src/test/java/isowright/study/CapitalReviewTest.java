package isowright.study;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import isowright.study.PlanFindings.Reviewed;
import isowright.study.ReviewFindings.Variant;
import java.nio.file.Files;
import java.nio.file.Path;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** User cost, the owner's services and filed costs with gaps, from file to findings, by hand. */
class CapitalReviewTest {

  @TempDir Path folder;

  private static final String STUDY =
      """
      title: Capital
      records: {file: plants.csv, plant: plant, period: year}
      output: {column: q}
      inputs:
        labour: {quantity: hours, price: wage}
        machines: {quantity: units}
      given:
        - {name: filed, form: cobb-douglas, constant: 0, coefficients: {labour: 0.5, machines: 0.5}}
      capital:
        machines: {asset-price: price, rate: 0.06, depreciation: 0.1, price-change: change}
      owner: {hours: own, wage: 7, into: machines}
      filing:
        cost: cost
        periods: [2024, 2024]
        allowance: {controllable: 1, quantile: 0.5, years: 2, frontier-shift: 0, index: 0}
      """;

  private Study study(String rows) throws Exception {
    Files.writeString(
        folder.resolve("plants.csv"),
        "plant,year,q,hours,wage,units,price,change,own,cost\n" + rows);
    return StudyFile.read(Files.writeString(folder.resolve("study.yaml"), STUDY));
  }

  /**
   * User cost 100 · (6 % + 10 % − 2 %) = 14, the owner's 6 h at 7 over 21 units add 2: 16. y =
   * √(LK) with wage 4: least cost of 10 is 2 · 10 · √(4 · 16) = 160, and without the owner 20 √56.
   */
  @Test
  void userCostAndOwnerByHand() throws Exception {
    Findings findings = Pipeline.run(study("A,2024,10,20,4,21,100,0.02,6,500\n"), Progress.SILENT);
    Reviewed review = findings.reviews().get(0);
    assertThat(review.atPrices()).isCloseTo(20 * 4 + 21 * 16, within(1e-9));
    assertThat(review.leastCost().orElseThrow().value()).isCloseTo(160, within(1e-9));
    assertThat(review.gap().orElseThrow().value()).isCloseTo(340, within(1e-9));
    Variant without =
        findings.review().variants().stream()
            .filter(v -> v.choice().equals("without-owner"))
            .findFirst()
            .orElseThrow();
    assertThat(without.leastCost().value()).isCloseTo(20 * Math.sqrt(56), within(1e-9));
    assertThat(findings.run().settings())
        .containsEntry("capital.machines.price-change", "column change")
        .containsEntry("owner.wage", "7");
    assertThat(findings.review().allowances().get(0).years().get(2).allowance())
        .isCloseTo(160, within(1e-9));
  }

  @Test
  void aUserCostThatIsNotPositiveNamesItsRows() throws Exception {
    Study study = study("A,2024,10,20,4,21,100,0.02,6,500\nB,2024,10,20,4,21,100,0.3,6,500\n");
    assertThatThrownBy(() -> Pipeline.run(study, Progress.SILENT))
        .isInstanceOfSatisfying(
            StudyRefused.class,
            refused -> {
              Mistake mistake = refused.mistakes().get(0);
              assertThat(mistake.key()).isEqualTo("capital.machines");
              assertThat(mistake.line()).isEqualTo(10);
              assertThat(mistake.message()).contains("row 3", "averaged over several years");
            });
  }

  @Test
  void aFiledCostWithGapsNamesItsRows() throws Exception {
    Study study = study("A,2024,10,20,4,21,100,0.02,6,500\nB,2024,10,20,4,21,100,0.02,6,\n");
    assertThatThrownBy(() -> Pipeline.run(study, Progress.SILENT))
        .isInstanceOfSatisfying(
            StudyRefused.class,
            refused -> {
              Mistake mistake = refused.mistakes().get(0);
              assertThat(mistake.key()).isEqualTo("filing.cost");
              assertThat(mistake.line()).isEqualTo(13);
              assertThat(mistake.message()).contains("row 3");
            });
  }

  /** A user cost that is no price and a filed cost that is missing are told together. */
  @Test
  void whatTheRecordsLackIsToldInOneGo() throws Exception {
    Study study = study("A,2024,10,20,4,21,100,0.3,6,500\nB,2024,10,20,4,21,100,0.02,6,\n");
    assertThatThrownBy(() -> Pipeline.run(study, Progress.SILENT))
        .isInstanceOfSatisfying(
            StudyRefused.class,
            refused ->
                assertThat(refused.mistakes())
                    .extracting(Mistake::key)
                    .containsExactly("capital.machines", "filing.cost"));
  }

  /** Given technologies alone have no residuals and no plants, hence no quartile, no smearing. */
  @Test
  void aReferenceThatOnlyAFitKnowsIsRefused() throws Exception {
    String contradictory =
        STUDY.replace(
            "  cost: cost\n", "  cost: cost\n  against: best-quarter\n  smearing: true\n");
    Files.writeString(
        folder.resolve("plants.csv"),
        "plant,year,q,hours,wage,units,price,change,own,cost\nA,2024,10,20,4,21,100,0.02,6,500\n");
    Path file = Files.writeString(folder.resolve("study.yaml"), contradictory);
    assertThatThrownBy(() -> StudyFile.read(file))
        .isInstanceOfSatisfying(
            StudyRefused.class,
            refused -> {
              assertThat(refused.mistakes())
                  .extracting(Mistake::key)
                  .containsExactly("filing.against", "filing.smearing");
              assertThat(refused.mistakes().get(0).line()).isEqualTo(14);
              assertThat(refused.mistakes().get(0).message())
                  .contains("known only of a technology that is fitted");
            });
  }
}
