package isowright.study;

import isowright.estimation.Estimator;
import isowright.estimation.Fit;
import isowright.inference.Estimate;
import isowright.inference.Inefficiency;
import isowright.records.Panel;
import isowright.regression.ComposedFit;
import isowright.study.Findings.Said;
import isowright.study.FrontierFindings.Plant;
import isowright.study.FrontierFindings.Row;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;

/** Turns what a frontier found into findings and remarks. */
final class FrontierStage {

  /** Rows kept, as of fitted points: more cannot be told apart on a page. */
  private static final int ROWS = 2000;

  private final Fit fit;
  private final Panel panel;
  private final Estimator.Frontier asked;
  private final ComposedFit found;
  private final double level;

  private FrontierStage(Fit fit, Estimator.Frontier asked, ComposedFit found) {
    this.fit = fit;
    this.panel = fit.panel();
    this.asked = asked;
    this.found = found;
    this.level = fit.specification().confidence();
  }

  private static Optional<FrontierStage> stage(Fit fit) {
    if (!fit.state().usable()
        || !(fit.specification().estimator() instanceof Estimator.Frontier asked)) {
      return Optional.empty();
    }
    return fit.numbers().frontier().map(own -> new FrontierStage(fit, asked, own.fit()));
  }

  /** Of a usable fit; absent where it is no frontier. */
  static Optional<FrontierFindings> findings(Fit fit) {
    return stage(fit).map(FrontierStage::findings);
  }

  /** What must be said of a fit because it is a frontier. */
  static List<Said> remarks(Fit fit) {
    return stage(fit).map(FrontierStage::remarks).orElse(List.of());
  }

  private FrontierFindings findings() {
    Inefficiency inefficiency = Inefficiency.of(fit).orElseThrow();
    List<Plant> plants = inefficiency.known().map(known -> plants(inefficiency)).orElse(List.of());
    return new FrontierFindings(
        asked.lawWord(),
        asked.overTime().word(),
        state(),
        words() + inefficiency.variances().map(v -> amount(v) + told(plants)).orElse(""),
        found.skewness(),
        inefficiency.variances().map(FrontierStage::variances),
        plants,
        inefficiency.known().map(known -> rows(inefficiency)).orElse(List.of()),
        inefficiency.byEffects().map(by -> panel.plants().get(by.best())));
  }

  private static FrontierFindings.Variances variances(Inefficiency.Variances v) {
    return new FrontierFindings.Variances(
        FitStage.figure(v.noise()),
        FitStage.figure(v.inefficiency()),
        FitStage.figure(v.ratio()),
        FitStage.figure(v.gamma()),
        FitStage.figure(v.share()),
        FitStage.figure(v.mean()),
        v.decay().map(FitStage::figure));
  }

  private String state() {
    return switch (found.state()) {
      case WRONG_SKEW -> "wrong-skew";
      case NONE_FOUND -> "none-found";
      default -> "found";
    };
  }

  private String words() {
    return switch (found.state()) {
      case WRONG_SKEW ->
          String.format(
              Locale.ROOT,
              "The residuals of least squares are skewed to the right (%.3f), where inefficiency"
                  + " would skew them to the left. Maximum likelihood then finds no inefficiency:"
                  + " the frontier is the least-squares technology, and no plant's inefficiency is"
                  + " reported. That happens by chance in small samples even where there is some;"
                  + " it is no evidence that there is none.",
              found.skewness());
      case NONE_FOUND ->
          "No inefficiency of any size raises the likelihood above that of least squares (gamma at"
              + " 0, its bound): the frontier is the least-squares technology, and no plant's"
              + " inefficiency is reported.";
      default ->
          "Inefficiency was estimated"
              + switch (asked.overTime()) {
                case EACH_ROW -> ", each row having its own, independent of every other.";
                case CONSTANT -> ", a plant having the same in all its periods.";
                case DECAY ->
                    ", that of a plant changing at one rate common to all plants, forward and back"
                        + " from the last period of the records.";
              };
    };
  }

  /** What mean inefficiency makes of output, and how much of the variance it takes. */
  private static String amount(Inefficiency.Variances v) {
    return String.format(
        Locale.ROOT,
        " At the same inputs the typical plant makes %s %% less output than the frontier (%s to"
            + " %s); inefficiency takes %s %% of the variance that the technology leaves (%s to"
            + " %s).",
        percent(-Math.expm1(-v.mean().value())),
        percent(-Math.expm1(-v.mean().low())),
        percent(-Math.expm1(-v.mean().high())),
        percent(v.share().value()),
        percent(v.share().low()),
        percent(v.share().high()));
  }

