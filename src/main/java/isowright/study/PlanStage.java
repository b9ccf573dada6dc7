package isowright.study;

import isowright.estimation.EstimatedTechnology;
import isowright.leastcost.Isoquant;
import isowright.leastcost.PlanChecks;
import isowright.leastcost.PlanOutcome;
import isowright.leastcost.PlanTask;
import isowright.leastcost.Proof;
import isowright.records.Panel;
import isowright.study.Findings.Said;
import isowright.study.PlanDetail.Checks;
import isowright.study.PlanDetail.Proved;
import isowright.study.PlanDetail.Worth;
import isowright.study.PlanFindings.CurvePoint;
import isowright.study.PlanFindings.Planned;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/** Answers the least-cost questions of a study with each technology asked. */
final class PlanStage {

  private static final int ISOQUANT_POINTS = 81;

  /** An isoquant is drawn from a third to three times the first input of the plan. */
  private static final double ISOQUANT_FACTOR = 3;

  /** More plants than this cannot be told apart in one picture. */
  private static final int SEEN = 500;

  private final Study study;
  private final PlanCircumstances circumstances;
  private final List<Candidate> candidates;

  /** One question to one technology. */
  private record Pair(Study.LeastCostQuestion asked, Candidate candidate) {}

  PlanStage(Study study, Optional<Panel> panel, List<Candidate> candidates) {
    this(study, new PlanCircumstances(study, panel), candidates);
  }

  PlanStage(Study study, PlanCircumstances circumstances, List<Candidate> candidates) {
    this.study = study;
    this.circumstances = circumstances;
    this.candidates = List.copyOf(candidates);
  }

  List<Planned> plans() {
    List<Pair> pairs = new ArrayList<>();
    SplitStage split = new SplitStage(study, circumstances, candidates);
    for (Study.LeastCostQuestion asked : study.leastCost()) {
      if (split.namesEveryTechnology(asked)) {
        split.first(asked).ifPresent(candidate -> pairs.add(new Pair(asked, candidate)));
        continue;
      }
      for (Candidate candidate : candidates) {
        boolean wanted =
            asked.technologies().isEmpty() || asked.technologies().contains(candidate.name());
        if (wanted && candidate.usable()) {
          pairs.add(new Pair(asked, candidate));
        }
      }
    }
    return pairs.parallelStream()
        .map(
            pair ->
                pair.asked.terms().across().isEmpty()
                    ? answer(pair.asked, pair.candidate)
                    : split.answer(pair.asked, pair.candidate))
        .toList();
  }

  private Planned answer(Study.LeastCostQuestion asked, Candidate candidate) {
    EstimatedTechnology estimated =
        candidate.at(circumstances.period(asked), circumstances.productivity(asked.productivity()));
    PlanTask task = circumstances.task(asked);
    PlanAnswer answer = PlanAnswer.of(study, asked, candidate, estimated, task);
    PlanOutcome outcome = answer.outcome();
    PlanFigures figures = new PlanFigures(answer, study.estimation().confidence());
    List<Said> remarks = new ArrayList<>();
    String status = status(outcome, remarks);
    if (!outcome.plan().reason().isEmpty()) {
      remarks.add(Said.of(outcome.planned() ? "note" : "warning", status, outcome.plan().reason()));
    }
    PlanFigures.Main main = figures.main();
    remarks.addAll(main.remarks());
    double around = outcome.planned() ? outcome.output() : asked.target();
    double[] targets =
        Double.isNaN(around) && asked.curve().isEmpty()
            ? new double[0]
            : CurveSpan.targets(asked, around);
    PlanCurve curves = new PlanCurve(answer, circumstances::inside);
    PlanCurve.Found curve = curves.over(targets);
    PlanDetail detail =
        outcome.planned()
            ? detail(answer, candidate, main, targets, curve)
            : bare(answer, curve, curves.nearest(curve.points()));
    detail.nearest().ifPresent(point -> remarks.add(nearest(point)));
    detail
        .proof()
        .map(Proved::reason)
        .filter(reason -> !reason.isEmpty())
        .ifPresent(reason -> remarks.add(Said.of("note", "local-proof", sentence(reason))));
    if (answer.figures().estimated()
        && outcome.planned()
        && PlanStage.goal(asked.terms()).equals("profit")) {
      remarks.add(
          Said.of(
              "note",
              "changes-without-intervals",
              "What other prices would change in profit is told without intervals: each is a search"
                  + " of its own."));
    }
    return new Planned(
        asked.name(),
        candidate.name(),
        candidate.estimated(),
        outcome.planned() ? outcome.output() : asked.target(),
        prices(answer),
        circumstances.productivityWords(asked, candidate),
        circumstances.limitWords(asked),
        status,
        main.mix(),
        main.cost(),
        main.marginalCost(),
        main.averageCost(),
        main.shares(),
        outcome.plan().optimality(),
        curve.points(),
        outcome.planned() ? isoquant(answer) : List.of(),
        seen(asked),
        remarks,
        detail);
  }

  private static String sentence(String reason) {
    return "Only a local best is proved: " + reason + ".";
  }

