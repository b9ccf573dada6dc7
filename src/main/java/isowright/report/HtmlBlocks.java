package isowright.report;

import isowright.charts.Chart;
import isowright.report.Document.Answer;
import isowright.report.Document.Answers;
import isowright.report.Document.Cell;
import isowright.report.Document.Column;
import isowright.report.Document.Definitions;
import isowright.report.Document.Display;
import isowright.report.Document.Drawing;
import isowright.report.Document.Entry;
import isowright.report.Document.Group;
import isowright.report.Document.Notice;
import isowright.report.Document.Paragraph;
import isowright.report.Document.Points;
import isowright.report.Document.Row;
import isowright.report.Document.Section;
import isowright.report.Document.Table;
import isowright.report.Text.Mathematics;
import isowright.report.Text.Reference;
import isowright.report.Text.Words;
import java.util.List;
import java.util.Locale;

/** The pieces of a document as HTML. */
final class HtmlBlocks implements Document.Reader, Text.Reader {

  private static final int DEEPEST_HEADING = 6;

  private final Markup out;
  private int depth = 1;
  private int tables = 0;
  private int drawings = 0;

  HtmlBlocks(Markup out) {
    this.out = out;
  }

  @Override
  public void section(Section section) {
    depth++;
    String id = identifier(section.id());
    String heading = "h" + Math.min(depth, DEEPEST_HEADING);
    out.open("section", "id", id, "aria-labelledby", id + "-title", "class", "depth-" + depth)
        .line();
    out.element(heading, section.title(), "id", id + "-title").line();
    section.blocks().forEach(block -> block.tell(this));
    out.close("section").line();
    depth--;
  }

  /**
   * Letters, digits and hyphens; anything else, such as a user's name of a technology, is coded.
   */
  static String identifier(String id) {
    StringBuilder safe = new StringBuilder();
    for (int i = 0; i < id.length(); i++) {
      char c = id.charAt(i);
      boolean plain = (c >= 'a' && c <= 'z') || (c >= '0' && c <= '9') || c == '-';
      safe.append(plain ? String.valueOf(c) : "_" + Integer.toHexString(c));
    }
    return safe.toString();
  }

  @Override
  public void paragraph(Paragraph paragraph) {
    out.open("p");
    inline(paragraph.text());
    out.close("p").line();
  }

  @Override
  public void points(Points points) {
    String list = points.numbered() ? "ol" : "ul";
    out.open(list).line();
    for (Text point : points.points()) {
      out.open("li");
      inline(point);
      out.close("li").line();
    }
    out.close(list).line();
  }

  @Override
  public void definitions(Definitions definitions) {
    out.open("dl", "class", "entries").line();
    for (Entry entry : definitions.entries()) {
      out.open("div").open("dt");
      inline(entry.term());
      out.close("dt").open("dd");
      inline(entry.meaning());
      out.close("dd").close("div").line();
    }
    out.close("dl").line();
  }

  @Override
  public void notice(Notice notice) {
    String kind = notice.weight().name().toLowerCase(Locale.ROOT);
    out.open("p", "class", "notice " + kind);
    out.element("span", notice.weight().word(), "class", "word").text(" ");
    inline(notice.text());
    out.close("p").line();
  }

  @Override
  public void answers(Answers answers) {
    out.open("ul", "class", "answers").line();
    for (Answer answer : answers.answers()) {
      out.open("li");
      out.element("span", answer.question(), "class", "asked").text(" ");
      out.open("strong", "class", "figure").text(answer.answer());
      if (!answer.unit().isEmpty()) {
        out.text(" ").element("span", answer.unit(), "class", "unit");
      }
      out.close("strong");
      line("sure", answer.sure());
      line("detail", answer.detail());
      line("caution", answer.caution());
      out.close("li").line();
    }
    out.close("ul").line();
  }

  private void line(String kind, String words) {
    if (!words.isEmpty()) {
      out.text(" ").element("span", words, "class", kind);
    }
  }

  @Override
  public void display(Display display) {
    out.open("div", "class", "formula", "tabindex", "0", "role", "group", "aria-label", "Formula");
    MathMarkup.write(out, display.formula(), true);
    out.close("div").line();
  }

