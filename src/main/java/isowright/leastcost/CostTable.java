package isowright.leastcost;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/**
 * Least cost of one plant at examined outputs, with what follows for the outputs between them:
 * where marginal cost rises from one to the next, cost lies above both tangents; where it falls,
 * above the chord. That holds as long as marginal cost turns nowhere between two neighbours, which
 * halving of neighbours that contradict it makes sure of as far as examined.
 *
 * <p>Points are added as a search needs them. Not shared between threads.
 */
final class CostTable {

  /** Outputs examined at first, evenly spaced in logs over five decades. */
  private static final int FIRST = 24;

  private static final double DECADES = 5;

  /** Halvings by which the end of the outputs with an answer is found. */
  private static final int HALVINGS = 48;

  /** Neighbours that contradict each other are halved this often at most. */
  private static final int REFINED = 12;

  /** Outputs nearer than this, relative, are the same point. */
  private static final double SAME = 1e-13;

  private final PlantOption plant;
  private final LeastCost leastCost;
  private final List<Point> points = new ArrayList<>();
  private Optional<Plan> near = Optional.empty();

  /** The least output with an answer; 0 where any, however small, has one. */
  final double least;

  /** The largest output with an answer, the capacity or the target if that is less. */
  final double most;

  /** Why more cannot be made, where that is neither capacity nor target; empty otherwise. */
  final String end;

  /** Whether outputs between 0 and {@link #least} or beyond {@link #most} are irregular. */
  final boolean partly;

  /** An output with its cost (without running cost) and marginal cost. */
  record Point(double output, double cost, double marginal, Plan plan) {}

  CostTable(PlantOption plant, double target) {
    this.plant = plant;
    this.leastCost = Minimiser.of(plant.technology());
    double top = Math.min(plant.capacity(), target);
    List<Point> run = answered(top);
    if (run.isEmpty()) {
      Plan none = leastCost.plan(plant.question().at(top));
      least = Double.NaN;
      most = Double.NaN;
      end = none.reason();
      partly = none.status() == Plan.Status.IRREGULAR;
      return;
    }
    points.addAll(run);
    double step = Math.exp(Math.log(10) * DECADES / (FIRST - 1));
    Point last = run.get(run.size() - 1);
    Plan beyond = last.plan;
    if (last.output < top) {
      beyond = extend(last.output, Math.min(top, last.output * step));
    }
    boolean toZero = run.get(0).output <= top * Math.pow(10, -DECADES) * (1 + SAME);
    if (!toZero) {
      extend(run.get(0).output, run.get(0).output / step);
    }
    least = toZero ? 0 : points.get(0).output;
    most = points.get(points.size() - 1).output;
    end = last.output < top ? beyond.reason() : "";
    partly = !toZero || (last.output < top && beyond.status() == Plan.Status.IRREGULAR);
    if (toZero) {
      points.add(0, new Point(0, plant.idle(), Double.NaN, points.get(0).plan));
    }
    refine();
  }

  boolean empty() {
    return points.isEmpty();
  }

  /** The longest run of neighbouring outputs with an answer. */
  private List<Point> answered(double top) {
    List<Point> best = new ArrayList<>();
    List<Point> run = new ArrayList<>();
    for (int k = 0; k < FIRST; k++) {
      double output = k == FIRST - 1 ? top : top * Math.pow(10, DECADES * (k / (FIRST - 1.0) - 1));
      Plan plan = plan(output);
      if (plan.answered()) {
        run.add(point(output, plan));
      } else {
        run = new ArrayList<>();
      }
      if (run.size() > best.size()) {
        best = run;
      }
    }
    return best;
  }

  /** Adds the farthest output with an answer towards one without; returns the plan beyond it. */
  private Plan extend(double from, double towards) {
    double inside = from;
    double outside = towards;
    Plan beyond = plan(towards);
    for (int k = 0; k < HALVINGS; k++) {
      double middle = Math.sqrt(inside * outside);
      Plan plan = plan(middle);
      if (plan.answered()) {
        inside = middle;
      } else {
        outside = middle;
        beyond = plan;
      }
    }
    at(inside);
    return beyond;
  }

