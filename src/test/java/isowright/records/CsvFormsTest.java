package isowright.records;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.catchThrowableOfType;

import java.io.ByteArrayOutputStream;
import java.nio.charset.Charset;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

/** The forms in which CSV files come: encodings, delimiters, marks, line ends, quotes. */
class CsvFormsTest {

  @TempDir private Path folder;

  private Reading read(String csv, Charset charset) throws Exception {
    return RecordsReader.read(
        Glassworks.write(folder, "glass.csv", csv, charset), Glassworks.allRoles(), Keep.ALL);
  }

  private Reading read(String csv) throws Exception {
    return read(csv, StandardCharsets.UTF_8);
  }

  private RecordsRefused refused(String csv) throws Exception {
    Source source = Glassworks.write(folder, "glass.csv", csv);
    return refused(source);
  }

  private static RecordsRefused refused(Source source) {
    RecordsRefused refused =
        catchThrowableOfType(
            RecordsRefused.class,
            () -> RecordsReader.read(source, Glassworks.allRoles(), Keep.ALL));
    assertThat(refused).isNotNull();
    return refused;
  }

  /** The numbers of a panel; equal lists mean equal panels but for the place in the file. */
  static List<double[]> numbers(Panel panel) {
    List<double[]> all = new java.util.ArrayList<>();
    PanelColumn.of(panel).forEach(c -> all.add(c.column().toArray()));
    return all;
  }

  private void assertSameAsPlain(Reading reading) throws Exception {
    Panel plain = read(Glassworks.csv()).panel();
    assertThat(numbers(reading.panel())).usingRecursiveComparison().isEqualTo(numbers(plain));
    assertThat(reading.panel().plants()).hasSameSizeAs(plain.plants());
    assertThat(reading.panel().periods()).isEqualTo(plain.periods());
  }

  @Test
  void factsOfAPlainFile() throws Exception {
    assertThat(read(Glassworks.csv()).facts())
        .containsExactly(
            java.util.Map.entry("encoding", "UTF-8 (recognised)"),
            java.util.Map.entry("byte-order mark", "none"),
            java.util.Map.entry("delimiter", "comma (recognised)"),
            java.util.Map.entry("decimal mark", "point (recognised)"),
            java.util.Map.entry("digit grouping", "none (recognised)"));
  }

  @ParameterizedTest
  @ValueSource(strings = {"UTF-8", "UTF-16LE", "UTF-16BE"})
  void aByteOrderMarkSaysTheEncoding(String name) throws Exception {
    String csv = "\ufeff" + Glassworks.csv().replace("Birch", "Bärch €");
    Reading reading = read(csv, Charset.forName(name));
    assertThat(reading.panel().plants()).containsExactly("Bärch €", "Alder");
    assertThat(reading.facts().get("encoding")).startsWith(name);
    assertThat(reading.facts().get("byte-order mark")).isEqualTo("present");
    assertSameAsPlain(reading);
  }

  @Test
  void textThatIsNotUtf8IsReadAsWindows1252() throws Exception {
    String csv = Glassworks.csv().replace("Birch", "Müller €");
    Reading reading = read(csv, Charset.forName("windows-1252"));
    assertThat(reading.panel().plants()).containsExactly("Müller €", "Alder");
    assertThat(reading.facts().get("encoding")).startsWith("windows-1252").contains("not UTF-8");
  }

  @Test
  void aByteThatIsNotUtf8FarDownIsFoundToo() throws Exception {
    StringBuilder csv = new StringBuilder(Glassworks.HEADINGS + "\n");
    for (int r = 0; r < 5000; r++) {
      csv.append("P").append(r).append(",2021,1000,4100,30,2000,160000,7,100,290000\n");
    }
    csv.append("Größe,2021,1000,4100,30,2000,160000,7,100,290000\n");
    Reading reading = read(csv.toString(), StandardCharsets.ISO_8859_1);
    assertThat(reading.panel().plants()).hasSize(5001).endsWith("Größe");
    assertThat(reading.fileRows()).isEqualTo(5001);
  }

  @Test
  void bytesOfNoEncodingAreRefused() throws Exception {
    ByteArrayOutputStream bytes = new ByteArrayOutputStream();
    bytes.write(Glassworks.csv().getBytes(StandardCharsets.UTF_8));
    bytes.write(0x81); // stands for nothing in windows-1252, and is no UTF-8
    RecordsRefused refused = refused(Glassworks.write(folder, "glass.csv", bytes.toByteArray()));
    assertThat(refused.reasons().get(0).code()).isEqualTo("encoding");
    assertThat(refused).hasMessageContaining("glass.csv").hasMessageContaining("UTF-8");
  }

