package isowright.charts;

import static org.assertj.core.api.Assertions.assertThat;

import isowright.charts.Chart.Kind;
import isowright.charts.Drawing.Letters;
import isowright.study.Findings;
import isowright.study.FindingsFixture;
import isowright.study.PlanFindings.Planned;
import isowright.study.RealFindings;
import java.awt.geom.Rectangle2D;
import java.awt.image.BufferedImage;
import java.io.ByteArrayInputStream;
import java.io.IOException;
import java.util.ArrayList;
import java.util.EnumSet;
import java.util.HashSet;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Set;
import java.util.stream.Stream;
import javax.imageio.ImageIO;
import org.junit.jupiter.api.Named;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import org.w3c.dom.Element;

/**
 * Every chart of invented and real studies by its structure: it can be read by people who do not
 * see it, its letters stand inside the picture and not on one another, and both forms show it.
 */
class ChartsTest {

  private static final Map<String, Findings> STUDIES = RealFindings.withInvented();

  /** Letters may touch by so much before they are hard to read, in pixels. */
  private static final double TOUCHING = 1;

  /** Drawn once: a chart keeps its picture. */
  private static final List<Named<Chart>> CHARTS =
      STUDIES.entrySet().stream()
          .flatMap(
              study ->
                  Charts.of(study.getValue()).stream()
                      .map(chart -> Named.of(study.getKey() + ", " + chart.name(), chart)))
          .toList();

  static Stream<Named<Chart>> all() {
    return CHARTS.stream();
  }

  @Test
  void everyFamilyIsDrawn() {
    Set<Kind> demo = new HashSet<>();
    Charts.of(RealFindings.of(RealFindings.Study.DEMO)).forEach(c -> demo.add(c.kind()));
    // the demo asks for no allowance, matrix, split, frontier or cost function, the invented
    // findings hold less
    Set<Kind> asked =
        EnumSet.complementOf(EnumSet.of(Kind.ALLOWANCE_PATH, Kind.SPECIFICATIONS, Kind.SPLIT));
    asked.removeAll(
        EnumSet.of(
            Kind.INEFFICIENCY,
            Kind.AVERAGE_COST,
            Kind.SCALE_ECONOMIES,
            Kind.COST_SHARES,
            Kind.PRICE_ELASTICITIES));
    assertThat(demo).containsExactlyInAnyOrderElementsOf(asked);
    Set<Kind> invented = new HashSet<>();
    Charts.of(FindingsFixture.glassworks()).forEach(c -> invented.add(c.kind()));
    asked.removeAll(
        EnumSet.of(
            Kind.ORDERED_RATIOS, Kind.ENVELOPE, Kind.DEMAND, Kind.CHANGES, Kind.EFFICIENT_SCALE));
    assertThat(invented).containsExactlyInAnyOrderElementsOf(asked);
  }

  /** Four headline figures, the chosen specification named in every picture's text. */
  @Test
  void everyHeadlineOfAMatrixIsDrawn() {
    Findings findings = RealFindings.of(RealFindings.Study.SPECIFICATIONS);
    List<Chart> drawn =
        Charts.of(findings).stream().filter(c -> c.kind() == Kind.SPECIFICATIONS).toList();
    assertThat(drawn)
        .extracting(Chart::name)
        .containsExactly(
            "specifications-returns-to-scale",
            "specifications-substitution",
            "specifications-least-cost",
            "specifications-gap");
    for (Chart chart : drawn) {
      assertThat(chart.rows()).hasSize(24);
      assertThat(chart.rows()).filteredOn(row -> row.get(4).startsWith("chosen")).hasSize(1);
      assertThat(chart.alternative()).contains("laid down beforehand choose ", "diamond");
    }
  }

  /** A chart for every answer, and none where there is no answer. */
  @Test
  void whatHasNoAnswerHasNoChart() {
    for (Findings findings : STUDIES.values()) {
      List<Chart> charts = Charts.of(findings);
      for (Planned plan : findings.plans()) {
        String subject = plan.question() + ", " + plan.technology();
        boolean drawn =
            charts.stream().anyMatch(c -> c.kind() == Kind.ISOQUANT && c.subject().equals(subject));
        assertThat(drawn).as(subject).isEqualTo(plan.answered() && !plan.isoquant().isEmpty());
      }
    }
  }

