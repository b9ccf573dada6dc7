package isowright.study;

import isowright.records.Roles.Further;
import isowright.records.Roles.Measure;
import isowright.study.Capital.Asset;
import isowright.study.Capital.Owner;
import isowright.study.Capital.Tax;
import isowright.study.Capital.Term;
import java.math.BigDecimal;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * Reads {@code capital} and {@code owner}: each value is a number, which is judged here, or the
 * name of a column, which becomes a further column of the records.
 */
final class CapitalBinder {

  private static final List<String> ASSET_KEYS =
      List.of("asset-price", "rate", "depreciation", "price-change", "tax");
  private static final List<String> TAX_KEYS = List.of("rate", "credit", "allowance-value");
  private static final List<String> OWNER_KEYS = List.of("hours", "wage", "into");

  private final YamlSection root;
  private final List<String> inputs;
  private final List<Further> further = new ArrayList<>();

  CapitalBinder(YamlSection root) {
    this.root = root;
    this.inputs =
        root.get("inputs")
            .filter(YamlValue::isMapping)
            .flatMap(YamlValue::section)
            .map(YamlSection::keys)
            .orElse(List.of());
  }

  /** What is said of capital. */
  Capital bind() {
    for (String key : List.of("capital", "owner")) {
      if (root.has(key) && !root.has("records")) {
        root.refuse(
            key, "this belongs to records, but there is no `records`; add it or take this out");
      }
    }
    Map<String, Asset> assets = new LinkedHashMap<>();
    root.section("capital")
        .ifPresent(
            section -> {
              if (!inputs.isEmpty()) {
                section.allowInputs(inputs);
              }
              for (String input : section.keys()) {
                section
                    .section(input)
                    .flatMap(asset -> asset(input, asset))
                    .ifPresent(asset -> assets.put(input, asset));
              }
            });
    return new Capital(assets, root.section("owner").flatMap(this::owner));
  }

  /** Holds the owner's services against what else is declared. */
  void check(Declared declared) {
    root.section("owner")
        .flatMap(owner -> owner.text("into"))
        .filter(declared.unpriced()::contains)
        .ifPresent(
            into ->
                root.refuse(
                    "owner",
                    "the owner's services are added to the price of "
                        + into
                        + ", which has none; name a price or spending column under inputs, or its"
                        + " user cost under capital"));
  }

  /** The columns that the terms name, in the order in which the terms count them. */
  List<Further> further() {
    return List.copyOf(further);
  }

  private Optional<Asset> asset(String input, YamlSection section) {
    section.allow("an asset", ASSET_KEYS, List.of());
    String of = " of " + input;
    Optional<Term> price =
        need(
            section,
            "asset-price",
            "what a unit of the asset costs",
            new Range(Measure.PRICE, Double.MIN_VALUE, Double.MAX_VALUE, "above 0"),
            "price of the asset" + of);
    Optional<Term> rate =
        need(section, "rate", "the rate of return, such as 0.06", RATE, "rate of return" + of);
    Optional<Term> depreciation =
        need(
            section,
            "depreciation",
            "the rate of depreciation, such as 0.08",
            SHARE,
            "depreciation" + of);
    Optional<Term> change =
        need(
            section,
            "price-change",
            "the rate at which the asset's price changes; write 0 where it does not",
            RATE,
            "change of the asset price" + of);
    boolean taxed = section.has("tax");
    Optional<Tax> tax = section.section("tax").flatMap(t -> tax(t, of));
    if (price.isEmpty()
        || rate.isEmpty()
        || depreciation.isEmpty()
        || change.isEmpty()
        || (taxed && tax.isEmpty())) {
      return Optional.empty();
    }
    return Optional.of(new Asset(price.get(), rate.get(), depreciation.get(), change.get(), tax));
  }

  private Optional<Tax> tax(YamlSection section, String of) {
    section.allow("`tax`", TAX_KEYS, List.of());
    Optional<Term> rate =
        need(section, "rate", "the rate of tax on profits, such as 0.25", BELOW_ONE, "tax" + of);
    Optional<Term> credit =
        need(
            section,
            "credit",
            "the share of the price credited against tax; write 0 where none is",
            SHARE,
            "tax credit" + of);
    Optional<Term> allowance =
        need(
            section,
            "allowance-value",
            "the present value of the depreciation allowed for tax, per unit of price",
            SHARE,
            "tax allowance" + of);
    return rate.isPresent() && credit.isPresent() && allowance.isPresent()
        ? Optional.of(new Tax(rate.get(), credit.get(), allowance.get()))
        : Optional.empty();
  }

  private Optional<Owner> owner(YamlSection section) {
    section.allow("`owner`", OWNER_KEYS, List.of());
    Range amount = new Range(Measure.AMOUNT, 0, Double.MAX_VALUE, "of 0 or more");
    Optional<Term> hours =
        need(section, "hours", "the owner's hours in a period", amount, "hours of the owner");
    Range positive = new Range(Measure.PRICE, Double.MIN_VALUE, Double.MAX_VALUE, "above 0");
    Optional<Term> wage =
        need(
            section,
            "wage",
            "what an hour of the owner's services is worth",
            positive,
            "wage of the owner");
    Optional<String> into =
        section
            .need("into", "the input in whose cost the owner's services are counted")
            .flatMap(value -> inputs.isEmpty() ? value.text() : value.word(inputs, List.of()));
    return hours.isPresent() && wage.isPresent() && into.isPresent()
        ? Optional.of(new Owner(hours.get(), wage.get(), into.get()))
        : Optional.empty();
  }

  /**
   * What a number may be.
   *
   * @param measure what a column in its place must hold
   * @param low the least
   * @param high the most
   * @param words the same in words
   */
  private record Range(Measure measure, double low, double high, String words) {}

  private static final Range RATE = new Range(Measure.RATE, -1, 1, "from -1 to 1 (0.06 is 6 %)");
  private static final Range SHARE = new Range(Measure.RATE, 0, 1, "from 0 to 1 (0.08 is 8 %)");
  private static final Range BELOW_ONE =
      new Range(Measure.RATE, 0, Math.nextDown(1.0), "from 0 to below 1 (0.25 is 25 %)");

  private Optional<Term> need(
      YamlSection section, String key, String remedy, Range range, String role) {
    return section
        .need(key, remedy + ", a number or the name of a column")
        .flatMap(value -> term(value, range, role));
  }

  private Optional<Term> term(YamlValue value, Range range, String role) {
    if (!value.isNumber()) {
      Optional<String> column = value.text();
      column.ifPresent(name -> further.add(new Further(name, role, range.measure())));
      return column.map(name -> new Term(name, Double.NaN, further.size() - 1));
    }
    OptionalDouble number = value.number();
    if (number.isEmpty()) {
      return Optional.empty();
    }
    double found = number.getAsDouble();
    if (found < range.low() || found > range.high()) {
      boolean percent = range.high() <= 1 && found > 1 && found <= 100;
      BigDecimal share = BigDecimal.valueOf(found).movePointLeft(2).stripTrailingZeros();
      value.refuse(
          "expects a number "
              + range.words()
              + " or the name of a column, found "
              + value.found()
              + (percent ? "; was " + share.toPlainString() + " meant?" : ""));
      return Optional.empty();
    }
    return Optional.of(new Term(value.found(), found, -1));
  }
}
