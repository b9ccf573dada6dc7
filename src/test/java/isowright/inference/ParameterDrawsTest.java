package isowright.inference;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import isowright.estimation.EstimatedTechnology;
import isowright.technology.Ces;
import isowright.technology.CobbDouglas;
import java.util.Arrays;
import java.util.List;
import java.util.stream.IntStream;
import org.apache.commons.statistics.distribution.TDistribution;
import org.junit.jupiter.api.Test;

/** Draws have the law that intervals rest on, keep to a singular covariance, and repeat. */
class ParameterDrawsTest {

  private static final double[][] COVARIANCE = {
    {.04, .001, -.002}, {.001, .0025, -.0005}, {-.002, -.0005, .0036}
  };
  private static final CobbDouglas CENTRE =
      CobbDouglas.of(List.of("labour", "machines"), .5, .6, .3);
  private static final int DRAWS = 40_000;

  /** a′θ over its standard error follows Student's law: its quantiles are looked up. */
  @Test
  void everyDirectionFollowsStudentsLaw() {
    double degrees = 13;
    ParameterDraws draws =
        ParameterDraws.of(new EstimatedTechnology(CENTRE, COVARIANCE, degrees), DRAWS, 9);
    double[] direction = {1, -2, .5};
    double variance = 0;
    for (int k = 0; k < 3; k++) {
      for (int l = 0; l < 3; l++) {
        variance += direction[k] * COVARIANCE[k][l] * direction[l];
      }
    }
    double se = Math.sqrt(variance);
    double[] t =
        IntStream.range(0, DRAWS)
            .mapToDouble(r -> draws.draw(r).along(direction) / se)
            .sorted()
            .toArray();
    for (double p : new double[] {.025, .25, .5, .75, .975}) {
      double share =
          Arrays.stream(t)
                  .filter(v -> v <= TDistribution.of(degrees).inverseCumulativeProbability(p))
                  .count()
              / (double) DRAWS;
      // Four binomial standard errors.
      assertThat(share).isCloseTo(p, within(4 * Math.sqrt(p * (1 - p) / DRAWS)));
    }
  }

  @Test
  void singularCovarianceIsKeptTo() {
    Ces ces = Ces.of(List.of("a", "b"), new double[] {1, 1}, 0, new double[] {.4, .6}, .5, 1);
    double[][] v = new double[5][5];
    v[1][1] = .01;
    v[2][2] = .01;
    v[1][2] = -.01;
    v[2][1] = -.01;
    ParameterDraws draws = ParameterDraws.of(new EstimatedTechnology(ces, v, 1e6), 50, 2);
    for (int r = 0; r < 50; r++) {
      double[] sum = {0, 1, 1, 0, 0};
      assertThat(draws.draw(r).along(sum)).isCloseTo(0, within(1e-15));
      assertThat(draws.technology(draws.draw(r)).parameters()[0]).isZero();
      assertThat(draws.draw(r).stretch()).isEqualTo(1);
    }
  }

  @Test
  void drawsRepeatInAnyOrder() {
    ParameterDraws draws =
        ParameterDraws.of(new EstimatedTechnology(CENTRE, COVARIANCE, 20), 100, 9);
    double[] late = draws.technology(draws.draw(70)).parameters();
    draws.draw(3);
    assertThat(draws.technology(draws.draw(70)).parameters()).isEqualTo(late);
    assertThat(draws.technology(draws.draw(71)).parameters()).isNotEqualTo(late);
  }
}
