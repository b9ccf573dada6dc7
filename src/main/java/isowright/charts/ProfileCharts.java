package isowright.charts;

import isowright.charts.Drawn.Said;
import isowright.charts.Drawn.Table;
import isowright.charts.Plot.Side;
import isowright.charts.Style.Dot;
import isowright.charts.Style.Pen;
import isowright.study.FitFindings.Curvature;
import isowright.study.FitFindings.Fitted;
import isowright.study.FitFindings.ProfilePoint;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;

/**
 * The least sum of squares along the elasticity of substitution: where it is least, how flat its
 * valley is, and which values the records do not rule out.
 */
final class ProfileCharts {

  /** The frame shows sums of squares up to this many times the threshold's height. */
  private static final double FRAME = 5;

  private final Fitted fit;
  private final Curvature curvature;
  private final Setting setting;
  private final List<ProfilePoint> profile;
  private final ProfilePoint least;

  private ProfileCharts(
      Fitted fit, Curvature curvature, Setting setting, List<ProfilePoint> profile) {
    this.fit = fit;
    this.curvature = curvature;
    this.setting = setting;
    this.profile = profile;
    least = profile.stream().min(Comparator.comparingDouble(ProfilePoint::ssr)).orElseThrow();
  }

  /** The charts of a fit, one for each curvature. */
  static List<Chart> of(Fitted fit, Setting setting) {
    return fit.curvatures().stream()
        .flatMap(curvature -> of(fit, curvature, setting).stream())
        .toList();
  }

  private static Optional<Chart> of(Fitted fit, Curvature curvature, Setting setting) {
    List<ProfilePoint> drawable =
        curvature.curve().stream()
            .filter(
                p ->
                    p.substitution() > 0
                        && Double.isFinite(p.substitution())
                        && Double.isFinite(p.ssr()))
            .sorted(Comparator.comparingDouble(ProfilePoint::substitution))
            .toList();
    return drawable.size() < 2
        ? Optional.empty()
        : Optional.of(new ProfileCharts(fit, curvature, setting, drawable).chart());
  }

  private Chart chart() {
    String technology = Words.sentence(Words.technology(fit.technology()));
    String nest = nest().isEmpty() ? "" : " within " + nest().replace("+", " and ");
    String title = technology + nest + ": " + finding(curvature, least.substitution());
    String caption =
        curvature.words()
            + " Values of the elasticity of substitution whose sum of squares lies under the"
            + " threshold are not ruled out at the "
            + setting.level()
            + " level (shaded). At one the form is Cobb-Douglas.";
    return Drawn.chart(
        Chart.Kind.PROFILE,
        new Said(
            fit.technology(),
            setting.names().of("profile", fit.technology(), nest()),
            title,
            caption,
            alternative(title)),
        table(),
        this::plot);
  }

  /** The nest inside which the curvature rules; empty for that between nests and the only one. */
  private String nest() {
    int colon = curvature.name().indexOf(':');
    return colon < 0 ? "" : curvature.name().substring(colon + 1);
  }

  /** The state of the profile in words that claim no more than it. */
  static String finding(Curvature curvature, double atLeast) {
    String interval = interval(curvature.substitutionLow(), curvature.substitutionHigh());
    return switch (curvature.state()) {
      case "interior" ->
          "the best elasticity of substitution is about "
              + Numbers.brief(atLeast)
              + (interval.isEmpty() ? "" : ", interval " + interval);
      case "boundary" ->
          "no best elasticity of substitution in the admissible range"
              + (interval.isEmpty() ? "" : "; not ruled out: " + interval);
      default ->
          "the records hardly tell the elasticity of substitution"
              + (interval.isEmpty() ? "" : "; not ruled out: " + interval);
    };
  }

