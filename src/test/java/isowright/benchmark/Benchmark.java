package isowright.benchmark;

import java.util.Locale;

/**
 * Prints how long each part of the work takes on this machine.
 *
 * <p>Run it with {@code mvn -Pbenchmark verify}; the heap is limited to 1 GB. Every wide step runs
 * once, cold, as it would for a user; rates are measured after a warm-up. A part that fails ends
 * the benchmark with an error.
 */
public final class Benchmark {

  private Benchmark() {}

  /** Takes no arguments. */
  public static void main(String[] arguments) throws Exception {
    Steps steps = new Steps(System.out);
    steps.remark(
        String.format(
            Locale.ROOT,
            "Java %s, %d processors, heap limit %d MB",
            Runtime.version(),
            Runtime.getRuntime().availableProcessors(),
            Runtime.getRuntime().maxMemory() >> 20));
    WideStudy.report(steps);
    ResamplingTimes.report(steps);
    LeastCostRate.report(steps);
    CostSystemTimes.report(steps);
    ReviewTimes.report(steps);
    MatrixTimes.report(steps);
    ProcessTimes.report(steps);
  }
}
