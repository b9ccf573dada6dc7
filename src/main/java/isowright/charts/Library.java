package isowright.charts;

import isowright.charts.Plot.Band;
import isowright.charts.Plot.Dots;
import isowright.charts.Plot.Layer;
import isowright.charts.Plot.Line;
import java.awt.BasicStroke;
import java.awt.Color;
import java.util.Arrays;
import java.util.Locale;
import org.knowm.xchart.XYChart;
import org.knowm.xchart.XYSeries;
import org.knowm.xchart.XYSeries.XYSeriesRenderStyle;
import org.knowm.xchart.style.AxesChartStyler.TextAlignment;
import org.knowm.xchart.style.XYStyler;
import org.knowm.xchart.style.lines.SeriesLines;
import org.knowm.xchart.style.markers.SeriesMarkers;

/** A {@link Plot} handed to the chart library: its series, its axes, our style. */
final class Library {

  private static final Color CLEAR = new Color(0, 0, 0, 0);

  /** By which share of its range an axis is let out, so that ticks at its very ends are drawn. */
  private static final double LET_OUT = 1e-9;

  /** The same for logarithmic axes, whose ticks the library puts at whole pixels. */
  private static final double LET_OUT_LOGARITHMIC = 0.003;

  private Library() {}

  /** The chart of a plot, ready to be painted. */
  static XYChart chart(Plot plot, int width, int height) {
    XYChart chart = new XYChart(width, height);
    XYStyler styler = chart.getStyler();
    plain(styler);
    ends(styler, plot.x(), true);
    ends(styler, plot.y(), false);
    frame(chart, plot);
    int number = 0;
    for (Layer layer : plot.layers()) {
      add(chart, plot, layer, Integer.toString(number++));
    }
    return chart;
  }

  /** Lets the ticks of a chart be labelled. */
  static void label(XYChart chart, TickLabels ticks, boolean verticalAxisMeasures) {
    XYStyler styler = chart.getStyler();
    styler.setXAxisTickLabelsFormattingFunction(ticks::ofHorizontal);
    styler.setYAxisTickLabelsFormattingFunction(ticks::ofVertical);
    styler.setYAxisTicksVisible(verticalAxisMeasures);
    styler.setPlotGridHorizontalLinesVisible(verticalAxisMeasures);
  }

  /**
   * Lets a painted chart say where its values lie. The library answers "in the middle" for a plot
   * that is narrower or lower than the distance asked for between ticks of the horizontal axis,
   * which no longer matters once the ticks are painted.
   */
  static void locate(XYChart chart) {
    chart.getStyler().setXAxisTickMarkSpacingHint(1);
  }

  private static void plain(XYStyler styler) {
    styler.setLocale(Locale.ROOT);
    styler.setChartBackgroundColor(CLEAR);
    styler.setPlotBackgroundColor(CLEAR);
    styler.setPlotBorderVisible(false);
    styler.setLegendVisible(false);
    styler.setChartTitleVisible(false);
    styler.setAxisTitlesVisible(false);
    styler.setChartPadding(12);
    styler.setPlotMargin(0);
    styler.setPlotContentSize(1);
    styler.setPlotTicksMarksVisible(false);
    // The grid would be painted over these lines where a tick lies at the end of an axis.
    styler.setAxisTicksLineVisible(false);
    styler.setXAxisLogarithmicDecadeOnly(false);
    styler.setYAxisLogarithmicDecadeOnly(false);
    styler.setPlotGridLinesColor(Style.GRID);
    styler.setPlotGridLinesStroke(new BasicStroke(1f));
    styler.setAxisTickMarksColor(Style.AXIS);
    styler.setXAxisTickMarksColor(Style.AXIS);
    styler.setYAxisTickMarksColor(Style.AXIS);
    styler.setYAxisGroupTickMarksColorMap(0, Style.AXIS);
    styler.setAxisTickMarksStroke(new BasicStroke(1f));
    styler.setAxisTickMarkLength(5);
    styler.setAxisTickPadding(5);
    styler.setAxisTickLabelsFont(Style.font(Style.LETTERS, false));
    styler.setXAxisTickLabelsColor(TickLabels.HORIZONTAL);
    styler.setYAxisTickLabelsColor(TickLabels.VERTICAL);
    styler.setYAxisGroupTickLabelsColorMap(0, TickLabels.VERTICAL);
    styler.setYAxisLabelAlignment(TextAlignment.Right);
    styler.setXAxisTickMarkSpacingHint(95);
    styler.setYAxisTickMarkSpacingHint(48);
  }

