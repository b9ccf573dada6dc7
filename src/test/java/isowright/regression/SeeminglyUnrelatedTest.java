package isowright.regression;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import isowright.regression.EquationSystem.Equation;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Map;
import java.util.Random;
import org.junit.jupiter.api.Test;

/**
 * Systems of equations against published estimates and against generalised least squares written
 * out in full.
 */
class SeeminglyUnrelatedTest {

  /**
   * R iterates to 1e-12 of the parameters and writes 15 digits; the script stands beside the
   * values.
   */
  private static final double REFERENCE = 1e-8;

  /** Four cost shares and prices, 1947–1971: Berndt and Wood 1975, United States manufacturing. */
  private static double[][] manufacturing() throws IOException {
    List<String> lines =
        Files.readAllLines(Path.of("src/test/resources/published/us-manufacturing-klem.csv"));
    double[][] columns = new double[10][lines.size() - 1];
    for (int i = 1; i < lines.size(); i++) {
      String[] cells = lines.get(i).split(",");
      for (int c = 0; c < 10; c++) {
        columns[c][i - 1] = Double.parseDouble(cells[c]);
      }
    }
    return columns;
  }

  /**
   * Three of four share equations s_i = a_i + Σ_j g_ij ln(p_j/p_d), d the one dropped, symmetric or
   * not. Columns: one, three relative prices, three shares.
   */
  private static SystemFit manufacturing(int dropped, boolean symmetric, int renewals)
      throws IOException {
    return manufacturing(manufacturing(), dropped, symmetric, renewals);
  }

  private static SystemFit manufacturing(
      double[][] data, int dropped, boolean symmetric, int renewals) {
    int[] kept = java.util.stream.IntStream.range(0, 4).filter(i -> i != dropped).toArray();
    int rows = data[0].length;
    double[][] regressors = new double[6][rows];
    double[] response = new double[rows];
    for (int t = 0; t < rows; t++) {
      regressors[0][t] = 1;
      for (int j = 0; j < 3; j++) {
        regressors[1 + j][t] = Math.log(data[6 + kept[j]][t] / data[6 + dropped][t]);
      }
      regressors[4][t] = data[2 + kept[0]][t];
      regressors[5][t] = data[2 + kept[1]][t];
      response[t] = data[2 + kept[2]][t];
    }
    String names = "KLEM";
    List<String> parameters = new ArrayList<>();
    for (int i : kept) {
      parameters.add("a" + names.charAt(i));
    }
    for (int i = 0; i < 3; i++) {
      for (int j = symmetric ? i : 0; j < 3; j++) {
        parameters.add("g" + names.charAt(kept[i]) + names.charAt(kept[j]));
      }
    }
    List<Equation> equations = new ArrayList<>();
    for (int i = 0; i < 3; i++) {
      double[] offsets = new double[7];
      offsets[4 + i] = 1;
      double[][] loadings = new double[7][parameters.size()];
      loadings[0][i] = 1;
      for (int j = 0; j < 3; j++) {
        int a = symmetric ? Math.min(i, j) : i;
        int b = symmetric ? Math.max(i, j) : j;
        String name = "g" + names.charAt(kept[a]) + names.charAt(kept[b]);
        loadings[1 + j][parameters.indexOf(name)] = 1;
      }
      equations.add(new Equation("share " + names.charAt(kept[i]), offsets, loadings, false));
    }
    ArrayDesign design =
        ArrayDesign.of(List.of("one", "p1", "p2", "p3", "s1", "s2"), regressors, response);
    return SeeminglyUnrelated.fit(design, new EquationSystem(parameters, equations), renewals);
  }

