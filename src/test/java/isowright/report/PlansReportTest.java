package isowright.report;

import static org.assertj.core.api.Assertions.assertThat;

import isowright.charts.Chart;
import isowright.charts.Charts;
import isowright.study.Findings;
import isowright.study.Pipeline;
import isowright.study.PlanDetail.Worth;
import isowright.study.PlanFindings.CurvePoint;
import isowright.study.PlanFindings.Planned;
import isowright.study.Progress;
import isowright.study.StudyFile;
import java.nio.file.Path;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.stream.Collectors;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;

/**
 * The example studies of plans, from the file to the report: whatever the findings hold of limits,
 * checks, short run, what-if and plants, a reader of the report sees.
 */
class PlansReportTest {

  private static Findings findings;
  private static List<Chart> charts;
  private static String report;

  @BeforeAll
  static void runTheExample() throws Exception {
    findings =
        Pipeline.run(
            StudyFile.read(Path.of("notebooks-data", "glassworks-plans.yaml")), Progress.SILENT);
    charts = Charts.of(findings);
    report = words(HtmlReport.write(findings, charts));
  }

  /** The text of a page, without its drawings and marks, blanks made one. */
  private static String words(String page) {
    return page.replaceAll("(?s)<svg.*?</svg>", " ")
        .replaceAll("<[^>]+>", " ")
        .replace("&#160;", " ")
        .replace("&nbsp;", " ")
        .replace("\u00a0", " ")
        .replaceAll("\\s+", " ");
  }

  private static Planned plan(String asked) {
    return findings.plans().stream()
        .filter(p -> p.detail().asked().equals(asked))
        .findFirst()
        .orElseThrow();
  }

  @Test
  void everyLimitIsToldWithWhatItIsWorth() {
    List<Worth> worths =
        findings.plans().stream().flatMap(p -> p.detail().multipliers().stream()).toList();
    assertThat(worths)
        .extracting(Worth::kind)
        .contains("held", "upper", "band", "budget", "capacity");
    for (Worth worth : worths) {
      if (!worth.kind().equals("target")) {
        String said = Phrases.sentence(worth.words());
        assertThat(report).contains(said.substring(0, said.length() - 1));
      }
    }
    assertThat(report).contains("one more h of machines would lower cost by");
  }

  @Test
  void questionAndAnswerAreCalledByTheirGoal() {
    assertThat(report)
        .contains("yields the most output for 9,000,000 EUR of 2020")
        .contains("Most output by CES")
        .contains("yields the most profit at 255 EUR of 2020 per t")
        .contains("Most profit by CES")
        .contains("How do GW-03, GW-10 and GW-14 together make 90,000 t at least cost")
        .contains("35,000 t and 45,000 t at least cost");
    assertThat(report).doesNotContain("38,400.6 t at least cost");
  }

  @Test
  void planAtALimitIsNoFlaw() {
    assertThat(plan("Machines as installed").status()).isEqualTo("corner");
    int support = report.indexOf("What the records support", report.indexOf("Question and answer"));
    int not = report.indexOf("What they do not support", support);
    int sure = report.indexOf("How sure this is", not);
    assertThat(report.substring(support, not)).contains("Machines as installed");
    assertThat(report.substring(not, sure)).doesNotContain("Machines as installed");
  }

  @Test
  void everyKindOfChartOfPlansIsDrawnAndPlaced() {
    Map<Chart.Kind, Long> kinds =
        charts.stream().collect(Collectors.groupingBy(Chart::kind, Collectors.counting()));
    assertThat(kinds)
        .containsKeys(
            Chart.Kind.ENVELOPE,
            Chart.Kind.DEMAND,
            Chart.Kind.CHANGES,
            Chart.Kind.SPLIT,
            Chart.Kind.EFFICIENT_SCALE);
    for (Chart chart : charts) {
      assertThat(report).as(chart.name()).contains(chart.caption().substring(0, 20));
      assertThat(chart.svg().get()).as(chart.name()).contains("<svg");
      assertThat(chart.rows()).as(chart.name()).isNotEmpty();
    }
  }

  @Test
  void severalTargetsShareTheirCurves() {
    String asked = "Two outputs, all inputs free";
    assertThat(charts.stream().filter(c -> c.subject().startsWith(asked)))
        .filteredOn(c -> c.kind() == Chart.Kind.COST_CURVES)
        .hasSize(1);
    assertThat(charts.stream().filter(c -> c.subject().startsWith(asked)))
        .filteredOn(c -> c.kind() == Chart.Kind.ISOQUANT)
        .hasSize(2);
  }

  @Test
  void everyTargetOfACurveIsMarkedOrHasItsReason() {
    for (Planned plan : findings.plans()) {
      if (plan.detail().goal().equals("target") && plan.detail().across().isEmpty()) {
        assertThat(plan.curve().size() + plan.detail().withoutPlan().size())
            .as(plan.question())
            .isEqualTo(21);
        assertThat(plan.detail().withoutPlan())
            .allSatisfy(p -> assertThat(p.reason()).isNotEmpty());
      }
    }
    assertThat(plan("Machines as installed").curve())
        .extracting(CurvePoint::inside)
        .contains(true, false);
  }

  @Test
  void annexHoldsChecksElasticitiesAndPlants() {
    String annex = report.substring(report.lastIndexOf("Annex: least-cost plans"));
    assertThat(annex)
        .contains("Checks of every plan")
        .contains("Elasticities of least cost")
        .contains("Elasticities of demand at the same output")
        .contains("What if: change of profit")
        .contains("What each plant makes")
        .contains("Shephard");
  }

  @Test
  void wholeUnitsAreToldWithWhatTheyCost() throws Exception {
    Findings whole =
        Pipeline.run(
            StudyFile.read(Path.of("notebooks-data", "whole-furnaces.yaml")), Progress.SILENT);
    String page = words(HtmlReport.write(whole, Charts.of(whole)));
    Worth worth =
        whole.plans().get(0).detail().multipliers().stream()
            .filter(w -> w.kind().equals("whole"))
            .findFirst()
            .orElseThrow();
    assertThat(page.toLowerCase(Locale.ROOT))
        .contains(worth.words().substring(0, 40).toLowerCase(Locale.ROOT));
    assertThat(whole.plans().get(0).mix().values())
        .allSatisfy(f -> assertThat(f.value()).isEqualTo(Math.rint(f.value())));
  }
}
