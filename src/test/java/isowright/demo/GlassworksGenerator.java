package isowright.demo;

import isowright.demo.GlassworksTruth.Plant;
import java.io.IOException;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Random;

/**
 * Draws the records of the invented glassworks: 14 plants, 2012 to 2024.
 *
 * <p>Each year a plant learns the output asked of it and the prices of its region, takes the
 * least-cost mix of {@link GlassworksTruth}, departs from it by habit and by chance, scales the
 * result to the output asked, and then produces what breakdowns and noise let it. Prices differ by
 * region and year by some ±40 % relative to one another, without which curvature could not be
 * learnt from the records.
 *
 * <p>Deterministic on every machine: {@link Random} with one seed, whose algorithm is part of the
 * Java specification, and {@link StrictMath} throughout.
 *
 * <p>To write the files again, from the top of the checkout: {@code mvn -q -Pquick test-compile
 * exec:java -Dexec.classpathScope=test -Dexec.mainClass=isowright.demo.GlassworksGenerator}.
 */
public final class GlassworksGenerator {

  private static final long SEED = 14L;

  /** Money a unit in the base year's prices: EUR/h, EUR/h, EUR/GJ. */
  private static final double[] BASE_PRICES = {31, 60, 9.5};

  /** Producer price index by year, 2020 = 100. */
  private static final double[] PRICE_INDEX = {
    91.8, 92.6, 92.9, 92.4, 93.1, 95.6, 98.2, 99.4, 100.0, 106.9, 124.3, 127.8, 129.1
  };

  /** Country-wide log departures of real prices from the base, by input and year. */
  private static final double[][] COUNTRY = {
    {-.10, -.08, -.07, -.05, -.03, -.02, .00, .01, .03, .02, .00, .03, .06},
    {.16, .12, .05, -.02, -.08, -.12, -.10, -.14, -.18, -.15, .04, .18, .22},
    {.12, .15, .08, -.12, -.22, -.12, .00, -.04, -.20, .10, .46, .30, .12},
  };

  /** Demand of the whole trade, log departures by year. */
  private static final double[] TRADE = {
    -.04, -.05, -.01, .02, .04, .06, .07, .03, -.12, .02, .05, -.03, -.06
  };

  private static final List<String> REGIONS = List.of("north", "river", "hills", "coast");

  /** Lasting log departures of real prices, by region and input. */
  private static final double[][] REGION = {
    {.14, -.06, -.12},
    {.02, .10, .04},
    {-.20, .02, .14},
    {.06, -.10, -.06},
  };

  /** Standard deviation of a year's news in a region's real prices, by input. */
  private static final double[] REGION_SHOCK = {0.08, 0.13, 0.15};

  private static final double REGION_MEMORY = 0.6;
  private static final double[] CONTRACT_SHOCK = {0.03, 0.06, 0.06};
  private static final double ADJUSTMENT = 0.15;
  private static final double DEMAND_SHOCK = 0.13;
  private static final double DEMAND_MEMORY = 0.4;

  private final Random random;

  private GlassworksGenerator(long seed) {
    this.random = new Random(seed);
  }

  /** One row as it stands in the file; an empty string is a missing cell. */
  record Row(String plant, int year, Map<String, String> cells) {}

  /** Writes the files of the demo into {@code notebooks-data}. */
  public static void main(String[] arguments) throws IOException {
    GlassworksFiles.write(rows(), Path.of("notebooks-data"));
  }

  /** All rows, plant by plant, with the blemishes. */
  static List<Row> rows() {
    return rows(SEED);
  }

  /** The same from another seed: another draw from the same truth. */
  static List<Row> rows(long seed) {
    List<Row> rows = new GlassworksGenerator(seed).draw();
    GlassworksBlemishes.apply(rows);
    return List.copyOf(rows);
  }

  private List<Row> draw() {
    double[][][] regional = regionalPrices();
    List<Row> rows = new ArrayList<>();
    for (Plant plant : GlassworksTruth.PLANTS) {
      double[][] local = regional[REGIONS.indexOf(plant.region())];
      double demandState = random.nextGaussian() * DEMAND_SHOCK;
      for (int t = 0; t < GlassworksTruth.YEARS; t++) {
        demandState = DEMAND_MEMORY * demandState + random.nextGaussian() * DEMAND_SHOCK;
        double logDemand = StrictMath.log(plant.usualOutput()) + TRADE[t] + demandState;
        rows.add(row(plant, t, logDemand, contractPrices(local, t)));
      }
    }
    return rows;
  }

