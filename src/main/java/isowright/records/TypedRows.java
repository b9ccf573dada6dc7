package isowright.records;

import isowright.records.Row.Found;
import isowright.records.Slot.Kind;
import java.time.LocalDateTime;
import java.time.LocalTime;
import java.util.List;
import java.util.Optional;

/**
 * Takes in the cells of a file and gives them their types: numbers in the declared or recognised
 * format, periods, plants. What cannot be typed is a fault of its cell; when the row ends, {@link
 * RowRules} decides what becomes of the row.
 */
final class TypedRows implements Intake {

  private final Slots slots;
  private final Kind[] kinds;
  private final NumberFormat format;
  private final NumberSyntax syntax;
  private final RowRules rules;
  private final TextCodes plants;
  private final Row row;
  private final Place place;

  private final boolean supposed;
  private final boolean workbook;

  private int[][] slotsOfColumn = {};
  private int columns;
  private boolean anyCell;
  private boolean cellTooMany;
  private boolean doubtful;
  private boolean pointSeen;
  private boolean pointCertain;

  private TypedRows(
      Place place,
      Slots slots,
      KeptRows kept,
      NumberFormat format,
      boolean supposed,
      boolean workbook) {
    this.place = place;
    this.slots = slots;
    this.kinds = slots.kinds();
    this.format = format;
    this.syntax = new NumberSyntax(format);
    this.supposed = supposed;
    this.workbook = workbook;
    this.rules = new RowRules(place, slots, kept);
    this.plants = rules.plants();
    this.row = new Row(slots.size());
  }

  /**
   * For a CSV file.
   *
   * @param supposed whether the format is only supposed, so that a number in another one stops the
   *     reading
   */
  static TypedRows ofCsv(
      Place place, Slots slots, KeptRows kept, NumberFormat format, boolean supposed) {
    return new TypedRows(place, slots, kept, format, supposed, false);
  }

  /** For a workbook, where a number is never text. */
  static TypedRows ofWorkbook(Place place, Slots slots, KeptRows kept) {
    return new TypedRows(place, slots, kept, new NumberFormat('.', Optional.empty()), false, true);
  }

  @Override
  public void headings(int fileRow, List<String> headings) throws RecordsRefused {
    slotsOfColumn = Headings.bind(place, fileRow, headings, slots);
    columns = headings.size();
  }

  @Override
  public void beginRow(int fileRow) {
    row.begin(fileRow);
    anyCell = false;
    cellTooMany = false;
  }

  @Override
  public void text(int column, char[] characters, int from, int length) {
    int start = firstInk(characters, from, from + length);
    int end = lastInk(characters, start, from + length);
    if (start == end) {
      return;
    }
    anyCell = true;
    if (column >= columns) {
      cellTooMany = !workbook;
      return;
    }
    for (int slot : slotsOfColumn[column]) {
      switch (kinds[slot]) {
        case PLANT -> row.putPlant(slot, plants.codeOf(characters, start, end - start));
        case PERIOD -> period(slot, characters, start, end - start);
        default -> number(slot, characters, start, end - start);
      }
    }
  }

  /** The first place that is not blank. */
  static int firstInk(char[] characters, int from, int to) {
    int start = from;
    while (start < to && isBlank(characters[start])) {
      start++;
    }
    return start;
  }

  /** The place after the last that is not blank. */
  static int lastInk(char[] characters, int from, int to) {
    int end = to;
    while (end > from && isBlank(characters[end - 1])) {
      end--;
    }
    return end;
  }

  private static boolean isBlank(char c) {
    return c <= ' ' || (c >= '\u0080' && (NumberSyntax.isSpace(c) || c == '\ufeff'));
  }

  private void number(int slot, char[] characters, int from, int length) {
    double value = syntax.parse(characters, from, length);
    if (workbook) {
      textForNumber(slot, value, new String(characters, from, length));
    } else if (Double.isFinite(value)) {
      row.put(slot, value);
      if (supposed && !pointCertain) {
        weigh(NumberEvidence.shape(characters, from, length));
      }
    } else {
      faultyNumber(slot, value, characters, from, length);
    }
  }

