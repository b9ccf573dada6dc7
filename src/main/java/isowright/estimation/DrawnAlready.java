package isowright.estimation;

import isowright.estimation.RefittedParameters.Outcome;
import isowright.estimation.RefittedParameters.Refit;
import isowright.technology.LinearForm;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/**
 * Refits of a control function: the draws of plants from which its standard errors come, asked for
 * once more. It is not fitted again without each plant.
 */
final class DrawnAlready implements Refitting {

  private final Fit fit;
  private final Particulars.OfProxy particulars;

  DrawnAlready(Fit fit, Particulars.OfProxy particulars) {
    this.fit = fit;
    this.particulars = particulars;
  }

  /** Of the estimator's own drawing, which is that of the study. */
  @Override
  public RefittedParameters drawn(int draws, long seed) {
    LinearForm form = (LinearForm) fit.specification().form();
    List<Refit> all = new ArrayList<>();
    particulars
        .parameters()
        .forEach(one -> all.add(Refit.of(LinearParameters.reported(fit, form, one))));
    for (int i = 0; i < particulars.failed(); i++) {
      all.add(Refit.failed(Outcome.NOT_FOUND));
    }
    return new RefittedParameters(all);
  }

  @Override
  public Optional<RefittedParameters> withoutPlants() {
    return Optional.empty();
  }

  @Override
  public Optional<RefittedParameters> withoutPeriods() {
    return Optional.empty();
  }
}
