package isowright.estimation;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;

/**
 * Values for estimators and tests on panels made with R ({@code
 * src/test/resources/reference/panel-estimators.R}, which names the packages; the head of the file
 * of values names their versions).
 */
public final class PanelReference {

  private static final Path FILE = Path.of("src/test/resources/reference/panel-estimators.csv");

  private PanelReference() {}

  /**
   * One value.
   *
   * @param panel whole or holes
   * @param form the form
   * @param model estimator, or {@code test}
   * @param name of the parameter or test
   * @param value what R gives
   * @param error its standard error; 0 where there is none
   */
  public record Value(
      String panel, String form, String model, String name, double value, double error) {}

  /** The values of a model on a panel for a form. */
  public static List<Value> of(String panel, String form, String model) {
    List<Value> values =
        all().stream()
            .filter(v -> v.panel().equals(panel) && v.form().equals(form))
            .filter(v -> v.model().equals(model))
            .toList();
    if (values.isEmpty()) {
      throw new IllegalArgumentException("no reference for " + panel + ", " + form + ", " + model);
    }
    return values;
  }

  private static List<Value> all() {
    List<Value> values = new ArrayList<>();
    try {
      for (String line : Files.readAllLines(FILE)) {
        if (!line.startsWith("#") && !line.startsWith("panel,")) {
          String[] cells = line.split(",", -1);
          values.add(
              new Value(
                  cells[0],
                  cells[1],
                  cells[2],
                  cells[3],
                  Double.parseDouble(cells[4]),
                  Double.parseDouble(cells[5])));
        }
      }
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
    return values;
  }
}
