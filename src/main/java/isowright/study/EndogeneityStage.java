package isowright.study;

import isowright.estimation.EstimatedTechnology;
import isowright.estimation.Estimation;
import isowright.estimation.Estimator;
import isowright.estimation.Fit;
import isowright.estimation.Particulars;
import isowright.estimation.Productivity;
import isowright.estimation.Specification.PlantEffects;
import isowright.inference.InstrumentFindings;
import isowright.inference.Intervals;
import isowright.inference.Verdict;
import isowright.regression.WaldTest;
import isowright.study.EndogeneityFindings.Anywhere;
import isowright.study.EndogeneityFindings.Beside;
import isowright.study.EndogeneityFindings.FirstStage;
import isowright.study.Findings.Said;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.stream.Collectors;

/** Turns what a fit found about inputs chosen knowing productivity into findings and remarks. */
final class EndogeneityStage {

  private final Fit fit;
  private final List<Estimator> asked;
  private final Optional<InstrumentFindings> instruments;

  /**
   * @param asked the principles asked for; the fit rests on the first
   */
  EndogeneityStage(Fit fit, List<Estimator> asked) {
    this.fit = fit;
    this.asked = List.copyOf(asked);
    this.instruments = InstrumentFindings.of(fit);
  }

  /** The tests of the instruments. */
  List<Verdict> verdicts() {
    return instruments.map(InstrumentFindings::verdicts).orElse(List.of());
  }

  /** Of a fit that has no numbers: what was asked and what was expected. */
  static EndogeneityFindings unusable(Fit fit) {
    Estimator by = fit.specification().estimator();
    List<String> inputs = chosen(fit);
    if (inputs.isEmpty()) {
      return EndogeneityFindings.NONE;
    }
    return new EndogeneityFindings(
        by.word(),
        inputs,
        List.of(),
        0,
        expected(fit, inputs),
        "",
        List.of(),
        Optional.empty(),
        List.of(),
        List.of());
  }

  /** The inputs taken to be chosen knowing productivity; none with other estimators. */
  private static List<String> chosen(Fit fit) {
    Estimator by = fit.specification().estimator();
    if (by instanceof Estimator.Instruments instruments) {
      return List.copyOf(instruments.byInput().keySet());
    }
    return by instanceof Estimator.Proxy proxy
        ? fit.panel().inputs().stream().filter(i -> !proxy.states().contains(i)).toList()
        : List.of();
  }

  /**
   * What was found.
   *
   * @param elasticities of this fit, by input
   * @param scale of this fit
   */
  EndogeneityFindings findings(Map<String, Figure> elasticities, Figure scale) {
    if (fit.numbers().particulars() instanceof Particulars.OfProxy by) {
      return new ProxyStage(fit, by).findings(chosen(fit), own(elasticities, scale), others());
    }
    if (instruments.isEmpty()) {
      return EndogeneityFindings.NONE;
    }
    Particulars.OfInstruments by = (Particulars.OfInstruments) fit.numbers().particulars();
    List<String> inputs = chosen(fit);
    List<Beside> beside = new ArrayList<>();
    beside.add(own(elasticities, scale));
    beside.add(beside("least-squares", "on the same rows", Estimation.leastSquaresBeside(fit)));
    beside.addAll(others());
    return new EndogeneityFindings(
        fit.specification().estimator().word(),
        inputs,
        by.series(),
        by.rowsUnknown(),
        expected(fit, inputs),
        shifts(by),
        firstStages(),
        anywhere(by),
        beside,
        words(inputs, beside));
  }

  private Beside own(Map<String, Figure> elasticities, Figure scale) {
    return new Beside(
        fit.specification().estimator().word(),
        "",
        fit.numbers().linear().rows(),
        elasticities,
        Optional.of(scale));
  }

  /** The other principles asked for, each fitted to the same records. */
  private List<Beside> others() {
    return asked.stream()
        .filter(other -> !other.equals(fit.specification().estimator()))
        .map(
            other ->
                beside(
                    other.word(), "", Estimation.fit(fit.panel(), fit.specification().by(other))))
        .toList();
  }

  static Beside beside(String word, String note, Fit other) {
    if (!other.state().usable()) {
      return new Beside(word, String.join(" ", other.reasons()), 0, Map.of(), Optional.empty());
    }
    EstimatedTechnology typical =
        other.at(other.panel().periods().size() - 1, new Productivity.Typical());
    ElasticityFindings figures =
        new ElasticityFindings(other, Intervals.of(typical, other.specification().confidence()));
    return new Beside(
        word,
        note,
        other.numbers().linear().rows(),
        figures.output(),
        Optional.of(figures.scale()));
  }

  static String expected(Fit fit, List<String> inputs) {
    String left =
        fit.specification().plantEffects() == PlantEffects.NONE
            ? ""
            : " What lasts in a plant is removed by the treatment of plants; what changes from"
                + " period to period is not.";
    return "Where a plant uses more "
        + either(inputs)
        + " in a period in which it is more productive, least squares credits "
        + (inputs.size() == 1 ? "that input" : "these inputs")
        + " with output that productivity brought: the output elasticity of "
        + String.join(", ", inputs)
        + " is expected to come out too high, and those of inputs that are fixed beforehand too"
        + " low. An error in the recorded quantity works the other way."
        + left;
  }

  private static String either(List<String> inputs) {
    return String.join(" or ", inputs);
  }

