package isowright.house;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import org.junit.jupiter.api.Test;

/** What the guides promise can be found in the files they speak of. */
class ReadmeTest {

  private static final Pattern LINK = Pattern.compile("\\]\\(([^)#:]+)\\)");

  @Test
  void testCommandIsTheOneTheAutomaticChecksRun() throws IOException {
    List<String> script = Files.readAllLines(Path.of(".ci/run"));
    assertThat(Files.readString(Path.of("README.md")))
        .contains("```\n" + script.get(script.size() - 1) + "\n```");
  }

  /** Line by line and in its order, so that the example cannot drift from what is tested. */
  @Test
  void exampleStudyIsPartOfTheDemo() throws IOException {
    String guide = Files.readString(Path.of("README.md"));
    int start = guide.indexOf("```yaml\n") + "```yaml\n".length();
    List<String> example = guide.substring(start, guide.indexOf("```", start)).lines().toList();
    assertThat(example).hasSizeGreaterThan(20);
    assertThat(Files.readAllLines(Path.of("notebooks-data/glassworks.yaml")))
        .containsSubsequence(example);
  }

  @Test
  void everyLinkLeadsToAFile() throws IOException {
    for (Path guide :
        List.of(
            Path.of("README.md"), Path.of("DEVELOPERS.md"), Path.of("notebooks-data/README.md"))) {
      Matcher link = LINK.matcher(Files.readString(guide));
      while (link.find()) {
        assertThat(Path.of(link.group(1))).as(guide + ": " + link.group(1)).exists();
      }
    }
  }
}
