package isowright.inference;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import isowright.estimation.Estimation;
import isowright.estimation.Estimator;
import isowright.estimation.Fit;
import isowright.estimation.PanelFixtures;
import isowright.estimation.Particulars;
import isowright.estimation.Replication.Drawing;
import isowright.estimation.Series;
import isowright.estimation.Specification;
import isowright.estimation.Specification.PlantEffects;
import isowright.estimation.Specification.Time;
import isowright.records.Column;
import isowright.records.Panel;
import isowright.technology.Form;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Objects;
import java.util.concurrent.ForkJoinPool;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/**
 * Control functions against the moments written out in R 4.2.2 and solved by optim, and joint
 * moments against AER 1.2.10 ({@code reference/control-function.R}), on invented plants.
 */
class ControlFunctionTest {

  private static final Path DATA =
      Path.of("src/test/resources/reference/control-function-data.csv");

  /** The search of optim stops at differences of some 1e-8 in the sum of squared moments. */
  private static final double SEARCHED = 1e-5;

  /** Both solve least squares; the orthogonal polynomials differ, their span does not. */
  private static final double SOLVED = 1e-8;

  private static Specification by(Estimator estimator, String form, PlantEffects plants) {
    return new Specification(
            Form.named(form),
            plants,
            Time.NONE,
            false,
            Specification.StandardErrors.CLUSTERED,
            0.95)
        .by(estimator);
  }

  private static Estimator.Proxy proxy(int process) {
    return new Estimator.Proxy(
        Series.of("material"), List.of("machines"), 3, process, new Drawing(99, 7));
  }

  private static Map<String, Double> reference() throws IOException {
    Map<String, Double> values = new HashMap<>();
    for (String line :
        Files.readAllLines(Path.of("src/test/resources/reference/control-function.csv"))) {
      String[] parts = line.split(",");
      if (parts.length == 3 && !line.startsWith("#") && !line.startsWith("model")) {
        values.put(parts[0] + "," + parts[1], Double.parseDouble(parts[2]));
      }
    }
    return values;
  }

  @Test
  void theFileHoldsWhatIsDrawn() throws IOException {
    assertThat(Files.readString(DATA)).isEqualTo(TransmissionBiasFile.text());
  }

  @ParameterizedTest
  @ValueSource(ints = {1, 2, 3})
  void againstR(int process) throws IOException {
    Map<String, Double> reference = reference();
    Fit fit =
        Estimation.fit(
            TransmissionBiasFile.panel(), by(proxy(process), "cobb-douglas", PlantEffects.NONE));
    assertThat(fit.state()).as(fit.reasons().toString()).isEqualTo(Fit.State.ESTIMATED);
    Particulars.OfProxy own = (Particulars.OfProxy) fit.numbers().particulars();
    for (String input : List.of("labour", "machines")) {
      double expected = Objects.requireNonNull(reference.get("moments " + process + "," + input));
      int k = fit.numbers().index(input);
      assertThat(fit.numbers().parameters()[k]).isCloseTo(expected, within(SEARCHED));
      Fit joint = own.jointly();
      assertThat(joint.numbers().parameters()[k])
          .isCloseTo(Objects.requireNonNull(reference.get("joint," + input)), within(SOLVED));
      assertThat(Math.sqrt(joint.numbers().covariance()[k][k]))
          .isCloseTo(Objects.requireNonNull(reference.get("joint error," + input)), within(SOLVED));
    }
    assertThat(own.pairs()).isEqualTo(300);
    assertThat(own.basis()).as("1 + 3 + 6 + 10").isEqualTo(20);
    assertThat(own.proxySlope()).isPositive();
  }

  /** The false solution, at which productivity is mistaken for the wage, is found and counted. */
  @Test
  void furtherSolutionsAreCounted() {
    Fit fit =
        Estimation.fit(
            TransmissionBiasFile.panel(), by(proxy(1), "cobb-douglas", PlantEffects.NONE));
    assertThat(((Particulars.OfProxy) fit.numbers().particulars()).others()).isPositive();
  }

