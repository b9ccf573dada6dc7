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
 * @param concavity whether and where cost is made concave in prices
 */
public record CostSpecification(
    CostForm form,
    Equations equations,
    boolean homogeneous,
    List<Restriction> restrictions,
    boolean plantEffects,
    boolean clustered,
    int leftOut,
    double confidence,
    Concavity concavity) {

  /** Copies the list. */
  public CostSpecification {
    restrictions = List.copyOf(restrictions);
  }

  /** The same with cost as concave as the records have it. */
  public CostSpecification(
      CostForm form,
      Equations equations,
      boolean homogeneous,
      List<Restriction> restrictions,
      boolean plantEffects,
      boolean clustered,
      int leftOut,
      double confidence) {
    this(
        form,
        equations,
        homogeneous,
        restrictions,
        plantEffects,
        clustered,
        leftOut,
        confidence,
        Concavity.FREE);
  }

  /** Whether and where cost is made concave in prices. */
  public enum Concavity {
    /** Not imposed. */
    FREE,
    /** At the mean of the records: translog cost. */
    AT_MEAN,
    /** At all prices: McFadden cost. */
    EVERYWHERE;

    /** The word used in files. */
    public String word() {
      return name().toLowerCase(Locale.ROOT).replace('_', '-');
    }
  }

  /** Which equations are fitted. */
  public enum Equations {
    /** The cost equation alone, by least squares. */
    COST,
    /** The cost equation and all share equations but one. */
    SYSTEM,
    /** All share equations but one. */
    SHARES,
    /** The quantities of all inputs, for forms in levels. */
    QUANTITIES;

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
    NEUTRAL_CHANGE,
    /** Forms in levels: inputs in proportions that prices do not move. */
    NO_SUBSTITUTION;

    /** The word used in files. */
    public String word() {
      return name().toLowerCase(Locale.ROOT).replace('_', '-');
    }
  }

  /** The same, with this share equation left out. */
  public CostSpecification leavingOut(int input) {
    return with(homogeneous, restrictions, input, concavity);
  }

  /** The same with these restrictions. */
  public CostSpecification restricted(List<Restriction> imposed) {
    return with(homogeneous, imposed, leftOut, concavity);
  }

  /** The same, with or without homogeneity imposed. */
  public CostSpecification homogeneous(boolean imposed) {
    return with(imposed, restrictions, leftOut, concavity);
  }

  /** The same, concave there. */
  public CostSpecification concave(Concavity where) {
    return with(homogeneous, restrictions, leftOut, where);
  }

  private CostSpecification with(
      boolean inPrices, List<Restriction> imposed, int input, Concavity where) {
    return new CostSpecification(
        form, equations, inPrices, imposed, plantEffects, clustered, input, confidence, where);
  }
}
