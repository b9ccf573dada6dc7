package isowright.regression;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;

/** Regressions on published data, with the times of their rows. */
final class PublishedDesigns {

  private static final Path PUBLISHED = Path.of("src/test/resources/published");

  private PublishedDesigns() {}

  /** ln gsp on a constant, ln pcap, ln pc, ln emp and unemp; the groups are 48 US states. */
  static ArrayDesign states() throws IOException {
    Table table = Table.read("us-states-public-capital.csv");
    List<Integer> starts = new ArrayList<>();
    for (int i = 0; i < table.rows(); i++) {
      if (i == 0 || !table.cell(i, "state").equals(table.cell(i - 1, "state"))) {
        starts.add(i);
      }
    }
    return ArrayDesign.of(
        List.of("constant", "pcap", "pc", "emp", "unemp"),
        new double[][] {
          table.ones(), table.logs("pcap"), table.logs("pc"), table.logs("emp"), table.of("unemp")
        },
        table.logs("gsp"),
        Groups.startingAt(table.rows(), starts.stream().mapToInt(Integer::intValue).toArray()));
  }

  /** The years of {@link #states()}, 1970 to 1986. */
  static Times years() throws IOException {
    double[] years = Table.read("us-states-public-capital.csv").of("year");
    int[] times = new int[years.length];
    for (int i = 0; i < times.length; i++) {
      times[i] = (int) years[i] - 1970;
    }
    return Times.of(17, times);
  }

  /** ln output on a constant, ln labour and ln capital: one series of 24 years. */
  static ArrayDesign manufacturing() throws IOException {
    Table table = Table.read("us-manufacturing-1899-1922.csv");
    return ArrayDesign.of(
        List.of("constant", "labour", "capital"),
        new double[][] {table.ones(), table.logs("labour"), table.logs("capital")},
        table.logs("output"));
  }

  /**
   * −ln(cost / fuel price) of 123 electricity companies on a constant, ln output, half its square,
   * and the logs of the capital and labour prices over the fuel price.
   */
  static ArrayDesign electricity() throws IOException {
    Table table = Table.read("electricity-1970.csv");
    int rows = 123;
    double[][] columns = new double[5][rows];
    double[] response = new double[rows];
    for (int i = 0; i < rows; i++) {
      double fuel = table.of("fuel")[i];
      double output = Math.log(table.of("output")[i]);
      columns[0][i] = 1;
      columns[1][i] = output;
      columns[2][i] = 0.5 * output * output;
      columns[3][i] = Math.log(table.of("capital")[i] / fuel);
      columns[4][i] = Math.log(table.of("labor")[i] / fuel);
      response[i] = -Math.log(table.of("cost")[i] / fuel);
    }
    return ArrayDesign.of(
        List.of("constant", "output", "square", "capital", "labour"), columns, response);
  }

  /** ln output on a constant, ln labour and ln capital of 27 states' primary metals. */
  static ArrayDesign primaryMetals() throws IOException {
    Table table = Table.read("primary-metals-27-states.csv");
    return ArrayDesign.of(
        List.of("constant", "labour", "capital"),
        new double[][] {table.ones(), table.logs("labor"), table.logs("capital")},
        table.logs("output"));
  }

  /** A comma-separated file with a heading. */
  private record Table(List<String> names, List<List<String>> cells) {

    static Table read(String file) throws IOException {
      List<List<String>> lines =
          Files.readAllLines(PUBLISHED.resolve(file)).stream()
              .map(line -> List.of(line.split(",")))
              .toList();
      return new Table(lines.get(0), lines.subList(1, lines.size()));
    }

    int rows() {
      return cells.size();
    }

    String cell(int row, String column) {
      return cells.get(row).get(names.indexOf(column));
    }

    double[] of(String column) {
      double[] values = new double[rows()];
      for (int i = 0; i < values.length; i++) {
        values[i] = Double.parseDouble(cell(i, column));
      }
      return values;
    }

    double[] logs(String column) {
      double[] values = of(column);
      for (int i = 0; i < values.length; i++) {
        values[i] = Math.log(values[i]);
      }
      return values;
    }

    double[] ones() {
      double[] values = new double[rows()];
      java.util.Arrays.fill(values, 1);
      return values;
    }
  }
}
