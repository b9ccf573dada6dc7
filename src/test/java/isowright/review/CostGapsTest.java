package isowright.review;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import isowright.cost.CostElasticities;
import isowright.cost.CostForm;
import isowright.cost.CostFunction;
import isowright.estimation.CostData;
import isowright.estimation.CostEstimation;
import isowright.estimation.CostFit;
import isowright.estimation.CostFixtures;
import isowright.estimation.CostSpecification;
import isowright.estimation.CostSpecification.Equations;
import isowright.estimation.EstimatedCost;
import isowright.estimation.Productivity;
import isowright.inference.DeltaMethod;
import isowright.inference.Estimate;
import isowright.inference.Propagation;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.List;
import java.util.stream.IntStream;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;

/** Filed costs of electricity companies (1970) against a cost equation and a cost system. */
class CostGapsTest {

  private static CostData data;

  @BeforeAll
  static void read() throws IOException {
    data = CostFixtures.electricity();
  }

  /** A fitted cost function, and how sure it is. */
  private record Fitted(CostFunction function, Propagation<CostFunction> propagation) {

    static Fitted of(CostForm form, Equations equations) {
      return of(form, equations, 1);
    }

    /** With standard errors times a factor, and steps of differences with them. */
    static Fitted of(CostForm form, Equations equations, double factor) {
      CostFit fit =
          CostEstimation.fit(
              data, new CostSpecification(form, equations, true, List.of(), false, false, 2, .95));
      EstimatedCost estimated = EstimatedCost.of(data, fit, new Productivity.Typical());
      return new Fitted(
          estimated.function(),
          new Propagation<>(
              estimated.centre(),
              Arrays.stream(estimated.covariance())
                  .map(row -> Arrays.stream(row).map(c -> c * factor * factor).toArray())
                  .toArray(double[][]::new),
              fit.degreesOfFreedom(),
              .95,
              estimated::at));
    }

    List<CostGap> gaps() {
      return CostGaps.against(propagation)
          .of(
              IntStream.range(0, data.rows())
                  .mapToObj(
                      r -> {
                        double cost = Math.exp(data.logCost()[r]);
                        return new CostGaps.Filed(data.point(r), cost, cost, new double[0]);
                      })
                  .toList(),
              function);
    }
  }

  /**
   * Least cost, its standard error and the gap's interval by R's predict.lm (script beside the
   * values, R 4.2.2). Classical covariance, Student's law on 118 degrees of freedom in both; two
   * decompositions of a design of condition number some 1e4 agree to about 1e-9.
   */
  @Test
  void gapsOfACostEquationAreThoseOfR() throws IOException {
    List<CostGap> gaps = Fitted.of(CostForm.COBB_DOUGLAS_SQUARED_OUTPUT, Equations.COST).gaps();
    List<String> lines = Files.readAllLines(Path.of("src/test/resources/reference/cost-gaps.csv"));
    assertThat(lines).hasSize(5);
    for (String line : lines.subList(1, 5)) {
      String[] cells = line.split(",");
      CostGap gap = gaps.get(Integer.parseInt(cells[0]) - 1);
      double least = Double.parseDouble(cells[1]);
      assertThat(gap.leastCost().value()).isCloseTo(least, within(1e-8 * least));
      assertThat(gap.leastCost().standardError())
          .isCloseTo(Double.parseDouble(cells[2]), within(1e-8 * least));
      assertThat(gap.difference().low())
          .isCloseTo(Double.parseDouble(cells[3]), within(1e-8 * least));
      assertThat(gap.difference().high())
          .isCloseTo(Double.parseDouble(cells[4]), within(1e-8 * least));
    }
  }

  @Test
  void partsAddUp() {
    Fitted fitted = Fitted.of(CostForm.TRANSLOG, Equations.SYSTEM);
    CostGaps gaps = CostGaps.against(fitted.propagation());
    List<CostGap> two =
        gaps.of(
            List.of(
                new CostGaps.Filed(data.point(50), 7, 6, new double[0]),
                new CostGaps.Filed(data.point(80), 30, 31, new double[0])),
            fitted.function());
    double sum = 0;
    for (CostGap gap : two) {
      // filed − C against (filed − recorded) + (recorded − C): rounding of numbers of size 30
      assertThat(gap.unreconciled() + gap.remainder().value())
          .isCloseTo(gap.difference().value(), within(1e-13));
      assertThat(gap.remainder().high() - gap.remainder().low())
          .isCloseTo(gap.difference().high() - gap.difference().low(), within(1e-13));
      assertThat(gaps.quantile(gap, .025)).isCloseTo(gap.difference().low(), within(1e-12));
      assertThat(gaps.quantile(gap, .25)).isLessThan(gap.difference().value());
      sum += gap.difference().value();
    }
    GapEstimates.Total total = gaps.total(two);
    assertThat(total.gap().value()).isCloseTo(sum, within(1e-12));
    // errors that share their parameters add up to no more than if they moved together
    assertThat(total.gap().standardError())
        .isLessThanOrEqualTo(
            1.0000001
                * (two.get(0).difference().standardError()
                    + two.get(1).difference().standardError()));
  }

