package isowright.cli;

import java.nio.file.Path;
import java.util.List;
import java.util.Objects;
import java.util.Optional;
import java.util.concurrent.Callable;
import org.jspecify.annotations.Nullable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.ParameterException;
import picocli.CommandLine.Parameters;
import picocli.CommandLine.ParentCommand;
import picocli.CommandLine.Spec;

/** {@code run}: carries out a study. The work is done in {@link RunCommand}. */
@Command(
    name = "run",
    sortOptions = false,
    header = {"carry out a study: fit, test, plan, review, and write the report", ""},
    description = {
      "",
      "Writes report.html, findings.json, technology.json, run-record.json and charts/",
      "into a folder, and prints the answer in brief. The folder is replaced as a whole",
      "when everything has been computed: a run that fails leaves an earlier report as it",
      "was."
    },
    synopsisHeading = "Use it so:%n",
    customSynopsis = "  isowright run STUDY [--into DIR] [--also FORMAT,...] [--quiet]",
    parameterListHeading = "%nWhat to give%n",
    optionListHeading = "%nOptions%n",
    footer = {
      "",
      "Examples",
      "  isowright run study.yaml                        the report goes to reports/study",
      "  isowright run study.yaml --into filing-2024",
      "  isowright run study.yaml --also docx,xlsx       a document and workpapers too",
      "  isowright run study.yaml --quiet > answer.txt"
    })
final class Run implements Callable<Integer> {

  @ParentCommand private @Nullable Main main;

  @Spec private @Nullable CommandSpec spec;

  @Parameters(paramLabel = "STUDY", description = "the study file")
  private @Nullable Path study;

  @Option(
      names = "--into",
      paramLabel = "DIR",
      description = "the folder of the report; reports/ and the name of the study if left out")
  private @Nullable Path into;

  @Option(
      names = "--also",
      paramLabel = "FORMAT",
      split = ",",
      description = "docx: the report for a word processor; xlsx: workpapers with live formulas")
  private List<String> also = List.of();

  @Option(names = "--quiet", description = "show no progress")
  private boolean quiet;

  @Option(
      names = {"-h", "--help"},
      usageHelp = true,
      description = "show this and end")
  @SuppressWarnings("unused") // the parser acts on it
  private boolean help;

  @Override
  public Integer call() throws Exception {
    Optional<String> mistake = Format.mistake(also);
    if (mistake.isPresent()) {
      throw new ParameterException(
          Objects.requireNonNull(spec).commandLine(), "`--also`: " + mistake.get());
    }
    return RunCommand.run(
            Objects.requireNonNull(study),
            Optional.ofNullable(into),
            Format.of(also),
            quiet,
            Objects.requireNonNull(main))
        .number();
  }
}
