package isowright.study;

import isowright.estimation.EstimatedTechnology;
import isowright.estimation.Productivity;
import isowright.estimation.SavedTechnology;
import isowright.inference.Support;
import isowright.leastcost.PlanTask;
import isowright.leastcost.PriceSchedule;
import isowright.records.Panel;
import java.text.DecimalFormat;
import java.text.DecimalFormatSymbols;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;

/**
 * The circumstances in which a question is answered: prices, limits, period and productivity, as
 * the question states them or the records hold them; and whether a mix lies inside the records.
 */
final class PlanCircumstances {

  /** More plants than this are not asked one by one for the range of productivity. */
  private static final int MOST_PLANTS = 500;

  private final Study study;
  private final Optional<Panel> panel;
  private final Optional<Recorded> recorded;
  private final Optional<Support> support;

  PlanCircumstances(Study study, Optional<Panel> panel) {
    this(study, panel, study.leastCost().isEmpty() ? Optional.empty() : panel.map(Recorded::of));
  }

  /** The circumstances of records that were read elsewhere. */
  static PlanCircumstances handedOver(Study study, Optional<Recorded> recorded) {
    return new PlanCircumstances(study, Optional.empty(), recorded);
  }

  private PlanCircumstances(Study study, Optional<Panel> panel, Optional<Recorded> recorded) {
    this.study = study;
    this.panel = panel;
    this.recorded = recorded;
    this.support = recorded.map(r -> r.support(study.inputs()));
  }

  /** The records themselves, where they are at hand. */
  Optional<Panel> panel() {
    return panel;
  }

  /** Whether anything is known of records. */
  boolean known() {
    return recorded.isPresent();
  }

  boolean inside(double[] mix) {
    return support.map(s -> s.inside(mix)).orElse(true);
  }

  /** Why a mix and an output lie outside the records; empty where they do not. */
  List<String> outside(double[] mix, double output) {
    List<String> reasons = new ArrayList<>(support.map(s -> s.reasons(mix)).orElse(List.of()));
    if (!recorded(output)) {
      double[] range = outputRange();
      reasons.add(
          String.format(
              Locale.ROOT,
              "the target of %,.6g lies outside recorded output (%,.6g to %,.6g)",
              output,
              range[0],
              range[1]));
    }
    return reasons;
  }

  /** Whether an output lies within those recorded; true where there are no records. */
  boolean recorded(double output) {
    double[] range = outputRange();
    return output >= range[0] && output <= range[1];
  }

  private double[] outputRange() {
    return recorded
        .map(r -> new double[] {r.leastOutput(), r.mostOutput()})
        .orElse(new double[] {0, Double.POSITIVE_INFINITY});
  }

  int period(Study.LeastCostQuestion asked) {
    return recorded
        .map(r -> asked.period().map(r.periods()::indexOf).orElseGet(() -> r.periods().size() - 1))
        .orElse(0);
  }

  Productivity productivity(Study.Productivity asked) {
    return asked.kind() == Study.Productivity.Kind.PLANT
        ? plant(asked.plant().orElseThrow())
        : productivity(asked, panel);
  }

  /** Whose productivity is meant. */
  static Productivity productivity(Study.Productivity asked, Optional<Panel> panel) {
    return switch (asked.kind()) {
      case TYPICAL -> new Productivity.Typical();
      case BEST_QUARTER -> new Productivity.UpperQuartile();
      case FRONTIER -> new Productivity.Frontier();
      case PLANT -> plant(asked.plant().orElseThrow(), panel);
    };
  }

  private static Productivity plant(String name, Optional<Panel> panel) {
    return new Productivity.Plant(panel.orElseThrow().plants().indexOf(name));
  }

  Productivity plant(String name) {
    return new Productivity.Plant(recorded.orElseThrow().plants().indexOf(name));
  }

  String productivityWords(Study.LeastCostQuestion asked, Candidate candidate) {
    if (candidate.given().isPresent()) {
      return "as given";
    }
    String when = recorded.map(r -> " in " + r.periods().get(period(asked))).orElse("");
    if (!asked.terms().across().isEmpty()) {
      return "each plant its own" + when;
    }
    return switch (asked.productivity().kind()) {
      case TYPICAL -> "the typical plant" + when;
      case BEST_QUARTER -> "the plant at the upper quartile of productivity" + when;
      case FRONTIER -> frontierWords(candidate) + when;
      case PLANT -> "plant " + asked.productivity().plant().orElseThrow() + when;
    };
  }

  /** The frontier of a fit, or what stands in its place where no inefficiency was found. */
  static String frontierWords(Candidate candidate) {
    return inefficient(candidate)
        ? "the frontier (no inefficiency)"
        : "the frontier, which is the typical plant (no inefficiency was found)";
  }

  /** Whether inefficiency was found in the fit. */
  static boolean inefficient(Candidate candidate) {
    return candidate.fit().flatMap(f -> f.numbers().frontier()).stream()
            .anyMatch(own -> own.fit().state().oneSided())
        || candidate.saved().map(SavedTechnology::inefficient).orElse(false);
  }

  /** The price of an input: stated, or the mean of the last period recorded. */
  double price(Map<String, Double> stated, int i) {
    Double price = stated.get(study.inputs().get(i));
    return price != null ? price : recorded.orElseThrow().prices()[i];
  }

  /** The key of the study file under which the goal stands. */
  static String goalKey(PlanTerms terms) {
    return terms.goal().fold(t -> "target", b -> "budget", p -> "output-price");
  }

