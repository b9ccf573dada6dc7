package isowright.inference;

import isowright.estimation.PanelFixtures;
import isowright.records.Panel;
import java.util.List;
import java.util.SplittableRandom;
import java.util.random.RandomGenerator;

/** Panels drawn from known technologies of two inputs, for simulations. */
final class SimulatedPanels {

  static final List<String> INPUTS = List.of("labour", "machines");

  private SimulatedPanels() {}

  /** ln Q from the logs of two inputs. */
  @FunctionalInterface
  interface LogOutput {
    double of(double logLabour, double logMachines);
  }

  /**
   * ln Q = plant + .6 ln L + .45 ln K + u, u normal with standard deviation .2, autoregressive
   * within plants; plants differ, and the more productive ones are larger.
   */
  static Panel cobbDouglas(int seed, int plants, int periods, double autoregression) {
    return drawn(seed, plants, periods, autoregression, (l, k) -> .6 * l + .45 * k);
  }

  /** The same with another technology. */
  static Panel drawn(
      int seed, int plants, int periods, double autoregression, LogOutput technology) {
    SplittableRandom source = new SplittableRandom(31_000 + seed);
    RandomGenerator random = source;
    int rows = plants * periods;
    int[] plant = new int[rows];
    int[] period = new int[rows];
    double[] output = new double[rows];
    double[][] x = new double[2][rows];
    int r = 0;
    double innovation = Math.sqrt(1 - autoregression * autoregression);
    for (int p = 0; p < plants; p++) {
      double level = periods > 1 ? .2 * random.nextGaussian() : 0;
      double size = level + .5 * random.nextGaussian();
      double error = random.nextGaussian();
      for (int t = 0; t < periods; t++, r++) {
        plant[r] = p;
        period[r] = 2015 + t;
        double labour = 3 + size + .6 * random.nextGaussian();
        double machines = 2 + size + .6 * random.nextGaussian();
        x[0][r] = Math.exp(labour);
        x[1][r] = Math.exp(machines);
        output[r] = Math.exp(level + technology.of(labour, machines) + .2 * error);
        error = autoregression * error + innovation * random.nextGaussian();
      }
    }
    return PanelFixtures.panel(
        plant, period, output, INPUTS, List.of(x[0], x[1]), List.of(), List.of());
  }
}
