package isowright.study;

import java.util.LinkedHashMap;
import java.util.Map;
import java.util.Optional;

/**
 * What a study file says of the cost of capital: assets whose user cost stands in place of a price,
 * and the owner's services that are counted in it.
 *
 * @param assets by input, in the order of the file
 * @param owner the owner's services, where they are counted
 */
public record Capital(Map<String, Asset> assets, Optional<Owner> owner) {

  /** Nothing said of capital. */
  public static final Capital NONE = new Capital(Map.of(), Optional.empty());

  /** Copies the map. */
  public Capital {
    assets = java.util.Collections.unmodifiableMap(new LinkedHashMap<>(assets));
  }

  /**
   * A number, or a column of the records that holds one for each row.
   *
   * @param written as it stands in the file
   * @param number the number, where it is one
   * @param further the place of the column among the further columns of the records, −1 for a
   *     number
   */
  public record Term(String written, double number, int further) {
    /** Whether it is a column. */
    public boolean column() {
      return further >= 0;
    }
  }

  /**
   * An asset: what its use costs follows from these.
   *
   * @param assetPrice the price of the asset for a unit of the input's quantity; a number is in the
   *     money of the base period
   * @param rate the rate of return a period
   * @param depreciation the rate of depreciation a period
   * @param priceChange the rate at which the asset's price changes
   * @param tax tax on profits, where stated
   */
  public record Asset(
      Term assetPrice, Term rate, Term depreciation, Term priceChange, Optional<Tax> tax) {}

  /**
   * Tax on profits.
   *
   * @param rate the rate of tax
   * @param credit the share of the asset's price credited against tax
   * @param allowanceValue the present value of the depreciation allowed for tax, per unit of price
   */
  public record Tax(Term rate, Term credit, Term allowanceValue) {}

  /**
   * The owner's services.
   *
   * @param hours the owner's hours in a row
   * @param wage what an hour is worth; a number is in the money of the base period
   * @param into the input in whose cost they are counted
   */
  public record Owner(Term hours, Term wage, String into) {}
}
