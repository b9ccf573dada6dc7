package isowright.report;

import isowright.charts.Chart;
import isowright.report.Document.Entry;
import isowright.report.Document.Section;
import isowright.study.Findings;
import java.io.IOException;
import java.io.InputStream;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.util.List;
import java.util.Objects;

/**
 * How does a report read on a screen, on a phone and on paper? One HTML page that needs nothing
 * beside itself: style sheet and drawings stand inside it, there is no script, and it may be opened
 * from a folder without a network.
 *
 * <p>The markup is well-formed XML too, so that it can be checked and read by machines. Headings
 * follow in order, tables name their rows and columns, every drawing has a text alternative and its
 * data beside it.
 *
 * <p>Tested in {@code HtmlReportTest}.
 */
public final class HtmlReport {

  /** Nothing may be fetched, should anything ever slip in that asks for it. */
  private static final String POLICY =
      "default-src 'none'; style-src 'unsafe-inline'; img-src data:; base-uri 'none'; form-action"
          + " 'none'";

  private static final int EXPECTED_LENGTH = 1 << 20;

  private HtmlReport() {}

  /** The report of these findings as one HTML page. */
  public static String write(Findings findings, List<Chart> charts) {
    return render(ReportContent.of(findings, charts));
  }

  /** A document as one HTML page. */
  static String render(Document document) {
    Markup out = new Markup(EXPECTED_LENGTH);
    out.trusted("<!DOCTYPE html>\n");
    out.open("html", "lang", "en").line();
    head(out, document);
    out.open("body").line();
    out.element("a", "Skip to the report", "class", "skip", "href", "#report").line();
    header(out, document);
    out.open("div", "class", "page").line();
    contents(out, document);
    out.open("main", "id", "report", "tabindex", "-1").line();
    HtmlBlocks blocks = new HtmlBlocks(out);
    document.sections().forEach(section -> section.tell(blocks));
    out.close("main").line();
    out.close("div").line();
    out.close("body").line();
    out.close("html").line();
    return out.toString();
  }

  private static void head(Markup out, Document document) {
    out.open("head").line();
    out.empty("meta", "charset", "utf-8").line();
    out.empty("meta", "http-equiv", "Content-Security-Policy", "content", POLICY).line();
    out.empty("meta", "name", "viewport", "content", "width=device-width, initial-scale=1").line();
    out.empty("meta", "name", "generator", "content", "Isowright").line();
    out.empty("meta", "name", "color-scheme", "content", "light").line();
    out.element("title", document.title() + " – " + document.about()).line();
    out.open("style").trusted("\n" + style()).close("style").line();
    out.close("head").line();
  }

  private static void header(Markup out, Document document) {
    out.open("header", "class", "cover").line();
    out.element("p", document.about(), "class", "about").line();
    out.element("h1", document.title()).line();
    out.open("dl", "class", "facts");
    for (Entry fact : document.facts()) {
      out.open("div");
      out.element("dt", fact.term().plain());
      out.element("dd", fact.meaning().plain());
      out.close("div");
    }
    out.close("dl").line();
    out.close("header").line();
  }

  private static void contents(Markup out, Document document) {
    out.open("nav", "class", "contents", "aria-labelledby", "contents").line();
    out.element("p", "Contents", "id", "contents", "class", "label").line();
    out.open("ol").line();
    for (Section section : document.sections()) {
      out.open("li");
      out.element("a", section.title(), "href", "#" + section.id());
      out.close("li").line();
    }
    out.close("ol").line();
    out.close("nav").line();
  }

  private static String style() {
    try (InputStream in = HtmlReport.class.getResourceAsStream("report.css")) {
      return new String(
          Objects.requireNonNull(in, "report.css is missing").readAllBytes(),
          StandardCharsets.UTF_8);
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }
}
