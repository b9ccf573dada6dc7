package isowright.estimation;

import isowright.cost.CostFunction;
import isowright.cost.GeneralisedCost;
import isowright.cost.TranslogCost;
import isowright.estimation.CostSpecification.Equations;
import isowright.regression.Design;
import isowright.regression.EquationSystem;
import isowright.regression.MappedFit;
import isowright.regression.SeeminglyUnrelated;
import isowright.regression.SystemCovariance;
import isowright.regression.SystemFit;
import isowright.regression.SystemRestrictions;
import isowright.regression.WaldTest;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;

/**
 * Fits a cost function to costs, shares, or both at once.
 *
 * <p>The cost equation alone is ordinary least squares, its covariance that of independent rows
 * with N − K degrees of freedom; with share equations beside it the system is iterated to maximum
 * likelihood ({@link SeeminglyUnrelated}), so that the share left out does not matter. Forms in
 * levels are fitted to the quantities of all inputs over output, iterated likewise. Where cost is
 * to be concave, products of prices are entries of a factor ({@link Curvature}).
 *
 * <p>Sources: Christensen, L. R. and Greene, W. H. (1976), <i>Journal of Political Economy</i> 84,
 * 655–676; Berndt, E. R. and Wood, D. O. (1975), <i>Review of Economics and Statistics</i> 57,
 * 259–268. Tested in {@code PublishedCostsTest}.
 */
public final class CostEstimation {

  private CostEstimation() {}

  /** Fits as specified. */
  public static CostFit fit(CostData data, CostSpecification specification) {
    return specification.form().inLevels().isPresent()
        ? inLevels(data, specification)
        : inLogs(data, specification);
  }

  private static CostFit inLogs(CostData data, CostSpecification specification) {
    CostEquations equations = new CostEquations(data, specification);
    CostDesign design = new CostDesign(data, equations.terms());
    Solved solved = Solved.of(design, equations.system(design), equations.curvature(data));
    Uncertainty uncertainty = uncertainty(design, specification, solved.fit());
    double[] coefficients = equations.coefficients(solved.theta());
    TranslogCost function =
        new TranslogCost(
            specification.form().word(), data.arguments(), equations.terms(), coefficients);
    List<String> names = new ArrayList<>(function.parameterNames());
    List<String> freeNames = equations.freeNames();
    int controls = (int) freeNames.stream().filter(name -> name.startsWith("control:")).count();
    names.addAll(freeNames.subList(freeNames.size() - controls, freeNames.size()));
    double[] values = java.util.Arrays.copyOf(coefficients, names.size());
    for (int c = 0; c < controls; c++) {
      values[coefficients.length + c] = solved.theta()[freeNames.size() - controls + c];
    }
    double[][] covariance = equations.covariance(solved.covariance(uncertainty.covariance()));
    return made(specification, function, names, values, covariance, uncertainty, solved);
  }

  private static CostFit inLevels(CostData data, CostSpecification specification) {
    QuantityDesign design = new QuantityDesign(data, specification.form().inLevels().orElseThrow());
    QuantityEquations equations = new QuantityEquations(data, specification, design);
    EquationSystem system = equations.system(design);
    Solved solved = Solved.of(design, system, equations.curvature(system.parameters()));
    Uncertainty uncertainty = uncertainty(design, specification, solved.fit());
    GeneralisedCost function = equations.function(solved.theta());
    double[][] covariance = equations.covariance(solved.covariance(uncertainty.covariance()));
    return made(
        specification,
        function,
        function.parameterNames(),
        function.parameters(),
        covariance,
        uncertainty,
        solved);
  }

  private static CostFit made(
      CostSpecification specification,
      CostFunction function,
      List<String> names,
      double[] values,
      double[][] covariance,
      Uncertainty uncertainty,
      Solved solved) {
    return new CostFit(
        specification,
        function,
        names,
        values,
        covariance,
        uncertainty.words(),
        uncertainty.degreesOfFreedom(),
        solved.fit().rank(),
        solved.fit(),
        solved.imposed());
  }

  /**
   * A system solved, freely or over the entries of a factor that makes cost concave.
   *
   * @param fit over the parameters that were free
   * @param theta the parameters of the system
   * @param jacobian how they move with those that were free; empty where they are the same
   */
  private record Solved(
      SystemFit fit, double[] theta, double[][] jacobian, Optional<CostFit.Imposed> imposed) {

    static Solved of(Design design, EquationSystem system, Optional<Curvature> curvature) {
      if (curvature.isEmpty()) {
        SystemFit fit = SeeminglyUnrelated.fit(design, system);
        return new Solved(fit, fit.coefficients(), new double[0][], Optional.empty());
      }
      MappedFit mapped = SeeminglyUnrelated.fit(design, system, curvature.get());
      Optional<CostFit.Imposed> imposed =
          Optional.of(new CostFit.Imposed(mapped.free().logLikelihood(), mapped.bound()));
      return new Solved(mapped.fit(), mapped.theta(), mapped.jacobian(), imposed);
    }

    double[][] covariance(double[][] ofFree) {
      return jacobian.length == 0 ? ofFree : Matrices.sandwich(jacobian, ofFree);
    }
  }

