package isowright.records;

import java.util.Locale;
import java.util.Set;
import java.util.regex.Pattern;

/**
 * What is wrong with a cell, in words.
 *
 * @param code a short, stable name of the kind of fault
 * @param rule what the cell should have been
 * @param remedy what to do
 */
record CellFault(String code, String rule, String remedy) {

  private static final Set<String> WORDS_FOR_MISSING =
      Set.of(
          "na", "n/a", "n.a.", "n.a", "#n/a", "null", "none", "nil", "missing", "miss", "unknown",
          "-", "--", "---", "–", "—", ".", "..", "...", "?", "x", "*", "tbd", "k.a.", "empty");

  private static final Set<String> NOT_FINITE =
      Set.of(
          "nan",
          "-nan",
          "+nan",
          "inf",
          "-inf",
          "+inf",
          "infinity",
          "-infinity",
          "+infinity",
          "∞",
          "-∞",
          "#num!");

  private static final Pattern WITH_COMMA = Pattern.compile("[+-]?\\d*,\\d+([eE][+-]?\\d+)?");
  private static final Pattern WITH_POINT = Pattern.compile("[+-]?\\d*\\.\\d+([eE][+-]?\\d+)?");
  private static final Pattern MARKS_AND_DIGITS =
      Pattern.compile("[+-]?\\d[\\d.,'’_ \\u00a0\\u202f\\u2009]*");
  private static final Pattern WITH_UNIT =
      Pattern.compile("[^\\d.,+-]{0,5}\\s*[+-]?\\d[\\d.,]*\\s*[^\\d\\s]\\D{0,15}|\\D{1,5}[\\d.,]+");

  /** Longer text is no mistyped number. */
  private static final int LONGEST_DIAGNOSED = 64;

  /** Why text is not a number in this format, and what to do about it. */
  static CellFault notNumber(String text, Slot slot, NumberFormat format) {
    String needed = "a number is needed here";
    if (text.length() > LONGEST_DIAGNOSED) {
      return new CellFault("not-a-number", needed, "Enter the number, or " + leaveBlank(slot));
    }
    String word = text.toLowerCase(Locale.ROOT);
    if (NOT_FINITE.contains(word)) {
      return notFinite(slot);
    }
    if (WORDS_FOR_MISSING.contains(word)) {
      return new CellFault(
          "word-for-missing",
          needed + ", and a missing value is a blank cell",
          "If the value is missing, " + leaveBlank(slot));
    }
    if (text.startsWith("#")) {
      return errorValue(slot);
    }
    if (text.endsWith("%")) {
      return new CellFault(
          "percent-sign",
          needed + ", without a percent sign",
          "Write the number alone, in every row either as a share (0.12) or in percent (12).");
    }
    if (text.startsWith("=")) {
      return new CellFault(
          "formula-text",
          needed + ", not the text of a formula",
          "Enter the value of the formula, or save the file again from the spreadsheet program.");
    }
    return marks(text, slot, format);
  }

  private static CellFault marks(String text, Slot slot, NumberFormat format) {
    String needed = "a number is needed here";
    boolean point = format.decimal() == '.';
    if (point && WITH_COMMA.matcher(text).matches()) {
      return new CellFault(
          "decimal-comma",
          "numbers are read with a decimal point" + groupWords(format),
          "Write %s, or, if the whole file has decimal commas, declare records.number-format: {decimal: \",\"}."
              .formatted(text.replace(',', '.')));
    }
    if (!point && WITH_POINT.matcher(text).matches()) {
      return new CellFault(
          "decimal-point",
          "numbers are read with a decimal comma" + groupWords(format),
          "Write %s, or, if the whole file has decimal points, declare records.number-format: {decimal: \".\"}."
              .formatted(text.replace('.', ',')));
    }
    if (MARKS_AND_DIGITS.matcher(text).matches()) {
      return new CellFault(
          "digit-grouping",
          "numbers are read with a decimal "
              + (point ? "point" : "comma")
              + groupWords(format)
              + ", in groups of three digits if at all",
          "Write the digits without marks between them, or declare records.number-format with decimal and group.");
    }
    if (text.startsWith("\u2212") || text.startsWith("\u2013") || text.startsWith("(")) {
      return new CellFault(
          "minus-sign",
          needed,
          "Write a negative number with a plain hyphen in front, such as -12.");
    }
    if (WITH_UNIT.matcher(text).matches()) {
      return new CellFault(
          "number-with-unit",
          needed + ", without unit, currency or other words",
          "Write the number alone and declare the unit in the study file.");
    }
    return new CellFault("not-a-number", needed, "Enter the number, or " + leaveBlank(slot));
  }

