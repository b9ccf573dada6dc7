package isowright.report;

import isowright.charts.Chart;
import isowright.charts.Chart.Kind;
import isowright.study.Findings;
import isowright.study.FitFindings.Fitted;
import isowright.study.PlanFindings.Planned;
import java.util.ArrayList;
import java.util.List;

/**
 * Charts that stand where drawn ones would: a picture of a few strokes for every place in a report
 * that asks for a chart.
 */
final class ChartsFixture {

  private ChartsFixture() {}

  /** One chart of every kind for every subject of the findings. */
  static List<Chart> of(Findings findings) {
    List<Chart> charts = new ArrayList<>();
    for (Fitted fit : findings.fits()) {
      charts.add(chart(Kind.RESIDUALS, fit.technology()));
      charts.add(chart(Kind.ACTUAL_PREDICTED, fit.technology()));
      if (fit.curvature().isPresent()) {
        charts.add(chart(Kind.PROFILE, fit.technology()));
      }
    }
    charts.add(chart(Kind.ELASTICITIES, ""));
    if (findings.plans().stream().anyMatch(Planned::answered)) {
      charts.add(chart(Kind.EFFICIENT_SCALE, ""));
    }
    for (Planned plan : findings.plans()) {
      if (plan.answered()) {
        String subject = plan.question() + ", " + plan.technology();
        charts.add(chart(Kind.ISOQUANT, subject));
        charts.add(chart(Kind.EXPANSION_PATH, subject));
        charts.add(chart(Kind.COST_CURVES, subject));
        charts.add(chart(Kind.ENVELOPE, subject));
        charts.add(chart(Kind.CHANGES, subject));
        charts.add(chart(Kind.DEMAND, subject));
        charts.add(chart(Kind.SPLIT, subject));
      }
    }
    findings.reviews().stream()
        .map(review -> review.technology())
        .distinct()
        .forEach(technology -> charts.add(chart(Kind.FILING, technology)));
    return charts;
  }

  private static Chart chart(Kind kind, String subject) {
    String name =
        (kind + "-" + subject)
            .toLowerCase(java.util.Locale.ROOT)
            .replaceAll("[^a-z0-9]+", "-")
            .replaceAll("-$", "");
    return new Chart(
        kind,
        subject,
        name,
        "Finding of " + name,
        "Look at the line.",
        "A line that rises from left to right.",
        List.of("Input (h)", "Output (t)"),
        List.of(List.of("1,000", "20"), List.of("2,000", "39")),
        () ->
            """
            <?xml version="1.0" encoding="UTF-8"?>
            <!DOCTYPE svg>
            <svg xmlns="http://www.w3.org/2000/svg" role="img" viewBox="0 0 600 330"
                 aria-labelledby="title desc">
              <title id="title">Finding</title><desc id="desc">A line.</desc>
              <defs><clipPath id="clip"><path d="M0 0h600v330h-600z"/></clipPath></defs>
              <g clip-path="url(#clip)" fill="none" stroke="#555">
                <path d="M40 20V290H580"/><path stroke="#14535f" stroke-width="3" d="M60 270L560 60"/>
              </g>
            </svg>
            """,
        () -> new byte[0]);
  }
}
