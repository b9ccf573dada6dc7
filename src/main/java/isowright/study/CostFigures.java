package isowright.study;

import isowright.cost.CostArguments;
import isowright.cost.CostElasticities;
import isowright.cost.CostFunction;
import isowright.cost.GeneralisedCost;
import isowright.estimation.CostData;
import isowright.estimation.CostFit;
import isowright.estimation.CostSpecification.Equations;
import isowright.inference.DeltaMethod;
import isowright.inference.Law;
import isowright.inference.Propagation;
import isowright.records.Panel;
import isowright.study.CostFindings.AtMean;
import isowright.study.CostFindings.Efficient;
import isowright.study.CostFindings.RowScale;
import isowright.study.FitFindings.Pair;
import isowright.study.FitFindings.Parameter;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.function.Function;

/** The figures of a fitted cost function, each with its uncertainty. */
final class CostFigures {

  /** More rows than this cannot be told apart in one picture. */
  private static final int ROWS = 2000;

  private final CostData data;
  private final CostFit fit;
  private final Propagation<CostFunction> propagation;
  private final double[] mean;

  CostFigures(CostData data, CostFit fit) {
    this.data = data;
    this.fit = fit;
    int p = fit.function().parameters().length;
    double[][] covariance = new double[p][];
    for (int k = 0; k < p; k++) {
      covariance[k] = java.util.Arrays.copyOf(fit.covariance()[k], p);
    }
    this.propagation =
        new Propagation<>(
            fit.function().parameters(),
            covariance,
            fit.degreesOfFreedom(),
            fit.specification().confidence(),
            fit.function()::withParameters);
    this.mean = new double[data.arguments().size()];
    for (int k = 0; k < mean.length; k++) {
      mean[k] = CostRecords.mean(data.points()[k]);
    }
  }

  /** Whether cost is known, not its shares alone. */
  private boolean ofCost() {
    return fit.specification().equations() != Equations.SHARES;
  }

  /** The arguments at their means (of logs, where they are logged), shape A. */
  double[] mean() {
    return mean.clone();
  }

  List<Figure> figures(Function<CostFunction, double[]> functions, DeltaMethod.Scale scale) {
    return propagation.estimates(functions, scale).stream().map(FitStage::figure).toList();
  }

  List<Parameter> parameters() {
    Law law = new Law.Student(fit.degreesOfFreedom());
    List<Parameter> parameters = new ArrayList<>();
    for (int k = 0; k < fit.names().size(); k++) {
      double value = fit.values()[k];
      double error = Math.sqrt(Math.max(0, fit.covariance()[k][k]));
      Figure figure =
          error == 0
              ? Figure.exact(value)
              : FitStage.figure(propagation.estimate(value, error, DeltaMethod.Scale.LINEAR));
      parameters.add(
          new Parameter(
              fit.names().get(k), figure, error == 0 ? Double.NaN : law.p(value / error)));
    }
    return parameters;
  }

  AtMean atMean() {
    CostArguments arguments = data.arguments();
    int n = arguments.inputs().size();
    int m = arguments.outputs().size();
    boolean outputs = m > 0 && ofCost();
    List<Figure> figures =
        figures(
            f -> {
              CostElasticities at = CostElasticities.at(f, mean);
              double[] all = new double[n + 2 * n * n + n * n + m + 2 + n];
              int k = 0;
              for (double share : at.shares()) {
                all[k++] = share;
              }
              for (int i = 0; i < n; i++) {
                for (int j = 0; j < n; j++) {
                  all[k++] = at.allen(i, j);
                }
              }
              for (int i = 0; i < n; i++) {
                for (int j = 0; j < n; j++) {
                  all[k++] = at.morishima(i, j);
                }
              }
              for (int i = 0; i < n; i++) {
                for (int j = 0; j < n; j++) {
                  all[k++] = at.demand(i, j);
                }
              }
              for (int o = 0; o < m; o++) {
                all[k++] = at.costElasticity(o);
              }
              all[k++] = outputs ? at.scaleEconomies() : 0;
              all[k++] = arguments.time() ? at.technicalChange() : 0;
              for (int i = 0; i < n; i++) {
                all[k++] = arguments.time() ? at.bias(i) : 0;
              }
              return all;
            },
            DeltaMethod.Scale.LINEAR);
    int after = n + 3 * n * n;
    boolean level = arguments.time() && ofCost();
    return new AtMean(
        named(arguments.inputs(), figures.subList(0, n)),
        outputs ? named(arguments.outputs(), figures.subList(after, after + m)) : Map.of(),
        outputs ? Optional.of(figures.get(after + m)) : Optional.empty(),
        substitution(figures.subList(n, n + 2 * n * n)),
        demand(figures.subList(n + 2 * n * n, after)),
        level ? Optional.of(figures.get(after + m + 1)) : Optional.empty(),
        arguments.time()
            ? named(arguments.inputs(), figures.subList(after + m + 2, after + m + 2 + n))
            : Map.of(),
        Optional.empty());
  }

  private static Map<String, Figure> named(List<String> names, List<Figure> figures) {
    Map<String, Figure> named = new LinkedHashMap<>();
    for (int i = 0; i < names.size(); i++) {
      named.put(names.get(i), figures.get(i));
    }
    return named;
  }

