package isowright.study;

import java.util.List;
import java.util.Optional;

/**
 * What it takes to answer least-cost questions later, without the records: the technologies with
 * their covariances at every period and level, and what a plan must know of the records. No row of
 * the records is in it, nor can one be found again from it, save the plants' names and levels.
 *
 * @param recorded what a plan must know of the records; absent where there were none
 * @param technologies fitted ones, then those taken as known
 */
public record Handover(Optional<Recorded> recorded, List<Saved> technologies) {

  /** Nothing to hand over. */
  public static final Handover NONE = new Handover(Optional.empty(), List.of());

  /** Copies the list. */
  public Handover {
    technologies = List.copyOf(technologies);
  }

  /** The technology of that name. */
  public Optional<Saved> named(String name) {
    return technologies.stream().filter(saved -> saved.name().equals(name)).findFirst();
  }

  /**
   * A technology as it is saved; the meaning of maps and levels is that of {@link
   * isowright.estimation.SavedTechnology}.
   *
   * @param name its name in the study
   * @param fitted whether it was estimated
   * @param form the name of its form
   * @param base what inputs are divided by
   * @param parameterNames of its parameters
   * @param parameters its parameters
   * @param degreesOfFreedom of the law of intervals
   * @param byPeriod the technology's parameters by period
   * @param maps kinds of derivatives in the reported parameters, each by period
   * @param levels the typical plant, the upper quartile, the frontier, then the plants
   */
  public record Saved(
      String name,
      boolean fitted,
      String form,
      double[] base,
      List<String> parameterNames,
      double[] parameters,
      double degreesOfFreedom,
      List<double[]> byPeriod,
      List<List<double[][]>> maps,
      List<Level> levels) {
    /** Copies the lists. */
    public Saved {
      parameterNames = List.copyOf(parameterNames);
      byPeriod = List.copyOf(byPeriod);
      maps = List.copyOf(maps);
      levels = List.copyOf(levels);
    }
  }

  /**
   * A level of productivity.
   *
   * @param map which kind of derivatives belongs to it
   * @param constants by period
   * @param covariance of the reported parameters with its constant in the place of their own
   */
  public record Level(int map, double[] constants, double[][] covariance) {}
}
