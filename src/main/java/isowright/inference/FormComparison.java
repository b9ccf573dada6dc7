package isowright.inference;

import isowright.estimation.Estimator;
import isowright.estimation.Fit;
import isowright.estimation.Specification;
import isowright.estimation.Specification.PlantEffects;
import isowright.estimation.Specification.RegularityImposed;
import isowright.regression.DerivedColumns;
import isowright.regression.Design;
import isowright.regression.LeastSquares;
import isowright.regression.LikelihoodComparison;
import isowright.regression.LikelihoodComparison.Correction;
import isowright.regression.LinearFit;
import isowright.technology.Form;
import isowright.technology.LinearForm;
import isowright.technology.NonlinearForm;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;

/**
 * Which of two forms do the records speak for, when neither contains the other (CES and translog,
 * say)? Vuong's comparison of likelihoods, and the J test in both directions.
 *
 * <p>The J test adds to one form's regression what the other form predicts beyond it; if the first
 * form is right, that adds nothing. For a form that is not linear in its parameters it is added to
 * the linearisation at the estimate (the P test). Both forms may be rejected, or neither.
 *
 * <p>Sources: {@link LikelihoodComparison}; R. Davidson and J. G. MacKinnon 1981, Econometrica 49,
 * 781–793. Tested in {@code FormComparisonTest} against R, and for size in {@code
 * LikelihoodComparisonTest}.
 *
 * @param first the name of the first form
 * @param second the name of the second
 * @param verdicts whether the two can be told apart; which is nearer, uncorrected and corrected for
 *     the number of parameters; the J test of each
 * @param words what follows, in words
 */
public record FormComparison(String first, String second, List<Verdict> verdicts, String words) {

  /** The names of the tests, in order. */
  public static final List<String> NAMES =
      List.of("vuong-alike", "vuong", "vuong-akaike", "vuong-schwarz", "j-first", "j-second");

  /** Copies the list. */
  public FormComparison {
    verdicts = List.copyOf(verdicts);
  }

  /** The comparisons of all pairs of fits of which neither form contains the other. */
  public static List<FormComparison> all(List<Fit> fits) {
    List<FormComparison> all = new ArrayList<>();
    for (int i = 0; i < fits.size(); i++) {
      for (int j = i + 1; j < fits.size(); j++) {
        of(fits.get(i), fits.get(j)).ifPresent(all::add);
      }
    }
    return List.copyOf(all);
  }

  /**
   * The comparison of two fits of the same rows; absent where one form contains the other, where a
   * fit is not usable, and for estimators whose likelihood is not that of rows or of plants'
   * deviations.
   */
  public static Optional<FormComparison> of(Fit one, Fit two) {
    if (!carries(one) || !carries(two) || !alike(one.specification(), two.specification())) {
      return Optional.empty();
    }
    Form first = one.specification().form();
    Form second = two.specification().form();
    if (contains(first, second) || contains(second, first)) {
      return Optional.empty();
    }
    LikelihoodComparison vuong = likelihoods(one, two);
    List<Verdict> verdicts = new ArrayList<>();
    verdicts.add(alike(first.name(), second.name(), vuong));
    Law law = vuong.grouped() ? new Law.Student(vuong.units() - 1) : new Law.Normal();
    for (Correction correction : Correction.values()) {
      verdicts.add(nearer(first.name(), second.name(), vuong, correction, law));
    }
    verdicts.add(added("j-first", one, two));
    verdicts.add(added("j-second", two, one));
    return Optional.of(
        new FormComparison(
            first.name(),
            second.name(),
            verdicts,
            words(first.name(), second.name(), verdicts) + readily(one, two, verdicts)));
  }

  private static boolean carries(Fit fit) {
    Specification how = fit.specification();
    return fit.state().usable()
        && how.estimator() instanceof Estimator.LeastSquares
        && how.regularity() == RegularityImposed.FREE
        && (how.plantEffects() == PlantEffects.NONE || how.plantEffects() == PlantEffects.WITHIN);
  }

  private static boolean alike(Specification one, Specification two) {
    return one.plantEffects() == two.plantEffects()
        && one.time() == two.time()
        && one.standardErrors() == two.standardErrors();
  }

  /** Whether every technology of the second form is one of the first. */
  static boolean contains(Form first, Form second) {
    if (first.name().equals(second.name())) {
      return true;
    }
    if (first instanceof LinearForm linear) {
      return second instanceof LinearForm other
          && linear.secondOrder(2).length > 0
          && other.secondOrder(2).length == 0;
    }
    NonlinearForm searched = (NonlinearForm) first;
    List<String> two = List.of("a", "b");
    boolean curved = !searched.curvatureNames(two).isEmpty();
    return (curved && searched.limit().name().equals(second.name()))
        || searched.withOneCurvature().name().equals(second.name());
  }

