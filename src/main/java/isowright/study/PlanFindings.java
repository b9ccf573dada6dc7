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
   * @param target the output to be reached; for a budget or a price of output the output found, NaN
   *     where there is none
   * @param prices by input; of an input in bands the price of one more unit
   * @param productivity whose productivity, in words
   * @param limits limits and held inputs in words, by input; empty where none
   * @param status {@code solved}, {@code corner}, {@code irregular}, {@code outside-records},
   *     {@code infeasible}, {@code unbounded} (no output is best) or {@code nothing} (best to make
   *     nothing)
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
   * @param detail what it says beside mix and cost
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
      List<Said> remarks,
      PlanDetail detail) {

    /** A plan of which nothing is said beside mix and cost. */
    public Planned(
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
      this(
          question,
          technology,
          estimated,
          target,
          prices,
          productivity,
          limits,
          status,
          mix,
          cost,
          marginalCost,
          averageCost,
          shares,
          optimality,
          curve,
          isoquant,
          plants,
          remarks,
          PlanDetail.NONE);
    }

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
   * @param regular whether the technology, checked again at the mix, is regular there
   */
  public record CurvePoint(
      double target,
      Figure cost,
      Figure marginalCost,
      Figure averageCost,
      Map<String, Double> mix,
      boolean inside,
      boolean regular) {

    /** A point at which the technology is regular. */
    public CurvePoint(
        double target,
        Figure cost,
        Figure marginalCost,
        Figure averageCost,
        Map<String, Double> mix,
        boolean inside) {
      this(target, cost, marginalCost, averageCost, mix, inside, true);
    }
  }

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
   * @param detail what follows from the gap; absent where there is none
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
      Optional<Detail> detail,
      List<Said> remarks) {

    /** A filing of which no more is known than its gap. */
    public Reviewed(
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
        List<Said> remarks) {
      this(
          plant,
          period,
          technology,
          filed,
          atPrices,
          leastCost,
          gap,
          unreconciled,
          technical,
          mix,
          status,
          Optional.empty(),
          remarks);
    }
  }

  /**
   * What follows from a gap.
   *
   * @param ratio filed over least cost
   * @param remainder what of the gap is left undivided
   * @param efficiency the parts as ratios of costs; absent where the gap is not split
   * @param scale where output stands against the efficient scale; no part of the gap
   * @param needed what would have to be true for the filed cost to be least cost; empty where it
   *     was not asked, the plants being many
   */
  public record Detail(
      Figure ratio,
      Figure remainder,
      Optional<Efficiency> efficiency,
      Optional<Scale> scale,
      List<Needed> needed) {
    /** Copies the list. */
    public Detail {
      needed = List.copyOf(needed);
    }
  }

  /**
   * Ratios of costs in Farrell's sense; technical × mix = cost.
   *
   * @param technical the factor by which all inputs would shrink to yield the output by the
   *     reference
   * @param mix least cost over the cost of that mix
   * @param cost least cost over price × quantity
   */
  public record Efficiency(Figure technical, Figure mix, Figure cost) {}

  /**
   * Where an output stands against the output at which a unit costs least.
   *
   * @param state {@code found}, {@code same-returns}, {@code still-falling}, {@code still-rising},
   *     {@code most-costly} or {@code no-answer}
   * @param elasticity the scale elasticity at the least-cost mix of the output
   * @param output the efficient scale
   * @param part what the output would cost less at the unit cost of the efficient scale
   */
  public record Scale(
      String state, Figure elasticity, Optional<Figure> output, Optional<Figure> part) {}

  /**
   * What would have to be true for a filed cost to be least cost, all else being as it is.
   *
   * @param kind {@code price}, {@code productivity} or {@code substitution}
   * @param input the input whose price it is; empty for the others
   * @param asIs what it is
   * @param value what it would have to be; absent where no value within the bounds does
   * @param low the lower bound of the search
   * @param high the upper bound
   * @param end where there is no value: the last one tried
   * @param costAtEnd least cost there
   * @param regular where there is no value: whether the search went to its bound, rather than to
   *     the end of what the technology can answer
   */
  public record Needed(
      String kind,
      String input,
      double asIs,
      Optional<Figure> value,
      double low,
      double high,
      double end,
      double costAtEnd,
      boolean regular) {}
}
