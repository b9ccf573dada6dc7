package isowright.technology;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import java.util.Optional;

/**
 * Constant elasticity of substitution in two stages: inputs are grouped, each group makes a
 * composite with its own elasticity, and the composites make output with another.
 *
 * <pre>  ln Q = constant + ν M(−ρ; y, δ),   y_g = M(−ρ_g; z_i for i in g, δ_i|g) </pre>
 *
 * M being the log of the weighted power mean and z_i = ln x_i − ln base_i. Shares sum to one within
 * a group and over the groups; the composite of a group of one is its input. Within a group the
 * direct elasticity of substitution is σ_g = 1/(1 + ρ_g); composites replace each other with σ =
 * 1/(1 + ρ). Between inputs of different groups the elasticities of Allen and Morishima vary with
 * the mix. With P_g and p_i the tilted shares of groups and within groups (see {@link Ces}), t =
 * −ρ, i in g and j in h:
 *
 * <pre>
 *   e_i = ν P_g p_i
 *   ∂²ln f/∂ln x_i∂ln x_j = ν P_g p_i p_j (t (1 − P_g) − t_g)      i ≠ j, g = h
 *                         = −ν t P_g p_i P_h p_j                     g ≠ h
 * </pre>
 *
 * and rows of the Hessian sum to zero, because e_i is homogeneous of degree zero. Each stage passes
 * through its limits (ρ = −1, 0, ∞) as {@code PowerMean} does; with equal curvatures it is {@link
 * Ces} with shares δ_g δ_i|g.
 *
 * <p><b>Parameters</b>, in this order: {@code constant}; for every nest {@code share:<input>} of
 * its members; for every group {@code share:<group>}, a nest being called {@code labour+machines},
 * a group of one after its input; {@code rho} between groups; {@code rho:<nest>} for every nest;
 * {@code scale} (ν). Both kinds of shares are bound by their sums; what {@link Ces} says of that
 * holds here.
 *
 * <p>Sources: Sato, K. (1967), A Two-Level Constant-Elasticity-of-Substitution Production Function,
 * <i>Review of Economic Studies</i> 34, 201–218 (the form); on elasticities between groups section
 * 3 there.
 *
 * <p>Tested in {@code NestedCesTest}.
 */
public final class NestedCes implements Technology {

  /** How the form presents itself to an estimator; arranged by {@link Form#nested}. */
  public static final NonlinearForm FORM = new NestedCesForm(Optional.empty(), false);

  private static final double SUM_TOLERANCE = 1e-9;

  private final InputScale scaling;
  private final Nests nests;
  private final double constant;

  /** δ_i|g by group. */
  private final double[][] within;

  private final double[] between;
  private final double rho;

  /** ρ_g by group; that of a group of one is not used. */
  private final double[] nestRho;

  private final double scale;
  private final double[] zeros;

  /** Unchecked; shares must sum to one. */
  NestedCes(
      InputScale scaling,
      Nests nests,
      double constant,
      double[][] within,
      double[] between,
      double rho,
      double[] nestRho,
      double scale) {
    this.scaling = scaling;
    this.nests = nests;
    this.constant = constant;
    this.within = Arrays.stream(within).map(double[]::clone).toArray(double[][]::new);
    this.between = between.clone();
    this.rho = rho;
    this.nestRho = nestRho.clone();
    this.scale = scale;
    this.zeros = new double[between.length];
  }

  /**
   * A technology with these parameters, checked.
   *
   * @param groups the inputs by group, every input once
   * @param within the shares within each group, parallel to {@code groups}, positive, summing to
   *     one
   * @param between the shares of the groups, positive, summing to one
   * @param rho ρ between groups, from −1 (linear) to +∞ (Leontief)
   * @param nestRho ρ_g of each group, likewise; that of a group of one is not used
   * @throws IllegalArgumentException saying which value is not admissible, and what is
   */
  public static NestedCes of(
      List<String> inputs,
      double[] base,
      List<List<String>> groups,
      double constant,
      double[][] within,
      double[] between,
      double rho,
      double[] nestRho,
      double scale) {
    Nests nests = Nests.of(inputs, groups);
    InputScale scaling = new InputScale(inputs, base);
    int count = nests.count();
    demand(within.length == count, "number of groups with shares", within.length, "give " + count);
    demand(nestRho.length == count, "number of group curvatures", nestRho.length, "give " + count);
    double[][] normalised = new double[count][];
    for (int g = 0; g < count; g++) {
      String name = "shares within " + nests.name(g, inputs);
      normalised[g] = shares(within[g], nests.members(g).length, name);
      demand(
          !nests.nest(g) || nestRho[g] >= -1, "rho of " + nests.name(g, inputs), nestRho[g], RHO);
    }
    demand(rho >= -1, "rho", rho, RHO);
    demand(scale > 0 && scale < Double.POSITIVE_INFINITY, "scale", scale, "give a positive number");
    demand(Double.isFinite(constant), "constant", constant, "give a finite number");
    return new NestedCes(
        scaling,
        nests,
        constant,
        normalised,
        shares(between, count, "shares of the groups"),
        rho,
        nestRho,
        scale);
  }

