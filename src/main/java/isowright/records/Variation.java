package isowright.records;

import isowright.records.PanelColumn.Kind;
import isowright.records.Remark.Severity;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import java.util.Optional;

/** What varies, and where: over all rows, within plants, over time. */
final class Variation {

  /**
   * Below this share of the variance within plants, an estimate within plants rests mostly on
   * errors of measurement (in the 48 states of Baltagi and Pinnoi 1995 the elasticity of public
   * capital, of whose variance 1.3 % is within states, goes from .155 to −.026).
   */
  static final double LITTLE_WITHIN = 0.05;

  /** Values that differ by no more than this share are the same but for the digits written. */
  private static final double SAME = 1e-9;

  private Variation() {}

  static void audit(Panel panel, List<PanelColumn> columns, AuditRemarks remarks) {
    for (PanelColumn column : columns) {
      if (column.kind() == Kind.PRICE) {
        price(panel, column, remarks);
      } else if (constant(panel, column.column(), Grouping.ALL)) {
        remarks.add(
            Severity.WARNING,
            "column-constant",
            () ->
                "%s is %s in every row; what never varies can explain nothing. Check the column, or leave it out of the study."
                    .formatted(column.words(), Shown.value(firstKnown(column.column()))),
            0);
      } else if (panel.repeats() && column.kind() != Kind.FILED_COST) {
        withinPlants(panel, column, remarks);
      }
    }
  }

  private static void price(Panel panel, PanelColumn column, AuditRemarks remarks) {
    if (constant(panel, column.column(), Grouping.ALL)) {
      remarks.add(
          Severity.WARNING,
          "price-constant",
          () ->
              "%s is %s in every row; a price that never varies may have been filled in, and nothing about the response to prices can be learnt from it. Check where it comes from."
                  .formatted(column.words(), Shown.value(firstKnown(column.column()))),
          0);
    } else if (panel.periods().size() > 1
        && panel.periods().size() < panel.rows()
        && constant(panel, column.column(), Grouping.PERIOD)) {
      remarks.add(
          Severity.NOTE,
          "price-only-over-time",
          () ->
              "%s is the same for all plants in each period and differs only over time; it cannot be told from other things that change from period to period. Use the plants' own prices if they are known."
                  .formatted(column.words()));
    } else if (panel.repeats() && constant(panel, column.column(), Grouping.PLANT)) {
      remarks.add(
          Severity.NOTE,
          "price-only-between-plants",
          () ->
              "%s is the same in all periods of each plant and differs only between plants; it cannot be told from other things that are particular to a plant. Use the prices of each period if they are known."
                  .formatted(column.words()));
    }
  }

  private static void withinPlants(Panel panel, PanelColumn column, AuditRemarks remarks) {
    Severity severity =
        column.kind() == Kind.CONTROL || column.kind() == Kind.FURTHER
            ? Severity.NOTE
            : Severity.WARNING;
    if (constant(panel, column.column(), Grouping.PLANT)) {
      remarks.add(
          severity,
          "constant-within-plants",
          () ->
              "%s is the same in all periods of each plant; with plant effects nothing can be learnt about it. Check that it was recorded in each period, or fit without plant effects."
                  .formatted(column.words()));
      return;
    }
    if (column.kind() == Kind.QUANTITY) {
      Optional<Double> share = withinShare(panel, column.column().logs());
      if (share.isPresent() && share.get() < LITTLE_WITHIN) {
        remarks.add(
            Severity.WARNING,
            "little-variation-within-plants",
            () ->
                "%s: only %s %% of the variance of its log lies within plants (less than %s %%); plant effects take away the rest, so an estimate with plant effects rests on little and on errors of measurement. Compare it with the estimate without plant effects before relying on it."
                    .formatted(
                        column.words(),
                        String.format(Locale.ROOT, "%.1f", 100 * share.get()),
                        Shown.value(100 * LITTLE_WITHIN)));
      }
    }
  }

  /**
   * Within sum of squares over total sum of squares, over the rows that are known.
   *
   * @return absent where the column never varies
   */
  static Optional<Double> withinShare(Panel panel, Column column) {
    double total = 0;
    double within = 0;
    double mean = 0;
    int count = 0;
    for (int p = 0; p < panel.plants().size(); p++) {
      double plantMean = 0;
      int plantCount = 0;
      for (int r = panel.plantStart(p); r < panel.plantEnd(p); r++) {
        double value = column.get(r);
        if (!Double.isNaN(value)) {
          double step = value - mean;
          mean += step / ++count;
          total += step * (value - mean);
          double plantStep = value - plantMean;
          plantMean += plantStep / ++plantCount;
          within += plantStep * (value - plantMean);
        }
      }
    }
    // Rounding alone leaves squares of this size in a column that never varies.
    boolean varies = total > count * Math.pow(1e-12 * Math.max(Math.abs(mean), 1e-300), 2);
    return varies ? Optional.of(within / total) : Optional.empty();
  }

  /** Over which rows a column is asked to be constant. */
  private enum Grouping {
    ALL,
    PLANT,
    PERIOD
  }

  private static boolean constant(Panel panel, Column column, Grouping grouping) {
    int groups =
        switch (grouping) {
          case ALL -> 1;
          case PLANT -> panel.plants().size();
          case PERIOD -> panel.periods().size();
        };
    double[] first = new double[groups];
    Arrays.fill(first, Double.NaN);
    int plant = 0;
    boolean repeated = false;
    for (int r = 0; r < panel.rows(); r++) {
      plant += r == panel.plantEnd(plant) ? 1 : 0;
      int group =
          switch (grouping) {
            case ALL -> 0;
            case PLANT -> plant;
            case PERIOD -> panel.rowPeriods().get(r);
          };
      double value = column.get(r);
      if (Double.isNaN(value)) {
        continue;
      }
      if (Double.isNaN(first[group])) {
        first[group] = value;
      } else if (Math.abs(value - first[group]) > SAME * Math.abs(first[group])) {
        return false;
      } else {
        repeated = true;
      }
    }
    return repeated;
  }

  private static double firstKnown(Column column) {
    int row = 0;
    while (row < column.size() - 1 && Double.isNaN(column.get(row))) {
      row++;
    }
    return column.get(row);
  }
}
