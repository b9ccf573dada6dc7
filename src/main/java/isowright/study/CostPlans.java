package isowright.study;

import isowright.cost.CostElasticities;
import isowright.cost.TranslogCost;
import isowright.estimation.CostData;
import isowright.estimation.CostFit;
import isowright.estimation.CostSpecification.Equations;
import isowright.inference.DeltaMethod;
import isowright.records.Panel;
import isowright.study.Findings.Said;
import isowright.study.PlanFindings.CurvePoint;
import isowright.study.PlanFindings.Planned;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;

/**
 * Answers the least-cost questions of a study with fitted cost functions: demands by Shephard's
 * lemma, marginal cost as the derivative of cost, with the same figures and states as answers from
 * production functions.
 */
final class CostPlans {

  private final Study study;
  private final Costs asked;
  private final Panel panel;
  private final CostData data;

  CostPlans(Study study, Costs asked, Panel panel, CostData data) {
    this.study = study;
    this.asked = asked;
    this.panel = panel;
    this.data = data;
  }

  /** The answers of these fits, question by question. */
  List<Planned> plans(List<CostFit> fits) {
    List<Planned> plans = new ArrayList<>();
    for (Study.LeastCostQuestion question : study.leastCost()) {
      for (CostFit fit : fits) {
        String name = fit.function().form();
        boolean wanted =
            question.technologies().isEmpty() || question.technologies().contains(name);
        if (wanted && fit.specification().equations() != Equations.SHARES) {
          plans.add(answer(question, fit));
        }
      }
    }
    return plans;
  }

  private Planned answer(Study.LeastCostQuestion question, CostFit fit) {
    List<Said> remarks = new ArrayList<>();
    double[] v = point(question);
    String status = status(question, fit, v, remarks);
    boolean answered = status.equals("solved") || status.equals("outside-records");
    CostFigures figures = new CostFigures(data, fit);
    int n = data.arguments().inputs().size();
    List<Figure> money =
        answered
            ? figures.figures(f -> money(f, v, question.target()), DeltaMethod.Scale.LOG)
            : List.of();
    List<Figure> shares =
        answered
            ? figures.figures(f -> CostElasticities.at(f, v).shares(), DeltaMethod.Scale.LINEAR)
            : List.of();
    return new Planned(
        question.name(),
        fit.function().form(),
        true,
        question.target(),
        prices(v),
        whose(fit, question),
        held(question),
        status,
        answered ? named(money.subList(3, 3 + n)) : Map.of(),
        answered ? Optional.of(money.get(0)) : Optional.empty(),
        answered ? Optional.of(money.get(1)) : Optional.empty(),
        answered ? Optional.of(money.get(2)) : Optional.empty(),
        answered ? named(shares) : Map.of(),
        answered ? departure(fit, v) : Double.NaN,
        answered ? curve(question, figures, fit) : List.of(),
        List.of(),
        List.of(),
        remarks);
  }

  /** Cost, marginal cost, average cost, demands. */
  private static double[] money(TranslogCost f, double[] v, double target) {
    CostElasticities at = CostElasticities.at(f, v);
    double[] demands = at.demands();
    double[] all = new double[3 + demands.length];
    all[0] = at.cost();
    all[1] = at.marginalCost(0, target);
    all[2] = at.cost() / target;
    System.arraycopy(demands, 0, all, 3, demands.length);
    return all;
  }

  /** By how much Σ w x departs from cost, relatively: zero where homogeneity holds. */
  private static double departure(CostFit fit, double[] v) {
    double sum = Arrays.stream(CostElasticities.at(fit.function(), v).shares()).sum();
    return Math.abs(sum - 1);
  }

  private double[] point(Study.LeastCostQuestion question) {
    List<String> inputs = data.arguments().inputs();
    double[] v = new double[data.arguments().size()];
    int last = panel.periods().size() - 1;
    int period = question.period().map(panel.periods()::indexOf).filter(p -> p >= 0).orElse(last);
    for (int i = 0; i < inputs.size(); i++) {
      Double stated = question.prices().get(inputs.get(i));
      v[i] = stated != null ? Math.log(stated) : meanOf(i, period);
    }
    v[inputs.size()] = Math.log(question.target());
    for (int k = inputs.size() + 1; k < data.points().length; k++) {
      v[k] = meanOf(k, period);
    }
    for (int f = 0; f < asked.fixed().size(); f++) {
      Double held = question.hold().get(asked.fixed().get(f).name());
      if (held != null) {
        v[inputs.size() + asked.outputs().size() + f] = Math.log(held);
      }
    }
    return v;
  }

  /** The mean of an argument over the rows of a period. */
  private double meanOf(int argument, int period) {
    double sum = 0;
    int count = 0;
    for (int r = 0; r < panel.rows(); r++) {
      if (panel.rowPeriods().get(r) == period) {
        sum += data.points()[argument][r];
        count++;
      }
    }
    return sum / count;
  }

