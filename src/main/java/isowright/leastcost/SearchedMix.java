package isowright.leastcost;

import isowright.technology.Regularity;
import isowright.technology.Technology;
import java.util.ArrayList;
import java.util.List;

/**
 * The least-cost quantities of the free inputs of any technology, searched for.
 *
 * <p>First Newton's method from a start near the answer ({@link FirstOrderConditions}). Where that
 * does not arrive at a regular point, a path is followed: from a point where the technology is
 * regular, at the prices and the output for which that point is least cost, prices and output are
 * moved to those asked for, and the least-cost mix is followed along. A technology that is regular
 * all the way has its answer at the end. If the path cannot be followed, the place where it ends
 * says what is irregular.
 *
 * <p>Not shared between threads.
 */
final class SearchedMix implements FreeMix {

  /** The shortest part of the path that is tried before it is given up. */
  private static final double SHORTEST = 1.0 / 2048;

  /**
   * Prices being finite, a path ends where isoquants cease to be convex, or where all free inputs
   * together cease to add output: their elasticities have then fallen to about this part of what
   * they were at its start (the square root of the shortest step).
   */
  private static final double RUN_OUT = 0.1;

  /** The weight of a ridge that lets nearly singular curvature be inverted for a start. */
  private static final double RIDGE = 1e-8;

  private final Technology technology;
  private final int n;
  private final FirstOrderConditions conditions;
  private final double[][] curvature;
  private final double[] logPrice;
  private final double[] reached;
  private String ended = "";

  SearchedMix(Technology technology) {
    this.technology = technology;
    n = technology.dimension();
    conditions = new FirstOrderConditions(technology);
    curvature = new double[n][n];
    logPrice = new double[n];
    reached = new double[n];
  }

  @Override
  public Outcome solve(LogQuestion question, boolean[] fixed, double[] z, boolean thorough) {
    System.arraycopy(z, 0, conditions.z, 0, n);
    if (conditions.solve(question.logTarget, question.logPrice, fixed) && convex(fixed)) {
      System.arraycopy(conditions.z, 0, z, 0, n);
      return Outcome.FOUND;
    }
    for (double[] start : starts(thorough)) {
      for (int i = 0; i < n; i++) {
        start[i] = fixed[i] ? z[i] : start[i];
      }
      if (follow(start, question, fixed)) {
        System.arraycopy(conditions.z, 0, z, 0, n);
        return Outcome.FOUND;
      }
    }
    return Outcome.NOT_FOUND;
  }

  @Override
  public String ended() {
    return ended;
  }

  /** Follows the least-cost mix from a regular point to the question. */
  private boolean follow(double[] start, LogQuestion question, boolean[] fixed) {
    double[] elasticities = new double[n];
    technology.logGradient(start, elasticities);
    for (int i = 0; i < n; i++) {
      if (!fixed[i] && !(elasticities[i] > 0)) {
        if (ended.isEmpty()) {
          ended = Regular.lack(technology, i, elasticities[i], start);
        }
        return false;
      }
    }
    double[] from = new double[n];
    double scale = 0;
    for (int i = 0; i < n; i++) {
      from[i] = fixed[i] ? 0 : Math.log(elasticities[i]) - start[i];
      scale += fixed[i] ? 0 : elasticities[i];
    }
    double output = technology.logOutput(start);
    System.arraycopy(start, 0, reached, 0, n);
    double t = 0;
    double stride = 0.5;
    while (t < 1) {
      double to = Math.min(1, t + stride);
      for (int i = 0; i < n; i++) {
        logPrice[i] = (1 - to) * from[i] + to * question.logPrice[i];
      }
      System.arraycopy(reached, 0, conditions.z, 0, n);
      double target = (1 - to) * output + to * question.logTarget;
      if (conditions.solve(target, logPrice, fixed) && convex(fixed)) {
        System.arraycopy(conditions.z, 0, reached, 0, n);
        t = to;
        stride *= 2;
      } else if (stride > SHORTEST) {
        stride /= 2;
      } else {
        ended = lacking(fixed, scale);
        return false;
      }
    }
    return true;
  }

