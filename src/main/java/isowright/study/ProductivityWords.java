package isowright.study;

import isowright.study.Study.Productivity;
import java.util.List;
import java.util.Optional;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/**
 * Reads whose productivity is meant: {@code typical}, {@code best-quarter}, {@code frontier} where
 * one is asked for, or a plant, written as {@code {plant: GW-03}} or as the text {@code "plant:
 * GW-03"}.
 */
final class ProductivityWords {

  private static final Pattern PLANT = Pattern.compile("plant:\\s*(\\S.*)");

  private ProductivityWords() {}

  /**
   * The productivity that is meant; typical, with a mistake added, where it cannot be told.
   *
   * @param plants whether a plant may be named here
   * @param frontier whether the study asks for a frontier
   */
  static Productivity read(YamlValue value, boolean plants, boolean frontier) {
    if (value.isMapping() && plants) {
      return value.section().flatMap(ProductivityWords::plant).orElse(Productivity.TYPICAL);
    }
    if (value.isMapping() || value.isList()) {
      value.refuse(
          (frontier ? "expects typical, best-quarter, frontier" : "expects typical or best-quarter")
              + plantForm(plants)
              + ", found "
              + value.found());
      return Productivity.TYPICAL;
    }
    Optional<String> text = value.text();
    if (text.isPresent() && plants) {
      Matcher named = PLANT.matcher(text.get());
      if (named.matches()) {
        return new Productivity(Productivity.Kind.PLANT, Optional.of(named.group(1).strip()));
      }
    }
    if (text.isEmpty()) {
      return Productivity.TYPICAL;
    }
    if (text.get().equals("frontier") && !frontier) {
      value.refuse(
          "`frontier` needs a frontier, and `estimation.frontier` asks for none; add `frontier:"
              + " {inefficiency: half-normal}` under `estimation`, or write typical or best-quarter"
              + " here");
      return Productivity.TYPICAL;
    }
    Optional<String> word =
        value.word(
            frontier
                ? List.of("typical", "best-quarter", "frontier")
                : List.of("typical", "best-quarter"),
            List.of());
    return word.map(ProductivityWords::kind)
        .map(kind -> new Productivity(kind, Optional.empty()))
        .orElse(Productivity.TYPICAL);
  }

  private static Productivity.Kind kind(String word) {
    return switch (word) {
      case "best-quarter" -> Productivity.Kind.BEST_QUARTER;
      case "frontier" -> Productivity.Kind.FRONTIER;
      default -> Productivity.Kind.TYPICAL;
    };
  }

  private static Optional<Productivity> plant(YamlSection section) {
    section.allow("`productivity`", List.of("plant"), List.of());
    return section
        .need("plant", "the plant whose productivity is meant")
        .flatMap(YamlValue::text)
        .map(name -> new Productivity(Productivity.Kind.PLANT, Optional.of(name)));
  }

  private static String plantForm(boolean plants) {
    return plants ? " or {plant: NAME}" : "";
  }
}
