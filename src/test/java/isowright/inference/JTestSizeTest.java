package isowright.inference;

import static org.assertj.core.api.Assertions.assertThat;

import isowright.estimation.Estimation;
import isowright.estimation.Fit;
import isowright.estimation.Specification;
import isowright.estimation.Specification.PlantEffects;
import isowright.estimation.Specification.StandardErrors;
import isowright.records.Panel;
import isowright.technology.Ces;
import isowright.technology.Form;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Tag;
import org.junit.jupiter.api.Test;

/**
 * How often does the J test reject a true form? Cross-sections of 200 rows are drawn from a CES
 * technology with σ = 0.5, to which a translog comes near: both forms are as good as true, and
 * neither ought to be rejected in more than 5 %.
 *
 * <p>The CES has two parameters fewer than the translog. What a rival fits beyond the truth is then
 * noise in two directions or three (neither form contains the other), and the J statistic is nearer
 * to χ² of as many degrees of freedom than to F(1, ·): P(χ²_2 &gt; 3.84) = .147, P(χ²_3 &gt; 3.84)
 * = .279. The test holds it between these, less and more three binomial standard errors of 200
 * draws (.025, .032); the report warns of it. The translog, which has more parameters than its
 * rival, is rejected less often, though above 5 % too: .05 ± .0154 was seen as .095, and three such
 * errors, 10 %, is what is held.
 */
@Tag("slow")
class JTestSizeTest {

  private static final int DRAWS = 200;

  @Test
  void sizesAreWhatTheoryAndTheReportSay() {
    Ces truth =
        Ces.of(SimulatedPanels.INPUTS, new double[] {20, 7.4}, 2, new double[] {.55, .45}, 1, 1.05);
    List<FormComparison> found =
        IntStream.range(0, DRAWS)
            .parallel()
            .mapToObj(
                draw -> {
                  Panel panel =
                      SimulatedPanels.drawn(
                          draw, 200, 1, 0, (l, k) -> truth.logOutput(new double[] {l, k}));
                  return FormComparison.of(fit(panel, "ces"), fit(panel, "translog"));
                })
            .flatMap(Optional::stream)
            .toList();
    double small = share(found, "j-first");
    double large = share(found, "j-second");
    SimulationTable.write(
        "sizes-j-test",
        String.format(
            Locale.ROOT,
            "CES true, against translog      %.3f%ntranslog near, against CES      %.3f%n",
            small,
            large));
    // A CES without an admissible optimum cannot be compared; with such samples it is rare.
    assertThat(found).hasSizeGreaterThan(DRAWS * 9 / 10);
    assertThat(small).isBetween(.147 - .075, .279 + .096);
    assertThat(large).isLessThan(.10);
  }

  private static double share(List<FormComparison> found, String name) {
    return found.stream()
            .filter(c -> c.verdicts().stream().anyMatch(v -> v.name().equals(name) && v.rejects()))
            .count()
        / (double) found.size();
  }

  private static Fit fit(Panel panel, String form) {
    return Estimation.fit(
        panel,
        new Specification(
            Form.named(form),
            PlantEffects.NONE,
            Specification.Time.NONE,
            true,
            StandardErrors.CLASSICAL,
            .95));
  }
}
