package isowright.study;

import static isowright.study.GlassworksPlants.CONSTANT;
import static isowright.study.GlassworksPlants.ENERGY;
import static isowright.study.GlassworksPlants.LABOUR;
import static isowright.study.GlassworksPlants.MACHINES;

import isowright.study.Findings.Said;
import isowright.study.PlanFindings.CurvePoint;
import isowright.study.PlanFindings.Planned;
import isowright.study.PlanFindings.Reviewed;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/** Plans and reviews of the invented glassworks, from the closed form of Cobb-Douglas. */
final class GlassworksPlans {

  static final double[] PRICES = {31.5, 84, 11.2};
  private static final double SCALE = LABOUR + MACHINES + ENERGY;

  private GlassworksPlans() {}

  /** Least cost of a target: C = ν [Q/A · Π (w_i/β_i)^β_i]^(1/ν), ν the sum of the exponents. */
  static double cost(double target) {
    double inside =
        target
            / CONSTANT
            * Math.pow(PRICES[0] / LABOUR, LABOUR)
            * Math.pow(PRICES[1] / MACHINES, MACHINES)
            * Math.pow(PRICES[2] / ENERGY, ENERGY);
    return SCALE * Math.pow(inside, 1 / SCALE);
  }

  static Map<String, Double> prices() {
    return byInput(PRICES[0], PRICES[1], PRICES[2]);
  }

  static Map<String, Double> mix(double target) {
    double perUnit = cost(target) / SCALE;
    return byInput(
        perUnit * LABOUR / PRICES[0], perUnit * MACHINES / PRICES[1], perUnit * ENERGY / PRICES[2]);
  }

  /** A plan with a mix, its curve and its isoquant. */
  static Planned solved(
      String question, String technology, double target, String status, GlassworksPlants plants) {
    Map<String, Figure> mix = new LinkedHashMap<>();
    Map<String, Figure> shares = new LinkedHashMap<>();
    mix(target)
        .forEach(
            (input, quantity) -> {
              mix.put(input, logFigure(quantity, 0.05));
              shares.put(
                  input,
                  logFigure(
                      quantity * prices().getOrDefault(input, Double.NaN) / cost(target), 0.04));
            });
    double averageCost = technology.equals("translog") ? bowlAt(target) : cost(target) / target;
    return new Planned(
        question,
        technology,
        true,
        target,
        prices(),
        "the typical plant in 2024",
        status.equals("corner") ? Map.of("machines", "held at 14,000 h") : Map.of(),
        status,
        mix,
        Optional.of(logFigure(averageCost * target, 0.021)),
        Optional.of(
            logFigure(
                technology.equals("translog")
                    ? averageCost * (1 + 0.24 * Math.log(target / 47000))
                    : averageCost / SCALE,
                0.034)),
        Optional.of(logFigure(averageCost, 0.021)),
        shares,
        3.1e-13,
        technology.equals("translog") ? bowl() : falling(),
        isoquant(target),
        plants.mixes(),
        remarks(status));
  }

  /** A plan without an answer. */
  static Planned unanswered(
      String question, String technology, double target, String status, GlassworksPlants plants) {
    return new Planned(
        question,
        technology,
        true,
        target,
        prices(),
        "the typical plant in 2024",
        Map.of("labour", "at most 60,000 h"),
        status,
        Map.of(),
        Optional.empty(),
        Optional.empty(),
        Optional.empty(),
        Map.of(),
        Double.NaN,
        List.of(),
        List.of(),
        plants.mixes(),
        remarks(status));
  }

  /** A plan of a technology taken as known: exact, without records. */
  static Planned known(String question, String technology, double target) {
    Map<String, Figure> mix = new LinkedHashMap<>();
    Map<String, Figure> shares = new LinkedHashMap<>();
    mix(target)
        .forEach(
            (input, quantity) -> {
              mix.put(input, Figure.exact(quantity));
              shares.put(
                  input,
                  Figure.exact(quantity * prices().getOrDefault(input, Double.NaN) / cost(target)));
            });
    List<CurvePoint> curve = new ArrayList<>();
    for (CurvePoint p : falling()) {
      curve.add(
          new CurvePoint(
              p.target(),
              Figure.exact(p.cost().value()),
              Figure.exact(p.marginalCost().value()),
              Figure.exact(p.averageCost().value()),
              p.mix(),
              true));
    }
    return new Planned(
        question,
        technology,
        false,
        target,
        prices(),
        "as given",
        Map.of(),
        "solved",
        mix,
        Optional.of(Figure.exact(cost(target))),
        Optional.of(Figure.exact(cost(target) / target / SCALE)),
        Optional.of(Figure.exact(cost(target) / target)),
        shares,
        2.2e-16,
        curve,
        isoquant(target),
        List.of(),
        List.of());
  }

