package isowright.cli;

import java.util.ArrayList;
import java.util.List;

/**
 * A table for people, in plain text: words to the left, numbers to the right, two blanks between
 * columns. Columns of numbers are told by their heading's place in the constructor.
 */
final class TextTable {

  private static final String GAP = "  ";

  private final List<String> headings;
  private final int words;
  private final List<List<String>> rows = new ArrayList<>();

  /**
   * An empty table.
   *
   * @param words how many columns, from the left, are words; the others are numbers
   * @param headings the headings
   */
  TextTable(int words, String... headings) {
    this.words = words;
    this.headings = List.of(headings);
  }

  /** Adds a row with a cell for every heading. */
  void row(String... cells) {
    if (cells.length != headings.size()) {
      throw new IllegalArgumentException(cells.length + " cells under " + headings.size());
    }
    rows.add(List.of(cells));
  }

  /** Whether no row was added. */
  boolean isEmpty() {
    return rows.isEmpty();
  }

  /** The lines, headings first, each indented. */
  List<String> lines(String indent) {
    int[] widths = new int[headings.size()];
    List<List<String>> all = new ArrayList<>();
    all.add(headings);
    all.addAll(rows);
    for (List<String> row : all) {
      for (int c = 0; c < widths.length; c++) {
        widths[c] = Math.max(widths[c], width(row.get(c)));
      }
    }
    return all.stream().map(row -> indent + line(row, widths).stripTrailing()).toList();
  }

  private String line(List<String> row, int[] widths) {
    StringBuilder line = new StringBuilder();
    for (int c = 0; c < widths.length; c++) {
      String blanks = " ".repeat(widths[c] - width(row.get(c)));
      line.append(c == 0 ? "" : GAP);
      line.append(c < words ? row.get(c) + blanks : blanks + row.get(c));
    }
    return line.toString();
  }

  private static int width(String cell) {
    return cell.codePointCount(0, cell.length());
  }
}
