package isowright.demo;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import isowright.charts.Chart;
import isowright.charts.Charts;
import isowright.study.Findings;
import isowright.study.Pipeline;
import isowright.study.PlanFindings.Reviewed;
import isowright.study.Progress;
import isowright.study.ReviewFindings.Allowed;
import isowright.study.ReviewFindings.Variant;
import isowright.study.ReviewFindings.Year;
import isowright.study.StudyFile;
import java.nio.file.Path;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;

/** The example study from gap to allowance: what it asks is answered, and its arithmetic holds. */
class AllowanceStudyTest {

  private static Findings findings;

  @BeforeAll
  static void run() throws Exception {
    findings =
        Pipeline.run(StudyFile.read(Path.of("notebooks-data", "allowance.yaml")), Progress.SILENT);
  }

  @Test
  void everyPlantIsReviewedWithPartsThatAddUp() {
    assertThat(findings.reviews()).hasSize(14);
    for (Reviewed review : findings.reviews()) {
      double sum =
          review.unreconciled()
              + review.technical().orElseThrow().value()
              + review.mix().orElseThrow().value()
              + review.detail().orElseThrow().remainder().value();
      // a sum of three products of size filed: a few units in its last place
      assertThat(review.gap().orElseThrow().value()).isCloseTo(sum, within(1e-13 * review.filed()));
    }
  }

  @Test
  void theGapStandsWithAndWithoutTheChoicesOfCapital() {
    assertThat(findings.review().variants())
        .extracting(Variant::choice)
        .contains("as-asked", "without-owner", "recorded-prices", "typical", "without-deflator");
  }

  /** Every line by hand from the terms of the study: 65 %, 25 % quantile, 5 years, 0.8 %, 2.1 %. */
  @Test
  void theAllowanceFollowsFromItsTerms() {
    assertThat(findings.review().allowances()).hasSize(15);
    for (Allowed plant : findings.review().allowances()) {
      if (plant.plant().isEmpty()) {
        continue;
      }
      assertThat(plant.years()).hasSize(6);
      assertThat(plant.gapUsed()).isLessThan(plant.gap());
      for (Year year : plant.years()) {
        int t = year.year();
        double rest = 0.35 * plant.filed();
        double controllable = 0.65 * plant.filed() - t / 5.0 * 0.65 * Math.max(plant.gapUsed(), 0);
        double before = rest + controllable * Math.pow(0.992, t);
        // rounding of sums of the size of the filing
        assertThat(year.allowance())
            .isCloseTo(before * Math.pow(1.021, t), within(1e-12 * plant.filed()));
      }
    }
  }

  @Test
  void theGlidePathIsDrawn() {
    assertThat(Charts.of(findings)).extracting(Chart::kind).contains(Chart.Kind.ALLOWANCE_PATH);
  }
}
