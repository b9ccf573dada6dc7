package isowright.report;

import isowright.study.Figure;
import isowright.study.PlanFindings.Detail;
import isowright.study.PlanFindings.Efficiency;
import isowright.study.PlanFindings.Needed;
import isowright.study.PlanFindings.Scale;
import isowright.study.ReviewFindings;
import isowright.study.ReviewFindings.Allowed;
import isowright.study.ReviewFindings.Band;
import isowright.study.ReviewFindings.Groups;
import isowright.study.ReviewFindings.Order;
import isowright.study.ReviewFindings.Placed;
import isowright.study.ReviewFindings.Variant;
import isowright.study.Study;
import java.io.IOException;
import java.util.List;
import java.util.Optional;

/** What follows from filed costs, as it stands in the findings file. */
final class ReviewJson {

  private ReviewJson() {}

  /** What follows from the gap of one filing; only what there is. */
  static void detail(JsonFile file, Detail detail) throws IOException {
    file.figure("ratio", Optional.of(detail.ratio()));
    if (detail.efficiency().isPresent()) {
      Efficiency efficiency = detail.efficiency().get();
      file.object(
          "efficiency",
          () -> {
            file.figure("technical", Optional.of(efficiency.technical()));
            file.figure("mix", Optional.of(efficiency.mix()));
            file.figure("cost", Optional.of(efficiency.cost()));
          });
    }
    if (detail.scale().isPresent()) {
      Scale found = detail.scale().get();
      file.object(
          "scale",
          () -> {
            file.text("state", found.state());
            file.figure("elasticity", Optional.of(found.elasticity()));
            present(file, "efficientOutput", found.output());
            present(file, "part", found.part());
          });
    }
    file.list("needed", detail.needed(), false, needed -> needed(file, needed));
  }

  private static void present(JsonFile file, String key, Optional<Figure> figure)
      throws IOException {
    if (figure.isPresent()) {
      file.figure(key, figure);
    }
  }

  private static void needed(JsonFile file, Needed needed) throws IOException {
    file.text("kind", needed.kind());
    file.text("input", needed.input());
    file.number("asIs", needed.asIs());
    present(file, "value", needed.value());
    file.number("low", needed.low());
    file.number("high", needed.high());
    file.number("end", needed.end());
    file.number("costAtEnd", needed.costAtEnd());
    file.truth("searchedToBound", needed.regular());
  }

  /** The review as a whole. */
  static void write(JsonFile file, ReviewFindings review) throws IOException {
    file.object(
        "review",
        () -> {
          file.text("reference", review.reference());
          file.list("orders", review.orders(), false, order -> order(file, order));
          file.list("variants", review.variants(), false, variant -> variant(file, variant));
          file.list(
              "omissions",
              review.omissions(),
              true,
              omission -> {
                file.text("technology", omission.technology());
                file.text("period", omission.period());
                file.text("plant", omission.plant());
                file.number("gap", omission.gap());
                file.number("share", omission.share());
              });
          file.list(
              "spreads",
              review.spreads(),
              true,
              spread -> {
                file.text("plant", spread.plant());
                file.text("period", spread.period());
                file.whole("choices", spread.choices());
                file.number("low", spread.low());
                file.text("lowBy", spread.lowBy());
                file.number("high", spread.high());
                file.text("highBy", spread.highBy());
              });
          terms(file, review.terms());
          file.list("allowances", review.allowances(), false, allowed -> allowed(file, allowed));
          file.remarks("remarks", review.remarks());
        });
  }

  private static void order(JsonFile file, Order order) throws IOException {
    file.text("technology", order.technology());
    file.text("period", order.period());
    file.text("simulation", order.simulation());
    file.whole("draws", order.draws());
    file.whole("seed", order.seed());
    file.whole("drawsWithoutAnswer", order.without());
    file.list("plants", order.plants(), true, placed -> placed(file, placed));
    groups(file, "groups", Optional.of(order.groups()));
    groups(file, "groupsWithYear", order.groupsWithYear());
  }

  private static void placed(JsonFile file, Placed placed) throws IOException {
    file.text("plant", placed.plant());
    file.whole("rank", placed.rank());
    file.figure("ratio", Optional.of(placed.ratio()));
    band(file, "band", Optional.of(placed.band()));
    band(file, "bandWithYear", placed.bandWithYear());
    file.numbers("probabilities", placed.probabilities().stream().mapToDouble(p -> p).toArray());
  }

  private static void band(JsonFile file, String key, Optional<Band> band) throws IOException {
    if (band.isPresent()) {
      file.wholes(key, List.of(band.get().low(), band.get().high()));
    }
  }

  private static void groups(JsonFile file, String key, Optional<Groups> groups)
      throws IOException {
    if (groups.isEmpty()) {
      return;
    }
    file.object(
        key,
        () -> {
          if (groups.get().critical().isPresent()) {
            file.number("critical", groups.get().critical().get());
          }
          file.list("plants", groups.get().plants(), true, plants -> file.texts("plants", plants));
        });
  }

  private static void variant(JsonFile file, Variant variant) throws IOException {
    file.text("technology", variant.technology());
    file.text("period", variant.period());
    file.text("choice", variant.choice());
    file.text("words", variant.words());
    file.text("money", variant.money());
    file.whole("filings", variant.filings());
    file.number("filed", variant.filed());
    file.figure("leastCost", Optional.of(variant.leastCost()));
    file.figure("gap", Optional.of(variant.gap()));
    file.figure("share", Optional.of(variant.share()));
  }

  private static void terms(JsonFile file, Optional<Study.Allowance> terms) throws IOException {
    if (terms.isEmpty()) {
      return;
    }
    Study.Allowance written = terms.get();
    file.object(
        "allowanceTerms",
        () -> {
          file.number("controllable", written.controllable());
          file.number("quantile", written.quantile());
          file.whole("years", written.years());
          file.number("frontierShift", written.frontierShift());
          file.number("index", written.index());
        });
  }

  private static void allowed(JsonFile file, Allowed allowed) throws IOException {
    file.text("plant", allowed.plant());
    file.text("period", allowed.period());
    file.text("technology", allowed.technology());
    file.number("filed", allowed.filed());
    file.number("gap", allowed.gap());
    file.number("gapUsed", allowed.gapUsed());
    file.number("margin", allowed.margin());
    file.number("controllableGap", allowed.controllableGap());
    file.list(
        "years",
        allowed.years(),
        true,
        year -> {
          file.whole("year", year.year());
          file.number("rest", year.rest());
          file.number("removed", year.removed());
          file.number("controllable", year.controllable());
          file.number("shift", year.shift());
          file.number("index", year.index());
          file.number("allowance", year.allowance());
        });
  }
}
