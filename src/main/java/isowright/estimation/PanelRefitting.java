package isowright.estimation;

import isowright.estimation.RefittedParameters.Outcome;
import isowright.estimation.RefittedParameters.Refit;
import isowright.records.Panel;
import isowright.regression.ClusterBootstrap;
import java.util.Optional;
import java.util.function.IntFunction;
import java.util.stream.IntStream;

/**
 * Refits the long way, for whatever estimator: a panel is put together and fitted from the
 * beginning, with inputs divided by the base of the fit.
 */
final class PanelRefitting implements Refitting {

  private final Fit fit;
  private final Panel panel;

  PanelRefitting(Fit fit) {
    this.fit = fit;
    this.panel = fit.panel();
  }

  @Override
  public RefittedParameters drawn(int draws, long seed) {
    int plants = panel.plants().size();
    return each(
        draws,
        d -> refit(SelectedPanel.counted(panel, ClusterBootstrap.counts(plants, d, seed)), false));
  }

  @Override
  public Optional<RefittedParameters> withoutPlants() {
    int plants = panel.plants().size();
    if (plants < 3 || (long) plants * panel.rows() > MOST_ROWS_REFITTED) {
      return Optional.empty();
    }
    return Optional.of(
        each(plants, p -> refit(SelectedPanel.kept(panel, row -> panel.plantOf(row) != p), true)));
  }

  @Override
  public Optional<RefittedParameters> withoutPeriods() {
    int periods = panel.periods().size();
    if (periods < 3 || (long) periods * panel.rows() > MOST_ROWS_REFITTED) {
      return Optional.empty();
    }
    boolean effects = fit.specification().time().byPeriod();
    return Optional.of(
        each(
            periods,
            t -> {
              Panel kept = SelectedPanel.kept(panel, row -> panel.rowPeriods().get(row) != t);
              return refit(effects ? SelectedPanel.withoutPeriod(kept, t) : kept, true);
            }));
  }

  private static RefittedParameters each(int count, IntFunction<Refit> refit) {
    return new RefittedParameters(IntStream.range(0, count).parallel().mapToObj(refit).toList());
  }

  /**
   * @param whole whether levels will be asked for
   */
  Refit refit(Panel some, boolean whole) {
    Specification own = fit.specification();
    // The covariance of a refit is not looked at; the classical one asks least of the rows.
    Specification plain =
        own.with(own.plantEffects(), own.time(), Specification.StandardErrors.CLASSICAL);
    Fit again =
        own.estimator() instanceof Estimator.Frontier
            ? FrontierEstimation.again(fit, some, plain)
            : Estimation.fit(some, plain, fit.base());
    if (!again.state().usable()) {
      boolean rank =
          again.state() == Fit.State.RANK_DEFICIENT || again.state() == Fit.State.REFUSED;
      return Refit.failed(rank ? Outcome.LOST_RANK : Outcome.NOT_FOUND);
    }
    Solution numbers = again.numbers();
    double[] reported = new double[fit.numbers().parameters().length];
    for (int k = 0; k < reported.length; k++) {
      // A period that is left out has no effect of its own: the level of the others moves instead.
      int place = numbers.index(fit.numbers().names().get(k));
      reported[k] = place < 0 ? 0 : numbers.parameters()[place];
    }
    return new Refit(Outcome.FITTED, reported, whole ? Optional.of(again) : Optional.empty());
  }
}
