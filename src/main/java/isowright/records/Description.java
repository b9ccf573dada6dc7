package isowright.records;

import java.util.Optional;

/**
 * A column of a panel described.
 *
 * @param column its heading in the file, or the name of what was computed
 * @param role what it is, in words, such as {@code quantity of labour}
 * @param unit its unit, empty where none was stated
 * @param count the number of values present, N
 * @param mean the arithmetic mean
 * @param standardDeviation the standard deviation with divisor N − 1; NaN where N &lt; 2
 * @param least the least value
 * @param most the greatest value
 * @param withinShare the share of the variance that lies within plants, Σ(z − z̄ of the plant)² /
 *     Σ(z − z̄)², with z = ln x where every value is positive and z = x otherwise; absent where no
 *     plant is seen twice or the column never varies
 */
public record Description(
    String column,
    String role,
    String unit,
    int count,
    double mean,
    double standardDeviation,
    double least,
    double most,
    Optional<Double> withinShare) {}
