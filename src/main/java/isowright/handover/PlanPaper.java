package isowright.handover;

import isowright.study.FitFindings.Fitted;
import isowright.study.FitFindings.Parameter;
import isowright.study.PlanFindings.Planned;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Objects;

/**
 * A least-cost plan worked out live from prices, target and parameters: change a wage, and mix and
 * cost change. Cobb-Douglas and CES have closed forms; for the translog six steps of Newton on the
 * Lagrange conditions in logs stand on the sheet, begun at the mix stated.
 *
 * <p>The level (constant, plant, period and controls together, in logs) is taken from the plan: it
 * is what makes the technology give the target at the mix stated.
 */
final class PlanPaper {

  private static final int STEPS = 6;
  private static final int INPUTS = 6;

  private final Paper paper;
  private final Planned plan;
  private final Map<String, Double> parameters = new LinkedHashMap<>();
  private final Map<String, Double> bases;
  private final List<String> inputs;

  private PlanPaper(Paper paper, Planned plan, Fitted fit) {
    this.paper = paper;
    this.plan = plan;
    this.bases = fit.how().scaling();
    for (Parameter parameter : fit.parameters()) {
      parameters.put(parameter.name(), parameter.figure().value());
    }
    this.inputs = List.copyOf(plan.mix().keySet());
  }

  /** Whether a plan can be worked out so: free of limits, for a target, of a form with a sheet. */
  static boolean live(Planned plan, Fitted fit) {
    boolean form = List.of("cobb-douglas", "ces", "translog").contains(fit.technology());
    boolean asks = plan.detail().goal().equals("target") && plan.detail().across().isEmpty();
    return form
        && asks
        && plan.status().equals("solved")
        && plan.limits().isEmpty()
        && !fit.how().time().equals("biased-trend")
        && plan.answered();
  }

  static void write(Paper paper, Planned plan, Fitted fit) {
    PlanPaper sheet = new PlanPaper(paper, plan, fit);
    sheet.question();
    switch (fit.technology()) {
      case "ces" -> sheet.ces();
      case "cobb-douglas" -> sheet.cobbDouglas();
      default -> sheet.translog();
    }
    sheet.compare();
    paper.width(0, 30);
    paper.verdict();
  }

  private int n() {
    return inputs.size();
  }

  private String price(int i) {
    return Paper.absolute(INPUTS + i, 1);
  }

  private String base(int i) {
    return Paper.absolute(INPUTS + i, 2);
  }

  private String first(int i) {
    return Paper.absolute(INPUTS + i, 3);
  }

  private String stated(int i) {
    return Paper.absolute(INPUTS + i, 5);
  }

  private static String target() {
    return Paper.absolute(3, 1);
  }

  private static String level() {
    return Paper.absolute(3, 3);
  }

  /**
   * Target and level; and by input price, base, parameter, live mix, stated mix, whether the same.
   */
  private void question() {
    paper.head(3, 0, "target");
    paper.input(3, 1, plan.target());
    paper.head(3, 2, "level, in logs");
    String[] heads = {
      "input", "price", "divided by", "parameter", "mix, live", "mix, stated", "same"
    };
    for (int c = 0; c < heads.length; c++) {
      paper.head(INPUTS - 1, c, heads[c]);
    }
    for (int i = 0; i < n(); i++) {
      String input = inputs.get(i);
      paper.text(INPUTS + i, 0, input);
      paper.input(INPUTS + i, 1, Objects.requireNonNull(plan.prices().get(input)));
      paper.input(INPUTS + i, 2, bases.getOrDefault(input, 1.0));
      paper.input(
          INPUTS + i,
          3,
          parameters.getOrDefault(input, parameters.getOrDefault("share:" + input, 0.0)));
      paper.stated(INPUTS + i, 5, Objects.requireNonNull(plan.mix().get(input)).value());
      paper.name(paper.name() + "_price_" + input, INPUTS + i, 1, INPUTS + i, 1);
    }
    paper.name(paper.name() + "_target", 3, 1, 3, 1);
  }

  private int below() {
    return INPUTS + n() + 1;
  }

