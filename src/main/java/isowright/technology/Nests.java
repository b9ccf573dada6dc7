package isowright.technology;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.stream.IntStream;

/**
 * How n inputs are grouped: every input belongs to one group, and a group of two or more is a nest.
 *
 * <p>A nest is called after its members, {@code labour+machines}; a group of one after its input.
 *
 * @param groups the groups, each the places of its members among the inputs
 */
record Nests(List<int[]> groups) {

  /** Copies the list. */
  Nests {
    groups = groups.stream().map(int[]::clone).toList();
  }

  /**
   * Groups by name, checked.
   *
   * @throws IllegalArgumentException saying which input is missing, unknown or named twice
   */
  static Nests of(List<String> inputs, List<List<String>> named) {
    List<String> seen = new ArrayList<>();
    List<int[]> groups = new ArrayList<>();
    for (List<String> group : named) {
      int[] members = new int[group.size()];
      for (int m = 0; m < members.length; m++) {
        String input = group.get(m);
        members[m] = inputs.indexOf(input);
        if (members[m] < 0 || seen.contains(input)) {
          throw new IllegalArgumentException(
              "nests "
                  + named
                  + ": "
                  + input
                  + (members[m] < 0 ? " is not an input" : " stands twice")
                  + "; name every one of "
                  + inputs
                  + " once");
        }
        seen.add(input);
      }
      if (members.length == 0) {
        throw new IllegalArgumentException("nests " + named + ": a group is empty");
      }
      groups.add(members);
    }
    if (seen.size() < inputs.size()) {
      List<String> missing = new ArrayList<>(inputs);
      missing.removeAll(seen);
      throw new IllegalArgumentException("nests " + named + ": " + missing + " belong to no group");
    }
    return new Nests(groups);
  }

  /** All of n inputs but the last as one group, the last apart. */
  static Nests lastApart(int n) {
    return new Nests(List.of(IntStream.range(0, n - 1).toArray(), new int[] {n - 1}));
  }

  /** The number of groups. */
  int count() {
    return groups.size();
  }

  /** The members of a group; the array itself. */
  int[] members(int group) {
    return groups.get(group);
  }

  /** Whether a group has two members or more. */
  boolean nest(int group) {
    return groups.get(group).length > 1;
  }

  /** The groups of two members or more, in order. */
  int[] nests() {
    return IntStream.range(0, count()).filter(this::nest).toArray();
  }

  /** What a group is called. */
  String name(int group, List<String> inputs) {
    return String.join("+", Arrays.stream(members(group)).mapToObj(inputs::get).toList());
  }
}
