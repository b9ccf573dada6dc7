package isowright.leastcost;

import isowright.leastcost.Plan.Status;
import isowright.technology.Technology;
import java.util.ArrayList;
import java.util.List;

/**
 * Makes a {@link Plan} of a mix found by whatever means. Output and elasticities are asked of the
 * technology again, so the departure from the first-order conditions that the plan carries owes
 * nothing to the solver.
 */
final class Answer {

  private static final double[] NONE = {};

  /** A share of cost that is zero in every printed figure; its conditions are lost to underflow. */
  private static final double VANISHING = 1e-290;

  /**
   * A limit that is worth less than this part of the price is worth nothing in any printed figure.
   */
  private static final double NOTHING = 1e-9;

  private final Technology technology;
  private final Question question;
  private final byte[] at;
  private final double[] mix;
  private final double[] spent;
  private final double[] elasticities;
  private final double excess;
  private final double cost;

  /**
   * A mix and what every input in it is ({@link ActiveLimits#FREE} and so on).
   *
   * @param z ln x, shape n
   */
  Answer(Technology technology, Question question, double logTarget, double[] z, byte[] at) {
    int n = z.length;
    this.technology = technology;
    this.question = question;
    this.at = at;
    mix = new double[n];
    spent = new double[n];
    elasticities = new double[n];
    double sum = 0;
    for (int i = 0; i < n; i++) {
      mix[i] =
          at[i] == ActiveLimits.FREE
              ? Math.exp(z[i])
              : at[i] == ActiveLimits.LOW ? question.low(i) : question.high(i);
      spent[i] = question.price(i) * mix[i];
      sum += spent[i];
    }
    cost = sum;
    excess = technology.logOutput(z) - logTarget;
    technology.logGradient(z, elasticities);
  }

  /** No mix within the limits. */
  static Plan none(Status status, String reason) {
    return new Plan(status, NONE, Double.NaN, Double.NaN, NONE, NONE, Double.NaN, reason);
  }

  /** Whether every input is strictly within its limits. */
  boolean within() {
    for (int i = 0; i < mix.length; i++) {
      if (!(mix[i] > question.low(i) && mix[i] < question.high(i))) {
        return false;
      }
    }
    return true;
  }

  /** μ as the free inputs have it: Σ w_i x_i = μ Σ e_i over them. */
  double freeMultiplier() {
    double free = 0;
    double sum = 0;
    for (int i = 0; i < mix.length; i++) {
      if (at[i] == ActiveLimits.FREE) {
        free += spent[i];
        sum += elasticities[i];
      }
    }
    return free / sum;
  }

  /** The plan where the target binds, μ = λ Q being what ln f is worth. */
  Plan plan(double multiplier) {
    double departure = Math.abs(Math.expm1(excess));
    double worth = Double.isInfinite(multiplier) ? savingMultiplier() : multiplier;
    double[] shares = new double[mix.length];
    double[] values = new double[mix.length];
    boolean corner = false;
    for (int i = 0; i < mix.length; i++) {
      shares[i] = spent[i] / cost;
      corner |= at[i] >= ActiveLimits.LOW || mix[i] == 0;
      if (at[i] != ActiveLimits.FREE && mix[i] > 0) {
        values[i] = (worth * elasticities[i] - spent[i]) / mix[i];
      }
      departure = Math.max(departure, departure(i, multiplier));
    }
    return new Plan(
        corner ? Status.CORNER : Status.SOLVED,
        mix,
        cost,
        multiplier / question.target(),
        shares,
        values,
        departure,
        reason(values));
  }

  /** The plan where the least of every input already yields more than the target. */
  Plan slack() {
    double[] shares = new double[mix.length];
    double[] values = new double[mix.length];
    for (int i = 0; i < mix.length; i++) {
      shares[i] = spent[i] / cost;
      values[i] = -question.price(i);
    }
    String reason =
        "the least that must be taken already yields "
            + Wording.number(question.target() * Math.exp(excess))
            + ", more than the target";
    double shortfall = Math.max(0, -Math.expm1(excess));
    return new Plan(Status.CORNER, mix, cost, 0, shares, values, shortfall, reason);
  }

  private double departure(int i, double multiplier) {
    if (!(spent[i] > VANISHING * cost) && !(elasticities[i] > VANISHING)) {
      return 0;
    }
    double ratio = spent[i] / (multiplier * elasticities[i]) - 1;
    return switch (at[i]) {
      case ActiveLimits.FREE -> Math.abs(ratio);
      case ActiveLimits.HIGH -> Math.max(0, ratio);
      case ActiveLimits.LOW -> Math.max(0, -ratio);
      default -> 0;
    };
  }

  /**
   * Where no input can give more, a little more of one would still save of another: what it
   * replaces is the dearest that could be reduced; nothing where all are held.
   */
  private double savingMultiplier() {
    double dearest = 0;
    for (int i = 0; i < mix.length; i++) {
      if (at[i] == ActiveLimits.HIGH && elasticities[i] > 0) {
        dearest = Math.max(dearest, spent[i] / elasticities[i]);
      }
    }
    return dearest;
  }

  private String reason(double[] values) {
    List<String> parts = new ArrayList<>(0);
    for (int i = 0; i < mix.length; i++) {
      if (at[i] != ActiveLimits.FREE) {
        parts.add(limit(i, values[i]));
      } else if (mix[i] == 0) {
        parts.add("so little of " + name(i) + " is taken that it rounds to zero");
      }
    }
    return parts.isEmpty() ? "" : String.join("; ", parts);
  }

  private String limit(int i, double value) {
    String place =
        switch (at[i]) {
          case ActiveLimits.HELD -> " is held at ";
          case ActiveLimits.LOW -> " is at its lower limit ";
          default -> " is at its upper limit ";
        };
    String worth =
        Math.abs(value) <= NOTHING * question.price(i)
            ? ", as it would be without"
            : value >= 0
                ? " (one more unit would save about " + Wording.brief(value) + ")"
                : " (one unit less would save about " + Wording.brief(-value) + ")";
    return name(i) + place + Wording.number(mix[i]) + worth;
  }

  private String name(int i) {
    return technology.inputs().get(i);
  }
}
