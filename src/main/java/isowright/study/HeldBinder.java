package isowright.study;

import isowright.estimation.Specification.RegularityImposed;
import isowright.estimation.Specification.Time;
import isowright.technology.Form;
import isowright.technology.LinearForm;
import isowright.technology.Restriction;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;

/**
 * Reads what the forms that are fitted are held to: groups of inputs, restrictions, regularity; and
 * holds the words against the forms asked and against one another.
 */
final class HeldBinder {

  private final YamlSection section;
  private final YamlSection root;
  private final List<String> inputs;
  private final List<String> technologies;

  HeldBinder(
      YamlSection section, YamlSection root, List<String> inputs, List<String> technologies) {
    this.section = section;
    this.root = root;
    this.inputs = List.copyOf(inputs);
    this.technologies = List.copyOf(technologies);
  }

  Study.Held bind(EffectsBinder.Effects effects) {
    List<List<String>> nests = nests();
    Optional<Restriction> restrict = restrict();
    RegularityImposed regularity =
        StudyBinder.choice(
                section, "regularity", RegularityImposed.values(), RegularityImposed::word)
            .orElse(RegularityImposed.FREE);
    if (restrict.isPresent() && effects.time() == Time.BIASED_TREND) {
      section.refuse(
          "restrict",
          "a biased trend moves the elasticities with time, which `restrict` would hold; set time to"
              + " trend or quadratic-trend, or take this out");
    }
    if (regularity != RegularityImposed.FREE) {
      regularity(regularity, restrict, effects);
    }
    return new Study.Held(nests, restrict, regularity);
  }

  /** Adds the mistake that a form's groups are not named, where they are not. */
  static void needNests(YamlValue technologies, List<String> fitted) {
    for (String name : fitted) {
      if (Form.named(name).needsNests()) {
        technologies.refuse(
            "`"
                + name
                + "` needs its groups of inputs; name them, such as `estimation: {nests: [[labour,"
                + " machines], [energy]]}`");
      }
    }
  }

  private List<List<String>> nests() {
    boolean asked = technologies.stream().anyMatch(name -> Form.named(name).needsNests());
    Optional<YamlValue> value = section.get("nests");
    if (value.isEmpty()) {
      root.get("technologies").ifPresent(list -> needNests(list, technologies));
      return List.of();
    }
    if (!asked && !root.has("matrix")) {
      section.refuse(
          "nests",
          "groups of inputs are named, but none of the technologies has groups; add nested-ces to"
              + " `technologies`, or take this out");
      return List.of();
    }
    List<List<String>> groups = new ArrayList<>();
    List<String> seen = new ArrayList<>();
    boolean sound = true;
    for (YamlValue item : value.get().list().orElse(List.of())) {
      List<String> group = new ArrayList<>();
      for (YamlValue member : item.list().orElse(List.of())) {
        Optional<String> input = member.word(inputs, List.of());
        if (input.isPresent() && seen.contains(input.get())) {
          member.refuse("`" + input.get() + "` stands in a group already; name every input once");
          sound = false;
        }
        input.ifPresent(group::add);
        input.ifPresent(seen::add);
        sound &= input.isPresent();
      }
      sound &= item.isList() && !group.isEmpty();
      if (item.isList() && group.isEmpty() && item.list().orElse(List.of()).isEmpty()) {
        item.refuse("a group needs an input; take the empty one out");
      }
      groups.add(group);
    }
    return sound && value.get().isList() && groups(value.get(), groups, seen) ? groups : List.of();
  }

  /** Whether the groups make nests of the inputs. */
  private boolean groups(YamlValue value, List<List<String>> groups, List<String> seen) {
    List<String> missing = new ArrayList<>(inputs);
    missing.removeAll(seen);
    boolean nested = groups.size() > 1 && groups.stream().anyMatch(group -> group.size() > 1);
    if (!missing.isEmpty()) {
      value.refuse(
          "every input belongs to a group; "
              + String.join(", ", missing)
              + (missing.size() == 1 ? " stands" : " stand")
              + " in none. A group may have one input");
    } else if (!nested) {
      value.refuse(
          "these groups make no nests: two groups or more are needed, one of them of two inputs or"
              + " more; without nests the form is `ces`");
    }
    return missing.isEmpty() && nested;
  }

  /** The strongest of the restrictions asked; it implies the others. */
  private Optional<Restriction> restrict() {
    List<String> words = Arrays.stream(Restriction.values()).map(Restriction::word).toList();
    List<Restriction> asked = new ArrayList<>();
    for (YamlValue item : section.get("restrict").flatMap(YamlValue::list).orElse(List.of())) {
      item.word(words, List.of())
          .ifPresent(word -> asked.add(Restriction.values()[words.indexOf(word)]));
    }
    return asked.stream().max(Comparator.naturalOrder());
  }

  private void regularity(
      RegularityImposed regularity, Optional<Restriction> restrict, EffectsBinder.Effects effects) {
    String asked = "`" + regularity.word() + "` ";
    boolean possible =
        technologies.stream()
            .map(Form::named)
            .anyMatch(form -> form instanceof LinearForm || form.regularByForm());
    if (!technologies.isEmpty() && !possible) {
      section.refuse(
          "regularity",
          asked
              + "is imposed on forms linear in their parameters, and none of the technologies asked"
              + " is ("
              + String.join(", ", technologies)
              + "); add translog, or set this to free");
    }
    if (effects.time() == Time.BIASED_TREND) {
      section.refuse(
          "regularity",
          asked
              + "holds the same elasticities at every period, and a biased trend moves them with"
              + " time; set time to trend or quadratic-trend, or this to free");
    }
    if (restrict.equals(Optional.of(Restriction.HOMOTHETIC))) {
      section.refuse(
          "regularity",
          asked
              + "and `restrict: [homothetic]` cannot be imposed together; restrict to homogeneous, or"
              + " set this to free");
    }
  }
}
