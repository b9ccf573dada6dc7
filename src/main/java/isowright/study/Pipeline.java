package isowright.study;

import isowright.estimation.Fit;
import isowright.estimation.Replication;
import isowright.estimation.Unfit;
import isowright.records.Panel;
import isowright.records.Reading;
import isowright.records.RecordsRefused;
import isowright.study.Findings.Said;
import isowright.study.FitFindings.Fitted;
import isowright.study.PlanFindings.Planned;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.stream.IntStream;

/**
 * Runs the stages of a study in order: records, technologies, least cost, review.
 *
 * <p>Every stage is a function of what came before; the result is a {@link Findings} tree. Nothing
 * is printed or written.
 */
public final class Pipeline {

  private static final int STAGES = 4;

  private Pipeline() {}

  /**
   * Runs a study.
   *
   * @param progress is told of each stage
   * @throws RecordsRefused if the records cannot be read as asked
   * @throws StudyRefused if the study asks for what the records do not hold (a plant, a period,
   *     prices)
   * @throws Unfit if forms were to be fitted and none could be estimated
   */
  public static Findings run(Study study, Progress progress)
      throws RecordsRefused, StudyRefused, Unfit {
    try {
      return stages(study, progress);
    } finally {
      progress.done();
    }
  }

  private static Findings stages(Study study, Progress progress)
      throws RecordsRefused, StudyRefused, Unfit {
    progress.stage("reading the records", 1, STAGES);
    Optional<Reading> reading = Optional.empty();
    if (study.records().isPresent()) {
      reading = Optional.of(RecordsStage.read(study.records().get()));
    }
    Optional<CapitalStage.Priced> priced = Optional.empty();
    if (reading.isPresent()) {
      priced = Optional.of(CapitalStage.price(study, reading.get().panel()));
    }
    Optional<Panel> panel = priced.map(CapitalStage.Priced::inForce);
    Demands.check(study, panel);

    progress.stage("fitting technologies", 2, STAGES);
    List<Fit> fits = new ArrayList<>();
    List<Fitted> fitted = new ArrayList<>();
    List<Optional<Replication>> refits = new ArrayList<>();
    if (panel.isPresent() && !study.technologies().isEmpty()) {
      FitStage stage = new FitStage(panel.get(), study);
      fits.addAll(stage.fit());
      refuseIfNothingWasEstimated(fits);
      refits.addAll(fits.stream().map(stage::replication).toList());
      fitted.addAll(
          IntStream.range(0, fits.size())
              .parallel()
              .mapToObj(f -> stage.findings(fits.get(f), refits.get(f)))
              .toList());
    }

    Optional<Reading> costReading =
        study.costs().isPresent()
            ? Optional.of(RecordsStage.read(study.costs().get().records()))
            : Optional.empty();
    CostFindings costs = CostFindings.NONE;
    List<Planned> costPlans = List.of();
    Optional<CostStage> costStage = Optional.empty();
    if (costReading.isPresent()) {
      CostFilings.check(study, costReading.get().panel());
      CostStage stage =
          new CostStage(study, study.costs().orElseThrow(), costReading.get().panel());
      costs = stage.findings();
      costPlans = stage.plans();
      costStage = Optional.of(stage);
    }

    progress.stage("answering least-cost questions", 3, STAGES);
    List<Candidate> candidates = new ArrayList<>();
    for (int f = 0; f < fits.size(); f++) {
      candidates.add(Candidate.fitted(fits.get(f), refits.get(f)));
    }
    study.given().forEach(given -> candidates.add(Candidate.given(given)));
    List<Planned> plans = new ArrayList<>(new PlanStage(study, panel, candidates).plans());
    plans.addAll(costPlans);
    CostFindings bothSides = CostSides.in(costs, fitted, plans);

    progress.stage("holding filed costs against least cost", 4, STAGES);
    ReviewStage.Review review =
        ReviewStage.of(study, priced, candidates)
            .and(costStage.map(CostStage::review).orElse(ReviewStage.Review.NONE));
    Optional<Findings.Records> records =
        reading
            .map(
                r ->
                    RecordsStage.describe(
                        study.records().orElseThrow(),
                        r,
                        panel.orElse(r.panel()),
                        study.money().words()))
            .or(() -> describe(study, costReading));
    return new Findings(
        Settings.run(study),
        Settings.units(study),
        study.estimation().confidence(),
        records,
        fitted,
        study.given().stream().map(GivenStage::describe).toList(),
        plans,
        review.reviews(),
        review.findings(),
        SpecificationStage.findings(study, reading, panel, fits, fitted),
        bothSides,
        HandoverStage.of(study, panel, fits),
        remarks(fitted, plans));
  }

  private static Optional<Findings.Records> describe(Study study, Optional<Reading> costs) {
    return costs.map(
        r ->
            RecordsStage.describe(
                study.costs().orElseThrow().records(), r, r.panel(), study.money().words()));
  }

  private static void refuseIfNothingWasEstimated(List<Fit> fits) throws Unfit {
    boolean nothing =
        fits.stream()
            .allMatch(
                fit -> fit.state() == Fit.State.REFUSED || fit.state() == Fit.State.RANK_DEFICIENT);
    if (nothing) {
      throw new Unfit(
          fits.stream()
              .flatMap(
                  fit ->
                      fit.reasons().stream()
                          .map(reason -> fit.specification().form().name() + ": " + reason))
              .distinct()
              .toList());
    }
  }

  private static List<Said> remarks(List<Fitted> fits, List<Planned> plans) {
    List<Said> remarks = new ArrayList<>();
    for (Fitted fit : fits) {
      if (!fit.usable()) {
        remarks.add(
            Said.of(
                "warning",
                "no-answer",
                "No technology of the form "
                    + fit.technology()
                    + " is reported ("
                    + fit.state()
                    + "); its section says why."));
      }
    }
    long irregular = plans.stream().filter(p -> p.status().equals("irregular")).count();
    if (irregular > 0) {
      remarks.add(
          Said.of(
              "warning",
              "irregular-plans",
              irregular
                  + (irregular == 1 ? " least-cost question has" : " least-cost questions have")
                  + " no answer because the technology is not regular where it would lie."));
    }
    return remarks;
  }
}
