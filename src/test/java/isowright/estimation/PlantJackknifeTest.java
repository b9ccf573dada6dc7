package isowright.estimation;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import isowright.estimation.Specification.PlantEffects;
import isowright.estimation.Specification.StandardErrors;
import isowright.records.Panel;
import isowright.technology.Form;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;

/** The covariance over plants left out, against fits of panels without them. */
class PlantJackknifeTest {

  private static Specification specification(PlantEffects effects, StandardErrors errors) {
    return new Specification(
        Form.named("translog"), effects, Specification.Time.TREND, true, errors, .95);
  }

  @ParameterizedTest
  @EnumSource(
      value = PlantEffects.class,
      names = {"NONE", "WITHIN", "DIFFERENCES"})
  void isThatOfRefits(PlantEffects effects) {
    Panel panel = PanelFixtures.usStates();
    Specification specification = specification(effects, StandardErrors.CLUSTERED);
    Fit fit = Estimation.fit(panel, specification);
    int plants = panel.plants().size();
    int size = fit.numbers().parameters().length;
    double[][] expected = new double[size][size];
    for (int p = 0; p < plants; p++) {
      int out = p;
      Panel kept = SelectedPanel.kept(panel, row -> panel.plantOf(row) != out);
      double[] without = Estimation.fit(kept, specification, fit.base()).numbers().parameters();
      for (int i = 1; i < size; i++) {
        for (int j = 1; j < size; j++) {
          expected[i][j] +=
              (plants - 1.0)
                  / plants
                  * (without[i] - fit.numbers().parameters()[i])
                  * (without[j] - fit.numbers().parameters()[j]);
        }
      }
    }
    PlantJackknife jackknife = PlantJackknife.of(fit).orElseThrow();
    assertThat(jackknife.plants()).isEqualTo(48);
    for (int i = 1; i < size; i++) {
      for (int j = 1; j < size; j++) {
        double scale = Math.sqrt(expected[i][i] * expected[j][j]);
        // Refits from sums of products lose what the condition of the columns takes, some 1e-9.
        assertThat(jackknife.covariance()[i][j] / scale)
            .isCloseTo(expected[i][j] / scale, within(1e-7));
      }
    }
  }

  @Test
  void onlyClusteredLeastSquaresHasOne() {
    Panel panel = PanelFixtures.usStates();
    Fit classical =
        Estimation.fit(panel, specification(PlantEffects.NONE, StandardErrors.CLASSICAL));
    assertThat(PlantJackknife.of(classical)).isEmpty();
  }
}
