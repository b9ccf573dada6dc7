package isowright.cli;

import isowright.charts.Chart;
import isowright.charts.Charts;
import isowright.estimation.Unfit;
import isowright.records.Panel;
import isowright.records.RecordsReader;
import isowright.records.RecordsRefused;
import isowright.report.CostRowsCsv;
import isowright.report.FindingsJson;
import isowright.report.HtmlReport;
import isowright.report.Publication;
import isowright.report.ReportContent;
import isowright.report.TechnologyJson;
import isowright.runs.RunRecord;
import isowright.study.Findings;
import isowright.study.Pipeline;
import isowright.study.Progress;
import isowright.study.Study;
import isowright.study.StudyFile;
import isowright.study.StudyRefused;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.time.Instant;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.concurrent.atomic.AtomicReference;
import java.util.function.Supplier;

/** Does the work of {@link Run}; loaded only when it is asked for. */
final class RunCommand {

  private RunCommand() {}

  /** Carries out a study and publishes its report. */
  static ExitCode run(Path file, Optional<Path> into, List<Format> also, boolean quiet, Main main)
      throws StudyRefused, RecordsRefused, Unfit, Publication.Refused {
    Study study = StudyFile.read(file);
    try (Publication publication = Publication.into(into.orElseGet(() -> usualFolder(file)))) {
      return published(study, publication, also, quiet, main);
    }
  }

  private static ExitCode published(
      Study study, Publication publication, List<Format> also, boolean quiet, Main main)
      throws StudyRefused, RecordsRefused, Unfit, Publication.Refused {
    Instant start = Instant.now();
    Progress progress = ProgressLine.on(main.terminal(), main.err(), quiet);
    WithLastStage stages = new WithLastStage(progress);
    Findings findings;
    Map<String, byte[]> files;
    try {
      findings = Pipeline.run(study, stages);
      stages.last("drawing charts and writing the report");
      files = files(findings, also, () -> rows(study));
      RunRecord record =
          RunRecord.of(study, findings, publication.folder(), files, start, Instant.now());
      files.put(RunRecord.NAME, record.write(findings.run().title()));
    } catch (Unfit unfit) {
      progress.done();
      new AuditText(main.out()).print(study);
      throw unfit;
    } finally {
      progress.done();
    }
    publication.write(files);
    new Answer(main.out()).print(findings, publication.folder());
    return ExitCode.DONE;
  }

  /** {@code reports/} and the name of the study file, under the folder the command is run in. */
  static Path usualFolder(Path studyFile) {
    String name = String.valueOf(studyFile.getFileName());
    int ending = name.lastIndexOf('.');
    return Path.of("reports", ending > 0 ? name.substring(0, ending) : name);
  }

  /** Every file of the report, by name; charts are drawn on all cores. */
  static Map<String, byte[]> files(
      Findings findings, List<Format> also, Supplier<Optional<Panel>> rows) {
    List<Chart> charts = Charts.of(findings).stream().map(RunCommand::drawnOnce).toList();
    Map<String, byte[]> files = new LinkedHashMap<>();
    List<Drawn> drawn = charts.parallelStream().map(Drawn::of).toList();
    files.put("report.html", HtmlReport.write(findings, charts).getBytes(StandardCharsets.UTF_8));
    files.put(Publication.MARK, FindingsJson.write(findings));
    files.put("technology.json", TechnologyJson.write(findings));
    files.putAll(CostRowsCsv.write(findings));
    Format.Handed handed =
        new Format.Handed(findings, () -> ReportContent.of(findings, charts), rows);
    also.forEach(format -> files.put(format.file(), format.write(handed)));
    for (Drawn chart : drawn) {
      String name = chart.name();
      for (int other = 2; files.containsKey("charts/" + name + ".svg"); other++) {
        name = chart.name() + "-" + other;
      }
      files.put("charts/" + name + ".svg", chart.svg());
      files.put("charts/" + name + ".png", chart.png());
    }
    return files;
  }

  /** The rows used, read once more: findings hold no rows. */
  private static Optional<Panel> rows(Study study) {
    return study
        .records()
        .map(
            records -> {
              try {
                return RecordsReader.read(records.source(), records.roles(), records.keep())
                    .panel();
              } catch (RecordsRefused changed) {
                throw new IllegalStateException("records that were read a moment ago", changed);
              }
            });
  }

  /** The same chart, whose picture is kept: more than one file may want it. */
  private static Chart drawnOnce(Chart chart) {
    AtomicReference<byte[]> drawn = new AtomicReference<>();
    return new Chart(
        chart.kind(),
        chart.subject(),
        chart.name(),
        chart.title(),
        chart.caption(),
        chart.alternative(),
        chart.header(),
        chart.rows(),
        chart.svg(),
        () -> drawn.updateAndGet(png -> png == null ? chart.png().get() : png),
        chart.figure());
  }

  /** A chart in both formats under a name that is fit for a file. */
  private record Drawn(String name, byte[] svg, byte[] png) {
    static Drawn of(Chart chart) {
      return new Drawn(
          fileName(chart.name()),
          chart.svg().get().getBytes(StandardCharsets.UTF_8),
          chart.png().get());
    }
  }

  /** Lower-case letters, digits and single hyphens: a name that no file system reads otherwise. */
  static String fileName(String name) {
    String plain =
        name.toLowerCase(Locale.ROOT).replaceAll("[^a-z0-9]+", "-").replaceAll("^-|-$", "");
    return plain.isEmpty() ? "chart" : plain;
  }
}