  private void level(String formula) {
    paper.live(3, 3, "LN(" + plan.target() + ")-(" + formula + ")");
  }

  private void mix(int i, String formula) {
    paper.live(INPUTS + i, 4, formula);
  }

  /** Mix, cost and marginal cost against those stated. */
  private void compare() {
    StringBuilder cost = new StringBuilder("0");
    for (int i = 0; i < n(); i++) {
      paper.check(INPUTS + i, 6, Paper.at(INPUTS + i, 4), Paper.at(INPUTS + i, 5));
      cost.append('+').append(price(i)).append('*').append(Paper.at(INPUTS + i, 4));
    }
    int row = below();
    paper.head(row, 0, "cost");
    paper.live(row, 4, cost.toString());
    paper.stated(row, 5, plan.cost().orElseThrow().value());
    paper.check(row, 6, Paper.at(row, 4), Paper.at(row, 5));
  }

  /**
   * x_i = g_i exp((ln Q − a)/ν) · (α_i/w̃_i) · Π (w̃_j/α_j)^(α_j/ν), with w̃ the price of g units.
   */
  private void cobbDouglas() {
    List<String> level = new ArrayList<>();
    List<String> scale = new ArrayList<>();
    List<String> index = new ArrayList<>();
    for (int i = 0; i < n(); i++) {
      level.add(first(i) + "*LN(" + stated(i) + "/" + base(i) + ")");
      scale.add(first(i));
    }
    level(String.join("+", level));
    String nu = "(" + String.join("+", scale) + ")";
    for (int i = 0; i < n(); i++) {
      index.add(
          String.format(
              Locale.ROOT, "(%s*%s/%s)^(%s/%s)", price(i), base(i), first(i), first(i), nu));
    }
    for (int i = 0; i < n(); i++) {
      mix(
          i,
          String.format(
              Locale.ROOT,
              "EXP((LN(%s)-%s)/%s)*%s/%s*%s",
              target(),
              level(),
              nu,
              first(i),
              price(i),
              String.join("*", index)));
    }
  }

  /** x_i = g_i q (δ_i/w̃_i)^σ [Σ δ_j^σ w̃_j^(1−σ)]^(1/ρ), q = exp((ln Q − a)/ν), ρ not zero. */
  private void ces() {
    int row = below() + 2;
    paper.head(row, 0, "rho");
    paper.input(row, 1, parameters.getOrDefault("rho", Double.NaN));
    paper.head(row + 1, 0, "scale");
    paper.input(row + 1, 1, parameters.getOrDefault("scale", Double.NaN));
    String rho = Paper.absolute(row, 1);
    String nu = Paper.absolute(row + 1, 1);
    String sigma = "(1/(1+" + rho + "))";
    List<String> level = new ArrayList<>();
    List<String> index = new ArrayList<>();
    for (int i = 0; i < n(); i++) {
      level.add(String.format(Locale.ROOT, "%s*(%s/%s)^(-%s)", first(i), stated(i), base(i), rho));
      index.add(
          String.format(
              Locale.ROOT, "%s^%s*(%s*%s)^(1-%s)", first(i), sigma, price(i), base(i), sigma));
    }
    level("-" + nu + "/" + rho + "*LN(" + String.join("+", level) + ")");
    for (int i = 0; i < n(); i++) {
      mix(
          i,
          String.format(
              Locale.ROOT,
              "%s*EXP((LN(%s)-%s)/%s)*(%s/(%s*%s))^%s*(%s)^(1/%s)",
              base(i),
              target(),
              level(),
              nu,
              first(i),
              price(i),
              base(i),
              sigma,
              String.join("+", index),
              rho));
    }
  }

  /** Where the second-order parameters stand. */
  private String second(int i, int j) {
    return Paper.absolute(below() + 3 + i, 1 + j);
  }

