package isowright.report;

import static org.assertj.core.api.Assertions.assertThat;

import isowright.charts.Charts;
import isowright.study.Findings;
import isowright.study.RealFindings;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.concurrent.ConcurrentHashMap;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import java.util.stream.Stream;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import org.w3c.dom.Attr;
import org.w3c.dom.Element;

/**
 * The report as a page: it stands alone, and can be read by people who do not see it (Web Content
 * Accessibility Guidelines 2.1: text alternatives 1.1.1, structure 1.3.1, headings 2.4.6, language
 * 3.1.1), with the charts that the findings give rise to.
 */
class HtmlReportTest {

  private static final Map<String, Page> PAGES = new ConcurrentHashMap<>();
  private static final Map<String, Findings> STUDIES = RealFindings.withInvented();

  /** "the null" is a word of statistics, "null" before a comma or a brace is not. */
  private static final Pattern MACHINE =
      Pattern.compile("\\b(NaN|Infinity|Optional|undefined|\\d[eE][+-]?\\d+)\\b|null[,}\\]]");

  private static final Pattern POINTER = Pattern.compile("url\\(#([^)]+)\\)");

  static Stream<String> all() {
    return STUDIES.keySet().stream();
  }

  private static Findings findings(String study) {
    return STUDIES.getOrDefault(study, RealFindings.of(RealFindings.Study.DEMO));
  }

  private static Page page(String study) {
    return PAGES.computeIfAbsent(
        study, name -> Page.of(HtmlReport.write(findings(name), Charts.of(findings(name)))));
  }

  @ParameterizedTest
  @MethodSource("all")
  void standsAlone(String study) {
    for (Element element : page(study).elements()) {
      assertThat(element.getTagName())
          .isNotIn("script", "link", "iframe", "object", "embed", "form", "base", "foreignObject");
      for (Attr attribute : attributes(element)) {
        String name = attribute.getName();
        String value = attribute.getValue();
        assertThat(name).doesNotStartWith("on");
        if (List.of("src", "href", "xlink:href", "data", "action", "srcset").contains(name)) {
          assertThat(value).startsWith("#");
        }
        if (!name.startsWith("xmlns")) {
          assertThat(value).doesNotContain("http:", "https:", "//", "javascript:");
        }
      }
      if (element.getTagName().equals("style")) {
        assertThat(element.getTextContent()).doesNotContain("@import", "url(", "http");
      }
    }
  }

  private static List<Attr> attributes(Element element) {
    List<Attr> attributes = new ArrayList<>();
    for (int i = 0; i < element.getAttributes().getLength(); i++) {
      attributes.add((Attr) element.getAttributes().item(i));
    }
    return attributes;
  }

  @ParameterizedTest
  @MethodSource("all")
  void saysItsLanguageAndItsTitle(String study) {
    Page page = page(study);
    assertThat(page.all("html").get(0).getAttribute("lang")).isEqualTo("en");
    assertThat(page.all("title").get(0).getTextContent()).contains(findings(study).run().title());
    assertThat(Page.text(page.all("h1").get(0)))
        .isEqualTo(Page.spaced(findings(study).run().title()));
  }

  @ParameterizedTest
  @MethodSource("all")
  void headingsFollowInOrder(String study) {
    List<Element> headings = page(study).all("h1", "h2", "h3", "h4", "h5", "h6");
    int before = 0;
    for (Element heading : headings) {
      int level = heading.getTagName().charAt(1) - '0';
      assertThat(level).as(Page.text(heading)).isBetween(1, before + 1);
      assertThat(Page.text(heading)).isNotBlank();
      before = level;
    }
    assertThat(headings).filteredOn(h -> h.getTagName().equals("h1")).hasSize(1);
    assertThat(headings.get(0).getTagName()).isEqualTo("h1");
  }

