package isowright.demo;

import isowright.demo.GlassworksGenerator.Row;
import isowright.demo.GlassworksTruth.Plant;
import java.util.List;
import java.util.Locale;

/** The truth behind the glassworks as the data dictionary prints it. */
final class GlassworksTruthTable {

  private static final List<String> QUANTITIES =
      List.of("labour_hours", "machine_hours", "energy_gj");

  private static final List<String> INPUT_NAMES = List.of("labour", "machines", "energy");

  private GlassworksTruthTable() {}

  /** Two tables in Markdown: the technology, and the plants. */
  static String markdown(List<Row> rows) {
    return technology(rows) + "\n" + plants();
  }

  private static String technology(List<Row> rows) {
    double[] elasticities = GlassworksTruth.outputElasticities(geometricMeans(rows));
    StringBuilder text = new StringBuilder("| quantity | truth |\n|---|---|\n");
    line(text, "elasticity of substitution σ", "%.3f", GlassworksTruth.SUBSTITUTION);
    line(text, "ρ", "%.1f", GlassworksTruth.RHO);
    line(text, "returns to scale ν", "%.2f", GlassworksTruth.SCALE);
    for (int i = 0; i < elasticities.length; i++) {
      String name =
          "output elasticity of " + INPUT_NAMES.get(i) + " at the records' geometric mean";
      line(text, name, "%.3f", elasticities[i]);
    }
    line(text, "trend, log output a year", "%.3f", GlassworksTruth.TREND);
    line(text, "effect of `breakdown_rate` on log output", "%.1f", GlassworksTruth.BREAKDOWN);
    line(text, "standard deviation of the noise in log output", "%.2f", GlassworksTruth.NOISE);
    return text.toString();
  }

  private static String plants() {
    StringBuilder text =
        new StringBuilder(
            "| plant | productivity, log output | habitually heavy in |\n|---|---|---|\n");
    for (Plant plant : GlassworksTruth.PLANTS) {
      String heavy =
          plant.heavyIn() < 0
              ? ""
              : String.format(
                  Locale.ROOT, "%s (+%.2f)", INPUT_NAMES.get(plant.heavyIn()), plant.excess());
      text.append(
          String.format(
              Locale.ROOT, "| %s | %+.2f | %s |\n", plant.name(), plant.productivity(), heavy));
    }
    return text.toString();
  }

  private static void line(StringBuilder into, String name, String format, double value) {
    into.append("| ")
        .append(name)
        .append(" | ")
        .append(String.format(Locale.ROOT, format, value))
        .append(" |\n");
  }

  /** Over the rows in which every quantity was filed. */
  private static double[] geometricMeans(List<Row> rows) {
    double[] sums = new double[QUANTITIES.size()];
    int used = 0;
    for (Row row : rows) {
      List<String> cells = QUANTITIES.stream().map(c -> row.cells().getOrDefault(c, "")).toList();
      if (cells.contains("")) {
        continue;
      }
      used++;
      for (int i = 0; i < sums.length; i++) {
        sums[i] += StrictMath.log(Double.parseDouble(cells.get(i)));
      }
    }
    for (int i = 0; i < sums.length; i++) {
      sums[i] = StrictMath.exp(sums[i] / used);
    }
    return sums;
  }
}
