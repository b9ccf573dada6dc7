package isowright.records;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.stream.Stream;

/**
 * Says what is doubtful in a panel before anything is fitted to it. Fit statistics cannot see a
 * wrong column; what stands in the records against themselves can.
 *
 * <p>Looked at are, each with its codes:
 *
 * <ul>
 *   <li>periods: {@code gap-in-periods}, {@code period-absent}, {@code plants-seen-once};
 *   <li>powers of ten against the plant's own history: {@code power-of-ten-slip}, {@code
 *       power-of-ten-break} (see {@link PowersOfTen});
 *   <li>money that must add up: {@code price-times-quantity}, {@code filed-cost-unit}, {@code
 *       filed-cost-below-parts}, {@code filed-cost-above-parts} (see {@link MoneyIdentities});
 *   <li>variation: {@code column-constant}, {@code price-constant}, {@code price-only-over-time},
 *       {@code price-only-between-plants}, {@code constant-within-plants}, {@code
 *       little-variation-within-plants} (see {@link Variation});
 *   <li>copies: {@code columns-equal}, {@code columns-proportional}, {@code identical-rows} (see
 *       {@link Copies});
 *   <li>rows far from all others: {@code extreme-value}.
 * </ul>
 */
public final class PanelAudit {

  private PanelAudit() {}

  /** What reading found worth saying, and then what the audit of the panel finds. */
  public static List<Remark> of(Reading reading) {
    List<Remark> all = new ArrayList<>(reading.remarks());
    all.addAll(of(reading.panel()));
    return List.copyOf(all);
  }

  /** What the audit of the panel finds; empty where nothing is doubtful. */
  public static List<Remark> of(Panel panel) {
    AuditRemarks remarks = new AuditRemarks(panel);
    List<PanelColumn> columns = PanelColumn.of(panel);
    Attendance.audit(panel, remarks);
    PowersOfTen.audit(panel, columns, remarks);
    MoneyIdentities.audit(panel, remarks);
    Variation.audit(panel, columns, remarks);
    Copies.audit(panel, columns, remarks);
    Extremes.audit(panel, columns, remarks);
    return List.copyOf(remarks.all());
  }

  /**
   * Describes every column: output, each input with its money, controls, filed cost, further ones.
   */
  public static List<Description> describe(Panel panel) {
    return Stream.concat(PanelColumn.of(panel).stream(), PanelColumn.ofPrices(panel).stream())
        .map(column -> describe(panel, column))
        .toList();
  }

  private static Description describe(Panel panel, PanelColumn described) {
    Column column = described.column();
    int count = 0;
    double mean = 0;
    double squares = 0;
    double least = Double.POSITIVE_INFINITY;
    double most = Double.NEGATIVE_INFINITY;
    for (int r = 0; r < column.size(); r++) {
      double value = column.get(r);
      if (!Double.isNaN(value)) {
        count++;
        // Welford 1962: no cancellation between large sums.
        double step = value - mean;
        mean += step / count;
        squares += step * (value - mean);
        least = Math.min(least, value);
        most = Math.max(most, value);
      }
    }
    Optional<Double> share =
        panel.repeats()
            ? Variation.withinShare(panel, least > 0 ? column.logs() : column)
            : Optional.empty();
    return new Description(
        column.name(),
        described.role(),
        described.unit(),
        count,
        count > 0 ? mean : Double.NaN,
        count > 1 ? Math.sqrt(squares / (count - 1)) : Double.NaN,
        count > 0 ? least : Double.NaN,
        count > 0 ? most : Double.NaN,
        share);
  }
}
