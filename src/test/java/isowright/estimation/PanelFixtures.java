package isowright.estimation;

import isowright.records.Column;
import isowright.records.Panel;
import isowright.records.Roles;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.TreeSet;

/** Panels for tests, from arrays and from the published files. */
public final class PanelFixtures {

  private static final Path PUBLISHED = Path.of("src/test/resources/published");

  private PanelFixtures() {}

  /** Columns of a published file by heading, as text. */
  public static Map<String, List<String>> table(String file) {
    try {
      List<String> lines = Files.readAllLines(PUBLISHED.resolve(file));
      String[] header = lines.get(0).split(",");
      Map<String, List<String>> columns = new LinkedHashMap<>();
      for (String name : header) {
        columns.put(name, new ArrayList<>());
      }
      for (String line : lines.subList(1, lines.size())) {
        String[] cells = line.split(",");
        for (int c = 0; c < header.length; c++) {
          columns.get(header[c]).add(cells[c]);
        }
      }
      return columns;
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }

  /** A numeric column. */
  public static double[] numbers(Map<String, List<String>> table, String column) {
    return table.get(column).stream().mapToDouble(Double::parseDouble).toArray();
  }

  /** 27 US states, primary metals, 1957 (Greene 2003, table F6.1): a cross-section. */
  public static Panel primaryMetals() {
    Map<String, List<String>> table = table("primary-metals-27-states.csv");
    return crossSection(
        numbers(table, "output"),
        List.of("labour", "capital"),
        numbers(table, "labor"),
        numbers(table, "capital"));
  }

  /** 30 points of a CES (Judge et al. 1988, pp. 514–515): a cross-section. */
  public static Panel cesPoints() {
    Map<String, List<String>> table = table("ces-30-points.csv");
    return crossSection(
        numbers(table, "output"),
        List.of("labour", "capital"),
        numbers(table, "labour"),
        numbers(table, "capital"));
  }

  /** US manufacturing 1899–1922 (Cobb and Douglas 1928): one plant, many periods. */
  public static Panel manufacturing1899() {
    Map<String, List<String>> table = table("us-manufacturing-1899-1922.csv");
    int rows = table.get("year").size();
    int[] years = table.get("year").stream().mapToInt(Integer::parseInt).toArray();
    return panel(
        new int[rows],
        years,
        numbers(table, "output"),
        List.of("labour", "capital"),
        List.of(numbers(table, "labour"), numbers(table, "capital")),
        List.of(),
        List.of());
  }

  /** 48 US states 1970–86 (Munnell 1990; Baltagi, table of chapter 2), sorted by state and year. */
  public static Panel usStates() {
    Map<String, List<String>> table = table("us-states-public-capital.csv");
    List<String> states = table.get("state").stream().distinct().toList();
    int[] plants = table.get("state").stream().mapToInt(states::indexOf).toArray();
    int[] years = table.get("year").stream().mapToInt(Integer::parseInt).toArray();
    return panel(
        plants,
        years,
        numbers(table, "gsp"),
        List.of("pcap", "pc", "emp"),
        List.of(numbers(table, "pcap"), numbers(table, "pc"), numbers(table, "emp")),
        List.of("unemp"),
        List.of(numbers(table, "unemp")));
  }

  /** A cross-section: every row its own plant. */
  public static Panel crossSection(double[] output, List<String> inputs, double[]... quantities) {
    int[] plants = new int[output.length];
    Arrays.setAll(plants, r -> r);
    return panel(
        plants,
        new int[output.length],
        output,
        inputs,
        List.of(quantities),
        List.of(),
        List.of());
  }

  /** A panel from arrays; rows must come sorted by plant. */
  public static Panel panel(
      int[] plantOfRow,
      int[] periodOfRow,
      double[] output,
      List<String> inputs,
      List<double[]> quantities,
      List<String> controlNames,
      List<double[]> controls) {
    int rows = output.length;
    List<String> plants = new ArrayList<>();
    List<Integer> starts = new ArrayList<>();
    for (int r = 0; r < rows; r++) {
      if (r == 0 || plantOfRow[r] != plantOfRow[r - 1]) {
        plants.add("P" + plantOfRow[r]);
        starts.add(r);
      }
    }
    List<Integer> periods =
        new ArrayList<>(new TreeSet<>(Arrays.stream(periodOfRow).boxed().toList()));
    int[] periodIndex =
        Arrays.stream(periodOfRow).map(p -> periods.indexOf(p)).toArray();
    int[] fileRows = new int[rows];
    Arrays.setAll(fileRows, r -> r + 2);
    List<Column> columns = new ArrayList<>();
    List<Roles.Input> roles = new ArrayList<>();
    for (int i = 0; i < inputs.size(); i++) {
      columns.add(Column.of(inputs.get(i), quantities.get(i)));
      roles.add(
          new Roles.Input(
              inputs.get(i), inputs.get(i), Optional.empty(), Optional.empty(), Optional.empty()));
    }
    List<Column> controlColumns = new ArrayList<>();
    List<Roles.Control> controlRoles = new ArrayList<>();
    for (int c = 0; c < controls.size(); c++) {
      controlColumns.add(Column.of(controlNames.get(c), controls.get(c)));
      controlRoles.add(new Roles.Control(controlNames.get(c), false));
    }
    Column outputColumn = Column.of("output", output);
    return new Panel(
        new Roles(
            Optional.of("plant"),
            Optional.of("period"),
            "output",
            Optional.empty(),
            roles,
            controlRoles,
            Optional.empty(),
            Optional.empty()),
        plants,
        Panel.Rows.of(starts.stream().mapToInt(Integer::intValue).toArray()),
        periods.stream().map(String::valueOf).toList(),
        periods.stream().map(Integer::doubleValue).toList(),
        Panel.Rows.of(periodIndex),
        Panel.Rows.of(fileRows),
        outputColumn,
        outputColumn.logs(),
        columns,
        columns.stream().map(Column::logs).toList(),
        inputs.stream().map(i -> Optional.<Column>empty()).toList(),
        inputs.stream().map(i -> Optional.<Column>empty()).toList(),
        controlColumns,
        Optional.empty());
  }
}
