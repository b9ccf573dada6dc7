package isowright.leastcost;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import isowright.leastcost.RandomTechnologies.Planted;
import isowright.technology.CobbDouglas;
import isowright.technology.Technology;
import java.util.List;
import org.apache.commons.math3.linear.Array2DRowRealMatrix;
import org.apache.commons.math3.linear.EigenDecomposition;
import org.apache.commons.math3.linear.MatrixUtils;
import org.apache.commons.math3.linear.RealMatrix;
import org.apache.commons.math3.linear.SingularValueDecomposition;
import org.junit.jupiter.api.Test;

/** The checks pass for plans that are right and see those that are not. */
class PlanChecksTest {

  @Test
  void rightPlansPass() {
    RandomTechnologies random = new RandomTechnologies(81);
    for (int k = 0; k < 600; k++) {
      Planted planted = random.any(k);
      Question question = planted.question();
      if (k % 2 == 0) {
        question = question.holding(0, planted.mix()[0] * random.between(.8, 1.25));
      }
      Plan plan = Minimiser.of(planted.technology()).plan(question);
      if (!plan.answered() || curved(planted.technology())) {
        continue;
      }
      PlanChecks checks = PlanChecks.of(planted.technology(), question, plan);
      assertThat(checks.output()).as("%d", k).isLessThan(1e-11);
      assertThat(checks.firstOrder()).as("%d", k).isLessThan(1e-9);
      if (!Double.isNaN(checks.secondOrder())) {
        assertThat(checks.secondOrder()).as("%d", k).isPositive();
      }
      // Fifth derivatives up to 1e7 times 4e-15, see the step of the differences.
      assertThat(checks.shephard()).as("%d %s", k, planted.technology()).isLessThan(1e-7);
      assertThat(checks.homogeneity()).as("%d", k).isLessThan(1e-11);
      assertThat(checks.marginalCost()).as("%d", k).isLessThan(1e-7);
    }
  }

  /** Near its limits CES has kinks, where differences straddle and say nothing. */
  private static boolean curved(Technology technology) {
    return technology instanceof isowright.technology.Ces ces && Math.abs(ces.rho()) > 3
        || technology instanceof isowright.technology.Ces steep && steep.rho() < -.8;
  }

  /** A mix beside the best one yields the target but breaks the conditions. */
  @Test
  void wrongPlansAreSeen() {
    Technology technology = CobbDouglas.of(List.of("a", "b"), 0, .5, .5);
    Question question = Question.of(6, 1, 1);
    Plan right = Minimiser.of(technology).plan(question);
    double[] mix = {9, 4};
    Plan wrong =
        new Plan(
            Plan.Status.SOLVED,
            mix,
            13,
            right.marginalCost(),
            new double[] {9 / 13.0, 4 / 13.0},
            new double[2],
            0,
            "");
    PlanChecks checks = PlanChecks.of(technology, question, wrong);
    assertThat(checks.output()).isLessThan(1e-12);
    // w x/(μ e) = 9/(13/1 · ½) and 4/(13/1 · ½).
    assertThat(checks.firstOrder()).isCloseTo(5 / 13.0, within(1e-12));
    assertThat(checks.homogeneity()).isCloseTo(1 - 12 / 13.0, within(1e-12));
    assertThat(checks.shephard()).isCloseTo(9 / 13.0 - .5, within(1e-9));
  }

  /** Cobb-Douglas with equal elasticities: diag(e) on the plane is e, over n e. */
  @Test
  void curvatureOfCobbDouglas() {
    Technology technology = CobbDouglas.of(List.of("a", "b", "c"), 0, .3, .3, .3);
    Question question = Question.of(6, 1, 2, 3);
    PlanChecks checks =
        PlanChecks.of(technology, question, Minimiser.of(technology).plan(question));
    assertThat(checks.secondOrder()).isCloseTo(1 / 3.0, within(1e-12));
    Question one = question.holding(0, 5).holding(1, 5);
    assertThat(PlanChecks.of(technology, one, Minimiser.of(technology).plan(one)).secondOrder())
        .isNaN();
  }

  /** Against the null space by singular values and the eigenvalues of Commons Math. */
  @Test
  void eigenvaluesOnThePlane() {
    RandomTechnologies random = new RandomTechnologies(82);
    for (int k = 0; k < 200; k++) {
      int n = 2 + random.below(5);
      double[][] form = new double[n][n];
      double[] normal = new double[n];
      for (int i = 0; i < n; i++) {
        normal[i] = random.between(-1, 1);
        for (int j = 0; j <= i; j++) {
          form[i][j] = random.between(-1, 1);
          form[j][i] = form[i][j];
        }
      }
      RealMatrix row = MatrixUtils.createRowRealMatrix(normal);
      RealMatrix square = row.transpose().multiply(row);
      RealMatrix basis =
          new SingularValueDecomposition(square).getU().getSubMatrix(0, n - 1, 1, n - 1);
      RealMatrix plane = basis.transpose().multiply(new Array2DRowRealMatrix(form)).multiply(basis);
      double[] expected = new EigenDecomposition(plane).getRealEigenvalues();
      java.util.Arrays.sort(expected);
      double[] values = PlaneEigenvalues.of(form, normal);
      java.util.Arrays.sort(values);
      assertThat(values).containsExactly(expected, within(1e-11));
    }
  }
}
