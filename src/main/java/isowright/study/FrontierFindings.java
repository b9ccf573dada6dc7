package isowright.study;

import java.util.List;
import java.util.Optional;

/**
 * What a frontier found: how much inefficiency there is, and where. Inefficiency is in ln output:
 * 0.1 is about 10 % less output than the technology makes possible.
 *
 * @param law the law of inefficiency, as in the study file
 * @param overTime how the rows of a plant share it: {@code each-row}, {@code constant} or {@code
 *     decay}
 * @param state {@code found}, {@code wrong-skew} or {@code none-found}
 * @param words the state in a sentence
 * @param skewness of the residuals of least squares
 * @param variances how much there is; absent where none was found
 * @param plants each plant at its last row, in the order of the records; empty where none was found
 * @param rows each row, where rows of a plant differ; thinned where there are many
 * @param bestByEffects the plant of greatest level within plants; absent where there are no such
 *     levels
 */
public record FrontierFindings(
    String law,
    String overTime,
    String state,
    String words,
    double skewness,
    Optional<Variances> variances,
    List<Plant> plants,
    List<Row> rows,
    Optional<String> bestByEffects) {

  /** Copies the lists. */
  public FrontierFindings {
    plants = List.copyOf(plants);
    rows = List.copyOf(rows);
  }

  /** Whether inefficiency was found. */
  public boolean found() {
    return state.equals("found");
  }

  /**
   * How much inefficiency there is.
   *
   * @param noise σ_v
   * @param inefficiency σ_u
   * @param ratio λ = σ_u/σ_v
   * @param gamma γ = σ_u²/(σ_u² + σ_v²)
   * @param share var u/(var u + σ_v²)
   * @param mean E u, in the last period of the records
   * @param decay η: by which share inefficiency falls from period to period; absent without decay
   */
  public record Variances(
      Figure noise,
      Figure inefficiency,
      Figure ratio,
      Figure gamma,
      Figure share,
      Figure mean,
      Optional<Figure> decay) {}

  /**
   * A row.
   *
   * @param row the row in the file
   * @param plant its plant
   * @param period its period
   * @param inefficiency given its residuals
   * @param efficiency the share of the frontier's output that is reached
   * @param aboveMean the probability that its inefficiency exceeds the mean of the law
   */
  public record Row(
      int row,
      String plant,
      String period,
      Figure inefficiency,
      Figure efficiency,
      double aboveMean) {}

  /**
   * A plant.
   *
   * @param last at its last row
   * @param byEffects its distance from the plant of greatest level, from the fit within plants
   */
  public record Plant(Row last, Optional<Figure> byEffects) {}
}
