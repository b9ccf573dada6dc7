package isowright.benchmark;

import com.sun.management.OperatingSystemMXBean;
import java.io.PrintStream;
import java.lang.management.ManagementFactory;
import java.util.Locale;
import java.util.concurrent.Callable;

/**
 * Times steps and prints a line for each as it ends: elapsed seconds and, since a machine is seldom
 * idle, the processor seconds of all threads.
 */
final class Steps {

  private final OperatingSystemMXBean system =
      ManagementFactory.getPlatformMXBean(OperatingSystemMXBean.class);
  private final PrintStream out;
  private double total;
  private double totalProcessor;

  Steps(PrintStream out) {
    this.out = out;
  }

  /** A heading; the totals start anew. */
  void heading(String text) {
    total = 0;
    totalProcessor = 0;
    out.printf(Locale.ROOT, "%n%s%n", text);
  }

  /** Runs a step once, prints its times, hands back its result. */
  <T> T time(String name, Callable<T> step) throws Exception {
    Mark start = mark();
    T result = step.call();
    since(start, name);
    return result;
  }

  /** A moment: of the clock and of the processor, in nanoseconds. */
  record Mark(long clock, long processor) {}

  /** Now. */
  Mark mark() {
    return new Mark(System.nanoTime(), system.getProcessCpuTime());
  }

  /** Prints the times since a moment. */
  void since(Mark start, String name) {
    double processor = (system.getProcessCpuTime() - start.processor()) * 1e-9;
    double seconds = (System.nanoTime() - start.clock()) * 1e-9;
    total += seconds;
    totalProcessor += processor;
    seconds(name, seconds, processor);
  }

  /** Prints the sums of the steps since the last heading. */
  void total() {
    seconds("total", total, totalProcessor);
  }

  private void seconds(String name, double elapsed, double processor) {
    out.printf(
        Locale.ROOT, "  %-58s %10.3f s elapsed %10.3f s processor%n", name, elapsed, processor);
  }

  /** Prints a sentence. */
  void remark(String text) {
    out.printf(Locale.ROOT, "  %s%n", text);
  }

  /** Prints a figure. */
  void line(String name, double value, String unit) {
    out.printf(Locale.ROOT, "  %-58s %,10.3f %s%n", name, value, unit);
  }
}
