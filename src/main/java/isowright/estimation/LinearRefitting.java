package isowright.estimation;

import isowright.estimation.RefittedParameters.Outcome;
import isowright.estimation.RefittedParameters.Refit;
import isowright.regression.ClusterBootstrap;
import isowright.regression.Design;
import isowright.regression.GroupProducts;
import isowright.regression.LeaveOut;
import isowright.regression.Refits;
import isowright.regression.Times;
import isowright.technology.LinearForm;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/**
 * Refits of a form linear in its parameters, pooled or within plants, from what each plant
 * contributes to sums of products; rows are read once. Where the fit is held to be regular, each
 * refit is, at the rows of the records.
 */
final class LinearRefitting implements Refitting {

  private final Fit fit;
  private final GroupProducts products;
  private final LinearForm form;
  private final Optional<Refits.Revision> revision;

  LinearRefitting(Fit fit, LinearForm form) {
    this.fit = fit;
    this.form = form;
    Solution free = fit.examined().numbers();
    this.products = GroupProducts.of(free.design(), free.linear());
    this.revision =
        fit == fit.examined()
            ? Optional.empty()
            : Optional.of(ImposedRegularity.revision(fit, form));
  }

  /** What each plant contributes. */
  GroupProducts products() {
    return products;
  }

  @Override
  public RefittedParameters drawn(int draws, long seed) {
    return reported(
        revision
            .map(held -> ClusterBootstrap.draw(products, draws, seed, held))
            .orElseGet(() -> ClusterBootstrap.draw(products, draws, seed)));
  }

  @Override
  public Optional<RefittedParameters> withoutPlants() {
    boolean tooMany =
        revision.isPresent() && (long) products.groups() * fit.panel().rows() > MOST_ROWS_REFITTED;
    if (products.groups() < 3 || tooMany) {
      return Optional.empty();
    }
    return Optional.of(
        reported(
            revision
                .map(held -> LeaveOut.eachGroup(products, held))
                .orElseGet(() -> LeaveOut.eachGroup(products))));
  }

  @Override
  public Optional<RefittedParameters> withoutPeriods() {
    if (fit.panel().periods().size() < 3) {
      return Optional.empty();
    }
    boolean effects = fit.specification().time().byPeriod();
    Design design = fit.numbers().design();
    Times times = PanelRows.of(fit.panel(), fit.base()).times();
    return Optional.of(
        reported(
            revision
                .map(held -> LeaveOut.eachTime(design, products, times, effects, held))
                .orElseGet(() -> LeaveOut.eachTime(design, products, times, effects))));
  }

  private RefittedParameters reported(Refits refits) {
    List<Refit> all = new ArrayList<>(refits.count());
    for (int i = 0; i < refits.count(); i++) {
      all.add(
          refits.failed(i)
              ? Refit.failed(refits.notRevised(i) ? Outcome.NOT_FOUND : Outcome.LOST_RANK)
              : Refit.of(LinearParameters.reported(fit, form, refits.coefficients(i))));
    }
    return new RefittedParameters(all);
  }
}
