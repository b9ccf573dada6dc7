package isowright.inference;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import isowright.estimation.EstimatedTechnology;
import isowright.inference.Simulation.Simulated;
import isowright.technology.CobbDouglas;
import isowright.technology.Technology;
import java.util.List;
import java.util.function.Function;
import org.junit.jupiter.api.Test;

/** Drawn technologies have the law they are drawn from. */
class SimulationTest {

  private static final double[][] COVARIANCE = {
    {.04, .005, -.005}, {.005, .01, -.004}, {-.005, -.004, .02}
  };

  private static EstimatedTechnology estimated(double degreesOfFreedom, double[][] covariance) {
    Technology technology = CobbDouglas.of(List.of("labour", "capital"), 1, .6, .4);
    return new EstimatedTechnology(technology, covariance, degreesOfFreedom);
  }

  /** β_1 + β_2 is normal about 1 with variance .01 + .02 − .008; 20,000 draws know ends to 2 %. */
  @Test
  void linearFunctionOfNormalDraws() {
    Simulated simulated =
        Simulation.of(estimated(Double.POSITIVE_INFINITY, COVARIANCE), .95, 20_000, 1)
            .estimates(new double[] {1}, t -> new double[] {t.parameters()[1] + t.parameters()[2]});
    Estimate sum = simulated.estimates().get(0);
    double se = Math.sqrt(.022);
    assertThat(sum.standardError()).isCloseTo(se, within(.02 * se));
    assertThat(sum.low()).isCloseTo(1 - 1.959964 * se, within(.04 * se));
    assertThat(sum.high()).isCloseTo(1 + 1.959964 * se, within(.04 * se));
    assertThat(sum.method()).isEqualTo(Estimate.Method.SIMULATION);
    assertThat(simulated.answered()).isEqualTo(1);
  }

  /** At 5 degrees of freedom the ends are those of Student's law, 2.570582 standard errors. */
  @Test
  void fewDegreesOfFreedom() {
    Estimate slope =
        Simulation.of(estimated(5, COVARIANCE), .95, 40_000, 2)
            .estimates(new double[] {.6}, t -> new double[] {t.parameters()[1]})
            .estimates()
            .get(0);
    // The density at the end of t(5) is .03, so 40,000 draws know it to 0.03 standard errors.
    assertThat(slope.high()).isCloseTo(.6 + 2.570582 * .1, within(.009));
  }

  /** A parameter without variance stays; a covariance of rank one moves along its one direction. */
  @Test
  void covarianceWithoutRank() {
    double[][] covariance = {{0, 0, 0}, {0, .01, -.01}, {0, -.01, .01}};
    Function<Technology, double[]> numbers =
        t ->
            new double[] {
              t.parameters()[0], t.parameters()[1], t.parameters()[1] + t.parameters()[2]
            };
    List<Estimate> estimates =
        Simulation.of(estimated(30, covariance), .9, 500, 3)
            .estimates(new double[] {1, .6, 1}, numbers)
            .estimates();
    assertThat(estimates.get(0).standardError()).isCloseTo(0, within(1e-12));
    assertThat(estimates.get(1).standardError()).isGreaterThan(.08);
    assertThat(estimates.get(2).standardError()).isCloseTo(0, within(1e-9));
  }

  @Test
  void drawsWithoutANumberAreLeftOutAndCounted() {
    Simulated simulated =
        Simulation.of(estimated(Double.POSITIVE_INFINITY, COVARIANCE), .95, 4_000, 4)
            .estimates(
                new double[] {.6},
                t -> new double[] {t.parameters()[1] > .6 ? t.parameters()[1] : Double.NaN});
    assertThat(simulated.answered()).isCloseTo(.5, within(.03));
    assertThat(simulated.estimates().get(0).low()).isGreaterThan(.6);
  }

  @Test
  void sameSeedSameDigits() {
    Function<Technology, double[]> slope = t -> new double[] {t.parameters()[1]};
    assertThat(draw(7, slope)).isEqualTo(draw(7, slope)).isNotEqualTo(draw(8, slope));
  }

  private static Estimate draw(long seed, Function<Technology, double[]> function) {
    return Simulation.of(estimated(30, COVARIANCE), .95, 50, seed)
        .estimates(new double[] {.6}, function)
        .estimates()
        .get(0);
  }
}
