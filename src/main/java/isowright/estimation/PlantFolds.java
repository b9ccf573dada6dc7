package isowright.estimation;

import isowright.estimation.RefittedParameters.Outcome;
import isowright.estimation.RefittedParameters.Refit;
import isowright.records.Panel;
import isowright.technology.NonlinearForm;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.function.Function;
import java.util.stream.IntStream;

/**
 * How well does a fit predict plants that it has not seen? The plants are dealt out to folds, every
 * k-th to the same; each fold is predicted by the fit of all others.
 *
 * <p>A plant that was not seen has no level of its own, so that what can be predicted of it are
 * changes: the deviations of ln Q from the plant's mean over its rows. Where one constant holds for
 * all plants, levels are predicted too. Inputs stay divided by the base of the whole fit.
 *
 * <p>Source of the idea: M. Stone 1974, Journal of the Royal Statistical Society B 36, 111–147.
 * Tested in {@code PlantPredictionTest}.
 *
 * @param changes for each plant the sum of squared errors of changes; NaN where its fold has no fit
 * @param changesKnown for each plant its rows less one, the number of changes
 * @param levels for each plant the sum of squared errors of levels; NaN likewise, and everywhere
 *     where plants have constants of their own
 * @param spread for each plant the sum of squared deviations of ln Q from the plant's mean
 * @param rows for each plant its rows
 * @param folds the number of folds
 * @param failed how many of them could not be fitted
 */
public record PlantFolds(
    double[] changes,
    int[] changesKnown,
    double[] levels,
    double[] spread,
    int[] rows,
    int folds,
    int failed) {

  /** As many folds, or as many as there are plants: common practice. */
  public static final int USUAL = 10;

  private static final int FEWEST_PLANTS = 4;

  /**
   * Predicts every plant from the others.
   *
   * @return empty where there are fewer than four plants, where the fits would read too many rows,
   *     or where the estimator is not least squares
   */
  public static Optional<PlantFolds> of(Fit fit, int wanted) {
    Panel panel = fit.panel();
    int plants = panel.plants().size();
    int folds = Math.min(wanted, plants);
    boolean leastSquares = fit.specification().estimator() instanceof Estimator.LeastSquares;
    if (!leastSquares
        || !fit.state().usable()
        || plants < FEWEST_PLANTS
        || (long) folds * panel.rows() > Refitting.MOST_ROWS_REFITTED) {
      return Optional.empty();
    }
    Function<Panel, Refit> refit = way(fit);
    List<Refit> refits =
        IntStream.range(0, folds)
            .parallel()
            .mapToObj(
                f -> refit.apply(SelectedPanel.kept(panel, r -> panel.plantOf(r) % folds != f)))
            .toList();
    return Optional.of(judged(fit, refits));
  }

  private static Function<Panel, Refit> way(Fit fit) {
    Specification how = fit.specification();
    if (how.form() instanceof NonlinearForm form && fit.numbers().searched().length > 0) {
      SearchedRefitting near = new SearchedRefitting(fit, form);
      return near::search;
    }
    PanelRefitting anew = new PanelRefitting(fit);
    return some -> anew.refit(some, false);
  }

  private static PlantFolds judged(Fit fit, List<Refit> refits) {
    Panel panel = fit.panel();
    int plants = panel.plants().size();
    RowLevels levels = new RowLevels(fit);
    boolean one = fit.specification().plantEffects() == Specification.PlantEffects.NONE;
    double[] changes = new double[plants];
    double[] level = new double[plants];
    double[] spread = new double[plants];
    int[] known = new int[plants];
    int[] rows = new int[plants];
    Arrays.fill(changes, Double.NaN);
    Arrays.fill(level, Double.NaN);
    for (int p = 0; p < plants; p++) {
      int from = panel.plantStart(p);
      int to = panel.plantEnd(p);
      rows[p] = to - from;
      known[p] = to - from - 1;
      double[] output = new double[to - from];
      panel.logOutput().copy(from, to, output);
      spread[p] = aboutMean(output);
      Refit refit = refits.get(p % refits.size());
      if (refit.outcome() == Outcome.FITTED) {
        double[] errors = levels.ofRows(refit.reported(), from, to);
        changes[p] = aboutMean(errors);
        if (one) {
          double constant = refit.reported()[0];
          level[p] = Arrays.stream(errors).map(e -> (e - constant) * (e - constant)).sum();
        }
      }
    }
    int failed = (int) refits.stream().filter(r -> r.outcome() != Outcome.FITTED).count();
    return new PlantFolds(changes, known, level, spread, rows, refits.size(), failed);
  }

  private static double aboutMean(double[] values) {
    double mean = Arrays.stream(values).average().orElse(0);
    return Arrays.stream(values).map(v -> (v - mean) * (v - mean)).sum();
  }
}
