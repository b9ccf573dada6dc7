package isowright.handover;

import isowright.records.Panel;
import isowright.study.FitFindings.Fitted;
import isowright.study.FitFindings.Parameter;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Objects;

/**
 * A CES technology: from the parameters stated, fitted values, residuals and their sum of squares
 * live over the records. The search for the parameters is not repeated; that no other parameters do
 * better is what the profile in the report shows.
 */
final class CurvedPapers {

  private static final int FIRST = 4;
  private static final int BLOCK = 1000;

  private final Fitted fit;
  private final RecordsPaper records;
  private final Panel panel;
  private final Paper design;
  private final Paper result;
  private final Map<String, Double> parameters = new LinkedHashMap<>();
  private final Map<String, Integer> rows = new LinkedHashMap<>();

  private CurvedPapers(Fitted fit, RecordsPaper records, Paper design, Paper result) {
    this.fit = fit;
    this.records = records;
    this.panel = records.panel();
    this.design = design;
    this.result = result;
    for (Parameter parameter : fit.parameters()) {
      parameters.put(parameter.name(), parameter.figure().value());
    }
  }

  /** Whether residuals can be worked out so: plants within, and a trend or nothing in time. */
  static boolean live(Fitted fit, RecordsPaper records) {
    boolean dated = fit.how().time().equals("none") || fit.how().time().equals("trend");
    return fit.usable()
        && fit.technology().equals("ces")
        && fit.how().plantEffects().equals("within")
        && dated
        && fit.how().rows() == records.panel().rows()
        && fit.parameters().stream()
            .map(Parameter::name)
            .filter(name -> name.startsWith("control:"))
            .allMatch(records::has);
  }

  static void write(Fitted fit, RecordsPaper records, Paper design, Paper result) {
    CurvedPapers papers = new CurvedPapers(fit, records, design, result);
    papers.parameters();
    papers.design();
  }

  private void parameters() {
    result.head(3, 0, "parameter");
    result.head(3, 1, "as stated");
    int row = 4;
    for (Map.Entry<String, Double> parameter : parameters.entrySet()) {
      rows.put(parameter.getKey(), row);
      result.text(row, 0, parameter.getKey());
      result.input(row++, 1, parameter.getValue());
    }
    for (String input : panel.inputs()) {
      rows.put("base " + input, row);
      result.text(row, 0, input + " is divided by");
      result.input(row++, 1, fit.how().scaling().getOrDefault(input, 1.0));
    }
    row++;
    result.head(row, 0, "sum of squared residuals");
    result.head(row, 1, "live");
    result.head(row, 2, "stated");
    result.head(row, 3, "same");
    int last = FIRST + panel.rows() - 1;
    result.live(row + 1, 1, "SUMSQ(" + design.elsewhere(Paper.range(FIRST, 4, last, 4)) + ")");
    result.stated(row + 1, 2, fit.summary().map(s -> s.ssr()).orElse(Double.NaN));
    if (fit.summary().isPresent()) {
      result.check(row + 1, 3, Paper.at(row + 1, 1), Paper.at(row + 1, 2));
    }
    result.width(0, 28);
    result.verdict();
  }

  private String value(String parameter) {
    return result.elsewhere(Paper.absolute(Objects.requireNonNull(rows.get(parameter)), 1));
  }

  private void design() {
    List<String> heads =
        List.of("plant", "log of output", "fitted, without the plant", "difference", "residual");
    for (int c = 0; c < heads.size(); c++) {
      design.head(FIRST - 1, c, heads.get(c));
    }
    design.freeze(FIRST, 1);
    for (int p = 0; p < panel.plants().size(); p++) {
      int from = FIRST + panel.plantStart(p);
      int to = FIRST + panel.plantEnd(p) - 1;
      for (int r = panel.plantStart(p); r < panel.plantEnd(p); r++) {
        int row = FIRST + r;
        design.text(row, 0, panel.plants().get(p));
        design.live(row, 1, "LN(" + records.cell("output", r) + ")");
        design.live(row, 2, fitted(r));
        design.live(row, 3, Paper.at(row, 1) + "-" + Paper.at(row, 2));
        design.live(row, 4, Paper.at(row, 3) + "-AVERAGE(" + Paper.range(from, 3, to, 3) + ")");
        if (r % BLOCK == BLOCK - 1) {
          design.written();
        }
      }
    }
  }

  private String fitted(int r) {
    StringBuilder index = new StringBuilder("0");
    for (String input : panel.inputs()) {
      index.append('+').append(value("share:" + input)).append("*(");
      index.append(records.cell(RecordsPaper.quantity(input), r)).append('/');
      index.append(value("base " + input)).append(")^(-").append(value("rho")).append(')');
    }
    StringBuilder sum = new StringBuilder();
    sum.append('-').append(value("scale")).append('/').append(value("rho"));
    sum.append("*LN(").append(index).append(')');
    for (String name : parameters.keySet()) {
      if (name.equals("trend")) {
        sum.append('+').append(value(name)).append('*').append(records.period(r));
      } else if (name.startsWith("control:")) {
        sum.append('+').append(value(name)).append('*').append(records.cell(name, r));
      }
    }
    return sum.toString();
  }
}
