package isowright.records;

import java.io.IOException;

/** Reads a workbook. */
final class XlsxReading {
  private XlsxReading() {}

  static Reading read(
      Source source, Place place, Roles roles, Slots slots, KeptRows kept, Money money)
      throws RecordsRefused, IOException {
    throw Refusals.of("workbook", place.file() + ": workbooks are not read yet.");
  }
}
