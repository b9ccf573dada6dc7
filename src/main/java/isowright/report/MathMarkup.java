package isowright.report;

import isowright.report.Formula.Fraction;
import isowright.report.Formula.Kind;
import isowright.report.Formula.Part;
import isowright.report.Formula.Scripted;
import isowright.report.Formula.Symbol;
import java.util.List;

/** Formulas as MathML, which browsers set without a script. */
final class MathMarkup implements Formula.Reader {

  private static final String NAMESPACE = "http://www.w3.org/1998/Math/MathML";

  private final Markup out;

  private MathMarkup(Markup out) {
    this.out = out;
  }

  /** Writes a formula, on a line of its own or within one. */
  static void write(Markup out, Formula formula, boolean display) {
    out.open(
        "math",
        "xmlns",
        NAMESPACE,
        "display",
        display ? "block" : "inline",
        "alttext",
        formula.notation());
    new MathMarkup(out).row(formula.parts());
    out.close("math");
  }

  private void row(List<Part> parts) {
    if (parts.size() == 1) {
      parts.get(0).tell(this);
      return;
    }
    out.open("mrow");
    parts.forEach(part -> part.tell(this));
    out.close("mrow");
  }

  @Override
  public void symbol(Symbol symbol) {
    switch (symbol.kind()) {
      case NAME -> out.element("mi", symbol.text());
      case NUMBER -> out.element("mn", symbol.text());
      case SUM -> out.element("mo", "∑");
      case SIGN -> sign(symbol.text());
    }
  }

  private void sign(String sign) {
    if (sign.equals(",")) {
      out.element("mo", ",", "separator", "true");
      out.empty("mspace", "width", "1em");
    } else {
      out.element("mo", sign);
    }
  }

  @Override
  public void fraction(Fraction fraction) {
    out.open("mfrac");
    row(fraction.above());
    row(fraction.below());
    out.close("mfrac");
  }

  @Override
  public void scripted(Scripted scripted) {
    boolean sum =
        scripted.base().size() == 1
            && scripted.base().get(0) instanceof Symbol symbol
            && (symbol.kind() == Kind.SUM || symbol.text().equals("min"));
    boolean lowered = !scripted.lowered().isEmpty();
    boolean raised = !scripted.raised().isEmpty();
    String element = lowered && raised ? "msubsup" : raised ? "msup" : sum ? "munder" : "msub";
    out.open(element);
    row(scripted.base());
    if (lowered) {
      row(scripted.lowered());
    }
    if (raised) {
      row(scripted.raised());
    }
    out.close(element);
  }
}
