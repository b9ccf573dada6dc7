package isowright.study;

import isowright.estimation.Fit;
import isowright.estimation.HuberFit;
import isowright.estimation.Replication;
import isowright.estimation.RowsUsed;
import isowright.inference.WildVerdict;
import isowright.records.Panel;
import isowright.regression.Influence;
import isowright.regression.LinearFit;
import isowright.study.Findings.Said;
import isowright.study.FitFindings.Influential;
import isowright.study.RobustnessFindings.Beyond;
import isowright.study.RobustnessFindings.Compared;
import isowright.study.RobustnessFindings.Huber;
import isowright.study.RobustnessFindings.Resampling;
import isowright.study.RobustnessFindings.Wild;
import isowright.technology.Elasticities;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;

/** Looks at a fit in other ways: see {@link RobustnessFindings}. */
final class RobustnessStage {

  /** Rows named as the most influential of a fit. */
  private static final int INFLUENTIAL = 5;

  /** So many standard errors apart, two estimates are said to differ. */
  private static final double APART = 2;

  private final Study study;
  private final Fit fit;
  private final Replication replication;
  private final Panel panel;
  private final Influence.Survey survey;
  private final Influence.Cutoffs cutoffs;
  private final Optional<HuberFit> huber;

  RobustnessStage(Study study, Fit fit, Replication replication) {
    this.study = study;
    this.fit = fit;
    this.replication = replication;
    this.panel = fit.panel();
    Fit examined = fit.examined();
    LinearFit linear = examined.numbers().linear();
    this.survey = Influence.survey(examined.numbers().design(), linear, INFLUENTIAL);
    this.cutoffs = Influence.Cutoffs.of(linear);
    this.huber = HuberFit.of(examined);
  }

  /**
   * What was found.
   *
   * @param elasticities output elasticities by input
   * @param scale returns to scale
   */
  RobustnessFindings findings(Map<String, Figure> elasticities, Figure scale) {
    return new RobustnessFindings(
        resampling(),
        wild(),
        survey.most().isEmpty() ? Optional.empty() : Optional.of(beyond()),
        huber.map(h -> compared(h, elasticities, scale)));
  }

  private Optional<Resampling> resampling() {
    boolean plants = panel.roles().plant().isPresent();
    return replication
        .drawing()
        .map(
            drawing ->
                new Resampling(
                    drawing.draws(),
                    drawing.seed(),
                    plants ? "plants" : "rows",
                    panel.plants().size(),
                    replication.drawsThatLostRank(),
                    replication.drawsWithoutOptimum()));
  }

  private List<Wild> wild() {
    double confidence = study.estimation().confidence();
    return replication
        .drawing()
        .map(
            drawing ->
                WildVerdict.of(
                        fit.examined(),
                        study.questions().returnsToScale(),
                        drawing.draws(),
                        drawing.seed())
                    .stream()
                    .map(verdict -> wild(verdict, confidence))
                    .toList())
        .orElse(List.of());
  }

  private static Wild wild(WildVerdict verdict, double confidence) {
    return new Wild(
        verdict.name(),
        verdict.nullHypothesis(),
        verdict.test().statistic(),
        verdict.test().draws(),
        verdict.test().sixPoint() ? "webb" : "rademacher",
        verdict.test().p(),
        verdict.sentence(confidence));
  }

  private Beyond beyond() {
    return new Beyond(
        cutoffs.leverage(),
        cutoffs.deletedResidual(),
        cutoffs.dffits(),
        cutoffs.dfbetas(),
        cutoffs.covarianceRatio(),
        Influence.Cutoffs.SEVERAL,
        survey.beyondSeveral());
  }

  /** The rows of largest Cook's distance. */
  List<Influential> influential() {
    return survey.most().stream().map(this::influential).toList();
  }

  private Influential influential(Influence found) {
    RowsUsed used = fit.numbers().treatment().rows();
    int row = used.panelRow(found.row());
    String period = panel.periods().get(panel.rowPeriods().get(row));
    int column = found.largestColumn();
    return new Influential(
        panel.fileRows().get(row),
        panel.plants().get(panel.plantOf(row)),
        used.kind() == RowsUsed.Kind.PLANT_MEANS ? "mean of its periods" : period,
        found.leverage(),
        found.cooksDistance(),
        found.deletedResidual(),
        found.dffits(),
        found.covarianceRatio(),
        found.dfbetas()[column],
        fit.numbers().linear().columns().get(column),
        cutoffs.beyond(found));
  }