  private Plan plan(double output) {
    Question asked = plant.question().at(output);
    Plan plan = near.map(n -> leastCost.plan(asked, n)).orElseGet(() -> leastCost.plan(asked));
    if (plan.answered()) {
      near = Optional.of(plan);
      return plan;
    }
    return near.isPresent() ? leastCost.plan(asked) : plan;
  }

  static Point point(double output, Plan plan) {
    return new Point(output, plan.cost(), plan.marginalCost(), plan);
  }

  /** The point at an output between least and most; examined and added where it is not there. */
  Point at(double output) {
    int k = place(output);
    for (int near = Math.max(0, k - 1); near <= Math.min(k, points.size() - 1); near++) {
      if (Math.abs(points.get(near).output - output) <= SAME * output) {
        return points.get(near);
      }
    }
    Plan plan = plan(output);
    Point point = point(output, plan);
    if (plan.answered()) {
      points.add(k, point);
    }
    return point;
  }

  /** An output's cost without keeping it; NaN where there is no answer. */
  Point examined(double output) {
    return point(output, plan(output));
  }

  /** The index of the first point at or above an output. */
  private int place(double output) {
    int low = 0;
    int high = points.size();
    while (low < high) {
      int middle = (low + high) >>> 1;
      if (points.get(middle).output < output) {
        low = middle + 1;
      } else {
        high = middle;
      }
    }
    return low;
  }

  /** Halves neighbours whose chord contradicts the course of marginal cost between them. */
  private void refine() {
    for (int round = 0; round < REFINED; round++) {
      List<Double> halves = new ArrayList<>();
      for (int k = 0; k + 1 < points.size(); k++) {
        Point a = points.get(k);
        Point b = points.get(k + 1);
        double chord = (b.cost - a.cost) / (b.output - a.output);
        double rounding = 1e-9 * chord;
        double low = Math.min(a.marginal, b.marginal) - rounding;
        double high = Math.max(a.marginal, b.marginal) + rounding;
        boolean known = Double.isFinite(a.marginal) && Double.isFinite(b.marginal);
        if (known && (chord < low || chord > high)) {
          halves.add(0.5 * (a.output + b.output));
        }
      }
      if (halves.isEmpty()) {
        return;
      }
      halves.forEach(this::at);
    }
  }

  /** Whether marginal cost nowhere falls, as far as examined. */
  boolean convex() {
    for (int k = 0; k + 1 < points.size(); k++) {
      if (!convex(points.get(k), points.get(k + 1))) {
        return false;
      }
    }
    return true;
  }

  private static boolean convex(Point a, Point b) {
    double rounding = 1e-9 * Math.abs(b.marginal);
    if (Double.isNaN(a.marginal)) {
      double chord = (b.cost - a.cost) / (b.output - a.output);
      return chord <= b.marginal + rounding;
    }
    return a.marginal <= b.marginal + rounding;
  }

  /** Corners (output, cost) that no cost between two outputs lies below when joined; ascending. */
  List<double[]> corners(double low, double high) {
    List<double[]> corners = new ArrayList<>();
    for (int k = place(low * (1 - SAME)); k < points.size(); k++) {
      Point b = points.get(k);
      if (b.output > high * (1 + SAME)) {
        break;
      }
      if (!corners.isEmpty()) {
        tangents(points.get(k - 1), b, corners);
      }
      corners.add(new double[] {b.output, b.cost});
    }
    return corners;
  }

  /** Adds the point where the tangents of two neighbours meet, where cost lies above them. */
  private static void tangents(Point a, Point b, List<double[]> corners) {
    double slope = Double.isNaN(a.marginal) ? 0 : a.marginal;
    if (!convex(a, b) || !(b.marginal > slope) || Double.isInfinite(b.marginal)) {
      if (Double.isInfinite(b.marginal)) {
        corners.add(new double[] {b.output, a.cost + slope * (b.output - a.output)});
      }
      return;
    }
    double meet =
        (a.cost - b.cost + b.marginal * b.output - slope * a.output) / (b.marginal - slope);
    if (meet > a.output && meet < b.output) {
      corners.add(new double[] {meet, a.cost + slope * (meet - a.output)});
    }
  }
}
