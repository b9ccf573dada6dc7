package isowright.estimation;

import isowright.cost.CostArguments;
import isowright.cost.PriceHomogeneity;
import isowright.cost.TranslogCost;
import isowright.cost.TranslogCost.Term;
import isowright.estimation.CostSpecification.Concavity;
import isowright.estimation.CostSpecification.Equations;
import isowright.estimation.CostSpecification.Restriction;
import isowright.regression.EquationSystem;
import isowright.regression.EquationSystem.Equation;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.stream.IntStream;

/**
 * Cost and share equations of a translog cost function as a system over free parameters φ: the
 * coefficients of its terms are offsets + loadings · φ, and by Shephard's lemma the share of input
 * i is the derivative of ln C in ln w_i, linear in the same coefficients.
 */
final class CostEquations {

  private final CostArguments arguments;
  private final CostSpecification specification;
  private final List<String> controls;
  private final List<Term> terms;
  private final List<Integer> free = new ArrayList<>();
  private final double[] offsets;
  private final List<double[]> loadings = new ArrayList<>();

  CostEquations(CostData data, CostSpecification specification) {
    this.arguments = data.arguments();
    this.specification = specification;
    this.controls = specification.equations() == Equations.SHARES ? List.of() : data.controlNames();
    this.terms = specification.form().terms(arguments).stream().filter(this::identified).toList();
    this.offsets = new double[terms.size()];
    if (specification.homogeneous()) {
      PriceHomogeneity rule = PriceHomogeneity.of(arguments, terms);
      System.arraycopy(rule.offsets(), 0, offsets, 0, offsets.length);
      for (int f = 0; f < rule.free().length; f++) {
        add(rule.free()[f], column(rule.loadings(), f));
      }
    } else {
      for (int t = 0; t < terms.size(); t++) {
        double[] own = new double[terms.size()];
        own[t] = 1;
        add(t, own);
      }
    }
    if (specification.restrictions().contains(Restriction.CONSTANT_RETURNS)) {
      constantReturns();
    }
  }

  private void add(int term, double[] load) {
    if (!vanishes(terms.get(term))) {
      free.add(term);
      loadings.add(load);
    }
  }

  private static double[] column(double[][] matrix, int j) {
    return Arrays.stream(matrix).mapToDouble(row -> row[j]).toArray();
  }

  /** Share equations know the terms that involve a price; group constants take up the constant. */
  private boolean identified(Term term) {
    if (specification.equations() != Equations.SHARES) {
      return !(term.constant() && specification.plantEffects());
    }
    return !term.constant()
        && (arguments.price(term.first())
            || (term.secondOrder() && arguments.price(term.second())));
  }

  private boolean vanishes(Term term) {
    if (!term.secondOrder()) {
      return false;
    }
    boolean price = arguments.price(term.first());
    boolean otherPrice = arguments.price(term.second());
    boolean scale = scale(term.first());
    boolean otherScale = scale(term.second());
    boolean time = arguments.time() && term.second() == arguments.size() - 1;
    List<Restriction> imposed = specification.restrictions();
    boolean homogeneous =
        imposed.contains(Restriction.HOMOGENEOUS_IN_OUTPUT)
            || imposed.contains(Restriction.CONSTANT_RETURNS);
    boolean homothetic = homogeneous || imposed.contains(Restriction.HOMOTHETIC);
    return (homothetic && price && otherScale)
        || (homogeneous && scale && (otherScale || time))
        || (imposed.contains(Restriction.UNIT_SUBSTITUTION) && price && otherPrice)
        || (imposed.contains(Restriction.NEUTRAL_CHANGE) && price && time);
  }

  private boolean scale(int argument) {
    return arguments.output(argument) || arguments.fixedInput(argument);
  }

  /**
   * Σ ∂ln C/∂ln y + Σ ∂ln C/∂ln fixed = 1: the last output's coefficient is what the others leave.
   */
  private void constantReturns() {
    int last = arguments.inputs().size() + arguments.outputs().size() - 1;
    int place = terms.indexOf(new Term(last, TranslogCost.NONE));
    int gone = free.indexOf(place);
    if (place < 0 || gone < 0) {
      return;
    }
    free.remove(gone);
    loadings.remove(gone);
    offsets[place] = 1;
    for (int f = 0; f < free.size(); f++) {
      Term term = terms.get(free.get(f));
      if (!term.constant() && !term.secondOrder() && scale(term.first())) {
        loadings.get(f)[place] -= 1;
      }
    }
  }

  List<Term> terms() {
    return terms;
  }

  /** The coefficients of the terms at φ; the controls follow φ and are no part of them. */
  double[] coefficients(double[] phi) {
    double[] all = offsets.clone();
    for (int f = 0; f < free.size(); f++) {
      for (int t = 0; t < all.length; t++) {
        all[t] += loadings.get(f)[t] * phi[f];
      }
    }
    return all;
  }

  /** The covariance of coefficients and controls from that of φ. */
  double[][] covariance(double[][] ofPhi) {
    int all = terms.size() + controls.size();
    double[][] toAll = new double[all][ofPhi.length];
    for (int f = 0; f < free.size(); f++) {
      for (int t = 0; t < terms.size(); t++) {
        toAll[t][f] = loadings.get(f)[t];
      }
    }
    for (int c = 0; c < controls.size(); c++) {
      toAll[terms.size() + c][free.size() + c] = 1;
    }
    return Matrices.sandwich(toAll, ofPhi);
  }

