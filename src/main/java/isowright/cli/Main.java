package isowright.cli;

import java.io.FileDescriptor;
import java.io.FileOutputStream;
import java.io.OutputStream;
import java.io.OutputStreamWriter;
import java.io.PrintStream;
import java.io.PrintWriter;
import java.nio.charset.StandardCharsets;
import java.util.Locale;
import java.util.Objects;
import java.util.concurrent.Callable;
import org.jspecify.annotations.Nullable;
import picocli.CommandLine;
import picocli.CommandLine.Command;
import picocli.CommandLine.Help.Ansi;
import picocli.CommandLine.Help.Ansi.Style;
import picocli.CommandLine.Help.ColorScheme;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.Spec;

/**
 * The entry of the command line: takes arguments, hands them to a command, and turns what comes
 * back, result or failure, into an {@link ExitCode}.
 *
 * <p>Results go to standard output, messages and progress to standard error, both in UTF-8. What a
 * command needs to work is loaded only when it works, so that help is quick.
 */
@Command(
    name = "isowright",
    subcommands = {
      Draft.class,
      Check.class,
      Run.class,
      Plan.class,
      Verify.class,
      Compare.class,
      Help.class
    },
    versionProvider = Version.class,
    sortOptions = false,
    header = {
      "From plant records to an estimated technology, its least-cost input mix,",
      "and a report that can be defended.",
      ""
    },
    synopsisHeading = "Use it so:%n",
    customSynopsis = {
      "  isowright COMMAND ...",
      "where isowright stands for: java -jar target/isowright.jar"
    },
    optionListHeading = "%nOptions%n",
    commandListHeading = "%nCommands%n",
    footer = {
      "",
      "From records to report",
      "  isowright draft plants.csv --into study.yaml   propose a study of these records",
      "  isowright check study.yaml                     see what is wrong with study or records",
      "  isowright run study.yaml                       fit, test, plan, and write the report",
      "  isowright plan technology.json --target 52000  a least-cost question without the records",
      "  isowright verify reports/study                 is the report as it was made?",
      "  isowright compare reports/a reports/b          what changed between two runs, and why",
      "  isowright help run                             more on one command",
      "",
      "Exit codes",
      "  0  done",
      "  1  a defect of this program; the message says where the details were written",
      "  2  a mistake in what was given (arguments, study file, records); nothing was written",
      "  3  the records cannot carry what was asked; the audit says why",
      "  4  verify: something is not as it was"
    })
public final class Main implements Callable<Integer> {

  /** Wide enough for every example on one line. */
  private static final int HELP_WIDTH = 100;

  @Spec private @Nullable CommandSpec spec;

  @Option(
      names = {"-h", "--help"},
      usageHelp = true,
      description = "show this and end")
  @SuppressWarnings("unused") // the parser acts on it
  private boolean help;

  @Option(
      names = {"-V", "--version"},
      versionHelp = true,
      description = "show the version and end")
  @SuppressWarnings("unused") // the parser acts on it
  private boolean version;

  private final PrintWriter out;
  private final PrintWriter err;
  private final Terminal terminal;

  private Main(PrintWriter out, PrintWriter err, Terminal terminal) {
    this.out = out;
    this.err = err;
    this.terminal = terminal;
  }

  /** Runs a command and ends the process with its exit code. */
  public static void main(String[] args) {
    Locale.setDefault(Locale.ROOT); // the same study gives the same bytes in every country
    Terminal terminal = Terminal.of(System.console() != null, System.getenv());
    OutputStream standardOutput = new FileOutputStream(FileDescriptor.out);
    OutputStream standardError = new FileOutputStream(FileDescriptor.err);
    System.exit(run(args, writer(standardOutput), writer(standardError), terminal));
  }

  /**
   * Runs a command as from a script: no terminal, no colour, no progress.
   *
   * @param args the arguments
   * @param out where results go, in UTF-8
   * @param err where messages go, in UTF-8
   * @return the exit code
   */
  public static int run(String[] args, PrintStream out, PrintStream err) {
    return run(args, writer(out), writer(err), Terminal.NONE);
  }

  static int run(String[] args, PrintWriter out, PrintWriter err, Terminal terminal) {
    try {
      return commandLine(out, err, terminal).execute(args);
    } catch (RuntimeException | Error defect) {
      return Failures.tell(defect, err).number();
    } finally {
      out.flush();
      err.flush();
    }
  }

  private static CommandLine commandLine(PrintWriter out, PrintWriter err, Terminal terminal) {
    CommandLine commandLine = new CommandLine(new Main(out, err, terminal));
    commandLine.setOut(out);
    commandLine.setErr(err);
    commandLine.setColorScheme(type(terminal));
    commandLine.setExpandAtFiles(false); // a file may be called @study.yaml
    commandLine.setUsageHelpWidth(HELP_WIDTH);
    commandLine.setParameterExceptionHandler(
        (mistake, args) -> ArgumentMistakes.tell(mistake, err).number());
    commandLine.setExecutionExceptionHandler(
        (failure, command, parsed) -> Failures.tell(failure, err).number());
    return commandLine;
  }

  private static ColorScheme type(Terminal terminal) {
    return new ColorScheme.Builder(terminal.bold() ? Ansi.ON : Ansi.OFF)
        .commands(Style.bold)
        .options(Style.bold)
        .parameters(Style.bold)
        .build();
  }

  private static PrintWriter writer(OutputStream stream) {
    return new PrintWriter(new OutputStreamWriter(stream, StandardCharsets.UTF_8), true);
  }

  /** Without a command there is nothing to do: the help goes to standard error. */
  @Override
  public Integer call() {
    Objects.requireNonNull(spec).commandLine().usage(err);
    return ExitCode.MISTAKE.number();
  }

  /** Where results go. */
  PrintWriter out() {
    return out;
  }

  /** Where messages and progress go. */
  PrintWriter err() {
    return err;
  }

  /** What the other end can show. */
  Terminal terminal() {
    return terminal;
  }
}
