package isowright.report;

import isowright.report.Document.Cell;
import isowright.report.Document.Column;
import isowright.report.Document.Group;
import isowright.report.Document.Row;
import isowright.report.Document.Table;
import isowright.study.PlanFindings.Detail;
import isowright.study.PlanFindings.Efficiency;
import isowright.study.PlanFindings.Reviewed;
import isowright.study.PlanFindings.Scale;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/** The parts of gaps as ratios of costs, and where output stands against the efficient scale. */
final class EfficiencyBlocks {

  private EfficiencyBlocks() {}

  /** The table for reviews in their order; absent where none has a gap. */
  static Optional<Table> table(Material material, String technology, List<Reviewed> reviews) {
    List<Row> rows = new ArrayList<>();
    boolean scaled =
        reviews.stream()
            .flatMap(review -> review.detail().stream())
            .anyMatch(detail -> detail.scale().isPresent());
    boolean found =
        reviews.stream()
            .flatMap(review -> review.detail().stream())
            .anyMatch(detail -> detail.scale().flatMap(Scale::output).isPresent());
    for (Reviewed review : reviews) {
      Optional<Detail> known =
          review.detail().filter(d -> d.efficiency().isPresent() || d.scale().isPresent());
      if (known.isPresent()) {
        Detail detail = known.get();
        rows.add(new Row(Text.of(review.plant()), cells(review.period(), detail, scaled, found)));
      }
    }
    if (rows.isEmpty()) {
      return Optional.empty();
    }
    return Optional.of(
        new Table(
            (scaled ? "Ratios of costs and scale, by " : "Ratios of costs, by ")
                + Terms.technology(technology),
            "Plant",
            columns(material, scaled, found),
            List.of(Group.of(rows)),
            notes(material, scaled, found)));
  }

  private static List<Text> notes(Material material, boolean scaled, boolean found) {
    List<Text> notes = new ArrayList<>();
    notes.add(
        Text.of(
            "Technical × mix = cost: least cost over price × quantity. A technical ratio above one"
                + " is a plant that does better than the reference. "
                + Phrases.sentence(material.interval())
                + "s beneath."));
    if (scaled) {
      notes.add(
          Text.of(
              "Scale is for information alone and no part of the gap: output is what the plant is"
                  + " asked for."
                  + (found
                      ? " Its worth is what the same output would cost less at the unit cost of the"
                          + " efficient scale."
                      : "")));
    }
    return notes;
  }

  private static List<Column> columns(Material material, boolean scale, boolean found) {
    List<Column> columns = new ArrayList<>();
    columns.add(Column.ofWords("Period"));
    columns.add(Column.ofNumbers("Technical", "ratio"));
    columns.add(Column.ofNumbers("Mix", "ratio"));
    columns.add(Column.ofNumbers("Cost", "ratio"));
    if (scale) {
      columns.add(Column.ofNumbers("Returns to scale", "at least cost"));
    }
    if (found) {
      columns.add(Column.ofNumbers("Efficient scale", material.outputUnit()));
      columns.add(Column.ofNumbers("Worth of scale", material.money()));
    }
    if (scale) {
      columns.add(Column.ofWords("Average cost"));
    }
    return columns;
  }

  private static List<Cell> cells(String period, Detail detail, boolean scaled, boolean found) {
    Optional<Efficiency> ratios = detail.efficiency();
    Optional<Scale> scale = detail.scale();
    List<Cell> cells = new ArrayList<>();
    cells.add(Cell.of(period));
    cells.add(Cells.figure(ratios.map(Efficiency::technical)));
    cells.add(Cells.figure(ratios.map(Efficiency::mix)));
    cells.add(Cells.figure(ratios.map(Efficiency::cost)));
    if (scaled) {
      cells.add(Cells.figure(scale.map(Scale::elasticity)));
    }
    if (found) {
      cells.add(Cells.figure(scale.flatMap(Scale::output)));
      cells.add(Cells.figure(scale.flatMap(Scale::part)));
    }
    if (scaled) {
      cells.add(Cell.of(scale.map(Scale::state).map(EfficiencyBlocks::words).orElse("")));
    }
    return cells;
  }

  private static String words(String state) {
    return switch (state) {
      case "found" -> "least within the records";
      case "same-returns" -> "has no least, returns being the same";
      case "still-falling" -> "still falls at the largest output of the records";
      case "still-rising" -> "falls towards the smallest output of the records";
      case "most-costly" -> "has a greatest, not a least";
      default -> "has no answer on the way";
    };
  }
}
