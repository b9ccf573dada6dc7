package isowright.estimation;

import static isowright.estimation.Specification.RegularityImposed.AT_MEAN;
import static isowright.estimation.Specification.RegularityImposed.EVERYWHERE;
import static isowright.estimation.Specification.RegularityImposed.FREE;
import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import isowright.estimation.Specification.PlantEffects;
import isowright.estimation.Specification.RegularityImposed;
import isowright.records.Column;
import isowright.records.Panel;
import isowright.technology.Form;
import isowright.technology.LinearForm;
import isowright.technology.Regularity;
import isowright.technology.Restriction;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Objects;
import java.util.SplittableRandom;
import java.util.random.RandomGenerator;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** Fits held to be regular, against an independent solution and against what must hold of them. */
class RegularityImposedTest {

  private static Fit fit(Panel panel, PlantEffects effects, RegularityImposed where) {
    return fit(panel, Form.named("translog"), effects, where);
  }

  private static Fit fit(Panel panel, Form form, PlantEffects effects, RegularityImposed where) {
    Specification.Time time =
        panel.periods().size() > 1 ? Specification.Time.TREND : Specification.Time.NONE;
    Specification.StandardErrors errors =
        panel.repeats()
            ? Specification.StandardErrors.CLUSTERED
            : Specification.StandardErrors.CLASSICAL;
    return Estimation.fit(
        panel, new Specification(form, effects, time, true, errors, .95).with(where));
  }

  private static Regularity.Count count(Fit fit) {
    double[][] logs =
        fit.panel().logQuantities().stream().map(Column::toArray).toArray(double[][]::new);
    return Regularity.count(fit.numbers().technology(), logs, fit.panel().rows());
  }

  private static Particulars.OfRegularity held(Fit fit) {
    return (Particulars.OfRegularity) fit.numbers().particulars();
  }

  private static Map<String, Double> reference(String group) throws IOException {
    Map<String, Double> values = new HashMap<>();
    for (String line :
        Files.readAllLines(Path.of("src/test/resources/reference/imposed-regularity.csv"))) {
      String[] cells = line.split(",");
      if (cells[0].equals(group)) {
        values.put(cells[1], Double.parseDouble(cells[2]));
      }
    }
    return values;
  }

  /**
   * The solutions of imposed-regularity.R (R 4.2.2: augmented Lagrangian, nlminb, numerical
   * slopes). Its sums of squares are good to some 1e-7, what is left of its inequalities times
   * multipliers of up to a hundred; its coefficients to the root of that where the sum of squares
   * is flat.
   */
  @ParameterizedTest
  @CsvSource({
    "metals, NONE, EVERYWHERE",
    "states pooled, NONE, EVERYWHERE",
    "states pooled at-mean, NONE, AT_MEAN",
    "states within, WITHIN, EVERYWHERE"
  })
  void isTheIndependentSolution(String group, PlantEffects effects, RegularityImposed where)
      throws IOException {
    Map<String, Double> expected = reference(group);
    Panel panel = group.equals("metals") ? PanelFixtures.primaryMetals() : PanelFixtures.usStates();
    Fit fit = fit(panel, effects, where);
    double ssr = fit.numbers().linear().ssr();
    double free = held(fit).free().numbers().linear().ssr();
    assertThat(ssr / Objects.requireNonNull(expected.get("ssr"))).isCloseTo(1, within(1e-7));
    assertThat(free / Objects.requireNonNull(expected.get("free ssr"))).isCloseTo(1, within(1e-10));
    int first = effects.constant() ? 1 : 0;
    double[] coefficients = fit.numbers().linear().coefficients();
    for (int k = 0; expected.containsKey("coefficient " + (k + 1)); k++) {
      assertThat(coefficients[first + k])
          .as("coefficient " + (k + 1))
          .isCloseTo(expected.get("coefficient " + (k + 1)), within(1e-5));
    }
    assertThat(held(fit).agreeing()).isEqualTo(held(fit).starts());
    // The step that ends the search is 1e-9 of its reach, and the Lagrangian bends by less than
    // 100.
    assertThat(held(fit).departure()).isLessThan(1e-6);
    if (where == EVERYWHERE) {
      assertThat(count(fit).both()).isEqualTo(panel.rows());
    }
  }

