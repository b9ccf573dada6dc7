package isowright.records;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.catchThrowableOfType;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** Files, headings and declarations that cannot be used are refused with a remedy. */
class BadFilesTest {

  @TempDir private Path folder;

  private static RecordsRefused refused(Source source, Roles roles, Keep keep) {
    RecordsRefused refused =
        catchThrowableOfType(RecordsRefused.class, () -> RecordsReader.read(source, roles, keep));
    assertThat(refused).isNotNull();
    assertThat(refused.reasons()).allMatch(r -> r.severity() == Remark.Severity.ERROR);
    return refused;
  }

  private static RecordsRefused refused(Source source) {
    return refused(source, Glassworks.allRoles(), Keep.ALL);
  }

  private RecordsRefused refused(String name, String text) throws IOException {
    return refused(Glassworks.write(folder, name, text));
  }

  private static void says(RecordsRefused refused, String code, String... words) {
    assertThat(refused.reasons().get(0).code()).isEqualTo(code);
    assertThat(refused.reasons().get(0).message()).contains(words).endsWith(".");
  }

  @Test
  void aFileThatIsNotThere() {
    Source source = new Source(folder.resolve("nothing.csv"), Optional.empty(), Optional.empty());
    says(refused(source), "no-such-file", "nothing.csv", folder.toString(), "records.file");
  }

  @Test
  void aDirectory() {
    says(
        refused(new Source(folder, Optional.empty(), Optional.empty())),
        "not-a-file",
        folder.toString(),
        "Name the .csv or .xlsx file");
  }

  @ParameterizedTest
  @CsvSource({
    "records.xls, Save it as .xlsx",
    "records.ods, Save it as .xlsx",
    "records.pdf, Save the records as .csv or .xlsx",
    "records, Save the records as .csv or .xlsx"
  })
  void otherKindsOfFile(String name, String remedy) throws IOException {
    says(refused(name, "anything"), "unknown-kind-of-file", name, remedy);
  }

  @Test
  void emptyFiles() throws IOException {
    says(refused("empty.csv", ""), "empty-file", "empty.csv", "0 bytes", "Export");
    says(refused("empty.xlsx", ""), "empty-file", "empty.xlsx", "0 bytes", "Save");
    says(refused("blank.csv", "\n \n\n"), "no-headings", "blank.csv", "first row");
    says(refused("commas.csv", ",,,\n,,,\n"), "no-headings", "commas.csv", "first row");
  }

  @Test
  void headingsOnly() throws IOException {
    says(refused("h.csv", Glassworks.HEADINGS), "no-rows", "h.csv", "no rows below");
    says(refused("h.csv", Glassworks.HEADINGS + "\n\n,,\n"), "no-rows", "h.csv");
  }

  @Test
  void filesWhoseEndingLies() throws IOException {
    byte[] old = {(byte) 0xD0, (byte) 0xCF, 0x11, (byte) 0xE0, (byte) 0xA1, (byte) 0xB1, 0x1A};
    says(
        refused(Glassworks.write(folder, "old.xlsx", old)),
        "protected-or-old-workbook",
        "old.xlsx",
        "password",
        "save it as .xlsx");
    says(
        refused(Glassworks.write(folder, "old.csv", old)),
        "workbook-called-csv",
        "old.csv",
        ".xls");
    byte[] zip = "PK\u0003\u0004rest".getBytes(StandardCharsets.ISO_8859_1);
    says(
        refused(Glassworks.write(folder, "zip.csv", zip)),
        "workbook-called-csv",
        "zip.csv",
        ".xlsx");
    says(
        refused(Glassworks.write(folder, "zip.xlsx", zip)), "damaged-workbook", "zip.xlsx", "save");
    says(refused("text.xlsx", Glassworks.csv()), "not-a-workbook", "text.xlsx", "ending .csv");
    says(
        refused(
            Glassworks.write(
                folder, "wide.csv", Glassworks.csv().getBytes(StandardCharsets.UTF_16LE))),
        "not-text",
        "wide.csv",
        "UTF-8");
  }

