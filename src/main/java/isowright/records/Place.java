package isowright.records;

import java.util.Optional;

/**
 * Where in a records file something stands, in words.
 *
 * @param file the file's name
 * @param sheet the sheet, in a workbook
 */
record Place(String file, Optional<String> sheet) {

  /** The place of a source; of a workbook only once its sheet is known. */
  static Place of(Source source) {
    return new Place(String.valueOf(source.file().getFileName()), Optional.empty());
  }

  Place onSheet(String name) {
    return new Place(file, Optional.of(name));
  }

  /** The file and, in a workbook, the sheet. */
  String words() {
    return file + sheet.map(s -> ", sheet \"" + s + "\"").orElse("");
  }

  /** The file and a row. */
  String row(int row) {
    return words() + ", row " + row;
  }
}
