package isowright.records;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import isowright.records.Reading.SetAside;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.security.MessageDigest;
import java.util.HexFormat;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** What becomes of the rows of a readable file. */
class RecordsReaderTest {

  @TempDir private Path folder;

  @Test
  void plantsStandInOrderOfFirstAppearanceAndPeriodsAscend() throws Exception {
    String shuffled =
        Glassworks.HEADINGS
            + "\n"
            + String.join(
                "\n",
                Glassworks.ROWS.get(1),
                Glassworks.ROWS.get(5),
                Glassworks.ROWS.get(2),
                Glassworks.ROWS.get(3),
                Glassworks.ROWS.get(0),
                Glassworks.ROWS.get(4));
    Panel panel = Glassworks.read(folder, shuffled).panel();
    assertThat(panel.plants()).containsExactly("Birch", "Alder");
    assertThat(panel.periods()).containsExactly("2021", "2022", "2023");
    assertThat(panel.fileRows().toArray()).containsExactly(6, 2, 4, 5, 7, 3);
    assertThat(panel.rowPeriods().toArray()).containsExactly(0, 1, 2, 0, 1, 2);
    assertThat(panel.plantStarts().toArray()).containsExactly(0, 3);
    assertThat(panel.output().toArray()).containsExactly(1000.5, 1100, 1150.25, 520, 560, 600);
  }

  @Test
  void theHashIsThatOfTheBytes() throws Exception {
    Source source = Glassworks.write(folder, "glass.csv", Glassworks.csv());
    byte[] digest = MessageDigest.getInstance("SHA-256").digest(Files.readAllBytes(source.file()));
    Reading reading = RecordsReader.read(source, Glassworks.roles(), Keep.ALL);
    assertThat(reading.sha256()).isEqualTo(HexFormat.of().formatHex(digest));
    assertThat(reading.fileRows()).isEqualTo(6);
  }

  @Test
  void aPriceIsWorkedOutOfSpendingAndControlsEnterInLogs() throws Exception {
    Panel panel =
        RecordsReader.read(
                Glassworks.write(folder, "glass.csv", Glassworks.csv()),
                Glassworks.roles(List.of(new Roles.Control("age", true)), Optional.empty()),
                Keep.ALL)
            .panel();
    Column price = panel.prices().get(1).orElseThrow();
    assertThat(price.name()).isEqualTo("machine_cost / machine_hours");
    assertThat(price.get(0)).isEqualTo(160000.0 / 2000);
    assertThat(panel.controls().get(0).name()).isEqualTo("ln age");
    assertThat(panel.controls().get(0).get(0)).isEqualTo(Math.log(7));
    assertThat(panel.spending().get(0)).isEmpty();
  }

  @Test
  void moneyIsBroughtToTheMoneyOfTheBase() throws Exception {
    Panel panel = Glassworks.read(folder, Glassworks.csv()).panel();
    // Birch in 2023: the deflator is 110, and 100 in the base period 2021.
    double factor = 100.0 / 110.0;
    double rounding = 1e-12; // two roundings of a double
    assertThat(panel.prices().get(0).orElseThrow().get(2))
        .isCloseTo(32.5 * factor, within(32.5 * rounding));
    assertThat(panel.spending().get(1).orElseThrow().get(2))
        .isCloseTo(180600 * factor, within(180600 * rounding));
    assertThat(panel.prices().get(1).orElseThrow().get(2))
        .isCloseTo(180600 * factor / 2150, within(100 * rounding));
    assertThat(panel.filedCost().orElseThrow().get(2))
        .isCloseTo(325000 * factor, within(325000 * rounding));
    assertThat(panel.output().get(2)).isEqualTo(1150.25);
  }

  @Test
  void theBaseDeflatorIsTheMeanOverTheRowsOfTheBaseEvenOfRowsNotKept() throws Exception {
    String csv = Glassworks.csvWith(4, "ppi", "102"); // Alder in 2021; Birch has 100
    Source source = Glassworks.write(folder, "glass.csv", csv);
    Keep late = new Keep(Optional.of("2022"), Optional.empty(), List.of());
    Reading reading = RecordsReader.read(source, Glassworks.allRoles(), late);
    assertThat(reading.panel().filedCost().orElseThrow().get(0))
        .isCloseTo(310000 * 101.0 / 104.0, within(1e-6));
    assertThat(reading.remarks())
        .filteredOn(r -> r.code().equals("deflator-varies-in-base"))
        .singleElement()
        .satisfies(r -> assertThat(r.message()).contains("100", "102", "101", "2021", "ppi"));
  }

