package isowright.charts;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import isowright.charts.Chart.Kind;
import isowright.study.Figure;
import isowright.study.Findings;
import isowright.study.FindingsFixture;
import isowright.study.FitFindings.Fitted;
import isowright.study.FitFindings.Point;
import isowright.study.FitFindings.ProfilePoint;
import isowright.study.PlanFindings.CurvePoint;
import isowright.study.PlanFindings.Mix;
import isowright.study.PlanFindings.Planned;
import isowright.study.PlanFindings.Reviewed;
import isowright.study.RealFindings;
import isowright.study.RealFindings.Study;
import java.util.Comparator;
import java.util.List;
import java.util.stream.Stream;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/** The table beside a chart holds the numbers of the findings that the chart draws. */
class ChartTablesTest {

  /** Tables print six significant digits: half a unit in the sixth. */
  private static final double PRINTED = 5.1e-6;

  static Stream<Findings> studies() {
    return Stream.of(
        FindingsFixture.glassworks(),
        FindingsFixture.givenOnly(),
        RealFindings.of(Study.DEMO),
        RealFindings.of(Study.PRIMARY_METALS),
        RealFindings.of(Study.THIRTY_POINTS));
  }

  private static List<Chart> charts(Findings findings, Kind kind) {
    return Charts.of(findings).stream().filter(chart -> chart.kind() == kind).toList();
  }

  private static List<List<String>> rows(Findings findings, Kind kind, String subject) {
    return charts(findings, kind).stream()
        .filter(chart -> chart.subject().equals(subject))
        .findFirst()
        .orElseThrow(() -> new AssertionError("no chart of " + kind + " about " + subject))
        .rows();
  }

  private static String subject(Planned plan) {
    return plan.question() + ", " + plan.technology();
  }

  private static void same(String cell, double value) {
    if (!Double.isFinite(value)) {
      assertThat(cell).isIn("", "unbounded", "-unbounded");
      return;
    }
    assertThat(Double.parseDouble(cell.replace(",", "")))
        .isCloseTo(value, within(PRINTED * Math.abs(value)));
  }

  /** Value, lower and upper end from a column on; ends empty where the figure is exact. */
  private static void same(List<String> row, int column, Figure figure) {
    same(row.get(column), figure.value());
    if (figure.uncertainty().isEmpty()) {
      assertThat(row.subList(column + 1, column + 3)).containsExactly("", "");
    } else {
      same(row.get(column + 1), figure.uncertainty().get().low());
      same(row.get(column + 2), figure.uncertainty().get().high());
    }
  }

  @ParameterizedTest
  @MethodSource("studies")
  void costCurves(Findings findings) {
    for (Planned plan : findings.plans()) {
      if (!plan.answered() || plan.curve().size() < 2) {
        continue;
      }
      List<List<String>> rows = rows(findings, Kind.COST_CURVES, subject(plan));
      assertThat(rows).hasSameSizeAs(plan.curve());
      for (int i = 0; i < rows.size(); i++) {
        CurvePoint point = plan.curve().get(i);
        same(rows.get(i).get(0), point.target());
        same(rows.get(i), 1, point.averageCost());
        same(rows.get(i), 4, point.marginalCost());
        same(rows.get(i), 7, point.cost());
        assertThat(rows.get(i).get(10)).isEqualTo(point.inside() ? "yes" : "no");
      }
      List<List<String>> path = rows(findings, Kind.EXPANSION_PATH, subject(plan));
      List<String> inputs = List.copyOf(findings.units().inputs().keySet());
      for (int i = 0; i < path.size(); i++) {
        for (int k = 0; k < inputs.size(); k++) {
          double quantity = plan.curve().get(i).mix().getOrDefault(inputs.get(k), Double.NaN);
          same(path.get(i).get(1 + k), quantity);
        }
      }
    }
  }

  @ParameterizedTest
  @MethodSource("studies")
  void isoquants(Findings findings) {
    for (Planned plan : findings.plans()) {
      if (!plan.answered() || plan.isoquant().size() < 2) {
        continue;
      }
      List<List<String>> rows = rows(findings, Kind.ISOQUANT, subject(plan));
      int points = plan.isoquant().size();
      assertThat(rows).hasSize(1 + points + Math.min(600, plan.plants().size()));
      List<Figure> mix = List.copyOf(plan.mix().values());
      same(rows.get(0).get(1), mix.get(0).value());
      same(rows.get(0).get(2), mix.get(1).value());
      same(rows.get(0).get(3), plan.target());
      for (int i = 0; i < points; i++) {
        same(rows.get(1 + i).get(1), plan.isoquant().get(i)[0]);
        same(rows.get(1 + i).get(2), plan.isoquant().get(i)[1]);
      }
      for (int i = 0; i < rows.size() - 1 - points; i++) {
        Mix seen = plan.plants().get(i);
        List<String> row = rows.get(1 + points + i);
        assertThat(row.get(0)).isEqualTo(seen.plant() + ", " + seen.period());
        same(row.get(1), seen.first());
        same(row.get(2), seen.second());
        same(row.get(3), seen.output());
      }
    }
  }

