package isowright.regression;

import java.io.BufferedReader;
import java.io.IOException;
import java.io.InputStream;
import java.io.InputStreamReader;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.List;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/**
 * One of the Statistical Reference Datasets; see {@code nist/SOURCE.txt} among the test resources.
 *
 * @param rows {@code rows[i]}: the response, then the predictors
 * @param starts two starts for nonlinear sets, none for linear ones
 * @param deviations certified standard deviations, empty where none were at hand
 * @param spread certified residual sum of squares (nonlinear) or standard deviation (linear)
 */
record NistSet(
    String name,
    double[][] rows,
    double[][] starts,
    double[] certified,
    double[] deviations,
    double spread) {

  private static final Pattern NONLINEAR = Pattern.compile("^\\s*b\\d+\\s*=\\s*(.*)$");
  private static final Pattern LINEAR = Pattern.compile("^\\s*B\\d+\\s+(\\S+)\\s+(\\S+)\\s*$");
  private static final Pattern SUM = Pattern.compile("^Residual Sum of Squares:\\s*(\\S+)");
  private static final Pattern DEVIATION =
      Pattern.compile("^Residual Standard Deviation:\\s*(\\S+)");

  static NistSet read(String name) {
    List<double[]> parameters = new ArrayList<>();
    List<double[]> rows = new ArrayList<>();
    boolean nonlinear = false;
    boolean data = false;
    double spread = Double.NaN;
    for (String line : lines(name)) {
      Matcher sum = SUM.matcher(line);
      Matcher deviation = DEVIATION.matcher(line);
      Matcher linear = LINEAR.matcher(line);
      Matcher other = NONLINEAR.matcher(line);
      if (data && !line.isBlank()) {
        rows.add(numbers(line));
      } else if (other.matches()) {
        nonlinear = true;
        parameters.add(numbers(other.group(1)));
      } else if (linear.matches()) {
        parameters.add(
            new double[] {
              Double.parseDouble(linear.group(1)), Double.parseDouble(linear.group(2))
            });
      } else if (sum.find() || (!nonlinear && deviation.find())) {
        spread = Double.parseDouble(nonlinear ? sum.group(1) : deviation.group(1));
      } else if (line.matches("^Data:\\s+y.*")) {
        data = true;
      }
    }
    int at = nonlinear ? 2 : 0;
    boolean complete = parameters.stream().allMatch(p -> p.length > at + 1);
    return new NistSet(
        name,
        rows.toArray(new double[0][]),
        nonlinear ? new double[][] {column(parameters, 0), column(parameters, 1)} : new double[0][],
        column(parameters, at),
        complete ? column(parameters, at + 1) : new double[0],
        spread);
  }

  private static List<String> lines(String name) {
    try (InputStream in = NistSet.class.getResourceAsStream("/nist/" + name + ".dat")) {
      if (in == null) {
        throw new IllegalArgumentException("no data set " + name);
      }
      return new BufferedReader(new InputStreamReader(in, StandardCharsets.UTF_8)).lines().toList();
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }

  private static double[] numbers(String line) {
    String[] words = line.strip().split("\\s+");
    double[] values = new double[words.length];
    for (int i = 0; i < values.length; i++) {
      values[i] = Double.parseDouble(words[i]);
    }
    return values;
  }

  private static double[] column(List<double[]> table, int k) {
    return table.stream().mapToDouble(row -> row[k]).toArray();
  }

  /** The response, logged for Nelson, as its model demands. */
  double[] response() {
    double[] y = new double[rows.length];
    for (int i = 0; i < y.length; i++) {
      y[i] = name.equals("Nelson") ? Math.log(rows[i][0]) : rows[i][0];
    }
    return y;
  }

  /** The linear design: a constant (but for NoInt) and powers of x, or the columns themselves. */
  Design linearDesign() {
    int columns = certified.length;
    boolean constant = !name.startsWith("NoInt");
    List<String> names = new ArrayList<>();
    double[][] x = new double[columns][rows.length];
    for (int k = 0; k < columns; k++) {
      names.add("B" + (constant ? k : k + 1));
      int power = constant ? k : k + 1;
      for (int i = 0; i < rows.length; i++) {
        x[k][i] =
            name.equals("Longley") && k > 0
                ? rows[i][k]
                : power == 0 ? 1 : power(rows[i][1], power);
      }
    }
    return ArrayDesign.of(names, x, response());
  }

  private static double power(double x, int exponent) {
    double product = x;
    for (int i = 1; i < exponent; i++) {
      product *= x;
    }
    return product;
  }

  /** Correct significant digits: −log10 of the relative error, 15 at most; absolute for zero. */
  static double digits(double computed, double certified) {
    double error =
        certified == 0 ? Math.abs(computed) : Math.abs(computed - certified) / Math.abs(certified);
    return error == 0 ? 15 : Math.max(0, Math.min(15, -Math.log10(error)));
  }

  static double leastDigits(double[] computed, double[] certified) {
    double least = 15;
    for (int k = 0; k < certified.length; k++) {
      least = Math.min(least, digits(computed[k], certified[k]));
    }
    return least;
  }
}
