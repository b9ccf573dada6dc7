package isowright.report;

import isowright.study.Figure;
import isowright.study.FitFindings.Fitted;
import isowright.study.RobustnessFindings;
import java.util.ArrayList;
import java.util.List;
import java.util.function.Function;

/** How figures were resampled, tested and checked, in the words of the method section. */
final class RobustnessMethod {

  private RobustnessMethod() {}

  /**
   * The points that apply to these findings.
   *
   * @param cite cites publications
   */
  static List<Text> points(Material material, Function<Source[], String> cite) {
    List<Fitted> fits = material.findings().fits();
    List<Text> points = new ArrayList<>();
    if (fits.stream().anyMatch(fit -> !fit.influence().isEmpty())) {
      points.add(
          Text.of(
              "Influence by leverage and Cook’s distance "
                  + cite.apply(new Source[] {Source.COOK})
                  + "; DFFITS, DFBETAS and the covariance ratio with their cut-offs "
                  + cite.apply(new Source[] {Source.BELSLEY})
                  + "."));
    }
    if (fits.stream()
        .anyMatch(
            fit -> fit.returnsToScale().map(Figure::refits).stream().anyMatch(r -> !r.none()))) {
      points.add(
          Text.of(
              "Figures without a plant or without a period by exact refits; the one that moves a figure"
                  + " most is named."));
    }
    if (fits.stream().anyMatch(fit -> fit.robustness().resampling().isPresent())) {
      points.add(
          Text.of(
              "Resampling: as many plants as there are are drawn with replacement, whole, a plant drawn"
                  + " twice being two plants, and everything is estimated again; the standard error is"
                  + " the standard deviation over draws, the interval that between percentiles "
                  + cite.apply(new Source[] {Source.DAVISON})
                  + ". Intervals corrected for bias, and for bias and skewness, stand beside it "
                  + cite.apply(new Source[] {Source.EFRON})
                  + ". Where a level of plants is asked for, the plants stay those of the records and"
                  + " their own mean error is added. Where more than one draw in ten has no value, no"
                  + " interval is given."));
    }
    if (fits.stream().anyMatch(fit -> !fit.robustness().wild().isEmpty())) {
      points.add(
          Text.of(
              "Tests by the wild cluster bootstrap with the null imposed "
                  + cite.apply(new Source[] {Source.CAMERON_BOOTSTRAP})
                  + ", with six-point weights where there are fewer than twelve plants "
                  + cite.apply(new Source[] {Source.WEBB})
                  + "."));
    }
    if (fits.stream()
        .map(Fitted::robustness)
        .map(RobustnessFindings::huber)
        .anyMatch(h -> h.isPresent())) {
      points.add(
          Text.of(
              "Cross-check by Huber’s M estimate, k = 1.345, scale by the median absolute residual over"
                  + " 0.6745 "
                  + cite.apply(new Source[] {Source.HUBER})
                  + "."));
    }
    return points;
  }
}
