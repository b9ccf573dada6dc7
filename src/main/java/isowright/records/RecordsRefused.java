package isowright.records;

import java.util.List;

/** Records cannot be read as asked; carries every reason, not only the first. */
public final class RecordsRefused extends Exception {

  private static final long serialVersionUID = 1L;

  private final transient List<Remark> reasons;

  /** With the reasons, at least one. */
  public RecordsRefused(List<Remark> reasons) {
    super(reasons.get(0).message());
    this.reasons = List.copyOf(reasons);
  }

  /** Every reason, in the order of the file. */
  public List<Remark> reasons() {
    return reasons;
  }
}
