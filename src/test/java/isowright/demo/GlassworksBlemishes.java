package isowright.demo;

import isowright.demo.GlassworksGenerator.Row;
import java.util.List;

/** What is wrong with the glassworks' records, on purpose, so that an audit has work to do. */
final class GlassworksBlemishes {

  /** A typing slip: one digit too many in the spending on machines. */
  static final String SLIP_PLANT = "GW-09";

  static final int SLIP_YEAR = 2017;

  /** A filed cost that exceeds its own parts by 12 %. */
  static final String OVERFILED_PLANT = "GW-11";

  static final int OVERFILED_YEAR = 2024;
  static final double OVERFILED_SHARE = 0.12;

  /**
   * Small amounts in filings that are in none of the three inputs, as a share of their cost.
   *
   * @param plant the plant
   * @param year the year
   * @param share the amount over the sum of price × quantity
   */
  record Unreconciled(String plant, int year, double share) {}

  static final List<Unreconciled> UNRECONCILED =
      List.of(
          new Unreconciled("GW-02", 2024, 0.006),
          new Unreconciled("GW-03", 2019, 0.004),
          new Unreconciled("GW-06", 2024, -0.003),
          new Unreconciled("GW-08", 2024, 0.008),
          new Unreconciled("GW-13", 2022, 0.005),
          new Unreconciled("GW-14", 2016, -0.004));

  private GlassworksBlemishes() {}

  /** Puts the blemishes into the rows. */
  static void apply(List<Row> rows) {
    for (Unreconciled amount : UNRECONCILED) {
      multiply(rows, amount.plant(), amount.year(), "filed_cost", 1 + amount.share());
    }
    multiply(rows, SLIP_PLANT, SLIP_YEAR, "machine_cost", 10);
    multiply(rows, OVERFILED_PLANT, OVERFILED_YEAR, "filed_cost", 1 + OVERFILED_SHARE);
    find(rows, "GW-06", 2014).cells().put("labour_hours", "");
    find(rows, "GW-12", 2019).cells().put("energy_gj", "");
  }

  private static void multiply(
      List<Row> rows, String plant, int year, String column, double factor) {
    Row row = find(rows, plant, year);
    long before = Long.parseLong(row.cells().getOrDefault(column, ""));
    row.cells().put(column, Long.toString(StrictMath.round(before * factor)));
  }

  private static Row find(List<Row> rows, String plant, int year) {
    return rows.stream()
        .filter(row -> row.plant().equals(plant) && row.year() == year)
        .findFirst()
        .orElseThrow();
  }
}
