package isowright.regression;

import isowright.regression.NonlinearFit.Stop;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import org.apache.commons.math3.exception.ConvergenceException;
import org.apache.commons.math3.exception.MaxCountExceededException;
import org.apache.commons.math3.fitting.leastsquares.LeastSquaresProblem;
import org.apache.commons.math3.fitting.leastsquares.LevenbergMarquardtOptimizer;
import org.apache.commons.math3.linear.ArrayRealVector;
import org.apache.commons.math3.linear.RealVector;
import org.apache.commons.math3.optim.ConvergenceChecker;
import org.apache.commons.math3.util.Incrementor;

/** One search for the parameters of a nonlinear model; used once. */
final class NonlinearSearch implements LeastSquaresProblem {

  /**
   * Initial step bound and tolerances of the search; as tight as double precision allows, because
   * convergence is judged by our own criterion. With these all certified problems of NIST are
   * solved from both starts; with the library's 1e-10 some stop at four digits.
   */
  private static final LevenbergMarquardtOptimizer METHOD =
      new LevenbergMarquardtOptimizer(100, 1e-15, 1e-15, 1e-15, 1e-300);

  /** Gauss-Newton steps after the search, at most; a tenth off each time is four digits in all. */
  private static final int MOST_SHARPENINGS = 90;

  /** A cosine so small that sharpening further is rounding. */
  private static final double SHARP = 1e-13;

  /** A sum of squares may rise by this share in a sharpening step: its own rounding. */
  private static final double SSR_ROUNDING = 1e-10;

  /** A Gauss-Newton step below this share of the parameter leaves it right to eight digits. */
  private static final double NEGLIGIBLE_STEP = 1e-9;

  /** A step whose effect is below this share of the largest effect of any parameter is rounding. */
  private static final double NEGLIGIBLE_EFFECT = 1e-14;

  private final NonlinearModel model;
  private final double[] start;
  private final boolean[] held;
  private final NonlinearLeastSquares.Settings settings;
  private final Incrementor evaluationCounter;
  private final Incrementor iterationCounter;
  private final List<String> free = new ArrayList<>();
  private int evaluations;
  private boolean lastFinite = true;
  private Optional<CompressedPoint> best = Optional.empty();

  NonlinearSearch(
      NonlinearModel model,
      double[] start,
      boolean[] held,
      NonlinearLeastSquares.Settings settings) {
    this.model = model;
    this.start = start.clone();
    this.held = held;
    this.settings = settings;
    this.evaluationCounter = new Incrementor(settings.mostEvaluations());
    this.iterationCounter = new Incrementor(settings.mostEvaluations());
    for (int k = 0; k < held.length; k++) {
      if (!held[k]) {
        free.add(model.parameters().get(k));
      }
    }
  }

  NonlinearFit run() {
    CompressedPoint first = read(getStart().toArray());
    if (!first.finite()) {
      return notFinite();
    }
    List<Collinearity> atStart = List.copyOf(first.analysis().collinearities());
    boolean limited = false;
    if (!free.isEmpty()) {
      limited = search();
      if (!limited) {
        sharpen();
      }
    }
    CompressedPoint end = best.orElse(first);
    return finish(end, stop(end, atStart, limited));
  }

  /** Runs the search; true where it used up its evaluations. */
  private boolean search() {
    try {
      METHOD.optimize(this);
      return false;
    } catch (MaxCountExceededException e) {
      return true;
    } catch (ConvergenceException e) {
      // Tolerances too tight for the problem: the best point met is judged by its own angle.
      return false;
    }
  }

  /**
   * Gauss-Newton steps from the best point, judged by the angle, which still resolves what the sum
   * of squares no longer can. Until the point counts as a solution a step is kept where it takes a
   * tenth off the angle, whole or halved (large residuals make such steps overshoot); after that
   * two more are tried, each kept where it halves the angle. A step that lowers the sum of squares
   * beyond its rounding is always kept.
   */
  private void sharpen() {
    int afterwards = 0;
    for (int s = 0; s < MOST_SHARPENINGS && afterwards < 2; s++) {
      CompressedPoint from = best.orElseThrow();
      if (from.cosine() <= SHARP) {
        return;
      }
      boolean solved = from.cosine() <= settings.orthogonality();
      afterwards += solved ? 1 : 0;
      boolean better =
          solved ? sharper(from, 1, 0.5) : sharper(from, 1, 0.9) || sharper(from, 0.5, 0.9);
      if (!better) {
        best = Optional.of(from);
        lastFinite = true;
        return;
      }
    }
  }

  /**
   * Takes a share of the Gauss-Newton step; true where it is kept, with the angle to be reached.
   */
  private boolean sharper(CompressedPoint from, double share, double most) {
    if (evaluations >= settings.mostEvaluations()) {
      return false;
    }
    double[] next = from.free().clone();
    double[] step = from.analysis().coefficients();
    for (int k = 0; k < next.length; k++) {
      next[k] += share * step[k];
    }
    CompressedPoint there = read(next);
    if (!there.finite()
        || there.ssr() > from.ssr() * (1 + SSR_ROUNDING)
        || there.analysis().rank() < from.analysis().rank()) {
      return false;
    }
    boolean lower = there.ssr() < from.ssr() * (1 - SSR_ROUNDING);
    if (!lower && there.cosine() > most * from.cosine()) {
      return false;
    }
    best = Optional.of(there);
    return true;
  }

