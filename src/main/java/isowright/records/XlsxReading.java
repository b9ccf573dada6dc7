package isowright.records;

import java.io.IOException;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;

/** Reads a sheet of a workbook. */
final class XlsxReading {

  private XlsxReading() {}

  static Reading read(
      Source source, Place place, Roles roles, Slots slots, KeptRows kept, Money money)
      throws RecordsRefused, IOException {
    try (XlsxRecords records = new XlsxRecords(source, place)) {
      Place sheet = place.onSheet(records.sheet());
      TypedRows typed = records.read(TypedRows.ofWorkbook(sheet, slots, kept));
      Map<String, String> facts = new LinkedHashMap<>();
      records.facts(facts);
      return Conclusion.of(
          sheet, roles, slots, money, typed.rules(), records.sha256(), facts, List.of());
    }
  }
}
