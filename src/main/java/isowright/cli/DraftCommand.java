package isowright.cli;

import isowright.records.RecordsRefused;
import isowright.records.RecordsSketch;
import isowright.records.Source;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.FileAlreadyExistsException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardOpenOption;
import java.util.Objects;
import java.util.Optional;
import picocli.CommandLine;
import picocli.CommandLine.ParameterException;

/** Does the work of {@link Draft}; loaded only when it is asked for. */
final class DraftCommand {

  private DraftCommand() {}

  /** Drafts a study and prints it, or writes it to a file that must not exist yet. */
  static ExitCode draft(
      Path records, Optional<String> sheet, Optional<Path> into, CommandLine command)
      throws RecordsRefused {
    if (into.isPresent() && Files.exists(into.get())) {
      throw exists(command, into.get());
    }
    RecordsSketch sketch = RecordsSketch.of(new Source(records, sheet, Optional.empty()));
    DraftText.Drafted drafted = DraftText.of(sketch, seenFrom(into, records), sheet);
    if (into.isPresent()) {
      write(drafted.text(), into.get(), command);
      command
          .getErr()
          .println("Drafted " + into.get() + ". Read it over, then: isowright check " + into.get());
    } else {
      command.getOut().print(drafted.text());
      command.getOut().flush();
    }
    if (!drafted.lacking().isEmpty()) {
      command.getErr().println("To be filled in before it can be used:");
      drafted.lacking().forEach(what -> command.getErr().println("  - " + what));
    }
    return ExitCode.DONE;
  }

  private static void write(String text, Path into, CommandLine command) {
    try {
      Files.writeString(into, text, StandardCharsets.UTF_8, StandardOpenOption.CREATE_NEW);
    } catch (FileAlreadyExistsException meanwhile) {
      throw exists(command, into);
    } catch (IOException failed) {
      throw new ParameterException(
          command, into + " cannot be written (" + failed + "); is there such a folder?");
    }
  }

  private static ParameterException exists(CommandLine command, Path into) {
    return new ParameterException(
        command, into + " exists, and a draft never overwrites a file; name another one.");
  }

  /** The records file as a study file names it: relative to the folder of the study. */
  private static String seenFrom(Optional<Path> study, Path records) {
    Path folder = study.orElse(Path.of("study.yaml")).toAbsolutePath().normalize().getParent();
    Path file = records.toAbsolutePath().normalize();
    Path seen = file;
    if (folder != null && Objects.equals(folder.getRoot(), file.getRoot())) {
      seen = folder.relativize(file);
    }
    return seen.toString().replace('\\', '/');
  }
}
