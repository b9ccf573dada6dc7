package isowright.handover;

import java.util.ArrayList;
import java.util.List;
import org.apache.poi.ss.usermodel.Cell;
import org.apache.poi.ss.usermodel.CellStyle;
import org.apache.poi.ss.usermodel.Name;
import org.apache.poi.ss.usermodel.Row;
import org.apache.poi.ss.util.CellRangeAddress;
import org.apache.poi.ss.util.CellReference;
import org.apache.poi.xssf.streaming.SXSSFSheet;

/**
 * One sheet of the workpapers: cells by row and column from zero, and the checks that were put on
 * it. A second row says whether all of its checks hold.
 */
final class Paper {

  /** Where the sheet's own verdict stands. */
  private static final int VERDICT_ROW = 1;

  private static final int MOST_ARGUMENTS = 200;

  private final SXSSFSheet sheet;
  private final PaperStyles styles;
  private final List<String> checks = new ArrayList<>();

  Paper(SXSSFSheet sheet, PaperStyles styles, String title) {
    this.sheet = sheet;
    this.styles = styles;
    text(0, 0, title, styles.title());
    sheet.setFitToPage(true);
    sheet.getPrintSetup().setLandscape(true);
    sheet.getPrintSetup().setFitHeight((short) 0);
    sheet.setMargin(org.apache.poi.ss.usermodel.PageMargin.LEFT, 0.5);
  }

  String name() {
    return sheet.getSheetName();
  }

  /** Keeps rows above and columns before this one in sight, and repeats the rows on paper. */
  void freeze(int row, int column) {
    sheet.createFreezePane(column, row);
    if (row > 0) {
      sheet.setRepeatingRows(new CellRangeAddress(row - 1, row - 1, -1, -1));
    }
  }

  void width(int column, int characters) {
    sheet.setColumnWidth(column, 256 * characters);
  }

  private Cell cell(int row, int column, CellStyle style) {
    Row line = sheet.getRow(row);
    Cell cell = (line == null ? sheet.createRow(row) : line).createCell(column);
    cell.setCellStyle(style);
    return cell;
  }

  private void text(int row, int column, String words, CellStyle style) {
    cell(row, column, style).setCellValue(words);
  }

  /** Words; what begins like a formula stays words even when it is edited. */
  void text(int row, int column, String words) {
    boolean formula = !words.isEmpty() && "=+-@\t\r".indexOf(words.charAt(0)) >= 0;
    text(row, column, words, formula ? styles.quoted() : styles.words());
  }

  void head(int row, int column, String words) {
    text(row, column, words, styles.head());
  }

  /** A number that came from the records or the study: change it and see. */
  void input(int row, int column, double value) {
    if (Double.isFinite(value)) {
      cell(row, column, styles.input()).setCellValue(value);
    }
  }

  /** A figure of Isowright, to compare with. */
  void stated(int row, int column, double value) {
    if (Double.isFinite(value)) {
      cell(row, column, styles.stated()).setCellValue(value);
    } else {
      text(row, column, "none");
    }
  }

  /** A figure that the workbook works out. */
  void live(int row, int column, String formula) {
    cell(row, column, styles.live()).setCellFormula(formula);
  }

  /**
   * Whether a live figure is the one stated: within 1e-9 of it, or of one where it is smaller than
   * one. Both are sums of products of doubles; they differ by rounding alone.
   */
  void check(int row, int column, String live, String stated) {
    cell(row, column, styles.check())
        .setCellFormula("ABS(" + live + "-" + stated + ")<=1E-9*MAX(1,ABS(" + stated + "))");
    checks.add(at(row, column));
  }

  /** Puts the sheet's own verdict in place, once all checks are there. */
  void verdict() {
    if (checks.isEmpty()) {
      text(VERDICT_ROW, 0, "No check on this sheet.");
      return;
    }
    text(VERDICT_ROW, 0, "All checks of this sheet hold:");
    List<String> parts = new ArrayList<>();
    for (int from = 0; from < checks.size(); from += MOST_ARGUMENTS) {
      int to = Math.min(checks.size(), from + MOST_ARGUMENTS);
      parts.add("AND(" + String.join(",", checks.subList(from, to)) + ")");
    }
    cell(VERDICT_ROW, 1, styles.check()).setCellFormula("AND(" + String.join(",", parts) + ")");
  }

  int checks() {
    return checks.size();
  }

  /** The verdict's address, from another sheet. */
  String verdictElsewhere() {
    return elsewhere(at(VERDICT_ROW, 1));
  }

  /** A named range of this workbook. */
  void name(String words, int row, int column, int lastRow, int lastColumn) {
    Name name = sheet.getWorkbook().createName();
    name.setNameName(words.replaceAll("[^A-Za-z0-9_]", "_"));
    name.setRefersToFormula(elsewhere(absolute(row, column) + ":" + absolute(lastRow, lastColumn)));
  }

  /** Gives memory free: nothing above this row is written any more. */
  void written() {
    try {
      sheet.flushRows();
    } catch (java.io.IOException full) {
      throw new java.io.UncheckedIOException("the folder for temporary files is full", full);
    }
  }

  static String at(int row, int column) {
    return new CellReference(row, column).formatAsString();
  }

  static String absolute(int row, int column) {
    return new CellReference(row, column, true, true).formatAsString();
  }

  /** A range on the same sheet, held in place. */
  static String range(int row, int column, int lastRow, int lastColumn) {
    return absolute(row, column) + ":" + absolute(lastRow, lastColumn);
  }

  /** An address on this sheet as another sheet writes it. */
  String elsewhere(String address) {
    return "'" + name() + "'!" + address;
  }
}