  /** Nominal prices by region, input and year. */
  private double[][][] regionalPrices() {
    double[][][] prices = new double[REGIONS.size()][GlassworksTruth.INPUTS][GlassworksTruth.YEARS];
    for (int r = 0; r < REGIONS.size(); r++) {
      for (int i = 0; i < GlassworksTruth.INPUTS; i++) {
        double state = 0;
        for (int t = 0; t < GlassworksTruth.YEARS; t++) {
          state = REGION_MEMORY * state + random.nextGaussian() * REGION_SHOCK[i];
          double real = BASE_PRICES[i] * StrictMath.exp(COUNTRY[i][t] + REGION[r][i] + state);
          prices[r][i][t] = real * PRICE_INDEX[t] / 100;
        }
      }
    }
    return prices;
  }

  /** What one plant pays in a year under its own contracts, rounded as printed. */
  private double[] contractPrices(double[][] local, int t) {
    double[] prices = new double[GlassworksTruth.INPUTS];
    for (int i = 0; i < prices.length; i++) {
      double price = local[i][t] * StrictMath.exp(random.nextGaussian() * CONTRACT_SHOCK[i]);
      prices[i] = StrictMath.rint(price * 100) / 100;
    }
    return prices;
  }

  private Row row(Plant plant, int t, double logDemand, double[] prices) {
    int year = GlassworksTruth.FIRST_YEAR + t;
    double[] mix = chosenMix(plant, year, logDemand, prices);
    int age = furnaceAge(plant, year);
    double breakdown = StrictMath.max(0.005, 0.025 + 0.004 * age + 0.014 * random.nextGaussian());
    breakdown = StrictMath.rint(breakdown * 1000) / 1000;
    double logOutput =
        GlassworksTruth.logOutput(mix, year, plant.productivity(), breakdown)
            + GlassworksTruth.NOISE * random.nextGaussian();
    long machineCost = StrictMath.round(mix[1] * prices[1]);
    double cost = mix[0] * prices[0] + machineCost + mix[2] * prices[2];

    Map<String, String> cells = new HashMap<>();
    cells.put("plant", plant.name());
    cells.put("region", plant.region());
    cells.put("year", Integer.toString(year));
    cells.put("tonnes", whole(StrictMath.exp(logOutput)));
    cells.put("labour_hours", whole(mix[0]));
    cells.put("machine_hours", whole(mix[1]));
    cells.put("energy_gj", whole(mix[2]));
    cells.put("wage", decimals(prices[0], 2));
    cells.put("machine_cost", Long.toString(machineCost));
    cells.put("energy_price", decimals(prices[2], 2));
    cells.put("ppi", decimals(PRICE_INDEX[t], 1));
    cells.put("filed_cost", whole(cost));
    cells.put("breakdown_rate", decimals(breakdown, 3));
    cells.put("furnace_age", Integer.toString(age));
    return new Row(plant.name(), year, cells);
  }

  /** The least-cost mix, disturbed by habit and chance, at the level that meets demand; whole. */
  private double[] chosenMix(Plant plant, int year, double logDemand, double[] prices) {
    double[] mix = GlassworksTruth.leastCostMix(logDemand, prices, year, plant.productivity());
    for (int i = 0; i < mix.length; i++) {
      double habit = i == plant.heavyIn() ? plant.excess() : 0;
      mix[i] *= StrictMath.exp(habit + ADJUSTMENT * random.nextGaussian());
    }
    mix = GlassworksTruth.scaledTo(logDemand, mix, year, plant.productivity());
    for (int i = 0; i < mix.length; i++) {
      mix[i] = StrictMath.rint(mix[i]);
    }
    return mix;
  }

  private static int furnaceAge(Plant plant, int year) {
    int last = plant.rebuilt().get(0);
    for (int rebuilt : plant.rebuilt()) {
      last = rebuilt <= year ? rebuilt : last;
    }
    return year - last;
  }

  private static String decimals(double value, int places) {
    return String.format(Locale.ROOT, "%." + places + "f", value);
  }

  private static String whole(double value) {
    return Long.toString(StrictMath.round(value));
  }
}
