package isowright.regression;

import isowright.regression.ComposedErrors.Sharing;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;

/**
 * Looks for the maximum of the likelihood of {@link ComposedErrors} from several starts, of which
 * the first are the moments of least squares: the third moment of its residuals gives σ_w, the
 * second σ_v, and the mean of w is put back into the constant.
 */
final class ComposedSearch {

  /** Shares of the residual variance that the one-sided error starts with. */
  private static final double[] SHARES = {0.2, 0.8};

  /** A rise of the log-likelihood below this is no sign of a one-sided error. */
  private static final double NO_RISE = 1e-7;

  /** Where one of the two errors is this small beside the other, it has gone to zero. */
  private static final double VANISHED = 1e-4;

  private final ComposedErrors model;
  private final LinearFit start;
  private final double[] residuals;
  private final double second;
  private final double third;
  private final double logLikelihood;

  ComposedSearch(ComposedErrors model) {
    this.model = model;
    this.start = LeastSquares.fit(model.design());
    this.residuals = LeastSquares.residuals(model.design(), start);
    this.second = start.ssr() / residuals.length;
    this.third = Arrays.stream(residuals).map(e -> e * e * e).sum() / residuals.length;
    this.logLikelihood = -residuals.length / 2.0 * (Math.log(2 * Math.PI) + Math.log(second) + 1);
    if (!model.design().columns().contains("constant")) {
      throw new IllegalArgumentException(
          "a one-sided error needs a column named constant among " + model.design().columns());
    }
  }

  ComposedFit fit() {
    return wrongSkew() ? without(ComposedFit.State.WRONG_SKEW, 0) : best(starts());
  }

  /** From a start of one's own, and from the first of the usual ones. */
  ComposedFit fit(double[] own) {
    if (own.length != model.parameters()) {
      return fit();
    }
    return wrongSkew()
        ? without(ComposedFit.State.WRONG_SKEW, 0)
        : best(List.of(own, moments().orElseGet(() -> share(SHARES[0]))));
  }

  private boolean wrongSkew() {
    return model.sharing() == Sharing.NONE && third >= 0;
  }

  private ComposedFit best(List<double[]> starts) {
    List<NewtonAscent.End> ends = new ArrayList<>();
    for (double[] from : starts) {
      ends.add(NewtonAscent.from(from, model::at));
    }
    NewtonAscent.End best = ends.get(0);
    for (NewtonAscent.End end : ends) {
      // A converged end is preferred to one a rounding higher that is not.
      double margin = end.converged() && !best.converged() ? NO_RISE : 0;
      if (end.value() > best.value() - margin) {
        best = end;
      }
    }
    int columns = model.design().columns().size();
    double noise = best.parameters()[columns];
    double scale = best.parameters()[columns + 1];
    if (best.value() <= logLikelihood + NO_RISE || scale - noise < Math.log(VANISHED)) {
      return without(ComposedFit.State.NONE_FOUND, best.steps());
    }
    if (noise - scale < Math.log(VANISHED)) {
      return without(ComposedFit.State.ALL_ONE_SIDED, best.steps());
    }
    if (!best.converged() || Double.isInfinite(best.decrement())) {
      return without(ComposedFit.State.NOT_CONVERGED, best.steps());
    }
    return new ComposedFit(
        model,
        ComposedFit.State.FOUND,
        best.parameters(),
        best.value(),
        start,
        logLikelihood,
        skewness(),
        best.steps());
  }

  private ComposedFit without(ComposedFit.State state, int steps) {
    return new ComposedFit(
        model, state, start.coefficients(), logLikelihood, start, logLikelihood, skewness(), steps);
  }

  private double skewness() {
    return third / Math.pow(second, 1.5);
  }

  private List<double[]> starts() {
    List<double[]> starts = new ArrayList<>();
    if (model.sharing() == Sharing.GROUP_WITH_DECAY) {
      ComposedErrors constant =
          new ComposedErrors(model.design(), model.law(), Sharing.GROUP, new double[0]);
      ComposedFit without = of(constant);
      if (without.state().oneSided()) {
        double[] same = without.parameters();
        double span = Arrays.stream(model.since()).map(Math::abs).max().orElse(1);
        for (double total : new double[] {0, 0.5, -0.5}) {
          double[] from = Arrays.copyOf(same, same.length + 1);
          from[same.length] = span > 0 ? total / span : 0;
          starts.add(from);
        }
        return starts;
      }
    }
    moments().ifPresent(starts::add);
    for (double share : SHARES) {
      starts.add(share(share));
    }
    return starts;
  }

  private Optional<double[]> moments() {
    double moment = model.law().scaleOf(Math.max(-third, 0));
    return moment > 0 && model.law().variance(moment) < 0.98 * second
        ? Optional.of(at(moment))
        : Optional.empty();
  }

  /** Where the one-sided error has this share of the residual variance. */
  private double[] share(double share) {
    return at(Math.sqrt(share * second / model.law().variance(1)));
  }

  private static ComposedFit of(ComposedErrors model) {
    return new ComposedSearch(model).fit();
  }

  /** The least-squares point with a one-sided error of this scale. */
  private double[] at(double scale) {
    double[] coefficients = start.coefficients();
    double[] from = Arrays.copyOf(coefficients, model.parameters());
    from[model.design().columns().indexOf("constant")] += model.law().mean(scale);
    from[coefficients.length] = 0.5 * Math.log(second - model.law().variance(scale));
    from[coefficients.length + 1] = Math.log(scale);
    return from;
  }
}
