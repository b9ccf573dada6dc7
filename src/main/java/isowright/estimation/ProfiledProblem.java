package isowright.estimation;

import isowright.records.Panel;
import isowright.technology.NonlinearForm;
import java.util.Arrays;
import java.util.List;

/**
 * The regression of a form that is not linear in its parameters, on one set of rows: the model with
 * any of the form's curvatures held, and where its parameters stand.
 */
record ProfiledProblem(
    PanelRows rows,
    NonlinearForm form,
    List<String> inputs,
    Circumstances circumstances,
    boolean within) {

  static ProfiledProblem of(
      Panel panel, Specification specification, double[] base, NonlinearForm form) {
    return new ProfiledProblem(
        PanelRows.of(panel, base),
        form,
        panel.inputs(),
        Circumstances.of(panel, specification.time()),
        specification.plantEffects() == Specification.PlantEffects.WITHIN);
  }

  /** The number of curvatures, K. */
  int curvatures() {
    return form.curvatureNames(inputs).size();
  }

  /** Where the curvatures stand among the parameters of {@link #free()}. */
  int place() {
    return (within ? 0 : 1) + form.innerNames(inputs).size();
  }

  /** The model with every curvature free. */
  ProfiledModel free() {
    double[] none = new double[curvatures()];
    Arrays.fill(none, Double.NaN);
    return holding(none);
  }

  /** The model with one curvature held. */
  ProfiledModel holding(int which, double curvature) {
    double[] held = new double[curvatures()];
    Arrays.fill(held, Double.NaN);
    held[which] = curvature;
    return holding(held);
  }

  /**
   * The model with some curvatures held.
   *
   * @param held shape K, NaN where free
   */
  ProfiledModel holding(double[] held) {
    return new ProfiledModel(this, held);
  }
}
