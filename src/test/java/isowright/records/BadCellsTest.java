package isowright.records;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.catchThrowableOfType;

import java.nio.file.Path;
import java.util.List;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.Arguments;
import org.junit.jupiter.params.provider.MethodSource;

/** Every bad cell is named with file, row, column, value and remedy. */
class BadCellsTest {

  @TempDir private Path folder;

  /** Heading, cell as written in the CSV file, value as said, code, words of the remedy. */
  static Stream<Arguments> badCells() {
    return Stream.of(
        bad("tonnes", "n/a", "n/a", "word-for-missing", "leave the cell blank"),
        bad("tonnes", "NA", "NA", "word-for-missing", "row is set aside"),
        bad("wage", "-", "-", "word-for-missing", "row is still used"),
        bad("wage", "null", "null", "word-for-missing", "leave the cell blank"),
        bad("wage", "?", "?", "word-for-missing", "leave the cell blank"),
        bad("tonnes", "NaN", "NaN", "not-finite", "row is set aside"),
        bad("filed_cost", "nan", "nan", "not-finite", "row is still used"),
        bad("labour_hours", "inf", "inf", "not-finite", "Correct the value"),
        bad("labour_hours", "-Infinity", "-Infinity", "not-finite", "Correct the value"),
        bad("labour_hours", "1e400", "1e400", "not-finite", "Correct the value"),
        bad("tonnes", "abc", "abc", "not-a-number", "Enter the number"),
        bad("tonnes", "1100 t", "1100 t", "number-with-unit", "declare the unit"),
        bad("wage", "EUR 31", "EUR 31", "number-with-unit", "number alone"),
        bad("wage", "31€", "31€", "number-with-unit", "number alone"),
        bad("wage", "$31.50", "$31.50", "number-with-unit", "number alone"),
        bad("labour_hours", "12h", "12h", "number-with-unit", "number alone"),
        bad("wage", "12%", "12%", "percent-sign", "as a share (0.12)"),
        bad("wage", "\"31,5\"", "31,5", "decimal-comma", "Write 31.5"),
        bad("wage", "\"31,5\"", "31,5", "decimal-comma", "records.number-format"),
        bad("labour_hours", "43 00", "43 00", "digit-grouping", "without marks"),
        bad("labour_hours", "\"4,30,0\"", "4,30,0", "digit-grouping", "without marks"),
        bad("labour_hours", "4_300", "4_300", "digit-grouping", "without marks"),
        bad("wage", "\u22125", "\u22125", "minus-sign", "plain hyphen"),
        bad("wage", "(31)", "(31)", "minus-sign", "plain hyphen"),
        bad("wage", "=B2*C2", "=B2*C2", "formula-text", "value of the formula"),
        bad("wage", "#DIV/0!", "#DIV/0!", "error-value", "Mend the formula"),
        bad("wage", "#N/A", "#N/A", "word-for-missing", "leave the cell blank"),
        bad("wage", "#REF!", "#REF!", "error-value", "Mend the formula"),
        bad("wage", "1.2.3", "1.2.3", "digit-grouping", "without marks"),
        bad("wage", "1e", "1e", "number-with-unit", "number alone"),
        bad("wage", "0x1F", "0x1F", "not-a-number", "Enter the number"),
        bad("wage", "1d", "1d", "number-with-unit", "number alone"),
        bad("wage", "1.0D+03", "1.0D+03", "not-a-number", "Enter the number"),
        bad("wage", "TRUE", "TRUE", "not-a-number", "Enter the number"),
        bad("wage", "5-", "5-", "number-with-unit", "number alone"),
        bad("tonnes", "0", "0", "output-not-positive", "records.keep"),
        bad("tonnes", "-0.0", "-0", "output-not-positive", "leave the cell blank"),
        bad("tonnes", "-3.5", "-3.5", "output-not-positive", "Correct it"),
        bad("wage", "0", "0", "price-not-positive", "leave the cell blank"),
        bad("wage", "-1", "-1", "price-not-positive", "Correct it"),
        bad("machine_cost", "0", "0", "spending-not-positive", "leave the cell blank"),
        bad("machine_cost", "-12", "-12", "spending-not-positive", "Correct it"),
        bad("ppi", "0", "0", "deflator-not-positive", "leave the cell blank"),
        bad("filed_cost", "-7", "-7", "filed-cost-not-positive", "nothing was filed"),
        bad("age", "0", "0", "control-not-positive", "log: true"),
        bad("year", "2022.5", "2022.5", "not-a-period", "2024-05-31"),
        bad("year", "2022.0", "2022.0", "not-a-period", "Write 2022."),
        bad("year", "Q1", "Q1", "not-a-period", "2024-05"),
        bad("year", "2022-13", "2022-13", "not-a-period", "ISO 8601"),
        bad("year", "2022-02-30", "2022-02-30", "not-a-period", "ISO 8601"),
        bad("year", "31.12.2022", "31.12.2022", "not-a-period", "ISO 8601"),
        bad("year", "12/31/2022", "12/31/2022", "not-a-period", "ISO 8601"),
        bad("year", "1234567890", "1234567890", "not-a-period", "ISO 8601"),
        bad("year", "2022-6", "2022-6", "not-a-period", "ISO 8601"));
  }

