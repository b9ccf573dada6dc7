package isowright.regression;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;

class CountedDesignTest {

  @Test
  void isAFitToSoManyCopies() {
    ArrayDesign raw = RandomDesigns.grouped(new SplittableRandom(131), 6000, 4, 9);
    int[] counts = ClusterBootstrap.counts(raw.groups().count(), 4, 2);
    ArrayDesign copies = ResampledDesigns.counted(raw, counts);
    for (boolean inGroups : new boolean[] {false, true}) {
      Design design = inGroups ? Effects.within(raw) : raw;
      LinearFit expected = LeastSquares.fit(inGroups ? Effects.within(copies) : copies);
      CountedDesign counted = CountedDesign.of(design, counts);
      LinearFit fit = LeastSquares.fit(counted);
      assertThat(fit.ssr()).isCloseTo(expected.ssr(), within(1e-10 * expected.ssr()));
      for (int k = 0; k < 4; k++) {
        assertThat(fit.coefficients()[k]).isCloseTo(expected.coefficients()[k], within(1e-11));
      }
      assertThat(fit.collinearities()).isEqualTo(expected.collinearities());
      assertThat(counted.absorbed()).isEqualTo(design.absorbed());
      assertThat(counted.absorbedLeverage(7)).isEqualTo(design.absorbedLeverage(7));
    }
  }

  @Test
  void everyGroupNeedsACount() {
    ArrayDesign raw = RandomDesigns.grouped(new SplittableRandom(132), 50, 2, 9);
    assertThatThrownBy(() -> CountedDesign.of(raw, new int[1]))
        .hasMessageStartingWith("1 counts for");
  }
}
