package isowright.inference;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.stream.Stream;

/**
 * The sizes and coverages that simulations measured, in one table: {@code target/simulation.txt},
 * put together anew from the part of each simulation whenever one of them ends.
 */
public final class SimulationTable {

  private static final Path PARTS = Path.of("target", "simulation");

  private SimulationTable() {}

  /** Keeps the lines of a simulation under its subject. */
  public static synchronized void write(String subject, String lines) {
    try {
      Files.createDirectories(PARTS);
      Files.writeString(PARTS.resolve(subject + ".txt"), lines);
      StringBuilder all = new StringBuilder();
      List<Path> parts;
      try (Stream<Path> found = Files.list(PARTS)) {
        parts = found.sorted().toList();
      }
      for (Path part : parts) {
        String name = part.getFileName().toString().replace(".txt", "");
        all.append(name).append('\n').append(Files.readString(part)).append('\n');
      }
      Files.writeString(Path.of("target", "simulation.txt"), all);
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }
}
