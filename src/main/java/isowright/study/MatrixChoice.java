package isowright.study;

import isowright.study.Matrix.Criterion;
import isowright.study.MatrixFindings.Cell;
import isowright.study.MatrixFindings.Criteria;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.Comparator;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.OptionalInt;
import java.util.stream.IntStream;

/**
 * Applies criteria laid down beforehand to the combinations of a specification matrix, each to what
 * the one before it left. Where several are left at the end, the first in the order of the study
 * file is taken, for the order was laid down beforehand too.
 *
 * <p>An information criterion compares likelihoods, and likelihoods can be compared where they are
 * of the same numbers: the same response at the same rows. So it compares combinations of one
 * sample, the first that the study file lists of those left, and of one response, rows as they
 * stand where any is left, and says why it does not compare the others.
 */
final class MatrixChoice {

  private final List<MatrixCell.Found> found;
  private final String[] standing;
  private final List<String> steps = new ArrayList<>();
  private List<Integer> left;

  private MatrixChoice(List<MatrixCell.Found> found) {
    this.found = found;
    this.standing = new String[found.size()];
    Arrays.fill(standing, "");
    this.left = IntStream.range(0, found.size()).filter(c -> cell(c).estimated()).boxed().toList();
  }

  static MatrixChoice of(List<Criterion> criteria, List<MatrixCell.Found> found) {
    MatrixChoice choice = new MatrixChoice(found);
    if (!criteria.isEmpty()) {
      choice.apply(criteria);
    }
    return choice;
  }

  private Cell cell(int c) {
    return found.get(c).cell();
  }

  private void apply(List<Criterion> criteria) {
    for (int c = 0; c < standing.length; c++) {
      standing[c] = cell(c).estimated() ? "" : "not estimated";
    }
    steps.add(left.size() + " of " + found.size() + " combinations were estimated");
    for (Criterion criterion : criteria) {
      if (left.isEmpty()) {
        return;
      }
      if (criterion.orders()) {
        least(criterion);
      } else {
        keep(criterion);
      }
    }
    if (left.size() > 1) {
      steps.add("the first of these in the order of the study file is taken");
      left.stream().skip(1).forEach(c -> standing[c] = "left, but later in the study file");
      left = left.subList(0, 1);
    }
    left.forEach(c -> standing[c] = "chosen");
  }

  private void keep(Criterion criterion) {
    List<Integer> kept = new ArrayList<>();
    for (int c : left) {
      Optional<String> fault = Optional.ofNullable(found.get(c).faults().get(criterion));
      if (fault.isEmpty()) {
        kept.add(c);
      } else {
        standing[c] = fault.get();
      }
    }
    left = kept;
    steps.add(
        switch (criterion) {
          case REGULAR_EVERYWHERE -> kept.size() + " of these are regular at every row";
          case REGULAR_AT_MEAN ->
              kept.size() + " of these are regular at the geometric mean of their rows";
          default ->
              kept.size() + " of these are not rejected by RESET (or it is not made of them)";
        });
  }

  /** The one of least criterion among those whose likelihood is of the same numbers. */
  private void least(Criterion criterion) {
    List<Integer> candidates = new ArrayList<>();
    for (int c : left) {
      if (criteria(c).of().equals("no likelihood")) {
        standing[c] = "not compared: its estimator maximises no likelihood";
      } else {
        candidates.add(c);
      }
    }
    if (candidates.isEmpty()) {
      left = candidates;
      steps.add("none of these has a likelihood");
      return;
    }
    int first = reference(candidates);
    List<Integer> compared =
        candidates.stream().filter(c -> incomparable(c, first).isEmpty()).toList();
    int best =
        compared.stream().min(Comparator.comparingDouble(c -> value(criterion, c))).orElse(first);
    for (int c : candidates) {
      standing[c] = incomparable(c, first).orElseGet(() -> above(criterion, c, best));
    }
    left = List.of(best);
    steps.add(
        compared.size()
            + (compared.size() == 1 ? " of these has a likelihood" : " of these have likelihoods")
            + " of the "
            + numbers(first)
            + " of sample "
            + cell(first).sample()
            + ", and the least "
            + name(criterion)
            + " among them is taken");
  }

  private String above(Criterion criterion, int c, int best) {
    double above = value(criterion, c) - value(criterion, best);
    return above == 0
        ? "the same " + name(criterion) + ", but later in the study file"
        : String.format(Locale.ROOT, "%s higher by %.1f", name(criterion), above);
  }

  /**
   * The combination with whose likelihood the others are compared: of the sample that the study
   * file lists first among those left, and of rows as they stand where any is.
   */
  private int reference(List<Integer> candidates) {
    List<String> samples = found.stream().map(f -> f.cell().sample()).distinct().toList();
    return candidates.stream()
        .min(
            Comparator.comparingInt((Integer c) -> samples.indexOf(cell(c).sample()))
                .thenComparing(c -> !criteria(c).of().equals("rows"))
                .thenComparing(c -> c))
        .orElseThrow();
  }

  private Optional<String> incomparable(int c, int first) {
    if (!cell(c).sample().equals(cell(first).sample())) {
      return Optional.of(
          "not compared: its likelihood is of the rows of sample "
              + cell(c).sample()
              + ", not of those of "
              + cell(first).sample());
    }
    return criteria(c).of().equals(criteria(first).of())
        ? Optional.empty()
        : Optional.of(
            "not compared: its likelihood is of " + numbers(c) + ", not of " + numbers(first));
  }

  private String numbers(int c) {
    String of = criteria(c).of();
    return of.equals("rows") ? "rows as they stand" : of;
  }

  private Criteria criteria(int c) {
    return cell(c).criteria().orElseThrow();
  }

  private double value(Criterion criterion, int c) {
    return criterion == Criterion.BIC ? criteria(c).bic() : criteria(c).aic();
  }

  private static String name(Criterion criterion) {
    return criterion == Criterion.BIC ? "BIC" : "AIC";
  }

  /** The combinations with their standing. */
  List<Cell> cells() {
    return IntStream.range(0, found.size()).mapToObj(c -> cell(c).standing(standing[c])).toList();
  }

  /** The one that is marked. */
  OptionalInt chosen() {
    return steps.isEmpty() || left.isEmpty() ? OptionalInt.empty() : OptionalInt.of(left.get(0));
  }

  /** How it came to be. */
  String words() {
    if (steps.isEmpty()) {
      return "No criteria were laid down beforehand, so that no combination is marked as chosen.";
    }
    String how = String.join("; ", steps);
    return how.substring(0, 1).toUpperCase(Locale.ROOT)
        + how.substring(1)
        + (left.isEmpty() ? ". No combination is chosen." : ".");
  }
}
