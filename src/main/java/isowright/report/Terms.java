package isowright.report;

/**
 * What are the short words of the findings called in a report? Names of technologies, parameters,
 * states and settings, in words a reader knows.
 */
final class Terms {

  private Terms() {}

  /** A specification named with its form first, "ces, within, trend": the form as printed. */
  static String specification(String name) {
    int comma = name.indexOf(',');
    return comma < 0
        ? technology(name)
        : technology(name.substring(0, comma)) + name.substring(comma);
  }

  /** A technology's name; names given by the user stand as they are. */
  static String technology(String name) {
    return switch (name) {
      case "cobb-douglas" -> "Cobb-Douglas";
      case "ces" -> "CES";
      case "nested-ces" -> "Nested CES";
      case "generalised-leontief" -> "Generalised Leontief";
      case "translog" -> "Translog";
      case "cobb-douglas-cost" -> "Cobb-Douglas cost";
      case "cobb-douglas-cost-squared-output" -> "Cobb-Douglas cost, output squared";
      case "translog-cost" -> "Translog cost";
      case "generalised-leontief-cost" -> "Generalised Leontief cost";
      case "mcfadden-cost" -> "McFadden cost";
      default -> name;
    };
  }

  /** A parameter's name in words. */
  static String parameter(String name) {
    int colon = name.indexOf(':');
    if (colon > 0) {
      String rest = name.substring(colon + 1);
      return switch (name.substring(0, colon)) {
        case "share" -> "Share δ of " + rest.replace("+", " and ");
        case "nest-share" -> "Share of " + rest + " in its nest";
        case "rho" -> "Curvature ρ within " + rest.replace("+", " and ");
        case "weight" -> "Weight of " + product(rest);
        case "control" -> "Control: " + rest;
        case "zero" -> "No " + rest + " used";
        case "mean" -> "Plant mean of " + parameter(rest).toLowerCase(java.util.Locale.ROOT);
        case "period" -> "Period " + rest;
        case "frontier" -> frontier(rest);
        default -> name;
      };
    }
    return switch (name) {
      case "constant" -> "Constant, ln A";
      case "trend" -> "Trend per period, τ";
      case "trend*trend" -> "Trend squared, τ₂ (of ½ t²)";
      case "rho" -> "Curvature ρ";
      case "scale" -> "Scale ν";
      default -> product(name);
    };
  }

  private static String frontier(String name) {
    return switch (name) {
      case "noise" -> "Noise, σ_v";
      case "inefficiency" -> "Inefficiency, σ_u";
      case "decay" -> "Decay of inefficiency, η";
      default -> name;
    };
  }

  private static String product(String name) {
    int star = name.indexOf('*');
    if (star < 0) {
      return name;
    }
    String first = name.substring(0, star);
    String second = name.substring(star + 1);
    if (second.equals("trend")) {
      return first + " × t";
    }
    return first.equals(second) ? first + " squared" : first + " × " + second;
  }

  /** The state of a fit as a short label. */
  static String state(String state) {
    return switch (state) {
      case "estimated" -> "estimated";
      case "boundary" -> "at the boundary";
      case "flat" -> "flat";
      case "not-converged" -> "not converged";
      case "rank-deficient" -> "rank-deficient";
      case "refused" -> "refused";
      default -> state;
    };
  }

  /** What the state of a fit means. */
  static String stateMeaning(String state) {
    return switch (state) {
      case "estimated" -> "An optimum was found and identified.";
      case "boundary" ->
          "The fit still improves at the edge of the admissible range: the records have no"
              + " admissible optimum under this form, and no figure is printed for it.";
      case "flat" ->
          "The sum of squares hardly changes over a wide range of curvature: read the interval, not"
              + " the point.";
      case "not-converged" ->
          "The search did not end at an optimum, and no figure is printed for it.";
      case "rank-deficient" ->
          "Columns are collinear, so that the parameters are not identified, and no figure is"
              + " printed for it.";
      default -> "";
    };
  }

  /** The status of a plan as a short label. */
  static String status(String status) {
    return switch (status) {
      case "solved" -> "solved";
      case "corner" -> "at a limit";
      case "irregular" -> "no plan: irregular technology";
      case "outside-records" -> "outside the records";
      case "infeasible" -> "no plan: out of reach";
      case "unbounded" -> "no plan: more is always better";
      case "nothing" -> "no plan: nothing is best";
      default -> status;
    };
  }

