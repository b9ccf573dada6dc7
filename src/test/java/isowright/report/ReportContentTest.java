package isowright.report;

import static org.assertj.core.api.Assertions.assertThat;

import isowright.charts.Charts;
import isowright.study.Figure;
import isowright.study.Findings;
import isowright.study.FindingsFixture;
import isowright.study.FitFindings.Fitted;
import isowright.study.PlanFindings.Planned;
import isowright.study.RealFindings;
import isowright.study.RealFindings.Study;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.stream.Stream;
import org.junit.jupiter.api.Named;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import org.w3c.dom.Element;

/**
 * What a report says: its order, intervals beside headline figures, and every state of a result.
 */
class ReportContentTest {

  /** The order in which an expert report is read; further sections may stand between these. */
  private static final List<String> ORDER =
      List.of(
          "brief",
          "records",
          "description",
          "technologies",
          "tests",
          "elasticities",
          "regularity",
          "plans",
          "filing",
          "sensitivity",
          "cautions",
          "method",
          "run");

  static Stream<Named<Findings>> all() {
    return RealFindings.withInvented().entrySet().stream()
        .map(entry -> Named.of(entry.getKey(), entry.getValue()));
  }

  private static Page page(Findings findings) {
    return Page.of(HtmlReport.write(findings, List.of()));
  }

  private static String text(Page page, String id) {
    return Page.text(page.withId(id));
  }

  @ParameterizedTest
  @MethodSource("all")
  void sectionsStandInTheOrderOfAnExpertReport(Findings findings) {
    List<String> sections =
        Page.children(page(findings).withId("report")).stream()
            .map(section -> section.getAttribute("id"))
            .toList();
    assertThat(sections).startsWith("brief").doesNotHaveDuplicates();
    List<String> expected = new ArrayList<>(ORDER);
    if (findings.records().isEmpty()) {
      expected.remove("description");
    }
    if (findings.fits().stream().allMatch(fit -> fit.tests().isEmpty())) {
      expected.remove("tests");
    }
    if (findings.plans().isEmpty()) {
      expected.remove("plans");
    }
    if (findings.reviews().isEmpty()) {
      expected.remove("filing");
    }
    assertThat(sections).filteredOn(ORDER::contains).containsExactlyElementsOf(expected);
  }

  @ParameterizedTest
  @MethodSource("all")
  void everyAnswerInBriefHasItsIntervalOrSaysWhyNot(Findings findings) {
    Page page = page(findings);
    List<Element> answers = new ArrayList<>();
    for (Element list : Page.withClass(page.withId("brief"), "answers")) {
      answers.addAll(Page.children(list));
    }
    assertThat(answers).hasSameSizeAs(findings.plans());
    for (int i = 0; i < answers.size(); i++) {
      Planned plan = findings.plans().get(i);
      String answer = Page.text(answers.get(i));
      assertThat(answer).contains(Terms.technology(plan.technology()));
      if (!plan.answered()) {
        assertThat(answer).contains("No plan");
        assertThat(Page.withClass(answers.get(i), "caution")).hasSize(1);
        continue;
      }
      Figure cost = plan.cost().orElseThrow();
      assertThat(answer).contains(Page.spaced(Numbers.value(cost)));
      String sure = Page.text(Page.withClass(answers.get(i), "sure").get(0));
      assertThat(sure)
          .isEqualTo(
              cost.uncertainty().isEmpty()
                  ? "Taken as known: no interval"
                  : Page.spaced(
                      Numbers.level(findings.confidence())
                          + " interval "
                          + Numbers.interval(cost)));
    }
  }

  @ParameterizedTest
  @MethodSource("all")
  void everyEstimatedFigureOfTheHeadlineTableHasItsIntervalBeneath(Findings findings) {
    Page page = page(findings);
    Map<String, List<Element>> rows = new LinkedHashMap<>();
    for (Element row : Page.named(page.withId("sensitivity"), "tr")) {
      rows.putIfAbsent(Page.text(Page.children(row).get(0)), Page.children(row));
    }
    List<Element> scale = rows.getOrDefault("Returns to scale", List.of());
    assertThat(scale).hasSize(1 + findings.fits().size() + findings.given().size());
    for (int i = 0; i < findings.fits().size(); i++) {
      Fitted fit = findings.fits().get(i);
      String cell = Page.text(scale.get(i + 1));
      if (fit.usable()) {
        Figure figure = fit.returnsToScale().orElseThrow();
        assertThat(cell)
            .isEqualTo(Page.spaced(Numbers.value(figure) + " " + Numbers.interval(figure)));
      } else {
        assertThat(cell).isEqualTo("—");
      }
    }
  }

