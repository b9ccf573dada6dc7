package isowright.study;

import isowright.estimation.Estimator;
import isowright.estimation.Specification.PlantEffects;
import isowright.inference.InputShifters;
import isowright.inference.InputShifters.Expected;
import isowright.inference.InputShifters.Shifter;
import isowright.records.Panel;
import isowright.study.SimultaneityFindings.Input;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/** States before fitting what least squares is expected to get wrong. */
final class SimultaneityStage {

  /** A share of the free input's error below which another coefficient is said not to lean. */
  private static final double HARDLY = 0.01;

  private SimultaneityStage() {}

  /** The statement; absent where nothing is fitted to records. */
  static Optional<SimultaneityFindings> findings(Study study, Optional<Panel> panel) {
    return study.technologies().isEmpty() ? Optional.empty() : panel.map(p -> of(study, p));
  }

  private static SimultaneityFindings of(Study study, Panel panel) {
    PlantEffects effects = study.estimation().plantEffects();
    boolean within = effects == PlantEffects.WITHIN || effects == PlantEffects.DIFFERENCES;
    Expected expected = InputShifters.of(panel, within, study.estimation().confidence());
    List<Input> inputs = new ArrayList<>();
    for (int i = 0; i < expected.shifters().size(); i++) {
      inputs.add(input(expected.shifters().get(i), expected.perFree()[i]));
    }
    String free = panel.inputs().get(expected.free());
    return new SimultaneityFindings(
        free, expectation(free, panel.repeats(), inputs), treatment(study), inputs);
  }

  private static Input input(Shifter shifter, double perFree) {
    return new Input(
        shifter.input(),
        direction(perFree),
        Double.isFinite(perFree) ? Optional.of(perFree) : Optional.empty(),
        shifter.withinShare(),
        shifted(shifter.state()),
        words(shifter),
        shifter.priceSpread(),
        shifter.priceShare(),
        shifter.correlation(),
        shifter.response().map(EstimatedFigures::of),
        shifter.p());
  }

  private static String direction(double perFree) {
    if (perFree > HARDLY) {
      return "upward";
    }
    return perFree < -HARDLY ? "downward" : "none";
  }

  private static String shifted(InputShifters.State state) {
    return switch (state) {
      case ANSWERS -> "yes";
      case NO_PRICE, STILL, SILENT -> "no";
      case DERIVED -> "unknown";
    };
  }

  private static String words(Shifter shifter) {
    return switch (shifter.state()) {
      case ANSWERS ->
          "its price moves apart from plant and period, and the quantity answers with the opposite"
              + " sign";
      case NO_PRICE -> "the records hold no price of it";
      case STILL ->
          "its price is the same for all plants in a period, or does not move, so that it shifts"
              + " nothing of its own";
      case SILENT ->
          "its price moves apart from plant and period, but the quantity is not seen to answer";
      case DERIVED ->
          "its price is spending divided by this very quantity, so that an error in the quantity"
              + " moves the two against each other, and the correlation proves nothing";
    };
  }

  private static String expectation(String free, boolean repeats, List<Input> inputs) {
    List<String> up = new ArrayList<>();
    List<String> down = new ArrayList<>();
    double whole = 0;
    for (Input input : inputs) {
      whole += input.perFree().orElse(0.0);
      if (!input.name().equals(free)) {
        if (input.direction().equals("downward")) {
          down.add(input.name());
        } else if (input.direction().equals("upward")) {
          up.add(input.name());
        }
      }
    }
    StringBuilder words = new StringBuilder();
    words.append(
        "A plant that has a good year knows it before the analyst does, and takes on more of what"
            + " it can change at once. Least squares credits that input with what the good year"
            + " did, so that its coefficient is expected too high. ");
    words
        .append("The input that moves most ")
        .append(repeats ? "within plants" : "between rows")
        .append(" is ")
        .append(free)
        .append("; if it is the one that answers to a good year, its coefficient leans upward");
    if (!down.isEmpty()) {
      words.append(", that of ").append(String.join(" and ", down)).append(" downward");
    }
    if (!up.isEmpty()) {
      words.append(", that of ").append(String.join(" and ", up)).append(" upward too");
    }
    words
        .append(" (they move together in the records), and returns to scale lean ")
        .append(whole >= 0 ? "upward" : "downward")
        .append('.');
    return words.toString();
  }

  private static String treatment(Study study) {
    if (!(study.estimation().estimator() instanceof Estimator.LeastSquares)) {
      return "This study does not rest on least squares but on "
          + study.estimation().estimator().word()
          + ", which is made for this.";
    }
    return switch (study.estimation().plantEffects()) {
      case WITHIN, DIFFERENCES ->
          "Plant effects take out what lasts; what a plant knows of the single year is left, and so"
              + " is this leaning, in part. Errors of measurement weigh more within plants and pull"
              + " coefficients towards zero.";
      case NONE, BETWEEN ->
          "Nothing is done against it in this study: lasting differences between plants are part of"
              + " the error. Set plant-effects to within beside it.";
      case RANDOM, MUNDLAK ->
          "Random effects weigh lasting differences down without taking them out; the Hausman test"
              + " says whether that is enough.";
    };
  }
}