  @Test
  void rowsOutsideWhatIsKeptAreSetAsideAndTheirOtherCellsNotJudged() throws Exception {
    String csv = Glassworks.csvWith(1, "tonnes", "unknown");
    Source source = Glassworks.write(folder, "glass.csv", csv);
    Keep keep = new Keep(Optional.of("2022"), Optional.of("2023"), List.of("Alder"));
    Reading reading = RecordsReader.read(source, Glassworks.roles(), keep);
    assertThat(reading.panel().fileRows().toArray()).containsExactly(3, 4);
    assertThat(reading.setAside())
        .containsExactly(
            new SetAside("period outside records.keep", 2, List.of(2, 5)),
            new SetAside("plant left out by records.keep", 2, List.of(6, 7)));
    assertThat(reading.fileRows()).isEqualTo(6);
  }

  @Test
  void blanksAndQuantitiesNotPositiveSetRowsAside() throws Exception {
    String csv =
        Glassworks.HEADINGS
            + "\n"
            + """
            Birch,2021,,4100,30.25,2000,160000,7,100,290000
            Birch,2022,1100,0,31,2100,172200,8,104,310000
            Birch,2023,1150.25,4350,32.5,  ,180600,9,110,325000
            ,2021,520,2500,28.5,950,77900,3,100,151000
            Alder,,560,2550,29,990,82170,4,104,158000
            Alder,2023,600,-2620,30.5,1010,86860,5,110,170000
            Alder,2024,610,2610,31,1020,86900,,112,171000
            Alder,2025,620,2630,32,1030,87100,7,114,172000
            """;
    Source source = Glassworks.write(folder, "glass.csv", csv);
    Roles roles = Glassworks.roles(List.of(new Roles.Control("age", false)), Optional.empty());
    Reading reading = RecordsReader.read(source, roles, Keep.ALL);
    assertThat(reading.panel().fileRows().toArray()).containsExactly(9);
    assertThat(reading.panel().plants()).containsExactly("Alder");
    assertThat(reading.setAside().stream().mapToInt(SetAside::count).sum()).isEqualTo(7);
    assertThat(reading.setAside())
        .contains(
            new SetAside("column \"tonnes\" (output) is blank", 1, List.of(2)),
            new SetAside("column \"machine_hours\" (quantity of machines) is blank", 1, List.of(4)),
            new SetAside("column \"plant\" (plant) is blank", 1, List.of(5)),
            new SetAside("column \"year\" (period) is blank", 1, List.of(6)),
            new SetAside("column \"age\" (control) is blank", 1, List.of(8)));
    assertThat(reading.remarks())
        .filteredOn(r -> r.severity() == Remark.Severity.WARNING)
        .singleElement()
        .satisfies(
            r -> {
              assertThat(r.code()).isEqualTo("set-aside-quantity-not-positive");
              assertThat(r.rows()).containsExactly(3, 7);
              assertThat(r.message()).contains("labour_hours", "2 rows", "rows 3, 7", "glass.csv");
            });
  }

  @Test
  void blankMoneyStaysUnknownAndTheRowIsUsed() throws Exception {
    String csv = Glassworks.csvWith(2, "wage", "").replace(",180600,", ",,");
    Reading reading = Glassworks.read(folder, csv);
    Panel panel = reading.panel();
    assertThat(panel.rows()).isEqualTo(6);
    assertThat(panel.prices().get(0).orElseThrow().get(1)).isNaN();
    assertThat(panel.prices().get(1).orElseThrow().get(2)).isNaN();
    assertThat(panel.spending().get(1).orElseThrow().get(2)).isNaN();
    assertThat(reading.remarks()).extracting(Remark::code).containsOnly("blank-money");
    assertThat(reading.remarks().get(0).message()).contains("wage", "1 row", "row 3");
  }

  @Test
  void withoutPlantAndPeriodEveryRowIsItsOwnPlant() throws Exception {
    Roles roles =
        new Roles(
            Optional.empty(),
            Optional.empty(),
            "tonnes",
            Optional.empty(),
            Glassworks.roles().inputs(),
            List.of(),
            Optional.empty(),
            Optional.empty());
    Panel panel =
        RecordsReader.read(Glassworks.write(folder, "glass.csv", Glassworks.csv()), roles, Keep.ALL)
            .panel();
    assertThat(panel.plants()).hasSize(6).startsWith("row 2", "row 3");
    assertThat(panel.periods()).containsExactly("all");
    assertThat(panel.repeats()).isFalse();
    assertThat(panel.plantOf(4)).isEqualTo(4);
  }

