package isowright.study;

import isowright.study.FitFindings.Fitted;
import isowright.study.FitFindings.Pair;
import isowright.study.Protocol.Expectation;
import isowright.study.SpecificationFindings.Agreement;
import isowright.study.SpecificationFindings.Expected;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/** Holds what was found against what was expected. */
final class ExpectationStage {

  private ExpectationStage() {}

  /** Every expectation beside the result of every fit, expectation by expectation. */
  static List<Expected> held(List<Expectation> expectations, List<Fitted> fits) {
    List<Expected> all = new ArrayList<>();
    for (Expectation expectation : expectations) {
      for (Fitted fit : fits) {
        all.addAll(held(expectation, fit));
      }
    }
    return all;
  }

  private static List<Expected> held(Expectation expectation, Fitted fit) {
    return switch (expectation.subject()) {
      case RETURNS_TO_SCALE -> List.of(held(expectation, fit, List.of(), fit.returnsToScale()));
      case OUTPUT_ELASTICITY -> {
        String input = expectation.input().orElseThrow();
        yield List.of(
            held(
                expectation,
                fit,
                List.of(input),
                Optional.ofNullable(fit.outputElasticity().get(input))));
      }
      case SUBSTITUTION -> substitution(expectation, fit);
    };
  }

  private static List<Expected> substitution(Expectation expectation, Fitted fit) {
    List<Pair> direct =
        fit.substitution().stream().filter(pair -> pair.measure().equals("hicks")).toList();
    if (direct.isEmpty()) {
      return List.of(held(expectation, fit, List.of(), Optional.empty()));
    }
    return direct.stream()
        .map(
            pair ->
                held(
                    expectation,
                    fit,
                    List.of(pair.first(), pair.second()),
                    Optional.of(pair.figure())))
        .toList();
  }

  private static Expected held(
      Expectation expectation, Fitted fit, List<String> of, Optional<Figure> found) {
    return new Expected(
        fit.technology(),
        expectation.subject().word(),
        of,
        expectation.low(),
        expectation.high(),
        found,
        found
            .map(figure -> agreement(figure, expectation.low(), expectation.high()))
            .orElse(Agreement.UNKNOWN));
  }

  /** The rule of the whole house: a figure lies somewhere when its whole interval does. */
  static Agreement agreement(Figure figure, double low, double high) {
    double from = figure.uncertainty().map(Figure.Uncertainty::low).orElse(figure.value());
    double to = figure.uncertainty().map(Figure.Uncertainty::high).orElse(figure.value());
    if (Double.isNaN(from) || Double.isNaN(to) || Double.isNaN(figure.value())) {
      return Agreement.UNKNOWN;
    }
    if (from >= low && to <= high) {
      return Agreement.INSIDE;
    }
    return to < low || from > high ? Agreement.OUTSIDE : Agreement.OVERLAPS;
  }
}