  private static final String RHO = "give −1 (linear) or more; substitution is 1/(1 + rho)";

  private static double[] shares(double[] raw, int size, String what) {
    demand(raw.length == size, "number of " + what, raw.length, "give " + size);
    for (double share : raw) {
      demand(share > 0, "one of the " + what, share, "give positive numbers");
    }
    double sum = Arrays.stream(raw).sum();
    demand(Math.abs(sum - 1) <= SUM_TOLERANCE, "sum of the " + what, sum, "let them sum to 1");
    return Ces.normalised(raw);
  }

  private static void demand(boolean met, String what, double value, String remedy) {
    if (!met) {
      throw new IllegalArgumentException(
          String.format(
              Locale.ROOT, "nested constant elasticity: %s is %s; %s", what, value, remedy));
    }
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
    for (int g : nests.nests()) {
      for (int i : nests.members(g)) {
        names.add("nest-share:" + scaling.names().get(i));
      }
    }
    for (int g = 0; g < nests.count(); g++) {
      names.add("share:" + nests.name(g, scaling.names()));
    }
    names.addAll(NestedCesForm.curvatureNames(nests, scaling.names()));
    names.add("scale");
    return List.copyOf(names);
  }

  @Override
  public double[] parameters() {
    double[] all = new double[parameterNames().size()];
    int at = 0;
    all[at++] = constant;
    for (int g : nests.nests()) {
      for (double share : within[g]) {
        all[at++] = share;
      }
    }
    for (double share : between) {
      all[at++] = share;
    }
    all[at++] = rho;
    for (int g : nests.nests()) {
      all[at++] = nestRho[g];
    }
    all[at] = scale;
    return all;
  }

  @Override
  public NestedCes withParameters(double[] parameters) {
    scaling.require(parameters, parameterNames().size(), "parameters");
    int at = 1;
    double[][] moved = new double[nests.count()][];
    for (int g = 0; g < moved.length; g++) {
      int size = nests.members(g).length;
      moved[g] = within[g];
      if (nests.nest(g)) {
        moved[g] = Ces.normalised(Arrays.copyOfRange(parameters, at, at + size));
        at += size;
      }
    }
    double[] groups = Ces.normalised(Arrays.copyOfRange(parameters, at, at + moved.length));
    at += moved.length;
    double outer = parameters[at++];
    double[] inner = nestRho.clone();
    for (int g : nests.nests()) {
      inner[g] = parameters[at++];
    }
    return new NestedCes(
        scaling, nests, parameters[0], moved, groups, outer, inner, parameters[at]);
  }

  @Override
  public NestedCes shifted(double logShift) {
    return new NestedCes(scaling, nests, constant + logShift, within, between, rho, nestRho, scale);
  }

  @Override
  public double logOutput(double[] logInputs) {
    return constant + scale * PowerMean.log(composites(logInputs), zeros, between, -rho);
  }

  /** y, the log of each group's composite relative to the base. */
  private double[] composites(double[] logInputs) {
    double[] y = new double[nests.count()];
    for (int g = 0; g < y.length; g++) {
      y[g] = PowerMean.log(part(logInputs, g), part(scaling.logBase(), g), within[g], -nestRho[g]);
    }
    return y;
  }

  private double[] part(double[] all, int group) {
    int[] members = nests.members(group);
    double[] part = new double[members.length];
    for (int m = 0; m < part.length; m++) {
      part[m] = all[members[m]];
    }
    return part;
  }

