package isowright.study;

import isowright.estimation.SavedTechnology;
import isowright.estimation.Specification;
import isowright.study.Findings.Said;
import isowright.study.PlanFindings.Planned;
import isowright.study.Study.LeastCostQuestion;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.stream.IntStream;

/**
 * Answers least-cost questions from a technology that was handed over, without the records: in the
 * words of the study file's {@code least-cost}, with the figures that a run of the study with these
 * questions would find by propagation of the covariance.
 *
 * <p>Tested in {@code PlanCommandTest}.
 */
public final class PlanQuestion {

  private static final List<String> KEYS = List.of("title", "least-cost");

  private final TechnologyFile technology;
  private final Path file;
  private final String text;
  private final KeyPlaces places;

  private PlanQuestion(TechnologyFile technology, Path file, String text, KeyPlaces places) {
    this.technology = technology;
    this.file = file;
    this.text = text;
    this.places = places;
  }

  /**
   * The answers to the questions of a file.
   *
   * @param question a file with {@code least-cost} as in a study file
   * @throws StudyRefused with every mistake
   */
  public static Findings answer(TechnologyFile technology, Path question) throws StudyRefused {
    String text;
    try {
      text = Files.readString(question, StandardCharsets.UTF_8);
    } catch (IOException unreadable) {
      throw new StudyRefused(
          question,
          List.of(new Mistake(0, 0, "", "there is no such file, or it is no text in UTF-8")));
    }
    return new PlanQuestion(technology, question, text, KeyPlaces.of(question)).answer();
  }

  /**
   * The answers to questions that stand in no file.
   *
   * @param text the same words
   * @throws StudyRefused with every mistake; its places are those in the text
   */
  public static Findings answer(TechnologyFile technology, String text) throws StudyRefused {
    return new PlanQuestion(technology, Path.of("question"), text, KeyPlaces.ofText(text)).answer();
  }

  private Findings answer() throws StudyRefused {
    Mistakes mistakes = new Mistakes();
    Optional<YamlSection> root = YamlNodes.root(text, mistakes).flatMap(YamlValue::section);
    List<LeastCostQuestion> asked = root.map(this::bind).orElse(List.of());
    root.flatMap(r -> r.get("least-cost"))
        .filter(YamlValue::isList)
        .flatMap(YamlValue::list)
        .ifPresent(items -> items.forEach(item -> item.section().ifPresent(this::known)));
    if (!mistakes.none()) {
      throw new StudyRefused(file, mistakes.inOrder());
    }
    Study study = study(asked, root.flatMap(r -> r.text("title")));
    PlanCircumstances circumstances =
        PlanCircumstances.handedOver(study, technology.handover().recorded());
    refuse(new OutOfReach(study, circumstances).mistakes());
    List<Candidate> candidates =
        technology.handover().technologies().stream()
            .map(saved -> HandoverStage.candidate(saved, study.inputs()))
            .toList();
    List<Planned> plans = new PlanStage(study, circumstances, candidates).plans();
    refuse(outOfReach(asked, plans));
    return findings(study, plans);
  }

  private void refuse(List<Mistake> mistakes) throws StudyRefused {
    if (!mistakes.isEmpty()) {
      throw new StudyRefused(file, places.located(mistakes));
    }
  }

  private List<LeastCostQuestion> bind(YamlSection root) {
    root.allow("a question file", KEYS, List.of());
    if (!root.has("least-cost")) {
      root.lacks("least-cost", "the questions, in the words of a study file");
    }
    Optional<Recorded> recorded = technology.handover().recorded();
    List<String> inputs = technology.inputs();
    List<String> unpriced =
        IntStream.range(0, inputs.size())
            .filter(i -> recorded.map(r -> Double.isNaN(r.prices()[i])).orElse(true))
            .mapToObj(inputs::get)
            .toList();
    Declared declared =
        new Declared(
            recorded.isPresent(),
            Optional.empty(),
            recorded.map(r -> r.plants().size() > 1).orElse(false),
            recorded.map(r -> r.periods().size() > 1).orElse(false),
            inputs,
            units(),
            unpriced,
            Optional.of(technology.units().output()).filter(unit -> !unit.isEmpty()),
            money(),
            Optional.empty());
    List<String> names =
        technology.handover().technologies().stream().map(Handover.Saved::name).toList();
    return new PlanBinder(declared, names).besideFrontier(frontier()).bind(root);
  }

  /** Whether any technology was estimated with a frontier, told by its level. */
  private boolean frontier() {
    return technology.handover().technologies().stream()
        .anyMatch(
            saved ->
                saved.fitted()
                    && saved.levels().get(2).constants()[0] > saved.levels().get(0).constants()[0]);
  }

  private List<Optional<String>> units() {
    return technology.units().inputs().values().stream()
        .map(unit -> Optional.of(unit).filter(u -> !u.isEmpty()))
        .toList();
  }

  private Study.Money money() {
    return new Study.Money(Optional.of(technology.units().money()), Optional.empty());
  }

