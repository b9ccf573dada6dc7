package isowright.study;

import isowright.study.Study.Allowance;
import isowright.study.Study.Filing;
import isowright.study.Study.Productivity;
import isowright.study.Study.Simulation;
import java.math.BigDecimal;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalInt;

/**
 * Reads {@code filing}: which filed costs are reviewed, against what, and how a gap becomes an
 * allowance. An allowance has no defaults: each of its keys decides money, so each is written.
 */
final class FilingBinder {

  private static final int MOST_YEARS = 50;
  private static final int FEWEST_DRAWS = 99;
  private static final int MOST_DRAWS = 100_000;

  /** A yearly change by as much as this is a percentage written as a number of percent. */
  private static final double LARGEST_CHANGE = 0.5;

  private static final List<String> KEYS =
      List.of("cost", "periods", "against", "smearing", "simulation", "allowance");
  private static final List<String> ALLOWANCE_KEYS =
      List.of("controllable", "quantile", "years", "frontier-shift", "index");

  private final Declared declared;

  FilingBinder(Declared declared) {
    this.declared = declared;
  }

  /** The column of filed cost, which is one of the roles of the records' columns. */
  static Optional<String> costColumn(YamlSection root) {
    return root.get("filing")
        .filter(YamlValue::isMapping)
        .flatMap(YamlValue::section)
        .flatMap(section -> section.text("cost"));
  }

  /** What is asked of filed costs; absent where nothing is. */
  Optional<Filing> bind(YamlSection root) {
    Optional<YamlSection> written = root.section("filing");
    if (written.isEmpty()) {
      return Optional.empty();
    }
    YamlSection section = written.get();
    section.allow("`filing`", KEYS, List.of());
    if (!declared.present()) {
      root.refuse("filing", "filed costs stand in records, but there is no `records`");
    } else if (!declared.unpriced().isEmpty()) {
      root.refuse(
          "filing",
          "filed costs are held against least cost at the prices paid, but there is neither price"
              + " nor spending of "
              + String.join(", ", declared.unpriced())
              + "; name a column for each");
    }
    if (section.has("periods") && declared.present() && !declared.period()) {
      section.refuse("periods", "periods are named, but `records.period` names no column");
    }
    Optional<List<String>> span = RecordsBinder.periods(section);
    Productivity against =
        section
            .get("against")
            .map(value -> ProductivityWords.read(value, false, FrontierBinder.asked(root)))
            .orElse(Productivity.TYPICAL);
    boolean smearing = section.get("smearing").flatMap(YamlValue::flag).orElse(false);
    contradictions(root, section, against, smearing);
    return Optional.of(
        new Filing(
            section.text("cost"),
            span.map(s -> s.get(0)),
            span.map(s -> s.get(1)),
            against,
            smearing,
            section.section("simulation").map(FilingBinder::simulation).orElse(Simulation.USUAL),
            section.section("allowance").flatMap(FilingBinder::allowance)));
  }

  /** What follows from residuals and from plants' levels is known of a fit alone. */
  private static void contradictions(
      YamlSection root, YamlSection section, Productivity against, boolean smearing) {
    if (against.kind() == Productivity.Kind.FRONTIER && !root.has("technologies")) {
      section.refuse(
          "against",
          "a frontier is estimated of production functions alone, and this study fits none; write"
              + " typical or best-quarter, or name a form under `technologies`");
      return;
    }
    boolean fitted = root.has("technologies") || root.has("costs");
    if (fitted) {
      return;
    }
    String remedy =
        " is known only of a technology that is fitted to the records, and this study has given"
            + " ones alone; name a form under `technologies` or take this out";
    if (against.kind() == Productivity.Kind.BEST_QUARTER) {
      section.refuse("against", "the productivity of the best quarter of plants" + remedy);
    }
    if (smearing) {
      section.refuse("smearing", "a smearing factor" + remedy);
    }
  }

