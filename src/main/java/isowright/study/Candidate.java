package isowright.study;

import isowright.estimation.EstimatedTechnology;
import isowright.estimation.Fit;
import isowright.estimation.Productivity;
import isowright.estimation.Replication;
import isowright.technology.Technology;
import java.util.Optional;

/**
 * A technology that can answer a least-cost question: one that was fitted, or one taken as known.
 *
 * @param name its name in the study
 * @param fit the fit, where it was fitted
 * @param replication its refits, where it was fitted and has numbers
 * @param given the technology, where it was taken as known
 */
record Candidate(
    String name, Optional<Fit> fit, Optional<Replication> replication, Optional<Technology> given) {

  static Candidate fitted(Fit fit, Optional<Replication> replication) {
    return new Candidate(
        fit.specification().form().name(), Optional.of(fit), replication, Optional.empty());
  }

  static Candidate given(Study.Given given) {
    return new Candidate(
        given.name(), Optional.empty(), Optional.empty(), Optional.of(given.technology()));
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
        .orElseGet(
            () -> {
              Technology technology = given.orElseThrow();
              int p = technology.parameters().length;
              return new EstimatedTechnology(technology, new double[p][p], 1);
            });
  }
}
