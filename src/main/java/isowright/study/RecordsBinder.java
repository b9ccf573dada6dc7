package isowright.study;

import isowright.records.Keep;
import isowright.records.NumberFormat;
import isowright.records.Roles;
import isowright.records.Roles.Control;
import isowright.records.Roles.Deflator;
import isowright.records.Roles.Input;
import isowright.records.Source;
import java.nio.file.InvalidPathException;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Currency;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.regex.Pattern;

/**
 * Reads what a study file says of its records: {@code records}, {@code output}, {@code inputs},
 * {@code money} and {@code controls}.
 */
final class RecordsBinder {

  private static final Pattern INTEGER = Pattern.compile("-?[0-9]{1,9}");
  private static final Pattern DATE = Pattern.compile("[0-9]{4}-[0-9]{2}-[0-9]{2}");

  /** Endings of delimited text. */
  private static final List<String> TEXT_ENDINGS = List.of(".csv", ".tsv", ".txt");

  private final Path studyFile;
  private final Optional<Source> instead;
  private final YamlSection root;
  private final boolean present;
  private final Optional<YamlSection> records;
  private final ColumnUses uses = new ColumnUses();

  RecordsBinder(Path studyFile, YamlSection root, Optional<Source> instead) {
    this.studyFile = studyFile;
    this.instead = instead;
    this.root = root;
    this.present = root.has("records");
    this.records = root.section("records");
  }

  /**
   * What is declared.
   *
   * @param filedCost the column of filed cost
   * @param capital inputs whose user cost stands in place of a price
   * @param further the further columns that are asked for
   */
  Declared bind(Optional<String> filedCost, Capital capital, List<Roles.Further> further) {
    Optional<Source> source = source();
    Optional<String> plant = column(records, "plant");
    Optional<String> period = column(records, "period");
    Keep keep = keep();
    Optional<YamlSection> outputSection = root.section("output");
    outputSection.ifPresent(s -> s.allow("`output`", List.of("column", "unit"), List.of()));
    Optional<String> output = column(outputSection, "column");
    needOutput(outputSection);
    Optional<String> outputUnit = outputSection.flatMap(s -> s.text("unit"));
    List<Input> inputs = inputs();
    List<Control> controls = controls();
    Optional<YamlSection> money = root.section("money");
    Optional<Deflator> deflator = deflator(money);
    Optional<Costs> costs = new CostsBinder(root, source, keep, plant, period, controls).bind();
    Optional<Study.Records> bound = Optional.empty();
    if (source.isPresent() && output.isPresent() && inputs.size() >= 2) {
      Roles roles =
          new Roles(plant, period, output.get(), outputUnit, inputs, controls, deflator, filedCost)
              .withAllFurther(further);
      bound = Optional.of(new Study.Records(source.get(), roles, keep));
    }
    return new Declared(
        present,
        bound,
        records.isPresent() && records.get().has("plant"),
        records.isPresent() && records.get().has("period"),
        inputs.stream().map(Input::name).toList(),
        inputs.stream().map(Input::unit).toList(),
        inputs.stream()
            .filter(input -> input.price().isEmpty() && input.spending().isEmpty())
            .filter(input -> !capital.assets().containsKey(input.name()))
            .map(Input::name)
            .toList(),
        outputUnit,
        new Study.Money(currency(money), deflator.map(Deflator::base)),
        costs);
  }

  private Optional<Source> source() {
    if (records.isEmpty()) {
      return Optional.empty();
    }
    YamlSection section = records.get();
    section.allow(
        "`records`",
        List.of("file", "sheet", "plant", "period", "keep", "number-format"),
        List.of());
    Optional<YamlValue> value =
        section.need("file", "the records, a .csv or .xlsx file, such as `file: plants.csv`");
    Optional<String> sheet = section.text("sheet");
    Optional<NumberFormat> format = numberFormat(section);
    Optional<String> name = value.flatMap(YamlValue::text);
    if (name.isEmpty()) {
      return Optional.empty();
    }
    String lower = name.get().toLowerCase(Locale.ROOT);
    boolean workbook = lower.endsWith(".xlsx");
    if (!workbook && TEXT_ENDINGS.stream().noneMatch(lower::endsWith)) {
      value
          .get()
          .refuse(
              "`"
                  + YamlValue.quote(name.get())
                  + "` ends neither in .csv (or .tsv, .txt) nor in .xlsx; export the records as one"
                  + " of these");
      return Optional.empty();
    }
    if (!workbook && section.has("sheet")) {
      section.refuse("sheet", "a .csv file has no sheets; take `sheet` out");
    }
    if (workbook && section.has("number-format")) {
      section.refuse(
          "number-format", "a workbook holds numbers, not written ones; take `number-format` out");
    }
    try {
      return instead.or(
          () -> Optional.of(new Source(studyFile.resolveSibling(name.get()), sheet, format)));
    } catch (InvalidPathException invalid) {
      value.get().refuse("this is not a file name: " + invalid.getReason());
      return Optional.empty();
    }
  }

