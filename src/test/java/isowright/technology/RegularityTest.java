package isowright.technology;

import static org.assertj.core.api.Assertions.assertThat;

import com.sun.management.ThreadMXBean;
import java.lang.management.ManagementFactory;
import java.util.Arrays;
import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.Test;

class RegularityTest {

  private static final List<String> TWO = List.of("labour", "machines");
  private static final double[] ONES = {1, 1};

  @Test
  void cobbDouglasWithPositiveCoefficientsIsRegularEverywhere() {
    Random random = new Random(1);
    for (int k = 0; k < 2000; k++) {
      Technology technology = RandomTechnologies.cobbDouglas(random, 1 + random.nextInt(4));
      double[] z = RandomTechnologies.logInputs(random, technology, 3);
      assertThat(Regularity.at(technology, z).regular()).isTrue();
      assertThat(Regularity.at(technology, z).strictlyQuasiConcave()).isTrue();
    }
  }

  @Test
  void constantElasticityIsRegularAboveMinusOneStraightAtItAndIrregularBelow() {
    Random random = new Random(2);
    for (int k = 0; k < 2000; k++) {
      int n = 2 + random.nextInt(3);
      Ces straight = RandomTechnologies.ces(random, n, -1);
      double[] z = RandomTechnologies.logInputs(random, straight, 1);
      double[] parameters = straight.parameters();
      parameters[n + 1] = -1 + Math.pow(10, -8 + 10 * random.nextDouble());
      Regularity bent = Regularity.at(straight.withParameters(parameters), z);
      assertThat(bent.regular()).isTrue();
      assertThat(bent.strictlyQuasiConcave()).isTrue();
      assertThat(Regularity.at(straight, z).regular()).isTrue();
      assertThat(Regularity.at(straight, z).strictlyQuasiConcave()).isFalse();
      parameters[n + 1] = -1 - Math.pow(10, -8 + 8 * random.nextDouble());
      Regularity bulging = Regularity.at(straight.withParameters(parameters), z);
      assertThat(bulging.monotone()).isTrue();
      assertThat(bulging.quasiConcave()).isFalse();
    }
  }

  @Test
  void theBorderedMinorsSayTheSame() {
    Random random = new Random(3);
    int[] seen = new int[2];
    for (int k = 0; k < 4000; k++) {
      int n = 2 + random.nextInt(3);
      double[] base = new double[n];
      Arrays.fill(base, 1);
      // Wild enough that about half of the mixes are irregular.
      double[] coefficients = new double[n + n * (n + 1) / 2];
      Arrays.setAll(coefficients, c -> c < n ? 0.4 : 0.2 * random.nextGaussian());
      Technology technology = new Translog(RandomTechnologies.inputs(n), base, 0, coefficients);
      double[] z = RandomTechnologies.logInputs(random, technology, 0.5);
      double[] x = Arrays.stream(z).map(Math::exp).toArray();
      TextbookBorderedHessian textbook = new TextbookBorderedHessian(technology, x);
      boolean signs = true;
      double nearest = Double.POSITIVE_INFINITY;
      for (int m = 2; m <= n; m++) {
        signs &= textbook.signedMinor(m) > 0;
        nearest = Math.min(nearest, Math.abs(textbook.signedMinor(m)));
      }
      // Where a minor is zero to rounding, the sign says nothing.
      if (nearest > 1e-9) {
        assertThat(Regularity.at(technology, z).strictlyQuasiConcave()).isEqualTo(signs);
        seen[signs ? 1 : 0]++;
      }
    }
    assertThat(seen[0]).isGreaterThan(500);
    assertThat(seen[1]).isGreaterThan(500);
  }

  @Test
  void neitherConditionImpliesTheOther() {
    // Elasticities of a half each, isoquants bulging outwards.
    Technology bulging = new Translog(TWO, ONES, 0, new double[] {0.5, 0.5, 0.6, -0.6, 0.6});
    Regularity first = Regularity.at(bulging, new double[] {0, 0});
    assertThat(first.monotone()).isTrue();
    assertThat(first.quasiConcave()).isFalse();
    assertThat(first.regular()).isFalse();
    // An input that takes away from output, isoquants bending the right way.
    Technology crowded = new Translog(TWO, ONES, 0, new double[] {-0.1, 0.9, -0.9, 0.3, 0.1});
    Regularity second = Regularity.at(crowded, new double[] {0, 0});
    assertThat(second.monotone(0)).isFalse();
    assertThat(second.monotone(1)).isTrue();
    assertThat(second.monotone()).isFalse();
    assertThat(second.quasiConcave()).isTrue();
    assertThat(second.regular()).isFalse();
  }

