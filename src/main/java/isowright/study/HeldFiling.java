package isowright.study;

import isowright.review.GapEstimate;
import java.util.Optional;

/**
 * A filing held against a reference.
 *
 * @param filing the filing
 * @param plant its plant
 * @param estimate the gap with its uncertainty; absent where a price or the filed cost is unknown
 */
record HeldFiling(FilingRows.Filing filing, String plant, Optional<GapEstimate> estimate) {

  /** Whether there is a gap with an interval. */
  boolean answered() {
    return estimate
        .filter(e -> e.gap().answered() && Double.isFinite(e.leastCost().standardError()))
        .isPresent();
  }

  /** The gap of a filing that has one. */
  GapEstimate gap() {
    return estimate.orElseThrow();
  }
}
