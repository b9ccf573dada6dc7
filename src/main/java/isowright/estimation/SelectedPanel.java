package isowright.estimation;

import isowright.records.Column;
import isowright.records.Panel;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.function.IntPredicate;

/** Panels made of some rows of another: what a refit is fitted to. */
final class SelectedPanel {

  private final Panel panel;
  private final int[] rows;
  private final List<String> plants = new ArrayList<>();
  private final List<Integer> starts = new ArrayList<>();
  private int count;

  private SelectedPanel(Panel panel, int most) {
    this.panel = panel;
    this.rows = new int[most];
  }

  /**
   * Every plant as often as it is counted; a copy is a plant of its own.
   *
   * @param counts shape as the plants
   */
  static Panel counted(Panel panel, int[] counts) {
    int most = 0;
    for (int p = 0; p < counts.length; p++) {
      most += counts[p] * (panel.plantEnd(p) - panel.plantStart(p));
    }
    SelectedPanel selected = new SelectedPanel(panel, most);
    for (int p = 0; p < counts.length; p++) {
      for (int copy = 0; copy < counts[p]; copy++) {
        String name = panel.plants().get(p) + (copy == 0 ? "" : " (" + (copy + 1) + ")");
        selected.plant(name, p, row -> true);
      }
    }
    return selected.panel();
  }

  /** Those rows that are to be kept; a plant without rows is left out, a period is not. */
  static Panel kept(Panel panel, IntPredicate keep) {
    SelectedPanel selected = new SelectedPanel(panel, panel.rows());
    for (int p = 0; p < panel.plants().size(); p++) {
      selected.plant(panel.plants().get(p), p, keep);
    }
    return selected.panel();
  }

  private void plant(String name, int plant, IntPredicate keep) {
    int before = count;
    for (int row = panel.plantStart(plant); row < panel.plantEnd(plant); row++) {
      if (keep.test(row)) {
        rows[count++] = row;
      }
    }
    if (count > before) {
      plants.add(name);
      starts.add(before);
    }
  }

  private Panel panel() {
    int[] kept = Arrays.copyOf(rows, count);
    return new Panel(
        panel.roles(),
        plants,
        Panel.Rows.of(starts.stream().mapToInt(Integer::intValue).toArray()),
        panel.periods(),
        panel.periodNumbers(),
        whole(panel.rowPeriods(), kept),
        whole(panel.fileRows(), kept),
        column(panel.output(), kept),
        column(panel.logOutput(), kept),
        columns(panel.quantities(), kept),
        columns(panel.logQuantities(), kept),
        optional(panel.prices(), kept),
        optional(panel.spending(), kept),
        columns(panel.controls(), kept),
        panel.filedCost().map(c -> column(c, kept)),
        columns(panel.further(), kept),
        panel.moneyFactor().map(c -> column(c, kept)));
  }

  /** The same records with a period struck from the list of periods; no row may be in it. */
  static Panel withoutPeriod(Panel panel, int period) {
    List<String> periods = new ArrayList<>(panel.periods());
    List<Double> numbers = new ArrayList<>(panel.periodNumbers());
    periods.remove(period);
    numbers.remove(period);
    int[] places = panel.rowPeriods().toArray();
    for (int row = 0; row < places.length; row++) {
      places[row] -= places[row] > period ? 1 : 0;
    }
    return new Panel(
        panel.roles(),
        panel.plants(),
        panel.plantStarts(),
        periods,
        numbers,
        Panel.Rows.of(places),
        panel.fileRows(),
        panel.output(),
        panel.logOutput(),
        panel.quantities(),
        panel.logQuantities(),
        panel.prices(),
        panel.spending(),
        panel.controls(),
        panel.filedCost(),
        panel.further(),
        panel.moneyFactor());
  }

  private static Panel.Rows whole(Panel.Rows values, int[] kept) {
    return Panel.Rows.of(Arrays.stream(kept).map(values::get).toArray());
  }

  private static Column column(Column column, int[] kept) {
    return Column.of(column.name(), Arrays.stream(kept).mapToDouble(column::get).toArray());
  }

  private static List<Column> columns(List<Column> columns, int[] kept) {
    return columns.stream().map(column -> column(column, kept)).toList();
  }

  private static List<Optional<Column>> optional(List<Optional<Column>> columns, int[] kept) {
    return columns.stream().map(o -> o.map(c -> column(c, kept))).toList();
  }
}
