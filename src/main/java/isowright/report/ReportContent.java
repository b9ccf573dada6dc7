package isowright.report;

import isowright.charts.Chart;
import isowright.report.Document.Entry;
import isowright.report.Document.Section;
import isowright.study.Findings;
import java.util.ArrayList;
import java.util.List;

/**
 * What does an expert report of these findings say, and in what order? One section a file, in the
 * order in which an expert report is read: the answer, the records, what they look like, the
 * technologies fitted, tests, elasticities, regularity, technical change, least-cost plans, filed
 * costs, sensitivity, cautions, method, run record.
 *
 * <p>Every figure stands in the findings already; nothing is computed here. A section about which
 * the findings have nothing is left out, save where its absence must be said.
 *
 * <p>Tested in {@code ReportContentTest}.
 */
public final class ReportContent {

  private ReportContent() {}

  /** The report of these findings. */
  public static Document of(Findings findings, List<Chart> charts) {
    Material material = new Material(findings, charts);
    List<Section> sections = new ArrayList<>();
    sections.add(BriefSection.of(material));
    if (material.handedOver()) {
      sections.add(PlansSection.of(material));
      sections.add(CautionsSection.of(material));
      PlanAnnexSection.of(material).ifPresent(sections::add);
      sections.add(RunSection.of(material));
      return new Document(
          findings.run().title(),
          "Least-cost plans from a technology handed over",
          facts(material),
          sections);
    }
    sections.add(RecordsSection.of(material));
    if (findings.records().isPresent()) {
      sections.add(DescriptionSection.of(material));
    }
    SimultaneitySection.of(material).ifPresent(sections::add);
    if (!CostsSection.alone(findings)) {
      sections.add(FitsSection.of(material));
    }
    if (findings.fits().stream().anyMatch(fit -> !fit.tests().isEmpty())) {
      sections.add(TestsSection.of(material));
    }
    EndogeneitySection.of(material).ifPresent(sections::add);
    if (!CostsSection.alone(findings)) {
      sections.add(ElasticitiesSection.of(material));
      sections.add(RegularitySection.of(material));
    }
    ChangeSection.of(material).ifPresent(sections::add);
    FrontierSection.of(material).ifPresent(sections::add);
    CostsSection.of(material).ifPresent(sections::add);
    ExpectationsSection.of(material).ifPresent(sections::add);
    if (!findings.plans().isEmpty()) {
      sections.add(PlansSection.of(material));
    }
    if (!findings.reviews().isEmpty()) {
      sections.add(FilingSection.of(material));
    }
    if (!CostsSection.alone(findings)) {
      sections.add(SensitivitySection.of(material));
    }
    DecisionsSection.of(material).ifPresent(sections::add);
    sections.add(CautionsSection.of(material));
    SpecificationSection.of(material).ifPresent(sections::add);
    MatrixSection.of(material).ifPresent(sections::add);
    RobustnessSection.of(material).ifPresent(sections::add);
    FrontierSection.annex(material).ifPresent(sections::add);
    PlanAnnexSection.of(material).ifPresent(sections::add);
    sections.add(MethodSection.of(material));
    sections.add(RunSection.of(material));
    String title = findings.run().title().isBlank() ? "Study" : findings.run().title();
    return new Document(title, "Technology, tests and least cost", facts(material), sections);
  }

  private static List<Entry> facts(Material material) {
    Findings findings = material.findings();
    List<Entry> facts = new ArrayList<>();
    findings
        .records()
        .ifPresent(
            records -> {
              facts.add(
                  Entry.of(
                      "Records",
                      records.file() + ", " + Phrases.count(records.used(), "row") + " used"));
              facts.add(Entry.of("Plants", Numbers.count(records.plants())));
              facts.add(Entry.of("Periods", RecordsSection.span(records)));
            });
    facts.add(Entry.of("Intervals", Numbers.level(material.confidence())));
    facts.add(Entry.of("Money", material.money()));
    facts.add(Entry.of("Made with", "Isowright " + findings.run().version()));
    return facts;
  }
}
