package isowright.estimation;

import isowright.records.Panel;
import isowright.regression.OneSidedLaw;
import java.util.List;
import java.util.SplittableRandom;

/** Panels drawn from a known Cobb-Douglas frontier with noise and inefficiency. */
public final class FrontierPanels {

  public static final List<String> INPUTS = List.of("labour", "machines");

  public static final double CONSTANT = 1;

  /** True output elasticities. */
  public static final double LABOUR = .6;

  public static final double MACHINES = .3;

  private FrontierPanels() {}

  /**
   * What is drawn.
   *
   * @param panel the records
   * @param inefficiency u of each row
   */
  public record Drawn(Panel panel, double[] inefficiency) {}

  /**
   * Draws a panel.
   *
   * @param noise σ_v
   * @param scale σ_u; 0: no inefficiency
   * @param shared whether the rows of a plant have the same inefficiency
   * @param decay η about the last period
   */
  public static Drawn draw(
      long seed,
      int plants,
      int periods,
      OneSidedLaw law,
      double noise,
      double scale,
      boolean shared,
      double decay) {
    SplittableRandom random = new SplittableRandom(seed);
    int rows = plants * periods;
    int[] plantOfRow = new int[rows];
    int[] periodOfRow = new int[rows];
    double[] output = new double[rows];
    double[] labour = new double[rows];
    double[] machines = new double[rows];
    double[] inefficiency = new double[rows];
    for (int p = 0; p < plants; p++) {
      double size = random.nextGaussian();
      double lasting = oneSided(law, scale, random);
      for (int t = 0; t < periods; t++) {
        int r = p * periods + t;
        plantOfRow[r] = p;
        periodOfRow[r] = 2015 + t;
        labour[r] = Math.exp(size + .5 * random.nextGaussian());
        machines[r] = Math.exp(size + .5 * random.nextGaussian());
        inefficiency[r] =
            shared ? lasting * Math.exp(-decay * (t - periods + 1)) : oneSided(law, scale, random);
        output[r] =
            Math.exp(
                CONSTANT
                    + LABOUR * Math.log(labour[r])
                    + MACHINES * Math.log(machines[r])
                    + noise * random.nextGaussian()
                    - inefficiency[r]);
      }
    }
    return new Drawn(
        PanelFixtures.panel(
            plantOfRow,
            periodOfRow,
            output,
            INPUTS,
            List.of(labour, machines),
            List.of(),
            List.of()),
        inefficiency);
  }

  private static double oneSided(OneSidedLaw law, double scale, SplittableRandom random) {
    return law == OneSidedLaw.HALF_NORMAL
        ? scale * Math.abs(random.nextGaussian())
        : -scale * Math.log(1 - random.nextDouble());
  }
}
