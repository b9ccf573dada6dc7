package isowright.benchmark;

import isowright.estimation.EstimatedTechnology;
import isowright.inference.Simulation;
import isowright.leastcost.CostCurve;
import isowright.leastcost.Minimiser;
import isowright.leastcost.Plan;
import isowright.leastcost.PlantOption;
import isowright.leastcost.PlantSplit;
import isowright.leastcost.Question;
import isowright.technology.Ces;
import isowright.technology.CobbDouglas;
import isowright.technology.Technology;
import isowright.technology.Translog;
import java.util.ArrayList;
import java.util.List;
import java.util.SplittableRandom;

/** How many least-cost questions a single thread answers in a second. */
final class LeastCostRate {

  private static final int QUESTIONS = 1_000;
  private static final double WARM_UP_SECONDS = 1;
  private static final double MEASURED_SECONDS = 3;

  private static final List<String> INPUTS = List.of("labour", "machines", "energy");
  private static final double[] BASE = {75_000, 36_000, 210_000};
  private static final double LOG_OUTPUT = Math.log(30_000);

  private static final int CURVE_POINTS = 61;
  private static final int DRAWS = 999;
  private static final int PLANTS = 20;
  private static final double TOTAL = 400_000;

  private LeastCostRate() {}

  /** These times alone. */
  public static void main(String[] arguments) {
    report(new Steps(System.out));
  }

  static void report(Steps steps) {
    steps.heading("Least-cost answers a second, 3 inputs, one thread");
    measure(steps, new CobbDouglas(INPUTS, BASE, LOG_OUTPUT, new double[] {.38, .35, .32}), false);
    measure(steps, Ces.of(INPUTS, BASE, LOG_OUTPUT, new double[] {.36, .34, .3}, .6, 1.05), false);
    double[] secondOrder = {.38, .35, .32, -.14, .07, .07, -.14, .07, -.14};
    Technology translog = new Translog(INPUTS, BASE, LOG_OUTPUT, secondOrder);
    measure(steps, translog, false);
    measure(steps, translog, true);
    steps.line("translog, curve of 61 points, 999 draws", curve(translog), "s");
    steps.line("target split over 20 plants", 1000 * split(), "ms");
  }

  /** Seconds for a curve whose bands come from drawn technologies, once warm. */
  private static double curve(Technology technology) {
    double[] parameters = technology.parameters();
    double[][] covariance = new double[parameters.length][parameters.length];
    for (int k = 0; k < parameters.length; k++) {
      covariance[k][k] = 1e-6; // standard errors of .001: every draw stays regular
    }
    EstimatedTechnology estimated = new EstimatedTechnology(technology, covariance, 30);
    Question question = Question.of(1, 31, 60, 9.5);
    double seconds = 0;
    for (int round = 0; round < 2; round++) {
      long start = System.nanoTime();
      CostCurve whole =
          CostCurve.of(Minimiser.of(technology), question, 15_000, 60_000, CURVE_POINTS);
      Simulation.of(estimated, .95, DRAWS, 7)
          .estimates(costs(technology, whole, question), t -> costs(t, whole, question));
      seconds = (System.nanoTime() - start) * 1e-9;
    }
    return seconds;
  }

  private static double[] costs(Technology technology, CostCurve near, Question question) {
    Minimiser minimiser = Minimiser.of(technology);
    double[] costs = new double[near.size()];
    for (int k = 0; k < costs.length; k++) {
      costs[k] = minimiser.plan(question.at(near.target(k)), near.plan(k)).cost();
    }
    return costs;
  }

  /** Seconds for one split over plants that differ in level and in what running them costs. */
  private static double split() {
    List<PlantOption> plants = new ArrayList<>();
    for (int p = 0; p < PLANTS; p++) {
      Technology own =
          Ces.of(INPUTS, BASE, LOG_OUTPUT + .01 * p, new double[] {.36, .34, .3}, .6, .9);
      plants.add(
          new PlantOption(
              "plant " + p, own, Question.of(1, 31, 60, 9.5), 40_000, 50_000 + 1_000 * p));
    }
    int rounds = 20;
    for (int round = 0; round < rounds; round++) {
      PlantSplit.of(plants, TOTAL);
    }
    long start = System.nanoTime();
    for (int round = 0; round < rounds; round++) {
      if (!PlantSplit.of(plants, TOTAL).planned()) {
        throw new IllegalStateException("no split");
      }
    }
    return (System.nanoTime() - start) * 1e-9 / rounds;
  }

  private static void measure(Steps steps, Technology technology, boolean limited) {
    Question[] questions = questions(limited);
    answersInASecond(technology, questions, WARM_UP_SECONDS);
    double rate = answersInASecond(technology, questions, MEASURED_SECONDS);
    steps.line(
        technology.form() + (limited ? ", one input held, one limited" : ", no limits"),
        rate,
        "a second");
  }

  /** Questions with prices within ±30 % of usual ones and targets from 15,000 to 60,000. */
  private static Question[] questions(boolean limited) {
    SplittableRandom random = new SplittableRandom(7);
    Question[] questions = new Question[QUESTIONS];
    for (int q = 0; q < QUESTIONS; q++) {
      double target = 15_000 * (1 + 3 * random.nextDouble());
      Question question =
          Question.of(
              target,
              31 * (0.7 + 0.6 * random.nextDouble()),
              60 * (0.7 + 0.6 * random.nextDouble()),
              9.5 * (0.7 + 0.6 * random.nextDouble()));
      double size = target / 30_000;
      questions[q] =
          limited ? question.holding(1, 36_000 * size).limiting(0, 0, 70_000 * size) : question;
    }
    return questions;
  }

  private static double answersInASecond(
      Technology technology, Question[] questions, double seconds) {
    Minimiser minimiser = Minimiser.of(technology);
    long start = System.nanoTime();
    long end = start + (long) (seconds * 1e9);
    long answers = 0;
    while (System.nanoTime() < end) {
      for (Question question : questions) {
        Plan plan = minimiser.plan(question);
        if (!plan.answered()) {
          throw new IllegalStateException(
              technology.form() + " " + plan.status() + ": " + plan.reason());
        }
      }
      answers += questions.length;
    }
    return answers / ((System.nanoTime() - start) * 1e-9);
  }
}
