package isowright.inference;

import isowright.cost.CostArguments;
import isowright.cost.CostForm;
import isowright.cost.GeneralisedCost;
import isowright.cost.TranslogCost;
import isowright.cost.TranslogCost.Term;
import isowright.estimation.CostData;
import isowright.estimation.CostEstimation;
import isowright.estimation.CostFit;
import isowright.estimation.CostSpecification;
import isowright.estimation.CostSpecification.Concavity;
import isowright.estimation.CostSpecification.Equations;
import isowright.estimation.CostSpecification.Restriction;
import isowright.regression.SystemFit;
import isowright.regression.WaldTest;
import java.util.ArrayList;
import java.util.List;

/**
 * The tests that belong to a cost function: homogeneity in prices and symmetry, which any cost
 * function of price-taking, cost-minimising firms obeys; and homotheticity, homogeneity in output,
 * constant returns, unit substitution, neutral technical change, which it may or may not.
 *
 * <p>Systems are compared by their likelihoods, χ² = 2 (ln L_free − ln L_held); a cost equation
 * alone by F from the sums of squares. Both take errors as equal in all rows; where rows of a firm
 * may depend on one another (clustered), tests are Wald tests in their F form with the clustered
 * covariance of the wider fit and G − 1 degrees of freedom, and one with more restrictions than G −
 * 1 is left out.
 *
 * <p>Checked against Berndt and Wood (1975): likelihood ratio of symmetry 12.84, in {@code
 * CostHypothesesTest}.
 */
public final class CostHypotheses {

  private final CostData data;
  private final CostFit fit;

  private CostHypotheses(CostData data, CostFit fit) {
    this.data = data;
    this.fit = fit;
  }

  /**
   * The tests that apply to a fit. Where cost was made concave they are those of the same equations
   * fitted freely: at the edge of what is concave likelihoods do not compare by χ².
   */
  public static List<Verdict> of(CostData data, CostFit fit) {
    CostFit free =
        fit.imposed().isEmpty()
            ? fit
            : CostEstimation.fit(data, fit.specification().concave(Concavity.FREE));
    CostHypotheses tests = new CostHypotheses(data, free);
    List<Verdict> verdicts = new ArrayList<>();
    tests.homogeneity(verdicts);
    tests.symmetry(verdicts);
    for (Restriction restriction : Restriction.values()) {
      if (tests.applies(restriction)) {
        tests.restriction(restriction, verdicts);
      }
    }
    return List.copyOf(verdicts);
  }

  private void homogeneity(List<Verdict> verdicts) {
    if (fit.function() instanceof GeneralisedCost) {
      return;
    }
    CostSpecification own = fit.specification();
    String null0 = "cost doubles when all prices double";
    if (own.clustered()) {
      clustered(
          "price-homogeneity",
          null0,
          CostEstimation.wald(data, own.homogeneous(false), true, own.homogeneous(true)),
          verdicts);
      return;
    }
    CostFit free = own.homogeneous() ? CostEstimation.fit(data, own.homogeneous(false)) : fit;
    CostFit held = own.homogeneous() ? fit : CostEstimation.fit(data, own.homogeneous(true));
    verdicts.add(compared("price-homogeneity", null0, free.system(), held.system()));
  }

  private void symmetry(List<Verdict> verdicts) {
    boolean products = fit.specification().form() == CostForm.TRANSLOG;
    if (fit.specification().equations() == Equations.COST || !products) {
      return;
    }
    String null0 = "the share equations are derivatives of one cost function";
    CostSpecification own = fit.specification();
    if (own.clustered()) {
      clustered("symmetric-shares", null0, CostEstimation.wald(data, own, false, own), verdicts);
      return;
    }
    SystemFit free = CostEstimation.withoutSymmetry(data, own);
    verdicts.add(compared("symmetric-shares", null0, free, fit.system()));
  }

