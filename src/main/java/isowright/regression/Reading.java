package isowright.regression;

import java.util.List;

/**
 * What one reading of a design gathers: the triangular factor, the size of each column before
 * anything was removed, and the spread of the response.
 */
final class Reading {

  private final OrthogonalDecomposition decomposition;
  private final double[] squares;
  private final Moments response = new Moments();

  private Reading(int size) {
    decomposition = new OrthogonalDecomposition(size);
    squares = new double[size];
  }

  static Reading of(Design design, Blocks blocks) {
    int size = design.columns().size() + 1;
    return blocks.gather(
        size,
        () -> new Reading(size),
        (reading, from, to, buffer) -> {
          design.fill(from, to, buffer, reading.squares);
          reading.response.add(buffer[size - 1], to - from);
          reading.decomposition.add(buffer, to - from);
        },
        Reading::add);
  }

  private void add(Reading other) {
    decomposition.add(other.decomposition);
    response.add(other.response);
    for (int k = 0; k < squares.length; k++) {
      squares[k] += other.squares[k];
    }
  }

  RankAnalysis analysis(List<String> columns, RankRule rule) {
    return new RankAnalysis(columns, decomposition, squares, rule);
  }

  OrthogonalDecomposition decomposition() {
    return decomposition;
  }

  /** The sum of squares of the response about its mean. */
  double responseSumOfSquares() {
    return response.sumOfSquares;
  }

  /** True where every value read was a finite number whose square is one too. */
  boolean finite() {
    return decomposition.finite();
  }

  /**
   * Sum of squares about the mean, mergeable: T. F. Chan, G. H. Golub and R. J. LeVeque, "Updating
   * formulae and a pairwise algorithm for computing sample variances", 1979.
   */
  private static final class Moments {
    private long count;
    private double mean;
    private double sumOfSquares;

    void add(double[] values, int rows) {
      double sum = 0;
      for (int i = 0; i < rows; i++) {
        sum += values[i];
      }
      double center = sum / rows;
      double squares = 0;
      double rest = 0;
      for (int i = 0; i < rows; i++) {
        double deviation = values[i] - center;
        squares += deviation * deviation;
        rest += deviation;
      }
      merge(rows, center + rest / rows, squares - rest * rest / rows);
    }

    void add(Moments other) {
      if (other.count > 0) {
        merge(other.count, other.mean, other.sumOfSquares);
      }
    }

    private void merge(long more, double otherMean, double otherSquares) {
      long all = count + more;
      double apart = otherMean - mean;
      sumOfSquares += otherSquares + apart * apart * ((double) count * more / all);
      mean += apart * more / all;
      count = all;
    }
  }
}
