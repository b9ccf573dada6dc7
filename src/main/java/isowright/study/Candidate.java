package isowright.study;

import isowright.estimation.EstimatedTechnology;
import isowright.estimation.Fit;
import isowright.estimation.Productivity;
import isowright.estimation.Replication;
import isowright.estimation.SavedTechnology;
import isowright.technology.Technology;
import java.util.Optional;

/**
 * A technology that can answer a least-cost question: one that was fitted, or one taken as known.
 *
 * @param name its name in the study
 * @param fit the fit, where it was fitted
 * @param replication its refits, where it was fitted and has numbers
 * @param given the technology, where it was taken as known
 * @param saved the technology, where it was fitted elsewhere and handed over
 */
record Candidate(
    String name,
    Optional<Fit> fit,
    Optional<Replication> replication,
    Optional<Technology> given,
    Optional<SavedTechnology> saved) {

  static Candidate fitted(Fit fit, Optional<Replication> replication) {
    return new Candidate(
        fit.specification().form().name(),
        Optional.of(fit),
        replication,
        Optional.empty(),
        Optional.empty());
  }

  static Candidate given(Study.Given given) {
    return new Candidate(
        given.name(),
        Optional.empty(),
        Optional.empty(),
        Optional.of(given.technology()),
        Optional.empty());
  }

  static Candidate saved(String name, SavedTechnology technology) {
    return new Candidate(
        name, Optional.empty(), Optional.empty(), Optional.empty(), Optional.of(technology));
  }

  /** Whether it was estimated, here or elsewhere. */
  boolean estimated() {
    return fit.isPresent() || saved.isPresent();
  }

  boolean usable() {
    return fit.map(f -> f.state().usable()).orElse(true);
  }

  /**
   * The technology at a period and productivity, with its covariance and refits where it was
   * estimated.
   */
  EstimatedTechnology at(int period, Productivity productivity) {
    return replication
        .map(r -> r.at(period, productivity))
        .or(() -> fit.map(f -> f.at(period, productivity)))
        .or(() -> saved.map(s -> s.at(period, productivity)))
        .orElseGet(
            () -> {
              Technology technology = given.orElseThrow();
              int p = technology.parameters().length;
              return new EstimatedTechnology(technology, new double[p][p], 1);
            });
  }
}
