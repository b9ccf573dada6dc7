package isowright.handover;

import isowright.records.Panel;
import isowright.study.FitFindings.Fitted;
import isowright.study.FitFindings.Parameter;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;

/**
 * A technology linear in its parameters, estimated live: the design as formulas over the records,
 * normal equations, coefficients, residuals, and the covariance by the plants’ scores, each held
 * against the figure stated.
 *
 * <p>Pooled rows and deviations from plant means can be worked out so; other treatments of plants
 * and of time cannot, and there the sheet says so.
 */
final class LinearPapers {

  private static final int FIRST = 4;
  private static final int BLOCK = 1000;

  private final Fitted fit;
  private final RecordsPaper records;
  private final Panel panel;
  private final boolean within;
  private final List<String> names;
  private final Paper design;
  private final Paper result;

  private LinearPapers(Fitted fit, RecordsPaper records, Paper design, Paper result) {
    this.fit = fit;
    this.records = records;
    this.panel = records.panel();
    this.within = fit.how().plantEffects().equals("within");
    this.names = names(fit, within);
    this.design = design;
    this.result = result;
  }

  private static List<String> names(Fitted fit, boolean within) {
    return fit.parameters().stream()
        .map(Parameter::name)
        .filter(name -> !within || !name.equals("constant"))
        .toList();
  }

  /** Whether a fit can be worked out from formulas: its form, its treatment of plants and time. */
  static boolean live(Fitted fit, RecordsPaper records) {
    boolean treated =
        fit.how().plantEffects().equals("none") || fit.how().plantEffects().equals("within");
    boolean dated = fit.how().time().equals("none") || fit.how().time().equals("trend");
    List<String> inputs = records.panel().inputs();
    return fit.usable()
        && treated
        && dated
        && fit.how().rows() == records.panel().rows()
        && fit.parameters().stream().allMatch(p -> term(p.name(), inputs, records).isPresent());
  }

  /** What a parameter multiplies: none for a parameter of another kind of form. */
  private static Optional<List<String>> term(
      String name, List<String> inputs, RecordsPaper records) {
    List<String> parts = List.of(name.split("\\*", -1));
    boolean known =
        name.equals("constant")
            || name.equals("trend")
            || (name.startsWith("control:") && records.has(name))
            || (parts.size() <= 2 && inputs.containsAll(parts));
    return known ? Optional.of(parts) : Optional.empty();
  }

  static void write(Fitted fit, RecordsPaper records, Paper design, Paper result) {
    LinearPapers papers = new LinearPapers(fit, records, design, result);
    papers.fillDesign();
    papers.fillResult();
  }

  /** Columns of the design sheet: response, regressors, then both as they enter, then residual. */
  private int entering(int column) {
    return within ? 1 + names.size() + 1 + column : 1 + column;
  }

  private int residual() {
    return entering(names.size()) + 1;
  }

  private int lastRow() {
    return FIRST + panel.rows() - 1;
  }

  private void fillDesign() {
    design.head(FIRST - 1, 0, "plant");
    design.head(FIRST - 1, 1, "log of output");
    for (int k = 0; k < names.size(); k++) {
      design.head(FIRST - 1, 2 + k, names.get(k));
    }
    if (within) {
      for (int c = 0; c <= names.size(); c++) {
        String what = c == 0 ? "log of output" : names.get(c - 1);
        design.head(FIRST - 1, entering(c), what + ", less its plant mean");
      }
    }
    design.head(FIRST - 1, residual(), "residual");
    design.freeze(FIRST, 1);
    for (int p = 0; p < panel.plants().size(); p++) {
      for (int r = panel.plantStart(p); r < panel.plantEnd(p); r++) {
        row(p, r);
        if (r % BLOCK == BLOCK - 1) {
          design.written();
        }
      }
    }
  }

