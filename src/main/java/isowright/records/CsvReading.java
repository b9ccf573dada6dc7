package isowright.records;

import isowright.records.Remark.Severity;
import java.io.IOException;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * Reads a CSV file: once, when its numbers are plain; when a number is met that is not written with
 * digits and a decimal point alone, a second time to weigh how all of them are written and a third
 * time with the format recognised.
 */
final class CsvReading {

  private static final NumberFormat PLAIN = new NumberFormat('.', Optional.empty());

  private CsvReading() {}

  static Reading read(
      Source source, Place place, Roles roles, Slots slots, KeptRows kept, Money money)
      throws RecordsRefused, IOException {
    CsvRecords records = new CsvRecords(source, place, slots.headings());
    List<Remark> remarks = new ArrayList<>();
    boolean declared = source.numberFormat().isPresent();
    NumberFormat format = source.numberFormat().orElse(PLAIN);
    if (declared) {
      Refusals.ifContradictory(place, format);
    }
    NumberFormat first = format;
    TypedRows typed = records.read(() -> TypedRows.ofCsv(place, slots, kept, first, !declared));
    if (typed.doubtful()) {
      NumberFormat recognised = survey(records, place, slots);
      typed = records.read(() -> TypedRows.ofCsv(place, slots, kept, recognised, false));
      format = recognised;
      remarkOnGroups(place, recognised, remarks);
    } else if (typed.ambiguous()) {
      if (records.delimiter() == ';') {
        throw Refusals.ambiguousNumbers(place, '.');
      }
      remarks.add(assumedPoint(place));
    }
    Map<String, String> facts = new LinkedHashMap<>();
    records.facts(facts);
    String how = declared ? " (declared)" : " (recognised)";
    facts.put("decimal mark", RecordsReader.markWords(format.decimal()) + how);
    facts.put("digit grouping", format.group().map(RecordsReader::markWords).orElse("none") + how);
    return Conclusion.of(
        place, roles, slots, money, typed.rules(), records.sha256(), facts, remarks);
  }

  private static NumberFormat survey(CsvRecords records, Place place, Slots slots)
      throws RecordsRefused, IOException {
    NumberSurvey survey = records.read(() -> new NumberSurvey(place, slots));
    Optional<NumberFormat> format = survey.format();
    if (format.isEmpty()) {
      throw Refusals.ambiguousNumbers(place, survey.ambiguousMark());
    }
    return format.get();
  }

  private static void remarkOnGroups(Place place, NumberFormat format, List<Remark> remarks) {
    if (format.group().isPresent()) {
      remarks.add(
          new Remark(
              Severity.NOTE,
              "digit-grouping",
              "%s: the %s was read as a mark between groups of digits and the %s as the decimal mark, because other numbers in the file can be read in no other way. If that is wrong, declare records.number-format."
                  .formatted(
                      place.words(),
                      RecordsReader.markWords(format.group().get()),
                      RecordsReader.markWords(format.decimal())),
              List.of()));
    }
  }

  private static Remark assumedPoint(Place place) {
    return new Remark(
        Severity.WARNING,
        "ambiguous-number-format",
        "%s: every number with a point has one to three digits before it and three after it, so 1.234 could be a little over one or over a thousand; the point was taken as the decimal mark. Declare records.number-format: {decimal: \".\"} to confirm it, or {decimal: \",\", group: \".\"}."
            .formatted(place.words()),
        List.of());
  }
}
