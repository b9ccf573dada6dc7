package isowright.estimation;

import isowright.records.Panel;
import isowright.records.PeriodSteps;
import isowright.regression.Collinearity;
import isowright.regression.Design;
import isowright.regression.Differences;
import isowright.regression.Effects;
import isowright.regression.InstrumentedDesign;
import isowright.regression.InstrumentedFit;
import isowright.regression.LinearFit;
import isowright.regression.SelectedRows;
import isowright.regression.TwoStageLeastSquares;
import isowright.technology.LinearForm;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.LinkedHashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.stream.IntStream;

/**
 * Fits a form that is linear in its parameters by two-stage least squares: on the rows as they are,
 * on what varies within plants, or on differences.
 *
 * <p>Used are the rows in which every instrument is known; a lag is unknown where the plant has no
 * row that many periods earlier. The technology, plants' levels and residuals speak of all rows.
 * Instruments of a form with second-order terms are those of {@link FormInstruments}. Checked
 * against R in {@code InstrumentsTest}.
 */
final class InstrumentedEstimation {

  private final Panel panel;
  private final Specification specification;
  private final double[] base;
  private final LinearForm form;
  private final Estimator.Instruments instruments;
  private final Map<Integer, List<SeriesColumn>> byInput = new LinkedHashMap<>();
  private final List<String> lacking = new ArrayList<>();

  InstrumentedEstimation(
      Panel panel,
      Specification specification,
      double[] base,
      LinearForm form,
      Estimator.Instruments instruments) {
    this.panel = panel;
    this.specification = specification;
    this.base = base;
    this.form = form;
    this.instruments = instruments;
  }

  /** The same rows by least squares, every input taken as it is. */
  Fit leastSquares() {
    return fit(true);
  }

  Fit fit() {
    return fit(false);
  }

  private Fit fit(boolean allExogenous) {
    read();
    if (!lacking.isEmpty()) {
      return refused(lacking);
    }
    boolean[] known = known();
    int[] used = used(known);
    if (used.length == 0) {
      return refused(List.of(nothingKnown()));
    }
    Circumstances circumstances = Circumstances.of(panel, specification.time());
    PanelRows rows = PanelRows.of(panel, base);
    boolean constant = specification.plantEffects().constant();
    LinearDesign own = new LinearDesign(rows, form, panel.inputs(), circumstances, constant);
    byInput.replaceAll((i, all) -> all.stream().map(s -> s.centred(used)).toList());
    FormInstruments columns = new FormInstruments(form, panel.inputs(), byInput);
    boolean[] held = held(own, used);
    Design wide = new DesignWithInstruments(own, rows, columns, held);
    Design treated = treated(wide, known, used);
    boolean[] endogenous =
        allExogenous ? new boolean[own.columns().size()] : endogenous(own, columns, constant);
    InstrumentedFit fit = TwoStageLeastSquares.fit(new InstrumentedDesign(treated, endogenous));
    List<String> reasons = reasons(fit, own, held);
    if (!reasons.isEmpty()) {
      return refused(reasons);
    }
    LinearFit whole = withoutHeld(fit.fit(), own, held);
    RowsUsed rowsUsed =
        treated instanceof Differences differences
            ? RowsUsed.differences(
                IntStream.range(0, differences.rows()).map(differences::end).toArray())
            : RowsUsed.some(used);
    PlantTreatment treatment =
        new PlantTreatment(
            fit.secondStage(),
            new Treatment(own, rowsUsed, Optional.empty(), new double[0], List.of()),
            List.of());
    return new LinearEstimation(panel, specification, base, form)
        .solved(
            treatment,
            whole,
            new Particulars.OfInstruments(
                fit,
                rows.times(rowsUsed),
                words(),
                panel.rows() - used.length,
                unknownPeriods(used)));
  }

  private Fit refused(List<String> reasons) {
    return Estimation.without(panel, specification, base, Fit.State.REFUSED, reasons);
  }

  private void read() {
    instruments
        .byInput()
        .forEach(
            (input, series) -> {
              List<SeriesColumn> all = new ArrayList<>();
              for (Series one : series) {
                SeriesColumn.of(panel, one, lacking).ifPresent(all::add);
              }
              byInput.put(panel.inputs().indexOf(input), all);
            });
  }

  private boolean[] known() {
    boolean[] known = new boolean[panel.rows()];
    Arrays.fill(known, true);
    byInput
        .values()
        .forEach(
            all ->
                all.forEach(
                    series -> {
                      for (int r = 0; r < known.length; r++) {
                        known[r] &= series.known(r);
                      }
                    }));
    return known;
  }

  /** The rows used; with differences the rows at either end of one. */
  private int[] used(boolean[] known) {
    if (specification.plantEffects() != Specification.PlantEffects.DIFFERENCES) {
      return IntStream.range(0, known.length).filter(r -> known[r]).toArray();
    }
    PeriodSteps steps = PeriodSteps.of(panel);
    Set<Integer> used = new LinkedHashSet<>();
    for (int r = 1; r < known.length; r++) {
      if (known[r] && known[r - 1] && steps.before(r, 1) == r - 1) {
        used.add(r - 1);
        used.add(r);
      }
    }
    return used.stream().mapToInt(Integer::intValue).toArray();
  }

