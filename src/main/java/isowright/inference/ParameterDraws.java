package isowright.inference;

import isowright.estimation.EstimatedTechnology;
import isowright.technology.Technology;
import java.util.Optional;
import java.util.SplittableRandom;
import java.util.random.RandomGenerator;
import org.apache.commons.math3.linear.Array2DRowRealMatrix;
import org.apache.commons.math3.linear.EigenDecomposition;

/**
 * Where might the parameters of an estimated technology lie? Draws from their estimated sampling
 * distribution, by which any function of the technology can be carried through without a
 * derivative:
 *
 * <pre>
 *   θ_r = θ̂ + V^½ z_r √(ν / χ²_r),   z_r standard normal, χ²_r chi-squared with ν degrees of freedom
 * </pre>
 *
 * that is, a multivariate Student's law with the covariance matrix V as its scale and the degrees
 * of freedom of the fit, whose margins are those of {@link DeltaMethod}'s intervals. V^½ is the
 * symmetric root, so a covariance that is singular by construction (shares that sum to one) gives
 * draws that keep to it.
 *
 * <p>Deterministic: draw r depends on the seed and on r alone, so draws may be made in any order
 * and on several threads.
 *
 * <p>Sources: Krinsky, I. and Robb, A. L. (1986), On approximating the statistical properties of
 * elasticities, <i>Review of Economics and Statistics</i> 68, 715–719 (draws of parameters carried
 * through a nonlinear function); the law with ν degrees of freedom: Genz, A. and Bretz, F. (2009),
 * <i>Computation of Multivariate Normal and t Probabilities</i>, Springer, section 1.2. Tested in
 * {@code ParameterDrawsTest}.
 */
public final class ParameterDraws {

  private final Optional<EstimatedTechnology> estimated;
  private final double degreesOfFreedom;
  private final double[] centre;
  private final double[][] root;
  private final int count;
  private final long seed;

  private ParameterDraws(
      Optional<EstimatedTechnology> estimated,
      double[] centre,
      double[][] covariance,
      double degreesOfFreedom,
      int count,
      long seed) {
    this.estimated = estimated;
    this.degreesOfFreedom = degreesOfFreedom;
    this.centre = centre;
    this.root = root(covariance);
    this.count = count;
    this.seed = seed;
  }

  /**
   * Draws of an estimated technology.
   *
   * @param count how many
   * @param seed where they begin; the same seed gives the same draws
   */
  public static ParameterDraws of(EstimatedTechnology estimated, int count, long seed) {
    return new ParameterDraws(
        Optional.of(estimated),
        estimated.technology().parameters(),
        estimated.covariance(),
        estimated.degreesOfFreedom(),
        count,
        seed);
  }

  /**
   * Draws of parameters that belong to no technology of inputs, for functions whose gradient is
   * known.
   *
   * @param covariance p × p
   * @param degreesOfFreedom of Student's law; infinite for the normal law
   */
  public static ParameterDraws of(
      double[][] covariance, double degreesOfFreedom, int count, long seed) {
    return new ParameterDraws(
        Optional.empty(), new double[covariance.length], covariance, degreesOfFreedom, count, seed);
  }

  /** How many draws there are. */
  public int count() {
    return count;
  }

  /**
   * One draw.
   *
   * @param r its number, from 0
   */
  public Draw draw(int r) {
    SplittableRandom source = new SplittableRandom(seed + 0x9E3779B97F4A7C15L * (r + 1L));
    RandomGenerator random = source;
    double stretch = stretch(random);
    double[] normal = new double[centre.length];
    for (int k = 0; k < normal.length; k++) {
      normal[k] = random.nextGaussian() * stretch;
    }
    double[] departure = new double[centre.length];
    for (int k = 0; k < departure.length; k++) {
      for (int l = 0; l < departure.length; l++) {
        departure[k] += root[k][l] * normal[l];
      }
    }
    return new Draw(departure, stretch, source.nextLong());
  }

  /**
   * The technology of a draw.
   *
   * @throws java.util.NoSuchElementException where the parameters belong to none
   */
  public Technology technology(Draw draw) {
    double[] moved = centre.clone();
    for (int k = 0; k < moved.length; k++) {
      moved[k] += draw.departure[k];
    }
    return estimated.orElseThrow().technology().withParameters(moved);
  }

  /** √(ν/χ²): many degrees of freedom are taken as normal. */
  private double stretch(RandomGenerator random) {
    double degrees = degreesOfFreedom;
    int whole = (int) Math.min(Math.rint(degrees), NORMAL + 1);
    if (whole > NORMAL) {
      return 1;
    }
    double sum = 0;
    for (int k = 0; k < Math.max(1, whole); k++) {
      double z = random.nextGaussian();
      sum += z * z;
    }
    return Math.sqrt(Math.max(1, whole) / sum);
  }

  /** Degrees of freedom above which Student's law is the normal to 0.2 % of any usual quantile. */
  private static final int NORMAL = 1000;

  private static double[][] root(double[][] covariance) {
    int p = covariance.length;
    double[][] root = new double[p][p];
    double[][] symmetric = new double[p][p];
    for (int k = 0; k < p; k++) {
      for (int l = 0; l < p; l++) {
        symmetric[k][l] = 0.5 * (covariance[k][l] + covariance[l][k]);
      }
    }
    EigenDecomposition eigen = new EigenDecomposition(new Array2DRowRealMatrix(symmetric, false));
    double[] values = eigen.getRealEigenvalues();
    for (int m = 0; m < p; m++) {
      double spread = Math.sqrt(Math.max(values[m], 0));
      double[] vector = eigen.getEigenvector(m).toArray();
      for (int k = 0; k < p; k++) {
        for (int l = 0; l < p; l++) {
          root[k][l] += vector[k] * spread * vector[l];
        }
      }
    }
    return root;
  }

  /** One draw of the parameters, as their departure from the estimate. */
  public static final class Draw {
    private final double[] departure;
    private final double stretch;
    private final long seed;

    private Draw(double[] departure, double stretch, long seed) {
      this.departure = departure;
      this.stretch = stretch;
      this.seed = seed;
    }

    /** What a function with this gradient in the parameters moves by, to first order. */
    public double along(double[] gradient) {
      double sum = 0;
      for (int k = 0; k < departure.length; k++) {
        sum += gradient[k] * departure[k];
      }
      return sum;
    }

    /** The factor √(ν/χ²) of this draw, for whatever else is to follow the same law. */
    public double stretch() {
      return stretch;
    }

    /** A seed for further random numbers that belong to this draw. */
    public long seed() {
      return seed;
    }
  }
}
