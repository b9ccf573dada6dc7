package isowright.report;

import isowright.study.PlanFindings.CurvePoint;
import isowright.study.PlanFindings.Detail;
import isowright.study.PlanFindings.Planned;
import isowright.study.PlanFindings.Reviewed;
import java.io.IOException;
import java.util.Optional;

/** Least-cost plans and filed costs, as they stand in the findings file. */
final class PlanJson {

  private PlanJson() {}

  static void write(JsonFile file, Planned plan) throws IOException {
    file.text("question", plan.question());
    file.text("technology", plan.technology());
    file.truth("estimated", plan.estimated());
    file.number("target", plan.target());
    file.numbersByName("prices", plan.prices());
    file.text("productivity", plan.productivity());
    file.textsByName("limits", plan.limits());
    file.text("status", plan.status());
    file.figures("mix", plan.mix());
    file.figure("cost", plan.cost());
    file.figure("marginalCost", plan.marginalCost());
    file.figure("averageCost", plan.averageCost());
    file.figures("shares", plan.shares());
    file.number("optimality", plan.optimality());
    file.list("curve", plan.curve(), false, point -> point(file, point));
    file.matrix("isoquant", plan.isoquant().toArray(new double[0][]));
    RefitJson.write(file, plan);
    PlanDetailJson.write(file, plan.detail());
    file.remarks("remarks", plan.remarks());
  }

  static void point(JsonFile file, CurvePoint point) throws IOException {
    file.number("target", point.target());
    file.figure("cost", Optional.of(point.cost()));
    file.figure("marginalCost", Optional.of(point.marginalCost()));
    file.figure("averageCost", Optional.of(point.averageCost()));
    file.numbersByName("mix", point.mix());
    file.truth("inside", point.inside());
    file.truth("regular", point.regular());
  }

  static void write(JsonFile file, Reviewed review) throws IOException {
    file.text("plant", review.plant());
    file.text("period", review.period());
    file.text("technology", review.technology());
    file.number("filed", review.filed());
    file.number("atPrices", review.atPrices());
    file.figure("leastCost", review.leastCost());
    file.figure("gap", review.gap());
    file.object(
        "parts",
        () -> {
          file.number("unreconciled", review.unreconciled());
          file.figure("technical", review.technical());
          file.figure("mix", review.mix());
          if (review.detail().isPresent()) {
            file.figure("remainder", review.detail().map(Detail::remainder));
          }
        });
    if (review.detail().isPresent()) {
      ReviewJson.detail(file, review.detail().get());
    }
    file.text("status", review.status());
    RefitJson.write(file, review);
    file.remarks("remarks", review.remarks());
  }
}
