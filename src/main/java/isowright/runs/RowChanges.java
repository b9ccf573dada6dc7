package isowright.runs;

import isowright.records.Column;
import isowright.records.Panel;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * What changed between two sets of records, row by row: a row is known by its plant and period.
 *
 * <p>Numbers are compared as they stand in the files, before any deflator. What a row is used for
 * follows from each run's own study; a column that only one of them uses is not compared.
 *
 * <p>Tested in {@code ComparisonTest}.
 *
 * @param added rows of the later records that the earlier ones do not have
 * @param removed rows of the earlier records that the later ones do not have
 * @param corrected cells of rows in both that differ
 * @param correctedRows in how many rows
 * @param same how many rows are the same in every compared column
 */
public record RowChanges(
    List<Row> added, List<Row> removed, List<Cell> corrected, int correctedRows, int same) {

  /** Copies the lists. */
  public RowChanges {
    added = List.copyOf(added);
    removed = List.copyOf(removed);
    corrected = List.copyOf(corrected);
  }

  /**
   * A row.
   *
   * @param plant its plant
   * @param period its period
   * @param fileRow its number in its file
   */
  public record Row(String plant, String period, int fileRow) {}

  /**
   * A corrected cell.
   *
   * @param row its row in the later records
   * @param column what the number is
   * @param before the number before; absent where there was none
   * @param after the number after; absent where there is none
   */
  public record Cell(Row row, String column, Optional<Double> before, Optional<Double> after) {}

  /** What changed from one to the other. */
  static RowChanges between(Panel before, Panel after) {
    Map<String, Integer> earlier = rows(before);
    Map<String, Integer> later = rows(after);
    Map<String, Numbers> was = numbers(before);
    Map<String, Numbers> is = numbers(after);
    List<Row> added = new ArrayList<>();
    List<Cell> corrected = new ArrayList<>();
    int correctedRows = 0;
    int same = 0;
    for (Map.Entry<String, Integer> entry : later.entrySet()) {
      Row row = row(after, entry.getValue());
      Integer old = earlier.get(entry.getKey());
      if (old == null) {
        added.add(row);
        continue;
      }
      List<Cell> cells = cells(row, was, old, is, entry.getValue());
      corrected.addAll(cells);
      correctedRows += cells.isEmpty() ? 0 : 1;
      same += cells.isEmpty() ? 1 : 0;
    }
    List<Row> removed = new ArrayList<>();
    earlier.forEach(
        (key, r) -> {
          if (!later.containsKey(key)) {
            removed.add(row(before, r));
          }
        });
    return new RowChanges(added, removed, corrected, correctedRows, same);
  }

  /** A row of numbers as it stands in the file. */
  private interface Numbers {
    double at(int row);
  }

  private static List<Cell> cells(
      Row row, Map<String, Numbers> was, int old, Map<String, Numbers> is, int now) {
    List<Cell> cells = new ArrayList<>();
    is.forEach(
        (column, numbers) -> {
          Numbers earlier = was.get(column);
          if (earlier != null) {
            double before = earlier.at(old);
            double after = numbers.at(now);
            if (!alike(before, after)) {
              cells.add(new Cell(row, column, known(before), known(after)));
            }
          }
        });
    return cells;
  }

  /**
   * Deflating and undoing it costs a rounding error or two; what a file says differs by more (its
   * numbers have at most 15 digits).
   */
  private static boolean alike(double a, double b) {
    boolean blank = Double.isNaN(a) && Double.isNaN(b);
    return blank || Math.abs(a - b) <= 8 * Math.ulp(Math.max(Math.abs(a), Math.abs(b)));
  }

  private static Optional<Double> known(double value) {
    return Double.isNaN(value) ? Optional.empty() : Optional.of(value);
  }

  private static Map<String, Integer> rows(Panel panel) {
    Map<String, Integer> rows = new LinkedHashMap<>();
    for (int r = 0; r < panel.rows(); r++) {
      Row row = row(panel, r);
      rows.put(row.plant() + "\0" + row.period(), r);
    }
    return rows;
  }

  private static Row row(Panel panel, int r) {
    return new Row(
        panel.plants().get(panel.plantOf(r)),
        panel.periods().get(panel.rowPeriods().get(r)),
        panel.fileRows().get(r));
  }

  private static Map<String, Numbers> numbers(Panel panel) {
    Map<String, Numbers> numbers = new LinkedHashMap<>();
    numbers.put("output", panel.output()::get);
    for (int i = 0; i < panel.inputs().size(); i++) {
      String input = panel.inputs().get(i);
      numbers.put("quantity of " + input, panel.quantities().get(i)::get);
      Optional<Column> spending = panel.spending().get(i);
      spending.ifPresent(c -> numbers.put("spending on " + input, undeflated(panel, c)));
      if (spending.isEmpty()) {
        panel
            .prices()
            .get(i)
            .ifPresent(c -> numbers.put("price of " + input, undeflated(panel, c)));
      }
    }
    panel.controls().forEach(c -> numbers.put("control " + c.name(), c::get));
    panel.filedCost().ifPresent(c -> numbers.put("filed cost", undeflated(panel, c)));
    panel.further().forEach(c -> numbers.put(c.name(), c::get));
    return numbers;
  }

  private static Numbers undeflated(Panel panel, Column column) {
    return panel
        .moneyFactor()
        .<Numbers>map(factor -> row -> column.get(row) / factor.get(row))
        .orElse(column::get);
  }
}
