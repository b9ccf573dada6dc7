package isowright.study;

import isowright.estimation.CurvatureProfile;
import isowright.estimation.EstimatedTechnology;
import isowright.estimation.Estimation;
import isowright.estimation.Fit;
import isowright.estimation.Productivity;
import isowright.estimation.Replication;
import isowright.estimation.Solution;
import isowright.estimation.Specification;
import isowright.inference.DeltaMethod;
import isowright.inference.Estimate;
import isowright.inference.Hypotheses;
import isowright.inference.Inefficiency;
import isowright.inference.Intervals;
import isowright.inference.Law;
import isowright.inference.SpecificationTests;
import isowright.inference.Verdict;
import isowright.records.Panel;
import isowright.regression.FitStatistics;
import isowright.study.Findings.Said;
import isowright.study.FitFindings.Fitted;
import isowright.study.FitFindings.Parameter;
import isowright.study.FitFindings.Point;
import isowright.technology.NonlinearForm;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/** Fits the forms of a study and turns each fit into findings. */
final class FitStage {

  /** Points kept of a fit for its charts; more cannot be told apart on a page. */
  private static final int POINTS = 2000;

  private final Panel panel;
  private final Study study;

  FitStage(Panel panel, Study study) {
    this.panel = panel;
    this.study = study;
  }

  /** Fits every form asked, in order. */
  List<Fit> fit() {
    return study.technologies().parallelStream()
        .map(name -> Estimation.fit(panel, specification(name)))
        .toList();
  }

  Specification specification(String technology) {
    Study.Estimation how = study.estimation();
    return new Specification(
        how.held().form(technology, panel.inputs()),
        how.plantEffects(),
        how.time(),
        how.scaled(),
        standardErrors(study),
        how.confidence(),
        how.components(),
        how.estimator(),
        how.held().regularity());
  }

  static Specification.StandardErrors standardErrors(Study study) {
    boolean plants = study.records().flatMap(r -> r.roles().plant()).isPresent();
    return study
        .estimation()
        .standardErrors()
        .orElse(
            plants ? Specification.StandardErrors.CLUSTERED : Specification.StandardErrors.ROBUST);
  }

  /** The refits of a fit that has numbers. */
  Optional<Replication> replication(Fit fit) {
    return fit.state().usable()
        ? Optional.of(Replication.of(fit, study.estimation().resampling()))
        : Optional.empty();
  }

  /** What a fit found. */
  Fitted findings(Fit fit, Optional<Replication> replication) {
    return replication.map(refits -> usable(fit, refits)).orElseGet(() -> unusable(fit));
  }

  private Fitted unusable(Fit fit) {
    String severity = fit.state() == Fit.State.BOUNDARY ? "warning" : "error";
    List<Said> remarks =
        fit.reasons().stream().map(r -> Said.of(severity, fit.state().word(), r)).toList();
    return new Fitted(
        fit.specification().form().name(),
        how(fit, "none: nothing was estimated", Double.NaN),
        fit.state().word(),
        List.of(),
        new double[0][],
        Optional.empty(),
        Map.of(),
        Optional.empty(),
        List.of(),
        List.of(),
        Optional.empty(),
        curvature(fit),
        List.of(),
        Map.of(),
        PanelFindings.of(panel.rows()),
        Optional.empty(),
        List.of(),
        List.of(),
        RobustnessFindings.NONE,
        Optional.empty(),
        EndogeneityStage.unusable(fit),
        remarks);
  }

