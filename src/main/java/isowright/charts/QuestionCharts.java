package isowright.charts;

import isowright.study.PlanFindings.Planned;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;

/**
 * The charts of which one a question is enough: of its first answer, that is of the technology
 * named first and the first of several targets. The tables have the others.
 */
final class QuestionCharts {

  private QuestionCharts() {}

  static List<Chart> of(List<Planned> plans, Setting setting) {
    Map<String, Planned> leading = new LinkedHashMap<>();
    for (Planned plan : plans) {
      if (plan.answered()) {
        leading.putIfAbsent(asked(plan), plan);
      }
    }
    List<Chart> charts = new ArrayList<>();
    for (Planned plan : leading.values()) {
      EnvelopeCharts.of(plan, setting).ifPresent(charts::add);
      SplitCharts.of(plan, setting).ifPresent(charts::add);
      ChangeCharts.of(plan, setting).ifPresent(charts::add);
      charts.addAll(DemandCharts.of(plan, setting));
    }
    EfficientScaleCharts.of(plans, setting).ifPresent(charts::add);
    return charts;
  }

  /** The question in the study file; several targets share it. */
  static String asked(Planned plan) {
    return plan.detail().asked().isEmpty() ? plan.question() : plan.detail().asked();
  }
}