  private static Arguments bad(
      String heading, String cell, String said, String code, String remedy) {
    return Arguments.of(heading, cell, said, code, remedy);
  }

  @ParameterizedTest
  @MethodSource("badCells")
  void aBadCellIsNamed(String heading, String cell, String said, String code, String remedy)
      throws Exception {
    String csv = Glassworks.csvWith(2, heading, cell);
    RecordsRefused refused =
        catchThrowableOfType(RecordsRefused.class, () -> Glassworks.read(folder, csv));
    assertThat(refused).isNotNull();
    assertThat(refused.reasons())
        .singleElement()
        .satisfies(
            reason -> {
              assertThat(reason.severity()).isEqualTo(Remark.Severity.ERROR);
              assertThat(reason.code()).isEqualTo(code);
              assertThat(reason.rows()).containsExactly(3);
              assertThat(reason.message())
                  .contains("glass.csv", "row 3", "\"" + heading + "\"", "\"" + said + "\"")
                  .contains(remedy)
                  .endsWith(".");
            });
  }

  @Test
  void allErrorsOfAFileComeTogetherInTheOrderOfTheFile() throws Exception {
    String csv =
        Glassworks.csv()
            .replace("Birch,2021,1000.5,4100,30.25", "Birch,2021,n/a,4100,thirty")
            .replace("Alder,2022,560", "Alder,2022,0")
            .replace("Alder,2023,600", "Alder,2022,600");
    RecordsRefused refused =
        catchThrowableOfType(RecordsRefused.class, () -> Glassworks.read(folder, csv));
    assertThat(refused.reasons())
        .extracting(Remark::code)
        .containsExactly(
            "word-for-missing", "not-a-number", "output-not-positive", "duplicate-period");
    assertThat(refused.getMessage()).isEqualTo(refused.reasons().get(0).message());
  }

  @Test
  void manyErrorsAreAllCountedAndTheFirstSaid() throws Exception {
    int rows = 1000;
    StringBuilder csv = new StringBuilder(Glassworks.HEADINGS + "\n");
    for (int r = 0; r < rows; r++) {
      csv.append("P").append(r).append(",2021,bad,worse,30,2000,160000,7,100,290000\n");
    }
    RecordsRefused refused =
        catchThrowableOfType(RecordsRefused.class, () -> Glassworks.read(folder, csv.toString()));
    assertThat(refused.reasons()).hasSize(51);
    Remark last = refused.reasons().get(50);
    assertThat(last.code()).isEqualTo("more-errors");
    assertThat(last.message())
        .contains("1,950 errors more")
        .contains("975 in column \"tonnes\" (output)")
        .contains("975 in column \"labour_hours\" (quantity of labour)");
  }

