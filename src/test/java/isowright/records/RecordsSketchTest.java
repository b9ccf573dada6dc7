package isowright.records;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.catchThrowableOfType;

import isowright.records.Proposal.Choice;
import isowright.records.Proposal.InputChoice;
import isowright.records.SketchedColumn.Content;
import java.io.IOException;
import java.io.OutputStream;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import org.apache.poi.xssf.usermodel.XSSFSheet;
import org.apache.poi.xssf.usermodel.XSSFWorkbook;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** What a file holds, and what its columns may be. */
class RecordsSketchTest {

  @TempDir private Path folder;

  private RecordsSketch sketch(String csv) throws IOException, RecordsRefused {
    return RecordsSketch.of(Glassworks.write(folder, "glass.csv", csv));
  }

  private static SketchedColumn column(RecordsSketch sketch, String heading) {
    return sketch.columns().stream()
        .filter(c -> c.heading().equals(heading))
        .findFirst()
        .orElseThrow();
  }

  @Test
  void columnsAreWhatTheyHold() throws Exception {
    RecordsSketch sketch =
        sketch(
            """
            id,month,tonnes,count,note,mixed,nothing,code
            GW1,2024-01,1.5,3,calm,1,,00123
            GW2,2024-02,-2.25,4,,a,,00123
            GW1,2024-03,n/a,5,windy,2,,00077
            GW1,2024-04,3,,calm,b,,00077
            GW1,2024-05,4,5,calm,b,,00077
            GW1,2024-06,5,5,calm,b,,00077
            GW1,2024-07,6,5,calm,b,,00077
            GW1,2024-08,7,5,calm,b,,00077
            GW1,2024-09,8,5,calm,b,,00077
            GW1,2024-10,9,5,calm,b,,00077
            """);
    assertThat(sketch.file()).isEqualTo("glass.csv");
    assertThat(sketch.rows()).isEqualTo(10);
    assertThat(sketch.columns())
        .extracting(SketchedColumn::content)
        .containsExactly(
            Content.TEXT,
            Content.DATES,
            Content.NUMBERS,
            Content.INTEGERS,
            Content.TEXT,
            Content.MIXED,
            Content.EMPTY,
            Content.TEXT);
    SketchedColumn tonnes = column(sketch, "tonnes");
    assertThat(tonnes.least()).contains(-2.25);
    assertThat(tonnes.most()).contains(9.0);
    assertThat(tonnes.examples()).containsExactly("1.5", "-2.25", "n/a");
    assertThat(tonnes.strange()).containsExactly("n/a");
    assertThat(tonnes.position()).isEqualTo(3);
    assertThat(column(sketch, "count").blank()).isEqualTo(1);
    assertThat(column(sketch, "count").words()).isEqualTo("9 whole numbers from 3 to 5, 1 blank");
    assertThat(column(sketch, "id").words()).isEqualTo("10 cells of text, 2 different");
    assertThat(column(sketch, "nothing").words()).isEqualTo("nothing, 10 blank");
    assertThat(column(sketch, "code").examples()).containsExactly("00123", "00077");
  }

  @Test
  void decimalCommasAreSeenThrough() throws Exception {
    RecordsSketch sketch = sketch(Glassworks.csv().replace(",", ";").replace(".", ","));
    assertThat(sketch.numberFormat()).contains(new NumberFormat(',', Optional.empty()));
    assertThat(sketch.facts().get("delimiter")).isEqualTo("semicolon (recognised)");
    assertThat(sketch.facts().get("decimal mark")).isEqualTo("comma (recognised)");
    assertThat(column(sketch, "tonnes").most()).contains(1150.25);
  }

  @Test
  void rolesAreProposedWithReasons() throws Exception {
    Proposal proposal = sketch(Glassworks.csv()).proposal();
    assertThat(proposal.plant().map(Choice::column)).contains("plant");
    assertThat(proposal.period().map(Choice::column)).contains("year");
    assertThat(proposal.output().map(Choice::column)).contains("tonnes");
    assertThat(proposal.deflator().map(Choice::column)).contains("ppi");
    assertThat(proposal.filedCost().map(Choice::column)).contains("filed_cost");
    assertThat(proposal.unassigned()).containsExactly("age");
    assertThat(proposal.inputs())
        .extracting(InputChoice::name)
        .containsExactly("labour", "machines");
    InputChoice labour = proposal.inputs().get(0);
    assertThat(labour.quantity().column()).isEqualTo("labour_hours");
    assertThat(labour.price().map(Choice::column)).contains("wage");
    assertThat(labour.spending()).isEmpty();
    InputChoice machines = proposal.inputs().get(1);
    assertThat(machines.quantity().column()).isEqualTo("machine_hours");
    assertThat(machines.spending().map(Choice::column)).contains("machine_cost");
    assertThat(labour.quantity().reason())
        .contains("labour", "may be", "6 whole numbers from 2500 to 4350");
    assertThat(proposal.filedCost().orElseThrow().reason()).contains("\"filed\"");
  }

