package isowright.study;

import isowright.cost.CostElasticities;
import isowright.cost.CostFunction;
import isowright.estimation.CostData;
import isowright.estimation.CostFit;
import isowright.estimation.CostSpecification.Equations;
import isowright.estimation.EstimatedCost;
import isowright.inference.DeltaMethod;
import isowright.inference.Propagation;
import isowright.records.Panel;
import isowright.study.CostTask.Settled;
import isowright.study.Findings.Said;
import isowright.study.PlanFindings.CurvePoint;
import isowright.study.PlanFindings.Planned;
import isowright.study.Study.LeastCostQuestion;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.function.Function;

/**
 * Answers the least-cost questions of a study with fitted cost functions: demands by Shephard's
 * lemma, marginal cost as the derivative of cost, the short run of what is held and the long run of
 * fixed inputs that have a price, with the same figures and states as answers from production
 * functions.
 */
final class CostPlans {

  private final Study study;
  private final Costs asked;
  private final CostData data;
  private final CostCircumstances circumstances;

  CostPlans(Study study, Costs asked, Panel panel, CostData data) {
    this.study = study;
    this.asked = asked;
    this.data = data;
    this.circumstances = new CostCircumstances(study, asked, panel, data);
  }

  /** One question to one cost function, with what is needed to say how sure its answer is. */
  private record Put(
      LeastCostQuestion question,
      CostFit fit,
      CostTask task,
      CostFunction function,
      Propagation<CostFunction> propagation) {

    List<Figure> figures(Function<CostFunction, double[]> numbers, DeltaMethod.Scale scale) {
      return propagation.estimates(numbers, scale).stream().map(FitStage::figure).toList();
    }
  }

  /** The answers of these fits, question by question. */
  List<Planned> plans(List<CostFit> fits) {
    List<Planned> plans = new ArrayList<>();
    for (LeastCostQuestion question : study.leastCost()) {
      for (CostFit fit : fits) {
        String name = fit.function().form();
        boolean wanted =
            question.technologies().isEmpty() || question.technologies().contains(name);
        if (wanted && fit.specification().equations() != Equations.SHARES) {
          plans.add(answer(put(question, fit)));
        }
      }
    }
    return plans;
  }

  private Put put(LeastCostQuestion question, CostFit fit) {
    EstimatedCost estimated = EstimatedCost.of(data, fit, circumstances.productivity(question));
    Propagation<CostFunction> propagation =
        new Propagation<>(
            estimated.centre(),
            estimated.covariance(),
            fit.degreesOfFreedom(),
            fit.specification().confidence(),
            estimated::at);
    return new Put(question, fit, circumstances.task(question), estimated.function(), propagation);
  }

  private Planned answer(Put put) {
    List<Said> remarks = new ArrayList<>();
    LeastCostQuestion question = put.question();
    Settled settled = put.task().settle(put.function(), question.target());
    String status = status(put, settled, remarks);
    boolean answered = !status.equals("infeasible") && !status.equals("irregular");
    List<Figure> money =
        answered
            ? put.figures(f -> put.task().numbers(f, settled), DeltaMethod.Scale.LOG)
            : List.of();
    PlanDetail detail =
        answered
            ? new CostPlanDetail(
                    put.task(), settled, put::figures, v -> circumstances.outside(v).isEmpty())
                .detail(question, CurveSpan.targets(question, question.target()), put.function())
            : CostPlanDetail.bare(question);
    return new Planned(
        question.name(),
        put.fit().function().form(),
        true,
        question.target(),
        prices(put.task()),
        circumstances.whose(put.fit(), question),
        circumstances.limitWords(question, put.task()),
        status,
        answered ? mix(put.task(), settled, money) : Map.of(),
        answered ? Optional.of(money.get(0)) : Optional.empty(),
        answered ? Optional.of(money.get(1)) : Optional.empty(),
        answered ? Optional.of(money.get(2)) : Optional.empty(),
        answered ? shares(put, settled) : Map.of(),
        answered ? departure(put, settled) : Double.NaN,
        answered ? curve(put) : List.of(),
        List.of(),
        List.of(),
        remarks,
        detail);
  }

  /** Quantities; one that is bound is known without error. */
  private static Map<String, Figure> mix(CostTask task, Settled settled, List<Figure> money) {
    Map<String, Figure> mix = new LinkedHashMap<>();
    for (int q = 0; q < task.names().size(); q++) {
      double bound = settled.bound()[q];
      mix.put(task.names().get(q), Double.isNaN(bound) ? money.get(3 + q) : Figure.exact(bound));
    }
    return mix;
  }

  private static Map<String, Figure> shares(Put put, Settled settled) {
    CostTask task = put.task();
    List<Figure> all =
        put.figures(
            f -> {
              double[] numbers = task.numbers(f, settled);
              double[] shares = new double[task.names().size()];
              for (int q = 0; q < shares.length; q++) {
                shares[q] = price(task, q) * numbers[3 + q] / numbers[0];
              }
              return shares;
            },
            DeltaMethod.Scale.LINEAR);
    Map<String, Figure> shares = new LinkedHashMap<>();
    for (int q = 0; q < all.size(); q++) {
      if (!Double.isNaN(price(task, q))) {
        shares.put(task.names().get(q), all.get(q));
      }
    }
    return shares;
  }

