package isowright.report;

import isowright.study.FrontierFindings;
import isowright.study.FrontierFindings.Plant;
import isowright.study.FrontierFindings.Row;
import isowright.study.FrontierFindings.Variances;
import java.io.IOException;
import java.util.List;
import java.util.Optional;

/** What a frontier found, as it stands in the findings file; nothing is written of other fits. */
final class FrontierJson {

  private FrontierJson() {}

  static void write(JsonFile file, Optional<FrontierFindings> frontier) throws IOException {
    if (frontier.isPresent()) {
      FrontierFindings found = frontier.get();
      file.object("frontier", () -> write(file, found));
    }
  }

  private static void write(JsonFile file, FrontierFindings found) throws IOException {
    file.text("inefficiencyLaw", found.law());
    file.text("overTime", found.overTime());
    file.text("state", found.state());
    file.text("words", found.words());
    file.number("skewness", found.skewness());
    if (found.variances().isPresent()) {
      Variances v = found.variances().get();
      file.figure("noise", Optional.of(v.noise()));
      file.figure("inefficiency", Optional.of(v.inefficiency()));
      file.figure("ratio", Optional.of(v.ratio()));
      file.figure("gamma", Optional.of(v.gamma()));
      file.figure("shareOfVariance", Optional.of(v.share()));
      file.figure("meanInefficiency", Optional.of(v.mean()));
      if (v.decay().isPresent()) {
        file.figure("decay", v.decay());
      }
    }
    if (found.bestByEffects().isPresent()) {
      file.text("bestByEffects", found.bestByEffects().get());
    }
    if (!found.plants().isEmpty()) {
      file.list("plants", found.plants(), false, plant -> plant(file, plant));
    }
    if (!found.rows().isEmpty()) {
      file.list("rows", found.rows(), false, row -> row(file, row));
    }
  }

  private static void plant(JsonFile file, Plant plant) throws IOException {
    row(file, plant.last());
    if (plant.byEffects().isPresent()) {
      file.figure("byEffects", plant.byEffects());
    }
  }

  private static void row(JsonFile file, Row row) throws IOException {
    file.text("plant", row.plant());
    file.text("period", row.period());
    file.whole("row", row.row());
    file.figure("inefficiency", Optional.of(row.inefficiency()));
    file.figure("efficiency", Optional.of(row.efficiency()));
    file.number("aboveMean", row.aboveMean());
  }

  /** The keys of the technology file that a frontier adds: where the typical plant stands. */
  static void technology(JsonFile file, Optional<FrontierFindings> frontier) throws IOException {
    List<Variances> found = frontier.flatMap(FrontierFindings::variances).stream().toList();
    for (Variances v : found) {
      file.line(
          "frontier",
          () -> {
            file.text("inefficiencyLaw", frontier.orElseThrow().law());
            file.text("overTime", frontier.orElseThrow().overTime());
            file.number("meanInefficiency", v.mean().value());
            file.text(
                "words",
                "The constant is that of the frontier; the typical plant of the last period lies"
                    + " meanInefficiency below it in ln output.");
          });
    }
  }
}