  private Fitted usable(Fit fit, Replication replication) {
    Solution numbers = fit.numbers();
    EstimatedTechnology typical =
        replication.at(panel.periods().size() - 1, new Productivity.Typical());
    DeltaMethod delta = DeltaMethod.of(typical, fit.specification().confidence());
    ElasticityFindings elasticities =
        new ElasticityFindings(fit, Intervals.of(typical, fit.specification().confidence()));
    Map<String, Figure> output = elasticities.output();
    Figure scale = elasticities.scale();
    RobustnessStage other = new RobustnessStage(study, fit, replication);
    RobustnessFindings robustness = other.findings(output, scale);
    List<FitFindings.Pair> substitution = elasticities.substitution();
    FitStatistics statistics = numbers.statistics();
    FitFindings.Regular regular = RegularityFindings.of(fit);
    EndogeneityStage endogenous = new EndogeneityStage(fit, study.estimation().estimators());
    List<Verdict> verdicts = verdicts(fit.examined());
    verdicts.addAll(endogenous.verdicts());
    List<Said> others = new ArrayList<>(other.remarks(robustness, output, scale));
    others.addAll(endogenous.remarks());
    return new Fitted(
        fit.specification().form().name(),
        how(
            fit,
            CovarianceWords.of(numbers.covarianceSource()),
            numbers.covarianceSource().degreesOfFreedom()),
        fit.state().word(),
        parameters(fit, delta),
        numbers.covariance(),
        Optional.of(
            new FitFindings.Summary(
                numbers.linear().ssr(),
                statistics.rSquared(),
                statistics.residualStandardError(),
                statistics.logLikelihood(),
                statistics.aic(),
                statistics.bic(),
                numbers.linear().residualDegreesOfFreedom())),
        output,
        Optional.of(scale),
        substitution,
        elasticities.demand(),
        Optional.of(regular),
        curvature(fit),
        verdicts.stream()
            .map(verdict -> tested(verdict, fit.specification().confidence()))
            .toList(),
        plantLevels(fit),
        new PanelStage(fit).findings(),
        Optional.of(numbers.smearing()),
        points(numbers),
        other.influential(),
        robustness,
        FrontierStage.findings(fit),
        endogenous.findings(output, scale),
        remarks(fit, regular, substitution, verdicts, others));
  }

  private FitFindings.How how(Fit fit, String covarianceWords, double degreesOfFreedom) {
    Specification how = fit.specification();
    Map<String, Double> scaling = new LinkedHashMap<>();
    if (how.scaled()) {
      for (int i = 0; i < fit.base().length; i++) {
        scaling.put(panel.inputs().get(i), fit.base()[i]);
      }
    }
    return new FitFindings.How(
        how.plantEffects().word(),
        how.time().word(),
        how.standardErrors().word(),
        covarianceWords,
        degreesOfFreedom,
        scaling,
        panel.rows(),
        panel.plants().size());
  }

  private List<Parameter> parameters(Fit fit, DeltaMethod delta) {
    Solution numbers = fit.numbers();
    Law law = new Law.Student(numbers.covarianceSource().degreesOfFreedom());
    List<Parameter> parameters = new ArrayList<>();
    Optional<Inefficiency.Variances> spreads = Inefficiency.variances(fit);
    for (int k = 0; k < numbers.names().size(); k++) {
      String name = numbers.names().get(k);
      double value = numbers.parameters()[k];
      double error = Math.sqrt(Math.max(0, numbers.covariance()[k][k]));
      Optional<CurvatureProfile> profile =
          fit.profiles().stream().filter(p -> p.name().equals(name)).findFirst();
      Optional<Estimate> spread = spread(name, spreads);
      boolean zeroMeansNothing =
          spread.isPresent()
              || fit.specification().form() instanceof NonlinearForm
                  && (profile.isPresent() || name.equals("scale") || name.contains("share:"));
      Figure figure =
          profile
              .map(p -> curvatureFigure(fit, p, value, error))
              .or(
                  () ->
                      spread.map(
                          e ->
                              Figure.estimated(value, error, e.low(), e.high(), e.method().word())))
              .orElseGet(() -> figure(delta.estimate(value, error, DeltaMethod.Scale.LINEAR)));
      parameters.add(
          new Parameter(name, figure, zeroMeansNothing ? Double.NaN : law.p(value / error)));
    }
    return parameters;
  }

  /** Standard deviations of a frontier: positive, with zero at their bound. */
  private static Optional<Estimate> spread(String name, Optional<Inefficiency.Variances> spreads) {
    return switch (name) {
      case "frontier:noise" -> spreads.map(Inefficiency.Variances::noise);
      case "frontier:inefficiency" -> spreads.map(Inefficiency.Variances::inefficiency);
      default -> Optional.empty();
    };
  }

  /** The interval of ρ is that of σ from the profile, carried over. */
  private static Figure curvatureFigure(
      Fit fit, CurvatureProfile profile, double value, double error) {
    NonlinearForm form = (NonlinearForm) fit.specification().form();
    double low = form.curvature(profile.substitutionHigh());
    double high = form.curvature(profile.substitutionLow());
    return Figure.estimated(value, error, low, high, Estimate.Method.PROFILE.word());
  }

  static Figure figure(Estimate estimate) {
    return EstimatedFigures.of(estimate);
  }

