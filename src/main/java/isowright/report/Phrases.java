package isowright.report;

import isowright.study.Figure;
import isowright.study.Figure.Uncertainty;
import isowright.study.FitFindings.Regular;
import isowright.study.FitFindings.Tested;
import java.util.List;
import java.util.Locale;

/**
 * What does a figure say in words? Sentences made from figures by rules, so that a verdict never
 * contradicts its interval or its p-value.
 *
 * <p>The rule behind most of them: a figure lies above (below) a reference when its whole interval
 * does; otherwise the two cannot be told apart. Without an interval nothing is told apart. An exact
 * figure is compared as it is.
 *
 * <p>Tested in {@code PhrasesTest}.
 */
public final class Phrases {

  private Phrases() {}

  /** Where a figure lies relative to a reference value. */
  public enum Relation {
    /** The whole interval lies below. */
    BELOW,
    /** The interval holds the reference, or the figure is exact and equal to it. */
    NOT_TOLD_APART,
    /** The whole interval lies above. */
    ABOVE,
    /** There is no figure, or an estimated one without an interval. */
    UNKNOWN
  }

  /** Where a figure lies relative to a reference. */
  public static Relation relation(Figure figure, double reference) {
    double low = figure.uncertainty().map(Uncertainty::low).orElse(figure.value());
    double high = figure.uncertainty().map(Uncertainty::high).orElse(figure.value());
    if (Double.isNaN(figure.value()) || Double.isNaN(low) || Double.isNaN(high)) {
      return Relation.UNKNOWN;
    }
    if (low > reference) {
      return Relation.ABOVE;
    }
    return high < reference ? Relation.BELOW : Relation.NOT_TOLD_APART;
  }

  /** A count with its noun: "1 row", "2 rows", "no rows". */
  public static String count(long count, String noun) {
    return count(count, noun, noun + "s");
  }

  /** A count with its noun, whose plural is not regular. */
  public static String count(long count, String one, String many) {
    if (count == 0) {
      return "no " + many;
    }
    return Numbers.count(count) + " " + (count == 1 ? one : many);
  }

  /** "a", "a and b", "a, b and c". */
  public static String list(List<String> words) {
    int last = words.size() - 1;
    if (last < 1) {
      return words.isEmpty() ? "" : words.get(0);
    }
    return String.join(", ", words.subList(0, last)) + " and " + words.get(last);
  }

  /** A sentence begins with a capital. */
  public static String sentence(String words) {
    return words.isEmpty()
        ? words
        : words.substring(0, 1).toUpperCase(Locale.ROOT) + words.substring(1);
  }

  /** A value with its interval and level: "1.04 (95 % interval 0.98 to 1.10)". */
  public static String figure(Figure figure, double confidence) {
    String sure = sure(figure, confidence);
    return sure.isEmpty() ? Numbers.value(figure) : Numbers.value(figure) + " (" + sure + ")";
  }

  /** How sure a figure is: "95 % interval 0.98 to 1.10"; empty where it is exact. */
  public static String sure(Figure figure, double confidence) {
    String interval = Numbers.interval(figure);
    return interval.isEmpty() || interval.equals(Numbers.NO_INTERVAL)
        ? interval
        : Numbers.level(confidence) + " interval " + interval;
  }

  /** What a scale elasticity says. */
  public static String returnsToScale(Figure scale, double confidence) {
    if (Double.isNaN(scale.value())) {
      return "returns to scale could not be had";
    }
    String growth =
        "one percent more of every input gives "
            + figure(scale, confidence)
            + " percent more output";
    return switch (relation(scale, 1)) {
      case ABOVE -> "returns to scale are increasing: " + growth;
      case BELOW -> "returns to scale are decreasing: " + growth;
      case NOT_TOLD_APART ->
          scale.uncertainty().isEmpty()
              ? "returns to scale are constant"
              : "returns to scale cannot be told apart from constant: " + growth;
      case UNKNOWN -> "increasing, constant and decreasing returns cannot be told apart: " + growth;
    };
  }

