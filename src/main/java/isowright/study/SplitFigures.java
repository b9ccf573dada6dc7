package isowright.study;

import isowright.estimation.EstimatedTechnology;
import isowright.inference.DeltaMethod.Scale;
import isowright.inference.Estimate;
import isowright.inference.JointTechnologies;
import isowright.leastcost.Plan;
import isowright.leastcost.PlantOption;
import isowright.leastcost.PlantSplit;
import isowright.leastcost.SplitOutcome;
import isowright.leastcost.SplitOutcome.Share;
import isowright.study.Findings.Said;
import isowright.study.PlanDetail.PlantPart;
import isowright.technology.Technology;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/** The figures of a split with their uncertainty, the same plants running as planned. */
final class SplitFigures {

  /**
   * A plant of a split.
   *
   * @param option what is split over
   * @param candidate its technology
   * @param estimated the technology at its level
   * @param level plants with the same word share technology and level
   */
  record Site(
      PlantOption option, Candidate candidate, EstimatedTechnology estimated, String level) {}

  /**
   * The figures of a split; capacities and bounds by the plants that make all they can.
   *
   * @param mix all plants together, by input
   */
  record Main(
      Map<String, Figure> mix,
      Optional<Figure> cost,
      Optional<Figure> marginalCost,
      Optional<Figure> averageCost,
      Map<String, Figure> shares,
      Map<String, Figure> capacities,
      Map<String, Double> bounds,
      List<PlantPart> parts,
      List<Said> remarks) {}

  private final Study study;
  private final List<Site> sites;
  private final SplitOutcome outcome;
  private final PlanCircumstances circumstances;
  private final JointTechnologies joint;
  private final int n;

  SplitFigures(
      Study study, PlanCircumstances circumstances, List<Site> sites, SplitOutcome outcome) {
    this.study = study;
    this.circumstances = circumstances;
    this.sites = sites;
    this.outcome = outcome;
    this.n = study.inputs().size();
    List<JointTechnologies.Member> members = new ArrayList<>();
    for (Site site : sites) {
      String fit = site.candidate().estimated() ? site.candidate().name() : "";
      members.add(new JointTechnologies.Member(site.estimated(), fit, site.level()));
    }
    this.joint = new JointTechnologies(members, study.estimation().confidence());
  }

  Main main() {
    if (!outcome.planned()) {
      return new Main(
          Map.of(),
          Optional.empty(),
          Optional.empty(),
          Optional.empty(),
          Map.of(),
          Map.of(),
          Map.of(),
          List.of(),
          List.of());
    }
    List<Figure> positive = figures(this::positive, Scale.LOG);
    List<Figure> linear = figures(this::linear, Scale.LINEAR);
    Map<String, Figure> capacities = new LinkedHashMap<>();
    Map<String, Double> bounds = new LinkedHashMap<>();
    for (int p = 0; p < sites.size(); p++) {
      if (outcome.shares().get(p).atCapacity()) {
        capacities.put(sites.get(p).option().name(), linear.get(n + p));
        bounds.put(sites.get(p).option().name(), outcome.shares().get(p).output());
      }
    }
    return new Main(
        named(positive.subList(3, 3 + n)),
        Optional.of(positive.get(0)),
        FigureMaker.finite(positive.get(1)),
        Optional.of(positive.get(2)),
        named(linear.subList(0, n)),
        capacities,
        bounds,
        parts(positive),
        remarks());
  }

  private List<Said> remarks() {
    return joint.several()
        ? List.of(
            Said.of(
                "note",
                "several-technologies",
                "The plants' technologies were estimated one by one from the same records, so how"
                    + " their errors go together is not known; standard errors are added, which"
                    + " is the most they can be together."))
        : List.of();
  }

  private List<Figure> figures(
      java.util.function.Function<List<Technology>, double[]> numbers, Scale scale) {
    Optional<List<Estimate>> estimates = joint.estimates(numbers, scale);
    if (estimates.isPresent()) {
      return estimates.get().stream().map(FitStage::figure).toList();
    }
    List<Figure> exact = new ArrayList<>();
    for (double number : numbers.apply(joint.technologies())) {
      exact.add(Figure.exact(number));
    }
    return exact;
  }

  private SplitOutcome again(List<Technology> technologies) {
    List<PlantOption> options = new ArrayList<>();
    for (int p = 0; p < sites.size(); p++) {
      PlantOption option = sites.get(p).option();
      options.add(
          new PlantOption(
              option.name(),
              technologies.get(p),
              option.question(),
              option.capacity(),
              option.runningCost()));
    }
    return PlantSplit.again(options, outcome);
  }

  /** Cost, marginal and average cost, total mix; then by plant output, cost, marginal cost, mix. */
  private double[] positive(List<Technology> technologies) {
    SplitOutcome split = again(technologies);
    int width = 3 + n;
    double[] row = new double[width + sites.size() * width];
    row[0] = split.cost();
    row[1] = split.marginalCost();
    double target = 0;
    for (int p = 0; p < sites.size(); p++) {
      Share share = split.shares().get(p);
      int at = width + p * width;
      target += share.output();
      row[at] = share.output();
      row[at + 1] = share.cost();
      row[at + 2] = share.runs() ? share.plan().marginalCost() : 0;
      for (int i = 0; i < n; i++) {
        row[at + 3 + i] = quantity(p, share, i);
        row[3 + i] += row[at + 3 + i];
      }
    }
    row[2] = row[0] / target;
    return row;
  }

  private double quantity(int p, Share share, int i) {
    if (!share.runs()) {
      return sites.get(p).option().question().low(i);
    }
    return share.plan().answered() ? share.plan().mix(i) : Double.NaN;
  }

  /** Shares of the inputs in what is spent on them, and what capacities are worth. */
  private double[] linear(List<Technology> technologies) {
    SplitOutcome split = again(technologies);
    double[] row = new double[n + sites.size()];
    double total = 0;
    for (int p = 0; p < sites.size(); p++) {
      Share share = split.shares().get(p);
      for (int i = 0; i < n; i++) {
        double spent = sites.get(p).option().question().price(i) * quantity(p, share, i);
        row[i] += spent;
        total += spent;
      }
      row[n + p] = share.capacityValue();
    }
    for (int i = 0; i < n; i++) {
      row[i] /= total;
    }
    return row;
  }

  private List<PlantPart> parts(List<Figure> positive) {
    List<PlantPart> parts = new ArrayList<>();
    int width = 3 + n;
    for (int p = 0; p < sites.size(); p++) {
      Share share = outcome.shares().get(p);
      List<Figure> row = positive.subList(width + p * width, 2 * width + p * width);
      PlantOption option = sites.get(p).option();
      Map<String, Double> prices = new LinkedHashMap<>();
      for (int i = 0; i < n; i++) {
        prices.put(study.inputs().get(i), option.question().price(i));
      }
      Plan plan = share.plan();
      parts.add(
          new PlantPart(
              option.name(),
              sites.get(p).candidate().name(),
              share.runs(),
              row.get(0),
              row.get(1),
              share.runs() ? FigureMaker.finite(row.get(2)) : Optional.empty(),
              option.capacity(),
              option.runningCost(),
              prices,
              share.runs() ? named(row.subList(3, width)) : Map.of(),
              !share.runs()
                  || circumstances.inside(plan.mix()) && circumstances.recorded(share.output())));
    }
    return parts;
  }

  private Map<String, Figure> named(List<Figure> figures) {
    Map<String, Figure> named = new LinkedHashMap<>();
    for (int i = 0; i < n; i++) {
      named.put(study.inputs().get(i), figures.get(i));
    }
    return named;
  }
}
