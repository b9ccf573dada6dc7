package isowright.study;

import isowright.cost.CostArguments;
import isowright.cost.CostElasticities;
import isowright.cost.CostFunction;
import isowright.estimation.CostData;
import isowright.estimation.CostFit;
import isowright.estimation.CostSpecification.Equations;
import isowright.estimation.EstimatedCost;
import isowright.estimation.Productivity;
import isowright.inference.DeltaMethod;
import isowright.inference.Estimate;
import isowright.inference.Propagation;
import isowright.records.Panel;
import isowright.study.CostRows.AveragePoint;
import isowright.study.CostRows.Row;
import isowright.study.CostRows.Spread;
import isowright.study.FitFindings.Pair;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.stream.IntStream;

/** What a fitted cost function says over the rows of the records. */
final class CostRowFigures {

  /** So many figures with intervals take a few seconds to find and some 15 megabytes to write. */
  private static final int FIGURES = 300_000;

  private static final int BLOCK = 400;
  private static final int POINTS = 41;

  private final CostData data;
  private final CostFit fit;
  private final Panel panel;
  private final double[] mean;
  private final boolean scale;
  private final int n;
  private final int width;

  CostRowFigures(CostData data, CostFit fit, Panel panel, double[] mean) {
    this.data = data;
    this.fit = fit;
    this.panel = panel;
    this.mean = mean.clone();
    List<String> outputs = data.arguments().outputs();
    this.scale = !outputs.isEmpty() && fit.specification().equations() != Equations.SHARES;
    this.n = data.arguments().inputs().size();
    this.width = (scale ? 1 : 0) + n * n + n * (n + 1) / 2;
  }

  CostRows rows(Propagation<? extends CostFunction> propagation) {
    int step = Math.max(1, (int) Math.ceil((double) data.rows() * width / FIGURES));
    int count = (data.rows() + step - 1) / step;
    int blocks = (count + BLOCK - 1) / BLOCK;
    List<Row> rows =
        IntStream.range(0, blocks)
            .parallel()
            .mapToObj(
                b ->
                    block(
                        propagation,
                        IntStream.range(b * BLOCK, Math.min(count, (b + 1) * BLOCK))
                            .map(k -> k * step)
                            .toArray()))
            .flatMap(List::stream)
            .toList();
    return new CostRows(data.rows(), rows, average(), spreads(), data.arguments().fixed());
  }

  private List<Row> block(Propagation<? extends CostFunction> propagation, int[] rows) {
    List<Estimate> all =
        propagation.estimates(
            f -> {
              double[] numbers = new double[rows.length * width];
              for (int k = 0; k < rows.length; k++) {
                numbers(f, data.point(rows[k]), numbers, k * width);
              }
              return numbers;
            },
            DeltaMethod.Scale.LINEAR);
    List<Row> made = new ArrayList<>();
    for (int k = 0; k < rows.length; k++) {
      made.add(row(rows[k], all.subList(k * width, (k + 1) * width)));
    }
    return made;
  }

  /** Scale economies, demand elasticities, Allen-Uzawa elasticities. */
  private void numbers(CostFunction f, double[] v, double[] into, int offset) {
    CostElasticities at = CostElasticities.at(f, v);
    int place = offset;
    if (scale) {
      into[place++] = at.scaleEconomies();
    }
    for (int k = 0; k < n * n; k++) {
      into[place++] = at.demand(k / n, k % n);
    }
    for (int i = 0; i < n; i++) {
      for (int j = i; j < n; j++) {
        into[place++] = at.allen(i, j);
      }
    }
  }

  private Row row(int row, List<Estimate> estimates) {
    CostArguments arguments = data.arguments();
    CostElasticities at = CostElasticities.at(fit.function(), data.point(row));
    List<Figure> figures = estimates.stream().map(FitStage::figure).toList();
    Map<String, Double> fitted = new LinkedHashMap<>();
    Map<String, Double> seen = new LinkedHashMap<>();
    double[] shares = at.shares();
    for (int i = 0; i < n; i++) {
      fitted.put(arguments.inputs().get(i), shares[i]);
      if (data.shares().length > 0) {
        seen.put(arguments.inputs().get(i), data.shares()[i][row]);
      }
    }
    List<Pair> pairs = new ArrayList<>();
    int place = scale ? 1 : 0;
    for (int k = 0; k < n * n; k++) {
      pairs.add(pair(k / n, k % n, "demand", figures.get(place++)));
    }
    for (int i = 0; i < n; i++) {
      for (int j = i; j < n; j++) {
        pairs.add(pair(i, j, "allen", figures.get(place++)));
      }
    }
    boolean one = arguments.outputs().size() == 1;
    return new Row(
        panel.fileRows().get(row),
        panel.plants().get(panel.plantOf(row)),
        panel.periods().get(panel.rowPeriods().get(row)),
        one ? Math.exp(data.points()[n][row]) : Double.NaN,
        one && scale ? averageCost(row) : Double.NaN,
        scale ? Optional.of(figures.get(0)) : Optional.empty(),
        fitted,
        seen,
        pairs,
        scale ? at.monotone() : Arrays.stream(shares).allMatch(s -> s > 0),
        at.concave());
  }