  private String shifts(Particulars.OfInstruments by) {
    String shares =
        instruments.orElseThrow().firstStages().stream()
            .map(
                stage ->
                    String.format(
                        Locale.ROOT, "%.0f %% of %s", 100 * stage.partialShare(), stage.column()))
            .collect(Collectors.joining(", "));
    return "Beyond what the other columns say, "
        + String.join(", ", by.series())
        + (by.series().size() == 1 ? " explains " : " explain ")
        + shares
        + " in the rows used.";
  }

  private List<FirstStage> firstStages() {
    return instruments.orElseThrow().firstStages().stream()
        .map(
            stage -> {
              WaldTest joint = stage.joint();
              return new FirstStage(
                  stage.column(),
                  stage.partialShare(),
                  joint.f(),
                  joint.restrictions(),
                  joint.degreesOfFreedom(),
                  stage.effective(),
                  Double.isNaN(stage.conditional())
                      ? Optional.empty()
                      : Optional.of(stage.conditional()),
                  !(stage.decisive() >= InstrumentFindings.WEAK));
            })
        .toList();
  }

  private Optional<Anywhere> anywhere(Particulars.OfInstruments by) {
    return instruments
        .orElseThrow()
        .anywhere()
        .map(
            set ->
                new Anywhere(
                    by.fit().endogenous().get(0),
                    set.pieces().stream()
                        .map(piece -> new Figure.Span(piece.low(), piece.high()))
                        .toList()));
  }

  private List<String> words(List<String> inputs, List<Beside> beside) {
    List<String> words = new ArrayList<>();
    for (Verdict verdict : verdicts()) {
      boolean rejected = verdict.p() < Verdict.level(fit.specification().confidence());
      if (verdict.name().equals("inputs-exogenous") && !Double.isNaN(verdict.p())) {
        words.add(
            rejected
                ? "The records speak against least squares: what instruments leave of "
                    + either(inputs)
                    + " still moves output."
                : "The records do not tell instruments from least squares; that is no proof that"
                    + " least squares is right, and its intervals are narrower only if it is.");
      }
    }
    Beside squares = beside.get(1);
    for (String input : inputs) {
      Figure own = beside.get(0).elasticity().get(input);
      Figure other = squares.elasticity().get(input);
      if (own != null && other != null) {
        words.add(
            String.format(
                Locale.ROOT,
                "The output elasticity of %s is %.3f by instruments and %.3f by least squares on"
                    + " the same rows; the difference points %s.",
                input,
                own.value(),
                other.value(),
                other.value() >= own.value() ? "the way expected" : "the other way than expected"));
      }
    }
    return words;
  }

  /** What must be said of it. */
  List<Said> remarks() {
    List<Said> remarks = new ArrayList<>();
    if (fit.numbers().particulars() instanceof Particulars.OfProxy by) {
      return new ProxyStage(fit, by).remarks();
    }
    if (instruments.isEmpty()) {
      return remarks;
    }
    Particulars.OfInstruments by = (Particulars.OfInstruments) fit.numbers().particulars();
    if (by.rowsUnknown() > 0) {
      remarks.add(
          Said.of(
              "note",
              "instruments-unknown",
              by.rowsUnknown()
                  + " of "
                  + fit.panel().rows()
                  + " rows were not used in the regression because an instrument is unknown there ("
                  + String.join(", ", by.series())
                  + ")."
                  + (by.periodsUnknown().isEmpty()
                      ? ""
                      : " Periods without any row used stand at the next one: "
                          + String.join(", ", by.periodsUnknown())
                          + ".")));
    }
    List<String> redundant = by.fit().redundant().stream().map(c -> c.words()).toList();
    if (!redundant.isEmpty()) {
      remarks.add(
          Said.of(
              "warning",
              "instruments-redundant",
              "Not every instrument says something of its own: "
                  + String.join("; ", redundant)
                      .replace("group effects", "plant effects")
                      .replace("within groups", "within plants")
                  + ". It is left out; take it out of the study, or name another."));
    }
    if (instruments.get().weak()) {
      remarks.add(weak());
    }
    verdicts().stream()
        .filter(v -> v.name().equals("instruments-agree"))
        .filter(v -> v.p() < Verdict.level(fit.specification().confidence()))
        .forEach(v -> remarks.add(disagree()));
    return remarks;
  }

  private Said weak() {
    String which =
        firstStages().stream()
            .filter(FirstStage::weak)
            .map(
                stage ->
                    String.format(
                        Locale.ROOT,
                        "%s (F %.1f)",
                        stage.column(),
                        Math.min(
                            stage.effective(),
                            stage.conditional().orElse(Double.POSITIVE_INFINITY))))
            .collect(Collectors.joining(", "));
    return Said.of(
        "warning",
        "weak-instruments",
        "The instruments hardly move "
            + which
            + "; below about 10 the estimate leans towards least squares and its intervals are too"
            + " narrow. Do not rely on them"
            + (instruments.orElseThrow().anywhere().isPresent()
                ? "; the values that are not rejected however weak the instruments stand in the"
                    + " section on endogenous inputs."
                : "."));
  }

  private static Said disagree() {
    return Said.of(
        "warning",
        "instruments-disagree",
        "The instruments contradict one another: at least one of them is related to what is left"
            + " unexplained, and the test cannot say which. Ask of each why it should shift the"
            + " input and nothing else.");
  }
}
