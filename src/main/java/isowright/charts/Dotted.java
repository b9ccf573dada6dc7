package isowright.charts;

import isowright.charts.Style.Dot;
import java.awt.BasicStroke;
import java.awt.Color;
import java.awt.Graphics2D;
import java.awt.geom.Ellipse2D;
import java.awt.geom.Path2D;
import org.knowm.xchart.style.markers.Marker;

/** A dot as the chart library asks for it: at a place, in the colour in force. */
final class Dotted extends Marker {

  private static final BasicStroke RIM = new BasicStroke(1.3f);
  private static final BasicStroke RING = new BasicStroke(1.6f);

  private final Dot dot;

  /** For a dot. */
  Dotted(Dot dot) {
    this.dot = dot;
  }

  @Override
  public void paint(Graphics2D g, double x, double y, int ignoredSize) {
    double r = dot.size() / 2.0;
    Ellipse2D circle = new Ellipse2D.Double(x - r, y - r, 2 * r, 2 * r);
    switch (dot.form()) {
      case DISC -> g.fill(circle);
      case CIRCLE -> {
        g.setStroke(RIM);
        g.draw(circle);
      }
      case DISC_WITH_RING -> {
        g.fill(circle);
        Color color = g.getColor();
        g.setStroke(RING);
        g.setColor(Style.PAPER);
        g.draw(circle);
        g.setColor(color);
      }
      case DIAMOND -> {
        Path2D.Double diamond = new Path2D.Double();
        diamond.moveTo(x - r, y);
        diamond.lineTo(x, y - r);
        diamond.lineTo(x + r, y);
        diamond.lineTo(x, y + r);
        diamond.closePath();
        g.fill(diamond);
      }
    }
  }
}
