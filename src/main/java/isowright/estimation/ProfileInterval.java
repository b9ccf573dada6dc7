package isowright.estimation;

import isowright.technology.NonlinearForm;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import org.apache.commons.statistics.distribution.FDistribution;

/**
 * The interval of the elasticity of substitution from the profile of the sum of squares: where SSR
 * ≤ SSR_min (1 + r F(1, df)/df).
 */
final class ProfileInterval {

  /**
   * An end of the interval is met where SSR is this near the threshold, as a part of threshold less
   * SSR_min: then the end is off by about half of that part of the interval's half-width, which no
   * printed digit shows.
   */
  private static final double PRECISION = 1e-3;

  private static final int STEPS = 60;

  private final ProfileSearch search;
  private final NonlinearForm form;
  private final double least;
  private final double threshold;
  private final double scaling;
  private final List<ProfileSearch.Held> added = new ArrayList<>();
  private double low;
  private double high;

  private ProfileInterval(ProfileSearch search, double least, double threshold, double scaling) {
    this.search = search;
    this.form = search.problem().form();
    this.least = least;
    this.threshold = threshold;
    this.scaling = scaling;
  }

  /**
   * Finds the interval.
   *
   * @param profiled the profile on the form's grid and the search that made it
   * @param top the point with the least sum of squares
   * @param degreesOfFreedom df, of the fit with the curvature free
   * @param scaling r
   */
  static ProfileInterval around(
      CurvatureSearch.Profiled profiled,
      ProfileSearch.Held top,
      double degreesOfFreedom,
      double confidence,
      double scaling) {
    double quantile =
        FDistribution.of(1, degreesOfFreedom).inverseCumulativeProbability(confidence);
    double threshold = top.ssr() * (1 + scaling * quantile / degreesOfFreedom);
    ProfileInterval interval =
        new ProfileInterval(profiled.search(), top.ssr(), threshold, scaling);
    List<ProfileSearch.Held> profile = profiled.points();
    List<ProfileSearch.Held> above =
        profile.stream().filter(held -> held.curvature() > top.curvature()).toList();
    List<ProfileSearch.Held> below =
        profile.stream()
            .filter(held -> held.curvature() < top.curvature())
            .sorted(Comparator.comparingDouble(ProfileSearch.Held::curvature).reversed())
            .toList();
    interval.low = interval.end(top, above, 0);
    interval.high = interval.end(top, below, Double.POSITIVE_INFINITY);
    return interval;
  }

  /** Whether the interval of σ reaches down to no substitution at all. */
  boolean openBelow() {
    return low == 0;
  }

  /** Whether the interval of σ reaches up to perfect substitution. */
  boolean openAbove() {
    return Double.isInfinite(high);
  }

  /** The state of a profile whose optimum lies inside the region. */
  CurvatureProfile.State insideState() {
    return openBelow() || openAbove()
        ? CurvatureProfile.State.FLAT
        : CurvatureProfile.State.INTERIOR;
  }

  /** The profile described, with the points found on the way. */
  CurvatureProfile profile(
      List<ProfileSearch.Held> grid, ProfileSearch.Held top, CurvatureProfile.State state) {
    List<ProfileSearch.Held> all = new ArrayList<>(grid);
    all.addAll(added);
    all.add(top);
    List<CurvatureProfile.Point> points =
        all.stream()
            .map(
                held ->
                    new CurvatureProfile.Point(
                        held.curvature(), form.substitution(held.curvature()), held.ssr()))
            .distinct()
            .sorted(Comparator.comparingDouble(CurvatureProfile.Point::curvature))
            .toList();
    return new CurvatureProfile(
        search.name(), state, points, top.curvature(), low, high, threshold, scaling);
  }

  /** Walks outward to the first grid point above the threshold and closes in on the crossing. */
  private double end(ProfileSearch.Held top, List<ProfileSearch.Held> outward, double open) {
    ProfileSearch.Held inside = top;
    for (ProfileSearch.Held held : outward) {
      if (held.ssr() > threshold) {
        return crossing(inside, held);
      }
      inside = held;
    }
    return open;
  }

  /**
   * The crossing between a point inside and one outside, by false position in √(SSR − SSR_min),
   * which is nearly straight along the curvature, with bisection as the safeguard.
   */
  private double crossing(ProfileSearch.Held inside, ProfileSearch.Held outside) {
    ProfileSearch.Held in = inside;
    ProfileSearch.Held out = outside;
    for (int step = 0; step < STEPS; step++) {
      double nearRoot = Math.sqrt(Math.max(in.ssr() - least, 0));
      double farRoot = Math.sqrt(out.ssr() - least);
      double part = (Math.sqrt(threshold - least) - nearRoot) / (farRoot - nearRoot);
      double share = step % 4 == 3 ? 0.5 : Math.min(Math.max(part, 0.01), 0.99);
      double curvature = in.curvature() + share * (out.curvature() - in.curvature());
      ProfileSearch.Held middle = search.hold(curvature, between(in, out, share));
      added.add(middle);
      if (Math.abs(middle.ssr() - threshold) <= PRECISION * (threshold - least)) {
        return form.substitution(middle.curvature());
      }
      if (middle.ssr() > threshold) {
        out = middle;
      } else {
        in = middle;
      }
    }
    return form.substitution(in.curvature());
  }

  /** The other parameters hardly bend along the profile, so their start is on the straight line. */
  private static double[] between(ProfileSearch.Held in, ProfileSearch.Held out, double share) {
    double[] start = in.parameters().clone();
    for (int k = 0; k < start.length; k++) {
      start[k] += share * (out.parameters()[k] - start[k]);
    }
    return start;
  }
}