  private static String percent(double share) {
    return String.format(Locale.ROOT, "%.1f", 100 * share);
  }

  /** Of how many plants it can be said on which side of the mean they lie. */
  private String told(List<Plant> plants) {
    long above = plants.stream().filter(p -> p.last().aboveMean() >= level).count();
    long below = plants.stream().filter(p -> p.last().aboveMean() <= 1 - level).count();
    return String.format(
        Locale.ROOT,
        " With a probability of at least %s %%, %d of %d %s less"
            + " inefficiency than that mean and %d more; of the other %d it cannot be said.",
        percent(level).replace(".0", ""),
        below,
        plants.size(),
        plants.size() == 1 ? "plant has" : "plants have",
        above,
        plants.size() - below - above);
  }

  private List<Plant> plants(Inefficiency inefficiency) {
    List<Plant> plants = new ArrayList<>();
    for (int p = 0; p < panel.plants().size(); p++) {
      int at = p;
      Optional<Figure> byEffects =
          inefficiency.byEffects().map(by -> FitStage.figure(by.plants().get(at)));
      plants.add(new Plant(row(inefficiency, panel.plantEnd(p) - 1), byEffects));
    }
    return plants;
  }

  /** None where each plant has the same in all its rows. */
  private List<Row> rows(Inefficiency inefficiency) {
    List<Row> rows = new ArrayList<>();
    if (asked.overTime() == Estimator.OverTime.CONSTANT || !panel.repeats()) {
      return rows;
    }
    int step = Math.max(1, (panel.rows() + ROWS - 1) / ROWS);
    for (int r = 0; r < panel.rows(); r += step) {
      rows.add(row(inefficiency, r));
    }
    return rows;
  }

  /** The mean it is held against is that of the row's own period. */
  private Row row(Inefficiency inefficiency, int row) {
    int period = panel.rowPeriods().get(row);
    int last = panel.periods().size() - 1;
    double since = panel.periodNumbers().get(period) - panel.periodNumbers().get(last);
    double mean = inefficiency.mean() * Math.exp(-found.decay() * since);
    return new Row(
        panel.fileRows().get(row),
        panel.plants().get(panel.plantOf(row)),
        panel.periods().get(period),
        figure(inefficiency.ofRow(row, level)),
        figure(inefficiency.efficiency(row, level)),
        inefficiency.probabilityAbove(row, mean));
  }

  private static Figure figure(Estimate estimate) {
    return Figure.estimated(
        estimate.value(),
        estimate.standardError(),
        estimate.low(),
        estimate.high(),
        estimate.method().word());
  }

  private static Said weak(Inefficiency.Variances v) {
    return Said.of(
        "warning",
        "inefficiency-weak",
        "The records hardly tell inefficiency from noise: "
            + (v.inefficiency().low() == 0
                ? "none at all is among the values they do not speak against"
                : "its size is known within wide bounds only")
            + ". Its intervals are read off the profile of the likelihood, and what is said of"
            + " single plants rests on the assumed law more than on the records.");
  }

  private List<Said> remarks() {
    List<Said> remarks = new ArrayList<>();
    if (!found.state().oneSided()) {
      remarks.add(Said.of("warning", state(), words()));
    } else {
      Inefficiency.variances(fit)
          .filter(v -> !Inefficiency.quadratic(v))
          .ifPresent(v -> remarks.add(weak(v)));
      remarks.add(
          Said.of(
              "note",
              "inefficiency-is-what-records-lack",
              "Inefficiency measured here includes whatever lowers output and is not in the"
                  + " records: quality, site, age of plant, safe staffing, duties of supply. It is"
                  + " not the same as waste. Its law ("
                  + asked.lawWord()
                  + ") was assumed and not found in the records."));
      remarks.add(
          Said.of(
              "note",
              "influence-about-typical",
              "The influence of single rows is measured as that on least squares about the typical"
                  + " plant; maximum likelihood has no such figures in closed form."));
      if (asked.overTime() == Estimator.OverTime.EACH_ROW && panel.repeats()) {
        remarks.add(
            Said.of(
                "note",
                "inefficiency-each-row",
                "Each row has an inefficiency of its own, so what lasts in a plant is not told from"
                    + " what comes and goes; `over-time: constant` or `decay` under"
                    + " `estimation.frontier` gives each plant one."));
      }
    }
    return remarks;
  }
}
