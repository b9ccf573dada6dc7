package isowright.report;

import isowright.report.Document.Cell;
import isowright.report.Document.Column;
import isowright.study.Figure;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/** Cells and headings that several tables share. */
final class Cells {

  private Cells() {}

  /** A figure with its interval beneath; a dash where there is none. */
  static Cell figure(Optional<Figure> figure) {
    return figure.map(Cells::figure).orElse(Cell.none());
  }

  /** A figure with its interval beneath. */
  static Cell figure(Figure figure) {
    return Cell.of(Numbers.value(figure), Numbers.interval(figure));
  }

  /** An exact number; a dash where there is none. */
  static Cell exact(Optional<Double> value) {
    return value.map(v -> Cell.of(Numbers.amount(v))).orElse(Cell.none());
  }

  /** One column for each technology with a result: those fitted, then those taken as known. */
  static List<Column> technologies(Material material) {
    List<Column> columns = new ArrayList<>();
    material
        .usable()
        .forEach(
            fit ->
                columns.add(
                    Column.ofNumbers(
                        Terms.technology(fit.technology()), Terms.state(fit.state()))));
    material
        .findings()
        .given()
        .forEach(given -> columns.add(Column.ofNumbers(given.name(), "taken as known")));
    return columns;
  }
}
