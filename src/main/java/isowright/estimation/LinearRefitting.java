package isowright.estimation;

import isowright.estimation.RefittedParameters.Outcome;
import isowright.estimation.RefittedParameters.Refit;
import isowright.regression.ClusterBootstrap;
import isowright.regression.GroupProducts;
import isowright.regression.LeaveOut;
import isowright.regression.Refits;
import isowright.technology.LinearForm;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/**
 * Refits of a form linear in its parameters, pooled or within plants, from what each plant
 * contributes to sums of products; rows are read once.
 */
final class LinearRefitting implements Refitting {

  private final Fit fit;
  private final GroupProducts products;
  private final LinearForm form;

  LinearRefitting(Fit fit, LinearForm form) {
    this.fit = fit;
    this.form = form;
    this.products = GroupProducts.of(fit.numbers().design(), fit.numbers().linear());
  }

  /** What each plant contributes. */
  GroupProducts products() {
    return products;
  }

  @Override
  public RefittedParameters drawn(int draws, long seed) {
    return reported(ClusterBootstrap.draw(products, draws, seed));
  }

  @Override
  public Optional<RefittedParameters> withoutPlants() {
    return products.groups() < 3
        ? Optional.empty()
        : Optional.of(reported(LeaveOut.eachGroup(products)));
  }

  @Override
  public Optional<RefittedParameters> withoutPeriods() {
    if (fit.panel().periods().size() < 3) {
      return Optional.empty();
    }
    boolean effects = fit.specification().time().byPeriod();
    return Optional.of(
        reported(
            LeaveOut.eachTime(
                fit.numbers().design(),
                products,
                PanelRows.of(fit.panel(), fit.base()).times(),
                effects)));
  }

  private RefittedParameters reported(Refits refits) {
    List<Refit> all = new ArrayList<>(refits.count());
    for (int i = 0; i < refits.count(); i++) {
      all.add(
          refits.failed(i)
              ? Refit.failed(Outcome.LOST_RANK)
              : Refit.of(LinearParameters.reported(fit, form, refits.coefficients(i))));
    }
    return new RefittedParameters(all);
  }
}
