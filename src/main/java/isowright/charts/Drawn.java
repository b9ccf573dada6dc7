package isowright.charts;

import java.util.ArrayList;
import java.util.List;
import java.util.function.Supplier;
import org.jspecify.annotations.Nullable;

/**
 * Everything of a chart before it is drawn. Drawing waits until a picture is asked for, is done
 * once, and may be asked for from several threads.
 */
final class Drawn {

  /**
   * The table beside a chart.
   *
   * @param header its headings
   * @param rows its rows
   */
  record Table(List<String> header, List<List<String>> rows) {

    /** A table without rows. */
    static Table of(String... header) {
      return new Table(List.of(header), new ArrayList<>());
    }

    /** A table without rows. */
    static Table of(List<String> header) {
      return new Table(List.copyOf(header), new ArrayList<>());
    }

    /** Adds a row. */
    void row(List<String> cells) {
      rows.add(List.copyOf(cells));
    }

    /** Adds a row. */
    void row(String... cells) {
      rows.add(List.of(cells));
    }
  }

  /**
   * The words of a chart.
   *
   * @param subject what it is about
   * @param name its file name
   * @param title the finding
   * @param caption what to look at
   * @param alternative the text alternative
   */
  record Said(String subject, String name, String title, String caption, String alternative) {}

  private final Supplier<Plot> plot;
  private final String title;
  private @Nullable Picture picture;

  private Drawn(Supplier<Plot> plot, String title) {
    this.plot = plot;
    this.title = title;
  }

  /** A chart whose plot is made and drawn when it is first looked at. */
  static Chart chart(Chart.Kind kind, Said said, Table table, Supplier<Plot> plot) {
    Drawn drawn = new Drawn(plot, said.title());
    return new Chart(
        kind,
        said.subject(),
        said.name(),
        said.title(),
        said.caption(),
        said.alternative(),
        table.header(),
        table.rows(),
        () -> drawn.svg(said, true),
        () -> PngWriter.write(drawn.picture()),
        () -> drawn.svg(said, false));
  }

  private String svg(Said said, boolean withHeading) {
    return SvgWriter.write(picture(), said.name(), title, said.alternative(), withHeading);
  }

  private synchronized Picture picture() {
    Picture known = picture;
    if (known == null) {
      known = Painter.picture(plot.get(), title);
      picture = known;
    }
    return known;
  }
}
