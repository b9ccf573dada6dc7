package isowright.records;

import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Optional;
import java.util.Set;

/**
 * Which rows of records that were read a {@link Keep} keeps, by the rules by which the reader keeps
 * rows of a file; and what it names that the records do not hold.
 *
 * <p>Tested in {@code MatrixSamplesTest}.
 */
public final class KeptPart {

  private final Panel panel;
  private final Set<String> without;
  private final boolean[] periods;
  private final List<String> faults = new ArrayList<>();

  private KeptPart(Panel panel, Keep keep) {
    this.panel = panel;
    this.without = new HashSet<>(keep.withoutPlants());
    this.periods = new boolean[panel.periods().size()];
    long first = bound(keep.firstPeriod(), "-999999999");
    long last = bound(keep.lastPeriod(), "999999999");
    boolean bounded = keep.firstPeriod().isPresent() || keep.lastPeriod().isPresent();
    for (int p = 0; p < periods.length; p++) {
      long key = bounded ? Periods.parse(panel.periods().get(p)) : Periods.NONE;
      periods[p] = !bounded || (faults.isEmpty() && Periods.within(key, first, last));
    }
    for (String plant : keep.withoutPlants()) {
      if (!panel.plants().contains(plant)) {
        faults.add(
            "the records used have no plant "
                + Shown.shortened(plant)
                + Nearest.word(plant, panel.plants())
                    .map(near -> "; did you mean " + near + "?")
                    .orElse(""));
      }
    }
  }

  /**
   * The rows of a panel that are kept.
   *
   * @param panel with a period column where {@code keep} names periods
   */
  public static KeptPart of(Panel panel, Keep keep) {
    return new KeptPart(panel, keep);
  }

  private long bound(Optional<String> written, String ifAbsent) {
    long key = Periods.parse(written.orElse(ifAbsent).strip());
    if (key == Periods.NONE) {
      faults.add(
          "\""
              + Shown.shortened(written.orElse(""))
              + "\" is not a period; write an integer or a date such as 2024, 2024-05 or"
              + " 2024-05-31");
    }
    return key;
  }

  /** Whether a row of the panel is kept. */
  public boolean row(int row) {
    return periods[panel.rowPeriods().get(row)]
        && (without.isEmpty() || !without.contains(panel.plants().get(panel.plantOf(row))));
  }

  /** What is wrong with the words of the {@code Keep}, each a sentence with its remedy. */
  public List<String> faults() {
    return List.copyOf(faults);
  }
}
