package isowright.cli;

import isowright.records.RecordsRefused;
import isowright.study.Study;
import isowright.study.StudyFile;
import isowright.study.StudyRefused;
import java.nio.file.Path;

/** Does the work of {@link Check}; loaded only when it is asked for. */
final class CheckCommand {

  private CheckCommand() {}

  /** Audits a study and its records. */
  static ExitCode check(Path file, Main main) throws StudyRefused, RecordsRefused {
    Study study = StudyFile.read(file);
    boolean usable = new AuditText(main.out()).print(study);
    return usable ? ExitCode.DONE : ExitCode.MISTAKE;
  }
}
