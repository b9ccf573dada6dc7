package isowright.cli;

import java.nio.file.Path;
import java.util.Objects;
import java.util.Optional;
import java.util.concurrent.Callable;
import org.jspecify.annotations.Nullable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Option;
import picocli.CommandLine.Parameters;
import picocli.CommandLine.ParentCommand;

/** {@code verify}: is a run as it was made? The work is done in {@link VerifyCommand}. */
@Command(
    name = "verify",
    sortOptions = false,
    header = {"see whether a run is as it was made, and make it again", ""},
    description = {
      "",
      "Holds every file that the run read or wrote against the fingerprints in its",
      "run-record.json, carries the study out again, and says whether every figure is the",
      "same to the last digit. Writes nothing. Ends with code 4 where something differs."
    },
    synopsisHeading = "Use it so:%n",
    customSynopsis = "  isowright verify RUN [--study FILE] [--quiet]",
    parameterListHeading = "%nWhat to give%n",
    optionListHeading = "%nOptions%n",
    footer = {
      "",
      "Examples",
      "  isowright verify reports/glassworks",
      "  isowright verify handed-over --study study.yaml   the study file lies elsewhere now"
    })
final class Verify implements Callable<Integer> {

  @ParentCommand private @Nullable Main main;

  @Parameters(paramLabel = "RUN", description = "the folder that a run wrote")
  private @Nullable Path run;

  @Option(
      names = "--study",
      paramLabel = "FILE",
      description = "the study file, where it is not where the run record says")
  private @Nullable Path study;

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
    return VerifyCommand.run(
            Objects.requireNonNull(run),
            Optional.ofNullable(study),
            quiet,
            Objects.requireNonNull(main))
        .number();
  }
}
