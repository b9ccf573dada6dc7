package isowright.charts;

import isowright.study.CostFindings;
import isowright.study.Findings;
import isowright.study.FitFindings.Fitted;
import isowright.study.PlanFindings.Planned;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Set;

/**
 * The charts of a study.
 *
 * <p>Nothing is drawn here: each chart draws itself when its picture is first asked for, so charts
 * may be drawn in any order and on several threads. Tested in {@code ChartsTest}.
 */
public final class Charts {

  private Charts() {}

  /**
   * The charts that findings give rise to, in the order of a report: elasticities, curvature,
   * residuals and fit of each technology; what cost functions say; isoquant, expansion path and
   * cost curves of each answer; filed against least cost, the gap in parts, plants in order,
   * allowances; figures across specifications. What has no answer has no chart.
   */
  public static List<Chart> of(Findings findings) {
    Setting setting = Setting.of(findings);
    List<Chart> charts = new ArrayList<>(ElasticityCharts.of(findings, setting));
    for (Fitted fit : findings.fits()) {
      charts.addAll(ProfileCharts.of(fit, setting));
    }
    for (Fitted fit : findings.fits()) {
      ResidualCharts.of(fit, setting).ifPresent(charts::add);
      ActualPredictedCharts.of(fit, setting).ifPresent(charts::add);
    }
    for (Fitted fit : findings.fits()) {
      InefficiencyCharts.of(fit, setting).ifPresent(charts::add);
    }
    charts.addAll(CostElasticityCharts.of(findings, setting));
    for (CostFindings.Fitted fit : findings.costs().fits()) {
      AverageCostCharts.of(fit, setting).ifPresent(charts::add);
      ScaleEconomiesCharts.of(fit, setting).ifPresent(charts::add);
      CostShareCharts.of(fit, setting).ifPresent(charts::add);
    }
    Set<String> curves = new HashSet<>(); // several targets of a question share them
    for (Planned plan : findings.plans()) {
      IsoquantCharts.of(plan, setting).ifPresent(charts::add);
      if (!plan.answered() || curves.add(QuestionCharts.asked(plan) + "\0" + plan.technology())) {
        ExpansionPathCharts.of(plan, setting).ifPresent(charts::add);
        CostCurveCharts.of(plan, setting).ifPresent(charts::add);
      }
    }
    charts.addAll(QuestionCharts.of(findings.plans(), setting));
    charts.addAll(FilingCharts.of(findings.reviews(), setting));
    charts.addAll(GapPartsCharts.of(findings.reviews(), setting));
    charts.addAll(RatioCharts.of(findings.review().orders(), setting));
    charts.addAll(AllowanceCharts.of(findings.review().allowances(), setting));
    findings
        .specification()
        .matrix()
        .ifPresent(matrix -> charts.addAll(MatrixCharts.of(matrix, setting)));
    return List.copyOf(charts);
  }
}
