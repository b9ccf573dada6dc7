package isowright.charts;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import isowright.charts.Drawing.Letters;
import isowright.study.DistortedFindings;
import isowright.study.Findings.Units;
import isowright.study.ReviewFindings.Order;
import java.awt.geom.Rectangle2D;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Objects;
import java.util.stream.Stream;
import org.junit.jupiter.api.Named;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/**
 * The charts of a review for one plant and for thousands, for negative and undivided parts, for
 * sizes from 1e-12 to 1e12 and names wider than a page: they can be read, and their tables hold
 * what is drawn. The pictures are left under target/ to be looked at.
 */
class ReviewChartsTest {

  /** Tables print six significant digits: half a unit in the sixth. */
  private static final double PRINTED = 5.1e-6;

  private static final Map<String, List<Chart>> CASES = cases();

  private static Map<String, List<Chart>> cases() {
    Map<String, List<Chart>> all = new LinkedHashMap<>();
    all.put("one plant", charts(Filings.of(1, "P", 1e6, true), 0, 1));
    all.put("two plants", charts(Filings.of(2, "P", 1e6, true), 2, 5));
    all.put("fourteen plants", charts(Filings.of(14, "GW-", 1e6, true), 4, 5));
    all.put("taken as known", charts(Filings.of(14, "GW-", 1e6, false), 4, 5));
    all.put("forty plants", charts(Filings.of(40, "P", 1e6, true), 9, 50));
    all.put("two hundred plants", charts(Filings.of(200, "P", 1e6, true), 5, 5));
    all.put("in too many groups", charts(Filings.of(200, "P", 1e6, true), 60, 5));
    all.put("three thousand plants", charts(Filings.of(3000, "P", 1e6, true), 0, 5));
    all.put("sizes of 1e-12", charts(Filings.of(5, "P", 1e-12, true), 2, 5));
    all.put("sizes of 1e12", charts(Filings.of(5, "P", 1e12, true), 2, 5));
    all.put("long names", charts(Filings.of(14, DistortedFindings.LONG, 1e6, true), 3, 5));
    all.put("many long names", charts(Filings.of(90, DistortedFindings.LONG, 1e6, true), 3, 5));
    return all;
  }

  private static List<Chart> charts(Filings filings, int group, int years) {
    Setting setting =
        new Setting(new Units("t", Map.of("labour", "h"), "EUR"), 0.95, new Words.Names());
    List<Chart> all = new ArrayList<>(GapPartsCharts.of(filings.reviews(), setting));
    all.addAll(RatioCharts.of(List.of(filings.order(group)), setting));
    all.addAll(AllowanceCharts.of(filings.allowances(years), setting));
    return all;
  }

  /** A chart of a case: parts, order, allowance. */
  private static Chart chart(String name, int which) {
    return Objects.requireNonNull(CASES.get(name)).get(which);
  }

  static Stream<Named<Chart>> all() {
    return CASES.entrySet().stream()
        .flatMap(
            entry ->
                entry.getValue().stream()
                    .map(chart -> Named.of(entry.getKey() + ": " + chart.name(), chart)));
  }

  @Test
  void thereIsAChartOfEachKind() throws IOException {
    Path folder = Files.createDirectories(Path.of("target", "review-charts"));
    for (Map.Entry<String, List<Chart>> entry : CASES.entrySet()) {
      assertThat(entry.getValue())
          .as(entry.getKey())
          .extracting(Chart::kind)
          .containsExactly(
              Chart.Kind.GAP_PARTS, Chart.Kind.ORDERED_RATIOS, Chart.Kind.ALLOWANCE_PATH);
      for (Chart chart : entry.getValue()) {
        String name = entry.getKey().replace(' ', '-') + "-" + chart.name() + ".svg";
        Files.writeString(folder.resolve(name), chart.svg().get());
      }
    }
  }

  @ParameterizedTest
  @MethodSource("all")
  void lettersStandInsideThePictureAndApart(Chart chart) {
    Drawing drawing = Drawing.of(chart.svg().get());
    Rectangle2D view = drawing.view();
    List<Letters> letters = drawing.letters();
    List<String> overlapping = new ArrayList<>();
    for (int i = 0; i < letters.size(); i++) {
      assertThat(view.contains(letters.get(i).box())).as(letters.get(i).text()).isTrue();
      for (int j = 0; j < i; j++) {
        Rectangle2D both = letters.get(i).box().createIntersection(letters.get(j).box());
        if (both.getWidth() > 1 && both.getHeight() > 1) {
          overlapping.add(letters.get(j).text() + " | " + letters.get(i).text());
        }
      }
    }
    assertThat(overlapping).isEmpty();
    // no taller than three screens, however many the plants
    assertThat(view.getHeight()).isLessThan(3 * 430);
  }

