package isowright.study;

import java.util.List;
import java.util.Optional;

/**
 * How far a fit stands when it is looked at in other ways: resampled, tested with few plants in
 * mind, searched for influential rows, and made again with large residuals counting for less. What
 * single figures become in refits stands with the figures.
 *
 * @param resampling how plants were drawn; absent where they were not
 * @param wild tests repeated by the wild cluster bootstrap; empty where they were not
 * @param influence the cut-offs of the measures of influence, and how many rows lie beyond; absent
 *     where rows have none
 * @param huber the cross-check by Huber's M estimate; absent where it was not made
 */
public record RobustnessFindings(
    Optional<Resampling> resampling,
    List<Wild> wild,
    Optional<Beyond> influence,
    Optional<Huber> huber) {

  /** Nothing was looked at. */
  public static final RobustnessFindings NONE =
      new RobustnessFindings(Optional.empty(), List.of(), Optional.empty(), Optional.empty());

  /** Copies the list. */
  public RobustnessFindings {
    wild = List.copyOf(wild);
  }

  /**
   * How plants were drawn.
   *
   * @param draws how many draws
   * @param seed of the random numbers
   * @param units what was drawn whole: {@code plants} or {@code rows}
   * @param count how many of them there are
   * @param lostRank draws that could not tell the parameters apart
   * @param withoutOptimum draws in which the search found no optimum inside the economic region
   */
  public record Resampling(
      int draws, long seed, String units, int count, int lostRank, int withoutOptimum) {}

  /**
   * A test repeated by the wild cluster bootstrap, the null imposed.
   *
   * @param name the name of the test, as of {@link FitFindings.Tested}
   * @param nullHypothesis the null in words
   * @param statistic Wald's statistic in its F form with the clustered covariance; NaN where that
   *     is singular
   * @param draws the draws that had a statistic
   * @param weights {@code webb} (six points) or {@code rademacher} (two)
   * @param p the p-value; NaN where there is none
   * @param verdict in a sentence
   */
  public record Wild(
      String name,
      String nullHypothesis,
      double statistic,
      int draws,
      String weights,
      double p,
      String verdict) {}

  /**
   * The cut-offs of Belsley, Kuh and Welsch, and the rows beyond.
   *
   * @param leverage cut-off of the leverage
   * @param deletedResidual of the externally studentised residual, in absolute value
   * @param dffits of DFFITS, in absolute value
   * @param dfbetas of DFBETAS, in absolute value
   * @param covarianceRatio of the distance of the covariance ratio from one
   * @param several how many of the five a row must be beyond to be named
   * @param rows how many rows are
   */
  public record Beyond(
      double leverage,
      double deletedResidual,
      double dffits,
      double dfbetas,
      double covarianceRatio,
      int several,
      int rows) {}

  /**
   * The cross-check by Huber's M estimate.
   *
   * @param scale the scale of the residuals, in logs
   * @param lessened how many rows count for less
   * @param rows how many rows there are
   * @param compared figures beside those by least squares
   */
  public record Huber(double scale, int lessened, int rows, List<Compared> compared) {
    /** Copies the list. */
    public Huber {
      compared = List.copyOf(compared);
    }
  }

  /**
   * A figure by both.
   *
   * @param figure what it is, such as {@code output elasticity of labour}
   * @param value by least squares
   * @param huber by Huber's M estimate
   * @param apart the difference in standard errors of the figure by least squares
   */
  public record Compared(String figure, double value, double huber, double apart) {}
}
