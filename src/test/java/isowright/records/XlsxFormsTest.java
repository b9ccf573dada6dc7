package isowright.records;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.catchThrowableOfType;

import java.io.IOException;
import java.io.OutputStream;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.security.GeneralSecurityException;
import java.time.LocalDate;
import java.util.List;
import java.util.Optional;
import java.util.function.Consumer;
import java.util.zip.ZipEntry;
import java.util.zip.ZipOutputStream;
import org.apache.poi.openxml4j.exceptions.InvalidFormatException;
import org.apache.poi.openxml4j.opc.OPCPackage;
import org.apache.poi.openxml4j.opc.PackageAccess;
import org.apache.poi.poifs.crypt.EncryptionInfo;
import org.apache.poi.poifs.crypt.EncryptionMode;
import org.apache.poi.poifs.crypt.Encryptor;
import org.apache.poi.poifs.filesystem.POIFSFileSystem;
import org.apache.poi.ss.usermodel.Cell;
import org.apache.poi.ss.usermodel.CellStyle;
import org.apache.poi.ss.usermodel.FormulaError;
import org.apache.poi.xssf.usermodel.XSSFCell;
import org.apache.poi.xssf.usermodel.XSSFRow;
import org.apache.poi.xssf.usermodel.XSSFSheet;
import org.apache.poi.xssf.usermodel.XSSFWorkbook;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** Workbooks: the same panel as from CSV, and what only a workbook's cell can hold. */
class XlsxFormsTest {

  private static final List<String> HEADINGS = List.of(Glassworks.HEADINGS.split(","));

  @TempDir private Path folder;

  /** The glassworks on a sheet called plants, changed, then written. */
  private Source workbook(Consumer<XSSFSheet> change) throws IOException {
    try (XSSFWorkbook workbook = new XSSFWorkbook()) {
      XSSFSheet sheet = workbook.createSheet("plants");
      fill(sheet, Glassworks.csv());
      change.accept(sheet);
      return write(workbook);
    }
  }

  private Source write(XSSFWorkbook workbook) throws IOException {
    Path file = folder.resolve("glass.xlsx");
    try (OutputStream out = Files.newOutputStream(file)) {
      workbook.write(out);
    }
    return new Source(file, Optional.empty(), Optional.empty());
  }

  private static void fill(XSSFSheet sheet, String csv) {
    String[] lines = csv.split("\n");
    for (int r = 0; r < lines.length; r++) {
      XSSFRow row = sheet.createRow(r);
      String[] cells = lines[r].split(",");
      for (int c = 0; c < cells.length; c++) {
        XSSFCell cell = row.createCell(c);
        if (r == 0 || c == 0) {
          cell.setCellValue(cells[c]);
        } else {
          cell.setCellValue(Double.parseDouble(cells[c]));
        }
      }
    }
  }

  private static XSSFCell cell(XSSFSheet sheet, int row, String heading) {
    return sheet.getRow(row - 1).getCell(HEADINGS.indexOf(heading));
  }

  private static Reading read(Source source) throws RecordsRefused {
    return RecordsReader.read(source, Glassworks.allRoles(), Keep.ALL);
  }

  private static RecordsRefused refused(Source source) {
    RecordsRefused refused = catchThrowableOfType(RecordsRefused.class, () -> read(source));
    assertThat(refused).isNotNull();
    return refused;
  }

  @Test
  void theSamePanelAsFromCsv() throws Exception {
    Reading book = read(workbook(sheet -> {}));
    Panel csv = Glassworks.read(folder, Glassworks.csv()).panel();
    assertThat(CsvFormsTest.numbers(book.panel()))
        .usingRecursiveComparison()
        .isEqualTo(CsvFormsTest.numbers(csv));
    assertThat(book.panel().plants()).isEqualTo(csv.plants());
    assertThat(book.panel().periods()).isEqualTo(csv.periods());
    assertThat(book.panel().fileRows().toArray()).isEqualTo(csv.fileRows().toArray());
    assertThat(book.facts().get("sheet")).isEqualTo("\"plants\" (the first of 1)");
    assertThat(book.sha256()).hasSize(64);
  }

