package isowright.charts;

import isowright.study.Figure;
import isowright.study.Findings.Units;
import java.util.HashSet;
import java.util.List;
import java.util.Locale;
import java.util.Set;

/** The words that several charts share. */
final class Words {

  private Words() {}

  /** What a technology is called in a sentence. */
  static String technology(String name) {
    return switch (name) {
      case "cobb-douglas" -> "Cobb-Douglas";
      case "ces" -> "CES";
      case "nested-ces" -> "nested CES";
      case "generalised-leontief" -> "generalised Leontief";
      case "cobb-douglas-cost" -> "Cobb-Douglas cost";
      case "cobb-douglas-cost-squared-output" -> "Cobb-Douglas cost with output squared";
      case "translog-cost" -> "translog cost";
      default -> name;
    };
  }

  /** ", 2024"; nothing for records that are one cross-section. */
  static String inPeriod(String period) {
    return period.isEmpty() || period.equals("all") ? "" : ", " + period;
  }

  /** The same with a capital first letter. */
  static String sentence(String words) {
    if (words.isEmpty()) {
      return words;
    }
    int first = words.offsetByCodePoints(0, 1);
    return words.substring(0, first).toUpperCase(Locale.ROOT) + words.substring(first);
  }

  /** "a", "a and b", "a, b and c". */
  static String list(List<String> words) {
    int last = words.size() - 1;
    return last < 1
        ? String.join("", words)
        : String.join(", ", words.subList(0, last)) + " and " + words.get(last);
  }

  /** A quantity with its unit, where one is stated. */
  static String with(String number, String unit) {
    return unit.isEmpty() ? number : number + " " + unit;
  }

  /** "labour (h)", or "labour" where no unit is stated. */
  static String heading(String name, String unit) {
    return unit.isEmpty() ? name : name + " (" + unit + ")";
  }

  /** The unit of an input, empty where not stated. */
  static String unit(Units units, String input) {
    return units.inputs().getOrDefault(input, "");
  }

  /** Output as a unit in "per …": its unit, or "unit of output". */
  static String perOutput(Units units) {
    return units.money() + " per " + (units.output().isEmpty() ? "unit of output" : units.output());
  }

  /** "output (t)". */
  static String output(Units units) {
    return heading("output", units.output());
  }

  /** The level of intervals: "95 %". */
  static String level(double confidence) {
    return Numbers.brief(100 * confidence) + " %";
  }

  /** Lower end, value, upper end for a table; ends empty for an exact number. */
  static List<String> cells(Figure figure) {
    return List.of(
        Numbers.tabular(figure.value()),
        Numbers.tabular(figure.uncertainty().map(Figure.Uncertainty::low)),
        Numbers.tabular(figure.uncertainty().map(Figure.Uncertainty::high)));
  }

  /** "0.62 (0.33 to 1.18)", or "0.62" for an exact number. */
  static String interval(Figure figure) {
    return figure
        .uncertainty()
        .map(u -> Numbers.interval(figure.value(), u.low(), u.high()))
        .orElse(Numbers.brief(figure.value()));
  }

  /** File names made of lower-case letters, digits and hyphens, none twice. */
  static final class Names {
    private final Set<String> taken = new HashSet<>();

    /** A name from words; a number follows where the name was taken. */
    String of(String... words) {
      String base =
          String.join(" ", words)
              .toLowerCase(Locale.ROOT)
              .replaceAll("[^a-z0-9]+", "-")
              .replaceAll("^-|-$", "");
      if (base.length() > 80) {
        base = base.substring(0, 80).replaceAll("-$", "");
      }
      String name = base;
      for (int i = 2; !taken.add(name); i++) {
        name = base + "-" + i;
      }
      return name;
    }
  }
}
