package isowright.estimation;

import isowright.cost.GeneralisedCost.PriceTerms;
import isowright.regression.Design;
import isowright.regression.Groups;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

/**
 * The columns of the input-quantity equations of a cost function in levels, each over h, the sum of
 * outputs: outputs, one, time, products of outputs, price terms, and last the quantities. Computed
 * as they are read; prices, outputs and quantities are those over their base.
 */
final class QuantityDesign implements Design {

  private final CostData data;
  private final PriceTerms prices;
  private final double[] weights;
  private final int n;
  private final int m;
  private final boolean time;
  private final List<String> columns;

  QuantityDesign(CostData data, PriceTerms prices) {
    this.data = data;
    this.prices = prices;
    this.n = data.arguments().inputs().size();
    this.m = data.arguments().outputs().size();
    this.time = data.arguments().time();
    List<String> inputs = data.arguments().inputs();
    List<String> outputs = data.arguments().outputs();
    List<String> names = new ArrayList<>();
    outputs.forEach(k -> names.add(k + " over output"));
    names.add("one over output");
    if (time) {
      names.addAll(List.of("trend", "trend over output", "trend*trend"));
    }
    for (int k = 0; k < m; k++) {
      for (int l = k; l < m; l++) {
        names.add(outputs.get(k) + "*" + outputs.get(l) + " over output");
      }
    }
    for (int i = 0; i < n; i++) {
      for (int j = 0; j < n; j++) {
        if (i != j) {
          names.add("prices " + inputs.get(i) + ", " + inputs.get(j));
        }
      }
    }
    inputs.forEach(i -> names.add("quantity of " + i));
    this.columns = List.copyOf(names.subList(0, names.size() - 1));
    this.weights = weights();
  }

  /** Mean quantities, over their sum: the weights θ of the inputs. */
  private double[] weights() {
    double[] sums = new double[n];
    double all = 0;
    for (int i = 0; i < n; i++) {
      for (int r = 0; r < data.rows(); r++) {
        sums[i] += quantity(i, r);
      }
      all += sums[i];
    }
    for (int i = 0; i < n; i++) {
      sums[i] /= all;
    }
    return sums;
  }

  double[] theta() {
    return weights.clone();
  }

  int size() {
    return columns.size() + 1;
  }

  int output(int k) {
    return k;
  }

  int one() {
    return m;
  }

  /** The column of t, of t/h and of t². */
  int trend(int which) {
    return m + 1 + which;
  }

  int square(int k, int l) {
    return m + 1 + (time ? 3 : 0) + k * (2 * m - k + 1) / 2 + l - k;
  }

  /**
   * The column of a price term: for roots √(w_j/w_i) of the ordered pair; for the quadratic form
   * (w_j − w_i)/θ′w of i before j, and its square over two of j before i.
   */
  int price(int i, int j) {
    return square(m, m) + i * (n - 1) + (j < i ? j : j - 1);
  }

  int quantity(int i) {
    return square(m, m) + n * (n - 1) + i;
  }

  private double price(int i, int row, double[] base) {
    return Math.exp(data.points()[i][row]) / base[i];
  }

  /** Spending over price. */
  private double quantity(int i, int row) {
    double price = Math.exp(data.points()[i][row]) / data.arguments().base()[i];
    return data.shares()[i][row] * Math.exp(data.logCost()[row]) / price;
  }

  @Override
  public int rows() {
    return data.rows();
  }

  @Override
  public List<String> columns() {
    return columns;
  }

  @Override
  public Groups groups() {
    return data.groups();
  }

  @Override
  public void fill(int from, int to, double[][] into) {
    double[] base = data.arguments().base();
    double[] w = new double[n];
    double[] y = new double[m];
    for (int r = from; r < to; r++) {
      double h = 0;
      for (int k = 0; k < m; k++) {
        y[k] = Math.exp(data.points()[n + k][r]) / base[n + k];
        h += y[k];
      }
      for (int i = 0; i < n; i++) {
        w[i] = price(i, r, base);
      }
      int at = r - from;
      scale(into, at, y, h, time ? data.points()[n + m][r] : 0);
      prices(into, at, w);
      double cost = Math.exp(data.logCost()[r]) / h;
      for (int i = 0; i < n; i++) {
        into[quantity(i)][at] = data.shares()[i][r] * cost / w[i];
      }
    }
  }

  private void scale(double[][] into, int at, double[] y, double h, double t) {
    for (int k = 0; k < m; k++) {
      into[output(k)][at] = y[k] / h;
      for (int l = k; l < m; l++) {
        into[square(k, l)][at] = y[k] * y[l] / h;
      }
    }
    into[one()][at] = 1 / h;
    if (time) {
      into[trend(0)][at] = t;
      into[trend(1)][at] = t / h;
      into[trend(2)][at] = t * t;
    }
  }

  private void prices(double[][] into, int at, double[] w) {
    double index = 0;
    for (int i = 0; i < n; i++) {
      index += weights[i] * w[i];
    }
    double[] root = prices == PriceTerms.LEONTIEF ? Arrays.stream(w).map(Math::sqrt).toArray() : w;
    for (int i = 0; i < n; i++) {
      for (int j = i + 1; j < n; j++) {
        if (prices == PriceTerms.LEONTIEF) {
          into[price(i, j)][at] = root[j] / root[i];
          into[price(j, i)][at] = root[i] / root[j];
        } else {
          double apart = (w[j] - w[i]) / index;
          into[price(i, j)][at] = apart;
          into[price(j, i)][at] = 0.5 * apart * apart;
        }
      }
    }
  }
}