  private static Optional<NumberFormat> numberFormat(YamlSection records) {
    Optional<YamlSection> section = records.section("number-format");
    if (section.isEmpty()) {
      return Optional.empty();
    }
    YamlSection format = section.get();
    format.allow("`number-format`", List.of("decimal", "group"), List.of());
    Optional<YamlValue> decimalValue = format.need("decimal", "the decimal mark, \".\" or \",\"");
    Optional<String> decimal =
        decimalValue.flatMap(value -> value.word(List.of(".", ","), List.of()));
    Optional<Character> group = format.get("group").flatMap(RecordsBinder::mark);
    if (decimal.isEmpty()) {
      return Optional.empty();
    }
    char point = decimal.get().charAt(0);
    if (group.isPresent() && group.get() == point) {
      format.refuse("group", "the group mark is the decimal mark; they must differ");
    }
    return Optional.of(new NumberFormat(point, group));
  }

  /** A group mark: one character, a space included, hence not stripped. */
  private static Optional<Character> mark(YamlValue value) {
    Optional<String> written = value.raw();
    if (written.isPresent() && written.get().length() == 1) {
      char mark = written.get().charAt(0);
      if (!Character.isLetterOrDigit(mark) && mark != '-' && mark != '+') {
        return Optional.of(mark);
      }
    }
    value.refuse(
        "expects one character such as \",\", \".\", \"'\" or \" \", found " + value.found());
    return Optional.empty();
  }

  private Keep keep() {
    Optional<YamlSection> section = records.flatMap(s -> s.section("keep"));
    if (section.isEmpty()) {
      return Keep.ALL;
    }
    YamlSection keep = section.get();
    keep.allow("`keep`", List.of("periods", "without-plants"), List.of());
    if (keep.has("periods") && !records.get().has("period")) {
      keep.refuse("periods", "periods are kept, but `records.period` names no column");
    }
    if (keep.has("without-plants") && !records.get().has("plant")) {
      keep.refuse("without-plants", "plants are set aside, but `records.plant` names no column");
    }
    Optional<List<String>> span = periods(keep);
    List<String> without = keep.get("without-plants").map(YamlValue::texts).orElse(List.of());
    return new Keep(span.map(s -> s.get(0)), span.map(s -> s.get(1)), without);
  }

  /** A first and a last period under {@code periods}, in this order. */
  static Optional<List<String>> periods(YamlSection section) {
    Optional<List<String>> span =
        section.get("periods").flatMap(value -> value.pair("a first and a last period"));
    span.ifPresent(
        s -> {
          if (after(s.get(0), s.get(1))) {
            section.refuse(
                "periods",
                "the first period, "
                    + s.get(0)
                    + ", is after the last, "
                    + s.get(1)
                    + "; swap them");
          }
        });
    return span;
  }

  /** Whether one period is after another, as far as can be told from how they are written. */
  private static boolean after(String first, String last) {
    if (INTEGER.matcher(first).matches() && INTEGER.matcher(last).matches()) {
      return Integer.parseInt(first) > Integer.parseInt(last);
    }
    return DATE.matcher(first).matches()
        && DATE.matcher(last).matches()
        && first.compareTo(last) > 0;
  }

  private void needOutput(Optional<YamlSection> output) {
    String remedy = "the column of output, such as `column: tonnes`";
    if (!present) {
      output
          .filter(section -> section.has("column"))
          .ifPresent(section -> withoutRecords(section, "column"));
    } else if (output.isPresent()) {
      output.get().need("column", remedy);
    } else if (!root.has("output") && !costsAlone()) {
      root.lacks("output", "`records` are given, so name " + remedy);
    }
  }

  /** Whether the study is of costs and prices alone, without quantities of inputs. */
  private boolean costsAlone() {
    return root.has("costs") && !root.has("inputs") && !root.has("output");
  }

