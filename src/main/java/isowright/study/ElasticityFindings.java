package isowright.study;

import isowright.estimation.CurvatureProfile;
import isowright.estimation.Fit;
import isowright.inference.DeltaMethod;
import isowright.inference.Intervals;
import isowright.study.FitFindings.Pair;
import isowright.technology.Elasticities;
import isowright.technology.Technology;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.function.Function;

/** Elasticities of a fit at the geometric mean of the sample, each with its uncertainty. */
final class ElasticityFindings {

  /** Derivatives of elasticities are differences and good to about 1e-9 of their size. */
  private static final double ROUNDING = 1e-9;

  private final Intervals intervals;
  private final List<String> inputs;
  private final double[] mean;
  private final List<CurvatureProfile> profiles;

  ElasticityFindings(Fit fit, Intervals intervals) {
    this.intervals = intervals;
    this.inputs = fit.panel().inputs();
    this.mean = fit.meanLogInputs();
    this.profiles = fit.profiles();
  }

  Map<String, Figure> output() {
    List<Figure> figures = figures(t -> Elasticities.at(t, mean).output());
    Map<String, Figure> named = new LinkedHashMap<>();
    for (int i = 0; i < inputs.size(); i++) {
      named.put(inputs.get(i), figures.get(i));
    }
    return named;
  }

  Figure scale() {
    return figures(t -> new double[] {Elasticities.at(t, mean).scale()}).get(0);
  }

  /**
   * Hicks once for a pair, Allen once for a pair, Morishima in both directions. Where one curvature
   * rules them all, the interval is that of its profile, unless plants were drawn: the delta
   * interval misleads in a flat valley.
   */
  List<Pair> substitution() {
    int n = inputs.size();
    List<Figure> hicks = figures(t -> hicks(Elasticities.at(t, mean)));
    List<Figure> allen = figures(t -> flat(Elasticities.at(t, mean).allen()));
    List<Figure> morishima = figures(t -> flat(Elasticities.at(t, mean).morishima()));
    List<Pair> pairs = new ArrayList<>();
    for (int i = 0; i < n; i++) {
      for (int j = i + 1; j < n; j++) {
        pairs.add(pair(i, j, "hicks", hicks.get(i * n + j)));
      }
    }
    for (int i = 0; i < n; i++) {
      for (int j = i + 1; j < n; j++) {
        pairs.add(pair(i, j, "allen", allen.get(i * n + j)));
      }
    }
    for (int i = 0; i < n; i++) {
      for (int j = 0; j < n; j++) {
        if (i != j) {
          pairs.add(pair(i, j, "morishima", morishima.get(i * n + j)));
        }
      }
    }
    return pairs;
  }

  /**
   * One number for how well inputs replace one another: Hicks's σ of the only pair; of more inputs
   * the mean of Morishima's over all ordered pairs, which is the σ of a CES technology. Its
   * interval is by the rules of {@link #substitution}.
   */
  Figure meanSubstitution() {
    Figure mean =
        figures(
                t -> {
                  Elasticities at = Elasticities.at(t, this.mean);
                  return new double[] {
                    inputs.size() == 2 ? hicks(at)[1] : offDiagonalMean(at.morishima())
                  };
                })
            .get(0);
    if (profiles.size() == 1 && !EstimatedFigures.resampled(mean)) {
      CurvatureProfile only = profiles.get(0);
      return EstimatedFigures.profiled(mean, only.substitutionLow(), only.substitutionHigh());
    }
    return fixedByTheForm(mean) ? exact(mean.value()) : mean;
  }

  private static double offDiagonalMean(double[][] square) {
    double sum = 0;
    for (int i = 0; i < square.length; i++) {
      for (int j = 0; j < square.length; j++) {
        sum += i == j ? 0 : square[i][j];
      }
    }
    return sum / (square.length * (square.length - 1.0));
  }

  /** ε_ij: what the quantity of i does, in percent, when the price of j rises by one percent. */
  List<Pair> demand() {
    int n = inputs.size();
    List<Figure> demand = figures(t -> flat(Elasticities.at(t, mean).demand()));
    List<Pair> pairs = new ArrayList<>();
    for (int i = 0; i < n; i++) {
      for (int j = 0; j < n; j++) {
        pairs.add(new Pair(inputs.get(i), inputs.get(j), "demand", demand.get(i * n + j)));
      }
    }
    return pairs;
  }

  private Pair pair(int i, int j, String measure, Figure figure) {
    Figure shown =
        profile(inputs.get(i), inputs.get(j), measure)
            .filter(p -> !EstimatedFigures.resampled(figure))
            .map(p -> EstimatedFigures.profiled(figure, p.substitutionLow(), p.substitutionHigh()))
            .orElseGet(() -> fixedByTheForm(figure) ? exact(figure.value()) : figure);
    return new Pair(inputs.get(i), inputs.get(j), measure, shown);
  }

  /**
   * The profile of the curvature that alone fixes this elasticity: the only one; of several, that
   * of a nest for the direct elasticity inside it, and that between groups for Allen's between
   * inputs of different groups (Sato 1967).
   */
  private Optional<CurvatureProfile> profile(String first, String second, String measure) {
    if (profiles.size() < 2) {
      return profiles.stream().findFirst();
    }
    Optional<CurvatureProfile> nest =
        profiles.stream()
            .filter(
                p -> {
                  List<String> members =
                      List.of(p.name().substring(p.name().indexOf(':') + 1).split("\\+"));
                  return members.contains(first) && members.contains(second);
                })
            .findFirst();
    if (measure.equals("hicks")) {
      return nest;
    }
    return measure.equals("allen") && nest.isEmpty()
        ? profiles.stream().findFirst()
        : Optional.empty();
  }

  /** No parameter moves it: what standard error there is comes from rounding. */
  private static boolean fixedByTheForm(Figure figure) {
    return figure
        .uncertainty()
        .map(u -> u.standardError() <= ROUNDING * Math.abs(figure.value()))
        .orElse(true);
  }

  private static Figure exact(double value) {
    double nearest = Math.rint(value);
    boolean whole = Math.abs(value - nearest) <= ROUNDING * Math.abs(value);
    return Figure.exact(whole ? nearest : value);
  }

  private List<Figure> figures(Function<Technology, double[]> functions) {
    return intervals.estimates(functions, DeltaMethod.Scale.LINEAR).stream()
        .map(EstimatedFigures::of)
        .toList();
  }

  private double[] hicks(Elasticities at) {
    int n = inputs.size();
    double[] flat = new double[n * n];
    for (int i = 0; i < n; i++) {
      for (int j = i + 1; j < n; j++) {
        flat[i * n + j] = at.hicks(i, j);
      }
    }
    return flat;
  }

  static double[] flat(double[][] matrix) {
    int n = matrix.length;
    double[] flat = new double[n * n];
    for (int i = 0; i < n; i++) {
      System.arraycopy(matrix[i], 0, flat, i * n, n);
    }
    return flat;
  }
}
