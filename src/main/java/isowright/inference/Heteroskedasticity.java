package isowright.inference;

import isowright.estimation.Fit;
import isowright.estimation.Solution;
import isowright.inference.SpecificationTests.Index;
import isowright.regression.AnotherResponse;
import isowright.regression.ColumnMoments;
import isowright.regression.DerivedColumns;
import isowright.regression.Design;
import isowright.regression.LeastSquares;
import isowright.regression.LinearFit;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.OptionalInt;

/**
 * Does the size of the errors move with the regressors? The squared residuals are regressed on a
 * constant and on terms: the regressors (Breusch and Pagan), or those with their squares and
 * products (White).
 *
 * <p>Where the fit's covariance takes rows as independent: LM = (N − a) R², chi-squared with as
 * many degrees of freedom as there are terms; a is the number of plant effects removed, from the
 * squared residuals and the terms likewise. This is Koenker's form, which needs no normal errors.
 * Where the covariance allows rows of a plant to depend on one another, LM would not follow its
 * law; then F of the terms with a covariance of the same kind.
 *
 * <p>The auxiliary regression must have at least {@value #UNITS_PER_TERM} independent units (rows,
 * or clusters) for each term: large-sample laws fail long before the terms run out of rows. With
 * fewer, Breusch-Pagan is made on the fitted value alone, and White on the fitted value and its
 * square (Wooldridge's short form).
 *
 * <p>Sources: T. S. Breusch and A. R. Pagan 1979, Econometrica 47, 1287–1294; R. Koenker 1981,
 * Journal of Econometrics 17, 107–112; H. White 1980, Econometrica 48, 817–838; J. M. Wooldridge
 * 2013, <i>Introductory Econometrics</i>, 5th ed., section 8.3 (from memory). The rule on units per
 * term is our own. Tested in {@code SpecificationTestsTest} against R, and for size in {@code
 * SpecificationSizeTest}.
 */
final class Heteroskedasticity {

  /** Independent units that the auxiliary regression must have for each term. */
  static final int UNITS_PER_TERM = 5;

  private static final String CLAIM = "the size of the errors does not move with ";

  private final Fit fit;
  private final Design base;
  private final boolean removed;
  private final int[] varying;
  private final ColumnMoments moments;
  private final Index index;
  private final double[] squares;
  private final boolean independent;
  private final int units;

  private Heteroskedasticity(Fit fit) {
    this.fit = fit;
    Solution numbers = fit.numbers();
    Design design = numbers.design();
    this.removed = design.absorbed() > 0;
    this.base = removed ? design.before() : design;
    this.moments = ColumnMoments.of(base);
    this.varying = varying(moments.spreads());
    this.index = Index.of(base, numbers.linear().coefficients());
    this.squares = LeastSquares.residuals(design, numbers.linear());
    double variance = numbers.linear().ssr() / squares.length;
    for (int r = 0; r < squares.length; r++) {
      squares[r] = squares[r] * squares[r] / variance;
    }
    OptionalInt clusters = numbers.covarianceSource().clusters();
    this.independent = clusters.isEmpty();
    this.units = clusters.orElse(squares.length - design.absorbed());
  }

  /** The two tests. */
  static List<Verdict> of(Fit fit) {
    Heteroskedasticity tests = new Heteroskedasticity(fit);
    return List.of(tests.breuschPagan(), tests.white());
  }

  private static int[] varying(double[] spreads) {
    List<Integer> places = new ArrayList<>();
    for (int k = 0; k < spreads.length - 1; k++) {
      if (spreads[k] > 0) {
        places.add(k);
      }
    }
    return places.stream().mapToInt(Integer::intValue).toArray();
  }

  private boolean carries(int terms) {
    return UNITS_PER_TERM * terms <= units;
  }

  private Verdict breuschPagan() {
    int terms = varying.length;
    return carries(terms)
        ? verdict("breusch-pagan", CLAIM + "the regressors", terms, this::linear)
        : verdict(
            "breusch-pagan",
            CLAIM + "the fitted value, the " + unitWord() + " being too few for all regressors",
            1,
            (regressors, rows, into) -> index.fill(regressors, rows, into[1]));
  }

  private Verdict white() {
    int terms = varying.length + varying.length * (varying.length + 1) / 2;
    return carries(terms)
        ? verdict(
            "white",
            CLAIM + "the regressors, their squares and products",
            terms,
            this::squaresAndProducts)
        : verdict(
            "white",
            CLAIM
                + "the fitted value and its square, the "
                + unitWord()
                + " being too few for squares and products of all regressors",
            2,
            (regressors, rows, into) -> {
              index.fill(regressors, rows, into[1]);
              multiply(into[1], into[1], rows, into[2]);
            });
  }

  private String unitWord() {
    return independent ? "rows" : "plants";
  }

  /** Writes the terms of a block from column 1 on. */
  private interface Terms {
    void fill(double[][] regressors, int rows, double[][] into);
  }

  private void linear(double[][] regressors, int rows, double[][] into) {
    double[] means = moments.means();
    double[] spreads = moments.spreads();
    for (int j = 0; j < varying.length; j++) {
      int k = varying[j];
      for (int i = 0; i < rows; i++) {
        into[1 + j][i] = (regressors[k][i] - means[k]) / spreads[k];
      }
    }
  }

  private void squaresAndProducts(double[][] regressors, int rows, double[][] into) {
    linear(regressors, rows, into);
    int at = 1 + varying.length;
    for (int j = 0; j < varying.length; j++) {
      for (int k = j; k < varying.length; k++) {
        multiply(into[1 + j], into[1 + k], rows, into[at++]);
      }
    }
  }

  private static void multiply(double[] a, double[] b, int rows, double[] into) {
    for (int i = 0; i < rows; i++) {
      into[i] = a[i] * b[i];
    }
  }

  private Verdict verdict(String name, String null0, int terms, Terms derivation) {
    List<String> columns = new ArrayList<>();
    columns.add("one");
    for (int k = 1; k <= terms; k++) {
      columns.add("term " + k);
    }
    Design wide =
        AnotherResponse.of(
            DerivedColumns.of(
                base,
                columns,
                (from, to, regressors, into) -> {
                  Arrays.fill(into[0], 0, to - from, 1);
                  derivation.fill(regressors, to - from, into);
                }),
            row -> squares[row]);
    Design auxiliary = removed ? fit.numbers().design().likewise(wide) : wide;
    LinearFit linear = LeastSquares.fit(auxiliary);
    int tested = linear.rank() - (removed ? 0 : 1);
    if (tested < 1) {
      return Verdict.of(name, null0, Double.NaN, new Law.ChiSquared(1));
    }
    if (independent) {
      double explained = 1 - linear.ssr() / linear.totalSumOfSquares();
      double multiplier = linear.rows() - linear.absorbed();
      return Verdict.of(name, null0, multiplier * explained, new Law.ChiSquared(tested));
    }
    AddedTerms added = AddedTerms.of(fit, constant(), auxiliary, 1);
    return Verdict.of(name, null0, added.statistic(), added.law());
  }

  /** The auxiliary regression on a constant, or on the constants of plants, alone. */
  private AddedTerms.Narrow constant() {
    Design one =
        AnotherResponse.of(
            DerivedColumns.of(
                base,
                List.of("one"),
                (from, to, regressors, into) -> Arrays.fill(into[0], 0, to - from, 1)),
            row -> squares[row]);
    Design design = removed ? fit.numbers().design().likewise(one) : one;
    return AddedTerms.Narrow.of(design, LeastSquares.fit(design));
  }
}
