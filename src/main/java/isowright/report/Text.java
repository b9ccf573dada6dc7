package isowright.report;

import java.util.ArrayList;
import java.util.List;
import java.util.stream.Collectors;

/**
 * Words in a line, some of them set apart. Plain characters throughout: a renderer escapes what its
 * format needs.
 *
 * @param spans the words in order
 */
public record Text(List<Span> spans) {

  /** Copies the list. */
  public Text {
    spans = List.copyOf(spans);
  }

  /** A run of words set in one way. */
  public sealed interface Span permits Words, Mathematics, Reference {
    /** Hands this span to the reader's matching method. */
    void tell(Reader reader);
  }

  /** How words are set. */
  public enum Manner {
    /** As the rest. */
    PLAIN,
    /** Of weight. */
    STRONG,
    /** A title or a symbol's name. */
    EMPHASIS,
    /** As typed: a key, a file name, a hash. */
    TYPED
  }

  /**
   * Words.
   *
   * @param words the words
   * @param manner how they are set
   */
  public record Words(String words, Manner manner) implements Span {
    @Override
    public void tell(Reader reader) {
      reader.words(this);
    }
  }

  /**
   * A formula within a line.
   *
   * @param formula the formula
   */
  public record Mathematics(Formula formula) implements Span {
    @Override
    public void tell(Reader reader) {
      reader.mathematics(this);
    }
  }

  /**
   * A pointer to a section of the same document.
   *
   * @param words the words to follow
   * @param section the section's identifier
   */
  public record Reference(String words, String section) implements Span {
    @Override
    public void tell(Reader reader) {
      reader.reference(this);
    }
  }

  /** Is told every span in turn. */
  public interface Reader {
    /** Words. */
    void words(Words span);

    /** A formula. */
    void mathematics(Mathematics span);

    /** A pointer. */
    void reference(Reference span);
  }

  /** Plain words. */
  public static Text of(String words) {
    return new Text(List.of(new Words(words, Manner.PLAIN)));
  }

  /** Words as typed. */
  public static Text typed(String words) {
    return new Text(List.of(new Words(words, Manner.TYPED)));
  }

  /** Words of weight. */
  public static Text strong(String words) {
    return new Text(List.of(new Words(words, Manner.STRONG)));
  }

  /** A formula in the notation of {@link Formula#of}. */
  public static Text formula(String notation) {
    return new Text(List.of(new Mathematics(Formula.of(notation))));
  }

  /** These words, then more plain ones. */
  public Text then(String words) {
    return with(new Words(words, Manner.PLAIN));
  }

  /** These words, then others of weight. */
  public Text thenStrong(String words) {
    return with(new Words(words, Manner.STRONG));
  }

  /** These words, then others in emphasis. */
  public Text thenEmphasis(String words) {
    return with(new Words(words, Manner.EMPHASIS));
  }

  /** These words, then others as typed. */
  public Text thenTyped(String words) {
    return with(new Words(words, Manner.TYPED));
  }

  /** These words, then a formula in the notation of {@link Formula#of}. */
  public Text thenFormula(String notation) {
    return with(new Mathematics(Formula.of(notation)));
  }

  /** These words, then a pointer to a section. */
  public Text thenReference(String words, String section) {
    return with(new Reference(words, section));
  }

  /** Whether there is nothing to read. */
  public boolean isEmpty() {
    return plain().isBlank();
  }

  /** The bare words. */
  public String plain() {
    return spans.stream()
        .map(
            span -> {
              if (span instanceof Words w) {
                return w.words();
              }
              if (span instanceof Reference r) {
                return r.words();
              }
              return ((Mathematics) span).formula().notation();
            })
        .collect(Collectors.joining());
  }

  private Text with(Span span) {
    List<Span> longer = new ArrayList<>(spans);
    longer.add(span);
    return new Text(longer);
  }
}
