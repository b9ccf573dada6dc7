package isowright.technology;

import java.util.Arrays;
import java.util.Optional;

/**
 * Conditional demand of a nested technology: in closed form where every input is free, and by
 * solving for one number where some are fixed.
 *
 * <p>With y_i = ln x_i − ln base_i, ω_i = ln w_i + ln base_i, T = (ln Q − constant)/ν, σ = 1/(1+ρ)
 * and M the log of the weighted power mean, the two stages are {@link CesDemand} twice:
 *
 * <pre>
 *   ln c_g = M(1 − σ_g; ω_i − ln δ_i, δ_i)           the least cost of a unit of composite g
 *   ln c   = M(1 − σ; ln c_g − ln δ_g, δ_g)
 *   Y_g    = T − σ (ln c_g − ln δ_g − ln c)
 *   y_i    = Y_g − σ_g (ω_i − ln δ_i − ln c_g)
 * </pre>
 *
 * <p><b>Fixed inputs.</b> With λ the multiplier of e^T, L = ln λ + T and t = −ρ, the outlay on a
 * free composite is its share P_g = δ_g e^{t(Y_g − T)} of e^L, which gives Y_g for each L. In a
 * nest with some inputs fixed the free ones make a composite u of their own with unit cost c_F and
 * weight D = Σ_free δ_i, and
 *
 * <pre>  ln c_F + u = L + ln δ_g + t (Y_g − T) + ln D + t_g (u − Y_g) </pre>
 *
 * whose left side rises faster in u than its right side, so that u follows from L. M over the Y_g
 * rises with L, and L is found where it is T. Both searches are Newton's method inside a bracket.
 *
 * <p>Source: the dual of two stages of constant elasticity follows from Sato (1967), <i>Review of
 * Economic Studies</i> 34, 201–218, by the argument of Arrow, Chenery, Minhas and Solow (1961) at
 * each stage. Tested in {@code NestedCesTest} and {@code ConditionalDemandTest}.
 */
final class NestedCesDemand implements ConditionalDemand.Smooth {

  private final Nests nests;
  private final double[] logBase;
  private final double constant;
  private final double[][] within;
  private final double[] between;
  private final double rho;
  private final double[] nestRho;
  private final double scale;

  private NestedCesDemand(
      Nests nests,
      double[] logBase,
      double constant,
      double[][] within,
      double[] between,
      double rho,
      double[] nestRho,
      double scale) {
    this.nests = nests;
    this.logBase = logBase;
    this.constant = constant;
    this.within = within;
    this.between = between;
    this.rho = rho;
    this.nestRho = nestRho;
    this.scale = scale;
  }

  /**
   * The demand; empty outside the economic region, and where a stage has straight isoquants or
   * corners, since a mix then has no single shape.
   */
  static Optional<ConditionalDemand> of(
      Nests nests,
      double[] logBase,
      double constant,
      double[][] within,
      double[] between,
      double rho,
      double[] nestRho,
      double scale) {
    boolean smooth = scale > 0 && smooth(rho) && positive(between);
    for (int g : nests.nests()) {
      smooth &= smooth(nestRho[g]) && positive(within[g]);
    }
    return smooth
        ? Optional.of(
            new NestedCesDemand(nests, logBase, constant, within, between, rho, nestRho, scale))
        : Optional.empty();
  }

  private static boolean smooth(double rho) {
    return rho > -1 && rho < Double.POSITIVE_INFINITY;
  }

  private static boolean positive(double[] shares) {
    for (double share : shares) {
      if (!(share > 0)) {
        return false;
      }
    }
    return true;
  }

  @Override
  public Reach logMix(double logTarget, double[] logPrices, boolean[] fixed, double[] logMix) {
    double target = (logTarget - constant) / scale;
    Group[] groups = new Group[nests.count()];
    boolean allFree = true;
    boolean noneFree = true;
    for (int g = 0; g < groups.length; g++) {
      groups[g] = new Group(g, logPrices, fixed, logMix);
      allFree &= groups[g].fixedCount == 0;
      noneFree &= groups[g].whole();
    }
    if (!allFree) {
      if (noneFree || output(groups, Double.POSITIVE_INFINITY) <= target) {
        return Reach.TOO_LITTLE;
      }
      if (output(groups, Double.NEGATIVE_INFINITY) >= target) {
        return Reach.TOO_MUCH;
      }
    }
    double unitCost = unitCost(groups);
    double outlay = allFree ? target + unitCost : outlay(groups, target, target + unitCost);
    for (Group group : groups) {
      if (allFree) {
        group.composite = target - (group.relativeCost() - unitCost) / (1 + rho);
      } else {
        group.settle(outlay, target);
      }
      group.write(fixed, logMix);
    }
    return Reach.REACHED;
  }

  /** ln c of the free composites; the first guess where some inputs are fixed. */
  private double unitCost(Group[] groups) {
    double[] relative = new double[groups.length];
    for (int g = 0; g < groups.length; g++) {
      relative[g] = groups[g].relativeCost();
    }
    return PowerMean.log(relative, new double[groups.length], between, rho / (1 + rho));
  }

