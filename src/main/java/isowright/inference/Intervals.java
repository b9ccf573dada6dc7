package isowright.inference;

import isowright.estimation.EstimatedTechnology;
import isowright.technology.Technology;
import java.util.List;
import java.util.Optional;
import java.util.function.Function;

/**
 * How sure is a number computed from an estimated technology? By propagation of its covariance
 * ({@link DeltaMethod}), or, where the fit was repeated, from the refits ({@link
 * ReplicatedIntervals}).
 */
public interface Intervals {

  /**
   * Several functions at once, which share the work of evaluating them; NaN where one has no value.
   */
  List<Estimate> estimates(Function<Technology, double[]> functions, DeltaMethod.Scale scale);

  /** An estimate from a value and its standard error, by Student's law. */
  Estimate estimate(double value, double standardError, DeltaMethod.Scale scale);

  /** For an estimated technology and a confidence level: from refits where there are any. */
  static Intervals of(EstimatedTechnology estimated, double level) {
    Optional<Intervals> refits = ReplicatedIntervals.of(estimated, level).map(r -> r);
    return refits.orElseGet(() -> DeltaMethod.of(estimated, level));
  }
}
