package isowright.regression;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;

class GroupProductsTest {

  /** What makes refits stable: seen together, the rows have unit lengths and right angles. */
  @Test
  void contributionsAddUpToTheIdentity() {
    SplittableRandom random = new SplittableRandom(81);
    for (int trial = 0; trial < 10; trial++) {
      ArrayDesign raw = RandomDesigns.grouped(random, 3000, 5, 8);
      for (Design design : new Design[] {raw, Effects.within(raw)}) {
        GroupProducts products = GroupProducts.of(design, LeastSquares.fit(design));
        double[] total = products.total();
        int at = 0;
        for (int p = 0; p < products.size(); p++) {
          for (int q = 0; q <= p; q++) {
            assertThat(total[at++]).isCloseTo(p == q ? 1 : 0, within(1e-12));
          }
        }
        assertThat(at).isEqualTo(total.length);
      }
    }
  }

  @Test
  void droppedColumnsTakeNoPart() {
    ArrayDesign raw = RandomDesigns.grouped(new SplittableRandom(82), 200, 3, 4);
    Design design = Effects.within(raw);
    LinearFit fit = LeastSquares.fit(design);
    assertThat(fit.rank()).isEqualTo(2);
    Refits refits = LeaveOut.eachGroup(GroupProducts.of(design, fit));
    assertThat(refits.failures()).isZero();
    for (int g = 0; g < refits.count(); g++) {
      assertThat(refits.coefficient(g, 0)).isZero();
    }
  }
}
