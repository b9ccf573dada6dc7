package isowright.study;

import isowright.estimation.Unfit;
import isowright.records.RecordsRefused;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.EnumMap;
import java.util.LinkedHashMap;
import java.util.Map;

/**
 * Findings of studies that went through the whole pipeline, for tests of views: the demo, and
 * published data in which every difficult state of a result occurs. Each study runs once. The
 * prices asked for the published data are invented; nothing is compared with them.
 */
public final class RealFindings {

  private static final Path DEMO = Path.of("notebooks-data");
  private static final Path PUBLISHED = Path.of("src/test/resources/published");
  private static final Path REFERENCE = Path.of("src/test/resources/reference");
  private static final Path STUDIES = Path.of("target/studies");
  private static final Map<Study, Findings> KNOWN = new EnumMap<>(Study.class);

  private RealFindings() {}

  /** A study and what is difficult about it. */
  public enum Study {
    /** Fourteen glassworks: a panel with plant effects, plans and filings. */
    DEMO,
    /** Technologies taken as known, no records. */
    GIVEN,
    /**
     * Hildebrand and Liu 1965: a CES technology at its boundary, a translog irregular in places,
     * plans outside the records, out of reach, and where the technology is irregular.
     */
    PRIMARY_METALS,
    /** The same, the translog held to be regular at every state. */
    PRIMARY_METALS_REGULAR,
    /** Judge et al. 1988: a CES technology whose sum of squares is flat. */
    THIRTY_POINTS,
    /**
     * Munnell 1990, within states: a technology that is regular nowhere, so that no plan is had.
     */
    STATES_WITHIN,
    /** Munnell 1990, pooled, with a plan. */
    STATES_POOLED,
    /** The demo's records under many specifications, some of which cannot be carried out. */
    SPECIFICATIONS,
    /** Invented brickyards: some burn no fuel, and likelihoods are of unlike numbers. */
    BRICKYARDS,
    /** A frontier of the demo's records, with decay. */
    FRONTIER
  }

  /** The findings of a study. */
  public static synchronized Findings of(Study study) {
    return KNOWN.computeIfAbsent(study, RealFindings::run);
  }

  /** Invented and real findings, by a name to be printed. */
  public static Map<String, Findings> withInvented() {
    Map<String, Findings> all = new LinkedHashMap<>();
    all.put("glassworks", FindingsFixture.glassworks());
    all.put("with markup", FindingsFixture.withMarkup());
    all.put("troubled", FindingsFixture.troubled());
    all.put("given only", FindingsFixture.givenOnly());
    for (Study study : Study.values()) {
      all.put("real: " + study, of(study));
    }
    return all;
  }

  private static Findings run(Study study) {
    try {
      return Pipeline.run(StudyFile.read(file(study)), Progress.SILENT);
    } catch (StudyRefused | RecordsRefused | Unfit e) {
      throw new IllegalStateException(study + ": " + e.getMessage(), e);
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }

  private static Path file(Study study) throws IOException {
    return switch (study) {
      case DEMO -> DEMO.resolve("glassworks.yaml");
      case GIVEN -> DEMO.resolve("given-only.yaml");
      case PRIMARY_METALS -> written("primary-metals-27-states", PRIMARY_METALS);
      case PRIMARY_METALS_REGULAR ->
          written(
              "primary-metals-27-states",
              PRIMARY_METALS + "estimation: {regularity: everywhere}\n");
      case THIRTY_POINTS -> written("ces-30-points", THIRTY_POINTS);
      case STATES_WITHIN -> written("us-states-public-capital", STATES.formatted("within"));
      case STATES_POOLED -> written("us-states-public-capital", STATES.formatted("none"));
      case FRONTIER -> DEMO.resolve("below-the-frontier.yaml");
      case SPECIFICATIONS -> DEMO.resolve("glassworks-specifications.yaml");
      case BRICKYARDS -> written(REFERENCE, "brickyards", BRICKYARDS);
    };
  }

  /** A study beside a copy of its records, since paths in a study are relative to it. */
  private static Path written(String records, String study) throws IOException {
    return written(PUBLISHED, records, study);
  }

  private static Path written(Path from, String records, String study) throws IOException {
    Path folder = Files.createDirectories(STUDIES.resolve(records));
    Path copy = folder.resolve(records + ".csv");
    Files.write(copy, Files.readAllBytes(from.resolve(records + ".csv")));
    return Files.writeString(folder.resolve("study.yaml"), study);
  }

  private static final String PRIMARY_METALS =
      """
      title: Primary metals in 27 states, 1957
      records: {file: primary-metals-27-states.csv, plant: observation}
      output: {column: output}
      inputs:
        labour: {quantity: labor}
        capital: {quantity: capital}
      technologies: [cobb-douglas, ces, translog]
      least-cost:
        - name: Somewhat more than the typical state
          target: 2500
          prices: {labour: 2, capital: 1}
          curve: {from: 500, to: 9000, points: 35}
        - name: Far beyond
          target: 60000
          prices: {labour: 2, capital: 1}
        - name: Little labour
          target: 2500
          prices: {labour: 2, capital: 1}
          limits: {labour: [0, 1], capital: [0, 900]}
      """;

  private static final String BRICKYARDS =
      """
      title: Brickyards, some of which burn no fuel
      records: {file: brickyards.csv, plant: plant, period: year}
      output: {column: bricks}
      inputs:
        labour: {quantity: hours, price: wage}
        machines: {quantity: machine_hours, price: rental}
        fuel: {quantity: fuel, spending: fuel_cost}
      technologies: [cobb-douglas, ces]
      estimation: {plant-effects: within, zeros: dummy}
      matrix:
        technologies: [cobb-douglas, ces]
        plant-effects: [none, within, between, differences]
        standard-errors: [classical, robust]
        samples: {all: {}, earlier: {half: earlier}}
        choose-by: [reset, aic]
      least-cost:
        - {name: Six thousand bricks, target: 6000}
      filing: {periods: [2024, 2024]}
      """;

  private static final String THIRTY_POINTS =
      """
      title: Thirty points
      records: {file: ces-30-points.csv}
      output: {column: output}
      inputs:
        labour: {quantity: labour}
        capital: {quantity: capital}
      technologies: [cobb-douglas, ces, translog]
      least-cost:
        - name: Half a unit
          target: 0.5
          prices: {labour: 1, capital: 1}
          curve: {from: 0.1, to: 1.2, points: 21}
      """;

  private static final String STATES =
      """
      title: Public capital in 48 states, 1970 to 1986
      records: {file: us-states-public-capital.csv, plant: state, period: year}
      output: {column: gsp}
      inputs:
        public capital: {quantity: pcap}
        private capital: {quantity: pc}
        employment: {quantity: emp}
      controls:
        - {column: unemp}
      technologies: [cobb-douglas, ces, translog]
      estimation: {plant-effects: %s}
      least-cost:
        - name: A state of middle size
          target: 40000
          prices: {public capital: 0.1, private capital: 0.1, employment: 15}
          curve: {from: 5000, to: 400000, points: 41}
      """;
}