  private void row(int plant, int r) {
    int row = FIRST + r;
    design.text(row, 0, panel.plants().get(plant));
    design.live(row, 1, "LN(" + records.cell("output", r) + ")");
    for (int k = 0; k < names.size(); k++) {
      design.live(row, 2 + k, regressor(names.get(k), r));
    }
    StringBuilder fitted = new StringBuilder();
    for (int k = 0; k < names.size(); k++) {
      fitted.append('+').append(Paper.at(row, entering(k + 1))).append('*').append(coefficient(k));
    }
    if (within) {
      int from = FIRST + panel.plantStart(plant);
      int to = FIRST + panel.plantEnd(plant) - 1;
      for (int c = 0; c <= names.size(); c++) {
        String mean = "AVERAGE(" + Paper.range(from, 1 + c, to, 1 + c) + ")";
        design.live(row, entering(c), Paper.at(row, 1 + c) + "-" + mean);
      }
    }
    design.live(row, residual(), Paper.at(row, entering(0)) + "-(0" + fitted + ")");
  }

  private String regressor(String name, int r) {
    if (name.equals("constant")) {
      return "1";
    }
    if (name.equals("trend")) {
      return records.period(r);
    }
    if (name.startsWith("control:")) {
      return records.cell(name, r);
    }
    String[] parts = name.split("\\*", -1);
    String first = log(parts[0], r);
    if (parts.length == 1) {
      return first;
    }
    return (parts[0].equals(parts[1]) ? "0.5*" : "") + first + "*" + log(parts[1], r);
  }

  /** The log of an input over its base, which stands among the results. */
  private String log(String input, int r) {
    String quantity = records.cell(RecordsPaper.quantity(input), r);
    int i = panel.inputs().indexOf(input);
    return fit.how().scaling().containsKey(input)
        ? "LN(" + quantity + "/" + result.elsewhere(Paper.absolute(4 + i, 1)) + ")"
        : "LN(" + quantity + ")";
  }

  private int tableTop() {
    return 6 + panel.inputs().size();
  }

  private String coefficient(int k) {
    return result.elsewhere(Paper.absolute(tableTop() + 1 + k, 1));
  }

  private void fillResult() {
    bases();
    int k = names.size();
    int top = tableTop();
    String[] heads = {
      "parameter", "live", "stated", "same", "standard error, live", "stated", "same"
    };
    for (int c = 0; c < heads.length; c++) {
      result.head(top, c, heads[c]);
    }
    int products = top + k + 8;
    int inverse = products + k + 3;
    matrix(products, "Products of regressors, and with the response", (i, j) -> product(i, j));
    matrix(
        inverse,
        "Their inverse",
        (i, j) ->
            j < k
                ? String.format(
                    Locale.ROOT,
                    "INDEX(MINVERSE(%s),%d,%d)",
                    Paper.range(products + 1, 1, products + k, k),
                    i + 1,
                    j + 1)
                : "");
    for (int i = 0; i < k; i++) {
      Parameter stated = parameter(names.get(i));
      result.text(top + 1 + i, 0, names.get(i));
      StringBuilder sum = new StringBuilder("0");
      for (int j = 0; j < k; j++) {
        sum.append('+')
            .append(Paper.at(inverse + 1 + i, 1 + j))
            .append('*')
            .append(Paper.at(products + 1 + j, 1 + k));
      }
      result.live(top + 1 + i, 1, sum.toString());
      compare(top + 1 + i, 1, stated.figure().value());
      result.name(
          "coefficient_" + result.name() + "_" + names.get(i), top + 1 + i, 1, top + 1 + i, 1);
    }
    int ssr = top + k + 2;
    result.text(ssr, 0, "sum of squared residuals");
    result.live(ssr, 1, "SUMSQ(" + column(residual()) + ")");
    fit.summary().ifPresent(summary -> compare(ssr, 1, summary.ssr()));
    standardErrors(inverse, ssr);
    result.width(0, 28);
    result.verdict();
  }

  private void bases() {
    result.head(3, 0, "input");
    result.head(3, 1, "divided by");
    for (int i = 0; i < panel.inputs().size(); i++) {
      String input = panel.inputs().get(i);
      result.text(4 + i, 0, input);
      result.input(4 + i, 1, fit.how().scaling().getOrDefault(input, 1.0));
    }
  }

  /** A formula by row and column. */
  private interface Entry {
    String at(int i, int j);
  }

  private void matrix(int top, String title, Entry entry) {
    result.head(top, 0, title);
    for (int j = 0; j < names.size(); j++) {
      result.head(top, 1 + j, names.get(j));
    }
    for (int i = 0; i < names.size(); i++) {
      result.text(top + 1 + i, 0, names.get(i));
      for (int j = 0; j <= names.size(); j++) {
        String formula = entry.at(i, j);
        if (!formula.isEmpty()) {
          result.live(top + 1 + i, 1 + j, formula);
        }
      }
    }
  }

