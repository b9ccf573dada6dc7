package isowright.study;

import java.util.LinkedHashMap;
import java.util.Map;

/** The settings of a review and of the cost of capital that are in force, defaults included. */
final class ReviewSettings {

  private final Map<String, String> settings = new LinkedHashMap<>();

  private ReviewSettings() {}

  /** By key of the study file. */
  static Map<String, String> of(Study study) {
    ReviewSettings all = new ReviewSettings();
    study
        .filing()
        .ifPresent(
            filing ->
                all.filing(
                    filing,
                    study.costs().isPresent() && study.records().isEmpty()
                        ? "the recorded cost"
                        : "the sum of price × quantity"));
    study.capital().assets().forEach(all::asset);
    study.capital().owner().ifPresent(all::owner);
    return all.settings;
  }

  private void filing(Study.Filing filing, String without) {
    settings.put("filing.cost", filing.cost().orElse(without));
    settings.put(
        "filing.periods",
        filing
            .firstPeriod()
            .map(first -> first + " to " + filing.lastPeriod().orElse(""))
            .orElse("the last"));
    settings.put(
        "filing.against",
        switch (filing.against().kind()) {
          case BEST_QUARTER -> "best-quarter";
          case FRONTIER -> "frontier";
          default -> "typical";
        });
    settings.put("filing.smearing", Boolean.toString(filing.smearing()));
    settings.put("filing.simulation.draws", Integer.toString(filing.simulation().draws()));
    settings.put("filing.simulation.seed", Long.toString(filing.simulation().seed()));
    filing
        .allowance()
        .ifPresent(
            allowance -> {
              put("filing.allowance.controllable", allowance.controllable());
              put("filing.allowance.quantile", allowance.quantile());
              settings.put("filing.allowance.years", Integer.toString(allowance.years()));
              put("filing.allowance.frontier-shift", allowance.frontierShift());
              put("filing.allowance.index", allowance.index());
            });
  }

  private void asset(String input, Capital.Asset asset) {
    String key = "capital." + input;
    put(key + ".asset-price", asset.assetPrice());
    put(key + ".rate", asset.rate());
    put(key + ".depreciation", asset.depreciation());
    put(key + ".price-change", asset.priceChange());
    asset
        .tax()
        .ifPresentOrElse(
            tax -> {
              put(key + ".tax.rate", tax.rate());
              put(key + ".tax.credit", tax.credit());
              put(key + ".tax.allowance-value", tax.allowanceValue());
            },
            () -> settings.put(key + ".tax", "none"));
  }

  private void owner(Capital.Owner owner) {
    put("owner.hours", owner.hours());
    put("owner.wage", owner.wage());
    settings.put("owner.into", owner.into());
  }

  private void put(String key, double value) {
    settings.put(key, Double.toString(value));
  }

  private void put(String key, Capital.Term term) {
    settings.put(key, term.column() ? "column " + term.written() : term.written());
  }
}
