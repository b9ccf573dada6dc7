package isowright.report;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import com.fasterxml.jackson.databind.JsonNode;
import isowright.inference.Estimate;
import java.util.ArrayList;
import java.util.List;
import java.util.Set;
import java.util.stream.Stream;

/**
 * The findings file as its format promises it, key by key: what a program that reads the file may
 * rely on. Keys may be added to the format and are no break of it; every key named here must be
 * there, with a value of the shape said.
 */
final class FindingsContract {

  private static final Set<String> METHODS =
      Set.copyOf(Stream.of(Estimate.Method.values()).map(Estimate.Method::word).toList());
  private static final List<String> UNCERTAIN = List.of("value", "se", "low", "high", "method");

  private final List<String> inputs;

  private FindingsContract(JsonNode file) {
    this.inputs = names(file.path("units").path("inputs"));
  }

  /** Checks a whole file. */
  static void check(JsonNode file) {
    FindingsContract contract = new FindingsContract(file);
    keys("file", file, "isowright", "study", "records", "fits", "leastCost", "filing");
    keys("isowright", file.get("isowright"), "version", "format");
    assertThat(file.at("/isowright/format").intValue()).isEqualTo(1);
    keys("study", file.get("study"), "title", "file", "sha256");
    assertThat(file.at("/study/sha256").textValue()).matches("[0-9a-f]{64}");
    records(file.get("records"));
    file.get("fits").forEach(contract::fit);
    file.get("leastCost").forEach(contract::plan);
    file.get("filing").forEach(contract::filing);
  }

  private static void records(JsonNode records) {
    if (records.isNull()) {
      return; // a study of given technologies alone reads none
    }
    keys("records", records, "file", "sha256", "rows", "used", "plants", "periods", "remarks");
    for (String count : List.of("rows", "used", "plants", "periods")) {
      assertThat(records.get(count).isInt()).as("records." + count).isTrue();
    }
    assertThat(records.get("used").intValue()).isBetween(1, records.get("rows").intValue());
    remarks("records", records);
  }

  private void fit(JsonNode fit) {
    String name = "fit " + fit.path("technology").asText();
    keys(
        name,
        fit,
        "technology plantEffects time standardErrors scaling rows plants converged parameters"
            + " covariance summary outputElasticity returnsToScale substitution regularity tests"
            + " plantLevels remarks");
    assertThat(fit.get("converged").isBoolean()).as(name).isTrue();
    boolean answered = fit.get("converged").booleanValue();
    remarks(name, fit);
    parameters(name, fit);
    covariance(name, fit);
    summary(name, fit, answered);
    if (answered) {
      assertThat(names(fit.get("outputElasticity"))).as(name).isEqualTo(inputs);
      fit.get("outputElasticity").forEach(e -> estimated(name, fit, e));
      figure(name, fit, fit.get("returnsToScale"));
    }
    for (JsonNode pair : fit.get("substitution")) {
      keys(name, pair, "pair", "measure", "value", "se", "low", "high");
      assertThat(pair.get("pair")).hasSize(2).allSatisfy(p -> assertThat(inputs).contains(text(p)));
      assertThat(text(pair.get("measure"))).isIn("hicks", "allen", "morishima");
      interval(name, fit, pair);
    }
    regularity(name, fit.get("regularity"));
    fit.get("tests").forEach(test -> test(name, test));
    fit.get("plantLevels").forEach(level -> assertThat(level.isNumber()).as(name).isTrue());
  }

  private static void parameters(String name, JsonNode fit) {
    for (JsonNode parameter : fit.get("parameters")) {
      keys(name, parameter, "name", "value", "se", "low", "high", "p");
      interval(name + ", " + text(parameter.get("name")), fit, parameter);
      JsonNode p = parameter.get("p");
      if (p.isNull()) {
        assertThat(fit.get("remarks").findValuesAsText("message"))
            .as(name + ", p of " + parameter.get("name") + " is null and no remark says why")
            .anyMatch(m -> m.contains("p is null") && m.contains(text(parameter.get("name"))));
      } else {
        assertThat(p.doubleValue()).isBetween(0.0, 1.0);
      }
    }
  }

