package isowright.regression;

import java.util.ArrayList;
import java.util.List;

/**
 * A two-stage least-squares fit.
 *
 * @param of what was fitted
 * @param firstStages the fit of each endogenous regressor on the instruments, in their order
 * @param secondStage the design of which the estimate is the least-squares fit and whose residuals
 *     are y − Xβ; what covariance estimators are given
 * @param fit coefficients β over the regressors; F F′ = (X̂′X̂)⁻¹; sum of squares of y − Xβ
 */
public record InstrumentedFit(
    InstrumentedDesign of, List<LinearFit> firstStages, Design secondStage, LinearFit fit) {

  /** Copies the list. */
  public InstrumentedFit {
    firstStages = List.copyOf(firstStages);
  }

  /** Whether the instruments move every regressor apart from the others. */
  public boolean identified() {
    return fit.fullRank();
  }

  /** The rank of the instruments, L. */
  public int instrumentRank() {
    return firstStages.isEmpty() ? fit.rank() : firstStages.get(0).rank();
  }

  /** L − K: how many more instruments than regressors there are. */
  public int overidentifying() {
    return instrumentRank() - fit.rank();
  }

  /** The endogenous regressors. */
  public List<String> endogenous() {
    List<String> names = new ArrayList<>();
    for (int k : of.endogenousColumns()) {
      names.add(of.design().columns().get(k));
    }
    return List.copyOf(names);
  }

  /** The outside instruments that the first stages use. */
  public List<String> instruments() {
    List<String> names = new ArrayList<>();
    int[] columns = of.instrumentColumns();
    boolean[] used = firstStages.get(0).estimated();
    for (int l = 0; l < columns.length; l++) {
      if (columns[l] >= of.regressors() && used[l]) {
        names.add(of.design().columns().get(columns[l]));
      }
    }
    return List.copyOf(names);
  }

  /** What was dropped among the instruments, because the others contain it. */
  public List<Collinearity> redundant() {
    return firstStages.isEmpty() ? List.of() : firstStages.get(0).collinearities();
  }
}
