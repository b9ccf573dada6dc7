package isowright.study;

import isowright.study.FitFindings.Point;
import isowright.study.PlanFindings.Mix;
import java.util.ArrayList;
import java.util.List;
import java.util.Random;

/**
 * Twenty invented glassworks over six years. Their records follow Q = 1.86 L^.42 M^.38 E^.24 with
 * seeded noise, so charts of them look as charts of real plants do.
 */
final class GlassworksPlants {

  static final double CONSTANT = 1.86;
  static final double LABOUR = 0.42;
  static final double MACHINES = 0.38;
  static final double ENERGY = 0.24;

  /** A row of the records. */
  record Row(
      int row,
      String plant,
      String period,
      double labour,
      double machines,
      double energy,
      double output) {}

  private final List<Row> rows = new ArrayList<>();

  /** With the name of the third plant to be chosen. */
  GlassworksPlants(String third) {
    Random random = new Random(20240613);
    for (int p = 0; p < 20; p++) {
      String plant = p == 2 ? third : String.format(java.util.Locale.ROOT, "GW-%02d", p + 1);
      double size = Math.exp(-0.9 + 1.8 * p / 19.0);
      double bias = 0.25 * random.nextGaussian();
      for (int t = 0; t < 6; t++) {
        double labour = 40000 * size * Math.exp(bias + 0.08 * random.nextGaussian());
        double machines = 14000 * size * Math.exp(-bias + 0.08 * random.nextGaussian());
        double energy = 65000 * size * Math.exp(0.15 * random.nextGaussian());
        double output =
            CONSTANT
                * Math.pow(labour, LABOUR)
                * Math.pow(machines, MACHINES)
                * Math.pow(energy, ENERGY)
                * Math.exp(0.11 * random.nextGaussian());
        rows.add(
            new Row(
                2 + rows.size(),
                plant,
                Integer.toString(2019 + t),
                labour,
                machines,
                energy,
                output));
      }
    }
  }

  List<Row> rows() {
    return List.copyOf(rows);
  }

  /** Fitted values and residuals; each form a little different from the next. */
  List<Point> points(String technology) {
    double tilt = technology.equals("translog") ? 0.03 : technology.equals("ces") ? 0.015 : 0;
    List<Point> points = new ArrayList<>();
    for (Row row : rows) {
      double actual = Math.log(row.output());
      double fitted =
          Math.log(CONSTANT)
              + LABOUR * Math.log(row.labour())
              + MACHINES * Math.log(row.machines())
              + ENERGY * Math.log(row.energy());
      fitted += tilt * (actual - fitted);
      points.add(new Point(row.row(), row.plant(), row.period(), actual, fitted, actual - fitted));
    }
    return points;
  }

  List<Mix> mixes() {
    return rows.stream()
        .map(r -> new Mix(r.plant(), r.period(), r.labour(), r.machines(), r.output()))
        .toList();
  }
}