  private String product(int i, int j) {
    int other = j < names.size() ? entering(j + 1) : entering(0);
    return "SUMPRODUCT(" + column(entering(i + 1)) + "," + column(other) + ")";
  }

  private String column(int column) {
    return design.elsewhere(Paper.range(FIRST, column, lastRow(), column));
  }

  private Parameter parameter(String name) {
    return fit.parameters().stream().filter(p -> p.name().equals(name)).findFirst().orElseThrow();
  }

  private void compare(int row, int live, double stated) {
    result.stated(row, live + 1, stated);
    result.check(row, live + 2, Paper.at(row, live), Paper.at(row, live + 1));
  }

  private void standardErrors(int inverse, int ssr) {
    int k = names.size();
    boolean clustered = fit.how().standardErrors().equals("clustered");
    boolean classical = fit.how().standardErrors().equals("classical") && !within;
    if (!clustered && !classical) {
      result.text(
          tableTop() + k + 3,
          0,
          "Standard errors of this kind ("
              + fit.how().standardErrors()
              + ") are stated, not live.");
    }
    int scores = inverse + k + 3;
    int meat = scores + panel.plants().size() + 3;
    if (clustered) {
      scores(scores);
      matrix(meat, "Products of scores", (i, j) -> j < k ? scoreProduct(scores, i, j) : "");
      matrix(
          meat + k + 3,
          "Inverse times products of scores",
          (i, j) -> j < k ? rows(inverse, i, meat, j) : "");
    }
    for (int i = 0; i < k; i++) {
      int row = tableTop() + 1 + i;
      if (clustered) {
        int g = panel.plants().size();
        int n = panel.rows();
        String factor = String.format(Locale.ROOT, "%d/%d*%d/%d", g, g - 1, n - 1, n - k);
        result.live(row, 4, "SQRT(" + factor + "*" + rows(meat + k + 3, i, inverse, i) + ")");
        compare(row, 4, error(i));
      } else if (classical) {
        result.live(
            row,
            4,
            String.format(
                Locale.ROOT,
                "SQRT(%s/%d*%s)",
                Paper.absolute(ssr, 1),
                panel.rows() - k,
                Paper.at(inverse + 1 + i, 1 + i)));
        compare(row, 4, error(i));
      } else {
        result.stated(row, 5, error(i));
      }
    }
  }

  private double error(int i) {
    return parameter(names.get(i))
        .figure()
        .uncertainty()
        .map(u -> u.standardError())
        .orElse(Double.NaN);
  }

  /** The sum over plants' rows of regressor times residual, plant by plant. */
  private void scores(int top) {
    result.head(top, 0, "Scores of each plant");
    for (int p = 0; p < panel.plants().size(); p++) {
      int from = FIRST + panel.plantStart(p);
      int to = FIRST + panel.plantEnd(p) - 1;
      String residuals = design.elsewhere(Paper.range(from, residual(), to, residual()));
      result.text(top + 1 + p, 0, panel.plants().get(p));
      for (int j = 0; j < names.size(); j++) {
        int column = entering(j + 1);
        String regressors = design.elsewhere(Paper.range(from, column, to, column));
        result.live(top + 1 + p, 1 + j, "SUMPRODUCT(" + regressors + "," + residuals + ")");
      }
    }
  }

  private String scoreProduct(int top, int i, int j) {
    int last = top + panel.plants().size();
    return "SUMPRODUCT("
        + Paper.range(top + 1, 1 + i, last, 1 + i)
        + ","
        + Paper.range(top + 1, 1 + j, last, 1 + j)
        + ")";
  }

  /** The sum of products of a row of one matrix and a row of another, which is symmetric. */
  private String rows(int first, int i, int second, int j) {
    List<String> sum = new ArrayList<>();
    for (int c = 0; c < names.size(); c++) {
      sum.add(Paper.at(first + 1 + i, 1 + c) + "*" + Paper.at(second + 1 + j, 1 + c));
    }
    return "(" + String.join("+", sum) + ")";
  }
}