  /** As many rows and columns as parameters, symmetric, its diagonal the squared errors. */
  private static void covariance(String name, JsonNode fit) {
    JsonNode covariance = fit.get("covariance");
    JsonNode parameters = fit.get("parameters");
    assertThat(covariance).as(name).hasSameSizeAs(parameters);
    for (int i = 0; i < covariance.size(); i++) {
      assertThat(covariance.get(i)).as(name).hasSameSizeAs(parameters);
      for (int j = 0; j < i; j++) {
        assertThat(covariance.get(i).get(j)).as(name).isEqualTo(covariance.get(j).get(i));
      }
      JsonNode se = parameters.get(i).get("se");
      if (se.isNumber()) {
        double squared = se.doubleValue() * se.doubleValue();
        // one square root and one product away from one another
        assertThat(covariance.get(i).get(i).doubleValue())
            .as(name + ", variance of " + parameters.get(i).get("name"))
            .isCloseTo(squared, within(1e-14 * squared));
      }
    }
  }

  private static void summary(String name, JsonNode fit, boolean answered) {
    JsonNode summary = fit.get("summary");
    if (summary.isNull()) {
      assertThat(answered).as(name + " has no summary").isFalse();
      return;
    }
    String all = "ssr rSquared residualStandardError logLikelihood aic bic degreesOfFreedom";
    keys(name, summary, all);
    summary.forEach(value -> assertThat(value.isNumber()).as(name + ", summary").isTrue());
  }

  private static void regularity(String name, JsonNode regularity) {
    if (regularity.isNull()) {
      return;
    }
    keys(name, regularity, "rows", "monotone", "quasiConcave");
    int rows = regularity.get("rows").intValue();
    assertThat(regularity.get("monotone").intValue()).as(name).isBetween(0, rows);
    assertThat(regularity.get("quasiConcave").intValue()).as(name).isBetween(0, rows);
  }

  private static void test(String name, JsonNode test) {
    keys(name, test, "name", "null", "statistic", "distribution", "df", "p");
    assertThat(text(test.get("distribution")))
        .isIn("F", "chi-squared", "t", "normal", "mixed chi-squared");
    assertThat(test.get("df")).as(name).allSatisfy(df -> assertThat(df.isNumber()).isTrue());
    assertThat(test.get("p").isNull() || test.get("p").isNumber()).as(name).isTrue();
  }

  private void plan(JsonNode plan) {
    String name = "plan " + plan.path("question") + ", " + plan.path("technology");
    keys(
        name,
        plan,
        "question technology target prices status mix cost marginalCost averageCost shares"
            + " optimality curve remarks");
    assertThat(text(plan.get("status")))
        .isIn("solved", "corner", "irregular", "outside-records", "infeasible");
    assertThat(names(plan.get("prices"))).as(name).isEqualTo(inputs);
    remarks(name, plan);
    boolean answered = !plan.get("mix").isEmpty();
    assertThat(answered)
        .as(name)
        .isEqualTo(!List.of("irregular", "infeasible").contains(text(plan.get("status"))));
    for (String money : List.of("cost", "marginalCost", "averageCost")) {
      figure(name + ", " + money, plan, plan.get(money));
      assertThat(plan.get(money).isNull() && answered).as(name + ", " + money).isFalse();
    }
    if (answered) {
      assertThat(names(plan.get("mix"))).as(name).isEqualTo(inputs);
      assertThat(names(plan.get("shares"))).as(name).isEqualTo(inputs);
    }
    plan.get("mix").forEach(quantity -> figure(name, plan, quantity));
    plan.get("shares").forEach(share -> figure(name, plan, share));
    for (JsonNode point : plan.get("curve")) {
      keys(name, point, "target", "cost", "marginalCost", "averageCost", "mix");
      assertThat(names(point.get("mix"))).as(name).isEqualTo(inputs);
      figure(name, plan, point.get("cost"));
    }
  }

