package isowright.records;

/** Being written. */
public final class PanelAudit {
  private PanelAudit() {}
}