  @ParameterizedTest
  @MethodSource("studies")
  void elasticities(Findings findings) {
    List<Chart> charts = charts(findings, Kind.ELASTICITIES);
    assertThat(charts).hasSize(2);
    for (List<String> row : charts.get(0).rows()) {
      same(row, 2, elasticity(findings, row.get(0), row.get(1)));
    }
    for (List<String> row : charts.get(1).rows()) {
      same(row, 2, scale(findings, row.get(1)));
    }
    int technologies =
        findings.given().size() + (int) findings.fits().stream().filter(Fitted::usable).count();
    assertThat(charts.get(1).rows()).hasSize(technologies);
    assertThat(charts.get(0).rows()).hasSize(technologies * findings.units().inputs().size());
  }

  private static Figure elasticity(Findings findings, String input, String technology) {
    return Stream.concat(
            findings.fits().stream()
                .filter(f -> Words.technology(f.technology()).equals(technology))
                .flatMap(f -> Stream.ofNullable(f.outputElasticity().get(input))),
            findings.given().stream()
                .filter(g -> g.name().equals(technology))
                .flatMap(g -> Stream.ofNullable(g.outputElasticity().get(input)))
                .map(Figure::exact))
        .findFirst()
        .orElseThrow();
  }

  private static Figure scale(Findings findings, String technology) {
    return Stream.concat(
            findings.fits().stream()
                .filter(f -> Words.technology(f.technology()).equals(technology))
                .flatMap(f -> f.returnsToScale().stream()),
            findings.given().stream()
                .filter(g -> g.name().equals(technology))
                .map(g -> Figure.exact(g.returnsToScale())))
        .findFirst()
        .orElseThrow();
  }

  @ParameterizedTest
  @MethodSource("studies")
  void fits(Findings findings) {
    for (Fitted fit : findings.fits()) {
      if (fit.points().size() < 2) {
        continue;
      }
      List<List<String>> residuals = rows(findings, Kind.RESIDUALS, fit.technology());
      List<List<String>> actual = rows(findings, Kind.ACTUAL_PREDICTED, fit.technology());
      assertThat(residuals).hasSameSizeAs(fit.points());
      for (int i = 0; i < residuals.size(); i++) {
        Point point = fit.points().get(i);
        assertThat(residuals.get(i).get(0)).isEqualTo(Integer.toString(point.row()));
        assertThat(residuals.get(i).get(1)).isEqualTo(point.plant());
        same(residuals.get(i).get(3), Math.exp(point.fitted()));
        same(residuals.get(i).get(4), point.residual());
        same(actual.get(i).get(3), Math.exp(point.fitted()));
        same(actual.get(i).get(4), Math.exp(point.actual()));
      }
    }
  }

  @ParameterizedTest
  @MethodSource("studies")
  void profiles(Findings findings) {
    for (Fitted fit : findings.fits()) {
      if (fit.curvature().isEmpty()) {
        continue;
      }
      List<ProfilePoint> profile =
          fit.curvature().get().curve().stream()
              .filter(p -> Double.isFinite(p.substitution()) && p.substitution() > 0)
              .sorted(Comparator.comparingDouble(ProfilePoint::substitution))
              .toList();
      List<List<String>> rows = rows(findings, Kind.PROFILE, fit.technology());
      assertThat(rows).hasSameSizeAs(profile);
      for (int i = 0; i < rows.size(); i++) {
        same(rows.get(i).get(0), profile.get(i).substitution());
        same(rows.get(i).get(1), profile.get(i).curvature());
        same(rows.get(i).get(2), profile.get(i).ssr());
        boolean under = profile.get(i).ssr() <= fit.curvature().get().threshold();
        assertThat(rows.get(i).get(3)).isEqualTo(under ? "yes" : "no");
      }
    }
  }

  /** The verdict is that of the gap's interval, the same as everywhere in the report. */
  @ParameterizedTest
  @MethodSource("studies")
  void filings(Findings findings) {
    for (String technology :
        findings.reviews().stream().map(Reviewed::technology).distinct().toList()) {
      List<Reviewed> reviews =
          findings.reviews().stream()
              .filter(r -> r.technology().equals(technology) && r.leastCost().isPresent())
              .toList();
      List<List<String>> rows = rows(findings, Kind.FILING, technology);
      assertThat(rows).hasSameSizeAs(reviews);
      for (int i = 0; i < rows.size(); i++) {
        Reviewed review = reviews.get(i);
        List<String> row = rows.get(i);
        assertThat(row.subList(0, 2)).containsExactly(review.plant(), review.period());
        same(row.get(2), review.filed());
        same(row, 3, review.leastCost().orElseThrow());
        Figure gap = review.gap().orElseThrow();
        same(row, 6, gap);
        double low = gap.uncertainty().map(Figure.Uncertainty::low).orElse(gap.value());
        double high = gap.uncertainty().map(Figure.Uncertainty::high).orElse(gap.value());
        assertThat(row.get(9))
            .isEqualTo(low > 0 ? "above" : high < 0 ? "below" : "cannot be told apart");
      }
    }
  }
}
