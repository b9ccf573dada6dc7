package isowright.leastcost;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;

/**
 * The least that a split can cost when each plant's cost is replaced by the lower convex hull of
 * what is known of it: a bound from below, filled in the order of the hulls' slopes.
 *
 * @param cost the bound; +∞ where the plants of this part cannot make the target
 * @param outputs the outputs at the bound
 * @param marginal the plant in the middle of an edge of its hull; −1 where none is
 * @param left where that edge begins
 * @param right where it ends
 * @param slope its slope, which is marginal cost at the bound
 */
record SplitBound(
    double cost, double[] outputs, int marginal, double left, double right, double slope) {

  /** What a plant may do in a part of the problem. */
  record Range(boolean idle, boolean runs, double low, double high) {}

  private record Edge(int plant, double[] from, double[] to, double slope) {}

  static SplitBound of(
      List<PlantOption> plants, List<CostTable> tables, List<Range> ranges, double target) {
    int n = plants.size();
    double[] outputs = new double[n];
    double cost = 0;
    double left = target;
    List<Edge> edges = new ArrayList<>();
    for (int p = 0; p < n; p++) {
      List<double[]> hull = hull(plants.get(p), tables.get(p), ranges.get(p));
      if (hull.isEmpty()) {
        return impossible(outputs);
      }
      outputs[p] = hull.get(0)[0];
      cost += hull.get(0)[1];
      left -= outputs[p];
      for (int k = 0; k + 1 < hull.size(); k++) {
        double[] a = hull.get(k);
        double[] b = hull.get(k + 1);
        edges.add(new Edge(p, a, b, (b[1] - a[1]) / (b[0] - a[0])));
      }
    }
    double rounding = 1e-12 * target;
    if (left < -rounding) {
      return impossible(outputs);
    }
    edges.sort(Comparator.comparingDouble(Edge::slope));
    double slope = Double.NaN;
    for (Edge edge : edges) {
      if (left <= rounding) {
        break;
      }
      double width = edge.to[0] - edge.from[0];
      slope = edge.slope;
      if (width > left + rounding) {
        outputs[edge.plant] = edge.from[0] + left;
        return new SplitBound(
            cost + slope * left, outputs, edge.plant, edge.from[0], edge.to[0], slope);
      }
      outputs[edge.plant] = edge.to[0];
      cost += edge.to[1] - edge.from[1];
      left -= width;
    }
    return left > rounding
        ? impossible(outputs)
        : new SplitBound(cost, outputs, -1, Double.NaN, Double.NaN, slope);
  }

  private static SplitBound impossible(double[] outputs) {
    return new SplitBound(
        Double.POSITIVE_INFINITY, outputs, -1, Double.NaN, Double.NaN, Double.NaN);
  }

  /** The corners of the lower convex hull of all that a plant may do, ascending. */
  private static List<double[]> hull(PlantOption plant, CostTable table, Range range) {
    List<double[]> hull = new ArrayList<>();
    if (range.idle) {
      hull.add(new double[] {0, plant.idle()});
    }
    if (range.runs && !table.empty()) {
      for (double[] corner : table.corners(range.low, range.high)) {
        add(hull, corner[0], corner[1] + plant.runningCost());
      }
    }
    return hull;
  }

  private static void add(List<double[]> hull, double x, double y) {
    int last = hull.size() - 1;
    if (last >= 0 && hull.get(last)[0] >= x) {
      if (hull.get(last)[1] <= y) {
        return;
      }
      hull.remove(last);
    }
    while (hull.size() > 1) {
      double[] a = hull.get(hull.size() - 2);
      double[] b = hull.get(hull.size() - 1);
      if ((b[1] - a[1]) * (x - a[0]) < (y - a[1]) * (b[0] - a[0])) {
        break;
      }
      hull.remove(hull.size() - 1);
    }
    hull.add(new double[] {x, y});
  }
}
