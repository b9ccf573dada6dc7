package isowright.study;

import java.util.HashMap;
import java.util.Map;

/**
 * Sees to it that one column of the records is not declared to be two things, say output and the
 * quantity of an input: an equation with the same column on both sides fits perfectly and says
 * nothing.
 */
final class ColumnUses {

  private final Map<String, String> claimed = new HashMap<>();

  /** Claims a column for the role at this key path; a mistake where it has another role already. */
  void claim(YamlSection section, String key, String column) {
    String role = section.path() + "." + key;
    String earlier = claimed.putIfAbsent(column, role);
    if (earlier != null) {
      section.refuse(
          key,
          "the column `"
              + YamlValue.quote(column)
              + "` is `"
              + earlier
              + "` already; one column has one role");
    }
  }
}