  @Test
  void namesAreSafeAndUniqueInAStudy() {
    for (Findings findings : STUDIES.values()) {
      assertThat(Charts.of(findings).stream().map(Chart::name))
          .doesNotHaveDuplicates()
          .allMatch(name -> name.matches("[a-z0-9][a-z0-9-]*"));
    }
  }

  @ParameterizedTest
  @MethodSource("all")
  void canBeReadByThoseWhoDoNotSeeIt(Chart chart) {
    for (String svg : List.of(chart.svg().get(), chart.figure().get())) {
      Drawing drawing = Drawing.of(svg);
      assertThat(drawing.root().getAttribute("role")).isEqualTo("img");
      String[] label = drawing.root().getAttribute("aria-labelledby").split(" ");
      assertThat(label).hasSize(2);
      assertThat(text(drawing, label[0])).isEqualTo(chart.title());
      assertThat(text(drawing, label[1])).isEqualTo(chart.alternative());
      assertThat(drawing.elements())
          .noneMatch(e -> List.of("script", "image", "foreignObject").contains(e.getLocalName()));
      List<String> ids = new ArrayList<>();
      for (Element element : drawing.elements()) {
        if (element.hasAttribute("id")) {
          ids.add(element.getAttribute("id"));
        }
        String clip = element.getAttribute("clip-path");
        if (!clip.isEmpty()) {
          assertThat(drawing.withId(clip.substring(5, clip.length() - 1))).as(clip).isPresent();
        }
      }
      assertThat(ids).doesNotHaveDuplicates();
    }
    // The finding, and more of it than the title says.
    assertThat(chart.alternative()).startsWith(chart.title()).isNotEqualTo(chart.title());
    assertThat(chart.caption()).isNotBlank();
  }

  private static String text(Drawing drawing, String id) {
    return drawing.withId(id).orElseThrow().getTextContent();
  }

  /** Money and quantities are never without their unit, where one is stated. */
  @ParameterizedTest
  @MethodSource("unitsOfCharts")
  void theTextNamesItsUnits(Chart chart, Findings.Units units) {
    String letters =
        String.join(
            " ", Drawing.of(chart.svg().get()).letters().stream().map(Letters::text).toList());
    String head = String.join(" ", chart.header());
    String firstUnit = units.inputs().values().iterator().next();
    switch (chart.kind()) {
      case ISOQUANT, EXPANSION_PATH -> {
        assertThat(letters).contains("(" + firstUnit + ")");
        assertThat(head).contains("(" + firstUnit + ")");
        assertThat(chart.title() + chart.caption()).contains(firstUnit);
      }
      case COST_CURVES -> {
        assertThat(letters).contains(units.money() + " per " + units.output());
        assertThat(chart.alternative()).contains(units.money());
        assertThat(head).contains(units.money());
      }
      case FILING, GAP_PARTS, ALLOWANCE_PATH -> {
        assertThat(letters).contains(units.money());
        assertThat(head).contains(units.money());
      }
      case ACTUAL_PREDICTED, RESIDUALS -> {
        assertThat(letters).contains("(" + units.output() + ")");
        assertThat(head).contains("(" + units.output() + ")");
      }
      case ORDERED_RATIOS -> assertThat(letters).contains("filed over least cost");
      case ELASTICITIES, PROFILE -> assertThat(letters).containsAnyOf("elasticity", "returns");
    }
  }

  static Stream<org.junit.jupiter.params.provider.Arguments> unitsOfCharts() {
    return Stream.of(FindingsFixture.glassworks(), RealFindings.of(RealFindings.Study.DEMO))
        .flatMap(
            f ->
                Charts.of(f).stream()
                    .map(
                        c ->
                            org.junit.jupiter.params.provider.Arguments.of(
                                Named.of(c.name(), c), f.units())));
  }

  @ParameterizedTest
  @MethodSource("all")
  void hasATableWithoutHoles(Chart chart) {
    assertThat(chart.header()).isNotEmpty().allSatisfy(head -> assertThat(head).isNotBlank());
    assertThat(chart.rows())
        .isNotEmpty()
        .allSatisfy(row -> assertThat(row).hasSameSizeAs(chart.header()))
        .allSatisfy(row -> assertThat(row.get(0)).isNotBlank());
  }