  private static void ends(XYStyler styler, Axis asked, boolean horizontal) {
    Axis axis = inPower(asked);
    double low;
    double high;
    if (axis.logarithmic()) {
      styler.setXAxisLogarithmic(horizontal || styler.isXAxisLogarithmic());
      styler.setYAxisLogarithmic(!horizontal || styler.isYAxisLogarithmic());
      double room = Math.pow(axis.high() / axis.low(), LET_OUT_LOGARITHMIC);
      low = axis.low() / room;
      high = axis.high() * room;
    } else {
      double room = LET_OUT * (axis.high() - axis.low());
      low = axis.low() - room;
      high = axis.high() + room;
    }
    if (horizontal) {
      styler.setXAxisMin(low);
      styler.setXAxisMax(high);
    } else {
      styler.setYAxisMin(low);
      styler.setYAxisMax(high);
    }
  }

  /** An axis in its power of ten: the library counts ticks of extreme sizes without end. */
  private static Axis inPower(Axis axis) {
    return new Axis(
        axis.title(), axis.inPower(axis.low()), axis.inPower(axis.high()), axis.logarithmic());
  }

  private static double[] inPower(Axis axis, double[] values) {
    return axis.exponent() == 0 ? values : Arrays.stream(values).map(axis::inPower).toArray();
  }

  /**
   * An invisible line at uneven places: where all values of a chart are evenly spaced, the library
   * puts ticks at the values instead of at round numbers.
   */
  private static void frame(XYChart chart, Plot plot) {
    double[] x = uneven(inPower(plot.x()));
    double[] y = uneven(inPower(plot.y()));
    XYSeries frame = chart.addSeries("frame", x, y);
    frame.setXYSeriesRenderStyle(XYSeriesRenderStyle.Scatter);
    frame.setMarker(SeriesMarkers.NONE);
  }

  private static double[] uneven(Axis axis) {
    double first =
        axis.logarithmic()
            ? axis.low() * Math.pow(axis.high() / axis.low(), 0.05)
            : axis.low() + 0.05 * (axis.high() - axis.low());
    return new double[] {axis.low(), first, axis.high()};
  }

  private static void add(XYChart chart, Plot plot, Layer layer, String key) {
    if (layer instanceof Band band) {
      int n = band.x().length;
      double[] x = new double[2 * n];
      double[] y = new double[2 * n];
      for (int i = 0; i < n; i++) {
        x[i] = band.x()[i];
        y[i] = band.high()[i];
        x[2 * n - 1 - i] = band.x()[i];
        y[2 * n - 1 - i] = band.low()[i];
      }
      XYSeries series = series(chart, plot, key, x, y);
      series.setXYSeriesRenderStyle(XYSeriesRenderStyle.PolygonArea);
      series.setLineStyle(SeriesLines.NONE);
      series.setMarker(SeriesMarkers.NONE);
      series.setFillColor(new Ink(band.color(), band.name()));
    } else if (layer instanceof Line line) {
      XYSeries series = series(chart, plot, key, line.x(), line.y());
      series.setXYSeriesRenderStyle(XYSeriesRenderStyle.Line);
      series.setMarker(SeriesMarkers.NONE);
      series.setLineStyle(line.pen().stroke());
      series.setLineColor(new Ink(line.pen().color(), line.name()));
    } else if (layer instanceof Dots dots && dots.x().length > 0) {
      XYSeries series = series(chart, plot, key, dots.x(), dots.y());
      series.setXYSeriesRenderStyle(XYSeriesRenderStyle.Scatter);
      series.setMarker(new Dotted(dots.dot()));
      series.setMarkerColor(new Ink(dots.dot().color(), dots.name()));
    }
  }

  private static XYSeries series(XYChart chart, Plot plot, String key, double[] x, double[] y) {
    return chart.addSeries(key, inPower(plot.x(), x), inPower(plot.y(), y));
  }
}
