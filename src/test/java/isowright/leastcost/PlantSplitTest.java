package isowright.leastcost;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import isowright.leastcost.RandomTechnologies.Planted;
import isowright.technology.Ces;
import isowright.technology.CobbDouglas;
import isowright.technology.Technology;
import isowright.technology.Translog;
import java.util.ArrayList;
import java.util.List;
import org.junit.jupiter.api.Test;

/** Splits of a target: worked example, equal marginal costs, enumeration, fine grids. */
class PlantSplitTest {

  private static final List<String> LK = List.of("labour", "capital");
  private static final double OPEN = Double.POSITIVE_INFINITY;

  /** A plant whose cost is (prices all w) w/2 · Q²: 2 L^¼ K^¼ (MIT OpenCourseWare 14.01). */
  private static PlantOption quadratic(String name, double w, double capacity, double running) {
    Technology technology = CobbDouglas.of(LK, Math.log(2), .25, .25);
    return new PlantOption(name, technology, Question.of(1, w, w), capacity, running);
  }

  /** A plant whose cost is price · Q^(1/scale). */
  private static PlantOption power(
      String name, double price, double scale, double capacity, double running) {
    Technology technology = CobbDouglas.of(LK, Math.log(2) * scale, scale / 2, scale / 2);
    return new PlantOption(name, technology, Question.of(1, price, price), capacity, running);
  }

  /**
   * Example 17: 8x² − xy + 12y² with x + y = 42 (textbook-style question): 25 and 17, 8043, λ 383.
   * On x + y = Q the cross term is (x² + y² − Q²)/2, so x and y are those of 8.5x² + 12.5y², whose
   * cost is larger by Q²/2 = 882 and marginal cost by Q = 42.
   */
  @Test
  void twoPlants() {
    List<PlantOption> plants = List.of(quadratic("x", 17, OPEN, 0), quadratic("y", 25, OPEN, 0));
    SplitOutcome split = PlantSplit.of(plants, 42);
    assertThat(split.shares().get(0).output()).isCloseTo(25, within(1e-8));
    assertThat(split.shares().get(1).output()).isCloseTo(17, within(1e-8));
    assertThat(split.cost()).isCloseTo(8043 + 882, within(1e-8));
    assertThat(split.marginalCost()).isCloseTo(383 + 42, within(1e-5));
    assertThat(split.proof().global()).isTrue();
  }

  /** With a capacity of 20 for x: y makes 22, and one more of capacity saves 550 − 340. */
  @Test
  void capacityIsWorthTheDifferenceOfMarginalCosts() {
    List<PlantOption> plants = List.of(quadratic("x", 17, 20, 0), quadratic("y", 25, OPEN, 0));
    SplitOutcome split = PlantSplit.of(plants, 42);
    assertThat(split.shares().get(0).output()).isCloseTo(20, within(1e-10));
    assertThat(split.shares().get(0).atCapacity()).isTrue();
    assertThat(split.shares().get(0).capacityValue()).isCloseTo(25 * 22 - 17 * 20, within(1e-6));
  }

  /** By hand: running y costs 4000; without it 8.5 · 42² = 14994, with it 8925 + 4000. */
  @Test
  void runningCostDecidesWhoRuns() {
    List<PlantOption> cheap = List.of(quadratic("x", 17, OPEN, 0), quadratic("y", 25, OPEN, 4000));
    assertThat(PlantSplit.of(cheap, 42).cost()).isCloseTo(12925, within(1e-5));
    List<PlantOption> dear = List.of(quadratic("x", 17, OPEN, 0), quadratic("y", 25, OPEN, 7000));
    SplitOutcome alone = PlantSplit.of(dear, 42);
    assertThat(alone.cost()).isCloseTo(14994, within(1e-8));
    assertThat(alone.shares().get(1).runs()).isFalse();
  }

