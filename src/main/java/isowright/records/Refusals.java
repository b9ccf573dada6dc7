package isowright.records;

import isowright.records.Remark.Severity;
import java.io.IOException;
import java.io.InputStream;
import java.nio.file.Files;
import java.nio.file.Path;
import java.security.MessageDigest;
import java.security.NoSuchAlgorithmException;
import java.util.List;
import java.util.Locale;

/** Files that cannot be read at all, each with what it is instead and what to do. */
final class Refusals {

  private Refusals() {}

  static RecordsRefused of(String code, String message) {
    return new RecordsRefused(List.of(new Remark(Severity.ERROR, code, message, List.of())));
  }

  /** Missing, a directory, or not allowed to be read. */
  static void ifNotReadable(Path file, Place place) throws RecordsRefused {
    if (Files.isDirectory(file)) {
      throw of(
          "not-a-file", "%s is a directory. Name the .csv or .xlsx file in it.".formatted(file));
    }
    if (!Files.exists(file)) {
      throw of(
          "no-such-file",
          "%s does not exist (looked for at %s). Correct records.file; its path is relative to the study file."
              .formatted(place.file(), file.toAbsolutePath().normalize()));
    }
    if (!Files.isReadable(file)) {
      throw of(
          "not-readable",
          "%s may not be read by the current user. Change its permissions."
              .formatted(place.file()));
    }
  }

  /** The kind of file, by its ending. */
  static Kind kind(Place place) throws RecordsRefused {
    String name = place.file().toLowerCase(Locale.ROOT);
    if (name.endsWith(".csv") || name.endsWith(".tsv") || name.endsWith(".txt")) {
      return Kind.CSV;
    }
    if (name.endsWith(".xlsx") || name.endsWith(".xlsm")) {
      return Kind.XLSX;
    }
    String remedy =
        name.matches(".*\\.(xls|xlsb|ods|numbers)")
            ? "Save it as .xlsx (Excel workbook) or .csv in the spreadsheet program."
            : "Save the records as .csv or .xlsx.";
    throw of(
        "unknown-kind-of-file", "%s is neither .csv nor .xlsx. %s".formatted(place.file(), remedy));
  }

  /** The kinds of file. */
  enum Kind {
    CSV,
    XLSX
  }

  /** Bytes that are no text, although the file is called .csv. */
  static void ifNotText(Place place, byte[] first) throws RecordsRefused {
    if (first.length == 0) {
      throw of(
          "empty-file", "%s is empty (0 bytes). Export the records again.".formatted(place.file()));
    }
    if (TextEncoding.startsWith(first, 'P', 'K', 3, 4)) {
      throw of(
          "workbook-called-csv",
          "%s is a workbook or another zip archive, not text. Give it the ending .xlsx, or save it as .csv."
              .formatted(place.file()));
    }
    if (TextEncoding.startsWith(first, 0xD0, 0xCF, 0x11, 0xE0)) {
      throw of(
          "workbook-called-csv",
          "%s is an old workbook (.xls), not text. Save it as .xlsx or .csv in the spreadsheet program."
              .formatted(place.file()));
    }
    if (TextEncoding.of(first).markBytes() == 0) {
      for (int i = 0; i < first.length; i++) {
        if (first[i] == 0) {
          throw of(
              "not-text",
              "%s holds a zero byte at place %d, so it is not text in UTF-8. Save it as CSV in UTF-8 (or in UTF-16 with a byte-order mark)."
                  .formatted(place.file(), i + 1));
        }
      }
    }
  }

  /** A file called .xlsx that is something else. */
  static void ifNotWorkbook(Path file, Place place) throws RecordsRefused, IOException {
    byte[] first;
    try (InputStream in = Files.newInputStream(file)) {
      first = in.readNBytes(8);
    }
    if (first.length == 0) {
      throw of(
          "empty-file", "%s is empty (0 bytes). Save the records again.".formatted(place.file()));
    }
    if (TextEncoding.startsWith(first, 0xD0, 0xCF, 0x11, 0xE0)) {
      throw of(
          "protected-or-old-workbook",
          "%s is either protected by a password or in the old .xls format under a new ending. Remove the password, or save it as .xlsx (Excel workbook) in the spreadsheet program."
              .formatted(place.file()));
    }
    if (!TextEncoding.startsWith(first, 'P', 'K')) {
      throw of(
          "not-a-workbook",
          "%s is not a workbook. If it is text, give it the ending .csv; otherwise save it as .xlsx in the spreadsheet program."
              .formatted(place.file()));
    }
  }

