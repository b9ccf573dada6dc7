package isowright.study;

import isowright.cost.CostForm;
import isowright.records.Column;
import isowright.records.KeptPart;
import isowright.records.Nearest;
import isowright.records.Panel;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.BitSet;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.TreeSet;
import java.util.function.IntPredicate;
import java.util.stream.Collectors;
import java.util.stream.IntStream;
import java.util.stream.Stream;

/**
 * Checks what a study asks of its records: plants, periods and prices that they do not hold; and
 * goals that no technology taken as known can achieve.
 */
final class Demands {

  /** So many rows are named. */
  private static final int NAMED = 10;

  private final Study study;
  private final Optional<Panel> panel;
  private final List<Mistake> mistakes = new ArrayList<>();

  private Demands(Study study, Optional<Panel> panel) {
    this.study = study;
    this.panel = panel;
  }

  /** What the records do not hold. */
  static List<Mistake> mistakes(Study study, Optional<Panel> panel) {
    Demands demands = new Demands(study, panel);
    demands.all();
    return demands.mistakes;
  }

  static void check(Study study, Optional<Panel> panel) throws StudyRefused {
    Demands demands = new Demands(study, panel);
    demands.all();
    if (demands.mistakes.isEmpty()) {
      demands.mistakes.addAll(new OutOfReach(study, panel).mistakes());
    }
    if (!demands.mistakes.isEmpty()) {
      throw new StudyRefused(study.file(), KeyPlaces.of(study.file()).located(demands.mistakes));
    }
  }

  private void all() {
    for (Study.LeastCostQuestion asked : study.leastCost()) {
      leastCost("least-cost[" + asked.terms().place() + "]", asked);
    }
    study.filing().ifPresent(this::filing);
    study.protocol().matrix().ifPresent(this::matrix);
  }

  /** The mean price of an input in the last period in which any is recorded. */
  static double meanPrice(Panel panel, int input) {
    Column prices = panel.prices().get(input).orElseThrow();
    for (int period = panel.periods().size() - 1; period >= 0; period--) {
      double sum = 0;
      int count = 0;
      for (int r = 0; r < panel.rows(); r++) {
        if (panel.rowPeriods().get(r) == period && Double.isFinite(prices.get(r))) {
          sum += prices.get(r);
          count++;
        }
      }
      if (count > 0) {
        return sum / count;
      }
    }
    return Double.NaN;
  }

  private void leastCost(String key, Study.LeastCostQuestion asked) {
    List<PlanTerms.Plant> plants = asked.terms().across();
    boolean asksPrices =
        plants.isEmpty() || plants.stream().anyMatch(plant -> plant.prices().isEmpty());
    for (int i = 0; i < study.inputs().size() && asksPrices; i++) {
      String input = study.inputs().get(i);
      boolean stated =
          asked.prices().containsKey(input) || asked.terms().bands().containsKey(input);
      if (!stated && !priced(i)) {
        mistake(
            key + ".prices",
            "no price of "
                + input
                + " is stated and the records hold none; state one, or name a price or spending"
                + " column under inputs");
      }
    }
    costFunctions(key, asked);
    asked.period().ifPresent(period -> period(key + ".period", period));
    asked.productivity().plant().ifPresent(plant -> plant(key + ".productivity", plant));
    for (int p = 0; p < plants.size(); p++) {
      String place = key + ".across[" + (p + 1) + "].plant";
      plants.get(p).plant().ifPresent(plant -> plant(place, plant));
    }
  }

  /**
   * A cost function says what a target costs at single prices; for the rest a technology is needed.
   */
  private void costFunctions(String key, Study.LeastCostQuestion asked) {
    List<String> forms =
        study.costs().map(c -> c.forms().stream().map(CostForm::word).toList()).orElse(List.of());
    boolean wanted =
        asked.technologies().isEmpty()
            ? !forms.isEmpty()
            : asked.technologies().stream().anyMatch(forms::contains);
    PlanTerms terms = asked.terms();
    boolean more =
        !PlanCircumstances.goalKey(terms).equals("target")
            || terms.jumps()
            || !terms.takeAtLeast().isEmpty()
            || !terms.across().isEmpty();
    heldAbroad(key, asked, forms, wanted);
    if (wanted && more) {
      mistake(
          key,
          "a cost function answers targets at single prices only; budgets, prices of output, whole"
              + " units, price bands, commitments and plants need a technology: name one under"
              + " `technology`, fitted or given, and none of "
              + String.join(", ", forms));
    }
  }

  /** What is held or limited must be an input of every technology that is asked. */
  private void heldAbroad(
      String key, Study.LeastCostQuestion asked, List<String> forms, boolean costs) {
    if (forms.isEmpty()) {
      return;
    }
    boolean production =
        asked.technologies().isEmpty()
            ? !study.technologies().isEmpty() || !study.given().isEmpty()
            : asked.technologies().stream().anyMatch(name -> !forms.contains(name));
    Set<String> bound = new TreeSet<>(asked.hold().keySet());
    bound.addAll(asked.limits().keySet());
    bound.addAll(asked.terms().shortRun());
    for (String name : bound) {
      if (production && !study.inputs().contains(name)) {
        mistake(
            key,
            name
                + " is an input of the cost functions alone; name only these under `technology`: "
                + String.join(", ", forms));
      }
      if (costs && study.costs().filter(c -> c.has(name)).isEmpty()) {
        mistake(
            key,
            name
                + " is no input of the cost functions; name other technologies under `technology`,"
                + " and none of "
                + String.join(", ", forms));
      }
    }
  }

