package isowright.study;

import isowright.estimation.Series;
import isowright.records.Roles;
import java.util.Arrays;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Optional;
import java.util.Set;

/**
 * Reads instruments and proxies ({@code wage}, {@code lag labour}, {@code {column: wage, log:
 * false}}), and gathers the columns that only they need.
 */
final class SeriesReader {

  private static final String LAG = "lag";
  private static final int LONGEST_LAG = 20;

  private final Declared declared;
  private final Set<String> further = new LinkedHashSet<>();

  SeriesReader(Declared declared) {
    this.declared = declared;
  }

  List<String> further() {
    return List.copyOf(further);
  }

  /** A word such as {@code wage} or {@code lag labour}, or keys column, lag, log. */
  Optional<Series> read(YamlValue value) {
    return value.isMapping()
        ? value.section().flatMap(s -> keyed(value, s))
        : value.text().flatMap(text -> worded(value, text));
  }

  private Optional<Series> keyed(YamlValue value, YamlSection keys) {
    keys.allow("an instrument", List.of("column", LAG, "log"), List.of());
    Optional<String> name =
        keys.need("column", "its column, or the name of an input").flatMap(YamlValue::text);
    int lag = keys.get(LAG).map(v -> v.whole(0, LONGEST_LAG).orElse(0)).orElse(0);
    Optional<Boolean> log = keys.get("log").flatMap(YamlValue::flag);
    return name.flatMap(n -> named(value, n, lag, log));
  }

  private Optional<Series> worded(YamlValue value, String text) {
    List<String> words = Arrays.asList(text.split(" +"));
    if (words.size() < 2 || !words.get(0).equals(LAG)) {
      return named(value, text, 0, Optional.empty());
    }
    boolean counted = words.size() > 2 && words.get(1).matches("[0-9]{1,2}");
    int lag = counted ? Integer.parseInt(words.get(1)) : 1;
    if (lag < 1 || lag > LONGEST_LAG) {
      value.refuse("expects a lag of 1 to " + LONGEST_LAG + " periods, found " + lag);
      return Optional.empty();
    }
    String name = String.join(" ", words.subList(counted ? 2 : 1, words.size()));
    return named(value, name, lag, Optional.empty());
  }

  private Optional<Series> named(YamlValue value, String name, int lag, Optional<Boolean> log) {
    if (declared.inputs().contains(name)) {
      return Optional.of(new Series(name, lag, Optional.empty()));
    }
    Optional<Roles> roles = declared.records().map(Study.Records::roles);
    if (roles.isEmpty()) {
      return Optional.of(new Series(name, lag, log));
    }
    Optional<String> input =
        roles.get().inputs().stream()
            .filter(i -> i.quantity().equals(name))
            .map(Roles.Input::name)
            .findFirst();
    if (input.isPresent()) {
      return Optional.of(new Series(input.get(), lag, Optional.empty()));
    }
    Optional<String> taken = taken(roles.get(), name, lag);
    if (taken.isPresent()) {
      value.refuse(
          "the column `"
              + YamlValue.quote(name)
              + "` is `"
              + taken.get()
              + "` already; name another");
      return Optional.empty();
    }
    if (!present(roles.get(), name)) {
      further.add(name);
    }
    return Optional.of(new Series(name, lag, log));
  }

  private static Optional<String> taken(Roles roles, String name, int lag) {
    if (roles.output().equals(name)) {
      return Optional.of("output.column");
    }
    if (roles.plant().filter(name::equals).isPresent()) {
      return Optional.of("records.plant");
    }
    if (lag == 0 && roles.controls().stream().anyMatch(c -> c.column().equals(name))) {
      return Optional.of("controls");
    }
    return roles.period().filter(name::equals).map(p -> "records.period");
  }

  /** Whether the panel holds the column in a role of its own, deflated where it is money. */
  private static boolean present(Roles roles, String name) {
    return roles.inputs().stream()
            .anyMatch(
                i ->
                    i.price().filter(name::equals).isPresent()
                        || i.spending().filter(name::equals).isPresent())
        || roles.filedCost().filter(name::equals).isPresent();
  }
}
