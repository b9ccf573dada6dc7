package isowright.estimation;

import isowright.records.Panel;
import isowright.regression.Covariance;
import isowright.regression.Design;
import isowright.regression.Effects;
import isowright.regression.FitStatistics;
import isowright.regression.LeastSquares;
import isowright.regression.LinearFit;
import isowright.regression.NonlinearFit;
import isowright.technology.ProfiledForm;
import isowright.technology.Technology;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;

/**
 * Fits a form with one curvature parameter: its sum of squares is walked along a grid of the
 * curvature, the curvature is freed from the points found, and the best admissible optimum is kept,
 * if there is one.
 */
final class ProfiledEstimation {

  /**
   * Above this many rows the grid is walked on every k-th plant; every local minimum found is then
   * polished on all rows. The walk only has to find the valleys.
   */
  static final int WALK_ROWS = 5_000;

  /**
   * In units of SSR/N: the threshold of an interval is a quantile of F(1, ∞), some 4 to 11, times
   * the scaling for a covariance other than the classical one; a hundred is beyond it.
   */
  private static final double BEYOND = 100;

  /** How much better than the best held point a free optimum must at least be, relative. */
  private static final double SAME = 1e-9;

  private final Panel panel;
  private final Specification specification;
  private final double[] base;
  private final ProfiledForm form;
  private final boolean within;
  private final Circumstances circumstances;

  ProfiledEstimation(Panel panel, Specification specification, double[] base, ProfiledForm form) {
    this.panel = panel;
    this.specification = specification;
    this.base = base;
    this.form = form;
    this.within = specification.plantEffects() == Specification.PlantEffects.WITHIN;
    this.circumstances = Circumstances.of(panel, specification.time());
  }

  Fit fit() {
    LinearFit limit = limitFit();
    Optional<Fit> lacking = LinearEstimation.lacking(panel, specification, base, limit);
    if (lacking.isPresent()) {
      return lacking.get();
    }
    if (limit.rows() <= limit.columns().size() + limit.absorbed() + 1) {
      return Estimation.without(
          panel,
          specification,
          base,
          Fit.State.REFUSED,
          List.of(
              limit.rows()
                  + " rows cannot carry a curvature beside "
                  + (limit.columns().size() + limit.absorbed())
                  + " other parameters: add records, or ask for a form with fewer parameters."));
    }
    double[] start = start(limit);
    boolean large = panel.rows() > 2 * WALK_ROWS;
    ProfileSearch search = search(panel, start);
    ProfileSearch walker = large ? search(ThinnedPanel.of(panel, WALK_ROWS), start) : search;
    List<ProfileSearch.Held> walked = walker.walk();
    List<ProfileSearch.Held> profile =
        large ? repeatOnAllRows(search, walked, panel.rows()) : walked;
    Optional<NonlinearFit> best = freed(search, large ? minima(walked) : walked);
    double least = profile.stream().mapToDouble(ProfileSearch.Held::ssr).min().orElseThrow();
    if (best.isEmpty() || best.get().ssr() > least * (1 + SAME)) {
      return boundary(search, profile, limit);
    }
    return solved(search, profile, best.get(), limit.totalSumOfSquares());
  }

  double ssrAt(double curvature) {
    LinearFit limit = limitFit();
    ProfileSearch search = search(panel, start(limit));
    return search.hold(curvature).ssr();
  }

  /** The least sum of squares in the economic region, with nothing else worked out. */
  double leastSsr() {
    ProfileSearch search = search(panel, start(limitFit()));
    boolean large = panel.rows() > 2 * WALK_ROWS;
    ProfileSearch walker =
        large ? search(ThinnedPanel.of(panel, WALK_ROWS), start(limitFit())) : search;
    List<ProfileSearch.Held> minima = minima(walker.walk());
    double held =
        minima.stream()
            .mapToDouble(m -> search.hold(m.curvature(), m.parameters()).ssr())
            .min()
            .orElseThrow();
    double free = freed(search, minima).map(NonlinearFit::ssr).orElse(Double.POSITIVE_INFINITY);
    return Math.min(held, free);
  }