  private String nothingKnown() {
    List<String> words = words();
    return "No row "
        + (specification.plantEffects() == Specification.PlantEffects.DIFFERENCES
            ? "and the row before it have"
            : "has")
        + " all instruments known ("
        + String.join(", ", words)
        + "). A lag is known only where the plant has a row that many periods earlier"
        + (panel.periods().size() == 1
            ? ", and the records have a single period (" + panel.periods().get(0) + ")"
            : "")
        + ". Use shorter lags or other columns, or add periods.";
  }

  private Design treated(Design wide, boolean[] known, int[] used) {
    return switch (specification.plantEffects()) {
      case WITHIN -> Effects.within(SelectedRows.of(wide, used));
      case DIFFERENCES -> {
        PeriodSteps steps = PeriodSteps.of(panel);
        yield Effects.differences(
            wide, r -> known[r] && known[r - 1] && steps.before(r, 1) == r - 1);
      }
      default -> SelectedRows.of(wide, used);
    };
  }

  /**
   * Constants of periods that have no row, and of the first that has one: nothing tells them apart.
   */
  private boolean[] held(LinearDesign own, int[] used) {
    boolean[] held = new boolean[own.columns().size()];
    if (!specification.time().byPeriod()) {
      return held;
    }
    boolean[] seen = seen(used);
    int first = 0;
    while (!seen[first]) {
      first++;
    }
    for (int p = 1; p < seen.length; p++) {
      if (!seen[p] || p == first) {
        held[own.columns().indexOf("period:" + panel.periods().get(p))] = true;
      }
    }
    return held;
  }

  private boolean[] seen(int[] used) {
    boolean[] seen = new boolean[panel.periods().size()];
    for (int row : used) {
      seen[panel.rowPeriods().get(row)] = true;
    }
    return seen;
  }

  private List<String> unknownPeriods(int[] used) {
    if (!specification.time().byPeriod()) {
      return List.of();
    }
    boolean[] seen = seen(used);
    return IntStream.range(0, seen.length)
        .filter(p -> !seen[p])
        .mapToObj(panel.periods()::get)
        .toList();
  }

  private static boolean[] endogenous(LinearDesign own, FormInstruments columns, boolean constant) {
    boolean[] all = new boolean[own.columns().size()];
    boolean[] ofForm = columns.endogenous();
    System.arraycopy(ofForm, 0, all, constant ? 1 : 0, ofForm.length);
    return all;
  }

  /** Why the fit has no answer, if it has none. */
  private List<String> reasons(InstrumentedFit fit, LinearDesign own, boolean[] held) {
    List<String> reasons = new ArrayList<>();
    LinearFit last = fit.fit();
    int parameters = fit.instrumentRank() + last.absorbed();
    if (last.rows() <= parameters) {
      reasons.add(
          last.rows()
              + (specification.plantEffects() == Specification.PlantEffects.DIFFERENCES
                  ? " differences"
                  : " rows")
              + " with all instruments known cannot carry "
              + parameters
              + " columns of the first stage"
              + (last.absorbed() > 0 ? " (plant effects among them)" : "")
              + ": add records, use fewer or shorter lags, or ask for a form with fewer"
              + " parameters.");
      return reasons;
    }
    List<Collinearity> untold =
        last.collinearities().stream()
            .filter(c -> !held[own.columns().indexOf(c.column())])
            .toList();
    if (!untold.isEmpty()) {
      reasons.add(notIdentified(fit, untold));
    }
    return reasons;
  }

  private String notIdentified(InstrumentedFit fit, List<Collinearity> untold) {
    List<String> redundant =
        fit.redundant().stream()
            .filter(c -> c.among().equals(List.of(Collinearity.GROUP_EFFECTS)))
            .map(Collinearity::column)
            .toList();
    return "The instruments ("
        + String.join(", ", words())
        + ") do not move "
        + String.join(", ", fit.endogenous())
        + " apart from the other columns: "
        + String.join("; ", untold.stream().map(Collinearity::words).toList())
            .replace("group effects", "plant effects")
            .replace("within groups", "within plants")
        + " once each is replaced by what the instruments say of it."
        + (redundant.isEmpty()
            ? ""
            : " Plant effects take up " + String.join(", ", redundant) + ".")
        + " Name more instruments, or instruments that vary where the input does.";
  }

  /** The fit without the complaint that columns held at zero are zero. */
  private static LinearFit withoutHeld(LinearFit fit, LinearDesign own, boolean[] held) {
    return new LinearFit(
        fit.columns(),
        fit.coefficients(),
        fit.estimated(),
        fit.inverseFactor(),
        fit.ssr(),
        fit.totalSumOfSquares(),
        fit.rows(),
        fit.absorbed(),
        fit.rank(),
        fit.collinearities().stream()
            .filter(c -> !held[own.columns().indexOf(c.column())])
            .toList(),
        fit.rankRule(),
        fit.pivots());
  }

  /** Every series as it enters. */
  private List<String> words() {
    Set<String> words = new LinkedHashSet<>();
    byInput.values().forEach(all -> all.forEach(series -> words.add(series.entering())));
    return List.copyOf(words);
  }
}
