package isowright.workbench;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import isowright.study.StudyRefused;
import java.nio.file.Path;
import java.util.NoSuchElementException;
import org.junit.jupiter.api.Test;

/** A study from code is the study of the file, and other sections make another. */
class WorkbenchTest {

  private static final String GIVEN =
      """
      title: As filed
      given:
        - {name: filed, form: cobb-douglas, constant: 0, coefficients: {labour: 0.5, machines: 0.5}}
      least-cost:
        # y = √(LK): a thousand of output at prices 4 and 1 takes L 500 and K 2,000
        - {name: Plan, target: 1000, prices: {labour: 4, machines: 1}}
      """;

  @Test
  void aTextIsAsGoodAsAFile() throws Exception {
    Workbench bench = Workbench.of(GIVEN, Path.of("."));
    // C = 2 y √(w r): 2 · 1000 · 2, exact but for rounding in logs and powers
    assertThat(bench.plan("Plan", "filed").cost().orElseThrow().value())
        .isCloseTo(4000, org.assertj.core.api.Assertions.within(1e-9));
    assertThat(bench.page()).contains("As filed");
    assertThat(bench.json()).startsWith("{");
    assertThat(bench.document().title()).isEqualTo("As filed");
  }

  @Test
  void otherSectionsMakeAnotherBench() throws Exception {
    Workbench bench = Workbench.of(GIVEN, Path.of("."));
    Workbench other =
        bench.with(
            """
            title: Dearer
            least-cost: [{name: Plan, target: 1000, prices: {labour: 16, machines: 1}}]
            """);
    assertThat(other.plan("Plan", "filed").cost().orElseThrow().value())
        .isCloseTo(8000, org.assertj.core.api.Assertions.within(1e-9));
    assertThat(other.text()).contains("Dearer").doesNotContain("As filed");
    assertThat(bench.text()).isEqualTo(GIVEN);
  }

  @Test
  void whatIsNotThereIsSaidWithWhatIs() throws Exception {
    Workbench bench = Workbench.of(GIVEN, Path.of("."));
    assertThatThrownBy(() -> bench.plan("Plan", "ces"))
        .isInstanceOf(NoSuchElementException.class)
        .hasMessageContaining("Plan, ces")
        .hasMessageContaining("there are: Plan, filed");
    assertThatThrownBy(bench::read).hasMessageContaining("no records");
    assertThatThrownBy(() -> bench.with("least-kost: []"))
        .isInstanceOfSatisfying(
            StudyRefused.class,
            refused -> assertThat(refused.mistakes().get(0).message()).contains("least-cost"));
  }
}
