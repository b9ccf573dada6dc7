package isowright.study;

import isowright.cost.CostForm;
import isowright.estimation.CostData;
import isowright.estimation.CostEstimation;
import isowright.estimation.CostFit;
import isowright.estimation.CostSpecification;
import isowright.estimation.CostSpecification.Concavity;
import isowright.estimation.CostSpecification.Equations;
import isowright.estimation.Specification.PlantEffects;
import isowright.estimation.Specification.StandardErrors;
import isowright.estimation.Unfit;
import isowright.inference.CostHypotheses;
import isowright.records.Panel;
import isowright.regression.Collinearity;
import isowright.study.Findings.Said;
import isowright.study.FitFindings.Tested;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;

/** Fits the cost functions of a study and says what was found of them. */
final class CostStage {

  /**
   * Estimates that differ by more than this between choices of the share equation left out differ
   * for want of shares that add up, not for rounding.
   */
  private static final double LEFT_OUT = 1e-6;

  private final Study study;
  private final Costs asked;
  private final Panel panel;
  private final CostData data;
  private final List<Said> records = new ArrayList<>();
  private final List<CostFit> usable = new ArrayList<>();
  private final Optional<String> zeros;

  CostStage(Study study, Costs asked, Panel panel) throws Unfit {
    this.study = study;
    this.asked = asked;
    this.panel = panel;
    CostRecords made = CostAudit.records(study, asked, panel);
    this.data = made.data();
    refuse(made);
    records.addAll(made.addingUp(data));
    this.zeros = made.zeros(data);
  }

  private void refuse(CostRecords made) throws Unfit {
    List<String> reasons = CostAudit.reasons(made, data);
    if (!reasons.isEmpty()) {
      throw new Unfit(reasons);
    }
  }

  /** The answers of the cost functions fitted to the least-cost questions; after the findings. */
  List<PlanFindings.Planned> plans() {
    return new CostPlans(study, asked, panel, data).plans(usable);
  }

  /** The review of filed costs against the cost functions fitted; after the findings. */
  ReviewStage.Review review() {
    return CostReviewStage.of(study, asked, panel, data, usable);
  }

  CostFindings findings() {
    List<CostFindings.Fitted> fitted = new ArrayList<>();
    for (CostForm form : asked.forms()) {
      fitted.add(fitted(form));
    }
    return new CostFindings(fitted, records, List.of());
  }

  /** McFadden cost is concave unless stated otherwise: that is what it is for. */
  private Concavity concavity(CostForm form) {
    return switch (form) {
      case MCFADDEN -> asked.concavity().orElse(Concavity.EVERYWHERE);
      case TRANSLOG -> asked.concavity().orElse(Concavity.FREE);
      default -> Concavity.FREE;
    };
  }

  private CostSpecification specification(CostForm form) {
    boolean clustered =
        study
            .estimation()
            .standardErrors()
            .map(kind -> kind == StandardErrors.CLUSTERED)
            .orElse(panel.plants().size() < panel.rows());
    return new CostSpecification(
        form,
        form.inLevels().isPresent() ? Equations.QUANTITIES : asked.equations(),
        true,
        asked.restrictions(),
        study.estimation().plantEffects() == PlantEffects.WITHIN,
        clustered,
        data.arguments().inputs().size() - 1,
        study.estimation().confidence(),
        concavity(form));
  }

  /** A form in logs that outputs of zero keep from being fitted. */
  private CostFindings.Fitted refused(CostForm form, String where) {
    CostSpecification how = specification(form);
    Said reason =
        Said.of(
            "error",
            "zero-output",
            "It takes logs of outputs, which zeros do not have ("
                + where
                + "), and no small number may stand for them: what a product costs alone would be"
                + " made up. Ask for generalised-leontief-cost or mcfadden-cost, which carry zeros,"
                + " or set these rows aside.");
    return unfitted(
        form, how(how, "", 0, Double.NaN, 0, Optional.empty()), "refused", List.of(reason));
  }

  private static CostFindings.Fitted unfitted(
      CostForm form, CostFindings.How how, String state, List<Said> remarks) {
    return new CostFindings.Fitted(
        form.word(),
        how,
        state,
        List.of(),
        new double[0][],
        Optional.empty(),
        List.of(),
        Optional.empty(),
        Optional.empty(),
        List.of(),
        CostRows.NONE,
        remarks);
  }

  private CostFindings.Fitted fitted(CostForm form) {
    if (form.inLevels().isEmpty() && zeros.isPresent()) {
      return refused(form, zeros.get());
    }
    CostFit fit = CostEstimation.fit(data, specification(form));
    List<Said> remarks = new ArrayList<>();
    String state = state(fit, remarks);
    if (!state.equals("estimated")) {
      return unfitted(form, how(fit), state, remarks);
    }
    usable.add(fit);
    CostFigures figures = new CostFigures(data, fit);
    CostFindings.Regular regular = figures.regularity();
    remark(fit, regular, remarks);
    return new CostFindings.Fitted(
        form.word(),
        how(fit),
        state,
        figures.parameters(),
        fit.covariance(),
        Optional.of(figures.atMean().with(new ScopeFigures(data, fit, figures).together())),
        figures.scale(panel),
        figures.efficient(),
        Optional.of(regular),
        CostHypotheses.of(data, fit).stream().map(CostStage::tested).toList(),
        figures.rows(panel),
        remarks);
  }