  @ParameterizedTest
  @CsvSource({"';', semicolon", "'|', vertical bar", "'\t', tab"})
  void delimitersAreRecognised(String delimiter, String word) throws Exception {
    Reading reading = read(Glassworks.csv().replace(",", delimiter));
    assertThat(reading.facts().get("delimiter")).isEqualTo(word + " (recognised)");
    assertSameAsPlain(reading);
  }

  @Test
  void aFirstLineMaySayTheDelimiter() throws Exception {
    Reading reading = read("sep=;\r\n" + Glassworks.csv().replace(",", ";"));
    assertThat(reading.facts().get("delimiter")).isEqualTo("semicolon (said by the file)");
    assertThat(reading.panel().fileRows().get(0)).isEqualTo(3);
    assertSameAsPlain(reading);
  }

  @ParameterizedTest
  @ValueSource(strings = {"\r\n", "\r", "\n\n", " \n"})
  void lineEndsAndBlankLinesDoNotMatter(String lineEnd) throws Exception {
    assertSameAsPlain(read(Glassworks.csv().replace("\n", lineEnd)));
  }

  @Test
  void rowsAreNumberedByTheLineOnWhichTheyBegin() throws Exception {
    String csv =
        Glassworks.csv()
            .replace("Birch,2022", "\"Birch\",2022")
            .replace("plant,", "\"plant\",")
            .replace("Birch,2021", "\"Big\nBirch\",2021");
    Panel panel = read("\n" + csv).panel();
    assertThat(panel.plants().get(0)).isEqualTo("Big\nBirch");
    // A blank line, the headings on line 2, the first record on lines 3 and 4.
    assertThat(panel.fileRows().toArray()).containsExactly(3, 5, 6, 7, 8, 9);
  }

  @Test
  void rowsOfNothingButDelimitersAreNoRows() throws Exception {
    Reading reading = read(Glassworks.csv() + ",,,,,,,,,\n, ,,,,,,,,\n");
    assertThat(reading.fileRows()).isEqualTo(6);
    assertThat(reading.setAside()).isEmpty();
  }

  @Test
  void decimalCommasAreRecognised() throws Exception {
    String csv = Glassworks.csv().replace(",", ";").replace(".", ",");
    Reading reading = read(csv);
    assertThat(reading.facts().get("decimal mark")).isEqualTo("comma (recognised)");
    assertSameAsPlain(reading);
  }

  @Test
  void decimalCommasWithGroupsAreRecognised() throws Exception {
    String csv =
        Glassworks.csv()
            .replace(",", ";")
            .replace(".", ",")
            .replace("1000,5", "1.000,5")
            .replace("290000", "290.000")
            .replace("310000", "310.000");
    Reading reading = read(csv);
    assertThat(reading.facts().get("digit grouping")).isEqualTo("point (recognised)");
    assertThat(reading.remarks()).extracting(Remark::code).containsExactly("digit-grouping");
    assertSameAsPlain(reading);
  }

  @ParameterizedTest
  @ValueSource(strings = {" ", "\u00a0", "\u202f", "'"})
  void spacesAndApostrophesBetweenGroupsAreRecognised(String mark) throws Exception {
    String csv =
        Glassworks.csv()
            .replace("290000", "290" + mark + "000")
            .replace("4100", "4" + mark + "100");
    assertSameAsPlain(read(csv));
  }

  @Test
  void groupedThousandsBesideDecimalPoints() throws Exception {
    String csv = Glassworks.csv().replace("290000", "\"290,000\"").replace("1000.5", "\"1,000.5\"");
    Reading reading = read(csv);
    assertThat(reading.facts().get("decimal mark")).isEqualTo("point (recognised)");
    assertThat(reading.facts().get("digit grouping")).isEqualTo("comma (recognised)");
    assertSameAsPlain(reading);
  }

  @Test
  void aLoneCommaInAColumnWrittenWithoutGroupsIsAnErrorNotAGroup() throws Exception {
    // 4,100 among 4300, 4350 and the like may be a mistyped 4.100.
    RecordsRefused refused = refused(Glassworks.csvWith(1, "labour_hours", "\"4,100\""));
    assertThat(refused.reasons()).extracting(Remark::code).containsExactly("decimal-comma");
  }

