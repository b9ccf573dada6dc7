package isowright.estimation;

import isowright.estimation.ProfileSearch.Held;
import isowright.regression.NonlinearFit;
import isowright.regression.NonlinearLeastSquares;
import isowright.technology.NonlinearForm;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;
import java.util.stream.IntStream;

/**
 * Several curvatures: all of them are held at every point of a coarse lattice and then freed from
 * its lowest points; from the best optimum each curvature in turn is walked along its grid while
 * the others are free.
 *
 * <p>Along a profile every point is fitted twice, from its neighbour and from the lowest point of
 * the lattice that is nearest in the curvature walked, because the others may change valleys.
 */
final class SeveralCurvatures implements CurvatureSearch {

  /** Elasticities of substitution of the lattice for two curvatures: 25 points. */
  private static final double[] FINE = {0.15, 0.4, 0.8, 1.5, 4};

  /** The same for three and more: 27 points, 81 points. */
  private static final double[] COARSE = {0.2, 0.7, 2.5};

  /** So many of the lowest points of the lattice are freed. */
  private static final int FREED = 8;

  /** Evaluations at a point of the lattice: valleys are seen long before parameters settle. */
  private static final int EVALUATIONS = 12;

  /** How much lower than the optimum a point of a profile must lie to be another valley. */
  private static final double OTHER_VALLEY = 1e-7;

  private final ProfiledProblem problem;
  private final ProfiledProblem few;
  private final double[] start;
  private final boolean large;
  private final int count;

  /** A point of the lattice, with all parameters as a free search has them. */
  private record Point(double[] curvatures, double[] all, double ssr) {}

  /**
   * @param few the same problem on so many rows as a walk needs, or the problem itself
   * @param start constant (if any), inner parameters, circumstances
   */
  SeveralCurvatures(ProfiledProblem problem, ProfiledProblem few, double[] start) {
    this.problem = problem;
    this.few = few;
    this.start = start.clone();
    this.large = few != problem;
    this.count = problem.curvatures();
  }

  @Override
  public Found search() {
    List<Point> lattice = lattice();
    Optional<NonlinearFit> best = optimum(few, lattice.subList(0, Math.min(FREED, lattice.size())));
    List<Profiled> walked = profiles(few, best, lattice);
    Optional<Profiled> lower = lower(best, walked);
    if (lower.isPresent()) {
      Optional<NonlinearFit> second =
          CurvatureSearch.best(
              few,
              SingleCurvature.minima(lower.get().points()).parallelStream()
                  .map(lower.get().search()::release)
                  .toList());
      if (second.isPresent() && (best.isEmpty() || second.get().ssr() < best.get().ssr())) {
        best = second;
        walked = profiles(few, best, lattice);
      }
    }
    return large ? onAllRows(best, walked) : new Found(best, walked);
  }

  @Override
  public double leastSsr() {
    Found found = search();
    double held = found.profiles().stream().mapToDouble(Profiled::least).min().orElseThrow();
    return found.best().map(fit -> Math.min(held, fit.ssr())).orElse(held);
  }

  /** Every combination of a few elasticities of substitution, the lowest sum of squares first. */
  private List<Point> lattice() {
    double[] values = count == 2 ? FINE : COARSE;
    int size = (int) Math.round(Math.pow(values.length, count));
    return IntStream.range(0, size)
        .parallel()
        .mapToObj(at -> point(values, at))
        .filter(point -> Double.isFinite(point.ssr()))
        .sorted(Comparator.comparingDouble(Point::ssr))
        .toList();
  }

  private Point point(double[] values, int at) {
    NonlinearForm form = problem.form();
    double[] curvatures = new double[count];
    for (int k = 0, rest = at; k < count; k++, rest /= values.length) {
      curvatures[k] = form.curvature(values[rest % values.length]);
    }
    NonlinearFit fit =
        NonlinearLeastSquares.fit(
            few.holding(curvatures),
            start,
            NonlinearLeastSquares.Settings.STANDARD.withMostEvaluations(EVALUATIONS));
    ProfiledModel free = few.free();
    int place = few.place();
    double[] held = fit.parameters();
    double[] all = new double[held.length + count];
    System.arraycopy(held, 0, all, 0, place);
    for (int k = 0; k < count; k++) {
      all[place + k] = free.searched(curvatures[k]);
    }
    System.arraycopy(held, place, all, place + count, held.length - place);
    return new Point(curvatures, all, fit.ssr());
  }

  private static Optional<NonlinearFit> optimum(ProfiledProblem problem, List<Point> from) {
    List<NonlinearFit> optima =
        from.parallelStream()
            .map(point -> NonlinearLeastSquares.fit(problem.free(), point.all()))
            .toList();
    return CurvatureSearch.best(problem, optima);
  }

  /**
   * Every curvature's profile, walked from the optimum, or from the lattice where there is none.
   */
  private List<Profiled> profiles(
      ProfiledProblem rows, Optional<NonlinearFit> best, List<Point> lattice) {
    double[] from = best.map(NonlinearFit::parameters).orElse(lattice.get(0).all());
    double ssr = best.map(NonlinearFit::ssr).orElse(lattice.get(0).ssr());
    double[] curvatures = rows.free().curvatures(from);
    List<Profiled> profiles = new ArrayList<>();
    for (int k = 0; k < count; k++) {
      int which = k;
      ProfileSearch search = new ProfileSearch(rows, k, start, false);
      Held point = new Held(curvatures[k], search.withoutCurvature(from), ssr, best.isPresent());
      profiles.add(
          new Profiled(
              search,
              search.walk(
                  point, at -> search.withoutCurvature(nearest(lattice, which, at).all()))));
    }
    return profiles;
  }

  /** The lowest of those points of the lattice that are nearest in one curvature. */
  private Point nearest(List<Point> lattice, int which, double curvature) {
    double wanted = Math.log(problem.form().substitution(curvature));
    Comparator<Point> near =
        Comparator.comparingDouble(
            point ->
                Math.abs(
                    Math.log(problem.form().substitution(point.curvatures()[which])) - wanted));
    // Equally far points keep their order, which is that of their sums of squares.
    return lattice.stream().min(near).orElseThrow();
  }

  /** A profile that passes through a lower valley than the optimum's. */
  private static Optional<Profiled> lower(Optional<NonlinearFit> best, List<Profiled> profiles) {
    double least = best.map(NonlinearFit::ssr).orElse(Double.POSITIVE_INFINITY);
    return profiles.stream()
        .filter(profile -> profile.least() < least * (1 - OTHER_VALLEY))
        .min(Comparator.comparingDouble(Profiled::least));
  }

  /** Optimum and profiles made again on all rows, as far as they matter. */
  private Found onAllRows(Optional<NonlinearFit> best, List<Profiled> walked) {
    List<Profiled> profiles = new ArrayList<>();
    for (int k = 0; k < count; k++) {
      ProfileSearch search = new ProfileSearch(problem, k, start, true);
      profiles.add(
          new Profiled(
              search,
              SingleCurvature.repeatOnAllRows(
                  search, walked.get(k).points(), problem.rows().count())));
    }
    List<NonlinearFit> optima = new ArrayList<>();
    best.ifPresent(fit -> optima.add(NonlinearLeastSquares.fit(problem.free(), fit.parameters())));
    if (best.isEmpty()) {
      profiles.forEach(profile -> optima.add(profile.search().release(profile.lowest())));
    }
    return new Found(CurvatureSearch.best(problem, optima), profiles);
  }
}
