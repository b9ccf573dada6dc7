package isowright.estimation;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import isowright.estimation.Specification.PlantEffects;
import isowright.estimation.Specification.StandardErrors;
import isowright.estimation.Specification.Time;
import isowright.records.Panel;
import isowright.regression.Design;
import isowright.regression.VarianceComponents;
import isowright.technology.Form;
import java.util.ArrayList;
import java.util.List;
import java.util.stream.Stream;
import org.apache.commons.math3.linear.Array2DRowRealMatrix;
import org.apache.commons.math3.linear.ArrayRealVector;
import org.apache.commons.math3.linear.LUDecomposition;
import org.apache.commons.math3.linear.RealMatrix;
import org.apache.commons.math3.linear.RealVector;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/**
 * Levels of plants and the technology of a plant in a period, against dense formulas: the mixed
 * model equations of Henderson for random effects, a regression on dummies within plants, and the
 * fitted value of every row.
 */
class PlantLevelsTest {

  /** Dense and streamed sums differ by rounding times a condition below 1e4. */
  private static final double ROUNDING = 1e-9;

  private static final Panel PANEL = RandomPanels.draw(5, 20, 7, .25, .01);

  private static Fit fit(String form, PlantEffects effects, Time time) {
    return Estimation.fit(
        PANEL,
        new Specification(Form.named(form), effects, time, true, StandardErrors.CLASSICAL, .95));
  }

  private record Case(String form, PlantEffects effects, Time time) {}

  static Stream<Case> cases() {
    List<Case> cases = new ArrayList<>();
    for (String form : List.of("cobb-douglas", "translog")) {
      for (PlantEffects effects : PlantEffects.values()) {
        for (Time time : Time.values()) {
          boolean sound =
              (effects != PlantEffects.BETWEEN || time == Time.NONE)
                  && (effects == PlantEffects.WITHIN || time != Time.TWO_WAY);
          if (sound) {
            cases.add(new Case(form, effects, time));
          }
        }
      }
    }
    return cases.stream();
  }

  /**
   * What a fit says of a row, ln Q less the residual, is what its technology says at the row's mix,
   * period and plant (of the typical plant where plants share a constant).
   */
  @ParameterizedTest
  @MethodSource("cases")
  void fittedValuesAreThoseOfTheTechnology(Case one) {
    Fit fit = fit(one.form(), one.effects(), one.time());
    boolean shared = one.effects() == PlantEffects.NONE || one.effects() == PlantEffects.BETWEEN;
    double[] z = new double[2];
    for (int p = 0; p < PANEL.plants().size(); p++) {
      for (int r = PANEL.plantStart(p); r < PANEL.plantEnd(p); r++) {
        Productivity whose = shared ? new Productivity.Typical() : new Productivity.Plant(p);
        EstimatedTechnology at = fit.at(PANEL.rowPeriods().get(r), whose);
        z[0] = PANEL.logQuantities().get(0).get(r);
        z[1] = PANEL.logQuantities().get(1).get(r);
        assertThat(at.technology().logOutput(z))
            .isCloseTo(PANEL.logOutput().get(r) - fit.numbers().residuals()[r], within(ROUNDING));
      }
    }
  }

  /** The plant at the upper quartile lies above the typical one, with a covariance. */
  @ParameterizedTest
  @MethodSource("cases")
  void theUpperQuartileLiesAboveTheTypicalPlant(Case one) {
    Fit fit = fit(one.form(), one.effects(), one.time());
    assertThat(fit.numbers().levels().relative()).hasSize(PANEL.plants().size());
    EstimatedTechnology best = fit.at(3, new Productivity.UpperQuartile());
    EstimatedTechnology typical = fit.at(3, new Productivity.Typical());
    assertThat(best.technology().parameters()[0])
        .isGreaterThan(typical.technology().parameters()[0]);
    for (int k = 0; k < best.covariance().length; k++) {
      assertThat(best.covariance()[k][k]).isPositive();
    }
  }