  @ParameterizedTest
  @CsvSource({
    "LabourHours, labour, QUANTITY",
    "Labor hours, labour, QUANTITY",
    "hours-labour, labour, QUANTITY",
    "wage, labour, PRICE",
    "WAGE RATE, labour, PRICE",
    "payroll, labour, SPENDING",
    "machine_rental, machines, PRICE",
    "machineCost, machines, SPENDING",
    "energyPrice, energy, PRICE",
    "energy_mwh, energy, QUANTITY",
    "fuel bill, fuel, SPENDING",
    "cost per machine hour, machines, PRICE",
    "unit cost of energy, energy, PRICE",
    "capital, capital, QUANTITY"
  })
  void wordsOfHeadings(String heading, String input, HeadingWords.Aspect aspect) {
    HeadingWords words = HeadingWords.of(heading);
    assertThat(words.input()).contains(input);
    assertThat(words.aspect()).isEqualTo(aspect);
  }

  @Test
  void nothingIsProposedWhereNothingSpeaksForIt() throws Exception {
    Proposal proposal = sketch("a,b,c\n1,2.5,3\n2,3.5,4\n").proposal();
    assertThat(proposal.plant()).isEmpty();
    assertThat(proposal.period()).isEmpty();
    assertThat(proposal.output()).isEmpty();
    assertThat(proposal.inputs()).isEmpty();
    assertThat(proposal.unassigned()).containsExactly("a", "b", "c");
  }

  @Test
  void plantAndPeriodAreKnownByTheirContentsToo() throws Exception {
    Proposal proposal =
        sketch("wo,wann,menge\nAhorn,2020,1.5\nAhorn,2021,2\nBuche,2020,3\nBuche,2021,4\n")
            .proposal();
    assertThat(proposal.plant().map(Choice::column)).contains("wo");
    assertThat(proposal.period().map(Choice::column)).contains("wann");
    assertThat(proposal.period().orElseThrow().reason()).contains("may be years");
  }

  @Test
  void aWorkbookIsSketchedWithItsSheets() throws Exception {
    Path file = folder.resolve("glass.xlsx");
    try (XSSFWorkbook workbook = new XSSFWorkbook();
        OutputStream out = Files.newOutputStream(file)) {
      XSSFSheet sheet = workbook.createSheet("plants");
      workbook.createSheet("notes");
      List<String> headings = List.of("plant", "tonnes", "broken");
      for (int c = 0; c < headings.size(); c++) {
        (c == 0 ? sheet.createRow(0) : sheet.getRow(0)).createCell(c).setCellValue(headings.get(c));
      }
      for (int r = 1; r <= 3; r++) {
        sheet.createRow(r).createCell(0).setCellValue("GW1");
        sheet.getRow(r).createCell(1).setCellValue(10.5 * r);
        sheet.getRow(r).createCell(2).setCellErrorValue((byte) 7);
      }
      workbook.write(out);
    }
    RecordsSketch sketch = RecordsSketch.of(new Source(file, Optional.empty(), Optional.empty()));
    assertThat(sketch.sheets()).containsExactly("plants", "notes");
    assertThat(sketch.facts().get("sheet")).isEqualTo("\"plants\" (the first of 2)");
    assertThat(column(sketch, "tonnes").most()).contains(31.5);
    assertThat(column(sketch, "broken").examples()).containsExactly("#DIV/0!");
    assertThat(sketch.proposal().plant().map(Choice::column)).contains("plant");
  }

  @Test
  void aFileThatCannotBeReadIsRefused() {
    Source source = new Source(folder.resolve("no.csv"), Optional.empty(), Optional.empty());
    RecordsRefused refused =
        catchThrowableOfType(RecordsRefused.class, () -> RecordsSketch.of(source));
    assertThat(refused).hasMessageContaining("no.csv");
  }
}
