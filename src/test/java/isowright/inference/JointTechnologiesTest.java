package isowright.inference;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import isowright.estimation.EstimatedTechnology;
import isowright.estimation.Estimation;
import isowright.estimation.Fit;
import isowright.estimation.PanelFixtures;
import isowright.estimation.Productivity;
import isowright.estimation.Specification;
import isowright.estimation.Specification.PlantEffects;
import isowright.estimation.Specification.StandardErrors;
import isowright.estimation.Specification.Time;
import isowright.inference.JointTechnologies.Member;
import isowright.records.Panel;
import isowright.technology.Form;
import isowright.technology.Technology;
import java.util.List;
import java.util.function.Function;
import org.junit.jupiter.api.Test;

/** Technologies of several plants together, on the 48 states of Munnell 1990 (two inputs). */
class JointTechnologiesTest {

  private final Panel panel = PanelFixtures.usStatesOfTwoInputs();
  private final Fit fit =
      Estimation.fit(
          panel,
          new Specification(
              Form.named("cobb-douglas"),
              PlantEffects.WITHIN,
              Time.NONE,
              true,
              StandardErrors.CLASSICAL,
              .95));

  private Member member(int plant) {
    EstimatedTechnology at = fit.at(0, new Productivity.Plant(plant));
    return new Member(at, "cobb-douglas", "plant " + plant);
  }

  /**
   * The difference of two plants' constants: (m_1 − m_2)′ V (m_1 − m_2) + s² (1/T_1 + 1/T_2), with
   * the means of the logged inputs taken from the records here.
   */
  @Test
  void differenceOfTwoLevels() {
    JointTechnologies joint = new JointTechnologies(List.of(member(3), member(17)), .95);
    Function<List<Technology>, double[]> difference =
        t -> new double[] {t.get(0).parameters()[0] - t.get(1).parameters()[0]};
    Estimate found = joint.estimates(difference, DeltaMethod.Scale.LINEAR).orElseThrow().get(0);
    double[] apart = new double[2];
    int[] rows = new int[2];
    for (int r = 0; r < panel.rows(); r++) {
      int which = panel.plantOf(r) == 3 ? 0 : panel.plantOf(r) == 17 ? 1 : -1;
      if (which >= 0) {
        rows[which]++;
        for (int i = 0; i < 2; i++) {
          apart[i] += (which == 0 ? 1 : -1) * Math.log(panel.quantities().get(i).get(r)) / 17;
        }
      }
    }
    assertThat(rows).containsExactly(17, 17);
    double[][] v = fit.at(0, new Productivity.Typical()).covariance();
    double variance = 0;
    for (int i = 0; i < 2; i++) {
      for (int j = 0; j < 2; j++) {
        variance += apart[i] * v[i + 1][j + 1] * apart[j];
      }
    }
    double s = fit.numbers().statistics().residualStandardError();
    variance += s * s * 2 / 17;
    // The gradient of a linear function by differences, some 1e-10.
    assertThat(found.standardError())
        .isCloseTo(Math.sqrt(variance), within(1e-6 * Math.sqrt(variance)));
  }

  /** One plant together with itself is that plant alone. */
  @Test
  void sameLevelTwice() {
    JointTechnologies joint = new JointTechnologies(List.of(member(3), member(3)), .95);
    Estimate sum =
        joint
            .estimates(
                t -> new double[] {t.get(0).parameters()[0] + t.get(1).parameters()[0]},
                DeltaMethod.Scale.LINEAR)
            .orElseThrow()
            .get(0);
    double alone = Math.sqrt(member(3).estimated().covariance()[0][0]);
    assertThat(sum.standardError()).isCloseTo(2 * alone, within(1e-8));
    assertThat(joint.several()).isFalse();
  }

  /** Technologies taken as known add nothing; from two fits standard errors are added. */
  @Test
  void knownAndSeveral() {
    Member known = new Member(member(5).estimated(), "", "");
    JointTechnologies none = new JointTechnologies(List.of(known, known), .95);
    Function<List<Technology>, double[]> constants =
        t -> new double[] {t.get(0).parameters()[0] + t.get(1).parameters()[0]};
    assertThat(none.estimates(constants, DeltaMethod.Scale.LINEAR)).isEmpty();
    Member other = new Member(member(5).estimated(), "translog", "plant 5");
    JointTechnologies two = new JointTechnologies(List.of(member(3), other), .95);
    double sum =
        two.estimates(constants, DeltaMethod.Scale.LINEAR).orElseThrow().get(0).standardError();
    double first = Math.sqrt(member(3).estimated().covariance()[0][0]);
    double second = Math.sqrt(other.estimated().covariance()[0][0]);
    assertThat(two.several()).isTrue();
    assertThat(sum).isCloseTo(first + second, within(1e-8));
  }
}
