package isowright.handover;

import isowright.report.Formula;
import isowright.report.Text;
import isowright.report.Text.Mathematics;
import isowright.report.Text.Reference;
import isowright.report.Text.Words;
import org.apache.poi.xwpf.usermodel.XWPFParagraph;
import org.apache.poi.xwpf.usermodel.XWPFRun;
import org.apache.xmlbeans.XmlCursor;
import org.apache.xmlbeans.XmlException;
import org.apache.xmlbeans.XmlObject;
import org.openxmlformats.schemas.wordprocessingml.x2006.main.CTHyperlink;
import org.openxmlformats.schemas.wordprocessingml.x2006.main.CTR;

/** Words in a line as runs, links and equations of a paragraph. */
final class WordText implements Text.Reader {

  private static final String TYPED_FACE = "DejaVu Sans Mono";

  private final XWPFParagraph line;

  private WordText(XWPFParagraph line) {
    this.line = line;
  }

  /** Adds words to a paragraph. */
  static void write(XWPFParagraph line, Text text) {
    WordText writer = new WordText(line);
    text.spans().forEach(span -> span.tell(writer));
  }

  /** Adds an equation to a paragraph. */
  static void formula(XWPFParagraph line, Formula formula) {
    try {
      XmlObject equation = XmlObject.Factory.parse(WordMath.of(formula));
      try (XmlCursor from = equation.newCursor();
          XmlCursor to = line.getCTP().newCursor()) {
        from.toFirstChild();
        to.toEndToken();
        from.copyXml(to);
      }
    } catch (XmlException impossible) {
      throw new IllegalStateException("an equation is well-formed", impossible);
    }
  }

  @Override
  public void words(Words span) {
    XWPFRun run = line.createRun();
    run.setText(span.words());
    switch (span.manner()) {
      case STRONG -> run.setBold(true);
      case EMPHASIS -> run.setItalic(true);
      case TYPED -> {
        run.setFontFamily(TYPED_FACE);
        run.setFontSize(8);
      }
      case PLAIN -> {}
    }
  }

  @Override
  public void mathematics(Mathematics span) {
    formula(line, span.formula());
  }

  @Override
  public void reference(Reference span) {
    CTHyperlink link = line.getCTP().addNewHyperlink();
    link.setAnchor(WordBlocks.bookmark(span.section()));
    CTR run = link.addNewR();
    run.addNewT().setStringValue(span.words());
    run.addNewRPr().addNewColor().setVal(WordStyles.ACCENT);
  }
}
