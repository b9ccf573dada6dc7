package isowright.regression;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.io.IOException;
import java.util.Arrays;
import java.util.List;
import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;

class LeaveOutTest {

  /** As a part of the coefficient's standard error: refits agree to nine digits and more. */
  private static final double PART = 1e-9;

  @Test
  void withoutEachGroup() {
    SplittableRandom random = new SplittableRandom(101);
    for (int trial = 0; trial < 4; trial++) {
      ArrayDesign raw = RandomDesigns.grouped(random, 150 + random.nextInt(200), 4, 12);
      for (boolean inGroups : new boolean[] {false, true}) {
        Design design = inGroups ? Effects.within(raw) : raw;
        LinearFit fit = LeastSquares.fit(design);
        Refits refits = LeaveOut.eachGroup(GroupProducts.of(design, fit));
        for (int g = 0; g < refits.count(); g++) {
          int out = g;
          ArrayDesign left = ResampledDesigns.kept(raw, row -> raw.groups().of(row) != out);
          assertRefit(refits, g, inGroups ? Effects.within(left) : left);
        }
      }
    }
  }

  @Test
  void withoutEachTime() {
    SplittableRandom random = new SplittableRandom(102);
    for (int trial = 0; trial < 4; trial++) {
      ArrayDesign raw = RandomDesigns.grouped(random, 150 + random.nextInt(200), 4, 12);
      Times times = times(random, raw.groups(), 9);
      for (boolean inGroups : new boolean[] {false, true}) {
        Design design = inGroups ? Effects.within(raw) : raw;
        LinearFit fit = LeastSquares.fit(design);
        Refits refits = LeaveOut.eachTime(design, GroupProducts.of(design, fit), times, false);
        for (int t = 0; t < 9; t++) {
          int out = t;
          ArrayDesign left = ResampledDesigns.kept(raw, row -> times.of(row) != out);
          assertRefit(refits, t, inGroups ? Effects.within(left) : left);
        }
      }
    }
  }

  /** Each year but the first has a column of its own, as constants for years do. */
  @Test
  void withoutEachTimeThatHasAColumnOfItsOwn() throws IOException {
    ArrayDesign states = PublishedDesigns.states();
    Times years = PublishedDesigns.years();
    ArrayDesign raw = withYears(states, years, -1);
    for (boolean inGroups : new boolean[] {false, true}) {
      Design design = inGroups ? Effects.within(raw) : raw;
      LinearFit fit = LeastSquares.fit(design);
      GroupProducts products = GroupProducts.of(design, fit);
      Refits refits = LeaveOut.eachTime(design, products, years, true);
      assertThat(refits.failures()).isZero();
      assertThat(LeaveOut.eachTime(design, products, years, false).failures()).isEqualTo(17);
      for (int t = 0; t < 17; t++) {
        int out = t;
        // Without the first year the second is the one that the others are measured against.
        ArrayDesign left =
            ResampledDesigns.kept(
                withYears(states, years, t == 0 ? 1 : t), r -> years.of(r) != out);
        Design again = inGroups ? Effects.within(left) : left;
        LinearFit expected = LeastSquares.fit(again);
        Covariance errors = Covariance.estimate(again, expected, Covariance.Kind.CLASSICAL);
        for (int k = 1; k < 5; k++) {
          assertThat(refits.coefficient(t, k))
              .isCloseTo(expected.coefficients()[k], within(PART * errors.standardError(k)));
        }
        // The last year against the second (or third) can be told as long as both are there.
        int base = t == 1 ? 2 : 1;
        if (t != 16) {
          int last = expected.columns().indexOf("year 16");
          int against = expected.columns().indexOf("year " + base);
          double level = against < 0 ? 0 : expected.coefficients()[against];
          assertThat(refits.coefficient(t, 4 + 16) - refits.coefficient(t, 4 + base))
              .isCloseTo(
                  expected.coefficients()[last] - level, within(PART * errors.standardError(last)));
        }
      }
    }
  }

  /** The states with a column for each year but the first and, maybe, another. */
  private static ArrayDesign withYears(ArrayDesign states, Times years, int without) {
    double[][] rows = RandomDesigns.rows(states);
    List<String> names = new java.util.ArrayList<>(states.columns());
    List<double[]> all = new java.util.ArrayList<>(Arrays.asList(rows).subList(0, 5));
    for (int t = 1; t < 17; t++) {
      if (t != without) {
        double[] column = new double[states.rows()];
        for (int i = 0; i < column.length; i++) {
          column[i] = years.of(i) == t ? 1 : 0;
        }
        names.add("year " + t);
        all.add(column);
      }
    }
    return ArrayDesign.of(names, all.toArray(double[][]::new), rows[5], states.groups());
  }

  @Test
  void aGroupThatAloneTellsColumnsApartCannotBeLeftOut() {
    double[][] x = {{1, 1, 1, 1, 1, 1}, {1, 2, 0, 0, 0, 0}};
    ArrayDesign design =
        ArrayDesign.of(
            List.of("one", "only"),
            x,
            new double[] {1, 3, 2, 5, 4, 8},
            Groups.startingAt(6, new int[] {0, 2, 4}));
    GroupProducts products = GroupProducts.of(design, LeastSquares.fit(design));
    Refits refits = LeaveOut.eachGroup(products);
    assertThat(refits.failed(0)).isTrue();
    assertThat(refits.failures()).isEqualTo(1);
    assertThatThrownBy(() -> LeaveOut.eachTime(design, products, Times.of(1, 0, 0), false))
        .hasMessage("there are times of 2 rows, the design has 6");
  }

  private static void assertRefit(Refits refits, int i, Design left) {
    LinearFit expected = LeastSquares.fit(left);
    Covariance errors = Covariance.estimate(left, expected, Covariance.Kind.CLASSICAL);
    for (int k = 0; k < expected.columns().size(); k++) {
      assertThat(refits.coefficient(i, k))
          .isCloseTo(expected.coefficients()[k], within(PART * errors.standardError(k)));
    }
    assertThat(refits.ssr(i)).isCloseTo(expected.ssr(), within(PART * expected.ssr()));
  }

  private static Times times(SplittableRandom random, Groups groups, int count) {
    int[] times = new int[groups.rows()];
    for (int g = 0; g < groups.count(); g++) {
      for (int row = groups.start(g); row < groups.end(g); row++) {
        times[row] = random.nextInt(count);
      }
      Arrays.sort(times, groups.start(g), groups.end(g));
    }
    return Times.of(count, times);
  }
}
