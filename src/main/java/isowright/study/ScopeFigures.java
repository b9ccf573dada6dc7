package isowright.study;

import isowright.cost.CostFunction;
import isowright.cost.GeneralisedCost;
import isowright.cost.OutputsTogether;
import isowright.estimation.CostData;
import isowright.estimation.CostFit;
import isowright.estimation.CostSpecification.Equations;
import isowright.inference.DeltaMethod;
import isowright.study.CostFindings.Together;
import isowright.study.FitFindings.Pair;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.stream.IntStream;

/**
 * What a fitted cost function says of several outputs made together, at the mean of the records.
 */
final class ScopeFigures {

  private final CostData data;
  private final CostFit fit;
  private final CostFigures figures;
  private final double[] mean;
  private final List<String> outputs;
  private final int m;

  ScopeFigures(CostData data, CostFit fit, CostFigures figures) {
    this.data = data;
    this.fit = fit;
    this.figures = figures;
    this.mean = figures.mean();
    this.outputs = data.arguments().outputs();
    this.m = outputs.size();
  }

  /** Absent where there is one output, or cost itself is not known. */
  Optional<Together> together() {
    if (m < 2 || fit.specification().equations() == Equations.SHARES) {
      return Optional.empty();
    }
    List<Figure> slopes =
        figures.figures(
            f -> {
              double[] all = new double[m * m];
              for (int k = 0; k < m * m; k++) {
                all[k] = OutputsTogether.complementarity(f, mean, k / m, k % m);
              }
              return all;
            },
            DeltaMethod.Scale.LINEAR);
    List<Pair> pairs = new ArrayList<>();
    for (int k = 0; k < m * m; k++) {
      String first = outputs.get(k / m);
      pairs.add(new Pair(first, outputs.get(k % m), "complementarity", slopes.get(k)));
    }
    return Optional.of(
        fit.function() instanceof GeneralisedCost
            ? scope(pairs)
            : new Together(
                Optional.empty(),
                Map.of(),
                pairs,
                "Economies of scope ask what one output costs alone, at zero of the others, and a"
                    + " function of the logs of outputs has no value there. Generalised Leontief"
                    + " and McFadden cost have one."));
  }

  private Together scope(List<Pair> pairs) {
    List<Figure> scope = figures.figures(this::scope, DeltaMethod.Scale.LINEAR);
    Map<String, Figure> each = new LinkedHashMap<>();
    for (int k = 0; k < m; k++) {
      each.put(outputs.get(k), scope.get(1 + k));
    }
    return new Together(Optional.of(scope.get(0)), each, pairs, reach());
  }

  private double[] scope(CostFunction f) {
    OutputsTogether together = new OutputsTogether((GeneralisedCost) f, mean);
    double[] all = new double[1 + m];
    all[0] = together.allApart();
    for (int k = 0; k < m; k++) {
      all[1 + k] = together.scope(k);
    }
    return all;
  }

  /**
   * Whether the records hold rows without some output, so that its absence is more than a guess.
   */
  private String reach() {
    int first = data.arguments().inputs().size();
    List<String> always =
        IntStream.range(0, m)
            .filter(
                k -> {
                  for (double log : data.points()[first + k]) {
                    if (Double.isInfinite(log)) {
                      return false;
                    }
                  }
                  return true;
                })
            .mapToObj(outputs::get)
            .toList();
    return always.isEmpty()
        ? ""
        : "No row is without "
            + String.join(", ", always)
            + ": what the other outputs cost without it lies outside the records, and economies of"
            + " scope rest on the form of the function there.";
  }
}
