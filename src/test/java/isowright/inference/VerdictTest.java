package isowright.inference;

import static org.assertj.core.api.Assertions.assertThat;

import java.math.BigDecimal;
import java.util.Random;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import java.util.stream.DoubleStream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** A verdict in words agrees with its p-value as it is printed. */
class VerdictTest {

  private static final Pattern P = Pattern.compile("p ([<=]) (0\\.\\d+|0|1\\.0+)");

  @ParameterizedTest
  @ValueSource(doubles = {0.8, 0.9, 0.95, 0.975, 0.99, 0.999, 0.9995})
  void theSentenceAgreesWithThePrintedP(double confidence) {
    double level = Verdict.level(confidence);
    DoubleStream near =
        DoubleStream.of(0, 1e-9, 1e-6, 1e-3)
            .flatMap(off -> DoubleStream.of(level * (1 - off), level * (1 + off)));
    DoubleStream anywhere = new Random(11).doubles(2000).map(u -> u * u * u);
    DoubleStream.concat(near, anywhere)
        .forEach(
            p -> {
              String sentence = Hypotheses.sentence("returns are constant", p, level);
              assertThat(sentence.contains("do not speak")).as(sentence).isEqualTo(p >= level);
              Matcher printed = P.matcher(sentence);
              assertThat(printed.find()).as(sentence).isTrue();
              boolean under = new BigDecimal(printed.group(2)).doubleValue() < level;
              assertThat(printed.group(1).equals("<") || under).as(sentence).isEqualTo(p < level);
            });
  }

  @Test
  void theLevelOfAConfidenceIsFreeOfRounding() {
    assertThat(Verdict.level(0.95)).isEqualTo(0.05);
    assertThat(Verdict.level(0.9)).isEqualTo(0.1);
    assertThat(Verdict.level(0.999)).isEqualTo(0.001);
  }

  @Test
  void aTestThatCouldNotBeMadeHasNoVerdict() {
    assertThat(Hypotheses.sentence("returns are constant", Double.NaN, 0.05))
        .contains("could not be made")
        .doesNotContain("speak");
  }
}
