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

/** {@code compare}: what changed between two runs? The work is done in {@link CompareCommand}. */
@Command(
    name = "compare",
    sortOptions = false,
    header = {"say what changed between two runs, and why", ""},
    description = {
      "",
      "Rows added, removed and corrected; settings changed; every headline figure before",
      "and after, and how much of its change comes from the records and how much from the",
      "settings. Writes compare.html and compare.json into a folder."
    },
    synopsisHeading = "Use it so:%n",
    customSynopsis = "  isowright compare EARLIER LATER [--into DIR] [--quiet]",
    parameterListHeading = "%nWhat to give%n",
    optionListHeading = "%nOptions%n",
    footer = {
      "",
      "Examples",
      "  isowright compare reports/filing reports/filing-corrected",
      "  isowright compare ours theirs --into reports/ours-and-theirs"
    })
final class Compare implements Callable<Integer> {

  @ParentCommand private @Nullable Main main;

  @Parameters(
      index = "0",
      paramLabel = "EARLIER",
      description = "the folder that the earlier run wrote")
  private @Nullable Path earlier;

  @Parameters(
      index = "1",
      paramLabel = "LATER",
      description = "the folder that the later run, or the other side's, wrote")
  private @Nullable Path later;

  @Option(
      names = "--into",
      paramLabel = "DIR",
      description = "the folder of the page; reports/compare-EARLIER-LATER if left out")
  private @Nullable Path into;

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
    return CompareCommand.run(
            Objects.requireNonNull(earlier),
            Objects.requireNonNull(later),
            Optional.ofNullable(into),
            quiet,
            Objects.requireNonNull(main))
        .number();
  }
}
