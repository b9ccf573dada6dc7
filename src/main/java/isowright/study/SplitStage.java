package isowright.study;

import isowright.estimation.EstimatedTechnology;
import isowright.leastcost.Goal;
import isowright.leastcost.PlanOutcome;
import isowright.leastcost.PlantOption;
import isowright.leastcost.PlantSplit;
import isowright.leastcost.Question;
import isowright.leastcost.SplitOutcome;
import isowright.study.Findings.Said;
import isowright.study.PlanDetail.PlantPart;
import isowright.study.PlanDetail.Worth;
import isowright.study.PlanFindings.Planned;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;

/** Splits targets over plants. */
final class SplitStage {

  private final Study study;
  private final PlanCircumstances circumstances;
  private final List<Candidate> candidates;

  SplitStage(Study study, PlanCircumstances circumstances, List<Candidate> candidates) {
    this.study = study;
    this.circumstances = circumstances;
    this.candidates = candidates;
  }

  /** Whether every plant has a technology of its own, so that one answer is all there is. */
  boolean namesEveryTechnology(Study.LeastCostQuestion asked) {
    List<PlanTerms.Plant> plants = asked.terms().across();
    return !plants.isEmpty() && plants.stream().allMatch(p -> p.technology().isPresent());
  }

  /** The technology of the first plant, if all the plants' technologies are usable. */
  Optional<Candidate> first(Study.LeastCostQuestion asked) {
    List<Optional<Candidate>> all =
        asked.terms().across().stream().map(p -> named(p.technology().orElse(""))).toList();
    return all.stream().allMatch(Optional::isPresent) ? all.get(0) : Optional.empty();
  }

  private Optional<Candidate> named(String name) {
    return candidates.stream().filter(c -> c.name().equals(name) && c.usable()).findFirst();
  }

  /** What is split over; none where a plant's technology is not among the candidates. */
  Optional<List<PlantOption>> options(Study.LeastCostQuestion asked, Candidate candidate) {
    List<PlantOption> options = new ArrayList<>();
    for (PlanTerms.Plant plant : asked.terms().across()) {
      Optional<Candidate> own = plant.technology().map(this::named).orElse(Optional.of(candidate));
      if (own.isEmpty()) {
        return Optional.empty();
      }
      options.add(site(asked, plant, own.get()).option());
    }
    return Optional.of(options);
  }

  Planned answer(Study.LeastCostQuestion asked, Candidate candidate) {
    List<SplitFigures.Site> sites = new ArrayList<>();
    Set<String> names = new LinkedHashSet<>();
    List<String> left = new ArrayList<>();
    for (PlanTerms.Plant plant : asked.terms().across()) {
      Optional<Candidate> own = plant.technology().map(this::named).orElse(Optional.of(candidate));
      if (own.isEmpty()) {
        left.add(plant.name());
        continue;
      }
      sites.add(site(asked, plant, own.get()));
      names.add(own.get().name());
    }
    List<PlantOption> options = sites.stream().map(SplitFigures.Site::option).toList();
    double target = asked.terms().goal().fold(Goal.Target::output, b -> 0.0, p -> 0.0);
    SplitOutcome outcome = PlantSplit.of(options, target);
    List<Said> remarks = new ArrayList<>();
    if (!left.isEmpty()) {
      remarks.add(
          Said.of(
              "warning",
              "plants-left-out",
              "Left out, because their technologies could not be estimated: "
                  + String.join(", ", left)
                  + "."));
    }
    return planned(asked, String.join(" and ", names), sites, outcome, target, remarks);
  }

  private SplitFigures.Site site(
      Study.LeastCostQuestion asked, PlanTerms.Plant plant, Candidate candidate) {
    EstimatedTechnology estimated =
        candidate.at(
            circumstances.period(asked),
            plant
                .plant()
                .filter(name -> candidate.estimated())
                .map(circumstances::plant)
                .orElseGet(() -> circumstances.productivity(asked.productivity())));
    int n = study.inputs().size();
    double[] prices = new double[n];
    double[] low = new double[n];
    double[] high = new double[n];
    for (int i = 0; i < n; i++) {
      Map<String, Double> stated = plant.prices().isEmpty() ? asked.prices() : plant.prices();
      prices[i] = circumstances.price(stated, i);
      double[] limits =
          PlanCircumstances.limits(study.inputs().get(i), plant.hold(), plant.limits());
      low[i] = limits[0];
      high[i] = limits[1];
    }
    PlantOption option =
        new PlantOption(
            plant.name(),
            estimated.technology(),
            new Question(1, prices, low, high),
            plant.capacity(),
            plant.runningCost());
    String level = plant.plant().orElse("") + "\0" + candidate.name();
    return new SplitFigures.Site(option, candidate, estimated, level);
  }

