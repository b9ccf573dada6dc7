package isowright.cli;

import java.util.ArrayList;
import java.util.List;

/** Counts remarks by how much they matter. */
final class RemarkCounts {

  private RemarkCounts() {}

  /** "1 error, 2 warnings, 3 notes"; "none" where there is none. */
  static String words(List<String> severities) {
    List<String> parts = new ArrayList<>();
    for (String severity : List.of("error", "warning", "note")) {
      int count = (int) severities.stream().filter(severity::equals).count();
      if (count > 0) {
        parts.add(Failures.count(count, severity));
      }
    }
    return parts.isEmpty() ? "none" : String.join(", ", parts);
  }
}
