package isowright.regression;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Objects;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;

/**
 * Two-stage least squares and its diagnostics against R 4.2.2 with AER 1.2.10 and sandwich 3.0.2
 * ({@code reference/instruments.R}), and against the algebra it rests on.
 */
class TwoStageLeastSquaresTest {

  /** R solves by normal equations in part (J), so 1e-8 is what both can be held to. */
  private static final double AGREEMENT = 1e-8;

  private static final Path REFERENCE = Path.of("src/test/resources/reference/instruments.csv");

  /** constant, pcap, pc, emp, unemp; lag emp, lag 2 emp, lag pc: rows 2 to 16 of each state. */
  static ArrayDesign states() throws IOException {
    ArrayDesign all = PublishedDesigns.states();
    double[][] columns = new double[6][all.rows()];
    all.fill(0, all.rows(), columns);
    int states = all.groups().count();
    int years = all.rows() / states;
    int rows = states * (years - 2);
    double[][] kept = new double[8][rows];
    double[] response = new double[rows];
    int[] starts = new int[states];
    int at = 0;
    for (int s = 0; s < states; s++) {
      starts[s] = at;
      for (int r = all.groups().start(s) + 2; r < all.groups().end(s); r++, at++) {
        for (int k = 0; k < 5; k++) {
          kept[k][at] = columns[k][r];
        }
        kept[5][at] = columns[3][r - 1];
        kept[6][at] = columns[3][r - 2];
        kept[7][at] = columns[2][r - 1];
        response[at] = columns[5][r];
      }
    }
    return ArrayDesign.of(
        List.of("constant", "pcap", "pc", "emp", "unemp", "lag emp", "lag 2 emp", "lag pc"),
        kept,
        response,
        Groups.startingAt(rows, starts));
  }

  static Times years() {
    return Times.of(15, java.util.stream.IntStream.range(0, 720).map(r -> r % 15).toArray());
  }

  private static InstrumentedFit pooled() throws IOException {
    return TwoStageLeastSquares.fit(
        new InstrumentedDesign(states(), new boolean[] {false, false, true, true, false}));
  }

  private static InstrumentedFit withinStates() throws IOException {
    Design slopes = new ChosenColumns(states(), new int[] {1, 2, 3, 4, 5, 6, 7}, 8);
    return TwoStageLeastSquares.fit(
        new InstrumentedDesign(Effects.within(slopes), new boolean[] {false, true, true, false}));
  }

  private static Map<String, Double> reference() throws IOException {
    Map<String, Double> values = new HashMap<>();
    for (String line : Files.readAllLines(REFERENCE)) {
      if (!line.startsWith("#") && !line.startsWith("model")) {
        String[] parts = line.split(",");
        values.put(String.join(",", List.of(parts).subList(0, 4)), Double.parseDouble(parts[4]));
      }
    }
    assertThat(values).hasSizeGreaterThan(100);
    return values;
  }

  private static void near(Map<String, Double> reference, String name, double found) {
    double expected = Objects.requireNonNull(reference.get(name), name);
    assertThat(found).as(name).isCloseTo(expected, within(AGREEMENT * Math.abs(expected)));
  }

  @Test
  void coefficientsAndSumOfSquares() throws IOException {
    Map<String, Double> reference = reference();
    for (String model : List.of("pooled", "within")) {
      InstrumentedFit fit = model.equals("pooled") ? pooled() : withinStates();
      double[] coefficients = fit.fit().coefficients();
      for (int k = 0; k < coefficients.length; k++) {
        near(reference, model + ",coefficient," + k + ",0", coefficients[k]);
      }
      near(reference, model + ",ssr,0,0", fit.fit().ssr());
      assertThat(fit.identified()).isTrue();
      assertThat(fit.overidentifying()).isEqualTo(1);
      assertThat(fit.instruments()).containsExactly("lag emp", "lag 2 emp", "lag pc");
    }
  }

