package isowright.cli;

import java.nio.file.Path;
import java.util.Objects;
import java.util.concurrent.Callable;
import org.jspecify.annotations.Nullable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Option;
import picocli.CommandLine.Parameters;
import picocli.CommandLine.ParentCommand;

/** {@code check}: audits study and records. The work is done in {@link CheckCommand}. */
@Command(
    name = "check",
    sortOptions = false,
    header = {"read study and records, say what is wrong with them; fit nothing", ""},
    description = {
      "",
      "Prints the audit: how the records were read, which rows are used and which set",
      "aside, what is suspicious, and how each column is spread. Writes no file."
    },
    synopsisHeading = "Use it so:%n",
    customSynopsis = "  isowright check STUDY",
    parameterListHeading = "%nWhat to give%n",
    optionListHeading = "%nOptions%n",
    footer = {
      "",
      "Examples",
      "  isowright check study.yaml",
      "  isowright check study.yaml > audit.txt"
    })
final class Check implements Callable<Integer> {

  @ParentCommand private @Nullable Main main;

  @Parameters(paramLabel = "STUDY", description = "the study file")
  private @Nullable Path study;

  @Option(
      names = {"-h", "--help"},
      usageHelp = true,
      description = "show this and end")
  @SuppressWarnings("unused") // the parser acts on it
  private boolean help;

  @Override
  public Integer call() throws Exception {
    return CheckCommand.check(Objects.requireNonNull(study), Objects.requireNonNull(main)).number();
  }
}
