package isowright.study;

import static org.assertj.core.api.Assertions.assertThat;

import isowright.study.SimultaneityFindings.Input;
import org.junit.jupiter.api.Test;

/** What a study states before fitting: the figures are held to R in {@code InputShiftersTest}. */
class SimultaneityTest {

  private static SimultaneityFindings of(RealFindings.Study study) {
    return RealFindings.of(study).specification().simultaneity().orElseThrow();
  }

  @Test
  void everyInputHasADirectionAndAReason() {
    SimultaneityFindings demo = of(RealFindings.Study.DEMO);
    assertThat(demo.inputs())
        .extracting(Input::name)
        .containsExactly("labour", "machines", "energy");
    assertThat(demo.inputs())
        .filteredOn(i -> i.name().equals(demo.free()))
        .singleElement()
        .satisfies(i -> assertThat(i.direction()).isEqualTo("upward"))
        .satisfies(i -> assertThat(i.perFree()).hasValue(1.0));
    // machine_cost / machine_hours is the price of machines
    assertThat(demo.inputs().get(1).shifted()).isEqualTo("unknown");
    assertThat(demo.inputs().get(1).words()).contains("spending divided by this very quantity");
    assertThat(demo.expectation()).contains("leans upward", "returns to scale lean ");
    assertThat(demo.treatment()).startsWith("Plant effects take out what lasts");
  }

  @Test
  void recordsWithoutPricesShiftNothing() {
    SimultaneityFindings states = of(RealFindings.Study.STATES_POOLED);
    assertThat(states.inputs()).allSatisfy(i -> assertThat(i.shifted()).isEqualTo("no"));
    assertThat(states.inputs()).allSatisfy(i -> assertThat(i.response()).isEmpty());
    assertThat(states.treatment()).startsWith("Nothing is done against it");
    assertThat(of(RealFindings.Study.PRIMARY_METALS).inputs())
        .allSatisfy(i -> assertThat(i.withinShare()).isEmpty());
    assertThat(RealFindings.of(RealFindings.Study.GIVEN).specification().simultaneity()).isEmpty();
  }
}