  private Stop stop(CompressedPoint end, List<Collinearity> atStart, boolean limited) {
    if (end.cosine() <= settings.orthogonality() || negligible(end)) {
      return identified(end, atStart) ? Stop.CONVERGED : Stop.UNIDENTIFIED;
    }
    if (limited) {
      return Stop.LIMIT;
    }
    return lastFinite ? Stop.STALLED : Stop.NOT_FINITE;
  }

  /**
   * True where the rows tell all free parameters apart; one that the group effects take up from the
   * start (a constant) does no harm.
   */
  private static boolean identified(CompressedPoint end, List<Collinearity> atStart) {
    return end.analysis().collinearities().stream()
        .allMatch(
            c -> c.among().equals(List.of(Collinearity.GROUP_EFFECTS)) && atStart.contains(c));
  }

  /** True where the remaining step changes no parameter, or has no effect beyond rounding. */
  private static boolean negligible(CompressedPoint end) {
    double[] step = end.analysis().coefficients();
    double[] lengths = end.analysis().lengths();
    double largest = 0;
    for (int k = 0; k < step.length; k++) {
      largest = Math.max(largest, lengths[k] * Math.abs(end.free()[k]));
    }
    for (int k = 0; k < step.length; k++) {
      double size = Math.abs(step[k]);
      if (size > NEGLIGIBLE_STEP * Math.abs(end.free()[k])
          && lengths[k] * size > NEGLIGIBLE_EFFECT * largest) {
        return false;
      }
    }
    return true;
  }

  private NonlinearFit finish(CompressedPoint end, Stop stop) {
    double[] parameters = NonlinearLeastSquares.spread(end.free(), held, start);
    LinearFit narrow = end.atRest(design(parameters));
    double[] step =
        NonlinearLeastSquares.spread(end.analysis().coefficients(), held, new double[held.length]);
    return new NonlinearFit(
        parameters,
        narrow.ssr(),
        narrow.widened(model.parameters(), held),
        stop,
        evaluations,
        end.cosine(),
        step);
  }

  private NonlinearFit notFinite() {
    int count = held.length;
    Design design = model.linearisedAt(start.clone());
    LinearFit nothing =
        new LinearFit(
            model.parameters(),
            new double[count],
            new boolean[count],
            new double[count][count],
            Double.NaN,
            Double.NaN,
            design.rows(),
            design.absorbed(),
            0,
            List.of(),
            settings.rankRule(),
            new double[count]);
    return new NonlinearFit(
        start, Double.NaN, nothing, Stop.NOT_FINITE, evaluations, Double.NaN, new double[count]);
  }

  private Design design(double[] parameters) {
    Design all = model.linearisedAt(parameters.clone());
    return free.size() == held.length ? all : new SelectedColumns(all, held);
  }

  /** Reads the rows at these values of the free parameters and remembers the best. */
  private CompressedPoint read(double[] at) {
    evaluations++;
    Design design = design(NonlinearLeastSquares.spread(at, held, start));
    Reading reading = Reading.of(design, Blocks.of(design.groups()));
    double worse = best.isEmpty() ? 1 : 1e10 * (1 + Math.sqrt(best.orElseThrow().ssr()));
    CompressedPoint point = new CompressedPoint(at, reading, free, settings.rankRule(), worse);
    lastFinite = point.finite();
    if (point.finite() && (best.isEmpty() || point.ssr() < best.orElseThrow().ssr())) {
      best = Optional.of(point);
    }
    return point;
  }

  @Override
  public RealVector getStart() {
    double[] values = new double[free.size()];
    int at = 0;
    for (int k = 0; k < held.length; k++) {
      if (!held[k]) {
        values[at++] = start[k];
      }
    }
    return new ArrayRealVector(values, false);
  }

  @Override
  public int getObservationSize() {
    return free.size() + 1;
  }

  @Override
  public int getParameterSize() {
    return free.size();
  }

  @Override
  public Evaluation evaluate(RealVector point) {
    double[] at = point.toArray();
    Optional<CompressedPoint> known = best.filter(b -> Arrays.equals(b.free(), at));
    return known.isPresent() ? known.orElseThrow() : read(at);
  }

  @Override
  public Incrementor getEvaluationCounter() {
    return evaluationCounter;
  }

  @Override
  public Incrementor getIterationCounter() {
    return iterationCounter;
  }

  @Override
  public ConvergenceChecker<Evaluation> getConvergenceChecker() {
    return (iteration, previous, current) ->
        current instanceof CompressedPoint point && point.cosine() <= settings.orthogonality();
  }
}
