package isowright.estimation;

import isowright.records.Column;
import isowright.records.Panel;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;

/** Every k-th plant of a panel, whole, so that about a wanted number of rows is left. */
final class ThinnedPanel {

  private ThinnedPanel() {}

  static Panel of(Panel panel, int wantedRows) {
    int every = Math.max(1, (int) Math.round(panel.rows() / (double) wantedRows));
    int[] rows = new int[panel.rows()];
    int count = 0;
    List<String> plants = new ArrayList<>();
    List<Integer> starts = new ArrayList<>();
    for (int p = 0; p < panel.plants().size(); p += every) {
      plants.add(panel.plants().get(p));
      starts.add(count);
      for (int r = panel.plantStart(p); r < panel.plantEnd(p); r++) {
        rows[count++] = r;
      }
    }
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
        panel.prices().stream().map(c -> Optional.<Column>empty()).toList(),
        panel.spending().stream().map(c -> Optional.<Column>empty()).toList(),
        columns(panel.controls(), kept),
        Optional.empty());
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
}