  @Test
  void twoRowsForOnePlantAndPeriodAreNamed() throws Exception {
    String csv =
        Glassworks.csv().replace("Birch,2023,", "Birch,2021,").replace("Birch,2022", "Birch,2021");
    RecordsRefused refused =
        catchThrowableOfType(RecordsRefused.class, () -> Glassworks.read(folder, csv));
    assertThat(refused.reasons())
        .singleElement()
        .satisfies(
            reason -> {
              assertThat(reason.code()).isEqualTo("duplicate-period");
              assertThat(reason.rows()).containsExactly(2, 3, 4);
              assertThat(reason.message())
                  .contains("glass.csv", "rows 2, 3, 4", "\"Birch\"", "2021", "Remove the row");
            });
  }

  @Test
  void aRowSetAsideIsNoDuplicate() throws Exception {
    String csv = Glassworks.csvWith(1, "tonnes", "").replace("Birch,2021", "Birch,2022");
    assertThat(Glassworks.read(folder, csv).panel().rows()).isEqualTo(5);
  }

  @Test
  void aMillionCharactersInACellAreShortened() throws Exception {
    String csv = Glassworks.csvWith(2, "tonnes", "9".repeat(999_999) + "x");
    RecordsRefused refused =
        catchThrowableOfType(RecordsRefused.class, () -> Glassworks.read(folder, csv));
    assertThat(refused.reasons())
        .singleElement()
        .satisfies(
            reason ->
                assertThat(reason.message())
                    .contains("999…", "1,000,000 characters", "row 3", "tonnes")
                    .hasSizeLessThan(400));
  }

  @Test
  void aMillionDigitsAreTooLargeANumber() throws Exception {
    String csv = Glassworks.csvWith(2, "tonnes", "9".repeat(1_000_000));
    RecordsRefused refused =
        catchThrowableOfType(RecordsRefused.class, () -> Glassworks.read(folder, csv));
    assertThat(refused.reasons()).extracting(Remark::code).containsExactly("not-finite");
  }

  @Test
  void aMillionCharactersInAnUnusedColumnDoNoHarm() throws Exception {
    String csv =
        Glassworks.csv()
            .replace(",ppi,", ",note,")
            .replace(",104,", "," + "x".repeat(1_000_000) + ",");
    Reading reading =
        RecordsReader.read(
            Glassworks.write(folder, "glass.csv", csv), Glassworks.roles(), Keep.ALL);
    assertThat(reading.panel().rows()).isEqualTo(6);
  }

  @Test
  void textThatLooksLikeAFormulaIsOnlyTextInThePlantColumn() throws Exception {
    String csv = Glassworks.csv().replace("Birch", "=cmd|' /C calc'!A0");
    assertThat(Glassworks.read(folder, csv).panel().plants())
        .containsExactly("=cmd|' /C calc'!A0", "Alder");
  }

  @Test
  void mixedKindsOfPeriodAreRefused() throws Exception {
    String csv = Glassworks.csvWith(2, "year", "2022-05");
    RecordsRefused refused =
        catchThrowableOfType(RecordsRefused.class, () -> Glassworks.read(folder, csv));
    assertThat(refused.reasons())
        .singleElement()
        .satisfies(
            reason ->
                assertThat(reason.message())
                    .contains("glass.csv", "year", "\"2021\" in row 2", "\"2022-05\" in row 3"));
  }

  @Test
  void raggedRowsAreNamed() throws Exception {
    String csv =
        Glassworks.csv()
            .replace("Birch,2022,1100,4300,31,", "Birch,2022,1100,4300,31,5,")
            .replace("Alder,2022,560,", "Alder,2022,");
    RecordsRefused refused =
        catchThrowableOfType(RecordsRefused.class, () -> Glassworks.read(folder, csv));
    assertThat(refused.reasons()).extracting(Remark::code).containsOnly("ragged-row");
    assertThat(refused.reasons()).extracting(Remark::rows).containsExactly(List.of(3), List.of(6));
    assertThat(refused.reasons().get(0).message())
        .contains("glass.csv", "row 3", "11 cells", "10", "double quotes");
  }
}