  /** M over the composites where every free input is at a bound, relative to the base. */
  private double output(Group[] groups, double bound) {
    double[] y = new double[groups.length];
    for (int g = 0; g < groups.length; g++) {
      y[g] = groups[g].compositeAt(bound);
    }
    return PowerMean.log(y, new double[groups.length], between, -rho);
  }

  /** L at which the composites make the target. */
  private double outlay(Group[] groups, double target, double guess) {
    return Rising.root(
        guess,
        (outlay, slope) -> {
          double[] y = new double[groups.length];
          double[] slopes = new double[groups.length];
          for (int g = 0; g < y.length; g++) {
            slopes[g] = groups[g].settle(outlay, target);
            y[g] = groups[g].composite;
          }
          double[] zeros = new double[y.length];
          double[] tilted = new double[y.length];
          PowerMean.tilted(y, zeros, between, -rho, tilted);
          for (int g = 0; g < y.length; g++) {
            slope[0] += tilted[g] * slopes[g];
          }
          return PowerMean.log(y, zeros, between, -rho) - target;
        });
  }

  /** One group at the prices asked, with its fixed inputs where they are. */
  private final class Group {

    private final int group;
    private final int[] members;

    /** z of fixed members, in order; the free composite follows. */
    private final double[] levels;

    /** The shares parallel to {@link #levels}. */
    private final double[] weights;

    /** v_i of free members: ω_i less the log of the share among the free. */
    private final double[] costs;

    private final double[] freeShares;
    private final double freeSum;

    /** ln c_F. */
    private final double freeCost;

    private final double order;
    private int fixedCount;
    private double composite;

    Group(int group, double[] logPrices, boolean[] fixed, double[] logMix) {
      this.group = group;
      this.members = nests.members(group);
      this.order = -nestRho[group];
      double sum = 0;
      for (int m = 0; m < members.length; m++) {
        fixedCount += fixed[members[m]] ? 1 : 0;
        sum += fixed[members[m]] ? 0 : within[group][m];
      }
      int free = members.length - fixedCount;
      freeSum = sum;
      levels = new double[fixedCount + 1];
      weights = new double[fixedCount + 1];
      weights[fixedCount] = sum;
      costs = new double[free];
      freeShares = new double[free];
      int atFixed = 0;
      int atFree = 0;
      for (int m = 0; m < members.length; m++) {
        int i = members[m];
        if (fixed[i]) {
          levels[atFixed] = logMix[i] - logBase[i];
          weights[atFixed++] = within[group][m];
        } else {
          freeShares[atFree] = within[group][m] / sum;
          costs[atFree] = logPrices[i] + logBase[i] - Math.log(freeShares[atFree]);
          atFree++;
        }
      }
      double sigma = 1 / (1 - order);
      freeCost =
          free == 0
              ? Double.NaN
              : PowerMean.log(costs, new double[free], freeShares, -order * sigma);
    }

    boolean whole() {
      return fixedCount == members.length;
    }

    /** ln c_g − ln δ_g; of a group that is fixed, what its share would cost at a price of one. */
    double relativeCost() {
      return (whole() ? 0 : freeCost) - Math.log(between[group]);
    }

    /** Y_g with the free composite at u. */
    double compositeAt(double free) {
      if (fixedCount == 0) {
        return free;
      }
      double[] at = levels.clone();
      at[fixedCount] = free;
      if (!whole()) {
        return PowerMean.log(at, new double[at.length], weights, order);
      }
      double[] onlyFixed = Arrays.copyOf(at, fixedCount);
      double[] shares = Arrays.copyOf(weights, fixedCount);
      return PowerMean.log(onlyFixed, new double[fixedCount], shares, order);
    }

    /** Sets u and Y_g for an outlay e^L; returns ∂Y_g/∂L. */
    double settle(double outlay, double target) {
      if (whole()) {
        composite = compositeAt(0);
        return 0;
      }
      double share = Math.log(between[group]);
      double t = -rho;
      if (fixedCount == 0) {
        levels[0] = (outlay + share - t * target - freeCost) / (1 - t);
        composite = levels[0];
        return 1 / (1 - t);
      }
      double guess = (outlay + share - t * target - freeCost) / (1 - t);
      double logSum = Math.log(freeSum);
      double[] weight = new double[1];
      double[] lastSlope = new double[1];
      levels[fixedCount] =
          Rising.root(
              guess,
              (u, slope) -> {
                double y = compositeAt(u);
                weight[0] = Math.exp(logSum + order * (u - y));
                slope[0] = (1 - order) * (1 - weight[0]) + (1 - t) * weight[0];
                lastSlope[0] = slope[0];
                return freeCost
                    + u
                    - (outlay + share + t * (y - target) + logSum + order * (u - y));
              });
      composite = compositeAt(levels[fixedCount]);
      return weight[0] / lastSlope[0];
    }

    /** Writes the free members from u. */
    void write(boolean[] fixed, double[] logMix) {
      double free = fixedCount == 0 ? composite : levels[fixedCount];
      double sigma = 1 / (1 - order);
      int at = 0;
      for (int i : members) {
        if (!fixed[i]) {
          logMix[i] = free - sigma * (costs[at++] - freeCost) + logBase[i];
        }
      }
    }
  }
}
