package isowright.estimation;

import isowright.cost.CostForm;
import java.util.List;
import java.util.Locale;

/**
 * How a cost function is to be fitted.
 *
 * @param form its terms
 * @param equations which equations are fitted
 * @param homogeneous whether homogeneity of degree one in prices is imposed
 * @param restrictions what else is imposed
 * @param plantEffects whether each firm has a constant of its own in the cost equation
 * @param clustered whether rows of a firm may depend on one another
 * @param leftOut the input whose share equation is left out, by place
 * @param confidence the level of all intervals
 */
public record CostSpecification(
    CostForm form,
    Equations equations,
    boolean homogeneous,
    List<Restriction> restrictions,
    boolean plantEffects,
    boolean clustered,
    int leftOut,
    double confidence) {

  /** Copies the list. */
  public CostSpecification {
    restrictions = List.copyOf(restrictions);
  }

  /** Which equations are fitted. */
  public enum Equations {
    /** The cost equation alone, by least squares. */
    COST,
    /** The cost equation and all share equations but one. */
    SYSTEM,
    /** All share equations but one. */
    SHARES;

    /** The word used in files. */
    public String word() {
      return name().toLowerCase(Locale.ROOT);
    }
  }

  /** What may be imposed beside homogeneity. */
  public enum Restriction {
    /** Shares do not depend on outputs or fixed inputs: no products of prices with them. */
    HOMOTHETIC,
    /** Homothetic, and the elasticity of cost in outputs is constant. */
    HOMOGENEOUS_IN_OUTPUT,
    /** Homogeneous in output with elasticities of cost that sum to one. */
    CONSTANT_RETURNS,
    /** No products of prices: all elasticities of substitution are one. */
    UNIT_SUBSTITUTION,
    /** No products of prices with time. */
    NEUTRAL_CHANGE;

    /** The word used in files. */
    public String word() {
      return name().toLowerCase(Locale.ROOT).replace('_', '-');
    }
  }

  /** The same, with this share equation left out. */
  public CostSpecification leavingOut(int input) {
    return new CostSpecification(
        form, equations, homogeneous, restrictions, plantEffects, clustered, input, confidence);
  }

  /** The same with these restrictions. */
  public CostSpecification restricted(List<Restriction> imposed) {
    return new CostSpecification(
        form, equations, homogeneous, imposed, plantEffects, clustered, leftOut, confidence);
  }

  /** The same, with or without homogeneity imposed. */
  public CostSpecification homogeneous(boolean imposed) {
    return new CostSpecification(
        form, equations, imposed, restrictions, plantEffects, clustered, leftOut, confidence);
  }
}
