package isowright.demo;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Random;

/**
 * Draws the records of the invented brickworks: 36 works, 2015 to 2024.
 *
 * <p>Each year the works learn the output asked of them and their prices, take the least-cost mix
 * of {@link BrickworksTruth} and miss it by some 8 % an input by chance; output then differs from
 * what that mix should make by a noise of 2 % that nobody foresaw. Works differ in level; the
 * larger ones are on the whole the better ones.
 *
 * <p>Deterministic on every machine: {@link Random} with one seed, whose algorithm is part of the
 * Java specification, and {@link StrictMath} throughout.
 *
 * <p>To write the file again, from the top of the checkout: {@code mvn -q -Pquick test-compile
 * exec:java -Dexec.classpathScope=test -Dexec.mainClass=isowright.demo.BrickworksGenerator}.
 */
public final class BrickworksGenerator {

  private static final long SEED = 36L;
  private static final int WORKS = 36;
  private static final int FIRST_YEAR = 2015;
  private static final int YEARS = 10;

  /** EUR/h, EUR/h, EUR/GJ. */
  private static final double[] BASE_PRICES = {26, 95, 11};

  /** Log departures of prices by input: lasting ones of the works, and those of a year. */
  private static final double[] LASTING = {0.15, 0.2, 0.2};

  private static final double[] YEARLY = {0.06, 0.12, 0.2};
  private static final double CHANCE = 0.08;
  private static final double NOISE = 0.02;
  private static final double DEMAND = 0.2;

  /** The works and year whose spending on energy has two digits exchanged. */
  static final String BLEMISHED = "BW-17";

  static final int BLEMISHED_YEAR = 2021;

  static final String HEADER =
      "works,year,bricks,labour_hours,kiln_hours,energy_gj,wage,kiln_price,energy_price,"
          + "labour_cost,kiln_cost,energy_cost,cost";

  private BrickworksGenerator() {}

  /** Writes the file of the demo into {@code notebooks-data}. */
  public static void main(String[] arguments) throws IOException {
    Files.writeString(Path.of("notebooks-data", "brickworks.csv"), csv(SEED));
  }

  /** The committed file. */
  static String csv() {
    return csv(SEED);
  }

  /** The file of another seed: another draw from the same truth, with the blemish. */
  static String csv(long seed) {
    List<String> lines = new ArrayList<>(List.of(HEADER));
    Random random = new Random(seed);
    for (int w = 0; w < WORKS; w++) {
      double size = 1.1 * (2.0 * w / (WORKS - 1) - 1) + 0.15 * random.nextGaussian();
      double level = 0.06 * size + 0.06 * random.nextGaussian();
      double[] local = new double[BrickworksTruth.INPUTS];
      for (int i = 0; i < local.length; i++) {
        local[i] = LASTING[i] * random.nextGaussian();
      }
      for (int t = 0; t < YEARS; t++) {
        lines.add(line(random, w, t, size, level, local));
      }
    }
    return String.join("\n", lines) + "\n";
  }

  private static String line(
      Random random, int w, int t, double size, double level, double[] local) {
    double[] prices = new double[BrickworksTruth.INPUTS];
    for (int i = 0; i < prices.length; i++) {
      double log = local[i] + YEARLY[i] * random.nextGaussian() + 0.02 * t;
      prices[i] = StrictMath.rint(100 * BASE_PRICES[i] * StrictMath.exp(log)) / 100;
    }
    double asked =
        BrickworksTruth.BASE_OUTPUT * StrictMath.exp(size + DEMAND * random.nextGaussian());
    double[] mix = BrickworksTruth.leastCostMix(asked, prices, level);
    for (int i = 0; i < mix.length; i++) {
      mix[i] = StrictMath.rint(mix[i] * StrictMath.exp(CHANCE * random.nextGaussian()));
    }
    double made = BrickworksTruth.output(mix, level + NOISE * random.nextGaussian());
    long[] spent = new long[mix.length];
    long cost = 0;
    for (int i = 0; i < mix.length; i++) {
      spent[i] = StrictMath.round(mix[i] * prices[i]);
      cost += spent[i];
    }
    String name = String.format(Locale.ROOT, "BW-%02d", w + 1);
    int year = FIRST_YEAR + t;
    if (name.equals(BLEMISHED) && year == BLEMISHED_YEAR) {
      spent[2] = exchanged(spent[2]);
    }
    return String.format(
        Locale.ROOT,
        "%s,%d,%d,%.0f,%.0f,%.0f,%.2f,%.2f,%.2f,%d,%d,%d,%d",
        name,
        year,
        StrictMath.round(made),
        mix[0],
        mix[1],
        mix[2],
        prices[0],
        prices[1],
        prices[2],
        spent[0],
        spent[1],
        spent[2],
        cost);
  }

  /** The first two digits the other way round. */
  private static long exchanged(long value) {
    String digits = Long.toString(value);
    return Long.parseLong("" + digits.charAt(1) + digits.charAt(0) + digits.substring(2));
  }
}
