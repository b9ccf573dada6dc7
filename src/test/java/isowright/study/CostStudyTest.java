package isowright.study;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import isowright.estimation.Unfit;
import isowright.study.Findings.Said;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.stream.Collectors;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** Studies of costs and prices alone, from the file to the findings, on published records. */
class CostStudyTest {

  private static final Path PUBLISHED = Path.of("src/test/resources/published");

  @TempDir private Path folder;

  private Findings run(String records, String study) throws Exception {
    Files.copy(PUBLISHED.resolve(records), folder.resolve(records));
    Path file = Files.writeString(folder.resolve("study.yaml"), study);
    return Pipeline.run(StudyFile.read(file), Progress.SILENT);
  }

  /** Companies 1 to 123; the rest of the file are aggregates (see the source of the data). */
  private static String electricity(String more) {
    String aggregates =
        IntStream.rangeClosed(124, 158)
            .mapToObj(Integer::toString)
            .collect(Collectors.joining(","));
    return """
    title: Electricity companies, 1970
    records:
      file: electricity-1970.csv
      plant: observation
      keep: {without-plants: [%s]}
    costs:
      total: cost
      outputs: {power: {column: output}}
      inputs:
        capital: {price: capital, share: capitalshare}
        labour: {price: labor, share: laborshare}
        fuel: {price: fuel, share: fuelshare}
    %s
    estimation: {standard-errors: classical, scaling: none}
    """
        .formatted(aggregates, more);
  }

  /**
   * Christensen and Greene (1976); Greene, 5th ed., example 5.6: efficient scale 17,309.9, 95 % of
   * it 10,560 to 28,373 by the delta method on the log (normal quantile; ours is Student's at 118,
   * which is 1 % wider), 85 % of the companies below.
   */
  @Test
  void efficientScaleOfElectricity() throws Exception {
    Findings findings =
        run(
            "electricity-1970.csv",
            electricity("  technologies: [cobb-douglas-cost-squared-output]\n  system: false"));
    CostFindings.Efficient efficient = findings.costs().fits().get(0).efficient().orElseThrow();
    // printed to one decimal
    assertThat(efficient.output().value()).isCloseTo(17_309.9, within(.05));
    Figure.Uncertainty sure = efficient.output().uncertainty().orElseThrow();
    // ends printed to the unit: half of one in 10,560 moves the log by 5e-5
    double half = Math.log(28_373 / 10_560.0) / 2;
    assertThat(Math.log(sure.high() / sure.low()) / 2)
        .isCloseTo(half * 1.980272 / 1.959964, within(1e-4));
    // printed as a whole per cent
    assertThat(efficient.below()).isCloseTo(.85, within(.005));
  }

  /** The same source: 116 of 123 with economies of scale; and the slip in row 62 of the data. */
  @Test
  void systemOfElectricity() throws Exception {
    Findings findings = run("electricity-1970.csv", electricity("  technologies: [translog-cost]"));
    CostFindings.Fitted fit = findings.costs().fits().get(0);
    assertThat(fit.how().equations()).isEqualTo("system");
    assertThat(fit.scale()).hasSize(123);
    assertThat(fit.scale()).filteredOn(row -> row.economies().value() > 1).hasSize(116);
    CostRows.Told told = fit.rows().told();
    assertThat(told.economies()).isEqualTo(116);
    assertThat(told.above() + told.unclear() + told.below()).isEqualTo(123);
    CostRows.Spread spread = fit.rows().spreads().get(0);
    assertThat(spread.measure()).isEqualTo("scale");
    // seven of 123 lie below one, so the tenth percentile of rows does not
    assertThat(spread.least()).isLessThan(1);
    assertThat(spread.tenth()).isGreaterThan(1);
    Said slip = findings.costs().remarks().get(0);
    assertThat(slip.code()).isEqualTo("shares-not-one");
    assertThat(slip.rows()).contains(63); // the headings are row 1
    assertThat(slip.message()).contains("row 63 (62)", "0.7998");
    assertThat(fit.remarks()).extracting(Said::code).contains("depends-on-share-left-out");
  }

