package isowright.estimation;

import isowright.cost.CostArguments;
import isowright.regression.Groups;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

/** Published records of costs and shares. */
public final class CostFixtures {

  private CostFixtures() {}

  /**
   * 123 United States electricity companies, 1970: Christensen and Greene 1976; Greene, Econometric
   * Analysis, 5th ed., example 5.6. Inputs capital, labour, fuel; output in million kWh.
   */
  public static CostData electricity() throws IOException {
    double[][] c = columns("electricity-1970.csv", 123);
    CostArguments arguments =
        CostArguments.ownUnits(
            List.of("capital", "labour", "fuel"), List.of("power"), List.of(), false);
    double[][] points = {logs(c[6]), logs(c[4]), logs(c[8]), logs(c[3])};
    double[][] shares = {c[7], c[5], c[9]};
    return new CostData(
        arguments,
        points,
        logs(c[2]),
        shares,
        new double[0][],
        List.of(),
        Groups.ofSingleRows(123));
  }

  /** United States manufacturing, 1947–1971: Berndt and Wood 1975. Shares and prices alone. */
  public static CostData manufacturing() throws IOException {
    double[][] c = columns("us-manufacturing-klem.csv", 25);
    CostArguments arguments =
        CostArguments.ownUnits(
            List.of("capital", "labour", "energy", "materials"), List.of(), List.of(), false);
    double[][] points = {logs(c[6]), logs(c[7]), logs(c[8]), logs(c[9])};
    return new CostData(
        arguments,
        points,
        new double[0],
        new double[][] {c[2], c[3], c[4], c[5]},
        new double[0][],
        List.of(),
        Groups.ofSingleRows(25));
  }

  /**
   * The same years with output and time, for forms in levels: the file has no output, so that cost
   * over an index of prices weighted by mean shares stands for it.
   */
  public static CostData manufacturingOfOutput() throws IOException {
    double[][] c = columns("us-manufacturing-klem.csv", 25);
    double[][] logs = new double[6][25];
    double[] base = new double[5];
    double[] shares = new double[4];
    for (int i = 0; i < 4; i++) {
      logs[i] = logs(c[6 + i]);
      base[i] = Math.exp(Arrays.stream(logs[i]).average().orElseThrow());
      shares[i] = Arrays.stream(c[2 + i]).average().orElseThrow();
    }
    double[] logCost = logs(c[1]);
    for (int r = 0; r < 25; r++) {
      logs[4][r] = logCost[r];
      for (int i = 0; i < 4; i++) {
        logs[4][r] -= shares[i] * logs[i][r];
      }
      logs[5][r] = r;
    }
    base[4] = Math.exp(Arrays.stream(logs[4]).average().orElseThrow());
    return new CostData(
        new CostArguments(
            List.of("capital", "labour", "energy", "materials"),
            List.of("output"),
            List.of(),
            true,
            base),
        logs,
        logCost,
        new double[][] {c[2], c[3], c[4], c[5]},
        new double[0][],
        List.of(),
        Groups.ofSingleRows(25));
  }

  private static double[] logs(double[] values) {
    double[] logs = new double[values.length];
    for (int i = 0; i < logs.length; i++) {
      logs[i] = Math.log(values[i]);
    }
    return logs;
  }

  private static double[][] columns(String file, int rows) throws IOException {
    List<String> lines = Files.readAllLines(Path.of("src/test/resources/published", file));
    List<double[]> cells = new ArrayList<>();
    for (String line : lines.subList(1, rows + 1)) {
      String[] parts = line.split(",");
      double[] row = new double[parts.length];
      for (int j = 0; j < row.length; j++) {
        row[j] = Double.parseDouble(parts[j]);
      }
      cells.add(row);
    }
    double[][] columns = new double[cells.get(0).length][rows];
    for (int i = 0; i < rows; i++) {
      for (int j = 0; j < columns.length; j++) {
        columns[j][i] = cells.get(i)[j];
      }
    }
    return columns;
  }
}