  private String status(PlanOutcome outcome, List<Said> remarks) {
    if (!outcome.planned()) {
      return outcome.state().name().toLowerCase(java.util.Locale.ROOT);
    }
    if (!circumstances.known()) {
      remarks.add(
          Said.of(
              "note",
              "no-records",
              "There are no records, so whether this mix has ever been seen cannot be said."));
    } else {
      List<String> reasons = circumstances.outside(outcome.plan().mix(), outcome.output());
      if (!reasons.isEmpty()) {
        remarks.add(
            Said.of(
                "warning",
                "outside-records",
                "This answer is a guess beyond the records: " + String.join("; ", reasons) + "."));
        return "outside-records";
      }
    }
    return outcome.plan().status() == isowright.leastcost.Plan.Status.CORNER ? "corner" : "solved";
  }

  private Map<String, Double> prices(PlanAnswer answer) {
    Map<String, Double> named = new LinkedHashMap<>();
    for (int i = 0; i < study.inputs().size(); i++) {
      double price =
          answer.outcome().planned()
              ? answer.settled().price(i)
              : answer.task().schedules().get(i).price(0);
      named.put(study.inputs().get(i), price);
    }
    return named;
  }

  /** What can be said where the technology is irregular at the target. */
  private Said nearest(CurvePoint point) {
    Findings.Units units = Settings.units(study);
    return Said.of(
        "note",
        "nearest-regular",
        "The nearest target at which the technology is regular and has a plan is "
            + PlanWords.number(point.target(), units.output())
            + ": least cost "
            + PlanWords.number(point.cost().value())
            + " "
            + units.money()
            + (point.inside() ? ", a mix inside the records." : ", a mix outside the records."));
  }

  private static PlanDetail bare(
      PlanAnswer answer, PlanCurve.Found curve, Optional<CurvePoint> nearest) {
    PlanTerms terms = answer.asked().terms();
    PlanDetail none = PlanDetail.NONE;
    return new PlanDetail(
        terms.asked(),
        goal(terms),
        stated(terms),
        none.output(),
        none.profit(),
        none.multipliers(),
        none.checks(),
        none.proof(),
        none.envelope(),
        none.efficientScale(),
        none.demands(),
        none.changes(),
        none.costElasticities(),
        none.demandElasticities(),
        none.across(),
        curve.without(),
        nearest);
  }

  static String goal(PlanTerms terms) {
    return terms.goal().fold(target -> "target", budget -> "budget", profit -> "profit");
  }

  static Optional<Double> stated(PlanTerms terms) {
    return terms
        .goal()
        .fold(
            target -> Optional.empty(),
            budget -> Optional.of(budget.money()),
            profit -> Optional.of(profit.price()));
  }

  private PlanDetail detail(
      PlanAnswer answer,
      Candidate candidate,
      PlanFigures.Main main,
      double[] targets,
      PlanCurve.Found curve) {
    PlanTerms terms = answer.asked().terms();
    Findings.Units units = Settings.units(study);
    List<Worth> worths = new ArrayList<>(new WorthWords(units, answer).all());
    WorthWords.whole(answer, units).ifPresent(worths::add);
    DemandFigures demand = new DemandFigures(answer);
    EnvelopeFigures envelope = new EnvelopeFigures(answer);
    ChangeFigures changes =
        new ChangeFigures(
            answer, circumstances.observed(answer.asked(), candidate, answer.estimated()));
    boolean plain = answer.smooth();
    return new PlanDetail(
        terms.asked(),
        goal(terms),
        stated(terms),
        main.output(),
        main.profit(),
        worths,
        Optional.of(checks(answer)),
        Optional.of(proved(answer.outcome().proof())),
        plain ? envelope.envelope(targets, circumstances::inside) : Optional.empty(),
        plain ? Optional.of(efficientScale(envelope, targets)) : Optional.empty(),
        plain ? demand.demands(circumstances::inside) : List.of(),
        changes.changes(),
        answer.leastCost() ? demand.costElasticities() : Map.of(),
        plain ? demand.demandElasticities() : Map.of(),
        List.of(),
        curve.without(),
        Optional.empty());
  }

  private PlanDetail.EfficientScale efficientScale(EnvelopeFigures envelope, double[] targets) {
    return envelope.efficientScale(
        targets[0], targets[targets.length - 1], circumstances::inside, circumstances::recorded);
  }

  private static Checks checks(PlanAnswer answer) {
    PlanChecks found = PlanChecks.of(answer.technology(), answer.settled(), answer.plan());
    return new Checks(
        found.output(),
        found.firstOrder(),
        found.secondOrder(),
        found.shephard(),
        found.homogeneity(),
        found.marginalCost());
  }

  static Proved proved(Proof proof) {
    return new Proved(
        proof.global() ? "global" : "local", proof.gap(), proof.parts(), proof.reason());
  }

  private static List<double[]> isoquant(PlanAnswer answer) {
    double[] mix = answer.plan().mix();
    return mix[0] > 0 && mix[1] > 0
        ? Isoquant.around(
            answer.technology(),
            answer.outcome().output(),
            0,
            1,
            mix,
            ISOQUANT_FACTOR,
            ISOQUANT_POINTS)
        : List.of();
  }

  /** The mixes of the period of the question, in the first two inputs. */
  private List<PlanFindings.Mix> seen(Study.LeastCostQuestion asked) {
    if (circumstances.panel().isEmpty()) {
      return List.of();
    }
    Panel p = circumstances.panel().get();
    int period = circumstances.period(asked);
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
}