  /**
   * Henderson's equations: with C the inverse of [X′X/σ²_e, X′Z/σ²_e; Z′X/σ²_e, Z′Z/σ²_e + I/σ²_u],
   * (β̂, û) = C (X′y, Z′y)/σ²_e, and C is the covariance of (β̂ − β, û − u). (Henderson 1975,
   * Biometrics 31, 423–447.) The part of C that comes from β̂ is scaled here by the residual
   * variance of generalised least squares over σ²_e, as the fit does.
   */
  @Test
  void randomLevelsAreThoseOfTheMixedModelEquations() {
    for (PlantEffects effects : List.of(PlantEffects.RANDOM, PlantEffects.MUNDLAK)) {
      Fit fit = fit("cobb-douglas", effects, Time.NONE);
      Solution numbers = fit.numbers();
      VarianceComponents components = numbers.treatment().components().orElseThrow();
      Design levels = numbers.treatment().levels();
      int k = levels.columns().size();
      int plants = PANEL.plants().size();
      double[][] block = new double[k + 1][PANEL.rows()];
      levels.fill(0, PANEL.rows(), block);
      RealMatrix w = new Array2DRowRealMatrix(PANEL.rows(), k + plants);
      for (int c = 0; c < k; c++) {
        w.setColumn(c, block[c]);
      }
      for (int r = 0; r < PANEL.rows(); r++) {
        w.setEntry(r, k + PANEL.plantOf(r), 1);
      }
      RealMatrix left = w.transpose().multiply(w).scalarMultiply(1 / components.row());
      for (int p = 0; p < plants; p++) {
        left.addToEntry(k + p, k + p, 1 / components.group());
      }
      RealMatrix c = new LUDecomposition(left).getSolver().getInverse();
      RealVector solved =
          c.operate(w.transpose().operate(new ArrayRealVector(block[k])))
              .mapMultiply(1 / components.row());
      double scale = numbers.linear().residualVariance() / components.row();
      for (int p = 0; p < plants; p++) {
        // The constant of a plant: the constant, its plant means if any, its predicted effect.
        double[] pick = new double[k + plants];
        pick[0] = 1;
        for (int m = 3; m < k; m++) {
          pick[m] = block[m][PANEL.plantStart(p)];
        }
        pick[k + p] = 1;
        RealVector of = new ArrayRealVector(pick);
        EstimatedTechnology mine = fit.at(2, new Productivity.Plant(p));
        assertThat(mine.technology().parameters()[0])
            .isCloseTo(solved.dotProduct(of), within(ROUNDING));
        int rows = PANEL.plantEnd(p) - PANEL.plantStart(p);
        double own = components.shrinkage(rows) * components.row() / rows;
        double variance = (of.dotProduct(c.operate(of)) - own) * scale + own;
        assertThat(mine.covariance()[0][0]).isCloseTo(variance, within(ROUNDING * variance));
        for (int i = 0; i < 2; i++) {
          double with = c.operate(of).getEntry(1 + i) * scale;
          assertThat(mine.covariance()[0][1 + i])
              .isCloseTo(with, within(ROUNDING * Math.sqrt(variance)));
        }
      }
    }
  }

  /** Within plants, a plant's constant and its variance are those of its dummy. */
  @Test
  void levelsWithinAreThoseOfDummies() {
    Fit fit = fit("cobb-douglas", PlantEffects.WITHIN, Time.NONE);
    Design levels = fit.numbers().treatment().levels();
    int plants = PANEL.plants().size();
    double[][] block = new double[3][PANEL.rows()];
    levels.fill(0, PANEL.rows(), block);
    RealMatrix w = new Array2DRowRealMatrix(PANEL.rows(), 2 + plants);
    w.setColumn(0, block[0]);
    w.setColumn(1, block[1]);
    for (int r = 0; r < PANEL.rows(); r++) {
      w.setEntry(r, 2 + PANEL.plantOf(r), 1);
    }
    RealMatrix inverse = new LUDecomposition(w.transpose().multiply(w)).getSolver().getInverse();
    RealVector solved = inverse.operate(w.transpose().operate(new ArrayRealVector(block[2])));
    double variance = fit.numbers().linear().residualVariance();
    for (int p = 0; p < plants; p++) {
      EstimatedTechnology mine = fit.at(0, new Productivity.Plant(p));
      assertThat(mine.technology().parameters()[0])
          .isCloseTo(solved.getEntry(2 + p), within(ROUNDING));
      double expected = variance * inverse.getEntry(2 + p, 2 + p);
      assertThat(mine.covariance()[0][0]).isCloseTo(expected, within(ROUNDING * expected));
    }
  }
}
