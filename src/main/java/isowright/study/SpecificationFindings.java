package isowright.study;

import isowright.study.Protocol.Decision;
import java.util.List;
import java.util.Optional;

/**
 * What was found of the specification as a whole: results beside what was expected of them, and the
 * decisions that were taken.
 *
 * @param expectations what was expected and what was found, fit by fit
 * @param decisions the decisions stated in the study file
 */
public record SpecificationFindings(List<Expected> expectations, List<Decision> decisions) {

  /** Nothing asked, nothing found. */
  public static final SpecificationFindings NONE = new SpecificationFindings(List.of(), List.of());

  /** Copies the lists. */
  public SpecificationFindings {
    expectations = List.copyOf(expectations);
    decisions = List.copyOf(decisions);
  }

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
