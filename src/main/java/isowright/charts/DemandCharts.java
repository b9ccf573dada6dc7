package isowright.charts;

import isowright.charts.Drawn.Said;
import isowright.charts.Drawn.Table;
import isowright.charts.Plot.Side;
import isowright.charts.Style.Dot;
import isowright.charts.Style.Pen;
import isowright.study.Figure;
import isowright.study.PlanDetail.Demand;
import isowright.study.PlanDetail.DemandPoint;
import isowright.study.PlanFindings.Planned;
import java.util.ArrayList;
import java.util.List;
import java.util.Objects;

/** How much of an input the least-cost mix holds at each of its prices, all else as planned. */
final class DemandCharts {

  /** A quantity that moves by less than this share does not move: it is held or at a limit. */
  private static final double STILL = 1e-9;

  private final Planned plan;
  private final Demand demand;
  private final Setting setting;
  private final double[] prices;
  private final List<Figure> quantities;

  private DemandCharts(Planned plan, Demand demand, Setting setting) {
    this.plan = plan;
    this.demand = demand;
    this.setting = setting;
    prices = demand.points().stream().mapToDouble(DemandPoint::price).toArray();
    quantities =
        demand.points().stream()
            .map(p -> Objects.requireNonNull(p.mix().get(demand.price())))
            .toList();
  }

  /** One chart an input whose quantity answers to its price. */
  static List<Chart> of(Planned plan, Setting setting) {
    List<Chart> charts = new ArrayList<>();
    for (Demand demand : plan.detail().demands()) {
      boolean there =
          demand.points().size() >= 2
              && demand.points().stream().allMatch(p -> p.mix().containsKey(demand.price()));
      if (there) {
        DemandCharts chart = new DemandCharts(plan, demand, setting);
        double[] values = Bands.values(chart.quantities);
        if (Curves.most(values) > Curves.least(values) * (1 + STILL)) {
          charts.add(chart.chart());
        }
      }
    }
    return charts;
  }

  private Chart chart() {
    int last = prices.length - 1;
    String title =
        Words.sentence(Words.technology(plan.technology()))
            + ": "
            + demand.price()
            + " falls from "
            + quantity(0)
            + " at "
            + Words.with(Numbers.brief(prices[0]), per())
            + " to "
            + quantity(last)
            + " at "
            + Numbers.brief(prices[last]);
    return Drawn.chart(
        Chart.Kind.DEMAND,
        new Said(
            Answers.subject(plan),
            setting.names().of("demand", demand.price(), plan.question(), plan.technology()),
            title,
            caption(),
            title + ". At the price of the plan it is " + planned() + "."),
        table(),
        this::plot);
  }

  private String per() {
    String unit = Words.unit(setting.units(), demand.price());
    return setting.units().money() + " per " + (unit.isEmpty() ? "unit" : unit);
  }

  private String quantity(int k) {
    return Answers.quantity(demand.price(), quantities.get(k).value(), setting);
  }

  private String planned() {
    return Answers.quantity(demand.price(), Answers.value(plan, demand.price()), setting);
  }

  private String caption() {
    return "The same output, "
        + Answers.planned(plan, setting)
        + ", at other prices of "
        + demand.price()
        + "; the other inputs take its place as their prices stand."
        + (Bands.uncertain(quantities)
            ? " The band is a pointwise " + setting.level() + " interval."
            : "")
        + Answers.limits(plan)
        + (demand.points().stream().allMatch(DemandPoint::inside)
            ? ""
            : " Shaded: the mix lies outside the records.");
  }

  private Table table() {
    List<String> header =
        new ArrayList<>(List.of("price of " + demand.price() + " (" + per() + ")"));
    for (String input : Answers.inputs(plan)) {
      header.addAll(List.of(Answers.heading(input, setting), input + ", low", input + ", high"));
    }
    String cost = "cost (" + setting.units().money() + ")";
    header.addAll(List.of(cost, "cost, low", "cost, high", "inside the records"));
    Table table = Table.of(header);
    for (DemandPoint point : demand.points()) {
      List<String> row = new ArrayList<>(List.of(Numbers.tabular(point.price())));
      for (String input : Answers.inputs(plan)) {
        Figure figure = point.mix().get(input);
        row.addAll(Words.cells(figure == null ? Figure.exact(Double.NaN) : figure));
      }
      row.addAll(Words.cells(point.cost()));
      row.add(point.inside() ? "yes" : "no");
      table.row(row);
    }
    return table;
  }

  private Plot plot() {
    Plot plot =
        new Plot(
            Axis.around(
                "price of " + demand.price() + " (" + per() + ")",
                prices[0],
                prices[prices.length - 1]),
            Bands.axis(Answers.heading(demand.price(), setting), quantities));
    Shades.outside(plot, prices, demand.points().stream().map(DemandPoint::inside).toList());
    Bands.add(plot, "interval", prices, quantities, Style.DEEP, Pen.MAIN_EDGE);
    plot.line("demand", prices, Bands.values(quantities), Pen.MAIN);
    double price = plan.prices().getOrDefault(demand.price(), Double.NaN);
    double quantity = Answers.value(plan, demand.price());
    if (plot.x().holds(price) && plot.y().holds(quantity)) {
      plot.dots("plan", new double[] {price}, new double[] {quantity}, Dot.ANSWER);
      plot.label("plan", price, quantity, Style.WARM, Side.NORTH_EAST, Side.SOUTH_WEST);
    }
    return plot;
  }
}
