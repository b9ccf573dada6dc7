package isowright.cost;

import isowright.cost.TranslogCost.Term;
import java.util.ArrayList;
import java.util.List;

/**
 * Cost doubles when all prices double: the linear restrictions that make a {@link TranslogCost}
 * homogeneous of degree one in prices, by writing every coefficient that involves the last price in
 * terms of the others.
 *
 * <pre>  a_n = 1 − Σ_{i&lt;n} a_i,   b_ni = −Σ_{j&lt;n} b_ij,   b_nn = ΣΣ_{i,j&lt;n} b_ij,
 *  b_nk = −Σ_{i&lt;n} b_ik  for every argument k that is no price </pre>
 *
 * so that coefficients = offsets + loadings · free. Which price is eliminated does not matter: the
 * same functions are described.
 *
 * @param free the places, among the terms, of the coefficients that stay free
 * @param offsets one a term
 * @param loadings terms × free
 */
public record PriceHomogeneity(int[] free, double[] offsets, double[][] loadings) {

  /** The restrictions for these terms. */
  public static PriceHomogeneity of(CostArguments arguments, List<Term> terms) {
    int last = arguments.inputs().size() - 1;
    List<Integer> kept = new ArrayList<>();
    for (int t = 0; t < terms.size(); t++) {
      if (terms.get(t).first() != last && terms.get(t).second() != last) {
        kept.add(t);
      }
    }
    int[] free = kept.stream().mapToInt(Integer::intValue).toArray();
    double[] offsets = new double[terms.size()];
    double[][] loadings = new double[terms.size()][free.length];
    for (int f = 0; f < free.length; f++) {
      loadings[free[f]][f] = 1;
      Term term = terms.get(free[f]);
      boolean first = arguments.price(term.first());
      boolean second = term.secondOrder() && arguments.price(term.second());
      // b_ij enters −b_in for i and j each, and b_nn once as (i, j) and once as (j, i).
      if (first && !term.secondOrder()) {
        loadings[place(terms, last, TranslogCost.NONE)][f] -= 1;
      } else if (first && second) {
        loadings[place(terms, term.first(), last)][f] -= 1;
        if (term.first() != term.second()) {
          loadings[place(terms, term.second(), last)][f] -= 1;
        }
        loadings[place(terms, last, last)][f] += term.first() == term.second() ? 1 : 2;
      } else if (first) {
        loadings[place(terms, last, term.second())][f] -= 1;
      }
    }
    offsets[place(terms, last, TranslogCost.NONE)] = 1;
    return new PriceHomogeneity(free, offsets, loadings);
  }

  private static int place(List<Term> terms, int k, int l) {
    Term term = l == TranslogCost.NONE ? new Term(k, l) : new Term(Math.min(k, l), Math.max(k, l));
    return terms.indexOf(term);
  }
}
