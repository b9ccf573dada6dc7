package isowright.handover;

import isowright.report.Document.Cell;
import isowright.report.Document.Group;
import isowright.report.Document.Row;
import isowright.report.Document.Table;
import isowright.report.Text;
import java.util.Arrays;
import java.util.stream.IntStream;

/**
 * How wide should each column of a table be? No column is narrower than its longest word; what is
 * left of the page goes to each by the square root of its longest line, so that sentences wrap and
 * numbers do not.
 */
final class ColumnWidths {

  /** Beyond this a cell is a sentence, which may wrap. */
  private static final int LONGEST_LINE = 60;

  private static final int LONGEST_WORD = 18;
  private static final int MARGINS = 2;

  private final int[] words;
  private final int[] lines;

  private ColumnWidths(int columns) {
    this.words = new int[columns];
    this.lines = new int[columns];
  }

  /** The width of each column, the first one the heads of the rows; they sum to the whole. */
  static int[] of(Table table, int whole) {
    ColumnWidths widths = new ColumnWidths(table.columns().size() + 1);
    widths.see(0, table.corner());
    for (int c = 0; c < table.columns().size(); c++) {
      widths.see(c + 1, table.columns().get(c).heading());
      widths.see(c + 1, table.columns().get(c).unit());
    }
    for (Group group : table.groups()) {
      group.rows().forEach(widths::see);
    }
    return widths.shared(whole);
  }

  private void see(Row row) {
    see(0, row.heading().plain());
    for (int c = 0; c < row.cells().size(); c++) {
      Cell cell = row.cells().get(c);
      for (Text line : cell.lines()) {
        see(c + 1, line.plain());
      }
    }
  }

  private void see(int column, String line) {
    lines[column] = Math.max(lines[column], Math.min(line.length(), LONGEST_LINE));
    int longest = Arrays.stream(line.split("[ \u00a0]")).mapToInt(String::length).max().orElse(0);
    words[column] = Math.max(words[column], Math.min(longest, LONGEST_WORD));
  }

  private int[] shared(int whole) {
    double least = IntStream.of(words).map(w -> w + MARGINS).sum();
    double extra = Arrays.stream(lines).mapToDouble(Math::sqrt).sum();
    double most = IntStream.of(lines).map(l -> l + MARGINS).sum();
    int[] widths = new int[words.length];
    // narrow tables need not fill the page, wide ones share what there is
    double characters = Math.max(least, Math.min(most, whole / 100.0));
    double unit = Math.min(110, whole / characters);
    for (int c = 0; c < widths.length; c++) {
      double share = words[c] + MARGINS + (characters - least) * Math.sqrt(lines[c]) / extra;
      widths[c] = (int) Math.round(share * unit);
    }
    return widths;
  }
}
