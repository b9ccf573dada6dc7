package isowright.records;

import isowright.records.Remark.Severity;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/** Holds money against money: what must be equal, or the sum of its parts. */
final class MoneyIdentities {

  /**
   * Price × quantity and spending may differ by this share: prices and spending written with three
   * significant digits are each off by at most half a percent.
   */
  static final double ROUNDING = 0.01;

  /**
   * Filed cost may exceed Σ price × quantity by this share without remark: small items filed with
   * the inputs.
   */
  static final double OTHER_COST = 0.05;

  /** Powers of ten are told apart from ordinary ratios by a factor of 1.4. */
  private static final double POWER_TOLERANCE = 0.15;

  private MoneyIdentities() {}

  static void audit(Panel panel, AuditRemarks remarks) {
    for (int i = 0; i < panel.inputs().size(); i++) {
      Roles.Input input = panel.roles().inputs().get(i);
      if (input.price().isPresent() && input.spending().isPresent()) {
        priceTimesQuantity(panel, i, remarks);
      }
    }
    boolean allPriced = panel.prices().stream().allMatch(Optional::isPresent);
    if (panel.filedCost().isPresent() && allPriced) {
      filedCost(panel, panel.filedCost().get(), remarks);
    }
  }

  private static void priceTimesQuantity(Panel panel, int input, AuditRemarks remarks) {
    Column price = panel.prices().get(input).orElseThrow();
    Column spending = panel.spending().get(input).orElseThrow();
    Column quantity = panel.quantities().get(input);
    double[] ratios = new double[panel.rows()];
    int count = 0;
    List<Integer> off = new ArrayList<>();
    for (int r = 0; r < panel.rows(); r++) {
      double ratio = price.get(r) * quantity.get(r) / spending.get(r);
      if (!Double.isNaN(ratio)) {
        ratios[count++] = ratio;
        if (Math.abs(ratio - 1) > ROUNDING) {
          off.add(r);
        }
      }
    }
    if (off.isEmpty()) {
      return;
    }
    String identity =
        "price × quantity of %s (\"%s\" × \"%s\") and spending \"%s\""
            .formatted(panel.inputs().get(input), price.name(), quantity.name(), spending.name());
    int all = count;
    double median = Robust.median(ratios, count);
    if (2 * off.size() > count) {
      remarks.add(
          Severity.WARNING,
          "price-times-quantity",
          () ->
              "%s differ by more than %s %% in %s of %s; the first is half the time more than %s times the second. One of the three columns is in another unit, or is not what it is declared to be; correct the file or the roles."
                  .formatted(
                      identity,
                      Shown.value(100 * ROUNDING),
                      Shown.count(off.size()),
                      Shown.count(all, "row"),
                      Shown.value(median)),
          first(off));
      return;
    }
    for (int row : off) {
      remarks.add(
          Severity.WARNING,
          "price-times-quantity",
          () ->
              "%s: %s should agree within %s %% (rounding), but %s × %s = %s and the spending is %s. One of the three is mistyped; correct it, or leave the wrong cell blank."
                  .formatted(
                      remarks.where(row),
                      identity,
                      Shown.value(100 * ROUNDING),
                      Shown.value(price.get(row)),
                      Shown.value(quantity.get(row)),
                      Shown.value(price.get(row) * quantity.get(row)),
                      Shown.value(spending.get(row))),
          row);
    }
  }

  private static void filedCost(Panel panel, Column filed, AuditRemarks remarks) {
    double[] ratios = new double[panel.rows()];
    double[] scratch = new double[panel.rows()];
    int count = 0;
    for (int r = 0; r < panel.rows(); r++) {
      ratios[r] = filed.get(r) / parts(panel, r);
      if (!Double.isNaN(ratios[r])) {
        scratch[count++] = ratios[r];
      }
    }
    double median = Robust.median(scratch, count);
    double decades = Math.log10(median);
    if (Math.abs(decades) >= 1 - POWER_TOLERANCE
        && Math.abs(decades - Math.rint(decades)) <= POWER_TOLERANCE) {
      int all = count;
      remarks.add(
          Severity.WARNING,
          "filed-cost-unit",
          () ->
              "column \"%s\" (filed cost) is typically %s times the sum of price × quantity over the inputs (median of %s); it seems to be in another unit of money. Bring it to the unit of the prices."
                  .formatted(filed.name(), Shown.value(median), Shown.count(all, "row")));
      return;
    }
    belowAndAbove(panel, filed, ratios, remarks);
  }

  private static void belowAndAbove(
      Panel panel, Column filed, double[] ratios, AuditRemarks remarks) {
    List<Integer> above = new ArrayList<>();
    int worst = -1;
    for (int r = 0; r < ratios.length; r++) {
      if (ratios[r] < 1 - ROUNDING) {
        int row = r;
        remarks.add(
            Severity.WARNING,
            "filed-cost-below-parts",
            () ->
                "%s, column \"%s\" (filed cost): %s is below the sum of price × quantity over the inputs, %s, by more than %s %% (rounding), and a cost cannot be less than its parts. Correct the filed cost, a price or a quantity."
                    .formatted(
                        remarks.where(row),
                        filed.name(),
                        Shown.value(filed.get(row)),
                        Shown.value(parts(panel, row)),
                        Shown.value(100 * ROUNDING)),
            r);
      } else if (ratios[r] > 1 + OTHER_COST) {
        above.add(r);
        worst = worst < 0 || ratios[r] > ratios[worst] ? r : worst;
      }
    }
    if (!above.isEmpty()) {
      int row = worst;
      remarks.add(
          Severity.NOTE,
          "filed-cost-above-parts",
          () ->
              "column \"%s\" (filed cost) exceeds the sum of price × quantity over the inputs by more than %s %% in %s of %s, most in %s: %s against %s. Cost of other things is filed with the inputs, or an input is missing from the study; a review of filed cost shows the difference as unreconciled."
                  .formatted(
                      filed.name(),
                      Shown.value(100 * OTHER_COST),
                      Shown.count(above.size()),
                      Shown.count(panel.rows(), "row"),
                      remarks.where(row),
                      Shown.value(filed.get(row)),
                      Shown.value(parts(panel, row))),
          first(above));
    }
  }

  /** Σ price × quantity of a row, NaN where a price is unknown. */
  private static double parts(Panel panel, int row) {
    double sum = 0;
    for (int i = 0; i < panel.inputs().size(); i++) {
      sum += panel.prices().get(i).orElseThrow().get(row) * panel.quantities().get(i).get(row);
    }
    return sum;
  }

  private static int[] first(List<Integer> rows) {
    return rows.stream().limit(10).mapToInt(Integer::intValue).toArray();
  }
}