  private static Simulation simulation(YamlSection section) {
    section.allow("`simulation`", List.of("draws", "seed"), List.of());
    OptionalInt draws =
        section
            .get("draws")
            .map(value -> value.whole(FEWEST_DRAWS, MOST_DRAWS))
            .orElse(OptionalInt.empty());
    OptionalInt seed =
        section
            .get("seed")
            .map(value -> value.whole(0, Integer.MAX_VALUE))
            .orElse(OptionalInt.empty());
    return new Simulation(
        draws.orElse(Simulation.USUAL.draws()),
        seed.isPresent() ? seed.getAsInt() : Simulation.USUAL.seed());
  }

  /** Every key must be there; all that are missing or mistaken are told in one go. */
  private static Optional<Allowance> allowance(YamlSection section) {
    section.allow("`allowance`", ALLOWANCE_KEYS, List.of());
    List<String> missing = new ArrayList<>(ALLOWANCE_KEYS);
    missing.removeAll(section.keys());
    for (String key : missing) {
      section.lacks(key, remedy(key) + "; an allowance has no defaults");
    }
    OptionalDouble controllable = share(section, "controllable");
    OptionalDouble quantile = quantile(section);
    OptionalInt years =
        section.get("years").map(v -> v.whole(1, MOST_YEARS)).orElse(OptionalInt.empty());
    OptionalDouble shift = change(section, "frontier-shift");
    OptionalDouble index = change(section, "index");
    if (controllable.isEmpty()
        || quantile.isEmpty()
        || years.isEmpty()
        || shift.isEmpty()
        || index.isEmpty()) {
      return Optional.empty();
    }
    return Optional.of(
        new Allowance(
            controllable.getAsDouble(),
            quantile.getAsDouble(),
            years.getAsInt(),
            shift.getAsDouble(),
            index.getAsDouble()));
  }

  private static String remedy(String key) {
    return switch (key) {
      case "controllable" -> "the share of filed cost that the plant can influence, from 0 to 1";
      case "quantile" ->
          "the quantile of the gap's distribution that is used, such as 0.25; 0.5 leaves no margin"
              + " for error";
      case "years" -> "over how many years the gap is removed, a whole number";
      case "frontier-shift" -> "by which share controllable cost falls each year, such as 0.008";
      default -> "by which share prices rise each year, such as 0.021";
    };
  }

  private static OptionalDouble share(YamlSection section, String key) {
    OptionalDouble share = number(section, key);
    if (share.isPresent() && !(share.getAsDouble() >= 0 && share.getAsDouble() <= 1)) {
      refuse(
          section,
          key,
          "a share from 0 to 1 (what can be influenced and what cannot add up to 1)",
          share.getAsDouble());
      return OptionalDouble.empty();
    }
    return share;
  }

  private static OptionalDouble quantile(YamlSection section) {
    OptionalDouble quantile = number(section, "quantile");
    if (quantile.isPresent() && !(quantile.getAsDouble() > 0 && quantile.getAsDouble() < 1)) {
      refuse(section, "quantile", "a number between 0 and 1", quantile.getAsDouble());
      return OptionalDouble.empty();
    }
    return quantile;
  }

  private static OptionalDouble change(YamlSection section, String key) {
    OptionalDouble change = number(section, key);
    if (change.isPresent() && !(Math.abs(change.getAsDouble()) <= LARGEST_CHANGE)) {
      refuse(
          section,
          key,
          "a yearly change as a share, from -0.5 to 0.5 (0.02 is 2 %)",
          change.getAsDouble());
      return OptionalDouble.empty();
    }
    return change;
  }

  private static OptionalDouble number(YamlSection section, String key) {
    return section.get(key).map(YamlValue::number).orElse(OptionalDouble.empty());
  }

  private static void refuse(YamlSection section, String key, String expected, double found) {
    boolean percent = found >= 1 && found <= 100;
    String remedy =
        percent
            ? "; was "
                + BigDecimal.valueOf(found).movePointLeft(2).stripTrailingZeros().toPlainString()
                + " meant?"
            : "";
    section
        .get(key)
        .ifPresent(
            value -> value.refuse("expects " + expected + ", found " + value.found() + remedy));
  }
}