  private List<Pair> substitution(List<Figure> figures) {
    List<String> inputs = data.arguments().inputs();
    int n = inputs.size();
    List<Pair> pairs = new ArrayList<>();
    for (int i = 0; i < n; i++) {
      for (int j = i + 1; j < n; j++) {
        pairs.add(new Pair(inputs.get(i), inputs.get(j), "allen", figures.get(i * n + j)));
      }
    }
    for (int i = 0; i < n; i++) {
      for (int j = 0; j < n; j++) {
        if (i != j) {
          pairs.add(
              new Pair(inputs.get(i), inputs.get(j), "morishima", figures.get(n * n + i * n + j)));
        }
      }
    }
    return pairs;
  }

  private List<Pair> demand(List<Figure> figures) {
    List<String> inputs = data.arguments().inputs();
    int n = inputs.size();
    List<Pair> pairs = new ArrayList<>();
    for (int i = 0; i < n; i++) {
      for (int j = 0; j < n; j++) {
        pairs.add(new Pair(inputs.get(i), inputs.get(j), "demand", figures.get(i * n + j)));
      }
    }
    return pairs;
  }

  /** What the cost function says over the rows. */
  CostRows rows(Panel panel) {
    return new CostRowFigures(data, fit, panel, mean).rows(propagation);
  }

  /** Scale economies of every row, thinned where there are many. */
  List<RowScale> scale(Panel panel) {
    List<String> outputs = data.arguments().outputs();
    boolean known = !outputs.isEmpty() && ofCost();
    if (!known) {
      return List.of();
    }
    int step = Math.max(1, (data.rows() + ROWS - 1) / ROWS);
    int count = (data.rows() + step - 1) / step;
    List<Figure> figures =
        figures(
            f -> {
              double[] economies = new double[count];
              for (int k = 0; k < count; k++) {
                economies[k] = CostElasticities.at(f, data.point(k * step)).scaleEconomies();
              }
              return economies;
            },
            DeltaMethod.Scale.LINEAR);
    int first = data.arguments().inputs().size();
    List<RowScale> rows = new ArrayList<>();
    for (int k = 0; k < count; k++) {
      int row = k * step;
      rows.add(
          new RowScale(
              panel.fileRows().get(row),
              panel.plants().get(panel.plantOf(row)),
              panel.periods().get(panel.rowPeriods().get(row)),
              Math.exp(data.points()[first][row]),
              figures.get(k)));
    }
    return rows;
  }

  /**
   * The output at which the elasticity of cost in output is one, other arguments at their means:
   * the least of average cost where that elasticity rises with output. For one output.
   */
  Optional<Efficient> efficient() {
    CostArguments arguments = data.arguments();
    if (arguments.outputs().size() != 1 || !arguments.fixed().isEmpty()) {
      return Optional.empty(); // the least of average variable cost is no efficient scale
    }
    Optional<Function<CostFunction, double[]>> least =
        fit.function() instanceof GeneralisedCost levels
            ? leastInLevels(levels)
            : leastInLogs(arguments);
    if (least.isEmpty()) {
      return Optional.empty();
    }
    Figure figure = figures(least.get(), DeltaMethod.Scale.LOG).get(0);
    int place = arguments.inputs().size();
    long below = 0;
    for (double y : data.points()[place]) {
      below += Math.exp(y) < figure.value() ? 1 : 0;
    }
    return Optional.of(new Efficient(figure, (double) below / data.rows()));
  }

  /** In logs: the square of output is all that bends the elasticity of cost in it. */
  private Optional<Function<CostFunction, double[]>> leastInLogs(CostArguments arguments) {
    String output = arguments.outputs().get(0);
    int square = fit.function().parameterNames().indexOf(output + "*" + output);
    if (square < 0 || !(fit.function().parameters()[square] > 0)) {
      return Optional.empty();
    }
    int place = arguments.inputs().size();
    return Optional.of(
        f -> {
          CostElasticities at = CostElasticities.at(f, mean);
          double away = (1 - at.costElasticity(0)) / f.parameters()[square];
          return new double[] {Math.exp(mean[place] + away)};
        });
  }

  /** In levels: C = F + m y + ½ C″ y², average cost is least at √(2 F/C″). */
  private Optional<Function<CostFunction, double[]>> leastInLevels(GeneralisedCost levels) {
    double[] nothing = mean.clone();
    nothing[data.arguments().inputs().size()] = Double.NEGATIVE_INFINITY;
    double fixed = Math.exp(levels.logCost(nothing));
    if (!(fixed > 0 && levels.complementarity(mean, 0, 0) > 0)) {
      return Optional.empty();
    }
    return Optional.of(
        f -> {
          double steep = ((GeneralisedCost) f).complementarity(mean, 0, 0);
          return new double[] {Math.sqrt(2 * Math.exp(f.logCost(nothing)) / steep)};
        });
  }

  /** Where the function is a cost function. */
  CostFindings.Regular regularity() {
    int monotone = 0;
    int concave = 0;
    int both = 0;
    boolean shares = !ofCost();
    for (int row = 0; row < data.rows(); row++) {
      CostElasticities at = CostElasticities.at(fit.function(), data.point(row));
      boolean rising = shares ? positive(at.shares()) : at.monotone();
      boolean bent = at.concave();
      monotone += rising ? 1 : 0;
      concave += bent ? 1 : 0;
      both += rising && bent ? 1 : 0;
    }
    return new CostFindings.Regular(data.rows(), monotone, concave, both);
  }

  private static boolean positive(double[] shares) {
    for (double share : shares) {
      if (!(share > 0)) {
        return false;
      }
    }
    return true;
  }
}
