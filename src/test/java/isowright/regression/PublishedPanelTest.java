package isowright.regression;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.io.IOException;
import java.util.List;
import org.junit.jupiter.api.Test;

/**
 * 48 US states, 1970 to 1986 ({@code published/us-states-public-capital.csv}): A. H. Munnell 1990;
 * B. H. Baltagi, <i>Econometric Analysis of Panel Data</i>, table of chapter 2. Values computed
 * with R 4.2 ({@code lm}, {@code plm}) to the digits written here, which agree with the printed
 * table.
 */
class PublishedPanelTest {

  /** Half a unit of the sixth decimal, the last one written in the reference. */
  private static final double PRINTED = 5e-7;

  @Test
  void pooled() throws IOException {
    Design states = PublishedDesigns.states();
    LinearFit fit = LeastSquares.fit(states);
    assertThat(fit.coefficients())
        .containsExactly(
            new double[] {1.643302, .155007, .309190, .593935, -.006733}, within(PRINTED));
    assertThat(fit.ssr()).isCloseTo(6.294154, within(PRINTED));
    assertErrors(
        Covariance.estimate(states, fit, Covariance.Kind.CLASSICAL),
        new double[] {.057587, .017154, .010272, .013747, .001416});
    Covariance clustered = Covariance.estimate(states, fit, Covariance.Kind.CLUSTERED);
    // The reference says .0601 and names no factor: it is the figure before any; the factor G/(G −
    // 1)
    // · (N − 1)/(N − K) = 1.0263 lifts it to .0609. R 4.2, with the sandwich written out in matrix
    // products, gives .0601195 and .06090534; tolerances are half of the last digit.
    assertThat(clustered.standardError(1) / Math.sqrt(clustered.factor()))
        .isCloseTo(.0601195, within(5e-8));
    assertThat(clustered.standardError(1)).isCloseTo(.06090534, within(5e-9));
    assertThat(clustered.degreesOfFreedom()).isEqualTo(47);
  }

  @Test
  void withinStates() throws IOException {
    Design states = Effects.within(PublishedDesigns.states());
    LinearFit fit = LeastSquares.fit(states);
    assertThat(fit.collinearities())
        .containsExactly(new Collinearity("constant", List.of(Collinearity.GROUP_EFFECTS)));
    assertThat(fit.coefficients())
        .containsExactly(new double[] {0, -.026150, .292007, .768159, -.005298}, within(PRINTED));
    assertThat(fit.ssr()).isCloseTo(1.111189, within(PRINTED));
    assertThat(fit.residualDegreesOfFreedom()).isEqualTo(764);
    assertErrors(
        Covariance.estimate(states, fit, Covariance.Kind.CLASSICAL),
        new double[] {0, .029002, .025120, .030092, .000989});
    Covariance clustered = Covariance.estimate(states, fit, Covariance.Kind.CLUSTERED);
    // The reference says .0603, before any factor; the factor lifts it to .0611.
    assertThat(clustered.standardError(1) / Math.sqrt(clustered.factor()))
        .isCloseTo(.0603, within(5e-5));
    assertThat(clustered.standardError(1)).isCloseTo(.0611, within(5e-5));
  }

  private static void assertErrors(Covariance covariance, double[] expected) {
    for (int k = 0; k < expected.length; k++) {
      assertThat(covariance.standardError(k)).isCloseTo(expected[k], within(PRINTED));
    }
  }
}
