package isowright.study;

import isowright.estimation.Estimator;
import isowright.estimation.Specification;
import isowright.records.Source;
import java.io.IOException;
import java.io.InputStream;
import java.io.UncheckedIOException;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Properties;
import java.util.function.Function;
import java.util.stream.Collectors;

/** What a run was made with: version, hashes, and every setting in force, defaults included. */
final class Settings {

  private Settings() {}

  static Findings.Run run(Study study) {
    return new Findings.Run(
        version(),
        study.title(),
        String.valueOf(study.file().getFileName()),
        study.sha256(),
        settings(study));
  }

  static Findings.Units units(Study study) {
    Map<String, String> units = new LinkedHashMap<>();
    for (int i = 0; i < study.inputs().size(); i++) {
      units.put(study.inputs().get(i), study.inputUnits().get(i).orElse(""));
    }
    return new Findings.Units(study.outputUnit().orElse(""), units, study.money().words());
  }

  /** The program's version, from the build. */
  static String version() {
    try (InputStream in = Settings.class.getResourceAsStream("/isowright/version.properties")) {
      Properties properties = new Properties();
      if (in != null) {
        properties.load(in);
      }
      return properties.getProperty("version", "unknown");
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }

  private static Map<String, String> settings(Study study) {
    Map<String, String> settings = new LinkedHashMap<>();
    study
        .records()
        .ifPresent(
            records -> {
              Source source = records.source();
              settings.put("records.file", String.valueOf(source.file().getFileName()));
              source.sheet().ifPresent(sheet -> settings.put("records.sheet", sheet));
              records
                  .keep()
                  .firstPeriod()
                  .ifPresent(
                      first ->
                          settings.put(
                              "records.keep.periods",
                              first + " to " + records.keep().lastPeriod().orElse("")));
              if (!records.keep().withoutPlants().isEmpty()) {
                settings.put(
                    "records.keep.without-plants",
                    String.join(", ", records.keep().withoutPlants()));
              }
            });
    settings.put("inputs", String.join(", ", study.inputs()));
    if (!study.technologies().isEmpty()) {
      Study.Estimation how = study.estimation();
      settings.put("technologies", String.join(", ", study.technologies()));
      settings.put("estimation.plant-effects", how.plantEffects().word());
      settings.put("estimation.time", how.time().word());
      if (how.plantEffects().random()) {
        settings.put("estimation.variance-components", how.components().word());
      }
      settings.put("estimation.scaling", how.scaled() ? "geometric-mean" : "none");
      settings.put("estimation.standard-errors", FitStage.standardErrors(study).word());
      boolean keeps = study.records().map(r -> r.roles().keepsZeros()).orElse(false);
      settings.put("estimation.zeros", keeps ? "dummy" : "drop");
      settings.put("estimation.missing-values", "drop");
      if (how.estimator() instanceof Estimator.Frontier frontier) {
        settings.put("estimation.frontier.inefficiency", frontier.lawWord());
        settings.put("estimation.frontier.over-time", frontier.overTime().word());
      }
      held(how.held(), settings);
      settings.putAll(EndogenousBinder.settings(how.estimators()));
      how.resampling()
          .ifPresent(
              drawing -> {
                settings.put("estimation.resampling.draws", Integer.toString(drawing.draws()));
                settings.put("estimation.resampling.seed", Long.toString(drawing.seed()));
              });
      settings.put(
          "questions.returns-to-scale", Double.toString(study.questions().returnsToScale()));
      settings.put("questions.substitution", Double.toString(study.questions().substitution()));
    }
    settings.put("estimation.confidence", Double.toString(study.estimation().confidence()));
    settings.put("money", study.money().words());
    protocol(study.protocol(), settings);
    settings.putAll(ReviewSettings.of(study));
    return settings;
  }

  private static void held(Study.Held held, Map<String, String> settings) {
    held.restrict().ifPresent(to -> settings.put("estimation.restrict", to.word()));
    settings.put("estimation.regularity", held.regularity().word());
    if (!held.nests().isEmpty()) {
      settings.put(
          "estimation.nests",
          held.nests().stream()
              .map(group -> String.join(" + ", group))
              .collect(Collectors.joining(", ")));
    }
  }

  private static void protocol(Protocol protocol, Map<String, String> settings) {
    for (Protocol.Expectation expected : protocol.expectations()) {
      settings.put(
          "expect."
              + expected.subject().word()
              + expected.input().map(input -> "." + input).orElse(""),
          expected.low() + " to " + expected.high());
    }
    protocol.matrix().ifPresent(matrix -> matrix(matrix, settings));
    if (!protocol.decisions().isEmpty()) {
      settings.put("decisions", Integer.toString(protocol.decisions().size()));
    }
  }

  private static void matrix(Matrix matrix, Map<String, String> settings) {
    settings.put("matrix.technologies", String.join(", ", matrix.technologies()));
    settings.put(
        "matrix.plant-effects", words(matrix.plantEffects(), Specification.PlantEffects::word));
    settings.put("matrix.time", words(matrix.times(), Specification.Time::word));
    if (!matrix.standardErrors().isEmpty()) {
      settings.put(
          "matrix.standard-errors",
          words(matrix.standardErrors(), Specification.StandardErrors::word));
    }
    settings.put("matrix.samples", words(matrix.samples(), Matrix.Sample::name));
    settings.put(
        "matrix.choose-by",
        matrix.chooseBy().isEmpty() ? "none" : words(matrix.chooseBy(), Matrix.Criterion::word));
  }

  private static <T> String words(List<T> values, Function<T, String> word) {
    return values.stream().map(word).collect(Collectors.joining(", "));
  }
}
