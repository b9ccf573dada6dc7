package isowright.records;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.Set;

/**
 * A column of a panel with what it is.
 *
 * @param column its values
 * @param kind what kind of column it is
 * @param role what it is, in words
 * @param unit its unit, empty where none was stated
 * @param input the index of the input to which it belongs, −1 for none
 * @param computed whether it was worked out from other columns
 */
record PanelColumn(
    Column column, Kind kind, String role, String unit, int input, boolean computed) {

  /** The kinds of column. */
  enum Kind {
    OUTPUT,
    QUANTITY,
    PRICE,
    SPENDING,
    CONTROL,
    FILED_COST,
    FURTHER;

    /** Whether values are positive by the rules of reading, so that logs exist. */
    boolean positive() {
      return this != CONTROL && this != FURTHER;
    }

    boolean money() {
      return this == PRICE || this == SPENDING || this == FILED_COST;
    }
  }

  /**
   * Every column of a panel, output first, then each input with its money, controls, filed cost,
   * further columns.
   */
  static List<PanelColumn> of(Panel panel) {
    Roles roles = panel.roles();
    String money = roles.deflator().map(d -> "money of " + d.base()).orElse("money");
    List<PanelColumn> all = new ArrayList<>();
    all.add(
        new PanelColumn(
            panel.output(),
            Kind.OUTPUT,
            roles.explained(),
            roles.outputUnit().orElse(""),
            -1,
            false));
    for (int i = 0; i < roles.inputs().size(); i++) {
      int input = i;
      Roles.Input declared = roles.inputs().get(i);
      String unit = declared.unit().orElse("");
      String name = declared.name();
      all.add(
          new PanelColumn(
              roles.keepsZeros() ? panel.quantities().get(i).positive() : panel.quantities().get(i),
              Kind.QUANTITY,
              "quantity of " + name,
              unit,
              i,
              false));
      String perUnit = unit.isEmpty() ? money : money + " per " + unit;
      boolean computed = declared.price().isEmpty();
      panel
          .prices()
          .get(i)
          .ifPresent(
              c ->
                  all.add(
                      new PanelColumn(
                          c, Kind.PRICE, "price of " + name, perUnit, input, computed)));
      panel
          .spending()
          .get(i)
          .ifPresent(
              c ->
                  all.add(
                      new PanelColumn(
                          c, Kind.SPENDING, "spending on " + name, money, input, false)));
    }
    for (int k = 0; k < panel.controls().size(); k++) {
      boolean logged = roles.controls().get(k).log();
      all.add(
          new PanelColumn(
              panel.controls().get(k),
              Kind.CONTROL,
              roles.controls().get(k).role(),
              "",
              -1,
              logged));
    }
    Optional<Column> filed = panel.filedCost();
    filed.ifPresent(
        c -> all.add(new PanelColumn(c, Kind.FILED_COST, "filed cost", money, -1, false)));
    all.addAll(further(panel, Set.of(Roles.Measure.NUMBER)));
    return all;
  }

  /**
   * The columns from which a price follows: described like the others, but not held against them.
   */
  static List<PanelColumn> ofPrices(Panel panel) {
    return further(panel, Set.of(Roles.Measure.PRICE, Roles.Measure.AMOUNT, Roles.Measure.RATE));
  }

  private static List<PanelColumn> further(Panel panel, Set<Roles.Measure> measures) {
    List<PanelColumn> all = new ArrayList<>();
    for (int k = 0; k < panel.further().size(); k++) {
      Roles.Further declared = panel.roles().further().get(k);
      if (measures.contains(declared.measure())) {
        Column column = panel.further().get(k);
        all.add(new PanelColumn(column, Kind.FURTHER, declared.role(), "", -1, false));
      }
    }
    return all;
  }

  /** How the column is named in a message. */
  String words() {
    return "column \"" + column.name() + "\" (" + role + ")";
  }
}
