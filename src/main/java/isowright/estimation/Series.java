package isowright.estimation;

import java.util.Optional;

/**
 * A column that an estimator looks at beside the technology: an instrument or a proxy.
 *
 * @param name the name of an input (its quantity, in logs) or the heading of a column
 * @param lag how many periods earlier, 0 for the same period
 * @param log whether it enters in natural logs; absent: in logs where every known value is positive
 */
public record Series(String name, int lag, Optional<Boolean> log) {

  /** In the same period, in logs where it can be. */
  public static Series of(String name) {
    return new Series(name, 0, Optional.empty());
  }

  /** A number of periods earlier, in logs where it can be. */
  public static Series lagged(String name, int lag) {
    return new Series(name, lag, Optional.empty());
  }

  /** As it is written in a study file: {@code wage}, {@code lag wage}, {@code lag 2 wage}. */
  public String word() {
    return lagged(name);
  }

  /** As it enters: {@code ln wage}, {@code lag ln wage}; or as it is written where not in logs. */
  String entering(boolean logged) {
    return lagged(logged ? "ln " + name : name);
  }

  private String lagged(String what) {
    return switch (lag) {
      case 0 -> what;
      case 1 -> "lag " + what;
      default -> "lag " + lag + " " + what;
    };
  }
}
