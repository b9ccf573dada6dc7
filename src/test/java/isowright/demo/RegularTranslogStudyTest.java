package isowright.demo;

import static org.assertj.core.api.Assertions.assertThat;

import isowright.study.Findings;
import isowright.study.FitFindings.Fitted;
import isowright.study.FitFindings.Regular;
import isowright.study.Pipeline;
import isowright.study.Progress;
import isowright.study.RegularityImposed;
import isowright.study.StudyFile;
import java.nio.file.Path;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;

/** The example study that holds a translog to be regular: price, remarks, and plans that follow. */
class RegularTranslogStudyTest {

  private static Findings findings;

  @BeforeAll
  static void run() throws Exception {
    findings =
        Pipeline.run(
            StudyFile.read(Path.of("notebooks-data", "regular-translog.yaml")), Progress.SILENT);
  }

  private static Fitted fit(String technology) {
    return findings.fits().stream()
        .filter(f -> f.technology().equals(technology))
        .findFirst()
        .orElseThrow();
  }

  @Test
  void theTranslogIsRegularAtEveryRowAtAStatedPrice() {
    Regular regular = fit("translog").regularity().orElseThrow();
    assertThat(regular.both()).isEqualTo(regular.rows()).isEqualTo(42);
    RegularityImposed imposed = regular.imposed().orElseThrow();
    assertThat(imposed.where()).isEqualTo("everywhere");
    assertThat(imposed.ssr()).isGreaterThan(imposed.freeSsr());
    assertThat(imposed.distance()).isPositive();
    assertThat(imposed.pLow()).isBetween(0.0, imposed.pHigh());
    assertThat(imposed.pHigh()).isLessThanOrEqualTo(1);
    assertThat(imposed.binding()).isPositive();
    assertThat(imposed.free().keySet())
        .containsExactlyElementsOf(
            fit("translog").parameters().stream().map(p -> p.name()).toList());
    assertThat(fit("translog").remarks())
        .anyMatch(said -> said.code().equals("regularity-imposed"))
        .noneMatch(said -> said.code().equals("irregular-rows"));
  }

  @Test
  void aFormThatIsAlwaysRegularSaysSo() {
    assertThat(fit("ces").remarks()).anyMatch(said -> said.code().equals("regular-by-form"));
    assertThat(fit("ces").regularity().orElseThrow().imposed()).isEmpty();
  }

  @Test
  void plansFollowFromTheTechnologyThatWasHeld() {
    assertThat(findings.plans())
        .filteredOn(answer -> answer.technology().equals("translog"))
        .isNotEmpty()
        .allMatch(answer -> answer.status().equals("solved"));
  }
}