  private LinearFit limitFit() {
    LinearDesign raw =
        new LinearDesign(
            PanelRows.of(panel, base), form.limit(), panel.inputs(), circumstances, !within);
    return LeastSquares.fit(within ? Effects.within(raw) : raw);
  }

  private double[] start(LinearFit limit) {
    int offset = within ? 0 : 1;
    int formColumns = limit.columns().size() - offset - circumstances.count();
    double[] b = limit.coefficients();
    double[] inner = form.start(Arrays.copyOfRange(b, offset, offset + formColumns));
    double[] start = new double[offset + inner.length + circumstances.count()];
    if (offset == 1) {
      start[0] = b[0];
    }
    System.arraycopy(inner, 0, start, offset, inner.length);
    System.arraycopy(b, offset + formColumns, start, offset + inner.length, circumstances.count());
    return start;
  }

  private ProfileSearch search(Panel rows, double[] start) {
    return new ProfileSearch(
        rows,
        base,
        form,
        Circumstances.of(rows, specification.time()),
        within,
        start,
        rows.rows() > 2 * WALK_ROWS);
  }

  /**
   * The walked profile, made again on all rows where it matters: at its minima, and from the lowest
   * of them outward on both sides until the sum of squares is beyond any interval.
   */
  private static List<ProfileSearch.Held> repeatOnAllRows(
      ProfileSearch search, List<ProfileSearch.Held> walked, int rows) {
    List<ProfileSearch.Held> repeated = new ArrayList<>();
    int lowest = -1;
    double least = Double.POSITIVE_INFINITY;
    for (ProfileSearch.Held minimum : minima(walked)) {
      ProfileSearch.Held held = search.hold(minimum.curvature(), minimum.parameters());
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
        ProfileSearch.Held near = walked.get(g);
        ProfileSearch.Held held = search.hold(near.curvature(), near.parameters());
        ssr = held.ssr();
        if (repeated.stream().noneMatch(other -> other.curvature() == held.curvature())) {
          repeated.add(held);
        }
      }
    }
    repeated.sort(Comparator.comparingDouble(ProfileSearch.Held::curvature));
    return repeated;
  }

  /** The points of a profile that are no higher than their neighbours. */
  private static List<ProfileSearch.Held> minima(List<ProfileSearch.Held> profile) {
    List<ProfileSearch.Held> minima = new ArrayList<>();
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

  /** The best converged optimum inside the economic region that the curvature finds when freed. */
  private Optional<NonlinearFit> freed(ProfileSearch search, List<ProfileSearch.Held> starts) {
    ProfiledModel model = search.free();
    double[] region = form.region();
    double[] grid = form.grid();
    return starts.parallelStream()
        .map(search::release)
        .filter(
            candidate -> {
              double curvature = model.curvature(candidate.parameters());
              return candidate.converged()
                  && curvature > region[0]
                  && curvature <= grid[grid.length - 1]
                  && form.admissible(model.inner(candidate.parameters()));
            })
        .min(Comparator.comparingDouble(NonlinearFit::ssr));
  }

  private Fit boundary(ProfileSearch search, List<ProfileSearch.Held> profile, LinearFit limit) {
    ProfileSearch.Held lowest = profile.get(0);
    for (ProfileSearch.Held held : profile) {
      if (held.ssr() < lowest.ssr()) {
        lowest = held;
      }
    }
    double[] region = form.region();
    double[] grid = form.grid();
    boolean low = lowest.curvature() <= region[0];
    boolean high = lowest.curvature() >= grid[grid.length - 1];
    ProfileInterval interval =
        ProfileInterval.around(
            search,
            form,
            profile,
            lowest,
            limit.residualDegreesOfFreedom() - 1,
            specification.confidence(),
            1);
    CurvatureProfile described = interval.profile(profile, lowest, CurvatureProfile.State.BOUNDARY);
    if (!low && !high) {
      return new Fit(
          specification,
          panel,
          base,
          Fit.State.NOT_CONVERGED,
          List.of(
              "The search found no optimum that meets its own criteria, although the sum of squares is"
                  + " lowest inside the region; the profile shows where."),
          Optional.empty(),
          Optional.of(described));
    }
    String reason =
        low
            ? "The sum of squares still falls at the edge of the economic region, where inputs replace"
                + " each other without limit: there is no optimum inside, so no elasticity of"
                + " substitution and no parameters are reported."
            : "The sum of squares still falls where inputs cannot replace each other at all: there is no"
                + " optimum inside the region, so no elasticity of substitution and no parameters are"
                + " reported.";
    return new Fit(
        specification,
        panel,
        base,
        Fit.State.BOUNDARY,
        List.of(reason),
        Optional.empty(),
        Optional.of(described));
  }

  private Fit solved(
      ProfileSearch search,
      List<ProfileSearch.Held> profile,
      NonlinearFit best,
      double totalSumOfSquares) {
    ProfiledModel model = search.free();
    double[] all = best.parameters();
    LinearFit linear = best.linearisation();
    Optional<Fit> lacking = LinearEstimation.lacking(panel, specification, base, linear);
    if (lacking.isPresent()) {
      return lacking.get();
    }
    Design design = model.linearisedAt(all);
    Covariance covariance =
        Covariance.estimate(
            design,
            linear,
            LinearEstimation.kind(specification.standardErrors()),
            PanelRows.of(panel, base).times());
    double[] inner = model.inner(all);
    double curvature = model.curvature(all);
    double[][] toReported = toReported(inner, curvature);
    int slopes = linear.columns().size() - (within ? 0 : 1);
    GroupMeans means = GroupMeans.of(model.rawAt(all), new double[linear.columns().size()]);
    PlantLevels levels =
        new PlantLevels(
            means,
            LinearEstimation.slopeBlock(covariance.matrix(), slopes),
            within ? 0 : 1,
            linear.residualVariance(),
            toReported);
    double constant = within ? levels.typical() : all[0];
    double[][] reported =
        within
            ? levels.covariance(levels.weights(new Productivity.Typical()))
            : Matrices.sandwich(toReported, covariance.matrix());
    Technology technology = form.technology(panel.inputs(), base, constant, inner, curvature);
    Solution solution =
        new Solution(
            technology,
            names(technology),
            withCircumstances(technology, all),
            reported,
            covariance,
            FitStatistics.of(linear, totalSumOfSquares),
            design,
            linear,
            LeastSquares.residuals(design, linear),
            levels);
    int place = model.innerOffset() + inner.length;
    double classical = linear.residualVariance() * linear.inverseCrossProduct()[place][place];
    double scaling = covariance.matrix()[place][place] / classical;
    ProfileSearch.Held top =
        new ProfileSearch.Held(curvature, search.withoutCurvature(all), best.ssr(), true);
    ProfileInterval interval =
        ProfileInterval.around(
            search,
            form,
            profile,
            top,
            linear.residualDegreesOfFreedom(),
            specification.confidence(),
            scaling);
    boolean flat = interval.openBelow() || interval.openAbove();
    CurvatureProfile described =
        interval.profile(
            profile, top, flat ? CurvatureProfile.State.FLAT : CurvatureProfile.State.INTERIOR);
    return new Fit(
        specification,
        panel,
        base,
        flat ? Fit.State.FLAT : Fit.State.ESTIMATED,
        List.of(),
        Optional.of(solution),
        Optional.of(described));
  }

  private List<String> names(Technology technology) {
    List<String> names = new ArrayList<>(technology.parameterNames());
    names.addAll(circumstances.names());
    return List.copyOf(names);
  }

  private double[] withCircumstances(Technology technology, double[] all) {
    double[] own = technology.parameters();
    int count = circumstances.count();
    double[] parameters = Arrays.copyOf(own, own.length + count);
    System.arraycopy(all, all.length - count, parameters, own.length, count);
    return parameters;
  }

  /** Reported parameters by free ones (constant, inner, curvature, circumstances). */
  private double[][] toReported(double[] inner, double curvature) {
    double[][] core = form.reported(inner, curvature);
    int free = inner.length + 2;
    int count = circumstances.count();
    double[][] all = new double[core.length + count][free + count];
    for (int k = 0; k < core.length; k++) {
      System.arraycopy(core[k], 0, all[k], 0, free);
    }
    for (int c = 0; c < count; c++) {
      all[core.length + c][free + c] = 1;
    }
    return all;
  }
}