  /** "0.33 to 1.18", "below 0.5", "above 1.6", "any value"; empty where not known. */
  static String interval(double low, double high) {
    if (Double.isNaN(low) || Double.isNaN(high)) {
      return "";
    }
    boolean openBelow = low <= 0;
    boolean openAbove = Double.isInfinite(high);
    if (openBelow) {
      return openAbove ? "any value" : "below " + Numbers.brief(high);
    }
    return openAbove
        ? "above " + Numbers.brief(low)
        : Numbers.brief(low) + " to " + Numbers.brief(high);
  }

  private ProfilePoint first() {
    return profile.get(0);
  }

  private ProfilePoint last() {
    return profile.get(profile.size() - 1);
  }

  private String alternative(String title) {
    return title
        + ". The sum of squares is "
        + Numbers.brief(first().ssr())
        + " at an elasticity of substitution of "
        + Numbers.brief(first().substitution())
        + ", least with "
        + Numbers.brief(least.ssr())
        + " at "
        + Numbers.brief(least.substitution())
        + ", and "
        + Numbers.brief(last().ssr())
        + " at "
        + Numbers.brief(last().substitution())
        + "; the threshold is "
        + Numbers.brief(curvature.threshold())
        + ".";
  }

  private Table table() {
    Table table =
        Table.of(
            "elasticity of substitution", "curvature parameter", "sum of squares", "not ruled out");
    for (ProfilePoint point : profile) {
      table.row(
          Numbers.tabular(point.substitution()),
          Numbers.tabular(point.curvature()),
          Numbers.tabular(point.ssr()),
          point.ssr() <= curvature.threshold() ? "yes" : "no");
    }
    return table;
  }

  private Plot plot() {
    double[] x = profile.stream().mapToDouble(ProfilePoint::substitution).toArray();
    double[] y = profile.stream().mapToDouble(ProfilePoint::ssr).toArray();
    double height = curvature.threshold() - least.ssr();
    double most = Curves.most(y);
    double top = height > 0 ? Math.min(most, least.ssr() + FRAME * height) : most;
    Plot plot =
        new Plot(
            Axis.logarithmic("elasticity of substitution", x[0], x[x.length - 1]),
            Axis.around("sum of squares", least.ssr(), Math.max(top, curvature.threshold())));
    shade(plot);
    if (plot.x().holds(1)) {
      plot.vertical("unit elasticity", 1, Pen.REFERENCE);
    }
    if (height > 0) {
      plot.horizontal("threshold", curvature.threshold(), Pen.SECOND);
      double[] places = {x[1], x[x.length - 2]};
      double[] level = {curvature.threshold(), curvature.threshold()};
      plot.labelAlong(
          "threshold, " + setting.level(),
          places,
          level,
          Style.WARM,
          Side.NORTH_EAST,
          Side.NORTH_WEST);
    }
    plot.line("sum of squares", x, y, Pen.MAIN);
    double[] bestX = {least.substitution()};
    double[] bestY = {least.ssr()};
    plot.dots("least", bestX, bestY, Dot.ANSWER);
    plot.label(
        curvature.state().equals("boundary")
            ? "still falling at the edge"
            : "least, at " + Numbers.brief(least.substitution()),
        bestX[0],
        bestY[0],
        Style.WARM,
        Side.NORTH,
        Side.NORTH_WEST,
        Side.NORTH_EAST,
        Side.EAST,
        Side.WEST);
    if (plot.x().holds(1)) {
      plot.label(
          "1: Cobb-Douglas",
          1,
          plot.y().high(),
          Style.QUIET_TEXT,
          Side.SOUTH_EAST,
          Side.SOUTH_WEST);
    }
    return plot;
  }

  /** Shades the interval, up to the frame where it is open. */
  private void shade(Plot plot) {
    double low = curvature.substitutionLow();
    double high = curvature.substitutionHigh();
    if (low <= high && high >= plot.x().low() && low <= plot.x().high()) {
      plot.region("interval", low, high);
      plot.keyOfShade("not ruled out at the " + setting.level() + " level");
    }
  }
}
