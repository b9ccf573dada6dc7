package isowright.review;

import isowright.leastcost.Contraction;
import isowright.leastcost.LeastCost;
import isowright.leastcost.Minimiser;
import isowright.leastcost.Plan;
import isowright.leastcost.Question;
import isowright.technology.Technology;
import java.util.OptionalDouble;

/**
 * How does a filed cost compare with the least cost of the same output at the same prices, and
 * where does the gap come from?
 *
 * <p>With x the mix a plant used, w its prices, Q its output, C(w, Q) least cost and θ the factor
 * by which the whole mix would shrink to yield just Q, f(θ x) = Q:
 *
 * <pre>  gap = filed − C(w, Q) = (filed − Σ w x)  +  (Σ w x − θ Σ w x)  +  (θ Σ w x − C(w, Q))
 *                             unreconciled        technical             mix </pre>
 *
 * <p>The unreconciled part is what the filing holds beyond price times quantity. The technical part
 * is what the same output would have cost less with the same proportions at the productivity of the
 * reference technology; it is negative where the plant does better than the reference. The mix part
 * (allocative in the literature) is never negative. None of the parts is waste: what a technology
 * does not explain may be quality, location, age of plant, errors of record, or the technology's
 * own error.
 *
 * <p>Where no multiple of the mix yields Q the gap is not split: the remainder is Σ w x − C(w, Q).
 *
 * <p><b>Limits of the split</b> (Kopp and Diewert 1982): it is made at the recorded output, by
 * shrinking inputs. For a homothetic technology any other radial direction gives the same ratios;
 * for one that is not (a translog without restrictions, say) it would give others, and {@link
 * Gap#splitDependsOnDirection} says so. The gap itself does not depend on it.
 *
 * <p>Sources: Farrell, M. J. (1957), The Measurement of Productive Efficiency, <i>Journal of the
 * Royal Statistical Society</i> A 120, 253–290; Kopp, R. J. and Diewert, W. E. (1982), The
 * Decomposition of Frontier Cost Function Deviations into Measures of Technical and Allocative
 * Efficiency, <i>Journal of Econometrics</i> 19, 319–331. Tested in {@code FiledCostTest}.
 */
public final class FiledCost {

  private final Technology reference;
  private final LeastCost leastCost;

  private FiledCost(Technology reference, LeastCost leastCost) {
    this.reference = reference;
    this.leastCost = leastCost;
  }

  /** Filed costs held against this technology. */
  public static FiledCost against(Technology reference) {
    return new FiledCost(reference, Minimiser.of(reference));
  }

  /**
   * The gap of one plant in one period, all inputs being free to change.
   *
   * @param mix the inputs used x, shape n, positive
   * @param output Q, positive
   * @param prices w, shape n, positive
   * @param filed the filed cost
   */
  public Gap gap(double[] mix, double output, double[] prices, double filed) {
    return gap(mix, Question.of(output, prices), filed);
  }

  /**
   * The gap where some inputs are held or limited; output and prices are those of the question.
   *
   * @param mix the inputs used x, shape n, positive
   * @param filed the filed cost
   * @throws IllegalArgumentException where a quantity is not positive or the filed cost not a
   *     number
   */
  public Gap gap(double[] mix, Question question, double filed) {
    return measured(mix, question, filed).gap();
  }

  /**
   * A gap with the plan behind it.
   *
   * @param gap the gap
   * @param plan the least-cost plan
   */
  record Measured(Gap gap, Plan plan) {}

  /** The gap and the least-cost plan from which it follows. */
  Measured measured(double[] mix, Question question, double filed) {
    require(mix, question, filed);
    Plan plan = leastCost.plan(question);
    double atPrices = atPrices(mix, question);
    return measured(mix, question, filed, plan, mixRatioAtOwnOutput(mix, question, atPrices, plan));
  }

  /**
   * Least cost, the gap, its technical and its mix part by another technology that is not far from
   * one whose plan is known; NaN where there is none.
   *
   * @param near that plan
   */
  public double[] parts(double[] mix, Question question, double filed, Plan near) {
    Plan plan = leastCost.plan(question, near);
    Gap gap = measured(mix, question, filed, plan, Double.NaN).gap();
    return new double[] {gap.leastCost(), gap.gap(), gap.technical(), gap.mix()};
  }

  private static double atPrices(double[] mix, Question question) {
    double atPrices = 0;
    for (int i = 0; i < mix.length; i++) {
      atPrices += question.price(i) * mix[i];
    }
    return atPrices;
  }

  private Measured measured(
      double[] mix, Question question, double filed, Plan plan, double mixRatioAtOwnOutput) {
    double atPrices = atPrices(mix, question);
    double unreconciled = filed - atPrices;
    OptionalDouble theta = Contraction.onto(reference, mix, question.target());
    double contraction = theta.orElse(Double.NaN);
    double technical = atPrices - contraction * atPrices;
    double inMix = contraction * atPrices - plan.cost();
    boolean split = theta.isPresent();
    double remainder = split ? 0 : atPrices - plan.cost();
    Gap gap =
        new Gap(
            filed,
            atPrices,
            plan.cost(),
            split ? unreconciled + technical + inMix : unreconciled + remainder,
            unreconciled,
            technical,
            inMix,
            plan.answered() ? remainder : Double.NaN,
            contraction,
            mixRatioAtOwnOutput,
            plan.status(),
            reason(plan, theta));
    return new Measured(gap, plan);
  }

  private double mixRatioAtOwnOutput(double[] mix, Question question, double atPrices, Plan near) {
    double own = reference.output(mix);
    return near.answered() && own > 0 && Double.isFinite(own)
        ? leastCost.plan(question.at(own), near).cost() / atPrices
        : Double.NaN;
  }

  private void require(double[] mix, Question question, double filed) {
    int n = reference.dimension();
    if (mix.length != n || question.dimension() != n) {
      throw new IllegalArgumentException(
          mix.length
              + " quantities and "
              + question.dimension()
              + " prices for the "
              + n
              + " inputs "
              + reference.inputs());
    }
    for (int i = 0; i < n; i++) {
      if (!(mix[i] > 0) || Double.isInfinite(mix[i])) {
        throw new IllegalArgumentException(
            "quantity of " + reference.inputs().get(i) + " is " + mix[i] + ", not positive");
      }
    }
    if (!Double.isFinite(filed)) {
      throw new IllegalArgumentException("filed cost is " + filed + ", not a number");
    }
  }

  private static String reason(Plan plan, OptionalDouble theta) {
    String first = plan.reason();
    String second = "";
    if (theta.isEmpty()) {
      second = "no multiple of the mix used yields the output, so the gap is not split";
    } else if (theta.getAsDouble() > 1 + Gap.EVEN) {
      second = "the plant does better than the reference: its technical part is negative";
    }
    return first.isEmpty() || second.isEmpty() ? first + second : first + "; " + second;
  }
}
