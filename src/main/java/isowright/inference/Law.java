package isowright.inference;

import isowright.regression.LikelihoodComparison;
import java.util.List;
import org.apache.commons.statistics.distribution.ChiSquaredDistribution;
import org.apache.commons.statistics.distribution.FDistribution;
import org.apache.commons.statistics.distribution.NormalDistribution;
import org.apache.commons.statistics.distribution.TDistribution;

/** The law of a test statistic under its null. */
public sealed interface Law {

  /**
   * Its name: {@code F}, {@code chi-squared}, {@code t}, {@code normal}, {@code mixed chi-squared}
   * or {@code weighted chi-squared}.
   */
  String name();

  /** Its degrees of freedom, none, one or two. */
  List<Double> degreesOfFreedom();

  /** The probability of a statistic at least as extreme. */
  double p(double statistic);

  /** Fisher's F. */
  record F(double numerator, double denominator) implements Law {
    @Override
    public String name() {
      return "F";
    }

    @Override
    public List<Double> degreesOfFreedom() {
      return List.of(numerator, denominator);
    }

    @Override
    public double p(double statistic) {
      return Double.isNaN(statistic)
          ? Double.NaN
          : FDistribution.of(numerator, denominator).survivalProbability(Math.max(statistic, 0));
    }
  }

  /** Chi-squared. */
  record ChiSquared(double degrees) implements Law {
    @Override
    public String name() {
      return "chi-squared";
    }

    @Override
    public List<Double> degreesOfFreedom() {
      return List.of(degrees);
    }

    @Override
    public double p(double statistic) {
      return Double.isNaN(statistic)
          ? Double.NaN
          : ChiSquaredDistribution.of(degrees).survivalProbability(Math.max(statistic, 0));
    }
  }

  /** Student's t, two-sided. */
  record Student(double degrees) implements Law {
    @Override
    public String name() {
      return "t";
    }

    @Override
    public List<Double> degreesOfFreedom() {
      return List.of(degrees);
    }

    @Override
    public double p(double statistic) {
      return Double.isNaN(statistic)
          ? Double.NaN
          : Math.min(1, 2 * TDistribution.of(degrees).survivalProbability(Math.abs(statistic)));
    }
  }

  /** The standard normal law, two-sided. */
  record Normal() implements Law {
    @Override
    public String name() {
      return "normal";
    }

    @Override
    public List<Double> degreesOfFreedom() {
      return List.of();
    }

    @Override
    public double p(double statistic) {
      return Double.isNaN(statistic)
          ? Double.NaN
          : Math.min(1, 2 * NormalDistribution.of(0, 1).survivalProbability(Math.abs(statistic)));
    }
  }

  /**
   * A mixture in equal parts of two chi-squared laws, of f and f + 1 degrees of freedom: the law of
   * a likelihood ratio where one of f + 1 restrictions puts a variance at its bound of zero. D. A.
   * Kodde and F. C. Palm 1986, <i>Econometrica</i> 54, 1243–1248; of 0 degrees of freedom is the
   * number zero.
   *
   * @param least f
   */
  record MixedChiSquared(int least) implements Law {
    @Override
    public String name() {
      return "mixed chi-squared";
    }

    @Override
    public List<Double> degreesOfFreedom() {
      return List.of((double) least, least + 1.0);
    }

    @Override
    public double p(double statistic) {
      if (Double.isNaN(statistic)) {
        return Double.NaN;
      }
      return statistic <= 0
          ? 1
          : 0.5 * beyond(least, statistic) + 0.5 * beyond(least + 1, statistic);
    }

    private static double beyond(int degrees, double statistic) {
      return degrees == 0 ? 0 : ChiSquaredDistribution.of(degrees).survivalProbability(statistic);
    }
  }

  /**
   * A sum of independent chi-squared variables of one degree of freedom each, with weights; its
   * p-values come from draws that are always the same.
   *
   * @param weights the weights, positive
   */
  record WeightedSum(List<Double> weights) implements Law {
    /** Copies the weights. */
    public WeightedSum {
      weights = List.copyOf(weights);
    }

    @Override
    public String name() {
      return "weighted chi-squared";
    }

    /** How many there are. */
    @Override
    public List<Double> degreesOfFreedom() {
      return List.of((double) weights.size());
    }

    @Override
    public double p(double statistic) {
      return Double.isNaN(statistic)
          ? Double.NaN
          : LikelihoodComparison.weightedSumBeyond(
              weights.stream().mapToDouble(Double::doubleValue).toArray(), statistic);
    }
  }
}
