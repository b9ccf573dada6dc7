package isowright.report;

import static java.nio.charset.StandardCharsets.UTF_8;
import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Map;
import java.util.UUID;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** A report is put in place whole or not at all, and no other folder is ever emptied. */
class PublicationTest {

  private static final Map<String, byte[]> FIRST =
      Map.of(
          "findings.json", "{}".getBytes(UTF_8),
          "report.html", "first".getBytes(UTF_8),
          "charts/old.svg", "old".getBytes(UTF_8));
  private static final Map<String, byte[]> SECOND =
      Map.of(
          "findings.json", "{2}".getBytes(UTF_8),
          "report.html", "second".getBytes(UTF_8),
          "charts/new.svg", "new".getBytes(UTF_8));

  @TempDir Path folder;

  private List<String> files() throws IOException {
    try (Stream<Path> all = Files.walk(folder)) {
      return all.filter(Files::isRegularFile)
          .map(path -> folder.relativize(path).toString().replace('\\', '/'))
          .sorted()
          .toList();
    }
  }

  @Test
  void makesTheFolderAndThoseAbove() throws Exception {
    Publication.into(folder.resolve("a/b/report")).write(FIRST);
    assertThat(files())
        .containsExactly(
            "a/b/report/charts/old.svg", "a/b/report/findings.json", "a/b/report/report.html");
  }

  @Test
  void replacesAnEarlierReportAndKeepsWhatLiesBesideIt() throws Exception {
    Path target = folder.resolve("report");
    Publication.into(target).write(FIRST);
    Files.writeString(target.resolve("notes.txt"), "mine");
    Publication.into(target).write(SECOND);
    assertThat(files())
        .containsExactly(
            "report/charts/new.svg",
            "report/findings.json",
            "report/notes.txt",
            "report/report.html");
    assertThat(target.resolve("report.html")).hasContent("second");
    assertThat(target.resolve("notes.txt")).hasContent("mine");
  }

  @Test
  void anEmptyFolderIsUsed() throws Exception {
    Publication.into(Files.createDirectory(folder.resolve("empty"))).write(FIRST);
    assertThat(files()).hasSize(3).allMatch(name -> name.startsWith("empty/"));
  }

  @Test
  void aFolderReachedByALinkIsReplacedWhereItIs() throws Exception {
    Path real = Files.createDirectory(folder.resolve("real"));
    Path link = Files.createSymbolicLink(folder.resolve("link"), real);
    Publication.into(link).write(FIRST);
    assertThat(link).isSymbolicLink();
    assertThat(real.resolve("report.html")).hasContent("first");
  }

  @Test
  void aFileIsNotAFolder() throws IOException {
    Path file = Files.writeString(folder.resolve("file"), "x");
    assertRefused(file, "is a file; name a folder");
    assertRefused(file.resolve("below"), "is a file, so");
    assertThat(file).hasContent("x");
  }

  @Test
  void aFolderWithOtherFilesIsLeftAlone() throws IOException {
    Path photos = Files.createDirectory(folder.resolve("photos"));
    Files.writeString(photos.resolve("one.jpg"), "x");
    assertRefused(photos, "holds other files and no earlier report");
    assertThat(files()).containsExactly("photos/one.jpg");
  }

  @Test
  void theFolderOneWorksInAndTheRootAreRefused() {
    assertRefused(Path.of(""), "is the folder you work in");
    assertRefused(folder.getRoot(), "cannot be the folder of a report");
  }

  private static void assertRefused(Path target, String words) {
    assertThatThrownBy(() -> Publication.into(target))
        .isInstanceOf(Publication.Refused.class)
        .hasMessageContaining(words);
  }

  /** A file in the way of the new folder makes the exchange fail after the files were written. */
  @Test
  void aFailedPublicationLeavesTheEarlierReportWhole() throws Exception {
    Path target = folder.resolve("report");
    Publication.into(target).write(FIRST);
    // a name that is a folder for one file and a file for another cannot be written
    Map<String, byte[]> impossible =
        Map.of("charts", new byte[0], "charts/a.svg", new byte[0], "findings.json", new byte[0]);
    assertThatThrownBy(() -> Publication.into(target).write(impossible))
        .isInstanceOf(Publication.Refused.class)
        .hasMessageContaining("could not be written");
    assertThat(files())
        .containsExactly("report/charts/old.svg", "report/findings.json", "report/report.html");
    assertThat(target.resolve("report.html")).hasContent("first");
  }

  @Test
  void aFailedFirstPublicationLeavesNothing() throws Exception {
    Map<String, byte[]> impossible = Map.of("charts", new byte[0], "charts/a.svg", new byte[0]);
    Publication publication = Publication.into(folder.resolve("reports/report"));
    assertThatThrownBy(() -> publication.write(impossible)).isInstanceOf(Publication.Refused.class);
    assertThat(folder).isEmptyDirectory();
  }

  @ParameterizedTest
  @ValueSource(
      strings = {"../escape", "charts/../../escape", "/absolute", "a/b/c", "", "..", "A.html"})
  void namesThatCouldLeaveTheFolderAreDefects(String name) throws Exception {
    Publication publication = Publication.into(folder.resolve("report"));
    assertThatThrownBy(() -> publication.write(Map.of(name, new byte[0])))
        .isInstanceOf(IllegalArgumentException.class);
    assertThat(folder).isEmptyDirectory();
  }

  @Test
  void aSecondRunIntoTheSameFolderIsRefusedUntilTheFirstIsDone() throws Exception {
    Path target = folder.resolve("report");
    try (Publication first = Publication.into(target)) {
      assertRefused(target, "another run is writing into");
      assertThat(first.folder()).isEqualTo(target.toAbsolutePath());
    }
    Publication.into(target).write(FIRST);
    assertThat(target.resolve("report.html")).hasContent("first");
  }

  /** As if a run had been killed between moving the earlier report aside and putting its own. */
  @Test
  void whatAKilledRunLeftIsMended() throws Exception {
    Path target = folder.resolve("report");
    Publication.into(target).write(FIRST);
    String run = UUID.randomUUID().toString();
    Files.move(target, folder.resolve(".report.old-" + run));
    Files.createDirectories(folder.resolve(".report.new-" + run + "/charts"));
    Files.createDirectories(folder.resolve(".report.new-of-mine"));
    Publication.into(target).close();
    assertThat(target.resolve("report.html")).hasContent("first");
    assertThat(folder.resolve(".report.new-" + run)).doesNotExist();
    assertThat(folder.resolve(".report.new-of-mine")).as("nothing of a run").exists();
  }
}
