package isowright.benchmark;

import java.io.PrintStream;
import java.util.Locale;
import java.util.concurrent.Callable;

/** Times steps and prints a line for each as it ends. */
final class Steps {

  private final PrintStream out;
  private double total;

  Steps(PrintStream out) {
    this.out = out;
  }

  /** A heading; the total starts anew. */
  void heading(String text) {
    total = 0;
    out.printf(Locale.ROOT, "%n%s%n", text);
  }

  /** Runs a step once, prints its time, hands back its result. */
  <T> T time(String name, Callable<T> step) throws Exception {
    long start = System.nanoTime();
    T result = step.call();
    double seconds = (System.nanoTime() - start) * 1e-9;
    total += seconds;
    line(name, seconds, "s");
    return result;
  }

  /** Prints the sum of the steps since the last heading. */
  void total() {
    line("total", total, "s");
  }

  /** Prints a sentence. */
  void remark(String text) {
    out.printf(Locale.ROOT, "  %s%n", text);
  }

  /** Prints a figure. */
  void line(String name, double value, String unit) {
    out.printf(Locale.ROOT, "  %-58s %,14.3f %s%n", name, value, unit);
  }
}
