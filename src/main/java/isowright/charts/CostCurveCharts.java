package isowright.charts;

import isowright.charts.Drawn.Said;
import isowright.charts.Drawn.Table;
import isowright.charts.Plot.Side;
import isowright.charts.Style.Dot;
import isowright.charts.Style.Pen;
import isowright.study.Figure;
import isowright.study.PlanFindings.CurvePoint;
import isowright.study.PlanFindings.Planned;
import java.awt.Color;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.function.Function;

/** Average and marginal cost along the target, with interval bands. */
final class CostCurveCharts {

  private final Planned plan;
  private final Setting setting;
  private final List<CurvePoint> curve;
  private final double[] targets;
  private final double[] average;
  private final double[] marginal;
  private final CostShape shape;

  private CostCurveCharts(Planned plan, List<CurvePoint> curve, Setting setting) {
    this.plan = plan;
    this.setting = setting;
    this.curve = curve;
    targets = curve.stream().mapToDouble(CurvePoint::target).toArray();
    average = curve.stream().mapToDouble(p -> p.averageCost().value()).toArray();
    marginal =
        curve.stream()
            .mapToDouble(p -> p.marginalCost().value())
            .map(m -> Double.isFinite(m) ? m : Double.NaN)
            .toArray();
    shape = CostShape.of(average, marginal);
  }

  /** The chart of an answer; none where there is no curve. */
  static Optional<Chart> of(Planned plan, Setting setting) {
    List<CurvePoint> curve =
        plan.curve().stream().filter(p -> Double.isFinite(p.averageCost().value())).toList();
    return plan.answered() && curve.size() >= 2
        ? Optional.of(new CostCurveCharts(plan, curve, setting).chart())
        : Optional.empty();
  }

  private Chart chart() {
    String title =
        Words.sentence(Words.technology(plan.technology()))
            + ": "
            + shape.words(targets, average, plan.limits().isEmpty(), setting);
    return Drawn.chart(
        Chart.Kind.COST_CURVES,
        new Said(
            Answers.subject(plan),
            setting.names().of("cost", plan.question(), plan.technology()),
            title,
            caption(),
            alternative(title)),
        table(),
        this::plot);
  }

  private boolean uncertain() {
    return curve.stream().anyMatch(p -> p.averageCost().uncertainty().isPresent());
  }

  private String caption() {
    return "Money axis in "
        + Words.perOutput(setting.units())
        + "."
        + (uncertain()
            ? " Bands are pointwise " + setting.level() + " intervals."
            : " The technology is taken as known, so there are no intervals.")
        + Answers.limits(plan)
        + (curve.stream().allMatch(CurvePoint::inside)
            ? ""
            : " Shaded: the mix lies outside the records.");
  }

  private String alternative(String title) {
    int last = targets.length - 1;
    StringBuilder words = new StringBuilder(title).append(". ");
    words.append("Average cost ").append(at(average, 0)).append(", ");
    words.append(at(average, last));
    if (Double.isFinite(marginal[0]) && Double.isFinite(marginal[last])) {
      words.append("; marginal cost ").append(at(marginal, 0));
      words.append(", ").append(at(marginal, last));
    } else {
      words.append("; marginal cost could not be had");
    }
    words.append('.');
    plan.averageCost()
        .ifPresent(
            figure ->
                words
                    .append(
                        (plan.detail().goal().equals("target")
                            ? " At the target of "
                            : " At the plan, "))
                    .append(Answers.planned(plan, setting))
                    .append(" average cost is ")
                    .append(Words.interval(figure))
                    .append(' ')
                    .append(Words.perOutput(setting.units()))
                    .append('.'));
    return words.toString();
  }

  private String at(double[] values, int index) {
    return Numbers.brief(values[index]) + " at " + Answers.output(targets[index], setting);
  }

  private Table table() {
    String per = Words.perOutput(setting.units());
    String money = setting.units().money();
    List<String> header = new ArrayList<>(List.of(Words.output(setting.units())));
    for (String what : List.of("average cost", "marginal cost")) {
      header.addAll(List.of(what + " (" + per + ")", what + ", low", what + ", high"));
    }
    header.addAll(List.of("cost (" + money + ")", "cost, low", "cost, high", "inside the records"));
    Table table = Table.of(header);
    for (CurvePoint point : curve) {
      List<String> row = new ArrayList<>(List.of(Numbers.tabular(point.target())));
      row.addAll(Words.cells(point.averageCost()));
      row.addAll(Words.cells(point.marginalCost()));
      row.addAll(Words.cells(point.cost()));
      row.add(point.inside() ? "yes" : "no");
      table.row(row);
    }
    return table;
  }

