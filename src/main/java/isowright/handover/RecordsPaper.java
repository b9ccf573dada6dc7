package isowright.handover;

import isowright.records.Column;
import isowright.records.Panel;
import java.util.LinkedHashMap;
import java.util.Map;
import java.util.Objects;
import java.util.Optional;

/**
 * The rows used, one a line, and where each of their columns stands: the ground on which the other
 * sheets build. Rows of a plant stand together.
 */
final class RecordsPaper {

  /** The first row of numbers. */
  static final int FIRST = 4;

  /** How many rows are kept in memory before they are written out. */
  private static final int BLOCK = 1000;

  private final Paper paper;
  private final Panel panel;
  private final Map<String, Integer> columns = new LinkedHashMap<>();

  private RecordsPaper(Paper paper, Panel panel) {
    this.paper = paper;
    this.panel = panel;
  }

  static RecordsPaper write(Paper paper, Panel panel, String money, Map<String, String> units) {
    RecordsPaper records = new RecordsPaper(paper, panel);
    records.fill(money, units);
    return records;
  }

  private void fill(String money, Map<String, String> units) {
    Map<String, Column> numbers = new LinkedHashMap<>();
    numbers.put("output", panel.output());
    for (int i = 0; i < panel.inputs().size(); i++) {
      String input = panel.inputs().get(i);
      String unit = units.getOrDefault(input, "");
      numbers.put(quantity(input) + in(unit), panel.quantities().get(i));
      put(numbers, "price of " + input + in(money), panel.prices().get(i));
    }
    panel.controls().forEach(column -> numbers.put("control:" + column.name(), column));
    put(numbers, "filed cost" + in(money), panel.filedCost());
    paper.text(
        1, 0, "Rows used, money in " + money + ". Each stands once; other sheets refer to it.");
    int c = 0;
    for (String head : new String[] {"plant", "period", "period as a number", "row in its file"}) {
      paper.head(FIRST - 1, c++, head);
    }
    for (String name : numbers.keySet()) {
      columns.put(name.split(", in ", 2)[0], c);
      paper.head(FIRST - 1, c++, name);
    }
    paper.freeze(FIRST, 2);
    rows(numbers.values().toArray(Column[]::new));
    columns.forEach((name, column) -> paper.name("records_" + name, FIRST, column, last(), column));
  }

  private static String in(String unit) {
    return unit.isEmpty() ? "" : ", in " + unit;
  }

  private static void put(Map<String, Column> into, String name, Optional<Column> column) {
    column.ifPresent(numbers -> into.put(name, numbers));
  }

  private void rows(Column[] numbers) {
    for (int r = 0; r < panel.rows(); r++) {
      int period = panel.rowPeriods().get(r);
      paper.text(FIRST + r, 0, panel.plants().get(panel.plantOf(r)));
      paper.text(FIRST + r, 1, panel.periods().get(period));
      paper.input(FIRST + r, 2, panel.periodNumbers().get(period));
      paper.stated(FIRST + r, 3, panel.fileRows().get(r));
      for (int c = 0; c < numbers.length; c++) {
        paper.input(FIRST + r, 4 + c, numbers[c].get(r));
      }
      if (r % BLOCK == BLOCK - 1) {
        paper.written();
      }
    }
  }

  static String quantity(String input) {
    return "quantity of " + input;
  }

  /** The last row of numbers. */
  int last() {
    return FIRST + panel.rows() - 1;
  }

  /** A number of a row of the panel, as another sheet writes it. */
  String cell(String column, int row) {
    return paper.elsewhere(Paper.at(FIRST + row, Objects.requireNonNull(columns.get(column))));
  }

  /** The period of a row as a number. */
  String period(int row) {
    return paper.elsewhere(Paper.at(FIRST + row, 2));
  }

  boolean has(String column) {
    return columns.containsKey(column);
  }

  Panel panel() {
    return panel;
  }
}
