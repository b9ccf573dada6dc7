package isowright.review;

import isowright.estimation.EstimatedTechnology;
import isowright.technology.Ces;
import isowright.technology.CobbDouglas;
import isowright.technology.Technology;
import isowright.technology.Translog;
import java.util.List;
import java.util.SplittableRandom;

/** Invented technologies of one industry with invented covariances, for tests of a review. */
final class Glass {

  static final List<String> INPUTS = List.of("labour", "machines", "energy");
  static final double[] BASE = {75_000, 36_000, 210_000};
  static final double[] PRICES = {31, 60, 9.5};
  static final double LOG_OUTPUT = Math.log(30_000);

  private Glass() {}

  static CobbDouglas cobbDouglas() {
    return new CobbDouglas(INPUTS, BASE, LOG_OUTPUT, new double[] {.38, .35, .32});
  }

  static Ces ces() {
    return Ces.of(INPUTS, BASE, LOG_OUTPUT, new double[] {.36, .34, .3}, .6, 1.05);
  }

  /**
   * Returns to scale fall from 1.15 at the base with output: rows of the second order sum to −0.1.
   */
  static Translog translog() {
    double[] coefficients = {.42, .38, .35, -.1733, .07, .0033, -.1733, .07, -.1733};
    return new Translog(INPUTS, BASE, LOG_OUTPUT, coefficients);
  }

  static List<Technology> all() {
    return List.of(cobbDouglas(), ces(), translog());
  }

  /** With a covariance of full rank in the directions that the form leaves free. */
  static EstimatedTechnology estimated(Technology technology, double size, long seed) {
    return new EstimatedTechnology(technology, covariance(technology, size, seed), 40);
  }

  /** V = B B′ with rows of B for shares summing to zero, so that every draw keeps their sum. */
  private static double[][] covariance(Technology technology, double size, long seed) {
    SplittableRandom random = new SplittableRandom(seed);
    List<String> names = technology.parameterNames();
    int p = names.size();
    double[][] root = new double[p][p];
    for (int l = 0; l < p; l++) {
      double sum = 0;
      int shares = 0;
      for (int k = 0; k < p; k++) {
        root[k][l] = size * (random.nextDouble() - .5);
        if (names.get(k).startsWith("share:")) {
          sum += root[k][l];
          shares++;
        }
      }
      for (int k = 0; k < p; k++) {
        if (names.get(k).startsWith("share:")) {
          root[k][l] -= sum / shares;
        }
      }
    }
    double[][] v = new double[p][p];
    for (int k = 0; k < p; k++) {
      for (int l = 0; l < p; l++) {
        for (int m = 0; m < p; m++) {
          v[k][l] += root[k][m] * root[l][m];
        }
      }
    }
    return v;
  }
}
