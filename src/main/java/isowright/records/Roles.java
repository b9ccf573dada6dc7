package isowright.records;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/**
 * What each column of a records file is: declared by the user, never guessed.
 *
 * @param plant the column naming the plant; absent: every row is its own plant
 * @param period the column naming the period (integer or ISO 8601 date); absent: one cross-section
 * @param output the column of output
 * @param outputUnit the unit of output, free text
 * @param inputs the inputs, in the order used everywhere; at least two
 * @param controls what else moves output
 * @param deflator the column by which money is divided, and the period whose money is used
 * @param filedCost the column of filed cost
 * @param further numeric columns that are neither input nor control but that a later stage looks
 *     at, such as what shifts an input, or the price of an asset
 * @param explained what the first column is called in messages: output, or cost where the records
 *     are of costs and prices, which then stand among the controls
 * @param keepsZeros whether rows in which a quantity of an input is zero are kept
 */
public record Roles(
    Optional<String> plant,
    Optional<String> period,
    String output,
    Optional<String> outputUnit,
    List<Input> inputs,
    List<Control> controls,
    Optional<Deflator> deflator,
    Optional<String> filedCost,
    List<Further> further,
    String explained,
    boolean keepsZeros) {

  /** What the column that is explained is called, where the records are those of production. */
  public static final String OUTPUT = "output";

  /** Copies the lists. */
  public Roles {
    inputs = List.copyOf(inputs);
    controls = List.copyOf(controls);
    further = List.copyOf(further);
  }

  /** Roles without further columns. */
  public Roles(
      Optional<String> plant,
      Optional<String> period,
      String output,
      Optional<String> outputUnit,
      List<Input> inputs,
      List<Control> controls,
      Optional<Deflator> deflator,
      Optional<String> filedCost) {
    this(
        plant,
        period,
        output,
        outputUnit,
        inputs,
        controls,
        deflator,
        filedCost,
        List.of(),
        OUTPUT,
        false);
  }

  /** The same with rows kept in which a quantity of an input is zero, or not. */
  public Roles keepingZeros(boolean keep) {
    return new Roles(
        plant,
        period,
        output,
        outputUnit,
        inputs,
        controls,
        deflator,
        filedCost,
        further,
        explained,
        keep);
  }

  /**
   * Records of costs: what explains cost (prices, outputs, fixed inputs, whatever else) stands
   * among the controls, each with its role in words, and shares or spending among the further
   * columns.
   */
  public static Roles ofCosts(
      Optional<String> plant,
      Optional<String> period,
      String cost,
      List<Control> arguments,
      List<Further> further) {
    return new Roles(
        plant,
        period,
        cost,
        Optional.empty(),
        List.of(),
        arguments,
        Optional.empty(),
        Optional.empty(),
        further,
        "cost",
        false);
  }

  /** The same with these columns, which an estimator uses, beside its further ones. */
  public Roles withFurther(List<String> columns) {
    List<Further> all = new ArrayList<>(further);
    all.addAll(columnsOfNumbers(columns));
    return withAllFurther(all);
  }

  private static List<Further> columnsOfNumbers(List<String> columns) {
    return columns.stream()
        .map(column -> new Further(column, "instrument or proxy", Measure.NUMBER))
        .toList();
  }

  /** The same with these further columns and no others. */
  public Roles withAllFurther(List<Further> all) {
    return new Roles(
        plant,
        period,
        output,
        outputUnit,
        inputs,
        controls,
        deflator,
        filedCost,
        all,
        explained,
        keepsZeros);
  }

  /**
   * A further column of numbers; a blank cell leaves the value unknown and the row in use.
   *
   * @param column its column
   * @param role what it is, in words
   * @param measure what its cells must be
   */
  public record Further(String column, String role, Measure measure) {}

  /** What the cells of a further column must be. */
  public enum Measure {
    /** Money for a unit of something, positive; deflated where a deflator is declared. */
    PRICE,
    /** An amount, not negative. */
    AMOUNT,
    /** A rate: any number, which may well be the same in every row. */
    RATE,
    /** Any number that an estimator uses, and that is audited like an input. */
    NUMBER
  }

  /**
   * An input.
   *
   * @param name the user's own name for it
   * @param quantity the column of its quantity
   * @param price the column of its price, money per unit of quantity
   * @param spending the column of the money spent on it; where there is no price column, price =
   *     spending / quantity
   * @param unit the unit of quantity, free text
   */
  public record Input(
      String name,
      String quantity,
      Optional<String> price,
      Optional<String> spending,
      Optional<String> unit) {}

  /**
   * A control.
   *
   * @param column its column
   * @param log whether it enters in natural logs
   * @param role what it is, in words, such as {@code price of labour}
   */
  public record Control(String column, boolean log, String role) {

    /** A control that is no more than that. */
    public Control(String column, boolean log) {
      this(column, log, log ? "control, in logs" : "control");
    }
  }

  /**
   * A deflator.
   *
   * @param column its column
   * @param base the period (as written in the file) whose money is used
   */
  public record Deflator(String column, String base) {}

  /** The names of the inputs, in order. */
  public List<String> inputNames() {
    return inputs.stream().map(Input::name).toList();
  }
}
