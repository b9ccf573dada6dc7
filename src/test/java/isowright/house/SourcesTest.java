package isowright.house;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Set;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;

/** What can be seen in the sources only: comments, lengths, words. */
class SourcesTest {

  private static final Path MAIN = Path.of("src/main/java/isowright");
  private static final Path TESTS = Path.of("src/test/java/isowright");

  /** A public type at the top of its file, with the comment before it, annotations between. */
  private static final Pattern PUBLIC_TYPE =
      Pattern.compile(
          // possessive throughout: a long comment or annotation must not exhaust the stack
          "(?s)(?:/\\*\\*(?<comment>[^*]*+(?:\\*(?!/)[^*]*+)*+)\\*/\\s*)?"
              + "(?<annotations>(?:@\\w+(?:\\((?:[^()\"]++|\"(?:[^\"\\\\]++|\\\\.)*+\"|\\([^()]*+\\))*+\\))?\\s*)*+)public"
              + " (?:abstract |final |sealed |non-sealed )*(?:class|interface|record|enum)"
              + " (?<name>\\w+)");

  /** Fewer words than this cannot say what question a type answers. */
  private static final int LEAST_WORDS = 6;

  private static final int MOST_LINES = 400;

  private static List<Path> sources(Path root) throws IOException {
    try (Stream<Path> all = Files.walk(root)) {
      return all.filter(path -> path.toString().endsWith(".java")).sorted().toList();
    }
  }

  @Test
  void everyPublicTypeHasACommentOfSubstance() throws IOException {
    int seen = 0;
    List<String> bare = new ArrayList<>();
    for (Path source : sources(MAIN)) {
      Matcher type = PUBLIC_TYPE.matcher(Files.readString(source));
      String file = String.valueOf(source.getFileName());
      if (!type.find() || !file.equals(type.group("name") + ".java")) {
        continue;
      }
      seen++;
      String comment = type.group("comment") == null ? "" : type.group("comment");
      String prose = comment.replaceAll("(?m)^\\s*\\*", " ");
      long words = Pattern.compile("\\p{L}[\\p{L}’'-]+").matcher(prose).results().count();
      if (words < LEAST_WORDS) {
        bare.add(source + ": " + words + " words");
      }
    }
    assertThat(bare).as("public types whose comment says next to nothing").isEmpty();
    assertThat(seen).as("public types seen").isGreaterThan(40);
  }

  /** A comment that names a test promises that there is one. */
  @Test
  void everyTestNamedInACommentExists() throws IOException {
    Set<String> tests = new HashSet<>();
    for (Path test : sources(TESTS)) {
      tests.add(String.valueOf(test.getFileName()).replace(".java", ""));
    }
    Pattern named = Pattern.compile("@code\\s+(?:\\*\\s*)?(\\w+Test)\\}");
    int seen = 0;
    List<String> missing = new ArrayList<>();
    for (Path source : sources(MAIN)) {
      Matcher name = named.matcher(Files.readString(source));
      while (name.find()) {
        seen++;
        if (!tests.contains(name.group(1))) {
          missing.add(source.getFileName() + ": " + name.group(1));
        }
      }
    }
    assertThat(seen).as("tests named").isGreaterThan(100);
    assertThat(missing).isEmpty();
  }

  @Test
  void noFileIsLong() throws IOException {
    List<String> tooLong = new ArrayList<>();
    for (Path root : List.of(MAIN, TESTS)) {
      for (Path source : sources(root)) {
        int lines = Files.readAllLines(source).size();
        if (lines > MOST_LINES) {
          tooLong.add(source + ": " + lines + " lines");
        }
      }
    }
    assertThat(tooLong).as("files in which two names would tell more than one").isEmpty();
  }

  /**
   * Least squares is statistics: economics would tie it to one use and to one vocabulary. (What a
   * call or a digit costs is plain English, so that word is not looked for.)
   */
  @Test
  void leastSquaresKnowsNoEconomics() throws IOException {
    Pattern economics =
        Pattern.compile("(?i)\\b(labour|capital|wages?|outputs?|plants?|prices?|firms?)\\b");
    for (Path source : sources(MAIN.resolve("regression"))) {
      if (source.endsWith("package-info.java")) {
        continue; // the sign names the words that do not belong here
      }
      assertThat(Files.readString(source)).as(source.toString()).doesNotContainPattern(economics);
    }
  }

  /**
   * Numbers must not be written after the fashion of the machine's country: decimals need a locale.
   * (Text and whole numbers may be put together without one; the entry of the program sets the root
   * locale for them.)
   */
  @Test
  void numbersAreFormattedForNoParticularCountry() throws IOException {
    Pattern number =
        Pattern.compile(
            "\"(?:[^\"\\\\\n"
                + "]|\\\\.)*%[-+0#, (]*\\d*(?:\\.\\d+)?[fgeEG](?:[^\"\\\\\n"
                + "]|\\\\.)*\"\\s*\\.formatted\\(");
    Pattern withoutLocale = Pattern.compile("String\\.format\\(\\s*\"");
    for (Path source : sources(MAIN)) {
      assertThat(Files.readString(source))
          .as(source.toString())
          .doesNotContainPattern(number)
          .doesNotContainPattern(withoutLocale);
    }
  }
}
