package isowright.study;

import java.util.List;
import java.util.Locale;
import java.util.Optional;

/**
 * What a study lays down before anything is fitted: what is expected of the results, and which
 * decisions were taken about the records, and which specifications are to stand beside one another.
 * It is printed beside the results and changes none of them.
 *
 * @param expectations the ranges in which figures are expected
 * @param decisions the decisions taken, in the order of the file
 * @param matrix the specifications to be set side by side, with the criteria of choice
 */
public record Protocol(
    List<Expectation> expectations, List<Decision> decisions, Optional<Matrix> matrix) {

  /** Nothing laid down. */
  public static final Protocol NONE = new Protocol(List.of(), List.of(), Optional.empty());

  /** Copies the lists. */
  public Protocol {
    expectations = List.copyOf(expectations);
    decisions = List.copyOf(decisions);
  }

  /** A figure of a fit of which something can be expected. */
  public enum Subject {
    /** The scale elasticity at the geometric mean of the records. */
    RETURNS_TO_SCALE,
    /** The output elasticity of one input, at the same point. */
    OUTPUT_ELASTICITY,
    /** The direct elasticity of substitution of every pair of inputs, at the same point. */
    SUBSTITUTION;

    /** The word used in files. */
    public String word() {
      return name().toLowerCase(Locale.ROOT).replace('_', '-');
    }
  }

  /**
   * The range in which a figure is expected.
   *
   * @param subject the figure
   * @param input the input, where the figure belongs to one
   * @param low the lower end; may be {@code −∞}
   * @param high the upper end, not below the lower; may be {@code +∞}
   */
  public record Expectation(Subject subject, Optional<String> input, double low, double high) {}

  /**
   * A decision taken by a person.
   *
   * @param date when, ISO 8601
   * @param by who took it
   * @param what what was decided
   * @param why the reason
   */
  public record Decision(String date, String by, String what, String why) {}
}
