package isowright.cli;

import isowright.estimation.Unfit;
import isowright.records.RecordsRefused;
import isowright.records.Remark;
import isowright.report.Publication;
import isowright.runs.RunRefused;
import isowright.study.Mistake;
import isowright.study.StudyRefused;
import java.io.IOException;
import java.io.PrintWriter;
import java.io.StringWriter;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.LocalDateTime;
import java.time.format.DateTimeFormatter;
import java.util.List;
import java.util.Locale;

/**
 * Turns what went wrong into a message and an exit code: the one place where failures end. A person
 * sees what, where and what to do; the inside of a defect goes to a file.
 */
final class Failures {

  private static final DateTimeFormatter STAMP =
      DateTimeFormatter.ofPattern("yyyyMMdd-HHmmss-SSS", Locale.ROOT);

  private Failures() {}

  /** Tells a failure, with the details of a defect in the folder for temporary files. */
  static ExitCode tell(Throwable failure, PrintWriter err) {
    return tell(failure, err, Path.of(System.getProperty("java.io.tmpdir", ".")));
  }

  /** Tells a failure, with the details of a defect in this folder. */
  static ExitCode tell(Throwable failure, PrintWriter err, Path detailsFolder) {
    if (failure instanceof StudyRefused refused) {
      return study(refused, err);
    }
    if (failure instanceof RecordsRefused refused) {
      return records(refused, err);
    }
    if (failure instanceof RunRefused refused) {
      err.println("isowright: " + count(refused.reasons().size(), "reason") + " not to go on.");
      refused.reasons().forEach(reason -> err.println("  - " + reason));
      err.println("Nothing was written.");
      return ExitCode.MISTAKE;
    }
    if (failure instanceof Publication.Refused refused) {
      err.println("isowright: " + refused.getMessage());
      return ExitCode.MISTAKE;
    }
    if (failure instanceof Unfit unfit) {
      err.println("isowright: the records cannot carry what was asked.");
      unfit.reasons().forEach(reason -> err.println("  - " + reason));
      err.println("Nothing was written.");
      return ExitCode.UNFIT;
    }
    return defect(failure, err, detailsFolder);
  }

  private static ExitCode study(StudyRefused refused, PrintWriter err) {
    List<Mistake> mistakes = refused.mistakes();
    err.println(
        "isowright: "
            + refused.file()
            + " cannot be used: "
            + count(mistakes.size(), "mistake")
            + ".");
    for (Mistake mistake : mistakes) {
      err.println();
      String place = place(mistake);
      if (!place.isEmpty()) {
        err.println("  " + place);
      }
      err.println("    " + mistake.message());
    }
    err.println();
    err.println("Nothing was written.");
    return ExitCode.MISTAKE;
  }

  private static String place(Mistake mistake) {
    String line =
        mistake.line() > 0 ? "line " + mistake.line() + ", column " + mistake.column() : "";
    String separator = line.isEmpty() || mistake.key().isEmpty() ? "" : ": ";
    return line + separator + mistake.key();
  }

  private static ExitCode records(RecordsRefused refused, PrintWriter err) {
    List<Remark> reasons = refused.reasons();
    err.println(
        "isowright: the records cannot be read as asked: " + count(reasons.size(), "reason") + ".");
    reasons.forEach(reason -> err.println("  - " + reason.message()));
    err.println("Nothing was written.");
    return ExitCode.MISTAKE;
  }

  private static ExitCode defect(Throwable defect, PrintWriter err, Path folder) {
    err.println("isowright: a defect of this program; your files are as they were.");
    if (defect instanceof OutOfMemoryError) {
      err.println("It ran out of memory; more is given with: java -Xmx8g -jar …");
    }
    StringWriter trace = new StringWriter();
    defect.printStackTrace(new PrintWriter(trace));
    String details =
        new Version().getVersion()[0]
            + System.lineSeparator()
            + "Java "
            + Runtime.version()
            + System.lineSeparator()
            + trace;
    Path file = folder.resolve("isowright-defect-" + STAMP.format(LocalDateTime.now()) + ".txt");
    try {
      Files.writeString(file, details, StandardCharsets.UTF_8);
      err.println("Details, to be sent with a report of the defect: " + file);
    } catch (IOException unwritable) {
      err.println("Its details could not be written to " + file + ": " + defect);
    }
    return ExitCode.DEFECT;
  }

  /** "1 mistake", "2 mistakes". */
  static String count(int number, String thing) {
    return number + " " + thing + (number == 1 ? "" : "s");
  }
}
