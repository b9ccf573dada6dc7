package isowright.records;

import java.util.List;
import java.util.Locale;

/**
 * One thing to be said about records: what, where (with the value found), and what to do.
 *
 * @param severity how much it matters
 * @param code a short, stable name of the kind of remark, such as {@code duplicate-period}
 * @param message the whole sentence, with file, sheet, row, column, value, rule and remedy as they
 *     apply
 * @param rows the first few rows concerned, numbered as the user sees them in the file
 */
public record Remark(Severity severity, String code, String message, List<Integer> rows) {

  /** How much a remark matters. */
  public enum Severity {
    /** The records cannot be used as they are. */
    ERROR,
    /** A result may be wrong because of it. */
    WARNING,
    /** Good to know. */
    NOTE;

    /** The word used in files. */
    public String word() {
      return name().toLowerCase(Locale.ROOT);
    }
  }

  /** Copies the rows. */
  public Remark {
    rows = List.copyOf(rows);
  }
}
