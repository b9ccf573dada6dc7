package isowright.study;

import isowright.study.PlanFindings.CurvePoint;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * What a plan says beside its mix and cost: what was pursued, what constraints are worth, how far
 * it is checked and proved, and how it answers to other targets and prices.
 *
 * @param asked the question's name in the study file
 * @param goal {@code target}, {@code budget} or {@code profit}
 * @param stated the budget or the price of output, where one was stated
 * @param output the output of the plan; exact where it was the target
 * @param profit the profit, where profit was the goal
 * @param multipliers what one more unit of each constraint that binds is worth
 * @param checks the plan examined without the search that found it
 * @param proof how far it is proved that nothing is better
 * @param envelope short-run beside long-run cost
 * @param efficientScale where average cost is least
 * @param demands conditional demand against each price
 * @param changes what other prices, targets and productivity do to the result
 * @param costElasticities by how many per cent cost rises with a per cent of each price, of output
 *     and of productivity
 * @param demandElasticities by input, then by the input whose price moves; empty where there are
 *     none
 * @param across what each plant makes, where the target is split
 * @param withoutPlan targets of the curve at which there is no plan, and why
 * @param nearest where the target has no plan because the technology is irregular there: the
 *     nearest target that has one
 */
public record PlanDetail(
    String asked,
    String goal,
    Optional<Double> stated,
    Optional<Figure> output,
    Optional<Figure> profit,
    List<Worth> multipliers,
    Optional<Checks> checks,
    Optional<Proved> proof,
    Optional<Envelope> envelope,
    Optional<EfficientScale> efficientScale,
    List<Demand> demands,
    List<Change> changes,
    Map<String, Figure> costElasticities,
    Map<String, Map<String, Figure>> demandElasticities,
    List<PlantPart> across,
    List<Unanswered> withoutPlan,
    Optional<CurvePoint> nearest) {

  /** Nothing beside mix and cost. */
  public static final PlanDetail NONE =
      new PlanDetail(
          "",
          "target",
          Optional.empty(),
          Optional.empty(),
          Optional.empty(),
          List.of(),
          Optional.empty(),
          Optional.empty(),
          Optional.empty(),
          Optional.empty(),
          List.of(),
          List.of(),
          Map.of(),
          Map.of(),
          List.of(),
          List.of(),
          Optional.empty());

  /** Copies the lists. */
  public PlanDetail {
    multipliers = List.copyOf(multipliers);
    demands = List.copyOf(demands);
    changes = List.copyOf(changes);
    across = List.copyOf(across);
    withoutPlan = List.copyOf(withoutPlan);
  }

  /**
   * A target of a curve without a plan.
   *
   * @param target the output
   * @param status {@code irregular} or {@code infeasible}
   * @param reason why
   */
  public record Unanswered(double target, String status, String reason) {}

  /**
   * What one more unit of a constraint is worth.
   *
   * @param kind {@code target}, {@code budget}, {@code held}, {@code upper}, {@code lower}, {@code
   *     commitment}, {@code band} or {@code capacity}
   * @param of the input or plant it concerns; empty where none
   * @param bound where the constraint stands
   * @param value its worth, in money or in output; absent where it is beyond measure
   * @param words the same in a sentence
   */
  public record Worth(String kind, String of, double bound, Optional<Figure> value, String words) {}

  /**
   * Departures found again from the technology, and by differences of least cost; NaN where there
   * is nothing to examine.
   *
   * @param output how far the mix falls short of the target, relative
   * @param firstOrder the largest relative departure from the first-order conditions
   * @param secondOrder the least relative curvature of isocost against isoquant; positive at a
   *     minimum
   * @param shephard the largest departure of ∂ln C/∂ln w from the cost share
   * @param homogeneity the relative departure of cost from rising in proportion with prices
   * @param marginalCost the relative departure of ∂C/∂Q from the multiplier
   */
  public record Checks(
      double output,
      double firstOrder,
      double secondOrder,
      double shephard,
      double homogeneity,
      double marginalCost) {}

  /**
   * How far it is proved that nothing is better.
   *
   * @param scope {@code global} or {@code local}
   * @param gap how much better, relative, a plan may be that was not examined
   * @param parts how many parts of the problem were examined
   * @param reason why only a local best is proved; empty otherwise
   */
  public record Proved(String scope, double gap, int parts, String reason) {}

  /**
   * Short-run cost beside long-run cost, which it touches where the held inputs are those of the
   * long run and exceeds elsewhere.
   *
   * @param held the held inputs and their quantities
   * @param points ascending in target
   * @param touch the target at which the two touch; absent where they do not
   */
  public record Envelope(
      Map<String, Double> held, List<EnvelopePoint> points, Optional<Figure> touch) {
    /** Copies the list. */
    public Envelope {
      points = List.copyOf(points);
    }
  }

  /**
   * Short- and long-run cost at one target.
   *
   * @param target the output
   * @param shortRun cost with the held inputs
   * @param shortRunMarginal its marginal cost
   * @param longRun cost with all inputs free
   * @param longRunMarginal its marginal cost
   * @param shortRunInside whether the mix of the short run lies inside the records
   * @param longRunInside whether that of the long run does
   */
  public record EnvelopePoint(
      double target,
      Figure shortRun,
      Figure shortRunMarginal,
      Figure longRun,
      Figure longRunMarginal,
      boolean shortRunInside,
      boolean longRunInside) {

    /** Average cost with the held inputs. */
    public Figure shortRunAverage() {
      return shortRun.per(target);
    }

    /** Average cost with all inputs free. */
    public Figure longRunAverage() {
      return longRun.per(target);
    }
  }

  /**
   * Where average cost is least.
   *
   * @param course {@code interior}, {@code falling}, {@code rising}, {@code level} or {@code none}:
   *     the course of average cost over the outputs examined
   * @param from the least output examined
   * @param to the largest
   * @param output the output of least average cost, where it is inside
   * @param averageCost average cost there
   * @param inside whether its mix lies inside the records
   */
  public record EfficientScale(
      String course,
      double from,
      double to,
      Optional<Figure> output,
      Optional<Figure> averageCost,
      boolean inside) {}

  /**
   * Conditional demand against the price of one input, everything else as planned.
   *
   * @param price the input whose price moves
   * @param points ascending in price
   */
  public record Demand(String price, List<DemandPoint> points) {
    /** Copies the list. */
    public Demand {
      points = List.copyOf(points);
    }
  }

  /**
   * The mix at one price.
   *
   * @param price money per unit
   * @param mix by input
   * @param cost least cost
   * @param inside whether the mix lies inside the records
   */
  public record DemandPoint(double price, Map<String, Figure> mix, Figure cost, boolean inside) {}

  /**
   * What moving one thing down and up does to the result: cost, or output for a budget, or profit.
   *
   * @param what {@code price}, {@code target}, {@code budget}, {@code output-price} or {@code
   *     productivity}
   * @param input the input whose price moves; empty otherwise
   * @param span {@code ten-per-cent} or {@code observed}
   * @param low the thing at its low end
   * @param high at its high end
   */
  public record Change(String what, String input, String span, End low, End high) {}

  /**
   * One end of a change.
   *
   * @param at the value of what is moved; for productivity the factor on output
   * @param result the result there; absent where there is no plan
   * @param relative the result relative to that of the plan, less one
   */
  public record End(double at, Optional<Figure> result, Optional<Figure> relative) {}

  /**
   * What one plant makes of a target that is split.
   *
   * @param plant its name
   * @param technology its technology
   * @param runs whether it makes anything
   * @param output what it makes
   * @param cost its cost, running cost included
   * @param marginalCost its marginal cost; absent where it does not run
   * @param capacity the most it can make; {@code +∞} where not stated
   * @param runningCost the money due if it makes anything
   * @param prices its prices
   * @param mix its inputs; empty where it does not run
   * @param inside whether its mix lies inside the records
   */
  public record PlantPart(
      String plant,
      String technology,
      boolean runs,
      Figure output,
      Figure cost,
      Optional<Figure> marginalCost,
      double capacity,
      double runningCost,
      Map<String, Double> prices,
      Map<String, Figure> mix,
      boolean inside) {}
}
