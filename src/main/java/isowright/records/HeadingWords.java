package isowright.records;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/**
 * The words of a heading, and what they usually say about a column.
 *
 * @param words the words in lower case: {@code LabourHours}, {@code labour_hours} and {@code Labour
 *     hours} are the same two
 */
record HeadingWords(List<String> words) {

  private static final Pattern WORD = Pattern.compile("\\p{Lu}?\\p{Ll}+|\\p{Lu}+(?!\\p{Ll})|\\d+");

  static final Set<String> PLANT =
      Set.of(
          "plant",
          "plants",
          "works",
          "site",
          "mill",
          "firm",
          "company",
          "establishment",
          "facility",
          "factory",
          "station",
          "producer",
          "operator",
          "state",
          "unit",
          "id",
          "code",
          "name");

  static final Set<String> PERIOD =
      Set.of("year", "period", "date", "month", "quarter", "day", "time", "week");

  static final Set<String> OUTPUT =
      Set.of(
          "output",
          "outputs",
          "production",
          "produced",
          "product",
          "tonnes",
          "tons",
          "volume",
          "units",
          "pieces",
          "gsp",
          "made",
          "shipped",
          "shipments");

  private static final Set<String> PRICE =
      Set.of("price", "prices", "wage", "wages", "rate", "rent", "rental", "tariff");

  private static final Set<String> SPENDING =
      Set.of(
          "cost",
          "costs",
          "spending",
          "spent",
          "spend",
          "expenditure",
          "expense",
          "expenses",
          "bill",
          "payroll",
          "paid",
          "outlay",
          "money");

  private static final Set<String> QUANTITY =
      Set.of(
          "hours",
          "hour",
          "hrs",
          "h",
          "quantity",
          "qty",
          "kwh",
          "mwh",
          "gwh",
          "gj",
          "tj",
          "kg",
          "t",
          "tonnes",
          "tons",
          "litres",
          "m3",
          "number",
          "count",
          "days",
          "stock",
          "used",
          "use",
          "employed");

  static final Set<String> FILED = Set.of("filed", "filing", "reported", "claimed", "total");

  static final Set<String> DEFLATOR = Set.of("deflator", "ppi", "cpi", "inflation");

  /** Inputs by the words that name them; the key is the name proposed. */
  private static final Map<String, Set<String>> INPUTS =
      Map.of(
          "labour",
          Set.of(
              "labour",
              "labor",
              "worker",
              "workers",
              "employee",
              "employees",
              "employment",
              "staff",
              "wage",
              "wages",
              "payroll",
              "manhours",
              "man"),
          "machines",
          Set.of("machine", "machines", "equipment", "rental", "kiln", "furnace", "press"),
          "capital",
          Set.of("capital"),
          "energy",
          Set.of("energy"),
          "fuel",
          Set.of("fuel", "coal", "oil", "gas"),
          "electricity",
          Set.of("electricity", "power", "kwh", "mwh"),
          "materials",
          Set.of("material", "materials", "raw"),
          "water",
          Set.of("water"),
          "land",
          Set.of("land"));

  static HeadingWords of(String heading) {
    List<String> words = new ArrayList<>();
    Matcher matcher = WORD.matcher(heading);
    while (matcher.find()) {
      words.add(matcher.group().toLowerCase(Locale.ROOT));
    }
    return new HeadingWords(words);
  }

  /** The first word that is one of these. */
  Optional<String> first(Set<String> of) {
    return words.stream().filter(of::contains).findFirst();
  }

  boolean any(Set<String> of) {
    return first(of).isPresent();
  }

  /** The input that the heading names, by the first of its words that names one. */
  Optional<String> input() {
    for (String word : words) {
      Optional<String> named =
          INPUTS.entrySet().stream()
              .filter(e -> e.getValue().contains(word))
              .map(Map.Entry::getKey)
              .sorted()
              .findFirst();
      if (named.isPresent()) {
        return named;
      }
    }
    return Optional.empty();
  }

  /** What a heading may say of an input. */
  enum Aspect {
    PRICE,
    SPENDING,
    QUANTITY
  }

  /** What the heading says of an input; a quantity where it says nothing. */
  Aspect aspect() {
    if (any(PRICE) && !any(SPENDING)) {
      return Aspect.PRICE;
    }
    // "Unit cost" and "cost per hour" are prices.
    boolean perUnit = words.contains("per") || words.contains("unit");
    if (any(SPENDING)) {
      return perUnit ? Aspect.PRICE : Aspect.SPENDING;
    }
    return perUnit && !any(QUANTITY) ? Aspect.PRICE : Aspect.QUANTITY;
  }

  /** Whether a word says which aspect it is, so that nothing had to be supposed. */
  boolean aspectSaid() {
    return any(PRICE) || any(SPENDING) || any(QUANTITY);
  }
}