  private Huber compared(HuberFit found, Map<String, Figure> elasticities, Figure scale) {
    Elasticities at = Elasticities.at(found.technology(), fit.meanLogInputs());
    List<Compared> compared = new ArrayList<>();
    compared.add(compared("returns to scale", scale, at.scale()));
    int i = 0;
    for (Map.Entry<String, Figure> entry : elasticities.entrySet()) {
      compared.add(
          compared("output elasticity of " + entry.getKey(), entry.getValue(), at.output(i++)));
    }
    return new Huber(
        found.regression().scale(),
        found.regression().lessened(),
        fit.numbers().linear().rows(),
        compared);
  }

  private static Compared compared(String name, Figure figure, double other) {
    double error = figure.uncertainty().map(Figure.Uncertainty::standardError).orElse(Double.NaN);
    return new Compared(name, figure.value(), other, (other - figure.value()) / error);
  }

  /** What must be said of it. */
  List<Said> remarks(RobustnessFindings found, Map<String, Figure> elasticities, Figure scale) {
    List<Said> remarks = new ArrayList<>();
    if (study.estimation().resampling().isPresent() && found.resampling().isEmpty()) {
      remarks.add(
          Said.of(
              "note",
              "resampling-by-the-estimator",
              "This estimator draws whole plants for its own standard errors, so its figures are"
                  + " not resampled once more."));
    }
    Map<String, Figure> headline = new LinkedHashMap<>();
    headline.put("returns to scale", scale);
    elasticities.forEach((input, figure) -> headline.put("output elasticity of " + input, figure));
    ResamplingWords.failed(headline.values().stream()).ifPresent(remarks::add);
    ruled(headline).ifPresent(remarks::add);
    beyondSeveral().ifPresent(remarks::add);
    found.huber().flatMap(RobustnessStage::differs).ifPresent(remarks::add);
    return remarks;
  }

  /** A plant or period without which a headline figure leaves its own interval. */
  private static Optional<Said> ruled(Map<String, Figure> headline) {
    List<String> parts = new ArrayList<>();
    headline.forEach(
        (name, figure) -> {
          figure.refits().withoutPlant().ifPresent(w -> ruled("plant", name, figure, w, parts));
          figure.refits().withoutPeriod().ifPresent(w -> ruled("period", name, figure, w, parts));
        });
    return parts.isEmpty()
        ? Optional.empty()
        : Optional.of(
            Said.of(
                "warning",
                "one-plant-rules",
                "A single plant or period decides where a figure lies: "
                    + String.join("; ", parts)
                    + ". Look at what is particular about it before relying on the figure."));
  }

  private static void ruled(
      String kind, String name, Figure figure, Figure.Without without, List<String> parts) {
    Figure.Uncertainty u = figure.uncertainty().orElseThrow();
    if (without.value() < u.low() || without.value() > u.high()) {
      parts.add(
          String.format(
              Locale.ROOT,
              "without %s %s the %s would be %.3g, outside its interval (%.3g to %.3g)",
              kind,
              without.name(),
              name,
              without.value(),
              u.low(),
              u.high()));
    }
  }

  private Optional<Said> beyondSeveral() {
    if (survey.beyondSeveral() == 0) {
      return Optional.empty();
    }
    List<Integer> rows =
        survey.worst().stream()
            .map(one -> panel.fileRows().get(fit.numbers().treatment().rows().panelRow(one.row())))
            .toList();
    return Optional.of(
        new Said(
            "note",
            "influential-rows",
            String.format(
                Locale.ROOT,
                "%d of %d rows lie beyond at least %d of the five cut-offs for influence (leverage,"
                    + " studentised residual, DFFITS, DFBETAS, covariance ratio); the first named"
                    + " move the fit most. They are not thereby wrong: look at them.",
                survey.beyondSeveral(),
                fit.numbers().linear().rows(),
                Influence.Cutoffs.SEVERAL),
            rows));
  }

  private static Optional<Said> differs(Huber huber) {
    List<String> names =
        huber.compared().stream()
            .filter(c -> Math.abs(c.apart()) > APART)
            .map(
                c ->
                    String.format(
                        Locale.ROOT, "%s %.3g in place of %.3g", c.figure(), c.huber(), c.value()))
            .toList();
    return names.isEmpty()
        ? Optional.empty()
        : Optional.of(
            Said.of(
                "warning",
                "huber-differs",
                "Where rows with large residuals count for less (Huber's M estimate), figures move"
                    + " by more than two standard errors: "
                    + String.join("; ", names)
                    + ". Some rows do not follow the rest."));
  }
}
