package isowright.estimation;

import isowright.records.Panel;
import isowright.regression.NonlinearFit;
import isowright.regression.NonlinearLeastSquares;
import isowright.technology.ProfiledForm;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.OptionalDouble;

/**
 * Walks a profiled form's sum of squares along its curvature on one set of rows.
 *
 * <p>A start near ρ = 0 can stop at the Cobb-Douglas value and look converged, so the curvature is
 * held at each point of a grid in turn, the rest is fitted there (from the neighbour's answer, and
 * from the linear limit where that fails), and the curvature is freed from every point so found.
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

  /** A profile point: everything but the curvature, fitted at a held curvature. */
  record Held(double curvature, double[] parameters, double ssr, boolean converged) {}

  private final PanelRows rows;
  private final ProfiledForm form;
  private final List<String> inputs;
  private final Circumstances circumstances;
  private final boolean within;
  private final double[] limitStart;
  private final NonlinearLeastSquares.Settings near;

  /**
   * @param limitStart constant (if any), inner parameters and circumstances to start from
   * @param large whether the rows are many, and starts near
   */
  ProfileSearch(
      Panel panel,
      double[] base,
      ProfiledForm form,
      Circumstances circumstances,
      boolean within,
      double[] limitStart,
      boolean large) {
    this.rows = PanelRows.of(panel, base);
    this.form = form;
    this.inputs = panel.inputs();
    this.circumstances = circumstances;
    this.within = within;
    this.limitStart = limitStart.clone();
    this.near =
        NonlinearLeastSquares.Settings.STANDARD.withMostEvaluations(
            large ? EVALUATIONS_OF_MANY : EVALUATIONS);
  }

  /** The model with the curvature free. */
  ProfiledModel free() {
    return model(OptionalDouble.empty());
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
        NonlinearLeastSquares.fit(model(OptionalDouble.of(curvature)), start, settings);
    return new Held(curvature, fit.parameters(), fit.ssr(), fit.converged());
  }

  /**
   * From a neighbour's answer; where that does not converge, the better of it and the linear limit.
   */
  Held holdFromNeighbour(double curvature, double[] neighbour) {
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
    double[] grid = form.grid();
    int middle = 0;
    for (int g = 0; g < grid.length; g++) {
      if (Math.abs(grid[g]) < Math.abs(grid[middle])) {
        middle = g;
      }
    }
    Held centre = hold(grid[middle]);
    int first = middle;
    List<List<Held>> wings =
        List.of(-1, 1).parallelStream().map(step -> wing(grid, first, step, centre)).toList();
    List<Held> profile = new ArrayList<>(wings.get(0));
    profile.add(centre);
    profile.addAll(wings.get(1));
    profile.sort(Comparator.comparingDouble(Held::curvature));
    return profile;
  }

  /** The points of the grid on one side, each started from its inner neighbour. */
  private List<Held> wing(double[] grid, int middle, int step, Held centre) {
    List<Held> wing = new ArrayList<>();
    Held held = centre;
    for (int g = middle + step; g >= 0 && g < grid.length; g += step) {
      held = holdFromNeighbour(grid[g], held.parameters());
      wing.add(held);
    }
    return wing;
  }

  /** Frees the curvature, starting from a profile point. */
  NonlinearFit release(Held held) {
    ProfiledModel model = free();
    int place = model.innerOffset() + form.innerNames(inputs).size();
    double[] start = new double[held.parameters().length + 1];
    System.arraycopy(held.parameters(), 0, start, 0, place);
    start[place] = held.curvature();
    System.arraycopy(held.parameters(), place, start, place + 1, held.parameters().length - place);
    return NonlinearLeastSquares.fit(model, start);
  }

  /** A free fit's parameters without the curvature: a start for holding it near there. */
  double[] withoutCurvature(double[] all) {
    int place = free().innerOffset() + form.innerNames(inputs).size();
    double[] rest = new double[all.length - 1];
    System.arraycopy(all, 0, rest, 0, place);
    System.arraycopy(all, place + 1, rest, place, rest.length - place);
    return rest;
  }

  private ProfiledModel model(OptionalDouble curvature) {
    return new ProfiledModel(rows, form, inputs, circumstances, within, curvature);
  }
}
