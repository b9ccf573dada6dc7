package isowright.runs;

import isowright.study.Figure;
import java.util.List;
import java.util.Optional;

/**
 * What changed from one run to another: records, settings, and every headline figure, with how much
 * of each change comes from the records and how much from the settings.
 *
 * <p>Write f(s, r) for a figure found with settings s in records r. The whole change is f(s₁, r₁) −
 * f(s₀, r₀). Going from one to the other there are two ways, records first or settings first; the
 * part of the records is the mean of what changing them does on either way,
 *
 * <pre>½ [f(s₀, r₁) − f(s₀, r₀)] + ½ [f(s₁, r₁) − f(s₁, r₀)],</pre>
 *
 * and the part of the settings is the rest, so that the parts add up and do not depend on an order
 * (the value of Shapley 1953 for two players). Where only one of the two changed, the whole change
 * is its.
 *
 * <p>Made by {@link Comparer}; tested in {@code ComparisonTest}.
 *
 * @param before the earlier run
 * @param after the later run
 * @param sameRecords whether both read the same records, byte for byte
 * @param sameStudy whether both read the same study file, byte for byte
 * @param rows what changed in the records; absent where they are the same or cannot be read again
 * @param settings keys of the study files that differ
 * @param changes every headline figure of either run
 * @param remarks what must be said beside
 */
public record Comparison(
    StoredRun before,
    StoredRun after,
    boolean sameRecords,
    boolean sameStudy,
    Optional<RowChanges> rows,
    List<Setting> settings,
    List<Change> changes,
    List<String> remarks) {

  /** Copies the lists. */
  public Comparison {
    settings = List.copyOf(settings);
    changes = List.copyOf(changes);
    remarks = List.copyOf(remarks);
  }

  /** The part of a study to which a figure belongs. */
  public enum Kind {
    /** A technology fitted. */
    TECHNOLOGY("technology"),
    /** A least-cost plan. */
    PLAN("least-cost plan"),
    /** A filed cost held against least cost. */
    FILING("filing");

    private final String words;

    Kind(String words) {
      this.words = words;
    }

    /** The part in words. */
    public String words() {
      return words;
    }
  }

  /**
   * A setting that differs.
   *
   * @param key its key in the study file
   * @param before its value before; absent where it was not written
   * @param after its value after
   */
  public record Setting(String key, Optional<String> before, Optional<String> after) {}

  /**
   * A headline figure of either run.
   *
   * @param kind the part of the study
   * @param of whose figure it is
   * @param figure which figure
   * @param before the figure before; absent where the earlier run does not have it
   * @param after the figure after
   * @param fromRecords the part of the change that comes from the records; absent where it is not
   *     known
   * @param fromSettings the part that comes from the settings
   */
  public record Change(
      Kind kind,
      String of,
      String figure,
      Optional<Figure> before,
      Optional<Figure> after,
      Optional<Double> fromRecords,
      Optional<Double> fromSettings) {

    /** The change; absent where either run lacks the figure. */
    public Optional<Double> difference() {
      return before.flatMap(b -> after.map(a -> a.value() - b.value()));
    }

    /** Whether the figure differs in any digit, or stands in one run only. */
    public boolean changed() {
      return difference().map(d -> d != 0).orElse(true);
    }

    /** Whether the later figure lies within the earlier interval; absent without interval. */
    public Optional<Boolean> within() {
      return before
          .flatMap(Figure::uncertainty)
          .flatMap(u -> after.map(a -> u.low() <= a.value() && a.value() <= u.high()));
    }
  }

  /** How many headline figures changed. */
  public long changed() {
    return changes.stream().filter(Change::changed).count();
  }
}
