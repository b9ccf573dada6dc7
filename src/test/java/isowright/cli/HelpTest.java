package isowright.cli;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.io.InputStream;
import java.io.PrintWriter;
import java.io.StringWriter;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Objects;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** The help texts are those of the golden files, and are quick. */
class HelpTest {

  private static String golden(String name) throws IOException {
    try (InputStream in = HelpTest.class.getResourceAsStream("help-" + name + ".txt")) {
      return new String(Objects.requireNonNull(in).readAllBytes(), StandardCharsets.UTF_8);
    }
  }

  private static void assertText(String actual, String name) throws IOException {
    assertThat(actual).isEqualToNormalizingNewlines(golden(name));
  }

  @Test
  void ofAllCommands() throws IOException {
    for (List<String> arguments : List.of(List.of("help"), List.of("--help"), List.of("-h"))) {
      Invocation help = Invocation.of(arguments.toArray(String[]::new));
      assertText(help.out(), "all");
      assertThat(help.err()).isEmpty();
      assertThat(help.code()).isZero();
    }
  }

  @ParameterizedTest
  @ValueSource(strings = {"draft", "check", "run", "plan", "verify", "compare", "help"})
  void ofOneCommand(String command) throws IOException {
    Invocation help = Invocation.of("help", command);
    assertText(help.out(), command);
    assertThat(help.code()).isZero();
    if (!command.equals("help")) {
      assertThat(Invocation.of(command, "--help")).isEqualTo(help);
    }
  }

  @Test
  void withoutACommandTheHelpIsAMessage() throws IOException {
    Invocation nothing = Invocation.of();
    assertText(nothing.err(), "all");
    assertThat(nothing.out()).isEmpty();
    assertThat(nothing.code()).isEqualTo(ExitCode.MISTAKE.number());
  }

  @Test
  void version() {
    assertThat(Invocation.of("--version").out()).matches("isowright \\d+\\.\\d+\\.\\d+\\R");
    assertThat(Invocation.of("-V")).isEqualTo(Invocation.of("--version"));
  }

  @Test
  void boldOnlyWhereTheTerminalShowsIt() {
    assertThat(helpOn(new Terminal(true, true))).contains("\u001b[1m");
    assertThat(helpOn(new Terminal(true, false))).doesNotContain("\u001b");
    assertThat(helpOn(Terminal.NONE)).doesNotContain("\u001b");
  }

  private static String helpOn(Terminal terminal) {
    StringWriter out = new StringWriter();
    Main.run(
        new String[] {"help"}, new PrintWriter(out), new PrintWriter(new StringWriter()), terminal);
    return out.toString();
  }

  /**
   * Help must be quick, so it must not load what commands work with. Seen from outside, in a fresh
   * process that tells which classes it loads.
   */
  @Test
  void loadsNothingThatCommandsWorkWith() throws Exception {
    List<String> command = new ArrayList<>();
    command.add(Path.of(System.getProperty("java.home"), "bin", "java").toString());
    command.add("-Xlog:class+load");
    command.add("-cp");
    command.add(System.getProperty("java.class.path"));
    command.add(Main.class.getName());
    command.add("help");
    Process process = new ProcessBuilder(command).redirectErrorStream(true).start();
    String log = new String(process.getInputStream().readAllBytes(), StandardCharsets.UTF_8);
    assertThat(process.waitFor()).isZero();
    List<String> loaded =
        log.lines()
            .filter(line -> line.contains(" source: "))
            .map(line -> line.replaceFirst("^(\\[[^\\]]*\\])+ ", "").split(" ", 2)[0])
            .toList();
    assertThat(loaded).contains("isowright.cli.Main", "picocli.CommandLine");
    assertThat(loaded)
        .noneMatch(name -> name.startsWith("isowright.") && !name.startsWith("isowright.cli."))
        .noneMatch(name -> name.startsWith("java.awt."))
        .noneMatch(
            name ->
                name.matches(
                    "(tech\\.tablesaw|org\\.apache|org\\.knowm|com\\.fasterxml|org\\.snakeyaml)\\..*"));
  }
}
