package isowright.estimation;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import isowright.cost.CostArguments;
import isowright.cost.CostElasticities;
import isowright.cost.CostForm;
import isowright.estimation.CostSpecification.Concavity;
import isowright.estimation.CostSpecification.Equations;
import isowright.regression.Groups;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.Test;

/** Factors that make cost concave: derivatives, and what becomes of fits that violate it. */
class CurvatureTest {

  private static Curvature pairs() {
    return Curvature.ofPairs(List.of("a", "b", "c", "d", "e", "f", "g"), 4);
  }

  /** Three inputs beside the last; b_ij at 0 … 5, three first-order coefficients, one more. */
  private static Curvature atPoint() {
    int[][] places = {{0, 1, 2}, {1, 3, 4}, {2, 4, 5}};
    double[][] shares = new double[3][10];
    for (int i = 0; i < 3; i++) {
      shares[i][6 + i] = 1;
      shares[i][9] = 0.3 * i;
    }
    List<String> names = new ArrayList<>();
    for (int k = 0; k < 10; k++) {
      names.add("k" + k);
    }
    return Curvature.atPoint(names, places, shares);
  }

  @Test
  void derivativesAreThoseOfTheValue() {
    Random random = new Random(31);
    for (Curvature map : List.of(pairs(), atPoint())) {
      int size = map.names().size();
      double[] phi = random.doubles(size, -1, 1).toArray();
      double[] g = random.doubles(size, -1, 1).toArray();
      double[][] jacobian = map.jacobian(phi);
      double[][] curvature = map.curvature(phi, g);
      for (int k = 0; k < size; k++) {
        double[] up = phi.clone();
        double[] down = phi.clone();
        up[k] += 1e-3;
        down[k] -= 1e-3;
        double[] above = map.parameters(up);
        double[] below = map.parameters(down);
        double[][] steeper = map.jacobian(up);
        double[][] flatter = map.jacobian(down);
        for (int j = 0; j < size; j++) {
          // θ is quadratic in φ: central differences are exact but for rounding of 1e-16/1e-3
          assertThat(jacobian[j][k]).isCloseTo((above[j] - below[j]) / 2e-3, within(1e-11));
          double bend = 0;
          for (int t = 0; t < size; t++) {
            bend += g[t] * (steeper[t][j] - flatter[t][j]) / 2e-3;
          }
          assertThat(curvature[j][k]).isCloseTo(bend, within(1e-11));
        }
      }
    }
  }

  /** Where nothing is violated the start gives the same parameters back. */
  @Test
  void startIsTheParametersThemselves() {
    Random random = new Random(32);
    for (Curvature map : List.of(pairs(), atPoint())) {
      double[] phi = random.doubles(map.names().size(), 1, 2).toArray();
      double[] theta = map.parameters(phi);
      double[] again = map.parameters(map.start(theta));
      for (int k = 0; k < theta.length; k++) {
        // eigenvalues below 1e-3 of the largest are raised; random squares are rarely that thin
        assertThat(again[k]).isCloseTo(theta[k], within(0.05));
      }
    }
  }

  /**
   * Costs whose inputs would be bought more the dearer they are: b_ij = 0.2 at shares of a third.
   */
  private static CostData violating() {
    Random random = new Random(33);
    int rows = 120;
    double[][] points = new double[4][rows];
    double[] logCost = new double[rows];
    double[][] shares = new double[3][rows];
    for (int r = 0; r < rows; r++) {
      for (int k = 0; k < 4; k++) {
        points[k][r] = 0.3 * random.nextGaussian();
      }
      double a = points[0][r] - points[2][r];
      double b = points[1][r] - points[2][r];
      shares[0][r] = 0.3 + 0.25 * a + 0.01 * random.nextGaussian();
      shares[1][r] = 0.3 + 0.05 * b + 0.01 * random.nextGaussian();
      shares[2][r] = 1 - shares[0][r] - shares[1][r];
      logCost[r] =
          points[2][r]
              + 0.3 * a
              + 0.3 * b
              + 0.125 * a * a
              + 0.025 * b * b
              + 0.9 * points[3][r]
              + 0.05 * random.nextGaussian();
    }
    double[] base = new double[4];
    Arrays.setAll(base, k -> Math.exp(Arrays.stream(points[k]).average().orElseThrow()));
    return new CostData(
        new CostArguments(List.of("a", "b", "c"), List.of("y"), List.of(), false, base),
        points,
        logCost,
        shares,
        new double[0][],
        List.of(),
        Groups.ofSingleRows(rows));
  }

  private static CostSpecification specification(
      Equations equations, Concavity concavity, int out) {
    return new CostSpecification(
        CostForm.TRANSLOG, equations, true, List.of(), false, false, out, 0.95, concavity);
  }

  /**
   * Ryan and Wales: concave at the point, at a price in likelihood, whichever share is left out.
   */
  @Test
  void violatingTranslogIsMadeConcaveAtTheMean() {
    CostData data = violating();
    double[] mean = new double[4];
    Arrays.setAll(mean, k -> Arrays.stream(data.points()[k]).average().orElseThrow());
    for (Equations equations : Equations.values()) {
      if (equations == Equations.QUANTITIES) {
        continue;
      }
      CostFit free = CostEstimation.fit(data, specification(equations, Concavity.FREE, 2));
      assertThat(CostElasticities.at(free.function(), mean).concave()).as("free").isFalse();
      CostFit held = CostEstimation.fit(data, specification(equations, Concavity.AT_MEAN, 2));
      assertThat(held.system().converged()).as(equations.word()).isTrue();
      assertThat(CostElasticities.at(held.function(), mean).concave()).isTrue();
      CostFit.Imposed imposed = held.imposed().orElseThrow();
      assertThat(imposed.bound()).isPositive();
      // the same search, to the last digit but rounding
      assertThat(imposed.logLikelihood()).isCloseTo(free.system().logLikelihood(), within(1e-9));
      assertThat(held.system().logLikelihood()).isLessThan(imposed.logLikelihood());
      // renewals end at 1e-9 of standard errors, which are below one
      assertThat(CostEstimation.dependenceOnLeftOut(data, held)).isLessThan(1e-7);
    }
  }

  /** Where the free fit is concave at the mean, imposing it changes nothing. */
  @Test
  void concaveFitStaysAsItIs() throws Exception {
    CostData own = CostFixtures.manufacturing();
    double[] base = new double[4];
    Arrays.setAll(base, k -> Math.exp(Arrays.stream(own.points()[k]).average().orElseThrow()));
    CostData data =
        new CostData(
            new CostArguments(own.arguments().inputs(), List.of(), List.of(), false, base),
            own.points(),
            own.logCost(),
            own.shares(),
            own.controls(),
            own.controlNames(),
            own.groups());
    CostFit free = CostEstimation.fit(data, specification(Equations.SHARES, Concavity.FREE, 3));
    CostFit held = CostEstimation.fit(data, specification(Equations.SHARES, Concavity.AT_MEAN, 3));
    assertThat(held.imposed().orElseThrow().bound()).isZero();
    for (int k = 0; k < free.values().length; k++) {
      // both end at 1e-9 of standard errors of order 0.01
      assertThat(held.values()[k]).isCloseTo(free.values()[k], within(1e-9));
      double se = Math.sqrt(free.covariance()[k][k]);
      assertThat(Math.sqrt(held.covariance()[k][k])).isCloseTo(se, within(1e-7));
    }
  }
}