  private void plant(String key, String plant) {
    if (panel.isPresent() && !panel.get().plants().contains(plant)) {
      mistake(key, "the records have no plant " + plant + nearest(plant, panel.get().plants()));
    }
  }

  private boolean priced(int input) {
    boolean amongCosts =
        study.records().isEmpty()
            && study
                .costs()
                .filter(c -> c.inputNames().contains(study.inputs().get(input)))
                .isPresent();
    return amongCosts || pricedInPanel(input);
  }

  private boolean pricedInPanel(int input) {
    return panel
        .map(p -> p.prices().get(input).isPresent() && Double.isFinite(meanPrice(p, input)))
        .orElse(false);
  }

  private void filing(Study.Filing filing) {
    filing.firstPeriod().ifPresent(period -> period("filing.periods", period));
    filing.lastPeriod().ifPresent(period -> period("filing.periods", period));
    panel.ifPresent(p -> unfiled(filing, p));
    for (int i = 0; i < study.inputs().size(); i++) {
      if (!priced(i)) {
        mistake(
            "filing",
            "filed costs cannot be reviewed without prices of "
                + study.inputs().get(i)
                + "; name a price or spending column under inputs");
      }
    }
  }

  /** Rows of the periods reviewed that hold no filed cost. */
  private void unfiled(Study.Filing filing, Panel records) {
    boolean known =
        Stream.of(filing.firstPeriod(), filing.lastPeriod())
            .flatMap(Optional::stream)
            .allMatch(records.periods()::contains);
    if (filing.cost().isEmpty() || records.filedCost().isEmpty() || !known) {
      return;
    }
    Column cost = records.filedCost().get();
    List<Integer> rows =
        Arrays.stream(ReviewStage.periods(filing, records))
            .flatMap(period -> Arrays.stream(FilingRows.of(records, period)))
            .filter(row -> Double.isNaN(cost.get(row)))
            .map(row -> records.fileRows().get(row))
            .sorted()
            .boxed()
            .toList();
    if (!rows.isEmpty()) {
      mistake(
          "filing.cost",
          "the column "
              + cost.name()
              + " has no value (or the deflator none) in "
              + (rows.size() == 1 ? "row " : rows.size() + " rows of the periods reviewed: ")
              + rows.stream().limit(NAMED).map(String::valueOf).collect(Collectors.joining(", "))
              + (rows.size() > NAMED ? ", …" : "")
              + "; fill them in, narrow filing.periods, set the plants aside with"
              + " records.keep.without-plants, or take filing.cost out to review price × quantity");
    }
  }

  private void period(String key, String period) {
    if (panel.isPresent() && !panel.get().periods().contains(period)) {
      List<String> periods = panel.get().periods();
      mistake(
          key,
          "the records used have no period "
              + period
              + "; they run from "
              + periods.get(0)
              + " to "
              + periods.get(periods.size() - 1));
    }
  }

  /** Samples that name what the records do not hold, keep no row, or keep the rows of another. */
  private void matrix(Matrix matrix) {
    if (panel.isEmpty()) {
      return;
    }
    Panel records = panel.get();
    List<BitSet> seen = new ArrayList<>();
    for (Matrix.Sample sample : matrix.samples()) {
      String key = "matrix.samples." + sample.name();
      List<String> faults = KeptPart.of(records, sample.keep()).faults();
      faults.forEach(fault -> mistake(key, fault));
      IntPredicate keeps = MatrixStage.rows(sample, records);
      BitSet rows = new BitSet();
      IntStream.range(0, records.rows()).filter(keeps).forEach(rows::set);
      if (faults.isEmpty() && rows.isEmpty()) {
        mistake(
            key,
            "the sample "
                + sample.name()
                + " keeps no row of the records used, which run from "
                + records.periods().get(0)
                + " to "
                + records.periods().get(records.periods().size() - 1)
                + "; widen it or take it out");
      } else if (faults.isEmpty() && seen.contains(rows) && !matrix.usual()) {
        mistake(
            key,
            "the sample "
                + sample.name()
                + " keeps the same rows as "
                + matrix.samples().get(seen.indexOf(rows)).name()
                + "; take one of them out");
      }
      seen.add(rows);
    }
  }

  private static String nearest(String found, List<String> allowed) {
    return Nearest.word(found, allowed).map(word -> "; did you mean " + word + "?").orElse("");
  }

  private void mistake(String key, String message) {
    Mistake found = new Mistake(0, 0, key, message);
    if (!mistakes.contains(found)) {
      mistakes.add(found); // several targets of one question say the same
    }
  }
}
