package isowright.benchmark;

import java.nio.file.Files;
import java.nio.file.Path;

/**
 * Prints how long each part of the work takes on this machine.
 *
 * <p>Run it with {@code mvn -Pbenchmark verify}; the heap is limited to 1 GB. Every wide step runs
 * once, cold, as it would for a user; rates are measured after a warm-up.
 */
public final class Benchmark {

  private static final int PLANTS = 100_000;

  private Benchmark() {}

  /** Takes no arguments. */
  public static void main(String[] arguments) throws Exception {
    Steps steps = new Steps(System.out);
    steps.line("heap limit", Runtime.getRuntime().maxMemory() / 1e6, "MB");
    steps.line("processors", Runtime.getRuntime().availableProcessors(), "");
    Path file = Path.of("target", "benchmark", "wide.csv");
    steps.heading("Wide records");
    steps.time(
        "made, not part of the study",
        () -> {
          WideRecords.write(file, PLANTS);
          return file;
        });
    steps.line("size", Files.size(file) / 1e6, "MB");
    ProcessTimes.report(steps);
  }
}
