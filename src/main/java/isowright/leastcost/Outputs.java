package isowright.leastcost;

import isowright.technology.Technology;

/** Outputs and spending at given quantities, as several searches need them. */
final class Outputs {

  private Outputs() {}

  /** ln of the output at the technology's base: where it is best known. */
  static double usual(Technology technology) {
    return technology.logOutput(logs(technology.base()));
  }

  static double[] logs(double[] quantities) {
    double[] logs = new double[quantities.length];
    for (int i = 0; i < logs.length; i++) {
      logs[i] = Math.log(quantities[i]);
    }
    return logs;
  }

  /** Σ w_i x_i. */
  static double spending(Question question, double[] mix) {
    double sum = 0;
    for (int i = 0; i < mix.length; i++) {
      sum += question.price(i) * mix[i];
    }
    return sum;
  }
}
