package isowright.study;

import isowright.estimation.Estimation;
import isowright.estimation.Estimator;
import isowright.estimation.Fit;
import isowright.estimation.Particulars;
import isowright.estimation.Specification;
import isowright.estimation.Specification.PlantEffects;
import isowright.study.EndogeneityFindings.Beside;
import isowright.study.Findings.Said;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;

/** Turns what a control function found into findings and remarks. */
final class ProxyStage {

  /** At one and beyond, a shock to productivity never fades. */
  private static final double NEVER_FADES = 1;

  /** A figure of the cross-check further away, in its own standard errors, is said to differ. */
  private static final double APART = 2;

  private final Fit fit;
  private final Particulars.OfProxy by;
  private final Estimator.Proxy asked;

  ProxyStage(Fit fit, Particulars.OfProxy by) {
    this.fit = fit;
    this.by = by;
    this.asked = (Estimator.Proxy) fit.specification().estimator();
  }

  EndogeneityFindings findings(List<String> inputs, Beside own, List<Beside> others) {
    Specification how = fit.specification();
    Fit squares = Estimation.fit(fit.panel(), how.by(new Estimator.LeastSquares()));
    List<Beside> beside = new ArrayList<>();
    beside.add(own);
    beside.add(
        EndogeneityStage.beside("joint-moments", "cross-check, without a search", by.jointly()));
    beside.add(EndogeneityStage.beside("least-squares", "", squares));
    beside.add(
        EndogeneityStage.beside(
            "least-squares-within",
            "",
            Estimation.fit(
                fit.panel(),
                how.by(new Estimator.LeastSquares())
                    .with(PlantEffects.WITHIN, how.time(), how.standardErrors()))));
    beside.addAll(others);
    return new EndogeneityFindings(
        asked.word(),
        inputs,
        List.of(by.proxy()),
        0,
        EndogeneityStage.expected(fit, inputs),
        shifts(inputs),
        List.of(),
        Optional.empty(),
        beside,
        words(inputs, beside));
  }

  private String shifts(List<String> inputs) {
    return String.format(
        Locale.ROOT,
        "Productivity is read off %s at given inputs by a polynomial of degree %d (%d columns, R²"
            + " %.4f). Its innovations, on %,d rows that have the row of the period before, are"
            + " taken to be unrelated to %s of the same period and to %s of the period before;"
            + " productivity follows a polynomial of degree %d in that of the period before. What"
            + " shifts %s apart from productivity is therefore what lasts in it from one period to"
            + " the next, such as the price that a plant pays.",
        by.proxy(),
        asked.degree(),
        by.basis(),
        by.smoothedShare(),
        by.pairs(),
        String.join(", ", asked.states()),
        String.join(", ", inputs),
        asked.process(),
        String.join(", ", inputs));
  }

  private List<String> words(List<String> inputs, List<Beside> beside) {
    List<String> words = new ArrayList<>();
    words.add(
        String.format(
            Locale.ROOT,
            "On average %.2f of a difference in productivity is left after one period.",
            by.lasts()));
    for (String input : inputs) {
      double own = value(beside.get(0), input);
      double other = value(beside.get(2), input);
      words.add(
          String.format(
              Locale.ROOT,
              "The output elasticity of %s is %.3f by the control function and %.3f by least"
                  + " squares; the difference points %s.",
              input,
              own,
              other,
              other >= own ? "the way expected" : "the other way than expected"));
    }
    words.add(agreement(beside));
    return words;
  }

  private static double value(Beside beside, String input) {
    return Optional.ofNullable(beside.elasticity().get(input))
        .map(Figure::value)
        .orElse(Double.NaN);
  }

  private static String agreement(List<Beside> beside) {
    Beside joint = beside.get(1);
    if (joint.elasticity().isEmpty()) {
      return "There is no cross-check by joint moments. " + joint.note();
    }
    List<String> apart = new ArrayList<>();
    beside
        .get(0)
        .elasticity()
        .forEach(
            (input, figure) -> {
              double error =
                  figure.uncertainty().map(Figure.Uncertainty::standardError).orElse(Double.NaN);
              if (Math.abs(value(joint, input) - figure.value()) > APART * error) {
                apart.add(input);
              }
            });
    return apart.isEmpty()
        ? "The cross-check by joint moments lies within two standard errors everywhere."
        : "The cross-check by joint moments differs by more than two standard errors for "
            + String.join(", ", apart)
            + ": the two assume different things of what the proxy moves with, and one of them does"
            + " not hold here.";
  }

  List<Said> remarks() {
    List<Said> remarks = new ArrayList<>();
    remarks.add(
        Said.of(
            "note",
            "proxy-monotone",
            "That "
                + by.proxy()
                + " rises with productivity at given inputs is what the control function rests on;"
                + " the records cannot test it, for productivity is not seen otherwise."));
    if (by.proxySlope() < 0) {
      remarks.add(
          Said.of(
              "warning",
              "proxy-falls",
              "At given inputs "
                  + by.proxy()
                  + " falls as the productivity found rises, against what the control function"
                  + " rests on. Do not rely on the figures; name another proxy."));
    }
    if (fit.panel().inputs().contains(asked.column().name())) {
      remarks.add(
          Said.of(
              "warning",
              "proxy-is-input",
              "The proxy "
                  + asked.column().name()
                  + " is itself an input: its own output elasticity rests on "
                  + asked.column().name()
                  + " of the period before alone, which says little unless something that lasts,"
                  + " such as its price, differs between plants."));
    }
    if (by.others() > 0) {
      remarks.add(
          Said.of(
              "warning",
              "several-solutions",
              "From other starts "
                  + (by.others() == 1 ? "one further solution" : by.others() + " further solutions")
                  + " of the same moments came up; the one nearest to the joint moments is"
                  + " reported. Such moments are known to have a false solution, at which"
                  + " productivity is mistaken for what shifts the free inputs."));
    }
    if (by.lasts() >= NEVER_FADES) {
      remarks.add(
          Said.of(
              "warning",
              "productivity-explodes",
              String.format(
                  Locale.ROOT,
                  "A difference in productivity grows from period to period (%.2f of it is left"
                      + " after one), which no lasting process does. Do not rely on the figures.",
                  by.lasts())));
    }
    if (!by.singletons().isEmpty()) {
      remarks.add(
          Said.of(
              "note",
              "plants-without-pairs",
              by.singletons().size()
                  + (by.singletons().size() == 1 ? " plant has" : " plants have")
                  + " no two successive periods and only help to smooth output: "
                  + String.join(", ", by.singletons().stream().limit(10).toList())
                  + (by.singletons().size() > 10 ? ", …" : "")
                  + "."));
    }
    if (by.failed() > 0) {
      remarks.add(
          Said.of(
              by.failed() * 20 > asked.drawing().draws() ? "warning" : "note",
              "draws-without-solution",
              by.failed()
                  + " of "
                  + asked.drawing().draws()
                  + " draws of plants have no solution and are left out of the standard errors."));
    }
    return remarks;
  }
}