  /** The audit names the slip before anything is fitted. */
  @Test
  void auditOfElectricity() throws Exception {
    Files.copy(PUBLISHED.resolve("electricity-1970.csv"), folder.resolve("electricity-1970.csv"));
    Path file =
        Files.writeString(
            folder.resolve("study.yaml"), electricity("  technologies: [translog-cost]"));
    assertThat(CostAudit.of(StudyFile.read(file)))
        .singleElement()
        .satisfies(said -> assertThat(said.message()).contains("row 63 (62)", "0.7998"));
  }

  /** Berndt and Wood (1975): shares alone, concave in all 25 years. */
  @Test
  void sharesOfManufacturing() throws Exception {
    Findings findings = run("us-manufacturing-klem.csv", MANUFACTURING);
    CostFindings.Fitted fit = findings.costs().fits().get(0);
    assertThat(fit.how().logLikelihood()).isCloseTo(344.467, within(0.5e-3));
    assertThat(fit.regularity().orElseThrow().both()).isEqualTo(25);
    assertThat(fit.at().orElseThrow().scaleEconomies()).isEmpty();
    assertThat(findings.records().orElseThrow().columns())
        .extracting(Findings.Described::role)
        .contains("cost", "price of energy");
  }

  /** The same source, 1959: elasticities of a row, printed to three and four decimals. */
  @Test
  void elasticitiesOfAYear() throws Exception {
    CostRows rows = run("us-manufacturing-klem.csv", MANUFACTURING).costs().fits().get(0).rows();
    CostRows.Row year =
        rows.rows().stream().filter(row -> row.period().equals("1959")).findFirst().orElseThrow();
    assertThat(year.fitted().values().stream().mapToDouble(s -> s).toArray())
        .containsExactly(new double[] {.0564, .2745, .0439, .6252}, within(.5e-4));
    assertThat(elasticity(year, "allen", "capital", "capital")).isCloseTo(-7.462, within(.5e-3));
    assertThat(elasticity(year, "allen", "capital", "energy")).isCloseTo(-3.313, within(.5e-3));
    assertThat(elasticity(year, "allen", "labour", "materials")).isCloseTo(.588, within(.5e-3));
    assertThat(elasticity(year, "demand", "capital", "capital")).isCloseTo(-.4208, within(.5e-4));
    assertThat(elasticity(year, "demand", "labour", "labour")).isCloseTo(-.4507, within(.5e-4));
    assertThat(year.concave()).isTrue();
    assertThat(rows.average()).isEmpty();
    assertThat(rows.spreads()).extracting(CostRows.Spread::measure).doesNotContain("scale");
  }

  private static double elasticity(CostRows.Row row, String measure, String first, String second) {
    return row.elasticities().stream()
        .filter(pair -> pair.measure().equals(measure))
        .filter(pair -> pair.first().equals(first) && pair.second().equals(second))
        .findFirst()
        .orElseThrow()
        .figure()
        .value();
  }

  private static final String MANUFACTURING =
      """
      title: Manufacturing
      records: {file: us-manufacturing-klem.csv, period: year}
      costs:
        total: cost
        inputs:
          capital: {price: capitalprice, share: capitalcost}
          labour: {price: laborprice, share: laborcost}
          energy: {price: energyprice, share: energycost}
          materials: {price: materialsprice, share: materialscost}
        technologies: [translog-cost]
        system: shares
      """;

  @Test
  void aPriceWithoutVariationIsRefusedByName() throws IOException {
    List<String> lines = Files.readAllLines(PUBLISHED.resolve("us-manufacturing-klem.csv"));
    StringBuilder text = new StringBuilder(lines.get(0) + "\n");
    for (String line : lines.subList(1, lines.size())) {
      String[] cells = line.split(",");
      cells[6] = cells[9]; // capital at the price of materials
      text.append(String.join(",", cells)).append('\n');
    }
    Files.writeString(folder.resolve("us-manufacturing-klem.csv"), text);
    Path file = Files.writeString(folder.resolve("study.yaml"), MANUFACTURING);
    assertThatThrownBy(() -> Pipeline.run(StudyFile.read(file), Progress.SILENT))
        .isInstanceOfSatisfying(
            Unfit.class,
            unfit ->
                assertThat(unfit.reasons())
                    .singleElement()
                    .satisfies(
                        reason -> assertThat(reason).contains("price of capital", "materials")));
  }
}
