package isowright.runs;

import java.util.List;

/** A folder cannot be used as a run, or two runs cannot be compared; every reason at once. */
public final class RunRefused extends Exception {

  private static final long serialVersionUID = 1L;

  @SuppressWarnings("serial") // an immutable list of strings
  private final List<String> reasons;

  RunRefused(List<String> reasons) {
    super(String.join(" ", reasons));
    this.reasons = List.copyOf(reasons);
  }

  /** The reasons, each a whole sentence that says what to do. */
  public List<String> reasons() {
    return reasons;
  }
}
