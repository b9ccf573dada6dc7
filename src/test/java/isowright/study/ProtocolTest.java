package isowright.study;

import static isowright.study.StudyTexts.SHORT;
import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.tuple;

import isowright.study.Protocol.Decision;
import isowright.study.Protocol.Expectation;
import isowright.study.Protocol.Subject;
import isowright.study.SpecificationFindings.Agreement;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** What a study lays down beforehand is read, refused where it makes no sense, and held. */
class ProtocolTest {

  @TempDir Path folder;

  @Test
  void expectationsAndDecisionsAreRead() {
    Protocol protocol =
        StudyTexts.read(
                folder,
                SHORT
                    + """
                    expect:
                      substitution: [0.2, 1.2]
                      output-elasticity: {machines: [-.inf, 0.7], labour: [0.3, .inf]}
                      returns-to-scale: [0.9, 1.1]
                    decisions:
                      - {date: 2025-02-03, by: analyst, what: without GW-07, why: rebuilt in 2019}
                      - {date: 2025-02, by: board, what: CES, why: policy}
                      - {date: 2024, by: board, what: prices of 2020, why: index}
                    """)
            .protocol();
    assertThat(protocol.expectations())
        .containsExactly(
            new Expectation(Subject.RETURNS_TO_SCALE, Optional.empty(), .9, 1.1),
            new Expectation(
                Subject.OUTPUT_ELASTICITY, Optional.of("labour"), .3, Double.POSITIVE_INFINITY),
            new Expectation(
                Subject.OUTPUT_ELASTICITY, Optional.of("machines"), Double.NEGATIVE_INFINITY, .7),
            new Expectation(Subject.SUBSTITUTION, Optional.empty(), .2, 1.2));
    assertThat(protocol.decisions())
        .hasSize(3)
        .first()
        .isEqualTo(new Decision("2025-02-03", "analyst", "without GW-07", "rebuilt in 2019"));
  }

  @Test
  void withoutTheseKeysNothingIsLaidDown() {
    assertThat(StudyTexts.read(folder, SHORT).protocol()).isEqualTo(Protocol.NONE);
  }

  @Test
  void everyMistakeIsToldAtOnce() {
    String text =
        SHORT
            + """
            expect:
              returns-to-scale: [1.1, 0.9]
              output-elasticity: {labor: [0, 1], machines: [0.2]}
              substitution: 1
              substitutions: [0, 1]
            decisions:
              - {date: 2025-13-03, by: analyst, what: x}
              - {data: 2025-01-01}
            """;
    assertThat(StudyTexts.mistakes(folder, text))
        .extracting(Mistake::line, Mistake::key)
        .containsExactlyInAnyOrder(
            tuple(9, "expect.returns-to-scale"),
            tuple(10, "expect.output-elasticity.labor"),
            tuple(10, "expect.output-elasticity.machines"),
            tuple(11, "expect.substitution"),
            tuple(12, "expect.substitutions"),
            tuple(14, "decisions[1].date"),
            tuple(14, "decisions[1].why"),
            tuple(15, "decisions[2].data"),
            tuple(15, "decisions[2].date"),
            tuple(15, "decisions[2].by"),
            tuple(15, "decisions[2].what"),
            tuple(15, "decisions[2].why"));
    assertThat(StudyTexts.mistakes(folder, text))
        .extracting(Mistake::message)
        .anySatisfy(m -> assertThat(m).contains("1.1", "is above the highest, 0.9", "swap them"))
        .anySatisfy(m -> assertThat(m).contains("the nearest is `labour`"))
        .anySatisfy(m -> assertThat(m).contains("the nearest is `substitution`"))
        .anySatisfy(m -> assertThat(m).contains("a date such as 2025-02-03"));
  }

  @Test
  void nothingCanBeExpectedOfAFitThatIsNotMade() {
    assertThat(
            StudyTexts.mistakes(
                folder, StudyTexts.GIVEN + "expect: {returns-to-scale: [0.9, 1.1]}\n"))
        .singleElement()
        .satisfies(m -> assertThat(m.message()).contains("no technology is fitted"));
  }

  /** Ranges and intervals by hand: the whole interval decides, ends included. */
  @ParameterizedTest
  @CsvSource({
    "0.9, 1.1, 0.9, 1.1, INSIDE",
    "0.95, 1.05, 0.9, 1.1, INSIDE",
    "0.85, 1.05, 0.9, 1.1, OVERLAPS",
    "0.8, 1.3, 0.9, 1.1, OVERLAPS",
    "1.1, 1.3, 0.9, 1.1, OVERLAPS",
    "1.11, 1.3, 0.9, 1.1, OUTSIDE",
    "0.5, 0.89, 0.9, 1.1, OUTSIDE",
    "NaN, NaN, 0.9, 1.1, UNKNOWN"
  })
  void theWholeIntervalDecides(
      double from, double to, double low, double high, Agreement agreement) {
    Figure figure = Figure.estimated((from + to) / 2, .1, from, to, "delta");
    assertThat(ExpectationStage.agreement(figure, low, high)).isEqualTo(agreement);
  }

  @Test
  void anExactFigureIsHeldAsItIs() {
    assertThat(ExpectationStage.agreement(Figure.exact(1), .2, 1.2)).isEqualTo(Agreement.INSIDE);
    assertThat(ExpectationStage.agreement(Figure.exact(2), .2, 1.2)).isEqualTo(Agreement.OUTSIDE);
  }

  /** The fixture's fits, of which one has no figures, beside expectations of every kind. */
  @Test
  void everyFitStandsBesideEveryExpectation() {
    Findings findings = FindingsFixture.troubled();
    List<SpecificationFindings.Expected> held =
        ExpectationStage.held(
            List.of(
                new Expectation(Subject.RETURNS_TO_SCALE, Optional.empty(), 0, 10),
                new Expectation(Subject.OUTPUT_ELASTICITY, Optional.of("labour"), 5, 6)),
            findings.fits());
    assertThat(held)
        .extracting(e -> e.technology(), e -> e.figure(), e -> e.agreement())
        .containsExactly(
            tuple("cobb-douglas", "returns-to-scale", Agreement.INSIDE),
            tuple("ces", "returns-to-scale", Agreement.UNKNOWN),
            tuple("translog", "returns-to-scale", Agreement.UNKNOWN),
            tuple("cobb-douglas", "output-elasticity", Agreement.OUTSIDE),
            tuple("ces", "output-elasticity", Agreement.UNKNOWN),
            tuple("translog", "output-elasticity", Agreement.UNKNOWN));
  }
}