  /** The same equations with share coefficients that need not be symmetric; what it fits counts. */
  public static SystemFit withoutSymmetry(CostData data, CostSpecification specification) {
    CostEquations equations = new CostEquations(data, specification);
    CostDesign design = new CostDesign(data, equations.terms());
    return SeeminglyUnrelated.fit(design, equations.asymmetric(design));
  }

  /**
   * The Wald test of a narrower specification in a wider one with the covariance that the wider one
   * asks for: where rows of a firm may depend on one another likelihoods do not compare, this does.
   *
   * @param symmetric whether the wider one has symmetric shares; if not, each share equation has
   *     coefficients of its own
   */
  public static WaldTest wald(
      CostData data, CostSpecification wide, boolean symmetric, CostSpecification narrow) {
    Design design;
    EquationSystem wider;
    EquationSystem narrower;
    if (wide.form().inLevels().isPresent()) {
      QuantityDesign quantities = new QuantityDesign(data, wide.form().inLevels().orElseThrow());
      design = quantities;
      wider = new QuantityEquations(data, wide, quantities).system(quantities);
      narrower = new QuantityEquations(data, narrow, quantities).system(quantities);
    } else {
      CostEquations equations = new CostEquations(data, wide);
      CostDesign logs = new CostDesign(data, equations.terms());
      design = logs;
      wider = symmetric ? equations.system(logs) : equations.asymmetric(logs);
      narrower = new CostEquations(data, narrow).system(logs);
    }
    SystemFit fit = SeeminglyUnrelated.fit(design, wider);
    Uncertainty uncertainty = uncertainty(design, wide, fit);
    return SystemRestrictions.test(
        fit, uncertainty.covariance(), uncertainty.degreesOfFreedom(), narrower);
  }

  /**
   * By how much the estimates depend on which share equation is left out: the largest difference of
   * a coefficient between any two choices. Zero up to rounding where the shares of every row add up
   * to one; not zero where they do not.
   */
  public static double dependenceOnLeftOut(CostData data, CostFit fit) {
    CostSpecification specification = fit.specification();
    boolean shares =
        specification.equations() == Equations.SYSTEM
            || specification.equations() == Equations.SHARES;
    if (!shares) {
      return 0;
    }
    double most = 0;
    for (int i = 0; i < data.arguments().inputs().size(); i++) {
      if (i != specification.leftOut()) {
        double[] other = fit(data, specification.leavingOut(i)).values();
        for (int k = 0; k < other.length; k++) {
          most = Math.max(most, Math.abs(other[k] - fit.values()[k]));
        }
      }
    }
    return most;
  }

  private record Uncertainty(double[][] covariance, String words, double degreesOfFreedom) {}

  private static Uncertainty uncertainty(
      Design design, CostSpecification specification, SystemFit fit) {
    if (specification.clustered()) {
      SystemCovariance clustered = SystemCovariance.clustered(design, fit);
      return new Uncertainty(clustered.matrix(), clustered.words(), clustered.clusters() - 1.0);
    }
    if (specification.equations() == Equations.COST) {
      double left = fit.rows() - fit.rank() - (double) fit.absorbed();
      double factor = fit.rows() / left;
      double[][] scaled = fit.covariance();
      for (double[] row : scaled) {
        for (int k = 0; k < row.length; k++) {
          row[k] *= factor;
        }
      }
      String words =
          String.format(
              Locale.ROOT,
              "Classical covariance (equal variance, independent rows): factor N/(N − K) = %d/%.0f;"
                  + " t with %.0f degrees of freedom.",
              fit.rows(),
              left,
              left);
      return new Uncertainty(scaled, words, left);
    }
    int equations = fit.system().size();
    double left = (double) fit.rows() * equations - fit.rank() - fit.absorbed();
    String words =
        String.format(
            Locale.ROOT,
            "Covariance of maximum likelihood (equal covariance of the equations' errors in all"
                + " rows, Σ = E′E/N, no factor); t with %.0f degrees of freedom, rows times"
                + " equations less parameters.",
            left);
    return new Uncertainty(fit.covariance(), words, left);
  }
}
