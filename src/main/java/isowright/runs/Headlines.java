package isowright.runs;

import com.fasterxml.jackson.databind.JsonNode;
import isowright.study.Figure;
import java.util.LinkedHashMap;
import java.util.Map;
import java.util.Optional;

/**
 * The headline figures of a findings file by what they are: scale, elasticities, substitution and
 * technical change of each technology, cost, marginal cost and mix of each plan, gap of each
 * filing.
 */
final class Headlines {

  private final Map<Key, Figure> figures = new LinkedHashMap<>();

  private Headlines() {}

  /**
   * What a figure is.
   *
   * @param kind the part of the study: technology, plan or filing
   * @param of whose it is: the technology; question and technology; plant, period and technology
   * @param figure which figure
   */
  record Key(Comparison.Kind kind, String of, String figure) {}

  static Map<Key, Figure> of(JsonNode findings) {
    Headlines headlines = new Headlines();
    findings.path("fits").forEach(headlines::fit);
    findings.at("/costs/fits").forEach(headlines::costFit);
    findings.path("leastCost").forEach(headlines::plan);
    findings.path("filing").forEach(headlines::filing);
    return headlines.figures;
  }

  private void fit(JsonNode fit) {
    String of = fit.path("technology").asText();
    add(Comparison.Kind.TECHNOLOGY, of, "returns to scale", fit.path("returnsToScale"));
    fit.path("outputElasticity")
        .properties()
        .forEach(
            e ->
                add(
                    Comparison.Kind.TECHNOLOGY,
                    of,
                    "output elasticity of " + e.getKey(),
                    e.getValue()));
    boolean direct = fit.path("substitution").findValuesAsText("measure").contains("hicks");
    for (JsonNode pair : fit.path("substitution")) {
      if (pair.path("measure").asText().equals(direct ? "hicks" : "morishima")) {
        String names = pair.at("/pair/0").asText() + ", " + pair.at("/pair/1").asText();
        add(Comparison.Kind.TECHNOLOGY, of, "elasticity of substitution, " + names, pair);
      }
    }
    for (JsonNode parameter : fit.path("parameters")) {
      if (parameter.path("name").asText().equals("trend")) {
        add(Comparison.Kind.TECHNOLOGY, of, "trend of log output", parameter);
      }
    }
  }

  private void costFit(JsonNode fit) {
    String of = fit.path("technology").asText();
    add(Comparison.Kind.TECHNOLOGY, of, "scale economies", fit.path("scaleEconomies"));
    add(Comparison.Kind.TECHNOLOGY, of, "efficient scale", fit.at("/efficientScale/output"));
  }

  private void plan(JsonNode plan) {
    String of = plan.path("question").asText() + ", " + plan.path("technology").asText();
    if (figures.containsKey(new Key(Comparison.Kind.PLAN, of, "cost"))) {
      of += ", target " + plan.path("target").asText(); // further targets of one question
    }
    String whose = of;
    add(Comparison.Kind.PLAN, of, "cost", plan.path("cost"));
    add(Comparison.Kind.PLAN, of, "marginal cost", plan.path("marginalCost"));
    plan.path("mix")
        .properties()
        .forEach(e -> add(Comparison.Kind.PLAN, whose, e.getKey(), e.getValue()));
  }

  private void filing(JsonNode filing) {
    String of =
        filing.path("plant").asText()
            + ", "
            + filing.path("period").asText()
            + ", "
            + filing.path("technology").asText();
    add(Comparison.Kind.FILING, of, "filed cost", filing.path("filed"));
    add(Comparison.Kind.FILING, of, "least cost", filing.path("leastCost"));
    add(Comparison.Kind.FILING, of, "gap", filing.path("gap"));
  }

  private void add(Comparison.Kind kind, String of, String figure, JsonNode node) {
    figure(node).ifPresent(found -> figures.putIfAbsent(new Key(kind, of, figure), found));
  }

  /** The figure that stands here, if one does; an end that is null is open. */
  private static Optional<Figure> figure(JsonNode node) {
    if (node.isNumber()) {
      return Optional.of(Figure.exact(node.asDouble()));
    }
    JsonNode value = node.path("value");
    if (!value.isNumber()) {
      return Optional.empty();
    }
    return Optional.of(
        node.path("se").isNumber() || node.path("low").isNumber() || node.path("high").isNumber()
            ? Figure.estimated(
                value.asDouble(),
                node.path("se").asDouble(Double.NaN),
                node.path("low").asDouble(Double.NEGATIVE_INFINITY),
                node.path("high").asDouble(Double.POSITIVE_INFINITY),
                node.path("method").asText())
            : Figure.exact(value.asDouble()));
  }
}
