package isowright.estimation;

import isowright.records.Panel;
import isowright.regression.Covariance;
import isowright.regression.Design;
import isowright.regression.FitStatistics;
import isowright.regression.LeastSquares;
import isowright.regression.LinearFit;
import isowright.regression.NonlinearFit;
import isowright.technology.Technology;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;

/**
 * From the optimum of a nonlinear form to the numbers of a fit: technology, covariance of its
 * parameters, plants' levels, and the state of every curvature.
 */
final class ProfiledSolution {

  private final Panel panel;
  private final Specification specification;
  private final double[] base;
  private final ProfiledProblem problem;

  ProfiledSolution(
      Panel panel, Specification specification, double[] base, ProfiledProblem problem) {
    this.panel = panel;
    this.specification = specification;
    this.base = base;
    this.problem = problem;
  }

  /** The fit at an optimum, with the profiles of its curvatures. */
  Fit fit(NonlinearFit best, List<CurvatureSearch.Profiled> profiles, double totalSumOfSquares) {
    LinearFit linear = best.linearisation();
    Optional<Fit> lacking =
        LinearEstimation.lacking(panel, specification, base, linear, RowsUsed.Kind.EACH);
    if (lacking.isPresent()) {
      return lacking.get();
    }
    Design design = problem.free().linearisedAt(best.parameters());
    Covariance covariance =
        Covariance.estimate(
            design,
            linear,
            LinearEstimation.kind(specification.standardErrors()),
            problem.rows().times());
    Solution solution = solution(best, design, covariance, totalSumOfSquares);
    List<CurvatureProfile> described = new ArrayList<>();
    boolean flat = false;
    for (int k = 0; k < profiles.size(); k++) {
      CurvatureSearch.Profiled profiled = profiles.get(k);
      int place = problem.place() + k;
      double classical = linear.residualVariance() * linear.inverseCrossProduct()[place][place];
      double scaling = covariance.matrix()[place][place] / classical;
      ProfileSearch.Held top = profiled.search().point(best);
      ProfileInterval interval =
          ProfileInterval.around(
              profiled,
              top,
              linear.residualDegreesOfFreedom(),
              specification.confidence(),
              scaling);
      flat |= interval.insideState() == CurvatureProfile.State.FLAT;
      described.add(interval.profile(profiled.points(), top, interval.insideState()));
    }
    return new Fit(
        specification,
        panel,
        base,
        flat ? Fit.State.FLAT : Fit.State.ESTIMATED,
        List.of(),
        Optional.of(solution),
        described);
  }

  private Solution solution(
      NonlinearFit best, Design design, Covariance covariance, double totalSumOfSquares) {
    ProfiledModel model = problem.free();
    double[] all = best.parameters();
    LinearFit linear = best.linearisation();
    boolean within = problem.within();
    double[] inner = model.inner(all);
    double[] curvatures = model.curvatures(all);
    double[][] toReported = toReported(model, inner, curvatures);
    int columns = linear.columns().size();
    Design raw = model.rawAt(all);
    PlantLevels levels =
        new PlantLevels(
            raw,
            new double[columns],
            covariance.matrix(),
            PlantLevels.level(columns, !within, 0),
            size -> 1,
            linear.residualVariance(),
            toReported);
    double constant = within ? levels.typical() : all[0];
    double[][] reported =
        within
            ? levels.covariance(levels.weights(new Productivity.Typical()))
            : Matrices.sandwich(toReported, covariance.matrix());
    Technology technology =
        problem.form().technology(panel.inputs(), base, constant, inner, curvatures);
    return new Solution(
        technology,
        names(technology),
        withCircumstances(technology, all),
        reported,
        covariance,
        FitStatistics.of(linear, totalSumOfSquares),
        design,
        linear,
        LeastSquares.residuals(design, linear),
        levels,
        Treatment.none(raw),
        all);
  }

  private List<String> names(Technology technology) {
    List<String> names = new ArrayList<>(technology.parameterNames());
    names.addAll(problem.circumstances().names());
    return List.copyOf(names);
  }

  private double[] withCircumstances(Technology technology, double[] all) {
    double[] own = technology.parameters();
    int count = problem.circumstances().count();
    double[] parameters = Arrays.copyOf(own, own.length + count);
    System.arraycopy(all, all.length - count, parameters, own.length, count);
    return parameters;
  }

  /** Reported parameters by free ones (constant, inner, curvatures, circumstances). */
  private double[][] toReported(ProfiledModel model, double[] inner, double[] curvatures) {
    double[][] core = problem.form().reported(inner, curvatures);
    for (double[] row : core) {
      for (int c = 0; c < curvatures.length; c++) {
        row[1 + inner.length + c] *= model.slope(curvatures[c]);
      }
    }
    return Matrices.extended(core, problem.circumstances().count());
  }
}
