package isowright.estimation;

import java.util.List;

/** The records are sound but cannot carry what was asked; carries every reason. */
public final class Unfit extends Exception {

  private static final long serialVersionUID = 1L;

  private final transient List<String> reasons;

  /** With the reasons, at least one; each says what is lacking and what to do. */
  public Unfit(List<String> reasons) {
    super(reasons.get(0));
    this.reasons = List.copyOf(reasons);
  }

  /** Every reason. */
  public List<String> reasons() {
    return reasons;
  }
}
