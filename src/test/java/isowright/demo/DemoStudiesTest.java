package isowright.demo;

import static org.assertj.core.api.Assertions.assertThat;

import isowright.study.Study;
import isowright.study.StudyFile;
import isowright.study.StudyRefused;
import java.nio.file.Path;
import java.util.List;
import org.junit.jupiter.api.Test;

/** The demo's study files ask what their comments and the guide say they ask. */
class DemoStudiesTest {

  private static final List<String> INPUTS = List.of("labour", "machines", "energy");

  @Test
  void demoAsksForThreeTechnologiesTwoPlansAndAReview() throws StudyRefused {
    Study study = StudyFile.read(Path.of("notebooks-data", "glassworks.yaml"));
    assertThat(study.inputs()).isEqualTo(INPUTS);
    assertThat(study.technologies()).containsExactly("cobb-douglas", "ces", "translog");
    assertThat(study.given()).extracting(Study.Given::name).containsExactly("filed");
    assertThat(study.leastCost()).hasSize(2);
    assertThat(study.leastCost().get(1).hold()).containsOnlyKeys("machines");
    assertThat(study.leastCost().get(1).limits()).containsOnlyKeys("labour");
    assertThat(study.filing()).isPresent();
    assertThat(study.money().words()).isEqualTo("EUR of 2020");
  }

  @Test
  void columnsOfTheDemoStandInItsRecords() throws StudyRefused {
    var roles =
        StudyFile.read(Path.of("notebooks-data", "glassworks.yaml"))
            .records()
            .orElseThrow()
            .roles();
    assertThat(GlassworksFiles.COLUMNS)
        .contains(roles.output(), roles.plant().orElseThrow(), roles.period().orElseThrow())
        .containsAll(roles.inputs().stream().map(input -> input.quantity()).toList())
        .containsAll(roles.inputs().stream().flatMap(input -> input.price().stream()).toList())
        .containsAll(roles.inputs().stream().flatMap(input -> input.spending().stream()).toList())
        .containsAll(roles.controls().stream().map(control -> control.column()).toList())
        .contains(roles.deflator().orElseThrow().column(), roles.filedCost().orElseThrow());
  }

  @Test
  void givenTechnologiesNeedNoRecords() throws StudyRefused {
    Study study = StudyFile.read(Path.of("notebooks-data", "given-only.yaml"));
    assertThat(study.records()).isEmpty();
    assertThat(study.inputs()).containsExactly("labour", "machines");
    assertThat(study.given())
        .extracting(given -> given.technology().form())
        .containsExactly("cobb-douglas", "ces", "translog");
    assertThat(study.leastCost()).hasSize(1);
  }
}
