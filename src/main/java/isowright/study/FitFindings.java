package isowright.study;

import isowright.study.Findings.Said;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/** What was found of technologies: those fitted to the records and those taken as known. */
public final class FitFindings {

  private FitFindings() {}

  /**
   * A technology fitted to the records.
   *
   * @param technology the form's name
   * @param how how it was obtained: effects, time, standard errors and their factor and degrees of
   *     freedom
   * @param state {@code estimated}, {@code boundary}, {@code flat}, {@code not-converged} or {@code
   *     rank-deficient}
   * @param parameters the parameters, controls and time effects, in the order of the covariance
   * @param covariance the covariance of the parameters
   * @param summary fit statistics
   * @param outputElasticity by input, at the geometric mean of the sample
   * @param returnsToScale at the geometric mean of the sample
   * @param substitution elasticities of substitution by ordered pair and measure, at the same point
   * @param demandElasticity own and cross price elasticities of demand at constant output, same
   *     point
   * @param regularity at how many rows the technology is regular
   * @param curvature the profile over the curvature parameter; absent for forms without one
   * @param tests the tests
   * @param plantLevels log output relative to the typical plant, by plant; empty without plant
   *     effects
   * @param panel what was found about plants and time beside the parameters
   * @param smearing mean of exp(residual), by which exp(predicted logs) is multiplied
   * @param points fitted value and residual of each row
   * @param influence the most influential rows
   * @param robustness how far the fit stands when looked at in other ways
   * @param frontier what was found of inefficiency; absent where no frontier was fitted
   * @param endogeneity what was found about inputs chosen knowing productivity
   * @param remarks what must be said of this fit
   */
  public record Fitted(
      String technology,
      How how,
      String state,
      List<Parameter> parameters,
      double[][] covariance,
      Optional<Summary> summary,
      Map<String, Figure> outputElasticity,
      Optional<Figure> returnsToScale,
      List<Pair> substitution,
      List<Pair> demandElasticity,
      Optional<Regular> regularity,
      Optional<Curvature> curvature,
      List<Tested> tests,
      Map<String, Double> plantLevels,
      PanelFindings panel,
      Optional<Double> smearing,
      List<Point> points,
      List<Influential> influence,
      RobustnessFindings robustness,
      Optional<FrontierFindings> frontier,
      EndogeneityFindings endogeneity,
      List<Said> remarks) {

    /** By least squares, about which nothing further was asked. */
    public Fitted(
        String technology,
        How how,
        String state,
        List<Parameter> parameters,
        double[][] covariance,
        Optional<Summary> summary,
        Map<String, Figure> outputElasticity,
        Optional<Figure> returnsToScale,
        List<Pair> substitution,
        List<Pair> demandElasticity,
        Optional<Regular> regularity,
        Optional<Curvature> curvature,
        List<Tested> tests,
        Map<String, Double> plantLevels,
        PanelFindings panel,
        Optional<Double> smearing,
        List<Point> points,
        List<Influential> influence,
        RobustnessFindings robustness,
        Optional<FrontierFindings> frontier,
        List<Said> remarks) {
      this(
          technology,
          how,
          state,
          parameters,
          covariance,
          summary,
          outputElasticity,
          returnsToScale,
          substitution,
          demandElasticity,
          regularity,
          curvature,
          tests,
          plantLevels,
          panel,
          smearing,
          points,
          influence,
          robustness,
          frontier,
          EndogeneityFindings.NONE,
          remarks);
    }

    /** Whether the fit has an answer that later stages may use. */
    public boolean usable() {
      return state.equals("estimated") || state.equals("flat");
    }

    /** The profiles of all curvatures, that between nests first. */
    public List<Curvature> curvatures() {
      List<Curvature> all = new ArrayList<>();
      curvature.ifPresent(
          first -> {
            all.add(first);
            all.addAll(first.further());
          });
      return all;
    }
  }

  /**
   * How a fit was obtained.
   *
   * @param plantEffects what was done about lasting differences between plants, as in the study
   *     file
   * @param time what was done about change over time, as in the study file
   * @param standardErrors the kind of covariance
   * @param covarianceWords the estimator, factor and degrees of freedom in words
   * @param degreesOfFreedom of the t distribution behind intervals and p-values
   * @param scaling the geometric means by which inputs were divided, by input; empty if not scaled
   * @param rows rows used
   * @param plants plants used
   */
  public record How(
      String plantEffects,
      String time,
      String standardErrors,
      String covarianceWords,
      double degreesOfFreedom,
      Map<String, Double> scaling,
      int rows,
      int plants) {}

  /**
   * A parameter.
   *
   * @param name {@code constant}, an input's name, {@code labour*machines}, {@code trend}, {@code
   *     trend*trend}, {@code labour*trend}, {@code share:labour}, {@code rho}, {@code scale},
   *     {@code control:COLUMN}, {@code period:P}, {@code mean:} before any of them for a plant
   *     mean, and {@code frontier:noise}, {@code frontier:inefficiency}, {@code frontier:decay}
   * @param figure value, standard error and interval
   * @param p two-sided p-value of the null that it is zero; NaN where there is none
   */
  public record Parameter(String name, Figure figure, double p) {}