  @ParameterizedTest
  @EnumSource(
      value = Covariance.Kind.class,
      names = {"CLASSICAL", "HC1", "CLUSTERED"})
  void covarianceAndDiagnostics(Covariance.Kind kind) throws IOException {
    Map<String, Double> reference = reference();
    for (String model : List.of("pooled", "within")) {
      InstrumentedFit fit = model.equals("pooled") ? pooled() : withinStates();
      boolean clusteredWithin = model.equals("within") && kind == Covariance.Kind.CLUSTERED;
      String at = (clusteredWithin ? "deviations" : model) + ",";
      double[][] matrix = Covariance.estimate(fit.secondStage(), fit.fit(), kind, years()).matrix();
      for (int i = 0; i < matrix.length; i++) {
        for (int j = 0; j <= i; j++) {
          near(reference, at + "covariance " + kind + "," + i + "," + j, matrix[i][j]);
        }
      }
      InstrumentTests tests = new InstrumentTests(fit, kind, years());
      String places = " " + kind + ",0,0";
      near(reference, at + "Weak instruments (c)" + places, tests.strength(0).f());
      near(reference, at + "Weak instruments (e)" + places, tests.strength(1).f());
      near(reference, at + "Wu-Hausman" + places, tests.endogeneity().f());
      assertThat(tests.endogeneity().restrictions()).isEqualTo(2);
      if (kind == Covariance.Kind.CLASSICAL) {
        // R counts all rows; here the group effects are taken off, as in the residual variance.
        double factor = model.equals("within") ? (720 - 48) / 720.0 : 1;
        near(reference, at + "Sargan" + places, tests.overidentification() / factor);
      } else {
        near(reference, at + "J" + places, tests.overidentification());
      }
    }
  }

  @Test
  void residualsAreThoseOfTheRegressorsThemselves() throws IOException {
    InstrumentedFit fit = pooled();
    double[] residuals = LeastSquares.residuals(fit.secondStage(), fit.fit());
    ArrayDesign states = states();
    double[][] block = new double[9][states.rows()];
    states.fill(0, states.rows(), block);
    double[] b = fit.fit().coefficients();
    for (int r = 0; r < states.rows(); r += 7) {
      double expected = block[8][r];
      for (int k = 0; k < 5; k++) {
        expected -= b[k] * block[k][r];
      }
      assertThat(residuals[r]).isCloseTo(expected, within(1e-12));
    }
  }

  @Test
  void withoutEndogenousRegressorsItIsLeastSquares() throws IOException {
    InstrumentedFit fit =
        TwoStageLeastSquares.fit(new InstrumentedDesign(states(), new boolean[5]));
    LinearFit least = LeastSquares.fit(new ChosenColumns(states(), new int[] {0, 1, 2, 3, 4}, 8));
    assertThat(fit.fit().coefficients()).containsExactly(least.coefficients(), within(1e-12));
  }

