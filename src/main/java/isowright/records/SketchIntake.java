package isowright.records;

import isowright.records.SketchedColumn.Content;
import java.time.LocalDateTime;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Optional;
import java.util.Set;

/** Takes in every column of a file to see what it holds. */
final class SketchIntake implements Intake {

  private static final int EXAMPLES = 3;
  private static final int LONGEST_VALUE = 200;

  /** A column is called what this share of its cells are; the rest are strange. */
  private static final double MOST_CELLS = 0.9;

  private final NumberSyntax syntax;
  private final List<Tally> tallies = new ArrayList<>();
  private Optional<NumberEvidence> evidence = Optional.empty();
  private int rows;
  private boolean anyCell;

  /** What has been seen of one column. */
  private static final class Tally {
    private final String heading;
    private final Set<String> distinct = new HashSet<>();
    private final Set<String> examples = new LinkedHashSet<>();
    private final Set<String> texts = new LinkedHashSet<>();
    private final Set<String> numerals = new LinkedHashSet<>();
    private int integers;
    private int numbers;
    private int dates;
    private int text;
    private double least = Double.POSITIVE_INFINITY;
    private double most = Double.NEGATIVE_INFINITY;

    Tally(String heading) {
      this.heading = heading;
    }

    void see(String shown) {
      if (distinct.size() < SketchedColumn.MOST_DISTINCT) {
        distinct.add(shown);
      }
      note(examples, shown);
    }

    private static void note(Set<String> few, String shown) {
      if (few.size() < EXAMPLES) {
        few.add(Shown.shortened(shown));
      }
    }
  }

  SketchIntake(NumberFormat format) {
    syntax = new NumberSyntax(format);
  }

  @Override
  public void headings(int fileRow, List<String> headings) {
    headings.forEach(h -> tallies.add(new Tally(h)));
    evidence = Optional.of(new NumberEvidence(headings.size()));
  }

  @Override
  public void beginRow(int fileRow) {
    anyCell = false;
  }

  @Override
  public void text(int column, char[] characters, int from, int length) {
    int start = TypedRows.firstInk(characters, from, from + length);
    int end = TypedRows.lastInk(characters, start, from + length);
    if (start == end || column >= tallies.size()) {
      return;
    }
    anyCell = true;
    Tally tally = tallies.get(column);
    String shown = new String(characters, start, Math.min(end - start, LONGEST_VALUE));
    tally.see(shown);
    long period = Periods.parse(characters, start, end - start);
    if (period != Periods.NONE && Periods.kind(period) != Periods.INTEGER) {
      tally.dates++;
      return;
    }
    evidence.ifPresent(e -> e.weigh(column, characters, start, end - start));
    double value = syntax.parse(characters, start, end - start);
    // 00123 is a name: a number is not written with a zero in front.
    boolean name = end - start > 1 && characters[start] == '0' && isDigit(characters[start + 1]);
    if (Double.isFinite(value) && !name) {
      number(tally, value, shown);
    } else {
      tally.text++;
      Tally.note(tally.texts, shown);
    }
  }

  private static boolean isDigit(char c) {
    return c >= '0' && c <= '9';
  }

  private static void number(Tally tally, double value, String shown) {
    tally.numbers++;
    tally.integers += value == Math.rint(value) ? 1 : 0;
    tally.least = Math.min(tally.least, value);
    tally.most = Math.max(tally.most, value);
    Tally.note(tally.numerals, shown);
  }

  @Override
  public void number(int column, double value, AsSeen asSeen) {
    anyCell = true;
    if (column < tallies.size()) {
      String shown = asSeen.text();
      tallies.get(column).see(shown);
      if (Double.isFinite(value)) {
        number(tallies.get(column), value, shown);
      }
    }
  }

  @Override
  public void date(int column, LocalDateTime date) {
    anyCell = true;
    if (column < tallies.size()) {
      tallies.get(column).see(date.toLocalDate().toString());
      tallies.get(column).dates++;
    }
  }

  @Override
  public void odd(int column, Oddity oddity, String shown) {
    anyCell = true;
    if (column < tallies.size()) {
      tallies.get(column).see(shown);
      tallies.get(column).text++;
      Tally.note(tallies.get(column).texts, shown);
    }
  }

  @Override
  public void endRow(int cells) {
    rows += anyCell ? 1 : 0;
  }

  /** The rows with any cell. */
  int rows() {
    return rows;
  }

  /** The format in which the numbers are written, where that can be told. */
  Optional<NumberFormat> format() {
    return evidence.flatMap(NumberEvidence::format);
  }

  /** What each column holds. */
  List<SketchedColumn> columns() {
    List<SketchedColumn> columns = new ArrayList<>();
    for (Tally tally : tallies) {
      Content content = content(tally);
      int present = tally.numbers + tally.dates + tally.text;
      boolean numbers = tally.numbers > 0;
      columns.add(
          new SketchedColumn(
              tally.heading,
              columns.size() + 1,
              content,
              present,
              rows - present,
              tally.distinct.size(),
              numbers ? Optional.of(tally.least) : Optional.empty(),
              numbers ? Optional.of(tally.most) : Optional.empty(),
              List.copyOf(tally.examples),
              strange(tally, content)));
    }
    return columns;
  }

  private static Content content(Tally tally) {
    int present = tally.numbers + tally.dates + tally.text;
    if (present == 0) {
      return Content.EMPTY;
    }
    double enough = MOST_CELLS * present;
    if (tally.dates >= enough) {
      return Content.DATES;
    }
    if (tally.text >= enough) {
      return Content.TEXT;
    }
    if (tally.numbers >= enough) {
      return tally.integers == tally.numbers ? Content.INTEGERS : Content.NUMBERS;
    }
    return Content.MIXED;
  }

  private static List<String> strange(Tally tally, Content content) {
    return switch (content) {
      case INTEGERS, NUMBERS, DATES -> List.copyOf(tally.texts);
      case TEXT, MIXED -> List.copyOf(tally.numerals);
      case EMPTY -> List.of();
    };
  }
}
