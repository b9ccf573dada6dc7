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

  /** All forms, in the order in which they are offered. */
  static List<Form> all() {
    return List.of(CobbDouglas.FORM, Ces.FORM, Translog.FORM);
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