  /**
   * Berndt and Wood (1975), Review of Economics and Statistics 57, 259–268; Greene, Econometric
   * Analysis, 4th ed., table 15.12, whose digits the reference values carry on.
   */
  @Test
  void sharesOfManufacturing() throws IOException {
    SystemFit fit = manufacturing(3, true, 1000);
    assertThat(fit.converged()).isTrue();
    Map<String, String> names =
        Map.of(
            "K_(Intercept)",
            "aK",
            "L_(Intercept)",
            "aL",
            "E_(Intercept)",
            "aE",
            "K_k",
            "gKK",
            "K_l",
            "gKL",
            "K_e",
            "gKE",
            "L_l",
            "gLL",
            "L_e",
            "gLE",
            "E_e",
            "gEE");
    int met = 0;
    for (String[] row : reference("manufacturing")) {
      String name = names.get(row[1]);
      if (name != null) {
        double value = Double.parseDouble(row[2]);
        assertThat(fit.coefficient(name)).as(name).isCloseTo(value, within(REFERENCE));
        assertThat(fit.standardError(name))
            .isCloseTo(Double.parseDouble(row[3]), within(REFERENCE));
        met++;
      } else if (row[1].equals("logLikelihood")) {
        assertThat(fit.logLikelihood()).isCloseTo(Double.parseDouble(row[2]), within(REFERENCE));
        met++;
      }
    }
    assertThat(met).isEqualTo(10);
    assertThat(fit.logLikelihood()).as("printed").isCloseTo(344.467, within(0.5e-3));
  }

  private static List<String[]> reference(String set) throws IOException {
    return Files.readAllLines(Path.of("src/test/resources/reference/equation-systems.csv")).stream()
        .map(line -> line.split(",", -1))
        .filter(row -> row[0].equals(set))
        .toList();
  }

  /** Likelihood ratio of symmetry 12.84 with three degrees of freedom (printed to two decimals). */
  @Test
  void symmetryOfManufacturing() throws IOException {
    double free = manufacturing(3, false, 1000).logLikelihood();
    double held = manufacturing(3, true, 1000).logLikelihood();
    assertThat(2 * (free - held)).isCloseTo(12.84, within(0.5e-2));
  }

  /**
   * After two steps the equation left out matters: .0294 without materials, .0425 without labour
   * (published beside the data). At convergence it matters by no more than the shares, printed to
   * five decimals, fail to add up to one: 2e-4 at most, in 1958.
   */
  @Test
  void theShareLeftOutMattersAfterTwoStepsAndNotAtConvergence() throws IOException {
    assertThat(manufacturing(3, true, 1).coefficient("gEE")).isCloseTo(.0294, within(0.5e-4));
    assertThat(manufacturing(1, true, 1).coefficient("gEE")).isCloseTo(.0425, within(0.5e-4));
    SystemFit withoutMaterials = manufacturing(3, true, 1000);
    SystemFit withoutLabour = manufacturing(1, true, 1000);
    for (String name : List.of("gKK", "gKE", "gEE", "aK", "aE")) {
      assertThat(withoutLabour.coefficient(name))
          .as(name)
          .isCloseTo(withoutMaterials.coefficient(name), within(2e-4));
    }
  }

  /** Random shares that do add up: the same estimates, errors and likelihood whichever is left. */
  @Test
  void sharesThatAddUpGiveTheSameWhicheverIsLeftOut() throws IOException {
    double[][] data = manufacturing();
    for (int t = 0; t < data[0].length; t++) {
      double sum = data[2][t] + data[3][t] + data[4][t] + data[5][t];
      for (int i = 2; i < 6; i++) {
        data[i][t] /= sum;
      }
    }
    SystemFit one = manufacturing(data, 3, true, 1000);
    SystemFit other = manufacturing(data, 0, true, 1000);
    for (String name : List.of("gLL", "gLE", "gEE", "aL", "aE")) {
      // renewals end at 1e-9 of a standard error, and errors are below a hundredth
      assertThat(other.coefficient(name)).isCloseTo(one.coefficient(name), within(1e-10));
      assertThat(other.standardError(name)).isCloseTo(one.standardError(name), within(1e-10));
    }
    assertThat(other.logLikelihood()).isCloseTo(one.logLikelihood(), within(1e-8));
  }

