package isowright.benchmark;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

/** How long whole runs of the program take, from the start of the process to its end. */
final class ProcessTimes {

  /** An odd number, so that the median is one of the times. */
  private static final int RUNS = 5;

  private static final Path JAR = Path.of("target", "isowright.jar");

  private ProcessTimes() {}

  static void report(Steps steps) throws IOException, InterruptedException {
    steps.heading("Whole process, median of " + RUNS + ": java -jar target/isowright.jar …");
    Path into = Path.of("target", "benchmark", "glassworks");
    measure(steps, List.of("help"));
    measure(steps, List.of("check", "notebooks-data/glassworks.yaml"));
    measure(
        steps,
        List.of("run", "notebooks-data/glassworks.yaml", "--into", into.toString(), "--quiet"));
  }

  private static void measure(Steps steps, List<String> arguments)
      throws IOException, InterruptedException {
    String command = String.join(" ", arguments);
    double[] seconds = new double[RUNS];
    for (int r = 0; r < RUNS; r++) {
      seconds[r] = once(arguments);
    }
    Arrays.sort(seconds);
    steps.line(command, seconds[RUNS / 2], "s");
  }

  /** Seconds of one run. */
  private static double once(List<String> arguments) throws IOException, InterruptedException {
    Path output = Path.of("target", "benchmark", "process.txt");
    Files.createDirectories(output.toAbsolutePath().getParent());
    List<String> command = new ArrayList<>();
    command.add(Path.of(System.getProperty("java.home"), "bin", "java").toString());
    command.addAll(List.of("-jar", JAR.toString()));
    command.addAll(arguments);
    ProcessBuilder builder =
        new ProcessBuilder(command).redirectErrorStream(true).redirectOutput(output.toFile());
    long start = System.nanoTime();
    int exit = builder.start().waitFor();
    double seconds = (System.nanoTime() - start) * 1e-9;
    if (exit != 0) {
      throw new IllegalStateException(
          command + " ended with exit code " + exit + ", see " + output);
    }
    return seconds;
  }
}
