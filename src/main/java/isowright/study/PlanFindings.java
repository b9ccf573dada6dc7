package isowright.study;

import isowright.study.Findings.Said;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/** What was found of costs: least-cost plans, curves, and filed costs held against them. */
public final class PlanFindings {

  private PlanFindings() {}

  /**
   * The answer of one technology to one least-cost question.
   *
   * @param question the question's name
   * @param technology the technology's name (a form, or a given technology)
   * @param estimated whether the technology was estimated (then figures carry uncertainty)
   * @param target the output to be reached
   * @param prices by input
   * @param productivity whose productivity, in words
   * @param limits limits and held inputs in words, by input; empty where none
   * @param status {@code solved}, {@code corner}, {@code irregular}, {@code outside-records} or
   *     {@code infeasible}
   * @param mix by input; empty where there is no answer
   * @param cost least cost
   * @param marginalCost marginal cost
   * @param averageCost average cost
   * @param shares cost shares by input
   * @param optimality the largest relative departure from the first-order conditions
   * @param curve the cost curve and expansion path, ascending in target
   * @param isoquant for the first two inputs, pairs of quantities along the isoquant of the target
   *     with the other inputs at the plan; empty where it cannot be drawn
   * @param plants the mixes of the records (first two inputs), for the same chart; may be thinned
   * @param remarks what must be said of this plan
   */
  public record Planned(
      String question,
      String technology,
      boolean estimated,
      double target,
      Map<String, Double> prices,
      String productivity,
      Map<String, String> limits,
      String status,
      Map<String, Figure> mix,
      Optional<Figure> cost,
      Optional<Figure> marginalCost,
      Optional<Figure> averageCost,
      Map<String, Figure> shares,
      double optimality,
      List<CurvePoint> curve,
      List<double[]> isoquant,
      List<Mix> plants,
      List<Said> remarks) {
    /** Whether there is a mix. */
    public boolean answered() {
      return !mix.isEmpty();
    }
  }

  /**
   * One point of a cost curve.
   *
   * @param target the output
   * @param cost least cost
   * @param marginalCost marginal cost
   * @param averageCost average cost
   * @param mix by input
   * @param inside whether the mix lies within the ranges of the records
   */
  public record CurvePoint(
      double target,
      Figure cost,
      Figure marginalCost,
      Figure averageCost,
      Map<String, Double> mix,
      boolean inside) {}

  /**
   * A mix seen in the records.
   *
   * @param plant the plant
   * @param period the period
   * @param first the quantity of the first input
   * @param second the quantity of the second input
   * @param output output
   */
  public record Mix(String plant, String period, double first, double second, double output) {}

  /**
   * The filed cost of a plant in a period held against the least cost of one technology.
   *
   * @param plant the plant
   * @param period the period
   * @param technology the technology
   * @param filed the filed cost
   * @param atPrices Σ price × quantity
   * @param leastCost the least cost of the same output at the same prices
   * @param gap filed cost less least cost
   * @param unreconciled filed cost less Σ price × quantity
   * @param technical Σ price × quantity less the cost of the same mix drawn back onto the isoquant
   * @param mix the cost of that mix less the least cost
   * @param status as of a plan
   * @param remarks what must be said of it
   */
  public record Reviewed(
      String plant,
      String period,
      String technology,
      double filed,
      double atPrices,
      Optional<Figure> leastCost,
      Optional<Figure> gap,
      double unreconciled,
      Optional<Figure> technical,
      Optional<Figure> mix,
      String status,
      List<Said> remarks) {}
}
