package isowright.records;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

/** The audit finds planted blemishes and is silent where there are none. */
class PanelAuditTest {

  @TempDir private Path folder;

  private Panel panel(CleanRecords records) throws Exception {
    return panel(records.csv());
  }

  private Panel panel(String csv) throws Exception {
    Roles roles =
        new Roles(
            Optional.of("plant"),
            Optional.of("year"),
            "tonnes",
            Optional.of("t"),
            List.of(
                new Roles.Input(
                    "labour",
                    "hours",
                    Optional.of("wage"),
                    Optional.of("payroll"),
                    Optional.of("h")),
                new Roles.Input(
                    "machines", "mh", Optional.of("rent"), Optional.empty(), Optional.of("h"))),
            List.of(),
            Optional.empty(),
            Optional.of("filed"));
    return RecordsReader.read(Glassworks.write(folder, "gw.csv", csv), roles, Keep.ALL).panel();
  }

  private List<Remark> audit(CleanRecords records) throws Exception {
    return PanelAudit.of(panel(records));
  }

  private static Remark only(List<Remark> remarks) {
    assertThat(remarks).hasSize(1);
    return remarks.get(0);
  }

  @ParameterizedTest
  @CsvSource({"0, 0.1", "0.05, 0.1", "0.3, 0.05", "-0.2, 0.1", "0.8, 0.02", "0, 0.3", "0.1, 0.2"})
  void cleanRecordsAreMetWithSilence(double growth, double scatter) throws Exception {
    for (long seed = 1; seed <= 5; seed++) {
      assertThat(audit(new CleanRecords(seed, growth, scatter)))
          // A plant that grows steadily may end up far from the others; that is no blemish.
          .filteredOn(r -> !r.code().equals("extreme-value"))
          .as("seed %d", seed)
          .isEmpty();
    }
  }

  @ParameterizedTest
  @ValueSource(doubles = {10, 0.1, 100, 0.01, 1000, 0.001})
  void aSlippedPowerOfTenIsFoundWhereverItStands(double factor) throws Exception {
    for (double growth : new double[] {0, 0.2}) {
      for (int t = 0; t < CleanRecords.PERIODS; t++) {
        CleanRecords records = new CleanRecords(7, growth, 0.1);
        records.machines[3][t] *= factor;
        records.filed[3][t] *= 1 + 10 * factor; // so that only the quantity is doubtful
        List<Remark> slips =
            audit(records).stream()
                .filter(r -> r.code().equals("power-of-ten-slip"))
                .filter(r -> r.message().contains("\"mh\""))
                .toList();
        Remark slip = only(slips);
        assertThat(slip.severity()).isEqualTo(Remark.Severity.WARNING);
        assertThat(slip.rows()).containsExactly(2 + 3 * CleanRecords.PERIODS + t);
        assertThat(slip.message())
            .contains(
                "\"GW-03\"", "period " + (2010 + t), "row " + (2 + 3 * CleanRecords.PERIODS + t))
            .contains("quantity of machines", "Compare it with its source");
      }
    }
  }

  @Test
  void aUnitThatChangesIsABreak() throws Exception {
    CleanRecords records = new CleanRecords(7, 0.05, 0.1);
    for (int t = 4; t < CleanRecords.PERIODS; t++) {
      records.tonnes[5][t] *= 1000;
    }
    Remark found =
        only(audit(records).stream().filter(r -> r.code().startsWith("power-of-ten")).toList());
    assertThat(found.code()).isEqualTo("power-of-ten-break");
    assertThat(found.rows()).containsExactly(2 + 5 * CleanRecords.PERIODS + 4);
    assertThat(found.message()).contains("GW-05", "2014", "tonnes", "1,000 times", "one unit");
  }

  @Test
  void anUnsteadyPlantIsNotSuspected() throws Exception {
    CleanRecords records = new CleanRecords(7, 0, 0.05);
    double[] wild = {1, 8, 3, 20, 2, 9, 1, 12};
    for (int t = 0; t < CleanRecords.PERIODS; t++) {
      records.tonnes[5][t] *= wild[t];
    }
    assertThat(audit(records)).extracting(Remark::code).doesNotContain("power-of-ten-slip");
  }

