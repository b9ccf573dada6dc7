package isowright.study;

import static org.assertj.core.api.Assertions.assertThat;

import isowright.study.FitFindings.Fitted;
import isowright.study.FitFindings.Pair;
import isowright.study.MatrixFindings.Cell;
import isowright.study.MatrixFindings.Headline;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Comparator;
import java.util.List;
import java.util.Map;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** A specification matrix against runs of the whole pipeline, each for one specification. */
class MatrixTest {

  private static final Path STUDY = Path.of("notebooks-data", "glassworks-specifications.yaml");

  @TempDir Path folder;

  private static MatrixFindings matrix() {
    return RealFindings.of(RealFindings.Study.SPECIFICATIONS)
        .specification()
        .matrix()
        .orElseThrow();
  }

  /**
   * The figures of a combination are those that a study of that specification alone finds, to the
   * last digit: both take the same steps in the same order. A study without a plant has no filing
   * of it, so gaps are compared where all plants are.
   */
  @Test
  void everyCellIsTheStudyOfItsSpecification() throws Exception {
    int compared = 0;
    MatrixFindings matrix = matrix();
    for (String effects : List.of("none", "within", "random")) {
      for (String sample : List.of("all", "recent", "without-GW-05")) {
        Findings single = Pipeline.run(StudyFile.read(single(effects, sample)), Progress.SILENT);
        for (Fitted fit : single.fits()) {
          Cell cell = cell(matrix, fit.technology(), effects, sample);
          assertThat(cell.state()).as(cell.toString()).isEqualTo(fit.state());
          if (fit.usable()) {
            same(cell, fit, single, !sample.startsWith("without"));
            compared++;
          } else {
            assertThat(cell.reasons())
                .isEqualTo(fit.remarks().stream().map(Findings.Said::message).toList());
          }
        }
      }
    }
    // CES is not linear in its parameters: three samples of it have no random effects.
    assertThat(compared).isEqualTo(27 - 3);
  }

  private static void same(Cell cell, Fitted fit, Findings single, boolean gap) {
    assertThat(cell.figure(MatrixFindings.SCALE).orElseThrow())
        .isEqualTo(bare(fit.returnsToScale().orElseThrow()));
    assertThat(cell.criteria().orElseThrow().bic()).isEqualTo(fit.summary().orElseThrow().bic());
    assertThat(cell.regular()).isEqualTo(fit.regularity());
    List<Pair> morishima =
        fit.substitution().stream().filter(p -> p.measure().equals("morishima")).toList();
    double mean = morishima.stream().mapToDouble(p -> p.figure().value()).sum() / morishima.size();
    // the sum is taken in the same order; of a fixed elasticity the last digit is rounded away
    assertThat(cell.figure(MatrixFindings.SUBSTITUTION).orElseThrow().value())
        .isCloseTo(mean, org.assertj.core.api.Assertions.within(1e-9));
    PlanFindings.Planned plan =
        single.plans().stream()
            .filter(p -> p.technology().equals(fit.technology()))
            .findFirst()
            .orElseThrow();
    assertThat(cell.figure(MatrixFindings.LEAST_COST)).isEqualTo(plan.cost().map(MatrixTest::bare));
    if (gap) {
      Figure share =
          single.review().variants().stream()
              .filter(v -> v.technology().equals(fit.technology()))
              .filter(v -> v.choice().equals("as-asked"))
              .findFirst()
              .orElseThrow()
              .share();
      assertThat(cell.figure(MatrixFindings.GAP).orElseThrow()).isEqualTo(share);
    }
  }

  /** A figure without what it would be in refits, which a matrix does not make. */
  private static Figure bare(Figure figure) {
    return figure.with(Figure.Refits.NONE);
  }

  private static Cell cell(MatrixFindings matrix, String form, String effects, String sample) {
    return matrix.cells().stream()
        .filter(c -> c.technology().equals(form))
        .filter(c -> c.plantEffects().equals(effects))
        .filter(c -> c.sample().equals(sample))
        .findFirst()
        .orElseThrow();
  }

  private Path single(String effects, String sample) throws Exception {
    String keep =
        Map.of(
                "all", "",
                "recent", "  keep: {periods: [2017, 2024]}\n",
                "without-GW-05", "  keep: {without-plants: [GW-05]}\n")
            .getOrDefault(sample, "");
    String text = Files.readString(STUDY);
    int from = text.indexOf("matrix:");
    int to = text.indexOf("least-cost:");
    text =
        (text.substring(0, from) + text.substring(to))
            .replace("  period: year\n", "  period: year\n" + keep)
            .replace("technologies: [ces]", "technologies: [cobb-douglas, ces, translog]")
            .replace("plant-effects: within", "plant-effects: " + effects);
    Files.copy(
        STUDY.resolveSibling("glassworks.csv"),
        folder.resolve("glassworks.csv"),
        java.nio.file.StandardCopyOption.REPLACE_EXISTING);
    return Files.writeString(folder.resolve(effects + "-" + sample + ".yaml"), text);
  }

