package isowright.cli;

import java.nio.file.Path;
import java.util.Objects;
import java.util.Optional;
import java.util.concurrent.Callable;
import org.jspecify.annotations.Nullable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.Parameters;
import picocli.CommandLine.Spec;

/** {@code draft}: proposes a study of a records file. The work is done in {@link DraftCommand}. */
@Command(
    name = "draft",
    sortOptions = false,
    header = {"propose a study of a records file, to be read over and corrected", ""},
    description = {
      "",
      "Looks at the columns of RECORDS, guesses what each one is, and writes a study",
      "file with every guess and its reason beside it. A file that exists is never",
      "overwritten."
    },
    synopsisHeading = "Use it so:%n",
    customSynopsis = "  isowright draft RECORDS [--sheet NAME] [--into STUDY.yaml]",
    parameterListHeading = "%nWhat to give%n",
    optionListHeading = "%nOptions%n",
    footer = {
      "",
      "Examples",
      "  isowright draft plants.csv                      print the draft",
      "  isowright draft plants.csv --into study.yaml    write it to a file",
      "  isowright draft filing.xlsx --sheet plants --into study.yaml"
    })
final class Draft implements Callable<Integer> {

  @Spec private @Nullable CommandSpec spec;

  @Parameters(paramLabel = "RECORDS", description = "a .csv or .xlsx file")
  private @Nullable Path records;

  @Option(
      names = "--sheet",
      paramLabel = "NAME",
      description = "the sheet of a workbook; the first if left out")
  private @Nullable String sheet;

  @Option(
      names = "--into",
      paramLabel = "STUDY.yaml",
      description = "the file to be written; the draft is printed if left out")
  private @Nullable Path into;

  @Option(
      names = {"-h", "--help"},
      usageHelp = true,
      description = "show this and end")
  @SuppressWarnings("unused") // the parser acts on it
  private boolean help;

  @Override
  public Integer call() throws Exception {
    return DraftCommand.draft(
            Objects.requireNonNull(records),
            Optional.ofNullable(sheet),
            Optional.ofNullable(into),
            Objects.requireNonNull(spec).commandLine())
        .number();
  }
}