  @ParameterizedTest
  @MethodSource("all")
  void saysNothingOfAMachine(Chart chart) {
    String everything =
        chart.svg().get()
            + chart.title()
            + chart.caption()
            + chart.alternative()
            + chart.header()
            + chart.rows();
    assertThat(everything)
        .doesNotContainPattern("\\b(NaN|null|Optional|Infinity)\\b")
        .doesNotContainPattern("not known|unbounded");
    assertThat(chart.alternative()).startsWith(chart.title());
    assertThat(chart.rows()).allSatisfy(row -> assertThat(row).hasSameSizeAs(chart.header()));
  }

  /** Unreconciled, technical, mix and remainder of every row make its gap. */
  @ParameterizedTest
  @MethodSource("all")
  void partsOfARowAddUp(Chart chart) {
    if (chart.kind() != Chart.Kind.GAP_PARTS) {
      return;
    }
    for (List<String> row : chart.rows()) {
      double sum =
          number(row.get(5)) + number(row.get(6)) + number(row.get(9)) + number(row.get(12));
      double size =
          Math.abs(number(row.get(5)))
              + Math.abs(number(row.get(6)))
              + Math.abs(number(row.get(9)))
              + Math.abs(number(row.get(12)));
      // each of the parts is printed to half a unit in its sixth digit, and so is the gap
      assertThat(number(row.get(2))).isCloseTo(sum, within(2 * PRINTED * size));
    }
  }

  private static double number(String cell) {
    String plain = cell.replace(",", "");
    int power = plain.indexOf(" × 10");
    if (power < 0) {
      return plain.isEmpty() ? 0 : Double.parseDouble(plain);
    }
    StringBuilder exponent = new StringBuilder();
    for (char c : plain.substring(power + 5).toCharArray()) {
      exponent.append(c == '⁻' ? "-" : Integer.toString("⁰¹²³⁴⁵⁶⁷⁸⁹".indexOf(c)));
    }
    return Double.parseDouble(plain.substring(0, power))
        * Math.pow(10, Integer.parseInt(exponent.toString()));
  }

  /** Of many plants only the highest and lowest gaps are drawn, and the table has all up to 600. */
  @Test
  void manyPlantsAreThinned() {
    Chart parts = chart("two hundred plants", 0);
    assertThat(parts.rows()).hasSize(200);
    assertThat(parts.caption()).contains("Of 200 filings the 20 highest and the 10 lowest gaps");
    assertThat(Drawing.of(parts.svg().get()).letters().stream().map(Letters::text))
        .contains(parts.rows().get(0).get(0), parts.rows().get(199).get(0));
    assertThat(chart("three thousand plants", 1).rows()).hasSize(Sample.MOST);
  }

  /** Ranks, ratios, groups as in the order; overlapping groups too many to draw are said to be. */
  @Test
  void theOrderIsThatOfTheFindings() {
    Filings filings = Filings.of(14, "GW-", 1e6, true);
    Order order = filings.order(4);
    Chart chart = chart("fourteen plants", 1);
    for (int i = 0; i < 14; i++) {
      List<String> row = chart.rows().get(i);
      assertThat(row.get(0)).isEqualTo(order.plants().get(i).plant());
      assertThat(row.get(1)).isEqualTo(Integer.toString(i + 1));
      double ratio = order.plants().get(i).ratio().value();
      assertThat(Double.parseDouble(row.get(2))).isCloseTo(ratio, within(PRINTED * ratio));
    }
    assertThat(chart.rows().get(0).get(8)).isEqualTo("1");
    assertThat(chart.rows().get(2).get(8)).isEqualTo("1 2 3");
    assertThat(chart.title()).contains("no plant is told apart from all others");
    assertThat(chart.caption()).contains("Brackets at the right");
    assertThat(chart("in too many groups", 1).caption()).contains("overlap too much");
    assertThat(chart("three thousand plants", 1).caption()).contains("were not compared");
  }
}
