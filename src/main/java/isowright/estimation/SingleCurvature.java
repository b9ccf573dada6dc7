package isowright.estimation;

import isowright.estimation.ProfileSearch.Held;
import isowright.regression.NonlinearFit;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;

/**
 * One curvature: its sum of squares is walked along a grid, and the curvature is freed from the
 * valleys found.
 */
final class SingleCurvature implements CurvatureSearch {

  /**
   * In units of SSR/N: the threshold of an interval is a quantile of F(1, ∞), some 4 to 11, times
   * the scaling for a covariance other than the classical one; a hundred is beyond it.
   */
  private static final double BEYOND = 100;

  private final ProfiledProblem problem;
  private final ProfileSearch search;
  private final ProfileSearch walker;
  private final boolean large;

  /**
   * @param few the same problem on so many rows as a walk needs, or the problem itself
   */
  SingleCurvature(ProfiledProblem problem, ProfiledProblem few, double[] start) {
    this.problem = problem;
    this.large = few != problem;
    this.search = new ProfileSearch(problem, 0, start, large);
    this.walker = large ? new ProfileSearch(few, 0, start, false) : search;
  }

  @Override
  public Found search() {
    List<Held> walked = walker.walk();
    List<Held> profile = large ? repeatOnAllRows(search, walked, problem.rows().count()) : walked;
    List<Held> starts = large ? minima(walked) : walked;
    return new Found(
        CurvatureSearch.best(problem, freed(starts)), List.of(new Profiled(search, profile)));
  }

  @Override
  public double leastSsr() {
    List<Held> minima = minima(walker.walk());
    double held =
        minima.stream()
            .mapToDouble(m -> search.hold(m.curvature(), m.parameters()).ssr())
            .min()
            .orElseThrow();
    return CurvatureSearch.best(problem, freed(minima))
        .map(fit -> Math.min(held, fit.ssr()))
        .orElse(held);
  }

  private List<NonlinearFit> freed(List<Held> starts) {
    return starts.parallelStream().map(search::release).toList();
  }

  /**
   * A walked profile, made again on all rows where it matters: at its minima, and from the lowest
   * of them outward on both sides until the sum of squares is beyond any interval.
   */
  static List<Held> repeatOnAllRows(ProfileSearch search, List<Held> walked, int rows) {
    List<Held> repeated = new ArrayList<>();
    int lowest = -1;
    double least = Double.POSITIVE_INFINITY;
    for (Held minimum : minima(walked)) {
      Held held = search.hold(minimum.curvature(), minimum.parameters());
      repeated.add(held);
      if (held.ssr() < least) {
        least = held.ssr();
        lowest = walked.indexOf(minimum);
      }
    }
    for (int step : new int[] {-1, 1}) {
      double ssr = least;
      for (int g = lowest + step;
          g >= 0 && g < walked.size() && ssr <= least * (1 + BEYOND / rows);
          g += step) {
        Held near = walked.get(g);
        Held held = search.hold(near.curvature(), near.parameters());
        ssr = held.ssr();
        if (repeated.stream().noneMatch(other -> other.curvature() == held.curvature())) {
          repeated.add(held);
        }
      }
    }
    repeated.sort(Comparator.comparingDouble(Held::curvature));
    return repeated;
  }

  /** The points of a profile that are no higher than their neighbours. */
  static List<Held> minima(List<Held> profile) {
    List<Held> minima = new ArrayList<>();
    for (int g = 0; g < profile.size(); g++) {
      double here = profile.get(g).ssr();
      boolean left = g == 0 || here <= profile.get(g - 1).ssr();
      boolean right = g == profile.size() - 1 || here <= profile.get(g + 1).ssr();
      if (left && right) {
        minima.add(profile.get(g));
      }
    }
    return minima;
  }
}
