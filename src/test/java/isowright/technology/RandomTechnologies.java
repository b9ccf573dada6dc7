package isowright.technology;

import java.util.List;
import java.util.Random;
import java.util.stream.IntStream;

/** Technologies and mixes drawn at random from a seed, with inputs of sizes from 1e−6 to 1e9. */
final class RandomTechnologies {

  private RandomTechnologies() {}

  static List<String> inputs(int n) {
    return IntStream.range(0, n).mapToObj(i -> "input" + (i + 1)).toList();
  }

  /** Even in logs between 1e−6 and 1e9. */
  static double[] base(Random random, int n) {
    return random.doubles(n, -6, 9).map(exponent -> Math.pow(10, exponent)).toArray();
  }

  static double[] shares(Random random, int n) {
    double[] raw = random.doubles(n, 0.05, 1).toArray();
    double sum = 0;
    for (double each : raw) {
      sum += each;
    }
    for (int i = 0; i < n; i++) {
      raw[i] /= sum;
    }
    return raw;
  }

  static CobbDouglas cobbDouglas(Random random, int n) {
    return new CobbDouglas(
        inputs(n), base(random, n), random.nextGaussian(), random.doubles(n, 0.05, 0.9).toArray());
  }

  static Ces ces(Random random, int n, double rho) {
    return Ces.of(
        inputs(n),
        base(random, n),
        random.nextGaussian(),
        shares(random, n),
        rho,
        0.5 + random.nextDouble());
  }

  /** Second-order coefficients small enough that mixes near the base are mostly regular. */
  static Translog translog(Random random, int n) {
    double[] coefficients = new double[n + n * (n + 1) / 2];
    for (int k = 0; k < coefficients.length; k++) {
      coefficients[k] = k < n ? 0.15 + 0.5 * random.nextDouble() : 0.06 * random.nextGaussian();
    }
    return new Translog(inputs(n), base(random, n), random.nextGaussian(), coefficients);
  }

  /** A form drawn at random, with two to four inputs; CES with σ between 0.05 and 10. */
  static Technology any(Random random) {
    int n = 2 + random.nextInt(3);
    return switch (random.nextInt(3)) {
      case 0 -> cobbDouglas(random, n);
      case 1 -> ces(random, n, Math.pow(10, -1 + 2.3 * random.nextDouble()) - 1);
      default -> translog(random, n);
    };
  }

  /** ln x around the technology's base, normal with this spread in logs. */
  static double[] logInputs(Random random, Technology technology, double spread) {
    double[] z = technology.base();
    for (int i = 0; i < z.length; i++) {
      z[i] = Math.log(z[i]) + spread * random.nextGaussian();
    }
    return z;
  }

  /** Columns of normal numbers. */
  static double[][] columns(Random random, int n, int rows, double spread) {
    double[][] columns = new double[n][rows];
    for (double[] column : columns) {
      for (int r = 0; r < rows; r++) {
        column[r] = spread * random.nextGaussian();
      }
    }
    return columns;
  }
}
