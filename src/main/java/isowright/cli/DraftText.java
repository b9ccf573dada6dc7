package isowright.cli;

import isowright.records.NumberFormat;
import isowright.records.Proposal;
import isowright.records.Proposal.Choice;
import isowright.records.Proposal.InputChoice;
import isowright.records.RecordsSketch;
import isowright.records.SketchedColumn;
import isowright.records.SketchedColumn.Content;
import isowright.technology.Form;
import java.math.BigDecimal;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.regex.Pattern;

/**
 * Writes a study file from what a sketch of records proposes. Every guess has its reason in a
 * comment above it; what could not be guessed is left open with a comment that says what belongs
 * there, and reading the study names the place. A complete draft is a sound study.
 */
final class DraftText {

  /** Text that YAML takes as it stands, in a block and in a list. */
  private static final Pattern PLAIN =
      Pattern.compile(
          "(?!(?i:null|true|false)$)[\\p{L}_][\\p{L}\\p{N}_./-]*( [\\p{L}\\p{N}_./][\\p{L}\\p{N}_./-]*)*");

  private final RecordsSketch sketch;
  private final Proposal proposal;
  private final List<String> lines = new ArrayList<>();
  private final List<String> lacking = new ArrayList<>();

  private DraftText(RecordsSketch sketch) {
    this.sketch = sketch;
    this.proposal = sketch.proposal();
  }

  /**
   * A study file proposed.
   *
   * @param text the YAML
   * @param lacking what has to be filled in before it can be used; empty where nothing has
   */
  record Drafted(String text, List<String> lacking) {}

  /**
   * The draft.
   *
   * @param sketch what the records hold
   * @param file the records file as seen from the study file
   * @param sheet the sheet asked for, if any
   */
  static Drafted of(RecordsSketch sketch, String file, Optional<String> sheet) {
    DraftText draft = new DraftText(sketch);
    draft.head();
    draft.records(file, sheet);
    draft.output();
    draft.inputs();
    draft.money();
    draft.technologies();
    draft.leastCost();
    draft.filing();
    draft.unassigned();
    return new Drafted(String.join("\n", draft.lines) + "\n", List.copyOf(draft.lacking));
  }

  private void add(String... more) {
    lines.addAll(List.of(more));
  }

  private void head() {
    add(
        "# A draft from the headings and contents of "
            + oneLine(sketch.file())
            + " ("
            + Failures.count(sketch.rows(), "row")
            + ").",
        "# Every role below is a guess with its reason. Read each one: a wrong column can fit as well",
        "# as the right one. Then: isowright check THIS-FILE",
        "",
        "title: " + scalar("Study of " + sketch.file()));
  }

  private void records(String file, Optional<String> sheet) {
    add("", "records:", "  file: " + scalar(file) + "   # relative to this file");
    if (!sketch.sheets().isEmpty()) {
      String chosen = sheet.orElse(sketch.sheets().get(0));
      if (sketch.sheets().size() > 1) {
        add("  # sheets: " + oneLine(String.join(", ", sketch.sheets())));
      }
      add("  sheet: " + scalar(chosen));
    }
    choice(
        "  ",
        "plant",
        proposal.plant(),
        "the column naming the plant; without it, every row is its own plant");
    choice(
        "  ",
        "period",
        proposal.period(),
        "the column naming the period; without it, one cross-section");
    sketch.numberFormat().ifPresent(this::numberFormat);
  }

  private void numberFormat(NumberFormat format) {
    String group =
        format.group().map(mark -> ", group: " + scalar(String.valueOf(mark))).orElse("");
    add(
        "  # recognised; declare it where the files of coming years must be read alike",
        "  # number-format: {decimal: " + scalar(String.valueOf(format.decimal())) + group + "}");
  }

  /** A role with its reason, or a comment that says what could stand there. */
  private void choice(String indent, String key, Optional<Choice> choice, String meaning) {
    if (choice.isPresent()) {
      add(
          indent + "# " + oneLine(choice.get().reason()),
          indent + key + ": " + scalar(choice.get().column()));
    } else {
      add(indent + "# " + key + ": …   (" + meaning + ")");
    }
  }

  private void output() {
    add("", "output:");
    if (proposal.output().isPresent()) {
      choice("  ", "column", proposal.output(), "");
    } else {
      lacking.add("`output.column`: no column could be told to be output");
      add("  column:   # to be filled in: the column of output");
    }
    add("  # unit: t");
  }