  @Test
  void formulasCountByTheirStoredValue() throws Exception {
    Source source =
        workbook(
            sheet -> {
              cell(sheet, 2, "tonnes").setCellFormula("1000+0.5");
              cell(sheet, 2, "plant").setCellFormula("CONCATENATE(\"Bir\",\"ch\")");
              sheet.getWorkbook().getCreationHelper().createFormulaEvaluator().evaluateAll();
            });
    Panel panel = read(source).panel();
    assertThat(panel.output().get(0)).isEqualTo(1000.5);
    assertThat(panel.plants()).containsExactly("Birch", "Alder");
  }

  @Test
  void aFormulaWithoutStoredValueIsAnError() throws Exception {
    Source source =
        workbook(
            sheet -> {
              XSSFCell cell = cell(sheet, 3, "wage");
              cell.setCellFormula("A1*2");
              cell.getCTCell().unsetV();
            });
    assertOneCellError(source, "formula-without-value", "wage", "=A1*2", "let it calculate");
  }

  private static void assertOneCellError(
      Source source, String code, String heading, String value, String remedy) {
    assertThat(refused(source).reasons())
        .singleElement()
        .satisfies(
            reason -> {
              assertThat(reason.code()).isEqualTo(code);
              assertThat(reason.rows()).containsExactly(3);
              assertThat(reason.message())
                  .contains("glass.xlsx", "sheet \"plants\"", "row 3")
                  .contains("\"" + heading + "\"", "\"" + value + "\"", remedy);
            });
  }

  @Test
  void errorValuesAreErrorsOfTheirCell() throws Exception {
    Source plain =
        workbook(sheet -> cell(sheet, 3, "tonnes").setCellErrorValue(FormulaError.DIV0.getCode()));
    assertOneCellError(plain, "error-value", "tonnes", "#DIV/0!", "Mend the formula");
    Source formula =
        workbook(
            sheet -> {
              cell(sheet, 3, "wage").setCellFormula("1/0");
              sheet.getWorkbook().getCreationHelper().createFormulaEvaluator().evaluateAll();
            });
    assertOneCellError(formula, "error-value", "wage", "#DIV/0!", "Mend the formula");
  }

  @Test
  void textTruthAndDatesAreNoNumbers() throws Exception {
    assertOneCellError(
        workbook(sheet -> cell(sheet, 3, "wage").setCellValue("31.5")),
        "number-stored-as-text",
        "wage",
        "31.5",
        "Convert the column");
    assertOneCellError(
        workbook(sheet -> cell(sheet, 3, "wage").setCellValue("31,5 EUR")),
        "number-with-unit",
        "wage",
        "31,5 EUR",
        "number alone");
    assertOneCellError(
        workbook(sheet -> cell(sheet, 3, "wage").setCellValue(true)),
        "truth-value",
        "wage",
        "TRUE",
        "Write 1 or 0");
    assertOneCellError(
        workbook(sheet -> date(cell(sheet, 3, "wage"), LocalDate.of(2024, 2, 1))),
        "date-in-number-column",
        "wage",
        "2024-02-01",
        "Format the cell as a number");
    assertOneCellError(
        workbook(sheet -> cell(sheet, 3, "year").setCellValue(2022.5)),
        "not-a-period",
        "year",
        "2022.5",
        "2024-05");
  }

  private static void date(Cell cell, LocalDate date) {
    CellStyle style = cell.getSheet().getWorkbook().createCellStyle();
    style.setDataFormat(cell.getSheet().getWorkbook().createDataFormat().getFormat("dd/mm/yyyy"));
    cell.setCellStyle(style);
    cell.setCellValue(date);
  }

  @Test
  void datesArePeriods() throws Exception {
    Source source =
        workbook(
            sheet -> {
              for (int r = 2; r <= 7; r++) {
                Cell cell = cell(sheet, r, "year");
                date(cell, LocalDate.of((int) cell.getNumericCellValue(), 12, 31));
              }
            });
    Roles roles = Glassworks.roles(List.of(), Optional.of(new Roles.Deflator("ppi", "2021")));
    Panel panel = RecordsReader.read(source, roles, Keep.ALL).panel();
    assertThat(panel.periods()).containsExactly("2021-12-31", "2022-12-31", "2023-12-31");
    assertThat(panel.periodNumbers().get(0)).isEqualTo(2021 + 364 / 365.0);
  }

