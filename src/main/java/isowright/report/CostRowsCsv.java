package isowright.report;

import isowright.study.CostFindings.Fitted;
import isowright.study.CostRows.Row;
import isowright.study.Figure;
import isowright.study.Figure.Uncertainty;
import isowright.study.Findings;
import isowright.study.FitFindings.Pair;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * What a cost function says of every row, as a file for a spreadsheet: UTF-8, comma, decimal point,
 * one line a row. Numbers are written so that reading them back gives the same number.
 */
public final class CostRowsCsv {

  private CostRowsCsv() {}

  /** The files of a study by name; empty where there is no cost function. */
  public static Map<String, byte[]> write(Findings findings) {
    Map<String, byte[]> files = new LinkedHashMap<>();
    for (Fitted fit : findings.costs().fits()) {
      if (!fit.rows().rows().isEmpty()) {
        files.put(name(fit), text(fit).getBytes(StandardCharsets.UTF_8));
      }
    }
    return files;
  }

  /** The file's name. */
  static String name(Fitted fit) {
    return "rows-" + fit.technology() + ".csv";
  }

  private static String text(Fitted fit) {
    StringBuilder text = new StringBuilder();
    line(text, headings(fit.rows().rows().get(0)));
    fit.rows().rows().forEach(row -> line(text, cells(row)));
    return text.toString();
  }

  private static List<String> headings(Row row) {
    List<String> all = new ArrayList<>(List.of("row", "plant", "period"));
    if (!Double.isNaN(row.output())) {
      all.add("output");
    }
    if (!Double.isNaN(row.averageCost())) {
      all.add("average cost at mean prices");
    }
    if (row.scale().isPresent()) {
      ends(all, "scale economies");
    }
    row.fitted().keySet().forEach(input -> all.add("fitted share of " + input));
    row.seen().keySet().forEach(input -> all.add("recorded share of " + input));
    for (Pair pair : row.elasticities()) {
      ends(
          all,
          pair.measure().equals("demand")
              ? "demand for " + pair.first() + " in the price of " + pair.second()
              : "Allen-Uzawa " + pair.first() + " and " + pair.second());
    }
    all.add("rising in prices and output");
    all.add("concave in prices");
    return all;
  }

  private static void ends(List<String> all, String what) {
    all.add(what);
    all.add(what + " low");
    all.add(what + " high");
  }

  private static List<String> cells(Row row) {
    List<String> all = new ArrayList<>();
    all.add(Integer.toString(row.row()));
    all.add(row.plant());
    all.add(row.period());
    if (!Double.isNaN(row.output())) {
      all.add(number(row.output()));
    }
    if (!Double.isNaN(row.averageCost())) {
      all.add(number(row.averageCost()));
    }
    row.scale().ifPresent(figure -> figure(all, figure));
    row.fitted().values().forEach(share -> all.add(number(share)));
    row.seen().values().forEach(share -> all.add(number(share)));
    row.elasticities().forEach(pair -> figure(all, pair.figure()));
    all.add(row.monotone() ? "yes" : "no");
    all.add(row.concave() ? "yes" : "no");
    return all;
  }

  private static void figure(List<String> all, Figure figure) {
    Optional<Uncertainty> sure = figure.uncertainty();
    all.add(number(figure.value()));
    all.add(number(sure.map(Uncertainty::low).orElse(figure.value())));
    all.add(number(sure.map(Uncertainty::high).orElse(figure.value())));
  }

  /** Empty for what is not known. */
  private static String number(double value) {
    return Double.isFinite(value) ? Double.toString(value) : "";
  }

  private static void line(StringBuilder text, List<String> cells) {
    for (int k = 0; k < cells.size(); k++) {
      text.append(k == 0 ? "" : ",").append(quoted(cells.get(k)));
    }
    text.append('\n');
  }

  /** In quotation marks where a comma, a mark or a line end would be misread (RFC 4180). */
  private static String quoted(String cell) {
    boolean plain = cell.indexOf(',') < 0 && cell.indexOf('"') < 0 && cell.indexOf('\n') < 0;
    return plain ? cell : '"' + cell.replace("\"", "\"\"") + '"';
  }
}
