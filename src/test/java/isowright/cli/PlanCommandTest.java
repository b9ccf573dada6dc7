package isowright.cli;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import isowright.report.FindingsJson;
import isowright.report.TechnologyJson;
import isowright.study.Findings;
import isowright.study.Pipeline;
import isowright.study.PlanQuestion;
import isowright.study.Progress;
import isowright.study.StudyFile;
import isowright.study.TechnologyFile;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Iterator;
import java.util.List;
import java.util.stream.Stream;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import org.junit.jupiter.params.provider.ValueSource;

/** {@code plan} without the records answers as {@code run} does with them. */
class PlanCommandTest {

  private static final ObjectMapper JSON = new ObjectMapper();
  private static final Path DEMO = Path.of("notebooks-data").toAbsolutePath();

  /**
   * Saved parameters are made to add up again, which may move their last digit; standard errors are
   * found by differences, which make some thousand times as much of it.
   */
  private static final double LAST_DIGITS = 1e-9;

  private static final String HEAD =
      """
      title: Glassworks
      records: {file: %s, plant: plant, period: year}
      output: {column: tonnes, unit: t}
      inputs:
        labour: {quantity: labour_hours, price: wage, unit: h}
        machines: {quantity: machine_hours, spending: machine_cost, unit: h}
        energy: {quantity: energy_gj, price: energy_price, unit: GJ}
      money: {currency: EUR, deflator: ppi, base: 2020}
      controls: [{column: breakdown_rate}]
      """
          .formatted(DEMO.resolve("glassworks.csv"));

  private static final String QUESTIONS =
      """
      least-cost:
        - name: Prices of the records
          target: [30000, 45000]
          curve: {from: 15000, to: 60000, points: 7, short-run: [machines]}
        - {name: An early year, target: 30000, period: 2014, productivity: best-quarter}
        - name: One works
          target: 40000
          prices: {labour: 34, machines: 74, energy: 10.5}
          productivity: "plant: GW-10"
          hold: {machines: 42000}
          limits: {labour: [0, 92000]}
        - name: Three works
          target: 80000
          across: [{plant: GW-03, capacity: 40000}, {plant: GW-10}, {plant: GW-14}]
      """;

  @TempDir private static Path folder;
  private static Path technology;

  @BeforeAll
  static void writeATechnology() throws Exception {
    Path study = Files.writeString(folder.resolve("study.yaml"), plantsApart() + QUESTIONS);
    technology = folder.resolve("technology.json");
    Files.write(technology, TechnologyJson.write(run(study)));
  }

  private static String plantsApart() {
    return HEAD
        + "technologies: [cobb-douglas, ces]\nestimation: {plant-effects: within, time: trend}\n";
  }

  private static Findings run(Path study) throws Exception {
    return Pipeline.run(StudyFile.read(study), Progress.SILENT);
  }

  static Stream<String> studies() {
    String forms = "technologies: [translog, generalised-leontief, nested-ces]\n";
    String nests = "nests: [[labour, machines], [energy]]";
    return Stream.of(
        plantsApart(),
        HEAD + forms + "estimation: {time: quadratic-trend, " + nests + "}\n",
        HEAD
            + "technologies: [translog]\n"
            + "estimation: {plant-effects: within, time: biased-trend, scaling: none}\n",
        HEAD
            + "technologies: [cobb-douglas, translog]\n"
            + "estimation: {plant-effects: mundlak, time: trend}\n",
        HEAD
            + "technologies: [cobb-douglas]\n"
            + "given:\n  - {name: filed, form: cobb-douglas, constant: -1.65, coefficients:"
            + " {labour: 0.38, machines: 0.36, energy: 0.32}}\n"
            + "estimation: {plant-effects: random}\n");
  }

  @ParameterizedTest
  @MethodSource("studies")
  void answersAsTheRunDid(String head, @TempDir Path own) throws Exception {
    Path study = Files.writeString(own.resolve("study.yaml"), head + QUESTIONS);
    Findings with = run(study);
    Path file = own.resolve("technology.json");
    Files.write(file, TechnologyJson.write(with));
    Findings without =
        PlanQuestion.answer(
            TechnologyFile.read(file), Files.writeString(own.resolve("question.yaml"), QUESTIONS));
    JsonNode one = JSON.readTree(FindingsJson.write(with)).get("leastCost");
    JsonNode other = JSON.readTree(FindingsJson.write(without)).get("leastCost");
    assertThat(one).hasSizeGreaterThanOrEqualTo(5);
    alike("leastCost", one, other);
  }

  /** The same keys, words and states; numbers to their last digits. */
  private static void alike(String at, JsonNode one, JsonNode other) {
    assertThat(other.getNodeType()).as(at).isEqualTo(one.getNodeType());
    if (one.isNumber()) {
      double value = one.doubleValue();
      // departures from laws are rounding errors, of which only the size is the same
      double room = Math.max(LAST_DIGITS * Math.abs(value), at.contains("checks") ? 1e-6 : 1e-9);
      assertThat(other.doubleValue()).as(at).isCloseTo(value, within(room));
    } else if (one.isValueNode()) {
      assertThat(other).as(at).isEqualTo(one);
    } else if (one.isArray()) {
      assertThat(other.size()).as(at).isEqualTo(one.size());
      for (int i = 0; i < one.size(); i++) {
        alike(at + "[" + i + "]", one.get(i), other.get(i));
      }
    } else {
      List<String> names = new ArrayList<>();
      for (Iterator<String> all = one.fieldNames(); all.hasNext(); ) {
        names.add(all.next());
      }
      names.remove("refits"); // of refits only a run can tell
      assertThat(other.size()).as(at).isGreaterThanOrEqualTo(names.size());
      for (String name : names) {
        assertThat(other.has(name)).as(at + "." + name).isTrue();
        alike(at + "." + name, one.get(name), other.get(name));
      }
    }
  }

