package isowright.technology;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.io.BufferedReader;
import java.io.IOException;
import java.io.InputStream;
import java.io.InputStreamReader;
import java.nio.charset.StandardCharsets;
import java.util.Arrays;
import java.util.List;
import java.util.Objects;
import org.junit.jupiter.api.Test;

/** Technologies with printed parameters, on open data, against what was published of them. */
class PublishedTechnologiesTest {

  /** Half a unit of the sixth decimal, to which coefficients are printed. */
  private static final double SIXTH_DECIMAL = 5e-7;

  /**
   * Translog of US primary metals (SIC 33), 27 states, 1957, unscaled logs: Hildebrand and Liu
   * 1965; Aigner, Lovell and Schmidt 1977; Greene, <i>Econometric Analysis</i>, 5th edition,
   * Example 6.2 and Table F6.1. Coefficients to six decimals and the values below computed with R
   * 4.2 (lm) from the same data; they agree with the printed table.
   */
  private static final Technology PRIMARY_METALS =
      new Translog(
          List.of("labor", "capital"),
          new double[] {1, 1},
          0.944197,
          new double[] {3.613639, -1.893113, -0.964052, 0.312387, 0.085295});

  @Test
  void primaryMetalsElasticities() throws IOException {
    double[][] records = records("primary-metals-27-states.csv", "labor", "capital");
    double[] mean = new double[2];
    double longest = 0;
    double lowest = Double.POSITIVE_INFINITY;
    double highest = 0;
    int rows = records[0].length;
    assertThat(rows).isEqualTo(27);
    for (int r = 0; r < rows; r++) {
      double[] mix = {records[0][r], records[1][r]};
      Elasticities found = Elasticities.atMix(PRIMARY_METALS, mix);
      mean[0] += found.output(0) / rows;
      mean[1] += found.output(1) / rows;
      lowest = Math.min(lowest, found.scale());
      highest = Math.max(highest, found.scale());
      longest = Math.max(longest, 1 + Math.log(mix[0]) + Math.log(mix[1]));
    }
    // Each coefficient may be off by half a unit of its last decimal; so may the mean.
    double room = SIXTH_DECIMAL * longest + SIXTH_DECIMAL;
    assertThat(mean[0]).isCloseTo(0.383187, within(room));
    assertThat(mean[1]).isCloseTo(0.542475, within(room));
    // Printed to three decimals; the scale elasticity adds two of them.
    assertThat(lowest).isCloseTo(0.645, within(5e-4 + 2 * room));
    assertThat(highest).isCloseTo(1.435, within(5e-4 + 2 * room));
  }

  @Test
  void primaryMetalsCurvatureHoldsWhereMonotonicityFails() throws IOException {
    double[][] logs = records("primary-metals-27-states.csv", "labor", "capital");
    for (double[] column : logs) {
      Arrays.setAll(column, r -> Math.log(column[r]));
    }
    Regularity.Count count = Regularity.count(PRIMARY_METALS, logs, 27);
    assertThat(count.nonMonotoneBy()[0]).isEqualTo(6);
    assertThat(count.quasiConcave()).isEqualTo(27);
  }

  @Test
  void primaryMetalsResidualSumOfSquares() throws IOException {
    double[][] records = records("primary-metals-27-states.csv", "labor", "capital", "output");
    // At the least-squares optimum errors of the coefficients enter squared: 27 rows times
    // (5e−7 · (1 + Σ |regressors|, about 150))² ≈ 1.5e−7, and 5e−8 from printing.
    assertThat(sumOfSquares(PRIMARY_METALS, records)).isCloseTo(0.6799272, within(2e-7));
  }

  /**
   * Judge, Hill, Griffiths, Lütkepohl and Lee 1988, <i>Introduction to the Theory and Practice of
   * Econometrics</i>, pp. 514–515: ln Q = b1 + b4 ln(b2 L^b3 + (1 − b2) K^b3), b = .1244909,
   * .3366731, −3.0109, −.33630 and a sum of squares of 1.761076 (R 4.2, nls). Here ρ = −b3, ν = b4
   * b3.
   */
  @Test
  void constantElasticityOfThirtyPoints() throws IOException {
    Ces ces =
        Ces.of(
            List.of("labour", "capital"),
            new double[] {1, 1},
            0.1244909,
            new double[] {0.3366731, 1 - 0.3366731},
            3.0109,
            -0.33630 * -3.0109);
    assertThat(ces.substitution()).isCloseTo(0.2493, within(5e-5));
    double[][] records = records("ces-30-points.csv", "labour", "capital", "output");
    assertThat(records[0]).hasSize(30);
    // Errors of the printed parameters enter squared, far below the last digit of the sum.
    assertThat(sumOfSquares(ces, records)).isCloseTo(1.761076, within(1e-6));
  }

  /**
   * (L^.5 + K^.5)² at prices 2 and 1 and an output of 9: the cheapest mix is L 1, K 4, marginal
   * cost two thirds (textbook-style question, answer re-solved). There the rate of substitution is
   * the price ratio and every f_i is price over marginal cost.
   */
  @Test
  void constantElasticityAtTheCheapestMix() {
    Ces ces =
        Ces.of(
            List.of("labour", "capital"),
            new double[] {1, 1},
            Math.log(4),
            new double[] {0.5, 0.5},
            -0.5,
            1);
    double[] mix = {1, 4};
    assertThat(ces.substitution()).isEqualTo(2);
    assertThat(ces.output(mix)).isCloseTo(9, within(1e-13));
    assertThat(ces.gradient(mix)[0]).isCloseTo(3, within(1e-13));
    assertThat(ces.gradient(mix)[1]).isCloseTo(1.5, within(1e-13));
    assertThat(Elasticities.atMix(ces, mix).marginalRate(0, 1)).isCloseTo(2, within(1e-14));
    // Cost shares 2 of 6 and 4 of 6.
    assertThat(Elasticities.atMix(ces, mix).share(0)).isCloseTo(1 / 3.0, within(1e-14));
  }

  private static double sumOfSquares(Technology technology, double[][] records) {
    double sum = 0;
    for (int r = 0; r < records[0].length; r++) {
      double[] logs = {Math.log(records[0][r]), Math.log(records[1][r])};
      double residual = Math.log(records[2][r]) - technology.logOutput(logs);
      sum += residual * residual;
    }
    return sum;
  }

  /** The columns of these names; first line holds the names. */
  private static double[][] records(String file, String... names) throws IOException {
    InputStream in =
        Objects.requireNonNull(
            PublishedTechnologiesTest.class.getResourceAsStream("/published/" + file), file);
    try (BufferedReader reader =
        new BufferedReader(new InputStreamReader(in, StandardCharsets.UTF_8))) {
      List<String[]> lines = reader.lines().map(line -> line.split(",", -1)).toList();
      List<String> header = Arrays.asList(lines.get(0));
      double[][] columns = new double[names.length][];
      for (int c = 0; c < names.length; c++) {
        int place = header.indexOf(names[c]);
        columns[c] =
            lines.stream().skip(1).mapToDouble(line -> Double.parseDouble(line[place])).toArray();
      }
      return columns;
    }
  }
}