  /**
   * Parts from shares: they add up, the product of the ratios is the cost ratio, and their standard
   * errors are those of differences over whole refound contractions (one parameter moved alone is
   * no longer homogeneous in prices, so that regularity is not asked for there). θ bends strongly
   * where elasticities are .1 to .4, so standard errors are taken a tenth as large, and with them
   * the steps: what differences of fourth order cut off, some 1e-7 of a slope, falls by 1e4.
   */
  @Test
  void partsFromSharesAddUpAndMoveAsDifferencesSay() {
    Fitted fitted = Fitted.of(CostForm.TRANSLOG, Equations.SYSTEM, .1);
    double[] v = data.point(60);
    double[] best = CostElasticities.at(fitted.function(), v).demands();
    double[] mix = {1.15 * best[0], 1.1 * best[1], 1.12 * best[2]};
    double recorded = 0;
    for (int i = 0; i < 3; i++) {
      recorded += Math.exp(v[i]) * mix[i];
    }
    double[] shares = new double[3];
    for (int i = 0; i < 3; i++) {
      shares[i] = Math.exp(v[i]) * mix[i] / recorded;
    }
    double cost = recorded;
    CostGap gap =
        CostGaps.against(fitted.propagation())
            .of(List.of(new CostGaps.Filed(v, 1.02 * cost, cost, shares)), fitted.function())
            .get(0);
    CostGap.Parts parts = gap.parts().orElseThrow();
    assertThat(gap.remainder().value()).isZero();
    // three differences of numbers of the size of the cost
    assertThat(gap.unreconciled() + parts.technical().value() + parts.mix().value())
        .isCloseTo(gap.difference().value(), within(1e-13 * cost));
    assertThat(parts.mix().value()).isPositive();
    assertThat(parts.efficiency().technical().value() * parts.efficiency().mix().value())
        .isCloseTo(parts.efficiency().cost().value(), within(1e-13));
    List<Estimate> differences =
        fitted
            .propagation()
            .estimates(
                f -> {
                  double theta = DualContraction.sought(f, v, mix).orElseThrow().theta();
                  return new double[] {cost - theta * cost, theta * cost - Math.exp(f.logCost(v))};
                },
                DeltaMethod.Scale.LINEAR);
    double se = differences.get(0).standardError();
    assertThat(parts.technical().standardError()).isCloseTo(se, within(1e-6 * se));
    assertThat(parts.mix().standardError())
        .isCloseTo(differences.get(1).standardError(), within(1e-6 * se));
  }

  /** At the value that would have to be true, the cost function says the filed cost. */
  @Test
  void whatWouldHaveToBeTrueMakesTheFiledCostLeast() {
    Fitted fitted = Fitted.of(CostForm.COBB_DOUGLAS_SQUARED_OUTPUT, Equations.COST);
    double[] point = data.point(80);
    double least = Math.exp(fitted.function().logCost(point));
    CostConditions conditions = CostConditions.on(fitted.function(), fitted.propagation());
    for (double filed : new double[] {1.1 * least, .95 * least}) {
      List<Condition> all = conditions.of(point, filed);
      assertThat(all).hasSize(4);
      for (int i = 0; i < 4; i++) {
        double factor = all.get(i).value().orElseThrow().value() / all.get(i).asIs();
        double[] moved = point.clone();
        moved[i] += i < 3 ? Math.log(factor) : -Math.log(factor);
        // the root is sought to 1e-12 in the log of cost
        assertThat(fitted.function().logCost(moved)).isCloseTo(Math.log(filed), within(1e-11));
        assertThat(all.get(i).value().orElseThrow().standardError()).isPositive();
      }
    }
    // a hundred times dearer fuel and labour do not explain a cost a million times too high
    assertThat(conditions.of(point, 1e6 * least)).allMatch(c -> c.value().isEmpty());
  }
}
