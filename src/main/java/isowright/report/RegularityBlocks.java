package isowright.report;

import isowright.report.Document.Block;
import isowright.report.Document.Cell;
import isowright.report.Document.Column;
import isowright.report.Document.Group;
import isowright.report.Document.Paragraph;
import isowright.report.Document.Row;
import isowright.report.Document.Table;
import isowright.study.FitFindings.Fitted;
import isowright.study.FitFindings.Parameter;
import isowright.study.RegularityImposed;
import java.io.IOException;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/** Fits held to be regular: what it costs, what binds, and the free estimate beside them. */
final class RegularityBlocks {

  private RegularityBlocks() {}

  private static Optional<RegularityImposed> imposed(Fitted fit) {
    return fit.regularity().flatMap(r -> r.imposed());
  }

  /** Nothing where no fit was held. */
  static List<Block> of(List<Fitted> fits) {
    List<Fitted> held = fits.stream().filter(fit -> imposed(fit).isPresent()).toList();
    if (held.isEmpty()) {
      return List.of();
    }
    List<Block> blocks = new ArrayList<>();
    blocks.add(price(held));
    for (Fitted fit : held) {
      RegularityImposed imposed = imposed(fit).orElseThrow();
      blocks.add(Paragraph.of(words(fit, imposed)));
      if (!imposed.idle()) {
        blocks.add(beside(fit, imposed));
      }
    }
    return blocks;
  }

  private static Table price(List<Fitted> held) {
    List<Row> rows = new ArrayList<>();
    for (Fitted fit : held) {
      RegularityImposed one = imposed(fit).orElseThrow();
      rows.add(
          new Row(
              Text.of(Terms.technology(fit.technology())),
              List.of(
                  Cell.of(where(one)),
                  Cell.of(Numbers.count(one.held())),
                  Cell.of(Numbers.count(one.withoutProduct())),
                  Cell.of(Numbers.count(one.straight())),
                  Cell.of(Numbers.significant(one.freeSsr(), 5)),
                  Cell.of(Numbers.significant(one.ssr(), 5)),
                  Cell.of(Numbers.percent(one.rise())),
                  Cell.of(Numbers.statistic(one.distance())),
                  Cell.of(
                      one.idle()
                          ? "1"
                          : Numbers.p(one.pLow()) + " to " + Numbers.p(one.pHigh())))));
    }
    return new Table(
        "What holding a technology to regularity costs in fit",
        "Technology",
        List.of(
            Column.ofWords("Held to be regular"),
            Column.ofNumbers("Mixes held", ""),
            Column.ofNumbers("An input held to add nothing", "mixes"),
            Column.ofNumbers("Isoquant held straight", "mixes"),
            Column.ofNumbers("Sum of squared residuals, free", ""),
            Column.ofNumbers("Held", ""),
            Column.ofNumbers("Rise", ""),
            Column.ofNumbers("Rise over residual variance", ""),
            Column.ofWords("Bounds of the p-value")),
        List.of(Group.of(rows)),
        List.of(
            Text.of(
                "Null: the technology is regular there. The law of the rise is a mixture of"
                    + " chi-squared laws whose weights are not known, so the p-value has bounds"
                    + " only; they suppose independent rows of equal variance.")));
  }

  private static String where(RegularityImposed imposed) {
    return imposed.where().equals("everywhere") ? "at every row" : "at the geometric mean";
  }

  private static String words(Fitted fit, RegularityImposed imposed) {
    String name = Terms.technology(fit.technology());
    if (imposed.idle()) {
      return name
          + ": the free estimate is regular "
          + where(imposed)
          + ", so nothing was changed by asking for it.";
    }
    return name
        + " was held to be regular "
        + where(imposed)
        + ". The best fit was reached from "
        + imposed.agreeing()
        + " of "
        + imposed.starts()
        + " starts. Between those mixes and beyond them it need not be regular; every plan says"
        + " whether it is where the answer lies. Where something binds, an input adds next to"
        + " nothing or two inputs replace one another nearly without limit: that is the bound, not"
        + " a finding. Standard errors take what binds as known, and an estimate at a bound is not"
        + " normal, so its intervals are a guide; a bootstrap does not mend this (Andrews 2000).";
  }

  private static Table beside(Fitted fit, RegularityImposed imposed) {
    List<Row> rows = new ArrayList<>();
    for (Parameter parameter : fit.parameters()) {
      rows.add(
          new Row(
              Text.of(Terms.parameter(parameter.name())),
              List.of(
                  Cells.figure(Optional.ofNullable(imposed.free().get(parameter.name()))),
                  Cells.figure(parameter.figure()))));
    }
    return new Table(
        Terms.technology(fit.technology()) + ": free estimate, and held to be regular",
        "Parameter",
        List.of(Column.ofNumbers("Free", ""), Column.ofNumbers("Held to be regular", "")),
        List.of(Group.of(rows)),
        List.of());
  }

  /** Into the findings file, beside the counts of rows. */
  static void write(JsonFile file, Fitted fit) throws IOException {
    Optional<RegularityImposed> found = imposed(fit);
    if (found.isEmpty()) {
      return;
    }
    RegularityImposed imposed = found.get();
    file.object(
        "regularityImposed",
        () -> {
          file.text("where", imposed.where());
          file.whole("held", imposed.held());
          file.whole("binding", imposed.binding());
          file.whole("withoutProduct", imposed.withoutProduct());
          file.whole("straight", imposed.straight());
          file.number("freeSsr", imposed.freeSsr());
          file.number("ssr", imposed.ssr());
          file.number("rise", imposed.rise());
          file.number("distance", imposed.distance());
          file.number("pLow", imposed.pLow());
          file.number("pHigh", imposed.pHigh());
          file.whole("starts", imposed.starts());
          file.whole("agreeing", imposed.agreeing());
          file.figures("freeParameters", imposed.free());
        });
  }
}
