package isowright.study;

/** The targets at which a cost curve is drawn. */
final class CurveSpan {

  private static final int POINTS = 41;

  private CurveSpan() {}

  /** Those asked, or from half to one and a half times the output of the plan. */
  static double[] targets(Study.LeastCostQuestion asked, double output) {
    Study.Curve curve =
        asked.curve().orElseGet(() -> new Study.Curve(0.5 * output, 1.5 * output, POINTS));
    double[] targets = new double[curve.points()];
    for (int k = 0; k < targets.length; k++) {
      targets[k] =
          targets.length == 1
              ? curve.from()
              : curve.from() + (curve.to() - curve.from()) * k / (targets.length - 1);
    }
    return targets;
  }
}