  /** Refuses periods and plants that the technology does not know. */
  private void known(YamlSection section) {
    List<String> periods =
        technology.handover().recorded().map(Recorded::periods).orElse(List.of());
    section
        .get("period")
        .filter(value -> value.raw().isPresent() && periods.size() > 1)
        .flatMap(YamlValue::text)
        .filter(period -> !periods.contains(period))
        .ifPresent(
            period ->
                section.refuse(
                    "period",
                    "the technology was estimated from no period "
                        + period
                        + YamlValue.nearest(period, periods)
                        + "; periods: "
                        + String.join(", ", periods)));
    section
        .get("productivity")
        .flatMap(value -> ProductivityWords.read(value, true, frontier()).plant())
        .ifPresent(plant -> plant(section, "productivity", plant));
    section
        .get("across")
        .filter(YamlValue::isList)
        .flatMap(YamlValue::list)
        .ifPresent(
            items ->
                items.forEach(
                    item ->
                        item.section()
                            .ifPresent(
                                each ->
                                    each.text("plant")
                                        .ifPresent(name -> plant(each, "plant", name)))));
  }

  private void plant(YamlSection section, String key, String plant) {
    List<String> plants = technology.handover().recorded().map(Recorded::plants).orElse(List.of());
    int at = plants.indexOf(plant);
    if (plants.isEmpty()) {
      return; // said already: there are no plants to choose from
    }
    if (at < 0) {
      section.refuse(
          key,
          "the technology was estimated from no plant " + plant + YamlValue.nearest(plant, plants));
    } else if (technology.handover().technologies().stream()
        .anyMatch(
            saved -> saved.fitted() && saved.levels().size() <= SavedTechnology.COMMON + at)) {
      section.refuse(
          key,
          "the plants were too many for their levels to be handed over; name `typical` or"
              + " `best-quarter`");
    }
  }

  /** A question that none of its technologies can achieve is a mistake of the question. */
  private static List<Mistake> outOfReach(List<LeastCostQuestion> asked, List<Planned> plans) {
    Map<String, Mistake> mistakes = new LinkedHashMap<>();
    for (LeastCostQuestion question : asked) {
      List<Planned> own =
          plans.stream().filter(plan -> plan.question().equals(question.name())).toList();
      if (!own.isEmpty() && own.stream().allMatch(plan -> plan.status().equals("infeasible"))) {
        List<String> reasons = new ArrayList<>();
        for (Planned plan : own) {
          plan.remarks().stream()
              .filter(said -> said.code().equals("infeasible"))
              .forEach(said -> reasons.add(plan.technology() + ": " + said.message()));
        }
        String key =
            "least-cost["
                + question.terms().place()
                + "]."
                + PlanCircumstances.goalKey(question.terms());
        mistakes.put(question.name(), new Mistake(0, 0, key, String.join("; ", reasons)));
      }
    }
    return List.copyOf(mistakes.values());
  }

  private Study study(List<LeastCostQuestion> asked, Optional<String> title) {
    List<Study.Given> given =
        technology.handover().technologies().stream()
            .filter(saved -> !saved.fitted())
            .map(saved -> HandoverStage.candidate(saved, technology.inputs()))
            .map(candidate -> new Study.Given(candidate.name(), candidate.given().orElseThrow()))
            .toList();
    return new Study(
        file,
        "",
        title.orElse("Plans from the technology of: " + technology.title()),
        Optional.empty(),
        money(),
        Optional.of(technology.units().output()).filter(unit -> !unit.isEmpty()),
        technology.inputs(),
        units(),
        technology.handover().technologies().stream()
            .filter(Handover.Saved::fitted)
            .map(Handover.Saved::name)
            .toList(),
        given,
        new Study.Estimation(
            Specification.PlantEffects.NONE,
            Specification.Time.NONE,
            true,
            Optional.empty(),
            technology.confidence()),
        new Study.Questions(1, 1),
        asked,
        Optional.empty(),
        Protocol.NONE,
        Optional.empty(),
        Capital.NONE);
  }

  private Findings findings(Study study, List<Planned> plans) {
    String from =
        technology.recordsFile().isEmpty() ? "" : " from the records " + technology.recordsFile();
    List<String> answering = plans.stream().map(Planned::technology).toList();
    return new Findings(
        new Findings.Run(
            Settings.version(),
            study.title(),
            String.valueOf(technology.file().getFileName()),
            technology.sha256(),
            Map.of()),
        Settings.units(study),
        technology.confidence(),
        Optional.empty(),
        List.of(),
        study.given().stream()
            .filter(given -> answering.contains(given.name()))
            .map(GivenStage::describe)
            .toList(),
        plans,
        List.of(),
        List.of(
            Said.of(
                "note",
                "handed-over",
                "The technologies were handed over in "
                    + technology.file().getFileName()
                    + ", estimated in the study “"
                    + technology.title()
                    + "”"
                    + from
                    + "; the records themselves were not read.")));
  }
}
