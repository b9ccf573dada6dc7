package isowright.leastcost;

import isowright.technology.Technology;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;

/**
 * Least cost by a technology that is not regular everywhere, searched from several starts: each
 * input in turn doubled and halved from the technology's base. The cheapest regular answer is kept.
 * This is evidence, no proof.
 */
final class OtherStarts implements LeastCost {

  /** How far starts lie from the base, as a factor: about the spread of records of one industry. */
  private static final double FACTOR = 2;

  /** Costs closer than this, relative, are the same answer reached twice. */
  private static final double SAME = 1e-9;

  private static final double[] NONE = {};

  private final Technology technology;
  private final LeastCost leastCost;

  OtherStarts(Technology technology, LeastCost leastCost) {
    this.technology = technology;
    this.leastCost = leastCost;
  }

  /** What is said of the starts tried. */
  static String words(Technology technology) {
    return String.format(
        Locale.ROOT,
        "from %d other starts within a factor of two of the scaling point nothing cheaper was found",
        2 * technology.dimension());
  }

  @Override
  public List<String> inputs() {
    return leastCost.inputs();
  }

  @Override
  public Plan plan(Question question) {
    return cheapest(question, leastCost.plan(question));
  }

  @Override
  public Plan plan(Question question, Plan near) {
    return cheapest(question, leastCost.plan(question, near));
  }

  private Plan cheapest(Question question, Plan first) {
    Plan best = first;
    for (Plan start : starts()) {
      Plan other = leastCost.plan(question, start);
      boolean better =
          other.answered() && (!best.answered() || other.cost() < best.cost() * (1 - SAME));
      if (better) {
        best = other;
      }
    }
    return best;
  }

  /** Mixes to begin at, in the guise of plans. */
  private List<Plan> starts() {
    double[] base = technology.base();
    List<Plan> starts = new ArrayList<>();
    for (int i = 0; i < base.length; i++) {
      for (double factor : new double[] {FACTOR, 1 / FACTOR}) {
        double[] mix = base.clone();
        mix[i] *= factor;
        starts.add(
            new Plan(Plan.Status.SOLVED, mix, Double.NaN, Double.NaN, NONE, NONE, Double.NaN, ""));
      }
    }
    return starts;
  }
}
