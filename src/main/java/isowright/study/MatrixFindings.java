package isowright.study;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalInt;
import java.util.function.Function;

/**
 * What was found of a specification matrix: every combination with its headline figures, their
 * order, and the combination that the criteria laid down beforehand mark.
 *
 * @param samples the rows of each sample
 * @param chooseBy the criteria, by their words; empty where none were laid down
 * @param headlines the headline figures that some combination has
 * @param cells the combinations, in the order of the study file
 * @param chosen the index of the marked one; empty where none is
 * @param choice how it came to be chosen, or why none is, in words
 * @param gaps for each filing of the last period reviewed, the lowest and highest gap of any
 *     combination
 */
public record MatrixFindings(
    List<Sample> samples,
    List<String> chooseBy,
    List<Headline> headlines,
    List<Cell> cells,
    OptionalInt chosen,
    String choice,
    List<ReviewFindings.Spread> gaps) {

  /** The scale elasticity at the geometric mean of the sample. */
  public static final String SCALE = "returns-to-scale";

  /** The mean elasticity of substitution, likewise. */
  public static final String SUBSTITUTION = "substitution";

  /** The answer to the first least-cost question. */
  public static final String LEAST_COST = "least-cost";

  /** The gap of the last period reviewed as a share of what was filed. */
  public static final String GAP = "gap";

  /** Copies the lists. */
  public MatrixFindings {
    samples = List.copyOf(samples);
    chooseBy = List.copyOf(chooseBy);
    headlines = List.copyOf(headlines);
    cells = List.copyOf(cells);
    gaps = List.copyOf(gaps);
  }

  /** The same with gaps filing by filing. */
  MatrixFindings with(List<ReviewFindings.Spread> byFiling) {
    return new MatrixFindings(samples, chooseBy, headlines, cells, chosen, choice, byFiling);
  }

  /**
   * What a combination is besides its form, in words: "within, trend, later-half". What all
   * combinations share is left out.
   */
  public String circumstances(Cell cell) {
    List<String> parts = new ArrayList<>();
    part(parts, Cell::plantEffects, cell, "pooled");
    part(parts, Cell::time, cell, "no trend");
    part(parts, Cell::standardErrors, cell, "none");
    part(parts, Cell::sample, cell, "none");
    return String.join(", ", parts);
  }

  private void part(
      List<String> parts, Function<Cell, String> axis, Cell cell, String insteadOfNone) {
    if (cells.stream().map(axis).distinct().count() > 1) {
      String word = axis.apply(cell);
      parts.add(word.equals("none") ? insteadOfNone : word);
    }
  }

  /** The combinations in the order of the first headline figure, those without it last. */
  public List<Integer> order() {
    List<Integer> order = new ArrayList<>(headlines.get(0).order());
    for (int c = 0; c < cells.size(); c++) {
      if (!order.contains(c)) {
        order.add(c);
      }
    }
    return order;
  }

  /** The combinations that were estimated. */
  public long estimated() {
    return cells.stream().filter(Cell::estimated).count();
  }

  /** Whether a combination is the marked one. */
  public boolean isChosen(int cell) {
    return chosen.isPresent() && chosen.getAsInt() == cell;
  }

  /**
   * A sample.
   *
   * @param name its name in the study
   * @param words which rows, in words
   * @param rows how many
   * @param plants of how many plants
   * @param periods of how many periods
   */
  public record Sample(String name, String words, int rows, int plants, int periods) {}

  /**
   * A headline figure across the combinations.
   *
   * @param name {@code returns-to-scale}, {@code substitution}, {@code least-cost} or {@code gap}
   * @param words what it is
   * @param unit its unit; empty for a pure number
   * @param order the indices of the combinations that have it, from the least to the greatest
   */
  public record Headline(String name, String words, String unit, List<Integer> order) {
    /** Copies the list. */
    public Headline {
      order = List.copyOf(order);
    }
  }

  /**
   * A combination.
   *
   * @param technology the form
   * @param plantEffects what was done about plants
   * @param time what was done about time
   * @param standardErrors the kind of standard errors
   * @param sample the name of the sample
   * @param state as of a fit
   * @param reasons why there is no answer, or what must be known of it
   * @param rows the rows of the regression; 0 where nothing was estimated
   * @param criteria information criteria; absent where there are no numbers
   * @param regular at how many rows it is regular; absent likewise
   * @param figures by the name of the headline
   * @param without why a headline figure is not there, by its name
   * @param asAsked whether it is a fit of the study itself
   * @param standing what the criteria said of it; empty where none were laid down
   */
  public record Cell(
      String technology,
      String plantEffects,
      String time,
      String standardErrors,
      String sample,
      String state,
      List<String> reasons,
      int rows,
      Optional<Criteria> criteria,
      Optional<FitFindings.Regular> regular,
      Map<String, Figure> figures,
      Map<String, String> without,
      boolean asAsked,
      String standing) {

    /** Copies the list. */
    public Cell {
      reasons = List.copyOf(reasons);
    }

    /** Whether it was estimated. */
    public boolean estimated() {
      return criteria.isPresent();
    }

    /** A headline figure. */
    public Optional<Figure> figure(String headline) {
      return Optional.ofNullable(figures.get(headline));
    }

    Cell standing(String words) {
      return new Cell(
          technology,
          plantEffects,
          time,
          standardErrors,
          sample,
          state,
          reasons,
          rows,
          criteria,
          regular,
          figures,
          without,
          asAsked,
          words);
    }
  }

  /**
   * Information criteria.
   *
   * @param of whose likelihood they are of: {@code rows}, {@code plant means} or {@code
   *     differences}
   * @param parameters how many parameters they count
   * @param logLikelihood the log-likelihood
   * @param aic Akaike's
   * @param bic Schwarz's
   */
  public record Criteria(String of, int parameters, double logLikelihood, double aic, double bic) {}
}
