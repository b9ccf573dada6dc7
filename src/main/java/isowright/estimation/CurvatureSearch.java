package isowright.estimation;

import isowright.records.Panel;
import isowright.regression.NonlinearFit;
import isowright.regression.NonlinearLeastSquares;
import isowright.technology.NonlinearForm;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;

/**
 * How the best parameters of a nonlinear form are looked for, given how many curvatures it has:
 * none, one or several.
 */
interface CurvatureSearch {

  /**
   * Above this many rows grids are walked on every k-th plant; every local minimum found is then
   * polished on all rows. The walk only has to find the valleys.
   */
  int WALK_ROWS = 5_000;

  /** One curvature's profile, ascending, and the search that made it. */
  record Profiled(ProfileSearch search, List<ProfileSearch.Held> points) {

    /** The least sum of squares of the profile. */
    double least() {
      return lowest().ssr();
    }

    /** The point of the least sum of squares. */
    ProfileSearch.Held lowest() {
      return points.stream().min(Comparator.comparingDouble(ProfileSearch.Held::ssr)).orElseThrow();
    }
  }

  /**
   * What was found.
   *
   * @param best the best converged optimum inside the economic region
   * @param profiles one for each curvature, in the form's order
   */
  record Found(Optional<NonlinearFit> best, List<Profiled> profiles) {}

  /** Looks for the best parameters and profiles every curvature. */
  Found search();

  /** The least sum of squares in the economic region, with nothing else worked out. */
  double leastSsr();

  /**
   * The search for a form.
   *
   * @param starts constant (if any), inner parameters and circumstances to start from
   */
  static CurvatureSearch of(
      Panel panel,
      Specification specification,
      double[] base,
      NonlinearForm form,
      List<double[]> starts) {
    ProfiledProblem all = ProfiledProblem.of(panel, specification, base, form);
    boolean large = panel.rows() > 2 * WALK_ROWS;
    ProfiledProblem few =
        large
            ? ProfiledProblem.of(ThinnedPanel.of(panel, WALK_ROWS), specification, base, form)
            : all;
    return switch (all.curvatures()) {
      case 0 -> new WithoutCurvature(all, starts);
      case 1 -> new SingleCurvature(all, few, starts.get(0));
      default -> new SeveralCurvatures(all, few, starts.get(0));
    };
  }

  /**
   * The best of some optima: converged, inner parameters admissible, every curvature inside the
   * region and no further out than the grid.
   */
  static Optional<NonlinearFit> best(ProfiledProblem problem, List<NonlinearFit> optima) {
    ProfiledModel model = problem.free();
    return optima.stream()
        .filter(NonlinearFit::converged)
        .filter(fit -> problem.form().admissible(model.inner(fit.parameters())))
        .filter(fit -> inside(problem.form(), model.curvatures(fit.parameters())))
        .min(Comparator.comparingDouble(NonlinearFit::ssr));
  }

  private static boolean inside(NonlinearForm form, double[] curvatures) {
    double[] region = form.region();
    double[] grid = form.grid();
    // With several curvatures the straight isoquant lies infinitely far out and is never reached.
    double straight = curvatures.length > 1 ? Math.max(region[0], grid[1]) : region[0];
    for (double curvature : curvatures) {
      if (!(curvature > straight && curvature <= grid[grid.length - 1])) {
        return false;
      }
    }
    return true;
  }

  /** A form without a curvature: the best of the optima found from its starts. */
  record WithoutCurvature(ProfiledProblem problem, List<double[]> starts)
      implements CurvatureSearch {

    @Override
    public Found search() {
      List<NonlinearFit> optima =
          starts.parallelStream()
              .map(start -> NonlinearLeastSquares.fit(problem.free(), start))
              .toList();
      return new Found(best(problem, optima), List.of());
    }

    @Override
    public double leastSsr() {
      return search().best().map(NonlinearFit::ssr).orElse(Double.NaN);
    }
  }
}