  /** p, the tilted shares within a group. */
  private double[] tilted(double[] logInputs, int group) {
    double[] tilted = new double[within[group].length];
    PowerMean.tilted(
        part(logInputs, group),
        part(scaling.logBase(), group),
        within[group],
        -nestRho[group],
        tilted);
    return tilted;
  }

  /** P, the tilted shares of the groups. */
  private double[] tilted(double[] composites) {
    double[] tilted = new double[composites.length];
    PowerMean.tilted(composites, zeros, between, -rho, tilted);
    return tilted;
  }

  @Override
  public void logGradient(double[] logInputs, double[] into) {
    double[] groups = tilted(composites(logInputs));
    for (int g = 0; g < groups.length; g++) {
      double[] p = tilted(logInputs, g);
      int[] members = nests.members(g);
      for (int m = 0; m < members.length; m++) {
        into[members[m]] = scale * groups[g] * p[m];
      }
    }
  }

  @Override
  public void logHessian(double[] logInputs, double[][] into) {
    int n = scaling.size();
    double[] groups = tilted(composites(logInputs));
    double[] share = new double[n];
    int[] group = new int[n];
    for (int g = 0; g < groups.length; g++) {
      double[] p = tilted(logInputs, g);
      int[] members = nests.members(g);
      for (int m = 0; m < members.length; m++) {
        share[members[m]] = p[m];
        group[members[m]] = g;
      }
    }
    for (int i = 0; i < n; i++) {
      for (int j = 0; j < i; j++) {
        double entry = cross(groups, group[i], group[j], share[i] * share[j]);
        into[i][j] = entry;
        into[j][i] = entry;
      }
    }
    for (int i = 0; i < n; i++) {
      double others = 0;
      for (int j = 0; j < n; j++) {
        others += i == j ? 0 : into[i][j];
      }
      into[i][i] = -others;
    }
  }

  /** An entry off the diagonal, for inputs in groups g and h with this product of shares. */
  private double cross(double[] groups, int g, int h, double shares) {
    if (g != h) {
      double both = groups[g] * groups[h] * shares;
      return both == 0 ? 0 : scale * rho * both;
    }
    double others = 0;
    for (int k = 0; k < groups.length; k++) {
      others += k == g ? 0 : groups[k];
    }
    double inside = groups[g] * shares;
    double outer = inside * others == 0 ? 0 : rho * inside * others;
    return inside == 0 ? 0 : scale * (nestRho[g] * inside - outer);
  }

  @Override
  public void parameterGradient(double[] logInputs, double[] into) {
    double[] y = composites(logInputs);
    double[] groups = tilted(y);
    int at = 0;
    into[at++] = 1;
    for (int g : nests.nests()) {
      double[] z = part(logInputs, g);
      double[] base = part(scaling.logBase(), g);
      PowerMean.shareSlopes(z, base, within[g], -nestRho[g], into, at);
      for (int m = 0; m < z.length; m++) {
        into[at++] *= scale * groups[g];
      }
    }
    PowerMean.shareSlopes(y, zeros, between, -rho, into, at);
    for (int g = 0; g < y.length; g++) {
      into[at++] *= scale;
    }
    into[at++] = -scale * PowerMean.orderSlope(y, zeros, between, -rho);
    for (int g : nests.nests()) {
      double[] z = part(logInputs, g);
      double[] base = part(scaling.logBase(), g);
      into[at++] = -scale * groups[g] * PowerMean.orderSlope(z, base, within[g], -nestRho[g]);
    }
    into[at] = PowerMean.log(y, zeros, between, -rho);
  }

  @Override
  public Optional<ConditionalDemand> conditionalDemand() {
    boolean equal = true;
    for (int g : nests.nests()) {
      equal &= nestRho[g] == rho;
    }
    if (equal) {
      double[] shares = new double[scaling.size()];
      for (int g = 0; g < between.length; g++) {
        int[] members = nests.members(g);
        for (int m = 0; m < members.length; m++) {
          shares[members[m]] = between[g] * within[g][m];
        }
      }
      return CesDemand.of(scaling.logBase(), constant, shares, rho, scale);
    }
    return NestedCesDemand.of(
        nests, scaling.logBase(), constant, within, between, rho, nestRho, scale);
  }
}