  /**
   * Primary metals, 27 states: free, the translog is not monotone at six (Greene 2003, example
   * 6.2); held, it is regular at all, and the sum of squares rises from .6799272 to .7085114.
   */
  @Test
  void primaryMetalsAreRegularAtAllStatesAtAPrice() {
    Panel panel = PanelFixtures.primaryMetals();
    Fit fit = fit(panel, PlantEffects.NONE, EVERYWHERE);
    Fit free = held(fit).free();
    assertThat(count(free).monotone()).isEqualTo(21);
    assertThat(count(fit).both()).isEqualTo(27);
    assertThat(free.numbers().linear().ssr()).isCloseTo(.6799272, within(.5e-7));
    // imposed-regularity.R
    assertThat(fit.numbers().linear().ssr()).isCloseTo(.708511429, within(1e-8));
    double rise = fit.numbers().linear().ssr() - free.numbers().linear().ssr();
    assertThat(held(fit).distance())
        .isCloseTo(rise / free.numbers().linear().residualVariance(), within(1e-9));
    assertThat(held(fit).binding()).isEqualTo(1);
    assertThat(held(fit).withoutProduct()).isEqualTo(1);
    // What binds is held: the elasticity of labour at that state has no variance left.
    int row = held(fit).watched().stream().filter(r -> elasticity(fit, r) < 1e-5).findFirst().get();
    assertThat(Math.sqrt(variance(fit, row))).isLessThan(1e-8);
    assertThat(Math.sqrt(variance(free, row))).isGreaterThan(.1);
  }

  private static double elasticity(Fit fit, int row) {
    double[] e = new double[2];
    fit.numbers().technology().logGradient(logs(fit, row), e);
    return e[0];
  }

  private static double[] logs(Fit fit, int row) {
    return fit.panel().logQuantities().stream().mapToDouble(c -> c.get(row)).toArray();
  }

  /** That of β_1 + β_11 z_1 + β_12 z_2. */
  private static double variance(Fit fit, int row) {
    double[] z = logs(fit, row);
    double[] slope = new double[fit.numbers().parameters().length];
    slope[1] = 1;
    slope[3] = z[0] - Math.log(fit.base()[0]);
    slope[4] = z[1] - Math.log(fit.base()[1]);
    double sum = 0;
    for (int k = 0; k < slope.length; k++) {
      for (int l = 0; l < slope.length; l++) {
        sum += slope[k] * fit.numbers().covariance()[k][l] * slope[l];
      }
    }
    return Math.max(0, sum);
  }

  @Test
  void whereNothingBindsTheFitIsTheFreeOne() {
    Panel panel = PanelFixtures.primaryMetals();
    Fit free = fit(panel, PlantEffects.NONE, FREE);
    Fit held = fit(panel, PlantEffects.NONE, AT_MEAN);
    assertThat(held(held).distance()).isZero();
    assertThat(held.numbers().parameters()).containsExactly(free.numbers().parameters());
    for (int k = 0; k < free.numbers().covariance().length; k++) {
      assertThat(held.numbers().covariance()[k])
          .containsExactly(free.numbers().covariance()[k], within(1e-14));
    }
  }

  @Test
  void unitsOfTheInputsChangeNothing() {
    Panel panel = PanelFixtures.primaryMetals();
    Specification scaled =
        new Specification(
                Form.named("translog"),
                PlantEffects.NONE,
                Specification.Time.NONE,
                false,
                Specification.StandardErrors.CLASSICAL,
                .95)
            .with(EVERYWHERE);
    assertThat(Estimation.fit(panel, scaled).numbers().linear().ssr())
        .isCloseTo(
            fit(panel, PlantEffects.NONE, EVERYWHERE).numbers().linear().ssr(), within(1e-9));
  }

  /** Every treatment of plants, and a restriction besides. */
  @ParameterizedTest
  @CsvSource({"WITHIN", "RANDOM", "DIFFERENCES", "MUNDLAK"})
  void worksWithEveryTreatmentOfPlants(PlantEffects effects) {
    Panel panel = PanelFixtures.usStates();
    Fit fit = fit(panel, effects, EVERYWHERE);
    assertThat(fit.state()).isEqualTo(Fit.State.ESTIMATED);
    assertThat(count(fit).both()).isEqualTo(panel.rows());
    Form homogeneous = Form.named("translog").restricted(Restriction.HOMOGENEOUS);
    Fit both = fit(panel, homogeneous, effects, EVERYWHERE);
    assertThat(count(both).both()).isEqualTo(panel.rows());
    assertThat(both.numbers().linear().ssr()).isGreaterThan(fit.numbers().linear().ssr());
    assertThat(((LinearForm) homogeneous).unrestricted()).isNotSameAs(homogeneous);
  }

