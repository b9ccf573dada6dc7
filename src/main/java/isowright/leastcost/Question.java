package isowright.leastcost;

/**
 * What mix of inputs yields a target at least cost? min Σ w_i x_i subject to f(x) ≥ target, low_i ≤
 * x_i ≤ high_i.
 *
 * <p>Shapes: n, the inputs of the technology in its order. An input that is held has {@code low ==
 * high}; an input without limits has low 0 and high {@code +∞}.
 *
 * @param target output Q, positive
 * @param prices w, all positive and finite, money per unit of the input
 * @param low the least of each input that is taken
 * @param high the most of each input that can be had
 */
public record Question(double target, double[] prices, double[] low, double[] high) {

  /** Copies and checks the arrays. */
  public Question {
    if (!(target > 0) || Double.isInfinite(target)) {
      throw new IllegalArgumentException("target " + target + " is not a positive number");
    }
    prices = prices.clone();
    low = low.clone();
    high = high.clone();
    if (low.length != prices.length || high.length != prices.length) {
      throw new IllegalArgumentException("prices and limits differ in length");
    }
    for (int i = 0; i < prices.length; i++) {
      if (!(prices[i] > 0) || Double.isInfinite(prices[i])) {
        throw new IllegalArgumentException("price " + i + " is " + prices[i]);
      }
      if (!(low[i] >= 0) || !(high[i] >= low[i]) || Double.isInfinite(low[i])) {
        throw new IllegalArgumentException("limits " + i + " are " + low[i] + " and " + high[i]);
      }
    }
  }

  /** A question without limits: the long run. */
  public static Question of(double target, double... prices) {
    double[] high = new double[prices.length];
    java.util.Arrays.fill(high, Double.POSITIVE_INFINITY);
    return new Question(target, prices, new double[prices.length], high);
  }

  /** The same with input i held at a quantity. */
  public Question holding(int i, double quantity) {
    return limiting(i, quantity, quantity);
  }

  /** The same with input i between two quantities. */
  public Question limiting(int i, double least, double most) {
    double[] newLow = low.clone();
    double[] newHigh = high.clone();
    newLow[i] = least;
    newHigh[i] = most;
    return new Question(target, prices, newLow, newHigh);
  }

  /** The same for another target. */
  public Question at(double otherTarget) {
    return new Question(otherTarget, prices, low, high);
  }

  /** The same at other prices. */
  public Question at(double[] otherPrices) {
    return new Question(target, otherPrices, low, high);
  }

  @Override
  public double[] prices() {
    return prices.clone();
  }

  @Override
  public double[] low() {
    return low.clone();
  }

  @Override
  public double[] high() {
    return high.clone();
  }

  /** The number of inputs. */
  public int dimension() {
    return prices.length;
  }

  /** The price of input i. */
  public double price(int i) {
    return prices[i];
  }

  /** The least of input i. */
  public double low(int i) {
    return low[i];
  }

  /** The most of input i. */
  public double high(int i) {
    return high[i];
  }

  /** Whether input i is held at one quantity. */
  public boolean held(int i) {
    return low[i] == high[i];
  }
}
