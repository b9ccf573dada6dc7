package isowright.records;

import de.siegmar.fastcsv.reader.CsvParseException;
import de.siegmar.fastcsv.reader.CsvReader;
import de.siegmar.fastcsv.reader.CsvRecord;
import de.siegmar.fastcsv.reader.FieldMismatchStrategy;
import java.util.ArrayList;
import java.util.List;
import java.util.Set;

/**
 * Recognises the delimiter of a CSV file from its beginning: the one by which most of the expected
 * headings are found; if that does not decide, the one by which most rows have as many cells as
 * there are headings, and then the one that makes most cells.
 */
final class Delimiters {

  private static final char[] CANDIDATES = {',', ';', '\t', '|'};
  private static final int ROWS_LOOKED_AT = 50;

  private Delimiters() {}

  /** The delimiter of the text of which this is the beginning. */
  static char recognise(String beginning, Set<String> expectedHeadings) {
    char best = CANDIDATES[0];
    long bestScore = -1;
    for (char candidate : CANDIDATES) {
      long score = score(beginning, candidate, expectedHeadings);
      if (score > bestScore) {
        best = candidate;
        bestScore = score;
      }
    }
    return best;
  }

  private static long score(String beginning, char delimiter, Set<String> expected) {
    List<CsvRecord> records = new ArrayList<>();
    try (CsvReader<CsvRecord> reader =
        CsvReader.builder()
            .fieldSeparator(delimiter)
            .extraFieldStrategy(FieldMismatchStrategy.IGNORE)
            .missingFieldStrategy(FieldMismatchStrategy.IGNORE)
            .ofCsvRecord(beginning)) {
      for (CsvRecord record : reader) {
        records.add(record);
        if (records.size() > ROWS_LOOKED_AT) {
          break;
        }
      }
    } catch (CsvParseException | java.io.IOException e) {
      // A wrong delimiter may leave characters after a closing quote: judge by what was read.
    }
    if (records.isEmpty()) {
      return 0;
    }
    List<String> headings = records.get(0).getFields();
    long found = headings.stream().map(String::strip).filter(expected::contains).count();
    int cells = headings.size();
    long alike = records.stream().skip(1).filter(r -> r.getFieldCount() == cells).count();
    long share = cells > 1 ? 100 * (alike + 1) / records.size() : 0;
    return found * 100_000_000L + share * 100_000L + Math.min(cells, 99_999);
  }

  static String words(char delimiter) {
    return switch (delimiter) {
      case ',' -> "comma";
      case ';' -> "semicolon";
      case '\t' -> "tab";
      case '|' -> "vertical bar";
      default -> "\"" + delimiter + "\"";
    };
  }
}
