package isowright.study;

import isowright.study.FitFindings.Curvature;
import isowright.study.FitFindings.Fitted;
import isowright.study.FitFindings.Given;
import isowright.study.FitFindings.Point;
import isowright.study.FitFindings.ProfilePoint;
import isowright.study.PlanFindings.CurvePoint;
import isowright.study.PlanFindings.Mix;
import isowright.study.PlanFindings.Planned;
import isowright.study.PlanFindings.Reviewed;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.function.UnaryOperator;

/**
 * Findings at the edge of what can be drawn, made from those of the invented glassworks: sizes from
 * 1e-12 to 1e12, one plant, one point, values that never change, filed costs below least cost,
 * intervals that are open or missing, names longer than a page is wide.
 */
public final class DistortedFindings {

  /** A name that fits nowhere. */
  public static final String LONG =
      "the technology of the filing of the second regulatory period as corrected in the letter of"
          + " the twenty-third of November";

  private DistortedFindings() {}

  /** All of them, by what is wrong. */
  public static Map<String, Findings> all() {
    Map<String, Findings> all = new LinkedHashMap<>();
    all.put("sizes of 1e-12", scaled(1e-12));
    all.put("sizes of 1e12", scaled(1e12));
    all.put("one plant", few(1));
    all.put("two points", few(2));
    all.put("nothing varies", constant());
    all.put("costs far apart", farApart());
    all.put("filed below least cost", belowLeastCost());
    all.put("intervals open or missing", without(Double.NaN));
    all.put("intervals without end", without(Double.POSITIVE_INFINITY));
    all.put("long names", longNames());
    all.put("nothing answered", FindingsFixture.troubled());
    return all;
  }

  private static Findings scaled(double by) {
    UnaryOperator<Figure> figure = f -> scaled(f, by);
    return changed(
        fit -> fitted(fit, fit.points().stream().map(p -> shifted(p, Math.log(by))).toList()),
        plan ->
            planned(
                plan,
                by,
                figure,
                plan.curve().stream().map(p -> point(p, by, figure)).toList(),
                plan.plants().stream().map(m -> mix(m, by)).toList()),
        review -> reviewed(review, review.filed() * by, review.leastCost().map(figure), figure));
  }

  /** So many plants, points of a curve and rows. */
  private static Findings few(int many) {
    return changed(
        fit -> fitted(fit, first(fit.points(), many)),
        plan -> planned(plan, 1, f -> f, first(plan.curve(), many), first(plan.plants(), many)),
        review -> review);
  }

  private static <T> List<T> first(List<T> list, int many) {
    return list.subList(0, Math.min(many, list.size()));
  }

  private static Findings constant() {
    UnaryOperator<Figure> flat = f -> Figure.estimated(f.value(), 0, f.value(), f.value(), "delta");
    return changed(
        fit ->
            flat(
                fitted(
                    fit,
                    fit.points().stream()
                        .map(p -> new Point(p.row(), p.plant(), p.period(), 3, 3, 0))
                        .toList())),
        plan ->
            planned(
                plan,
                1,
                flat,
                plan.curve().stream().map(p -> same(p, plan.curve().get(0))).toList(),
                plan.plants().stream().map(m -> same(m, plan.plants().get(0))).toList()),
        review -> reviewed(review, review.filed(), flat));
  }

  /** Costs that differ by a factor of 1e12 from one another. */
  private static Findings farApart() {
    return changed(
        fit -> fit,
        plan -> plan,
        review -> reviewed(review, review.filed() * 1e12, figure -> figure));
  }

  private static Findings belowLeastCost() {
    return changed(
        fit -> fit,
        plan -> plan,
        review ->
            reviewed(
                review,
                review.filed() / 3,
                f ->
                    Figure.estimated(
                        -f.value(),
                        Math.abs(f.value()) / 10,
                        -1.2 * Math.abs(f.value()),
                        -0.8 * Math.abs(f.value()),
                        "delta")));
  }

  /** Every interval ends at that number, and marginal cost is that number. */
  private static Findings without(double end) {
    UnaryOperator<Figure> open = f -> Figure.estimated(f.value(), Double.NaN, -end, end, "profile");
    return changed(
        fit -> fit,
        plan ->
            planned(
                plan,
                1,
                open,
                plan.curve().stream()
                    .map(
                        p ->
                            new CurvePoint(
                                p.target(),
                                open.apply(p.cost()),
                                Figure.exact(end),
                                open.apply(p.averageCost()),
                                p.mix(),
                                p.inside()))
                    .toList(),
                plan.plants()),
        review -> reviewed(review, review.filed(), open));
  }

  private static Findings longNames() {
    Findings plain = FindingsFixture.givenOnly();
    Map<String, String> units = new LinkedHashMap<>();
    plain.units().inputs().forEach((input, unit) -> units.put(input, LONG));
    List<Given> given =
        plain.given().stream()
            .map(
                g ->
                    new Given(
                        LONG,
                        g.technology(),
                        g.parameters(),
                        g.outputElasticity(),
                        g.returnsToScale(),
                        g.substitution(),
                        g.remarks()))
            .toList();
    return new Findings(
        plain.run(),
        new Findings.Units(LONG, units, LONG),
        plain.confidence(),
        plain.records(),
        plain.fits(),
        given,
        plain.plans(),
        plain.reviews(),
        plain.remarks());
  }

