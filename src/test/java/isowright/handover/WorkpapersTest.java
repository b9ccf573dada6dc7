package isowright.handover;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;
import static org.junit.jupiter.api.Assumptions.assumeTrue;

import isowright.records.Panel;
import isowright.records.RecordsReader;
import isowright.study.Findings;
import isowright.study.Pipeline;
import isowright.study.Progress;
import isowright.study.Study;
import isowright.study.StudyFile;
import isowright.workbench.Workbench;
import java.io.ByteArrayInputStream;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Objects;
import java.util.Optional;
import java.util.TreeMap;
import java.util.concurrent.TimeUnit;
import java.util.stream.Stream;
import org.apache.poi.ss.usermodel.Cell;
import org.apache.poi.ss.usermodel.CellType;
import org.apache.poi.ss.usermodel.FormulaEvaluator;
import org.apache.poi.ss.usermodel.Row;
import org.apache.poi.ss.usermodel.Sheet;
import org.apache.poi.ss.usermodel.Workbook;
import org.apache.poi.xssf.usermodel.XSSFWorkbook;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Tag;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/**
 * The workpapers of the demo, worked out again by programs that are not this one: a spreadsheet
 * (LibreOffice, where it is installed) for everything, the evaluator of Apache POI for what it
 * knows.
 */
@Tag("slow")
class WorkpapersTest {

  private static final Path DEMO = Path.of("notebooks-data", "glassworks.yaml");

  @TempDir private Path folder;

  private static byte[] file;

  @BeforeAll
  static void writeThem() throws Exception {
    Study study = StudyFile.read(DEMO);
    Findings findings = Pipeline.run(study, Progress.SILENT);
    Study.Records asked = study.records().orElseThrow();
    Panel rows = RecordsReader.read(asked.source(), asked.roles(), asked.keep()).panel();
    file = Workpapers.write(findings, Optional.of(rows));
    assertThat(Workpapers.write(findings, Optional.of(rows))).isEqualTo(file);
  }

  private static Workbook open() throws IOException {
    return new XSSFWorkbook(new ByteArrayInputStream(file));
  }

  /** The sheets as a spreadsheet recalculates them, each a list of lines. */
  private Map<String, List<String>> recalculated(byte[] workbook) throws Exception {
    assumeTrue(installed("soffice"), "needs the Debian package libreoffice-calc-nogui");
    Path xlsx = Files.write(folder.resolve("w.xlsx"), workbook);
    Process process =
        new ProcessBuilder(
                "soffice",
                "--headless",
                "-env:UserInstallation=" + folder.resolve("office").toUri(),
                "--convert-to",
                "csv:Text - txt - csv (StarCalc):44,34,76,1,,0,false,true,false,false,false,-1",
                "--outdir",
                folder.toString(),
                xlsx.toString())
            .redirectErrorStream(true)
            .redirectOutput(folder.resolve("log").toFile())
            .start();
    assertThat(process.waitFor(5, TimeUnit.MINUTES)).isTrue();
    Map<String, List<String>> sheets = new TreeMap<>();
    try (Stream<Path> all = Files.list(folder)) {
      for (Path csv : all.filter(path -> path.toString().endsWith(".csv")).toList()) {
        String name = String.valueOf(csv.getFileName()).replaceAll("^w-|\\.csv$", "");
        sheets.put(name, Files.readAllLines(csv));
      }
    }
    return sheets;
  }

  private static boolean installed(String program) {
    return Stream.of(System.getenv("PATH").split(":"))
        .anyMatch(place -> Files.isExecutable(Path.of(place, program)));
  }

  @Test
  void aSpreadsheetFindsEveryCheckTrue() throws Exception {
    Map<String, List<String>> sheets = recalculated(file);
    assertThat(sheets).containsKeys("Guide", "Fit1", "Fit2", "Fit3", "Plan1", "Tests", "Review");
    List<String> all = sheets.values().stream().flatMap(List::stream).toList();
    assertThat(all).noneMatch(line -> line.contains("FALSE") || line.contains("Err:"));
    assertThat(all).noneMatch(line -> line.contains("#VALUE!") || line.contains("#NAME?"));
    assertThat(sheets.get("Guide"))
        .anyMatch(line -> line.startsWith("whether the two") && line.contains("TRUE"));
    assertThat(all.stream().filter(line -> line.contains("TRUE")).count()).isGreaterThan(100);
  }

