package isowright.charts;

import static org.assertj.core.api.Assertions.assertThat;

import isowright.study.Findings;
import isowright.study.Pipeline;
import isowright.study.Progress;
import isowright.study.StudyFile;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Locale;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** The charts of cost functions: a single series of years, many firms, very many firms. */
class CostChartsTest {

  private static final Path PUBLISHED = Path.of("src/test/resources/published");

  @TempDir private Path folder;

  private List<Chart> charts(String study) throws Exception {
    Path file = Files.writeString(folder.resolve("study.yaml"), study);
    Findings findings = Pipeline.run(StudyFile.read(file), Progress.SILENT);
    return Charts.of(findings);
  }

  private static Chart only(List<Chart> charts, Chart.Kind kind) {
    return charts.stream().filter(chart -> chart.kind() == kind).findFirst().orElseThrow();
  }

  /** Berndt and Wood (1975): capital and energy are complements, the finding of that paper. */
  @Test
  void yearsOfManufacturing() throws Exception {
    Files.copy(PUBLISHED.resolve("us-manufacturing-klem.csv"), folder.resolve("klem.csv"));
    List<Chart> charts =
        charts(
            """
            title: Manufacturing
            records: {file: klem.csv, period: year}
            costs:
              total: cost
              inputs:
                capital: {price: capitalprice, share: capitalcost}
                labour: {price: laborprice, share: laborcost}
                energy: {price: energyprice, share: energycost}
                materials: {price: materialsprice, share: materialscost}
              technologies: [translog-cost]
              system: shares
            """);
    assertThat(charts)
        .extracting(Chart::kind)
        .containsExactly(
            Chart.Kind.PRICE_ELASTICITIES, Chart.Kind.PRICE_ELASTICITIES, Chart.Kind.COST_SHARES);
    assertThat(charts.get(1).title()).contains("Complements", "capital and energy");
    Chart shares = only(charts, Chart.Kind.COST_SHARES);
    assertThat(shares.rows()).hasSize(25);
    assertThat(shares.svg().get()).contains(">1950<", ">materials<").doesNotContain(">1,950<");
    assertThat(shares.png().get()).isNotEmpty();
  }

  /**
   * Ten thousand invented firms with average cost least at e^9.5: thinned, not drawn one by one.
   */
  @Test
  void tenThousandFirms() throws Exception {
    Random random = new Random(10_000);
    StringBuilder csv = new StringBuilder("firm,cost,output,wage,fuel,wage_share,fuel_share\n");
    for (int firm = 0; firm < 10_000; firm++) {
      double y = 8 + 1.2 * random.nextGaussian();
      double wage = 0.3 * random.nextGaussian();
      double fuel = 0.3 * random.nextGaussian();
      double share = 0.4 + 0.1 * (wage - fuel) + 0.03 * random.nextGaussian();
      double cost =
          2
              + 0.7 * (y - 8)
              + 0.1 * (y - 8) * (y - 8)
              + 0.4 * wage
              + 0.6 * fuel
              + 0.05 * (wage - fuel) * (wage - fuel)
              + 0.1 * random.nextGaussian();
      csv.append(
          String.format(
              Locale.ROOT,
              "F%d,%.8g,%.8g,%.8g,%.8g,%.6f,%.6f%n",
              firm,
              Math.exp(cost),
              Math.exp(y),
              Math.exp(wage),
              Math.exp(fuel),
              share,
              1 - share));
    }
    Files.writeString(folder.resolve("firms.csv"), csv);
    List<Chart> charts =
        charts(
            """
            title: Firms
            records: {file: firms.csv, plant: firm}
            costs:
              total: cost
              outputs: {power: {column: output, unit: MWh}}
              inputs:
                labour: {price: wage, share: wage_share}
                fuel: {price: fuel, share: fuel_share}
              technologies: [translog-cost]
            estimation: {standard-errors: robust}
            """
                .replace("robust", "classical"));
    for (Chart.Kind kind :
        List.of(Chart.Kind.AVERAGE_COST, Chart.Kind.SCALE_ECONOMIES, Chart.Kind.COST_SHARES)) {
      Chart chart = only(charts, kind);
      assertThat(chart.rows()).as(kind.name()).hasSizeLessThanOrEqualTo(Sample.MOST);
      assertThat(chart.caption()).as(kind.name()).contains("10,000 rows");
      // six hundred dots or three curves, not ten thousand
      assertThat(chart.svg().get().length()).as(kind.name()).isLessThan(400_000);
    }
    assertThat(only(charts, Chart.Kind.SCALE_ECONOMIES).title()).contains("of 10,000 rows");
  }
}