  private static final String AMBIGUOUS =
      """
      plant;year;tonnes;labour_hours;wage;machine_hours;machine_cost;age;ppi;filed_cost
      Birch;2021;1,234;4,100;30;2,000;160,000;7;100;290,000
      Birch;2022;1,334;4,200;31;2,100;170,000;7;100;295,000
      """;

  @Test
  void numbersThatMayBeReadInTwoWaysAreRefused() throws Exception {
    RecordsRefused refused = refused(AMBIGUOUS);
    assertThat(refused.reasons().get(0).code()).isEqualTo("ambiguous-number-format");
    assertThat(refused)
        .hasMessageContaining("1,234")
        .hasMessageContaining("records.number-format")
        .hasMessageContaining("{decimal: \",\"}")
        .hasMessageContaining("{decimal: \".\", group: \",\"}");
    RecordsRefused points = refused(AMBIGUOUS.replace(',', '.'));
    assertThat(points).hasMessageContaining("1.234").hasMessageContaining("group: \".\"");
  }

  @Test
  void aDeclaredFormatDecides() throws Exception {
    Source source = Glassworks.write(folder, "glass.csv", AMBIGUOUS);
    Reading comma =
        RecordsReader.read(Glassworks.declaring(source, ','), Glassworks.allRoles(), Keep.ALL);
    assertThat(comma.panel().output().get(0)).isEqualTo(1.234);
    assertThat(comma.facts().get("decimal mark")).isEqualTo("comma (declared)");
    Reading group =
        RecordsReader.read(Glassworks.declaring(source, '.', ','), Glassworks.allRoles(), Keep.ALL);
    assertThat(group.panel().output().get(0)).isEqualTo(1234);
    assertThat(group.panel().spending().get(1).orElseThrow().get(0)).isEqualTo(160000);
    assertThat(group.facts().get("digit grouping")).isEqualTo("comma (declared)");
  }

  @Test
  void aDeclaredFormatIsHeldToInEveryCell() throws Exception {
    Source source = Glassworks.write(folder, "glass.csv", Glassworks.csv());
    RecordsRefused refused = refused(Glassworks.declaring(source, ','));
    assertThat(refused.reasons()).extracting(Remark::code).containsOnly("decimal-point");
    assertThat(refused.reasons().get(0).message()).contains("1000.5", "Write 1000,5", "tonnes");
    RecordsRefused contradictory = refused(Glassworks.declaring(source, '.', '.'));
    assertThat(contradictory.reasons().get(0).code()).isEqualTo("number-format");
  }

  @Test
  void pointsThatMayGroupAreRemarkedWhenTakenAsDecimals() throws Exception {
    String csv =
        """
        plant,year,tonnes,labour_hours,wage,machine_hours,machine_cost,age,ppi,filed_cost
        Birch,2021,1.234,4.100,30,2.000,160.000,7,100,290.000
        """;
    Reading reading = read(csv);
    assertThat(reading.panel().output().get(0)).isEqualTo(1.234);
    assertThat(reading.remarks())
        .singleElement()
        .satisfies(
            r -> {
              assertThat(r.severity()).isEqualTo(Remark.Severity.WARNING);
              assertThat(r.code()).isEqualTo("ambiguous-number-format");
              assertThat(r.message()).contains("point was taken as the decimal mark");
            });
  }

  @Test
  void anUnclosedQuoteIsNamedByItsRow() throws Exception {
    RecordsRefused refused = refused(Glassworks.csv().replace("Alder,2022", "\"Alder,2022"));
    assertThat(refused.reasons().get(0).code()).isEqualTo("broken-quotes");
    assertThat(refused).hasMessageContaining("row 6").hasMessageContaining("glass.csv");
    RecordsRefused after = refused(Glassworks.csv().replace("Alder,2022", "\"Al\"der,2022"));
    assertThat(after).hasMessageContaining("row 6");
  }

  @Test
  void numbersSurviveBeingWrittenAndReadExactly() throws Exception {
    Random random = new Random(3);
    StringBuilder csv = new StringBuilder(Glassworks.HEADINGS + "\n");
    double[] outputs = new double[500];
    for (int r = 0; r < outputs.length; r++) {
      outputs[r] = Math.exp(random.nextGaussian() * 20);
      csv.append("P").append(r).append(",2021,").append(outputs[r]);
      csv.append(",4100,30,2000,160000,7,100,290000\n");
    }
    assertThat(read(csv.toString()).panel().output().toArray()).isEqualTo(outputs);
  }
}
