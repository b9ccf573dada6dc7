package isowright.regression;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Objects;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;

/**
 * The strength of first stages and values not rejected however weak they are, against R 4.2.2 with
 * AER 1.2.10 and sandwich 3.0.2 ({@code reference/first-stages.R}).
 */
class FirstStageTest {

  /**
   * Instruments and inputs move together (partial R² beyond .99 between lags), which costs both
   * programs some five of sixteen digits in residuals of residuals.
   */
  private static final double AGREEMENT = 1e-7;

  private static InstrumentedFit fit(boolean... endogenous) throws IOException {
    return TwoStageLeastSquares.fit(
        new InstrumentedDesign(TwoStageLeastSquaresTest.states(), endogenous));
  }

  /** pc is exogenous here, and its lag an instrument. */
  private static InstrumentedFit ofOne() throws IOException {
    return fit(false, false, false, true, false);
  }

  private static double reference(String name, Covariance.Kind kind) throws IOException {
    Map<String, Double> values = new HashMap<>();
    for (String line :
        Files.readAllLines(Path.of("src/test/resources/reference/first-stages.csv"))) {
      String[] parts = line.split(",");
      if (parts.length == 3 && !line.startsWith("#") && !line.startsWith("name")) {
        values.put(parts[0] + "," + parts[1], Double.parseDouble(parts[2]));
      }
    }
    return Objects.requireNonNull(values.get(name + "," + kind), name);
  }

  @ParameterizedTest
  @EnumSource(
      value = Covariance.Kind.class,
      names = {"CLASSICAL", "HC1", "CLUSTERED"})
  void againstR(Covariance.Kind kind) throws IOException {
    Times years = TwoStageLeastSquaresTest.years();
    List<FirstStage> one = FirstStage.of(ofOne(), kind, years);
    assertThat(one).hasSize(1);
    near(one.get(0).effective(), reference("effective", kind));
    assertThat(one.get(0).conditional()).isNaN();
    assertThat(one.get(0).decisive()).isEqualTo(one.get(0).effective());
    List<FirstStage> two = FirstStage.of(fit(false, false, true, true, false), kind, years);
    near(two.get(0).conditional(), reference("conditional c", kind));
    near(two.get(1).conditional(), reference("conditional e", kind));
    // The value of which R has the statistic is where the set of that critical value ends.
    double critical = reference("anderson-rubin", kind);
    AndersonRubin set = AndersonRubin.of(ofOne(), kind, years, 0.02, (q, n) -> critical);
    List<Double> ends =
        set.pieces().stream().flatMap(p -> List.of(p.low(), p.high()).stream()).toList();
    assertThat(ends).anySatisfy(end -> assertThat(end).isCloseTo(0.5, within(1e-6)));
  }

  private static void near(double found, double expected) {
    assertThat(found).isCloseTo(expected, within(AGREEMENT * expected));
  }

  /** With equal variances the effective F is F itself, and an exact fit needs no second moment. */
  @Test
  void classicalEffectiveIsTheOrdinaryF() throws IOException {
    FirstStage stage =
        FirstStage.of(ofOne(), Covariance.Kind.CLASSICAL, TwoStageLeastSquaresTest.years()).get(0);
    near(stage.effective(), stage.joint().f());
    assertThat(stage.partialShare()).isBetween(0.9, 1.0);
  }

  /** Where the critical value is beyond every statistic the set has no end on either side. */
  @Test
  void nothingRejectedIsOpenOnBothSides() throws IOException {
    AndersonRubin set =
        AndersonRubin.of(
            ofOne(),
            Covariance.Kind.CLASSICAL,
            TwoStageLeastSquaresTest.years(),
            0.02,
            (q, n) -> 1e9);
    assertThat(set.pieces())
        .containsExactly(
            new AndersonRubin.Piece(Double.NEGATIVE_INFINITY, Double.POSITIVE_INFINITY));
    AndersonRubin none =
        AndersonRubin.of(
            ofOne(),
            Covariance.Kind.CLASSICAL,
            TwoStageLeastSquaresTest.years(),
            0.02,
            (q, n) -> 0);
    assertThat(none.pieces()).isEmpty();
  }
}
