package isowright.cost;

import isowright.cost.TranslogCost.Term;
import java.util.ArrayList;
import java.util.List;

/**
 * A cost form that is linear in its parameters in logs, and which terms it has: how it presents
 * itself to an estimator.
 */
public enum CostForm {
  /** First-order terms alone. */
  COBB_DOUGLAS("cobb-douglas-cost"),
  /** First-order terms and the squares and products of outputs. */
  COBB_DOUGLAS_SQUARED_OUTPUT("cobb-douglas-cost-squared-output"),
  /** All second-order terms. */
  TRANSLOG("translog-cost");

  private final String word;

  CostForm(String word) {
    this.word = word;
  }

  /** The word used in files. */
  public String word() {
    return word;
  }

  /** The terms over these arguments: the constant, first order, second order. */
  public List<Term> terms(CostArguments arguments) {
    int count = arguments.size();
    List<Term> terms = new ArrayList<>();
    terms.add(new Term(TranslogCost.NONE, TranslogCost.NONE));
    for (int k = 0; k < count; k++) {
      terms.add(new Term(k, TranslogCost.NONE));
    }
    for (int k = 0; k < count; k++) {
      for (int l = k; l < count; l++) {
        boolean outputs = arguments.output(k) && arguments.output(l);
        if (this == TRANSLOG || (this == COBB_DOUGLAS_SQUARED_OUTPUT && outputs)) {
          terms.add(new Term(k, l));
        }
      }
    }
    return List.copyOf(terms);
  }
}
