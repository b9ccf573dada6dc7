package isowright.study;

import static isowright.study.StudyTexts.SHORT;
import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.tuple;

import java.io.IOException;
import java.io.InputStream;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Objects;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/**
 * A table of study files with one mistake each: the mistake is the only one told, at this line and
 * key, in these words.
 */
class StudyMistakesTest {

  @TempDir Path folder;

  /**
   * One bad study.
   *
   * @param text a sound study
   * @param passage the passage of it that is replaced
   * @param bad what stands there instead
   * @param line where the mistake is told
   * @param key at which key
   * @param words what the message says, among other things
   */
  record Bad(String text, String passage, String bad, int line, String key, List<String> words) {
    @Override
    public String toString() {
      return line + " " + key + ": " + bad.strip();
    }
  }

  @ParameterizedTest(name = "{0}")
  @MethodSource("table")
  void isToldWithItsPlace(Bad bad) {
    String text = StudyTexts.with(bad.text(), bad.passage(), bad.bad());
    List<Mistake> mistakes = StudyTexts.mistakes(folder, text);
    assertThat(mistakes).as(text).hasSize(1);
    Mistake mistake = mistakes.get(0);
    assertThat(mistake.message()).contains(bad.words());
    assertThat(mistake.key()).isEqualTo(bad.key());
    assertThat(mistake.line()).isEqualTo(bad.line());
  }

  static List<Bad> table() throws IOException {
    List<Bad> all = new ArrayList<>();
    List<String> files =
        List.of(
            "mistakes.txt",
            "filing-mistakes.txt",
            "matrix-mistakes.txt",
            "endogenous-mistakes.txt");
    for (String file : files) {
      all.addAll(table(file));
    }
    return all;
  }

  private static List<Bad> table(String file) throws IOException {
    List<String> lines;
    try (InputStream in = StudyMistakesTest.class.getResourceAsStream(file)) {
      lines =
          new String(Objects.requireNonNull(in).readAllBytes(), StandardCharsets.UTF_8)
              .lines()
              .filter(line -> !line.isBlank() && !line.startsWith("#"))
              .toList();
    }
    List<Bad> all = new ArrayList<>();
    for (int i = 0; i < lines.size(); i += 2) {
      String[] study = (lines.get(i) + " ").split(" ¦ ?", -1);
      String[] told = lines.get(i + 1).split(" ¦ ", -1);
      all.add(
          new Bad(
              StudyTexts.named(study[0]),
              study[1].translateEscapes(),
              study[2].substring(0, study[2].length() - 1).translateEscapes(),
              Integer.parseInt(told[0].strip()),
              told[1],
              List.of(told[2].split(" … "))));
    }
    return all;
  }

  /** The table is whole: it shrinks only on purpose. */
  @Test
  void theTableIsLong() throws IOException {
    assertThat(table()).hasSizeGreaterThan(160);
  }

  /** A form that cannot be fitted so beside one that can is no mistake; alone it is. */
  @Test
  void noFormCanBeFittedSo() {
    String text =
        """
        title: Curved
        records: {file: plants.csv, plant: plant, period: year}
        output: {column: tonnes}
        inputs:
          labour: {quantity: hours}
          machines: {quantity: machine_hours}
        technologies: [ces]
        estimation: {plant-effects: random, time: biased-trend}
        """;
    assertThat(StudyTexts.mistakes(folder, text))
        .extracting(Mistake::line, Mistake::key)
        .containsExactly(tuple(8, "estimation.plant-effects"), tuple(8, "estimation.time"));
    assertThat(StudyTexts.mistakes(folder, text).get(0).message())
        .contains("linear in their parameters", "(ces)", "add cobb-douglas or translog");
    assertThat(StudyTexts.read(folder, text.replace("[ces]", "[ces, translog]")).estimation())
        .isNotNull();
  }

  @Test
  void neitherRecordsNorGiven() {
    assertThat(StudyTexts.mistakes(folder, "title: Nothing\n"))
        .singleElement()
        .satisfies(
            mistake ->
                assertThat(mistake.message())
                    .contains("`records` is missing", "technologies taken as known (`given`)"));
  }

  @Test
  void everyMistakeIsToldInTheOrderOfTheFile() {
    String text =
        """
        title: Many
        records: {file: plants.csv, shet: x}
        output: {column: tonnes}
        inputs:
          labour: {quantity: hours, price: wage}
          machines: {quantity: machine_hours}
        technologies: [translogg]
        estimation: {plant-effects: within, time: trend, confidence: 2}
        least-cost:
          - {name: A, target: ten, hold: {labor: 3}}
        """;
    assertThat(StudyTexts.mistakes(folder, text))
        .extracting(Mistake::line, Mistake::key)
        .containsExactly(
            tuple(2, "records.shet"),
            tuple(7, "technologies[1]"),
            tuple(8, "estimation.plant-effects"),
            tuple(8, "estimation.time"),
            tuple(8, "estimation.confidence"),
            tuple(10, "least-cost[1].prices"),
            tuple(10, "least-cost[1].target"),
            tuple(10, "least-cost[1].hold.labor"));
  }

  /** Columns point at the word that is wrong, counted from 1. */
  @Test
  void columnsPointAtTheWord() {
    String text = StudyTexts.with(SHORT, "[cobb-douglas]", "[ces, cob]");
    assertThat(StudyTexts.mistakes(folder, text).get(0).column())
        .isEqualTo("technologies: [ces, ".length() + 1);
  }

  @Test
  void withoutRecordsNoColumnsAreNamed() {
    String text =
        """
        title: Given
        output: {column: tonnes}
        inputs:
          labour: {quantity: hours}
          machines: {unit: h}
        controls: [{column: age}]
        money: {deflator: ppi, base: 2020}
        given:
          - {name: filed, form: cobb-douglas, constant: 0, coefficients: {labour: 1, machines: 1}}
        """;
    assertThat(StudyTexts.mistakes(folder, text))
        .extracting(Mistake::key)
        .containsExactly("output.column", "inputs.labour.quantity", "controls", "money.deflator");
  }

  @Test
  void unitsNeedNoRecords() {
    String text =
        """
        title: Given
        output: {unit: t}
        inputs: {labour: {unit: h}, machines: {unit: h}}
        given:
          - {name: filed, form: cobb-douglas, constant: 0, coefficients: {labour: 1, machines: 1}}
        """;
    Study study = StudyTexts.read(folder, text);
    assertThat(study.outputUnit()).contains("t");
    assertThat(study.inputUnits()).hasSize(2).allMatch(unit -> unit.equals(Optional.of("h")));
  }

  /** Texts made to exhaust a reader end in a mistake as well. */
  @Test
  void textsMadeToExhaust() {
    assertThat(StudyTexts.mistakes(folder, "a: " + "[".repeat(300_000)))
        .singleElement()
        .satisfies(mistake -> assertThat(mistake.message()).contains("nested too deeply"));
    StringBuilder laughs = new StringBuilder("a0: &a0 [x]\n");
    for (int i = 1; i < 60; i++) {
      String before = "*a" + (i - 1);
      laughs.append("a" + i + ": &a" + i + " [" + before + ", " + before + "]\n");
    }
    assertThat(StudyTexts.mistakes(folder, laughs.toString())).isNotEmpty();
  }

  /** Aliases that refer to themselves end in mistakes, not in a search without end. */
  @Test
  void aMappingInsideItselfIsRefused() {
    assertThat(StudyTexts.mistakes(folder, "&all\ntitle: A\nrecords: *all\n")).isNotEmpty();
  }
}