  /** Fit statistics; AIC and BIC count the error variance and every plant effect. */
  public record Summary(
      double ssr,
      double rSquared,
      double residualStandardError,
      double logLikelihood,
      double aic,
      double bic,
      double degreesOfFreedom) {}

  /**
   * A figure for an ordered pair of inputs.
   *
   * @param first the first input (the one whose quantity answers)
   * @param second the second input (the one whose price moves, where direction matters)
   * @param measure {@code hicks}, {@code allen}, {@code morishima} or {@code demand}
   * @param figure the figure
   */
  public record Pair(String first, String second, String measure, Figure figure) {}

  /**
   * Regularity over the rows of the records.
   *
   * @param rows rows examined
   * @param monotone rows at which every marginal product is positive
   * @param quasiConcave rows at which the bordered Hessian has the right signs
   * @param both rows at which both hold
   * @param nonMonotoneBy rows with a non-positive marginal product, by input
   * @param imposed how the fit was held to be regular; absent where it was not
   * @param imposable whether it could have been
   */
  public record Regular(
      int rows,
      int monotone,
      int quasiConcave,
      int both,
      Map<String, Integer> nonMonotoneBy,
      Optional<RegularityImposed> imposed,
      boolean imposable) {

    /** Of a fit that was not held to be regular, and whose form cannot be. */
    public Regular(
        int rows, int monotone, int quasiConcave, int both, Map<String, Integer> nonMonotoneBy) {
      this(rows, monotone, quasiConcave, both, nonMonotoneBy, Optional.empty(), false);
    }
  }

  /**
   * The profile of the sum of squares over a curvature parameter.
   *
   * @param name the name of the curvature among the parameters, such as {@code rho}
   * @param state {@code interior}, {@code boundary} or {@code flat}
   * @param words the state in a sentence
   * @param curve the profile, by ascending curvature
   * @param substitutionLow lower end of the profile interval of the elasticity of substitution; 0
   *     where it is open below
   * @param substitutionHigh upper end; infinite where it is open above
   * @param threshold the sum of squares below which a value is inside the interval
   * @param further the profiles of the form's other curvatures, those within nests
   */
  public record Curvature(
      String name,
      String state,
      String words,
      List<ProfilePoint> curve,
      double substitutionLow,
      double substitutionHigh,
      double threshold,
      List<Curvature> further) {

    /** The profile of a form's only curvature. */
    public Curvature(
        String state,
        String words,
        List<ProfilePoint> curve,
        double substitutionLow,
        double substitutionHigh,
        double threshold) {
      this("rho", state, words, curve, substitutionLow, substitutionHigh, threshold, List.of());
    }
  }

  /** One point of a profile: curvature, elasticity of substitution, sum of squares. */
  public record ProfilePoint(double curvature, double substitution, double ssr) {}

  /**
   * A test.
   *
   * @param name its name, such as {@code constant-returns}
   * @param nullHypothesis the null in words
   * @param statistic the statistic
   * @param distribution {@code F}, {@code chi-squared}, {@code t} or {@code normal}
   * @param degreesOfFreedom one or two
   * @param p the p-value
   * @param verdict the verdict in a sentence
   */
  public record Tested(
      String name,
      String nullHypothesis,
      double statistic,
      String distribution,
      List<Double> degreesOfFreedom,
      double p,
      String verdict) {}

  /**
   * A row of the records and what the fit says of it.
   *
   * @param row the row in the file
   * @param plant its plant
   * @param period its period
   * @param actual ln output
   * @param fitted fitted ln output
   * @param residual the difference
   */
  public record Point(
      int row, String plant, String period, double actual, double fitted, double residual) {}

  /**
   * An influential row.
   *
   * @param row the row in the file
   * @param plant its plant
   * @param period its period
   * @param leverage its leverage
   * @param cook Cook's distance
   * @param deletedResidual its externally studentised residual; NaN where its leverage is one
   * @param dffits DFFITS
   * @param covarianceRatio the covariance ratio
   * @param dfbetas the DFBETAS largest in absolute value
   * @param parameter the parameter that the row so moves most
   * @param beyond how many of the five cut-offs it lies beyond
   */
  public record Influential(
      int row,
      String plant,
      String period,
      double leverage,
      double cook,
      double deletedResidual,
      double dffits,
      double covarianceRatio,
      double dfbetas,
      String parameter,
      int beyond) {}

  /**
   * A technology taken as known.
   *
   * @param name its name in the study
   * @param technology its form
   * @param parameters parameters as given
   * @param outputElasticity by input, at its base point
   * @param returnsToScale at its base point
   * @param substitution at its base point
   * @param remarks what must be said of it
   */
  public record Given(
      String name,
      String technology,
      Map<String, Double> parameters,
      Map<String, Double> outputElasticity,
      double returnsToScale,
      List<Pair> substitution,
      List<Said> remarks) {}
}
