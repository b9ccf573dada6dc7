package isowright.records;

import isowright.records.Remark.Severity;
import java.util.ArrayList;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Set;
import java.util.stream.Collectors;

/** Finds the declared columns among the headings of a file. */
final class Headings {

  private static final int MOST_LISTED = 40;

  private Headings() {}

  /**
   * For each column of the file, the slots it fills.
   *
   * @throws RecordsRefused naming every declared column that is missing, with the nearest heading,
   *     and every one whose heading stands more than once
   */
  static int[][] bind(Place place, int fileRow, List<String> headings, Slots slots)
      throws RecordsRefused {
    List<Remark> errors = new ArrayList<>();
    for (String declared : slots.headings()) {
      List<Integer> at = new ArrayList<>();
      for (int c = 0; c < headings.size(); c++) {
        if (headings.get(c).equals(declared)) {
          at.add(c);
        }
      }
      if (declared.isBlank()) {
        errors.add(blank(place, fileRow, slots));
      } else if (at.isEmpty()) {
        errors.add(missing(place, fileRow, declared, headings, slots));
      } else if (at.size() > 1) {
        errors.add(twice(place, fileRow, declared, at));
      }
    }
    if (!errors.isEmpty()) {
      throw new RecordsRefused(errors);
    }
    int[][] slotsOfColumn = new int[headings.size()][];
    for (int c = 0; c < headings.size(); c++) {
      List<Integer> filled = new ArrayList<>();
      for (int s = 0; s < slots.size(); s++) {
        if (slots.get(s).heading().equals(headings.get(c))) {
          filled.add(s);
        }
      }
      slotsOfColumn[c] = filled.stream().mapToInt(Integer::intValue).toArray();
    }
    return slotsOfColumn;
  }

  private static Remark missing(
      Place place, int fileRow, String declared, List<String> headings, Slots slots) {
    Set<String> named = new LinkedHashSet<>(headings);
    named.removeIf(String::isBlank);
    String nearest =
        Nearest.word(declared, named)
            .map(n -> " The nearest heading is \"" + Shown.shortened(n) + "\".")
            .orElse("");
    String list =
        named.stream()
            .limit(MOST_LISTED)
            .map(h -> "\"" + Shown.shortened(h) + "\"")
            .collect(Collectors.joining(", "));
    boolean emptyHeadings = headings.stream().anyMatch(String::isBlank);
    return new Remark(
        Severity.ERROR,
        "missing-column",
        "%s: there is no column \"%s\", declared as %s.%s The headings are %s%s. Correct the study file or the heading%s."
            .formatted(
                place.row(fileRow),
                Shown.shortened(declared),
                roles(declared, slots),
                nearest,
                list.isEmpty() ? "all empty" : list,
                named.size() > MOST_LISTED ? " and " + (named.size() - MOST_LISTED) + " more" : "",
                emptyHeadings ? " (some columns have an empty heading: name them)" : ""),
        List.of(fileRow));
  }

  private static Remark blank(Place place, int fileRow, Slots slots) {
    return new Remark(
        Severity.ERROR,
        "empty-heading",
        "%s: the column declared as %s has an empty name. Give the column a heading in the file and name it in the study file."
            .formatted(place.row(fileRow), roles("", slots)),
        List.of(fileRow));
  }

  private static Remark twice(Place place, int fileRow, String declared, List<Integer> at) {
    String columns =
        at.stream()
            .map(c -> columnLetters(c) + " (" + (c + 1) + ")")
            .collect(Collectors.joining(", "));
    return new Remark(
        Severity.ERROR,
        "duplicate-heading",
        "%s: the heading \"%s\" stands over %d columns: %s. Rename all but the one that is meant."
            .formatted(place.row(fileRow), Shown.shortened(declared), at.size(), columns),
        List.of(fileRow));
  }

  private static String roles(String declared, Slots slots) {
    List<String> roles = new ArrayList<>();
    for (int s = 0; s < slots.size(); s++) {
      if (slots.get(s).heading().equals(declared)
          || (declared.isEmpty() && slots.get(s).heading().isBlank())) {
        roles.add(slots.get(s).role());
      }
    }
    return String.join(" and ", roles);
  }

  /** The letters that a spreadsheet program shows over a column: A, B, …, Z, AA, … */
  static String columnLetters(int column) {
    StringBuilder letters = new StringBuilder();
    for (int c = column; c >= 0; c = c / 26 - 1) {
      letters.insert(0, (char) ('A' + c % 26));
    }
    return letters.toString();
  }
}