  /**
   * Increasing returns: at a best split all plants but one make nothing or all they can (cost is
   * concave), so every choice of those and of the one is tried.
   */
  @Test
  void threePlantsWithIncreasingReturnsByEnumeration() {
    RandomTechnologies random = new RandomTechnologies(91);
    int several = 0;
    for (int k = 0; k < 500; k++) {
      List<PlantOption> plants = new ArrayList<>();
      double[] price = new double[3];
      double[] scale = new double[3];
      double[] capacity = new double[3];
      double[] running = new double[3];
      double all = 0;
      for (int p = 0; p < 3; p++) {
        price[p] = random.between(1, 2);
        scale[p] = random.between(1.02, 1.6);
        capacity[p] = random.between(5, 30);
        running[p] = random.below(2) * random.between(0, 10);
        all += capacity[p];
        plants.add(power("p" + p, price[p], scale[p], capacity[p], running[p]));
      }
      double target = random.between(.1, .99) * all;
      SplitOutcome split = PlantSplit.of(plants, target);
      double best = OPEN;
      for (int full = 0; full < 8; full++) {
        for (int p = 0; p < 3; p++) {
          double left = target;
          double cost = 0;
          for (int q = 0; q < 3; q++) {
            if (q != p && (full & 1 << q) != 0) {
              left -= capacity[q];
              cost += price[q] * Math.pow(capacity[q], 1 / scale[q]) + running[q];
            }
          }
          if (left >= 0 && left <= capacity[p]) {
            cost += left == 0 ? 0 : price[p] * Math.pow(left, 1 / scale[p]) + running[p];
            best = Math.min(best, cost);
          }
        }
      }
      assertThat(split.planned()).as("%d %s", k, split.reason()).isTrue();
      // The search ends at a proved gap of 1e-9.
      assertThat(split.cost()).as("%d %s", k, split).isCloseTo(best, within(2e-9 * best));
      assertThat(split.proof().gap()).isLessThan(1.1e-9);
      several += split.shares().stream().filter(SplitOutcome.Share::runs).count() > 1 ? 1 : 0;
    }
    assertThat(several).isGreaterThan(200);
  }

  /** Plants with rising and with falling marginal cost together, against a fine grid. */
  @Test
  void mixedReturnsAgainstAGrid() {
    RandomTechnologies random = new RandomTechnologies(92);
    for (int k = 0; k < 300; k++) {
      double[] price = new double[3];
      double[] scale = new double[3];
      double[] capacity = new double[3];
      double[] running = new double[3];
      List<PlantOption> plants = new ArrayList<>();
      for (int p = 0; p < 3; p++) {
        price[p] = random.between(1, 2);
        scale[p] = random.between(.6, 1.5);
        capacity[p] = random.between(8, 30);
        running[p] = random.below(2) * random.between(0, 10);
        plants.add(power("p" + p, price[p], scale[p], capacity[p], running[p]));
      }
      double target = random.between(5, 24);
      SplitOutcome split = PlantSplit.of(plants, target);
      int steps = 600;
      double best = OPEN;
      for (int a = 0; a <= steps; a++) {
        for (int b = 0; a + b <= steps; b++) {
          double[] q = {target * a / steps, target * b / steps, target * (steps - a - b) / steps};
          double cost = 0;
          for (int p = 0; p < 3; p++) {
            cost +=
                q[p] > capacity[p]
                    ? OPEN
                    : q[p] == 0 ? 0 : price[p] * Math.pow(q[p], 1 / scale[p]) + running[p];
          }
          best = Math.min(best, cost);
        }
      }
      assertThat(split.cost()).as("%d %s", k, split).isLessThan(best * (1 + 2e-9));
      // A grid of 1/600 misses the best by as much of the target at a capacity: λ ≤ AC/scale.
      assertThat(split.cost()).as("%d %s", k, split).isGreaterThan(best * (1 - 1e-2));
      double sum = split.shares().stream().mapToDouble(SplitOutcome.Share::output).sum();
      assertThat(sum).isCloseTo(target, within(1e-10 * target));
    }
  }

