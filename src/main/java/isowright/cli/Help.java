package isowright.cli;

import java.util.Optional;
import java.util.concurrent.Callable;
import org.jspecify.annotations.Nullable;
import picocli.CommandLine;
import picocli.CommandLine.Command;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Parameters;
import picocli.CommandLine.Spec;

/** {@code help [COMMAND]}: what can be asked, with examples. */
@Command(
    name = "help",
    header = {"show help, on one command or on all", ""},
    synopsisHeading = "Use it so:%n",
    customSynopsis = "  isowright help [COMMAND]",
    parameterListHeading = "%nWhat to give%n",
    footer = {"", "Examples", "  isowright help", "  isowright help draft"})
final class Help implements Callable<Integer> {

  @Spec private @Nullable CommandSpec spec;

  @Parameters(arity = "0..1", paramLabel = "COMMAND", description = "the command; all if left out")
  private @Nullable String command;

  @Override
  public Integer call() {
    CommandLine root = java.util.Objects.requireNonNull(spec).parent().commandLine();
    Optional<String> name = Optional.ofNullable(command);
    CommandLine asked = name.map(root.getSubcommands()::get).orElse(root);
    if (name.isPresent() && !root.getSubcommands().containsKey(name.get())) {
      throw new CommandLine.UnmatchedArgumentException(root, java.util.List.of(name.get()));
    }
    asked.usage(root.getOut());
    return ExitCode.DONE.number();
  }
}
