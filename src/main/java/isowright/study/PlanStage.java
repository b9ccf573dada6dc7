package isowright.study;

import isowright.estimation.EstimatedTechnology;
import isowright.estimation.Productivity;
import isowright.inference.DeltaMethod;
import isowright.inference.Intervals;
import isowright.inference.Support;
import isowright.leastcost.Isoquant;
import isowright.leastcost.Minimiser;
import isowright.leastcost.Plan;
import isowright.leastcost.Question;
import isowright.records.Panel;
import isowright.study.Findings.Said;
import isowright.study.PlanFindings.CurvePoint;
import isowright.study.PlanFindings.Planned;
import isowright.technology.Technology;
import java.text.DecimalFormat;
import java.text.DecimalFormatSymbols;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;

/** Answers the least-cost questions of a study with each technology asked. */
final class PlanStage {

  private static final int ISOQUANT_POINTS = 81;

  /** An isoquant is drawn from a third to three times the first input of the plan. */
  private static final double ISOQUANT_FACTOR = 3;

  private final Study study;
  private final Optional<Panel> panel;
  private final Optional<Support> support;
  private final List<Candidate> candidates;

  PlanStage(Study study, Optional<Panel> panel, List<Candidate> candidates) {
    this.study = study;
    this.panel = panel;
    this.support = study.leastCost().isEmpty() ? Optional.empty() : panel.map(Support::of);
    this.candidates = List.copyOf(candidates);
  }

  List<Planned> plans() {
    List<Planned> plans = new ArrayList<>();
    for (Study.LeastCostQuestion asked : study.leastCost()) {
      for (Candidate candidate : candidates) {
        boolean wanted =
            asked.technologies().isEmpty() || asked.technologies().contains(candidate.name());
        if (wanted && candidate.usable()) {
          plans.add(answer(asked, candidate));
        }
      }
    }
    return plans;
  }

  private Planned answer(Study.LeastCostQuestion asked, Candidate candidate) {
    EstimatedTechnology estimated = candidate.at(period(asked), productivity(asked));
    Question question = question(asked);
    Plan plan = Minimiser.of(estimated.technology()).plan(question);
    PlanFigures figures =
        new PlanFigures(
            study.inputs(),
            candidate.fit().map(f -> Intervals.of(estimated, study.estimation().confidence())),
            candidate.fit().map(f -> DeltaMethod.of(estimated, study.estimation().confidence())));
    List<Said> remarks = new ArrayList<>();
    String status = status(asked, plan, remarks);
    if (!plan.reason().isEmpty()) {
      remarks.add(Said.of(plan.answered() ? "note" : "warning", status, plan.reason()));
    }
    PlanFigures.Answer answer = figures.answer(estimated.technology(), question, plan);
    remarks.addAll(answer.remarks());
    List<CurvePoint> curve =
        figures.curve(
            estimated.technology(), question, CurveSpan.targets(asked), mix -> inside(mix));
    List<double[]> isoquant =
        plan.answered() ? isoquant(estimated.technology(), question, plan) : List.of();
    return new Planned(
        asked.name(),
        candidate.name(),
        candidate.fit().isPresent(),
        asked.target(),
        named(question.prices()),
        productivityWords(asked, candidate),
        limits(asked),
        status,
        answer.mix(),
        answer.cost(),
        answer.marginalCost(),
        answer.averageCost(),
        answer.shares(),
        plan.optimality(),
        curve,
        isoquant,
        seen(asked),
        remarks);
  }

  private boolean inside(double[] mix) {
    return support.map(s -> s.inside(mix)).orElse(true);
  }

  private String status(Study.LeastCostQuestion asked, Plan plan, List<Said> remarks) {
    if (plan.status() == Plan.Status.IRREGULAR) {
      return "irregular";
    }
    if (plan.status() == Plan.Status.INFEASIBLE) {
      return "infeasible";
    }
    if (support.isEmpty()) {
      remarks.add(
          Said.of(
              "note",
              "no-records",
              "There are no records, so whether this mix has ever been seen cannot be said."));
    } else {
      List<String> reasons = new ArrayList<>(support.get().reasons(plan.mix()));
      outputReason(asked.target()).ifPresent(reasons::add);
      if (!reasons.isEmpty()) {
        remarks.add(
            Said.of(
                "warning",
                "outside-records",
                "This answer is a guess beyond the records: " + String.join("; ", reasons) + "."));
        return "outside-records";
      }
    }
    return plan.status() == Plan.Status.CORNER ? "corner" : "solved";
  }

