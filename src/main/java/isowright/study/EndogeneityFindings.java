package isowright.study;

import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * What a fit found about inputs that are chosen knowing productivity: how least squares was
 * expected to err, what was put in its place, whether that can be relied on, and the figures side
 * by side.
 *
 * @param estimator {@code least-squares}, {@code instruments} or {@code proxy}
 * @param inputs the inputs taken to be chosen knowing productivity
 * @param standIns what stands in for them, as it enters
 * @param rowsUnknown the rows not used because one of these is unknown
 * @param expected how least squares was expected to err, stated before fitting
 * @param shifts whether anything in the records shifts these inputs
 * @param firstStages the strength of each first stage; empty without instruments
 * @param anywhere values not rejected however weak the instruments; absent where not worked out
 * @param beside figures of each estimator, the one that the technology rests on first
 * @param words what follows, in sentences
 */
public record EndogeneityFindings(
    String estimator,
    List<String> inputs,
    List<String> standIns,
    int rowsUnknown,
    String expected,
    String shifts,
    List<FirstStage> firstStages,
    Optional<Anywhere> anywhere,
    List<Beside> beside,
    List<String> words) {

  /** Least squares, about which nothing further was asked. */
  public static final EndogeneityFindings NONE =
      new EndogeneityFindings(
          "least-squares",
          List.of(),
          List.of(),
          0,
          "",
          "",
          List.of(),
          Optional.empty(),
          List.of(),
          List.of());

  /** Copies the lists. */
  public EndogeneityFindings {
    inputs = List.copyOf(inputs);
    standIns = List.copyOf(standIns);
    firstStages = List.copyOf(firstStages);
    beside = List.copyOf(beside);
    words = List.copyOf(words);
  }

  /** Whether anything was asked. */
  public boolean asked() {
    return !estimator.equals(NONE.estimator);
  }

  /**
   * How strongly the instruments move a column.
   *
   * @param column the column, such as {@code labour} or {@code labour*labour}
   * @param partialShare the share of its variation, net of the other columns, that they explain
   * @param f the F statistic, with the covariance of the fit
   * @param numerator its first degrees of freedom
   * @param denominator its second
   * @param effective the effective F
   * @param conditional the conditional F; absent for a single column
   * @param weak whether the statistic that decides lies below 10
   */
  public record FirstStage(
      String column,
      double partialShare,
      double f,
      double numerator,
      double denominator,
      double effective,
      Optional<Double> conditional,
      boolean weak) {}

  /**
   * Values of one coefficient that are not rejected however weak the instruments (Anderson and
   * Rubin).
   *
   * @param column the column
   * @param pieces the intervals that make up the set; ends may be infinite
   */
  public record Anywhere(String column, List<Figure.Span> pieces) {
    /** Copies the list. */
    public Anywhere {
      pieces = List.copyOf(pieces);
    }
  }

  /**
   * Figures of one estimator.
   *
   * @param estimator {@code instruments}, {@code proxy}, {@code joint-moments}, {@code
   *     least-squares}
   * @param note what must be known of it, such as its rows; or why it has no figures
   * @param rows how many rows it uses
   * @param elasticity output elasticity by input, at the geometric mean; empty without figures
   * @param scale returns to scale there
   */
  public record Beside(
      String estimator,
      String note,
      int rows,
      Map<String, Figure> elasticity,
      Optional<Figure> scale) {}
}
