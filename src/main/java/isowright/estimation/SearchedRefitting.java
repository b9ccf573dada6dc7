package isowright.estimation;

import isowright.estimation.RefittedParameters.Outcome;
import isowright.estimation.RefittedParameters.Refit;
import isowright.records.Panel;
import isowright.regression.ClusterBootstrap;
import isowright.regression.CountedDesign;
import isowright.regression.NonlinearFit;
import isowright.regression.NonlinearLeastSquares;
import isowright.regression.NonlinearModel;
import isowright.technology.NonlinearForm;
import isowright.technology.Technology;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.function.IntFunction;
import java.util.stream.IntStream;

/**
 * Refits of a form whose parameters are searched for, pooled or within plants. Each search starts
 * from the estimate and so finds the optimum of the same valley; one that does not converge, or
 * leaves the economic region, has no parameters.
 */
final class SearchedRefitting implements Refitting {

  /** Readings of the rows by one search; from a near start some five suffice. */
  private static final int MOST_EVALUATIONS = 100;

  private final Fit fit;
  private final NonlinearForm form;

  SearchedRefitting(Fit fit, NonlinearForm form) {
    this.fit = fit;
    this.form = form;
  }

  @Override
  public RefittedParameters drawn(int draws, long seed) {
    ProfiledProblem problem = problem(fit.panel());
    ProfiledModel model = problem.free();
    int groups = problem.rows().groups().count();
    return each(
        draws,
        d -> {
          int[] counts = ClusterBootstrap.counts(groups, d, seed);
          return search(problem, counted(model, counts));
        });
  }

  private static NonlinearModel counted(ProfiledModel model, int[] counts) {
    return new NonlinearModel() {
      @Override
      public List<String> parameters() {
        return model.parameters();
      }

      @Override
      public CountedDesign linearisedAt(double[] parameters) {
        return CountedDesign.of(model.linearisedAt(parameters), counts);
      }
    };
  }

  @Override
  public Optional<RefittedParameters> withoutPlants() {
    int plants = fit.panel().plants().size();
    if (plants < 3 || (long) plants * fit.panel().rows() > MOST_ROWS_REFITTED) {
      return Optional.empty();
    }
    return Optional.of(
        each(
            plants,
            p -> search(SelectedPanel.kept(fit.panel(), r -> fit.panel().plantOf(r) != p))));
  }

  @Override
  public Optional<RefittedParameters> withoutPeriods() {
    Panel panel = fit.panel();
    int periods = panel.periods().size();
    boolean effects = fit.specification().time().byPeriod();
    if (effects) {
      return new PanelRefitting(fit).withoutPeriods();
    }
    if (periods < 3 || (long) periods * panel.rows() > MOST_ROWS_REFITTED) {
      return Optional.empty();
    }
    return Optional.of(
        each(
            periods,
            t -> search(SelectedPanel.kept(panel, row -> panel.rowPeriods().get(row) != t))));
  }

  private static RefittedParameters each(int count, IntFunction<Refit> refit) {
    return new RefittedParameters(IntStream.range(0, count).parallel().mapToObj(refit).toList());
  }

  private ProfiledProblem problem(Panel panel) {
    return ProfiledProblem.of(panel, fit.specification(), fit.base(), form);
  }

  Refit search(Panel panel) {
    ProfiledProblem problem = problem(panel);
    return search(problem, problem.free());
  }

  private Refit search(ProfiledProblem problem, NonlinearModel model) {
    NonlinearFit found =
        NonlinearLeastSquares.fit(
            model,
            fit.numbers().searched(),
            NonlinearLeastSquares.Settings.STANDARD.withMostEvaluations(MOST_EVALUATIONS));
    if (found.stop() == NonlinearFit.Stop.UNIDENTIFIED) {
      return Refit.failed(Outcome.LOST_RANK);
    }
    return CurvatureSearch.best(problem, List.of(found))
        .map(best -> Refit.of(reported(problem, best.parameters())))
        .orElse(Refit.failed(Outcome.NOT_FOUND));
  }

  private double[] reported(ProfiledProblem problem, double[] all) {
    ProfiledModel model = problem.free();
    double constant = problem.within() ? fit.numbers().parameters()[0] : all[0];
    Technology technology =
        form.technology(
            problem.inputs(), fit.base(), constant, model.inner(all), model.curvatures(all));
    double[] own = technology.parameters();
    int count = problem.circumstances().count();
    double[] reported = Arrays.copyOf(own, own.length + count);
    System.arraycopy(all, all.length - count, reported, own.length, count);
    return reported;
  }
}
