package isowright.study;

import isowright.study.Findings.Said;
import isowright.study.FitFindings.Curvature;
import isowright.study.FitFindings.Fitted;
import isowright.study.FitFindings.How;
import isowright.study.FitFindings.Influential;
import isowright.study.FitFindings.Pair;
import isowright.study.FitFindings.Parameter;
import isowright.study.FitFindings.Point;
import isowright.study.FitFindings.ProfilePoint;
import isowright.study.FitFindings.Regular;
import isowright.study.FitFindings.Summary;
import isowright.study.FitFindings.Tested;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.apache.commons.statistics.distribution.TDistribution;

/** Fits of the invented glassworks: numbers that hang together, estimated by nobody. */
final class GlassworksFits {

  private static final double CRITICAL = 2.093; // t with 19 degrees of freedom, 97.5 %

  private GlassworksFits() {}

  static Figure figure(double value, double se) {
    return Figure.estimated(value, se, value - CRITICAL * se, value + CRITICAL * se, "delta");
  }

  static Fitted cobbDouglas(GlassworksPlants plants) {
    List<Parameter> parameters =
        List.of(
            parameter("constant", 10.74, 0.021),
            parameter("labour", 0.42, 0.061),
            parameter("machines", 0.38, 0.055),
            parameter("energy", 0.24, 0.048),
            parameter("trend", 0.011, 0.004));
    return fitted("cobb-douglas", "estimated", plants)
        .parameters(parameters)
        .summary(new Summary(1.482, 0.9613, 0.1136, 94.21, -176.42, -159.7, 115))
        .elasticities(figure(0.42, 0.061), figure(0.38, 0.055), figure(0.24, 0.048))
        .scale(figure(1.04, 0.026))
        .regularity(new Regular(120, 120, 120, 120, counts(0, 0, 0)))
        .tests(
            List.of(
                new Tested(
                    "constant-returns",
                    "output elasticities sum to 1",
                    2.367,
                    "F",
                    List.of(1.0, 19.0),
                    0.1404,
                    "Constant returns to scale are not rejected at the 5 % level.")))
        .build();
  }

  static Fitted ces(GlassworksPlants plants) {
    List<ProfilePoint> curve = new ArrayList<>();
    for (int i = 0; i <= 60; i++) {
      double substitution = 0.05 * Math.pow(400, i / 60.0);
      double away = Math.log(substitution / 0.62);
      curve.add(new ProfilePoint(1 / substitution - 1, substitution, 1.431 + 0.062 * away * away));
    }
    java.util.Collections.reverse(curve); // ascending curvature is descending substitution
    return fitted("ces", "estimated", plants)
        .parameters(
            List.of(
                parameter("constant", 10.73, 0.02),
                parameter("share:labour", 0.41, 0.058),
                parameter("share:machines", 0.36, 0.052),
                parameter("share:energy", 0.23, 0.047),
                parameter("rho", 0.613, 0.51),
                parameter("scale", 1.052, 0.027),
                parameter("trend", 0.0107, 0.004)))
        .summary(new Summary(1.431, 0.9626, 0.1121, 96.31, -176.62, -154.3, 113))
        .elasticities(figure(0.431, 0.06), figure(0.379, 0.054), figure(0.242, 0.049))
        .scale(figure(1.052, 0.027))
        .substitution(
            List.of(
                pair("labour", "machines", "hicks", 0.62, 0.19),
                pair("labour", "energy", "hicks", 0.62, 0.19),
                pair("machines", "energy", "hicks", 0.62, 0.19)))
        .regularity(new Regular(120, 120, 120, 120, counts(0, 0, 0)))
        .curvature(
            new Curvature(
                "interior",
                "The sum of squares has its least value inside the admissible range, at an"
                    + " elasticity of substitution of 0.62.",
                curve,
                0.33,
                1.18,
                1.431 + 0.062 * Math.pow(Math.log(1.18 / 0.62), 2)))
        .tests(
            List.of(
                new Tested(
                    "unit-substitution",
                    "the elasticity of substitution is 1",
                    1.47,
                    "F",
                    List.of(1.0, 19.0),
                    0.2402,
                    "Unit elasticity of substitution is not rejected at the 5 % level.")))
        .build();
  }

