package isowright.regression;

import java.util.List;

/**
 * A column that was dropped because the rows cannot tell it from others.
 *
 * @param column the column dropped
 * @param among the kept columns it is a combination of; {@link #GROUP_EFFECTS} where removing the
 *     group effects leaves nothing of it; empty where it is zero in every row
 */
public record Collinearity(String column, List<String> among) {

  /** Stands for the group effects among the names of columns. */
  public static final String GROUP_EFFECTS = "group effects";

  /** Copies the list. */
  public Collinearity {
    among = List.copyOf(among);
  }

  /** One sentence that says what the column is. */
  public String words() {
    if (among.isEmpty()) {
      return column + " is zero in every row";
    }
    if (among.equals(List.of(GROUP_EFFECTS))) {
      return column + " does not vary within groups, so the group effects take it up";
    }
    return column
        + (among.size() == 1 ? " is a multiple of " : " is a combination of ")
        + String.join(", ", among);
  }
}
