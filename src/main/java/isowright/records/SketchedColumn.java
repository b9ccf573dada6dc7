package isowright.records;

import java.util.List;
import java.util.Optional;

/**
 * What a column of a file holds, seen without any declaration.
 *
 * @param heading its heading, may be empty
 * @param position its place in the file, from 1
 * @param content what its cells are
 * @param present cells that are not blank
 * @param blank blank cells
 * @param distinct different values, counted up to {@link #MOST_DISTINCT}
 * @param least the least number, where the cells are numbers
 * @param most the greatest number, where the cells are numbers
 * @param examples the first few different values, as in the file
 * @param strange the first few values that are not what the others are, as in the file
 */
public record SketchedColumn(
    String heading,
    int position,
    Content content,
    int present,
    int blank,
    int distinct,
    Optional<Double> least,
    Optional<Double> most,
    List<String> examples,
    List<String> strange) {

  /** Different values are counted up to here; what has more is no name of a plant or period. */
  public static final int MOST_DISTINCT = 10_000;

  /** Copies the lists. */
  public SketchedColumn {
    examples = List.copyOf(examples);
    strange = List.copyOf(strange);
  }

  /** What the cells of a column are; a column is called what nine tenths of its cells are. */
  public enum Content {
    /** Whole numbers. */
    INTEGERS("whole numbers"),
    /** Numbers. */
    NUMBERS("numbers"),
    /** Dates or months (ISO 8601). */
    DATES("dates"),
    /** Text. */
    TEXT("text"),
    /** Some of this and some of that. */
    MIXED("numbers and text mixed"),
    /** Nothing but blanks. */
    EMPTY("nothing");

    private final String words;

    Content(String words) {
      this.words = words;
    }

    /** What the cells are, in words. */
    public String words() {
      return words;
    }

    /** Whether the cells are numbers, whole or not. */
    public boolean numeric() {
      return this == INTEGERS || this == NUMBERS;
    }
  }

  /** Whether some value stands in more than one row. */
  public boolean repeats() {
    return distinct < present;
  }

  /** The column in a few words, such as "240 numbers from 12.5 to 4500, 3 blank". */
  public String words() {
    StringBuilder words = new StringBuilder();
    if (content == Content.EMPTY) {
      words.append("nothing");
    } else {
      words.append(Shown.count(present)).append(' ').append(cells());
    }
    if (content.numeric()) {
      words
          .append(" from ")
          .append(least.map(Shown::value).orElse("?"))
          .append(" to ")
          .append(most.map(Shown::value).orElse("?"));
    } else if (content != Content.EMPTY) {
      words
          .append(", ")
          .append(distinct >= MOST_DISTINCT ? "at least " : "")
          .append(Shown.count(distinct))
          .append(" different");
    }
    return words + (blank > 0 ? ", " + Shown.count(blank) + " blank" : "");
  }

  private String cells() {
    return content == Content.TEXT ? "cells of text" : content.words();
  }
}
