package isowright.cli;

/** How a command ended, as the shell sees it. */
public enum ExitCode {
  /** Done. */
  DONE(0),
  /** A defect of this program; a short message says where the details were written. */
  DEFECT(1),
  /** A mistake in what was given: arguments, study file, records; nothing was written. */
  MISTAKE(2),
  /** The records cannot carry what was asked; nothing could be estimated. */
  UNFIT(3),
  /** Checked, and something is not as it was. */
  DIFFERENT(4);

  private final int number;

  ExitCode(int number) {
    this.number = number;
  }

  /** The number handed to the shell. */
  public int number() {
    return number;
  }
}