  private void inputs() {
    add("", "inputs:   # two or more; the names are yours, the order is used everywhere");
    for (InputChoice input : proposal.inputs()) {
      add("  " + scalar(input.name()) + ":");
      choice("    ", "quantity", Optional.of(input.quantity()), "");
      choice("    ", "price", input.price(), "money per unit of quantity");
      choice("    ", "spending", input.spending(), "the money spent; price = spending / quantity");
      add("    # unit: h");
    }
    int missing = 2 - proposal.inputs().size();
    if (missing > 0) {
      lacking.add(
          "`inputs`: "
              + Failures.count(missing, "more input")
              + " of at least two, each with the column of its quantity");
      for (int i = 1; i <= missing; i++) {
        add("  input-" + i + ":", "    quantity:   # to be filled in: the column of its quantity");
      }
    }
  }

  private void money() {
    Optional<String> base = proposal.deflator().flatMap(deflator -> lastPeriod());
    if (base.isPresent()) {
      add("", "money:", "  # currency: EUR");
      choice("  ", "deflator", proposal.deflator(), "");
      add(
          "  # the last period; the period whose money the report is to be in",
          "  base: " + base.get());
    } else {
      add("", "# money:", "#   currency: EUR");
      proposal
          .deflator()
          .ifPresent(
              deflator ->
                  add(
                      "#   # " + oneLine(deflator.reason()),
                      "#   deflator: " + scalar(deflator.column()),
                      "#   base: …   (the period whose money is used)"));
    }
  }

  /** The last period, where periods are whole numbers. */
  private Optional<String> lastPeriod() {
    return proposal
        .period()
        .flatMap(
            period ->
                sketch.columns().stream()
                    .filter(column -> column.heading().equals(period.column()))
                    .filter(column -> column.content() == Content.INTEGERS)
                    .findFirst())
        .flatMap(SketchedColumn::most)
        .map(most -> BigDecimal.valueOf(most).stripTrailingZeros().toPlainString());
  }

  /** The forms that need no more than a name, the first three of them. */
  private static List<String> proposed() {
    return Form.all().stream()
        .filter(form -> !form.needsNests())
        .map(Form::name)
        .limit(FORMS_PROPOSED)
        .toList();
  }

  private static final int FORMS_PROPOSED = 3;

  private void technologies() {
    add(
        "",
        "technologies: [" + String.join(", ", proposed()) + "]",
        "",
        "# estimation:",
        "#   plant-effects: within      # lasting differences between plants removed; needs a plant column",
        "#   time: trend                # or period-effects; needs a period column",
        "#   standard-errors: clustered # the default where there is a plant column");
  }

  private boolean priced() {
    return proposal.inputs().stream()
        .allMatch(input -> input.price().isPresent() || input.spending().isPresent());
  }

  private void leastCost() {
    add("", "# least-cost:", "#   - name: Plan", "#     target: …   (the output to be reached)");
    add(
        priced()
            ? "#     # prices: the mean prices of the last period, where not named here"
            : "#     prices: {…}   (a price for every input: the records have none for some)");
  }

  private void filing() {
    if (proposal.filedCost().isEmpty()) {
      return;
    }
    boolean usable = priced() && proposal.inputs().size() > 1;
    String comment = usable ? "" : "# ";
    add("");
    if (!usable) {
      add("# Filed costs can be reviewed once every input has a price or spending.");
    }
    add(
        comment + "filing:   # filed costs of the last period held against least cost",
        comment + "  # " + oneLine(proposal.filedCost().get().reason()),
        comment + "  cost: " + scalar(proposal.filedCost().get().column()));
  }

  private void unassigned() {
    if (!proposal.unassigned().isEmpty()) {
      add("", "# Columns without a role (one may be a control, `controls: [{column: …}]`):");
      proposal.unassigned().forEach(heading -> add("#   " + oneLine(heading)));
    }
  }

  private static String oneLine(String text) {
    return text.replaceAll("[\\p{Cntrl}\\s]+", " ");
  }

  /** A text as a YAML scalar: as it stands where that is safe, else in double quotes. */
  static String scalar(String text) {
    if (PLAIN.matcher(text).matches()) {
      return text;
    }
    String escaped = oneLine(text).replace("\\", "\\\\").replace("\"", "\\\"");
    return "\"" + escaped + "\"";
  }
}