  /** Points from which to follow a path: the base, then points with chosen elasticities. */
  private List<double[]> starts(boolean thorough) {
    double[] base = technology.base();
    double[] logBase = new double[n];
    for (int i = 0; i < n; i++) {
      logBase[i] = Math.log(base[i]);
    }
    List<double[]> starts = new ArrayList<>();
    starts.add(logBase.clone());
    double[] even = new double[n];
    for (int dominant = -1; thorough && dominant < n; dominant++) {
      for (int i = 0; i < n; i++) {
        even[i] = dominant < 0 ? 1.0 / n : (i == dominant ? 0.6 : 0.4 / (n - 1));
      }
      double[] point = logBase.clone();
      if (n > 1 && moveTo(even, point)) {
        starts.add(point);
      }
    }
    return starts;
  }

  /** Moves a point by Gauss-Newton steps to where the output elasticities have given values. */
  private boolean moveTo(double[] wanted, double[] point) {
    double[] elasticities = new double[n];
    double[] step = new double[n];
    double[][] system = new double[n][n + 1];
    for (int iteration = 0; iteration < 10; iteration++) {
      technology.logGradient(point, elasticities);
      technology.logHessian(point, curvature);
      double size = 0;
      for (int i = 0; i < n; i++) {
        for (int j = 0; j < n; j++) {
          size += curvature[i][j] * curvature[i][j];
        }
      }
      for (int i = 0; i < n; i++) {
        for (int j = 0; j <= n; j++) {
          double sum = i == j ? RIDGE * size : 0;
          for (int k = 0; k < n; k++) {
            sum += curvature[k][i] * (j < n ? curvature[k][j] : wanted[k] - elasticities[k]);
          }
          system[i][j] = sum;
        }
      }
      if (!(size > 0) || !DenseSystem.solve(system, n, step)) {
        return false;
      }
      double largest = 0;
      for (int i = 0; i < n; i++) {
        point[i] += step[i];
        largest = Math.max(largest, Math.abs(step[i]));
      }
      if (!(largest < 1e3)) {
        return false;
      }
      if (largest < 1e-6) {
        return true;
      }
    }
    return true;
  }

  /** Whether cost is at a minimum, not a saddle, among mixes of the free inputs. */
  private boolean convex(boolean[] fixed) {
    int free = 0;
    for (boolean f : fixed) {
      free += f ? 0 : 1;
    }
    if (free < 2) {
      return true;
    }
    technology.logHessian(conditions.z, curvature);
    double[] normal = new double[free];
    double[][] part = new double[free][free];
    for (int i = 0, r = 0; i < n; i++) {
      if (fixed[i]) {
        continue;
      }
      normal[r] = conditions.elasticities[i];
      for (int j = 0, c = 0; j < n; j++) {
        if (!fixed[j]) {
          part[r][c++] = (i == j ? conditions.elasticities[i] : 0) - curvature[i][j];
        }
      }
      r++;
    }
    return DenseSystem.positiveOnPlane(part, normal, Regularity.TOLERANCE);
  }

  /** What ran out at the last point reached: the free inputs' output, or convexity. */
  private String lacking(boolean[] fixed, double startingScale) {
    double[] elasticities = new double[n];
    technology.logGradient(reached, elasticities);
    double scale = 0;
    int free = 0;
    int least = -1;
    for (int i = 0; i < n; i++) {
      if (!fixed[i]) {
        scale += elasticities[i];
        free++;
        least = least < 0 || elasticities[i] < elasticities[least] ? i : least;
      }
    }
    if (free == 1 || scale < RUN_OUT * startingScale) {
      return Regular.lack(technology, least, elasticities[least], reached);
    }
    return "isoquants cease to be convex to the origin beyond "
        + Wording.mix(technology.inputs(), reached);
  }
}
