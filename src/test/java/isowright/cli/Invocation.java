package isowright.cli;

import java.io.ByteArrayOutputStream;
import java.io.PrintStream;
import java.nio.charset.StandardCharsets;

/**
 * A command as a script sees it.
 *
 * @param code the exit code
 * @param out what stood on standard output
 * @param err what stood on standard error
 */
record Invocation(int code, String out, String err) {

  /** Runs a command with these arguments. */
  static Invocation of(String... arguments) {
    ByteArrayOutputStream out = new ByteArrayOutputStream();
    ByteArrayOutputStream err = new ByteArrayOutputStream();
    int code =
        Main.run(
            arguments,
            new PrintStream(out, false, StandardCharsets.UTF_8),
            new PrintStream(err, false, StandardCharsets.UTF_8));
    return new Invocation(
        code, out.toString(StandardCharsets.UTF_8), err.toString(StandardCharsets.UTF_8));
  }
}
