package isowright.charts;

import isowright.charts.Plot.Label;
import isowright.charts.Plot.Side;
import java.awt.geom.Rectangle2D;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/**
 * Where labels stand: of all places offered (points, sides, distances) the one that covers least.
 * Covering another label is worst, being moved into the plot and covering a line are bad, covering
 * a dot less so; among equals the earlier point, side and the shorter distance win. A label that
 * would cover another wherever it stood is left out: what it names stands in the chart's table.
 * Deterministic.
 */
final class Placement {

  private static final double[] DISTANCES = {7, 12, 18, 26};
  private static final double MOVED = 40;
  private static final double ON_LABEL = 400;
  private static final double ON_LINE = 12;
  private static final double ON_DOT = 4;
  private static final double STEP = 3;
  private static final double ASCENT = 0.76;
  private static final double HEIGHT = 1.0;

  /** Where the mapping from units to pixels comes from. */
  interface Screen {
    /** The pixel column of an x. */
    double x(double value);

    /** The pixel row of a y. */
    double y(double value);
  }

  /** What a label says, shortened to the plot, and the left end of its baseline. */
  record Placed(String text, double x, double baseline) {}

  private final Rectangle2D plot;
  private final List<double[]> onLines = new ArrayList<>();
  private final List<double[]> onDots = new ArrayList<>();
  private final List<Rectangle2D> taken = new ArrayList<>();

  /** Within the plot's pixels. */
  Placement(Rectangle2D plot) {
    this.plot = plot;
  }

  /** A line that labels should not cover. */
  void avoidLine(double[] xs, double[] ys) {
    for (int i = 1; i < xs.length; i++) {
      double length = Math.hypot(xs[i] - xs[i - 1], ys[i] - ys[i - 1]);
      if (Double.isNaN(length)) {
        continue;
      }
      int steps = Math.max(1, (int) Math.min(600, length / STEP));
      for (int k = 0; k <= steps; k++) {
        double t = (double) k / steps;
        onLines.add(
            new double[] {
              xs[i - 1] + t * (xs[i] - xs[i - 1]), ys[i - 1] + t * (ys[i] - ys[i - 1])
            });
      }
    }
  }

  /** A dot that labels should not cover. */
  void avoidDot(double x, double y) {
    onDots.add(new double[] {x, y});
  }

  /** Puts a label where it covers least; nowhere if it would cover another one everywhere. */
  Optional<Placed> place(Label label, Screen screen) {
    String text = Letters.shortened(label.text(), plot.getWidth(), Style.LETTERS, label.bold());
    double width = Letters.width(text, Style.LETTERS, label.bold());
    double least = Double.POSITIVE_INFINITY;
    Rectangle2D best = new Rectangle2D.Double();
    for (int p = 0; p < label.x().length; p++) {
      double x = screen.x(label.x()[p]);
      double y = screen.y(label.y()[p]);
      for (int d = 0; d < DISTANCES.length; d++) {
        for (int s = 0; s < label.sides().size(); s++) {
          Rectangle2D asked = box(x, y, width, label.sides().get(s), DISTANCES[d]);
          Rectangle2D box = intoPlot(asked);
          double moved = box.equals(asked) ? 0 : MOVED;
          double cost = cost(box) + moved + 0.5 * p + 1.5 * s + 6 * d;
          if (cost < least) {
            least = cost;
            best = box;
          }
        }
      }
    }
    if (covers(best)) {
      return Optional.empty();
    }
    taken.add(best);
    return Optional.of(new Placed(text, best.getX(), best.getY() + ASCENT * Style.LETTERS));
  }

  /** The nearest place inside the plot. */
  private Rectangle2D intoPlot(Rectangle2D box) {
    double x = Math.min(box.getX(), plot.getMaxX() - box.getWidth());
    double y = Math.min(box.getY(), plot.getMaxY() - box.getHeight());
    return new Rectangle2D.Double(
        Math.max(x, plot.getX()), Math.max(y, plot.getY()), box.getWidth(), box.getHeight());
  }

  private boolean covers(Rectangle2D box) {
    return taken.stream().anyMatch(other -> other.intersects(box));
  }

  private static Rectangle2D box(double x, double y, double width, Side side, double distance) {
    double height = HEIGHT * Style.LETTERS;
    double diagonal = side.right() != 0 && side.down() != 0 ? 0.7 : 1;
    double dx = diagonal * distance * side.right();
    double dy = diagonal * distance * side.down();
    double left = side.right() > 0 ? x : side.right() < 0 ? x - width : x - width / 2;
    double top = side.down() > 0 ? y : side.down() < 0 ? y - height : y - height / 2;
    return new Rectangle2D.Double(left + dx, top + dy, width, height);
  }

  private double cost(Rectangle2D box) {
    double cost = 0;
    for (Rectangle2D other : taken) {
      if (grown(other, 3).intersects(box)) {
        cost += ON_LABEL;
      }
    }
    return cost + ON_LINE * inside(onLines, grown(box, 2)) + ON_DOT * inside(onDots, grown(box, 4));
  }

  private static int inside(List<double[]> points, Rectangle2D box) {
    int count = 0;
    for (double[] p : points) {
      if (p[0] >= box.getMinX()
          && p[0] <= box.getMaxX()
          && p[1] >= box.getMinY()
          && p[1] <= box.getMaxY()) {
        count++;
      }
    }
    return count;
  }

  private static Rectangle2D grown(Rectangle2D box, double by) {
    return new Rectangle2D.Double(
        box.getX() - by, box.getY() - by, box.getWidth() + 2 * by, box.getHeight() + 2 * by);
  }
}
