package isowright.study;

import static isowright.study.StudyTexts.SHORT;
import static org.assertj.core.api.Assertions.assertThat;

import java.nio.file.Path;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** The words of a frontier: what is read, and what is told of mistakes. */
class FrontierStudyTest {

  @TempDir Path folder;

  private static String study(String records, String estimation) {
    return StudyTexts.with(SHORT, "{file: plants.csv}", "{file: plants.csv" + records + "}")
        + "estimation: {"
        + estimation
        + "}\n";
  }

  @ParameterizedTest
  @CsvSource(
      delimiter = ';',
      value = {
        "''; frontier: {}; estimation.frontier.inefficiency; half-normal or exponential",
        "''; 'frontier: {inefficiency: gamma}'; estimation.frontier.inefficiency; half-normal",
        "''; 'frontier: {inefficiency: exponential, law: a}'; estimation.frontier.law; allowed:"
            + " inef",
        "''; 'frontier: half-normal'; estimation.frontier; expects keys and values",
        "''; 'frontier: {inefficiency: half-normal, over-time: decay}';"
            + " estimation.frontier.over-time; records.plant` names no column",
        "', plant: p'; 'frontier: {inefficiency: half-normal, over-time: decay}';"
            + " estimation.frontier.over-time; records.period` names no column",
        "', plant: p'; 'plant-effects: within, frontier: {inefficiency: half-normal}';"
            + " estimation.plant-effects; set plant-effects to none",
        "''; 'standard-errors: hc3, frontier: {inefficiency: half-normal}';"
            + " estimation.standard-errors; classical, robust or clustered",
      })
  void mistakesAreTold(String records, String estimation, String key, String words) {
    List<Mistake> mistakes = StudyTexts.mistakes(folder, study(records, estimation));
    assertThat(mistakes).hasSize(1);
    assertThat(mistakes.get(0).key()).isEqualTo(key);
    assertThat(mistakes.get(0).message()).contains(words);
    assertThat(mistakes.get(0).line()).isEqualTo(8);
  }

  @Test
  void formsThatCannotCarryAFrontierAreTold() {
    String text =
        StudyTexts.with(
            study("", "frontier: {inefficiency: half-normal}"), "[cobb-douglas]", "[ces]");
    assertThat(StudyTexts.mistakes(folder, text))
        .singleElement()
        .satisfies(m -> assertThat(m.message()).contains("(ces)", "add cobb-douglas or translog"));
  }

  @Test
  void frontierIsAProductivityWhereOneIsAsked() {
    String question =
        "least-cost:\n  - {name: Plan, target: 10, prices: {labour: 1, machines: 2}, productivity:"
            + " frontier}\n";
    List<Mistake> mistakes = StudyTexts.mistakes(folder, SHORT + question);
    assertThat(mistakes).hasSize(1);
    assertThat(mistakes.get(0).message())
        .contains("`estimation.frontier` asks for none", "write typical or best-quarter");
    Study study =
        StudyTexts.read(folder, study("", "frontier: {inefficiency: exponential}") + question);
    assertThat(study.leastCost().get(0).productivity().kind())
        .isEqualTo(Study.Productivity.Kind.FRONTIER);
    assertThat(Settings.run(study).settings())
        .containsEntry("estimation.frontier.inefficiency", "exponential")
        .containsEntry("estimation.frontier.over-time", "each-row");
  }
}