  /** A constant for each group in the first equation is the same as a column for each group. */
  @Test
  void groupConstantsAreColumnsOfTheirOwn() {
    int groups = 7;
    int[] starts = {0, 5, 9, 16, 18, 19, 27};
    int rows = 33;
    Random random = new Random(4);
    double[][] x = new double[3][rows];
    double[] second = new double[rows];
    double[] first = new double[rows];
    Groups grouping = Groups.startingAt(rows, starts);
    for (int t = 0; t < rows; t++) {
      x[0][t] = 1;
      x[1][t] = random.nextGaussian() + grouping.of(t);
      x[2][t] = random.nextGaussian();
      double shared = random.nextGaussian();
      first[t] = 0.4 * x[1][t] - x[2][t] + 2 * Math.sin(grouping.of(t)) + shared;
      second[t] = 1 + 0.4 * x[2][t] + 0.6 * shared + 0.5 * random.nextGaussian();
    }
    // first = a x1 + b x2, second = c + a x2; columns one, x1, x2, second, first
    List<String> names = List.of("a", "b", "c");
    double[][] onFirst = {{0, 0, 0}, {1, 0, 0}, {0, 1, 0}, {0, 0, 0}, {0, 0, 0}};
    double[][] onSecond = {{0, 0, 1}, {0, 0, 0}, {1, 0, 0}, {0, 0, 0}, {0, 0, 0}};
    EquationSystem absorbing =
        new EquationSystem(
            names,
            List.of(
                new Equation("first", new double[] {0, 0, 0, 0, 1}, onFirst, true),
                new Equation("second", new double[] {0, 0, 0, 1, 0}, onSecond, false)));
    SystemFit fit =
        SeeminglyUnrelated.fit(
            ArrayDesign.of(
                List.of("one", "x1", "x2", "second"),
                new double[][] {x[0], x[1], x[2], second},
                first,
                grouping),
            absorbing);

    double[][] wide = new double[4 + groups][];
    System.arraycopy(new double[][] {x[0], x[1], x[2], second}, 0, wide, 0, 4);
    List<String> wideNames = new ArrayList<>(names);
    List<String> columns = new ArrayList<>(List.of("one", "x1", "x2", "second"));
    double[][] wideFirst = new double[5 + groups][3 + groups];
    double[][] wideSecond = new double[5 + groups][3 + groups];
    for (int j = 0; j < 3; j++) {
      System.arraycopy(onFirst[j], 0, wideFirst[j], 0, 3);
      System.arraycopy(onSecond[j], 0, wideSecond[j], 0, 3);
    }
    for (int g = 0; g < groups; g++) {
      wide[4 + g] = new double[rows];
      Arrays.fill(wide[4 + g], grouping.start(g), grouping.end(g), 1);
      wideNames.add("group" + g);
      columns.add("group" + g);
      wideFirst[4 + g][3 + g] = 1;
    }
    double[] explainFirst = new double[5 + groups];
    explainFirst[4 + groups] = 1;
    double[] explainSecond = new double[5 + groups];
    explainSecond[3] = 1;
    SystemFit dummies =
        SeeminglyUnrelated.fit(
            ArrayDesign.of(columns, wide, first),
            new EquationSystem(
                wideNames,
                List.of(
                    new Equation("first", explainFirst, wideFirst, false),
                    new Equation("second", explainSecond, wideSecond, false))));
    // renewals end at 1e-9 of a standard error
    for (String name : names) {
      assertThat(fit.coefficient(name)).isCloseTo(dummies.coefficient(name), within(1e-9));
      assertThat(fit.standardError(name)).isCloseTo(dummies.standardError(name), within(1e-9));
    }
    assertThat(fit.logLikelihood()).isCloseTo(dummies.logLikelihood(), within(1e-8));
    assertThat(fit.absorbed()).isEqualTo(groups);
  }
}
