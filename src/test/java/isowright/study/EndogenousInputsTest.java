package isowright.study;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import isowright.estimation.Unfit;
import isowright.study.EndogeneityFindings.Beside;
import isowright.study.FitFindings.Fitted;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Locale;
import java.util.Objects;
import java.util.Random;
import org.assertj.core.api.Assertions;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** Inputs chosen knowing productivity, from study file to findings, on invented plants. */
class EndogenousInputsTest {

  @TempDir Path folder;

  /**
   * Labour is chosen after productivity and by the wage, machines before; 40 plants, 8 years, one
   * gap each. Truth: 0.6 and 0.4.
   */
  private static String rows() {
    Random random = new Random(20240613);
    StringBuilder text = new StringBuilder("plant,year,q,hours,units,wage,bonus,flat,material\n");
    for (int p = 0; p < 40; p++) {
      double omega = 0.3 * random.nextGaussian();
      for (int t = 0; t < 8; t++) {
        omega = 0.7 * omega + 0.2 * random.nextGaussian();
        double k = 3 + 0.5 * random.nextGaussian();
        double wage = 3 + 0.3 * random.nextGaussian();
        double l = 5 + 1.5 * omega - 1.2 * (wage - 3) + 0.4 * (k - 3) + 0.1 * random.nextGaussian();
        double y = 0.6 * l + 0.4 * k + omega + 0.05 * random.nextGaussian();
        if (t != 3) {
          text.append(
              String.format(
                  Locale.ROOT,
                  "P%02d,%d,%.6f,%.6f,%.6f,%.4f,%.4f,7,%.6f%n",
                  p,
                  2010 + t,
                  Math.exp(y),
                  Math.exp(l),
                  Math.exp(k),
                  Math.exp(wage),
                  random.nextGaussian(),
                  Math.exp(2 + 0.5 * k + omega)));
        }
      }
    }
    return text.toString();
  }

  private Findings run(String estimation) throws Exception {
    Files.writeString(folder.resolve("plants.csv"), rows());
    String study =
        """
        title: Chosen knowing productivity
        records: {file: plants.csv, plant: plant, period: year}
        output: {column: q}
        inputs:
          labour: {quantity: hours, price: wage}
          machines: {quantity: units}
        technologies: [cobb-douglas]
        least-cost:
          - {name: Plan, target: 100, prices: {labour: 20, machines: 30}}
        estimation: %s
        """
            .formatted(estimation);
    return Pipeline.run(
        StudyFile.read(Files.writeString(folder.resolve("study.yaml"), study)), Progress.SILENT);
  }

  @Test
  void instrumentsStandBesideLeastSquaresOnTheSameRows() throws Exception {
    Findings findings = run("{instruments: {labour: [wage, lag wage]}}");
    Fitted fit = findings.fits().get(0);
    EndogeneityFindings found = fit.endogeneity();
    assertThat(found.estimator()).isEqualTo("instruments");
    assertThat(found.standIns()).containsExactly("ln wage", "lag ln wage");
    // A lag is unknown in the first year and after the gap.
    assertThat(found.rowsUnknown()).isEqualTo(80);
    Beside own = found.beside().get(0);
    Beside squares = found.beside().get(1);
    assertThat(own.rows()).isEqualTo(200).isEqualTo(squares.rows());
    Figure labour = Objects.requireNonNull(own.elasticity().get("labour"));
    Figure.Uncertainty sure = labour.uncertainty().orElseThrow();
    assertThat(labour.value())
        .as("truth within three standard errors")
        .isCloseTo(0.6, within(3 * sure.standardError()));
    assertThat(Objects.requireNonNull(squares.elasticity().get("labour")).value())
        .as("least squares overstates by many")
        .isGreaterThan(0.6 + 5 * sure.standardError());
    assertThat(found.words()).anyMatch(w -> w.contains("speak against least squares"));
    assertThat(found.firstStages().get(0).weak()).isFalse();
    EndogeneityFindings.Anywhere set = found.anywhere().orElseThrow();
    assertThat(set.pieces()).hasSize(1);
    assertThat(set.pieces().get(0).low()).isLessThan(labour.value());
    assertThat(set.pieces().get(0).high()).isGreaterThan(labour.value());
    assertThat(fit.tests()).extracting(FitFindings.Tested::name).contains("instruments-agree");
    assertThat(findings.plans().get(0).status()).isEqualTo("solved");
    assertThat(findings.run().settings())
        .containsEntry("estimation.instruments.labour", "wage, lag wage");
  }

  @Test
  void aControlFunctionStandsBesideItsCrossCheckAndLeastSquares() throws Exception {
    Findings findings =
        run(
            "{proxy: {column: material, state: [machines]}, resampling: {draws: 99, seed: 5},"
                + " instruments: {labour: [wage]}}");
    // The first principle named is the one that the technology rests on.
    assertThat(findings.fits().get(0).endogeneity().estimator()).isEqualTo("instruments");
    assertThat(findings.fits().get(0).endogeneity().beside())
        .extracting(Beside::estimator)
        .containsExactly("instruments", "least-squares", "proxy");
    findings =
        run(
            "{proxy: {column: material, state: [machines], process: 1}, resampling: {draws: 99,"
                + " seed: 5}}");
    Fitted fit = findings.fits().get(0);
    EndogeneityFindings found = fit.endogeneity();
    assertThat(found.estimator()).isEqualTo("proxy");
    assertThat(found.inputs()).containsExactly("labour");
    assertThat(found.beside())
        .extracting(Beside::estimator)
        .containsExactly("proxy", "joint-moments", "least-squares", "least-squares-within");
    // Five successive pairs a plant: the fourth year is missing.
    assertThat(found.shifts()).contains("on 200 rows that have the row of the period before");
    assertThat(fit.remarks())
        .extracting(Findings.Said::code)
        .contains("proxy-monotone")
        .doesNotContain("proxy-falls");
    assertThat(fit.how().covarianceWords()).contains("99 draws of whole plants (seed 5)");
    assertThat(findings.run().settings())
        .containsEntry("estimation.proxy.column", "material")
        .containsEntry("estimation.proxy.draws", "99");
    assertThat(findings.plans().get(0).cost()).isPresent();
  }

  @Test
  void instrumentsThatMoveNothingAreCalledWeakAndTheSetIsWide() throws Exception {
    Fitted fit = run("{instruments: {labour: [bonus]}}").fits().get(0);
    assertThat(fit.remarks())
        .extracting(Findings.Said::code)
        .contains("weak-instruments")
        .doesNotContain("instruments-disagree");
    assertThat(fit.endogeneity().anywhere().orElseThrow().pieces())
        .anyMatch(p -> Double.isInfinite(p.low()) || Double.isInfinite(p.high()));
  }

  @Test
  void aColumnThatNeverVariesIsLeftOutAndSaid() throws Exception {
    Fitted fit = run("{instruments: {labour: [wage, flat]}}").fits().get(0);
    assertThat(fit.remarks())
        .anySatisfy(
            said -> {
              assertThat(said.code()).isEqualTo("instruments-redundant");
              assertThat(said.message()).contains("flat");
            });
    Assertions.assertThatThrownBy(() -> run("{instruments: {labour: [flat]}}"))
        .isInstanceOf(Unfit.class)
        .hasMessageContaining("do not move labour apart");
  }
}
