package isowright.cli;

import isowright.records.Nearest;
import java.io.PrintWriter;
import java.util.ArrayList;
import java.util.List;
import java.util.stream.Collectors;
import picocli.CommandLine;
import picocli.CommandLine.MissingParameterException;
import picocli.CommandLine.Model.ArgSpec;
import picocli.CommandLine.Model.OptionSpec;
import picocli.CommandLine.OverwrittenOptionException;
import picocli.CommandLine.ParameterException;
import picocli.CommandLine.UnmatchedArgumentException;

/** Says what is wrong with the arguments of a command, and what could have been meant. */
final class ArgumentMistakes {

  private ArgumentMistakes() {}

  /** Tells the mistake and where to read on. */
  static ExitCode tell(ParameterException mistake, PrintWriter err) {
    CommandLine command = mistake.getCommandLine();
    err.println("isowright: " + sentence(mistake, command));
    boolean top = command.getParent() == null;
    err.println("Read on with: isowright help" + (top ? "" : " " + command.getCommandName()));
    return ExitCode.MISTAKE;
  }

  private static String sentence(ParameterException mistake, CommandLine command) {
    if (mistake instanceof UnmatchedArgumentException unmatched
        && !unmatched.getUnmatched().isEmpty()) {
      return unmatched(unmatched.getUnmatched(), command);
    }
    if (mistake instanceof MissingParameterException missing) {
      return "`"
          + command.getCommandName()
          + "` lacks "
          + missing.getMissing().stream()
              .map(ArgumentMistakes::lacking)
              .collect(Collectors.joining(", "))
          + ".";
    }
    if (mistake instanceof OverwrittenOptionException twice) {
      String option =
          twice.getOverwritten() instanceof OptionSpec named
              ? named.longestName()
              : twice.getOverwritten().paramLabel();
      return "`" + option + "` of " + name(command) + " is given twice; once is enough.";
    }
    return String.valueOf(mistake.getMessage());
  }

  private static String lacking(ArgSpec argument) {
    return argument instanceof OptionSpec option
        ? option.paramLabel() + " after `" + option.longestName() + "`"
        : argument.paramLabel();
  }

  private static String unmatched(List<String> arguments, CommandLine command) {
    String first =
        arguments.stream().filter(a -> a.startsWith("-")).findFirst().orElse(arguments.get(0));
    if (first.startsWith("-")) {
      List<String> options = new ArrayList<>(command.getCommandSpec().optionsMap().keySet());
      return "`"
          + first
          + "` is not an option of "
          + name(command)
          + nearest(first, options)
          + " Options: "
          + (options.isEmpty() ? "none" : String.join(", ", options))
          + ".";
    }
    if (command.getParent() == null) {
      List<String> commands = List.copyOf(command.getSubcommands().keySet());
      return "`"
          + first
          + "` is not a command"
          + nearest(first, commands)
          + " Commands: "
          + String.join(", ", commands)
          + ".";
    }
    return "`" + first + "` is one argument too many for " + name(command) + ".";
  }

  private static String name(CommandLine command) {
    return "`" + command.getCommandName() + "`";
  }

  private static String nearest(String found, List<String> allowed) {
    return Nearest.word(found, allowed).map(near -> "; the nearest is `" + near + "`.").orElse(".");
  }
}
