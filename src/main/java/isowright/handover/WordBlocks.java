package isowright.handover;

import isowright.report.Document;
import isowright.report.Document.Answer;
import isowright.report.Document.Answers;
import isowright.report.Document.Definitions;
import isowright.report.Document.Display;
import isowright.report.Document.Drawing;
import isowright.report.Document.Entry;
import isowright.report.Document.Notice;
import isowright.report.Document.Paragraph;
import isowright.report.Document.Points;
import isowright.report.Document.Section;
import isowright.report.Document.Table;
import isowright.report.Document.Weight;
import isowright.report.Text;
import java.math.BigInteger;
import org.apache.poi.xwpf.usermodel.Borders;
import org.apache.poi.xwpf.usermodel.ParagraphAlignment;
import org.apache.poi.xwpf.usermodel.XWPFDocument;
import org.apache.poi.xwpf.usermodel.XWPFParagraph;
import org.apache.poi.xwpf.usermodel.XWPFRun;
import org.openxmlformats.schemas.wordprocessingml.x2006.main.CTBookmark;
import org.openxmlformats.schemas.wordprocessingml.x2006.main.CTShd;
import org.openxmlformats.schemas.wordprocessingml.x2006.main.STFldCharType;
import org.openxmlformats.schemas.wordprocessingml.x2006.main.STShd;

/** The pieces of a document as paragraphs, tables and pictures of a word processor. */
final class WordBlocks implements Document.Reader {

  private static final int DEEPEST_HEADING = 5;
  private static final int INDENT = 360;

  private final XWPFDocument word;
  private int depth = 0;
  private int bookmarks = 0;
  private int tables = 0;
  private int drawings = 0;

  WordBlocks(XWPFDocument word) {
    this.word = word;
  }

  /** A name that the format allows for a section: a letter first, letters, digits, underscores. */
  static String bookmark(String section) {
    StringBuilder name = new StringBuilder("s_");
    for (int i = 0; i < section.length(); i++) {
      char c = section.charAt(i);
      boolean plain = (c >= 'a' && c <= 'z') || (c >= '0' && c <= '9');
      name.append(plain ? String.valueOf(c) : "_" + Integer.toHexString(c));
    }
    int longest = 40; // ECMA-376 part 1, 17.13.6.2 leaves it open; word processors cut here
    return name.length() <= longest
        ? name.toString()
        : name.substring(0, longest - 9) + "_" + Integer.toHexString(section.hashCode());
  }

  @Override
  public void section(Section section) {
    depth++;
    XWPFParagraph heading = word.createParagraph();
    heading.setStyle(WordStyles.HEADING + Math.min(depth, DEEPEST_HEADING));
    CTBookmark start = heading.getCTP().addNewBookmarkStart();
    start.setId(BigInteger.valueOf(bookmarks));
    start.setName(bookmark(section.id()));
    heading.createRun().setText(section.title());
    heading.getCTP().addNewBookmarkEnd().setId(BigInteger.valueOf(bookmarks));
    bookmarks++;
    section.blocks().forEach(block -> block.tell(this));
    depth--;
  }

  @Override
  public void paragraph(Paragraph paragraph) {
    WordText.write(word.createParagraph(), paragraph.text());
  }

  @Override
  public void points(Points points) {
    int number = 0;
    for (Text point : points.points()) {
      number++;
      XWPFParagraph line = word.createParagraph();
      line.setIndentationLeft(INDENT);
      line.setIndentationHanging(INDENT);
      line.setSpacingAfter(60);
      XWPFRun mark = line.createRun();
      mark.setText(points.numbered() ? number + "." : "•");
      mark.addTab();
      WordText.write(line, point);
    }
  }

  @Override
  public void definitions(Definitions definitions) {
    for (Entry entry : definitions.entries()) {
      XWPFParagraph line = word.createParagraph();
      line.setSpacingAfter(60);
      line.setIndentationLeft(INDENT);
      line.setIndentationHanging(INDENT);
      WordText.write(line, entry.term());
      line.getRuns().forEach(run -> run.setBold(true));
      line.createRun().setText(". ");
      WordText.write(line, entry.meaning());
    }
  }

  @Override
  public void notice(Notice notice) {
    XWPFParagraph line = word.createParagraph();
    line.setStyle(WordStyles.NOTICE);
    line.setBorderLeft(Borders.THICK);
    line.setIndentationLeft(INDENT / 2);
    shade(line, notice.weight() == Weight.NOTE ? "EEF3F4" : "FBF1DF");
    XWPFRun weight = line.createRun();
    weight.setBold(true);
    weight.setText(notice.weight().word() + ". ");
    WordText.write(line, notice.text());
  }

  private static void shade(XWPFParagraph line, String colour) {
    CTShd shade = line.getCTP().getPPr().addNewShd();
    shade.setVal(STShd.CLEAR);
    shade.setFill(colour);
  }

  @Override
  public void answers(Answers answers) {
    for (Answer answer : answers.answers()) {
      XWPFParagraph question = word.createParagraph();
      question.setStyle(WordStyles.CAPTION);
      question.createRun().setText(answer.question());
      XWPFParagraph figure = word.createParagraph();
      figure.setSpacingAfter(40);
      XWPFRun run = figure.createRun();
      run.setBold(true);
      run.setFontSize(14);
      run.setText((answer.answer() + " " + answer.unit()).strip());
      for (String line : new String[] {answer.sure(), answer.detail(), answer.caution()}) {
        if (!line.isEmpty()) {
          XWPFParagraph beneath = word.createParagraph();
          beneath.setSpacingAfter(40);
          beneath.createRun().setText(line);
        }
      }
    }
  }

  @Override
  public void table(Table table) {
    tables++;
    caption("Table", tables, table.caption());
    WordTable.write(word, table);
    for (Text note : table.notes()) {
      XWPFParagraph line = word.createParagraph();
      line.setStyle(WordStyles.NOTE);
      WordText.write(line, note);
    }
    if (table.notes().isEmpty()) {
      word.createParagraph().setStyle(WordStyles.NOTE); // tables that touch become one
    }
  }

  @Override
  public void drawing(Drawing drawing) {
    drawings++;
    caption("Figure", drawings, drawing.chart().title());
    WordPicture.write(word.createParagraph(), drawing.chart());
    XWPFParagraph words = word.createParagraph();
    words.setStyle(WordStyles.NOTE);
    words.createRun().setText(drawing.chart().caption());
  }

  /** "Table 3. …": the number is a field that counts by itself when something is put before it. */
  private void caption(String what, int number, String title) {
    XWPFParagraph caption = word.createParagraph();
    caption.setStyle(WordStyles.CAPTION);
    caption.createRun().setText(what + " ");
    var paragraph = caption.getCTP();
    WordContents.field(paragraph.addNewR(), STFldCharType.BEGIN);
    WordContents.instruction(paragraph.addNewR(), " SEQ " + what + " \\* ARABIC ");
    WordContents.field(paragraph.addNewR(), STFldCharType.SEPARATE);
    paragraph.addNewR().addNewT().setStringValue(String.valueOf(number));
    WordContents.field(paragraph.addNewR(), STFldCharType.END);
    XWPFRun words =
        new XWPFRun(paragraph.addNewR(), (org.apache.poi.xwpf.usermodel.IRunBody) caption);
    words.setText(". " + title);
  }

  @Override
  public void display(Display display) {
    XWPFParagraph line = word.createParagraph();
    line.setAlignment(ParagraphAlignment.LEFT);
    line.setIndentationLeft(INDENT);
    WordText.formula(line, display.formula());
  }
}
