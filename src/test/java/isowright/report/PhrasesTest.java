package isowright.report;

import static org.assertj.core.api.Assertions.assertThat;

import isowright.report.Phrases.Relation;
import isowright.study.Figure;
import isowright.study.FitFindings.Regular;
import isowright.study.FitFindings.Tested;
import java.math.BigDecimal;
import java.util.List;
import java.util.Map;
import java.util.Random;
import java.util.stream.DoubleStream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

/** A sentence never says more than the interval or the p-value printed beside it. */
class PhrasesTest {

  private static final int DRAWS = 5_000;

  private static Tested test(double p) {
    return new Tested("constant-returns", "…", 1.2, "F", List.of(1.0, 24.0), p, "…");
  }

  @ParameterizedTest
  @ValueSource(doubles = {0.8, 0.9, 0.95, 0.975, 0.99, 0.999})
  void theOutcomeOfATestAgreesWithThePrintedP(double confidence) {
    double level = Phrases.level(confidence);
    Random random = new Random(3);
    DoubleStream near =
        DoubleStream.of(0, 1e-9, 1e-7, 1e-5, 1e-3, 1e-2)
            .flatMap(off -> DoubleStream.of(level * (1 - off), level * (1 + off)));
    DoubleStream anywhere = random.doubles(DRAWS).map(u -> u * u * u);
    DoubleStream.concat(near, anywhere)
        .forEach(
            p -> {
              boolean rejected = Phrases.outcome(test(p), confidence).equals("rejected");
              assertThat(rejected).as("p " + p + " at " + level).isEqualTo(p < level);
              String printed = Numbers.p(p, level);
              BigDecimal number = PrintedNumber.allIn(printed).get(0);
              BigDecimal mark = BigDecimal.valueOf(level);
              if (printed.contains("<")) {
                assertThat(rejected).as(printed).isTrue();
              } else if (printed.contains("=")) {
                assertThat(number.compareTo(mark) < 0).as(printed).isEqualTo(rejected);
              }
            });
  }

  /** 1 − 0.95 is more than 0.05 in doubles, by which a p of exactly 0.05 would be rejected. */
  @Test
  void aPAtTheLevelDoesNotReject() {
    assertThat(Phrases.outcome(test(0.05), 0.95)).isEqualTo("not rejected");
    assertThat(Phrases.outcome(test(0.0499999), 0.95)).isEqualTo("rejected");
    assertThat(Phrases.outcome(test(Double.NaN), 0.95)).isEqualTo("no outcome");
  }

  private static Figure drawn(Random random) {
    double value = 0.5 + random.nextDouble();
    double error = Math.pow(10, 3 * random.nextDouble() - 3);
    return Figure.estimated(value, error, value - 2 * error, value + 2 * error, "delta");
  }

  @Test
  void returnsToScaleAreOnlyCalledWhatTheWholeIntervalIs() {
    Random random = new Random(4);
    for (int i = 0; i < DRAWS; i++) {
      Figure scale = drawn(random);
      String words = Phrases.returnsToScale(scale, 0.95);
      List<BigDecimal> printed = PrintedNumber.allIn(Numbers.interval(scale));
      boolean above = printed.get(0).compareTo(BigDecimal.ONE) > 0;
      boolean below = printed.get(1).compareTo(BigDecimal.ONE) < 0;
      assertThat(words.startsWith("returns to scale are increasing")).as(words).isEqualTo(above);
      assertThat(words.startsWith("returns to scale are decreasing")).as(words).isEqualTo(below);
      assertThat(words.contains("cannot be told apart")).as(words).isEqualTo(!above && !below);
      assertThat(words).contains("95\u00a0% interval " + Numbers.interval(scale));
    }
  }

  @Test
  void substitutionAndGapsAreOnlyCalledWhatTheWholeIntervalIs() {
    Random random = new Random(5);
    for (int i = 0; i < DRAWS; i++) {
      Figure sigma = drawn(random);
      String words = Phrases.substitution("labour", "machines", sigma, 0.95);
      Relation relation = Phrases.relation(sigma, 1);
      assertThat(words.contains("more readily")).isEqualTo(relation == Relation.ABOVE);
      assertThat(words.contains("less readily")).isEqualTo(relation == Relation.BELOW);
      assertThat(words).contains(Numbers.interval(sigma));
      Figure gap = shifted(sigma, -1);
      String said = Phrases.gap(gap, "EUR", 0.95);
      assertThat(said.contains("lies above")).isEqualTo(relation == Relation.ABOVE);
      assertThat(said.contains("lies below")).isEqualTo(relation == Relation.BELOW);
      assertThat(said).contains(Numbers.interval(gap), "EUR").doesNotContain("waste");
    }
  }

  private static Figure shifted(Figure figure, double by) {
    Figure.Uncertainty u = figure.uncertainty().orElseThrow();
    return Figure.estimated(
        figure.value() + by, u.standardError(), u.low() + by, u.high() + by, u.method());
  }

  @Test
  void withoutAnIntervalNothingIsToldApart() {
    Figure unsure = Figure.estimated(1.4, Double.NaN, Double.NaN, Double.NaN, "delta");
    assertThat(Phrases.relation(unsure, 1)).isEqualTo(Relation.UNKNOWN);
    assertThat(Phrases.returnsToScale(unsure, 0.95))
        .contains("cannot be told apart", "no interval")
        .doesNotContain("are increasing");
    assertThat(Phrases.substitution("a", "b", unsure, 0.95)).contains("cannot be said");
    assertThat(Phrases.gap(unsure, "EUR", 0.95)).contains("could not be had");
    assertThat(Phrases.returnsToScale(Figure.exact(Double.NaN), 0.95)).contains("could not be had");
  }

  @Test
  void anExactFigureIsComparedAsItIs() {
    assertThat(Phrases.returnsToScale(Figure.exact(1), 0.95))
        .isEqualTo("returns to scale are constant");
    assertThat(Phrases.returnsToScale(Figure.exact(1.03), 0.95)).contains("increasing", "1.03");
    assertThat(Phrases.gap(Figure.exact(0), "EUR", 0.95)).isEqualTo("filed cost equals least cost");
  }

  @ParameterizedTest
  @CsvSource({"0, no rows", "1, 1 row", "2, 2 rows", "1200, '1,200 rows'"})
  void countsAgreeWithTheirNoun(long count, String words) {
    assertThat(Phrases.count(count, "row")).isEqualTo(words);
  }

  @Test
  void listsReadAsSentences() {
    assertThat(Phrases.list(List.of())).isEmpty();
    assertThat(Phrases.list(List.of("a"))).isEqualTo("a");
    assertThat(Phrases.list(List.of("a", "b"))).isEqualTo("a and b");
    assertThat(Phrases.list(List.of("a", "b", "c"))).isEqualTo("a, b and c");
  }

  @Test
  void regularityIsSaidForEveryCount() {
    for (int rows = 0; rows <= 4; rows++) {
      for (int both = 0; both <= rows; both++) {
        String words = Phrases.regularity(new Regular(rows, rows, both, both, Map.of()));
        if (rows == 0) {
          assertThat(words).isEqualTo("No row was examined.");
        } else if (both == rows) {
          assertThat(words).startsWith("Regular at every row");
        } else {
          assertThat(words)
              .startsWith("Irregular at " + (rows - both) + " of " + Phrases.count(rows, "row"))
              .contains(rows - both == 1 ? "like that one are void" : "like those are void");
          assertThat(words.contains("everywhere")).isEqualTo(both == 0);
        }
      }
    }
  }
}
