package isowright.review;

import java.util.ArrayList;
import java.util.List;

/**
 * What would a plant be allowed, year by year, if a gap were to be removed? With F the filed cost,
 * g the quantile of the gap's distribution that is used, c the controllable share, Y the years, f
 * the frontier shift and i the index, year t = 1 … Y:
 *
 * <pre>
 *   rest            (1 − c) F                         stays as filed
 *   controllable_t  c F − (t/Y) c max(g, 0)           the gap removed in equal steps
 *   shift_t         −controllable_t (1 − (1 − f)^t)    what all plants are expected to gain, kept apart
 *   index_t         (rest + controllable_t + shift_t) ((1 + i)^t − 1)
 *   allowance_t     rest + controllable_t + shift_t + index_t
 * </pre>
 *
 * <p>The margin for error is the estimated gap less g; where g is not positive nothing is removed.
 * Every line is a product of figures shown, so the table can be checked by hand; nothing is rounded
 * on the way.
 *
 * <p>This is arithmetic, not advice: c, the quantile, Y, f and i are choices of whoever decides.
 *
 * <p>Source: common practice of incentive regulation (controllable base, margin for error, removal
 * in equal yearly steps, general productivity and index kept apart); compare annex 1 of Germany's
 * Anreizregulierungsverordnung of 2007 (its factor V_t rises in equal steps; from memory). Tested
 * by hand arithmetic in {@code AllowancePathTest}.
 *
 * @param filed F
 * @param gap the estimated gap
 * @param gapUsed g
 * @param margin the estimated gap less g
 * @param controllableGap c max(g, 0), removed over the years
 * @param years the lines, t = 0 to Y
 */
public record AllowancePath(
    double filed,
    double gap,
    double gapUsed,
    double margin,
    double controllableGap,
    List<Year> years) {

  /** Copies the lines. */
  public AllowancePath {
    years = List.copyOf(years);
  }

  /**
   * What is decided outside this program.
   *
   * @param controllable c, 0 to 1
   * @param years Y, at least one
   * @param frontierShift f
   * @param index i
   */
  public record Terms(double controllable, int years, double frontierShift, double index) {}

  /**
   * One line.
   *
   * @param year t
   * @param rest what cannot be influenced
   * @param removed the part of the gap removed by then
   * @param controllable what can be influenced, after that
   * @param shift frontier shift, negative where cost falls
   * @param index what rising prices add
   * @param allowance the sum of rest, controllable, shift and index
   */
  public record Year(
      int year,
      double rest,
      double removed,
      double controllable,
      double shift,
      double index,
      double allowance) {}

  /**
   * The path of one plant.
   *
   * @param filed F, positive
   * @param gap the estimated gap
   * @param gapUsed g
   */
  public static AllowancePath of(double filed, double gap, double gapUsed, Terms terms) {
    double removable = terms.controllable() * Math.max(gapUsed, 0);
    double rest = (1 - terms.controllable()) * filed;
    List<Year> lines = new ArrayList<>();
    for (int t = 0; t <= terms.years(); t++) {
      double removed = removable * ((double) t / terms.years());
      double controllable = terms.controllable() * filed - removed;
      double shift = -controllable * (1 - Math.pow(1 - terms.frontierShift(), t));
      double before = rest + controllable + shift;
      double index = before * (Math.pow(1 + terms.index(), t) - 1);
      lines.add(new Year(t, rest, removed, controllable, shift, index, before + index));
    }
    return new AllowancePath(filed, gap, gapUsed, gap - gapUsed, removable, lines);
  }
}
