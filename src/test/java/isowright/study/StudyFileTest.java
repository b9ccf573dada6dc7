package isowright.study;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import isowright.estimation.Specification.PlantEffects;
import isowright.estimation.Specification.StandardErrors;
import isowright.estimation.Specification.Time;
import isowright.records.Keep;
import isowright.records.NumberFormat;
import isowright.records.Roles.Control;
import isowright.records.Roles.Deflator;
import isowright.regression.VarianceComponents;
import isowright.study.Study.Curve;
import isowright.study.Study.Given;
import isowright.study.Study.LeastCostQuestion;
import isowright.study.Study.Limit;
import isowright.study.Study.Productivity;
import isowright.technology.Technology;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.security.MessageDigest;
import java.util.HexFormat;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** A sound study file is read as the format says, with its defaults. */
class StudyFileTest {

  @TempDir Path folder;

  private Study whole() {
    return StudyTexts.read(folder, StudyTexts.WHOLE);
  }

  @Test
  void recordsAndRoles() {
    Study study = whole();
    Study.Records records = study.records().orElseThrow();
    assertThat(study.title()).isEqualTo("Glassworks, review of the 2024 cost filing");
    assertThat(records.source().file()).isEqualTo(folder.resolve("glassworks.csv"));
    assertThat(records.source().numberFormat()).contains(new NumberFormat('.', Optional.of(',')));
    assertThat(records.keep())
        .isEqualTo(new Keep(Optional.of("2012"), Optional.of("2024"), List.of("GW-07")));
    assertThat(records.roles().plant()).contains("plant");
    assertThat(records.roles().period()).contains("year");
    assertThat(records.roles().output()).isEqualTo("tonnes");
    assertThat(records.roles().inputNames()).containsExactly("labour", "machines");
    assertThat(records.roles().inputs().get(0).price()).contains("wage");
    assertThat(records.roles().inputs().get(1).spending()).contains("machine_cost");
    assertThat(records.roles().controls())
        .containsExactly(new Control("breakdown_rate", false), new Control("furnace_age", true));
    assertThat(records.roles().deflator()).contains(new Deflator("ppi", "2020"));
    assertThat(records.roles().filedCost()).contains("filed_cost");
    assertThat(study.money().words()).isEqualTo("EUR of 2020");
    assertThat(study.outputUnit()).contains("t");
    assertThat(study.inputUnits()).containsExactly(Optional.of("h"), Optional.of("h"));
    assertThat(study.technologies()).containsExactly("cobb-douglas", "ces", "translog");
  }

  @Test
  void estimationQuestionsAndFiling() {
    Study study = whole();
    assertThat(study.estimation())
        .isEqualTo(
            new Study.Estimation(
                PlantEffects.WITHIN, Time.TREND, false, Optional.of(StandardErrors.HC3), 0.9));
    assertThat(study.questions()).isEqualTo(new Study.Questions(1.1, 0.5));
    assertThat(study.filing())
        .contains(
            new Study.Filing(
                Optional.of("filed_cost"),
                Optional.of("2023"),
                Optional.of("2024"),
                new Productivity(Productivity.Kind.BEST_QUARTER, Optional.empty()),
                true,
                new Study.Simulation(499, 7),
                Optional.of(new Study.Allowance(0.65, 0.25, 5, 0.008, 0.021))));
  }

  @Test
  void leastCostQuestion() {
    LeastCostQuestion question = whole().leastCost().get(0);
    assertThat(question.name()).isEqualTo("Plan 2025");
    assertThat(question.technologies()).containsExactly("ces", "filed");
    assertThat(question.target()).isEqualTo(52000);
    assertThat(question.prices()).isEqualTo(Map.of("labour", 31.5, "machines", 84.0));
    assertThat(question.productivity().kind()).isEqualTo(Productivity.Kind.BEST_QUARTER);
    assertThat(question.period()).contains("2024");
    assertThat(question.hold()).isEqualTo(Map.of("machines", 21000.0));
    assertThat(question.limits()).isEqualTo(Map.of("labour", new Limit(0, 60000)));
    assertThat(question.curve()).contains(new Curve(20000, 80000, 31));
  }

