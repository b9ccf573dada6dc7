package isowright.study;

import isowright.estimation.Fit;
import isowright.estimation.RowsUsed;
import isowright.estimation.Solution;
import isowright.estimation.Specification;
import isowright.estimation.Treatment;
import isowright.inference.Estimate;
import isowright.inference.TechnicalChange;
import isowright.records.Panel;
import isowright.regression.VarianceComponents;
import isowright.study.Findings.Said;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;

/** Turns what a fit found about plants and time into findings and remarks. */
final class PanelStage {

  private final Fit fit;
  private final Panel panel;

  PanelStage(Fit fit) {
    this.fit = fit;
    this.panel = fit.panel();
  }

  PanelFindings findings() {
    RowsUsed used = fit.numbers().treatment().rows();
    return new PanelFindings(
        used.count(),
        observed(used.kind()),
        components(),
        TechnicalChange.of(fit).map(this::change));
  }

  private static String observed(RowsUsed.Kind kind) {
    return switch (kind) {
      case EACH -> "rows";
      case PLANT_MEANS -> "plant-means";
      case DIFFERENCES -> "differences";
    };
  }

  private Optional<PanelFindings.Components> components() {
    return fit.numbers()
        .treatment()
        .components()
        .map(
            c -> {
              int least = Integer.MAX_VALUE;
              int most = 0;
              for (int p = 0; p < panel.plants().size(); p++) {
                int size = panel.plantEnd(p) - panel.plantStart(p);
                least = Math.min(least, size);
                most = Math.max(most, size);
              }
              return new PanelFindings.Components(
                  c.method().word(),
                  c.row(),
                  c.group(),
                  c.share(least),
                  c.share(most),
                  c.truncated());
            });
  }

  private PanelFindings.Change change(TechnicalChange change) {
    List<PanelFindings.Rate> rates =
        change.rates().stream()
            .map(
                rate ->
                    new PanelFindings.Rate(
                        rate.place().word(), when(rate.place()), FitStage.figure(rate.percent())))
            .toList();
    List<PanelFindings.Bias> biases =
        change.biases().stream()
            .map(
                bias ->
                    new PanelFindings.Bias(
                        bias.input(), FitStage.figure(bias.points()), verdict(bias.points())))
            .toList();
    return new PanelFindings.Change(change.unit(), rates, biases, words(change));
  }

  private String when(TechnicalChange.Place place) {
    List<String> periods = panel.periods();
    String last = periods.get(periods.size() - 1);
    return switch (place) {
      case MEAN -> "at the mean of the records";
      case LAST -> "in " + last + ", at the mean inputs of that period";
      case AVERAGE -> "on average from " + periods.get(0) + " to " + last;
      case LATEST -> "from " + periods.get(periods.size() - 2) + " to " + last;
    };
  }

  private static String verdict(Estimate points) {
    if (points.low() > 0) {
      return "uses";
    }
    return points.high() < 0 ? "saves" : "not-told-apart";
  }

  private static String words(TechnicalChange change) {
    Estimate percent = change.rates().get(0).percent();
    String sense;
    if (percent.low() > 0) {
      sense = "At the same inputs output grows over time.";
    } else if (percent.high() < 0) {
      sense = "At the same inputs output shrinks over time.";
    } else {
      sense = "Whether output grows or shrinks over time at the same inputs cannot be said.";
    }
    if (change.biases().isEmpty()) {
      return sense;
    }
    List<String> used = new ArrayList<>();
    List<String> saved = new ArrayList<>();
    for (TechnicalChange.Bias bias : change.biases()) {
      switch (verdict(bias.points())) {
        case "uses" -> used.add(bias.input());
        case "saves" -> saved.add(bias.input());
        default -> {}
      }
    }
    if (used.isEmpty() && saved.isEmpty()) {
      return sense + " Which input the change uses or saves cannot be said.";
    }
    return sense
        + (used.isEmpty()
            ? ""
            : " It uses " + String.join(", ", used) + ": the share in cost rises at a given mix.")
        + (saved.isEmpty()
            ? ""
            : " It saves "
                + String.join(", ", saved)
                + ": the share in cost falls at a given mix.");
  }

  /** What must be said of the fit because of what was done about plants and time. */
  List<Said> remarks() {
    List<Said> remarks = new ArrayList<>();
    Solution numbers = fit.numbers();
    Treatment treatment = numbers.treatment();
    treatment
        .components()
        .filter(VarianceComponents::truncated)
        .ifPresent(c -> remarks.add(zero()));
    if (!treatment.leftOut().isEmpty()) {
      remarks.add(
          Said.of(
              "note",
              "plant-means-left-out",
              "No plant mean was added for "
                  + String.join(", ", treatment.leftOut())
                  + ": the records cannot tell it from what is there already."));
    }
    if (treatment.rows().kind() == RowsUsed.Kind.DIFFERENCES) {
      remarks.add(differences(treatment.rows()));
    }
    if (treatment.rows().kind() == RowsUsed.Kind.PLANT_MEANS) {
      remarks.add(
          Said.of(
              "note",
              "plant-means",
              "The regression is on one mean a plant ("
                  + treatment.rows().count()
                  + "), each counting once. What lasts in a plant stays in it, so inputs are credited"
                  + " with lasting productivity that moves with them."));
    }
    if (fit.specification().time() == Specification.Time.BIASED_TREND) {
      remarks.add(
          Said.of(
              "note",
              "elasticities-at-last-period",
              "The trend changes output elasticities: those shown are of the last period, "
                  + panel.periods().get(panel.periods().size() - 1)
                  + ", while the coefficients are of the first, "
                  + panel.periods().get(0)
                  + ". Regularity is examined at each row's own period."));
    }
    return remarks;
  }

  private static Said zero() {
    return Said.of(
        "warning",
        "no-plant-variance",
        "The variance between plants comes out negative and was set to zero, its bound: random effects"
            + " are then the same as one constant for all plants.");
  }

  private Said differences(RowsUsed rows) {
    int possible = panel.rows() - panel.plants().size();
    int gaps = possible - rows.count();
    return Said.of(
        "note",
        "differences",
        String.format(
            Locale.ROOT,
            "The regression is on %,d differences of successive periods%s. R², log-likelihood, AIC and"
                + " BIC are those of differences and not to be held against fits of levels.",
            rows.count(),
            gaps > 0
                ? String.format(
                    Locale.ROOT, "; none was taken across the %,d gaps in plants' periods", gaps)
                : ""));
  }
}
