package isowright.benchmark;

import isowright.study.Findings;
import isowright.study.Pipeline;
import isowright.study.Progress;
import isowright.study.Study;
import isowright.study.StudyFile;
import java.nio.file.Files;
import java.nio.file.Path;

/**
 * Times the usual specification matrix, 24 combinations, on the demo: the same study with it and
 * without it, each run warm; the difference is the matrix.
 */
final class MatrixTimes {

  private static final int WARM_UP = 3;

  private MatrixTimes() {}

  static void report(Steps steps) throws Exception {
    steps.heading("Demo with the usual specification matrix, 24 combinations");
    Path demo = Path.of("notebooks-data", "glassworks.yaml");
    Path folder = Files.createDirectories(Path.of("target", "matrix-times"));
    Files.write(
        folder.resolve("glassworks.csv"),
        Files.readAllBytes(demo.resolveSibling("glassworks.csv")));
    String text = Files.readString(demo);
    Study without = StudyFile.read(Files.writeString(folder.resolve("without.yaml"), text));
    Study with =
        StudyFile.read(
            Files.writeString(
                folder.resolve("with.yaml"),
                text.replace("\nfiling:", "\nmatrix: default\nfiling:")));
    Findings cold = steps.time("first run, with the matrix", () -> run(with));
    if (cold.specification().matrix().orElseThrow().estimated() != 24) {
      throw new IllegalStateException("not every combination of the usual matrix was estimated");
    }
    for (int i = 0; i < WARM_UP; i++) {
      run(with);
    }
    steps.time("without the matrix", () -> run(without));
    steps.time("with the matrix", () -> run(with));
  }

  private static Findings run(Study study) throws Exception {
    return Pipeline.run(study, Progress.SILENT);
  }
}
