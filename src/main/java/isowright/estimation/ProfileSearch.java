package isowright.estimation;

import isowright.regression.NonlinearFit;
import isowright.regression.NonlinearLeastSquares;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.function.DoubleFunction;

/**
 * Walks a nonlinear form's sum of squares along one of its curvatures on one set of rows.
 *
 * <p>A start near ρ = 0 can stop at the Cobb-Douglas value and look converged, so the curvature is
 * held at each point of a grid in turn, the rest is fitted there (from the neighbour's answer, and
 * from another start where that fails), and the curvature is freed from every point so found.
 */
final class ProfileSearch {

  /**
   * Evaluations at a held curvature from a near start: steps close in quadratically, so that eight
   * leave nothing; where they do not suffice, the linear limit is tried without a bound.
   */
  private static final int EVALUATIONS = 8;

  /**
   * The same where each evaluation reads many rows: the start is the answer on a part of the rows
   * or on the line between neighbours, and two steps leave nothing that a profile shows.
   */
  private static final int EVALUATIONS_OF_MANY = 3;

  /**
   * The same where other curvatures are free: one of them may run to the edge of its region, where
   * the sum of squares settles long before the curvature does.
   */
  private static final int EVALUATIONS_OF_SEVERAL = 30;

  /** A profile point: everything but the curvature, fitted at a held curvature. */
  record Held(double curvature, double[] parameters, double ssr, boolean converged) {}

  private final ProfiledProblem problem;
  private final int which;
  private final double[] limitStart;
  private final NonlinearLeastSquares.Settings near;

  /**
   * @param which the curvature that is walked
   * @param limitStart constant (if any), inner parameters, the other curvatures as they are
   *     searched, and circumstances to start from
   * @param large whether the rows are many, and starts near
   */
  ProfileSearch(ProfiledProblem problem, int which, double[] limitStart, boolean large) {
    this.problem = problem;
    this.which = which;
    this.limitStart = limitStart.clone();
    int evaluations = large ? EVALUATIONS_OF_MANY : EVALUATIONS;
    this.near =
        NonlinearLeastSquares.Settings.STANDARD.withMostEvaluations(
            problem.curvatures() > 1 ? EVALUATIONS_OF_SEVERAL : evaluations);
  }

  /** The problem whose curvature is walked. */
  ProfiledProblem problem() {
    return problem;
  }

  /** The name of the curvature that is walked. */
  String name() {
    return problem.form().curvatureNames(problem.inputs()).get(which);
  }

  /** Fits all but the curvature from a near start. */
  Held hold(double curvature, double[] start) {
    return hold(curvature, start, near);
  }

  /** Fits all but the curvature from the linear limit, however long it takes. */
  Held hold(double curvature) {
    return hold(curvature, limitStart, NonlinearLeastSquares.Settings.STANDARD);
  }

  private Held hold(double curvature, double[] start, NonlinearLeastSquares.Settings settings) {
    NonlinearFit fit =
        NonlinearLeastSquares.fit(problem.holding(which, curvature), start, settings);
    return new Held(curvature, fit.parameters(), fit.ssr(), fit.converged());
  }

  /**
   * From a neighbour's answer; where that does not converge, the better of it and the linear limit.
   */
  private Held holdFromNeighbour(double curvature, double[] neighbour) {
    Held first = hold(curvature, neighbour);
    if (first.converged()) {
      return first;
    }
    Held second = hold(curvature);
    return second.ssr() < first.ssr() ? second : first;
  }

  /**
   * The profile over the form's grid, ascending, walked outward from the point nearest the limit.
   */
  List<Held> walk() {
    return walk(0, this::hold, this::holdFromNeighbour);
  }

  /**
   * The profile over the form's grid, ascending, walked outward from a point already found; at each
   * point of the grid the better of the neighbour's answer and a start of its own is kept.
   *
   * @param start a start for a held curvature
   */
  List<Held> walk(Held from, DoubleFunction<double[]> start) {
    return walk(
        from.curvature(),
        curvature -> hold(curvature, from.parameters()),
        (curvature, neighbour) -> {
          Held first = hold(curvature, neighbour);
          Held second = hold(curvature, start.apply(curvature));
          return second.ssr() < first.ssr() ? second : first;
        });
  }

  /** How a point is fitted from its neighbour. */
  @FunctionalInterface
  private interface Next {
    Held at(double curvature, double[] neighbour);
  }

  private List<Held> walk(double from, DoubleFunction<Held> first, Next next) {
    double[] grid = problem.form().grid();
    int middle = 0;
    for (int g = 0; g < grid.length; g++) {
      if (Math.abs(grid[g] - from) < Math.abs(grid[middle] - from)) {
        middle = g;
      }
    }
    Held centre = first.apply(grid[middle]);
    int place = middle;
    List<List<Held>> wings =
        List.of(-1, 1).parallelStream().map(step -> wing(grid, place, step, centre, next)).toList();
    List<Held> profile = new ArrayList<>(wings.get(0));
    profile.add(centre);
    profile.addAll(wings.get(1));
    profile.sort(Comparator.comparingDouble(Held::curvature));
    return profile;
  }

  /** The points of the grid on one side, each started from its inner neighbour. */
  private static List<Held> wing(double[] grid, int middle, int step, Held centre, Next next) {
    List<Held> wing = new ArrayList<>();
    Held held = centre;
    for (int g = middle + step; g >= 0 && g < grid.length; g += step) {
      held = next.at(grid[g], held.parameters());
      wing.add(held);
    }
    return wing;
  }

  /** Frees the curvature, starting from a profile point. */
  NonlinearFit release(Held held) {
    ProfiledModel model = problem.free();
    int place = problem.place() + which;
    double[] start = new double[held.parameters().length + 1];
    System.arraycopy(held.parameters(), 0, start, 0, place);
    start[place] = model.searched(held.curvature());
    System.arraycopy(held.parameters(), place, start, place + 1, held.parameters().length - place);
    return NonlinearLeastSquares.fit(model, start);
  }

  /** A free fit's point: a start for holding the curvature near there. */
  Held point(NonlinearFit fit) {
    double[] all = fit.parameters();
    return new Held(
        problem.free().curvatures(all)[which], withoutCurvature(all), fit.ssr(), fit.converged());
  }

  /** A free fit's parameters without the curvature. */
  double[] withoutCurvature(double[] all) {
    int place = problem.place() + which;
    double[] rest = new double[all.length - 1];
    System.arraycopy(all, 0, rest, 0, place);
    System.arraycopy(all, place + 1, rest, place, rest.length - place);
    return rest;
  }
}
