package isowright.estimation;

import java.util.List;
import java.util.Locale;

/**
 * The profile of the sum of squares over a curvature parameter: for each value of it the least sum
 * of squares over all other parameters.
 *
 * <p>The interval of the elasticity of substitution holds the values with SSR ≤ SSR_min (1 + r F(1,
 * df)/df), the set that a likelihood-ratio test does not reject; r scales the test for a covariance
 * other than the classical one (Kent 1982, <i>Biometrika</i> 69, 19–27).
 *
 * @param name the name of the curvature among the parameters, such as {@code rho}
 * @param state where the optimum lies
 * @param points by ascending curvature
 * @param best the curvature with the least sum of squares found in the region
 * @param substitutionLow lower end of the interval of σ; 0 where open below
 * @param substitutionHigh upper end; +∞ where open above
 * @param threshold the sum of squares at the ends of the interval
 * @param scaling r
 */
public record CurvatureProfile(
    String name,
    State state,
    List<Point> points,
    double best,
    double substitutionLow,
    double substitutionHigh,
    double threshold,
    double scaling) {

  /** Where the optimum lies. */
  public enum State {
    /** Inside the economic region, with an interval that is closed on both sides. */
    INTERIOR,
    /** The sum of squares still falls at the edge of the economic region: there is no optimum. */
    BOUNDARY,
    /** Inside, but the interval reaches an edge of the region: a set of values, not a point. */
    FLAT;

    /** The word used in files. */
    public String word() {
      return name().toLowerCase(Locale.ROOT);
    }
  }

  /**
   * A point of the profile.
   *
   * @param curvature ρ
   * @param substitution σ
   * @param ssr the sum of squares
   */
  public record Point(double curvature, double substitution, double ssr) {}

  /** Copies the points. */
  public CurvatureProfile {
    points = List.copyOf(points);
  }
}