  private void textForNumber(int slot, double value, String text) {
    Slot declared = slots.get(slot);
    row.fault(
        slot,
        () ->
            new Found(
                text,
                Double.isNaN(value)
                    ? CellFault.notNumber(text, declared, format)
                    : CellFault.numberStoredAsText()));
  }

  private void faultyNumber(int slot, double value, char[] characters, int from, int length) {
    if (supposed
        && Double.isNaN(value)
        && NumberEvidence.shape(characters, from, length) != NumberEvidence.Shape.NO_NUMBER) {
      doubtful = true;
    }
    Slot declared = slots.get(slot);
    String text = rules.full() ? "" : new String(characters, from, length);
    if (Double.isNaN(value)) {
      row.fault(slot, () -> new Found(text, CellFault.notNumber(text, declared, format)));
    } else {
      row.fault(slot, () -> new Found(text, CellFault.notFinite(declared)));
    }
  }

  private void weigh(NumberEvidence.Shape shape) {
    pointSeen |= shape == NumberEvidence.Shape.POINT_OR_GROUP;
    pointCertain |= shape == NumberEvidence.Shape.DECIMAL_POINT;
  }

  private void period(int slot, char[] characters, int from, int length) {
    long key = Periods.parse(characters, from, length);
    if (key != Periods.NONE) {
      row.putPeriod(slot, key);
      return;
    }
    String text = rules.full() ? "" : new String(characters, from, length);
    row.fault(slot, () -> new Found(text, CellFault.notPeriod(text)));
  }

  @Override
  public void number(int column, double value, AsSeen asSeen) {
    anyCell = true;
    if (column >= columns) {
      return;
    }
    for (int slot : slotsOfColumn[column]) {
      switch (kinds[slot]) {
        case PLANT -> row.putPlant(slot, plants.codeOf(asSeen.text().strip()));
        case PERIOD -> {
          // A whole number below 2^53 is shown without decimals, whatever the cell's format.
          String text =
              value == Math.rint(value) ? Long.toString((long) value) : Double.toString(value);
          period(slot, text.toCharArray(), 0, text.length());
        }
        default -> {
          Slot declared = slots.get(slot);
          if (Double.isFinite(value)) {
            row.put(slot, value);
          } else {
            row.fault(slot, () -> new Found(Double.toString(value), CellFault.notFinite(declared)));
          }
        }
      }
    }
  }

  @Override
  public void date(int column, LocalDateTime date) {
    anyCell = true;
    if (column >= columns) {
      return;
    }
    boolean day = date.toLocalTime().equals(LocalTime.MIDNIGHT);
    String shown = day ? date.toLocalDate().toString() : date.toString();
    for (int slot : slotsOfColumn[column]) {
      switch (kinds[slot]) {
        case PLANT -> row.putPlant(slot, plants.codeOf(shown));
        case PERIOD -> period(slot, shown.toCharArray(), 0, shown.length());
        default -> row.fault(slot, () -> new Found(shown, CellFault.dateForNumber()));
      }
    }
  }

  @Override
  public void odd(int column, Oddity oddity, String shown) {
    anyCell = true;
    if (column >= columns) {
      return;
    }
    for (int slot : slotsOfColumn[column]) {
      Slot declared = slots.get(slot);
      row.fault(slot, () -> new Found(shown, CellFault.of(oddity, declared)));
    }
  }

  @Override
  public void endRow(int cells) {
    if (!anyCell) {
      return;
    }
    if (cells < columns || cellTooMany) {
      rules.ragged(row, cells, columns);
    } else {
      rules.endRow(row);
    }
  }

  @Override
  public boolean wantsMore() {
    return !doubtful;
  }

  /** What became of the rows. */
  RowRules rules() {
    return rules;
  }

  /** Whether a number was met that is written in another format than supposed. */
  boolean doubtful() {
    return doubtful;
  }

  /** Whether every mark met may as well stand between groups of three digits. */
  boolean ambiguous() {
    return pointSeen && !pointCertain;
  }
}