  @Test
  void givenFormsBecomeTechnologies() {
    List<Given> given = whole().given();
    assertThat(given)
        .extracting(Given::name)
        .containsExactly("filed", "filed-ces", "filed-translog");
    double labour = 30_000;
    double machines = 10_000;
    double[] mix = {labour, machines};
    double cobbDouglas = 0.35 + 0.62 * Math.log(labour) + 0.41 * Math.log(machines);
    double sum = 0.4 * Math.pow(labour, -0.8) + 0.6 * Math.pow(machines, -0.8);
    double ces = 0.1 - 1.02 / 0.8 * Math.log(sum);
    double zl = Math.log(labour / 41_000);
    double zm = Math.log(machines / 20_500);
    // with the half: half of -0.05 times the square, and the cross term once
    double translog = 0.2 + 0.55 * zl + 0.47 * zm - 0.025 * zl * zl + 0.03 * zl * zm;
    // rounding of a dozen operations on logs near 10
    double rounding = 1e-12;
    assertThat(logOutput(given.get(0), mix)).isCloseTo(cobbDouglas, within(rounding));
    assertThat(logOutput(given.get(1), mix)).isCloseTo(ces, within(rounding));
    assertThat(logOutput(given.get(2), mix)).isCloseTo(translog, within(rounding));
  }

  private static double logOutput(Given given, double... mix) {
    Technology technology = given.technology();
    double[] logs = {Math.log(mix[0]), Math.log(mix[1])};
    return technology.logOutput(logs);
  }

  @Test
  void infiniteRhoIsFixedProportions() {
    String text =
        StudyTexts.with(
            StudyTexts.GIVEN,
            "form: cobb-douglas, constant: 0.35, coefficients: {labour: 0.62, machines: 0.41}",
            "form: ces, constant: 0, shares: {labour: 0.5, machines: 0.5}, rho: .inf, scale: 1");
    Given given = StudyTexts.read(folder, text).given().get(0);
    // fixed proportions with equal shares: output is the lesser input
    assertThat(logOutput(given, 7, 100)).isCloseTo(Math.log(7), within(1e-12));
  }

  /** Two-way names plant effects itself; every other word is carried as it is written. */
  @Test
  void plantsAndTime() {
    Study.Estimation twoWay =
        StudyTexts.read(
                folder,
                StudyTexts.with(
                    StudyTexts.WHOLE, "plant-effects: within\n  time: trend", "time: two-way"))
            .estimation();
    assertThat(twoWay.plantEffects()).isEqualTo(PlantEffects.WITHIN);
    assertThat(twoWay.time()).isEqualTo(Time.TWO_WAY);
    Study.Estimation random =
        StudyTexts.read(
                folder,
                StudyTexts.with(
                    StudyTexts.WHOLE,
                    "plant-effects: within\n  time: trend",
                    "plant-effects: random\n  time: biased-trend\n  variance-components:"
                        + " wallace-hussain"))
            .estimation();
    assertThat(random.plantEffects()).isEqualTo(PlantEffects.RANDOM);
    assertThat(random.time()).isEqualTo(Time.BIASED_TREND);
    assertThat(random.components()).isEqualTo(VarianceComponents.Method.WALLACE_HUSSAIN);
  }

  @Test
  void defaults() {
    Study study = StudyTexts.read(folder, StudyTexts.SHORT);
    assertThat(study.estimation())
        .isEqualTo(
            new Study.Estimation(PlantEffects.NONE, Time.NONE, true, Optional.empty(), 0.95));
    assertThat(study.questions()).isEqualTo(new Study.Questions(1, 1));
    assertThat(study.leastCost()).isEmpty();
    assertThat(study.filing()).isEmpty();
    assertThat(study.given()).isEmpty();
    assertThat(study.records().orElseThrow().keep()).isEqualTo(Keep.ALL);
    assertThat(study.records().orElseThrow().roles().plant()).isEmpty();
    assertThat(study.money().words()).isEqualTo("money");
    assertThat(study.inputUnits()).containsExactly(Optional.empty(), Optional.empty());
  }

  @Test
  void givenTechnologiesNameTheInputs() {
    Study study = StudyTexts.read(folder, StudyTexts.GIVEN);
    assertThat(study.records()).isEmpty();
    assertThat(study.inputs()).containsExactly("labour", "machines");
    assertThat(study.inputUnits()).hasSize(2);
    assertThat(study.leastCost().get(0).productivity()).isEqualTo(Productivity.TYPICAL);
    assertThat(study.leastCost().get(0).curve()).isEmpty();
  }

  @Test
  void coefficientsMayComeInAnyOrder() {
    String text =
        StudyTexts.with(
            StudyTexts.WHOLE,
            "coefficients: {labour: 0.62, machines: 0.41}",
            "coefficients: {machines: 0.41, labour: 0.62}");
    Technology technology = StudyTexts.read(folder, text).given().get(0).technology();
    assertThat(technology.inputs()).containsExactly("labour", "machines");
    assertThat(technology.parameters()).containsExactly(0.35, 0.62, 0.41);
  }

