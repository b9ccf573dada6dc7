package isowright.cost;

import isowright.cost.GeneralisedCost.PriceTerms;
import isowright.cost.TranslogCost.Term;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/**
 * The cost forms, and how each presents itself to an estimator: those in logs by their terms, those
 * in levels by their price function.
 */
public enum CostForm {
  /** First-order terms alone. */
  COBB_DOUGLAS("cobb-douglas-cost"),
  /** First-order terms and the squares and products of outputs. */
  COBB_DOUGLAS_SQUARED_OUTPUT("cobb-douglas-cost-squared-output"),
  /** All second-order terms. */
  TRANSLOG("translog-cost"),
  /** In levels: {@link GeneralisedCost} with square roots of prices. */
  GENERALISED_LEONTIEF("generalised-leontief-cost"),
  /** In levels: {@link GeneralisedCost} with a quadratic form of prices. */
  MCFADDEN("mcfadden-cost");

  private final String word;

  CostForm(String word) {
    this.word = word;
  }

  /** The word used in files. */
  public String word() {
    return word;
  }

  /** Its price function, where it is a sum in levels; absent where it is one in logs. */
  public Optional<PriceTerms> inLevels() {
    return switch (this) {
      case GENERALISED_LEONTIEF -> Optional.of(PriceTerms.LEONTIEF);
      case MCFADDEN -> Optional.of(PriceTerms.MCFADDEN);
      default -> Optional.empty();
    };
  }

  /**
   * The terms over these arguments: the constant, first order, second order.
   *
   * @throws IllegalStateException if the form is one in levels
   */
  public List<Term> terms(CostArguments arguments) {
    if (inLevels().isPresent()) {
      throw new IllegalStateException(word + " has no terms in logs");
    }
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
