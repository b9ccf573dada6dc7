package isowright.records;

import java.io.IOException;

/**
 * Reads plant records from a file into a {@link Panel}.
 *
 * <p>A CSV file (.csv, .tsv, .txt) is decoded strictly: UTF-8, UTF-16 with a byte-order mark, or
 * windows-1252 where the bytes are not UTF-8. Delimiter and decimal mark are recognised and stated
 * in {@link Reading#facts}; a declared {@link NumberFormat} wins. Of a workbook (.xlsx) one sheet
 * is read, cell by cell as stored: formulas by their stored value.
 *
 * <p>The first row with any text holds the headings. A blank cell is a missing value. Rows are
 * numbered as the user sees them: by line in a CSV file (a record is named by the line on which it
 * begins), by row in a sheet.
 *
 * <p>What becomes of a row is stated by reason in {@link Reading#setAside}: rows outside {@link
 * Keep}, rows with a blank plant, period, output, quantity or control, and rows with a quantity of
 * an input that is zero or negative are set aside. A blank price, spending, deflator or filed cost
 * stays unknown (NaN) and the row is used.
 *
 * <p>Errors are gathered over the whole file and thrown together: cells that are not what their
 * column must hold; output, price, deflator, filed cost or logged control that is not positive; two
 * rows for the same plant and period.
 *
 * <p>Money (price, spending, filed cost) is multiplied by deflator(base) / deflator(row), where
 * deflator(base) is the mean of the deflator over the rows of the base period. Where spending but
 * no price is declared, price = spending / quantity.
 */
public final class RecordsReader {

  private RecordsReader() {}

  /**
   * Reads a file.
   *
   * @param source the file
   * @param roles what its columns are
   * @param keep which rows are kept
   * @return the panel, with how the file was read and what is worth saying about it
   * @throws RecordsRefused with every reason why the records cannot be used as asked
   */
  public static Reading read(Source source, Roles roles, Keep keep) throws RecordsRefused {
    Place place = Place.of(source);
    Refusals.ifNotReadable(source.file(), place);
    Refusals.Kind kind = Refusals.kind(place);
    Slots slots = new Slots(roles);
    KeptRows kept = KeptRows.of(place, keep, roles);
    Money money = Money.of(place, roles);
    try {
      return switch (kind) {
        case CSV -> CsvReading.read(source, place, roles, slots, kept, money);
        case XLSX -> XlsxReading.read(source, place, roles, slots, kept, money);
      };
    } catch (IOException e) {
      throw Refusals.cannotRead(place, e);
    }
  }

  /** What a mark is called in messages. */
  static String markWords(char mark) {
    return switch (mark) {
      case '.' -> "point";
      case ',' -> "comma";
      case ' ' -> "space";
      case '\'', '’' -> "apostrophe";
      default -> "\"" + mark + "\"";
    };
  }
}