  private void translog() {
    int top = below() + 2;
    paper.head(top, 0, "second-order parameters");
    for (int i = 0; i < n(); i++) {
      paper.text(top + 1 + i, 0, inputs.get(i));
      for (int j = 0; j < n(); j++) {
        String name = inputs.get(Math.min(i, j)) + "*" + inputs.get(Math.max(i, j));
        paper.input(top + 1 + i, 1 + j, parameters.getOrDefault(name, 0.0));
      }
    }
    List<String> start = new ArrayList<>();
    for (int i = 0; i < n(); i++) {
      start.add("LN(" + stated(i) + "/" + base(i) + ")");
    }
    level(log(start));
    int block = top + n() + 3;
    List<String> z = start;
    String multiplier = String.format(Locale.ROOT, "LN(%s)", plan.cost().orElseThrow().value());
    for (int step = 0; step < STEPS; step++) {
      z = step(block, step, z, multiplier);
      multiplier = Paper.absolute(block + 1 + n(), 1);
      block += n() + 4;
    }
    for (int i = 0; i < n(); i++) {
      mix(i, base(i) + "*EXP(" + z.get(i) + ")");
    }
  }

  private String log(List<String> z) {
    List<String> terms = new ArrayList<>();
    for (int i = 0; i < n(); i++) {
      terms.add(first(i) + "*" + z.get(i));
      for (int j = 0; j < n(); j++) {
        terms.add("0.5*" + second(i, j) + "*" + z.get(i) + "*" + z.get(j));
      }
    }
    return String.join("+", terms);
  }

  /**
   * One step of Newton. Columns: the unknowns after the step, before it, output elasticities, the
   * conditions z_i + ln(w_i g_i) − ln e_i − ℓ = 0 and a + f(z) − ln Q = 0, and their derivatives.
   */
  private List<String> step(int top, int number, List<String> before, String multiplier) {
    int n = n();
    paper.head(top, 0, "step " + (number + 1));
    String[] heads = {"after", "before", "elasticity", "condition"};
    for (int c = 0; c < heads.length; c++) {
      paper.head(top, 1 + c, heads[c]);
    }
    for (int i = 0; i <= n; i++) {
      paper.live(top + 1 + i, 2, i < n ? before.get(i) : multiplier);
    }
    List<String> z = new ArrayList<>();
    for (int i = 0; i < n; i++) {
      z.add(Paper.absolute(top + 1 + i, 2));
    }
    String ell = Paper.absolute(top + 1 + n, 2);
    for (int i = 0; i < n; i++) {
      StringBuilder elasticity = new StringBuilder(first(i));
      for (int j = 0; j < n; j++) {
        elasticity.append('+').append(second(i, j)).append('*').append(z.get(j));
      }
      String e = Paper.at(top + 1 + i, 3);
      paper.text(top + 1 + i, 0, inputs.get(i));
      paper.live(top + 1 + i, 3, elasticity.toString());
      paper.live(
          top + 1 + i,
          4,
          String.format(
              Locale.ROOT, "%s+LN(%s*%s)-LN(%s)-%s", z.get(i), price(i), base(i), e, ell));
      for (int j = 0; j < n; j++) {
        paper.live(top + 1 + i, 5 + j, (i == j ? "1" : "0") + "-" + second(i, j) + "/" + e);
        paper.live(top + 1 + n, 5 + j, Paper.at(top + 1 + j, 3));
      }
      paper.live(top + 1 + i, 5 + n, "-1");
    }
    paper.text(top + 1 + n, 0, "multiplier, in logs");
    paper.live(top + 1 + n, 4, level() + "+" + log(z) + "-LN(" + target() + ")");
    paper.live(top + 1 + n, 5 + n, "0");
    String jacobian = Paper.range(top + 1, 5, top + 1 + n, 5 + n);
    for (int i = 0; i <= n; i++) {
      StringBuilder after = new StringBuilder(Paper.at(top + 1 + i, 2));
      for (int j = 0; j <= n; j++) {
        after.append(
            String.format(
                Locale.ROOT,
                "-INDEX(MINVERSE(%s),%d,%d)*%s",
                jacobian,
                i + 1,
                j + 1,
                Paper.at(top + 1 + j, 4)));
      }
      paper.live(top + 1 + i, 1, after.toString());
    }
    List<String> next = new ArrayList<>();
    for (int i = 0; i < n; i++) {
      next.add(Paper.absolute(top + 1 + i, 1));
    }
    return next;
  }
}
