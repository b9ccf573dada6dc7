package isowright.study;

import java.util.List;

/**
 * Which words an input may be called by. Parameters are named after inputs ({@code labour}, {@code
 * labour*machines}, {@code share:labour}), so a name must not contain {@code *} or {@code :} and
 * must not be the name of another parameter.
 */
final class InputNames {

  private static final List<String> TAKEN = List.of("constant", "trend", "rho", "scale");

  private InputNames() {}

  /** Adds a mistake where the key of an input cannot be its name. */
  static void check(YamlSection section, String name) {
    if (name.isBlank()) {
      section.refuse(name, "an input needs a name");
    } else if (name.contains("*") || name.contains(":")) {
      section.refuse(
          name,
          "an input's name must not contain * or :, which join the names of parameters; found `"
              + YamlValue.quote(name)
              + "`");
    } else if (TAKEN.contains(name)) {
      section.refuse(
          name,
          "`"
              + name
              + "` is the name of a parameter; call the input otherwise, such as `"
              + name
              + "-input`");
    }
  }
}
