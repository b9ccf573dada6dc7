package isowright.technology;

import java.util.ArrayList;
import java.util.Arrays;
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

  /** A curvature with σ between 0.05 and 10. */
  static double curvature(Random random) {
    return Math.pow(10, -1 + 2.3 * random.nextDouble()) - 1;
  }

  /** Groups of n inputs: one of two and the rest alone, or, for four, sometimes two pairs. */
  static List<List<String>> groups(Random random, int n) {
    List<String> inputs = inputs(n);
    if (n == 4 && random.nextBoolean()) {
      // Not neighbours, so that the order of inputs and that of groups differ.
      return List.of(List.of(inputs.get(0), inputs.get(3)), List.of(inputs.get(2), inputs.get(1)));
    }
    List<List<String>> groups = new ArrayList<>();
    groups.add(List.of(inputs.get(n - 1), inputs.get(0)));
    for (int i = 1; i < n - 1; i++) {
      groups.add(List.of(inputs.get(i)));
    }
    return groups;
  }

  /** Three or four inputs in groups; curvatures drawn by {@link #curvature}. */
  static NestedCes nestedCes(Random random, int n) {
    List<List<String>> groups = groups(random, n);
    double[][] within = new double[groups.size()][];
    double[] curvatures = new double[groups.size()];
    for (int g = 0; g < within.length; g++) {
      within[g] = shares(random, groups.get(g).size());
      curvatures[g] = curvature(random);
    }
    return NestedCes.of(
        inputs(n),
        base(random, n),
        groups,
        random.nextGaussian(),
        within,
        shares(random, groups.size()),
        curvature(random),
        curvatures,
        0.5 + random.nextDouble());
  }

  /** Cross terms b_ij = κ s_i s_j, κ about that of σ = 2, some negative. */
  static GeneralisedLeontief generalisedLeontief(Random random, int n) {
    double[] shares = shares(random, n);
    double[] weights = new double[n * (n + 1) / 2];
    for (int i = 0; i < n; i++) {
      weights[GeneralisedLeontief.place(n, i, i)] += shares[i];
      for (int j = i + 1; j < n; j++) {
        double cross = (-0.1 + 1.4 * random.nextDouble()) * shares[i] * shares[j];
        weights[GeneralisedLeontief.place(n, i, j)] = cross;
        weights[GeneralisedLeontief.place(n, i, i)] -= cross;
        weights[GeneralisedLeontief.place(n, j, j)] -= cross;
      }
    }
    return GeneralisedLeontief.of(
        inputs(n), base(random, n), random.nextGaussian(), weights, 0.5 + random.nextDouble());
  }

  /** A form drawn at random, with two to four inputs; CES with σ between 0.05 and 10. */
  static Technology any(Random random) {
    int n = 2 + random.nextInt(3);
    return switch (random.nextInt(5)) {
      case 0 -> cobbDouglas(random, n);
      case 1 -> ces(random, n, curvature(random));
      case 2 -> nestedCes(random, Math.max(n, 3));
      case 3 -> generalisedLeontief(random, n);
      default -> translog(random, n);
    };
  }

  /** The same parameters with inputs divided by another base: inputs in other units. */
  static Technology withBase(Technology technology, double[] base) {
    double[] all = technology.parameters();
    double[] rest = Arrays.copyOfRange(all, 1, all.length);
    if (technology instanceof Ces ces) {
      return Ces.of(ces.inputs(), base, all[0], ces.shares(), ces.rho(), ces.scale());
    }
    if (technology instanceof NestedCes nested) {
      return withBase(nested, base);
    }
    if (technology instanceof GeneralisedLeontief leontief) {
      double[] weights = Arrays.copyOfRange(all, 1, all.length - 1);
      return GeneralisedLeontief.of(leontief.inputs(), base, all[0], weights, all[all.length - 1]);
    }
    return technology instanceof CobbDouglas
        ? new CobbDouglas(technology.inputs(), base, all[0], rest)
        : new Translog(technology.inputs(), base, all[0], rest);
  }

  private static NestedCes withBase(NestedCes technology, double[] base) {
    List<List<String>> groups = new ArrayList<>();
    for (String name : technology.parameterNames()) {
      if (name.startsWith("share:")) {
        groups.add(List.of(name.substring("share:".length()).split("\\+")));
      }
    }
    int count = groups.size();
    double[] all = technology.parameters();
    int at = 1;
    double[][] within = new double[count][];
    for (int g = 0; g < count; g++) {
      int size = groups.get(g).size();
      within[g] = size == 1 ? new double[] {1} : Arrays.copyOfRange(all, at, at + size);
      at += size == 1 ? 0 : size;
    }
    double[] between = Arrays.copyOfRange(all, at, at + count);
    at += count;
    double rho = all[at++];
    double[] curvatures = new double[count];
    for (int g = 0; g < count; g++) {
      curvatures[g] = groups.get(g).size() == 1 ? 0 : all[at++];
    }
    return NestedCes.of(
        technology.inputs(), base, groups, all[0], within, between, rho, curvatures, all[at]);
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
