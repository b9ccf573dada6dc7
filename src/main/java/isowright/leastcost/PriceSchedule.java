package isowright.leastcost;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;

/**
 * What does a quantity of one input cost, where its price depends on how much is bought?
 *
 * <p>Bands follow one another from 0. In band k, from start_k to end_k, spending is a straight line
 *
 * <pre>  S(x) = intercept_k + price_k x </pre>
 *
 * A band's price is paid for the units inside it; a step is money due as soon as anything of the
 * band is taken (a demand charge); a band for all units has its price for every unit bought, also
 * those of the bands before (an all-units discount). Rising prices without steps make S convex
 * (overtime); falling prices and steps do not. Bands share their ends, and there the cheaper one
 * counts, so that S is lower semicontinuous and a cheapest quantity exists.
 *
 * <p>Quantities in the unit of the input, prices in money per unit, steps in money. Immutable.
 * Tested in {@code PriceBandsTest}.
 */
public final class PriceSchedule {

  private final double[] starts;
  private final double[] ends;
  private final double[] prices;
  private final double[] intercepts;

  /**
   * One band.
   *
   * @param to the quantity at which it ends, {@code +∞} for the last of an input without end
   * @param price money per unit, positive
   * @param step money due once anything in the band is taken, zero or more
   * @param allUnits whether the price is that of all units bought, not only of those in the band
   */
  public record Band(double to, double price, double step, boolean allUnits) {
    /** A band whose price is paid for the units inside it, without a step. */
    public static Band of(double to, double price) {
      return new Band(to, price, 0, false);
    }
  }

  private PriceSchedule(double[] starts, double[] ends, double[] prices, double[] intercepts) {
    this.starts = starts;
    this.ends = ends;
    this.prices = prices;
    this.intercepts = intercepts;
  }

  /** One price for any quantity. */
  public static PriceSchedule single(double price) {
    return of(List.of(Band.of(Double.POSITIVE_INFINITY, price)));
  }

  /**
   * Bands in their order.
   *
   * @throws IllegalArgumentException where ends do not rise, a price is not positive or a step is
   *     negative
   */
  public static PriceSchedule of(List<Band> bands) {
    int size = bands.size();
    if (size == 0) {
      throw new IllegalArgumentException("a price schedule needs one band at least");
    }
    double[] starts = new double[size];
    double[] ends = new double[size];
    double[] prices = new double[size];
    double[] intercepts = new double[size];
    double start = 0;
    double spent = 0;
    double steps = 0;
    for (int k = 0; k < size; k++) {
      Band band = bands.get(k);
      check(k, band, start);
      steps += band.step();
      double entry = band.allUnits() ? steps + band.price() * start : spent + band.step();
      starts[k] = start;
      ends[k] = band.to();
      prices[k] = band.price();
      intercepts[k] = entry - band.price() * start;
      spent = intercepts[k] + band.price() * band.to();
      start = band.to();
    }
    return new PriceSchedule(starts, ends, prices, intercepts);
  }

  private static void check(int k, Band band, double start) {
    boolean sound =
        band.to() > start
            && band.price() > 0
            && Double.isFinite(band.price())
            && band.step() >= 0
            && Double.isFinite(band.step());
    if (!sound) {
      throw new IllegalArgumentException(
          String.format(
              Locale.ROOT,
              "band %d from %s to %s at %s with a step of %s: ends must rise, prices be positive,"
                  + " steps not negative",
              k + 1,
              start,
              band.to(),
              band.price(),
              band.step()));
    }
  }

  /** The same with every price and step multiplied. */
  public PriceSchedule times(double factor) {
    double[] newPrices = prices.clone();
    double[] newIntercepts = intercepts.clone();
    for (int k = 0; k < prices.length; k++) {
      newPrices[k] *= factor;
      newIntercepts[k] *= factor;
    }
    return new PriceSchedule(starts, ends, newPrices, newIntercepts);
  }

  /** The number of bands. */
  public int size() {
    return prices.length;
  }

  /** Where band k starts. */
  public double start(int k) {
    return starts[k];
  }

  /** Where band k ends; may be {@code +∞}. */
  public double end(int k) {
    return ends[k];
  }

  /** The price of a unit in band k. */
  public double price(int k) {
    return prices[k];
  }

  /** Spending in band k less price times quantity. */
  public double intercept(int k) {
    return intercepts[k];
  }

  /** The most that can be bought; may be {@code +∞}. */
  public double most() {
    return ends[ends.length - 1];
  }

