package isowright.inference;

import static org.assertj.core.api.Assertions.assertThat;

import isowright.estimation.Estimation;
import isowright.estimation.Fit;
import isowright.estimation.Specification;
import isowright.estimation.Specification.PlantEffects;
import isowright.estimation.Specification.StandardErrors;
import isowright.records.Panel;
import isowright.technology.Form;
import java.util.List;
import java.util.Locale;
import java.util.function.IntFunction;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Tag;
import org.junit.jupiter.api.Test;

/**
 * Do the tests of the specification reject a true null as often as they say? Panels are drawn from
 * a known Cobb-Douglas technology and tested at 5 %.
 *
 * <p>With two thousand draws a size of .05 is seen as .05 ± .0049 (binomial standard error), so 3
 * to 7 % is four such errors either way. Two settings: rows independent, one constant; and errors
 * that depend on one another within plants (autoregressive, .5), plant effects removed, covariance
 * clustered over 80 plants. Normality takes rows as independent and is judged in the first setting,
 * and with plant effects in a third.
 */
@Tag("slow")
class SpecificationSizeTest {

  private static final int DRAWS = 2000;

  /** One draw's rejections, test by test. */
  private static double[] sizes(IntFunction<Fit> fits, List<String> names) {
    boolean[][] rejected =
        IntStream.range(0, DRAWS)
            .parallel()
            .mapToObj(
                draw -> {
                  List<Verdict> verdicts = SpecificationTests.of(fits.apply(draw));
                  boolean[] row = new boolean[names.size()];
                  for (int k = 0; k < row.length; k++) {
                    String name = names.get(k);
                    row[k] =
                        verdicts.stream()
                            .filter(v -> v.name().equals(name))
                            .findFirst()
                            .orElseThrow()
                            .rejects();
                  }
                  return row;
                })
            .toArray(boolean[][]::new);
    double[] sizes = new double[names.size()];
    for (int k = 0; k < sizes.length; k++) {
      int test = k;
      sizes[k] = IntStream.range(0, DRAWS).filter(d -> rejected[d][test]).count() / (double) DRAWS;
    }
    return sizes;
  }

  private static Fit fit(Panel panel, PlantEffects effects, StandardErrors errors) {
    return Estimation.fit(
        panel,
        new Specification(
            Form.named("cobb-douglas"), effects, Specification.Time.NONE, true, errors, 0.95));
  }

  @Test
  void sizesLieNearFivePerCent() {
    List<String> heteroskedasticity = List.of("reset", "breusch-pagan", "white");
    StringBuilder table = new StringBuilder();
    hold(
        table,
        "independent rows, one constant",
        SpecificationTests.NAMES,
        draw ->
            fit(
                SimulatedPanels.cobbDouglas(draw, 400, 1, 0),
                PlantEffects.NONE,
                StandardErrors.CLASSICAL));
    hold(
        table,
        "dependent rows, plant effects, clustered",
        heteroskedasticity,
        draw ->
            fit(
                SimulatedPanels.cobbDouglas(draw, 80, 6, .5),
                PlantEffects.WITHIN,
                StandardErrors.CLUSTERED));
    hold(
        table,
        "independent rows, plant effects",
        SpecificationTests.NAMES,
        draw ->
            fit(
                SimulatedPanels.cobbDouglas(draw, 80, 6, 0),
                PlantEffects.WITHIN,
                StandardErrors.CLASSICAL));
    SimulationTable.write("sizes-specification", table.toString());
    assertThat(table.toString().lines().filter(line -> line.endsWith("outside")).toList())
        .isEmpty();
  }

  private static void hold(
      StringBuilder table, String setting, List<String> names, IntFunction<Fit> fits) {
    double[] sizes = sizes(fits, names);
    for (int k = 0; k < sizes.length; k++) {
      String verdict = sizes[k] >= .03 && sizes[k] <= .07 ? "" : " outside";
      table.append(
          String.format(
              Locale.ROOT, "%-42s %-14s %.4f%s%n", setting, names.get(k), sizes[k], verdict));
    }
  }
}
