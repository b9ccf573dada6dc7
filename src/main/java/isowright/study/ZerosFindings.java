package isowright.study;

import isowright.study.MatrixFindings.Cell;
import isowright.study.MatrixFindings.Headline;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;

/**
 * What the policy for inputs that some rows do not use does to the headline figures: every fit of
 * the study under both policies.
 *
 * @param policy the one in force: {@code drop} or {@code dummy}
 * @param rows by input, in how many rows it is zero; inputs that every row uses are left out
 * @param headlines the figures
 * @param cells each form of the study under either policy, which stands in the place of the sample
 */
public record ZerosFindings(
    String policy, Map<String, Integer> rows, List<Headline> headlines, List<Cell> cells) {

  /** The rows are set aside. */
  public static final String DROP = "drop";

  /** The rows are kept, and say that they do without (Battese 1997). */
  public static final String DUMMY = "dummy";

  /** Copies the collections. */
  public ZerosFindings {
    rows = java.util.Collections.unmodifiableMap(new LinkedHashMap<>(rows));
    headlines = List.copyOf(headlines);
    cells = List.copyOf(cells);
  }
}