  /** A fit whose sum of squares still falls at the edge of the admissible range. */
  static Fitted cesAtBoundary(GlassworksPlants plants) {
    List<ProfilePoint> curve = new ArrayList<>();
    for (int i = 0; i <= 60; i++) {
      double substitution = 50 * Math.pow(0.001, i / 60.0);
      curve.add(
          new ProfilePoint(
              1 / substitution - 1, substitution, 0.8054 + 0.02 * Math.log(50 / substitution)));
    }
    return fitted("ces", "boundary", plants)
        .curvature(
            new Curvature(
                "boundary",
                "The sum of squares still falls at the edge of the admissible range: no elasticity"
                    + " of substitution can be stated.",
                curve,
                1.6,
                Double.POSITIVE_INFINITY,
                0.874))
        .remarks(
            List.of(
                Said.of(
                    "warning",
                    "curvature-boundary",
                    "CES has no admissible optimum in these records; no plan is made from it.")))
        .build();
  }

  static Fitted translog(GlassworksPlants plants) {
    List<String> names =
        List.of(
            "constant",
            "labour",
            "machines",
            "energy",
            "labour*labour",
            "labour*machines",
            "labour*energy",
            "machines*machines",
            "machines*energy",
            "energy*energy");
    double[] values = {10.75, 0.437, 0.371, 0.251, -0.09, 0.05, 0.021, -0.071, 0.012, -0.043};
    double[] errors = {0.022, 0.066, 0.06, 0.051, 0.11, 0.08, 0.07, 0.1, 0.06, 0.05};
    List<Parameter> parameters = new ArrayList<>();
    for (int i = 0; i < values.length; i++) {
      parameters.add(parameter(names.get(i), values[i], errors[i]));
    }
    return fitted("translog", "estimated", plants)
        .parameters(parameters)
        .summary(new Summary(1.301, 0.966, 0.1087, 102.02, -182.04, -151.4, 110))
        .elasticities(figure(0.437, 0.066), figure(0.371, 0.06), figure(0.251, 0.051))
        .scale(figure(1.059, 0.029))
        .substitution(
            List.of(
                pair("labour", "machines", "allen", 0.78, 0.31),
                pair("labour", "energy", "allen", 0.91, 0.42),
                pair("machines", "energy", "allen", -0.14, 0.55)))
        .regularity(new Regular(120, 117, 111, 109, counts(0, 0, 3)))
        .remarks(
            List.of(
                Said.of(
                    "warning",
                    "irregular-rows",
                    "The translog is not regular at 11 of 120 rows; elasticities and plans there"
                        + " are void.")))
        .build();
  }

  /** A fit that could not be had. */
  static Fitted translogRankDeficient(GlassworksPlants plants) {
    return fitted("translog", "rank-deficient", plants)
        .points(List.of())
        .remarks(
            List.of(
                Said.of(
                    "error",
                    "rank-deficient",
                    "The columns ln labour and ln energy are collinear; the translog cannot be"
                        + " estimated.")))
        .build();
  }

  private static Map<String, Integer> counts(int labour, int machines, int energy) {
    Map<String, Integer> counts = new LinkedHashMap<>();
    counts.put("labour", labour);
    counts.put("machines", machines);
    counts.put("energy", energy);
    return counts;
  }

  private static Pair pair(String first, String second, String measure, double value, double se) {
    return new Pair(first, second, measure, figure(value, se));
  }

  private static Parameter parameter(String name, double value, double se) {
    double p = 2 * TDistribution.of(19).survivalProbability(Math.abs(value / se));
    return new Parameter(name, figure(value, se), p);
  }

  private static Draft fitted(String technology, String state, GlassworksPlants plants) {
    return new Draft(technology, state, plants);
  }

  /** A fit being put together. */
  private static final class Draft {
    private final String technology;
    private final String state;
    private List<Parameter> parameters = List.of();
    private Optional<Summary> summary = Optional.empty();
    private Map<String, Figure> elasticities = Map.of();
    private Optional<Figure> scale = Optional.empty();
    private List<Pair> substitution = List.of();
    private Optional<Regular> regularity = Optional.empty();
    private Optional<Curvature> curvature = Optional.empty();
    private List<Tested> tests = List.of();
    private List<Point> points;
    private List<Said> remarks = List.of();

