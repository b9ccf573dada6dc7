package isowright.estimation;

import isowright.records.Panel;
import java.util.ArrayList;
import java.util.List;
import java.util.SplittableRandom;
import java.util.random.RandomGenerator;

/** Panels with holes, drawn with a seed: plants of unequal length, gaps, plants seen once. */
public final class RandomPanels {

  /** The names of the inputs drawn. */
  public static final List<String> INPUTS = List.of("labour", "machines");

  private RandomPanels() {}

  /**
   * A panel.
   *
   * @param holes the share of rows left out at random
   * @param bias what a year adds to the output elasticity of machines
   */
  public static Panel draw(long seed, int plants, int periods, double holes, double bias) {
    RandomGenerator random = new SplittableRandom(seed);
    List<double[]> rows = new ArrayList<>();
    for (int p = 0; p < plants; p++) {
      double level = .2 * random.nextGaussian();
      double size = .5 * level + .5 * random.nextGaussian();
      for (int t = 0; t < periods; t++) {
        double labour = 3 + size + .3 * random.nextGaussian();
        double machines = 2 + size + .3 * random.nextGaussian();
        double output =
            level + .01 * t + .6 * labour + (.4 + bias * t) * machines + .1 * random.nextGaussian();
        // A plant keeps its first row, so that none is lost altogether.
        if (t == 0 || random.nextDouble() >= holes) {
          rows.add(
              new double[] {p, 2010 + t, Math.exp(output), Math.exp(labour), Math.exp(machines)});
        }
      }
    }
    return PanelFixtures.panel(
        rows.stream().mapToInt(r -> (int) r[0]).toArray(),
        rows.stream().mapToInt(r -> (int) r[1]).toArray(),
        column(rows, 2),
        INPUTS,
        List.of(column(rows, 3), column(rows, 4)),
        List.of(),
        List.of());
  }

  private static double[] column(List<double[]> rows, int k) {
    return rows.stream().mapToDouble(r -> r[k]).toArray();
  }
}