  @Test
  void datesMayBeCountedFrom1904() throws Exception {
    Source source =
        workbook(
            sheet -> {
              sheet.getWorkbook().getCTWorkbook().addNewWorkbookPr().setDate1904(true);
              for (int r = 2; r <= 7; r++) {
                XSSFCell cell = cell(sheet, r, "year");
                // Days since 1 January 1904: 43830 is 1 January 2024, by the calendar
                // 120 · 365 + 30 leap days (1904, 1908, …, 2020).
                double days = 43830 + r;
                date(cell, LocalDate.EPOCH.plusDays(30000));
                cell.setCellValue(days);
              }
            });
    Reading reading = RecordsReader.read(source, Glassworks.roles(), Keep.ALL);
    assertThat(reading.panel().periods()).startsWith("2024-01-03").hasSize(6);
    assertThat(reading.facts()).containsKey("dates");
  }

  @Test
  void plantsAreNamedAsTheUserSeesThem() throws Exception {
    Source source =
        workbook(
            sheet -> {
              CellStyle style = sheet.getWorkbook().createCellStyle();
              style.setDataFormat(sheet.getWorkbook().createDataFormat().getFormat("00000"));
              for (int r = 2; r <= 4; r++) {
                cell(sheet, r, "plant").setCellValue(123);
                cell(sheet, r, "plant").setCellStyle(style);
              }
              for (int r = 5; r <= 7; r++) {
                cell(sheet, r, "plant").setCellValue(77);
              }
            });
    assertThat(read(source).panel().plants()).containsExactly("00123", "77");
  }

  @Test
  void blankRowsTitlesAboveAndNotesBesideDoNoHarm() throws Exception {
    Source source =
        workbook(
            sheet -> {
              sheet.getRow(2).createCell(12).setCellValue("note beside the table");
              sheet.shiftRows(3, 6, 2);
              sheet.createRow(20).createCell(0).setCellValue("  ");
              sheet.shiftRows(0, sheet.getLastRowNum(), 3);
            });
    Panel panel = read(source).panel();
    assertThat(panel.fileRows().toArray()).containsExactly(5, 6, 9, 10, 11, 12);
  }

  @Test
  void blankCellsInTheMiddleAndAtTheEnd() throws Exception {
    Source source =
        workbook(
            sheet -> {
              sheet.getRow(1).removeCell(cell(sheet, 2, "tonnes"));
              sheet.getRow(2).removeCell(cell(sheet, 3, "filed_cost"));
            });
    Reading reading = read(source);
    assertThat(reading.panel().fileRows().toArray()).containsExactly(3, 4, 5, 6, 7);
    assertThat(reading.panel().filedCost().orElseThrow().get(0)).isNaN();
    assertThat(reading.setAside().get(0).rows()).containsExactly(2);
  }

  @Test
  void theSheetIsFoundByName() throws Exception {
    Source source;
    try (XSSFWorkbook workbook = new XSSFWorkbook()) {
      workbook.createSheet("cover").createRow(0).createCell(0).setCellValue("Glassworks");
      fill(workbook.createSheet("plants"), Glassworks.csv());
      source = write(workbook);
    }
    Source named = new Source(source.file(), Optional.of("plants"), Optional.empty());
    Reading reading = read(named);
    assertThat(reading.panel().rows()).isEqualTo(6);
    assertThat(reading.facts().get("sheet")).isEqualTo("\"plants\" (declared)");
    RecordsRefused cover = refused(source);
    assertThat(cover).hasMessageContaining("sheet \"cover\"").hasMessageContaining("Glassworks");
    RecordsRefused unknown =
        refused(new Source(source.file(), Optional.of("plant"), Optional.empty()));
    assertThat(unknown.reasons().get(0).code()).isEqualTo("no-such-sheet");
    assertThat(unknown)
        .hasMessageContaining("The nearest is \"plants\"")
        .hasMessageContaining("\"cover\", \"plants\"");
  }

