package isowright.technology;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;

/**
 * Constant elasticity of substitution, n inputs:
 *
 * <pre>  Q = e^constant [Σ_i δ_i (x_i/base_i)^{−ρ}]^{−ν/ρ},   Σ δ_i = 1,  ρ ≥ −1,  ν &gt; 0 </pre>
 *
 * that is, ln Q = constant + ν M(−ρ), M the log of the weighted power mean of the inputs. Every
 * elasticity of substitution is σ = 1/(1 + ρ), at every mix and for every pair; ν is the scale
 * elasticity. With p_i the shares tilted to the mix, p_i = δ_i e^{−ρ z_i}/Σ_k δ_k e^{−ρ z_k}, z_i =
 * ln x_i − ln base_i:
 *
 * <pre>  e_i = ν p_i,    ∂²ln f/∂ln x_i∂ln x_j = −ρ ν (p_i [i = j] − p_i p_j) </pre>
 *
 * <p><b>Limits.</b> ρ = 0 is Cobb-Douglas with elasticities ν δ_i, ρ = −1 linear in the inputs (for
 * ν = 1), ρ = +∞ Leontief: ln Q = constant + ν min z_i. There the gradient is ν on the scarcest
 * input and 0 on the others (split by the shares where several are equally scarce, the limit of ρ →
 * ∞), and the Hessian 0 off the ridge and infinite on it. All three are reached without loss of
 * digits; {@code PowerMean} says how.
 *
 * <p><b>Parameters</b>, in this order: {@code constant}, {@code share:<input>} for all n inputs,
 * {@code rho}, {@code scale} (ν). The shares are bound by Σ δ_i = 1, so {@link #withParameters}
 * divides them by their sum, and {@link #parameterGradient} is the gradient of that composition:
 * its components for the shares, weighted by the shares, sum to zero, and a numerical derivative of
 * any function of the technology through {@code withParameters} is exact along the directions that
 * keep the sum. No other direction matters: the covariance of all n shares is singular by
 * construction (the shares of its every draw sum to one, so its rows for the shares sum to zero),
 * and gradient · covariance · gradient is the same whichever rule restores the sum.
 *
 * <p><b>Outside the economic region.</b> Values a little outside (ρ under −1, a share under 0) are
 * computed as the formula has them, so that derivatives and profiles can be taken at the bounds;
 * {@link #of} refuses them.
 *
 * <p>Sources: Arrow, K. J., Chenery, H. B., Minhas, B. S. and Solow, R. M. (1961), Capital-Labor
 * Substitution and Economic Efficiency, <i>Review of Economics and Statistics</i> 43, 225–250;
 * Uzawa, H. (1962), Production Functions with Constant Elasticities of Substitution, <i>Review of
 * Economic Studies</i> 29, 291–299; on the base: Klump, R. and de La Grandville, O. (2000),
 * Economic Growth and the Elasticity of Substitution, <i>American Economic Review</i> 90, 282–291.
 *
 * <p>Tested in {@code CesTest}, {@code CesPrecisionTest} (against decimal arithmetic of 80 digits)
 * and, on published values, {@code PublishedTechnologiesTest}.
 */
public final class Ces implements Technology {

  /** How the form presents itself to an estimator. */
  public static final NonlinearForm FORM = new CesForm(false);

  /** How far given shares may sum from one: what printing them to nine decimals leaves. */
  private static final double SUM_TOLERANCE = 1e-9;

  private final InputScale scaling;
  private final double constant;
  private final double[] shares;
  private final double rho;
  private final double scale;

  /** Unchecked; the shares must sum to one. */
  Ces(InputScale scaling, double constant, double[] shares, double rho, double scale) {
    scaling.require(shares, scaling.size(), "shares");
    this.scaling = scaling;
    this.constant = constant;
    this.shares = shares.clone();
    this.rho = rho;
    this.scale = scale;
  }

  /**
   * A technology with these parameters, checked.
   *
   * @param inputs the names of the inputs
   * @param base what each input is divided by, shape n, positive
   * @param constant ln Q at the base
   * @param shares δ, shape n, positive, summing to one (to 1e-9; the rest is divided away)
   * @param rho ρ, from −1 (linear) to +∞ (Leontief)
   * @param scale ν, positive
   * @throws IllegalArgumentException saying which value is not admissible, and what is
   */
  public static Ces of(
      List<String> inputs,
      double[] base,
      double constant,
      double[] shares,
      double rho,
      double scale) {
    InputScale scaling = new InputScale(inputs, base);
    scaling.require(shares, scaling.size(), "shares");
    for (int i = 0; i < shares.length; i++) {
      demand(shares[i] > 0, "share of " + inputs.get(i), shares[i], "give a positive number");
    }
    double sum = sum(shares);
    demand(Math.abs(sum - 1) <= SUM_TOLERANCE, "sum of the shares", sum, "let them sum to 1");
    demand(rho >= -1, "rho", rho, "give −1 (linear) or more; substitution is 1/(1 + rho)");
    demand(scale > 0 && scale < Double.POSITIVE_INFINITY, "scale", scale, "give a positive number");
    demand(Double.isFinite(constant), "constant", constant, "give a finite number");
    return new Ces(scaling, constant, normalised(shares), rho, scale);
  }

  /** The shares δ, shape n, summing to one. */
  public double[] shares() {
    return shares.clone();
  }

  /** The curvature ρ. */
  public double rho() {
    return rho;
  }

  /** The degree of homogeneity ν, which is the scale elasticity at every mix. */
  public double scale() {
    return scale;
  }

