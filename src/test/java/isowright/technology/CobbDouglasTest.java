package isowright.technology;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import org.junit.jupiter.api.Test;

class CobbDouglasTest extends TechnologyContract {

  @Override
  List<Technology> technologies() {
    return List.of(
        CobbDouglas.of(List.of("labour", "machines"), 0.35, 0.62, 0.41),
        new CobbDouglas(
            List.of("labour", "machines"), new double[] {41000, 0.02}, -1, new double[] {0.3, 0.5}),
        CobbDouglas.of(List.of("labour", "machines", "energy"), 2, 0.2, 0.3, 0.4),
        CobbDouglas.of(List.of("a", "b", "c", "d"), 0, 0.4, 0.3, 0.2, 0.25));
  }

  @Override
  double curvature(Technology technology) {
    return 0;
  }

  /** f = 20 K^.4 L^.3 at K = 32, L = 243: 20 · 4 · 3^1.5, worked by hand. */
  @Test
  void outputIsThePowerProduct() {
    Technology technology = CobbDouglas.of(List.of("machines", "labour"), Math.log(20), 0.4, 0.3);
    assertThat(technology.output(new double[] {32, 243})).isCloseTo(415.6921938, within(1e-7));
  }

  @Test
  void parametersAreNamedAfterTheInputs() {
    Technology technology = technologies().get(0);
    assertThat(technology.parameterNames()).containsExactly("constant", "labour", "machines");
    assertThat(technology.parameters()).containsExactly(0.35, 0.62, 0.41);
  }

  @Test
  void regressorsAreTheLogInputsAndConstantReturnsIsOneRestriction() {
    double[][] z = {{1, 2, 3}, {4, 5, 6}};
    double[][] into = new double[3][3];
    CobbDouglas.FORM.regressors(z, 3, into, 1);
    assertThat(into[1]).containsExactly(1, 2, 3);
    assertThat(into[2]).containsExactly(4, 5, 6);
    assertThat(
            CobbDouglas.FORM.restrictions(
                Restriction.CONSTANT_RETURNS, List.of("labour", "machines")))
        .isDeepEqualTo(new double[][] {{1, 1, 1}});
    assertThat(CobbDouglas.FORM.secondOrder(2)).isEmpty();
  }

  @Test
  void inadmissibleInputsAreRefusedByName() {
    List<String> inputs = List.of("labour", "machines");
    double[] half = {0.5, 0.5};
    assertThatThrownBy(() -> new CobbDouglas(inputs, new double[] {1, 0}, 0, half))
        .isInstanceOf(IllegalArgumentException.class)
        .hasMessageContaining("machines")
        .hasMessageContaining("0.0");
    assertThatThrownBy(() -> CobbDouglas.of(inputs, 0, 0.5))
        .isInstanceOf(IllegalArgumentException.class)
        .hasMessageContaining("coefficients");
    assertThatThrownBy(() -> CobbDouglas.of(List.of("labour", "labour"), 0, 0.5, 0.5))
        .isInstanceOf(IllegalArgumentException.class)
        .hasMessageContaining("only once");
    assertThatThrownBy(() -> new CobbDouglas(inputs, new double[] {1}, 0, half))
        .isInstanceOf(IllegalArgumentException.class)
        .hasMessageContaining("base");
  }
}
