package isowright.leastcost;

import isowright.technology.Ces;
import isowright.technology.CobbDouglas;
import isowright.technology.GeneralisedLeontief;
import isowright.technology.NestedCes;
import isowright.technology.Regularity;
import isowright.technology.Technology;
import isowright.technology.Translog;
import java.util.Arrays;
import java.util.List;
import java.util.SplittableRandom;

/**
 * Seeded technologies and questions. Every question is planted: a mix is drawn, and prices are made
 * proportional to its marginal products, so the least-cost mix is known beforehand.
 */
final class RandomTechnologies {

  private static final List<String> NAMES = List.of("labour", "machines", "energy", "material");

  private final SplittableRandom random;

  RandomTechnologies(long seed) {
    random = new SplittableRandom(seed);
  }

  /** A technology, a mix at which it is regular, and the question that the mix answers. */
  record Planted(Technology technology, double[] mix, Question question) {
    Plan plan() {
      return Minimiser.of(technology).plan(question);
    }
  }

  double between(double low, double high) {
    return low + (high - low) * random.nextDouble();
  }

  int below(int bound) {
    return random.nextInt(bound);
  }

  /** One of the five forms in turn. */
  Planted any(int k) {
    return switch (k % 5) {
      case 0 -> cobbDouglas();
      case 1 -> ces(curvature());
      case 2 -> translog();
      case 3 -> nestedCes();
      default -> generalisedLeontief();
    };
  }

  /** Curvatures over the whole region, the neighbourhoods of its limits among them. */
  double curvature() {
    return switch (random.nextInt(5)) {
      case 0 -> between(-1e-9, 1e-9);
      case 1 -> between(-0.97, -0.8);
      case 2 -> between(5, 50);
      default -> 1 / Math.exp(between(Math.log(0.1), Math.log(8))) - 1;
    };
  }

  Planted cobbDouglas() {
    int n = 2 + random.nextInt(3);
    double[] coefficients = new double[n];
    for (int i = 0; i < n; i++) {
      coefficients[i] = between(0.05, 0.7);
    }
    return plant(
        new CobbDouglas(names(n), base(n), between(-2, 8), coefficients), 1.5, between(0.1, 10));
  }

  Planted ces(double rho) {
    int n = 2 + random.nextInt(3);
    double[] shares = shares(n);
    Ces ces = Ces.of(names(n), base(n), between(-2, 8), shares, rho, between(0.6, 1.5));
    // Mixes spread no wider than a few cost shares allow at this substitution.
    return plant(ces, Math.min(1.5, 1.5 / Math.abs(rho)), between(0.1, 10));
  }

  /** Two inputs in a nest, two apart or one; curvatures up to σ = 0.15. */
  Planted nestedCes() {
    int n = 3 + random.nextInt(2);
    List<String> names = names(n);
    double[][] within = new double[n - 1][];
    double[] curvatures = new double[n - 1];
    for (int g = 0; g < n - 1; g++) {
      within[g] = g == 0 ? shares(2) : new double[] {1};
      curvatures[g] = 1 / Math.exp(between(Math.log(0.15), Math.log(6))) - 1;
    }
    double rho = 1 / Math.exp(between(Math.log(0.15), Math.log(6))) - 1;
    NestedCes nested =
        NestedCes.of(
            names,
            base(n),
            groups(n),
            between(-2, 8),
            within,
            shares(n - 1),
            rho,
            curvatures,
            between(0.6, 1.5));
    return plant(nested, 0.25, between(0.1, 10));
  }

  /** The first and the last input together, the others alone. */
  private static List<List<String>> groups(int n) {
    List<String> names = names(n);
    return n == 3
        ? List.of(List.of(names.get(0), names.get(2)), List.of(names.get(1)))
        : List.of(
            List.of(names.get(0), names.get(3)), List.of(names.get(1)), List.of(names.get(2)));
  }