  /** ln Q at the base. */
  public double constant() {
    return constant;
  }

  /** The elasticity of substitution σ = 1/(1 + ρ); +∞ for the linear technology, 0 for Leontief. */
  public double substitution() {
    return FORM.substitution(rho);
  }

  /**
   * The same technology with its inputs divided by another base. Shares and constant have no
   * meaning without their base (Klump and de La Grandville 2000); this restates them, for instance
   * in the inputs' own units with a base of ones: δ′_i = e_i/ν and constant′ = ln f, both at the
   * new base.
   *
   * @param newBase shape n, positive
   * @throws IllegalArgumentException where a share vanishes at the new base, as it does for
   *     Leontief
   */
  public Ces rebased(double[] newBase) {
    InputScale restated = new InputScale(scaling.names(), newBase);
    double[] at = restated.logBase();
    double[] tilted = new double[shares.length];
    PowerMean.tilted(at, scaling.logBase(), shares, -rho, tilted);
    for (int i = 0; i < tilted.length; i++) {
      demand(
          tilted[i] != 0,
          "share of " + scaling.names().get(i) + " at the new base",
          tilted[i],
          "keep a base nearer to the mixes in question");
    }
    return new Ces(restated, logOutput(at), tilted, rho, scale);
  }

  @Override
  public String form() {
    return FORM.name();
  }

  @Override
  public List<String> inputs() {
    return scaling.names();
  }

  @Override
  public double[] base() {
    return scaling.base();
  }

  @Override
  public List<String> parameterNames() {
    List<String> names = new ArrayList<>(List.of("constant"));
    scaling.names().forEach(input -> names.add("share:" + input));
    names.add("rho");
    names.add("scale");
    return List.copyOf(names);
  }

  @Override
  public double[] parameters() {
    int n = shares.length;
    double[] all = new double[n + 3];
    all[0] = constant;
    System.arraycopy(shares, 0, all, 1, n);
    all[n + 1] = rho;
    all[n + 2] = scale;
    return all;
  }

  @Override
  public Ces withParameters(double[] parameters) {
    int n = shares.length;
    scaling.require(parameters, n + 3, "parameters");
    double[] raw = new double[n];
    System.arraycopy(parameters, 1, raw, 0, n);
    return new Ces(scaling, parameters[0], normalised(raw), parameters[n + 1], parameters[n + 2]);
  }

  @Override
  public Ces shifted(double logShift) {
    return new Ces(scaling, constant + logShift, shares, rho, scale);
  }

  @Override
  public Optional<Technology> withSubstitution(double elasticity) {
    return Optional.of(new Ces(scaling, constant, shares, FORM.curvature(elasticity), scale));
  }

  @Override
  public double logOutput(double[] logInputs) {
    return constant + scale * PowerMean.log(logInputs, scaling.logBase(), shares, -rho);
  }

  @Override
  public void logGradient(double[] logInputs, double[] into) {
    PowerMean.tilted(logInputs, scaling.logBase(), shares, -rho, into);
    for (int i = 0; i < shares.length; i++) {
      into[i] *= scale;
    }
  }

  @Override
  public void logHessian(double[] logInputs, double[][] into) {
    int n = shares.length;
    // The last row holds the tilted shares until it is its own turn, so that nothing is allocated.
    double[] last = into[n - 1];
    PowerMean.tilted(logInputs, scaling.logBase(), shares, -rho, last);
    for (int i = 0; i < n - 1; i++) {
      for (int j = 0; j < n; j++) {
        double both = last[i] * last[j];
        into[i][j] = both == 0 ? 0 : rho * scale * both;
      }
    }
    for (int j = 0; j < n - 1; j++) {
      last[j] = into[j][n - 1];
    }
    // Homogeneity: every row sums to zero. As a sum the diagonal keeps its digits where p_i nears
    // 1.
    for (int i = 0; i < n; i++) {
      double others = 0;
      for (int j = 0; j < n; j++) {
        others += i == j ? 0 : into[i][j];
      }
      into[i][i] = -others;
    }
  }

  @Override
  public void parameterGradient(double[] logInputs, double[] into) {
    int n = shares.length;
    double[] logBase = scaling.logBase();
    into[0] = 1;
    PowerMean.shareSlopes(logInputs, logBase, shares, -rho, into, 1);
    for (int i = 1; i <= n; i++) {
      into[i] *= scale;
    }
    into[n + 1] = -scale * PowerMean.orderSlope(logInputs, logBase, shares, -rho);
    into[n + 2] = PowerMean.log(logInputs, logBase, shares, -rho);
  }

  /** The closed form, the linear or the Leontief one where ρ is; empty outside the region. */
  @Override
  public Optional<ConditionalDemand> conditionalDemand() {
    return CesDemand.of(scaling.logBase(), constant, shares, rho, scale);
  }

  private static double sum(double[] values) {
    double sum = 0;
    for (double value : values) {
      sum += value;
    }
    return sum;
  }

  /** Shares divided by their sum. */
  static double[] normalised(double[] raw) {
    double sum = sum(raw);
    double[] divided = raw.clone();
    for (int i = 0; i < divided.length; i++) {
      divided[i] /= sum;
    }
    return divided;
  }

  private static void demand(boolean met, String what, double value, String remedy) {
    if (!met) {
      throw new IllegalArgumentException(
          String.format(Locale.ROOT, "constant elasticity: %s is %s; %s", what, value, remedy));
    }
  }
}
