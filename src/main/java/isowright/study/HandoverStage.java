package isowright.study;

import isowright.estimation.Fit;
import isowright.estimation.SavedTechnology;
import isowright.records.Panel;
import isowright.study.Handover.Level;
import isowright.study.Handover.Saved;
import isowright.technology.SavedForms;
import isowright.technology.Technology;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/** Packs technologies so that they can be asked without the records, and unpacks them. */
final class HandoverStage {

  /** Of more plants than this no levels are saved, only the typical plant and the quartile. */
  private static final int MOST_PLANTS = 500;

  private HandoverStage() {}

  static Handover of(Study study, Optional<Panel> panel, List<Fit> fits) {
    List<Saved> all = new ArrayList<>();
    for (Fit fit : fits) {
      if (fit.state().usable()) {
        int plants = fit.panel().plants().size();
        all.add(saved(fit, fit.saved(plants <= MOST_PLANTS ? plants : 0)));
      }
    }
    study.given().forEach(given -> all.add(saved(given)));
    return new Handover(panel.map(Recorded::of), all);
  }

  private static Saved saved(Fit fit, SavedTechnology numbers) {
    Technology technology = numbers.technology();
    return new Saved(
        fit.specification().form().name(),
        true,
        technology.form(),
        technology.base(),
        technology.parameterNames(),
        technology.parameters(),
        numbers.degreesOfFreedom(),
        numbers.parameters(),
        numbers.maps(),
        numbers.levels().stream()
            .map(level -> new Level(level.map(), level.constants(), level.covariance()))
            .toList());
  }

  private static Saved saved(Study.Given given) {
    Technology technology = given.technology();
    return new Saved(
        given.name(),
        false,
        technology.form(),
        technology.base(),
        technology.parameterNames(),
        technology.parameters(),
        0,
        List.of(),
        List.of(),
        List.of());
  }

  /** A technology that was saved, ready to answer. */
  static Candidate candidate(Saved saved, List<String> inputs) {
    Technology technology =
        SavedForms.of(
            saved.form(), inputs, saved.base(), saved.parameterNames(), saved.parameters());
    if (!saved.fitted()) {
      return Candidate.given(new Study.Given(saved.name(), technology));
    }
    return Candidate.saved(
        saved.name(),
        new SavedTechnology(
            technology,
            saved.degreesOfFreedom(),
            saved.byPeriod(),
            saved.maps(),
            saved.levels().stream()
                .map(l -> new SavedTechnology.Level(l.map(), l.constants(), l.covariance()))
                .toList()));
  }
}