  /** What the status of a plan means. */
  static String statusMeaning(String status) {
    return switch (status) {
      case "solved" -> "Every first-order condition is met, inside the ranges of the records.";
      case "corner" ->
          "The best mix lies at a limit: an input is not used or held, a capacity, contract or"
              + " price band binds, or a plant runs full; what the limit is worth stands beneath.";
      case "irregular" ->
          "The technology is not regular where the answer would lie, so that no mix is given.";
      case "unbounded" ->
          "Profit grows with output without end, because returns do not decrease: prices alone do"
              + " not determine an output. State a target, a budget or limits.";
      case "nothing" ->
          "At these prices no output covers its cost, so that it is best to make none.";
      case "outside-records" ->
          "The mix or the target lies outside the ranges of the records: the figures rest on the"
              + " form of the technology and not on anything seen.";
      case "infeasible" -> "No mix within the limits reaches the target.";
      default -> "";
    };
  }

  /** Whether a status needs a warning beside the result; a plan at a limit is as good as any. */
  static boolean cautionary(String status) {
    return !status.equals("solved") && !status.equals("corner");
  }

  /** What was done about lasting differences between plants. */
  static String plantEffects(String word) {
    return switch (word) {
      case "none" -> "one constant for all plants";
      case "within" -> "a constant for each plant, removed by taking deviations from plant means";
      case "between" -> "the means of plants, one row a plant";
      case "random" -> "plants as random draws, unrelated to inputs";
      case "differences" ->
          "a constant for each plant, removed by differences of successive periods";
      case "mundlak" -> "plants as random draws around what their mean inputs say";
      default -> word;
    };
  }

  /** What was done about time. */
  static String time(String word) {
    return switch (word) {
      case "none" -> "no change over time";
      case "trend" -> "a linear trend over the periods";
      case "quadratic-trend" -> "a trend with its square over the periods";
      case "biased-trend" -> "a trend with its square that also works through each input";
      case "two-way" -> "a constant for each period but the first, beside one for each plant";
      case "period-effects" -> "a constant for each period but the first";
      default -> word;
    };
  }

  /** After whom variances of random effects were estimated. */
  static String estimator(String word) {
    return switch (word) {
      case "least-squares" -> "Least squares";
      case "instruments" -> "Two-stage least squares";
      case "proxy" -> "Control function";
      case "joint-moments" -> "Joint moments in one step";
      case "least-squares-within" -> "Least squares within plants";
      default -> word;
    };
  }

  static String components(String word) {
    return switch (word) {
      case "swamy-arora" -> "Swamy and Arora";
      case "wallace-hussain" -> "Wallace and Hussain";
      case "amemiya" -> "Amemiya";
      default -> word;
    };
  }

  /** How uncertainty was obtained. */
  static String method(String word) {
    return switch (word) {
      case "delta" -> "first-order propagation of the parameter covariance";
      case "profile" -> "the profile of the sum of squares or of the likelihood";
      case "resampling" -> "resampling of whole plants";
      case "conditional" -> "the law of inefficiency given the residuals";
      default -> word;
    };
  }

  /** The name of an elasticity of substitution, by measure. */
  static String measure(String measure) {
    return switch (measure) {
      case "hicks" -> "Direct (Hicks)";
      case "allen" -> "Allen-Uzawa";
      case "morishima" -> "Morishima";
      default -> measure;
    };
  }

  /** A test's name in words. */
  static String test(String name) {
    return switch (name) {
      case "constant-returns" -> "Constant returns to scale";
      case "homogeneous" -> "Homogeneity";
      case "homothetic" -> "Homotheticity";
      case "one-substitution" -> "One elasticity of substitution (CES within nested CES)";
      case "unit-substitution" -> "Unit elasticity of substitution";
      case "cobb-douglas-in-translog" -> "Cobb-Douglas within translog";
      case "plant-effects" -> "Plant effects";
      case "plant-variance" -> "Variance between plants";
      case "random-against-within" -> "Random effects against within";
      case "no-inefficiency" -> "No inefficiency (one-sided)";
      case "no-decay" -> "Inefficiency constant over time";
      case "instruments-agree" -> "Do the instruments agree? (over-identification)";
      case "inputs-exogenous" -> "Were instruments needed? (Durbin-Wu-Hausman)";
      case "reset" -> "RESET: is the form rich enough?";
      case "breusch-pagan" -> "Breusch-Pagan: equal variance";
      case "white" -> "White: equal variance";
      case "jarque-bera" -> "Jarque-Bera: normal errors";
      case "vuong-alike" -> "Vuong: can they be told apart?";
      case "vuong" -> "Vuong: which is nearer?";
      case "vuong-akaike" -> "… corrected after Akaike";
      case "vuong-schwarz" -> "… corrected after Schwarz";
      case "j-first" -> "J test of the first";
      case "j-second" -> "J test of the second";
      default -> Phrases.sentence(name.replace('-', ' '));
    };
  }
}