  /** The names of φ. */
  List<String> freeNames() {
    List<String> names = new ArrayList<>();
    List<String> all =
        new TranslogCost("", arguments, terms, new double[terms.size()]).parameterNames();
    free.forEach(t -> names.add(all.get(t)));
    controls.forEach(control -> names.add("control:" + control));
    return names;
  }

  /** The factor that makes cost concave at the mean of the records, where that is asked for. */
  Optional<Curvature> curvature(CostData data) {
    int r = arguments.inputs().size() - 1;
    if (specification.concavity() == Concavity.FREE || !specification.homogeneous()) {
      return Optional.empty();
    }
    int[][] places = new int[r][r];
    double[][] shares = new double[r][free.size() + controls.size()];
    double[] mean = new double[arguments.size()];
    Arrays.setAll(mean, k -> Arrays.stream(data.points()[k]).average().orElse(0));
    double[] z = arguments.scaled(mean);
    for (int i = 0; i < r; i++) {
      for (int j = 0; j < r; j++) {
        places[i][j] = free.indexOf(terms.indexOf(new Term(Math.min(i, j), Math.max(i, j))));
        if (places[i][j] < 0) {
          return Optional.empty();
        }
      }
      shares[i][free.indexOf(terms.indexOf(new Term(i, TranslogCost.NONE)))] = 1;
      for (int k = r + 1; k < arguments.size(); k++) {
        int place = free.indexOf(terms.indexOf(new Term(i, k)));
        if (place >= 0) {
          shares[i][place] = z[k];
        }
      }
    }
    return Optional.of(Curvature.atPoint(freeNames(), places, shares));
  }

  /** The places of the inputs whose share equations are fitted. */
  int[] fittedShares() {
    int n = arguments.inputs().size();
    return IntStream.range(0, n).filter(i -> i != specification.leftOut()).toArray();
  }

  /** The system over φ. */
  EquationSystem system(CostDesign design) {
    List<String> names = freeNames();
    List<Equation> equations = new ArrayList<>();
    if (specification.equations() != Equations.SHARES) {
      equations.add(costEquation(design, names.size()));
    }
    if (specification.equations() != Equations.COST) {
      for (int i : fittedShares()) {
        equations.add(shareEquation(design, i, names.size()));
      }
    }
    return new EquationSystem(names, equations);
  }

  /**
   * The same equations, each share equation with coefficients of its own: what symmetry is tested
   * against. Homogeneity, where imposed, is imposed on each.
   */
  EquationSystem asymmetric(CostDesign design) {
    List<String> names = new ArrayList<>();
    if (specification.equations() == Equations.SYSTEM) {
      names.addAll(freeNames());
    }
    int first = names.size();
    List<Integer> regressors = ownRegressors();
    for (int i : fittedShares()) {
      regressors.forEach(k -> names.add("share " + i + " on " + k));
    }
    List<Equation> equations = new ArrayList<>();
    if (specification.equations() == Equations.SYSTEM) {
      equations.add(costEquation(design, names.size()));
    }
    for (int i : fittedShares()) {
      double[] explained = new double[design.size()];
      explained[design.share(i)] = 1;
      double[][] load = new double[design.size()][names.size()];
      for (int k : regressors) {
        int at = first++;
        load[k < 0 ? 0 : design.argument(k)][at] = 1;
        if (specification.homogeneous() && k >= 0 && arguments.price(k)) {
          load[design.argument(arguments.inputs().size() - 1)][at] = -1;
        }
      }
      equations.add(new Equation("share of " + arguments.inputs().get(i), explained, load, false));
    }
    return new EquationSystem(names, equations);
  }

  /** What a share depends on: −1 for the constant, else the argument. */
  private List<Integer> ownRegressors() {
    List<Integer> regressors = new ArrayList<>(List.of(-1));
    int last = arguments.inputs().size() - 1;
    for (int k = 0; k < arguments.size(); k++) {
      Term term = new Term(0, Math.max(k, 0));
      boolean present = terms.contains(term) && !vanishes(term);
      if (present && !(specification.homogeneous() && k == last)) {
        regressors.add(k);
      }
    }
    return regressors;
  }

  private Equation costEquation(CostDesign design, int parameters) {
    double[] explained = new double[design.size()];
    double[][] load = new double[design.size()][parameters];
    explained[design.cost()] = 1;
    for (int t = 0; t < terms.size(); t++) {
      int column = design.column(terms.get(t));
      explained[column] -= offsets[t];
      for (int f = 0; f < free.size(); f++) {
        load[column][f] += loadings.get(f)[t];
      }
    }
    for (int c = 0; c < controls.size(); c++) {
      load[design.control(c)][free.size() + c] = 1;
    }
    return new Equation("cost", explained, load, specification.plantEffects());
  }

  private Equation shareEquation(CostDesign design, int input, int parameters) {
    double[] explained = new double[design.size()];
    double[][] load = new double[design.size()][parameters];
    explained[design.share(input)] = 1;
    for (int t = 0; t < terms.size(); t++) {
      int column = derivative(design, terms.get(t), input);
      if (column >= 0) {
        explained[column] -= offsets[t];
        for (int f = 0; f < free.size(); f++) {
          load[column][f] += loadings.get(f)[t];
        }
      }
    }
    String name = "share of " + arguments.inputs().get(input);
    return new Equation(name, explained, load, false);
  }

  /** The column that is the derivative of a term in the log price of an input, or −1. */
  private static int derivative(CostDesign design, Term term, int input) {
    if (term.constant() || (term.first() != input && term.second() != input)) {
      return -1;
    }
    if (!term.secondOrder()) {
      return 0;
    }
    int other = term.first() == input ? term.second() : term.first();
    return design.argument(other);
  }
}