  @Test
  void idsStayTextAndAPlantMayComeTwiceWithoutPeriods() throws Exception {
    String csv = "id,q,l,k\n00123,1,2,3\n123,2,3,4\n00123,3,4,5\n1e3,4,5,6\n";
    Roles roles =
        new Roles(
            Optional.of("id"),
            Optional.empty(),
            "q",
            Optional.empty(),
            List.of(input("l"), input("k")),
            List.of(),
            Optional.empty(),
            Optional.empty());
    Panel panel =
        RecordsReader.read(Glassworks.write(folder, "ids.csv", csv), roles, Keep.ALL).panel();
    assertThat(panel.plants()).containsExactly("00123", "123", "1e3");
    assertThat(panel.fileRows().toArray()).containsExactly(2, 4, 3, 5);
  }

  private static Roles.Input input(String column) {
    return new Roles.Input(column, column, Optional.empty(), Optional.empty(), Optional.empty());
  }

  @Test
  void plantsThatDifferOnlyInCapitalsOrSeparatorsAreRemarked() throws Exception {
    String csv = Glassworks.csv().replace("Alder,2022", "alder,2022");
    Reading reading = Glassworks.read(folder, csv);
    assertThat(reading.panel().plants()).containsExactly("Birch", "Alder", "alder");
    assertThat(reading.remarks())
        .singleElement()
        .satisfies(
            r -> {
              assertThat(r.code()).isEqualTo("plants-alike");
              assertThat(r.message()).contains("\"Alder\"", "\"alder\"");
            });
  }

  @Test
  void monthsAndDaysArePeriods() throws Exception {
    Panel months = periods("2023-11", "2024-02", "2023-12");
    assertThat(months.periods()).containsExactly("2023-11", "2023-12", "2024-02");
    assertThat(months.periodNumbers().get(1)).isEqualTo(2023 + 11 / 12.0);
    Panel days = periods("2024-12-31", "2024-02-29", "2023-06-30");
    assertThat(days.periods()).containsExactly("2023-06-30", "2024-02-29", "2024-12-31");
    // 2024 is a leap year: 31 December is day 366, so 365 days have gone.
    assertThat(days.periodNumbers().get(2)).isEqualTo(2024 + 365 / 366.0);
    Panel integers = periods("-3", "12", "007");
    assertThat(integers.periods()).containsExactly("-3", "7", "12");
  }

  private Panel periods(String... written) throws IOException, RecordsRefused {
    StringBuilder csv = new StringBuilder(Glassworks.HEADINGS + "\n");
    for (String period : written) {
      csv.append("Birch,").append(period).append(",1000,4100,30,2000,160000,7,100,290000\n");
    }
    return RecordsReader.read(
            Glassworks.write(folder, "glass.csv", csv.toString()), Glassworks.roles(), Keep.ALL)
        .panel();
  }

  @Test
  void aYearKeepsItsMonths() throws Exception {
    String csv =
        Glassworks.csv()
            .replace("Birch,2021", "Birch,2023-12")
            .replace("Birch,2022", "Birch,2024-01")
            .replace("Birch,2023,", "Birch,2024-12,")
            .replace("Alder,2021", "Alder,2025-01")
            .replace("Alder,2022", "Alder,2024-06")
            .replace("Alder,2023,", "Alder,2023-06,");
    Keep keep = new Keep(Optional.of("2024"), Optional.of("2024"), List.of());
    Panel panel =
        RecordsReader.read(Glassworks.write(folder, "glass.csv", csv), Glassworks.roles(), keep)
            .panel();
    assertThat(panel.periods()).containsExactly("2024-01", "2024-06", "2024-12");
  }

  @Test
  void aPanelOfOnePlantWithManyUnsortedPeriodsIsSorted() throws Exception {
    int rows = 5000;
    StringBuilder csv = new StringBuilder(Glassworks.HEADINGS + "\n");
    for (int r = 0; r < rows; r++) {
      // 1013 has no factor in common with 5000, so every period comes once.
      csv.append("Birch,")
          .append(r * 1013L % rows)
          .append(",1000,4100,30,2000,160000,7,100,290000\n");
    }
    Panel panel =
        RecordsReader.read(
                Glassworks.write(folder, "glass.csv", csv.toString()), Glassworks.roles(), Keep.ALL)
            .panel();
    assertThat(panel.rowPeriods().toArray()).isSorted();
    for (int r = 0; r < rows; r++) {
      int fileRow = panel.fileRows().get(r);
      assertThat((fileRow - 2) * 1013L % rows).isEqualTo(r);
    }
  }

  @Test
  void nothingLeftIsRefusedWithTheReasons() throws Exception {
    Source source = Glassworks.write(folder, "glass.csv", Glassworks.csv());
    Keep keep = new Keep(Optional.of("2030"), Optional.empty(), List.of());
    assertThatThrownBy(() -> RecordsReader.read(source, Glassworks.roles(), keep))
        .isInstanceOf(RecordsRefused.class)
        .hasMessageContaining("none of 6 rows")
        .hasMessageContaining("period outside records.keep");
  }
}
