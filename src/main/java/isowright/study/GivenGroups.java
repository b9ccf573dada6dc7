package isowright.study;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * Reads the groups of a technology given with its inputs nested: {@code nests}, the shares within
 * them ({@code nest-shares}, by input), the shares of the groups ({@code shares}, by group) and the
 * curvatures of the nests ({@code nest-rho}, by nest). A nest is called after its members, {@code
 * labour+machines}; a group of one after its input.
 */
final class GivenGroups {

  private static final double SHARE_TOLERANCE = 1e-9;

  private final YamlSection section;
  private List<String> inputs;

  /**
   * What was read.
   *
   * @param names the inputs by group
   * @param within the shares within each group; a one for a group of one
   * @param between the shares of the groups
   * @param rho the curvature of each group; 0 for a group of one
   */
  record Groups(List<List<String>> names, double[][] within, double[] between, double[] rho) {}

  /**
   * @param inputs the names of the inputs; empty where the groups name them
   */
  GivenGroups(YamlSection section, List<String> inputs) {
    this.section = section;
    this.inputs = List.copyOf(inputs);
  }

  /** The names of the inputs, as known beforehand or as the groups have them. */
  List<String> inputs() {
    return inputs;
  }

  Optional<Groups> read() {
    section.allow(
        "a given nested CES technology",
        List.of(
            "name",
            "form",
            "constant",
            "nests",
            "nest-shares",
            "shares",
            "rho",
            "nest-rho",
            "scale",
            "scaling"),
        List.of());
    Optional<List<List<String>>> read =
        section
            .need("nests", "the inputs by group, such as `nests: [[labour, machines], [energy]]`")
            .flatMap(this::groups);
    if (read.isEmpty()) {
      return Optional.empty();
    }
    List<List<String>> groups = read.get();
    List<String> nested = groups.stream().filter(g -> g.size() > 1).flatMap(List::stream).toList();
    List<String> names = groups.stream().map(group -> String.join("+", group)).toList();
    List<String> nests = names.stream().filter(name -> name.contains("+")).toList();
    section.need("nest-shares", "the share of every input within its nest");
    section.need("shares", "the share of every group: " + String.join(", ", names));
    section.need("nest-rho", "the curvature within every nest: " + String.join(", ", nests));
    Optional<double[]> within = new InputNumbers(nested).positive(section, "nest-shares");
    Optional<double[]> between = new InputNumbers(names, "group").positive(section, "shares");
    Optional<double[]> rho = curvatures(nests);
    if (within.isEmpty() || between.isEmpty() || rho.isEmpty()) {
      return Optional.empty();
    }
    double[][] shares = new double[groups.size()][];
    double[] curvatures = new double[groups.size()];
    boolean sound = one("shares", "shares of the groups", between.get());
    for (int g = 0, at = 0, nest = 0; g < shares.length; g++) {
      int size = groups.get(g).size();
      shares[g] = new double[] {1};
      if (size > 1) {
        shares[g] = Arrays.copyOfRange(within.get(), at, at + size);
        curvatures[g] = rho.get()[nest++];
        sound &= one("nest-shares", "shares within " + names.get(g), shares[g]);
        at += size;
      }
    }
    return sound
        ? Optional.of(new Groups(groups, shares, between.get(), curvatures))
        : Optional.empty();
  }

  /** The groups, every input once. */
  private Optional<List<List<String>>> groups(YamlValue value) {
    List<List<String>> groups = new ArrayList<>();
    List<String> seen = new ArrayList<>();
    boolean sound = true;
    for (YamlValue item : value.list().orElse(List.of())) {
      List<String> group = item.texts();
      for (String name : group) {
        if (seen.contains(name)) {
          item.refuse("`" + YamlValue.quote(name) + "` stands in a group already");
          sound = false;
        } else if (!inputs.isEmpty() && !inputs.contains(name)) {
          item.refuse(
              "`"
                  + YamlValue.quote(name)
                  + "` is not an input"
                  + YamlValue.nearest(name, inputs)
                  + "; inputs: "
                  + String.join(", ", inputs));
          sound = false;
        }
        seen.add(name);
      }
      sound &= !group.isEmpty();
      groups.add(group);
    }
    List<String> missing = new ArrayList<>(inputs);
    missing.removeAll(seen);
    if (!missing.isEmpty()) {
      value.refuse("every input belongs to a group; missing: " + String.join(", ", missing));
      sound = false;
    } else if (groups.size() < 2 || groups.stream().allMatch(group -> group.size() < 2)) {
      value.refuse(
          "two groups or more are needed, one of them of two inputs or more; without nests the form"
              + " is `ces`");
      sound = false;
    }
    if (sound && inputs.isEmpty()) {
      seen.forEach(name -> InputNames.check(section, name));
      inputs = List.copyOf(seen);
    }
    return sound ? Optional.of(groups) : Optional.empty();
  }

  private Optional<double[]> curvatures(List<String> nests) {
    Optional<YamlSection> written = section.section("nest-rho");
    if (written.isEmpty()) {
      return Optional.empty();
    }
    written.get().allowNames(nests, "nest");
    double[] curvatures = new double[nests.size()];
    boolean sound = written.get().keys().size() == nests.size();
    for (int g = 0; g < curvatures.length; g++) {
      Optional<YamlValue> value = written.get().need(nests.get(g), "its curvature, such as 0.5");
      OptionalDouble rho = value.map(GivenBinder::curvature).orElse(OptionalDouble.empty());
      sound &= rho.isPresent();
      curvatures[g] = rho.orElse(0);
    }
    return sound ? Optional.of(curvatures) : Optional.empty();
  }

  private boolean one(String key, String what, double[] shares) {
    double sum = Arrays.stream(shares).sum();
    if (Math.abs(sum - 1) > SHARE_TOLERANCE) {
      section.refuse(
          key, String.format(Locale.ROOT, "%s must sum to 1; these sum to %.10g", what, sum));
      return false;
    }
    return true;
  }
}
