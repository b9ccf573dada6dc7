package isowright.cost;

import isowright.cost.GeneralisedCost.PriceTerms;

/**
 * A {@link GeneralisedCost} at a point: C, its slope and its second derivatives in the scaled
 * levels of prices and outputs and in time. Tested in {@code GeneralisedCostTest}.
 */
final class GeneralisedCostPoint {

  private final GeneralisedCost function;
  private final double[] p;
  private final double[] theta;
  private final int n;
  private final int m;
  private final double[] u;
  private final double t;
  private final double total;
  private final double index;
  private final double[] slope;
  private final double[][] bend;
  private double cost;

  GeneralisedCostPoint(GeneralisedCost function, double[] v) {
    this.function = function;
    CostArguments arguments = function.arguments();
    this.p = function.coefficients();
    this.theta = function.weights();
    this.n = arguments.inputs().size();
    this.m = arguments.outputs().size();
    this.u = new double[arguments.size()];
    double[] base = arguments.base();
    for (int k = 0; k < u.length; k++) {
      // a zero output has the log −∞ and the level zero
      u[k] = k < base.length ? Math.exp(v[k]) / base[k] : 1;
    }
    this.t = arguments.time() ? v[v.length - 1] : 0;
    double outputs = 0;
    for (int k = 0; k < m; k++) {
      outputs += u[n + k];
    }
    this.total = outputs;
    double prices = 0;
    for (int i = 0; i < n; i++) {
      prices += theta[i] * u[i];
    }
    this.index = prices;
    this.slope = new double[u.length];
    this.bend = new double[u.length][u.length];
    if (function.prices() == PriceTerms.LEONTIEF) {
      roots();
    } else {
      quadratic();
    }
    linear();
    neutral();
    for (int k = 0; k < u.length; k++) {
      for (int l = 0; l < k; l++) {
        bend[k][l] = bend[l][k];
      }
    }
  }

  double cost() {
    return cost;
  }

  double[] slope() {
    return slope;
  }

  double[][] bend() {
    return bend;
  }

  /** The derivative of the level of an argument in the argument: the level itself, or one. */
  double unit(int k) {
    return u[k];
  }

  /** q and its slopes enter cost by h = Σ y, and the slopes in outputs by their prices. */
  private void priceTerms(double q, double[] slopes) {
    cost += total * q;
    for (int i = 0; i < n; i++) {
      slope[i] += total * slopes[i];
      for (int k = 0; k < m; k++) {
        bend[i][n + k] += slopes[i];
      }
    }
    for (int k = 0; k < m; k++) {
      slope[n + k] += q;
    }
  }

  private void roots() {
    double q = 0;
    double[] slopes = new double[n];
    for (int i = 0; i < n; i++) {
      for (int j = i + 1; j < n; j++) {
        double a = p[GeneralisedCost.pair(n, i, j)];
        double root = Math.sqrt(u[i] * u[j]);
        q += 2 * a * root;
        slopes[i] += a * root / u[i];
        slopes[j] += a * root / u[j];
        bend[i][j] += total * a / (2 * root);
        bend[i][i] -= total * a * root / (2 * u[i] * u[i]);
        bend[j][j] -= total * a * root / (2 * u[j] * u[j]);
      }
    }
    priceTerms(q, slopes);
  }

  private void quadratic() {
    double[] sw = new double[n];
    double squares = 0;
    double[][] s = new double[n][n];
    for (int i = 0; i < n; i++) {
      for (int j = i + 1; j < n; j++) {
        double a = p[GeneralisedCost.pair(n, i, j)];
        double apart = u[j] - u[i];
        sw[i] += a * apart;
        sw[j] -= a * apart;
        squares += a * apart * apart;
        s[i][j] = a;
        s[i][i] -= a;
        s[j][j] -= a;
      }
    }
    double d = index;
    double[] slopes = new double[n];
    for (int i = 0; i < n; i++) {
      slopes[i] = sw[i] / d + theta[i] * squares / (2 * d * d);
      for (int j = i; j < n; j++) {
        bend[i][j] +=
            total
                * (s[i][j] / d
                    - (sw[i] * theta[j] + theta[i] * sw[j]) / (d * d)
                    - theta[i] * theta[j] * squares / (d * d * d));
      }
    }
    priceTerms(-squares / (2 * d), slopes);
  }

  private void linear() {
    int last = u.length - 1;
    for (int i = 0; i < n; i++) {
      double fixed = p[function.fixed(i)];
      cost += fixed * u[i];
      slope[i] += fixed;
      for (int k = 0; k < m; k++) {
        double c = p[function.linear(i, k)];
        cost += c * u[i] * u[n + k];
        slope[i] += c * u[n + k];
        slope[n + k] += c * u[i];
        bend[i][n + k] += c;
      }
      if (function.arguments().time()) {
        double trend = p[function.trend(i)];
        cost += total * t * trend * u[i];
        slope[i] += total * t * trend;
        slope[last] += total * trend * u[i];
        bend[i][last] += total * trend;
        for (int k = 0; k < m; k++) {
          slope[n + k] += t * trend * u[i];
          bend[i][n + k] += t * trend;
          bend[n + k][last] += trend * u[i];
        }
      }
    }
  }

  /** θ′w (β t + β₂ t² h + Σ d_kl y_k y_l). */
  private void neutral() {
    double sum = 0;
    double[] slopes = new double[m];
    for (int k = 0; k < m; k++) {
      for (int l = k; l < m; l++) {
        double d = p[function.square(k, l)];
        sum += d * u[n + k] * u[n + l];
        slopes[k] += d * u[n + l];
        slopes[l] += d * u[n + k];
        bend[n + k][n + l] += index * d * (k == l ? 2 : 1);
      }
    }
    int last = u.length - 1;
    if (function.arguments().time()) {
      double first = p[function.trend(n)];
      double second = p[function.trend(n + 1)];
      sum += first * t + second * t * t * total;
      double speed = first + 2 * second * t * total;
      slope[last] += index * speed;
      bend[last][last] += index * 2 * second * total;
      for (int i = 0; i < n; i++) {
        bend[i][last] += theta[i] * speed;
      }
      for (int k = 0; k < m; k++) {
        slopes[k] += second * t * t;
        bend[n + k][last] += index * 2 * second * t;
      }
    }
    cost += index * sum;
    for (int i = 0; i < n; i++) {
      slope[i] += theta[i] * sum;
      for (int k = 0; k < m; k++) {
        bend[i][n + k] += theta[i] * slopes[k];
      }
    }
    for (int k = 0; k < m; k++) {
      slope[n + k] += index * slopes[k];
    }
  }
}
