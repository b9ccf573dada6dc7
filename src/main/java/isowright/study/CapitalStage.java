package isowright.study;

import isowright.records.Column;
import isowright.records.Panel;
import isowright.review.UserCost;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.stream.Collectors;

/**
 * Puts the user cost of capital in place of a price, and counts the owner's services in it. A user
 * cost that is not positive is a mistake, told with its rows.
 */
final class CapitalStage {

  /** So many rows are named. */
  private static final int NAMED = 8;

  /**
   * The records at the prices in force, and at those that they are compared with.
   *
   * @param inForce with user costs and the owner's services
   * @param withoutOwner the same without the owner's services, where they are counted
   * @param recordedPrices with the prices that the records hold in place of user costs, where they
   *     hold any
   */
  record Priced(Panel inForce, Optional<Panel> withoutOwner, Optional<Panel> recordedPrices) {}

  private final Capital capital;
  private final Panel panel;
  private final List<Mistake> mistakes = new ArrayList<>();

  private CapitalStage(Capital capital, Panel panel) {
    this.capital = capital;
    this.panel = panel;
  }

  /**
   * The records of a study with their prices.
   *
   * @throws StudyRefused where a user cost is not positive, naming the rows, and with them whatever
   *     else the records do not hold
   */
  static Priced price(Study study, Panel panel) throws StudyRefused {
    CapitalStage stage = new CapitalStage(study.capital(), panel);
    List<Optional<Column>> used = stage.userCosts();
    if (!stage.mistakes.isEmpty()) {
      stage.mistakes.addAll(Demands.mistakes(study, Optional.of(panel.withPrices(used))));
      throw new StudyRefused(study.file(), KeyPlaces.of(study.file()).located(stage.mistakes));
    }
    boolean owner = study.capital().owner().isPresent();
    boolean recorded =
        study.capital().assets().keySet().stream()
            .anyMatch(input -> panel.prices().get(panel.inputs().indexOf(input)).isPresent());
    return new Priced(
        panel.withPrices(stage.withOwner(used)),
        owner ? Optional.of(panel.withPrices(used)) : Optional.empty(),
        recorded
            ? Optional.of(panel.withPrices(stage.withOwner(stage.recordedWherePossible(used))))
            : Optional.empty());
  }

  private List<Optional<Column>> userCosts() {
    List<Optional<Column>> prices = new ArrayList<>(panel.prices());
    capital
        .assets()
        .forEach(
            (input, asset) ->
                prices.set(panel.inputs().indexOf(input), Optional.of(userCost(input, asset))));
    return prices;
  }

  private List<Optional<Column>> recordedWherePossible(List<Optional<Column>> used) {
    List<Optional<Column>> prices = new ArrayList<>(used);
    for (int i = 0; i < prices.size(); i++) {
      if (panel.prices().get(i).isPresent()) {
        prices.set(i, panel.prices().get(i));
      }
    }
    return prices;
  }

  private Column userCost(String input, Capital.Asset asset) {
    double[] values = new double[panel.rows()];
    List<Integer> wrong = new ArrayList<>();
    double least = 0;
    for (int r = 0; r < values.length; r++) {
      values[r] =
          new UserCost(
                  at(asset.assetPrice(), r),
                  at(asset.rate(), r),
                  at(asset.depreciation(), r),
                  at(asset.priceChange(), r),
                  tax(asset, r))
              .value();
      if (values[r] <= 0 || Double.isInfinite(values[r])) {
        wrong.add(panel.fileRows().get(r));
        least = Math.min(least, values[r]);
      }
    }
    if (!wrong.isEmpty()) {
      refuse(input, wrong, least);
    }
    return Column.of("user cost of " + input, values);
  }

  private void refuse(String input, List<Integer> rows, double least) {
    String named =
        rows.stream().sorted().limit(NAMED).map(String::valueOf).collect(Collectors.joining(", "));
    mistakes.add(
        new Mistake(
            0,
            0,
            "capital." + input,
            String.format(
                Locale.ROOT,
                "the user cost of %s is no positive number in %d of %d rows (%s %s%s; the lowest is"
                    + " %.4g): there the price of the asset rises faster than return and"
                    + " depreciation together, or tax takes more than all. Take a price-change"
                    + " averaged over several years, take rate and price-change both without"
                    + " inflation, or set these rows aside with records.keep",
                input,
                rows.size(),
                panel.rows(),
                rows.size() == 1 ? "row" : "rows",
                named,
                rows.size() > NAMED ? ", …" : "",
                least)));
  }

  private UserCost.Tax tax(Capital.Asset asset, int row) {
    return asset
        .tax()
        .map(
            tax ->
                new UserCost.Tax(
                    at(tax.rate(), row), at(tax.credit(), row), at(tax.allowanceValue(), row)))
        .orElse(UserCost.Tax.NONE);
  }

  private double at(Capital.Term term, int row) {
    return term.column() ? panel.further().get(term.further()).get(row) : term.number();
  }

  private List<Optional<Column>> withOwner(List<Optional<Column>> prices) {
    if (capital.owner().isEmpty()) {
      return prices;
    }
    Capital.Owner owner = capital.owner().get();
    int i = panel.inputs().indexOf(owner.into());
    Column price = prices.get(i).orElseThrow();
    double[] values = new double[panel.rows()];
    for (int r = 0; r < values.length; r++) {
      values[r] =
          UserCost.withOwner(
              price.get(r),
              panel.quantities().get(i).get(r),
              at(owner.hours(), r),
              at(owner.wage(), r));
    }
    List<Optional<Column>> with = new ArrayList<>(prices);
    with.set(i, Optional.of(Column.of(price.name() + " with the owner's services", values)));
    return with;
  }
}
