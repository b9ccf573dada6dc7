package isowright.inference;

import isowright.estimation.Fit;
import isowright.estimation.PlantFolds;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.apache.commons.statistics.distribution.TDistribution;

/**
 * Which form predicts plants best that it has not seen? Root mean squared errors in ln Q from
 * {@link PlantFolds}, form by form, each held against the least.
 *
 * <p>Judged are changes within plants where plants are seen more than once (levels of unseen plants
 * cannot be known), else levels. The difference of two mean squared errors has its standard error
 * from the spread of the plants' differences, plants being independent, and Student's t with one
 * degree less than there are plants; fits of different folds share rows, which this does not see.
 *
 * @param form the form
 * @param ofChanges whether changes are judged; levels otherwise
 * @param error the root mean squared error of what is judged
 * @param levelError the root mean squared error of levels, where they can be predicted
 * @param spread what the error would be if no change were foreseen at all; NaN where levels are
 *     judged
 * @param difference how much the mean squared error exceeds the least; absent for the least
 * @param plants the plants predicted
 * @param folds the folds
 * @param failed the folds that could not be fitted
 */
public record PlantPrediction(
    String form,
    boolean ofChanges,
    double error,
    Optional<Double> levelError,
    double spread,
    Optional<Estimate> difference,
    int plants,
    int folds,
    int failed) {

  /**
   * The predictions of fits of the same panel; empty where fewer than two can be made.
   *
   * @param confidence of the intervals of differences
   */
  public static List<PlantPrediction> of(List<Fit> fits, double confidence) {
    List<String> forms = new ArrayList<>();
    List<PlantFolds> all = new ArrayList<>();
    for (Fit fit : fits) {
      PlantFolds.of(fit, PlantFolds.USUAL)
          .filter(folds -> folds.failed() < folds.folds())
          .ifPresent(
              folds -> {
                forms.add(fit.specification().form().name());
                all.add(folds);
              });
    }
    if (all.size() < 2) {
      return List.of();
    }
    boolean changes = fits.get(0).panel().repeats();
    int best = 0;
    for (int f = 1; f < all.size(); f++) {
      if (meanSquare(all.get(f), changes) < meanSquare(all.get(best), changes)) {
        best = f;
      }
    }
    List<PlantPrediction> predictions = new ArrayList<>();
    for (int f = 0; f < all.size(); f++) {
      PlantFolds folds = all.get(f);
      double level = meanSquare(folds, false);
      predictions.add(
          new PlantPrediction(
              forms.get(f),
              changes,
              Math.sqrt(meanSquare(folds, changes)),
              Double.isNaN(level) ? Optional.empty() : Optional.of(Math.sqrt(level)),
              changes ? Math.sqrt(spread(folds)) : Double.NaN,
              f == best
                  ? Optional.empty()
                  : Optional.of(difference(folds, all.get(best), changes, confidence)),
              predicted(folds),
              folds.folds(),
              folds.failed()));
    }
    return List.copyOf(predictions);
  }

  private static int predicted(PlantFolds folds) {
    int count = 0;
    for (double square : folds.changes()) {
      count += Double.isNaN(square) ? 0 : 1;
    }
    return count;
  }

  /** Over the plants predicted; NaN where there is none. */
  private static double meanSquare(PlantFolds folds, boolean changes) {
    double[] squares = changes ? folds.changes() : folds.levels();
    int[] counts = changes ? folds.changesKnown() : folds.rows();
    double sum = 0;
    double count = 0;
    for (int p = 0; p < squares.length; p++) {
      if (!Double.isNaN(squares[p])) {
        sum += squares[p];
        count += counts[p];
      }
    }
    return count > 0 ? sum / count : Double.NaN;
  }

  private static double spread(PlantFolds folds) {
    double sum = 0;
    double count = 0;
    for (int p = 0; p < folds.spread().length; p++) {
      sum += folds.spread()[p];
      count += folds.changesKnown()[p];
    }
    return sum / count;
  }

  /** The difference of two mean squared errors over the plants that both predict. */
  private static Estimate difference(
      PlantFolds one, PlantFolds best, boolean changes, double confidence) {
    double[] own = changes ? one.changes() : one.levels();
    double[] other = changes ? best.changes() : best.levels();
    int[] counts = changes ? one.changesKnown() : one.rows();
    double sum = 0;
    double count = 0;
    int plants = 0;
    for (int p = 0; p < own.length; p++) {
      if (!Double.isNaN(own[p] - other[p])) {
        sum += own[p] - other[p];
        count += counts[p];
        plants++;
      }
    }
    double mean = sum / count;
    double squares = 0;
    for (int p = 0; p < own.length; p++) {
      if (!Double.isNaN(own[p] - other[p])) {
        double departure = own[p] - other[p] - mean * counts[p];
        squares += departure * departure;
      }
    }
    double error = Math.sqrt(plants / (plants - 1.0) * squares) / count;
    double t = TDistribution.of(plants - 1.0).inverseSurvivalProbability((1 - confidence) / 2);
    return new Estimate(
        mean, error, mean - t * error, mean + t * error, confidence, Estimate.Method.DELTA);
  }
}
