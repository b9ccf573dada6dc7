package isowright.demo;

import static org.apache.poi.ss.usermodel.Row.MissingCellPolicy.RETURN_BLANK_AS_NULL;
import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import isowright.demo.GlassworksGenerator.Row;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import org.apache.poi.ss.usermodel.Cell;
import org.apache.poi.ss.usermodel.CellType;
import org.apache.poi.ss.usermodel.Sheet;
import org.apache.poi.ss.usermodel.Workbook;
import org.apache.poi.ss.usermodel.WorkbookFactory;
import org.jspecify.annotations.Nullable;
import org.junit.jupiter.api.Test;

/** The committed demo records are what the generator makes and what their dictionary says. */
class GlassworksDataTest {

  private static final Path FOLDER = Path.of("notebooks-data");

  /** Filed costs are whole EUR; half of one in a cost of more than half a million. */
  private static final double ROUNDING = 1e-6;

  private final List<Row> rows = GlassworksGenerator.rows();

  @Test
  void committedCsvIsExactlyWhatTheGeneratorMakes() throws IOException {
    assertThat(Files.readString(FOLDER.resolve("glassworks.csv")))
        .isEqualTo(GlassworksFiles.csv(rows));
  }

  @Test
  void anotherSeedIsAnotherDraw() {
    assertThat(GlassworksFiles.csv(GlassworksGenerator.rows(1)))
        .isNotEqualTo(GlassworksFiles.csv(rows));
  }

  @Test
  void workbookHoldsTheSameDigits() throws IOException {
    try (Workbook workbook =
        WorkbookFactory.create(FOLDER.resolve("glassworks.xlsx").toFile(), null, true)) {
      Sheet sheet = workbook.getSheet("plants");
      assertThat(workbook.getSheetIndex(sheet)).as("the first sheet").isZero();
      assertThat(sheet.getLastRowNum()).isEqualTo(rows.size());
      for (int c = 0; c < GlassworksFiles.COLUMNS.size(); c++) {
        String column = GlassworksFiles.COLUMNS.get(c);
        assertThat(sheet.getRow(0).getCell(c).getStringCellValue()).isEqualTo(column);
        List<Object> cells = new ArrayList<>();
        List<Object> values = new ArrayList<>();
        for (int r = 0; r < rows.size(); r++) {
          cells.add(value(sheet.getRow(r + 1).getCell(c, RETURN_BLANK_AS_NULL)));
          values.add(value(column, rows.get(r).cells().getOrDefault(column, "")));
        }
        assertThat(cells).as(column).isEqualTo(values);
      }
    }
  }

  private static Object value(@Nullable Cell cell) {
    if (cell == null) {
      return "";
    }
    return cell.getCellType() == CellType.NUMERIC
        ? cell.getNumericCellValue()
        : cell.getStringCellValue();
  }

  private static Object value(String column, String text) {
    return text.isEmpty() || GlassworksFiles.TEXT.contains(column)
        ? text
        : Double.parseDouble(text);
  }

  @Test
  void schemaAndDictionaryNameEveryColumn() throws IOException {
    JsonNode fields =
        new ObjectMapper()
            .readTree(FOLDER.resolve("glassworks.schema.json").toFile())
            .path("fields");
    List<String> names = new ArrayList<>();
    String dictionary = Files.readString(FOLDER.resolve("README.md"));
    for (JsonNode field : fields) {
      String name = field.path("name").asText();
      names.add(name);
      assertThat(field.path("type").asText().equals("string"))
          .as(name)
          .isEqualTo(GlassworksFiles.TEXT.contains(name));
      assertThat(dictionary).contains("| `" + name + "` |");
    }
    assertThat(names).isEqualTo(GlassworksFiles.COLUMNS);
  }

  @Test
  void dictionaryPrintsTheTruth() throws IOException {
    assertThat(Files.readString(FOLDER.resolve("README.md")))
        .contains(GlassworksTruthTable.markdown(rows));
  }

  @Test
  void filedCostsReconcileExceptWhereTheDictionarySaysSo() {
    List<String> departures = new ArrayList<>();
    for (Row row : rows) {
      if (row.cells().containsValue("")) {
        continue;
      }
      double parts =
          number(row, "wage") * number(row, "labour_hours")
              + number(row, "machine_cost")
              + number(row, "energy_price") * number(row, "energy_gj");
      if (Math.abs(number(row, "filed_cost") / parts - 1) > ROUNDING) {
        departures.add(row.plant() + " " + row.year());
      }
    }
    List<String> known =
        new ArrayList<>(
            List.of(
                GlassworksBlemishes.SLIP_PLANT + " " + GlassworksBlemishes.SLIP_YEAR,
                GlassworksBlemishes.OVERFILED_PLANT + " " + GlassworksBlemishes.OVERFILED_YEAR));
    GlassworksBlemishes.UNRECONCILED.forEach(u -> known.add(u.plant() + " " + u.year()));
    assertThat(departures).containsExactlyInAnyOrderElementsOf(known);
  }

  @Test
  void truthIsWhatItsConstantsSay() {
    // The closed-form least-cost mix meets its target and makes cost shares proportional to output
    // elasticities, which is the first-order condition in logs; 1e-12 is rounding of double sums.
    double[] prices = {34, 74, 10.5};
    double[] mix = GlassworksTruth.leastCostMix(Math.log(40_000), prices, 2024, 0.08);
    double usual = GlassworksTruth.USUAL_BREAKDOWN;
    assertThat(GlassworksTruth.logOutput(mix, 2024, 0.08, usual))
        .isCloseTo(Math.log(40_000), within(1e-12));
    double[] elasticities = GlassworksTruth.outputElasticities(mix);
    double cost = mix[0] * prices[0] + mix[1] * prices[1] + mix[2] * prices[2];
    double sum = 0;
    for (int i = 0; i < mix.length; i++) {
      assertThat(prices[i] * mix[i] / cost)
          .isCloseTo(elasticities[i] / GlassworksTruth.SCALE, within(1e-12));
      sum += elasticities[i];
    }
    assertThat(sum).isCloseTo(GlassworksTruth.SCALE, within(1e-12));
    assertThat(
            GlassworksTruth.PLANTS.stream().mapToDouble(GlassworksTruth.Plant::productivity).sum())
        .as("productivity levels are relative to their mean")
        .isCloseTo(0, within(1e-12));
  }

  private static double number(Row row, String column) {
    return Double.parseDouble(row.cells().getOrDefault(column, ""));
  }
}