  /** Average cost falls throughout: returns to scale exceed one. */
  private static List<CurvePoint> falling() {
    List<CurvePoint> curve = new ArrayList<>();
    for (int i = 0; i <= 60; i++) {
      double target = 20000 + 1000 * i;
      double average = cost(target) / target;
      curve.add(point(target, average, average / SCALE));
    }
    return curve;
  }

  /** Average cost is least at 47,000 t: ln AC = ln AC* + 0.12 ln²(Q/47,000). */
  private static List<CurvePoint> bowl() {
    List<CurvePoint> curve = new ArrayList<>();
    for (int i = 0; i <= 60; i++) {
      double target = 20000 + 1000 * i;
      double average = bowlAt(target);
      curve.add(point(target, average, average * (1 + 0.24 * Math.log(target / 47000))));
    }
    return curve;
  }

  private static double bowlAt(double target) {
    double away = Math.log(target / 47000);
    return cost(47000) / 47000 * Math.exp(0.12 * away * away);
  }

  private static CurvePoint point(double target, double average, double marginal) {
    double wider = 0.018 + 0.03 * Math.abs(Math.log(target / 50000));
    return new CurvePoint(
        target,
        logFigure(average * target, wider),
        logFigure(marginal, 1.5 * wider),
        logFigure(average, wider),
        mix(target),
        target <= 75000);
  }

  private static List<double[]> isoquant(double target) {
    Map<String, Double> mix = mix(target);
    double rest = CONSTANT * Math.pow(mix.getOrDefault("energy", 1.0), ENERGY);
    List<double[]> isoquant = new ArrayList<>();
    for (int i = 0; i <= 80; i++) {
      double labour = mix.getOrDefault("labour", 1.0) * Math.pow(2, (i - 40) / 20.0);
      double machines = Math.pow(target / rest / Math.pow(labour, LABOUR), 1 / MACHINES);
      isoquant.add(new double[] {labour, machines});
    }
    return isoquant;
  }

  /** Filed costs of one year held against least cost. */
  static List<Reviewed> reviews(String technology, GlassworksPlants plants) {
    List<Reviewed> reviews = new ArrayList<>();
    for (GlassworksPlants.Row row : plants.rows()) {
      if (!row.period().equals("2024")) {
        continue;
      }
      double atPrices =
          row.labour() * PRICES[0] + row.machines() * PRICES[1] + row.energy() * PRICES[2];
      double filed = atPrices * (1 + 0.01 * (row.row() % 5));
      double least = cost(row.output());
      double technical = 0.6 * (atPrices - least);
      if (row.row() % 41 == 0) {
        reviews.add(without(row, technology, filed, atPrices));
        continue;
      }
      double se = 0.03 * least;
      reviews.add(
          new Reviewed(
              row.plant(),
              row.period(),
              technology,
              filed,
              atPrices,
              Optional.of(logFigure(least, 0.03)),
              Optional.of(GlassworksFits.figure(filed - least, se)),
              filed - atPrices,
              Optional.of(GlassworksFits.figure(technical, 0.7 * se)),
              Optional.of(GlassworksFits.figure(atPrices - least - technical, 0.5 * se)),
              "solved",
              List.of()));
    }
    return reviews;
  }

  private static Reviewed without(
      GlassworksPlants.Row row, String technology, double filed, double atPrices) {
    return new Reviewed(
        row.plant(),
        row.period(),
        technology,
        filed,
        atPrices,
        Optional.empty(),
        Optional.empty(),
        filed - atPrices,
        Optional.empty(),
        Optional.empty(),
        "irregular",
        List.of(
            Said.of(
                "warning",
                "irregular-plan",
                "The technology is not regular at this plant's mix.")));
  }

  /** A positive figure with an interval on the log scale. */
  static Figure logFigure(double value, double relative) {
    return Figure.estimated(
        value,
        value * relative,
        value * Math.exp(-2.093 * relative),
        value * Math.exp(2.093 * relative),
        "delta");
  }

  static Map<String, Double> byInput(double labour, double machines, double energy) {
    Map<String, Double> map = new LinkedHashMap<>();
    map.put("labour", labour);
    map.put("machines", machines);
    map.put("energy", energy);
    return map;
  }

  private static List<Said> remarks(String status) {
    return switch (status) {
      case "outside-records" ->
          List.of(
              Said.of(
                  "warning",
                  "outside-records",
                  "The mix lies outside the range of the records (machines above 33,500 h)."));
      case "irregular" ->
          List.of(
              Said.of(
                  "warning",
                  "irregular",
                  "The technology is not regular where the answer would lie; no mix is given."));
      case "infeasible" ->
          List.of(
              Said.of(
                  "warning",
                  "infeasible",
                  "No mix within the limits reaches 400,000 t; the most is 187,000 t."));
      case "corner" ->
          List.of(
              Said.of(
                  "note",
                  "limit-binds",
                  "Machines are held at 14,000 h; one more hour" + " would save 12.4 EUR."));
      default -> List.of();
    };
  }
}
