package isowright.study;

import isowright.cost.CostForm;
import isowright.estimation.CostSpecification.Concavity;
import isowright.estimation.CostSpecification.Equations;
import isowright.estimation.CostSpecification.Restriction;
import java.util.List;
import java.util.Optional;
import java.util.stream.Stream;

/**
 * What a study asks of the cost side: cost functions fitted to filed or recorded costs at the
 * prices paid.
 *
 * @param records the records with the roles of their columns: cost is explained; prices, outputs,
 *     fixed inputs and controls explain it, in this order
 * @param variable whether the cost is variable cost, that of the inputs that are not fixed
 * @param inputs the inputs whose prices are known
 * @param outputs the outputs
 * @param fixed the inputs that are fixed
 * @param controls how many controls follow
 * @param forms the forms to be fitted, in order
 * @param equations which equations are fitted
 * @param restrictions what is imposed
 * @param concavity whether and where cost is made concave, where that is stated
 * @param outputsAsTheyStand whether outputs are read as they stand, zeros among them
 */
public record Costs(
    Study.Records records,
    boolean variable,
    List<Input> inputs,
    List<Quantity> outputs,
    List<Quantity> fixed,
    List<String> controls,
    List<CostForm> forms,
    Equations equations,
    List<Restriction> restrictions,
    Optional<Concavity> concavity,
    boolean outputsAsTheyStand) {

  /** Copies the lists. */
  public Costs {
    inputs = List.copyOf(inputs);
    outputs = List.copyOf(outputs);
    fixed = List.copyOf(fixed);
    controls = List.copyOf(controls);
    forms = List.copyOf(forms);
    restrictions = List.copyOf(restrictions);
  }

  /**
   * An input.
   *
   * @param name the user's own name for it
   * @param price the column of its price
   * @param share the column of its share in cost
   * @param spending the column of the money spent on it
   */
  public record Input(
      String name, String price, Optional<String> share, Optional<String> spending) {}

  /**
   * An output or a fixed input.
   *
   * @param name the user's own name for it
   * @param column the column of its quantity
   * @param unit its unit, empty where not stated
   */
  public record Quantity(String name, String column, String unit) {}

  /** The unit of output, where there is one output and its unit is stated. */
  Optional<String> outputUnit() {
    return outputs.size() == 1 && !outputs.get(0).unit().isEmpty()
        ? Optional.of(outputs.get(0).unit())
        : Optional.empty();
  }

  /** The names of the inputs, in order. */
  public List<String> inputNames() {
    return inputs.stream().map(Input::name).toList();
  }

  /** The names of its inputs, fixed ones last, that are not among these. */
  List<String> others(List<String> names) {
    return Stream.concat(inputs.stream().map(Input::name), fixed.stream().map(Quantity::name))
        .filter(name -> !names.contains(name))
        .toList();
  }

  /** Whether it has an input of this name, variable or fixed. */
  boolean has(String name) {
    return inputs.stream().anyMatch(input -> input.name().equals(name))
        || fixed.stream().anyMatch(quantity -> quantity.name().equals(name));
  }
}
