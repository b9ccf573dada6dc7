package isowright.records;

import java.util.Locale;
import java.util.Random;

/** Clean records by plant and period, each column a table that a test may spoil. */
final class CleanRecords {
  static final int PLANTS = 20;
  static final int PERIODS = 8;

  final double[][] tonnes = new double[PLANTS][PERIODS];
  final double[][] hours = new double[PLANTS][PERIODS];
  final double[][] wage = new double[PLANTS][PERIODS];
  final double[][] payroll = new double[PLANTS][PERIODS];
  final double[][] machines = new double[PLANTS][PERIODS];
  final double[][] rent = new double[PLANTS][PERIODS];
  final double[][] filed = new double[PLANTS][PERIODS];
  final boolean[][] left = new boolean[PLANTS][PERIODS];

  /** Sizes differ between plants, all grow by a rate, and quantities scatter. */
  CleanRecords(long seed, double growth, double scatter) {
    Random random = new Random(seed);
    for (int p = 0; p < PLANTS; p++) {
      double size = Math.exp(0.3 * random.nextGaussian());
      double pay = 30 * Math.exp(0.05 * random.nextGaussian());
      for (int t = 0; t < PERIODS; t++) {
        double level = size * Math.exp(growth * t);
        tonnes[p][t] = 1000 * level * Math.exp(scatter * random.nextGaussian());
        hours[p][t] = 4000 * level * Math.exp(scatter * random.nextGaussian());
        machines[p][t] = 2000 * level * Math.exp(scatter * random.nextGaussian());
        wage[p][t] = pay * Math.exp(0.02 * t + 0.1 * random.nextGaussian());
        rent[p][t] = 80 * Math.exp(0.1 * random.nextGaussian());
        payroll[p][t] = wage[p][t] * hours[p][t];
        filed[p][t] =
            (payroll[p][t] + rent[p][t] * machines[p][t]) * (1 + 0.03 * random.nextDouble());
      }
    }
  }

  String csv() {
    StringBuilder csv = new StringBuilder("plant,year,tonnes,hours,wage,payroll,mh,rent,filed\n");
    for (int p = 0; p < PLANTS; p++) {
      for (int t = 0; t < PERIODS; t++) {
        if (!left[p][t]) {
          csv.append(
              String.format(
                  Locale.ROOT,
                  "GW-%02d,%d,%.6g,%.6g,%.6g,%.6g,%.6g,%.6g,%.6g%n",
                  p,
                  2010 + t,
                  tonnes[p][t],
                  hours[p][t],
                  wage[p][t],
                  payroll[p][t],
                  machines[p][t],
                  rent[p][t],
                  filed[p][t]));
        }
      }
    }
    return csv.toString();
  }
}
