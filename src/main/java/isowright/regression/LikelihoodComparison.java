package isowright.regression;

import java.util.SplittableRandom;
import java.util.random.RandomGenerator;
import org.apache.commons.math3.linear.Array2DRowRealMatrix;
import org.apache.commons.math3.linear.EigenDecomposition;
import org.apache.commons.math3.linear.RealMatrix;

/**
 * Which of two regressions of the same response is nearer to the truth, when neither contains the
 * other? Vuong's comparison of their normal likelihoods.
 *
 * <p>Row i contributes d_i = −½ (1 − h_i) ln(s₁²/s₂²) − ½ (r₁ᵢ²/s₁² − r₂ᵢ²/s₂²), with residuals r,
 * s² = SSR/(N − a), and h_i the leverage of the a effects that were removed (the likelihood is then
 * that of what varies within groups). A unit is a row, or a group whose rows may depend on one
 * another; D_u is the sum of d over a unit, LR = Σ D_u, and ω̂² = Σ (D_u − D̄)²/n over n units.
 *
 * <ul>
 *   <li>Can the two be told apart at all? If they describe every row alike, n ω̂² follows Σ λ_j²
 *       χ²(1), λ the eigenvalues of J Σ: Σ the covariance of the two normalised scores summed over
 *       units, J = diag(I, −I). Regressions that share a special case (as CES and translog share
 *       Cobb-Douglas) are alike where that case holds, and then the second test has no meaning.
 *   <li>Is one nearer? z = LR/(√n ω̂), standard normal where both are equally near; above zero the
 *       first is nearer. With groups as units, Student's t with n − 1 degrees of freedom and the
 *       divisor n − 1 in place of n.
 * </ul>
 *
 * <p>Corrected for their numbers of parameters p₁, p₂: LR − (p₁ − p₂) after Akaike, LR − (p₁ − p₂)
 * ln(N)/2 after Schwarz.
 *
 * <p>With groups as units the likelihood of a group is taken as the product of those of its rows,
 * which is not its likelihood if they depend on one another: the comparison then asks which
 * regression describes single rows better, and only its uncertainty allows for the dependence.
 *
 * <p>Source: Q. H. Vuong 1989, Econometrica 57, 307–333: theorems 3.3, 4.1, 5.1, equations 5.6 and
 * 5.7 for the corrections (numbers from memory). Groups: our own extension. Tested in {@code
 * LikelihoodComparisonTest} against R and for size.
 *
 * @param ratio LR
 * @param variance ω̂²
 * @param units n
 * @param grouped whether a unit is a group
 * @param parameters p₁ − p₂
 * @param rows N
 * @param weights λ_j²
 */
