package isowright.study;

import isowright.regression.Covariance;
import isowright.study.Findings.Said;
import java.util.Optional;

/** What must be said of how the covariance of the parameters was estimated. */
final class CovarianceWords {

  /** Below this many clusters, intervals are known to be too narrow (Cameron and Miller 2015). */
  static final int FEW_CLUSTERS = 30;

  /** Driscoll and Kraay's estimate rests on many periods; below this many it is warned of. */
  private static final int FEW_PERIODS = 20;

  private CovarianceWords() {}

  /**
   * The estimator in words. The regression knows groups of rows and their times; here they are
   * plants and periods.
   */
  static String of(Covariance covariance) {
    return covariance
        .words()
        .replace("by group", "by plant")
        .replace("of all groups", "of all plants")
        .replace("the longest group", "the longest plant")
        .replace("group effects", "plant effects")
        .replace("by time", "by period")
        .replaceAll("(\\d) times\\b", "$1 periods");
  }

  /**
   * The warning of few clusters, where there are few.
   *
   * @param resampled whether the study asks for resampling, and so for the wild cluster bootstrap
   */
  static Optional<Said> few(Covariance covariance, boolean resampled) {
    String offer =
        resampled
            ? " The wild cluster bootstrap stands beside the tests; it holds its size with few"
                + " plants."
            : " `resampling` under `estimation` in the study file adds draws of whole plants and the"
                + " wild cluster bootstrap of the tests, which holds its size with few plants.";
    int clusters = covariance.clusters().orElse(Integer.MAX_VALUE);
    String freedom =
        " They use Student's law with "
            + (clusters - 1)
            + " degrees of freedom, which helps but does not cure it.";
    return switch (covariance.kind()) {
      case CLUSTERED ->
          clusters < FEW_CLUSTERS
              ? warning(
                  "Standard errors are clustered over only "
                      + clusters
                      + " plants; below about "
                      + FEW_CLUSTERS
                      + " such intervals tend to be too narrow."
                      + freedom
                      + offer)
              : Optional.empty();
      case CLUSTERED_TWO_WAY ->
          clusters < FEW_CLUSTERS
              ? warning(
                  "Standard errors are clustered by plant and by period, and the smaller number of the"
                      + " two is "
                      + clusters
                      + "; below about "
                      + FEW_CLUSTERS
                      + " such intervals tend to be too narrow."
                      + freedom)
              : Optional.empty();
      case DRISCOLL_KRAAY ->
          clusters < FEW_PERIODS
              ? warning(
                  "Driscoll-Kraay standard errors rest on many periods; there are "
                      + clusters
                      + ", and below about "
                      + FEW_PERIODS
                      + " they tend to be too small."
                      + freedom)
              : Optional.empty();
      default -> Optional.empty();
    };
  }

  private static Optional<Said> warning(String message) {
    return Optional.of(Said.of("warning", "few-clusters", message));
  }
}