  private List<Input> inputs() {
    if (!root.has("inputs")) {
      if (present && !costsAlone()) {
        root.lacks("inputs", "`records` are given, so name two inputs or more");
      }
      return List.of();
    }
    List<Input> all = new ArrayList<>();
    Optional<YamlSection> section = root.section("inputs");
    if (section.isEmpty()) {
      return all;
    }
    for (String name : section.get().keys()) {
      InputNames.check(section.get(), name);
      section.get().section(name).ifPresent(input -> all.add(input(name, input)));
    }
    int named = section.get().keys().size();
    if (named < 2) {
      root.refuse("inputs", "two inputs or more are needed, found " + named);
    }
    return all;
  }

  private Input input(String name, YamlSection section) {
    section.allow("an input", List.of("quantity", "price", "spending", "unit"), List.of());
    if (present) {
      section.need("quantity", "the column of its quantity, such as `quantity: labour_hours`");
    } else {
      for (String key : List.of("quantity", "price", "spending")) {
        if (section.has(key)) {
          withoutRecords(section, key);
        }
      }
    }
    return new Input(
        name,
        column(Optional.of(section), "quantity").orElse(""),
        section.text("price"),
        section.text("spending"),
        section.text("unit"));
  }

  private List<Control> controls() {
    List<Control> all = new ArrayList<>();
    Optional<YamlValue> value = root.get("controls");
    if (value.isPresent() && !present) {
      withoutRecords(root, "controls");
    }
    for (YamlValue item : value.flatMap(YamlValue::list).orElse(List.of())) {
      Optional<YamlSection> section = item.section();
      if (section.isEmpty()) {
        continue;
      }
      section.get().allow("a control", List.of("column", "log"), List.of());
      section.get().need("column", "the column of this control, such as `column: breakdown_rate`");
      boolean log = section.get().get("log").flatMap(YamlValue::flag).orElse(false);
      column(section, "column").ifPresent(name -> all.add(new Control(name, log)));
    }
    return all;
  }

  private Optional<Deflator> deflator(Optional<YamlSection> money) {
    if (money.isEmpty()) {
      return Optional.empty();
    }
    YamlSection section = money.get();
    section.allow("`money`", List.of("currency", "deflator", "base"), List.of());
    Optional<String> column = section.text("deflator");
    Optional<String> base = section.text("base");
    if (section.has("deflator") && !section.has("base")) {
      section.refuse(
          "deflator",
          "a deflator needs `base`, the period whose money is used, such as `base: 2020`");
    }
    if (section.has("base") && !section.has("deflator")) {
      section.refuse("base", "a base needs `deflator`, the column by which money is divided");
    }
    if (section.has("deflator") && !present) {
      withoutRecords(section, "deflator");
    } else if (section.has("base")
        && present
        && records.isPresent()
        && !records.get().has("period")) {
      section.refuse("base", "a base is a period, but `records.period` names no column");
    }
    return column.isPresent() && base.isPresent()
        ? Optional.of(new Deflator(column.get(), base.get()))
        : Optional.empty();
  }

  private static Optional<String> currency(Optional<YamlSection> money) {
    Optional<String> written = money.flatMap(section -> section.text("currency"));
    if (written.isEmpty()) {
      return written;
    }
    List<String> codes =
        Currency.getAvailableCurrencies().stream().map(Currency::getCurrencyCode).sorted().toList();
    String code = written.get();
    if (!codes.contains(code)) {
      String upper = code.toUpperCase(Locale.ROOT);
      String near =
          codes.contains(upper) ? "; write `" + upper + "`" : YamlValue.nearest(code, codes);
      money
          .get()
          .get("currency")
          .ifPresent(
              value ->
                  value.refuse(
                      "`"
                          + YamlValue.quote(code)
                          + "` is not a currency code of ISO 4217, such as EUR or USD"
                          + near));
    }
    return written;
  }

  /** The name of a column that may have no second role of this kind. */
  private Optional<String> column(Optional<YamlSection> section, String key) {
    Optional<String> name = section.flatMap(s -> s.text(key));
    name.ifPresent(column -> uses.claim(section.get(), key, column));
    return name;
  }

  private static void withoutRecords(YamlSection section, String key) {
    section.refuse(
        key,
        "this names columns of the records, but there is no `records`; add it or take this out");
  }
}