  private static String groupWords(NumberFormat format) {
    return format
        .group()
        .map(g -> " and " + RecordsReader.markWords(g) + " between groups of digits")
        .orElse(" and no mark between groups of digits");
  }

  /** What is wrong with a cell of a workbook that holds no value. */
  static CellFault of(Intake.Oddity oddity, Slot slot) {
    return switch (oddity) {
      case ERROR_VALUE -> errorValue(slot);
      case TRUTH_VALUE -> truthValue();
      case FORMULA_WITHOUT_VALUE -> formulaWithoutValue();
    };
  }

  static CellFault notFinite(Slot slot) {
    return new CellFault(
        "not-finite",
        "a finite number is needed here",
        "Correct the value, or " + leaveBlank(slot));
  }

  static CellFault errorValue(Slot slot) {
    return new CellFault(
        "error-value",
        "this is an error of the spreadsheet, not a number",
        "Mend the formula that gave it, or " + leaveBlank(slot));
  }

  static CellFault truthValue() {
    return new CellFault(
        "truth-value",
        "a number is needed here, not TRUE or FALSE",
        "Write 1 or 0 if that is what is meant.");
  }

  static CellFault formulaWithoutValue() {
    return new CellFault(
        "formula-without-value",
        "the formula has no stored value",
        "Open the workbook in a spreadsheet program, let it calculate, and save it.");
  }

  static CellFault dateForNumber() {
    return new CellFault(
        "date-in-number-column",
        "a number is needed here, and the cell is a date",
        "Format the cell as a number and enter the number again (a spreadsheet program may have turned 1.2 into a date).");
  }

  static CellFault numberStoredAsText() {
    return new CellFault(
        "number-stored-as-text",
        "the cell is text, although it looks like a number",
        "Convert the column to numbers in the spreadsheet program and save the workbook.");
  }

  static CellFault notPeriod(String text) {
    String remedy =
        text.matches("-?\\d{1,9}[.,]0+")
            ? "Write " + text.substring(0, text.replace(',', '.').indexOf('.')) + "."
            : "Write for example 2024, 2024-05 or 2024-05-31.";
    return new CellFault(
        "not-a-period", "a period is an integer or a date as year-month-day (ISO 8601)", remedy);
  }

  static CellFault notPositive(Slot slot) {
    return switch (slot.kind()) {
      case OUTPUT ->
          new CellFault(
              "output-not-positive",
              slot.role() + " must be positive",
              "Correct it, leave the cell blank so that the row is set aside, or set the row aside through records.keep.");
      case LOGGED_CONTROL ->
          new CellFault(
              "control-not-positive",
              slot.role().startsWith("control")
                  ? "a control that enters in logs must be positive"
                  : slot.role() + " enters in logs and must be positive",
              slot.role().startsWith("control")
                  ? "Correct it, leave the cell blank so that the row is set aside, or declare the control without log: true."
                  : "Correct it, leave the cell blank so that the row is set aside, or set the row aside through records.keep.");
      case DEFLATOR ->
          new CellFault(
              "deflator-not-positive",
              "a deflator must be positive",
              "Correct it, or leave the cell blank; the money of the row is then unknown.");
      case SPENDING ->
          new CellFault(
              "spending-not-positive",
              "spending must not be negative, and must be positive where the price is worked out from it",
              "Correct it, or leave the cell blank; the row's price is then unknown.");
      case AMOUNT ->
          new CellFault(
              "amount-negative",
              "an amount must not be negative",
              "Correct it, or leave the cell blank; the amount is then unknown.");
      case FILED_COST ->
          new CellFault(
              "filed-cost-not-positive",
              "a filed cost must be positive",
              "Correct it, or leave the cell blank where nothing was filed.");
      default ->
          new CellFault(
              "price-not-positive",
              "a price must be positive",
              "Correct it, or leave the cell blank; the row's price is then unknown.");
    };
  }

  private static String leaveBlank(Slot slot) {
    return slot.kind().neededInEveryRow()
        ? "leave the cell blank so that the row is set aside."
        : "leave the cell blank; the value is then unknown and the row is still used.";
  }
}