  @Test
  void gapsAndPlantsSeenOnce() throws Exception {
    CleanRecords records = new CleanRecords(2, 0, 0.1);
    records.left[4][3] = true;
    records.left[4][4] = true;
    for (int t = 1; t < CleanRecords.PERIODS; t++) {
      records.left[9][t] = true;
    }
    List<Remark> remarks = audit(records);
    assertThat(remarks)
        .extracting(Remark::code)
        .containsExactlyInAnyOrder("plants-seen-once", "gap-in-periods");
    assertThat(remarks.get(0).message()).contains("1 of 20 plants is", "\"GW-09\"");
    assertThat(remarks.get(1).message()).contains("\"GW-04\"", "the 2 periods 2013 to 2014");
  }

  @Test
  void aPeriodThatNoPlantHas() throws Exception {
    CleanRecords records = new CleanRecords(2, 0, 0.1);
    for (int p = 0; p < CleanRecords.PLANTS; p++) {
      records.left[p][5] = true;
    }
    Remark remark = only(audit(records));
    assertThat(remark.code()).isEqualTo("period-absent");
    assertThat(remark.message()).contains("2014", "2016");
  }

  @Test
  void priceTimesQuantityMustBeTheSpending() throws Exception {
    CleanRecords records = new CleanRecords(3, 0, 0.1);
    records.payroll[6][2] *= 1.3;
    Remark remark = only(audit(records));
    assertThat(remark.code()).isEqualTo("price-times-quantity");
    assertThat(remark.rows()).containsExactly(2 + 6 * CleanRecords.PERIODS + 2);
    assertThat(remark.message()).contains("GW-06", "2012", "wage", "hours", "payroll", "1 %");
  }

  @Test
  void spendingInAnotherUnitIsSaidOnce() throws Exception {
    CleanRecords records = new CleanRecords(3, 0, 0.1);
    for (double[] plant : records.payroll) {
      for (int t = 0; t < CleanRecords.PERIODS; t++) {
        plant[t] /= 1000;
      }
    }
    Remark remark = only(audit(records));
    assertThat(remark.code()).isEqualTo("price-times-quantity");
    assertThat(remark.message()).contains("160 of 160 rows", "1000 times", "another unit");
  }

  @Test
  void filedCostAgainstItsParts() throws Exception {
    CleanRecords below = new CleanRecords(3, 0, 0.1);
    below.filed[1][1] *= 0.8;
    assertThat(only(audit(below)))
        .satisfies(
            r -> {
              assertThat(r.code()).isEqualTo("filed-cost-below-parts");
              assertThat(r.severity()).isEqualTo(Remark.Severity.WARNING);
              assertThat(r.message()).contains("GW-01", "2011", "filed");
            });
    CleanRecords above = new CleanRecords(3, 0, 0.1);
    above.filed[1][1] *= 1.5;
    above.filed[2][1] *= 1.2;
    assertThat(only(audit(above)))
        .satisfies(
            r -> {
              assertThat(r.code()).isEqualTo("filed-cost-above-parts");
              assertThat(r.severity()).isEqualTo(Remark.Severity.NOTE);
              assertThat(r.message()).contains("2 of 160 rows", "GW-01", "unreconciled");
            });
    CleanRecords thousands = new CleanRecords(3, 0, 0.1);
    for (double[] plant : thousands.filed) {
      for (int t = 0; t < CleanRecords.PERIODS; t++) {
        plant[t] /= 1000;
      }
    }
    assertThat(only(audit(thousands)))
        .satisfies(
            r -> {
              assertThat(r.code()).isEqualTo("filed-cost-unit");
              assertThat(r.message()).contains("0.001", "another unit of money");
            });
  }

