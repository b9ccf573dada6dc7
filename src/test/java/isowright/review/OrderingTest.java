package isowright.review;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import isowright.estimation.EstimatedTechnology;
import isowright.leastcost.Question;
import isowright.review.Ordering.Ranked;
import isowright.review.Ordering.Simulation;
import isowright.technology.CobbDouglas;
import java.util.ArrayList;
import java.util.List;
import java.util.SplittableRandom;
import org.apache.commons.statistics.distribution.NormalDistribution;
import org.junit.jupiter.api.Test;

/** Ranks, their probabilities, and which plants can be told apart. */
class OrderingTest {

  private static final List<String> LK = List.of("labour", "capital");

  /**
   * y = L^β K^(1−β) with only β uncertain (se τ): ln C = ln y + β ln(w/β) + (1−β) ln(r/(1−β)),
   * whose derivative at β = ½ is ln(w/r). Plants with w/r = e^±½ thus move by ±½ τ z.
   */
  private static EstimatedTechnology onlyShareUncertain(double tau, double degrees) {
    double[][] v = {{0, 0, 0}, {0, tau * tau, -tau * tau}, {0, -tau * tau, tau * tau}};
    return new EstimatedTechnology(CobbDouglas.of(LK, 0, .5, .5), v, degrees);
  }

  private static Entrant entrant(
      String plant, EstimatedTechnology reference, double priceRatio, double ratio, double s) {
    Question question = Question.of(1, Math.sqrt(priceRatio), 1 / Math.sqrt(priceRatio));
    GapEstimates estimates = GapEstimates.against(reference, .95);
    double least =
        FiledCost.against(reference.technology()).gap(new double[] {1, 1}, question, 1).leastCost();
    GapEstimate estimate = estimates.of(new double[] {1, 1}, question, ratio * least);
    return Entrant.of(plant, question, estimate, s);
  }

  /**
   * Two plants whose ln ratios differ by .02 and whose difference has standard error τ: the first
   * is first with probability Φ(.02/τ). With 20,000 draws the binomial error is below .0035.
   */
  @Test
  void probabilityOfRankIsThatOfTheNormalLaw() {
    double tau = .03;
    EstimatedTechnology reference = onlyShareUncertain(tau, 1e6);
    List<Entrant> entrants =
        List.of(
            entrant("B", reference, Math.exp(-.5), Math.exp(.02), 0),
            entrant("A", reference, Math.exp(.5), 1, 0));
    Ordering ordering = Ordering.of(entrants, reference, 20_000, 4, .95);
    assertThat(ordering.simulation()).isEqualTo(Simulation.SOLVED);
    Ranked first = ordering.ranked().get(0);
    assertThat(first.entrant().plant()).isEqualTo("A");
    double expected = NormalDistribution.of(0, 1).cumulativeProbability(.02 / tau);
    // Three binomial standard errors; the second derivative of ln C in β is lost in them.
    assertThat(first.probabilities().get(0)).isCloseTo(expected, within(.011));
    assertThat(first.probabilities().stream().mapToDouble(p -> p).sum())
        .isCloseTo(1, within(1e-12));
    assertThat(first.bandWithYear()).isEmpty();
    // One pair: its critical value is the .95 quantile of |z|.
    assertThat(ordering.apart().critical().orElseThrow()).isCloseTo(1.96, within(.06));
    assertThat(ordering.apart().groups()).containsExactly(List.of("A", "B"));
  }

  /** First order and solving anew agree where little is uncertain, and more so where less is. */
  @Test
  void firstOrderAgreesWithSolvingAnew() {
    EstimatedTechnology reference = Glass.estimated(Glass.translog(), .004, 2);
    List<Entrant> few = entrants(reference, 40, .0);
    List<Entrant> many = entrants(reference, 600, .0);
    Ordering solved = Ordering.of(few, reference, 999, 4, .95);
    assertThat(solved.simulation()).isEqualTo(Simulation.SOLVED);
    assertThat(solved.without()).isZero();
    Ordering first = Ordering.of(many, reference, 999, 4, .95);
    assertThat(first.simulation()).isEqualTo(Simulation.FIRST_ORDER);
    assertThat(first.ranked()).hasSize(600);
    assertThat(first.apart().groups()).isEmpty();
    assertThat(first.ranked().get(0).probabilities()).isEmpty();
    for (Ranked ranked : solved.ranked()) {
      assertThat(ranked.band().low()).isLessThanOrEqualTo(ranked.rank());
      assertThat(ranked.band().high()).isGreaterThanOrEqualTo(ranked.rank());
    }
  }

