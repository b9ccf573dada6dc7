package isowright.study;

import isowright.study.Protocol.Decision;
import isowright.study.Protocol.Expectation;
import isowright.study.Protocol.Subject;
import java.time.LocalDate;
import java.time.YearMonth;
import java.time.format.DateTimeParseException;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.regex.Pattern;

/**
 * Reads what a study file lays down before fitting: {@code expect}, {@code decisions} and, with its
 * reader, {@code matrix}.
 */
final class ProtocolBinder {

  private static final List<String> DECISION_KEYS = List.of("date", "by", "what", "why");

  private static final Pattern YEAR = Pattern.compile("[0-9]{4}");

  private final YamlSection root;
  private final Declared declared;
  private final boolean fitted;
  private final Study.Estimation estimation;

  /**
   * A reader.
   *
   * @param fitted whether any technology is fitted to records
   * @param estimation how
   */
  ProtocolBinder(YamlSection root, Declared declared, boolean fitted, Study.Estimation estimation) {
    this.root = root;
    this.declared = declared;
    this.fitted = fitted;
    this.estimation = estimation;
  }

  Protocol bind() {
    return new Protocol(
        expectations(), decisions(), new MatrixBinder(root, declared, estimation).bind());
  }

  private List<Expectation> expectations() {
    Optional<YamlSection> written = root.section("expect");
    if (written.isEmpty()) {
      return List.of();
    }
    YamlSection section = written.get();
    List<String> words = new ArrayList<>();
    for (Subject subject : Subject.values()) {
      words.add(subject.word());
    }
    section.allow("`expect`", words, List.of());
    if (!fitted) {
      root.refuse(
          "expect",
          "figures are expected of fits, but no technology is fitted to records; add `technologies`"
              + " or take this out");
    }
    List<Expectation> all = new ArrayList<>();
    single(section, Subject.RETURNS_TO_SCALE).ifPresent(all::add);
    all.addAll(elasticities(section));
    single(section, Subject.SUBSTITUTION).ifPresent(all::add);
    return all;
  }

  private static Optional<Expectation> single(YamlSection section, Subject subject) {
    return section.get(subject.word()).flatMap(value -> range(value, subject, Optional.empty()));
  }

  private List<Expectation> elasticities(YamlSection section) {
    Optional<YamlSection> byInput = section.section(Subject.OUTPUT_ELASTICITY.word());
    if (byInput.isEmpty()) {
      return List.of();
    }
    byInput.get().allowInputs(declared.inputs());
    List<Expectation> all = new ArrayList<>();
    for (String input : declared.inputs()) {
      byInput
          .get()
          .get(input)
          .flatMap(value -> range(value, Subject.OUTPUT_ELASTICITY, Optional.of(input)))
          .ifPresent(all::add);
    }
    return all;
  }

  private static Optional<Expectation> range(
      YamlValue value, Subject subject, Optional<String> input) {
    Optional<List<YamlValue>> ends = value.list();
    if (ends.isEmpty()) {
      return Optional.empty();
    }
    if (ends.get().size() != 2) {
      value.refuse(
          "expects a lowest and a highest value such as [0.9, 1.1], found "
              + ends.get().size()
              + (ends.get().size() == 1 ? " item" : " items"));
      return Optional.empty();
    }
    OptionalDouble low = ends.get().get(0).numberOrInfinity();
    OptionalDouble high = ends.get().get(1).numberOrInfinity();
    if (low.isEmpty() || high.isEmpty()) {
      return Optional.empty();
    }
    if (low.getAsDouble() > high.getAsDouble()) {
      value.refuse(
          "the lowest value, "
              + ends.get().get(0).found()
              + ", is above the highest, "
              + ends.get().get(1).found()
              + "; swap them");
      return Optional.empty();
    }
    return Optional.of(new Expectation(subject, input, low.getAsDouble(), high.getAsDouble()));
  }

  private List<Decision> decisions() {
    List<Decision> all = new ArrayList<>();
    for (YamlValue item : root.get("decisions").flatMap(YamlValue::list).orElse(List.of())) {
      item.section().flatMap(ProtocolBinder::decision).ifPresent(all::add);
    }
    return all;
  }

  private static Optional<Decision> decision(YamlSection section) {
    section.allow("a decision", DECISION_KEYS, List.of());
    Optional<String> date =
        section
            .need("date", "when it was taken, such as `date: 2025-02-03`")
            .flatMap(ProtocolBinder::date);
    Optional<String> by = need(section, "by", "who took it, such as `by: analyst`");
    Optional<String> what =
        need(section, "what", "what was decided, such as `what: without GW-07`");
    Optional<String> why = need(section, "why", "the reason, such as `why: rebuilt in 2019`");
    if (date.isEmpty() || by.isEmpty() || what.isEmpty() || why.isEmpty()) {
      return Optional.empty();
    }
    return Optional.of(new Decision(date.get(), by.get(), what.get(), why.get()));
  }

  private static Optional<String> need(YamlSection section, String key, String remedy) {
    return section.need(key, remedy).flatMap(YamlValue::text);
  }

  private static Optional<String> date(YamlValue value) {
    Optional<String> written = value.text();
    if (written.isPresent() && !isDate(written.get())) {
      value.refuse("expects a date such as 2025-02-03, 2025-02 or 2025, found " + value.found());
      return Optional.empty();
    }
    return written;
  }

  private static boolean isDate(String written) {
    try {
      if (written.length() == "2025-02".length()) {
        YearMonth.parse(written);
      } else if (!YEAR.matcher(written).matches()) {
        LocalDate.parse(written);
      }
      return true;
    } catch (DateTimeParseException other) {
      return false;
    }
  }
}
