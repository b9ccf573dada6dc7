package isowright.inference;

import isowright.estimation.Fit;
import isowright.estimation.Particulars;
import isowright.regression.AndersonRubin;
import isowright.regression.Covariance;
import isowright.regression.FirstStage;
import isowright.regression.InstrumentTests;
import isowright.regression.WaldTest;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.apache.commons.statistics.distribution.FDistribution;

/**
 * Can the instruments of a fit be relied on, and were they needed? The strength of every first
 * stage, and two verdicts:
 *
 * <ul>
 *   <li>{@code instruments-agree}: Sargan where the covariance is classical, else Hansen; only
 *       where there are more instruments than columns they stand in for.
 *   <li>{@code inputs-exogenous}: Durbin, Wu and Hausman by first-stage residuals added to the
 *       regression, with the covariance of the fit.
 * </ul>
 *
 * <p>See {@link InstrumentTests} and {@link FirstStage} for formulas and sources. Tested in {@code
 * EndogenousInputsTest}; sizes in {@code EndogenousInputsSimulationTest}.
 *
 * @param firstStages by endogenous column
 * @param verdicts the tests
 * @param anywhere for a single endogenous column, the values that are not rejected however weak the
 *     instruments
 */
public record InstrumentFindings(
    List<FirstStage> firstStages, List<Verdict> verdicts, Optional<AndersonRubin> anywhere) {

  /** Below it an estimate leans towards least squares: Staiger and Stock 1997, p. 557. */
  public static final double WEAK = 10;

  /** Copies the lists. */
  public InstrumentFindings {
    firstStages = List.copyOf(firstStages);
    verdicts = List.copyOf(verdicts);
  }

  /** Of a usable fit; absent where it does not rest on instruments. */
  public static Optional<InstrumentFindings> of(Fit fit) {
    return fit.numbers().particulars() instanceof Particulars.OfInstruments by
        ? Optional.of(of(fit, by))
        : Optional.empty();
  }

  private static InstrumentFindings of(Fit fit, Particulars.OfInstruments by) {
    Covariance covariance = fit.numbers().covarianceSource();
    Covariance.Kind kind = covariance.kind();
    InstrumentTests tests = new InstrumentTests(by.fit(), kind, by.times());
    List<Verdict> verdicts = new ArrayList<>();
    int over = by.fit().overidentifying();
    if (over > 0) {
      verdicts.add(
          Verdict.of(
              "instruments-agree",
              "all instruments are unrelated to what is left unexplained (asked of those beyond the"
                  + " number needed)",
              tests.overidentification(),
              new Law.ChiSquared(over)));
    }
    WaldTest needed = tests.endogeneity();
    verdicts.add(
        Verdict.of(
            "inputs-exogenous",
            "the inputs that instruments stand in for are unrelated to what is left unexplained",
            needed.f(),
            new Law.F(needed.restrictions(), needed.degreesOfFreedom())));
    return new InstrumentFindings(
        FirstStage.of(by.fit(), kind, by.times()), verdicts, anywhere(fit, by, kind));
  }

  private static Optional<AndersonRubin> anywhere(
      Fit fit, Particulars.OfInstruments by, Covariance.Kind kind) {
    if (by.fit().endogenous().size() != 1) {
      return Optional.empty();
    }
    int column = by.fit().of().design().columns().indexOf(by.fit().endogenous().get(0));
    double error = Math.sqrt(fit.numbers().covarianceSource().matrix()[column][column]);
    double confidence = fit.specification().confidence();
    return Optional.of(
        AndersonRubin.of(
            by.fit(),
            kind,
            by.times(),
            error,
            (numerator, denominator) ->
                FDistribution.of(numerator, denominator).inverseCumulativeProbability(confidence)));
  }

  /** Whether any first stage is weak. */
  public boolean weak() {
    return firstStages.stream().anyMatch(stage -> !(stage.decisive() >= WEAK));
  }
}
