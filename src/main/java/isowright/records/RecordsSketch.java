package isowright.records;

import java.io.IOException;
import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * What a records file holds, seen without any declaration: the start of a study file. Nothing here
 * is used in a study; roles are declared by the user.
 *
 * @param file the file's name
 * @param rows the rows, headings not counted
 * @param facts how the file was read, in the order to print
 * @param sheets the sheets of a workbook, in order; empty for a CSV file
 * @param numberFormat how the numbers of a CSV file are written, where that can be told
 * @param columns what each column holds, in the order of the file
 * @param proposal what the columns may be
 */
public record RecordsSketch(
    String file,
    int rows,
    Map<String, String> facts,
    List<String> sheets,
    Optional<NumberFormat> numberFormat,
    List<SketchedColumn> columns,
    Proposal proposal) {

  private static final NumberFormat PLAIN = new NumberFormat('.', Optional.empty());

  /** Copies the lists. */
  public RecordsSketch {
    sheets = List.copyOf(sheets);
    columns = List.copyOf(columns);
  }

  /**
   * Looks at a file.
   *
   * @throws RecordsRefused where it cannot be read at all
   */
  public static RecordsSketch of(Source source) throws RecordsRefused {
    Place place = Place.of(source);
    Refusals.ifNotReadable(source.file(), place);
    Refusals.Kind kind = Refusals.kind(place);
    try {
      return switch (kind) {
        case CSV -> ofCsv(source, place);
        case XLSX -> ofWorkbook(source, place);
      };
    } catch (IOException e) {
      throw Refusals.cannotRead(place, e);
    }
  }

  private static RecordsSketch ofCsv(Source source, Place place)
      throws RecordsRefused, IOException {
    CsvRecords records = new CsvRecords(source, place, java.util.Set.of());
    NumberFormat supposed = source.numberFormat().orElse(PLAIN);
    SketchIntake seen = records.read(() -> new SketchIntake(supposed));
    Optional<NumberFormat> format = source.numberFormat().or(seen::format);
    if (format.isPresent() && !format.get().equals(supposed)) {
      NumberFormat recognised = format.get();
      seen = records.read(() -> new SketchIntake(recognised));
    }
    Map<String, String> facts = new LinkedHashMap<>();
    records.facts(facts);
    facts.put(
        "decimal mark",
        format
            .map(f -> RecordsReader.markWords(f.decimal()) + " (recognised)")
            .orElse("cannot be told; a point was assumed"));
    return sketch(place, facts, List.of(), format, seen);
  }

  private static RecordsSketch ofWorkbook(Source source, Place place)
      throws RecordsRefused, IOException {
    try (XlsxRecords records = new XlsxRecords(source, place)) {
      SketchIntake seen = records.read(new SketchIntake(PLAIN));
      Map<String, String> facts = new LinkedHashMap<>();
      records.facts(facts);
      return sketch(place, facts, records.sheets(), Optional.empty(), seen);
    }
  }

  private static RecordsSketch sketch(
      Place place,
      Map<String, String> facts,
      List<String> sheets,
      Optional<NumberFormat> format,
      SketchIntake seen) {
    List<SketchedColumn> columns = seen.columns();
    return new RecordsSketch(
        place.file(),
        seen.rows(),
        Collections.unmodifiableMap(facts),
        sheets,
        format,
        columns,
        Proposal.of(columns));
  }
}