  private static Findings changed(
      UnaryOperator<Fitted> fit, UnaryOperator<Planned> plan, UnaryOperator<Reviewed> review) {
    Findings plain = FindingsFixture.glassworks();
    return new Findings(
        plain.run(),
        plain.units(),
        plain.confidence(),
        plain.records(),
        plain.fits().stream().map(fit).toList(),
        plain.given(),
        plain.plans().stream().map(plan).toList(),
        plain.reviews().stream().map(review).toList(),
        plain.remarks());
  }

  private static Figure scaled(Figure figure, double by) {
    return new Figure(
        figure.value() * by,
        figure
            .uncertainty()
            .map(
                u ->
                    new Figure.Uncertainty(
                        u.standardError() * by, u.low() * by, u.high() * by, u.method())));
  }

  private static Point shifted(Point p, double by) {
    return new Point(
        p.row(), p.plant(), p.period(), p.actual() + by, p.fitted() + by, p.residual());
  }

  private static Mix mix(Mix m, double by) {
    return new Mix(m.plant(), m.period(), m.first() * by, m.second() * by, m.output() * by);
  }

  private static Mix same(Mix m, Mix as) {
    return new Mix(m.plant(), m.period(), as.first(), as.second(), as.output());
  }

  private static CurvePoint point(CurvePoint p, double by, UnaryOperator<Figure> figure) {
    Map<String, Double> mix = new LinkedHashMap<>();
    p.mix().forEach((input, quantity) -> mix.put(input, quantity * by));
    return new CurvePoint(
        p.target() * by,
        figure.apply(p.cost()),
        figure.apply(p.marginalCost()),
        figure.apply(p.averageCost()),
        mix,
        p.inside());
  }

  private static CurvePoint same(CurvePoint p, CurvePoint as) {
    return new CurvePoint(
        p.target(), as.cost(), as.marginalCost(), as.averageCost(), as.mix(), true);
  }

  private static Planned planned(
      Planned p,
      double by,
      UnaryOperator<Figure> figure,
      List<CurvePoint> curve,
      List<Mix> plants) {
    Map<String, Figure> mix = new LinkedHashMap<>();
    p.mix().forEach((input, quantity) -> mix.put(input, scaled(quantity, by)));
    return new Planned(
        p.question(),
        p.technology(),
        p.estimated(),
        p.target() * by,
        p.prices(),
        p.productivity(),
        p.limits(),
        p.status(),
        mix,
        p.cost().map(figure),
        p.marginalCost().map(figure),
        p.averageCost().map(figure),
        p.shares(),
        p.optimality(),
        curve,
        p.isoquant().stream().map(q -> new double[] {q[0] * by, q[1] * by}).toList(),
        plants,
        p.remarks());
  }

  private static Reviewed reviewed(Reviewed r, double filed, UnaryOperator<Figure> figure) {
    return reviewed(r, filed, r.leastCost(), figure);
  }

  private static Reviewed reviewed(
      Reviewed r, double filed, Optional<Figure> leastCost, UnaryOperator<Figure> figure) {
    return new Reviewed(
        r.plant(),
        r.period(),
        r.technology(),
        filed,
        r.atPrices(),
        leastCost,
        r.gap().map(figure),
        r.unreconciled(),
        r.technical().map(figure),
        r.mix().map(figure),
        r.status(),
        r.remarks());
  }

  private static Fitted fitted(Fitted f, List<Point> points) {
    return fitted(f, points, f.curvature(), f.outputElasticity(), f.returnsToScale());
  }

  /** Elasticities whose intervals have no width, and a profile that never changes. */
  private static Fitted flat(Fitted f) {
    Map<String, Figure> elasticities = new LinkedHashMap<>();
    f.outputElasticity()
        .forEach((input, e) -> elasticities.put(input, Figure.estimated(0, 0, 0, 0, "delta")));
    return fitted(
        f,
        f.points(),
        f.curvature()
            .map(
                c ->
                    new Curvature(
                        "flat",
                        c.words(),
                        c.curve().stream()
                            .map(p -> new ProfilePoint(p.curvature(), p.substitution(), 1))
                            .toList(),
                        0,
                        Double.POSITIVE_INFINITY,
                        1)),
        elasticities,
        f.returnsToScale().map(s -> Figure.estimated(1, 0, 1, 1, "delta")));
  }

  private static Fitted fitted(
      Fitted f,
      List<Point> points,
      Optional<Curvature> curvature,
      Map<String, Figure> elasticities,
      Optional<Figure> scale) {
    return new Fitted(
        f.technology(),
        f.how(),
        f.state(),
        f.parameters(),
        f.covariance(),
        f.summary(),
        elasticities,
        scale,
        f.substitution(),
        f.demandElasticity(),
        f.regularity(),
        curvature,
        f.tests(),
        f.plantLevels(),
        f.panel(),
        f.smearing(),
        points,
        f.influence(),
        f.robustness(),
        f.frontier(),
        f.remarks());
  }
}
