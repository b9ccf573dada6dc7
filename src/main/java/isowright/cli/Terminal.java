package isowright.cli;

import java.util.Map;

/**
 * What the other end of standard error can show.
 *
 * @param interactive whether a person watches, so that a line may be rewritten in place
 * @param bold whether bold type may be used
 */
record Terminal(boolean interactive, boolean bold) {

  /** A file or a pipe: nothing but text. */
  static final Terminal NONE = new Terminal(false, false);

  /**
   * What can be shown.
   *
   * @param console whether the process has a console
   * @param environment the environment; {@code NO_COLOR} (when not empty) and {@code TERM=dumb} are
   *     respected
   */
  static Terminal of(boolean console, Map<String, String> environment) {
    boolean dumb = "dumb".equals(environment.get("TERM"));
    boolean interactive = console && !dumb;
    boolean plain = !environment.getOrDefault("NO_COLOR", "").isEmpty();
    return new Terminal(interactive, interactive && !plain);
  }
}
