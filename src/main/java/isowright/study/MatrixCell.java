package isowright.study;

import isowright.estimation.Estimation;
import isowright.estimation.Estimator;
import isowright.estimation.Fit;
import isowright.estimation.RowsUsed;
import isowright.estimation.Specification;
import isowright.estimation.Specification.PlantEffects;
import isowright.estimation.Specification.StandardErrors;
import isowright.estimation.Specification.Time;
import isowright.inference.Intervals;
import isowright.inference.SpecificationTests;
import isowright.inference.Verdict;
import isowright.records.Panel;
import isowright.regression.FitStatistics;
import isowright.study.Matrix.Criterion;
import isowright.study.MatrixFindings.Cell;
import isowright.study.MatrixFindings.Criteria;
import isowright.technology.LinearForm;
import isowright.technology.Regularity;
import java.util.Arrays;
import java.util.EnumMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;

/**
 * One combination of a specification matrix, fitted as a study of its own would fit it.
 *
 * @param technology the form
 * @param effects the treatment of plants
 * @param time the treatment of time
 * @param errors the kind of standard errors
 * @param sample the name of the sample
 * @param panel its records, shared with every other combination of the sample
 * @param asAsked whether it is a fit of the study itself
 */
record MatrixCell(
    String technology,
    PlantEffects effects,
    Time time,
    StandardErrors errors,
    String sample,
    Panel panel,
    boolean asAsked) {

  /**
   * What was found of a combination; the fit itself is not kept, for a matrix has many.
   *
   * @param cell what was found
   * @param faults why it does not meet a criterion, by the criterion
   * @param gaps the gap of each filing as a share of what was filed, in order; empty where nothing
   *     is reviewed
   */
  record Found(Cell cell, Map<Criterion, String> faults, List<Double> gaps) {}

  /** Forms that are searched for take longest. */
  boolean searched(Study study) {
    return !(study.estimation().held().form(technology, panel.inputs()) instanceof LinearForm);
  }

  Found found(Study study, MatrixHeadlines headlines, List<Criterion> chooseBy) {
    Specification how =
        new FitStage(panel, study).specification(technology).with(effects, time, errors);
    Fit fit = Estimation.fit(panel, how);
    if (!fit.state().usable()) {
      return new Found(
          cell(fit, 0, Optional.empty(), Optional.empty(), Map.of(), Map.of()),
          Map.of(),
          List.of());
    }
    Map<String, Figure> figures = new LinkedHashMap<>();
    Map<String, String> without = new LinkedHashMap<>();
    ElasticityFindings elasticities =
        new ElasticityFindings(fit, Intervals.of(fit.typical(), how.confidence()));
    figures.put(MatrixFindings.SCALE, elasticities.scale());
    figures.put(MatrixFindings.SUBSTITUTION, elasticities.meanSubstitution());
    headlines.cost(fit, figures, without);
    double[] gaps = headlines.gap(fit, figures, without);
    FitStatistics statistics = fit.numbers().statistics();
    Criteria criteria =
        new Criteria(
            response(fit),
            statistics.parameters(),
            statistics.logLikelihood(),
            statistics.aic(),
            statistics.bic());
    Cell cell =
        cell(
            fit,
            fit.numbers().linear().rows(),
            Optional.of(criteria),
            Optional.of(RegularityFindings.of(fit)),
            figures,
            without);
    Map<Criterion, String> faults = new EnumMap<>(Criterion.class);
    for (Criterion criterion : chooseBy) {
      fault(criterion, cell, fit).ifPresent(fault -> faults.put(criterion, fault));
    }
    return new Found(cell, faults, Arrays.stream(gaps).boxed().toList());
  }

  private static Optional<String> fault(Criterion criterion, Cell cell, Fit fit) {
    return switch (criterion) {
      case REGULAR_EVERYWHERE -> irregularRows(cell.regular().orElseThrow());
      case REGULAR_AT_MEAN ->
          Regularity.at(fit.typical().technology(), fit.meanLogInputs()).regular()
              ? Optional.empty()
              : Optional.of("not regular at the geometric mean");
      case RESET -> rejected(fit);
      case BIC, AIC -> Optional.empty();
    };
  }

  private static Optional<String> irregularRows(FitFindings.Regular regular) {
    int rows = regular.rows() - regular.both();
    return rows == 0
        ? Optional.empty()
        : Optional.of("not regular at " + rows + " of " + regular.rows() + " rows");
  }

  private static Optional<String> rejected(Fit fit) {
    return SpecificationTests.of(fit).stream()
        .filter(v -> v.name().equals("reset"))
        .map(Verdict::p)
        .filter(p -> p < 1 - fit.specification().confidence())
        .map(p -> String.format(Locale.ROOT, "RESET rejects the form (p = %.3g)", p))
        .findFirst();
  }

  private static String response(Fit fit) {
    Estimator estimator = fit.specification().estimator();
    if (!(estimator instanceof Estimator.LeastSquares || estimator instanceof Estimator.Frontier)) {
      return "no likelihood";
    }
    RowsUsed.Kind kind = fit.numbers().treatment().rows().kind();
    return switch (kind) {
      case EACH -> "rows";
      case PLANT_MEANS -> "plant means";
      case DIFFERENCES -> "differences";
    };
  }

  private Cell cell(
      Fit fit,
      int rows,
      Optional<Criteria> criteria,
      Optional<FitFindings.Regular> regular,
      Map<String, Figure> figures,
      Map<String, String> without) {
    return new Cell(
        technology,
        effects.word(),
        time.word(),
        errors.word(),
        sample,
        fit.state().word(),
        fit.reasons(),
        rows,
        criteria,
        regular,
        figures,
        without,
        asAsked,
        "");
  }
}
