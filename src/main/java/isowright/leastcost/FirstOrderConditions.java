package isowright.leastcost;

import isowright.technology.Technology;

/**
 * Newton's method for the first-order conditions of least cost in logs, some inputs being fixed.
 *
 * <p>Unknowns are z_i = ln x_i of the free inputs and κ = ln μ, μ = λ Q; with output elasticities
 * e_i the conditions w_i x_i = μ e_i and f(x) = Q read
 *
 * <pre>  F_i = ln w_i + z_i − κ − ln e_i(z) = 0,      ln f(z) − ln Q = 0 </pre>
 *
 * In this form they are linear for Cobb-Douglas and nearly so for its relatives, so a handful of
 * steps suffice. Each condition multiplied by e_i, the Newton step solves, with G the Hessian of ln
 * f in ln x,
 *
 * <pre>  (diag(e) − G) dz − e dκ = −e F,      e · dz = ln Q − ln f </pre>
 *
 * whose upper left block is positive definite on e · dz = 0 exactly where f is quasi-concave. Steps
 * are halved until Σ F² + (ln f − ln Q)² falls and every e_i stays positive, which the step
 * guarantees for short enough a step.
 *
 * <p>Not shared between threads: it holds the point reached.
 */
final class FirstOrderConditions {

  /** Where iteration stops: some ten times the rounding of a sum of logs of the size of 30. */
  private static final double TIGHT = 1e-13;

  /** What counts as solved where rounding stops the descent before {@link #TIGHT}. */
  private static final double SOLVED = 1e-10;

  /** No input changes by more than a factor of e^4 in one step; the model is local. */
  private static final double LONGEST = 4;

  private static final int ITERATIONS = 60;
  private static final int HALVINGS = 30;

  /** A step must bring this part of the decrease that the linear model promises. */
  private static final double DECREASE = 1e-4;

  private final Technology technology;
  private final int n;

  /** ln x; set before solving, the solution after. */
  final double[] z;

  /** The output elasticities at z, of all inputs, after solving. */
  final double[] elasticities;

  /** ln μ after solving. */
  double logMultiplier;

  /** ln f − ln Q after solving. */
  double excess;

  private final double[] trial;
  private final double[] step;
  private final double[][] hessian;
  private final double[][] system;
  private final int[] place;

  FirstOrderConditions(Technology technology) {
    this.technology = technology;
    this.n = technology.dimension();
    z = new double[n];
    elasticities = new double[n];
    trial = new double[n];
    step = new double[n + 1];
    hessian = new double[n][n];
    system = new double[n + 1][n + 2];
    place = new int[n];
  }

  /**
   * Solves from the point z.
   *
   * @return whether the conditions are met; if not, z is the point where the search ended
   */
  boolean solve(double logTarget, double[] logPrice, boolean[] fixed) {
    int free = 0;
    for (int i = 0; i < n; i++) {
      if (!fixed[i]) {
        place[free++] = i;
      }
    }
    excess = technology.logOutput(z) - logTarget;
    technology.logGradient(z, elasticities);
    if (!startMultiplier(logPrice, free)) {
      return false;
    }
    double merit = merit(z, logMultiplier, logPrice, free);
    for (int iteration = 0; iteration < ITERATIONS; iteration++) {
      double largest = largest(logPrice, free);
      if (largest <= TIGHT) {
        return true;
      }
      if (!newtonStep(logPrice, free)) {
        return largest <= SOLVED;
      }
      double lower = advance(logTarget, logPrice, free, merit);
      if (!(lower < merit)) {
        return largest <= SOLVED;
      }
      merit = lower;
    }
    return largest(logPrice, free) <= SOLVED;
  }

  /** κ from the sum of the conditions, each weighted by e_i; false where an e_i is not positive. */
  private boolean startMultiplier(double[] logPrice, int free) {
    double sum = 0;
    double weighted = 0;
    for (int k = 0; k < free; k++) {
      int i = place[k];
      double e = elasticities[i];
      if (!(e > 0) || !(e < Double.POSITIVE_INFINITY)) {
        return false;
      }
      sum += e;
      weighted += e * (logPrice[i] + z[i] - Math.log(e));
    }
    logMultiplier = weighted / sum;
    return Double.isFinite(excess);
  }

  /** Solves for the step by elimination with partial pivoting; false where it is singular. */
  private boolean newtonStep(double[] logPrice, int free) {
    technology.logHessian(z, hessian);
    int size = free + 1;
    for (int k = 0; k < free; k++) {
      int i = place[k];
      double e = elasticities[i];
      double[] row = system[k];
      for (int l = 0; l < free; l++) {
        row[l] = -hessian[i][place[l]];
      }
      row[k] += e;
      row[free] = -e;
      row[size] = -e * (logPrice[i] + z[i] - logMultiplier - Math.log(e));
      system[free][k] = e;
    }
    system[free][free] = 0;
    system[free][size] = -excess;
    return DenseSystem.solve(system, size, step);
  }

  /** Moves along the step as far as the merit falls; returns the new merit, or the old one. */
  private double advance(double logTarget, double[] logPrice, int free, double merit) {
    double longest = 0;
    for (int k = 0; k < free; k++) {
      longest = Math.max(longest, Math.abs(step[k]));
    }
    if (!(longest < Double.POSITIVE_INFINITY)) {
      return merit;
    }
    double t = Math.min(1, LONGEST / longest);
    System.arraycopy(z, 0, trial, 0, n);
    for (int halving = 0; halving < HALVINGS; halving++) {
      for (int k = 0; k < free; k++) {
        trial[place[k]] = z[place[k]] + t * step[k];
      }
      double multiplier = logMultiplier + t * step[free];
      excess = technology.logOutput(trial) - logTarget;
      technology.logGradient(trial, elasticities);
      double lower = merit(trial, multiplier, logPrice, free);
      if (lower < merit * (1 - DECREASE * t)) {
        System.arraycopy(trial, 0, z, 0, n);
        logMultiplier = multiplier;
        return lower;
      }
      t /= 2;
    }
    excess = technology.logOutput(z) - logTarget;
    technology.logGradient(z, elasticities);
    return merit;
  }

  /** Σ F² + excess²; infinite where an e_i is not positive. */
  private double merit(double[] at, double multiplier, double[] logPrice, int free) {
    double sum = excess * excess;
    for (int k = 0; k < free; k++) {
      int i = place[k];
      if (!(elasticities[i] > 0)) {
        return Double.POSITIVE_INFINITY;
      }
      double residual = logPrice[i] + at[i] - multiplier - Math.log(elasticities[i]);
      sum += residual * residual;
    }
    return Double.isNaN(sum) ? Double.POSITIVE_INFINITY : sum;
  }

  private double largest(double[] logPrice, int free) {
    double largest = Math.abs(excess);
    for (int k = 0; k < free; k++) {
      int i = place[k];
      double residual = logPrice[i] + z[i] - logMultiplier - Math.log(elasticities[i]);
      largest = Math.max(largest, Math.abs(residual));
    }
    return largest;
  }
}
