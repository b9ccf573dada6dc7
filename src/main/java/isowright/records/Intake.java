package isowright.records;

import java.time.LocalDateTime;
import java.util.List;

/**
 * What takes in the cells of a file, row by row. The readers of CSV and of workbooks drive it and
 * know nothing of roles; whoever implements it knows nothing of files.
 *
 * <p>A cell is reported at most once, by its column from 0. Cells that are not there are not
 * reported, so a row begins with every cell blank.
 */
interface Intake {

  /** The headings, before any row. */
  void headings(int fileRow, List<String> headings) throws RecordsRefused;

  /** A row begins. */
  void beginRow(int fileRow);

  /** A cell of text; the array belongs to the caller and is overwritten after the call. */
  void text(int column, char[] characters, int from, int length);

  /**
   * A cell that a workbook stores as a number.
   *
   * @param asSeen how the workbook shows it, asked for only where the text matters
   */
  void number(int column, double value, AsSeen asSeen);

  /** A cell that a workbook shows as a date. */
  void date(int column, LocalDateTime date);

  /** A cell that holds no value: an error of the workbook, a truth value, a formula never run. */
  void odd(int column, Oddity oddity, String shown);

  /** A row ends; {@code cells} is the number of cells it had in the file. */
  void endRow(int cells);

  /** Whether reading on makes sense. */
  default boolean wantsMore() {
    return true;
  }

  /** How a workbook shows a number. */
  @FunctionalInterface
  interface AsSeen {
    /** The text in the cell as the user sees it. */
    String text();
  }

  /** What a workbook's cell may hold besides text, numbers and dates. */
  enum Oddity {
    /** An error value such as {@code #DIV/0!}. */
    ERROR_VALUE,
    /** TRUE or FALSE. */
    TRUTH_VALUE,
    /** A formula whose value was never stored. */
    FORMULA_WITHOUT_VALUE
  }
}
