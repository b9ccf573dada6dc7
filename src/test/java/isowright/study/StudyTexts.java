package isowright.study;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Map;
import java.util.Objects;

/** Study files for tests: an invented glassworks, whole and with one thing changed. */
final class StudyTexts {

  /** Every key of the format that this version carries out; line numbers are used by the tests. */
  static final String WHOLE =
      """
      title: Glassworks, review of the 2024 cost filing
      records:
        file: glassworks.csv
        plant: plant
        period: year
        keep:
          periods: [2012, 2024]
          without-plants: [GW-07]
        number-format: {decimal: ".", group: ","}
      output:
        column: tonnes
        unit: t
      inputs:
        labour:
          quantity: labour_hours
          price: wage
          unit: h
        machines:
          quantity: machine_hours
          spending: machine_cost
          unit: h
      money:
        currency: EUR
        deflator: ppi
        base: 2020
      controls:
        - {column: breakdown_rate}
        - {column: furnace_age, log: true}
      technologies: [cobb-douglas, ces, translog]
      given:
        - {name: filed, form: cobb-douglas, constant: 0.35, coefficients: {labour: 0.62, machines: 0.41}}
        - {name: filed-ces, form: ces, constant: 0.1, shares: {labour: 0.4, machines: 0.6}, rho: 0.8, scale: 1.02}
        - name: filed-translog
          form: translog
          constant: 0.2
          coefficients: {labour: 0.55, machines: 0.47}
          second-order: {labour*labour: -0.05, machines*labour: 0.03}
          scaling: {labour: 41000, machines: 20500}
      estimation:
        plant-effects: within
        time: trend
        scaling: none
        standard-errors: hc3
        confidence: 0.9
      questions:
        returns-to-scale: 1.1
        substitution: 0.5
      least-cost:
        - name: Plan 2025
          technology: [ces, filed]
          target: 52000
          prices: {labour: 31.5, machines: 84}
          productivity: best-quarter
          period: 2024
          hold: {machines: 21000}
          limits: {labour: [0, 60000]}
          curve: {from: 20000, to: 80000, points: 31}
      filing:
        cost: filed_cost
        periods: [2023, 2024]
        against: best-quarter
        smearing: true
        simulation: {draws: 499, seed: 7}
        allowance: {controllable: 0.65, quantile: 0.25, years: 5, frontier-shift: 0.008, index: 0.021}
      """;

  /** The least that a study with records needs. */
  static final String SHORT =
      """
      title: Short
      records: {file: plants.csv}
      output: {column: tonnes}
      inputs:
        labour: {quantity: hours}
        machines: {quantity: machine_hours}
      technologies: [cobb-douglas]
      """;

  /** A study of given technologies alone. */
  static final String GIVEN =
      """
      title: Given
      given:
        - {name: filed, form: cobb-douglas, constant: 0.35, coefficients: {labour: 0.62, machines: 0.41}}
      least-cost:
        - name: Plan
          target: 100
          prices: {labour: 31.5, machines: 84}
      """;

  private StudyTexts() {}

  /** One of the three by its name. */
  static String named(String name) {
    return Objects.requireNonNull(Map.of("WHOLE", WHOLE, "SHORT", SHORT, "GIVEN", GIVEN).get(name));
  }

  /** The text with one passage replaced, which must be there exactly once. */
  static String with(String text, String passage, String replacement) {
    int at = text.indexOf(passage);
    if (at < 0 || text.indexOf(passage, at + 1) >= 0) {
      throw new IllegalArgumentException("not there exactly once: " + passage);
    }
    return text.replace(passage, replacement);
  }

  /** Writes a text as a study file. */
  static Path write(Path folder, String text) {
    try {
      return Files.writeString(folder.resolve("study.yaml"), text);
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }

  /** The study of a text that has no mistake. */
  static Study read(Path folder, String text) {
    try {
      return StudyFile.read(write(folder, text));
    } catch (StudyRefused refused) {
      throw new AssertionError(refused.mistakes().toString(), refused);
    }
  }

  /** The mistakes of a text; empty where it has none. */
  static List<Mistake> mistakes(Path folder, String text) {
    try {
      StudyFile.read(write(folder, text));
      return List.of();
    } catch (StudyRefused refused) {
      return refused.mistakes();
    }
  }
}
