package isowright.runs;

import isowright.cli.Main;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.io.PrintStream;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Random;

/** Invented kilns, eight plants over six years, and studies of them, run as a user runs them. */
final class Kilns {

  private final Path folder;

  Kilns(Path folder) {
    this.folder = folder;
  }

  /** What a command said. */
  record Said(int code, String out, String err) {}

  static Said command(String... arguments) {
    ByteArrayOutputStream out = new ByteArrayOutputStream();
    ByteArrayOutputStream err = new ByteArrayOutputStream();
    int code =
        Main.run(
            arguments,
            new PrintStream(out, false, StandardCharsets.UTF_8),
            new PrintStream(err, false, StandardCharsets.UTF_8));
    return new Said(
        code, out.toString(StandardCharsets.UTF_8), err.toString(StandardCharsets.UTF_8));
  }

  /** The lines of the records, the heading first; rows plant by plant. */
  static List<String> records() {
    Random random = new Random(20250314);
    List<String> lines = new ArrayList<>(List.of("kiln,year,bricks,hours,kiln_hours,wage,rent"));
    for (int plant = 1; plant <= 8; plant++) {
      for (int year = 2015; year <= 2020; year++) {
        double hours = 50 + 400 * random.nextDouble();
        double kilnHours = 20 + 200 * random.nextDouble();
        double bricks =
            Math.exp(
                0.6 * Math.log(hours) + 0.4 * Math.log(kilnHours) + 0.05 * random.nextGaussian());
        lines.add(
            String.format(
                Locale.ROOT,
                "K%d,%d,%.3f,%.1f,%.1f,%.2f,%.2f",
                plant,
                year,
                bricks,
                hours,
                kilnHours,
                28 + 6 * random.nextDouble(),
                70 + 20 * random.nextDouble()));
      }
    }
    return lines;
  }

  static String study(String records, int wage) {
    return """
    title: <b>Kilns</b> & "ovens"
    records: {file: %s, plant: kiln, period: year}
    output: {column: bricks, unit: t}
    inputs:
      labour: {quantity: hours, price: wage, unit: h}
      machines: {quantity: kiln_hours, price: rent, unit: h}
    technologies: [cobb-douglas]
    least-cost:
      - {name: Next year, target: 100, prices: {labour: %d, machines: 80}, curve: {from: 50, to: 150, points: 5}}
    filing: {periods: [2020, 2020]}
    """
        .formatted(records, wage);
  }

  /** Writes records and study of this name, runs the study, and gives the folder of the run. */
  Path run(String name, List<String> records, String file, int wage) throws IOException {
    Files.write(folder.resolve(file), records);
    Path study = Files.writeString(folder.resolve(name + ".yaml"), study(file, wage));
    Path into = folder.resolve(name);
    Said said = command("run", study.toString(), "--into", into.toString());
    if (said.code() != 0) {
      throw new AssertionError(said.err());
    }
    return into;
  }
}
