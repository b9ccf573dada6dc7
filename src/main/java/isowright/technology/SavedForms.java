package isowright.technology;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

/**
 * A technology again from what is saved of it: form, inputs, base, parameters and their names.
 *
 * <p>Tested in {@code PlanCommandTest}.
 */
public final class SavedForms {

  private static final String SHARE = "share:";
  private static final double CURVATURE = 0.5;

  private SavedForms() {}

  /**
   * The technology of these parameters.
   *
   * @param form one of {@link Form#names()}
   * @param base what each input is divided by, shape n
   * @param names the parameters' names, as {@link Technology#parameterNames()} gives them
   * @param parameters parallel to the names
   * @throws IllegalArgumentException if they do not belong to the form
   */
  public static Technology of(
      String form, List<String> inputs, double[] base, List<String> names, double[] parameters) {
    if (!Form.names().contains(form)) {
      throw new IllegalArgumentException("no form is called " + form);
    }
    Form named = Form.named(form);
    Technology like =
        like(named.needsNests() ? named.nested(nests(names), inputs) : named, inputs, base);
    if (!like.parameterNames().equals(names)) {
      throw new IllegalArgumentException(
          "the parameters of " + form + " are " + String.join(", ", like.parameterNames()));
    }
    return like.withParameters(parameters);
  }

  /** Some technology of the form, whose parameters do not matter. */
  private static Technology like(Form form, List<String> inputs, double[] base) {
    int n = inputs.size();
    if (form instanceof LinearForm linear) {
      double[] coefficients = new double[linear.coefficientNames(inputs).size()];
      return linear.technology(inputs, base, 0, coefficients);
    }
    NonlinearForm nonlinear = (NonlinearForm) form;
    double[] equal = new double[n];
    Arrays.fill(equal, 1.0 / n);
    double[] curvatures = new double[nonlinear.curvatureNames(inputs).size()];
    Arrays.fill(curvatures, CURVATURE);
    double[] inner = nonlinear.starts(equal).get(0);
    return nonlinear.technology(inputs, base, 0, inner, curvatures);
  }

  /** The groups of inputs, told by the names of the shares of groups: {@code share:a+b}. */
  private static List<List<String>> nests(List<String> names) {
    List<List<String>> nests = new ArrayList<>();
    for (String name : names) {
      if (name.startsWith(SHARE)) {
        nests.add(List.of(name.substring(SHARE.length()).split("\\+")));
      }
    }
    return nests;
  }
}