  /** The library's own words name its classes and parts of the archive, which help no reader. */
  static RecordsRefused damagedWorkbook(Place place) {
    return of(
        "damaged-workbook",
        "%s cannot be read as a workbook: the file is cut short, damaged, or of another kind. Open it in a spreadsheet program and save it again as .xlsx, or save the sheet as .csv."
            .formatted(place.file()));
  }

  static void ifNothingIn(Place place, String beginning, boolean whole) throws RecordsRefused {
    if (whole && beginning.isBlank()) {
      throw nothingIn(place);
    }
  }

  static RecordsRefused nothingIn(Place place) {
    return of(
        "no-headings",
        "%s holds no headings and no rows. Put the names of the columns in the first row and the records below."
            .formatted(place.words()));
  }

  static RecordsRefused noRows(Place place) {
    return of(
        "no-rows",
        "%s holds headings and no rows below them. Export the records again."
            .formatted(place.words()));
  }

  static RecordsRefused notInEncoding(Place place, TextEncoding encoding) {
    String found =
        encoding.markBytes() > 0
            ? "says by its byte-order mark that it is %s, and it is not"
                .formatted(encoding.charset().name())
            : "is text neither in UTF-8 nor in windows-1252";
    return of("encoding", "%s %s. Save it as CSV in UTF-8.".formatted(place.file(), found));
  }

  static RecordsRefused brokenCsv(Place place, int line) {
    return new RecordsRefused(
        List.of(
            new Remark(
                Severity.ERROR,
                "broken-quotes",
                "%s: a double quote in the record that begins in row %d is never closed, or is followed by more text. Close it before the next delimiter, or write it twice (\"\") if it belongs to the text."
                    .formatted(place.words(), line),
                List.of(line))));
  }

  static RecordsRefused ambiguousNumbers(Place place, char mark) {
    char other = mark == '.' ? ',' : '.';
    return of(
        "ambiguous-number-format",
        "%s: numbers such as 1%c234 may mean a little over one or over a thousand, and no other number in the file says which. Declare records.number-format, either {decimal: \"%c\"} or {decimal: \"%c\", group: \"%c\"}."
            .formatted(place.words(), mark, mark, other, mark));
  }

  /** A number format whose two marks are one, or whose mark is a digit. */
  static void ifContradictory(Place place, NumberFormat format) throws RecordsRefused {
    char group = format.group().orElse('_');
    if (format.decimal() == group
        || !isMark(format.decimal())
        || (format.group().isPresent() && !isMark(group))) {
      throw of(
          "number-format",
          "%s: records.number-format has decimal \"%c\"%s. The two must be different marks, neither a letter, a digit nor a sign, such as {decimal: \",\", group: \".\"}."
              .formatted(
                  place.words(),
                  format.decimal(),
                  format.group().map(g -> " and group \"" + g + "\"").orElse("")));
    }
  }

  private static boolean isMark(char c) {
    return !Character.isLetterOrDigit(c) && c != '-' && c != '+';
  }

  static RecordsRefused cannotRead(Place place, IOException e) {
    if (String.valueOf(e.getMessage()).contains("Zip bomb")) {
      return of(
          "unreasonable-archive",
          "%s unpacks to far more than a workbook does and was not read further. Save the sheet as .csv."
              .formatted(place.file()));
    }
    if (e instanceof java.util.zip.ZipException) {
      return damagedWorkbook(place);
    }
    return of(
        "not-readable",
        "%s cannot be read: %s. Check that the file is whole and that no other program holds it."
            .formatted(place.file(), e.getMessage() == null ? "input failed" : e.getMessage()));
  }

  static MessageDigest sha256() {
    try {
      return MessageDigest.getInstance("SHA-256");
    } catch (NoSuchAlgorithmException e) {
      throw new IllegalStateException("every Java platform has SHA-256", e);
    }
  }
}
