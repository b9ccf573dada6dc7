package isowright.handover;

import static org.assertj.core.api.Assertions.assertThat;

import isowright.charts.Chart;
import isowright.charts.Charts;
import isowright.report.Document;
import isowright.report.Document.Block;
import isowright.report.Document.Cell;
import isowright.report.Document.Column;
import isowright.report.Document.Display;
import isowright.report.Document.Drawing;
import isowright.report.Document.Entry;
import isowright.report.Document.Group;
import isowright.report.Document.Paragraph;
import isowright.report.Document.Row;
import isowright.report.Document.Section;
import isowright.report.Document.Table;
import isowright.report.ReportContent;
import isowright.report.Text;
import isowright.study.Findings;
import isowright.study.RealFindings;
import java.io.ByteArrayInputStream;
import java.io.IOException;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.stream.Stream;
import org.apache.poi.xwpf.usermodel.XWPFDocument;
import org.apache.poi.xwpf.usermodel.XWPFParagraph;
import org.apache.poi.xwpf.usermodel.XWPFTable;
import org.apache.poi.xwpf.usermodel.XWPFTableCell;
import org.apache.poi.xwpf.usermodel.XWPFTableRow;
import org.junit.jupiter.api.Named;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/**
 * The report for a word processor says what the document says, in the word processor's own parts.
 */
class WordReportTest {

  static Stream<Named<Findings>> all() {
    return RealFindings.withInvented().entrySet().stream()
        .map(entry -> Named.of(entry.getKey(), entry.getValue()));
  }

  private static XWPFDocument read(byte[] file) throws IOException {
    return new XWPFDocument(new ByteArrayInputStream(file));
  }

  /** Every piece of a document, section by section, in order. */
  private static List<Block> pieces(List<? extends Block> blocks) {
    List<Block> all = new ArrayList<>();
    for (Block block : blocks) {
      all.add(block);
      if (block instanceof Section section) {
        all.addAll(pieces(section.blocks()));
      }
    }
    return all;
  }

  private static <T> List<T> of(Document document, Class<T> kind) {
    return pieces(document.sections()).stream().filter(kind::isInstance).map(kind::cast).toList();
  }

  @ParameterizedTest
  @MethodSource("all")
  void headingsAndTablesAreThoseOfTheDocument(Findings findings) throws IOException {
    Document document = ReportContent.of(findings, List.of());
    try (XWPFDocument word = read(WordReport.write(document))) {
      assertThat(
              word.getParagraphs().stream()
                  .filter(line -> String.valueOf(line.getStyle()).startsWith("Heading"))
                  .map(XWPFParagraph::getText))
          .isEqualTo(of(document, Section.class).stream().map(Section::title).toList());
      List<Table> tables = of(document, Table.class);
      assertThat(word.getTables()).hasSameSizeAs(tables);
      for (int t = 0; t < tables.size(); t++) {
        assertThat(cells(word.getTables().get(t)))
            .as(tables.get(t).caption())
            .isEqualTo(cells(tables.get(t)));
      }
    }
  }

  private static List<List<String>> cells(XWPFTable table) {
    List<List<String>> rows = new ArrayList<>();
    for (XWPFTableRow row : table.getRows()) {
      rows.add(row.getTableCells().stream().map(WordReportTest::words).toList());
    }
    return rows;
  }

  /** The words of a cell, line by line; equations are not runs, so their letters are left out. */
  private static String words(XWPFTableCell cell) {
    return cell.getParagraphs().stream()
        .map(XWPFParagraph::getText)
        .reduce((a, b) -> a + "\n" + b)
        .orElse("");
  }

  private static List<List<String>> cells(Table table) {
    List<List<String>> rows = new ArrayList<>();
    List<String> head = new ArrayList<>(List.of(table.corner()));
    for (Column column : table.columns()) {
      head.add(column.heading() + (column.unit().isEmpty() ? "" : "\n" + column.unit()));
    }
    rows.add(head);
    for (Group group : table.groups()) {
      group.heading().ifPresent(heading -> rows.add(List.of(heading)));
      for (Row row : group.rows()) {
        List<String> line = new ArrayList<>(List.of(plain(row.heading())));
        for (Cell cell : row.cells()) {
          line.add(
              cell.lines().stream()
                  .map(WordReportTest::plain)
                  .reduce((a, b) -> a + "\n" + b)
                  .orElse(""));
        }
        rows.add(line);
      }
    }
    return rows;
  }

