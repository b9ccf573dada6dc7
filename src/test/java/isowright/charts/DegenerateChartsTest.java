package isowright.charts;

import static org.assertj.core.api.Assertions.assertThat;

import isowright.charts.Drawing.Letters;
import isowright.study.DistortedFindings;
import java.awt.geom.Rectangle2D;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Set;
import java.util.stream.Stream;
import org.junit.jupiter.api.Named;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/** Findings at the edge of what can be drawn neither stop a chart nor make it print nonsense. */
class DegenerateChartsTest {

  private static final List<Named<Chart>> CHARTS =
      DistortedFindings.all().entrySet().stream()
          .flatMap(
              entry ->
                  Charts.of(entry.getValue()).stream()
                      .map(chart -> Named.of(entry.getKey() + ": " + chart.name(), chart)))
          .toList();

  static Stream<Named<Chart>> all() {
    return CHARTS.stream();
  }

  @ParameterizedTest
  @MethodSource("all")
  void isDrawnAndSaysNothingOfAMachine(Chart chart) {
    String everything =
        chart.svg().get()
            + chart.figure().get()
            + chart.title()
            + chart.caption()
            + chart.alternative()
            + chart.header()
            + chart.rows();
    assertThat(everything)
        .doesNotContainPattern("\\b(NaN|null|Optional)\\b")
        .doesNotContainPattern("Infinity|∞");
    assertThat(chart.title() + chart.caption() + chart.alternative())
        .doesNotContainPattern("not known|unbounded");
  }

  @ParameterizedTest
  @MethodSource("all")
  void lettersStandInsideThePictureAndApart(Chart chart) {
    Drawing drawing = Drawing.of(chart.svg().get());
    Rectangle2D view = drawing.view();
    List<Letters> all = drawing.letters();
    List<String> overlapping = new ArrayList<>();
    for (int i = 0; i < all.size(); i++) {
      assertThat(view.contains(all.get(i).box()))
          .as("'%s' at %s", all.get(i).text(), all.get(i).box())
          .isTrue();
      for (int j = 0; j < i; j++) {
        Rectangle2D both = all.get(i).box().createIntersection(all.get(j).box());
        if (both.getWidth() > 1 && both.getHeight() > 1) {
          overlapping.add(all.get(j).text() + " | " + all.get(i).text());
        }
      }
    }
    assertThat(overlapping).isEmpty();
  }

  static Stream<Named<Chart>> someOfEachKind() {
    Set<String> seen = new HashSet<>();
    return CHARTS.stream()
        .filter(c -> seen.add(c.getName().split(":", 2)[0] + c.getPayload().kind()));
  }

  @ParameterizedTest
  @MethodSource("someOfEachKind")
  void isPaintedInPixels(Chart chart) {
    assertThat(chart.png().get()).hasSizeGreaterThan(1000);
  }
}
