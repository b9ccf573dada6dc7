package isowright.study;

import isowright.estimation.Estimator;
import isowright.estimation.Replication;
import isowright.estimation.Specification;
import isowright.records.Keep;
import isowright.records.Roles;
import isowright.records.Source;
import isowright.regression.VarianceComponents;
import isowright.technology.Form;
import isowright.technology.Restriction;
import isowright.technology.Technology;
import java.nio.file.Path;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * A study: everything that a study file asks, checked for its own sake (keys, types,
 * contradictions) but not yet against the records.
 *
 * @param file the study file
 * @param sha256 the SHA-256 of the study file, in hexadecimal
 * @param title the title of the report
 * @param records the records and the roles of their columns; absent where only given technologies
 *     are asked
 * @param money currency and base of money
 * @param outputUnit the unit of output
 * @param inputs the names of the inputs, in order (from {@code inputs} or from the given
 *     technologies)
 * @param inputUnits the unit of each input, empty where not stated
 * @param technologies the forms to be fitted, by name, in order
 * @param given technologies taken as known
 * @param estimation how they are fitted
 * @param questions what is tested
 * @param leastCost the least-cost questions
 * @param filing the filed costs to be reviewed
 * @param protocol what was laid down before fitting
 * @param costs the cost side; absent where none is asked
 * @param capital user costs in place of prices, and the owner's services
 */
