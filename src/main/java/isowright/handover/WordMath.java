package isowright.handover;

import isowright.report.Formula;
import isowright.report.Formula.Fraction;
import isowright.report.Formula.Kind;
import isowright.report.Formula.Part;
import isowright.report.Formula.Scripted;
import isowright.report.Formula.Symbol;
import java.util.List;

/**
 * Formulas as native equations of a word processor: Office Math Markup (ECMA-376 part 1, section
 * 22.1).
 */
final class WordMath implements Formula.Reader {

  private static final String NAMESPACE =
      "http://schemas.openxmlformats.org/officeDocument/2006/math";

  private final StringBuilder out = new StringBuilder();

  private WordMath() {}

  /** The element of a formula, namespace declared. */
  static String of(Formula formula) {
    WordMath math = new WordMath();
    math.out.append("<m:oMath xmlns:m=\"").append(NAMESPACE).append("\">");
    math.row(formula.parts());
    math.out.append("</m:oMath>");
    return math.out.toString();
  }

  private void row(List<Part> parts) {
    parts.forEach(part -> part.tell(this));
  }

  private void element(String name, List<Part> parts) {
    out.append("<m:").append(name).append('>');
    row(parts);
    out.append("</m:").append(name).append('>');
  }

  @Override
  public void symbol(Symbol symbol) {
    boolean upright = symbol.kind() == Kind.NAME && symbol.text().length() > 1;
    String text = symbol.kind() == Kind.SUM ? "∑" : symbol.text();
    out.append("<m:r>");
    if (upright) {
      out.append("<m:rPr><m:sty m:val=\"p\"/></m:rPr>");
    }
    String space = text.equals(",") || upright ? " " : "";
    out.append("<m:t xml:space=\"preserve\">").append(escaped(text)).append(space);
    out.append("</m:t></m:r>");
  }

  private static String escaped(String text) {
    return text.replace("&", "&amp;").replace("<", "&lt;").replace(">", "&gt;");
  }

  @Override
  public void fraction(Fraction fraction) {
    out.append("<m:f>");
    element("num", fraction.above());
    element("den", fraction.below());
    out.append("</m:f>");
  }

  @Override
  public void scripted(Scripted scripted) {
    boolean lowered = !scripted.lowered().isEmpty();
    boolean raised = !scripted.raised().isEmpty();
    String name = lowered && raised ? "sSubSup" : raised ? "sSup" : "sSub";
    out.append("<m:").append(name).append('>');
    element("e", scripted.base());
    if (lowered) {
      element("sub", scripted.lowered());
    }
    if (raised) {
      element("sup", scripted.raised());
    }
    out.append("</m:").append(name).append('>');
  }
}
