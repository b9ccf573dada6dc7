package isowright.cli;

import isowright.report.Numbers;
import isowright.report.PlanWording;
import isowright.study.CostFindings;
import isowright.study.Figure;
import isowright.study.Findings;
import isowright.study.Findings.Said;
import isowright.study.FitFindings.Fitted;
import isowright.study.FitFindings.Given;
import isowright.study.FitFindings.Pair;
import isowright.study.PlanFindings.Planned;
import java.io.PrintWriter;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.stream.Stream;

/** Prints the answer of a study in brief; the report has the rest. Computes nothing. */
final class Answer {

  private final PrintWriter out;

  Answer(PrintWriter out) {
    this.out = out;
  }

  /** Prints what was found and where the report is. */
  void print(Findings findings, Path folder) {
    print(findings, Optional.of(folder));
  }

  /** Prints what was found; without a report also what else must be known of each plan. */
  void print(Findings findings, Optional<Path> folder) {
    out.println(findings.run().title());
    findings.records().ifPresent(this::records);
    if (!findings.fits().isEmpty()
        || !findings.costs().fits().isEmpty()
        || findings.plans().stream().anyMatch(Planned::estimated)) {
      out.println("Intervals at " + Numbers.level(findings.confidence()) + ".");
    }
    findings.fits().forEach(this::fit);
    findings.given().forEach(this::given);
    findings.costs().fits().forEach(this::cost);
    plans(findings);
    reviews(findings);
    out.println();
    out.println("Remarks: " + RemarkCounts.words(severities(findings)));
    folder.ifPresentOrElse(
        into -> out.println("Report: " + into.resolve("report.html")), () -> more(findings));
  }

  private void more(Findings findings) {
    for (Planned plan : findings.plans()) {
      out.println();
      out.println(plan.question() + ", " + plan.technology());
      String per = findings.units().output();
      String unit = findings.units().money() + " per " + (per.isEmpty() ? "unit of output" : per);
      plan.marginalCost()
          .ifPresent(f -> line("marginal cost", Numbers.valueAndInterval(f) + " " + unit));
      plan.averageCost()
          .ifPresent(f -> line("average cost", Numbers.valueAndInterval(f) + " " + unit));
      plan.detail().multipliers().stream()
          .filter(worth -> !worth.kind().equals("target"))
          .forEach(worth -> out.println("  " + worth.words()));
      plan.remarks().forEach(said -> out.println("  " + said.severity() + ": " + said.message()));
    }
    findings.remarks().forEach(said -> out.println(said.message()));
  }

  private void records(Findings.Records records) {
    String span =
        records.periods() > 1 ? ", " + records.firstPeriod() + " to " + records.lastPeriod() : "";
    out.println(
        Failures.count(records.used(), "row")
            + " used of "
            + records.rows()
            + ", "
            + Failures.count(records.plants(), "plant")
            + span
            + ".");
  }

  private void fit(Fitted fit) {
    out.println();
    out.println(fit.technology() + ": " + fit.state());
    fit.returnsToScale().ifPresent(f -> line("returns to scale", Numbers.valueAndInterval(f)));
    substitution(fit.substitution());
    fit.regularity()
        .ifPresent(r -> line("regular", "at " + r.both() + " of " + r.rows() + " rows"));
    fit.frontier()
        .ifPresent(
            found ->
                line(
                    "inefficiency",
                    found
                        .variances()
                        .map(v -> Numbers.valueAndInterval(v.mean()) + " of ln output, on average")
                        .orElse("none found (" + found.state() + ")")));
  }

  private void cost(CostFindings.Fitted fit) {
    out.println();
    out.println(fit.technology() + ": " + fit.state());
    fit.at()
        .flatMap(CostFindings.AtMean::scaleEconomies)
        .ifPresent(f -> line("scale economies", Numbers.valueAndInterval(f)));
    fit.efficient().ifPresent(e -> line("efficient scale", Numbers.valueAndInterval(e.output())));
    fit.regularity()
        .ifPresent(r -> line("regular", "at " + r.both() + " of " + r.rows() + " rows"));
  }

  private void given(Given given) {
    out.println();
    out.println(given.name() + ": " + given.technology() + ", as given");
    line("returns to scale", Numbers.amount(given.returnsToScale()));
    substitution(given.substitution());
  }