  /** A wage changed in the workbook gives what the program gives at that wage. */
  @Test
  void anotherWageGivesThePlanOfTheProgram() throws Exception {
    byte[] changed;
    try (Workbook book = open();
        java.io.ByteArrayOutputStream out = new java.io.ByteArrayOutputStream()) {
      for (Sheet sheet : book) {
        if (sheet.getSheetName().startsWith("Plan")) {
          sheet.getRow(6).getCell(1).setCellValue(40);
        }
      }
      book.setForceFormulaRecalculation(true);
      book.write(out);
      changed = out.toByteArray();
    }
    Map<String, List<String>> sheets = recalculated(changed);
    Workbench bench =
        Workbench.open(DEMO)
            .with(
                """
                least-cost:
                  - {name: Dearer, target: 40000, prices: {labour: 40, machines: 74, energy: 10.5}}
                """);
    List<String> technologies = List.of("cobb-douglas", "ces", "translog");
    for (int p = 0; p < technologies.size(); p++) {
      double hours =
          Objects.requireNonNull(bench.plan("Dearer", technologies.get(p)).mix().get("labour"))
              .value();
      String[] labour = Objects.requireNonNull(sheets.get("Plan" + (p + 1))).get(6).split(",");
      // the level is held as stated; both solve the same conditions to rounding
      assertThat(Double.parseDouble(labour[4])).isCloseTo(hours, within(1e-7 * hours));
    }
  }

  /** Without a spreadsheet: what POI's evaluator knows (no inverse, no laws of statistics). */
  @Test
  void closedFormsAndSumsHoldByAnotherEvaluator() throws Exception {
    try (Workbook book = open()) {
      FormulaEvaluator evaluator = book.getCreationHelper().createFormulaEvaluator();
      for (String name : List.of("Plan1", "Plan2", "Review", "Fit2")) {
        Cell verdict = book.getSheet(name).getRow(1).getCell(1);
        assertThat(evaluator.evaluate(verdict).getBooleanValue()).as(name).isTrue();
      }
    }
  }

  @Test
  void aFalseFigureTurnsItsCheckFalse() throws Exception {
    try (Workbook book = open()) {
      Sheet review = book.getSheet("Review");
      Cell stated = review.getRow(4).getCell(6);
      stated.setCellValue(stated.getNumericCellValue() * (1 + 1e-6));
      FormulaEvaluator evaluator = book.getCreationHelper().createFormulaEvaluator();
      assertThat(evaluator.evaluate(review.getRow(1).getCell(1)).getBooleanValue()).isFalse();
    }
  }

  @Test
  void coefficientsAndPlansAreFormulasAndNoFormulaHasAStaleValue() throws Exception {
    int formulas = 0;
    try (Workbook book = open()) {
      for (Sheet sheet : book) {
        assertThat(sheet.getFitToPage()).isTrue();
        for (Row row : sheet) {
          for (Cell cell : row) {
            if (cell.getCellType() == CellType.FORMULA) {
              formulas++;
              assertThat(((org.apache.poi.xssf.usermodel.XSSFCell) cell).getCTCell().isSetV())
                  .as(sheet.getSheetName() + cell.getAddress())
                  .isFalse();
            }
          }
        }
      }
      assertThat(book.getSheet("Records").getPaneInformation().isFreezePane()).isTrue();
      assertThat(book.getAllNames())
          .extracting(name -> name.getNameName())
          .contains("records_output", "Plan1_price_labour", "coefficient_Fit1_labour");
    }
    assertThat(formulas).isGreaterThan(2000);
  }

  @Test
  void wordsThatLookLikeFormulasStayWords() throws Exception {
    List<String> plants = new ArrayList<>(List.of("=1+1", "+A", "-B", "@C", "<b>D"));
    StringBuilder csv = new StringBuilder("plant,year,q,l,k,w,r\n");
    for (int p = 0; p < plants.size(); p++) {
      for (int year = 2018; year <= 2020; year++) {
        double l = 10 + p + 2 * (year - 2018) + (p * year) % 3;
        double k = 20 + 3 * p + (year % 2) + (p * p) % 5;
        double q = Math.pow(l, 0.6) * Math.pow(k, 0.4) * (1 + 0.01 * ((p + year) % 4));
        csv.append(String.join(",", plants.get(p), "" + year, "" + q, "" + l, "" + k, "3", "2"));
        csv.append('\n');
      }
    }
    Files.writeString(folder.resolve("r.csv"), csv);
    Path yaml =
        Files.writeString(
            folder.resolve("s.yaml"),
            """
            title: "=2+2"
            records: {file: r.csv, plant: plant, period: year}
            output: {column: q}
            inputs: {labour: {quantity: l, price: w}, machines: {quantity: k, price: r}}
            technologies: [cobb-douglas]
            """);
    Study study = StudyFile.read(yaml);
    Study.Records asked = study.records().orElseThrow();
    Panel rows = RecordsReader.read(asked.source(), asked.roles(), asked.keep()).panel();
    byte[] written = Workpapers.write(Pipeline.run(study, Progress.SILENT), Optional.of(rows));
    try (Workbook book = new XSSFWorkbook(new ByteArrayInputStream(written))) {
      Sheet records = book.getSheet("Records");
      for (int p = 0; p < plants.size(); p++) {
        Cell plant = records.getRow(4 + 3 * p).getCell(0);
        assertThat(plant.getCellType()).isEqualTo(CellType.STRING);
        assertThat(plant.getStringCellValue()).isEqualTo(plants.get(p));
      }
      assertThat(book.getSheet("Guide").getRow(0).getCell(0).getStringCellValue())
          .isEqualTo("=2+2");
    }
  }
}