  /** Just identified: Z′(y − Xβ) = 0, and nothing is left to test. */
  @Test
  void asManyInstrumentsAsRegressors() {
    Random random = new Random(5);
    int rows = 400;
    double[][] columns = new double[4][rows];
    double[] response = new double[rows];
    for (int r = 0; r < rows; r++) {
      double hidden = random.nextGaussian();
      columns[0][r] = 1;
      columns[2][r] = random.nextGaussian();
      columns[3][r] = random.nextGaussian();
      columns[1][r] = columns[3][r] + hidden;
      response[r] = 1 + 0.5 * columns[1][r] + hidden + 0.1 * random.nextGaussian();
    }
    // The second column is exogenous, the last is the instrument of the endogenous one.
    double[][] ordered = {columns[0], columns[2], columns[1], columns[3]};
    ArrayDesign design = ArrayDesign.of(List.of("constant", "x", "d", "z"), ordered, response);
    InstrumentedFit fit =
        TwoStageLeastSquares.fit(
            new InstrumentedDesign(design, new boolean[] {false, false, true}));
    double[] u = LeastSquares.residuals(fit.secondStage(), fit.fit());
    for (int k : new int[] {0, 1, 3}) {
      double product = 0;
      for (int r = 0; r < rows; r++) {
        product += ordered[k][r] * u[r];
      }
      assertThat(product).isCloseTo(0, within(1e-10));
    }
    InstrumentTests tests =
        new InstrumentTests(fit, Covariance.Kind.HC1, Times.of(1, new int[rows]));
    assertThat(tests.overidentification()).isNaN();
    assertThat(tests.endogeneity().f()).isGreaterThan(10);
    assertThat(tests.partialShare(0)).isBetween(0.3, 0.7);
    assertThat(fit.fit().coefficient("d")).isCloseTo(0.5, within(0.15));
    assertThat(LeastSquares.fit(new ChosenColumns(design, new int[] {0, 1, 2}, 4)).coefficient("d"))
        .as("least squares is far off")
        .isGreaterThan(0.8);
  }

  @Test
  void anInstrumentThatSaysNothingNewIsDroppedAndNamed() throws IOException {
    ArrayDesign states = states();
    double[][] block = new double[9][states.rows()];
    states.fill(0, states.rows(), block);
    double[][] columns = Arrays.copyOf(block, 9);
    columns[8] = new double[states.rows()];
    for (int r = 0; r < states.rows(); r++) {
      columns[8][r] = 2 * block[5][r] - block[1][r];
    }
    List<String> names = new java.util.ArrayList<>(states.columns());
    names.add("double");
    ArrayDesign more = ArrayDesign.of(names, columns, block[8], states.groups());
    InstrumentedFit fit =
        TwoStageLeastSquares.fit(
            new InstrumentedDesign(more, new boolean[] {false, false, true, true, false}));
    assertThat(fit.redundant()).hasSize(1);
    assertThat(fit.redundant().get(0).column()).isEqualTo("double");
    assertThat(fit.instruments()).doesNotContain("double");
    assertThat(fit.fit().coefficients())
        .containsExactly(pooled().fit().coefficients(), within(1e-9));
    for (Covariance.Kind kind : List.of(Covariance.Kind.CLASSICAL, Covariance.Kind.CLUSTERED)) {
      assertThat(new InstrumentTests(fit, kind, years()).overidentification())
          .isCloseTo(
              new InstrumentTests(pooled(), kind, years()).overidentification(), within(1e-7));
    }
  }

  @Test
  void tooFewInstrumentsAreSaidToBe() throws IOException {
    Design few = new ChosenColumns(states(), new int[] {0, 1, 2, 3, 4, 5}, 8);
    InstrumentedFit fit =
        TwoStageLeastSquares.fit(
            new InstrumentedDesign(few, new boolean[] {false, false, true, true, false}));
    assertThat(fit.identified()).isFalse();
    assertThat(fit.fit().collinearities().get(0).words()).contains("pc, emp");
  }

  @Test
  void anInstrumentThatGroupEffectsTakeUpIsNamed() throws IOException {
    ArrayDesign states = states();
    double[][] block = new double[9][states.rows()];
    states.fill(0, states.rows(), block);
    double[] fixed = new double[states.rows()];
    for (int r = 0; r < fixed.length; r++) {
      fixed[r] = 1.5 * states.groups().of(r);
    }
    ArrayDesign design =
        ArrayDesign.of(
            List.of("pcap", "emp", "site"),
            new double[][] {block[1], block[3], fixed},
            block[8],
            states.groups());
    InstrumentedFit fit =
        TwoStageLeastSquares.fit(
            new InstrumentedDesign(Effects.within(design), new boolean[] {false, true}));
    assertThat(fit.identified()).isFalse();
    assertThat(fit.redundant().get(0).words()).contains("does not vary within groups");
  }
}