  private boolean applies(Restriction restriction) {
    List<Restriction> imposed = fit.specification().restrictions();
    CostArguments arguments = data.arguments();
    if (fit.function() instanceof GeneralisedCost) {
      return !imposed.contains(restriction)
          && switch (restriction) {
            case CONSTANT_RETURNS, NO_SUBSTITUTION -> true;
            case NEUTRAL_CHANGE -> arguments.time();
            default -> false;
          };
    }
    boolean second =
        fit.function() instanceof TranslogCost own
            && own.terms().stream().anyMatch(Term::secondOrder);
    boolean translog = fit.specification().form() == CostForm.TRANSLOG;
    boolean cost = fit.specification().equations() != Equations.SHARES;
    boolean outputs = !arguments.outputs().isEmpty();
    boolean implied =
        imposed.contains(restriction)
            || imposed.contains(Restriction.CONSTANT_RETURNS)
                && restriction.ordinal() < Restriction.CONSTANT_RETURNS.ordinal()
            || imposed.contains(Restriction.HOMOGENEOUS_IN_OUTPUT)
                && restriction == Restriction.HOMOTHETIC;
    return !implied
        && switch (restriction) {
          case HOMOTHETIC -> translog && outputs;
          case HOMOGENEOUS_IN_OUTPUT -> second && outputs && cost;
          case CONSTANT_RETURNS -> outputs && cost;
          case UNIT_SUBSTITUTION -> translog;
          case NEUTRAL_CHANGE -> translog && arguments.time();
          case NO_SUBSTITUTION -> false;
        };
  }

  private void restriction(Restriction restriction, List<Verdict> verdicts) {
    List<Restriction> imposed = new ArrayList<>(fit.specification().restrictions());
    imposed.add(restriction);
    String null0 =
        switch (restriction) {
          case HOMOTHETIC -> "the mix of inputs does not depend on the scale of output";
          case HOMOGENEOUS_IN_OUTPUT ->
              "the mix does not depend on scale, and scale economies are the same at every output";
          case CONSTANT_RETURNS -> "returns to scale are constant at every output";
          case UNIT_SUBSTITUTION -> "every elasticity of substitution is one";
          case NEUTRAL_CHANGE -> "technical change saves all inputs alike";
          case NO_SUBSTITUTION -> "prices do not move the proportions of inputs";
        };
    CostSpecification narrow = fit.specification().restricted(imposed);
    if (fit.specification().clustered()) {
      clustered(
          restriction.word(),
          null0,
          CostEstimation.wald(data, fit.specification(), true, narrow),
          verdicts);
      return;
    }
    CostFit held = CostEstimation.fit(data, narrow);
    if (held.free() != fit.free()) {
      verdicts.add(compared(restriction.word(), null0, fit.system(), held.system()));
    }
  }

  /** A Wald test; left out where nothing is restricted, or more than the plants can bear. */
  private static void clustered(String name, String null0, WaldTest test, List<Verdict> verdicts) {
    if (Double.isFinite(test.f())) {
      Law law = new Law.F(test.restrictions(), test.degreesOfFreedom());
      verdicts.add(
          verdict(name, null0, test.f(), law)
              .noting("By the clustered covariance of the unrestricted fit."));
    }
  }

  private Verdict compared(String name, String null0, SystemFit free, SystemFit held) {
    double restrictions = free.rank() - (double) held.rank();
    if (fit.specification().equations() == Equations.COST) {
      double freeSsr = free.residualCovariance()[0][0];
      double heldSsr = held.residualCovariance()[0][0];
      double left = free.rows() - free.rank() - (double) free.absorbed();
      double f = Math.max(0, heldSsr - freeSsr) / restrictions / (freeSsr / left);
      return verdict(name, null0, f, new Law.F(restrictions, left));
    }
    double ratio = 2 * (free.logLikelihood() - held.logLikelihood());
    return verdict(name, null0, Math.max(0, ratio), new Law.ChiSquared(restrictions));
  }

  private static Verdict verdict(String name, String null0, double statistic, Law law) {
    double p = law.p(statistic);
    return new Verdict(name, null0, statistic, law, p, Hypotheses.sentence(null0, p));
  }
}
