package isowright.handover;

import org.apache.poi.ss.usermodel.BorderStyle;
import org.apache.poi.ss.usermodel.CellStyle;
import org.apache.poi.ss.usermodel.FillPatternType;
import org.apache.poi.ss.usermodel.Font;
import org.apache.poi.ss.usermodel.IndexedColors;
import org.apache.poi.ss.usermodel.Workbook;

/**
 * How cells of the workpapers look. What a cell is shows in more than its colour: inputs have a
 * dotted border, live figures none, figures to compare with are in italics, checks are bold.
 */
record PaperStyles(
    CellStyle title,
    CellStyle head,
    CellStyle words,
    CellStyle quoted,
    CellStyle input,
    CellStyle live,
    CellStyle stated,
    CellStyle check) {

  static PaperStyles of(Workbook book) {
    CellStyle quoted = book.createCellStyle();
    quoted.setQuotePrefixed(true);
    return new PaperStyles(
        title(book),
        head(book),
        book.createCellStyle(),
        quoted,
        input(book),
        live(book),
        stated(book),
        check(book));
  }

  private static Font font(Workbook book, boolean bold, boolean italic, int points) {
    Font font = book.createFont();
    font.setBold(bold);
    font.setItalic(italic);
    font.setFontHeightInPoints((short) points);
    return font;
  }

  private static CellStyle title(Workbook book) {
    CellStyle style = book.createCellStyle();
    style.setFont(font(book, true, false, 14));
    return style;
  }

  private static CellStyle head(Workbook book) {
    CellStyle style = book.createCellStyle();
    style.setFont(font(book, true, false, 10));
    style.setBorderBottom(BorderStyle.THIN);
    style.setWrapText(true);
    return style;
  }

  private static CellStyle number(Workbook book) {
    CellStyle style = book.createCellStyle();
    style.setDataFormat(book.createDataFormat().getFormat("General"));
    return style;
  }

  private static CellStyle input(Workbook book) {
    CellStyle style = number(book);
    style.setFillForegroundColor(IndexedColors.LIGHT_CORNFLOWER_BLUE.getIndex());
    style.setFillPattern(FillPatternType.SOLID_FOREGROUND);
    style.setBorderBottom(BorderStyle.DOTTED);
    style.setBorderTop(BorderStyle.DOTTED);
    return style;
  }

  private static CellStyle live(Workbook book) {
    return number(book);
  }

  private static CellStyle stated(Workbook book) {
    CellStyle style = number(book);
    style.setFont(font(book, false, true, 10));
    return style;
  }

  private static CellStyle check(Workbook book) {
    CellStyle style = number(book);
    style.setFont(font(book, true, false, 10));
    style.setBorderBottom(BorderStyle.DOUBLE);
    return style;
  }
}
