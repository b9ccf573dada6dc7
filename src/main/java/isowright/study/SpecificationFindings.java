package isowright.study;

import isowright.inference.SpecificationTests;
import isowright.study.FitFindings.Tested;
import isowright.study.Protocol.Decision;
import java.util.List;
import java.util.Optional;

/**
 * What was found of the specification as a whole: how far regressors stand in one another's way,
 * which form is nearer to the records, which predicts unseen plants best, results beside what was
 * expected of them, and the decisions that were taken.
 *
 * @param inflation variance inflation of every coefficient of the fits linear in their parameters
 * @param comparisons pairs of forms of which neither contains the other
 * @param predictions how well each form predicts plants that were left out
 * @param expectations what was expected and what was found, fit by fit
 * @param decisions the decisions stated in the study file
 * @param matrix other specifications side by side, where asked
 * @param zeros what the other policy for zeros does, where the records hold any
 * @param simultaneity what was expected of least squares before fitting, where anything is fitted
 */
public record SpecificationFindings(
    List<Inflation> inflation,
    List<Comparison> comparisons,
    List<Predicted> predictions,
    List<Expected> expectations,
    List<Decision> decisions,
    Optional<MatrixFindings> matrix,
    Optional<ZerosFindings> zeros,
    Optional<SimultaneityFindings> simultaneity) {

  /** Nothing asked, nothing found. */
  public static final SpecificationFindings NONE =
      new SpecificationFindings(
          List.of(),
          List.of(),
          List.of(),
          List.of(),
          List.of(),
          Optional.empty(),
          Optional.empty(),
          Optional.empty());

  /** The names of the tests of the specification among the tests of a fit. */
  public static final List<String> TESTS = SpecificationTests.NAMES;

  /** Copies the lists. */
  public SpecificationFindings {
    inflation = List.copyOf(inflation);
    comparisons = List.copyOf(comparisons);
    predictions = List.copyOf(predictions);
    expectations = List.copyOf(expectations);
    decisions = List.copyOf(decisions);
  }

  /**
   * By what factor the other regressors inflate the variance of a coefficient.
   *
   * @param technology the fit
   * @param parameter the coefficient's name
   * @param raw about zero, effects and constant counted among the other regressors
   * @param centred about the mean, or about the means of plants where these were removed
   */
  public record Inflation(String technology, String parameter, double raw, double centred) {}

  /**
   * Two forms of which neither contains the other.
   *
   * @param first the first
   * @param second the second
   * @param tests whether they can be told apart, which is nearer, what each misses
   * @param words what follows
   */
  public record Comparison(String first, String second, List<Tested> tests, String words) {
    /** Copies the list. */
    public Comparison {
      tests = List.copyOf(tests);
    }
  }

  /**
   * How well a form predicts plants that were left out of its fit.
   *
   * @param technology the form
   * @param judged {@code changes} within plants, or {@code levels}
   * @param error the root mean squared error of ln output
   * @param levelError the same of levels, where one constant holds for all plants
   * @param spread the error if no change were foreseen; absent where levels are judged
   * @param difference how much the mean squared error exceeds that of the best form; absent for the
   *     best
   * @param plants the plants predicted
   * @param folds the folds
   * @param failed the folds that could not be fitted
   * @param verdict in words
   */
  public record Predicted(
      String technology,
      String judged,
      double error,
      Optional<Double> levelError,
      Optional<Double> spread,
      Optional<Figure> difference,
      int plants,
      int folds,
      int failed,
      String verdict) {}

  /** How a result lies to the range in which it was expected. */
  public enum Agreement {
    /** The whole interval lies in the range. */
    INSIDE("inside"),
    /** Part of the interval lies in the range. */
    OVERLAPS("interval overlaps"),
    /** No part of the interval lies in the range. */
    OUTSIDE("outside"),
    /** The fit has no such figure, or no interval of it. */
    UNKNOWN("no figure");

    private final String word;

    Agreement(String word) {
      this.word = word;
    }

    /** The word used in files and reports. */
    public String word() {
      return word;
    }
  }

  /**
   * An expectation and the result.
   *
   * @param technology the fit
   * @param figure {@code returns-to-scale}, {@code output-elasticity} or {@code substitution}
   * @param of the input, or the two inputs, that the figure belongs to; empty for returns to scale
   * @param low the lower end of the range expected
   * @param high the upper end
   * @param found the result
   * @param agreement how the two lie to one another
   */
  public record Expected(
      String technology,
      String figure,
      List<String> of,
      double low,
      double high,
      Optional<Figure> found,
      Agreement agreement) {
    /** Copies the list. */
    public Expected {
      of = List.copyOf(of);
    }
  }
}
