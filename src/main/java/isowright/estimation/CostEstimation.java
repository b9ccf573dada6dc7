package isowright.estimation;

import isowright.cost.TranslogCost;
import isowright.estimation.CostSpecification.Equations;
import isowright.regression.EquationSystem;
import isowright.regression.SeeminglyUnrelated;
import isowright.regression.SystemCovariance;
import isowright.regression.SystemFit;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;

/**
 * Fits a cost function to costs, shares, or both at once.
 *
 * <p>The cost equation alone is ordinary least squares, its covariance that of independent rows
 * with N − K degrees of freedom; with share equations beside it the system is iterated to maximum
 * likelihood ({@link SeeminglyUnrelated}), so that the share left out does not matter.
 *
 * <p>Sources: Christensen, L. R. and Greene, W. H. (1976), <i>Journal of Political Economy</i> 84,
 * 655–676; Berndt, E. R. and Wood, D. O. (1975), <i>Review of Economics and Statistics</i> 57,
 * 259–268. Tested in {@code PublishedCostsTest}.
 */
public final class CostEstimation {

  private CostEstimation() {}

  /** Fits as specified. */
  public static CostFit fit(CostData data, CostSpecification specification) {
    CostEquations equations = new CostEquations(data, specification);
    CostDesign design = new CostDesign(data, equations.terms());
    EquationSystem system = equations.system(design);
    SystemFit fit = SeeminglyUnrelated.fit(design, system);
    Uncertainty uncertainty = uncertainty(design, specification, fit);
    double[] coefficients = equations.coefficients(fit.coefficients());
    TranslogCost function =
        new TranslogCost(
            specification.form().word(), data.arguments(), equations.terms(), coefficients);
    List<String> names = new ArrayList<>(function.parameterNames());
    List<String> freeNames = equations.freeNames();
    int controls = (int) freeNames.stream().filter(name -> name.startsWith("control:")).count();
    List<String> controlNames = freeNames.subList(freeNames.size() - controls, freeNames.size());
    names.addAll(controlNames);
    double[] values = java.util.Arrays.copyOf(coefficients, names.size());
    for (int c = 0; c < controls; c++) {
      values[coefficients.length + c] = fit.coefficient(controlNames.get(c));
    }
    return new CostFit(
        specification,
        function,
        names,
        values,
        equations.covariance(uncertainty.covariance()),
        uncertainty.words(),
        uncertainty.degreesOfFreedom(),
        fit.rank(),
        fit);
  }

  /** The same equations with share coefficients that need not be symmetric; what it fits counts. */
  public static SystemFit withoutSymmetry(CostData data, CostSpecification specification) {
    CostEquations equations = new CostEquations(data, specification);
    CostDesign design = new CostDesign(data, equations.terms());
    return SeeminglyUnrelated.fit(design, equations.asymmetric(design));
  }

  /**
   * By how much the estimates depend on which share equation is left out: the largest difference of
   * a coefficient between any two choices. Zero up to rounding where the shares of every row add up
   * to one; not zero where they do not.
   */
  public static double dependenceOnLeftOut(CostData data, CostFit fit) {
    CostSpecification specification = fit.specification();
    if (specification.equations() == Equations.COST) {
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
      CostDesign design, CostSpecification specification, SystemFit fit) {
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
                + " rows, Σ = E′E/N, no factor); t with %.0f degrees of freedom, rows times equations"
                + " less parameters.",
            left);
    return new Uncertainty(fit.covariance(), words, left);
  }
}