  @Test
  void everyMissingColumnIsNamedWithTheNearestHeading() throws IOException {
    String csv =
        Glassworks.csv().replace("tonnes", "tones").replace("wage", "x1").replace("age,", "Age,");
    RecordsRefused refused = refused("glass.csv", csv);
    assertThat(refused.reasons()).extracting(Remark::code).containsOnly("missing-column");
    assertThat(refused.reasons()).hasSize(3);
    says(
        refused,
        "missing-column",
        "glass.csv, row 1",
        "no column \"tonnes\"",
        "output",
        "nearest heading is \"tones\"",
        "\"labour_hours\"");
    assertThat(refused.reasons().get(1).message())
        .contains("\"wage\"", "price of labour")
        .doesNotContain("x1\".");
    assertThat(refused.reasons().get(2).message()).contains("nearest heading is \"Age\"");
  }

  @Test
  void aHeadingThatStandsTwiceIsRefusedOnlyWhereItIsUsed() throws Exception {
    String csv = Glassworks.csv().replace("labour_hours,wage", "wage,wage");
    RecordsRefused refused = refused("glass.csv", csv.replace("machine_hours", "labour_hours"));
    assertThat(refused.reasons())
        .extracting(Remark::code)
        .containsExactly("duplicate-heading", "missing-column");
    says(refused, "duplicate-heading", "\"wage\"", "2 columns", "D (4), E (5)", "Rename");
    String unused = Glassworks.csv().replace("age,ppi", "note,note");
    assertThat(
            RecordsReader.read(
                    Glassworks.write(folder, "glass.csv", unused), Glassworks.roles(), Keep.ALL)
                .panel()
                .rows())
        .isEqualTo(6);
  }

  @Test
  void anEmptyHeadingOverAUsedColumn() throws IOException {
    RecordsRefused refused = refused("glass.csv", Glassworks.csv().replace("tonnes", " "));
    says(refused, "missing-column", "\"tonnes\"", "empty heading");
  }

  @Test
  void contradictionsBetweenKeepAndRoles() throws IOException {
    Source source = Glassworks.write(folder, "glass.csv", Glassworks.csv());
    Roles bare =
        new Roles(
            Optional.empty(),
            Optional.empty(),
            "tonnes",
            Optional.empty(),
            Glassworks.roles().inputs(),
            List.of(),
            Optional.empty(),
            Optional.empty());
    Keep keep = new Keep(Optional.of("2021"), Optional.empty(), List.of("Birch"));
    RecordsRefused refused = refused(source, bare, keep);
    assertThat(refused.reasons()).hasSize(2);
    says(refused, "keep", "records.keep", "records.period");
    Keep backwards = new Keep(Optional.of("2023"), Optional.of("2021"), List.of());
    says(refused(source, Glassworks.roles(), backwards), "keep", "2023", "2021", "backwards");
    Keep words = new Keep(Optional.of("first"), Optional.empty(), List.of());
    says(refused(source, Glassworks.roles(), words), "keep", "\"first\"", "2024-05");
    Keep stranger = new Keep(Optional.empty(), Optional.empty(), List.of("Bich"));
    says(
        refused(source, Glassworks.roles(), stranger),
        "unknown-plant",
        "\"Bich\"",
        "nearest plant is \"Birch\"");
  }

  @Test
  void aBaseThatTheFileDoesNotHave() throws IOException {
    Source source = Glassworks.write(folder, "glass.csv", Glassworks.csv());
    Roles early = Glassworks.roles(List.of(), Optional.of(new Roles.Deflator("ppi", "2015")));
    says(
        refused(source, early, Keep.ALL),
        "base-period",
        "2015",
        "ppi",
        "2021, 2022, 2023",
        "money.base");
    Roles words = Glassworks.roles(List.of(), Optional.of(new Roles.Deflator("ppi", "start")));
    says(refused(source, words, Keep.ALL), "base-period", "\"start\"", "money.base");
    Roles noPeriod =
        new Roles(
            Optional.of("plant"),
            Optional.empty(),
            "tonnes",
            Optional.empty(),
            Glassworks.roles().inputs(),
            List.of(),
            Optional.of(new Roles.Deflator("ppi", "2021")),
            Optional.empty());
    says(refused(source, noPeriod, Keep.ALL), "deflator-without-period", "records.period");
  }

  @Test
  void aFileThatMayNotBeRead() throws IOException {
    Source source = Glassworks.write(folder, "closed.csv", Glassworks.csv());
    boolean closed = source.file().toFile().setReadable(false);
    org.junit.jupiter.api.Assumptions.assumeTrue(
        closed && !Files.isReadable(source.file()), "the user may read everything");
    says(refused(source), "not-readable", "closed.csv", "permissions");
  }
}
