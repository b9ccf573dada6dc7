package isowright.charts;

import isowright.charts.Style.Pen;
import isowright.study.Figure;
import java.awt.Color;
import java.util.ArrayList;
import java.util.List;

/** The intervals of figures along a curve, as a band. */
final class Bands {

  private Bands() {}

  /** Adds the band of figures; it closes where one is exact. Nothing where all are. */
  static void add(
      Plot plot, String name, double[] at, List<Figure> figures, Color color, Pen edge) {
    List<double[]> known = new ArrayList<>();
    for (int k = 0; k < at.length; k++) {
      Figure figure = figures.get(k);
      double x = at[k];
      if (figure.uncertainty().isEmpty()) {
        known.add(new double[] {x, figure.value(), figure.value()});
      }
      figure
          .uncertainty()
          .filter(u -> Double.isFinite(u.low()) && Double.isFinite(u.high()))
          .ifPresent(u -> known.add(new double[] {x, u.low(), u.high()}));
    }
    if (known.size() < 2 || !uncertain(figures)) {
      return;
    }
    Color faint = new Color(color.getRed(), color.getGreen(), color.getBlue(), Style.BAND_ALPHA);
    plot.band(name, column(known, 0), column(known, 1), column(known, 2), faint, edge);
  }

  private static double[] column(List<double[]> rows, int column) {
    return rows.stream().mapToDouble(row -> row[column]).toArray();
  }

  /** The values of figures. */
  static double[] values(List<Figure> figures) {
    return figures.stream().mapToDouble(Figure::value).toArray();
  }

  /** Lower or upper ends; the value where a figure has no interval. */
  static double[] ends(List<Figure> figures, boolean lower) {
    return figures.stream()
        .mapToDouble(
            f -> {
              double end = f.uncertainty().map(u -> lower ? u.low() : u.high()).orElse(f.value());
              return Double.isFinite(end) ? end : f.value();
            })
        .toArray();
  }

  /** Whether any figure has an interval. */
  static boolean uncertain(List<Figure> figures) {
    return figures.stream().anyMatch(f -> f.uncertainty().isPresent());
  }

  /** An axis around curves and their bands; a band that explodes may leave the frame. */
  static Axis axis(String title, List<Figure> figures) {
    double[] values = values(figures);
    double least = Curves.least(values);
    double most = Curves.most(values);
    double room = Math.max(most - least, 0.1 * Math.abs(most));
    return Axis.around(
        title,
        Math.min(least, Math.max(least - room, Curves.least(ends(figures, true)))),
        Math.max(most, Math.min(most + room, Curves.most(ends(figures, false)))));
  }
}