  @Test
  void emptySheetsAndSheetsOfHeadingsOnly() throws Exception {
    try (XSSFWorkbook workbook = new XSSFWorkbook()) {
      workbook.createSheet("empty");
      assertThat(refused(write(workbook)))
          .hasMessageContaining("glass.xlsx, sheet \"empty\"")
          .hasMessageContaining("no headings");
    }
    Source headings =
        workbook(
            sheet -> {
              for (int r = 6; r >= 1; r--) {
                sheet.removeRow(sheet.getRow(r));
              }
            });
    assertThat(refused(headings).reasons().get(0).code()).isEqualTo("no-rows");
  }

  @Test
  void aNumberFormatIsForTextAndSaysNothingHere() throws Exception {
    Source source = workbook(sheet -> {});
    assertThat(read(Glassworks.declaring(source, ',')).panel().output().get(0)).isEqualTo(1000.5);
  }

  @Test
  void aProtectedWorkbookIsRefused()
      throws IOException, GeneralSecurityException, InvalidFormatException {
    Source plain = workbook(sheet -> {});
    Path closed = folder.resolve("closed.xlsx");
    try (POIFSFileSystem files = new POIFSFileSystem()) {
      Encryptor encryptor = new EncryptionInfo(EncryptionMode.agile).getEncryptor();
      encryptor.confirmPassword("secret");
      try (OPCPackage archive = OPCPackage.open(plain.file().toFile(), PackageAccess.READ_WRITE);
          OutputStream out = encryptor.getDataStream(files)) {
        archive.save(out);
      }
      try (OutputStream out = Files.newOutputStream(closed)) {
        files.writeFilesystem(out);
      }
    }
    RecordsRefused refused = refused(new Source(closed, Optional.empty(), Optional.empty()));
    assertThat(refused).hasMessageContaining("closed.xlsx").hasMessageContaining("password");
  }

  @Test
  void damagedAndUnreasonableArchivesAreRefused() throws IOException {
    Source source = workbook(sheet -> {});
    byte[] bytes = Files.readAllBytes(source.file());
    Source half =
        Glassworks.write(folder, "half.xlsx", java.util.Arrays.copyOf(bytes, bytes.length / 2));
    assertThat(refused(half)).hasMessageContaining("half.xlsx").hasMessageContaining("save");
    Path document = folder.resolve("letter.xlsx");
    try (org.apache.poi.xwpf.usermodel.XWPFDocument letter =
            new org.apache.poi.xwpf.usermodel.XWPFDocument();
        OutputStream out = Files.newOutputStream(document)) {
      letter.write(out);
    }
    assertThat(refused(new Source(document, Optional.empty(), Optional.empty())))
        .hasMessageContaining("letter.xlsx")
        .hasMessageContaining("no workbook in it");
    assertThat(refused(bomb()).reasons().get(0))
        .satisfies(
            reason -> {
              assertThat(reason.code()).isEqualTo("unreasonable-archive");
              assertThat(reason.message()).contains("bomb.xlsx", ".csv");
            });
  }

  /** A workbook whose sheet is 10 MB of the same cell, packed into a few ten kilobytes. */
  private Source bomb() throws IOException {
    Path plain = workbook(sheet -> {}).file();
    Path file = folder.resolve("bomb.xlsx");
    try (java.util.zip.ZipFile parts = new java.util.zip.ZipFile(plain.toFile());
        ZipOutputStream out = new ZipOutputStream(Files.newOutputStream(file))) {
      for (ZipEntry entry : java.util.Collections.list(parts.entries())) {
        out.putNextEntry(new ZipEntry(entry.getName()));
        if (entry.getName().endsWith("sheet1.xml")) {
          String sheet =
              new String(parts.getInputStream(entry).readAllBytes(), StandardCharsets.UTF_8);
          String head = sheet.substring(0, sheet.indexOf("</sheetData>"));
          out.write(head.getBytes(StandardCharsets.UTF_8));
          byte[] rows = "<row><c><v>1</v></c></row>".repeat(4000).getBytes(StandardCharsets.UTF_8);
          for (int i = 0; i < 100; i++) {
            out.write(rows);
          }
        } else {
          parts.getInputStream(entry).transferTo(out);
        }
      }
    }
    return new Source(file, Optional.empty(), Optional.empty());
  }
}
