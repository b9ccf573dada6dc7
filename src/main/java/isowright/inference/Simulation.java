package isowright.inference;

import isowright.estimation.EstimatedTechnology;
import isowright.technology.Technology;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.function.Function;
import java.util.random.RandomGenerator;
import java.util.random.RandomGeneratorFactory;
import java.util.stream.IntStream;
import org.apache.commons.math3.linear.Array2DRowRealMatrix;
import org.apache.commons.math3.linear.EigenDecomposition;

/**
 * How sure is a number that jumps as an estimated technology changes a little, such as a plan in
 * whole units? Derivatives say nothing there; so technologies are drawn, θ ~ θ̂ + V^½ t with t of
 * Student's law at the fit's degrees of freedom, the number is found for each, and the interval is
 * that between percentiles.
 *
 * <p>A draw for which the number cannot be had is left out; the share of the others is told. The
 * seed is fixed, so the same study gives the same digits.
 *
 * <p>Source: Krinsky, I. and Robb, A. L. (1986), On Approximating the Statistical Properties of
 * Elasticities, <i>Review of Economics and Statistics</i> 68, 715–719. Tested in {@code
 * SimulationTest}.
 */
public final class Simulation {

  private final List<Technology> draws;
  private final double level;

  /**
   * Numbers with their uncertainty.
   *
   * @param estimates the numbers, in their order
   * @param answered the share of the draws for which they could be had
   */
  public record Simulated(List<Estimate> estimates, double answered) {
    /** Copies the list. */
    public Simulated {
      estimates = List.copyOf(estimates);
    }
  }

  private Simulation(List<Technology> draws, double level) {
    this.draws = draws;
    this.level = level;
  }

  /**
   * Draws of an estimated technology.
   *
   * @param count how many
   * @param seed where the random numbers begin
   */
  public static Simulation of(EstimatedTechnology estimated, double level, int count, long seed) {
    double[] centre = estimated.technology().parameters();
    double[][] root = root(estimated.covariance());
    RandomGenerator random = RandomGeneratorFactory.of("L64X128MixRandom").create(seed);
    List<Technology> draws = new ArrayList<>();
    for (int d = 0; d < count; d++) {
      double[] normal = new double[centre.length];
      for (int k = 0; k < normal.length; k++) {
        normal[k] = random.nextGaussian();
      }
      double scale = student(random, estimated.degreesOfFreedom());
      double[] drawn = centre.clone();
      for (int k = 0; k < drawn.length; k++) {
        for (int l = 0; l < normal.length; l++) {
          drawn[k] += scale * root[k][l] * normal[l];
        }
      }
      draws.add(estimated.technology().withParameters(drawn));
    }
    return new Simulation(draws, level);
  }

  /** √(ν/χ²_ν), χ² as a sum of squares; degrees of freedom beyond a hundred are as good as none. */
  private static double student(RandomGenerator random, double degreesOfFreedom) {
    if (!(degreesOfFreedom < 100)) {
      return 1;
    }
    int whole = (int) Math.max(1, Math.rint(degreesOfFreedom));
    double sum = 0;
    for (int k = 0; k < whole; k++) {
      double normal = random.nextGaussian();
      sum += normal * normal;
    }
    return Math.sqrt(whole / sum);
  }

  /** A square root of a covariance that may lack rank: eigenvectors times roots of eigenvalues. */
  private static double[][] root(double[][] covariance) {
    int p = covariance.length;
    EigenDecomposition eigen =
        new EigenDecomposition(new Array2DRowRealMatrix(symmetric(covariance)));
    double[][] root = new double[p][p];
    for (int l = 0; l < p; l++) {
      double size = Math.sqrt(Math.max(0, eigen.getRealEigenvalue(l)));
      for (int k = 0; k < p; k++) {
        root[k][l] = size * eigen.getV().getEntry(k, l);
      }
    }
    return root;
  }

  private static double[][] symmetric(double[][] matrix) {
    int p = matrix.length;
    double[][] symmetric = new double[p][p];
    for (int k = 0; k < p; k++) {
      for (int l = 0; l < p; l++) {
        symmetric[k][l] = 0.5 * (matrix[k][l] + matrix[l][k]);
      }
    }
    return symmetric;
  }

  /**
   * Several numbers at once.
   *
   * @param values the numbers by the point estimate
   * @param functions the numbers by a drawn technology; NaN where they cannot be had
   */
  public Simulated estimates(double[] values, Function<Technology, double[]> functions) {
    List<double[]> drawn =
        IntStream.range(0, draws.size())
            .parallel()
            .mapToObj(d -> functions.apply(draws.get(d)))
            .filter(numbers -> Arrays.stream(numbers).noneMatch(Double::isNaN))
            .toList();
    List<Estimate> estimates = new ArrayList<>();
    for (int f = 0; f < values.length; f++) {
      int which = f;
      double[] sorted = drawn.stream().mapToDouble(numbers -> numbers[which]).sorted().toArray();
      estimates.add(
          new Estimate(
              values[f],
              deviation(sorted),
              percentile(sorted, (1 - level) / 2),
              percentile(sorted, (1 + level) / 2),
              level,
              Estimate.Method.SIMULATION));
    }
    return new Simulated(estimates, drawn.size() / (double) draws.size());
  }

  private static double deviation(double[] numbers) {
    if (numbers.length < 2) {
      return Double.NaN;
    }
    double mean = Arrays.stream(numbers).average().orElse(Double.NaN);
    double sum = 0;
    for (double number : numbers) {
      sum += (number - mean) * (number - mean);
    }
    return Math.sqrt(sum / (numbers.length - 1));
  }

  /** Linear between order statistics (type 7 of Hyndman and Fan 1996). */
  private static double percentile(double[] sorted, double share) {
    if (sorted.length == 0) {
      return Double.NaN;
    }
    double position = share * (sorted.length - 1);
    int below = (int) Math.floor(position);
    int above = Math.min(below + 1, sorted.length - 1);
    return sorted[below] + (position - below) * (sorted[above] - sorted[below]);
  }
}
