package isowright.technology;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.Test;

/** What every nonlinear form must obey towards an estimator, with and without restrictions. */
class NonlinearFormsTest {

  private static final double[] CURVATURES = {-0.6, 0, 1e-9, 0.8, 4};

  private record Case(NonlinearForm form, int inputs, double[] inner, double[] curvatures) {

    List<String> names() {
      return RandomTechnologies.inputs(inputs);
    }

    int size() {
      return inner.length + curvatures.length;
    }

    double[] all() {
      double[] all = Arrays.copyOf(inner, size());
      System.arraycopy(curvatures, 0, all, inner.length, curvatures.length);
      return all;
    }

    Technology technology(double constant, double[] all) {
      double[] ones = new double[inputs];
      Arrays.fill(ones, 1);
      return form.technology(
          names(),
          ones,
          constant,
          Arrays.copyOf(all, inner.length),
          Arrays.copyOfRange(all, inner.length, all.length));
    }

    void evaluate(double[][] z, double[] all, double[] value, double[][] derivatives) {
      form.evaluate(
          z,
          value.length,
          Arrays.copyOf(all, inner.length),
          Arrays.copyOfRange(all, inner.length, all.length),
          value,
          derivatives);
    }
  }

  private static List<Case> cases() {
    Random random = new Random(12);
    List<Case> cases = new ArrayList<>();
    for (int k = 0; k < 60; k++) {
      int n = 2 + random.nextInt(3);
      List<Form> forms = new ArrayList<>(List.of(Ces.FORM, GeneralisedLeontief.FORM));
      if (n > 2) {
        forms.add(
            NestedCes.FORM.nested(
                RandomTechnologies.groups(random, n), RandomTechnologies.inputs(n)));
        forms.add(NestedCes.FORM);
      }
      for (Form form : List.copyOf(forms)) {
        forms.add(form.restricted(Restriction.CONSTANT_RETURNS));
      }
      forms.add(Translog.FORM.restricted(Restriction.HOMOTHETIC));
      for (Form each : forms) {
        cases.add(drawn(random, (NonlinearForm) each, n));
      }
    }
    return cases;
  }

  /** Starts moved a little, so that derivatives are taken where nothing is special. */
  private static Case drawn(Random random, NonlinearForm form, int n) {
    double[] beta = random.doubles(n, 0.1, 0.8).toArray();
    List<double[]> starts = form.starts(beta);
    double[] inner = starts.get(random.nextInt(starts.size())).clone();
    for (int i = 0; i < inner.length; i++) {
      inner[i] += 0.02 * random.nextGaussian();
    }
    double[] curvatures = new double[form.curvatureNames(RandomTechnologies.inputs(n)).size()];
    Arrays.setAll(curvatures, c -> CURVATURES[random.nextInt(CURVATURES.length)]);
    return new Case(form, n, inner, curvatures);
  }

  @Test
  void valuesAreThoseOfTheTechnologyRowByRow() {
    Random random = new Random(13);
    for (Case each : cases()) {
      int rows = 300;
      double[][] z = RandomTechnologies.columns(random, each.inputs(), rows, 0.5);
      double[] value = new double[rows];
      each.evaluate(z, each.all(), value, new double[each.size()][rows]);
      Technology technology = each.technology(0, each.all());
      assertThat(each.form().innerNames(each.names())).hasSize(each.inner().length);
      for (int r = 0; r < rows; r++) {
        int row = r;
        double[] at = new double[each.inputs()];
        Arrays.setAll(at, i -> z[i][row]);
        // The same formulas in another order of rounding.
        assertThat(value[r]).isCloseTo(technology.logOutput(at), within(1e-13));
      }
    }
  }

