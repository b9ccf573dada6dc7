package isowright.inference;

import static org.assertj.core.api.Assertions.assertThat;

import isowright.estimation.Estimation;
import isowright.estimation.Estimator;
import isowright.estimation.Fit;
import isowright.estimation.Particulars;
import isowright.estimation.Replication.Drawing;
import isowright.estimation.Series;
import isowright.estimation.Specification;
import isowright.records.Panel;
import isowright.technology.Form;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.function.LongFunction;
import java.util.stream.LongStream;
import org.apache.commons.statistics.distribution.TDistribution;
import org.junit.jupiter.api.Tag;
import org.junit.jupiter.api.Test;

/**
 * Where labour is chosen knowing productivity ({@link TransmissionBias}): least squares misses by
 * many standard errors, intervals of two-stage least squares and of the control function cover, and
 * the tests of instruments have their size.
 *
 * <p>With a thousand panels a share of .95 is seen as .95 ± .0069 (binomial standard error) and 3
 * to 7 %, 93 to 97 % are three such errors either way. Of the control function, which draws plants
 * 99 times in each, there are sixty panels: three errors of .0281.
 */
@Tag("slow")
class EndogenousInputsSimulationTest {

  private static final int PANELS = 1000;
  private static final int DRAWN = 60;
  private static final int PLANTS = 100;
  private static final int PERIODS = 6;

  private static final Specification LEAST_SQUARES =
      new Specification(
          Form.named("cobb-douglas"),
          Specification.PlantEffects.NONE,
          Specification.Time.NONE,
          false,
          Specification.StandardErrors.CLUSTERED,
          .95);

  private static Estimator by(Series... series) {
    return new Estimator.Instruments(Map.of("labour", List.of(series)));
  }

  private static double[] means(int panels, LongFunction<double[]> each) {
    double[][] all = LongStream.range(0, panels).parallel().mapToObj(each).toArray(double[][]::new);
    double[] means = new double[all[0].length];
    for (double[] one : all) {
      for (int k = 0; k < means.length; k++) {
        means[k] += one[k] / panels;
      }
    }
    return means;
  }

  private static double error(Fit fit, int k) {
    return Math.sqrt(fit.numbers().covariance()[k][k]);
  }

  private static double covers(Fit fit, String input, double truth) {
    int k = fit.numbers().index(input);
    double t =
        TDistribution.of(fit.numbers().covarianceSource().degreesOfFreedom())
            .inverseCumulativeProbability(.975);
    double away = Math.abs(fit.numbers().parameters()[k] - truth);
    return away <= t * error(fit, k) ? 1 : 0;
  }

  private static double rejects(Fit fit, String test) {
    return InstrumentFindings.of(fit).orElseThrow().verdicts().stream()
            .filter(verdict -> verdict.name().equals(test))
            .anyMatch(Verdict::rejects)
        ? 1
        : 0;
  }

  private static double[] instruments(long seed) {
    Panel panel = TransmissionBias.draw(seed, PLANTS, PERIODS);
    Fit least = Estimation.fit(panel, LEAST_SQUARES);
    int labour = least.numbers().index("labour");
    Fit fit =
        Estimation.fit(panel, LEAST_SQUARES.by(by(Series.of("wage"), Series.lagged("wage", 1))));
    Fit idle = Estimation.fit(panel, LEAST_SQUARES.by(by(Series.of("noise"))));
    Panel unbiased = TransmissionBias.draw(seed, PLANTS, PERIODS, 0, 0);
    Fit needless = Estimation.fit(unbiased, LEAST_SQUARES.by(by(Series.of("wage"))));
    var stage = InstrumentFindings.of(idle).orElseThrow().firstStages().get(0).joint();
    double p = new Law.F(stage.restrictions(), stage.degreesOfFreedom()).p(stage.f());
    return new double[] {
      (least.numbers().parameters()[labour] - TransmissionBias.LABOUR) / error(least, labour),
      covers(fit, "labour", TransmissionBias.LABOUR),
      rejects(fit, "instruments-agree"),
      rejects(needless, "inputs-exogenous"),
      p < Verdict.LEVEL ? 1 : 0,
      rejects(fit, "inputs-exogenous")
    };
  }

  private static double[] controlFunction(long seed) {
    Panel panel = TransmissionBias.draw(5000 + seed, PLANTS, PERIODS);
    Fit fit =
        Estimation.fit(
            panel,
            LEAST_SQUARES.by(
                new Estimator.Proxy(
                    Series.of("material"), List.of("machines"), 3, 1, new Drawing(99, seed))));
    if (!fit.state().usable()) {
      return new double[4];
    }
    Fit joint = ((Particulars.OfProxy) fit.numbers().particulars()).jointly();
    return new double[] {
      covers(fit, "labour", TransmissionBias.LABOUR),
      covers(fit, "machines", TransmissionBias.MACHINES),
      covers(joint, "labour", TransmissionBias.LABOUR),
      covers(joint, "machines", TransmissionBias.MACHINES)
    };
  }

  @Test
  void leastSquaresFailsWhereTheOthersCover() throws IOException {
    double[] stages = means(PANELS, EndogenousInputsSimulationTest::instruments);
    double[] moments = means(DRAWN, EndogenousInputsSimulationTest::controlFunction);
    String[] names = {
      "least squares, labour: standard errors away",
      "two-stage, labour: coverage",
      "instruments agree: size",
      "inputs exogenous: size",
      "first stage: size",
      "inputs exogenous: power"
    };
    String[] ofMoments = {
      "control function, labour: coverage",
      "control function, machines: coverage",
      "joint moments, labour: coverage",
      "joint moments, machines: coverage"
    };
    StringBuilder table = new StringBuilder();
    append(table, names, stages);
    append(table, ofMoments, moments);
    Files.createDirectories(Path.of("target"));
    Files.writeString(Path.of("target/endogenous-inputs.txt"), table);
    assertThat(stages[0]).as(names[0]).isGreaterThan(5);
    assertThat(stages[1]).as(names[1]).isBetween(.93, .97);
    for (int k = 2; k < 5; k++) {
      assertThat(stages[k]).as(names[k]).isBetween(.03, .07);
    }
    assertThat(stages[5]).as(names[5]).isGreaterThan(.9);
    for (int k = 0; k < moments.length; k++) {
      assertThat(moments[k]).as(ofMoments[k]).isBetween(.95 - 3 * .0281, 1.0);
    }
  }

  private static void append(StringBuilder table, String[] names, double[] values) {
    Arrays.setAll(
        names,
        k -> {
          table.append(String.format(Locale.ROOT, "%-45s %.3f%n", names[k], values[k]));
          return names[k];
        });
  }
}
