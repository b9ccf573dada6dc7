package isowright.study;

import isowright.review.AllowancePath;
import isowright.study.ReviewFindings.Allowed;
import isowright.study.ReviewFindings.Year;
import java.util.ArrayList;
import java.util.List;

/** Carries the gaps of one technology and period to allowances, plant by plant and in sum. */
final class AllowanceStage {

  private final Study.Allowance terms;

  AllowanceStage(Study.Allowance terms) {
    this.terms = terms;
  }

  /**
   * A gap to be carried to an allowance.
   *
   * @param plant its plant
   * @param filed the filed cost
   * @param gap the estimated gap
   * @param used the quantile of it that is used
   */
  record Carried(String plant, double filed, double gap, double used) {}

  /** An allowance for every gap, and their sum under no plant's name. */
  List<Allowed> allowed(String technology, String period, List<Carried> gaps) {
    AllowancePath.Terms each =
        new AllowancePath.Terms(
            terms.controllable(), terms.years(), terms.frontierShift(), terms.index());
    List<Allowed> all = new ArrayList<>();
    for (Carried gap : gaps) {
      AllowancePath path = AllowancePath.of(gap.filed(), gap.gap(), gap.used(), each);
      all.add(allowed(gap.plant(), period, technology, path));
    }
    if (!all.isEmpty()) {
      all.add(sum(all, period, technology));
    }
    return all;
  }

  private static Allowed allowed(
      String plant, String period, String technology, AllowancePath path) {
    return new Allowed(
        plant,
        period,
        technology,
        path.filed(),
        path.gap(),
        path.gapUsed(),
        path.margin(),
        path.controllableGap(),
        path.years().stream()
            .map(
                y ->
                    new Year(
                        y.year(),
                        y.rest(),
                        y.removed(),
                        y.controllable(),
                        y.shift(),
                        y.index(),
                        y.allowance()))
            .toList());
  }

  private static Allowed sum(List<Allowed> plants, String period, String technology) {
    List<Year> years = new ArrayList<>();
    for (int t = 0; t < plants.get(0).years().size(); t++) {
      double[] sums = new double[6];
      for (Allowed plant : plants) {
        Year year = plant.years().get(t);
        double[] own = {
          year.rest(),
          year.removed(),
          year.controllable(),
          year.shift(),
          year.index(),
          year.allowance()
        };
        for (int k = 0; k < sums.length; k++) {
          sums[k] += own[k];
        }
      }
      years.add(new Year(t, sums[0], sums[1], sums[2], sums[3], sums[4], sums[5]));
    }
    return new Allowed(
        "",
        period,
        technology,
        plants.stream().mapToDouble(Allowed::filed).sum(),
        plants.stream().mapToDouble(Allowed::gap).sum(),
        plants.stream().mapToDouble(Allowed::gapUsed).sum(),
        plants.stream().mapToDouble(Allowed::margin).sum(),
        plants.stream().mapToDouble(Allowed::controllableGap).sum(),
        years);
  }
}
