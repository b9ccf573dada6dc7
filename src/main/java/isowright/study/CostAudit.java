package isowright.study;

import isowright.estimation.CostData;
import isowright.estimation.Specification.Time;
import isowright.records.Panel;
import isowright.records.RecordsRefused;
import isowright.study.Findings.Said;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;

/**
 * What is wrong with the records of a cost side, as far as it can be said before anything is
 * fitted: shares that do not add up, shares that are not known, prices that do not move apart.
 * Tested in {@code CostStudyTest}.
 */
public final class CostAudit {

  private CostAudit() {}

  /** The remarks on the records of a study's cost side; empty where it has none. */
  public static List<Said> of(Study study) throws RecordsRefused {
    if (study.costs().isEmpty()) {
      return List.of();
    }
    Costs asked = study.costs().get();
    Panel panel = RecordsStage.read(asked.records()).panel();
    CostRecords made = records(study, asked, panel);
    CostData data = made.data();
    List<Said> remarks = new ArrayList<>();
    reasons(made, data).forEach(reason -> remarks.add(Said.of("error", "costs", reason)));
    remarks.addAll(made.addingUp(data));
    return remarks;
  }

  static CostRecords records(Study study, Costs asked, Panel panel) {
    return new CostRecords(
        asked, panel, study.estimation().time() == Time.TREND, study.estimation().scaled());
  }

  /** Why cost functions cannot be fitted to these records; empty where they can. */
  static List<String> reasons(CostRecords made, CostData data) {
    List<String> reasons = new ArrayList<>();
    List<Integer> missing = made.withoutShare(data);
    if (!missing.isEmpty()) {
      reasons.add(
          String.format(
              Locale.ROOT,
              "costs: the share or the spending of an input is not known in %d of %d rows (first in"
                  + " row %d): enter it, set these rows aside, or fit the cost equation alone"
                  + " (system: false).",
              missing.size(),
              data.rows(),
              missing.get(0)));
    }
    reasons.addAll(made.impossibleOutputs(data));
    String last = data.arguments().inputs().get(data.arguments().inputs().size() - 1);
    List<String> still = made.withoutVariation(data);
    for (String input : still) {
      reasons.add(
          "costs: the price of "
              + input
              + " over that of "
              + last
              + " is the same in every row, so that nothing can be learnt of their substitution:"
              + " give records in which they move apart, or leave one of them out.");
    }
    List<String> together = still.isEmpty() ? made.collinear(data) : List.of();
    if (together.size() > 1) {
      reasons.add(
          String.format(
              Locale.ROOT,
              "costs: over all %d rows the price of %s, over that of %s, is a combination of those"
                  + " of %s, so that their substitution cannot be told apart: give records in which"
                  + " they move apart, or put two of these inputs together.",
              data.rows(),
              together.get(0),
              last,
              String.join(", ", together.subList(1, together.size()))));
    }
    return reasons;
  }
}