  /** What is planned. */
  PlanTask task(Study.LeastCostQuestion asked) {
    int n = study.inputs().size();
    List<PriceSchedule> schedules = new ArrayList<>();
    double[] low = new double[n];
    double[] high = new double[n];
    double[] committed = new double[n];
    boolean[] whole = new boolean[n];
    for (int i = 0; i < n; i++) {
      String input = study.inputs().get(i);
      PriceSchedule bands = asked.terms().bands().get(input);
      schedules.add(bands != null ? bands : PriceSchedule.single(price(asked.prices(), i)));
      double[] limits = limits(input, asked.hold(), asked.limits());
      low[i] = limits[0];
      high[i] = limits[1];
      committed[i] = asked.terms().takeAtLeast().getOrDefault(input, 0.0);
      whole[i] = asked.terms().whole().contains(input);
    }
    return new PlanTask(asked.terms().goal(), schedules, low, high, committed, whole);
  }

  static double[] limits(String input, Map<String, Double> hold, Map<String, Study.Limit> limits) {
    Double held = hold.get(input);
    Study.Limit limit = limits.get(input);
    if (held != null) {
      return new double[] {held, held};
    }
    return limit == null
        ? new double[] {0, Double.POSITIVE_INFINITY}
        : new double[] {limit.low(), limit.high()};
  }

  /** Limits, bands and whole units in words, by input. */
  Map<String, String> limitWords(Study.LeastCostQuestion asked) {
    Map<String, String> words = new LinkedHashMap<>();
    for (String input : study.inputs()) {
      List<String> parts = new ArrayList<>();
      Study.Limit limit = asked.limits().get(input);
      Double held = asked.hold().get(input);
      Double take = asked.terms().takeAtLeast().get(input);
      PriceSchedule bands = asked.terms().bands().get(input);
      if (held != null) {
        parts.add("held at " + quantity(input, held));
      } else if (limit != null) {
        parts.add(within(input, limit));
      }
      if (take != null) {
        parts.add("at least " + quantity(input, take) + " paid for whether used or not");
      }
      if (bands != null) {
        parts.add(bandWords(bands));
      }
      if (asked.terms().whole().contains(input)) {
        parts.add("in whole units");
      }
      if (!parts.isEmpty()) {
        words.put(input, String.join(", ", parts));
      }
    }
    return words;
  }

  /** "at most 60,000 h". */
  String within(String input, Study.Limit limit) {
    if (Double.isInfinite(limit.high())) {
      return "at least " + quantity(input, limit.low());
    }
    return limit.low() <= 0
        ? "at most " + quantity(input, limit.high())
        : "at least "
            + quantity(input, limit.low())
            + " and at most "
            + quantity(input, limit.high());
  }

  /** A quantity as stated, thousands set off, with its unit: "42,000 h". */
  String quantity(String input, double value) {
    int at = study.inputs().indexOf(input);
    DecimalFormatSymbols plain = DecimalFormatSymbols.getInstance(Locale.ROOT);
    String number = new DecimalFormat("#,##0.######", plain).format(value);
    return study.inputUnits().get(at).map(unit -> number + " " + unit).orElse(number);
  }

  /** "at 31.5 up to 40,000, then 47.25". */
  private static String bandWords(PriceSchedule bands) {
    List<String> parts = new ArrayList<>();
    for (int k = 0; k < bands.size(); k++) {
      String price = PlanWords.number(bands.price(k));
      String end =
          Double.isInfinite(bands.end(k)) ? "" : " up to " + PlanWords.number(bands.end(k));
      double before = k == 0 ? 0 : bands.intercept(k - 1) + bands.price(k - 1) * bands.start(k);
      double jump = bands.intercept(k) + bands.price(k) * bands.start(k) - before;
      String step =
          Math.abs(jump) <= 1e-9 * Math.max(1, Math.abs(before))
              ? ""
              : jump > 0
                  ? " and " + PlanWords.number(jump) + " once it is entered"
                  : " for all units";
      parts.add((k == 0 ? "at " : "then ") + price + end + step);
    }
    return String.join(", ", parts);
  }

  /** What the records hold of prices, output and productivity. */
  ChangeFigures.Observed observed(
      Study.LeastCostQuestion asked, Candidate candidate, EstimatedTechnology estimated) {
    List<Optional<double[]>> prices =
        recorded
            .map(Recorded::priceRanges)
            .orElseGet(() -> Collections.nCopies(study.inputs().size(), Optional.empty()));
    Optional<double[]> output = recorded.flatMap(Recorded::outputRange);
    return new ChangeFigures.Observed(prices, output, levels(asked, candidate, estimated));
  }

  /** The least and most productive plants of the records, as factors on the answer's output. */
  private Optional<double[]> levels(
      Study.LeastCostQuestion asked, Candidate candidate, EstimatedTechnology estimated) {
    if (recorded.isEmpty() || !candidate.estimated()) {
      return Optional.empty();
    }
    int plants = recorded.get().plants().size();
    if (plants < 2 || !recorded.get().repeated() || plants > MOST_PLANTS) {
      return Optional.empty(); // without repeated plants a level is a residual
    }
    double here = estimated.technology().parameters()[0];
    double[] shifts = new double[plants];
    for (int p = 0; p < plants; p++) {
      EstimatedTechnology own = candidate.at(period(asked), new Productivity.Plant(p));
      shifts[p] = Math.exp(own.technology().parameters()[0] - here);
    }
    return ChangeFigures.range(Arrays.stream(shifts).min(), Arrays.stream(shifts).max());
  }
}
