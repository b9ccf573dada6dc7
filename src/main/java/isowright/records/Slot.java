package isowright.records;

/**
 * A declared use of a column: its heading and what its cells must be.
 *
 * @param heading the heading as declared
 * @param kind what its cells must be
 * @param role what the column is, in words, such as {@code quantity of labour}
 */
record Slot(String heading, Kind kind, String role) {

  /** What the cells of a column must be, and what a blank or a value out of range means. */
  enum Kind {
    /** Text that names a plant. */
    PLANT,
    /** An integer or an ISO 8601 date. */
    PERIOD,
    /** A positive number; blank sets the row aside; zero or negative is an error. */
    OUTPUT,
    /** A number; blank, zero or negative sets the row aside. */
    QUANTITY,
    /** A positive number; blank leaves the price unknown. */
    PRICE,
    /** A number, not negative; blank leaves the spending unknown. */
    SPENDING,
    /** A number; blank sets the row aside. */
    CONTROL,
    /** A positive number; blank sets the row aside. */
    LOGGED_CONTROL,
    /** A positive number; blank leaves the row's money unknown. */
    DEFLATOR,
    /** A positive number; blank leaves the filed cost unknown. */
    FILED_COST,
    /** A number, not negative; blank leaves the amount unknown. */
    AMOUNT,
    /** A number; blank leaves it unknown. */
    FURTHER;

    /** Whether the cells are numbers. */
    boolean numeric() {
      return this != PLANT && this != PERIOD;
    }

    /** Whether a row without this value cannot be used. */
    boolean neededInEveryRow() {
      return switch (this) {
        case PLANT, PERIOD, OUTPUT, QUANTITY, CONTROL, LOGGED_CONTROL -> true;
        case PRICE, SPENDING, DEFLATOR, FILED_COST, AMOUNT, FURTHER -> false;
      };
    }
  }

  /** How the column is named in a message. */
  String words() {
    return "column \"" + Shown.shortened(heading) + "\" (" + role + ")";
  }
}