  private void filing(JsonNode filing) {
    String name = "filing of " + filing.path("plant") + ", " + filing.path("technology");
    keys(name, filing, "plant period technology filed atPrices leastCost gap parts remarks");
    keys(name, filing.get("parts"), "unreconciled", "technical", "mix");
    remarks(name, filing);
    figure(name, filing, filing.get("leastCost"));
    figure(name, filing, filing.get("gap"));
    figure(name, filing, filing.at("/parts/technical"));
    figure(name, filing, filing.at("/parts/mix"));
    if (filing.get("gap").isNull()) {
      return;
    }
    double parts =
        filing.at("/parts/unreconciled").doubleValue()
            + value(filing.at("/parts/technical"))
            + value(filing.at("/parts/mix"));
    // differences of costs that are themselves rounded: some units in the last place of each
    double rounding = 1e-12 * Math.abs(filing.get("filed").doubleValue());
    assertThat(parts)
        .as(name + ": parts of the gap")
        .isCloseTo(value(filing.get("gap")), within(rounding));
  }

  /** An estimated figure, an exact number, or null with a remark nearby. */
  private static void figure(String name, JsonNode owner, JsonNode figure) {
    if (figure.isNull()) {
      explained(name, owner);
    } else if (!figure.isNumber()) {
      estimated(name, owner, figure);
    }
  }

  private static void estimated(String name, JsonNode owner, JsonNode figure) {
    assertThat(names(figure)).as(name).containsExactlyElementsOf(UNCERTAIN);
    assertThat(text(figure.get("method"))).as(name).isIn(METHODS);
    interval(name, owner, figure);
  }

  /** The value a number; error and ends numbers in order, or null with a remark nearby. */
  private static void interval(String name, JsonNode owner, JsonNode figure) {
    assertThat(figure.get("value").isNumber()).as(name + ", value").isTrue();
    double value = value(figure);
    JsonNode se = figure.get("se");
    boolean exact = se.isNull() && figure.path("method").isNull();
    if (exact) {
      assertThat(figure.get("low").isNull() && figure.get("high").isNull()).as(name).isTrue();
      return;
    }
    if (se.isNull()) {
      explained(name + ", se", owner);
    } else {
      assertThat(se.doubleValue()).as(name + ", se").isPositive();
    }
    for (String end : List.of("low", "high")) {
      if (figure.get(end).isNull()) {
        explained(name + ", " + end, owner);
      }
    }
    assertThat(figure.get("low").asDouble(value)).as(name + ", low").isLessThanOrEqualTo(value);
    assertThat(figure.get("high").asDouble(value))
        .as(name + ", high")
        .isGreaterThanOrEqualTo(value);
  }

  /** Where a figure is null, the owner of the figure says why. */
  private static void explained(String name, JsonNode owner) {
    assertThat(owner.get("remarks")).as(name + " is null and no remark says why").isNotEmpty();
  }

  private static void remarks(String name, JsonNode owner) {
    for (JsonNode remark : owner.get("remarks")) {
      keys(name + ", remarks", remark, "severity", "code", "message", "rows");
      assertThat(text(remark.get("severity"))).isIn("error", "warning", "note");
      assertThat(text(remark.get("code"))).matches("[a-z0-9-]+");
      assertThat(text(remark.get("message"))).isNotBlank();
      assertThat(remark.get("rows")).allSatisfy(row -> assertThat(row.isInt()).isTrue());
    }
  }

  private static double value(JsonNode figure) {
    return figure.isNumber() ? figure.doubleValue() : figure.get("value").doubleValue();
  }

  private static String text(JsonNode node) {
    assertThat(node.isTextual()).as(node.toString()).isTrue();
    return node.textValue();
  }

  static List<String> names(JsonNode object) {
    List<String> names = new ArrayList<>();
    object.fieldNames().forEachRemaining(names::add);
    return names;
  }

  private static void keys(String name, JsonNode object, String... expected) {
    assertThat(object.isObject()).as(name + " is an object").isTrue();
    for (String keys : expected) {
      assertThat(names(object)).as(name).contains(keys.split(" "));
    }
  }
}
