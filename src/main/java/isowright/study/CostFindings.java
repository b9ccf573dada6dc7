package isowright.study;

import isowright.study.Findings.Said;
import isowright.study.FitFindings.Pair;
import isowright.study.FitFindings.Parameter;
import isowright.study.FitFindings.Tested;
import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/** What was found of the cost side: cost functions fitted to recorded costs and prices. */
public record CostFindings(List<Fitted> fits, List<Said> remarks, List<Side> sides) {

  /** No cost side was asked for. */
  public static final CostFindings NONE = new CostFindings(List.of(), List.of(), List.of());

  /**
   * Copies the lists.
   *
   * @param fits the cost functions fitted
   * @param remarks what the records of costs made it necessary to say
   * @param sides the same figures from production and from cost, where the study has both
   */
  public CostFindings {
    fits = List.copyOf(fits);
    remarks = List.copyOf(remarks);
    sides = List.copyOf(sides);
  }

  /**
   * A cost function fitted to records of costs.
   *
   * @param technology the form's name
   * @param how how it was fitted
   * @param state {@code estimated}, {@code not-converged}, {@code rank-deficient} or {@code
   *     refused}
   * @param parameters the parameters and controls, in the order of the covariance
   * @param covariance their covariance
   * @param at the figures at the geometric mean of the sample; absent where there is no fit
   * @param scale scale economies of every row, where there are outputs
   * @param efficient the output at which average cost is least, at mean prices
   * @param regularity at how many rows it is a cost function
   * @param tests the tests
   * @param rows what it says over the records
   * @param remarks what must be said of this fit
   */
  public record Fitted(
      String technology,
      How how,
      String state,
      List<Parameter> parameters,
      double[][] covariance,
      Optional<AtMean> at,
      List<RowScale> scale,
      Optional<Efficient> efficient,
      Optional<Regular> regularity,
      List<Tested> tests,
      CostRows rows,
      List<Said> remarks) {

    /** Whether later stages may use the numbers. */
    public boolean usable() {
      return state.equals("estimated");
    }
  }

  /**
   * How a cost function was fitted.
   *
   * @param equations cost, system, shares or quantities
   * @param restrictions what was imposed beside homogeneity in prices
   * @param plantEffects none or within
   * @param covarianceWords the estimator, factor and degrees of freedom in words
   * @param degreesOfFreedom of Student's law behind intervals
   * @param base what prices, outputs and fixed inputs were divided by before logs
   * @param rows rows used
   * @param plants firms or plants
   * @param logLikelihood of all equations together
   * @param iterations how often the covariance of the equations was renewed
   * @param concave what it took to make cost concave, where that was asked for
   */
  public record How(
      String equations,
      List<String> restrictions,
      String plantEffects,
      String covarianceWords,
      double degreesOfFreedom,
      Map<String, Double> base,
      int rows,
      int plants,
      double logLikelihood,
      int iterations,
      Optional<Concave> concave) {}

  /**
   * Cost made concave in prices.
   *
   * @param where {@code at-mean} or {@code everywhere}
   * @param logLikelihoodFree of the same equations fitted freely
   * @param edge whether the records would have it otherwise, so that the fit is at the edge
   */
  public record Concave(String where, double logLikelihoodFree, boolean edge) {}

  /**
   * Figures at the geometric mean of the sample.
   *
   * @param shares fitted share of each input in cost
   * @param costElasticity per cent more cost for a per cent more of each output
   * @param scaleEconomies one over their sum
   * @param substitution elasticities of substitution
   * @param demand price elasticities of demand
   * @param technicalChange by how much cost falls a period, as a share
   * @param bias change of each share a period
   * @param together several outputs made together, where there are several
   */
  public record AtMean(
      Map<String, Figure> shares,
      Map<String, Figure> costElasticity,
      Optional<Figure> scaleEconomies,
      List<Pair> substitution,
      List<Pair> demand,
      Optional<Figure> technicalChange,
      Map<String, Figure> bias,
      Optional<Together> together) {

    AtMean with(Optional<Together> several) {
      return new AtMean(
          shares,
          costElasticity,
          scaleEconomies,
          substitution,
          demand,
          technicalChange,
          bias,
          several);
    }
  }

  /**
   * Several outputs made together.
   *
   * @param scope by what share cost would rise with every output made apart; absent where the form
   *     cannot tell
   * @param byOutput the same with one output apart from the rest
   * @param complementarity elasticities of the marginal cost of the first in the second
   * @param note why scope is absent, or how far the records bear it; may be empty
   */
  public record Together(
      Optional<Figure> scope,
      Map<String, Figure> byOutput,
      List<Pair> complementarity,
      String note) {}

  /** Scale economies of a row. */
  public record RowScale(int row, String plant, String period, double output, Figure economies) {}

  /**
   * The output of least average cost.
   *
   * @param output where it is
   * @param below the share of rows with less output
   */
  public record Efficient(Figure output, double below) {}

  /**
   * Regularity over the rows.
   *
   * @param rows rows examined
   * @param monotone rows at which every fitted share and marginal cost is positive
   * @param concave rows at which cost is concave in prices
   * @param both rows at which both hold
   */
  public record Regular(int rows, int monotone, int concave, int both) {}

  /**
   * A figure found from both sides.
   *
   * @param measure {@code scale}, {@code allen}, {@code demand} (own price), {@code least-cost} or
   *     {@code marginal-cost}
   * @param of the inputs or the question it concerns; empty for scale
   * @param production the figure by technology fitted to quantities
   * @param cost the figure by cost function
   * @param apart whether some interval of one side and some of the other do not meet
   */
  public record Side(
      String measure,
      String of,
      Map<String, Figure> production,
      Map<String, Figure> cost,
      boolean apart) {

    /** Copies the maps, keeping their order. */
    public Side {
      production = Collections.unmodifiableMap(new LinkedHashMap<>(production));
      cost = Collections.unmodifiableMap(new LinkedHashMap<>(cost));
    }
  }
}
