package isowright.records;

import isowright.records.HeadingWords.Aspect;
import isowright.records.SketchedColumn.Content;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.function.Predicate;

/**
 * What the columns of a file may be, by their headings and contents; a guess to be checked, never
 * used unseen.
 *
 * @param plant the column that may name the plant
 * @param period the column that may name the period
 * @param output the column that may be output
 * @param inputs what may be inputs, in the order of the file
 * @param deflator the column that may be a deflator
 * @param filedCost the column that may be filed cost
 * @param unassigned the columns for which nothing is proposed
 */
public record Proposal(
    Optional<Choice> plant,
    Optional<Choice> period,
    Optional<Choice> output,
    List<InputChoice> inputs,
    Optional<Choice> deflator,
    Optional<Choice> filedCost,
    List<String> unassigned) {

  private static final int FIRST_LIKELY_YEAR = 1800;
  private static final int LAST_LIKELY_YEAR = 2200;

  /** Copies the lists. */
  public Proposal {
    inputs = List.copyOf(inputs);
    unassigned = List.copyOf(unassigned);
  }

  /**
   * A column with the reason why it is proposed.
   *
   * @param column its heading
   * @param reason why, in words
   */
  public record Choice(String column, String reason) {}

  /**
   * What may be an input.
   *
   * @param name a name for it
   * @param quantity the column of its quantity
   * @param price the column of its price
   * @param spending the column of the money spent on it
   */
  public record InputChoice(
      String name, Choice quantity, Optional<Choice> price, Optional<Choice> spending) {}

  /** Proposes a role for each column that seems to have one. */
  static Proposal of(List<SketchedColumn> columns) {
    return new Search(columns).proposal();
  }

  /** The search, which takes away each column as it is given a role. */
  private static final class Search {
    private final Map<SketchedColumn, HeadingWords> free = new LinkedHashMap<>();

    Search(List<SketchedColumn> columns) {
      for (SketchedColumn column : columns) {
        if (!column.heading().isBlank() && column.content() != Content.EMPTY) {
          free.put(column, HeadingWords.of(column.heading()));
        }
      }
    }

    Proposal proposal() {
      Optional<Choice> period = period();
      Optional<Choice> plant = plant();
      Optional<Choice> deflator =
          take(HeadingWords.DEFLATOR, c -> c.content().numeric(), "a deflator");
      Optional<Choice> filed = filed();
      List<InputChoice> inputs = inputs();
      Optional<Choice> output = take(HeadingWords.OUTPUT, c -> c.content().numeric(), "output");
      List<String> rest = free.keySet().stream().map(SketchedColumn::heading).toList();
      return new Proposal(plant, period, output, inputs, deflator, filed, rest);
    }

    private Optional<Choice> take(Set<String> words, Predicate<SketchedColumn> fits, String role) {
      for (Map.Entry<SketchedColumn, HeadingWords> entry : free.entrySet()) {
        Optional<String> word = entry.getValue().first(words);
        if (word.isPresent() && fits.test(entry.getKey())) {
          return Optional.of(
              take(
                  entry.getKey(),
                  "the heading says \"%s\", which may be %s".formatted(word.get(), role)));
        }
      }
      return Optional.empty();
    }

    private Choice take(SketchedColumn column, String reason) {
      free.remove(column);
      return new Choice(column.heading(), reason + "; it holds " + column.words());
    }

    private Optional<Choice> firstOf(Predicate<SketchedColumn> fits, String reason) {
      return free.keySet().stream().filter(fits).findFirst().map(c -> take(c, reason));
    }

    private Optional<Choice> period() {
      return take(
              HeadingWords.PERIOD,
              c -> c.content() == Content.INTEGERS || c.content() == Content.DATES,
              "the period")
          .or(() -> firstOf(c -> c.content() == Content.DATES, "it holds dates"))
          .or(() -> firstOf(Search::likelyYears, "it holds whole numbers that may be years"));
    }

    private static boolean likelyYears(SketchedColumn column) {
      return column.content() == Content.INTEGERS
          && column.repeats()
          && column.least().orElse(0.0) >= FIRST_LIKELY_YEAR
          && column.most().orElse(0.0) <= LAST_LIKELY_YEAR;
    }

    private Optional<Choice> plant() {
      return take(HeadingWords.PLANT, c -> c.content() == Content.TEXT, "the plant")
          .or(
              () ->
                  take(
                      HeadingWords.PLANT,
                      c -> c.content() == Content.INTEGERS && c.repeats(),
                      "the plant"))
          .or(
              () ->
                  firstOf(
                      c -> c.content() == Content.TEXT && c.repeats(),
                      "it holds names that stand in more than one row"));
    }

    private Optional<Choice> filed() {
      for (Map.Entry<SketchedColumn, HeadingWords> entry : free.entrySet()) {
        HeadingWords words = entry.getValue();
        boolean cost = words.aspect() == Aspect.SPENDING && words.input().isEmpty();
        Optional<String> filed = words.first(HeadingWords.FILED);
        if (cost && entry.getKey().content().numeric()) {
          String reason =
              filed
                  .map(w -> "the heading says \"%s\" and names no input".formatted(w))
                  .orElse("the heading names a cost and no input");
          return Optional.of(take(entry.getKey(), reason + ", so it may be filed cost"));
        }
      }
      return Optional.empty();
    }

    private List<InputChoice> inputs() {
      Map<String, Map<Aspect, SketchedColumn>> found = new LinkedHashMap<>();
      free.forEach(
          (column, words) -> {
            if (column.content().numeric()) {
              words
                  .input()
                  .ifPresent(
                      input ->
                          found
                              .computeIfAbsent(input, i -> new LinkedHashMap<>())
                              .putIfAbsent(words.aspect(), column));
            }
          });
      List<InputChoice> inputs = new ArrayList<>();
      found.forEach(
          (name, aspects) -> {
            // Without a quantity there is no input; its money stays unassigned.
            if (aspects.containsKey(Aspect.QUANTITY)) {
              inputs.add(
                  new InputChoice(
                      name,
                      aspect(name, aspects, Aspect.QUANTITY, "the quantity of").orElseThrow(),
                      aspect(name, aspects, Aspect.PRICE, "the price of"),
                      aspect(name, aspects, Aspect.SPENDING, "the money spent on")));
            }
          });
      return inputs;
    }

    private Optional<Choice> aspect(
        String name, Map<Aspect, SketchedColumn> aspects, Aspect aspect, String words) {
      SketchedColumn column = aspects.get(aspect);
      if (column == null) {
        return Optional.empty();
      }
      boolean said = HeadingWords.of(column.heading()).aspectSaid();
      String reason =
          "the heading names %s%s".formatted(name, said ? "" : " and says nothing of money");
      return Optional.of(take(column, "%s, so it may be %s %s".formatted(reason, words, name)));
    }
  }
}
