package isowright.demo;

import static org.assertj.core.api.Assertions.assertThat;

import isowright.study.CostFindings;
import isowright.study.CostFindings.Side;
import isowright.study.Figure;
import isowright.study.Findings;
import isowright.study.Findings.Said;
import isowright.study.Pipeline;
import isowright.study.PlanFindings.Planned;
import isowright.study.Progress;
import isowright.study.StudyFile;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Objects;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;

/**
 * The study of the invented brickworks from file to findings, held against their truth: every
 * headline interval holds it (the seed was chosen once, with the records).
 */
class BrickworksTest {

  private static final double[] PRICES = {30, 110, 14};

  private static Findings findings;

  @BeforeAll
  static void run() throws Exception {
    Path study = Path.of("notebooks-data", "brickworks-costs.yaml");
    findings = Pipeline.run(StudyFile.read(study), Progress.SILENT);
  }

  private static CostFindings.Fitted fit() {
    return findings.costs().fits().get(0);
  }

  @Test
  void committedFileIsTheGenerators() throws Exception {
    assertThat(Files.readString(Path.of("notebooks-data", "brickworks.csv")))
        .isEqualTo(BrickworksGenerator.csv());
  }

  @Test
  void efficientScale() {
    holds(fit().efficient().orElseThrow().output(), BrickworksTruth.EFFICIENT);
  }

  /** The cost function is fitted at the geometric mean of output. */
  @Test
  void scaleEconomiesAndSubstitution() {
    double mean = Objects.requireNonNull(fit().how().base().get("bricks"));
    CostFindings.AtMean at = fit().at().orElseThrow();
    holds(at.scaleEconomies().orElseThrow(), BrickworksTruth.scaleEconomies(mean));
    assertThat(at.substitution())
        .filteredOn(pair -> pair.measure().equals("allen"))
        .hasSize(3)
        .allSatisfy(pair -> holds(pair.figure(), BrickworksTruth.SUBSTITUTION));
  }

  /**
   * Works of level zero; typical works have the mean level of the sample instead, which is close to
   * zero by construction but not known to the test, so it is taken from the generator's draws: the
   * interval must hold the truth at some level within two standard errors of a mean of 36 levels of
   * standard deviation 0.085.
   */
  @Test
  void leastCost() {
    Planned plan = plan("More output", "translog-cost");
    Figure cost = plan.cost().orElseThrow();
    double margin = 2 * 0.085 / 6;
    double least = BrickworksTruth.leastCost(40_000, PRICES, margin);
    double most = BrickworksTruth.leastCost(40_000, PRICES, -margin);
    assertThat(cost.uncertainty().orElseThrow().high()).isGreaterThan(least);
    assertThat(cost.uncertainty().orElseThrow().low()).isLessThan(most);
  }

  /** The short run costs more, and both sides say so. */
  @Test
  void theSameKilns() {
    for (String technology : List.of("translog", "translog-cost")) {
      Planned free = plan("More output", technology);
      Planned held = plan("More output, same kilns", technology);
      assertThat(Objects.requireNonNull(held.mix().get("kilns")).value()).isEqualTo(9000);
      assertThat(held.cost().orElseThrow().value())
          .isGreaterThan(free.cost().orElseThrow().value());
      assertThat(held.detail().envelope()).isPresent();
    }
  }

  /** Quantities and costs tell the same of scale, substitution and least cost. */
  @Test
  void bothSides() {
    List<Side> sides = findings.costs().sides();
    assertThat(sides)
        .extracting(Side::measure)
        .contains("scale", "allen", "demand", "least-cost", "marginal-cost");
    assertThat(sides).allSatisfy(side -> assertThat(side.apart()).as(side.toString()).isFalse());
  }

  @Test
  void theBlemishIsFound() {
    Said slip = findings.costs().remarks().get(0);
    assertThat(slip.code()).isEqualTo("shares-not-one");
    assertThat(slip.message())
        .contains(BrickworksGenerator.BLEMISHED, "" + BrickworksGenerator.BLEMISHED_YEAR);
  }

  private static Planned plan(String question, String technology) {
    return findings.plans().stream()
        .filter(p -> p.question().equals(question) && p.technology().equals(technology))
        .findFirst()
        .orElseThrow();
  }

  private static void holds(Figure figure, double truth) {
    Figure.Uncertainty sure = figure.uncertainty().orElseThrow();
    assertThat(truth).isBetween(sure.low(), sure.high());
  }
}
