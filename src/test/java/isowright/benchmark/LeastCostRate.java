package isowright.benchmark;

import isowright.leastcost.Minimiser;
import isowright.leastcost.Plan;
import isowright.leastcost.Question;
import isowright.technology.Ces;
import isowright.technology.CobbDouglas;
import isowright.technology.Technology;
import isowright.technology.Translog;
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

  private LeastCostRate() {}

  static void report(Steps steps) {
    steps.heading("Least-cost answers a second, 3 inputs, one thread");
    measure(steps, new CobbDouglas(INPUTS, BASE, LOG_OUTPUT, new double[] {.38, .35, .32}), false);
    measure(steps, Ces.of(INPUTS, BASE, LOG_OUTPUT, new double[] {.36, .34, .3}, .6, 1.05), false);
    double[] secondOrder = {.38, .35, .32, -.14, .07, .07, -.14, .07, -.14};
    Technology translog = new Translog(INPUTS, BASE, LOG_OUTPUT, secondOrder);
    measure(steps, translog, false);
    measure(steps, translog, true);
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
