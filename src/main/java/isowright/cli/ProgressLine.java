package isowright.cli;

import isowright.study.Progress;
import java.io.PrintWriter;
import java.util.Locale;

/**
 * Shows how far a run has come, on one line that is rewritten in place and wiped at the end. Used
 * on terminals only: in a log it would be noise.
 */
final class ProgressLine implements Progress {

  private static final int WIDTH = 20;

  private final PrintWriter err;
  private int shown;

  ProgressLine(PrintWriter err) {
    this.err = err;
  }

  /** The progress for a terminal: silent where nobody watches, or quiet was asked. */
  static Progress on(Terminal terminal, PrintWriter err, boolean quiet) {
    return terminal.interactive() && !quiet ? new ProgressLine(err) : SILENT;
  }

  @Override
  public void stage(String name, int number, int stages) {
    int filled = stages < 1 ? 0 : Math.min(WIDTH, WIDTH * (number - 1) / stages);
    String line =
        String.format(
            Locale.ROOT,
            "[%s%s] %d/%d %s",
            "#".repeat(filled),
            "-".repeat(WIDTH - filled),
            number,
            stages,
            name);
    rewrite(line);
  }

  @Override
  public void done() {
    rewrite("");
    err.print('\r');
    err.flush();
    shown = 0;
  }

  /** Blanks cover what a longer line left behind. */
  private void rewrite(String line) {
    err.print('\r' + line + " ".repeat(Math.max(0, shown - line.length())));
    err.flush();
    shown = line.length();
  }
}