  @Test
  void aPlantsProductivityIsWrittenInTwoWays() {
    for (String written : List.of("{plant: GW-03}", "\"plant: GW-03\"")) {
      String text =
          StudyTexts.with(
              StudyTexts.WHOLE, "productivity: best-quarter", "productivity: " + written);
      assertThat(StudyTexts.read(folder, text).leastCost().get(0).productivity())
          .isEqualTo(new Productivity(Productivity.Kind.PLANT, Optional.of("GW-03")));
    }
  }

  @Test
  void oneTechnologyNeedsNoList() {
    String text =
        StudyTexts.with(StudyTexts.WHOLE, "technology: [ces, filed]", "technology: filed");
    assertThat(StudyTexts.read(folder, text).leastCost().get(0).technologies())
        .containsExactly("filed");
  }

  @Test
  void anOpenLimitAndUsualPoints() {
    String text =
        StudyTexts.with(
            StudyTexts.with(StudyTexts.WHOLE, "labour: [0, 60000]", "labour: [10, .inf]"),
            ", points: 31",
            "");
    LeastCostQuestion question = StudyTexts.read(folder, text).leastCost().get(0);
    assertThat(question.limits())
        .isEqualTo(Map.of("labour", new Limit(10, Double.POSITIVE_INFINITY)));
    assertThat(question.curve().orElseThrow().points()).isEqualTo(61);
  }

  /** YAML 1.2, not 1.1: these words are text, and a leading zero is kept. */
  @Test
  void wordsStayWords() {
    String text =
        StudyTexts.with(
            StudyTexts.WHOLE, "without-plants: [GW-07]", "without-plants: [007, no, 2024-01-31]");
    assertThat(StudyTexts.read(folder, text).records().orElseThrow().keep().withoutPlants())
        .containsExactly("007", "no", "2024-01-31");
  }

  @Test
  void aSpaceMayGroupDigits() {
    String text =
        StudyTexts.with(
            StudyTexts.WHOLE, "{decimal: \".\", group: \",\"}", "{decimal: \",\", group: \" \"}");
    assertThat(StudyTexts.read(folder, text).records().orElseThrow().source().numberFormat())
        .contains(new NumberFormat(',', Optional.of(' ')));
  }

  @Test
  void markupInATitleStaysText() {
    String text = StudyTexts.with(StudyTexts.SHORT, "title: Short", "title: <b>Short</b> & \"so\"");
    assertThat(StudyTexts.read(folder, text).title()).isEqualTo("<b>Short</b> & \"so\"");
  }

  @Test
  void theHashIsOfTheBytes() throws Exception {
    Path file = StudyTexts.write(folder, StudyTexts.SHORT);
    byte[] digest = MessageDigest.getInstance("SHA-256").digest(Files.readAllBytes(file));
    assertThat(StudyFile.read(file).sha256()).isEqualTo(HexFormat.of().formatHex(digest));
    assertThat(StudyFile.read(file).file()).isEqualTo(file);
  }

  @Test
  void aByteOrderMarkIsNoMistake() {
    assertThat(StudyTexts.read(folder, "\uFEFF" + StudyTexts.SHORT).title()).isEqualTo("Short");
  }

  @Test
  void filesThatAreNoStudy() throws IOException {
    assertRefused(folder.resolve("missing.yaml"), 0, "there is no such file");
    StudyTexts.write(folder, StudyTexts.SHORT);
    assertRefused(folder.resolve("stduy.yaml"), 0, "the nearest is `study.yaml`");
    assertRefused(folder, 0, "this is a folder");
    Path empty = Files.createFile(folder.resolve("empty.yaml"));
    assertRefused(empty, 0, "the file is empty");
    Path comments = Files.writeString(folder.resolve("comments.yaml"), "# only a comment\n");
    assertRefused(comments, 0, "holds no setting");
    Path latin = folder.resolve("latin.yaml");
    Files.write(latin, "title: Glas\nnote: f\u00fcr\n".getBytes(StandardCharsets.ISO_8859_1));
    assertRefused(latin, 2, "the byte 0xFC is not UTF-8");
    Path large = Files.write(folder.resolve("large.yaml"), new byte[(1 << 20) + 1]);
    assertRefused(large, 0, "is it the records file?");
  }

  private static void assertRefused(Path file, int line, String words) {
    assertThatThrownBy(() -> StudyFile.read(file))
        .isInstanceOfSatisfying(
            StudyRefused.class,
            refused -> {
              assertThat(refused.file()).isEqualTo(file);
              assertThat(refused.mistakes()).hasSize(1);
              assertThat(refused.mistakes().get(0).line()).isEqualTo(line);
              assertThat(refused.mistakes().get(0).message()).contains(words);
            });
  }
}