  @Test
  void derivativesAreThoseOfTheValue() {
    Random random = new Random(14);
    for (Case each : cases()) {
      double[][] z = RandomTechnologies.columns(random, each.inputs(), 1, 0.5);
      double[][] derivatives = new double[each.size()][1];
      each.evaluate(z, each.all(), new double[1], derivatives);
      for (int p = 0; p < each.size(); p++) {
        double numerical =
            TechnologyContract.derivative(
                at -> {
                  double[] value = new double[1];
                  each.evaluate(z, at, value, new double[each.size()][1]);
                  return value[0];
                },
                each.all(),
                p,
                1e-3);
        // Truncation h⁴ f⁗/30 with f⁗ up to a thousand.
        assertThat(derivatives[p][0]).isCloseTo(numerical, within(1e-9));
      }
    }
  }

  @Test
  void reportedIsTheJacobianOfTheParameters() {
    for (Case each : cases()) {
      double[] all = new double[1 + each.size()];
      System.arraycopy(each.all(), 0, all, 1, each.size());
      double[][] jacobian = each.form().reported(each.inner(), each.curvatures());
      int rows = each.technology(0, each.all()).parameters().length;
      assertThat(jacobian).hasDimensions(rows, all.length);
      for (int row = 0; row < rows; row++) {
        int which = row;
        for (int column = 0; column < all.length; column++) {
          double numerical =
              TechnologyContract.derivative(
                  at ->
                      each.technology(at[0], Arrays.copyOfRange(at, 1, at.length))
                          .parameters()[which],
                  all,
                  column,
                  1e-3);
          assertThat(jacobian[row][column]).isCloseTo(numerical, within(1e-10));
        }
      }
    }
  }

  @Test
  void curvaturesAreParametersOfTheTechnology() {
    for (Case each : cases()) {
      Technology technology = each.technology(0.3, each.all());
      List<String> names = each.form().curvatureNames(each.names());
      for (int c = 0; c < names.size(); c++) {
        int place = technology.parameterNames().indexOf(names.get(c));
        assertThat(technology.parameters()[place]).isEqualTo(each.curvatures()[c]);
      }
    }
  }

  @Test
  void startsAreAdmissibleAndHaveTheElasticitiesOfTheLimitAtTheBase() {
    double[] beta = {0.5, 0.3, 0.2};
    List<String> inputs = RandomTechnologies.inputs(3);
    for (Form form :
        List.of(Ces.FORM, NestedCes.FORM, GeneralisedLeontief.FORM, new HomotheticTranslog())) {
      NonlinearForm nonlinear = (NonlinearForm) form;
      double[] curvatures = new double[nonlinear.curvatureNames(inputs).size()];
      for (double[] start : nonlinear.starts(beta)) {
        assertThat(nonlinear.admissible(start)).isTrue();
        Technology technology =
            nonlinear.technology(inputs, new double[] {1, 1, 1}, 0, start, curvatures);
        double[] e = new double[3];
        technology.logGradient(new double[3], e);
        for (int i = 0; i < 3; i++) {
          assertThat(e[i]).as(form.name()).isCloseTo(beta[i], within(1e-14));
        }
      }
      for (double[] odd : new double[][] {{1.2, -0.3, 0}, {0, 0, 0}, {-1, -2, -1}}) {
        nonlinear.starts(odd).forEach(start -> assertThat(nonlinear.admissible(start)).isTrue());
      }
    }
  }

  @Test
  void runawayParametersAreNotAdmissible() {
    assertThat(((NonlinearForm) NestedCes.FORM).admissible(new double[] {1, 0.2, 0.1})).isTrue();
    assertThat(((NonlinearForm) NestedCes.FORM).admissible(new double[] {-1, 0.2, 0.1})).isFalse();
    assertThat(((NonlinearForm) NestedCes.FORM).admissible(new double[] {1, 40, 0.1})).isFalse();
    assertThat(((NonlinearForm) NestedCes.FORM).admissible(new double[] {1, 0, -40})).isFalse();
    assertThat(((NonlinearForm) GeneralisedLeontief.FORM).admissible(new double[] {0, 0.2, 0.1}))
        .isFalse();
  }
}