  @ParameterizedTest
  @MethodSource("all")
  void printsNoNumberOfAMachine(Chart chart) {
    String everything =
        chart.svg().get() + chart.title() + chart.caption() + chart.alternative() + chart.rows();
    assertThat(everything)
        .doesNotContainPattern("\\b(NaN|Infinity|null|Optional)\\b")
        .doesNotContainPattern("(?i)unbounded|not known");
  }

  @ParameterizedTest
  @MethodSource("all")
  void lettersStandInsideThePicture(Chart chart) {
    for (String svg : List.of(chart.svg().get(), chart.figure().get())) {
      Drawing drawing = Drawing.of(svg);
      Rectangle2D view = drawing.view();
      for (Letters letters : drawing.letters()) {
        assertThat(view.contains(letters.box()))
            .as("'%s' at %s in %s", letters.text(), letters.box(), view)
            .isTrue();
      }
    }
  }

  @ParameterizedTest
  @MethodSource("all")
  void lettersDoNotStandOnOneAnother(Chart chart) {
    List<Letters> all = Drawing.of(chart.svg().get()).letters();
    List<String> overlapping = new ArrayList<>();
    for (int i = 0; i < all.size(); i++) {
      for (int j = 0; j < i; j++) {
        Rectangle2D both = all.get(i).box().createIntersection(all.get(j).box());
        if (both.getWidth() > TOUCHING && both.getHeight() > TOUCHING) {
          overlapping.add(
              String.format(
                  Locale.ROOT,
                  "'%s' and '%s' by %.1f × %.1f",
                  all.get(j).text(),
                  all.get(i).text(),
                  both.getWidth(),
                  both.getHeight()));
        }
      }
    }
    assertThat(overlapping).isEmpty();
  }

  /** One chart of each kind of each study: pixels take time. */
  static Stream<Named<Chart>> someOfEachKind() {
    Set<String> seen = new HashSet<>();
    return CHARTS.stream()
        .filter(c -> seen.add(c.getName().split(", ", 2)[0] + c.getPayload().kind()));
  }

  /** Twice the size of the drawing, and with more than one colour on it. */
  @ParameterizedTest
  @MethodSource("someOfEachKind")
  void thePixelsAreThoseOfTheDrawing(Chart chart) throws IOException {
    BufferedImage image = ImageIO.read(new ByteArrayInputStream(chart.png().get()));
    Rectangle2D view = Drawing.of(chart.svg().get()).view();
    assertThat(image.getWidth()).isEqualTo((int) Math.round(2 * view.getWidth()));
    assertThat(image.getHeight()).isEqualTo((int) Math.round(2 * view.getHeight()));
    Set<Integer> colours = new HashSet<>();
    int inked = 0;
    for (int x = 0; x < image.getWidth(); x += 2) {
      for (int y = 0; y < image.getHeight(); y += 2) {
        int colour = image.getRGB(x, y) & 0xffffff;
        colours.add(colour);
        inked += colour == 0xffffff ? 0 : 1;
      }
    }
    assertThat(colours).hasSizeGreaterThan(10);
    // Letters and lines of the sparsest chart cover more than a two-hundredth of the paper.
    assertThat(inked).isGreaterThan(image.getWidth() / 2 * image.getHeight() / 2 / 200);
  }

  @Test
  void theSameFindingsGiveTheSamePictures() {
    List<Chart> once = Charts.of(FindingsFixture.glassworks());
    List<Chart> again = Charts.of(FindingsFixture.glassworks());
    assertThat(again.get(0).png().get()).isEqualTo(once.get(0).png().get());
    for (int i = 0; i < once.size(); i++) {
      assertThat(again.get(i).svg().get()).isEqualTo(once.get(i).svg().get());
      assertThat(again.get(i).rows()).isEqualTo(once.get(i).rows());
    }
  }

  @Test
  void markupInNamesIsTextAlone() {
    boolean seen = false;
    for (Chart chart : Charts.of(FindingsFixture.withMarkup())) {
      Drawing drawing = Drawing.of(chart.svg().get());
      assertThat(drawing.elements())
          .noneMatch(e -> List.of("b", "i", "script").contains(e.getLocalName()));
      seen |= chart.rows().toString().contains(FindingsFixture.MARKUP);
    }
    assertThat(seen).isTrue();
  }
}
