package isowright.handover;

import isowright.report.Document;
import isowright.report.Document.Entry;
import isowright.report.Document.Section;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.math.BigInteger;
import java.time.Instant;
import java.util.Date;
import java.util.Optional;
import org.apache.poi.ooxml.POIXMLProperties.CoreProperties;
import org.apache.poi.xwpf.usermodel.XWPFDocument;
import org.apache.poi.xwpf.usermodel.XWPFParagraph;
import org.openxmlformats.schemas.wordprocessingml.x2006.main.CTPageMar;
import org.openxmlformats.schemas.wordprocessingml.x2006.main.CTPageSz;
import org.openxmlformats.schemas.wordprocessingml.x2006.main.CTSectPr;

/**
 * The report as a document for a word processor (Office Open XML, ECMA-376): what a consultant
 * edits, signs and hands over. Real headings, a table of contents whose page numbers the word
 * processor fills in, captions that count by themselves, native tables whose heads repeat on every
 * page, native equations, charts at twice their printed size with text alternatives.
 *
 * <p>It says what the page says, from the same {@link Document}. The same document gives the same
 * bytes.
 *
 * <p>Tested in {@code WordReportTest}.
 */
public final class WordReport {

  /** A4 and its margins, in twentieths of a point. */
  private static final int PAGE_WIDTH = 11906;

  private static final int PAGE_HEIGHT = 16838;
  private static final int MARGIN = 1247;

  /** The width that text may fill, in twentieths of a point. */
  static final int TEXT_WIDTH = PAGE_WIDTH - 2 * MARGIN;

  private WordReport() {}

  /** The file of this document. */
  public static byte[] write(Document document) {
    try (XWPFDocument word = new XWPFDocument();
        ByteArrayOutputStream bytes = new ByteArrayOutputStream(1 << 20)) {
      WordStyles.addTo(word);
      page(word);
      properties(word, document);
      cover(word, document);
      contents(word, document);
      WordBlocks blocks = new WordBlocks(word);
      document.sections().forEach(section -> section.tell(blocks));
      word.write(bytes);
      return bytes.toByteArray();
    } catch (IOException e) {
      throw new UncheckedIOException("writing to memory failed", e);
    }
  }

  private static void page(XWPFDocument word) {
    CTSectPr section = word.getDocument().getBody().addNewSectPr();
    CTPageSz size = section.addNewPgSz();
    size.setW(BigInteger.valueOf(PAGE_WIDTH));
    size.setH(BigInteger.valueOf(PAGE_HEIGHT));
    CTPageMar margins = section.addNewPgMar();
    margins.setLeft(BigInteger.valueOf(MARGIN));
    margins.setRight(BigInteger.valueOf(MARGIN));
    margins.setTop(BigInteger.valueOf(MARGIN));
    margins.setBottom(BigInteger.valueOf(MARGIN));
  }

  private static void properties(XWPFDocument word, Document document) {
    CoreProperties properties = word.getProperties().getCoreProperties();
    properties.setTitle(document.title());
    properties.setSubjectProperty(document.about());
    properties.setCreator("Isowright");
    // when a run was made stands in its record; here it would make every file another
    properties.setCreated(Optional.of(Date.from(Instant.EPOCH)));
    properties.setModified(Optional.of(Date.from(Instant.EPOCH)));
  }

  private static void cover(XWPFDocument word, Document document) {
    paragraph(word, WordStyles.ABOUT, document.about());
    paragraph(word, WordStyles.TITLE, document.title());
    for (Entry fact : document.facts()) {
      XWPFParagraph line = word.createParagraph();
      line.setSpacingAfter(20);
      line.createRun().setText(fact.term().plain() + ": ");
      line.getRuns().get(0).setBold(true);
      line.createRun().setText(fact.meaning().plain());
    }
  }

  private static void paragraph(XWPFDocument word, String style, String text) {
    XWPFParagraph paragraph = word.createParagraph();
    paragraph.setStyle(style);
    paragraph.createRun().setText(text);
  }

  private static void contents(XWPFDocument word, Document document) {
    XWPFParagraph head = word.createParagraph();
    head.setStyle(WordStyles.CAPTION);
    head.createRun().setText("Contents");
    WordContents contents = new WordContents(word);
    for (Section section : document.sections()) {
      contents.entry(section.title(), WordBlocks.bookmark(section.id()));
    }
    contents.close();
  }
}
