package isowright.regression;

import java.util.ArrayList;
import java.util.List;
import java.util.function.IntPredicate;

/** Designs made of some rows of another, copied out, for refits the long way. */
final class ResampledDesigns {

  private ResampledDesigns() {}

  /** Each group as often as it is counted, every copy a group of its own. */
  static ArrayDesign counted(ArrayDesign design, int[] counts) {
    List<Integer> rows = new ArrayList<>();
    List<Integer> starts = new ArrayList<>();
    for (int g = 0; g < counts.length; g++) {
      for (int copy = 0; copy < counts[g]; copy++) {
        starts.add(rows.size());
        for (int row = design.groups().start(g); row < design.groups().end(g); row++) {
          rows.add(row);
        }
      }
    }
    return of(design, rows, starts);
  }

  /** The rows that are kept, in their groups. */
  static ArrayDesign kept(ArrayDesign design, IntPredicate keep) {
    List<Integer> rows = new ArrayList<>();
    List<Integer> starts = new ArrayList<>();
    int last = -1;
    for (int row = 0; row < design.rows(); row++) {
      if (keep.test(row)) {
        int group = design.groups().of(row);
        if (group != last) {
          starts.add(rows.size());
          last = group;
        }
        rows.add(row);
      }
    }
    return of(design, rows, starts);
  }

  private static ArrayDesign of(ArrayDesign design, List<Integer> rows, List<Integer> starts) {
    double[][] all = RandomDesigns.rows(design);
    double[][] some = new double[all.length][rows.size()];
    for (int k = 0; k < all.length; k++) {
      for (int i = 0; i < rows.size(); i++) {
        some[k][i] = all[k][rows.get(i)];
      }
    }
    return RandomDesigns.design(
        design.columns(),
        some,
        Groups.startingAt(rows.size(), starts.stream().mapToInt(Integer::intValue).toArray()));
  }
}