  @Test
  void optionsAndFileAskTheSame() throws Exception {
    Path question =
        Files.writeString(
            folder.resolve("question.yaml"),
            """
            least-cost:
              - name: Plan
                technology: ces
                target: 40000
                prices: {labour: 34, machines: 74, energy: 10.5}
                hold: {machines: 42000}
                limits: {labour: [0, 92000]}
                productivity: best-quarter
                period: 2020
            """);
    Invocation file = plan("--question", question.toString());
    Invocation options =
        plan(
            "--technology",
            "ces",
            "--target",
            "40000",
            "--prices",
            "labour=34,machines=74,energy=10.5",
            "--hold",
            "machines=42000",
            "--limits",
            "labour=..92000",
            "--productivity",
            "best-quarter",
            "--period",
            "2020");
    assertThat(options.code()).isZero();
    assertThat(options.out()).isEqualTo(file.out());
    assertThat(options.out().replace('\u00a0', ' '))
        .contains("Plan: 40,000 t at least cost", "marginal cost", "machines held at 42,000 h");
  }

  @Test
  void everyMistakeIsToldAtOnceByItsOption() {
    Invocation refused =
        plan(
            "--technology",
            "ces,foo",
            "--target",
            "-5",
            "--prices",
            "labour=-1,machins=3,energy=x",
            "--limits",
            "labour=9..2",
            "--hold",
            "fuel=3",
            "--period",
            "2031",
            "--productivity",
            "plant: GW-77");
    assertThat(refused.code()).isEqualTo(2);
    assertThat(refused.out()).isEmpty();
    assertThat(refused.err())
        .contains(
            "`foo` is neither fitted nor given",
            "--target",
            "expects a number above 0, found -5",
            "the nearest is `machines`",
            "--prices.labour",
            "--prices.energy",
            "swap them",
            "`fuel` is not an input",
            "no period 2031",
            "no plant GW-77",
            "Nothing was written");
  }

  @Test
  void targetOutOfReachIsToldWithTheMostAndTheLimitThatBinds() {
    Invocation refused =
        plan(
            "--technology",
            "ces",
            "--target",
            "4000000",
            "--hold",
            "machines=42000",
            "--limits",
            "labour=0..92000");
    assertThat(refused.code()).isEqualTo(2);
    assertThat(refused.err())
        .contains("--target", "out of reach", "labour at most 92000", "machines held at 42000")
        .containsPattern("output (is at most|stays below) \\d+");
  }

  @Test
  void jsonIsTheFindingsFile() throws Exception {
    Invocation done = plan("--target", "40000", "--json");
    JsonNode findings = JSON.readTree(done.out());
    assertThat(findings.get("leastCost")).hasSize(2);
    assertThat(findings.at("/leastCost/0/cost/low").isNumber()).isTrue();
    assertThat(findings.at("/study/sha256").textValue()).matches("[0-9a-f]{64}");
  }

  @Test
  void reportGoesIntoAFolderOnRequestAndSaysThatRecordsWereNotRead(@TempDir Path own)
      throws Exception {
    Path into = own.resolve("next-year");
    Invocation done = plan("--target", "40000", "--technology", "ces", "--into", into.toString());
    assertThat(done.code()).isZero();
    assertThat(into.resolve("findings.json")).exists();
    assertThat(into.resolve("technology.json")).doesNotExist();
    String report = Files.readString(into.resolve("report.html"));
    assertThat(report.contains("the records themselves were not read")).isTrue();
    assertThat(report.contains("no figure carries an")).isFalse();
    Invocation refused = plan("--target", "0", "--into", own.resolve("other").toString());
    assertThat(refused.code()).isEqualTo(2);
    assertThat(own.resolve("other")).doesNotExist();
  }

  @Test
  void noRowOfTheRecordsIsHandedOver() throws Exception {
    String file = Files.readString(technology);
    List<String> rows = Files.readAllLines(DEMO.resolve("glassworks.csv"));
    String[] row = rows.get(20).split(",");
    for (String head : List.of("tonnes", "labour_hours", "machine_cost", "filed_cost")) {
      int column = List.of(rows.get(0).split(",")).indexOf(head);
      assertThat(file).doesNotContain(row[column]);
    }
  }

  @ParameterizedTest
  @ValueSource(strings = {"README.md", "notebooks-data/glassworks.yaml", "nowhere.json", "."})
  void whatIsNoTechnologyIsRefused(String file) {
    Invocation refused = Invocation.of("plan", file, "--target", "3");
    assertThat(refused.code()).isEqualTo(2);
    assertThat(refused.err()).contains("cannot be used", "Nothing was written");
  }

  @ParameterizedTest
  @ValueSource(strings = {"\"farthest\"", "\"covariance\"", "\"constants\"", "\"units\""})
  void damagedFileIsRefusedByItsKey(String key) throws Exception {
    Path damaged = folder.resolve("damaged.json");
    String whole = Files.readString(technology);
    int at = whole.lastIndexOf(key);
    Files.writeString(damaged, whole.substring(0, at) + "\"x" + whole.substring(at + 1));
    Invocation refused = Invocation.of("plan", damaged.toString(), "--target", "30000");
    assertThat(refused.code()).isEqualTo(2);
    assertThat(refused.err()).contains(key.replace("\"", ""), "run the study again");
  }

  private static Invocation plan(String... options) {
    List<String> all = new ArrayList<>(List.of("plan", technology.toString()));
    all.addAll(List.of(options));
    return Invocation.of(all.toArray(String[]::new));
  }
}
