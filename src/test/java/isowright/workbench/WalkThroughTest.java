package isowright.workbench;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.net.URISyntaxException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import jdk.jshell.JShell;
import jdk.jshell.Snippet;
import jdk.jshell.SnippetEvent;
import jdk.jshell.SourceCodeAnalysis;
import jdk.jshell.execution.LoaderDelegate;
import jdk.jshell.execution.LocalExecutionControl;
import jdk.jshell.spi.ExecutionControl;
import jdk.jshell.spi.ExecutionControl.ClassBytecodes;
import jdk.jshell.spi.ExecutionControlProvider;
import jdk.jshell.spi.ExecutionEnv;
import org.junit.jupiter.api.Test;

/** The walk from code goes through, and every line gives what the file says it gives. */
class WalkThroughTest {

  private static final Path FILE = Path.of("notebooks-data", "walk-through.jsh");
  private static final String GIVES = "// ==>";

  /** A complete piece of code and what it is said to give; empty where nothing is said. */
  private record Step(String code, String gives) {}

  private static List<Step> steps(SourceCodeAnalysis analysis) throws IOException {
    List<Step> steps = new ArrayList<>();
    StringBuilder pending = new StringBuilder();
    String gives = "";
    for (String line : Files.readAllLines(FILE)) {
      int at = line.indexOf(GIVES);
      if (at >= 0) {
        gives = line.substring(at + GIVES.length()).strip();
      }
      pending.append(at >= 0 ? line.substring(0, at) : line).append('\n');
      if (pending.toString().isBlank() || pending.toString().strip().startsWith("//")) {
        pending.setLength(0);
        continue;
      }
      if (analysis.analyzeCompletion(pending.toString()).completeness().isComplete()) {
        steps.add(new Step(pending.toString(), gives));
        pending.setLength(0);
        gives = "";
      }
    }
    assertThat(pending.toString()).as("code that never ends").isBlank();
    return steps;
  }

  /** Where the program's classes are: a folder in a build, a jar for a user. */
  private static String program() {
    try {
      return Path.of(Workbench.class.getProtectionDomain().getCodeSource().getLocation().toURI())
          .toString();
    } catch (URISyntaxException impossible) {
      throw new IllegalStateException(impossible);
    }
  }

  /** Runs what the shell compiles in this process, with the classes that this test sees. */
  private static final class Here implements ExecutionControlProvider {
    @Override
    public String name() {
      return "here";
    }

    @Override
    public ExecutionControl generate(ExecutionEnv environment, Map<String, String> parameters) {
      return new LocalExecutionControl(new Beside());
    }
  }

  /** Puts what the shell compiles beside the classes that this test sees. */
  private static final class Beside extends ClassLoader implements LoaderDelegate {
    private final Map<String, byte[]> compiled = new HashMap<>();

    Beside() {
      super(WalkThroughTest.class.getClassLoader());
    }

    @Override
    public void load(ClassBytecodes[] classes) {
      for (ClassBytecodes one : classes) {
        compiled.put(one.name(), one.bytecodes());
      }
    }

    @Override
    public void classesRedefined(ClassBytecodes[] classes) {
      load(classes);
    }

    @Override
    public void addToClasspath(String path) {}

    @Override
    public Class<?> findClass(String name) throws ClassNotFoundException {
      byte[] code = compiled.get(name);
      if (code == null) {
        throw new ClassNotFoundException(name);
      }
      return defineClass(name, code, 0, code.length);
    }
  }

  @Test
  void everyLineGivesWhatTheFileSays() throws IOException {
    Locale before = Locale.getDefault();
    Locale.setDefault(Locale.ROOT);
    try (JShell shell = JShell.builder().executionEngine(new Here(), Map.of()).build()) {
      shell.addToClasspath(program());
      int held = 0;
      for (Step step : steps(shell.sourceCodeAnalysis())) {
        for (SnippetEvent event : shell.eval(step.code())) {
          assertThat(event.status()).as(step.code()).isEqualTo(Snippet.Status.VALID);
          assertThat(event.exception()).as(step.code()).isNull();
          if (!step.gives().isEmpty()) {
            held++;
            assertThat(event.value().replace("\"", "")).as(step.code()).isEqualTo(step.gives());
          }
        }
      }
      assertThat(held).as("lines held to what they are said to give").isGreaterThan(8);
    } finally {
      Locale.setDefault(before);
    }
  }
}
