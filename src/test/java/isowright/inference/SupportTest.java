package isowright.inference;

import static org.assertj.core.api.Assertions.assertThat;

import isowright.estimation.PanelFixtures;
import isowright.records.Panel;
import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.Test;

class SupportTest {

  private static Panel along() {
    Random random = new Random(20240613);
    double[] labour = new double[60];
    double[] machines = new double[60];
    double[] output = new double[60];
    for (int r = 0; r < 60; r++) {
      double size = 4 + 3 * random.nextDouble();
      labour[r] = Math.exp(size + .1 * random.nextGaussian());
      machines[r] = Math.exp(size - 1 + .1 * random.nextGaussian());
      output[r] = Math.exp(size);
    }
    return PanelFixtures.crossSection(output, List.of("labour", "machines"), labour, machines);
  }

  @Test
  void everyRecordIsInside() {
    Panel panel = along();
    Support support = Support.of(panel);
    for (int r = 0; r < panel.rows(); r++) {
      double[] mix = {panel.quantities().get(0).get(r), panel.quantities().get(1).get(r)};
      assertThat(support.inside(mix)).as("row " + r).isTrue();
    }
  }

  @Test
  void anInputBeyondItsRangeIsNamedWithTheRange() {
    assertThat(Support.of(along()).reasons(new double[] {1e6, 100}))
        .anySatisfy(reason -> assertThat(reason).contains("labour", "above the records"));
  }

  /** Each input within its range, but little labour with many machines was never seen. */
  @Test
  void anUnseenCombinationIsOutside() {
    double[] mix = {Math.exp(4.5), Math.exp(5.5)};
    assertThat(Support.of(along()).reasons(mix)).singleElement().asString().contains("combination");
  }
}
