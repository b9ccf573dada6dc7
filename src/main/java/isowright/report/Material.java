package isowright.report;

import isowright.charts.Chart;
import isowright.report.Document.Block;
import isowright.report.Document.Drawing;
import isowright.report.Document.Notice;
import isowright.report.Document.Weight;
import isowright.study.Findings;
import isowright.study.Findings.Said;
import isowright.study.FitFindings.Fitted;
import isowright.study.PlanFindings.Planned;
import java.util.List;
import java.util.regex.Pattern;

/**
 * What the sections of a report are made from, with the words that all of them share.
 *
 * @param findings the findings
 * @param charts the charts
 */
record Material(Findings findings, List<Chart> charts) {

  Material {
    charts = List.copyOf(charts);
  }

  /** Whether the technologies were estimated elsewhere, from records that were not read. */
  boolean handedOver() {
    return findings.records().isEmpty()
        && findings.fits().isEmpty()
        && findings.costs().fits().isEmpty()
        && findings.plans().stream().anyMatch(Planned::estimated);
  }

  /** The level of all intervals. */
  double confidence() {
    return findings.confidence();
  }

  /** "95 % interval". */
  String interval() {
    return Numbers.level(confidence()) + " interval";
  }

  /** The inputs, in their order. */
  List<String> inputs() {
    return List.copyOf(findings.units().inputs().keySet());
  }

  /** The unit of an input, empty where not stated. */
  String unit(String input) {
    return findings.units().inputs().getOrDefault(input, "");
  }

  /** An input and its unit: "labour (h)". */
  String inputAndUnit(String input) {
    return unit(input).isEmpty() ? input : input + " (" + unit(input) + ")";
  }

  /** How money is printed. */
  String money() {
    return findings.units().money();
  }

  /** The unit of output, empty where not stated. */
  String outputUnit() {
    return findings.units().output();
  }

  /** Money per unit of output. */
  String moneyPerOutput() {
    return money() + " per " + (outputUnit().isEmpty() ? "unit of output" : outputUnit());
  }

  /** Money per unit of an input. */
  String moneyPer(String input) {
    return money() + " per " + (unit(input).isEmpty() ? "unit" : unit(input));
  }

  /** The level of significance that belongs to the intervals: "5 %". */
  String significance() {
    return Numbers.level(Phrases.level(confidence()));
  }

  /** The fits that later stages may use. */
  List<Fitted> usable() {
    return findings.fits().stream().filter(Fitted::usable).toList();
  }

  /** The names of the questions, in order. */
  List<String> questions() {
    return findings.plans().stream().map(Planned::question).distinct().toList();
  }

  /** The answers to one question. */
  List<Planned> plans(String question) {
    return findings.plans().stream().filter(plan -> plan.question().equals(question)).toList();
  }

  /** The charts of a kind about a subject. */
  List<Block> drawings(Chart.Kind kind, String subject) {
    return charts.stream()
        .filter(chart -> chart.kind() == kind && chart.subject().equals(subject))
        .<Block>map(Drawing::new)
        .toList();
  }

  /** All charts of a kind. */
  List<Block> drawings(Chart.Kind kind) {
    return charts.stream().filter(chart -> chart.kind() == kind).<Block>map(Drawing::new).toList();
  }

  /** Remarks as notices. */
  static List<Block> notices(List<Said> remarks) {
    return remarks.stream().map(Material::notice).toList();
  }

  /** A remark as a notice, with the rows it concerns. */
  static Block notice(Said remark) {
    return new Notice(Weight.of(remark.severity()), Text.of(remark.message() + rows(remark)));
  }

  /** Remarks about something that is named first. */
  static List<Block> notices(String about, List<Said> remarks) {
    return remarks.stream()
        .<Block>map(
            remark ->
                new Notice(
                    Weight.of(remark.severity()),
                    Text.strong(about + ". ").then(remark.message() + rows(remark))))
        .toList();
  }

  /** The rows that a remark concerns and does not itself name. */
  private static String rows(Said remark) {
    List<String> unnamed =
        remark.rows().stream()
            .map(String::valueOf)
            .filter(row -> !Pattern.compile("\\b" + row + "\\b").matcher(remark.message()).find())
            .toList();
    if (unnamed.isEmpty()) {
      return "";
    }
    return (unnamed.size() == 1 ? " Row " : " Rows ") + Phrases.list(unnamed) + ".";
  }
}
