package isowright.estimation;

import isowright.records.Panel;
import isowright.records.PeriodSteps;
import isowright.regression.Collinearity;
import isowright.regression.Design;
import isowright.regression.Differences;
import isowright.regression.Effects;
import isowright.regression.LeastSquares;
import isowright.regression.LinearFit;
import isowright.regression.VarianceComponents;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.stream.IntStream;

/**
 * The rows of a panel made ready for least squares by what is to be done about plants. For random
 * effects that takes their variances first.
 *
 * @param design what least squares is done on, with the columns of {@code outcome.levels()}
 * @param outcome what was found on the way
 * @param lacking in words, why the records cannot carry it; the rest means nothing then
 */
record PlantTreatment(Design design, Treatment outcome, List<String> lacking) {

  /** How a plant's mean of a column is named. */
  static final String MEAN = "mean:";

  private static final String CONSTANT = "constant";

  Design levels() {
    return outcome.levels();
  }

  /**
   * @param levels the rows in levels, with a constant where the treatment has one
   */
  static PlantTreatment of(Panel panel, Specification specification, Design levels) {
    return switch (specification.plantEffects()) {
      case NONE -> plain(levels, levels);
      case WITHIN -> plain(levels, Effects.within(levels));
      case BETWEEN ->
          new PlantTreatment(
              Effects.between(levels),
              new Treatment(
                  levels, RowsUsed.plantMeans(panel), Optional.empty(), new double[0], List.of()),
              List.of());
      case DIFFERENCES -> differences(panel, levels);
      case RANDOM -> random(specification, levels, new double[0], List.of());
      case MUNDLAK -> correlated(panel, specification, levels);
    };
  }

  /** The same treatment of other columns of the same rows, with the variances found here. */
  Design again(Panel panel, Specification specification, Design other) {
    return outcome
        .components()
        .map(found -> Effects.partlyWithin(other, found.shares(other.groups())))
        .orElseGet(() -> of(panel, specification, other).design());
  }

  private static PlantTreatment plain(Design levels, Design design) {
    return new PlantTreatment(design, Treatment.none(levels), List.of());
  }

  private static PlantTreatment differences(Panel panel, Design levels) {
    PeriodSteps steps = PeriodSteps.of(panel);
    Differences differences = Effects.differences(levels, row -> steps.before(row, 1) == row - 1);
    int[] ends = IntStream.range(0, differences.rows()).map(differences::end).toArray();
    return new PlantTreatment(
        differences,
        new Treatment(
            levels, RowsUsed.differences(ends), Optional.empty(), new double[0], List.of()),
        List.of());
  }

  /** Random effects with the plant means of all columns beside the columns (Mundlak 1978). */
  private static PlantTreatment correlated(
      Panel panel, Specification specification, Design levels) {
    List<String> own = levels.columns().stream().filter(name -> !name.equals(CONSTANT)).toList();
    Design all = Effects.withGroupMeans(levels, own, MEAN);
    List<String> untold =
        LeastSquares.fit(all).collinearities().stream()
            .map(Collinearity::column)
            .filter(column -> column.startsWith(MEAN))
            .map(column -> column.substring(MEAN.length()))
            .toList();
    List<String> kept = own.stream().filter(name -> !untold.contains(name)).toList();
    Design beside = Effects.withGroupMeans(levels, kept, MEAN);
    GroupMeans means = GroupMeans.of(beside, new double[beside.columns().size()]);
    double[] overall = means.regressors(means.byRows());
    double[] ofMeans = Arrays.copyOfRange(overall, levels.columns().size(), overall.length);
    List<String> ownColumns = Circumstances.of(panel, Specification.Time.NONE).names();
    List<String> leftOut =
        untold.stream().filter(c -> panel.inputs().contains(c) || ownColumns.contains(c)).toList();
    return random(specification, beside, ofMeans, leftOut);
  }

  private static PlantTreatment random(
      Specification specification, Design levels, double[] plantMeans, List<String> leftOut) {
    VarianceComponents components = VarianceComponents.estimate(levels, specification.components());
    List<String> lacking = lacking(specification, levels, components);
    Treatment outcome =
        new Treatment(
            levels, RowsUsed.each(levels.rows()), Optional.of(components), plantMeans, leftOut);
    Design design =
        lacking.isEmpty()
            ? Effects.partlyWithin(levels, components.shares(levels.groups()))
            : levels;
    return new PlantTreatment(design, outcome, lacking);
  }

  /** Why the variances of random effects could not be had, if they could not. */
  private static List<String> lacking(
      Specification specification, Design levels, VarianceComponents components) {
    boolean sound = components.row() > 0 && !Double.isNaN(components.group());
    boolean amemiya = specification.components() == VarianceComponents.Method.AMEMIYA;
    if (sound && !amemiya) {
      return List.of();
    }
    List<String> lacking = new ArrayList<>();
    int plants = levels.groups().count();
    LinearFit within = LeastSquares.fit(Effects.within(levels));
    if (Double.isNaN(components.row())) {
      lacking.add(
          "The variance within plants cannot be estimated: "
              + levels.rows()
              + " rows of "
              + plants
              + " plants leave nothing beside "
              + within.rank()
              + " slopes and a level for each plant. Add periods, ask for a form with fewer"
              + " parameters, or set plant-effects to none.");
    } else if (!(components.row() > 0)) {
      lacking.add(
          "Within plants the records are fitted without any error, so random effects have no scale."
              + " Check that output was not computed from inputs, or set plant-effects to within.");
    }
    if (components.row() > 0 && Double.isNaN(components.group())) {
      lacking.add(
          "The variance between plants cannot be estimated after Swamy and Arora: "
              + plants
              + " plants (one mean each) cannot carry the parameters of a regression between them."
              + " Set variance-components to wallace-hussain, set plant-effects to within, ask for a"
              + " form with fewer parameters, or add plants.");
    }
    if (amemiya) {
      within.collinearities().stream()
          .filter(c -> !c.column().equals(CONSTANT))
          .filter(c -> c.among().equals(List.of(Collinearity.GROUP_EFFECTS)))
          .forEach(
              c ->
                  lacking.add(
                      c.column()
                          + " does not vary within plants, and Amemiya’s variances rest on the"
                          + " regression within plants alone. Set variance-components to"
                          + " swamy-arora."));
    }
    return lacking;
  }
}