  private Plot plot() {
    double[] both = Curves.joined(average, marginal);
    double least = Curves.least(both);
    double most = Curves.most(both);
    // A band that explodes at the ends must not flatten the curves: it may leave the frame.
    double room = Math.max(most - least, 0.1 * most);
    double low = Math.max(least - room, Curves.least(ends(Figure.Uncertainty::low, least)));
    double high = Math.min(most + room, Curves.most(ends(Figure.Uncertainty::high, most)));
    Plot plot =
        new Plot(
            Axis.around(Words.output(setting.units()), targets[0], targets[targets.length - 1]),
            Axis.around(
                Words.perOutput(setting.units()), Math.min(low, least), Math.max(high, most)));
    Shades.outside(plot, targets, curve.stream().map(CurvePoint::inside).toList());
    band(plot, "interval of average cost", CurvePoint::averageCost, Style.DEEP, Pen.MAIN_EDGE);
    band(plot, "interval of marginal cost", CurvePoint::marginalCost, Style.WARM, Pen.SECOND_EDGE);
    plot.line("marginal cost", targets, marginal, Pen.SECOND);
    plot.line("average cost", targets, average, Pen.MAIN);
    target(plot);
    if (shape.interior()) {
      int at = shape.least();
      double[] x = {targets[at]};
      double[] y = {average[at]};
      plot.dots("least average cost", x, y, Dot.STEP);
      plot.label(
          "least average cost",
          x[0],
          y[0],
          Style.DEEP,
          Side.SOUTH,
          Side.NORTH,
          Side.SOUTH_WEST,
          Side.SOUTH_EAST,
          Side.NORTH_WEST);
    }
    curveLabel(plot, "average cost", average, Style.DEEP);
    curveLabel(plot, "marginal cost", marginal, Style.WARM);
    return plot;
  }

  private void curveLabel(Plot plot, String text, double[] values, Color color) {
    if (Double.isFinite(Curves.least(values))) {
      plot.labelAlong(
          text, Curves.ends(targets), Curves.ends(values), color, Side.NORTH, Side.SOUTH);
    }
  }

  private double[] ends(Function<Figure.Uncertainty, Double> end, double without) {
    return curve.stream()
        .flatMap(p -> java.util.stream.Stream.of(p.averageCost(), p.marginalCost()))
        .mapToDouble(f -> f.uncertainty().map(end).filter(Double::isFinite).orElse(without))
        .toArray();
  }

  private void band(
      Plot plot, String name, Function<CurvePoint, Figure> figure, Color color, Pen edge) {
    List<CurvePoint> known =
        curve.stream()
            .filter(
                p ->
                    figure
                        .apply(p)
                        .uncertainty()
                        .filter(u -> Double.isFinite(u.low()) && Double.isFinite(u.high()))
                        .isPresent())
            .toList();
    if (known.size() < 2) {
      return;
    }
    Color faint = new Color(color.getRed(), color.getGreen(), color.getBlue(), Style.BAND_ALPHA);
    plot.band(
        name,
        known.stream().mapToDouble(CurvePoint::target).toArray(),
        known.stream().mapToDouble(p -> bound(figure.apply(p), true)).toArray(),
        known.stream().mapToDouble(p -> bound(figure.apply(p), false)).toArray(),
        faint,
        edge);
  }

  private static double bound(Figure figure, boolean low) {
    return figure.uncertainty().map(u -> low ? u.low() : u.high()).orElse(figure.value());
  }

  private void target(Plot plot) {
    if (!plot.x().holds(plan.target())) {
      return;
    }
    plot.vertical("target", plan.target(), Pen.REFERENCE);
    plan.averageCost()
        .map(Figure::value)
        .filter(plot.y()::holds)
        .ifPresent(
            cost ->
                plot.dots("target", new double[] {plan.target()}, new double[] {cost}, Dot.ANSWER));
    plot.label(
        Answers.aim(plan, setting),
        plan.target(),
        plot.y().high(),
        Style.QUIET_TEXT,
        Side.SOUTH_EAST,
        Side.SOUTH_WEST);
  }
}