  @Test
  void everyHeadlineIsInOrder() {
    MatrixFindings matrix = matrix();
    assertThat(matrix.headlines())
        .extracting(Headline::name)
        .containsExactly("returns-to-scale", "substitution", "least-cost", "gap");
    for (Headline headline : matrix.headlines()) {
      assertThat(headline.order()).as(headline.name()).doesNotHaveDuplicates().hasSize(24);
      assertThat(
              headline.order().stream()
                  .map(c -> matrix.cells().get(c).figure(headline.name()).orElseThrow().value()))
          .as(headline.name())
          .isSorted();
    }
    assertThat(matrix.order()).hasSize(27).doesNotHaveDuplicates();
  }

  /** The rule is carried out here once more, in other words. */
  @Test
  void theChosenOneHasTheLeastBicOfTheRegularOnesOfItsSample() {
    MatrixFindings matrix = matrix();
    List<Integer> regular =
        IntStream.range(0, 27)
            .filter(c -> matrix.cells().get(c).estimated())
            .filter(
                c -> {
                  FitFindings.Regular r = matrix.cells().get(c).regular().orElseThrow();
                  return r.both() == r.rows();
                })
            .boxed()
            .toList();
    String sample = matrix.cells().get(regular.get(0)).sample();
    int least =
        regular.stream()
            .filter(c -> matrix.cells().get(c).sample().equals(sample))
            .min(
                Comparator.comparingDouble(
                    c -> matrix.cells().get(c).criteria().orElseThrow().bic()))
            .orElseThrow();
    assertThat(matrix.chosen()).hasValue(least);
    assertThat(matrix.cells().get(least).standing()).isEqualTo("chosen");
    assertThat(matrix.cells())
        .filteredOn(c -> c.estimated() && !c.sample().equals(sample))
        .allSatisfy(
            c -> assertThat(c.standing()).containsAnyOf("not compared: ", "not regular at"));
    assertThat(matrix.cells().stream().filter(Cell::asAsked))
        .extracting(Cell::technology, Cell::plantEffects, Cell::sample)
        .containsExactly(org.assertj.core.api.Assertions.tuple("ces", "within", "all"));
  }

  /** The range of each filing holds the gap of every study of one specification. */
  @Test
  void theGapOfEachFilingRangesOverTheSpecifications() {
    Findings findings = RealFindings.of(RealFindings.Study.SPECIFICATIONS);
    List<ReviewFindings.Spread> gaps = matrix().gaps();
    assertThat(gaps).hasSize(14).allSatisfy(g -> assertThat(g.choices()).isEqualTo(24));
    for (ReviewFindings.Spread gap : gaps) {
      PlanFindings.Reviewed asked =
          findings.reviews().stream()
              .filter(r -> r.plant().equals(gap.plant()) && r.period().equals("2024"))
              .findFirst()
              .orElseThrow();
      double share = asked.gap().orElseThrow().value() / asked.filed();
      assertThat(share).as(gap.plant()).isBetween(gap.low() - 1e-9, gap.high() + 1e-9);
      assertThat(gap.low()).isLessThan(gap.high());
    }
  }

  @Test
  void theUsualGridHasTwentyFourCombinations() throws Exception {
    Files.copy(STUDY.resolveSibling("glassworks.csv"), folder.resolve("glassworks.csv"));
    String text = Files.readString(STUDY);
    String before = text.substring(0, text.indexOf("matrix:"));
    for (String usual : List.of("matrix: default\n", "matrix: {}\n")) {
      Path file = Files.writeString(folder.resolve("usual.yaml"), before + usual);
      MatrixFindings matrix =
          Pipeline.run(StudyFile.read(file), Progress.SILENT)
              .specification()
              .matrix()
              .orElseThrow();
      assertThat(matrix.cells()).hasSize(24).allMatch(Cell::estimated);
      assertThat(matrix.samples()).extracting(MatrixFindings.Sample::name).contains("later-half");
      assertThat(matrix.headlines()).hasSize(2); // nothing is planned, nothing reviewed
    }
    Path without = Files.writeString(folder.resolve("without.yaml"), before);
    assertThat(Pipeline.run(StudyFile.read(without), Progress.SILENT).specification().matrix())
        .isEmpty();
  }
}
