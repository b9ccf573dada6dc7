package isowright.report;

/** Being written. */
public final class HtmlReport {
  private HtmlReport() {}
}
