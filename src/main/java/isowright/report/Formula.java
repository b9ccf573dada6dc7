package isowright.report;

import java.util.ArrayList;
import java.util.List;

/**
 * A formula as a tree, so that every format can set it in its own way.
 *
 * <p>Written in a line notation: letters are symbols, two or more ASCII letters are the name of a
 * function or a unit, {@code _} and {@code ^} lower and raise the next symbol or braced group,
 * {@code {a}/{b}} is a fraction, anything else stands for itself. {@code ln Q = α + Σ_i β_i z_i}.
 *
 * @param notation the line notation, which is also the formula's text alternative
 * @param parts the formula
 */
public record Formula(String notation, List<Part> parts) {

  /** Copies the list. */
  public Formula {
    parts = List.copyOf(parts);
  }

  /** A part of a formula. */
  public sealed interface Part permits Symbol, Fraction, Scripted {
    /** Hands this part to the reader's matching method. */
    void tell(Reader reader);
  }

  /** What a symbol is. */
  public enum Kind {
    /** A quantity, set in italics, or the name of a function, set upright. */
    NAME,
    /** A number. */
    NUMBER,
    /** A sign, a bracket. */
    SIGN,
    /** A sum sign, over which an index runs. */
    SUM
  }

  /** A single symbol. */
  public record Symbol(String text, Kind kind) implements Part {
    @Override
    public void tell(Reader reader) {
      reader.symbol(this);
    }
  }

  /** A fraction. */
  public record Fraction(List<Part> above, List<Part> below) implements Part {
    /** Copies the lists. */
    public Fraction {
      above = List.copyOf(above);
      below = List.copyOf(below);
    }

    @Override
    public void tell(Reader reader) {
      reader.fraction(this);
    }
  }

  /** Something with a lowered and a raised part, either of which may be empty. */
  public record Scripted(List<Part> base, List<Part> lowered, List<Part> raised) implements Part {
    /** Copies the lists. */
    public Scripted {
      base = List.copyOf(base);
      lowered = List.copyOf(lowered);
      raised = List.copyOf(raised);
    }

    @Override
    public void tell(Reader reader) {
      reader.scripted(this);
    }
  }

  /** Is told every part in turn. */
  public interface Reader {
    /** A symbol. */
    void symbol(Symbol symbol);

    /** A fraction. */
    void fraction(Fraction fraction);

    /** Something with scripts. */
    void scripted(Scripted scripted);
  }

  /**
   * Reads the line notation.
   *
   * @throws IllegalArgumentException if braces are not closed or a script has nothing to stand on
   */
  public static Formula of(String notation) {
    Notation reader = new Notation(notation);
    List<Part> parts = reader.group();
    if (!reader.ended()) {
      throw new IllegalArgumentException("unmatched brace in formula " + notation);
    }
    return new Formula(notation, parts);
  }

  /** Reads the notation from left to right. */
  private static final class Notation {
    private final String text;
    private int at = 0;

    Notation(String text) {
      this.text = text;
    }

    boolean ended() {
      return at >= text.length();
    }

    /** Parts up to the end or a closing brace. */
    List<Part> group() {
      List<Part> parts = new ArrayList<>();
      while (!ended() && text.charAt(at) != '}') {
        if (text.charAt(at) == ' ') {
          at++;
        } else {
          parts.addAll(scripted());
        }
      }
      return parts;
    }

    private List<Part> scripted() {
      boolean braced = text.charAt(at) == '{';
      List<Part> base = atom();
      if (braced && text.startsWith("/{", at)) {
        at++;
        base = List.of(new Fraction(base, atom()));
      }
      List<Part> lowered = script('_');
      List<Part> raised = script('^');
      return lowered.isEmpty() && raised.isEmpty()
          ? base
          : List.of(new Scripted(base, lowered, raised));
    }

    private List<Part> script(char sign) {
      if (ended() || text.charAt(at) != sign) {
        return List.of();
      }
      at++;
      return atom();
    }

    private List<Part> atom() {
      if (ended()) {
        throw new IllegalArgumentException("formula ends too early: " + text);
      }
      char c = text.charAt(at);
      if (c == '{') {
        at++;
        List<Part> inside = group();
        if (ended()) {
          throw new IllegalArgumentException("unmatched brace in formula " + text);
        }
        at++;
        return inside;
      }
      if (c >= '0' && c <= '9') {
        return List.of(new Symbol(run(Notation::ofNumber), Kind.NUMBER));
      }
      if (asciiLetter(c)) {
        return List.of(new Symbol(run(Notation::asciiLetter), Kind.NAME));
      }
      at++;
      Kind kind = c == 'Σ' ? Kind.SUM : Character.isLetter(c) || c == '′' ? Kind.NAME : Kind.SIGN;
      return List.of(new Symbol(String.valueOf(c), kind));
    }

    private String run(java.util.function.IntPredicate belongs) {
      int from = at;
      while (!ended() && belongs.test(text.charAt(at))) {
        at++;
      }
      return text.substring(from, at);
    }

    private static boolean ofNumber(int c) {
      return (c >= '0' && c <= '9') || c == '.';
    }

    private static boolean asciiLetter(int c) {
      return (c >= 'a' && c <= 'z') || (c >= 'A' && c <= 'Z');
    }
  }
}
