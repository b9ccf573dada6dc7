package isowright.estimation;

import isowright.technology.Technology;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

/**
 * A fit reduced to what it takes to have its technology at any period and productivity, with its
 * covariance, when the records are no longer at hand.
 *
 * <p>With P reported parameters and p of the technology: at period t and level l the technology has
 * the parameters of the period with the constant of the level, and the covariance M V_l M', where M
 * (p × P) holds the derivatives of the technology's parameters in the reported ones and V_l is the
 * covariance of the reported parameters with the constant of the level in the place of their own,
 * as in {@link Fit#at}. Tested in {@code PlanCommandTest}.
 *
 * @param technology the technology of the fit
 * @param degreesOfFreedom of the t distribution for intervals
 * @param parameters of the typical plant, by period, shape p each
 * @param maps the kinds of M, each by period
 * @param levels the typical plant, the plant at the upper quartile, the frontier, then every plant
 */
public record SavedTechnology(
    Technology technology,
    double degreesOfFreedom,
    List<double[]> parameters,
    List<List<double[][]>> maps,
    List<Level> levels) {

  /** The levels before those of the plants. */
  public static final int COMMON = 3;

  /** Copies the lists. */
  public SavedTechnology {
    parameters = List.copyOf(parameters);
    maps = List.copyOf(maps);
    levels = List.copyOf(levels);
  }

  /**
   * A level of productivity.
   *
   * @param map which kind of M belongs to it
   * @param constants by period
   * @param covariance V_l, P × P
   */
  public record Level(int map, double[] constants, double[][] covariance) {}

  /** What a fit with numbers leaves behind. */
  static SavedTechnology of(Fit fit, int plants) {
    List<Productivity> all = new ArrayList<>();
    all.add(new Productivity.Typical());
    all.add(new Productivity.UpperQuartile());
    all.add(new Productivity.Frontier());
    for (int plant = 0; plant < plants; plant++) {
      all.add(new Productivity.Plant(plant));
    }
    int periods = fit.panel().periods().size();
    List<double[]> parameters = new ArrayList<>();
    for (int t = 0; t < periods; t++) {
      parameters.add(fit.technology(t, all.get(0)).parameters());
    }
    List<List<double[][]>> maps = new ArrayList<>();
    List<Level> levels = new ArrayList<>();
    for (Productivity productivity : all) {
      double[] constants = new double[periods];
      for (int t = 0; t < periods; t++) {
        constants[t] = fit.technology(t, productivity).parameters()[0];
      }
      levels.add(new Level(map(fit, productivity, maps), constants, covariance(fit, productivity)));
    }
    return new SavedTechnology(
        fit.numbers().technology(),
        fit.numbers().covarianceSource().degreesOfFreedom(),
        parameters,
        maps,
        levels);
  }

  /** Which of the kinds of M is that of a productivity; a new one is added. */
  private static int map(Fit fit, Productivity productivity, List<List<double[][]>> maps) {
    List<double[][]> own = new ArrayList<>();
    for (int t = 0; t < fit.panel().periods().size(); t++) {
      own.add(fit.toTechnology(t, productivity));
    }
    for (int k = 0; k < maps.size(); k++) {
      if (Arrays.deepEquals(maps.get(k).toArray(), own.toArray())) {
        return k;
      }
    }
    maps.add(own);
    return maps.size() - 1;
  }

  private static double[][] covariance(Fit fit, Productivity productivity) {
    Solution numbers = fit.numbers();
    return fit.levelsGiveTheConstant(productivity)
        ? numbers.levels().covariance(numbers.levels().weights(productivity))
        : numbers.covariance();
  }

  /** Whether the frontier lies above the typical plant. */
  public boolean inefficient() {
    return levels.get(2).constants[0] > levels.get(0).constants[0];
  }

  private static int place(Productivity productivity) {
    if (productivity instanceof Productivity.Plant plant) {
      return COMMON + plant.index();
    }
    if (productivity instanceof Productivity.UpperQuartile) {
      return 1;
    }
    return productivity instanceof Productivity.Frontier ? 2 : 0;
  }

  /** The technology at a period for a productivity, with its covariance. */
  public EstimatedTechnology at(int period, Productivity productivity) {
    Level level = levels.get(place(productivity));
    double[] own = parameters.get(period).clone();
    own[0] = level.constants[period];
    return new EstimatedTechnology(
        technology.withParameters(own),
        Matrices.sandwich(maps.get(level.map).get(period), level.covariance),
        degreesOfFreedom);
  }
}
