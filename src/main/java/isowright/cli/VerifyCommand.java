package isowright.cli;

import isowright.estimation.Unfit;
import isowright.records.RecordsRefused;
import isowright.report.FindingsJson;
import isowright.runs.RunRefused;
import isowright.runs.StoredRun;
import isowright.runs.Verification;
import isowright.runs.Verification.Anew;
import isowright.runs.Verification.Checked;
import isowright.runs.Verification.State;
import isowright.study.Pipeline;
import isowright.study.Progress;
import isowright.study.Study;
import isowright.study.StudyFile;
import isowright.study.StudyRefused;
import java.io.PrintWriter;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;

/** Does the work of {@link Verify}; loaded only when it is asked for. */
final class VerifyCommand {

  private VerifyCommand() {}

  /**
   * Looks at every file of a run and carries its study out again.
   *
   * @param moved where the study file lies now; where the run record says if left out
   */
  static ExitCode run(Path folder, Optional<Path> moved, boolean quiet, Main main)
      throws RunRefused, StudyRefused, RecordsRefused, Unfit {
    StoredRun run = StoredRun.read(List.of(folder)).get(0);
    List<Checked> files = Verification.files(run);
    Path file = moved.orElseGet(run::studyFile);
    Optional<Anew> anew = Optional.empty();
    if (Files.isRegularFile(file)) {
      Study study = StudyFile.read(file);
      Progress progress = ProgressLine.on(main.terminal(), main.err(), quiet);
      try {
        anew =
            Optional.of(Verification.anew(run, FindingsJson.write(Pipeline.run(study, progress))));
      } finally {
        progress.done();
      }
    }
    Verification verification = new Verification(files, anew);
    tell(run, verification, file, main.out());
    return verification.holds() ? ExitCode.DONE : ExitCode.DIFFERENT;
  }

  private static void tell(StoredRun run, Verification verification, Path study, PrintWriter out) {
    out.println(run.title());
    out.println(
        "Made with Isowright " + run.record().version() + ", Java " + run.record().java() + ".");
    out.println();
    long changed = verification.files().stream().filter(file -> file.state() != State.SAME).count();
    out.println(
        changed == 0
            ? "All " + Failures.count(verification.files().size(), "file") + " are as they were."
            : changed + " of " + verification.files().size() + " files are not as they were:");
    for (Checked file : verification.files()) {
      if (file.state() != State.SAME) {
        out.println(
            "  "
                + file.path()
                + ", "
                + (file.read() ? "read" : "written")
                + " by the run: "
                + file.state().words());
      }
    }
    out.println();
    if (verification.anew().isEmpty()) {
      out.println(
          "The study could not be carried out again: there is no file "
              + study
              + ". Say where it is now with --study FILE.");
      return;
    }
    tell(run, verification.anew().get(), out);
  }

  private static void tell(StoredRun run, Anew anew, PrintWriter out) {
    if (anew.different() == 0) {
      out.println(
          "Carried out again, the study gives all "
              + anew.figures()
              + " figures and words of findings.json to the last digit.");
      return;
    }
    out.println(
        "Carried out again, the study gives "
            + anew.different()
            + " of "
            + anew.figures()
            + " figures and words otherwise; the first of them:");
    TextTable table = new TextTable(3, "place in findings.json", "in the run", "now");
    anew.first().forEach(d -> table.row(d.place(), shown(d.before()), shown(d.now())));
    table.lines("  ").forEach(out::println);
    if (!run.record().version().equals(anew.version())) {
      out.println(
          "The run was made with version "
              + run.record().version()
              + " of the program, this is "
              + anew.version()
              + ".");
    }
  }

  private static String shown(String value) {
    int most = 40;
    String plain = value.isEmpty() ? "none" : value;
    return plain.length() > most ? plain.substring(0, most - 1) + "…" : plain;
  }
}
