package isowright.regression;

import java.util.Arrays;

/**
 * The mean and the spread of each column of a design, read once, in parallel.
 *
 * <p>The spread is the root of the mean squared deviation from the mean (divisor N). Sums are taken
 * of deviations from the first row, so that a large level loses no digits. Arrays are copied in and
 * out.
 *
 * @param means shape K + 1, the response last
 * @param spreads shape K + 1; 0 for a column that does not vary
 */
public record ColumnMoments(double[] means, double[] spreads) {

  /** What rounding leaves of a column that does not vary, in units of its mean. */
  private static final double ROUNDING = 1e-13;

  /** Copies the arrays. */
  public ColumnMoments {
    means = means.clone();
    spreads = spreads.clone();
  }

  @Override
  public double[] means() {
    return means.clone();
  }

  @Override
  public double[] spreads() {
    return spreads.clone();
  }

  /** The moments of the columns as the design hands them over. */
  public static ColumnMoments of(Design design) {
    int size = design.columns().size() + 1;
    Blocks blocks = Blocks.of(design.groups());
    double[] level = first(design, blocks, size);
    Sums sums =
        blocks.gather(
            size,
            () -> new Sums(size),
            (into, from, to, buffer) -> {
              design.fill(from, to, buffer);
              into.add(buffer, to - from, level);
            },
            Sums::add);
    double rows = design.rows();
    double[] means = new double[size];
    double[] spreads = new double[size];
    for (int k = 0; k < size; k++) {
      double shift = sums.first[k] / rows;
      means[k] = level[k] + shift;
      double spread = Math.sqrt(Math.max(0, sums.second[k] / rows - shift * shift));
      spreads[k] = spread > ROUNDING * Math.abs(means[k]) ? spread : 0;
    }
    return new ColumnMoments(means, spreads);
  }

  private static double[] first(Design design, Blocks blocks, int size) {
    double[][] buffer = new double[size][blocks.longest()];
    design.fill(0, blocks.end(0), buffer);
    return Arrays.stream(buffer).mapToDouble(column -> column[0]).toArray();
  }

  private static final class Sums {
    private final double[] first;
    private final double[] second;

    Sums(int size) {
      first = new double[size];
      second = new double[size];
    }

    void add(double[][] block, int rows, double[] level) {
      for (int k = 0; k < first.length; k++) {
        double sum = 0;
        double squares = 0;
        for (int i = 0; i < rows; i++) {
          double deviation = block[k][i] - level[k];
          sum += deviation;
          squares += deviation * deviation;
        }
        first[k] += sum;
        second[k] += squares;
      }
    }

    void add(Sums other) {
      for (int k = 0; k < first.length; k++) {
        first[k] += other.first[k];
        second[k] += other.second[k];
      }
    }
  }
}
