package isowright.records;

import java.util.Locale;
import org.apache.poi.ss.usermodel.DataFormatter;
import org.apache.poi.ss.usermodel.DateUtil;
import org.apache.poi.xssf.model.StylesTable;
import org.apache.poi.xssf.usermodel.XSSFCellStyle;

/** Which styles of a workbook show a number as a date, and how a number is shown. */
final class CellStyles {

  private static final byte UNKNOWN = 0;
  private static final byte DATE = 1;
  private static final byte NUMBER = 2;

  private final StylesTable styles;
  private final boolean from1904;
  private final byte[] kinds;
  private final DataFormatter formatter = new DataFormatter(Locale.ROOT);

  CellStyles(StylesTable styles, boolean from1904) {
    this.styles = styles;
    this.from1904 = from1904;
    this.kinds = new byte[Math.max(styles.getNumCellStyles(), 1)];
  }

  boolean from1904() {
    return from1904;
  }

  /** Whether cells of a style are shown as dates. */
  boolean date(int style) {
    if (style < 0 || style >= kinds.length) {
      return false;
    }
    if (kinds[style] == UNKNOWN) {
      XSSFCellStyle found = styles.getStyleAt(style);
      boolean date =
          found != null
              && DateUtil.isADateFormat(found.getDataFormat(), found.getDataFormatString());
      kinds[style] = date ? DATE : NUMBER;
    }
    return kinds[style] == DATE;
  }

  /** A number as a cell of a style shows it, such as 00123. */
  String asSeen(double value, int style) {
    XSSFCellStyle found = style >= 0 && style < kinds.length ? styles.getStyleAt(style) : null;
    if (found == null || found.getDataFormatString() == null) {
      return formatter.formatRawCellContents(value, 0, "General", from1904);
    }
    return formatter.formatRawCellContents(
        value, found.getDataFormat(), found.getDataFormatString(), from1904);
  }
}
