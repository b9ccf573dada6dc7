package isowright.records;

import java.time.LocalDateTime;
import java.util.List;
import java.util.Optional;

/** Takes in a CSV file only to weigh how the numbers in its numeric columns are written. */
final class NumberSurvey implements Intake {

  private final Place place;
  private final Slots slots;
  private final NumberEvidence evidence;
  private int[][] slotsOfColumn = {};

  NumberSurvey(Place place, Slots slots) {
    this.place = place;
    this.slots = slots;
    this.evidence = new NumberEvidence(slots.size());
  }

  @Override
  public void headings(int fileRow, List<String> headings) throws RecordsRefused {
    slotsOfColumn = Headings.bind(place, fileRow, headings, slots);
  }

  @Override
  public void beginRow(int fileRow) {}

  @Override
  public void text(int column, char[] characters, int from, int length) {
    if (column >= slotsOfColumn.length) {
      return;
    }
    for (int slot : slotsOfColumn[column]) {
      if (slots.get(slot).kind().numeric()) {
        int start = TypedRows.firstInk(characters, from, from + length);
        int end = TypedRows.lastInk(characters, start, from + length);
        evidence.weigh(slot, characters, start, end - start);
      }
    }
  }

  @Override
  public void number(int column, double value, AsSeen asSeen) {}

  @Override
  public void date(int column, LocalDateTime date) {}

  @Override
  public void odd(int column, Oddity oddity, String shown) {}

  @Override
  public void endRow(int cells) {}

  /** The format of the numbers, absent where nothing says which mark is the decimal mark. */
  Optional<NumberFormat> format() {
    return evidence.format();
  }

  char ambiguousMark() {
    return evidence.ambiguousMark();
  }
}
