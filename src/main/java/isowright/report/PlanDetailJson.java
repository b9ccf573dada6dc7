package isowright.report;

import isowright.study.Figure;
import isowright.study.PlanDetail;
import isowright.study.PlanDetail.Change;
import isowright.study.PlanDetail.Demand;
import isowright.study.PlanDetail.End;
import isowright.study.PlanDetail.Envelope;
import isowright.study.PlanDetail.PlantPart;
import java.io.IOException;
import java.util.Map;
import java.util.Optional;

/**
 * What a plan says beside mix and cost, as it stands in the findings file. Keys for what was not
 * asked or does not exist (an envelope where nothing is held) are left out.
 */
final class PlanDetailJson {

  private PlanDetailJson() {}

  static void write(JsonFile file, PlanDetail detail) throws IOException {
    file.text("asked", detail.asked());
    file.text("goal", detail.goal());
    if (detail.goal().equals("budget")) {
      known(file, "budget", detail.stated().orElse(Double.NaN));
    } else if (detail.goal().equals("profit")) {
      known(file, "outputPrice", detail.stated().orElse(Double.NaN));
    }
    there(file, "profit", detail.profit());
    there(file, "output", detail.output());
    file.list(
        "multipliers",
        detail.multipliers(),
        false,
        worth -> {
          file.text("constraint", worth.kind());
          file.text("of", worth.of());
          known(file, "bound", worth.bound());
          there(file, "value", worth.value());
          file.text("words", worth.words());
        });
    checks(file, detail);
    proof(file, detail);
    envelope(file, detail.envelope());
    efficientScale(file, detail);
    file.figures("costElasticities", detail.costElasticities());
    file.object(
        "demandElasticities",
        () -> {
          for (Map.Entry<String, Map<String, Figure>> row :
              detail.demandElasticities().entrySet()) {
            file.figures(row.getKey(), row.getValue());
          }
        });
    file.list("demand", detail.demands(), false, demand -> demand(file, demand));
    file.list("changes", detail.changes(), false, change -> change(file, change));
    file.list("across", detail.across(), false, part -> part(file, part));
    file.list(
        "withoutPlan",
        detail.withoutPlan(),
        true,
        point -> {
          file.number("target", point.target());
          file.text("status", point.status());
          file.text("reason", point.reason());
        });
    if (detail.nearest().isPresent()) {
      file.object("nearestRegular", () -> PlanJson.point(file, detail.nearest().get()));
    }
  }

  /** What there is nothing to say of is left out: null would say that it could not be had. */
  private static void there(JsonFile file, String key, Optional<Figure> figure) throws IOException {
    if (figure.isPresent()) {
      file.figure(key, figure);
    }
  }

  private static void known(JsonFile file, String key, double number) throws IOException {
    if (Double.isFinite(number)) {
      file.number(key, number);
    }
  }

  private static void checks(JsonFile file, PlanDetail detail) throws IOException {
    if (detail.checks().isEmpty()) {
      return;
    }
    PlanDetail.Checks checks = detail.checks().get();
    file.object(
        "checks",
        () -> {
          known(file, "output", checks.output());
          known(file, "firstOrder", checks.firstOrder());
          known(file, "secondOrder", checks.secondOrder());
          known(file, "shephard", checks.shephard());
          known(file, "homogeneity", checks.homogeneity());
          known(file, "marginalCost", checks.marginalCost());
        });
  }

  private static void proof(JsonFile file, PlanDetail detail) throws IOException {
    if (detail.proof().isEmpty()) {
      return;
    }
    PlanDetail.Proved proof = detail.proof().get();
    file.object(
        "proof",
        () -> {
          file.text("scope", proof.scope());
          file.number("gap", proof.gap());
          file.whole("parts", proof.parts());
          file.text("reason", proof.reason());
        });
  }

  private static void envelope(JsonFile file, Optional<Envelope> found) throws IOException {
    if (found.isEmpty()) {
      return;
    }
    Envelope envelope = found.get();
    file.object(
        "envelope",
        () -> {
          file.numbersByName("held", envelope.held());
          there(file, "touch", envelope.touch());
          file.list(
              "points",
              envelope.points(),
              false,
              point -> {
                file.number("target", point.target());
                file.figure("shortRunCost", Optional.of(point.shortRun()));
                file.figure("shortRunMarginalCost", Optional.of(point.shortRunMarginal()));
                file.figure("longRunCost", Optional.of(point.longRun()));
                file.figure("longRunMarginalCost", Optional.of(point.longRunMarginal()));
                file.figure("shortRunAverageCost", Optional.of(point.shortRunAverage()));
                file.figure("longRunAverageCost", Optional.of(point.longRunAverage()));
                file.truth("shortRunInside", point.shortRunInside());
                file.truth("longRunInside", point.longRunInside());
              });
        });
  }

  private static void efficientScale(JsonFile file, PlanDetail detail) throws IOException {
    if (detail.efficientScale().isEmpty()) {
      return;
    }
    PlanDetail.EfficientScale scale = detail.efficientScale().get();
    file.object(
        "efficientScale",
        () -> {
          file.text("averageCost", scale.course());
          known(file, "from", scale.from());
          known(file, "to", scale.to());
          there(file, "output", scale.output());
          there(file, "leastAverageCost", scale.averageCost());
          file.truth("inside", scale.inside());
        });
  }

  private static void demand(JsonFile file, Demand demand) throws IOException {
    file.text("price", demand.price());
    file.list(
        "points",
        demand.points(),
        false,
        point -> {
          file.number("price", point.price());
          file.figures("mix", point.mix());
          file.figure("cost", Optional.of(point.cost()));
          file.truth("inside", point.inside());
        });
  }

  private static void change(JsonFile file, Change change) throws IOException {
    file.text("what", change.what());
    file.text("input", change.input());
    file.text("span", change.span());
    end(file, "low", change.low());
    end(file, "high", change.high());
  }

  private static void end(JsonFile file, String key, End end) throws IOException {
    file.object(
        key,
        () -> {
          file.number("at", end.at());
          there(file, "result", end.result());
          there(file, "relative", end.relative());
        });
  }

  private static void part(JsonFile file, PlantPart part) throws IOException {
    file.text("plant", part.plant());
    file.text("technology", part.technology());
    file.truth("runs", part.runs());
    file.figure("output", Optional.of(part.output()));
    file.figure("cost", Optional.of(part.cost()));
    there(file, "marginalCost", part.marginalCost());
    known(file, "capacity", part.capacity());
    file.number("runningCost", part.runningCost());
    file.numbersByName("prices", part.prices());
    file.figures("mix", part.mix());
    file.truth("inside", part.inside());
  }
}
