package isowright.inference;

import isowright.estimation.PanelFixtures;
import isowright.records.Column;
import isowright.records.Panel;
import java.util.ArrayList;
import java.util.List;
import java.util.SplittableRandom;
import java.util.random.RandomGenerator;

/**
 * Invented plants whose labour is chosen after their productivity: what least squares gets wrong
 * and instruments and a control function should not. Its formulas are its own.
 *
 * <p>Logs: productivity ω_t = .7 ω_{t−1} + ξ; capital follows last period's capital, productivity
 * and a shock (investment); the wage is a plant's own and lasts in part; labour rises with
 * productivity and falls with the wage; material rises strictly with productivity at given capital;
 * output .6 labour + .4 machines + ω + noise.
 */
public final class TransmissionBias {

  /** The truth. */
  public static final double LABOUR = .6;

  /** The truth. */
  public static final double MACHINES = .4;

  private static final int BURNT = 20;

  private TransmissionBias() {}

  /** A panel with the columns wage, noise (moves nothing) and material beside it. */
  public static Panel draw(long seed, int plants, int periods) {
    return draw(seed, plants, periods, 1, 0);
  }

  /**
   * @param chosen how far labour is chosen knowing productivity: 1, or 0 for not at all
   * @param improper how far the column {@code noise} moves output itself
   */
  public static Panel draw(long seed, int plants, int periods, double chosen, double improper) {
    RandomGenerator random = new SplittableRandom(seed * 7919 + 17);
    int rows = plants * periods;
    int[] plant = new int[rows];
    int[] period = new int[rows];
    double[][] x = new double[2][rows];
    double[] output = new double[rows];
    double[][] beside = new double[3][rows];
    int r = 0;
    for (int p = 0; p < plants; p++) {
      double omega = 0;
      double wage = 0;
      double k = 0;
      for (int t = -BURNT; t < periods; t++) {
        k = .8 * k + .2 * omega + .3 * random.nextGaussian();
        omega = .5 * omega + .25 * random.nextGaussian();
        wage = .95 * wage + .15 * random.nextGaussian();
        double luck = .1 * random.nextGaussian();
        double l = .4 * k + chosen * 1.2 * omega - wage + luck;
        double noise = .3 * random.nextGaussian();
        double error = .1 * random.nextGaussian();
        if (t >= 0) {
          plant[r] = p;
          period[r] = 2010 + t;
          x[0][r] = Math.exp(5 + l);
          x[1][r] = Math.exp(4 + k);
          beside[0][r] = Math.exp(3 + wage);
          beside[1][r] = Math.exp(noise);
          beside[2][r] = Math.exp(6 + .5 * k + 1.5 * omega + .1 * omega * omega);
          output[r] = Math.exp(1 + LABOUR * l + MACHINES * k + omega + error + improper * noise);
          r++;
        }
      }
    }
    Panel bare =
        PanelFixtures.panel(
            plant, period, output, List.of("labour", "machines"), List.of(x), List.of(), List.of());
    List<Column> further = new ArrayList<>();
    List<String> names = List.of("wage", "noise", "material");
    for (int c = 0; c < names.size(); c++) {
      further.add(Column.of(names.get(c), beside[c]));
    }
    return PanelFixtures.withFurther(bare, further);
  }
}