  /** Whether there is one price and no step, whatever the quantity. */
  public boolean plain() {
    return size() == 1 && intercepts[0] == 0 && ends[0] == Double.POSITIVE_INFINITY;
  }

  /** Whether S is convex on all quantities above zero: rising prices, no steps. */
  public boolean convex() {
    for (int k = 1; k < size(); k++) {
      double jump = intercepts[k] - intercepts[k - 1] + (prices[k] - prices[k - 1]) * starts[k];
      double rounding = 1e-12 * prices[k] * starts[k];
      if (prices[k] < prices[k - 1] || Math.abs(jump) > rounding) {
        return false;
      }
    }
    return true;
  }

  /** The band in which a quantity costs least; the lower one where two agree. */
  public int band(double quantity) {
    int best = -1;
    for (int k = 0; k < size(); k++) {
      boolean holds = quantity >= starts[k] && quantity <= ends[k];
      if (holds && (best < 0 || spending(k, quantity) < spending(best, quantity))) {
        best = k;
      }
    }
    if (best < 0) {
      throw new IllegalArgumentException("no band holds a quantity of " + quantity);
    }
    return best;
  }

  /** S(x), what a quantity costs; nothing where nothing is taken. */
  public double spending(double quantity) {
    return quantity == 0 ? 0 : spending(band(quantity), quantity);
  }

  private double spending(int k, double quantity) {
    return intercepts[k] + prices[k] * quantity;
  }

  /**
   * A straight line nowhere above S on the part of bands first to last between two quantities, and
   * as near to S as any at a reference: the edge of the lower convex hull there.
   *
   * @param low the least quantity, at or above the start of the first band
   * @param high the greatest, at or below the end of the last band; may be {@code +∞}
   * @param reference where it should be near
   * @return intercept and price, the price positive
   */
  double[] below(int first, int last, double low, double high, double reference) {
    if (first == last) {
      return new double[] {intercepts[first], prices[first]};
    }
    List<double[]> hull = hull(first, last, low, high);
    boolean open = high == Double.POSITIVE_INFINITY;
    double slope = open ? prices[last] : Double.NaN;
    int at = hull.size() - 1;
    for (int k = 0; k + 1 < hull.size(); k++) {
      if (reference <= hull.get(k + 1)[0]) {
        at = k;
        break;
      }
    }
    if (at + 1 < hull.size()) {
      slope = (hull.get(at + 1)[1] - hull.get(at)[1]) / (hull.get(at + 1)[0] - hull.get(at)[0]);
    } else if (!open) {
      slope = prices[last];
    }
    // A falling hull (all-units discounts) is met by a line that hardly rises.
    slope = Math.max(slope, 1e-3 * prices[last]);
    double intercept = Double.POSITIVE_INFINITY;
    for (double[] corner : hull) {
      intercept = Math.min(intercept, corner[1] - slope * corner[0]);
    }
    return new double[] {intercept, slope};
  }

  /** The corners of the lower convex hull, from left to right. */
  private List<double[]> hull(int first, int last, double low, double high) {
    List<double[]> corners = new ArrayList<>();
    for (int k = first; k <= last; k++) {
      double from = Math.max(low, starts[k]);
      double to = Math.min(high, ends[k]);
      if (from <= to) {
        corner(corners, from, spending(k, from));
        if (to < Double.POSITIVE_INFINITY && to > from) {
          corner(corners, to, spending(k, to));
        }
      }
    }
    if (high == Double.POSITIVE_INFINITY) {
      // Edges steeper than the open end are not part of the hull.
      for (int end = corners.size() - 1; end > 0; end--) {
        double[] a = corners.get(end - 1);
        double[] b = corners.get(end);
        if ((b[1] - a[1]) > prices[last] * (b[0] - a[0])) {
          corners.remove(end);
        } else {
          break;
        }
      }
    }
    return corners;
  }

  /** Adds a corner, dropping those that then lie above the hull. */
  private static void corner(List<double[]> corners, double x, double spending) {
    if (!corners.isEmpty() && corners.get(corners.size() - 1)[0] == x) {
      if (corners.get(corners.size() - 1)[1] <= spending) {
        return;
      }
      corners.remove(corners.size() - 1);
    }
    while (corners.size() > 1) {
      double[] a = corners.get(corners.size() - 2);
      double[] b = corners.get(corners.size() - 1);
      double over = (b[1] - a[1]) * (x - a[0]) - (spending - a[1]) * (b[0] - a[0]);
      if (over < 0) {
        break;
      }
      corners.remove(corners.size() - 1);
    }
    corners.add(new double[] {x, spending});
  }
}