  private static Tested tested(isowright.inference.Verdict verdict) {
    return new Tested(
        verdict.name(),
        verdict.nullHypothesis(),
        verdict.statistic(),
        verdict.law().name(),
        verdict.law().degreesOfFreedom(),
        verdict.p(),
        verdict.sentence());
  }

  private static String state(CostFit fit, List<Said> remarks) {
    if (!fit.collinearities().isEmpty()) {
      for (Collinearity collinearity : fit.collinearities()) {
        remarks.add(
            Said.of(
                "error",
                "rank-deficient",
                "The records cannot tell "
                    + collinearity.words()
                    + "; ask for a form with fewer terms, or give records in which they move"
                    + " apart."));
      }
      return "rank-deficient";
    }
    if (!fit.system().converged()) {
      remarks.add(
          Said.of(
              "error",
              "not-converged",
              "The equations did not settle after "
                  + fit.system().iterations()
                  + " renewals: the errors of one equation may be determined by the others. Check"
                  + " the shares, or fit fewer equations."));
      return "not-converged";
    }
    return "estimated";
  }

  private void remark(CostFit fit, CostFindings.Regular regular, List<Said> remarks) {
    double dependence = CostEstimation.dependenceOnLeftOut(data, fit);
    if (dependence > LEFT_OUT) {
      remarks.add(
          Said.of(
              "warning",
              "depends-on-share-left-out",
              String.format(
                  Locale.ROOT,
                  "Estimates depend on which share equation is left out, by up to %.2g: where"
                      + " shares add up to one they would not. Correct the shares that do not add"
                      + " up.",
                  dependence)));
    }
    if (regular.both() < regular.rows()) {
      remarks.add(
          Said.of(
              "warning",
              "irregular-rows",
              String.format(
                  Locale.ROOT,
                  "Not a cost function at %d of %d rows (rising in prices and outputs at %d,"
                      + " concave in prices at %d): elasticities and plans there are no economics."
                      + remedy(fit, regular),
                  regular.rows() - regular.both(),
                  regular.rows(),
                  regular.monotone(),
                  regular.concave())));
    }
    fit.imposed().ifPresent(imposed -> remarks.add(concave(fit, imposed)));
    if (fit.specification().clustered() && panel.plants().size() < FEW_CLUSTERS) {
      remarks.add(
          Said.of(
              "warning",
              "few-clusters",
              "Standard errors are clustered over only "
                  + panel.plants().size()
                  + " plants; below about "
                  + FEW_CLUSTERS
                  + " such intervals tend to be too narrow."));
    }
  }

  private static String remedy(CostFit fit, CostFindings.Regular regular) {
    boolean bent = regular.concave() < regular.rows() && fit.imposed().isEmpty();
    return bent && fit.specification().form() == CostForm.TRANSLOG
        ? " `concavity: at-mean` under `costs` makes it concave at the mean of the records."
        : bent && fit.specification().form() == CostForm.GENERALISED_LEONTIEF
            ? " mcfadden-cost can be made concave at all prices."
            : "";
  }

  private static Said concave(CostFit fit, CostFit.Imposed imposed) {
    String where =
        fit.specification().concavity() == Concavity.AT_MEAN
                && fit.specification().form() == CostForm.TRANSLOG
            ? "at the mean of the records"
            : "at all prices";
    double lost = imposed.logLikelihood() - fit.system().logLikelihood();
    return Said.of(
        imposed.bound() > 0 ? "warning" : "note",
        "concavity-imposed",
        String.format(
            Locale.ROOT,
            imposed.bound() > 0
                ? "Cost was made concave %s, against what the records would have: the"
                    + " logarithm of likelihood falls by %.4g, and the fit is at the edge of what"
                    + " is concave, so that standard errors are those given the edge."
                : "Cost was made concave %s; the records have it so themselves (the"
                    + " logarithm of likelihood falls by %.2g).",
            where,
            Math.max(0, lost)));
  }

  /** Below this many clusters, intervals are known to be too narrow (Cameron and Miller 2015). */
  private static final int FEW_CLUSTERS = 30;

  private CostFindings.How how(CostFit fit) {
    Optional<CostFindings.Concave> concave =
        fit.imposed()
            .map(
                imposed ->
                    new CostFindings.Concave(
                        fit.specification().concavity().word(),
                        imposed.logLikelihood(),
                        imposed.bound() > 0));
    return how(
        fit.specification(),
        fit.covarianceWords().replace("by group", "by plant"),
        fit.degreesOfFreedom(),
        fit.system().logLikelihood(),
        fit.system().iterations(),
        concave);
  }

  private CostFindings.How how(
      CostSpecification how,
      String words,
      double degreesOfFreedom,
      double logLikelihood,
      int iterations,
      Optional<CostFindings.Concave> concave) {
    Map<String, Double> base = new LinkedHashMap<>();
    if (study.estimation().scaled()) {
      double[] values = data.arguments().base();
      for (int k = 0; k < values.length; k++) {
        base.put(data.arguments().names().get(k), values[k]);
      }
    }
    boolean within = how.plantEffects() && how.equations() != Equations.SHARES;
    return new CostFindings.How(
        how.equations().word(),
        how.restrictions().stream().map(CostSpecification.Restriction::word).toList(),
        within ? PlantEffects.WITHIN.word() : PlantEffects.NONE.word(),
        words,
        degreesOfFreedom,
        base,
        data.rows(),
        panel.plants().size(),
        logLikelihood,
        iterations,
        concave);
  }
}