  private static LikelihoodComparison likelihoods(Fit one, Fit two) {
    Design first = one.numbers().design();
    Design second = two.numbers().design();
    LinearFit left = one.numbers().linear();
    LinearFit right = two.numbers().linear();
    boolean grouped =
        first.absorbed() > 0 || one.numbers().covarianceSource().clusters().isPresent();
    return grouped
        ? LikelihoodComparison.byGroups(first, left, second, right)
        : LikelihoodComparison.byRows(first, left, second, right);
  }

  private static Verdict alike(String first, String second, LikelihoodComparison vuong) {
    List<Double> weights = Arrays.stream(vuong.weights()).boxed().toList();
    return Verdict.of(
        "vuong-alike",
        first + " and " + second + " describe every row alike",
        weights.isEmpty() ? Double.NaN : vuong.distance(),
        new Law.WeightedSum(weights));
  }

  private static Verdict nearer(
      String first, String second, LikelihoodComparison vuong, Correction correction, Law law) {
    String corrected =
        switch (correction) {
          case NONE -> "";
          case AKAIKE -> ", with Akaike's correction for the number of parameters";
          case SCHWARZ -> ", with Schwarz's correction for the number of parameters";
        };
    return Verdict.of(
        correction == Correction.NONE
            ? "vuong"
            : "vuong-" + correction.name().toLowerCase(java.util.Locale.ROOT),
        first + " and " + second + " are equally near to the records" + corrected,
        vuong.statistic(correction),
        law);
  }

  /** The J test of a form against another: the difference of fitted values is added. */
  private static Verdict added(String name, Fit examined, Fit other) {
    Design design = examined.numbers().design();
    LinearFit linear = examined.numbers().linear();
    double[] own = LeastSquares.residuals(design, linear);
    double[] rival = LeastSquares.residuals(other.numbers().design(), other.numbers().linear());
    double spread = Math.sqrt(linear.ssr() / own.length);
    int columns = design.columns().size();
    List<String> names = new ArrayList<>(design.columns());
    names.add("fitted by the other form");
    Design wider =
        DerivedColumns.of(
            design,
            names,
            (from, to, regressors, into) -> {
              for (int k = 0; k < columns; k++) {
                System.arraycopy(regressors[k], 0, into[k], 0, to - from);
              }
              for (int r = from; r < to; r++) {
                into[columns][r - from] = (own[r] - rival[r]) / spread;
              }
            });
    AddedTerms added =
        AddedTerms.of(examined, new AddedTerms.Narrow(linear.ssr(), own), wider, columns);
    return Verdict.of(
        name,
        "beyond "
            + examined.specification().form().name()
            + ", what "
            + other.specification().form().name()
            + " predicts adds nothing",
        added.statistic(),
        added.law());
  }

  /**
   * The J test adds what the rival fits, noise included: where the rival has k further directions
   * that hardly differ from the truth, its statistic is nearer to χ²_k than to F(1, ·), so that it
   * rejects too often (Godfrey, L. G. and Pesaran, M. H. 1983, <i>Journal of Econometrics</i> 21,
   * 133–154). Measured in {@code JTestSizeTest}.
   */
  private static String readily(Fit one, Fit two, List<Verdict> verdicts) {
    int fewer = one.numbers().linear().rank() - two.numbers().linear().rank();
    boolean smaller = fewer < 0 ? verdicts.get(4).rejects() : verdicts.get(5).rejects();
    return fewer != 0 && smaller
        ? " But the J test rejects a form too readily against one of more parameters (a true CES"
            + " against a translog in about one sample of five where one of twenty is meant), so"
            + " that alone is weak evidence against "
            + (fewer < 0 ? one : two).specification().form().name()
            + "."
        : "";
  }

  private static String words(String first, String second, List<Verdict> verdicts) {
    Verdict alike = verdicts.get(0);
    Verdict plain = verdicts.get(1);
    StringBuilder words = new StringBuilder();
    if (!alike.rejects()) {
      words.append(
          "The records cannot tell "
              + first
              + " and "
              + second
              + " apart: they describe the rows too much alike to ask which is nearer.");
    } else if (plain.rejects()) {
      words.append(
          "Judged by likelihood, "
              + (plain.statistic() > 0 ? first : second)
              + " is nearer to the records than "
              + (plain.statistic() > 0 ? second : first)
              + ".");
    } else {
      words.append(first + " and " + second + " differ, but neither is nearer to the records.");
    }
    words.append(" By the J test ");
    boolean one = verdicts.get(4).rejects();
    boolean two = verdicts.get(5).rejects();
    if (one && two) {
      words.append("both are rejected: each misses something that the other sees.");
    } else if (one || two) {
      words.append(
          (one ? first : second) + " misses something that " + (one ? second : first) + " sees.");
    } else {
      words.append("neither misses anything that the other sees.");
    }
    return words.toString();
  }
}
