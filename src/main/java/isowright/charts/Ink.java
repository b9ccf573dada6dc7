package isowright.charts;

import java.awt.Color;

/**
 * A colour that remembers what is drawn with it, so that a picture can say which of its marks
 * belong to which series.
 */
final class Ink extends Color {

  private static final long serialVersionUID = 1L;

  private final String series;

  /** A colour for a series. */
  Ink(Color color, String series) {
    super(color.getRGB(), true);
    this.series = series;
  }

  /** The series. */
  String series() {
    return series;
  }

  /** The series of a colour, empty if it has none. */
  static String series(Color color) {
    return color instanceof Ink ink ? ink.series : "";
  }

  @Override
  public boolean equals(Object other) {
    return other instanceof Ink ink && super.equals(ink) && series.equals(ink.series);
  }

  @Override
  public int hashCode() {
    return 31 * super.hashCode() + series.hashCode();
  }
}
