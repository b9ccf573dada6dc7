package isowright.handover;

import java.math.BigInteger;
import org.apache.poi.xwpf.usermodel.XWPFDocument;
import org.apache.poi.xwpf.usermodel.XWPFStyle;
import org.apache.poi.xwpf.usermodel.XWPFStyles;
import org.openxmlformats.schemas.wordprocessingml.x2006.main.CTPPrGeneral;
import org.openxmlformats.schemas.wordprocessingml.x2006.main.CTRPr;
import org.openxmlformats.schemas.wordprocessingml.x2006.main.CTStyle;
import org.openxmlformats.schemas.wordprocessingml.x2006.main.STStyleType;

/**
 * The styles of the document: one place for its type, sizes and spaces. Headings are the word
 * processor's own, so that its outline, navigation and table of contents find them.
 */
final class WordStyles {

  static final String TITLE = "Title";
  static final String ABOUT = "Subtitle";
  static final String HEADING = "Heading";
  static final String CAPTION = "Caption";
  static final String NOTE = "TableNote";
  static final String NOTICE = "Notice";
  static final String CONTENTS = "TOC1";
  static final String TABLE_TEXT = "TableText";

  /** Ink and rule, the same as on the page. */
  static final String INK = "1B1F24";

  static final String ACCENT = "0B4F5C";

  private static final String TEXT_FACE = "DejaVu Serif";
  private static final String HEAD_FACE = "DejaVu Sans";
  private static final int LEVELS = 5;

  private WordStyles() {}

  static void addTo(XWPFDocument document) {
    XWPFStyles styles = document.createStyles();
    add(styles, style("Normal", "Normal", TEXT_FACE, 10, false, INK, 0, 120, -1));
    add(styles, style(TITLE, "Title", TEXT_FACE, 24, true, INK, 0, 120, -1));
    add(styles, style(ABOUT, "Subtitle", HEAD_FACE, 10, false, ACCENT, 0, 60, -1));
    int[] sizes = {16, 13, 11, 10, 10};
    for (int level = 1; level <= LEVELS; level++) {
      String name = "heading " + level;
      add(
          styles,
          style(
              HEADING + level,
              name,
              TEXT_FACE,
              sizes[level - 1],
              true,
              INK,
              level == 1 ? 360 : 240,
              100,
              level - 1));
    }
    add(styles, style(CAPTION, "caption", HEAD_FACE, 9, true, INK, 200, 60, -1));
    add(styles, style(NOTE, "Table note", HEAD_FACE, 8, false, INK, 40, 40, -1));
    add(styles, style(NOTICE, "Notice", TEXT_FACE, 10, false, INK, 60, 120, -1));
    add(styles, style(CONTENTS, "toc 1", HEAD_FACE, 9, false, ACCENT, 0, 40, -1));
    add(styles, style(TABLE_TEXT, "Table text", HEAD_FACE, 8, false, INK, 20, 20, -1));
  }

  private static void add(XWPFStyles styles, CTStyle style) {
    styles.addStyle(new XWPFStyle(style));
  }

  private static CTStyle style(
      String id,
      String name,
      String face,
      int points,
      boolean bold,
      String colour,
      int before,
      int after,
      int outline) {
    CTStyle style = CTStyle.Factory.newInstance();
    style.setStyleId(id);
    style.addNewName().setVal(name);
    style.setType(STStyleType.PARAGRAPH);
    if (id.equals("Normal")) {
      style.setDefault(true);
    } else {
      style.addNewBasedOn().setVal("Normal");
      style.addNewNext().setVal("Normal");
    }
    style.addNewQFormat();
    CTPPrGeneral paragraph = style.addNewPPr();
    paragraph.addNewSpacing().setBefore(BigInteger.valueOf(before));
    paragraph.getSpacing().setAfter(BigInteger.valueOf(after));
    if (outline >= 0) {
      paragraph.addNewKeepNext();
      paragraph.addNewOutlineLvl().setVal(BigInteger.valueOf(outline));
    } else if (id.equals(CAPTION)) {
      paragraph.addNewKeepNext();
    }
    CTRPr run = style.addNewRPr();
    var fonts = run.addNewRFonts();
    fonts.setAscii(face);
    fonts.setHAnsi(face);
    fonts.setCs(face);
    if (bold) {
      run.addNewB();
    }
    run.addNewColor().setVal(colour);
    run.addNewSz().setVal(BigInteger.valueOf(2L * points));
    return style;
  }
}
