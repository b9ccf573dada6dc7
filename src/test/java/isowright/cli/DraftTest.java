package isowright.cli;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import isowright.records.Roles.Input;
import isowright.study.Study;
import isowright.study.StudyFile;
import isowright.study.StudyRefused;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** A draft is a study that can be read at once when everything could be guessed. */
class DraftTest {

  private static final Path GLASSWORKS = Path.of("notebooks-data/glassworks.csv");

  @TempDir Path folder;

  private Path records(String text) throws IOException {
    return Files.writeString(folder.resolve("records.csv"), text);
  }

  @Test
  void aCompleteDraftIsASoundStudy() throws Exception {
    Path into = folder.resolve("study.yaml");
    Invocation draft = Invocation.of("draft", GLASSWORKS.toString(), "--into", into.toString());
    assertThat(draft.code()).isZero();
    assertThat(draft.out()).isEmpty();
    assertThat(draft.err()).contains("isowright check " + into).doesNotContain("To be filled in");
    Study study = StudyFile.read(into);
    Study.Records found = study.records().orElseThrow();
    assertThat(found.source().file().toRealPath()).isEqualTo(GLASSWORKS.toRealPath());
    assertThat(found.roles().plant()).contains("plant");
    assertThat(found.roles().period()).contains("year");
    assertThat(found.roles().output()).isEqualTo("tonnes");
    assertThat(found.roles().inputs())
        .extracting(Input::name, Input::quantity)
        .containsExactly(
            org.assertj.core.groups.Tuple.tuple("labour", "labour_hours"),
            org.assertj.core.groups.Tuple.tuple("machines", "machine_hours"),
            org.assertj.core.groups.Tuple.tuple("energy", "energy_gj"));
    assertThat(found.roles().inputs().get(1).spending()).contains("machine_cost");
    assertThat(found.roles().filedCost()).contains("filed_cost");
    assertThat(Invocation.of("check", into.toString()).code()).isZero();
  }

  @Test
  void everyGuessHasItsReasonAboveIt() {
    List<String> lines = Invocation.of("draft", GLASSWORKS.toString()).out().lines().toList();
    for (String key :
        List.of("plant", "period", "column", "quantity", "price", "spending", "cost", "deflator")) {
      for (int i = 0; i < lines.size(); i++) {
        if (lines.get(i).strip().startsWith(key + ":")) {
          assertThat(lines.get(i - 1).strip()).startsWith("# ").contains("it holds");
        }
      }
    }
    assertThat(lines).contains("#   furnace_age", "  column: tonnes");
  }

  @Test
  void whatCannotBeGuessedIsLeftOpenAndNamed() throws IOException {
    Path into = folder.resolve("study.yaml");
    Path file = records("a,b,c\nx,1.5,2.5\ny,2.5,3.5\n");
    Invocation draft = Invocation.of("draft", file.toString(), "--into", into.toString());
    assertThat(draft.code()).isZero();
    assertThat(draft.err()).contains("To be filled in", "`output.column`", "2 more inputs");
    assertThatThrownBy(() -> StudyFile.read(into))
        .isInstanceOfSatisfying(
            StudyRefused.class,
            refused ->
                assertThat(refused.mistakes())
                    .extracting(mistake -> mistake.key())
                    .containsExactly(
                        "output.column", "inputs.input-1.quantity", "inputs.input-2.quantity"));
  }

  @Test
  void anExistingFileIsNeverOverwritten() throws IOException {
    Path into = Files.writeString(folder.resolve("study.yaml"), "mine");
    Invocation draft = Invocation.of("draft", GLASSWORKS.toString(), "--into", into.toString());
    assertThat(draft.code()).isEqualTo(2);
    assertThat(draft.err()).contains("never overwrites a file");
    assertThat(into).hasContent("mine");
  }

  @Test
  void aMissingFolderAndMissingRecordsAreMistakes() {
    Path into = folder.resolve("no/such/study.yaml");
    Invocation nowhere = Invocation.of("draft", GLASSWORKS.toString(), "--into", into.toString());
    assertThat(nowhere.code()).isEqualTo(2);
    assertThat(nowhere.err()).contains("is there such a folder?");
    Invocation nothing = Invocation.of("draft", folder.resolve("none.csv").toString());
    assertThat(nothing.code()).isEqualTo(2);
    assertThat(nothing.out()).isEmpty();
  }

  @Test
  void aSheetIsNamed() throws Exception {
    Path into = folder.resolve("study.yaml");
    Path workbook = Path.of("notebooks-data/glassworks.xlsx");
    Invocation draft =
        Invocation.of("draft", workbook.toString(), "--sheet", "plants", "--into", into.toString());
    assertThat(draft.code()).isZero();
    assertThat(StudyFile.read(into).records().orElseThrow().source().sheet()).contains("plants");
  }

  /** Headings with marks that mean something in YAML come back as they were. */
  @Test
  void awkwardHeadings() throws Exception {
    Path file =
        records(
            """
            plant: name,year,# tonnes,labour hours [h],"machine hours, {all}",null
            A,2020,1,2,3,4
            A,2021,2,3,4,5
            """);
    Path into = folder.resolve("study.yaml");
    assertThat(Invocation.of("draft", file.toString(), "--into", into.toString()).code()).isZero();
    Study.Records found = StudyFile.read(into).records().orElseThrow();
    assertThat(found.roles().plant()).contains("plant: name");
    assertThat(found.roles().output()).isEqualTo("# tonnes");
    assertThat(found.roles().inputs())
        .extracting(Input::quantity)
        .containsExactly("labour hours [h]", "machine hours, {all}");
    assertThat(found.source().file().getFileName().toString()).isEqualTo("records.csv");
  }

  @ParameterizedTest
  @ValueSource(
      strings = {
        "plain", "two words", "a: b", "- a", "#a", "null", "True", "~", "1.5", "2020", "a'b",
        "say \"so\"", "back\\slash", "{a}", "[a]", "a, b", "&a", "*a", "!a", "%a", "@a", "`a",
        "straße", "a/b.csv", "../a.csv", "a #b", "x - y", "|", ">", "?", ":"
      })
  void anyTextComesBackAsItWas(String text) throws Exception {
    String study =
        """
        title: %s
        records: {file: r.csv, plant: %s}
        output: {column: q}
        inputs: {a: {quantity: a}, b: {quantity: b}}
        technologies: [ces]
        """
            .replace("%s", DraftText.scalar(text));
    Study read = StudyFile.read(Files.writeString(folder.resolve("study.yaml"), study));
    assertThat(read.title()).isEqualTo(text);
    assertThat(read.records().orElseThrow().roles().plant()).isEqualTo(Optional.of(text));
  }
}
