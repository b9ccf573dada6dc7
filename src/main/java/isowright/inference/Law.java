package isowright.inference;

import java.util.List;
import org.apache.commons.statistics.distribution.ChiSquaredDistribution;
import org.apache.commons.statistics.distribution.FDistribution;
import org.apache.commons.statistics.distribution.TDistribution;

/** The law of a test statistic under its null. */
public sealed interface Law {

  /** Its name: {@code F}, {@code chi-squared} or {@code t}. */
  String name();

  /** Its degrees of freedom, one or two. */
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
}