    Draft(String technology, String state, GlassworksPlants plants) {
      this.technology = technology;
      this.state = state;
      this.points = plants.points(technology);
    }

    Draft parameters(List<Parameter> value) {
      parameters = value;
      return this;
    }

    Draft summary(Summary value) {
      summary = Optional.of(value);
      return this;
    }

    Draft elasticities(Figure labour, Figure machines, Figure energy) {
      Map<String, Figure> map = new LinkedHashMap<>();
      map.put("labour", labour);
      map.put("machines", machines);
      map.put("energy", energy);
      elasticities = map;
      return this;
    }

    Draft scale(Figure value) {
      scale = Optional.of(value);
      return this;
    }

    Draft substitution(List<Pair> value) {
      substitution = value;
      return this;
    }

    Draft regularity(Regular value) {
      regularity = Optional.of(value);
      return this;
    }

    Draft curvature(Curvature value) {
      curvature = Optional.of(value);
      return this;
    }

    Draft tests(List<Tested> value) {
      tests = value;
      return this;
    }

    Draft points(List<Point> value) {
      points = value;
      return this;
    }

    Draft remarks(List<Said> value) {
      remarks = value;
      return this;
    }

    Fitted build() {
      Map<String, Double> scaling = new LinkedHashMap<>();
      scaling.put("labour", 39800.0);
      scaling.put("machines", 13900.0);
      scaling.put("energy", 64100.0);
      How how =
          new How(
              "none",
              "trend",
              "clustered",
              "clustered by plant, CR1, factor 20/19 · 119/115; t with 19 degrees of freedom",
              19,
              scaling,
              120,
              20);
      List<Influential> influence =
          points.isEmpty()
              ? List.of()
              : List.of(
                  new Influential(
                      points.get(7).row(),
                      points.get(7).plant(),
                      points.get(7).period(),
                      0.141,
                      0.32,
                      2.31,
                      0.94,
                      0.71,
                      0.52,
                      "labour",
                      3),
                  new Influential(
                      points.get(64).row(),
                      points.get(64).plant(),
                      points.get(64).period(),
                      0.098,
                      0.11,
                      -1.44,
                      -0.47,
                      1.02,
                      -0.3,
                      "machines",
                      1));
      return new Fitted(
          technology,
          how,
          state,
          parameters,
          covariance(),
          summary,
          elasticities,
          scale,
          substitution,
          demand(),
          regularity,
          curvature,
          tests,
          Map.of(),
          PanelFindings.of(120),
          points.isEmpty() ? Optional.empty() : Optional.of(1.0064),
          points,
          influence,
          RobustnessFindings.NONE,
          Optional.empty(),
          remarks);
    }

    private List<Pair> demand() {
      if (elasticities.isEmpty()) {
        return List.of();
      }
      return List.of(
          pair("labour", "labour", "demand", -0.37, 0.11),
          pair("labour", "machines", "demand", 0.23, 0.09),
          pair("labour", "energy", "demand", 0.14, 0.06),
          pair("machines", "labour", "demand", 0.25, 0.1),
          pair("machines", "machines", "demand", -0.39, 0.12),
          pair("machines", "energy", "demand", 0.14, 0.06),
          pair("energy", "labour", "demand", 0.25, 0.1),
          pair("energy", "machines", "demand", 0.23, 0.09),
          pair("energy", "energy", "demand", -0.48, 0.13));
    }

    /** Variances as stated, correlations (−0.3)^|i−j|, which is positive definite. */
    private double[][] covariance() {
      int n = parameters.size();
      double[][] covariance = new double[n][n];
      for (int i = 0; i < n; i++) {
        for (int j = 0; j < n; j++) {
          covariance[i][j] =
              Math.pow(-0.3, Math.abs(i - j)) * (standardError(i) * standardError(j));
        }
      }
      return covariance;
    }

    private double standardError(int i) {
      return parameters.get(i).figure().uncertainty().orElseThrow().standardError();
    }
  }
}
