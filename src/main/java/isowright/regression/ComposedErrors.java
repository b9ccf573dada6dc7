package isowright.regression;

import java.util.ArrayList;
import java.util.List;

/**
 * The model y = Xβ + v − w with noise v of both signs, normal with standard deviation σ_v, and an
 * error w ≥ 0 of one sign.
 *
 * <p>Every unit i has a draw w_i of the one-sided law with scale σ_w; its rows share it as g_t w_i
 * with g_t = exp(−η τ_t) (1 without decay). With ε = y − Xβ, S₁ = Σ g ε, S₂ = Σ g², A = S₂/σ_v² +
 * [1/σ_w²], B = −S₁/σ_v² − (1/σ_w), q = B/√A, where [·] belongs to the half-normal and (·) to the
 * exponential law, a unit of T rows adds
 *
 * <pre>  ln f = −T/2 ln 2π − T ln σ_v − ln σ_w + c − ½ ln A − ½ Σ ε²/σ_v² + ½ q² + ln Φ(q), </pre>
 *
 * c = ln 2 (half-normal) or ½ ln 2π (exponential): the integral over w_i of the normal densities of
 * its rows times the law of w_i, by completing the square. Given its rows, w_i is normal with mean
 * B/A and variance 1/A, cut off at zero.
 *
 * <p>With one row a unit this is D. J. Aigner, C. A. K. Lovell and P. Schmidt 1977, Journal of
 * Econometrics 6, 21–37 (both laws; the exponential also W. Meeusen and J. van den Broeck 1977,
 * International Economic Review 18, 435–444); with several and no decay G. E. Battese and T. J.
 * Coelli 1988, Journal of Econometrics 38, 387–399; with decay G. E. Battese and T. J. Coelli 1992,
 * Journal of Productivity Analysis 3, 153–169. Derivatives are held to differences in {@code
 * ComposedErrorsTest}.
 *
 * @param design X and y
 * @param law of w
 * @param sharing how rows share a draw
 * @param since τ_t of each row, shape N; read where there is decay only
 */
public record ComposedErrors(Design design, OneSidedLaw law, Sharing sharing, double[] since) {

  /** How rows share a draw of the one-sided error. */
  public enum Sharing {
    /** Every row has its own. */
    NONE,
    /** The rows of a group have the same. */
    GROUP,
    /** The rows of a group have the same, times e^(−ητ). */
    GROUP_WITH_DECAY
  }

  /** Copies the array. */
  public ComposedErrors {
    since = since.clone();
    if (sharing == Sharing.GROUP_WITH_DECAY && since.length != design.rows()) {
      throw new IllegalArgumentException(
          "there are times of " + since.length + " rows, the design has " + design.rows());
    }
  }

  @Override
  public double[] since() {
    return since.clone();
  }

  /** The number of parameters: β, ln σ_v, ln σ_w and, with decay, η. */
  public int parameters() {
    return design.columns().size() + (sharing == Sharing.GROUP_WITH_DECAY ? 3 : 2);
  }

  /** Their names: those of the columns, {@code ln-noise}, {@code ln-one-sided}, {@code decay}. */
  public List<String> names() {
    List<String> names = new ArrayList<>(design.columns());
    names.add("ln-noise");
    names.add("ln-one-sided");
    if (sharing == Sharing.GROUP_WITH_DECAY) {
      names.add("decay");
    }
    return List.copyOf(names);
  }

  /** The log-likelihood with its derivatives at a point; one reading of the design. */
  ComposedLikelihood at(double[] parameters) {
    return ComposedLikelihood.of(this, parameters);
  }

  /** τ of a row. */
  double since(int row) {
    return sharing == Sharing.GROUP_WITH_DECAY ? since[row] : 0;
  }
}
