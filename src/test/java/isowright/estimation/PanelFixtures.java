package isowright.estimation;

import isowright.records.Column;
import isowright.records.Keep;
import isowright.records.Panel;
import isowright.records.RecordsReader;
import isowright.records.RecordsRefused;
import isowright.records.Roles;
import isowright.records.Source;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.TreeSet;

/** Panels for tests, from arrays and from the published files. */
public final class PanelFixtures {

  private static final Path PUBLISHED = Path.of("src/test/resources/published");

  private PanelFixtures() {}

  /** 27 US states, primary metals, 1957 (Greene 2003, table F6.1): a cross-section. */
  public static Panel primaryMetals() {
    return published(
        "primary-metals-27-states.csv",
        "",
        "",
        "output",
        List.of(input("labour", "labor"), input("capital", "capital")),
        List.of());
  }

  /** 30 points of a CES (Judge et al. 1988, pp. 514–515): a cross-section. */
  public static Panel cesPoints() {
    return published(
        "ces-30-points.csv",
        "",
        "",
        "output",
        List.of(input("labour", "labour"), input("capital", "capital")),
        List.of());
  }

  /** US manufacturing 1899–1922 (Cobb and Douglas 1928): many periods of one series. */
  public static Panel manufacturing1899() {
    return published(
        "us-manufacturing-1899-1922.csv",
        "",
        "year",
        "output",
        List.of(input("labour", "labour"), input("capital", "capital")),
        List.of());
  }

  /** 48 US states 1970–86 (Munnell 1990; Baltagi, table of chapter 2). */
  public static Panel usStates() {
    return usStates(PUBLISHED.resolve("us-states-public-capital.csv"));
  }

  /**
   * The same states with holes, by a rule that the reference script shares: row i of the file (from
   * 0) is left out where i mod 7 is 3 or i mod 11 is 5; of Texas only 1970 is kept.
   */
  public static Panel usStatesWithHoles() {
    try {
      List<String> lines = Files.readAllLines(PUBLISHED.resolve("us-states-public-capital.csv"));
      List<String> kept = new ArrayList<>(List.of(lines.get(0)));
      for (int i = 0; i + 1 < lines.size(); i++) {
        String line = lines.get(i + 1);
        boolean texas = line.startsWith("TEXAS,") && !line.startsWith("TEXAS,1970");
        if (i % 7 != 3 && i % 11 != 5 && !texas) {
          kept.add(line);
        }
      }
      Path file = Files.createTempFile("states-with-holes", ".csv");
      try {
        Files.write(file, kept);
        return usStates(file);
      } finally {
        Files.delete(file);
      }
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }

  private static Panel usStates(Path file) {
    return read(
        file,
        "state",
        "year",
        "gsp",
        List.of(input("pcap", "pcap"), input("pc", "pc"), input("emp", "emp")),
        List.of(new Roles.Control("unemp", false)));
  }

  /** The same with private capital and employment alone, and no control. */
  public static Panel usStatesOfTwoInputs() {
    return published(
        "us-states-public-capital.csv",
        "state",
        "year",
        "gsp",
        List.of(input("pc", "pc"), input("emp", "emp")),
        List.of());
  }

  /** The rows of {@link #usStates()} in some periods. */
  public static Panel usStatesIn(List<String> periods) {
    Panel all = usStates();
    return SelectedPanel.kept(
        all, row -> periods.contains(all.periods().get(all.rowPeriods().get(row))));
  }

  /** The demo's glassworks, 2012 on, with a control. */
  public static Panel glassworks() {
    return read(
        Path.of("notebooks-data/glassworks.csv"),
        "plant",
        "year",
        "tonnes",
        List.of(
            input("labour", "labour_hours"),
            input("machines", "machine_hours"),
            input("energy", "energy_gj")),
        List.of(new Roles.Control("breakdown_rate", false)));
  }

  private static Roles.Input input(String name, String column) {
    return new Roles.Input(name, column, Optional.empty(), Optional.empty(), Optional.empty());
  }

  private static Panel published(
      String file,
      String plant,
      String period,
      String output,
      List<Roles.Input> inputs,
      List<Roles.Control> controls) {
    return read(PUBLISHED.resolve(file), plant, period, output, inputs, controls);
  }

  private static Panel read(
      Path file,
      String plant,
      String period,
      String output,
      List<Roles.Input> inputs,
      List<Roles.Control> controls) {
    Source source = new Source(file, Optional.empty(), Optional.empty());
    Roles roles =
        new Roles(
            Optional.of(plant).filter(name -> !name.isEmpty()),
            Optional.of(period).filter(name -> !name.isEmpty()),
            output,
            Optional.empty(),
            inputs,
            controls,
            Optional.empty(),
            Optional.empty());
    try {
      return RecordsReader.read(source, roles, Keep.ALL).panel();
    } catch (RecordsRefused refused) {
      throw new IllegalStateException(refused);
    }
  }

  /** A cross-section: every row its own plant. */
  public static Panel crossSection(double[] output, List<String> inputs, double[]... quantities) {
    int[] plants = new int[output.length];
    Arrays.setAll(plants, r -> r);
    return panel(
        plants, new int[output.length], output, inputs, List.of(quantities), List.of(), List.of());
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
    int[] periodIndex = Arrays.stream(periodOfRow).map(p -> periods.indexOf(p)).toArray();
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

  /** A panel with further columns, of the same rows. */
  public static Panel withFurther(Panel panel, List<Column> further) {
    return new Panel(
        panel.roles().withFurther(further.stream().map(Column::name).toList()),
        panel.plants(),
        panel.plantStarts(),
        panel.periods(),
        panel.periodNumbers(),
        panel.rowPeriods(),
        panel.fileRows(),
        panel.output(),
        panel.logOutput(),
        panel.quantities(),
        panel.logQuantities(),
        panel.prices(),
        panel.spending(),
        panel.controls(),
        panel.filedCost(),
        further,
        Optional.empty());
  }
}