  @Test
  void pricesThatNeverVary() throws Exception {
    CleanRecords constant = new CleanRecords(4, 0, 0.1);
    CleanRecords overTime = new CleanRecords(4, 0, 0.1);
    CleanRecords between = new CleanRecords(4, 0, 0.1);
    for (int p = 0; p < CleanRecords.PLANTS; p++) {
      for (int t = 0; t < CleanRecords.PERIODS; t++) {
        constant.rent[p][t] = 80;
        overTime.rent[p][t] = 80 + t;
        between.rent[p][t] = 80 + p;
      }
    }
    assertThat(aboutRent(constant).code()).isEqualTo("price-constant");
    assertThat(aboutRent(constant).message()).contains("rent", "80 in every row");
    assertThat(aboutRent(overTime).code()).isEqualTo("price-only-over-time");
    assertThat(aboutRent(between).code()).isEqualTo("price-only-between-plants");
  }

  private Remark aboutRent(CleanRecords records) throws Exception {
    return only(audit(records).stream().filter(r -> r.message().contains("\"rent\"")).toList());
  }

  @Test
  void inputsThatBarelyVaryWithinPlants() throws Exception {
    CleanRecords never = new CleanRecords(4, 0, 0.1);
    CleanRecords little = new CleanRecords(4, 0, 0.1);
    for (int p = 0; p < CleanRecords.PLANTS; p++) {
      for (int t = 0; t < CleanRecords.PERIODS; t++) {
        never.machines[p][t] = never.machines[p][0];
        little.machines[p][t] = little.machines[p][0] * (1 + 0.01 * t);
      }
    }
    assertThat(audit(never)).extracting(Remark::code).contains("constant-within-plants");
    assertThat(audit(little)).extracting(Remark::code).contains("little-variation-within-plants");
  }

  @Test
  void copiedColumnsAndRows() throws Exception {
    CleanRecords equal = new CleanRecords(4, 0, 0.1);
    CleanRecords proportional = new CleanRecords(4, 0, 0.1);
    CleanRecords row = new CleanRecords(4, 0, 0.1);
    for (int p = 0; p < CleanRecords.PLANTS; p++) {
      for (int t = 0; t < CleanRecords.PERIODS; t++) {
        equal.machines[p][t] = equal.tonnes[p][t];
        // Powers of two keep all six digits written.
        proportional.tonnes[p][t] = Math.rint(proportional.tonnes[p][t]);
        proportional.machines[p][t] = 2 * proportional.tonnes[p][t];
      }
    }
    assertThat(audit(equal))
        .filteredOn(r -> r.code().equals("columns-equal"))
        .singleElement()
        .satisfies(r -> assertThat(r.message()).contains("tonnes", "mh", "copied"));
    assertThat(audit(proportional))
        .filteredOn(r -> r.code().equals("columns-proportional"))
        .singleElement()
        .satisfies(r -> assertThat(r.message()).contains("factor 2"));
    String[] lines = row.csv().split("\\R");
    String copied = lines[10].replaceFirst("GW-\\d\\d,\\d+", lines[11].substring(0, 10));
    String csv = row.csv().replace(lines[11], copied);
    assertThat(PanelAudit.of(panel(csv)))
        .filteredOn(r -> r.code().equals("identical-rows"))
        .singleElement()
        .satisfies(r -> assertThat(r.rows()).containsExactly(11, 12));
  }

  @Test
  void aRowFarFromAllOthers() throws Exception {
    CleanRecords records = new CleanRecords(4, 0, 0.1);
    for (int t = 0; t < CleanRecords.PERIODS; t++) {
      records.tonnes[2][t] *= 5000;
    }
    assertThat(audit(records))
        .filteredOn(r -> r.code().equals("extreme-value"))
        .hasSize(CleanRecords.PERIODS)
        .allSatisfy(
            r -> {
              assertThat(r.severity()).isEqualTo(Remark.Severity.NOTE);
              assertThat(r.message()).contains("GW-02", "tonnes", "more than 5");
            });
  }