  /** Convex plants: marginal costs are equal wherever a plant can make more and less. */
  @Test
  void equalMarginalCostsWhereCostsAreConvex() {
    RandomTechnologies random = new RandomTechnologies(93);
    for (int k = 0; k < 100; k++) {
      List<PlantOption> plants = new ArrayList<>();
      int size = 2 + random.below(6);
      for (int p = 0; p < size; p++) {
        double share = random.between(.3, .7);
        Technology ces =
            Ces.of(
                LK,
                new double[] {1, 1},
                0,
                new double[] {share, 1 - share},
                random.between(-.5, 2),
                random.between(.5, .95));
        Question question = Question.of(1, random.between(1, 2), random.between(1, 2));
        if (random.below(2) == 0) {
          question = question.holding(1, random.between(2, 10));
        }
        plants.add(new PlantOption("p" + p, ces, question, random.between(3, 20), 0));
      }
      double target = 1.5 * size;
      SplitOutcome split = PlantSplit.of(plants, target);
      if (!split.planned()) {
        continue;
      }
      for (int p = 0; p < size; p++) {
        SplitOutcome.Share share = split.shares().get(p);
        if (share.runs() && !share.atCapacity() && share.output() > 1e-6) {
          // Newton ends when steps no longer lower cost: 1e-15 of cost is 1e-7 of output.
          assertThat(share.plan().marginalCost())
              .as("%d %s", k, split)
              .isCloseTo(split.marginalCost(), within(1e-6 * split.marginalCost()));
        }
      }
    }
  }

  /** Translogs whose marginal cost falls and then rises; held to a grid on two plants. */
  @Test
  void translogPlantsAgainstAGrid() {
    for (int k = 0; k < 10; k++) {
      List<PlantOption> plants = new ArrayList<>();
      for (int p = 0; p < 2; p++) {
        double[] coefficients = {.58, .58 + .01 * p, -.03, .004 * k / 10, -.03};
        Technology technology = new Translog(LK, new double[] {1, 1}, 0, coefficients);
        plants.add(new PlantOption("p" + p, technology, Question.of(1, 1, 1.1), OPEN, .5));
      }
      double target = 8 + 6 * k;
      SplitOutcome split = PlantSplit.of(plants, target);
      assertThat(split.planned()).as(split.reason()).isTrue();
      assertThat(split.proof().global()).isFalse();
      double best = OPEN;
      for (int a = 0; a <= 2000; a++) {
        double cost = 0;
        for (int p = 0; p < 2; p++) {
          double q = target * (p == 0 ? a : 2000 - a) / 2000;
          PlantOption plant = plants.get(p);
          if (q > 0) {
            Plan plan = Minimiser.of(plant.technology()).plan(plant.question().at(q));
            cost += plan.answered() ? plan.cost() + plant.runningCost() : OPEN;
          }
        }
        best = Math.min(best, cost);
      }
      assertThat(split.cost()).isBetween(best * (1 - 1e-5), best * (1 + 2e-9));
    }
  }

  @Test
  void outOfReachSaysWhatBinds() {
    List<PlantOption> plants = List.of(quadratic("x", 17, 20, 0), quadratic("y", 25, 10, 0));
    SplitOutcome split = PlantSplit.of(plants, 42);
    assertThat(split.state()).isEqualTo(PlanOutcome.State.INFEASIBLE);
    assertThat(split.reason())
        .contains("the plants together make at most 30")
        .contains("x at most 20 (its capacity)");
  }

  /** Twenty plants of planted technologies; every split must cost no more than equal parts. */
  @Test
  void manyPlants() {
    RandomTechnologies random = new RandomTechnologies(94);
    List<PlantOption> plants = new ArrayList<>();
    for (int p = 0; p < 20; p++) {
      Planted planted = random.cobbDouglas();
      Technology technology = Rescaled.of(planted.technology(), 1).shifted(0);
      technology = technology.shifted(-technology.parameters()[0]);
      double[] prices = new double[technology.dimension()];
      java.util.Arrays.fill(prices, random.between(1, 2));
      plants.add(
          new PlantOption("p" + p, technology, Question.of(1, prices), 12, random.between(0, 3)));
    }
    SplitOutcome split = PlantSplit.of(plants, 60);
    assertThat(split.planned()).isTrue();
    assertThat(split.proof().gap()).isLessThan(1.1e-9);
    double equal = 0;
    for (PlantOption plant : plants) {
      equal +=
          Minimiser.of(plant.technology()).plan(plant.question().at(3)).cost()
              + plant.runningCost();
    }
    assertThat(split.cost()).isLessThan(equal);
  }
}
