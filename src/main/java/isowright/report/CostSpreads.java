package isowright.report;

import isowright.report.Document.Cell;
import isowright.report.Document.Column;
import isowright.report.Document.Group;
import isowright.report.Document.Row;
import isowright.report.Document.Table;
import isowright.study.CostFindings.Fitted;
import isowright.study.CostRows;
import isowright.study.CostRows.Spread;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/** How figures of cost functions spread over the rows: quantiles, whatever the number of rows. */
final class CostSpreads {

  private CostSpreads() {}

  private static List<Column> quantiles(String... more) {
    List<Column> columns = new ArrayList<>();
    for (String heading : List.of("Least", "10 %", "25 %", "Median", "75 %", "90 %", "Greatest")) {
      columns.add(Column.ofNumbers(heading, ""));
    }
    for (String heading : more) {
      columns.add(Column.ofNumbers(heading, ""));
    }
    return columns;
  }

  private static List<Cell> cells(Spread spread) {
    List<Cell> cells = new ArrayList<>();
    for (double value :
        new double[] {
          spread.least(),
          spread.tenth(),
          spread.quarter(),
          spread.median(),
          spread.threeQuarters(),
          spread.nineTenths(),
          spread.most()
        }) {
      cells.add(Cell.of(Numbers.significant(value, 3)));
    }
    return cells;
  }

  /** Scale economies over the rows; absent where none are known. */
  static Optional<Table> scale(List<Fitted> fits, Material material) {
    List<Row> rows = new ArrayList<>();
    boolean thinned = false;
    for (Fitted fit : fits) {
      for (Spread spread : fit.rows().spreads()) {
        if (spread.measure().equals("scale")) {
          CostRows.Told told = fit.rows().told();
          List<Cell> cells = new ArrayList<>(cells(spread));
          cells.add(Cell.of(Numbers.count(told.above())));
          cells.add(Cell.of(Numbers.count(told.unclear())));
          cells.add(Cell.of(Numbers.count(told.below())));
          rows.add(new Row(Text.of(Terms.technology(fit.technology())), cells));
          thinned |= told.known() < fit.rows().all();
        }
      }
    }
    if (rows.isEmpty()) {
      return Optional.empty();
    }
    return Optional.of(
        new Table(
            "Scale economies over the rows",
            "Technology",
            quantiles("Above one", "Not told", "Below one"),
            List.of(Group.of(rows)),
            List.of(
                Text.of(
                    "Quantiles over rows, then the number of rows whose whole interval at "
                        + Numbers.level(material.confidence())
                        + " lies above one, holds one, or lies below one"
                        + (thinned ? ", of an even sample of the rows" : "")
                        + "."))));
  }

  /** Elasticities over the rows. */
  static Optional<Table> elasticities(List<Fitted> fits) {
    List<Group> groups = new ArrayList<>();
    for (Fitted fit : fits) {
      for (String measure : List.of("demand", "allen")) {
        List<Row> rows = new ArrayList<>();
        for (Spread spread : fit.rows().spreads()) {
          // what the form fixes is the same in every row
          if (spread.measure().equals(measure) && spread.most() - spread.least() > 1e-9) {
            rows.add(new Row(Text.of(spread.of()), cells(spread)));
          }
        }
        if (!rows.isEmpty()) {
          groups.add(
              new Group(
                  Optional.of(
                      (measure.equals("demand")
                              ? "Own price elasticity of demand"
                              : "Allen-Uzawa elasticity of substitution")
                          + (fits.size() > 1 ? ", " + Terms.technology(fit.technology()) : "")),
                  rows));
        }
      }
    }
    return groups.isEmpty()
        ? Optional.empty()
        : Optional.of(
            new Table(
                "Elasticities over the rows",
                "Of",
                quantiles(),
                groups,
                List.of(
                    Text.of(
                        "Quantiles over rows. A row at which the function is no cost function is"
                            + " among them."))));
  }
}
