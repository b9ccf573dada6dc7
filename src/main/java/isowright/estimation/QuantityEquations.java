package isowright.estimation;

import isowright.cost.CostArguments;
import isowright.cost.GeneralisedCost;
import isowright.cost.GeneralisedCost.PriceTerms;
import isowright.estimation.CostSpecification.Concavity;
import isowright.estimation.CostSpecification.Restriction;
import isowright.regression.EquationSystem;
import isowright.regression.EquationSystem.Equation;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/**
 * The input quantities of a cost function in levels, by Shephard's lemma, each over h, the sum of
 * outputs, as a system over the coefficients that are free:
 *
 * <pre>  x_i/h = ∂q/∂w_i + Σ_k c_ik y_k/h + b_i/h + τ_i t + θ_i (β t/h + β₂ t² + Σ d_kl y_k y_l/h)
 * </pre>
 *
 * Dividing by output keeps errors of large and small firms comparable; all n equations are fitted,
 * their errors being free to go together.
 */
final class QuantityEquations {

  private final CostArguments arguments;
  private final CostSpecification specification;
  private final PriceTerms prices;
  private final GeneralisedCost frame;
  private final List<Integer> free = new ArrayList<>();

  QuantityEquations(CostData data, CostSpecification specification, QuantityDesign design) {
    this.arguments = data.arguments();
    this.specification = specification;
    this.prices = specification.form().inLevels().orElseThrow();
    int count = GeneralisedCost.names(arguments).size();
    this.frame = new GeneralisedCost(prices, arguments, design.theta(), new double[count]);
    for (int k = 0; k < count; k++) {
      if (!vanishes(k)) {
        free.add(k);
      }
    }
  }

  private boolean vanishes(int place) {
    List<Restriction> imposed = specification.restrictions();
    int n = arguments.inputs().size();
    boolean pair = place < frame.linear(0, 0);
    boolean fixed = place >= frame.fixed(0) && place < frame.fixed(n);
    boolean bias = arguments.time() && place >= frame.trend(0) && place < frame.trend(n);
    boolean neutral = arguments.time() && place == frame.trend(n);
    boolean square = place >= frame.square(0, 0);
    return (imposed.contains(Restriction.CONSTANT_RETURNS) && (fixed || neutral || square))
        || (imposed.contains(Restriction.NO_SUBSTITUTION) && pair)
        || (imposed.contains(Restriction.NEUTRAL_CHANGE) && bias);
  }

  /** The function of these free coefficients. */
  GeneralisedCost function(double[] theta) {
    double[] all = frame.parameters();
    for (int f = 0; f < free.size(); f++) {
      all[free.get(f)] = theta[f];
    }
    return frame.withParameters(all);
  }

  /** The covariance of all coefficients from that of the free ones. */
  double[][] covariance(double[][] ofFree) {
    double[][] all = new double[frame.parameters().length][frame.parameters().length];
    for (int f = 0; f < free.size(); f++) {
      for (int g = 0; g < free.size(); g++) {
        all[free.get(f)][free.get(g)] = ofFree[f][g];
      }
    }
    return all;
  }

  /** The factor that makes McFadden cost concave, where that is asked for. */
  Optional<Curvature> curvature(List<String> names) {
    boolean asked = specification.concavity() != Concavity.FREE;
    boolean moved = !specification.restrictions().contains(Restriction.NO_SUBSTITUTION);
    return asked && moved && prices == PriceTerms.MCFADDEN
        ? Optional.of(Curvature.ofPairs(names, arguments.inputs().size()))
        : Optional.empty();
  }

  EquationSystem system(QuantityDesign design) {
    List<String> all = frame.parameterNames();
    List<String> names = new ArrayList<>();
    free.forEach(place -> names.add(all.get(place)));
    List<Equation> equations = new ArrayList<>();
    for (int i = 0; i < arguments.inputs().size(); i++) {
      double[][] load = new double[design.size()][all.size()];
      prices(design, i, load);
      scale(design, i, load);
      equations.add(equation(design, i, load, names.size()));
    }
    return new EquationSystem(names, equations);
  }

  private Equation equation(QuantityDesign design, int input, double[][] load, int parameters) {
    double[][] kept = new double[design.size()][parameters];
    for (int c = 0; c < kept.length; c++) {
      for (int f = 0; f < parameters; f++) {
        kept[c][f] = load[c][free.get(f)];
      }
    }
    double[] explained = new double[design.size()];
    explained[design.quantity(input)] = 1;
    return new Equation("quantity of " + arguments.inputs().get(input), explained, kept, false);
  }

  private void prices(QuantityDesign design, int i, double[][] load) {
    int n = arguments.inputs().size();
    for (int k = 0; k < n; k++) {
      for (int l = k + 1; l < n; l++) {
        int at = GeneralisedCost.pair(n, k, l);
        if (prices == PriceTerms.LEONTIEF && (i == k || i == l)) {
          load[design.price(i, i == k ? l : k)][at] = 1;
        } else if (prices == PriceTerms.MCFADDEN) {
          load[design.price(k, l)][at] = i == k ? 1 : i == l ? -1 : 0;
          load[design.price(l, k)][at] = design.theta()[i];
        }
      }
    }
  }

  private void scale(QuantityDesign design, int i, double[][] load) {
    int n = arguments.inputs().size();
    int m = arguments.outputs().size();
    double weight = design.theta()[i];
    load[design.one()][frame.fixed(i)] = 1;
    for (int k = 0; k < m; k++) {
      load[design.output(k)][frame.linear(i, k)] = 1;
      for (int l = k; l < m; l++) {
        load[design.square(k, l)][frame.square(k, l)] = weight;
      }
    }
    if (arguments.time()) {
      load[design.trend(0)][frame.trend(i)] = 1;
      load[design.trend(1)][frame.trend(n)] = weight;
      load[design.trend(2)][frame.trend(n + 1)] = weight;
    }
  }
}
