package isowright.cli;

import isowright.report.ComparisonJson;
import isowright.report.ComparisonReport;
import isowright.report.FindingsJson;
import isowright.report.Publication;
import isowright.runs.Comparer;
import isowright.runs.Comparison;
import isowright.runs.RunRefused;
import isowright.runs.StoredRun;
import isowright.study.Pipeline;
import isowright.study.Progress;
import java.io.PrintWriter;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/** Does the work of {@link Compare}; loaded only when it is asked for. */
final class CompareCommand {

  private static final String PAGE = "compare.html";

  private CompareCommand() {}

  /** Holds two runs against each other and publishes what changed. */
  static ExitCode run(Path earlier, Path later, Optional<Path> into, boolean quiet, Main main)
      throws RunRefused, Publication.Refused {
    List<StoredRun> runs = StoredRun.read(List.of(earlier, later));
    Path folder = into.orElseGet(() -> usualFolder(earlier, later));
    try (Publication publication = Publication.into(folder, ComparisonJson.NAME)) {
      Progress progress = ProgressLine.on(main.terminal(), main.err(), quiet);
      Comparison comparison;
      try {
        comparison =
            Comparer.compare(
                runs.get(0),
                runs.get(1),
                study -> FindingsJson.write(Pipeline.run(study, progress)));
      } finally {
        progress.done();
      }
      Map<String, byte[]> files = new LinkedHashMap<>();
      files.put(PAGE, ComparisonReport.write(comparison).getBytes(StandardCharsets.UTF_8));
      files.put(ComparisonJson.NAME, ComparisonJson.write(comparison));
      publication.write(files);
      tell(comparison, publication.folder().resolve(PAGE), main.out());
    }
    return ExitCode.DONE;
  }

  private static Path usualFolder(Path earlier, Path later) {
    return Path.of("reports", "compare-" + name(earlier) + "-" + name(later));
  }

  private static String name(Path folder) {
    return RunCommand.fileName(String.valueOf(folder.toAbsolutePath().normalize().getFileName()));
  }

  private static void tell(Comparison comparison, Path page, PrintWriter out) {
    ComparisonReport.brief(comparison).forEach(out::println);
    out.println();
    out.println("Comparison: " + page);
  }
}