  private Optional<String> outputReason(double target) {
    double[] output = panel.orElseThrow().output().toArray();
    double least = Double.POSITIVE_INFINITY;
    double most = Double.NEGATIVE_INFINITY;
    for (double q : output) {
      least = Math.min(least, q);
      most = Math.max(most, q);
    }
    if (target >= least && target <= most) {
      return Optional.empty();
    }
    return Optional.of(
        String.format(
            Locale.ROOT,
            "the target of %,.6g lies outside recorded output (%,.6g to %,.6g)",
            target,
            least,
            most));
  }

  private int period(Study.LeastCostQuestion asked) {
    return panel
        .map(p -> asked.period().map(p.periods()::indexOf).orElseGet(() -> p.periods().size() - 1))
        .orElse(0);
  }

  private Productivity productivity(Study.LeastCostQuestion asked) {
    return productivity(asked.productivity(), panel);
  }

  static Productivity productivity(Study.Productivity asked, Optional<Panel> panel) {
    return switch (asked.kind()) {
      case TYPICAL -> new Productivity.Typical();
      case BEST_QUARTER -> new Productivity.UpperQuartile();
      case PLANT ->
          new Productivity.Plant(panel.orElseThrow().plants().indexOf(asked.plant().orElseThrow()));
    };
  }

  private String productivityWords(Study.LeastCostQuestion asked, Candidate candidate) {
    if (candidate.given().isPresent()) {
      return "as given";
    }
    String when = panel.map(p -> " in " + p.periods().get(period(asked))).orElse("");
    return switch (asked.productivity().kind()) {
      case TYPICAL -> "the typical plant" + when;
      case BEST_QUARTER -> "the plant at the upper quartile of productivity" + when;
      case PLANT -> "plant " + asked.productivity().plant().orElseThrow() + when;
    };
  }

  private Question question(Study.LeastCostQuestion asked) {
    List<String> inputs = study.inputs();
    double[] prices = new double[inputs.size()];
    for (int i = 0; i < prices.length; i++) {
      Double stated = asked.prices().get(inputs.get(i));
      prices[i] = stated != null ? stated : Demands.meanPrice(panel.orElseThrow(), i);
    }
    Question question = Question.of(asked.target(), prices);
    for (int i = 0; i < prices.length; i++) {
      Study.Limit limit = asked.limits().get(inputs.get(i));
      Double held = asked.hold().get(inputs.get(i));
      if (held != null) {
        question = question.holding(i, held);
      } else if (limit != null) {
        question = question.limiting(i, limit.low(), limit.high());
      }
    }
    return question;
  }

  private Map<String, String> limits(Study.LeastCostQuestion asked) {
    Map<String, String> words = new LinkedHashMap<>();
    for (String input : study.inputs()) {
      Study.Limit limit = asked.limits().get(input);
      Double held = asked.hold().get(input);
      if (held != null) {
        words.put(input, "held at " + quantity(input, held));
      } else if (limit != null) {
        words.put(input, within(input, limit));
      }
    }
    return words;
  }

  private String within(String input, Study.Limit limit) {
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
  private String quantity(String input, double value) {
    int at = study.inputs().indexOf(input);
    DecimalFormatSymbols plain = DecimalFormatSymbols.getInstance(Locale.ROOT);
    String number = new DecimalFormat("#,##0.######", plain).format(value);
    return study.inputUnits().get(at).map(unit -> number + " " + unit).orElse(number);
  }

  private Map<String, Double> named(double[] values) {
    Map<String, Double> named = new LinkedHashMap<>();
    for (int i = 0; i < values.length; i++) {
      named.put(study.inputs().get(i), values[i]);
    }
    return named;
  }

  private static List<double[]> isoquant(Technology technology, Question question, Plan plan) {
    double[] mix = plan.mix();
    return mix[0] > 0 && mix[1] > 0
        ? Isoquant.around(
            technology, question.target(), 0, 1, mix, ISOQUANT_FACTOR, ISOQUANT_POINTS)
        : List.of();
  }

  /** The mixes of the period of the question, in the first two inputs. */
  private List<PlanFindings.Mix> seen(Study.LeastCostQuestion asked) {
    if (panel.isEmpty()) {
      return List.of();
    }
    Panel p = panel.get();
    int period = period(asked);
    List<PlanFindings.Mix> mixes = new ArrayList<>();
    for (int r = 0; r < p.rows() && mixes.size() < SEEN; r++) {
      if (p.rowPeriods().get(r) == period) {
        mixes.add(
            new PlanFindings.Mix(
                p.plants().get(p.plantOf(r)),
                p.periods().get(period),
                p.quantities().get(0).get(r),
                p.quantities().get(1).get(r),
                p.output().get(r)));
      }
    }
    return mixes;
  }

  /** More plants than this cannot be told apart in one picture. */
  private static final int SEEN = 500;
}