  @Override
  public void table(Table table) {
    tables++;
    String id = "table-" + tables;
    out.open("figure", "class", "table", "id", id).line();
    out.open(
        "div",
        "class",
        "scroll",
        "role",
        "region",
        "tabindex",
        "0",
        "aria-labelledby",
        id + "-caption");
    out.line().open("table").line();
    out.open("caption", "id", id + "-caption");
    out.element("span", "Table " + tables, "class", "number").text(" " + table.caption());
    out.close("caption").line();
    heads(table.corner(), table.columns());
    for (Group group : table.groups()) {
      group(table, group);
    }
    out.close("table").line().close("div").line();
    if (!table.notes().isEmpty()) {
      out.open("figcaption");
      for (Text note : table.notes()) {
        out.open("p");
        inline(note);
        out.close("p");
      }
      out.close("figcaption").line();
    }
    out.close("figure").line();
  }

  private void heads(String corner, List<Column> columns) {
    out.open("thead").open("tr");
    out.element("th", corner, "scope", "col");
    for (Column column : columns) {
      if (column.numbers()) {
        out.open("th", "scope", "col", "class", "n");
      } else {
        out.open("th", "scope", "col");
      }
      out.text(column.heading());
      if (!column.unit().isEmpty()) {
        out.text(" ").element("span", column.unit(), "class", "beneath");
      }
      out.close("th");
    }
    out.close("tr").close("thead").line();
  }

  private void group(Table table, Group group) {
    out.open("tbody").line();
    group
        .heading()
        .ifPresent(
            heading -> {
              String span = String.valueOf(table.columns().size() + 1);
              out.open("tr", "class", "group");
              out.element("th", heading, "scope", "rowgroup", "colspan", span);
              out.close("tr").line();
            });
    for (Row row : group.rows()) {
      out.open("tr").open("th", "scope", "row");
      inline(row.heading());
      out.close("th");
      for (int c = 0; c < row.cells().size(); c++) {
        cell(table.columns().get(c), row.cells().get(c));
      }
      out.close("tr").line();
    }
    out.close("tbody").line();
  }

  private void cell(Column column, Cell cell) {
    if (column.numbers()) {
      out.open("td", "class", "n");
    } else {
      out.open("td");
    }
    for (int i = 0; i < cell.lines().size(); i++) {
      if (i == 0) {
        inline(cell.lines().get(0));
      } else {
        out.text(" ").open("span", "class", "beneath");
        inline(cell.lines().get(i));
        out.close("span");
      }
    }
    out.close("td");
  }

  @Override
  public void drawing(Drawing drawing) {
    drawings++;
    Chart chart = drawing.chart();
    String id = "figure-" + drawings;
    out.open("figure", "class", "drawing", "id", id).line();
    out.open("figcaption");
    out.open("p", "class", "finding");
    out.element("span", "Figure " + drawings, "class", "number").text(" " + chart.title());
    out.close("p");
    out.element("p", chart.caption());
    out.close("figcaption").line();
    out.open("div", "class", "picture");
    out.trusted(InlineDrawing.of(chart.figure().get(), id + "-"));
    out.close("div").line();
    out.open("details");
    out.element("summary", "The data and a description of figure " + drawings);
    out.element("p", chart.alternative());
    data(chart, id);
    out.close("details").line();
    out.close("figure").line();
  }

  private void data(Chart chart, String id) {
    out.open(
        "div",
        "class",
        "scroll",
        "role",
        "region",
        "tabindex",
        "0",
        "aria-labelledby",
        id + "-data");
    out.open("table", "class", "data");
    out.element("caption", "Data of figure " + drawings, "id", id + "-data");
    out.open("thead").open("tr");
    chart.header().forEach(head -> out.element("th", head, "scope", "col"));
    out.close("tr").close("thead").open("tbody").line();
    for (List<String> row : chart.rows()) {
      out.open("tr");
      for (int c = 0; c < row.size(); c++) {
        if (c == 0) {
          out.element("th", row.get(c), "scope", "row");
        } else {
          out.element("td", row.get(c));
        }
      }
      out.close("tr").line();
    }
    out.close("tbody").close("table").close("div");
  }

  private void inline(Text text) {
    text.spans().forEach(span -> span.tell(this));
  }

  @Override
  public void words(Words span) {
    switch (span.manner()) {
      case PLAIN -> out.text(span.words());
      case STRONG -> out.element("strong", span.words());
      case EMPHASIS -> out.element("em", span.words());
      case TYPED -> out.element("code", span.words());
    }
  }

  @Override
  public void mathematics(Mathematics span) {
    MathMarkup.write(out, span.formula(), false);
  }

  @Override
  public void reference(Reference span) {
    out.element("a", span.words(), "href", "#" + identifier(span.section()));
  }
}
