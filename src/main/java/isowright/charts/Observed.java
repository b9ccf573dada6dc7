package isowright.charts;

import isowright.study.FitFindings.Fitted;
import isowright.study.FitFindings.Influential;
import isowright.study.FitFindings.Point;
import java.util.Comparator;
import java.util.List;
import java.util.stream.Stream;

/** The rows of the records as a fit sees them, for charts of residuals and of fitted output. */
final class Observed {

  /** How many influential rows are marked. */
  private static final int MARKED = 3;

  /** The longest name beside a dot. */
  private static final int LONGEST = 24;

  private Observed() {}

  /** The rows that can be drawn: finite, and with an output that is an ordinary number. */
  static List<Point> points(Fitted fit) {
    return fit.points().stream()
        .filter(
            p ->
                Double.isFinite(Math.exp(p.fitted()))
                    && Math.exp(p.fitted()) > 0
                    && Double.isFinite(Math.exp(p.actual()))
                    && Math.exp(p.actual()) > 0
                    && Double.isFinite(p.residual()))
        .toList();
  }

  /** The rows that weigh most, by Cook's distance. */
  static List<Point> influential(Fitted fit, List<Point> points) {
    List<Integer> rows =
        fit.influence().stream()
            .sorted(
                Comparator.comparingDouble(Influential::cook)
                    .reversed()
                    .thenComparingInt(Influential::row))
            .limit(MARKED)
            .map(Influential::row)
            .toList();
    return rows.stream()
        .flatMap(row -> points.stream().filter(p -> p.row() == row).limit(1))
        .toList();
  }

  /** The sample of rows drawn, the influential ones besides. */
  static List<Point> drawn(List<Point> points, List<Point> influential) {
    List<Point> sample = Sample.of(points);
    return Stream.concat(sample.stream(), influential.stream().filter(p -> !sample.contains(p)))
        .toList();
  }

  /** "GW-03, 2021", shortened where the name is long. */
  static String name(String plant, String period) {
    String shortened =
        plant.codePointCount(0, plant.length()) > LONGEST
            ? plant.substring(0, plant.offsetByCodePoints(0, LONGEST - 1)) + "…"
            : plant;
    return shortened + ", " + period;
  }
}