  @ParameterizedTest
  @MethodSource("all")
  void identifiersAreUniqueAndEveryPointerResolves(String study) {
    Set<String> known = new HashSet<>();
    List<String> pointers = new ArrayList<>();
    for (Element element : page(study).elements()) {
      for (Attr attribute : attributes(element)) {
        String value = attribute.getValue();
        switch (attribute.getName()) {
          case "id" -> assertThat(known.add(value)).as("twice: " + value).isTrue();
          case "href", "xlink:href" -> pointers.add(value.substring(1));
          case "aria-labelledby", "aria-describedby", "headers" ->
              pointers.addAll(List.of(value.split(" ")));
          default -> {
            Matcher pointer = POINTER.matcher(value);
            while (pointer.find()) {
              pointers.add(pointer.group(1));
            }
          }
        }
      }
    }
    assertThat(pointers).isNotEmpty().allSatisfy(pointer -> assertThat(known).contains(pointer));
  }

  @ParameterizedTest
  @MethodSource("all")
  void everyTableIsNamedAndNamesItsRowsAndColumns(String study) {
    Page page = page(study);
    assertThat(page.all("table")).isNotEmpty();
    for (Element table : page.all("table")) {
      String caption = Page.text(Page.named(table, "caption").get(0));
      assertThat(caption).isNotBlank();
      List<Element> heads = Page.named(Page.named(table, "thead").get(0), "th");
      assertThat(heads)
          .as(caption)
          .isNotEmpty()
          .allSatisfy(head -> assertThat(head.getAttribute("scope")).isEqualTo("col"))
          .allSatisfy(head -> assertThat(Page.text(head)).as(caption).isNotBlank());
      for (Element row : Page.named(table, "tr")) {
        List<Element> cells = Page.children(row);
        assertThat(cells.get(0).getTagName()).as(caption).isEqualTo("th");
        assertThat(cells.get(0).getAttribute("scope")).isIn("row", "rowgroup", "col");
        boolean whole = cells.get(0).hasAttribute("colspan");
        int width = whole ? Integer.parseInt(cells.get(0).getAttribute("colspan")) : cells.size();
        assertThat(width).as(caption + ": " + Page.text(row)).isEqualTo(heads.size());
      }
    }
  }

  @ParameterizedTest
  @MethodSource("all")
  void everyDrawingHasATextAlternativeAndItsData(String study) {
    Page page = page(study);
    List<Element> drawings = new ArrayList<>();
    for (Element figure : page.all("figure")) {
      if (figure.getAttribute("class").equals("drawing")) {
        drawings.add(figure);
      }
    }
    assertThat(drawings).hasSameSizeAs(page.all("svg"));
    assertThat(drawings).hasSameSizeAs(Charts.of(findings(study)));
    for (Element drawing : drawings) {
      Element svg = Page.named(drawing, "svg").get(0);
      assertThat(svg.getAttribute("role")).isEqualTo("img");
      String[] label = svg.getAttribute("aria-labelledby").split(" ");
      assertThat(label).hasSize(2);
      assertThat(Page.text(page.withId(label[0]))).isNotBlank();
      assertThat(Page.text(page.withId(label[1])).length()).isGreaterThan(30);
      assertThat(Page.text(Page.named(drawing, "figcaption").get(0))).isNotBlank();
      Element details = Page.named(drawing, "details").get(0);
      assertThat(Page.text(Page.named(details, "summary").get(0))).contains("data");
      assertThat(Page.named(Page.named(details, "tbody").get(0), "tr")).isNotEmpty();
    }
  }

  /** The heading of a figure stands once on the page, not again within the picture. */
  @ParameterizedTest
  @MethodSource("all")
  void noDrawingRepeatsItsHeading(String study) {
    for (Element svg : page(study).all("svg")) {
      String title = Page.text(Page.named(svg, "title").get(0));
      String letters = String.join(" ", Page.named(svg, "text").stream().map(Page::text).toList());
      assertThat(letters).doesNotContain(title.substring(0, Math.min(30, title.length())));
    }
  }

  @ParameterizedTest
  @MethodSource("all")
  void noNumberIsPrintedAsAMachineWritesIt(String study) {
    String text = Page.text(page(study).withId("report"));
    Matcher machine = MACHINE.matcher(text);
    List<String> found = new ArrayList<>();
    while (machine.find()) {
      int from = Math.max(0, machine.start() - 40);
      found.add(text.substring(from, Math.min(text.length(), machine.end() + 40)));
    }
    assertThat(found).isEmpty();
  }
}
