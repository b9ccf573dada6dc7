package isowright.study;

import isowright.leastcost.Question;
import isowright.records.Column;
import isowright.records.Panel;
import java.util.Arrays;
import java.util.Optional;
import java.util.stream.IntStream;

/**
 * The filings of a panel: mix, output, prices and filed cost, row by row, in the money of the base
 * period or in that of each row.
 */
final class FilingRows {

  /**
   * A filing.
   *
   * @param row its row in the panel
   * @param mix the quantities used, shape n
   * @param prices the prices paid, shape n; NaN where unknown
   * @param output output
   * @param atPrices Σ price × quantity
   * @param filed the filed cost; Σ price × quantity where no column is named
   */
  record Filing(
      int row, double[] mix, double[] prices, double output, double atPrices, double filed) {

    /** Whether every price and the filed cost are known, and every input was used. */
    boolean known() {
      return Double.isFinite(atPrices)
          && Double.isFinite(filed)
          && Arrays.stream(mix).allMatch(quantity -> quantity > 0);
    }

    Question question() {
      return Question.of(output, prices);
    }
  }

  private final Study.Filing asked;
  private final Panel panel;
  private final boolean nominal;

  private FilingRows(Study.Filing asked, Panel panel, boolean nominal) {
    this.asked = asked;
    this.panel = panel;
    this.nominal = nominal;
  }

  /** In the money of the panel. */
  static FilingRows of(Study.Filing asked, Panel panel) {
    return new FilingRows(asked, panel, false);
  }

  /** In the money of each row, where the panel's money was deflated. */
  static FilingRows nominal(Study.Filing asked, Panel panel) {
    return new FilingRows(asked, panel, true);
  }

  /** The rows of a period. */
  static int[] of(Panel panel, int period) {
    return IntStream.range(0, panel.rows())
        .filter(r -> panel.rowPeriods().get(r) == period)
        .toArray();
  }

  Filing filing(int row) {
    int n = panel.inputs().size();
    double factor = nominal ? panel.moneyFactor().map(column -> column.get(row)).orElse(1.0) : 1;
    double[] mix = new double[n];
    double[] prices = new double[n];
    double atPrices = 0;
    for (int i = 0; i < n; i++) {
      mix[i] = panel.quantities().get(i).get(row);
      prices[i] = panel.prices().get(i).orElseThrow().get(row) / factor;
      atPrices += mix[i] * prices[i];
    }
    Optional<Column> column = asked.cost().flatMap(name -> panel.filedCost());
    double filed = column.isPresent() ? column.get().get(row) / factor : atPrices;
    return new Filing(row, mix, prices, panel.output().get(row), atPrices, filed);
  }
}
