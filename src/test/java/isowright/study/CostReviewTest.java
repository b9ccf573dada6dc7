package isowright.study;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import isowright.study.PlanFindings.Reviewed;
import isowright.study.ReviewFindings.Variant;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** Filed costs held against an estimated cost function, from the study file to the findings. */
class CostReviewTest {

  private static final Path RECORDS = Path.of("src/test/resources/published/electricity-1970.csv");

  @TempDir private Path folder;

  /** The first 123 companies with a column of filed costs: 5 % above what was recorded. */
  private Study study(String filed, String filing) throws Exception {
    List<String> lines = new ArrayList<>();
    List<String> all = Files.readAllLines(RECORDS).subList(0, 124);
    lines.add(all.get(0) + ",filed");
    for (String line : all.subList(1, 124)) {
      double cost = Double.parseDouble(line.split(",")[2]);
      lines.add(line + "," + (line.startsWith("62,") ? filed : Double.toString(1.05 * cost)));
    }
    Files.write(folder.resolve("electricity.csv"), lines);
    return StudyFile.read(
        Files.writeString(
            folder.resolve("study.yaml"),
            """
            title: Electricity companies
            records: {file: electricity.csv, plant: observation}
            costs:
              total: cost
              outputs: {power: {column: output}}
              inputs:
                capital: {price: capital, share: capitalshare}
                labour: {price: labor, share: laborshare}
                fuel: {price: fuel, share: fuelshare}
              technologies: [cobb-douglas-cost-squared-output, translog-cost]
            filing:
            """
                + filing));
  }

  @Test
  void filedCostIsHeldAgainstEveryCostFunction() throws Exception {
    Findings findings =
        Pipeline.run(
            study(
                "25",
                "  cost: filed\n"
                    + "  allowance: {controllable: 1, quantile: 0.5, years: 2, frontier-shift: 0,"
                    + " index: 0}\n"),
            Progress.SILENT);
    assertThat(findings.reviews()).hasSize(2 * 123);
    long answered = findings.reviews().stream().filter(r -> r.gap().isPresent()).count();
    assertThat(answered).isGreaterThan(230);
    int divided = 0;
    for (Reviewed review : findings.reviews()) {
      if (review.gap().isEmpty()) {
        assertThat(review.status()).isEqualTo("irregular");
        continue;
      }
      double remainder = review.detail().orElseThrow().remainder().value();
      double technical = review.technical().map(Figure::value).orElse(0.0);
      double mix = review.mix().map(Figure::value).orElse(0.0);
      // differences of numbers of the size of the filing
      assertThat(review.unreconciled() + technical + mix + remainder)
          .isCloseTo(review.gap().orElseThrow().value(), within(1e-12 * review.filed()));
      divided += review.technical().isPresent() ? 1 : 0;
      assertThat(review.technical().isPresent()).isEqualTo(review.mix().isPresent());
      assertThat(review.remarks().isEmpty()).isEqualTo(review.technical().isPresent());
    }
    // many mixes are least cost only at prices where the translog is no cost function
    assertThat(divided).isBetween(50, (int) answered - 1);
    assertThat(findings.review().orders()).hasSize(2);
    assertThat(findings.review().variants())
        .extracting(Variant::choice)
        .containsExactly(
            "as-asked",
            "typical-mean",
            "best-quarter",
            "best-quarter-mean",
            "as-asked",
            "typical-mean",
            "best-quarter",
            "best-quarter-mean");
    // the best quarter makes the same at less cost, so the gap to it is larger
    assertThat(findings.review().variants().get(2).gap().value())
        .isGreaterThan(findings.review().variants().get(0).gap().value());
    var path = findings.review().allowances().get(0);
    // all of the median gap is gone after two years, or none where it is negative
    assertThat(path.years().get(2).allowance())
        .isCloseTo(path.filed() - Math.max(path.gap(), 0), within(1e-9 * path.filed()));
  }

  /** Without a column of filed costs it is the recorded cost that is reviewed. */
  @Test
  void recordedCostIsFiledWhereNoColumnIsNamed() throws Exception {
    Findings findings = Pipeline.run(study("25", "  against: best-quarter\n"), Progress.SILENT);
    assertThat(findings.reviews()).allMatch(r -> r.unreconciled() == 0);
    assertThat(findings.run().settings()).containsEntry("filing.cost", "the recorded cost");
    assertThat(findings.review().reference()).contains("lower quartile of cost");
  }

  @Test
  void aFiledCostWithAGapIsRefused() throws Exception {
    Study study = study("", "  cost: filed\n");
    assertThatThrownBy(() -> Pipeline.run(study, Progress.SILENT))
        .isInstanceOfSatisfying(
            StudyRefused.class,
            refused -> {
              assertThat(refused.mistakes()).hasSize(1);
              assertThat(refused.mistakes().get(0).key()).isEqualTo("filing.cost");
              assertThat(refused.mistakes().get(0).line()).isEqualTo(12);
              assertThat(refused.mistakes().get(0).message()).contains("filed", "row 63");
            });
  }

  /** Cost functions have no frontier to be held against. */
  @Test
  void aFrontierIsNoReferenceOfCostFunctions() {
    assertThatThrownBy(
            () ->
                study(
                    "25",
                    "  against: frontier\n"
                        + "estimation: {frontier: {inefficiency: half-normal}}\n"))
        .isInstanceOfSatisfying(
            StudyRefused.class,
            refused -> {
              assertThat(refused.mistakes())
                  .extracting(Mistake::key)
                  .contains("filing.against", "estimation.frontier");
              assertThat(refused.mistakes().get(0).message())
                  .contains("production functions alone");
            });
  }
}