  private static Optional<FitFindings.Curvature> curvature(Fit fit) {
    List<FitFindings.Curvature> all = new ArrayList<>();
    fit.profiles().forEach(profile -> all.add(curvature(fit, profile, List.of())));
    return all.isEmpty()
        ? Optional.empty()
        : Optional.of(
            curvature(fit, fit.profiles().get(0), List.copyOf(all.subList(1, all.size()))));
  }

  private static FitFindings.Curvature curvature(
      Fit fit, CurvatureProfile profile, List<FitFindings.Curvature> further) {
    return new FitFindings.Curvature(
        profile.name(),
        profile.state().word(),
        CurvatureWords.of(fit, profile),
        profile.points().stream()
            .map(p -> new FitFindings.ProfilePoint(p.curvature(), p.substitution(), p.ssr()))
            .toList(),
        profile.substitutionLow(),
        profile.substitutionHigh(),
        profile.threshold(),
        further);
  }

  private List<Verdict> verdicts(Fit fit) {
    List<Verdict> verdicts = new ArrayList<>();
    verdicts.addAll(
        Hypotheses.of(fit, study.questions().returnsToScale(), study.questions().substitution()));
    verdicts.addAll(SpecificationTests.of(fit));
    return verdicts;
  }

  static FitFindings.Tested tested(Verdict verdict, double confidence) {
    return new FitFindings.Tested(
        verdict.name(),
        verdict.nullHypothesis(),
        verdict.statistic(),
        verdict.law().name(),
        verdict.law().degreesOfFreedom(),
        verdict.p(),
        verdict.sentence(confidence));
  }

  private Map<String, Double> plantLevels(Fit fit) {
    if (fit.specification().plantEffects() == Specification.PlantEffects.NONE) {
      return Map.of();
    }
    double[] levels = fit.numbers().levels().relative();
    Map<String, Double> named = new LinkedHashMap<>();
    for (int p = 0; p < levels.length; p++) {
      named.put(panel.plants().get(p), levels[p]);
    }
    return named;
  }

  private List<Point> points(Solution numbers) {
    int step = Math.max(1, (panel.rows() + POINTS - 1) / POINTS);
    List<Point> points = new ArrayList<>();
    for (int r = 0; r < panel.rows(); r += step) {
      double actual = panel.logOutput().get(r);
      double residual = numbers.residuals()[r];
      points.add(
          new Point(
              panel.fileRows().get(r),
              panel.plants().get(panel.plantOf(r)),
              panel.periods().get(panel.rowPeriods().get(r)),
              actual,
              actual - residual,
              residual));
    }
    return points;
  }

  private List<Said> remarks(
      Fit fit,
      FitFindings.Regular regular,
      List<FitFindings.Pair> elasticities,
      List<Verdict> verdicts,
      List<Said> robustness) {
    List<Said> remarks = new ArrayList<>();
    verdicts.stream()
        .filter(verdict -> Double.isNaN(verdict.p()))
        .forEach(verdict -> remarks.add(Said.of("note", "test-not-made", verdict.sentence())));
    fit.reasons().forEach(reason -> remarks.add(Said.of("warning", fit.state().word(), reason)));
    CovarianceWords.few(
            fit.numbers().covarianceSource(), study.estimation().resampling().isPresent())
        .ifPresent(remarks::add);
    remarks.addAll(robustness);
    remarks.addAll(new PanelStage(fit).remarks());
    remarks.addAll(FrontierStage.remarks(fit));
    remarks.addAll(RegularityFindings.remarks(fit, regular));
    if (elasticities.stream().allMatch(pair -> pair.figure().uncertainty().isEmpty())) {
      remarks.add(
          Said.of(
              "note",
              "substitution-fixed-by-form",
              "The form itself fixes every elasticity of substitution; none was estimated, and the"
                  + " records were not asked about it."));
    }
    fit.profiles().stream()
        .filter(profile -> profile.state() == CurvatureProfile.State.FLAT)
        .forEach(
            profile ->
                remarks.add(Said.of("warning", "flat-curvature", CurvatureWords.of(fit, profile))));
    if (panel.rows() > POINTS) {
      remarks.add(
          Said.of(
              "note",
              "points-thinned",
              "Charts and findings show every "
                  + ((panel.rows() + POINTS - 1) / POINTS)
                  + "th row; the fit uses all "
                  + panel.rows()
                  + "."));
    }
    return remarks;
  }
}
