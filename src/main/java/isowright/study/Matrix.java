package isowright.study;

import isowright.estimation.Specification.PlantEffects;
import isowright.estimation.Specification.StandardErrors;
import isowright.estimation.Specification.Time;
import isowright.records.Keep;
import java.util.List;
import java.util.Locale;
import java.util.Optional;

/**
 * A specification matrix: every combination of what is listed is fitted, and one of them is marked
 * by criteria laid down before anything was fitted.
 *
 * @param technologies the forms
 * @param plantEffects the treatments of plants
 * @param times the treatments of time
 * @param standardErrors the kinds of standard errors; empty: the kind of the study
 * @param samples the rows
 * @param chooseBy the criteria, each applied to what the one before it left; may be empty
 * @param usual whether the whole grid is the usual one rather than written
 */
public record Matrix(
    List<String> technologies,
    List<PlantEffects> plantEffects,
    List<Time> times,
    List<StandardErrors> standardErrors,
    List<Sample> samples,
    List<Criterion> chooseBy,
    boolean usual) {

  /** Copies the lists. */
  public Matrix {
    technologies = List.copyOf(technologies);
    plantEffects = List.copyOf(plantEffects);
    times = List.copyOf(times);
    standardErrors = List.copyOf(standardErrors);
    samples = List.copyOf(samples);
    chooseBy = List.copyOf(chooseBy);
  }

  /** How many combinations there are. */
  public int size() {
    return technologies.size()
        * plantEffects.size()
        * times.size()
        * Math.max(1, standardErrors.size())
        * samples.size();
  }

  /**
   * Rows to which every form is fitted.
   *
   * @param name its name in the study
   * @param keep the rows by period and plant
   * @param half one half of the periods, where that is asked
   */
  public record Sample(String name, Keep keep, Optional<Half> half) {}

  /** A half of the periods; the middle one of an odd number belongs to the later half. */
  public enum Half {
    /** The first periods. */
    EARLIER,
    /** The last periods. */
    LATER;

    /** The word used in files. */
    public String word() {
      return words(this);
    }
  }

  /** By what a combination is chosen. */
  public enum Criterion {
    /** Those regular at every row of their sample stay. */
    REGULAR_EVERYWHERE,
    /** Those regular at the geometric mean of their sample stay. */
    REGULAR_AT_MEAN,
    /** Those in which RESET does not reject the form stay. */
    RESET,
    /** The one of least BIC, among those whose likelihoods can be compared. */
    BIC,
    /** The one of least AIC, likewise. */
    AIC;

    /** The word used in files. */
    public String word() {
      return words(this);
    }

    /** Whether it puts combinations in an order, rather than letting some stay. */
    public boolean orders() {
      return this == BIC || this == AIC;
    }
  }

  private static String words(Enum<?> value) {
    return value.name().toLowerCase(Locale.ROOT).replace('_', '-');
  }
}
