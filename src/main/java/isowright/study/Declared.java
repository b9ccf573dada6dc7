package isowright.study;

import java.util.List;
import java.util.Optional;

/**
 * What a study file declares of its records, in the shape in which the questions are checked
 * against it.
 *
 * @param present whether the file has a {@code records} key, even a mistaken one
 * @param records the records; absent where not declared, or not without a mistake
 * @param plant whether a plant column is declared
 * @param period whether a period column is declared
 * @param inputs the names of the inputs; empty where they come from given technologies
 * @param units the unit of each input
 * @param unpriced the inputs with neither a price nor a spending column
 * @param outputUnit the unit of output
 * @param money currency and base
 * @param costs the cost side; absent where not declared, or not without a mistake
 */
record Declared(
    boolean present,
    Optional<Study.Records> records,
    boolean plant,
    boolean period,
    List<String> inputs,
    List<Optional<String>> units,
    List<String> unpriced,
    Optional<String> outputUnit,
    Study.Money money,
    Optional<Costs> costs) {

  Declared {
    inputs = List.copyOf(inputs);
    units = List.copyOf(units);
    unpriced = List.copyOf(unpriced);
  }

  /** The same with further columns of the records. */
  Declared withFurther(List<String> columns) {
    Optional<Study.Records> more =
        records.map(r -> new Study.Records(r.source(), r.roles().withFurther(columns), r.keep()));
    return new Declared(
        present, more, plant, period, inputs, units, unpriced, outputUnit, money, costs);
  }

  /** The same with rows kept in which an input is not used. */
  Declared keepingZeros() {
    Optional<Study.Records> more =
        records.map(r -> new Study.Records(r.source(), r.roles().keepingZeros(true), r.keep()));
    return new Declared(
        present, more, plant, period, inputs, units, unpriced, outputUnit, money, costs);
  }

  /** The same with inputs whose names come from given technologies. */
  Declared withInputs(List<String> names) {
    List<Optional<String>> none = names.stream().map(name -> Optional.<String>empty()).toList();
    return new Declared(
        present, records, plant, period, names, none, unpriced, outputUnit, money, costs);
  }
}