  private static String plain(Text text) {
    StringBuilder words = new StringBuilder();
    for (Text.Span span : text.spans()) {
      if (span instanceof Text.Words w) {
        words.append(w.words());
      } else if (span instanceof Text.Reference r) {
        words.append(r.words());
      }
    }
    return words.toString();
  }

  private static Document small(List<Chart> charts) {
    List<Block> blocks = new ArrayList<>();
    blocks.add(Paragraph.of("<b>=1+1</b> & \"so\""));
    blocks.add(new Paragraph(Text.of("See ").thenReference("there", "other place")));
    blocks.add(Display.of("ln Q = {a}/{b} + Σ_i β_i^2 < 1"));
    blocks.add(
        new Table(
            "A table",
            "Row",
            List.of(Column.ofNumbers("Many words in a heading", "EUR")),
            List.of(Group.of(List.of(Row.of("=cmd()", List.of("1.5"))))),
            List.of()));
    charts.forEach(chart -> blocks.add(new Drawing(chart)));
    return new Document(
        "Title <of> it",
        "About",
        List.of(Entry.of("Fact", "word")),
        List.of(
            new Section("first", "First", blocks),
            new Section("other place", "Other", List.of(Paragraph.of("End.")))));
  }

  @Test
  void linksOfTextAndContentsLeadToSections() throws IOException {
    try (XWPFDocument word = read(WordReport.write(small(List.of())))) {
      Set<String> names = new HashSet<>();
      List<String> anchors = new ArrayList<>();
      for (XWPFParagraph line : word.getParagraphs()) {
        line.getCTP().getBookmarkStartList().forEach(mark -> names.add(mark.getName()));
        line.getCTP().getHyperlinkList().forEach(link -> anchors.add(link.getAnchor()));
      }
      assertThat(names).hasSize(2);
      assertThat(anchors).hasSize(3).allMatch(names::contains);
    }
  }

  @Test
  void markupAndFormulaTextStayText() throws IOException {
    try (XWPFDocument word = read(WordReport.write(small(List.of())))) {
      assertThat(word.getParagraphs().stream().map(XWPFParagraph::getText))
          .contains("<b>=1+1</b> & \"so\"", "Title <of> it");
      assertThat(word.getTables().get(0).getRow(1).getCell(0).getText()).isEqualTo("=cmd()");
    }
  }

  @Test
  void formulasAreNativeEquations() throws IOException {
    try (XWPFDocument word = read(WordReport.write(small(List.of())))) {
      String body = word.getDocument().xmlText();
      assertThat(body).contains("<m:oMath", "<m:f>", "<m:num>", "<m:sSub>", "<m:sSubSup>");
      assertThat(body).contains("<m:t xml:space=\"preserve\">&lt;</m:t>");
    }
  }

  @Test
  void chartsHaveTheirAlternativesAndCaptionsCount() throws IOException {
    Findings findings = RealFindings.withInvented().values().iterator().next();
    List<Chart> charts = Charts.of(findings).stream().limit(2).toList();
    try (XWPFDocument word = read(WordReport.write(small(charts)))) {
      assertThat(word.getAllPictures()).hasSize(2);
      String body = word.getDocument().xmlText();
      charts.forEach(
          chart ->
              assertThat(body)
                  .contains(chart.alternative().replace("&", "&amp;").substring(0, 20)));
      assertThat(body).contains(" SEQ Figure ", " SEQ Table ", " TOC ", " PAGEREF ");
    }
  }

  @Test
  void theSameDocumentGivesTheSameBytes() {
    assertThat(WordReport.write(small(List.of()))).isEqualTo(WordReport.write(small(List.of())));
  }

  @Test
  void noColumnIsNarrowerThanItsLongestWordAndTheyFillNoMoreThanThePage() {
    Table table =
        new Table(
            "Widths",
            "Row",
            List.of(Column.ofNumbers("n", ""), Column.ofWords("words")),
            List.of(
                new Group(
                    Optional.of("heading"),
                    List.of(Row.of("a", List.of("1,234,567", "a sentence ".repeat(9)))))),
            List.of());
    int[] widths = ColumnWidths.of(table, 9000);
    assertThat(widths[1]).isGreaterThan(9 * 80); // nine characters of eight points
    assertThat(widths[2]).isGreaterThan(widths[1]);
    assertThat(widths[0] + widths[1] + widths[2]).isLessThanOrEqualTo(9003);
  }
}
