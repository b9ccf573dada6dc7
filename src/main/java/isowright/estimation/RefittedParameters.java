package isowright.estimation;

import java.util.Arrays;
import java.util.List;
import java.util.Optional;

/**
 * Reported parameters of a fit made again and again, in the order of {@link Solution#parameters()}.
 * Where plants' levels give the constant, the first is a placeholder.
 */
final class RefittedParameters {

  /** What became of one refit. */
  enum Outcome {
    /** It has parameters. */
    FITTED,
    /** Its rows cannot tell the parameters apart. */
    LOST_RANK,
    /** The search found no optimum inside the economic region. */
    NOT_FOUND
  }

  /**
   * One refit.
   *
   * @param reported its parameters; empty where there are none
   * @param whole all of it, where it was fitted from the beginning and is to be asked for levels
   */
  record Refit(Outcome outcome, double[] reported, Optional<Fit> whole) {

    private static final double[] NOTHING = {};

    static Refit of(double[] reported) {
      return new Refit(Outcome.FITTED, reported, Optional.empty());
    }

    static Refit failed(Outcome outcome) {
      return new Refit(outcome, NOTHING, Optional.empty());
    }
  }

  private final List<Refit> refits;

  RefittedParameters(List<Refit> refits) {
    this.refits = List.copyOf(refits);
  }

  int count() {
    return refits.size();
  }

  boolean fitted(int i) {
    return refits.get(i).outcome() == Outcome.FITTED;
  }

  /** The parameters of a refit that has them; not to be changed. */
  double[] reported(int i) {
    return refits.get(i).reported();
  }

  /** All of a refit, where it was kept. */
  Optional<Fit> whole(int i) {
    return refits.get(i).whole();
  }

  /** How many refits ended so. */
  int count(Outcome outcome) {
    return (int) refits.stream().filter(refit -> refit.outcome() == outcome).count();
  }

  @Override
  public String toString() {
    return "RefittedParameters[count="
        + count()
        + ", outcomes="
        + Arrays.toString(Arrays.stream(Outcome.values()).mapToInt(this::count).toArray())
        + "]";
  }
}
