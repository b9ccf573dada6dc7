package isowright.study;

import isowright.cost.CostArguments;
import isowright.estimation.CostData;
import isowright.estimation.CostFit;
import isowright.estimation.Productivity;
import isowright.inference.Support;
import isowright.records.Panel;
import isowright.study.Study.LeastCostQuestion;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * The circumstances in which a least-cost question is put to cost functions, as the question states
 * them or the records hold them; and whether a point lies inside the records.
 */
final class CostCircumstances {

  /** A fixed input that may be chosen is looked for this many times beyond the records. */
  private static final double BEYOND = 10;

  private final Study study;
  private final Costs asked;
  private final Panel panel;
  private final CostData data;
  private final Support support;

  CostCircumstances(Study study, Costs asked, Panel panel, CostData data) {
    this.study = study;
    this.asked = asked;
    this.panel = panel;
    this.data = data;
    CostArguments arguments = data.arguments();
    int n = arguments.inputs().size();
    List<String> names = new ArrayList<>();
    arguments.inputs().forEach(i -> names.add("price of " + i + " over the mean of all prices,"));
    names.addAll(arguments.names().subList(n, arguments.base().length));
    // Cost is homogeneous in prices: only relative prices can be new.
    double[] general = new double[data.rows()];
    for (int r = 0; r < general.length; r++) {
      for (int i = 0; i < n; i++) {
        general[r] += data.points()[i][r] / n;
      }
    }
    this.support =
        Support.of(names, data.rows(), (k, r) -> data.points()[k][r] - (k < n ? general[r] : 0));
  }

  /** Why a point lies outside the records; empty where it does not. */
  List<String> outside(double[] v) {
    int n = data.arguments().inputs().size();
    double general = 0;
    for (int i = 0; i < n; i++) {
      general += v[i] / n;
    }
    double[] mix = new double[data.arguments().base().length];
    for (int k = 0; k < mix.length; k++) {
      mix[k] = Math.exp(v[k] - (k < n ? general : 0));
    }
    return support.reasons(mix);
  }

  int period(LeastCostQuestion question) {
    int last = panel.periods().size() - 1;
    return question.period().map(panel.periods()::indexOf).filter(p -> p >= 0).orElse(last);
  }

  /** Whose cost level is meant. */
  Productivity productivity(LeastCostQuestion question) {
    return PlanCircumstances.productivity(question.productivity(), Optional.of(panel));
  }

  CostTask task(LeastCostQuestion question) {
    CostArguments arguments = data.arguments();
    int n = arguments.inputs().size();
    int f = asked.fixed().size();
    int period = period(question);
    double[] v = new double[arguments.size()];
    for (int k = 0; k < v.length; k++) {
      v[k] = meanOf(k, period);
    }
    for (int i = 0; i < n; i++) {
      Double stated = question.prices().get(arguments.inputs().get(i));
      v[i] = stated != null ? Math.log(stated) : v[i];
    }
    v[n] = Math.log(question.target());
    double[] low = new double[n + f];
    double[] high = new double[n + f];
    double[] prices = new double[f];
    double[] from = new double[f];
    double[] to = new double[f];
    for (int q = 0; q < n + f; q++) {
      String name = q < n ? arguments.inputs().get(q) : asked.fixed().get(q - n).name();
      double[] limits = PlanCircumstances.limits(name, question.hold(), question.limits());
      low[q] = limits[0];
      high[q] = limits[1];
      if (q >= n) {
        Double price = question.prices().get(name);
        double[] logs = data.points()[n + asked.outputs().size() + q - n];
        prices[q - n] = price == null ? Double.NaN : price;
        from[q - n] = Arrays.stream(logs).min().orElse(0) - Math.log(BEYOND);
        to[q - n] = Arrays.stream(logs).max().orElse(0) + Math.log(BEYOND);
        if (price == null && low[q] < high[q]) {
          low[q] = Math.exp(v[n + asked.outputs().size() + q - n]);
          high[q] = low[q];
        }
      }
    }
    return new CostTask(arguments, v, prices, low, high, from, to);
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

  /** What is held or limited, in words, by input. */
  Map<String, String> limitWords(LeastCostQuestion question, CostTask task) {
    Map<String, String> words = new LinkedHashMap<>();
    int n = task.inputs();
    for (int q = 0; q < task.names().size(); q++) {
      String name = task.names().get(q);
      String unit = q < n ? unit(name) : asked.fixed().get(q - n).unit();
      Study.Limit limit = question.limits().get(name);
      if (question.hold().containsKey(name)) {
        words.put(name, "held at " + PlanWords.number(task.low()[q], unit));
      } else if (limit != null) {
        List<String> parts = new ArrayList<>();
        if (limit.low() > 0) {
          parts.add("at least " + PlanWords.number(limit.low(), unit));
        }
        if (Double.isFinite(limit.high())) {
          parts.add("at most " + PlanWords.number(limit.high(), unit));
        }
        words.put(name, String.join(" and ", parts));
      } else if (task.held(q)) {
        words.put(name, "at the mean of the period, " + PlanWords.number(task.low()[q], unit));
      }
    }
    return words;
  }

  /** The unit of a variable input, where the production side of the study states it. */
  private String unit(String input) {
    int at = study.inputs().indexOf(input);
    return at < 0 ? "" : study.inputUnits().get(at).orElse("");
  }

  /** Whose cost it is, in words. */
  String whose(CostFit fit, LeastCostQuestion question) {
    String when = data.arguments().time() ? " in " + panel.periods().get(period(question)) : "";
    return switch (question.productivity().kind()) {
      case TYPICAL ->
          (fit.specification().plantEffects()
                  ? "the typical plant"
                  : "the plants of the records on average")
              + when;
      case FRONTIER ->
          "the plants of the records on average, no frontier being fitted of cost" + when;
      case BEST_QUARTER -> "the plant at the lower quartile of cost at equal prices" + when;
      case PLANT -> "plant " + question.productivity().plant().orElseThrow() + when;
    };
  }
}