  /** The price of a quantity; NaN where a fixed input has none. */
  private static double price(CostTask task, int q) {
    return q < task.inputs() ? Math.exp(task.v()[q]) : task.fixedPrices()[q - task.inputs()];
  }

  /** How far Σ w x is from cost (homogeneity) and the fixed inputs from their best, relatively. */
  private static double departure(Put put, Settled settled) {
    double sum = 0;
    for (double share : CostElasticities.at(put.function(), settled.at()).shares()) {
      sum += share;
    }
    return Math.max(Math.abs(sum - 1), settled.departure());
  }

  private String status(Put put, Settled settled, List<Said> remarks) {
    if (asked.outputs().size() != 1) {
      remarks.add(
          Said.of(
              "warning",
              "infeasible",
              "One target is asked of "
                  + asked.outputs().size()
                  + " outputs; a least-cost question answers for a cost function of one output."));
      return "infeasible";
    }
    if (settled.reason().isPresent()) {
      remarks.add(
          Said.of("warning", "infeasible", "There is no plan: " + settled.reason().get() + "."));
      return "infeasible";
    }
    String irregular = irregular(put.function(), settled.at());
    if (!irregular.isEmpty()) {
      remarks.add(
          Said.of(
              "warning",
              "irregular",
              "At these prices and this target the fitted function is no cost function ("
                  + irregular
                  + "), so there is no plan."));
      return "irregular";
    }
    fixedInputs(put, settled, remarks);
    if (study.money().base().isPresent()
        && !put.question().prices().keySet().containsAll(data.arguments().inputs())) {
      remarks.add(
          Said.of(
              "note",
              "money-of-the-period",
              "Prices that the question does not state are those recorded, in money of the period:"
                  + " the cost side is not deflated, which changes no estimate. State prices to"
                  + " have the answer in their money."));
    }
    List<String> outside = circumstances.outside(settled.at());
    if (!outside.isEmpty()) {
      remarks.add(
          Said.of(
              "warning",
              "outside-records",
              "This answer is a guess beyond the records: " + String.join("; ", outside) + "."));
      return "outside-records";
    }
    return settled.limited() ? "corner" : "solved";
  }

  private static String irregular(CostFunction function, double[] v) {
    CostElasticities at = CostElasticities.at(function, v);
    List<String> reasons = new ArrayList<>();
    if (!at.monotone()) {
      reasons.add("a share or marginal cost is not positive");
    }
    if (!at.concave()) {
      reasons.add("it is not concave in prices");
    }
    return String.join("; ", reasons);
  }

  /** What must be said of inputs that are fixed. */
  private void fixedInputs(Put put, Settled settled, List<Said> remarks) {
    CostTask task = put.task();
    List<String> unpriced = new ArrayList<>();
    double[] gradient = new double[task.v().length];
    put.function().gradient(settled.at(), gradient);
    for (int f = 0; f < asked.fixed().size(); f++) {
      String name = asked.fixed().get(f).name();
      if (Double.isNaN(task.fixedPrices()[f])) {
        unpriced.add(name);
      }
      double slope = gradient[task.inputs() + asked.outputs().size() + f];
      if (slope > 0) {
        remarks.add(
            Said.of(
                "warning",
                "fixed-input-raises-cost",
                "More of the fixed input "
                    + name
                    + " raises variable cost here, where it could be left idle: variable cost rises"
                    + " by "
                    + PlanWords.number(slope)
                    + " per cent with a per cent of it."));
      }
    }
    if (!unpriced.isEmpty()) {
      remarks.add(
          Said.of(
              "note",
              "variable-cost",
              "Costs are variable costs: what "
                  + String.join(" and ", unpriced)
                  + " cost is not among them. State a price to have it counted and, where the"
                  + " quantity is not held, chosen."));
    }
  }

  private List<CurvePoint> curve(Put put) {
    CostTask task = put.task();
    List<Settled> kept = new ArrayList<>();
    List<Double> targets = new ArrayList<>();
    for (double target : CurveSpan.targets(put.question(), put.question().target())) {
      Settled settled = task.settle(put.function(), target);
      if (settled.reason().isEmpty() && irregular(put.function(), settled.at()).isEmpty()) {
        kept.add(settled);
        targets.add(target);
      }
    }
    int width = 3 + task.names().size();
    List<Figure> all =
        put.figures(
            f -> {
              double[] rows = new double[kept.size() * width];
              for (int k = 0; k < kept.size(); k++) {
                System.arraycopy(task.numbers(f, kept.get(k)), 0, rows, k * width, width);
              }
              return rows;
            },
            DeltaMethod.Scale.LOG);
    List<CurvePoint> points = new ArrayList<>();
    for (int k = 0; k < kept.size(); k++) {
      List<Figure> row = all.subList(k * width, (k + 1) * width);
      Map<String, Double> mix = new LinkedHashMap<>();
      for (int q = 0; q < task.names().size(); q++) {
        mix.put(task.names().get(q), row.get(3 + q).value());
      }
      boolean inside = circumstances.outside(kept.get(k).at()).isEmpty();
      points.add(new CurvePoint(targets.get(k), row.get(0), row.get(1), row.get(2), mix, inside));
    }
    return points;
  }

  private static Map<String, Double> prices(CostTask task) {
    Map<String, Double> prices = new LinkedHashMap<>();
    for (int q = 0; q < task.names().size(); q++) {
      if (!Double.isNaN(price(task, q))) {
        prices.put(task.names().get(q), price(task, q));
      }
    }
    return prices;
  }
}