  private String status(
      Study.LeastCostQuestion question, CostFit fit, double[] v, List<Said> remarks) {
    List<String> unheard = new ArrayList<>();
    if (asked.outputs().size() != 1) {
      unheard.add("one target is asked of " + asked.outputs().size() + " outputs");
    }
    if (!question.limits().isEmpty()) {
      unheard.add("limits on inputs");
    }
    question.hold().keySet().stream()
        .filter(name -> asked.fixed().stream().noneMatch(q -> q.name().equals(name)))
        .forEach(name -> unheard.add(name + " held, which is no fixed input of the cost function"));
    if (!unheard.isEmpty()) {
      remarks.add(
          Said.of(
              "warning",
              "infeasible",
              "A cost function has its inputs at their least cost and cannot answer this question: "
                  + String.join("; ", unheard)
                  + "."));
      return "infeasible";
    }
    CostElasticities at = CostElasticities.at(fit.function(), v);
    if (!at.monotone() || !at.concave()) {
      remarks.add(
          Said.of(
              "warning",
              "irregular",
              "At these prices and this target the fitted function is no cost function ("
                  + (at.monotone() ? "" : "a share or marginal cost is not positive")
                  + (at.monotone() || at.concave() ? "" : "; ")
                  + (at.concave() ? "" : "it is not concave in prices")
                  + "), so there is no plan."));
      return "irregular";
    }
    List<String> outside = outside(v);
    if (!outside.isEmpty()) {
      remarks.add(
          Said.of(
              "warning",
              "outside-records",
              "This answer is a guess beyond the records: " + String.join("; ", outside) + "."));
      return "outside-records";
    }
    return "solved";
  }

  private List<String> outside(double[] v) {
    List<String> reasons = new ArrayList<>();
    for (int k = 0; k < data.arguments().base().length; k++) {
      double least = Arrays.stream(data.points()[k]).min().orElse(Double.NaN);
      double most = Arrays.stream(data.points()[k]).max().orElse(Double.NaN);
      if (v[k] < least || v[k] > most) {
        reasons.add(
            String.format(
                Locale.ROOT,
                "%s of %,.6g lies outside those recorded (%,.6g to %,.6g)",
                (data.arguments().price(k) ? "a price of " : "") + data.arguments().names().get(k),
                Math.exp(v[k]),
                Math.exp(least),
                Math.exp(most)));
      }
    }
    return reasons;
  }

  private List<CurvePoint> curve(
      Study.LeastCostQuestion question, CostFigures figures, CostFit fit) {
    double[] targets = CurveSpan.targets(question, question.target());
    double[] v = point(question);
    int place = data.arguments().inputs().size();
    List<Double> kept = new ArrayList<>();
    for (double target : targets) {
      v[place] = Math.log(target);
      CostElasticities at = CostElasticities.at(fit.function(), v);
      if (at.monotone() && at.concave()) {
        kept.add(target);
      }
    }
    int width = 3 + place;
    List<Figure> all =
        figures.figures(
            f -> {
              double[] rows = new double[kept.size() * width];
              double[] w = v.clone();
              for (int k = 0; k < kept.size(); k++) {
                w[place] = Math.log(kept.get(k));
                System.arraycopy(money(f, w, kept.get(k)), 0, rows, k * width, width);
              }
              return rows;
            },
            DeltaMethod.Scale.LOG);
    List<CurvePoint> points = new ArrayList<>();
    for (int k = 0; k < kept.size(); k++) {
      List<Figure> row = all.subList(k * width, (k + 1) * width);
      Map<String, Double> mix = new LinkedHashMap<>();
      for (int i = 0; i < place; i++) {
        mix.put(data.arguments().inputs().get(i), row.get(3 + i).value());
      }
      v[place] = Math.log(kept.get(k));
      points.add(
          new CurvePoint(
              kept.get(k), row.get(0), row.get(1), row.get(2), mix, outside(v).isEmpty()));
    }
    return points;
  }

  private Map<String, Double> prices(double[] v) {
    Map<String, Double> prices = new LinkedHashMap<>();
    for (int i = 0; i < data.arguments().inputs().size(); i++) {
      prices.put(data.arguments().inputs().get(i), Math.exp(v[i]));
    }
    return prices;
  }

  private Map<String, Figure> named(List<Figure> figures) {
    Map<String, Figure> named = new LinkedHashMap<>();
    for (int i = 0; i < figures.size(); i++) {
      named.put(data.arguments().inputs().get(i), figures.get(i));
    }
    return named;
  }

  private static Map<String, String> held(Study.LeastCostQuestion question) {
    Map<String, String> words = new LinkedHashMap<>();
    question
        .hold()
        .forEach(
            (name, quantity) ->
                words.put(name, String.format(Locale.ROOT, "held at %,.6g", quantity)));
    return words;
  }

  private String whose(CostFit fit, Study.LeastCostQuestion question) {
    String when =
        data.arguments().time()
            ? " in " + question.period().orElse(panel.periods().get(panel.periods().size() - 1))
            : "";
    return (fit.specification().plantEffects()
            ? "the typical plant"
            : "the plants of the records on average")
        + when;
  }
}