public record LikelihoodComparison(
    double ratio,
    double variance,
    int units,
    boolean grouped,
    int parameters,
    int rows,
    double[] weights) {

  /** Eigenvalues below this share of the largest are rounding. */
  private static final double NOTHING = 1e-12;

  /** Copies the weights. */
  public LikelihoodComparison {
    weights = weights.clone();
  }

  @Override
  public double[] weights() {
    return weights.clone();
  }

  /** How LR is corrected for the numbers of parameters. */
  public enum Correction {
    /** Not at all. */
    NONE,
    /** After Akaike. */
    AKAIKE,
    /** After Schwarz. */
    SCHWARZ
  }

  /** n ω̂², the statistic of whether the two can be told apart. */
  public double distance() {
    return units * variance;
  }

  /** z or t; NaN where the two are the same. */
  public double statistic(Correction correction) {
    double less =
        switch (correction) {
          case NONE -> 0;
          case AKAIKE -> parameters;
          case SCHWARZ -> parameters * Math.log(rows) / 2;
        };
    double divisor = grouped ? units - 1 : units;
    double spread = Math.sqrt(units * variance / divisor);
    return (ratio - less) / (Math.sqrt(units) * spread);
  }

  /**
   * Compares two regressions, rows being independent.
   *
   * @param first a design with the same rows as the second; its linearisation where the model is
   *     not linear
   * @param one its fit
   */
  public static LikelihoodComparison byRows(
      Design first, LinearFit one, Design second, LinearFit two) {
    return of(first, one, second, two, Groups.ofSingleRows(first.rows()), false);
  }

  /** The same, rows of a group being dependent. */
  public static LikelihoodComparison byGroups(
      Design first, LinearFit one, Design second, LinearFit two) {
    return of(first, one, second, two, first.groups(), true);
  }

  private static LikelihoodComparison of(
      Design first, LinearFit one, Design second, LinearFit two, Groups units, boolean grouped) {
    Blocks blocks = Blocks.of(first.groups());
    Sums sums =
        blocks.gather(
            one.columns().size() + 1,
            () ->
                new Sums(
                    new Side(first, one, blocks.longest()),
                    new Side(second, two, blocks.longest())),
            (into, from, to, buffer) -> into.add(from, to, buffer, units),
            Sums::add);
    int n = units.count();
    double mean = sums.ratio / n;
    int p = one.rank() + 1;
    return new LikelihoodComparison(
        sums.ratio,
        Math.max(0, sums.squares / n - mean * mean),
        n,
        grouped,
        one.rank() - two.rank(),
        first.rows(),
        weights(sums.symmetric(), p));
  }

  /** Sums over units: log-likelihood ratios, their squares, products of scores. */
  private static final class Sums {
    private final Side left;
    private final Side right;
    private final double[] score;
    private final double[][] products;
    private double ratio;
    private double squares;

    Sums(Side left, Side right) {
      this.left = left;
      this.right = right;
      this.score = new double[left.size() + right.size()];
      this.products = new double[score.length][score.length];
    }

    void add(int from, int to, double[][] buffer, Groups units) {
      left.read(from, to, buffer);
      right.read(from, to, right.own);
      for (int u = units.of(from); u < units.count() && units.start(u) < to; u++) {
        java.util.Arrays.fill(score, 0);
        double d = 0;
        for (int i = units.start(u) - from; i < units.end(u) - from; i++) {
          d += left.logDensity(i) - right.logDensity(i);
          left.addScore(i, buffer, score, 0);
          right.addScore(i, right.own, score, left.size());
        }
        ratio += d;
        squares += d * d;
        for (int i = 0; i < score.length; i++) {
          for (int j = 0; j <= i; j++) {
            products[i][j] += score[i] * score[j];
          }
        }
      }
    }

    void add(Sums other) {
      ratio += other.ratio;
      squares += other.squares;
      for (int i = 0; i < products.length; i++) {
        for (int j = 0; j <= i; j++) {
          products[i][j] += other.products[i][j];
        }
      }
    }

    double[][] symmetric() {
      for (int i = 0; i < products.length; i++) {
        for (int j = 0; j < i; j++) {
          products[j][i] = products[i][j];
        }
      }
      return products;
    }
  }

  /** The squared eigenvalues of J Σ, those of the symmetric Σ^½ J Σ^½. */
  private static double[] weights(double[][] covariance, int p) {
    EigenDecomposition own = new EigenDecomposition(new Array2DRowRealMatrix(covariance, false));
    int size = covariance.length;
    double[][] root = new double[size][size];
    for (int k = 0; k < size; k++) {
      double length = Math.sqrt(Math.max(0, own.getRealEigenvalue(k)));
      double[] vector = own.getEigenvector(k).toArray();
      for (int i = 0; i < size; i++) {
        for (int j = 0; j < size; j++) {
          root[i][j] += length * vector[i] * vector[j];
        }
      }
    }
    RealMatrix half = new Array2DRowRealMatrix(root, false);
    double[][] signed = half.getData();
    for (int i = p; i < size; i++) {
      for (int j = 0; j < size; j++) {
        signed[i][j] = -signed[i][j];
      }
    }
    double[][] middle = half.multiply(new Array2DRowRealMatrix(signed, false)).getData();
    for (int i = 0; i < size; i++) {
      for (int j = 0; j < i; j++) {
        middle[i][j] = middle[j][i];
      }
    }
    double[] eigenvalues =
        new EigenDecomposition(new Array2DRowRealMatrix(middle, false)).getRealEigenvalues();
    double most = 0;
    for (int k = 0; k < size; k++) {
      eigenvalues[k] *= eigenvalues[k];
      most = Math.max(most, eigenvalues[k]);
    }
    double least = NOTHING * most;
    return java.util.Arrays.stream(eigenvalues).filter(w -> w > least).sorted().toArray();
  }

  /** Draws behind a p-value of a weighted sum: its standard error is below .0036, .0016 at .05. */
  private static final int DRAWS = 20_000;

  private static final long SEED = 19_890_307;

  /**
   * P(Σ w_j χ²_j(1) ≥ x) by {@value #DRAWS} draws, always the same ones.
   *
   * @param weights w, positive
   */
  public static double weightedSumBeyond(double[] weights, double x) {
    RandomGenerator random = new SplittableRandom(SEED);
    int beyond = 0;
    for (int d = 0; d < DRAWS; d++) {
      double sum = 0;
      for (double weight : weights) {
        double z = random.nextGaussian();
        sum += weight * z * z;
      }
      beyond += sum >= x ? 1 : 0;
    }
    return beyond / (double) DRAWS;
  }

  /** A regression's log densities and normalised scores, block by block. */
  private static final class Side {
    private final Design design;
    private final double[] coefficients;
    private final double[][] factor;
    private final int[] kept;
    private final double variance;
    private final double informations;
    private final Residuals working;
    private final double[] residuals;
    private final double[] room;
    private final double[][] own;

    Side(Design design, LinearFit fit, int longest) {
      this.design = design;
      this.coefficients = fit.coefficients();
      this.factor = fit.inverseFactor();
      this.kept = fit.kept();
      double free = fit.rows() - fit.absorbed();
      this.variance = fit.ssr() / free;
      this.informations = Math.sqrt(2 * free);
      this.working = new Residuals(longest);
      this.residuals = new double[longest];
      this.room = new double[longest];
      this.own = new double[coefficients.length + 1][longest];
    }

    void read(int from, int to, double[][] block) {
      int rows = to - from;
      design.fill(from, to, block);
      System.arraycopy(working.of(block, rows, coefficients), 0, residuals, 0, rows);
      Leverage.rotate(block, rows, factor, kept);
      for (int i = 0; i < rows; i++) {
        room[i] = 1 - design.absorbedLeverage(from + i);
      }
    }

    /** The number of parameters, the variance among them. */
    int size() {
      return kept.length + 1;
    }

    double logDensity(int i) {
      return -room[i] / 2 * Math.log(variance) - residuals[i] * residuals[i] / (2 * variance);
    }

    /** Adds the scores in parameters whose information over all rows is one. */
    void addScore(int i, double[][] block, double[] into, int offset) {
      double scaled = residuals[i] / Math.sqrt(variance);
      for (int k = 0; k < kept.length; k++) {
        into[offset + k] += block[kept[k]][i] * scaled;
      }
      into[offset + kept.length] += (scaled * scaled - room[i]) / informations;
    }
  }
}
