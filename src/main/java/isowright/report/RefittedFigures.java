package isowright.report;

import isowright.report.Document.Cell;
import isowright.report.Document.Row;
import isowright.study.Figure;
import isowright.study.Figure.Drawn;
import isowright.study.Figure.Span;
import isowright.study.FitFindings.Fitted;
import isowright.study.FitFindings.Pair;
import isowright.study.PlanFindings.Planned;
import isowright.study.PlanFindings.Reviewed;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;

/** The headline figures of a technology that were refitted, by name, and how they are printed. */
final class RefittedFigures {

  private RefittedFigures() {}

  /**
   * Returns to scale, output elasticities, direct elasticities of substitution, least cost,
   * marginal cost and mix of each plan, and the gaps of filed costs.
   *
   * @param filings how many gaps at most
   */
  static Map<String, Figure> of(Material material, Fitted fit, int filings) {
    Map<String, Figure> figures = new LinkedHashMap<>();
    fit.returnsToScale().ifPresent(figure -> figures.put("Returns to scale", figure));
    fit.outputElasticity()
        .forEach((input, figure) -> figures.put("Output elasticity of " + input, figure));
    for (Pair pair : fit.substitution()) {
      if (pair.measure().equals("hicks")) {
        figures.put("Substitution of " + pair.first() + " and " + pair.second(), pair.figure());
      }
    }
    for (Planned plan : material.findings().plans()) {
      if (plan.technology().equals(fit.technology())) {
        plan.cost().ifPresent(figure -> figures.put(plan.question() + ": least cost", figure));
        plan.marginalCost()
            .ifPresent(figure -> figures.put(plan.question() + ": marginal cost", figure));
        plan.mix().forEach((input, figure) -> figures.put(plan.question() + ": " + input, figure));
      }
    }
    int printed = 0;
    for (Reviewed review : material.findings().reviews()) {
      if (review.technology().equals(fit.technology())
          && review.gap().isPresent()
          && printed++ < filings) {
        figures.put("Gap of " + review.plant() + ", " + review.period(), review.gap().get());
      }
    }
    figures.values().removeIf(figure -> figure.refits().none());
    return figures;
  }

  /** A row of the table of figures over draws. */
  static Row row(String name, Figure figure, Drawn drawn) {
    return new Row(
        Text.of(name),
        List.of(
            Cell.of(like(figure, figure.value())),
            Cell.of(error(figure, drawn.standardError()), error(figure, drawn.analytic())),
            Cell.of(interval(figure, drawn.percentile())),
            Cell.of(interval(figure, drawn.corrected())),
            Cell.of(interval(figure, drawn.accelerated())),
            Cell.of(interval(figure, drawn.analyticInterval())),
            Cell.of(Numbers.count(drawn.failed()))));
  }

  /** A number printed with as many digits as a figure's uncertainty allows the figure. */
  static String like(Figure figure, double value) {
    double error =
        figure
            .refits()
            .drawn()
            .map(Drawn::analytic)
            .or(() -> figure.uncertainty().map(Figure.Uncertainty::standardError))
            .orElse(0.0);
    return Numbers.value(Figure.estimated(value, error, value, value, ""));
  }

  private static String error(Figure figure, double error) {
    return Double.isNaN(error)
        ? "—"
        : Numbers.standardError(
            Figure.estimated(figure.value(), error, figure.value(), figure.value(), ""));
  }

  private static String interval(Figure figure, Span span) {
    if (Double.isNaN(span.low()) || Double.isNaN(span.high())) {
      return "—";
    }
    double error = figure.refits().drawn().map(Drawn::analytic).orElse(0.0);
    return Numbers.interval(Figure.estimated(figure.value(), error, span.low(), span.high(), ""));
  }
}