  /** What an elasticity of substitution says of two inputs. */
  public static String substitution(String first, String second, Figure sigma, double confidence) {
    if (Double.isNaN(sigma.value())) {
      return "how readily " + first + " and " + second + " replace one another could not be had";
    }
    String sure = sure(sigma, confidence);
    String size =
        " (elasticity of substitution "
            + Numbers.value(sigma)
            + (sure.isEmpty() ? "" : ", " + sure)
            + ")";
    String pair = first + " and " + second;
    return switch (relation(sigma, 1)) {
      case ABOVE ->
          pair + " replace one another more readily than in a Cobb-Douglas technology" + size;
      case BELOW ->
          pair + " replace one another less readily than in a Cobb-Douglas technology" + size;
      case NOT_TOLD_APART ->
          sigma.uncertainty().isEmpty()
              ? pair + " replace one another with an elasticity of substitution of one"
              : "how readily "
                  + pair
                  + " replace one another cannot be told apart from a Cobb-Douglas"
                  + " technology"
                  + size;
      case UNKNOWN ->
          "how readily "
              + pair
              + " replace one another cannot be said, for want of an interval"
              + size;
    };
  }

  /**
   * The level of significance that belongs to a confidence: 0.05 to 0.95, without the rounding
   * error of the difference, by which p = 0.05 would count as rejected.
   */
  public static double level(double confidence) {
    return Math.rint((1 - confidence) * 1e9) / 1e9;
  }

  /** Whether a null is rejected at the level that belongs to a confidence. */
  public static boolean rejected(double p, double confidence) {
    return p < level(confidence);
  }

  /** The outcome of a test at the level that belongs to a confidence. */
  public static String outcome(Tested test, double confidence) {
    if (Double.isNaN(test.p())) {
      return "no outcome";
    }
    return rejected(test.p(), confidence) ? "rejected" : "not rejected";
  }

  /** The statistic with its distribution: "F(1, 24) = 0.116". */
  public static String statistic(Tested test) {
    String symbol =
        switch (test.distribution()) {
          case "chi-squared" -> "χ²";
          case "normal" -> "z";
          case "mixed chi-squared" -> "½χ² + ½χ²";
          case "weighted chi-squared" -> "Σwχ²";
          default -> test.distribution();
        };
    String degrees =
        test.degreesOfFreedom().isEmpty()
            ? ""
            : "("
                + String.join(
                    "," + Numbers.BOUND,
                    test.degreesOfFreedom().stream().map(Numbers::degrees).toList())
                + ")";
    return symbol
        + degrees
        + Numbers.BOUND
        + "="
        + Numbers.BOUND
        + Numbers.statistic(test.statistic());
  }

  /** What regularity over the rows means for the reader. */
  public static String regularity(Regular regular) {
    if (regular.rows() == 0) {
      return "No row was examined.";
    }
    if (regular.both() == regular.rows()) {
      return "Regular at every row of the records: elasticities, plans and costs inside their"
          + " ranges can be read as economics.";
    }
    int failing = regular.rows() - regular.both();
    String where =
        sentence("irregular at ")
            + Numbers.count(failing)
            + " of "
            + count(regular.rows(), "row")
            + ": elasticities, plans and costs at mixes like "
            + (failing == 1 ? "that one" : "those")
            + " are void";
    return regular.both() == 0 ? where + ", which is everywhere in the records." : where + ".";
  }

  /** What a gap between filed and least cost says. */
  public static String gap(Figure gap, String money, double confidence) {
    String size = figure(gap, confidence) + (money.isEmpty() ? "" : ", in " + money);
    return switch (relation(gap, 0)) {
      case ABOVE -> "filed cost lies above least cost by " + size;
      case BELOW -> "filed cost lies below least cost: the gap is " + size;
      case NOT_TOLD_APART ->
          gap.uncertainty().isEmpty()
              ? "filed cost equals least cost"
              : "filed cost cannot be told apart from least cost: the gap is " + size;
      case UNKNOWN -> "how far filed cost lies from least cost could not be had";
    };
  }

  /** The short word for a relation of filed to least cost. */
  public static String gapWord(Relation relation) {
    return switch (relation) {
      case ABOVE -> "above least cost";
      case BELOW -> "below least cost";
      case NOT_TOLD_APART -> "cannot be told apart";
      case UNKNOWN -> "no answer";
    };
  }
}