  /**
   * What a fit says of returns to scale stands in brief with its interval, one way or the other.
   */
  @ParameterizedTest
  @MethodSource("all")
  void returnsToScaleStandInBriefWithTheirInterval(Findings findings) {
    Page page = page(findings);
    String brief = text(page, "brief");
    for (Fitted fit : findings.fits()) {
      if (fit.usable()) {
        Figure scale = fit.returnsToScale().orElseThrow();
        assertThat(brief).contains(Page.spaced(Numbers.valueAndInterval(scale)));
        boolean told = Phrases.relation(scale, 1) != Phrases.Relation.NOT_TOLD_APART;
        assertThat(text(page, told ? "brief-support" : "brief-not"))
            .contains(Page.spaced(Numbers.valueAndInterval(scale)));
      }
    }
  }

  /** A fit that is not simply estimated says so in brief, in its section and beside its column. */
  @ParameterizedTest
  @MethodSource("all")
  void everyStateOfAFitIsShown(Findings findings) {
    Page page = page(findings);
    for (Fitted fit : findings.fits()) {
      String name = Terms.technology(fit.technology());
      String state = Terms.state(fit.state());
      if (!fit.state().equals("estimated")) {
        assertThat(text(page, "brief-not")).contains(name + " is " + state);
        assertThat(text(page, "technologies")).contains(name + ": " + state);
      }
      assertThat(text(page, "sensitivity")).contains(name + " " + state);
      fit.regularity()
          .filter(regular -> fit.usable() && regular.both() < regular.rows())
          .ifPresent(
              regular -> {
                String where = "at " + (regular.rows() - regular.both()) + " of " + regular.rows();
                assertThat(text(page, "brief-not")).contains(name + " is irregular " + where);
                assertThat(text(page, "regularity")).contains("Irregular " + where);
              });
    }
  }

  @ParameterizedTest
  @MethodSource("all")
  void everyStatusOfAPlanIsShown(Findings findings) {
    Page page = page(findings);
    for (Planned plan : findings.plans()) {
      if (!plan.status().equals("solved")) {
        String status = Terms.status(plan.status());
        String name = Terms.technology(plan.technology());
        assertThat(text(page, "plans"))
            .contains(name + ": " + status + ". " + Terms.statusMeaning(plan.status()));
        assertThat(text(page, "brief").toLowerCase(java.util.Locale.ROOT))
            .contains(status.replace("no plan: ", ""));
        plan.remarks().stream()
            .filter(r -> !r.code().equals("corner")) // told with what each limit is worth
            .forEach(r -> assertThat(text(page, "plans")).containsIgnoringCase(r.message()));
      }
    }
  }

  @Test
  void aLimitThatBindsIsNamedWhereTheAnswerStands() {
    String brief = text(page(RealFindings.of(Study.DEMO)), "brief");
    assertThat(brief).contains("machines held at 42,000", "labour at most 92,000");
  }

  @Test
  void theDemoReachesEveryKindOfState() {
    List<String> states = new ArrayList<>();
    RealFindings.withInvented()
        .values()
        .forEach(
            findings -> {
              findings.fits().forEach(fit -> states.add(fit.state()));
              findings.plans().forEach(plan -> states.add(plan.status()));
            });
    assertThat(states)
        .contains("estimated", "boundary", "flat", "not-converged", "rank-deficient")
        .contains("solved", "corner", "irregular", "outside-records", "infeasible");
  }

  @Test
  void markupInNamesIsTextAlone() {
    Findings findings = everywhereMarkedUp();
    String html = HtmlReport.write(findings, Charts.of(findings));
    Page page = Page.of(html);
    assertThat(page.all("b", "script", "u", "s", "i", "img")).isEmpty();
    String text = page.all("body").get(0).getTextContent();
    assertThat(text)
        .contains(
            FindingsFixture.MARKUP,
            "Glassworks </title> & <i>others</i>",
            "<u>t</u>",
            "<s>labour</s>",
            "<img src=x onerror=alert(1)>",
            "EUR & \"<b>\"");
    assertThat(page.all("title").get(0).getTextContent()).contains("</title> & <i>others</i>");
    // Twice escaped would be as wrong as not at all.
    assertThat(html).doesNotContain("&amp;lt;", "&amp;amp;", "&amp;quot;");
  }

  /** Markup in title, plant, units, money, inputs, columns, questions and remarks. */
  private static Findings everywhereMarkedUp() {
    Findings plain = FindingsFixture.withMarkup();
    Map<String, String> inputs = new LinkedHashMap<>();
    plain.units().inputs().forEach((name, unit) -> inputs.put(name, "<s>" + name + "</s>"));
    Findings.Records records = plain.records().orElseThrow();
    List<Findings.SetAside> aside =
        List.of(new Findings.SetAside("<img src=x onerror=alert(1)>", 3, List.of(1, 2, 3)));
    return new Findings(
        plain.run(),
        new Findings.Units("<u>t</u>", inputs, "EUR & \"<b>\""),
        plain.confidence(),
        java.util.Optional.of(
            new Findings.Records(
                records.file(),
                records.sha256(),
                records.rows(),
                records.used(),
                records.plants(),
                records.periods(),
                records.firstPeriod(),
                records.lastPeriod(),
                records.facts(),
                records.columns(),
                aside,
                records.remarks())),
        plain.fits(),
        plain.given(),
        plain.plans(),
        plain.reviews(),
        plain.remarks());
  }
}
