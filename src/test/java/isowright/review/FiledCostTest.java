package isowright.review;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import isowright.leastcost.Plan.Status;
import isowright.leastcost.Question;
import isowright.technology.Ces;
import isowright.technology.CobbDouglas;
import isowright.technology.Translog;
import java.util.List;
import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;

/** Filed cost against least cost: a worked example, and parts that always add up. */
class FiledCostTest {

  private static final List<String> LK = List.of("labour", "capital");
  private static final CobbDouglas ROOT = CobbDouglas.of(LK, 0, .5, .5);

  /**
   * y = √(LK), prices 4 and 1; a plant used L 3, K 6 for y = 3. By hand: θ = 3/√18 = .707107; its
   * mix costs 18, drawn onto the isoquant 12.7279, at least 2·3·√4 = 12; so technical .707107, mix
   * .942809, cost .666667 (a textbook-style question after Farrell 1957, figure 1).
   */
  @Test
  void farrellsArithmetic() {
    Gap gap = FiledCost.against(ROOT).gap(new double[] {3, 6}, 3, new double[] {4, 1}, 20);
    assertThat(gap.atPrices()).isEqualTo(18);
    assertThat(gap.leastCost()).isCloseTo(12, within(1e-12));
    assertThat(gap.contraction()).isCloseTo(.707107, within(5e-7));
    assertThat(gap.technicalRatio()).isCloseTo(.707107, within(5e-7));
    assertThat(gap.mixRatio()).isCloseTo(.942809, within(5e-7));
    assertThat(gap.costRatio()).isCloseTo(.666667, within(5e-7));
    assertThat(gap.unreconciled()).isEqualTo(2);
    assertThat(gap.technical()).isCloseTo(18 - 12.7279, within(5e-5));
    assertThat(gap.mix()).isCloseTo(.7279, within(5e-5));
    assertThat(gap.gap()).isCloseTo(8, within(1e-12));
    assertThat(gap.status()).isEqualTo(Status.SOLVED);
    assertThat(gap.complete()).isTrue();
    assertThat(gap.reason()).isEmpty();
  }

  @Test
  void plantBetterThanTheReferenceHasANegativeTechnicalPart() {
    Gap gap = FiledCost.against(ROOT).gap(new double[] {1, 4}, 4, new double[] {4, 1}, 8);
    assertThat(gap.contraction()).isCloseTo(2, within(1e-12));
    assertThat(gap.technical()).isCloseTo(-8, within(1e-11));
    assertThat(gap.mix()).isCloseTo(0, within(1e-11));
    assertThat(gap.reason()).contains("better than the reference");
  }

  @Test
  void partsAddUpExactlyAndTheMixPartIsNeverNegative() {
    SplittableRandom random = new SplittableRandom(61);
    for (int k = 0; k < 3000; k++) {
      double share = .1 + .8 * random.nextDouble();
      double rho = -.9 + 5 * random.nextDouble();
      Ces ces = Ces.of(LK, new double[] {20, 7}, 1, new double[] {share, 1 - share}, rho, 1.1);
      double[] mix = {20 * Math.exp(random.nextDouble() - .5), 7 * (.5 + random.nextDouble())};
      double[] prices = {1 + 9 * random.nextDouble(), 1 + 9 * random.nextDouble()};
      double output = ces.output(mix) * (.7 + .5 * random.nextDouble());
      Gap gap = FiledCost.against(ces).gap(mix, output, prices, 300 * random.nextDouble());
      assertThat(gap.unreconciled() + gap.technical() + gap.mix() + gap.remainder())
          .isEqualTo(gap.gap());
      double size = gap.filed() + gap.leastCost();
      assertThat(gap.gap()).isCloseTo(gap.filed() - gap.leastCost(), within(1e-14 * size));
      assertThat(gap.mix()).isGreaterThan(-1e-11 * size);
      double contracted =
          ces.output(new double[] {mix[0] * gap.contraction(), mix[1] * gap.contraction()});
      assertThat(contracted).isCloseTo(output, within(1e-11 * output));
      assertThat(gap.technicalRatio() * gap.mixRatio()).isCloseTo(gap.costRatio(), within(1e-12));
    }
  }

  @Test
  void heldInputsLeaveLessToTheMix() {
    FiledCost review = FiledCost.against(ROOT);
    double[] mix = {3, 6};
    Question question = Question.of(3, 4, 1);
    Gap free = review.gap(mix, question, 18);
    Gap held = review.gap(mix, question.holding(1, 6), 18);
    assertThat(held.leastCost()).isCloseTo(4 * 1.5 + 6, within(1e-12));
    assertThat(held.gap()).isLessThanOrEqualTo(free.gap() + 1e-12);
    assertThat(held.reason()).contains("capital is held at 6");
  }

  @Test
  void withoutLeastCostThereIsNoGap() {
    Translog saddle = new Translog(LK, new double[] {1, 1}, 0, new double[] {.5, .5, .6, -.6, .6});
    Gap gap = FiledCost.against(saddle).gap(new double[] {2, 2}, 2, new double[] {1, 1}, 5);
    assertThat(gap.status()).isEqualTo(Status.IRREGULAR);
    assertThat(gap.complete()).isFalse();
    assertThat(gap.gap()).isNaN();
    assertThat(gap.leastCost()).isNaN();
    assertThat(gap.unreconciled()).isEqualTo(1);
    assertThat(gap.technical()).isCloseTo(0, within(1e-12));
    assertThat(gap.reason()).contains("convex");
  }

  @Test
  void withoutContractionTheGapIsNotSplit() {
    // ln Q = ½ Σ z − ½ Σ z²: along the ray output never exceeds its value at e^½ of the base.
    Translog humped = new Translog(LK, new double[] {1, 1}, 0, new double[] {.5, .5, -1, 0, -1});
    Gap gap = FiledCost.against(humped).gap(new double[] {1, 1}, 100, new double[] {1, 1}, 5);
    assertThat(gap.contraction()).isNaN();
    assertThat(gap.technical()).isNaN();
    assertThat(gap.reason()).contains("no multiple of the mix");
  }

  @Test
  void impossibleEntriesAreRefused() {
    FiledCost review = FiledCost.against(ROOT);
    double[] prices = {4, 1};
    assertThatThrownBy(() -> review.gap(new double[] {3, 0}, 3, prices, 20))
        .hasMessageContaining("quantity of capital is 0.0");
    assertThatThrownBy(() -> review.gap(new double[] {3, 6}, 3, prices, Double.NaN))
        .hasMessageContaining("filed cost is NaN");
    assertThatThrownBy(() -> review.gap(new double[] {3}, 3, prices, 20))
        .hasMessageContaining("1 quantities and 2 prices for the 2 inputs");
  }
}
