package isowright.review;

/**
 * What does it cost to use one unit of an asset for one period?
 *
 * <pre>  u = q (i + d − p) (1 − k − t z) / (1 − t) </pre>
 *
 * <p>q price of the asset, i rate of return asked, d rate of depreciation, p rate at which the
 * asset's price changes, t rate of tax on profits, k share of the price credited against tax, z
 * present value of the depreciation allowed for tax, per unit of the price. Rates are shares a
 * period (0.06 is 6 %); u is money per unit of asset and period. Rates i and p are both nominal or
 * both real.
 *
 * <p>The owner's own services belong to the cost of capital where they are counted: u + owner's
 * hours × wage / quantity ({@link #withOwner}).
 *
 * <p>A cost that is not positive is no price: the asset would pay for its own use. That is a
 * finding about the rates, so it is returned and not hidden; the caller must not plan with it.
 *
 * <p>Sources: Jorgenson, D. W. (1963), Capital Theory and Investment Behavior, <i>American Economic
 * Review</i> 53 (2), 247–259; Hall, R. E. and Jorgenson, D. W. (1967), Tax Policy and Investment
 * Behavior, <i>American Economic Review</i> 57, 391–414; OECD (2009), <i>Measuring Capital</i>,
 * chapter 8. Tested in {@code UserCostTest}.
 *
 * @param assetPrice q
 * @param rate i
 * @param depreciation d
 * @param priceChange p
 * @param tax t, k and z
 */
public record UserCost(
    double assetPrice, double rate, double depreciation, double priceChange, Tax tax) {

  /**
   * Tax on profits.
   *
   * @param rate t, below one
   * @param credit k
   * @param allowanceValue z
   */
  public record Tax(double rate, double credit, double allowanceValue) {
    /** No tax. */
    public static final Tax NONE = new Tax(0, 0, 0);

    /** (1 − k − t z)/(1 − t). */
    public double factor() {
      return (1 - credit - rate * allowanceValue) / (1 - rate);
    }
  }

  /** u, whatever its sign. */
  public double value() {
    return assetPrice * (rate + depreciation - priceChange) * tax.factor();
  }

  /**
   * A price of capital with the owner's services in it.
   *
   * @param price the price of a unit of capital
   * @param quantity units of capital used
   * @param hours the owner's hours
   * @param wage what an hour of the owner's services is worth
   */
  public static double withOwner(double price, double quantity, double hours, double wage) {
    return price + hours * wage / quantity;
  }
}
