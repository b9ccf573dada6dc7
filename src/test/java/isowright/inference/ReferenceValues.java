package isowright.inference;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;

/**
 * Stored reference values: lines of {@code case,name,numbers…}, with "NA" where there is no number;
 * comments begin with #, and the first other line holds the headings.
 */
final class ReferenceValues {

  private final Map<String, Map<String, double[]>> cases = new LinkedHashMap<>();

  private ReferenceValues() {}

  /** The values of a file under {@code src/test/resources/reference}. */
  static ReferenceValues of(String file) {
    ReferenceValues values = new ReferenceValues();
    try {
      List<String> lines =
          Files.readAllLines(Path.of("src/test/resources/reference", file)).stream()
              .filter(line -> !line.startsWith("#"))
              .skip(1)
              .toList();
      for (String line : lines) {
        String[] cells = line.split(",");
        double[] numbers = new double[cells.length - 2];
        for (int k = 0; k < numbers.length; k++) {
          String cell = cells[k + 2];
          numbers[k] = cell.equals("NA") ? Double.NaN : Double.parseDouble(cell);
        }
        values.cases.computeIfAbsent(cells[0], c -> new LinkedHashMap<>()).put(cells[1], numbers);
      }
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
    return values;
  }

  /** The values of a case by name. */
  Map<String, double[]> group(String group) {
    Map<String, double[]> found = cases.get(group);
    if (found == null) {
      throw new IllegalArgumentException("no case " + group + " among " + cases.keySet());
    }
    return found;
  }

  /** The numbers of a name in a case. */
  double[] numbers(String group, String name) {
    double[] found = group(group).get(name);
    if (found == null) {
      throw new IllegalArgumentException("no " + name + " in " + group);
    }
    return found;
  }
}