  private Planned planned(
      Study.LeastCostQuestion asked,
      String technology,
      List<SplitFigures.Site> sites,
      SplitOutcome outcome,
      double target,
      List<Said> remarks) {
    SplitFigures figures = new SplitFigures(study, circumstances, sites, outcome);
    SplitFigures.Main main = figures.main();
    remarks.addAll(main.remarks());
    String status = status(sites, outcome, main, remarks);
    if (!outcome.reason().isEmpty()) {
      remarks.add(Said.of(outcome.planned() ? "note" : "warning", status, outcome.reason()));
    }
    if (!outcome.proof().reason().isEmpty()) {
      remarks.add(
          Said.of(
              "note",
              "local-proof",
              "Only a local best is proved: " + outcome.proof().reason() + "."));
    }
    Candidate first = sites.get(0).candidate();
    boolean estimated = sites.stream().anyMatch(s -> s.candidate().estimated());
    return new Planned(
        asked.name(),
        technology,
        estimated,
        target,
        prices(asked),
        circumstances.productivityWords(asked, first),
        limitWords(asked),
        status,
        main.mix(),
        main.cost(),
        main.marginalCost(),
        main.averageCost(),
        main.shares(),
        worstDeparture(outcome),
        List.of(),
        List.of(),
        List.of(),
        remarks,
        detail(asked, outcome, main, target));
  }

  private static double worstDeparture(SplitOutcome outcome) {
    return outcome.shares().stream()
        .filter(SplitOutcome.Share::runs)
        .mapToDouble(share -> share.plan().optimality())
        .max()
        .orElse(Double.NaN);
  }

  private PlanDetail detail(
      Study.LeastCostQuestion asked, SplitOutcome outcome, SplitFigures.Main main, double target) {
    PlanDetail none = PlanDetail.NONE;
    return new PlanDetail(
        asked.terms().asked(),
        "target",
        Optional.empty(),
        outcome.planned() ? Optional.of(Figure.exact(target)) : Optional.empty(),
        none.profit(),
        outcome.planned() ? worths(main) : none.multipliers(),
        none.checks(),
        outcome.planned() ? Optional.of(PlanStage.proved(outcome.proof())) : none.proof(),
        none.envelope(),
        none.efficientScale(),
        none.demands(),
        none.changes(),
        none.costElasticities(),
        none.demandElasticities(),
        main.parts(),
        none.withoutPlan(),
        none.nearest());
  }

  private List<Worth> worths(SplitFigures.Main main) {
    Findings.Units units = Settings.units(study);
    String unit = units.output().isEmpty() ? "unit of output" : units.output();
    List<Worth> worths = new ArrayList<>();
    worths.add(
        new Worth(
            "target",
            "",
            Double.NaN,
            main.marginalCost(),
            main.marginalCost()
                .map(
                    m ->
                        "One more "
                            + unit
                            + " costs "
                            + PlanWords.number(m.value())
                            + " "
                            + units.money()
                            + ".")
                .orElse("More output cannot be had: no plant can make more.")));
    main.capacities()
        .forEach(
            (plant, value) ->
                worths.add(
                    new Worth(
                        "capacity",
                        plant,
                        main.bounds().getOrDefault(plant, Double.NaN),
                        Optional.of(value),
                        plant
                            + " makes all it can: one more "
                            + unit
                            + " of its capacity would lower cost by "
                            + PlanWords.number(value.value())
                            + " "
                            + units.money()
                            + ".")));
    return worths;
  }

  private String status(
      List<SplitFigures.Site> sites,
      SplitOutcome outcome,
      SplitFigures.Main main,
      List<Said> remarks) {
    if (!outcome.planned()) {
      return outcome.state() == PlanOutcome.State.IRREGULAR ? "irregular" : "infeasible";
    }
    List<String> outside = new ArrayList<>();
    boolean corner = false;
    for (int p = 0; p < sites.size(); p++) {
      PlantPart part = main.parts().get(p);
      corner |= !part.runs() || outcome.shares().get(p).atCapacity();
      if (part.runs() && !part.inside()) {
        outside.add(part.plant());
      }
    }
    if (circumstances.known() && !outside.isEmpty()) {
      remarks.add(
          Said.of(
              "warning",
              "outside-records",
              "This answer is a guess beyond the records for "
                  + String.join(", ", outside)
                  + ": such a mix or output is not among them."));
      return "outside-records";
    }
    return corner ? "corner" : "solved";
  }

  private Map<String, Double> prices(Study.LeastCostQuestion asked) {
    Map<String, Double> prices = new LinkedHashMap<>();
    boolean own =
        asked.prices().isEmpty()
            && asked.terms().across().stream().noneMatch(plant -> plant.prices().isEmpty());
    for (int i = 0; i < study.inputs().size() && !own; i++) {
      prices.put(study.inputs().get(i), circumstances.price(asked.prices(), i));
    }
    return prices;
  }

  private Map<String, String> limitWords(Study.LeastCostQuestion asked) {
    Map<String, String> words = new LinkedHashMap<>();
    for (PlanTerms.Plant plant : asked.terms().across()) {
      List<String> parts = new ArrayList<>();
      if (Double.isFinite(plant.capacity())) {
        parts.add("at most " + PlanWords.number(plant.capacity()));
      }
      if (plant.runningCost() > 0) {
        parts.add(PlanWords.number(plant.runningCost()) + " due if it runs");
      }
      plant
          .hold()
          .forEach((input, q) -> parts.add(input + " held at " + circumstances.quantity(input, q)));
      plant
          .limits()
          .forEach((input, limit) -> parts.add(input + " " + circumstances.within(input, limit)));
      if (!parts.isEmpty()) {
        words.put(plant.name(), String.join(", ", parts));
      }
    }
    return words;
  }
}