  @Test
  void manyFindingsOfAKindAreCounted() throws Exception {
    CleanRecords records = new CleanRecords(3, 0, 0.1);
    for (int p = 0; p < CleanRecords.PLANTS; p++) {
      for (int t = 0; t < 3; t++) {
        records.payroll[p][t] *= 1.3;
      }
    }
    List<Remark> remarks = audit(records);
    assertThat(remarks).hasSize(21).extracting(Remark::code).containsOnly("price-times-quantity");
    assertThat(remarks.get(20).message()).contains("And 40 findings more");
  }

  @Test
  void withinSharesOfTheStatesAreThePublishedOnes() throws RecordsRefused {
    // Within-state shares of the variance of logs, computed with R 4.2 on the data of Baltagi and
    // Pinnoi 1995 and rounded to a tenth of a percent.
    List<Description> columns = PanelAudit.describe(PublishedRecordsTest.states().panel());
    double rounding = 0.0005;
    assertThat(share(columns, "pcap")).isCloseTo(0.013, within(rounding));
    assertThat(share(columns, "pc")).isCloseTo(0.032, within(rounding));
    assertThat(share(columns, "emp")).isCloseTo(0.019, within(rounding));
  }

  private static double share(List<Description> columns, String name) {
    return columns.stream()
        .filter(c -> c.column().equals(name))
        .findFirst()
        .orElseThrow()
        .withinShare()
        .orElseThrow();
  }

  @Test
  void littleVariationWithinTheStatesIsSaidOfEachInput() throws RecordsRefused {
    List<Remark> remarks = PanelAudit.of(PublishedRecordsTest.states());
    assertThat(remarks).extracting(Remark::code).containsOnly("little-variation-within-plants");
    assertThat(remarks).hasSize(3);
    assertThat(remarks.get(0).message())
        .contains("pcap")
        .contains("quantity of public")
        .contains("1.3 %")
        .contains("5 %");
  }

  @Test
  void descriptionsAreThoseOfTheColumns() throws Exception {
    String csv =
        """
        plant,year,tonnes,hours,wage,payroll,mh,rent,filed
        A,2010,2,1,30,30,5,80,
        A,2011,4,1,,,5,80,500
        B,2010,6,1,32,32,5,80,700
        """;
    List<Description> all = PanelAudit.describe(panel(csv));
    assertThat(all)
        .extracting(Description::role)
        .containsExactly(
            "output",
            "quantity of labour",
            "price of labour",
            "spending on labour",
            "quantity of machines",
            "price of machines",
            "filed cost");
    Description output = all.get(0);
    assertThat(output.count()).isEqualTo(3);
    assertThat(output.mean()).isEqualTo(4);
    assertThat(output.standardDeviation()).isEqualTo(2);
    assertThat(output.least()).isEqualTo(2);
    assertThat(output.most()).isEqualTo(6);
    assertThat(output.unit()).isEqualTo("t");
    // ln 2, ln 4 within A; ln 6 alone in B. By hand: within (ln 2)²/2; total about the mean.
    double a = Math.log(2);
    double b = Math.log(4);
    double c = Math.log(6);
    double mean = (a + b + c) / 3;
    double total = Math.pow(a - mean, 2) + Math.pow(b - mean, 2) + Math.pow(c - mean, 2);
    assertThat(output.withinShare().orElseThrow())
        .isCloseTo(Math.pow(b - a, 2) / 2 / total, within(1e-14)); // a few roundings
    assertThat(all.get(1).withinShare()).isEmpty();
    assertThat(all.get(2).unit()).isEqualTo("money per h");
    assertThat(all.get(6).count()).isEqualTo(2);
    assertThat(all.get(6).mean()).isEqualTo(600);
  }

  @Test
  void mediansAgreeWithSorting() {
    Random random = new Random(23);
    for (int n = 1; n < 200; n++) {
      double[] values = random.doubles(n).map(v -> Math.rint(20 * v)).toArray();
      double[] sorted = values.clone();
      java.util.Arrays.sort(sorted);
      double expected = n % 2 == 1 ? sorted[n / 2] : (sorted[n / 2 - 1] + sorted[n / 2]) / 2;
      assertThat(Robust.median(values, n)).isEqualTo(expected);
    }
    assertThat(Robust.median(new double[0], 0)).isNaN();
  }
}