  /** Two inputs have one elasticity, the direct one; with more, the Morishima ones are shown. */
  private void substitution(List<Pair> pairs) {
    boolean direct = pairs.stream().anyMatch(pair -> pair.measure().equals("hicks"));
    String measure = direct ? "hicks" : "morishima";
    Map<String, String> shown = new LinkedHashMap<>();
    for (Pair pair : pairs) {
      if (pair.measure().equals(measure)) {
        String between =
            direct
                ? pair.first() + ", " + pair.second()
                : pair.first()
                    + "/"
                    + pair.second()
                    + " as the price of "
                    + pair.second()
                    + " moves";
        shown.put(between, Numbers.valueAndInterval(pair.figure()));
      }
    }
    if (shown.size() > 1 && shown.values().stream().distinct().count() == 1) {
      line("substitution", shown.values().iterator().next() + ", every pair of inputs");
    } else {
      shown.forEach((between, figure) -> line("substitution", figure + ", " + between));
    }
  }

  private void line(String what, String value) {
    out.println("  " + what + " ".repeat(Math.max(1, 18 - what.length())) + value);
  }

  private void plans(Findings findings) {
    Map<String, List<Planned>> questions = new LinkedHashMap<>();
    for (Planned plan : findings.plans()) {
      questions.computeIfAbsent(plan.question(), name -> new ArrayList<>()).add(plan);
    }
    questions.forEach((question, plans) -> plans(question, plans, findings));
  }

  private void plans(String question, List<Planned> plans, Findings findings) {
    Findings.Units units = findings.units();
    Planned first = plans.get(0);
    out.println();
    out.println(question + ": " + PlanWording.sought(first, units.money(), units.output()));
    List<String> inputs = List.copyOf(first.prices().keySet());
    List<String> headings = new ArrayList<>(List.of("technology", "status"));
    inputs.forEach(input -> headings.add(withUnit(input, units.inputs().getOrDefault(input, ""))));
    String goal = first.detail().goal();
    headings.add(
        switch (goal) {
          case "budget" -> withUnit("output", units.output());
          case "profit" -> "profit, " + units.money();
          default -> "cost, " + units.money();
        });
    headings.add("interval");
    TextTable table = new TextTable(2, headings.toArray(String[]::new));
    for (Planned plan : plans) {
      List<String> row = new ArrayList<>(List.of(plan.technology(), plan.status()));
      inputs.forEach(input -> row.add(value(Optional.ofNullable(plan.mix().get(input)))));
      Optional<Figure> answer = PlanWording.answer(plan);
      row.add(value(answer));
      row.add(answer.map(Numbers::interval).orElse(""));
      table.row(row.toArray(String[]::new));
    }
    table.lines("  ").forEach(out::println);
    for (Planned plan : plans) {
      if (!plan.answered()) {
        plan.remarks().stream()
            .limit(1)
            .forEach(said -> out.println("  " + plan.technology() + ": " + said.message()));
      }
    }
  }

  private static String withUnit(String name, String unit) {
    return unit.isEmpty() ? name : name + ", " + unit;
  }

  private static String value(Optional<Figure> figure) {
    return figure.map(Numbers::value).orElse("none");
  }

  private void reviews(Findings findings) {
    if (findings.reviews().isEmpty()) {
      return;
    }
    long filings =
        findings.reviews().stream().map(r -> r.plant() + "\0" + r.period()).distinct().count();
    out.println();
    out.println(
        Failures.count((int) filings, "filed cost")
            + " held against least cost; gaps and their parts are in the report.");
  }

  private static List<String> severities(Findings findings) {
    Stream<Said> records = findings.records().stream().flatMap(r -> r.remarks().stream());
    Stream<Said> fits = findings.fits().stream().flatMap(f -> f.remarks().stream());
    Stream<Said> given = findings.given().stream().flatMap(g -> g.remarks().stream());
    Stream<Said> plans = findings.plans().stream().flatMap(p -> p.remarks().stream());
    Stream<Said> reviews = findings.reviews().stream().flatMap(r -> r.remarks().stream());
    Stream<Said> costs =
        Stream.concat(
            findings.costs().remarks().stream(),
            findings.costs().fits().stream().flatMap(f -> f.remarks().stream()));
    return Stream.of(findings.remarks().stream(), records, fits, given, costs, plans, reviews)
        .flatMap(said -> said)
        .map(Said::severity)
        .toList();
  }
}