  private Pair pair(int i, int j, String measure, Figure figure) {
    List<String> inputs = data.arguments().inputs();
    return new Pair(inputs.get(i), inputs.get(j), measure, figure);
  }

  /** The mean point at another output. */
  private double[] at(double logOutput) {
    double[] v = mean.clone();
    v[n] = logOutput;
    return v;
  }

  private double averageCost(int row) {
    double[] point = data.point(row);
    double log =
        data.logCost()[row] - fit.function().logCost(point) + fit.function().logCost(at(point[n]));
    for (int c = 0; c < data.controls().length; c++) {
      double[] control = data.controls()[c];
      double away = control[row] - Arrays.stream(control).average().orElse(0);
      log -= fit.values()[fit.function().parameters().length + c] * away;
    }
    return Math.exp(log - point[n]);
  }

  private List<AveragePoint> average() {
    if (!scale || data.arguments().outputs().size() != 1) {
      return List.of();
    }
    EstimatedCost typical = EstimatedCost.of(data, fit, new Productivity.Typical());
    Propagation<CostFunction> propagation =
        new Propagation<>(
            typical.centre(),
            typical.covariance(),
            fit.degreesOfFreedom(),
            fit.specification().confidence(),
            typical::at);
    double low = Arrays.stream(data.points()[n]).min().orElse(0);
    double high = Arrays.stream(data.points()[n]).max().orElse(0);
    double[] logs = new double[high > low ? POINTS : 0];
    for (int k = 0; k < logs.length; k++) {
      logs[k] = low + (high - low) * k / (POINTS - 1);
    }
    List<Estimate> costs =
        propagation.estimates(
            f -> Arrays.stream(logs).map(y -> Math.exp(f.logCost(at(y)) - y)).toArray(),
            DeltaMethod.Scale.LOG);
    List<AveragePoint> points = new ArrayList<>();
    for (int k = 0; k < logs.length; k++) {
      points.add(new AveragePoint(Math.exp(logs[k]), FitStage.figure(costs.get(k))));
    }
    return points;
  }

  private List<Spread> spreads() {
    int columns = width + n;
    double[][] values = new double[columns][data.rows()];
    IntStream.range(0, data.rows())
        .parallel()
        .forEach(
            r -> {
              double[] numbers = new double[width];
              double[] v = data.point(r);
              numbers(fit.function(), v, numbers, 0);
              double[] shares = CostElasticities.at(fit.function(), v).shares();
              for (int c = 0; c < columns; c++) {
                values[c][r] = c < width ? numbers[c] : shares[c - width];
              }
            });
    List<String> inputs = data.arguments().inputs();
    List<Spread> spreads = new ArrayList<>();
    int place = 0;
    if (scale) {
      spreads.add(spread("scale", "", values[place++]));
    }
    for (int i = 0; i < n; i++) {
      spreads.add(spread("share", inputs.get(i), values[width + i]));
    }
    for (int i = 0; i < n; i++) {
      spreads.add(spread("demand", inputs.get(i), values[place + i * n + i]));
    }
    place += n * n;
    for (int i = 0; i < n; i++) {
      for (int j = i; j < n; j++, place++) {
        if (i != j) {
          spreads.add(spread("allen", inputs.get(i) + " and " + inputs.get(j), values[place]));
        }
      }
    }
    return spreads;
  }

  private static Spread spread(String measure, String of, double[] values) {
    double[] sorted = values.clone();
    Arrays.sort(sorted);
    return new Spread(
        measure,
        of,
        sorted[0],
        quantile(sorted, 0.1),
        quantile(sorted, 0.25),
        quantile(sorted, 0.5),
        quantile(sorted, 0.75),
        quantile(sorted, 0.9),
        sorted[sorted.length - 1]);
  }

  /** The linear interpolation between order statistics that R calls type 7. */
  private static double quantile(double[] sorted, double share) {
    double position = share * (sorted.length - 1);
    int below = (int) Math.floor(position);
    int above = Math.min(below + 1, sorted.length - 1);
    return sorted[below] + (position - below) * (sorted[above] - sorted[below]);
  }
}
