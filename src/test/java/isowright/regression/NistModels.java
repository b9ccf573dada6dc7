package isowright.regression;

import java.util.List;
import java.util.Map;
import java.util.Objects;
import java.util.TreeMap;
import java.util.stream.IntStream;
import org.apache.commons.math3.analysis.differentiation.DerivativeStructure;

/** The models of the nonlinear NIST sets, with exact derivatives by automatic differentiation. */
final class NistModels {

  private NistModels() {}

  /** A prediction from parameters b and predictors x (x[0] is the response and not used). */
  interface Formula {
    DerivativeStructure of(DerivativeStructure[] b, double[] x);
  }

  static final Map<String, Formula> ALL = all();

  private static Map<String, Formula> all() {
    Map<String, Formula> m = new TreeMap<>();
    Formula chwirut = (b, x) -> b[0].multiply(-x[1]).exp().divide(b[2].multiply(x[1]).add(b[1]));
    m.put("Chwirut1", chwirut);
    m.put("Chwirut2", chwirut);
    for (String set : List.of("Gauss1", "Gauss2", "Gauss3")) {
      m.put(
          set,
          (b, x) ->
              decay(b[0], b[1], x[1])
                  .add(peak(b[2], b[3], b[4], x[1]))
                  .add(peak(b[5], b[6], b[7], x[1])));
    }
    for (String set : List.of("Lanczos1", "Lanczos2", "Lanczos3")) {
      m.put(
          set,
          (b, x) ->
              decay(b[0], b[1], x[1]).add(decay(b[2], b[3], x[1])).add(decay(b[4], b[5], x[1])));
    }
    Formula saturation = (b, x) -> b[0].multiply(b[1].multiply(-x[1]).exp().negate().add(1));
    m.put("Misra1a", saturation);
    m.put("BoxBOD", saturation);
    m.put(
        "Misra1b", (b, x) -> b[0].multiply(b[1].multiply(x[1] / 2).add(1).pow(-2).negate().add(1)));
    m.put(
        "Misra1c",
        (b, x) -> b[0].multiply(b[1].multiply(2 * x[1]).add(1).pow(-0.5).negate().add(1)));
    m.put(
        "Misra1d", (b, x) -> b[0].multiply(b[1]).multiply(x[1]).divide(b[1].multiply(x[1]).add(1)));
    m.put("DanWood", (b, x) -> b[0].multiply(b[1].multiply(Math.log(x[1])).exp()));
    m.put("Kirby2", (b, x) -> polynomial(b, 0, 2, x[1]).divide(below(b, 3, 2, x[1])));
    m.put("Hahn1", (b, x) -> polynomial(b, 0, 3, x[1]).divide(below(b, 4, 3, x[1])));
    m.put("Thurber", (b, x) -> polynomial(b, 0, 3, x[1]).divide(below(b, 4, 3, x[1])));
    m.put(
        "Nelson",
        (b, x) -> b[0].subtract(b[1].multiply(x[1]).multiply(b[2].multiply(-x[2]).exp())));
    m.put(
        "MGH09",
        (b, x) ->
            b[0].multiply(b[1].multiply(x[1]).add(x[1] * x[1]))
                .divide(b[2].multiply(x[1]).add(x[1] * x[1]).add(b[3])));
    m.put("MGH10", (b, x) -> b[0].multiply(b[1].divide(b[2].add(x[1])).exp()));
    m.put("MGH17", (b, x) -> b[0].add(decay(b[1], b[3], x[1])).add(decay(b[2], b[4], x[1])));
    m.put("Rat42", (b, x) -> b[0].divide(logistic(b[1], b[2], x[1])));
    m.put("Rat43", (b, x) -> b[0].divide(logistic(b[1], b[2], x[1]).pow(b[3].reciprocal())));
    m.put(
        "Eckerle4",
        (b, x) -> {
          DerivativeStructure z = b[2].negate().add(x[1]).divide(b[1]);
          return b[0].divide(b[1]).multiply(z.multiply(z).multiply(-0.5).exp());
        });
    m.put("Bennett5", (b, x) -> b[0].multiply(b[1].add(x[1]).pow(b[2].reciprocal().negate())));
    m.put(
        "Roszman1",
        (b, x) ->
            b[0].subtract(b[1].multiply(x[1]))
                .subtract(b[2].divide(b[3].negate().add(x[1])).atan().divide(Math.PI)));
    m.put(
        "ENSO",
        (b, x) -> {
          double year = 2 * Math.PI * x[1] / 12;
          return b[0].add(b[1].multiply(Math.cos(year)))
              .add(b[2].multiply(Math.sin(year)))
              .add(cycle(b[3], b[4], b[5], x[1]))
              .add(cycle(b[6], b[7], b[8], x[1]));
        });
    return m;
  }

  private static DerivativeStructure decay(
      DerivativeStructure height, DerivativeStructure rate, double x) {
    return height.multiply(rate.multiply(-x).exp());
  }

  private static DerivativeStructure peak(
      DerivativeStructure height, DerivativeStructure center, DerivativeStructure width, double x) {
    DerivativeStructure z = center.negate().add(x).divide(width);
    return height.multiply(z.multiply(z).negate().exp());
  }

  private static DerivativeStructure logistic(
      DerivativeStructure shift, DerivativeStructure rate, double x) {
    return shift.subtract(rate.multiply(x)).exp().add(1);
  }

  private static DerivativeStructure cycle(
      DerivativeStructure period, DerivativeStructure a, DerivativeStructure b, double x) {
    DerivativeStructure angle = period.reciprocal().multiply(2 * Math.PI * x);
    return a.multiply(angle.cos()).add(b.multiply(angle.sin()));
  }

  /** b_from + b_(from+1) x + … up to a degree. */
  private static DerivativeStructure polynomial(
      DerivativeStructure[] b, int from, int degree, double x) {
    DerivativeStructure sum = b[from + degree];
    for (int k = degree - 1; k >= 0; k--) {
      sum = sum.multiply(x).add(b[from + k]);
    }
    return sum;
  }

  /** 1 + b_from x + b_(from+1) x² + … up to a degree. */
  private static DerivativeStructure below(
      DerivativeStructure[] b, int from, int degree, double x) {
    return polynomial(b, from, degree - 1, x).multiply(x).add(1);
  }

  /** The model of a set as this package sees it. */
  static NonlinearModel model(NistSet set) {
    Formula formula = Objects.requireNonNull(ALL.get(set.name()));
    double[] response = set.response();
    int count = set.certified().length;
    List<String> names = IntStream.rangeClosed(1, count).mapToObj(k -> "b" + k).toList();
    return new NonlinearModel() {
      @Override
      public List<String> parameters() {
        return names;
      }

      @Override
      public Design linearisedAt(double[] parameters) {
        DerivativeStructure[] b = new DerivativeStructure[count];
        for (int k = 0; k < count; k++) {
          b[k] = new DerivativeStructure(count, 1, k, parameters[k]);
        }
        double[][] jacobian = new double[count][response.length];
        double[] residual = new double[response.length];
        for (int i = 0; i < response.length; i++) {
          DerivativeStructure prediction = formula.of(b, set.rows()[i]);
          residual[i] = response[i] - prediction.getValue();
          double[] all = prediction.getAllDerivatives();
          for (int k = 0; k < count; k++) {
            jacobian[k][i] = all[k + 1];
          }
        }
        return ArrayDesign.of(names, jacobian, residual);
      }
    };
  }
}