  /**
   * Cobb-Douglas itself fails where an elasticity is negative; the held one is zero but for 1e-6.
   */
  @Test
  void cobbDouglasWithANegativeElasticityIsHeldAtZero() {
    Panel panel = PanelFixtures.usStates();
    Fit fit = fit(panel, Form.named("cobb-douglas"), PlantEffects.WITHIN, EVERYWHERE);
    Fit free = held(fit).free();
    int k = fit.numbers().index("pcap");
    assertThat(free.numbers().parameters()[k]).isNegative();
    assertThat(fit.numbers().parameters()[k]).isCloseTo(1e-6, within(1e-9));
    assertThat(held(fit).binding()).isEqualTo(panel.rows());
  }

  /** Refits are held at the rows of the records too, and their digits repeat. */
  @Test
  void refitsAreRegularToo() {
    Panel panel = PanelFixtures.usStates();
    Fit fit = fit(panel, PlantEffects.WITHIN, EVERYWHERE);
    Replication.Drawing drawing = new Replication.Drawing(20, 7);
    int last = panel.periods().size() - 1;
    Replicas some =
        Replication.of(fit, java.util.Optional.of(drawing))
            .at(last, new Productivity.Typical())
            .replicas();
    double[][] logs = panel.logQuantities().stream().map(Column::toArray).toArray(double[][]::new);
    for (Replicas.Technologies which : List.of(some.drawn(), some.withoutPlants())) {
      int found = 0;
      for (int i = 0; i < which.count(); i++) {
        if (which.get(i).isPresent()) {
          found++;
          assertThat(Regularity.count(which.get(i).get(), logs, panel.rows()).both())
              .isEqualTo(panel.rows());
        }
      }
      assertThat(found).isEqualTo(which.count());
    }
    double[] again =
        Replication.of(fit, java.util.Optional.of(drawing))
            .at(last, new Productivity.Typical())
            .replicas()
            .drawn()
            .get(3)
            .orElseThrow()
            .parameters();
    assertThat(again).containsExactly(some.drawn().get(3).orElseThrow().parameters());
  }

  /** Many rows and five inputs: rows are watched as they are missed, so a few suffice. */
  @Test
  void manyRowsOfFiveInputs() {
    RandomGenerator random = new SplittableRandom(3);
    int rows = 4000;
    double[][] x = new double[5][rows];
    double[] output = new double[rows];
    int[] plant = new int[rows];
    int[] period = new int[rows];
    for (int r = 0; r < rows; r++) {
      double size = random.nextGaussian();
      double log = 1.5 * random.nextGaussian();
      for (int i = 0; i < 5; i++) {
        double z = size + .7 * random.nextGaussian();
        x[i][r] = Math.exp(z);
        log += (.05 + .1 * i) * z;
      }
      plant[r] = r / 10;
      period[r] = 2000 + r % 10;
      output[r] = Math.exp(log);
    }
    Panel panel =
        PanelFixtures.panel(
            plant,
            period,
            output,
            List.of("a", "b", "c", "d", "e"),
            List.of(x),
            List.of(),
            List.of());
    Fit fit = fit(panel, PlantEffects.NONE, EVERYWHERE);
    assertThat(count(held(fit).free()).both()).isLessThan(rows);
    assertThat(count(fit).both()).isEqualTo(rows);
    assertThat(held(fit).watched()).hasSizeLessThan(rows / 10);
  }

  @Test
  void whatCannotBeHeldIsRefusedWithAReason() {
    Fit leontief =
        fit(
            PanelFixtures.usStates(),
            Form.named("generalised-leontief"),
            PlantEffects.NONE,
            EVERYWHERE);
    assertThat(leontief.state()).isEqualTo(Fit.State.REFUSED);
    assertThat(leontief.reasons()).singleElement().asString().contains("not linear");
    Fit biased =
        Estimation.fit(
            PanelFixtures.usStates(),
            new Specification(
                    Form.named("translog"),
                    PlantEffects.NONE,
                    Specification.Time.BIASED_TREND,
                    true,
                    Specification.StandardErrors.CLUSTERED,
                    .95)
                .with(EVERYWHERE));
    assertThat(biased.reasons()).singleElement().asString().contains("biased trend");
  }
}
