package isowright.estimation;

import isowright.records.Column;
import isowright.records.Panel;
import isowright.records.PeriodSteps;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.stream.Stream;

/**
 * The values of a {@link Series} in a panel: NaN where the column is blank or the plant has no row
 * that many periods earlier.
 *
 * @param word how the series is named, such as {@code lag wage}
 * @param entering how it enters, such as {@code lag ln wage}
 * @param values by row of the panel
 */
record SeriesColumn(String word, String entering, double[] values) {

  /** The column of a series, or why there is none. */
  static Optional<SeriesColumn> of(Panel panel, Series series, List<String> lacking) {
    Optional<Column> found = column(panel, series.name());
    if (found.isEmpty()) {
      lacking.add(
          "The records hold no column "
              + series.name()
              + " for "
              + series.word()
              + ". Name a column that they have.");
      return Optional.empty();
    }
    Column column = found.get();
    boolean input = panel.inputs().contains(series.name());
    boolean positive = true;
    for (int r = 0; r < column.size(); r++) {
      positive &= Double.isNaN(column.get(r)) || column.get(r) > 0;
    }
    if (series.log().orElse(false) && !positive) {
      lacking.add(
          series.name()
              + " is to enter in logs but is not positive in every row. Take `log: true` out, or"
              + " correct the values.");
      return Optional.empty();
    }
    boolean logged = input || series.log().orElse(positive);
    Column values = logged ? column.logs() : column;
    PeriodSteps steps = PeriodSteps.of(panel);
    double[] own = new double[panel.rows()];
    for (int r = 0; r < own.length; r++) {
      int before = steps.before(r, series.lag());
      own[r] = before < 0 ? Double.NaN : values.get(before);
    }
    return Optional.of(new SeriesColumn(series.word(), series.entering(logged), own));
  }

  private static Optional<Column> column(Panel panel, String name) {
    int input = panel.inputs().indexOf(name);
    if (input >= 0) {
      return Optional.of(panel.quantities().get(input));
    }
    List<Column> all = new ArrayList<>();
    Stream.of(panel.prices(), panel.spending())
        .flatMap(List::stream)
        .flatMap(Optional::stream)
        .forEach(all::add);
    panel.filedCost().ifPresent(all::add);
    all.addAll(panel.further());
    return all.stream().filter(c -> c.name().equals(name)).findFirst();
  }

  /** Whether the value of a row is known. */
  boolean known(int row) {
    return Double.isFinite(values[row]);
  }

  /** The same about its mean over some rows; it changes no span of columns that has a constant. */
  SeriesColumn centred(int[] rows) {
    double sum = 0;
    for (int row : rows) {
      sum += values[row];
    }
    double mean = sum / rows.length;
    double[] moved = new double[values.length];
    for (int r = 0; r < moved.length; r++) {
      moved[r] = values[r] - mean;
    }
    return new SeriesColumn(word, entering, moved);
  }
}
