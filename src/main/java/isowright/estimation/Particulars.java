package isowright.estimation;

import isowright.regression.ComposedFit;
import isowright.regression.InstrumentedFit;
import isowright.regression.Times;
import java.util.List;

/** What belongs to one estimator alone, for its tests and for what is said of it. */
public sealed interface Particulars {

  /** Nothing beside the solution. */
  record None() implements Particulars {}

  /**
   * Of two-stage least squares.
   *
   * @param fit both stages
   * @param times when each row of them was observed
   * @param series what stands in for inputs, as it enters: {@code ln wage}, {@code lag ln labour}
   * @param rowsUnknown how many rows of the panel were not used because an instrument is unknown
   * @param periodsUnknown periods without any row used, whose constants stand at that of the next
   */
  record OfInstruments(
      InstrumentedFit fit,
      Times times,
      List<String> series,
      int rowsUnknown,
      List<String> periodsUnknown)
      implements Particulars {
    /** Copies the lists. */
    public OfInstruments {
      series = List.copyOf(series);
      periodsUnknown = List.copyOf(periodsUnknown);
    }
  }

  /**
   * Of a frontier.
   *
   * @param fit the fit by maximum likelihood, or by least squares where no inefficiency was found
   * @param scale c, by which σ_u is multiplied for the mean of the inefficiency
   */
  record OfFrontier(ComposedFit fit, double scale) implements Particulars {

    /** The parameters that follow those of least squares: {@code frontier:noise} and so on. */
    static final List<String> NAMES =
        List.of("frontier:noise", "frontier:inefficiency", "frontier:decay");

    /** How many of them there are; none where no inefficiency was found. */
    int count() {
      return fit.parameters().length - fit.coefficients().length;
    }

    /**
     * The mean of the inefficiency, c σ_u e^(−ητ).
     *
     * @param own the parameters that follow those of least squares, shape {@link #count}
     * @param since τ, the time since the last period of the records
     */
    double mean(double[] own, double since) {
      double share = own.length > 2 ? Math.exp(-own[2] * since) : 1;
      return own.length < 2 ? 0 : scale * own[1] * share;
    }

    /** Its derivatives in those parameters. */
    double[] slopes(double[] own, double since) {
      double[] slopes = new double[own.length];
      if (own.length > 1) {
        slopes[1] = scale * (own.length > 2 ? Math.exp(-own[2] * since) : 1);
      }
      if (own.length > 2) {
        slopes[2] = -since * mean(own, since);
      }
      return slopes;
    }
  }

  /**
   * Of a fit held to be regular.
   *
   * @param free the same without
   * @param where where it is held
   * @param held at how many mixes
   * @param binding at how many of them something binds
   * @param withoutProduct at how many an input is held to add nothing
   * @param straight at how many the isoquant is held straight
   * @param watched the rows whose inequalities entered the search
   * @param distance the rise of the sum of squares over the free residual variance
   * @param departure how far the first-order conditions are from being met, zero at an optimum
   * @param starts from how many starts the search was made
   * @param agreeing how many of them came to the best
   */
  record OfRegularity(
      Fit free,
      Specification.RegularityImposed where,
      int held,
      int binding,
      int withoutProduct,
      int straight,
      List<Integer> watched,
      double distance,
      double departure,
      int starts,
      int agreeing)
      implements Particulars {
    /** Copies the list. */
    public OfRegularity {
      watched = List.copyOf(watched);
    }

    static OfRegularity of(
        Fit free,
        Specification.RegularityImposed where,
        ImposedRegularity imposed,
        ImposedRegularity.Best best) {
      int[] binding = imposed.mixes().binding(best.found().coefficients());
      return new OfRegularity(
          free,
          where,
          imposed.mixes().rows(),
          binding[0],
          binding[1],
          binding[2],
          imposed.mixes().watched(),
          best.found().distance(),
          best.found().departure(),
          best.starts(),
          best.agreeing());
    }
  }

  /**
   * Of a control function.
   *
   * @param proxy the proxy as it enters
   * @param free the inputs chosen knowing productivity
   * @param basis how many columns smooth output
   * @param smoothedShare R² of the smoothing
   * @param pairs how many rows have the row of the period before
   * @param unpaired how many rows have not, first rows of plants among them
   * @param singletons plants without any pair
   * @param lasts the mean derivative of productivity by that of the period before
   * @param others how many further solutions of the moments were found from other starts
   * @param failed how many draws of plants have no solution
   * @param proxySlope the slope of productivity on the proxy at given inputs
   * @param parameters of every draw that has a solution, over the columns of the fit
   * @param jointly the joint moments in their one-step form
   */
  record OfProxy(
      String proxy,
      List<String> free,
      int basis,
      double smoothedShare,
      int pairs,
      int unpaired,
      List<String> singletons,
      double lasts,
      int others,
      int failed,
      double proxySlope,
      List<double[]> parameters,
      Fit jointly)
      implements Particulars {
    /** Copies the lists. */
    public OfProxy {
      free = List.copyOf(free);
      singletons = List.copyOf(singletons);
      parameters = List.copyOf(parameters);
    }
  }
}