  @Test
  void sameDigitsWhateverTheNumberOfThreads() throws Exception {
    Specification how = by(proxy(2), "cobb-douglas", PlantEffects.NONE);
    Panel panel = TransmissionBiasFile.panel();
    double[][] many = Estimation.fit(panel, how).numbers().covariance();
    ForkJoinPool single = new ForkJoinPool(1);
    try {
      double[][] one = single.submit(() -> Estimation.fit(panel, how)).get().numbers().covariance();
      assertThat(one).isDeepEqualTo(many);
    } finally {
      single.shutdown();
    }
  }

  /** Trends belong to productivity; the truth has none, and inputs keep their elasticities. */
  @Test
  void aTrendIsThatOfProductivity() {
    Fit fit =
        Estimation.fit(
            TransmissionBiasFile.panel(),
            by(proxy(1), "cobb-douglas", PlantEffects.NONE)
                .with(PlantEffects.NONE, Time.TREND, Specification.StandardErrors.CLUSTERED));
    int trend = fit.numbers().index("trend");
    double error = Math.sqrt(fit.numbers().covariance()[trend][trend]);
    assertThat(fit.numbers().parameters()[trend]).isCloseTo(0, within(3 * error));
    assertThat(fit.numbers().parameters()[fit.numbers().index("labour")])
        .isCloseTo(TransmissionBias.LABOUR, within(0.2));
  }

  @Test
  void aTranslogIsFittedByTheSameMoments() {
    Panel panel = TransmissionBias.draw(11, 200, 6);
    Fit fit = Estimation.fit(panel, by(proxy(1), "translog", PlantEffects.NONE));
    assertThat(fit.state()).as(fit.reasons().toString()).isEqualTo(Fit.State.ESTIMATED);
    double[] gradient = new double[2];
    fit.typical().technology().logGradient(fit.meanLogInputs(), gradient);
    assertThat(gradient[0]).isCloseTo(TransmissionBias.LABOUR, within(0.2));
    assertThat(gradient[1]).isCloseTo(TransmissionBias.MACHINES, within(0.2));
  }

  @Test
  void whatTheRecordsCannotCarryIsSaid() {
    Panel panel = TransmissionBiasFile.panel();
    double[] same = new double[panel.rows()];
    Arrays.fill(same, 3);
    Panel flat = PanelFixtures.withFurther(panel, List.of(Column.of("material", same)));
    assertThat(refused(flat, PlantEffects.NONE, proxy(1)))
        .contains("The proxy material is the same in every row");
    double[] holes = same.clone();
    holes[4] = Double.NaN;
    Panel blank = PanelFixtures.withFurther(panel, List.of(Column.of("material", holes)));
    assertThat(refused(blank, PlantEffects.NONE, proxy(1))).contains("blank in 1 of 360 rows");
    assertThat(refused(TransmissionBias.draw(1, 60, 1), PlantEffects.NONE, proxy(1)))
        .contains("the records have one period (2010)");
    assertThat(refused(TransmissionBias.draw(1, 4, 3), PlantEffects.NONE, proxy(3)))
        .contains("12 rows, 8 of them with the row of the period before, cannot carry");
    assertThat(refused(panel, PlantEffects.WITHIN, proxy(1))).contains("Set plant-effects to none");
    assertThat(
            refused(
                panel,
                PlantEffects.NONE,
                new Estimator.Proxy(
                    Series.of("rain"), List.of("machines"), 3, 1, new Drawing(99, 7))))
        .contains("no column rain");
  }

  private static String refused(Panel panel, PlantEffects plants, Estimator estimator) {
    Fit fit = Estimation.fit(panel, by(estimator, "cobb-douglas", plants));
    assertThat(fit.state()).isEqualTo(Fit.State.REFUSED);
    return String.join(" ", fit.reasons());
  }
}