  @Test
  void leontiefsIdleInputIsNotMonotone() {
    Technology leontief =
        Ces.of(TWO, ONES, 0, new double[] {0.5, 0.5}, Double.POSITIVE_INFINITY, 1);
    Regularity found = Regularity.at(leontief, new double[] {1, 2});
    assertThat(found.monotone(0)).isTrue();
    assertThat(found.monotone(1)).isFalse();
    assertThat(found.quasiConcave()).isTrue();
    assertThat(found.strictlyQuasiConcave()).isFalse();
  }

  @Test
  void whatCannotBeComputedIsNotRegular() {
    Technology technology = CobbDouglas.of(TWO, 0, Double.NaN, 0.5);
    assertThat(Regularity.at(technology, new double[] {0, 0}).regular()).isFalse();
    assertThat(Regularity.at(technology, new double[] {0, 0}).quasiConcave()).isFalse();
    Technology idle = CobbDouglas.of(TWO, 0, 0, 0);
    assertThat(Regularity.at(idle, new double[] {0, 0}).quasiConcave()).isFalse();
    assertThat(Regularity.at(idle, new double[] {0, 0}).monotone()).isFalse();
  }

  @Test
  void countIsTheSumOfRowsAndACheckerCanBeUsedAgain() {
    Random random = new Random(4);
    int rows = 400;
    for (int k = 0; k < 20; k++) {
      int n = 2 + random.nextInt(3);
      Translog technology = RandomTechnologies.translog(random, n);
      double[][] columns = new double[n][rows];
      int[] expected = new int[3];
      int[] nonMonotoneBy = new int[n];
      Regularity.Checker checker = new Regularity.Checker(technology);
      for (int r = 0; r < rows; r++) {
        double[] z = RandomTechnologies.logInputs(random, technology, 3);
        Regularity single = Regularity.at(technology, z);
        checker.check(z);
        assertThat(checker.monotone()).isEqualTo(single.monotone());
        assertThat(checker.quasiConcave()).isEqualTo(single.quasiConcave());
        assertThat(checker.strictlyQuasiConcave()).isEqualTo(single.strictlyQuasiConcave());
        assertThat(checker.regular()).isEqualTo(single.regular());
        expected[0] += single.monotone() ? 1 : 0;
        expected[1] += single.quasiConcave() ? 1 : 0;
        expected[2] += single.regular() ? 1 : 0;
        for (int i = 0; i < n; i++) {
          columns[i][r] = z[i];
          nonMonotoneBy[i] += single.monotone(i) ? 0 : 1;
        }
      }
      Regularity.Count count = Regularity.count(technology, columns, rows);
      assertThat(count.rows()).isEqualTo(rows);
      assertThat(count.monotone()).isEqualTo(expected[0]);
      assertThat(count.quasiConcave()).isEqualTo(expected[1]);
      assertThat(count.both()).isEqualTo(expected[2]);
      assertThat(count.nonMonotoneBy()).containsExactly(nonMonotoneBy);
    }
  }

  @Test
  void aCheckAllocatesNothing() {
    ThreadMXBean thread = (ThreadMXBean) ManagementFactory.getThreadMXBean();
    Random random = new Random(5);
    int checks = 10_000;
    for (Technology technology :
        List.of(
            RandomTechnologies.cobbDouglas(random, 3),
            RandomTechnologies.ces(random, 3, 0.7),
            RandomTechnologies.translog(random, 3))) {
      double[] z = RandomTechnologies.logInputs(random, technology, 1);
      Regularity.Checker checker = new Regularity.Checker(technology);
      checker.check(z);
      long before = thread.getCurrentThreadAllocatedBytes();
      for (int k = 0; k < checks; k++) {
        checker.check(z);
      }
      long after = thread.getCurrentThreadAllocatedBytes();
      // The smallest object takes 16 bytes; the rest is the virtual machine's own.
      assertThat(after - before).isLessThan(16L * checks / 10);
    }
  }
}
