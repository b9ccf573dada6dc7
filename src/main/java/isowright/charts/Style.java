package isowright.charts;

import java.awt.BasicStroke;
import java.awt.Color;
import java.awt.Font;

/**
 * The one visual language of all charts: colours, strokes, dots, letters, sizes.
 *
 * <p>Three colours carry data. They differ in lightness (L* about 24, 48 and 56), so that they can
 * be told apart in grey, and stay apart for readers who confuse red and green; strokes and dots
 * differ as well, so that nothing depends on colour alone. Text has a contrast of at least 4.5 to
 * 1, lines and dots of at least 3 to 1 on white (WCAG 2.1, success criteria 1.4.3 and 1.4.11).
 * Tested in {@code StyleTest}.
 */
final class Style {

  /** The paper. */
  static final Color PAPER = Color.WHITE;

  /** Text. */
  static final Color TEXT = new Color(0x1d2733);

  /** Text that stands back: axis titles, tick labels, keys. */
  static final Color QUIET_TEXT = new Color(0x4a5663);

  /** Axis lines. */
  static final Color AXIS = new Color(0x6b7680);

  /** Grid lines: decoration, no information. */
  static final Color GRID = new Color(0xe4e8ec);

  /** The colour of what the chart is about. */
  static final Color DEEP = new Color(0x0a3f52);

  /** The colour of what it is held against. */
  static final Color WARM = new Color(0xbf4d1a);

  /** The colour of the background of observations and reference lines. */
  static final Color SLATE = new Color(0x7a8794);

  /** Shade of a region. */
  static final Color SHADE = new Color(0xe9edf1);

  /** How opaque a band is. */
  static final int BAND_ALPHA = 38;

  /** Width of every picture. */
  static final int WIDTH = 720;

  /** Height of the pictures without heading. */
  static final int HEIGHT = 430;

  /** Size of letters in labels and axes. */
  static final float LETTERS = 13f;

  /** Size of letters in the heading. */
  static final float HEADING_LETTERS = 17f;

  /** Distance of lines of the heading. */
  static final int HEADING_LEADING = 23;

  /** What a browser looks for, in the order of likeness to the letters measured here. */
  static final String FAMILIES = "DejaVu Sans, Verdana, Segoe UI, Arial, sans-serif";

  private Style() {}

  /** The letters: the logical sans serif of the machine, DejaVu Sans on a headless Debian. */
  static Font font(float size, boolean bold) {
    return new Font(Font.SANS_SERIF, bold ? Font.BOLD : Font.PLAIN, 1).deriveFont(size);
  }

  /** How a line is drawn. */
  enum Pen {
    /** The curve that the chart is about. */
    MAIN(DEEP, 2.6f),
    /** The same where it leaves the records. */
    MAIN_BEYOND(DEEP, 2.2f, 3f, 3f),
    /** A second curve. */
    SECOND(WARM, 2.2f, 9f, 5f),
    /** A line of reference. */
    REFERENCE(AXIS, 1.4f, 2f, 4f),
    /** An interval. */
    INTERVAL(DEEP, 2f),
    /** A bar. */
    BAR(DEEP, 11f),
    /** A bar that is told apart from the first by its colour and width. */
    SECOND_BAR(WARM, 6f),
    /** An interval over a bar. */
    BAR_INTERVAL(WARM, 2f),
    /** A thin interval behind many dots. */
    THIN_INTERVAL(SLATE, 1.2f),
    /** The edge of a band of the first curve. */
    MAIN_EDGE(DEEP, 0.8f),
    /** The edge of a band of the second curve. */
    SECOND_EDGE(WARM, 0.8f, 4f, 3f),
    /** A bar of the first part of a sum: filled. */
    PART_FIRST(DEEP, 11f),
    /** A bar of the second part: filled, lighter. */
    PART_SECOND(WARM, 11f),
    /** A bar of the third part: striped. */
    PART_THIRD(SLATE, 11f, 3f, 1.5f),
    /** A bar of the fourth part: widely striped. */
    PART_FOURTH(AXIS, 11f, 1.5f, 3.5f),
    /** An interval beside a bar. */
    FINE_INTERVAL(DEEP, 1.4f),
    /** A bracket around what belongs together. */
    BRACKET(WARM, 2f),
    /** Nothing. */
    NONE(PAPER, 1f);

    private final Color color;
    private final BasicStroke stroke;

    Pen(Color color, float width, float... dashes) {
      this.color = color;
      this.stroke =
          dashes.length == 0
              ? new BasicStroke(width, BasicStroke.CAP_BUTT, BasicStroke.JOIN_ROUND)
              : new BasicStroke(
                  width, BasicStroke.CAP_BUTT, BasicStroke.JOIN_ROUND, 10f, dashes, 0f);
    }

    Color color() {
      return color;
    }

    BasicStroke stroke() {
      return stroke;
    }
  }

  /** How a point is drawn. */
  enum Dot {
    /** The point that the chart is about. */
    ANSWER(WARM, 11, Form.DISC_WITH_RING),
    /** An estimate. */
    ESTIMATE(DEEP, 10, Form.DISC_WITH_RING),
    /** A step on a curve. */
    STEP(DEEP, 7, Form.DISC_WITH_RING),
    /** A sum beneath the bars of its parts. */
    TOTAL(DEEP, 6, Form.DISC),
    /** An exact number. */
    EXACT(DEEP, 11, Form.DIAMOND),
    /** An observation that counts here. */
    NEAR(SLATE, 6, Form.DISC),
    /** Another observation. */
    FAR(SLATE, 6, Form.CIRCLE),
    /** An observation marked out. */
    MARKED(WARM, 7, Form.DIAMOND),
    /** An estimate marked out. */
    CHOSEN(WARM, 13, Form.DIAMOND);

    private final Color color;
    private final int size;
    private final Form form;

    Dot(Color color, int size, Form form) {
      this.color = color;
      this.size = size;
      this.form = form;
    }

    Color color() {
      return color;
    }

    int size() {
      return size;
    }

    Form form() {
      return form;
    }
  }

  /** The shape of a dot. */
  enum Form {
    /** A filled disc. */
    DISC,
    /** A filled disc with a ring of paper, so that it stands out from lines. */
    DISC_WITH_RING,
    /** An open circle. */
    CIRCLE,
    /** A filled diamond. */
    DIAMOND
  }
}
