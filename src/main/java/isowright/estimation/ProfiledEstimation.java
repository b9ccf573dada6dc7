package isowright.estimation;

import isowright.records.Panel;
import isowright.regression.Effects;
import isowright.regression.LeastSquares;
import isowright.regression.LinearFit;
import isowright.regression.NonlinearLeastSquares;
import isowright.technology.NonlinearForm;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;

/**
 * Fits a form that is not linear in its parameters: its sum of squares is profiled along each of
 * its curvatures, and the best admissible optimum is kept, if there is one.
 */
final class ProfiledEstimation {

  /** How much better than the best held point a free optimum must at least be, relative. */
  private static final double SAME = 1e-9;

  private final Panel panel;
  private final Specification specification;
  private final double[] base;
  private final NonlinearForm form;
  private final ProfiledProblem problem;
  private final int count;

  ProfiledEstimation(Panel panel, Specification specification, double[] base, NonlinearForm form) {
    this.panel = panel;
    this.specification = specification;
    this.base = base;
    this.form = form;
    this.problem = ProfiledProblem.of(panel, specification, base, form);
    this.count = problem.curvatures();
  }

  Fit fit() {
    LinearFit limit = limitFit();
    Optional<Fit> lacking =
        LinearEstimation.lacking(panel, specification, base, limit, RowsUsed.Kind.EACH);
    if (lacking.isPresent()) {
      return lacking.get();
    }
    int parameters = problem.free().parameters().size() + limit.absorbed();
    if (limit.rows() <= parameters) {
      return Estimation.without(
          panel, specification, base, Fit.State.REFUSED, List.of(tooFewRows(parameters)));
    }
    CurvatureSearch.Found found = searchFrom(limit).search();
    double least =
        found.profiles().stream()
            .mapToDouble(CurvatureSearch.Profiled::least)
            .min()
            .orElse(Double.POSITIVE_INFINITY);
    if (found.best().isEmpty() || found.best().get().ssr() > least * (1 + SAME)) {
      return withoutOptimum(found.profiles(), limit);
    }
    return new ProfiledSolution(panel, specification, base, problem)
        .fit(found.best().get(), found.profiles(), limit.totalSumOfSquares());
  }

  private String tooFewRows(int parameters) {
    return panel.rows()
        + " rows cannot carry "
        + (count == 1 ? "a curvature beside " + (parameters - 1) + " other" : parameters)
        + " parameters: add records, or ask for a form with fewer parameters.";
  }

  /** The least sum of squares with every curvature held at the same value. */
  double ssrAt(double curvature) {
    double[] held = new double[count];
    Arrays.fill(held, curvature);
    return NonlinearLeastSquares.fit(problem.holding(held), starts(limitFit()).get(0)).ssr();
  }

  /** The least sum of squares in the economic region, with nothing else worked out. */
  double leastSsr() {
    return searchFrom(limitFit()).leastSsr();
  }

  private CurvatureSearch searchFrom(LinearFit limit) {
    return CurvatureSearch.of(panel, specification, base, form, starts(limit));
  }

  private LinearFit limitFit() {
    LinearDesign raw =
        new LinearDesign(
            problem.rows(),
            form.limit(),
            panel.inputs(),
            problem.circumstances(),
            !problem.within());
    return LeastSquares.fit(problem.within() ? Effects.within(raw) : raw);
  }

  /** Constant (if any), inner parameters and circumstances, from the linear limit. */
  private List<double[]> starts(LinearFit limit) {
    int offset = problem.within() ? 0 : 1;
    int circumstances = problem.circumstances().count();
    int formColumns = limit.columns().size() - offset - circumstances;
    double[] b = limit.coefficients();
    List<double[]> starts = new ArrayList<>();
    for (double[] inner : form.starts(Arrays.copyOfRange(b, offset, offset + formColumns))) {
      double[] start = new double[offset + inner.length + circumstances];
      if (offset == 1) {
        start[0] = b[0];
      }
      System.arraycopy(inner, 0, start, offset, inner.length);
      System.arraycopy(b, offset + formColumns, start, offset + inner.length, circumstances);
      starts.add(start);
    }
    return starts;
  }

  /** The fit where no optimum was found inside the region, with what the profiles say of it. */
  private Fit withoutOptimum(List<CurvatureSearch.Profiled> profiles, LinearFit limit) {
    int degrees = limit.rows() - limit.absorbed() - problem.free().parameters().size();
    double[] grid = form.grid();
    List<CurvatureProfile> described = new ArrayList<>();
    List<String> edges = new ArrayList<>();
    for (CurvatureSearch.Profiled profiled : profiles) {
      ProfileSearch.Held lowest = profiled.lowest();
      boolean low = lowest.curvature() <= form.region()[0];
      boolean high = lowest.curvature() >= grid[grid.length - 1];
      if (low || high) {
        edges.add(edge(count == 1 ? "" : " along " + profiled.search().name(), low));
      }
      ProfileInterval interval =
          ProfileInterval.around(profiled, lowest, degrees, specification.confidence(), 1);
      described.add(
          interval.profile(
              profiled.points(),
              lowest,
              low || high || count == 1
                  ? CurvatureProfile.State.BOUNDARY
                  : interval.insideState()));
    }
    if (!edges.isEmpty()) {
      return without(Fit.State.BOUNDARY, edges, described);
    }
    String reason =
        "The search found no optimum that meets its own criteria"
            + (count == 0
                ? ": the records hardly tell the parameters of this form apart. Ask for a form with"
                    + " fewer parameters."
                : ", although the sum of squares is lowest inside the region; the profile shows"
                    + " where.");
    return without(Fit.State.NOT_CONVERGED, List.of(reason), described);
  }

  private static String edge(String along, boolean low) {
    return "The sum of squares still falls"
        + along
        + (low
            ? " at the edge of the economic region, where inputs replace each other without limit:"
                + " there is no optimum inside, so no elasticity of substitution and no parameters are"
                + " reported."
            : " where inputs cannot replace each other at all: there is no optimum inside the region,"
                + " so no elasticity of substitution and no parameters are reported.");
  }

  private Fit without(Fit.State state, List<String> reasons, List<CurvatureProfile> profiles) {
    return new Fit(specification, panel, base, state, reasons, Optional.empty(), profiles);
  }
}
