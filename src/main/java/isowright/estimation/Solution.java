package isowright.estimation;

import isowright.regression.Covariance;
import isowright.regression.Design;
import isowright.regression.FitStatistics;
import isowright.regression.LinearFit;
import isowright.regression.VarianceInflation;
import isowright.technology.Technology;
import java.util.List;
import java.util.Optional;

/**
 * The numbers of a fit.
 *
 * @param technology the typical plant (of a frontier, the frontier) in the first period, with
 *     controls (and plant means that were added) at zero
 * @param names the names of the reported parameters: the technology's, then controls and time, then
 *     plant means where they were added, then those of the law of errors of a frontier
 * @param parameters the reported parameters, shape P
 * @param covariance their covariance, P × P
 * @param covarianceSource the estimator, its factor and degrees of freedom
 * @param statistics how well the rows are described
 * @param design the regression at the estimate (linearised where the form is not linear)
 * @param linear its decomposition
 * @param residuals residuals in ln Q, by row of the panel
 * @param levels what is needed to move to another plant's productivity
 * @param treatment what was done about plants
 * @param searched the parameters as a search found them, a start for refits; empty where none was
 *     searched for
 * @param particulars what belongs to the estimator alone
 */
public record Solution(
    Technology technology,
    List<String> names,
    double[] parameters,
    double[][] covariance,
    Covariance covarianceSource,
    FitStatistics statistics,
    Design design,
    LinearFit linear,
    double[] residuals,
    PlantLevels levels,
    Treatment treatment,
    double[] searched,
    Particulars particulars) {

  /** By least squares. */
  public Solution(
      Technology technology,
      List<String> names,
      double[] parameters,
      double[][] covariance,
      Covariance covarianceSource,
      FitStatistics statistics,
      Design design,
      LinearFit linear,
      double[] residuals,
      PlantLevels levels,
      Treatment treatment,
      double[] searched) {
    this(
        technology,
        names,
        parameters,
        covariance,
        covarianceSource,
        statistics,
        design,
        linear,
        residuals,
        levels,
        treatment,
        searched,
        new Particulars.None());
  }

  /** Without a search. */
  public Solution(
      Technology technology,
      List<String> names,
      double[] parameters,
      double[][] covariance,
      Covariance covarianceSource,
      FitStatistics statistics,
      Design design,
      LinearFit linear,
      double[] residuals,
      PlantLevels levels,
      Treatment treatment) {
    this(
        technology,
        names,
        parameters,
        covariance,
        covarianceSource,
        statistics,
        design,
        linear,
        residuals,
        levels,
        treatment,
        new double[0]);
  }

  /** The mean of exp(residual), by which exp(predicted ln Q) is multiplied (Duan 1983). */
  public double smearing() {
    double sum = 0;
    for (double residual : residuals) {
      sum += Math.exp(residual);
    }
    return sum / residuals.length;
  }

  /** What belongs to a frontier, where one was fitted. */
  public Optional<Particulars.OfFrontier> frontier() {
    return particulars instanceof Particulars.OfFrontier own ? Optional.of(own) : Optional.empty();
  }

  /** How many reported parameters, the last ones, are of the law of errors and of nothing else. */
  int lawOfErrors() {
    return frontier().map(Particulars.OfFrontier::count).orElse(0);
  }

  /** By how much the other regressors inflate the variance of each coefficient. */
  public List<VarianceInflation> inflation() {
    return VarianceInflation.of(design, linear);
  }

  /** The index of a reported parameter; −1 if there is none of that name. */
  public int index(String name) {
    return names.indexOf(name);
  }
}