  @Test
  void theChanceOfTheYearWidensBandsAndGroups() {
    EstimatedTechnology reference = Glass.estimated(Glass.ces(), .004, 2);
    Ordering ordering = Ordering.of(entrants(reference, 30, .1), reference, 999, 4, .95);
    int alone = 0;
    int withYear = 0;
    for (Ranked ranked : ordering.ranked()) {
      alone += ranked.band().high() - ranked.band().low();
      withYear += ranked.bandWithYear().get(0).high() - ranked.bandWithYear().get(0).low();
    }
    assertThat(withYear).isGreaterThan(2 * alone);
    assertThat(ordering.apartWithYear().largestGroup())
        .isGreaterThan(ordering.apart().largestGroup());
    // Thirty nearly equal variances: the .95 quantile of the studentised range of 30 means is 5.30
    // (tables, from memory), over √2 it is 3.75; 40 degrees of freedom add some.
    assertThat(ordering.apartWithYear().critical().orElseThrow()).isBetween(3.5, 4.3);
  }

  private static List<Entrant> entrants(EstimatedTechnology reference, int count, double s) {
    SplittableRandom random = new SplittableRandom(8);
    GapEstimates estimates = GapEstimates.against(reference, .95);
    List<Entrant> entrants = new ArrayList<>();
    for (int k = 0; k < count; k++) {
      double[] prices = Glass.PRICES.clone();
      double[] mix = Glass.BASE.clone();
      for (int i = 0; i < 3; i++) {
        prices[i] *= Math.exp(.4 * random.nextDouble() - .2);
        mix[i] *= Math.exp(.4 * random.nextDouble() - .2);
      }
      double output = reference.technology().output(mix) * Math.exp(.1 * random.nextDouble());
      Question question = Question.of(output, prices);
      double filed = 0;
      for (int i = 0; i < 3; i++) {
        filed += prices[i] * mix[i];
      }
      entrants.add(Entrant.of("P" + k, question, estimates.of(mix, question, filed), s));
    }
    return entrants;
  }

  @Test
  void theSameSeedGivesTheSameAndAnotherAnother() {
    EstimatedTechnology reference = Glass.estimated(Glass.ces(), .01, 2);
    List<Entrant> entrants = entrants(reference, 12, .05);
    List<List<Double>> once = probabilities(Ordering.of(entrants, reference, 499, 4, .95));
    assertThat(probabilities(Ordering.of(entrants, reference, 499, 4, .95))).isEqualTo(once);
    assertThat(probabilities(Ordering.of(entrants, reference, 499, 5, .95))).isNotEqualTo(once);
  }

  private static List<List<Double>> probabilities(Ordering ordering) {
    return ordering.ranked().stream().map(Ranked::probabilities).toList();
  }

  /** Under no true difference, the chance that any pair is called apart is that of the level. */
  @Test
  void falseDifferencesAreAsRareAsTheLevelSays() {
    EstimatedTechnology reference = Glass.estimated(Glass.ces(), .02, 2);
    SplittableRandom random = new SplittableRandom(77);
    List<Entrant> entrants = entrants(reference, 15, .1);
    int called = 0;
    int trials = 400;
    for (int trial = 0; trial < trials; trial++) {
      var draw = isowright.inference.ParameterDraws.of(reference, 1, random.nextLong()).draw(0);
      List<Entrant> equal = new ArrayList<>();
      double[] noise = new double[entrants.size()];
      Year.add(entrants.stream().mapToDouble(Entrant::yearSpread).toArray(), noise, draw);
      for (int i = 0; i < entrants.size(); i++) {
        Entrant e = entrants.get(i);
        double moved = Math.exp(draw.along(e.slopes()) + noise[i]);
        equal.add(
            new Entrant(
                e.plant(),
                e.leastCost() * moved,
                e.leastCost(),
                e.slopes(),
                e.yearSpread(),
                e.asked()));
      }
      if (Ordering.of(equal, reference, 999, trial, .95).apartWithYear().groups().size() > 1) {
        called++;
      }
    }
    // 5 % of 400 is 20, binomial standard error 4.4; the critical value of 999 draws adds about 3.
    assertThat(called).isBetween(5, 37);
  }

  @Test
  void aKnownTechnologyOrdersExactly() {
    int p = Glass.ces().parameters().length;
    EstimatedTechnology known = new EstimatedTechnology(Glass.ces(), new double[p][p], 1);
    Ordering ordering = Ordering.of(entrants(known, 10, 0), known, 999, 4, .95);
    assertThat(ordering.simulation()).isEqualTo(Simulation.EXACT);
    for (Ranked ranked : ordering.ranked()) {
      assertThat(ranked.band()).isEqualTo(new RankBands.Band(ranked.rank(), ranked.rank()));
    }
    assertThat(ordering.apart().all()).isTrue();
  }
}
