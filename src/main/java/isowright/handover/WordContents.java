package isowright.handover;

import java.math.BigInteger;
import org.apache.poi.xwpf.usermodel.XWPFDocument;
import org.apache.poi.xwpf.usermodel.XWPFParagraph;
import org.openxmlformats.schemas.wordprocessingml.x2006.main.CTHyperlink;
import org.openxmlformats.schemas.wordprocessingml.x2006.main.CTP;
import org.openxmlformats.schemas.wordprocessingml.x2006.main.CTR;
import org.openxmlformats.schemas.wordprocessingml.x2006.main.CTTabStop;
import org.openxmlformats.schemas.wordprocessingml.x2006.main.STFldCharType;
import org.openxmlformats.schemas.wordprocessingml.x2006.main.STTabJc;
import org.openxmlformats.schemas.wordprocessingml.x2006.main.STTabTlc;

/**
 * A table of contents: a field that the word processor can bring up to date, already filled with
 * links to the sections, so that it can be read before anybody does.
 */
final class WordContents {

  private static final String INSTRUCTION = " TOC \\o \"1-2\" \\h \\z \\u ";

  private final XWPFDocument word;
  private boolean begun = false;

  WordContents(XWPFDocument word) {
    this.word = word;
  }

  void entry(String title, String bookmark) {
    XWPFParagraph line = word.createParagraph();
    line.setStyle(WordStyles.CONTENTS);
    CTTabStop stop = line.getCTP().getPPr().addNewTabs().addNewTab();
    stop.setVal(STTabJc.RIGHT);
    stop.setLeader(STTabTlc.DOT);
    stop.setPos(BigInteger.valueOf(WordReport.TEXT_WIDTH));
    CTP paragraph = line.getCTP();
    if (!begun) {
      field(paragraph.addNewR(), STFldCharType.BEGIN);
      instruction(paragraph.addNewR(), INSTRUCTION);
      field(paragraph.addNewR(), STFldCharType.SEPARATE);
      begun = true;
    }
    CTHyperlink link = paragraph.addNewHyperlink();
    link.setAnchor(bookmark);
    link.addNewR().addNewT().setStringValue(title);
    link.addNewR().addNewTab();
    field(link.addNewR(), STFldCharType.BEGIN);
    instruction(link.addNewR(), " PAGEREF " + bookmark + " \\h ");
    field(link.addNewR(), STFldCharType.SEPARATE);
    link.addNewR().addNewT().setStringValue("…");
    field(link.addNewR(), STFldCharType.END);
  }

  void close() {
    if (begun) {
      field(word.createParagraph().getCTP().addNewR(), STFldCharType.END);
    }
  }

  static void field(CTR run, STFldCharType.Enum type) {
    run.addNewFldChar().setFldCharType(type);
  }

  static void instruction(CTR run, String words) {
    run.addNewInstrText().setStringValue(words);
  }
}