public record Study(
    Path file,
    String sha256,
    String title,
    Optional<Records> records,
    Money money,
    Optional<String> outputUnit,
    List<String> inputs,
    List<Optional<String>> inputUnits,
    List<String> technologies,
    List<Given> given,
    Estimation estimation,
    Questions questions,
    List<LeastCostQuestion> leastCost,
    Optional<Filing> filing,
    Protocol protocol,
    Optional<Costs> costs,
    Capital capital) {

  /** Copies the lists. */
  public Study {
    inputs = List.copyOf(inputs);
    inputUnits = List.copyOf(inputUnits);
    technologies = List.copyOf(technologies);
    given = List.copyOf(given);
    leastCost = List.copyOf(leastCost);
  }

  /**
   * The records file and what its columns are.
   *
   * @param source the file, resolved against the study file's folder
   * @param roles the roles of the columns
   * @param keep which rows are kept
   */
  public record Records(Source source, Roles roles, Keep keep) {}

  /**
   * Money.
   *
   * @param currency the ISO 4217 code
   * @param base the period whose money is used, where a deflator is declared
   */
  public record Money(Optional<String> currency, Optional<String> base) {
    /** How money is printed beside a figure: "EUR", "EUR of 2020", or "money". */
    public String words() {
      return currency.orElse("money") + base.map(b -> " of " + b).orElse("");
    }
  }

  /**
   * A technology taken as known.
   *
   * @param name its name in the study
   * @param technology what it is
   */
  public record Given(String name, Technology technology) {}

  /**
   * How technologies are fitted; {@code standardErrors} absent means clustered where there is a
   * plant column, else robust. Of the principles asked for, the technologies rest on the first; the
   * others are set beside it. None: least squares. Where {@code resampling} is there, every
   * headline figure is resampled.
   */
  public record Estimation(
      Specification.PlantEffects plantEffects,
      Specification.Time time,
      VarianceComponents.Method components,
      boolean scaled,
      Optional<Specification.StandardErrors> standardErrors,
      double confidence,
      List<Estimator> estimators,
      Held held,
      Optional<Replication.Drawing> resampling) {

    /** Copies the list. */
    public Estimation {
      estimators = List.copyOf(estimators);
    }

    /** By least squares, without resampling. */
    public Estimation(
        Specification.PlantEffects plantEffects,
        Specification.Time time,
        boolean scaled,
        Optional<Specification.StandardErrors> standardErrors,
        double confidence) {
      this(
          plantEffects,
          time,
          VarianceComponents.Method.SWAMY_ARORA,
          scaled,
          standardErrors,
          confidence,
          List.of(),
          Held.FREE,
          Optional.empty());
    }

    /** The same by these principles. */
    Estimation by(List<Estimator> principles) {
      return new Estimation(
          plantEffects,
          time,
          components,
          scaled,
          standardErrors,
          confidence,
          principles,
          held,
          resampling);
    }

    /** The same with the forms held to this. */
    Estimation held(Held to) {
      return new Estimation(
          plantEffects,
          time,
          components,
          scaled,
          standardErrors,
          confidence,
          estimators,
          to,
          resampling);
    }

    /** The principle that the technologies rest on. */
    public Estimator estimator() {
      return estimators.isEmpty() ? new Estimator.LeastSquares() : estimators.get(0);
    }
  }

  /**
   * What the forms that are fitted are held to.
   *
   * @param nests the inputs by group, for the form that has groups; empty where not stated
   * @param restrict the strongest restriction asked
   * @param regularity where the fit is held to be regular
   */
  public record Held(
      List<List<String>> nests,
      Optional<Restriction> restrict,
      Specification.RegularityImposed regularity) {

    /** Nothing but what each form is. */
    public static final Held FREE =
        new Held(List.of(), Optional.empty(), Specification.RegularityImposed.FREE);

    /** Copies the lists. */
    public Held {
      nests = nests.stream().map(List::copyOf).toList();
    }

    /** A form as it is fitted. */
    public Form form(String name, List<String> inputs) {
      Form form = Form.named(name);
      Form grouped = nests.isEmpty() ? form : form.nested(nests, inputs);
      return restrict.map(grouped::restricted).orElse(grouped);
    }
  }

  /**
   * What is tested.
   *
   * @param returnsToScale the degree of homogeneity under the null
   * @param substitution the elasticity of substitution under the null
   */
  public record Questions(double returnsToScale, double substitution) {}

  /**
   * A least-cost question.
   *
   * @param name its name
   * @param technologies the technologies (form names or names of given ones) whose answers are
   *     wanted; empty: all
   * @param target the output to be reached; NaN where a budget or a price of output stands in its
   *     place
   * @param prices by input; mean prices of the last period for those left out
   * @param productivity whose productivity
   * @param period the period at which time effects are evaluated; the last if absent
   * @param hold quantities of inputs that cannot change
   * @param limits lowest and highest quantity by input
   * @param curve the cost curve wanted; a default span if absent
   * @param terms what is asked beside
   */
  public record LeastCostQuestion(
      String name,
      List<String> technologies,
      double target,
      Map<String, Double> prices,
      Productivity productivity,
      Optional<String> period,
      Map<String, Double> hold,
      Map<String, Limit> limits,
      Optional<Curve> curve,
      PlanTerms terms) {
    /** Copies the collections. */
    public LeastCostQuestion {
      technologies = List.copyOf(technologies);
      prices = Map.copyOf(prices);
      hold = Map.copyOf(hold);
      limits = Map.copyOf(limits);
    }
  }

  /**
   * Limits of one input.
   *
   * @param low the least
   * @param high the most; may be {@code +∞}
   */
  public record Limit(double low, double high) {}

  /**
   * A span of targets.
   *
   * @param from the first
   * @param to the last
   * @param points how many
   */
  public record Curve(double from, double to, int points) {}

  /**
   * Whose productivity is meant.
   *
   * @param kind typical, best quarter, the frontier, or a named plant
   * @param plant the plant, where one is named
   */
  public record Productivity(Kind kind, Optional<String> plant) {
    /** The kinds. */
    public enum Kind {
      /** The typical plant. */
      TYPICAL,
      /** The plant at the upper quartile of productivity. */
      BEST_QUARTER,
      /** The frontier, where there is no inefficiency. */
      FRONTIER,
      /** A named plant. */
      PLANT
    }

    /** The typical plant. */
    public static final Productivity TYPICAL = new Productivity(Kind.TYPICAL, Optional.empty());
  }

  /**
   * Filed costs to be reviewed.
   *
   * @param cost the column of filed cost; absent: the sum of price × quantity
   * @param firstPeriod the first period; absent: the last of the records
   * @param lastPeriod the last period
   * @param against typical, best quarter or the frontier
   * @param smearing whether the reference is brought from the median to the mean of output (Duan
   *     1983)
   * @param simulation how ranks are drawn
   * @param allowance how a gap becomes an allowance, where asked
   */
  public record Filing(
      Optional<String> cost,
      Optional<String> firstPeriod,
      Optional<String> lastPeriod,
      Productivity against,
      boolean smearing,
      Simulation simulation,
      Optional<Allowance> allowance) {}

  /**
   * Draws of the technology's parameters.
   *
   * @param draws how many
   * @param seed where they begin, so that a second run gives the same
   */
  public record Simulation(int draws, long seed) {
    /** What is in force where nothing is written. */
    public static final Simulation USUAL = new Simulation(999, 20240613);
  }

  /**
   * How a gap becomes an allowance; nothing here has a default.
   *
   * @param controllable the share of filed cost that the plant can influence, 0 to 1
   * @param quantile which quantile of the gap's distribution is used, so that error speaks for the
   *     plant
   * @param years over how many years it is removed, in equal steps
   * @param frontierShift by which share controllable cost falls each year for all plants
   * @param index by which share prices rise each year
   */
  public record Allowance(
      double controllable, double quantile, int years, double frontierShift, double index) {}
}
