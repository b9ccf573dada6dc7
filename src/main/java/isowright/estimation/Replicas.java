package isowright.estimation;

import isowright.technology.Technology;
import java.util.Optional;

/**
 * One technology estimated again and again: to plants drawn anew, without each plant, without each
 * period. Each is at the period and productivity of the estimate that it belongs to.
 *
 * @param drawn from plants drawn with replacement, one a draw; none where no resampling was asked
 * @param withoutPlants without plant i, in the order of the panel; none where it was not worked out
 * @param withoutPeriods without period i, in the order of the panel; none where it was not
 */
public record Replicas(
    Technologies drawn, Technologies withoutPlants, Technologies withoutPeriods) {

  /** No refits. */
  public static final Replicas NONE =
      new Replicas(Technologies.NONE, Technologies.NONE, Technologies.NONE);

  /** The same with output exp(shift) times as large at every mix. */
  Replicas shifted(double logShift) {
    return new Replicas(
        drawn.shifted(logShift), withoutPlants.shifted(logShift), withoutPeriods.shifted(logShift));
  }

  /** Technologies by number, made when they are asked for. */
  public interface Technologies {

    /** None. */
    Technologies NONE =
        new Technologies() {
          @Override
          public int count() {
            return 0;
          }

          @Override
          public Optional<Technology> get(int i) {
            return Optional.empty();
          }

          @Override
          public String name(int i) {
            return "";
          }
        };

    /** How many there are, those without an estimate included. */
    int count();

    /** Technology i; empty where it could not be estimated. */
    Optional<Technology> get(int i);

    /** What was left out of refit i, or the number of the draw. */
    String name(int i);

    /** The same with output exp(shift) times as large at every mix. */
    default Technologies shifted(double logShift) {
      Technologies own = this;
      return new Technologies() {
        @Override
        public int count() {
          return own.count();
        }

        @Override
        public Optional<Technology> get(int i) {
          return own.get(i).map(technology -> technology.shifted(logShift));
        }

        @Override
        public String name(int i) {
          return own.name(i);
        }
      };
    }
  }
}
