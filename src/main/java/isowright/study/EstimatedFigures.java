package isowright.study;

import isowright.inference.Estimate;
import isowright.inference.LeftOut;
import isowright.inference.Resampled;
import isowright.inference.Resampled.Interval;
import isowright.study.Figure.Drawn;
import isowright.study.Figure.Refits;
import isowright.study.Figure.Span;
import isowright.study.Figure.Without;

/** From estimates to the figures of the findings. */
final class EstimatedFigures {

  private EstimatedFigures() {}

  /** What no parameter moves, such as a quantity that is held, is exact. */
  static Figure of(Estimate estimate) {
    if (estimate.standardError() == 0) {
      return Figure.exact(estimate.value());
    }
    return Figure.estimated(
            estimate.value(),
            estimate.standardError(),
            estimate.low(),
            estimate.high(),
            estimate.method().word())
        .with(refits(estimate));
  }

  static Refits refits(Estimate estimate) {
    return new Refits(
        estimate.resampled().map(EstimatedFigures::drawn),
        estimate.leftOut().plant().map(EstimatedFigures::without),
        estimate.leftOut().period().map(EstimatedFigures::without));
  }

  private static Drawn drawn(Resampled resampled) {
    return new Drawn(
        resampled.draws(),
        resampled.failed(),
        resampled.mean(),
        resampled.standardError(),
        span(resampled.percentile()),
        span(resampled.corrected()),
        span(resampled.accelerated()),
        resampled.analytic(),
        span(resampled.analyticInterval()));
  }

  private static Span span(Interval interval) {
    return new Span(interval.low(), interval.high());
  }

  private static Without without(LeftOut.Most most) {
    return new Without(most.name(), most.value(), most.lost());
  }

  /** Whether the interval of a figure comes from draws. */
  static boolean resampled(Figure figure) {
    return figure
        .uncertainty()
        .map(u -> u.method().equals(Estimate.Method.RESAMPLING.word()))
        .orElse(false);
  }

  /** The profile's interval in the place of a figure's own. */
  static Figure profiled(Figure figure, double low, double high) {
    return Figure.estimated(
            figure.value(),
            figure.uncertainty().map(Figure.Uncertainty::standardError).orElse(0.0),
            low,
            high,
            Estimate.Method.PROFILE.word())
        .with(figure.refits());
  }
}
