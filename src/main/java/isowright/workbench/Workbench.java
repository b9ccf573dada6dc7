package isowright.workbench;

import isowright.charts.Chart;
import isowright.charts.Charts;
import isowright.estimation.Unfit;
import isowright.records.RecordsRefused;
import isowright.report.Document;
import isowright.report.FindingsJson;
import isowright.report.HtmlReport;
import isowright.report.ReportContent;
import isowright.study.Findings;
import isowright.study.FitFindings.Fitted;
import isowright.study.FitFindings.Tested;
import isowright.study.Pipeline;
import isowright.study.PlanFindings.Planned;
import isowright.study.PlanFindings.Reviewed;
import isowright.study.Progress;
import isowright.study.Study;
import isowright.study.StudyFile;
import isowright.study.StudyRefused;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.NoSuchElementException;
import java.util.Optional;
import java.util.function.Function;

/**
 * A study from code: read, fit, ask, plan, draw.
 *
 * <pre>{@code
 * Workbench bench = Workbench.open(Path.of("notebooks-data/glassworks.yaml"));
 * bench.read().used();                                       // rows used
 * bench.fit("ces").returnsToScale();                         // a figure with its interval
 * bench.ask("ces", "constant-returns").p();
 * bench.plan("Plan 2025, long run", "ces").cost();
 * bench.with("estimation: {plant-effects: random, time: trend}").fit("cobb-douglas");
 * }</pre>
 *
 * <p>A study is said in the words of the study file and in no others; {@link #with} puts other
 * sections in place of those of the same name and gives another bench, this one stays as it was.
 * Everything found is a value of {@link isowright.study}: figures carry their standard errors and
 * intervals. A study is carried out once, when something of it is first asked.
 *
 * <p>Immutable, save that findings are kept; may be used by several threads. Tested in {@code
 * WorkbenchTest} and, line by line, by {@code WalkThroughTest}.
 */
public final class Workbench {

  private final Path file;
  private final String text;
  private final Study study;
  private volatile Optional<Findings> found = Optional.empty();

  private Workbench(Path file, String text) throws StudyRefused {
    this.file = file;
    this.text = text;
    this.study = StudyFile.readText(file, text);
  }

  /**
   * The bench of a study file.
   *
   * @throws StudyRefused with every mistake in it
   */
  public static Workbench open(Path file) throws StudyRefused {
    StudyFile.read(file); // tells whatever is wrong with the file itself
    try {
      return new Workbench(file, Files.readString(file, StandardCharsets.UTF_8));
    } catch (IOException gone) {
      throw new UncheckedIOException("the study file was taken away", gone);
    }
  }

  /**
   * The bench of a study written here.
   *
   * @param text what a study file would say
   * @param folder the folder from which its paths are meant
   * @throws StudyRefused with every mistake in it
   */
  public static Workbench of(String text, Path folder) throws StudyRefused {
    return new Workbench(folder.resolve("study.yaml"), text);
  }

  /**
   * The same study with other sections.
   *
   * @param sections sections as in a study file; each takes the place of the one of its name, or is
   *     added where there is none
   * @throws StudyRefused with every mistake in what comes of it
   */
  public Workbench with(String sections) throws StudyRefused {
    return new Workbench(file, Sections.of(text).with(Sections.of(sections)).text());
  }

  /** The study as it would stand in a study file. */
  public String text() {
    return text;
  }

  /**
   * Everything found.
   *
   * @throws RecordsRefused if the records cannot be read as asked
   * @throws StudyRefused if the study asks for what the records do not hold
   * @throws Unfit if nothing could be estimated
   */
  public synchronized Findings findings() throws RecordsRefused, StudyRefused, Unfit {
    if (found.isEmpty()) {
      found = Optional.of(Pipeline.run(study, Progress.SILENT));
    }
    return found.get();
  }

  /** Read: what the records are and what the audit found; the study's exceptions as in findings. */
  public Findings.Records read() throws RecordsRefused, StudyRefused, Unfit {
    return findings()
        .records()
        .orElseThrow(() -> new NoSuchElementException("the study has no records"));
  }

  /**
   * Fit: a technology fitted to the records.
   *
   * @param technology its name in the study
   * @throws NoSuchElementException if the study does not fit it; the message names those it does
   */
  public Fitted fit(String technology) throws RecordsRefused, StudyRefused, Unfit {
    return named(findings().fits(), Fitted::technology, technology, "technology fitted");
  }

  /**
   * Ask: a test of a fitted technology.
   *
   * @param technology its name
   * @param test the test's name, such as {@code constant-returns}
   * @throws NoSuchElementException if there is no such test; the message names those there are
   */
  public Tested ask(String technology, String test) throws RecordsRefused, StudyRefused, Unfit {
    return named(fit(technology).tests(), Tested::name, test, "test of " + technology);
  }

  /**
   * Plan: the answer to a least-cost question.
   *
   * @param question its name in the study
   * @param technology the technology that answers
   * @throws NoSuchElementException if there is none; the message names those there are
   */
  public Planned plan(String question, String technology)
      throws RecordsRefused, StudyRefused, Unfit {
    return named(
        findings().plans(),
        plan -> plan.question() + ", " + plan.technology(),
        question + ", " + technology,
        "plan");
  }

  /**
   * A filed cost held against least cost.
   *
   * @throws NoSuchElementException if there is none; the message names those there are
   */
  public Reviewed review(String plant, String period, String technology)
      throws RecordsRefused, StudyRefused, Unfit {
    return named(
        findings().reviews(),
        filing -> filing.plant() + ", " + filing.period() + ", " + filing.technology(),
        plant + ", " + period + ", " + technology,
        "filing");
  }

  /**
   * Draw: a chart, as SVG, PNG and table.
   *
   * @param name its name, that of its file without ending
   * @throws NoSuchElementException if there is none; the message names those there are
   */
  public Chart draw(String name) throws RecordsRefused, StudyRefused, Unfit {
    return named(Charts.of(findings()), Chart::name, name, "chart");
  }

  /** The report as a document, for any format. */
  public Document document() throws RecordsRefused, StudyRefused, Unfit {
    return ReportContent.of(findings(), Charts.of(findings()));
  }

  /** The report as one HTML page. */
  public String page() throws RecordsRefused, StudyRefused, Unfit {
    return HtmlReport.write(findings(), Charts.of(findings()));
  }

  /** The findings file. */
  public String json() throws RecordsRefused, StudyRefused, Unfit {
    return new String(FindingsJson.write(findings()), StandardCharsets.UTF_8);
  }

  private static <T> T named(List<T> all, Function<T, String> name, String wanted, String what) {
    return all.stream()
        .filter(one -> name.apply(one).equals(wanted))
        .findFirst()
        .orElseThrow(
            () ->
                new NoSuchElementException(
                    "no "
                        + what
                        + " is called '"
                        + wanted
                        + "'; there are: "
                        + String.join("; ", all.stream().map(name).distinct().toList())));
  }
}
