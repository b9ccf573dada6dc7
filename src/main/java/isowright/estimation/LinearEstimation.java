package isowright.estimation;

import isowright.records.Panel;
import isowright.regression.Collinearity;
import isowright.regression.Covariance;
import isowright.regression.Design;
import isowright.regression.Effects;
import isowright.regression.FitStatistics;
import isowright.regression.LeastSquares;
import isowright.regression.LinearFit;
import isowright.technology.LinearForm;
import isowright.technology.Technology;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;

/**
 * Fits a form that is linear in its parameters: ordinary least squares, pooled or within plants.
 */
final class LinearEstimation {

  private final Panel panel;
  private final Specification specification;
  private final double[] base;
  private final LinearForm form;
  private final boolean within;

  LinearEstimation(Panel panel, Specification specification, double[] base, LinearForm form) {
    this.panel = panel;
    this.specification = specification;
    this.base = base;
    this.form = form;
    this.within = specification.plantEffects() == Specification.PlantEffects.WITHIN;
  }

  Fit fit() {
    Circumstances circumstances = Circumstances.of(panel, specification.time());
    LinearDesign raw =
        new LinearDesign(PanelRows.of(panel, base), form, panel.inputs(), circumstances, !within);
    Design design = within ? Effects.within(raw) : raw;
    LinearFit fit = LeastSquares.fit(design);
    Optional<Fit> lacking = lacking(panel, specification, base, fit);
    return lacking.orElseGet(() -> solved(circumstances, raw, design, fit));
  }

  /** The fit that says what the rows lack, if anything. */
  static Optional<Fit> lacking(
      Panel panel, Specification specification, double[] base, LinearFit fit) {
    int parameters = fit.columns().size() + fit.absorbed();
    if (fit.rows() <= parameters) {
      String reason =
          fit.rows()
              + " rows cannot carry "
              + parameters
              + " parameters"
              + (fit.absorbed() > 0 ? " (plant effects among them)" : "")
              + ": add records, or ask for a form with fewer parameters.";
      return Optional.of(
          Estimation.without(panel, specification, base, Fit.State.REFUSED, List.of(reason)));
    }
    if (!fit.fullRank()) {
      List<String> reasons = new ArrayList<>();
      for (Collinearity collinearity : fit.collinearities()) {
        reasons.add(
            collinearity.column()
                + " cannot be told apart from "
                + String.join(", ", collinearity.among())
                + ": in these records it is an exact combination of them. Leave one of them out, add"
                + " records in which they move apart, or ask for a simpler form.");
      }
      return Optional.of(
          Estimation.without(panel, specification, base, Fit.State.RANK_DEFICIENT, reasons));
    }
    return Optional.empty();
  }

  private Fit solved(Circumstances circumstances, LinearDesign raw, Design design, LinearFit fit) {
    Covariance covariance =
        Covariance.estimate(
            design, fit, kind(specification.standardErrors()), PanelRows.of(panel, base).times());
    int slopes = fit.columns().size() - (within ? 0 : 1);
    GroupMeans means = GroupMeans.of(raw, fit.coefficients());
    double[][] slopeCovariance = slopeBlock(covariance.matrix(), slopes);
    PlantLevels levels =
        new PlantLevels(
            means,
            slopeCovariance,
            within ? 0 : 1,
            fit.residualVariance(),
            Matrices.identity(slopes + 1));
    double[] parameters = new double[slopes + 1];
    System.arraycopy(fit.coefficients(), 0, parameters, within ? 1 : 0, fit.coefficients().length);
    double[][] full = covariance.matrix();
    if (within) {
      parameters[0] = levels.typical();
      full = levels.covariance(levels.weights(new Productivity.Typical()));
    }
    int formColumns = slopes - circumstances.count();
    Technology technology =
        form.technology(
            panel.inputs(),
            base,
            parameters[0],
            Arrays.copyOfRange(parameters, 1, 1 + formColumns));
    List<String> names = new ArrayList<>(technology.parameterNames());
    names.addAll(circumstances.names());
    Solution solution =
        new Solution(
            technology,
            List.copyOf(names),
            parameters,
            full,
            covariance,
            FitStatistics.of(fit),
            design,
            fit,
            LeastSquares.residuals(design, fit),
            levels);
    return new Fit(
        specification,
        panel,
        base,
        Fit.State.ESTIMATED,
        List.of(),
        Optional.of(solution),
        List.of());
  }

  /** The last rows and columns of a covariance. */
  static double[][] slopeBlock(double[][] covariance, int slopes) {
    int skip = covariance.length - slopes;
    double[][] block = new double[slopes][];
    for (int k = 0; k < slopes; k++) {
      block[k] = Arrays.copyOfRange(covariance[skip + k], skip, covariance.length);
    }
    return block;
  }

  static Covariance.Kind kind(Specification.StandardErrors standardErrors) {
    return switch (standardErrors) {
      case CLASSICAL -> Covariance.Kind.CLASSICAL;
      case ROBUST -> Covariance.Kind.HC1;
      case HC3 -> Covariance.Kind.HC3;
      case CLUSTERED -> Covariance.Kind.CLUSTERED;
      case CLUSTERED_TWO_WAY -> Covariance.Kind.CLUSTERED_TWO_WAY;
      case NEWEY_WEST -> Covariance.Kind.NEWEY_WEST;
      case DRISCOLL_KRAAY -> Covariance.Kind.DRISCOLL_KRAAY;
    };
  }
}
