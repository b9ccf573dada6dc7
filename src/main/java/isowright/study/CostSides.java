package isowright.study;

import isowright.study.CostFindings.AtMean;
import isowright.study.CostFindings.Side;
import isowright.study.Figure.Uncertainty;
import isowright.study.Findings.Said;
import isowright.study.FitFindings.Fitted;
import isowright.study.FitFindings.Pair;
import isowright.study.PlanFindings.Planned;
import isowright.technology.Form;
import isowright.technology.Restriction;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.function.Function;
import java.util.stream.Collectors;

/**
 * The same figures from production and from cost, where a study has both: a technology and its cost
 * function describe one thing (Shephard 1953), so that scale, substitution and least cost must
 * agree but for chance and for what each presumes.
 */
final class CostSides {

  private final List<Fitted> production;
  private final List<CostFindings.Fitted> costs;
  private final List<Planned> plans;
  private final List<Side> sides = new ArrayList<>();

  private CostSides(List<Fitted> production, List<CostFindings.Fitted> costs, List<Planned> plans) {
    this.production = production.stream().filter(Fitted::usable).toList();
    this.costs = costs.stream().filter(CostFindings.Fitted::usable).toList();
    this.plans = plans;
  }

  /** The cost side with what both sides say; unchanged where one of them is missing. */
  static CostFindings in(CostFindings costs, List<Fitted> production, List<Planned> plans) {
    CostSides both = new CostSides(production, costs.fits(), plans);
    if (both.production.isEmpty() || both.costs.isEmpty()) {
      return costs;
    }
    both.atMean();
    both.plans();
    List<Said> remarks = new ArrayList<>(costs.remarks());
    if (!both.sides.isEmpty()) {
      remarks.addAll(both.reasons());
    }
    return new CostFindings(costs.fits(), remarks, both.sides);
  }

  private void atMean() {
    add(
        "scale",
        "",
        by(production, Fitted::technology, Fitted::returnsToScale),
        byCost(fit -> fit.at().flatMap(AtMean::scaleEconomies)));
    pairs("allen", Fitted::substitution, AtMean::substitution);
    pairs("demand", Fitted::demandElasticity, AtMean::demand);
  }

  /** Pairs that both sides know; of demand the own elasticities alone. */
  private void pairs(
      String measure, Function<Fitted, List<Pair>> made, Function<AtMean, List<Pair>> cost) {
    Set<List<String>> names = new LinkedHashSet<>();
    production.forEach(
        fit ->
            made.apply(fit).stream()
                .filter(pair -> pair.measure().equals(measure))
                .filter(pair -> !measure.equals("demand") || pair.first().equals(pair.second()))
                .forEach(pair -> names.add(List.of(pair.first(), pair.second()))));
    for (List<String> name : names) {
      add(
          measure,
          name.get(0).equals(name.get(1)) ? name.get(0) : String.join(" and ", name),
          by(production, Fitted::technology, fit -> find(made.apply(fit), measure, name)),
          byCost(fit -> fit.at().flatMap(at -> find(cost.apply(at), measure, name))));
    }
  }

  private static Optional<Figure> find(List<Pair> pairs, String measure, List<String> name) {
    return pairs.stream()
        .filter(pair -> pair.measure().equals(measure))
        .filter(pair -> pair.first().equals(name.get(0)) && pair.second().equals(name.get(1)))
        .map(Pair::figure)
        .findFirst();
  }

  private void plans() {
    Set<String> questions =
        plans.stream().map(Planned::question).collect(Collectors.toCollection(LinkedHashSet::new));
    for (String question : questions) {
      plan("least-cost", question, Planned::cost);
      plan("marginal-cost", question, Planned::marginalCost);
    }
  }

  private void plan(String measure, String question, Function<Planned, Optional<Figure>> figure) {
    Function<String, Optional<Figure>> of =
        technology ->
            plans.stream()
                .filter(p -> p.question().equals(question) && p.technology().equals(technology))
                .findFirst()
                .flatMap(figure);
    add(
        measure,
        question,
        by(production, Fitted::technology, fit -> of.apply(fit.technology())),
        byCost(fit -> of.apply(fit.technology())));
  }

  private Map<String, Figure> byCost(Function<CostFindings.Fitted, Optional<Figure>> figure) {
    return by(costs, CostFindings.Fitted::technology, figure);
  }

  private static <T> Map<String, Figure> by(
      List<T> fits, Function<T, String> name, Function<T, Optional<Figure>> figure) {
    Map<String, Figure> figures = new LinkedHashMap<>();
    for (T fit : fits) {
      figure
          .apply(fit)
          .filter(f -> Double.isFinite(f.value()))
          .ifPresent(f -> figures.put(name.apply(fit), f));
    }
    return figures;
  }

  private void add(String measure, String of, Map<String, Figure> made, Map<String, Figure> cost) {
    if (!made.isEmpty() && !cost.isEmpty()) {
      sides.add(new Side(measure, of, made, cost, apart(made, cost)));
    }
  }

  /** Whether some interval from production and some interval from cost do not meet. */
  private static boolean apart(Map<String, Figure> made, Map<String, Figure> cost) {
    return made.values().stream().anyMatch(m -> cost.values().stream().anyMatch(c -> apart(m, c)));
  }

  private static boolean apart(Figure first, Figure second) {
    Optional<Uncertainty> one = first.uncertainty();
    Optional<Uncertainty> other = second.uncertainty();
    return one.isPresent()
        && other.isPresent()
        && (one.get().low() > other.get().high() || other.get().low() > one.get().high());
  }

  /** What in this study makes the two sides differ. */
  private List<Said> reasons() {
    List<Said> reasons = new ArrayList<>();
    for (CostFindings.Fitted cost : costs) {
      for (Fitted made : production) {
        if (cost.how().rows() != made.how().rows()) {
          reasons.add(
              reason(
                  "The cost side rests on "
                      + cost.how().rows()
                      + " rows, the production side on "
                      + made.how().rows()
                      + ": a row enters a side only where what that side asks is known."));
        }
        if (!cost.how().plantEffects().equals(made.how().plantEffects())) {
          reasons.add(
              reason(
                  "Lasting differences between plants are treated otherwise: plant effects are "
                      + cost.how().plantEffects()
                      + " on the cost side, "
                      + made.how().plantEffects()
                      + " on the production side."));
        }
        if (!made.how()
            .time()
            .equals(cost.at().flatMap(AtMean::technicalChange).isPresent() ? "trend" : "none")) {
          reasons.add(reason("Change over time is treated otherwise on the two sides."));
        }
      }
    }
    for (Fitted made : production) {
      boolean oneScale =
          Form.all().stream()
              .filter(form -> form.name().equals(made.technology()))
              .anyMatch(form -> form.obeys(Restriction.HOMOGENEOUS));
      if (oneScale && squared()) {
        reasons.add(
            reason(
                "The production side has a form with one degree of returns to scale at every"
                    + " output, the cost side one whose scale economies change with output."));
      }
    }
    return reasons.stream().distinct().toList();
  }

  private static Said reason(String words) {
    return Said.of("note", "sides-differ", words);
  }

  /** Whether a cost function has the square of an output among its terms. */
  private boolean squared() {
    return costs.stream()
        .anyMatch(
            fit ->
                fit.at().stream()
                    .flatMap(at -> at.costElasticity().keySet().stream())
                    .anyMatch(
                        output ->
                            fit.parameters().stream()
                                .anyMatch(p -> p.name().equals(output + "*" + output))));
  }
}