  /** The same parameters with inputs divided by another base: inputs in other units. */
  static Technology withBase(Technology technology, double[] base) {
    List<String> names = technology.inputs();
    int n = names.size();
    double[] all = technology.parameters();
    double[] own = Arrays.copyOfRange(all, 1, all.length);
    return switch (technology.form()) {
      case "cobb-douglas" -> new CobbDouglas(names, base, all[0], own);
      case "ces" -> Ces.of(names, base, all[0], Arrays.copyOf(own, n), own[n], own[n + 1]);
      case "nested-ces" -> {
        double[][] within = new double[n - 1][];
        Arrays.fill(within, new double[] {1});
        within[0] = Arrays.copyOf(own, 2);
        double[] curvatures = new double[n - 1];
        curvatures[0] = own[n + 2];
        double[] between = Arrays.copyOfRange(own, 2, n + 1);
        yield NestedCes.of(
            names, base, groups(n), all[0], within, between, own[n + 1], curvatures, own[n + 3]);
      }
      case "generalised-leontief" -> {
        double[] weights = Arrays.copyOf(own, own.length - 1);
        yield GeneralisedLeontief.of(names, base, all[0], weights, own[own.length - 1]);
      }
      default -> new Translog(names, base, all[0], own);
    };
  }

  /** Weights that are not negative, so regular everywhere. */
  Planted generalisedLeontief() {
    int n = 2 + random.nextInt(3);
    double[] weights = new double[n * (n + 1) / 2];
    double[] shares = shares(n);
    for (int i = 0; i < n; i++) {
      double own = shares[i];
      for (int j = 0; j < n; j++) {
        double cross = j == i ? 0 : 0.8 * shares[i] * shares[j];
        own -= cross;
        if (j > i) {
          weights[GeneralisedLeontief.place(n, i, j)] = cross;
        }
      }
      weights[GeneralisedLeontief.place(n, i, i)] = own;
    }
    GeneralisedLeontief technology =
        GeneralisedLeontief.of(names(n), base(n), between(-2, 8), weights, between(0.6, 1.5));
    return plant(technology, 0.6, between(0.1, 10));
  }

  private double[] shares(int n) {
    double[] shares = new double[n];
    double sum = 0;
    for (int i = 0; i < n; i++) {
      shares[i] = between(0.1, 1);
      sum += shares[i];
    }
    for (int i = 0; i < n; i++) {
      shares[i] /= sum;
    }
    return shares;
  }

  /** A translog that is regular at the planted mix, drawn until it is. */
  Planted translog() {
    while (true) {
      int n = 2 + random.nextInt(3);
      double[] coefficients = new double[n + n * (n + 1) / 2];
      for (int i = 0; i < coefficients.length; i++) {
        coefficients[i] = i < n ? between(0.15, 0.6) : between(-0.12, 0.12);
      }
      Translog translog = new Translog(names(n), base(n), between(-2, 8), coefficients);
      Planted planted = plant(translog, 0.6, between(0.1, 10));
      if (regularAround(planted)) {
        return planted;
      }
    }
  }

  /** Regular along the line from the base to the mix and somewhat beyond. */
  private static boolean regularAround(Planted planted) {
    Technology technology = planted.technology();
    double[] base = technology.base();
    double[] z = new double[base.length];
    for (int step = 0; step <= 12; step++) {
      for (int i = 0; i < z.length; i++) {
        double from = Math.log(base[i]);
        z[i] = from + step / 10.0 * (Math.log(planted.mix()[i]) - from);
      }
      Regularity regularity = Regularity.at(technology, z);
      double[] e = new double[z.length];
      technology.logGradient(z, e);
      for (double each : e) {
        if (each < 0.05) {
          return false;
        }
      }
      if (!regularity.regular() || !regularity.strictlyQuasiConcave()) {
        return false;
      }
    }
    return true;
  }

  private Planted plant(Technology technology, double spread, double level) {
    int n = technology.dimension();
    double[] base = technology.base();
    double[] mix = new double[n];
    for (int i = 0; i < n; i++) {
      mix[i] = base[i] * Math.exp(between(-spread, spread));
    }
    double[] prices = technology.gradient(mix);
    double output = technology.output(mix);
    for (int i = 0; i < n; i++) {
      prices[i] *= level * 100 / output;
    }
    return new Planted(technology, mix, Question.of(output, safe(prices)));
  }

  /** A translog drawn without regularity can have negative marginal products; it is thrown away. */
  private static double[] safe(double[] prices) {
    for (int i = 0; i < prices.length; i++) {
      prices[i] = prices[i] > 0 ? prices[i] : 1;
    }
    return prices;
  }

  private double[] base(int n) {
    double[] base = new double[n];
    for (int i = 0; i < n; i++) {
      base[i] = Math.exp(between(-1, 9));
    }
    return base;
  }

  private static List<String> names(int n) {
    return NAMES.subList(0, n);
  }
}
