package isowright.technology;

import java.util.List;

/**
 * How a functional form presents itself to an estimator, which knows the two descriptions below and
 * never a concrete form: either the form is linear in its parameters, or it is not and has any
 * number of curvatures that are profiled.
 */
public sealed interface Form permits LinearForm, NonlinearForm {

  /** The form's name in study files. */
  String name();

  /**
   * The form held to a restriction; this form where it obeys at any parameters.
   *
   * @param restriction what it is held to
   */
  Form restricted(Restriction restriction);

  /** Whether every technology of this form obeys a restriction. */
  boolean obeys(Restriction restriction);

  /**
   * The linear restrictions that a technology of this form would have to meet beyond those that the
   * form obeys at any parameters: rows R and right sides r with R β = r, over {@link
   * Technology#parameters()} without the constant; the last entry of a row is its right side. For
   * constant returns the first row is the one whose right side is the degree of homogeneity. Empty
   * where the form obeys, or where what it takes is not linear.
   */
  double[][] restrictions(Restriction restriction, List<String> inputs);

  /**
   * How far a technology is from a restriction, and how that moves with its parameters.
   *
   * @param parameters those of the technology
   */
  default Departure departure(Restriction restriction, List<String> inputs, double[] parameters) {
    double[][] rows = restrictions(restriction, inputs);
    double[] value = new double[rows.length];
    double[][] jacobian = new double[rows.length][parameters.length];
    for (int i = 0; i < rows.length; i++) {
      value[i] = -rows[i][parameters.length - 1];
      for (int k = 1; k < parameters.length; k++) {
        jacobian[i][k] = rows[i][k - 1];
        value[i] += jacobian[i][k] * parameters[k];
      }
    }
    return new Departure(value, jacobian);
  }

  /**
   * How far a technology is from a restriction.
   *
   * @param value zero where it obeys; one number for each independent restriction, shape q
   * @param jacobian ∂value/∂parameters, q × p
   */
  record Departure(double[] value, double[][] jacobian) {}

  /**
   * The form with its inputs in groups; this form where it knows no groups.
   *
   * @param groups the inputs by group, every input once
   * @param inputs all inputs, in the order used everywhere
   */
  default Form nested(List<List<String>> groups, List<String> inputs) {
    return this;
  }

  /** Whether the form is fitted with its inputs in groups that have to be named. */
  default boolean needsNests() {
    return false;
  }

  /** Whether every technology of this form with admissible parameters is regular everywhere. */
  default boolean regularByForm() {
    return false;
  }

  /** The restriction of constant returns on a parameter of its own, the last one. */
  static double[][] lastIsOne(Restriction restriction, boolean obeyed, int parameters) {
    if (obeyed || restriction != Restriction.CONSTANT_RETURNS) {
      return new double[0][];
    }
    double[] row = new double[parameters];
    row[parameters - 2] = 1;
    row[parameters - 1] = 1;
    return new double[][] {row};
  }

  /** All forms, in the order in which they are offered. */
  static List<Form> all() {
    return List.of(
        CobbDouglas.FORM, Ces.FORM, NestedCes.FORM, GeneralisedLeontief.FORM, Translog.FORM);
  }

  /** The names of all forms. */
  static List<String> names() {
    return all().stream().map(Form::name).toList();
  }

  /** The form of that name; the name must be one of {@link #names()}. */
  static Form named(String name) {
    return all().stream()
        .filter(form -> form.name().equals(name))
        .findFirst()
        .orElseThrow(
            () ->
                new IllegalArgumentException(
                    "no form is called " + name + "; there are " + String.join(", ", names())));
  }
}
