package isowright.regression;

import java.util.Arrays;

/**
 * Would the coefficients be others if rows with large residuals counted for less? Huber's M
 * estimate: Σ ρ(e_i/s) least, with ρ a square up to k = 1.345 and a straight line beyond.
 *
 * <p>Found by least squares with the weights min(1, k s/|e_i|), again and again until the residuals
 * stand still; the scale s is the median of |e_i| over 0.6745, renewed each time. With k = 1.345
 * the estimate has 95 % of the precision of least squares where errors are normal. Where group
 * effects were removed they are estimated along, as weighted means. It guards against outlying
 * responses, not against outlying regressors: see {@link Influence} for those.
 *
 * <p>Sums of products are taken in the basis of the least-squares fit (see {@link GroupProducts}),
 * where weights between 0 and 1 cannot make them ill-conditioned unless rows are all but left out.
 *
 * <p>Source: P. J. Huber, <i>Robust Statistics</i>, 1981, sections 7.3 and 7.8; the constant: P. W.
 * Holland and R. E. Welsch 1977, Communications in Statistics A6, 813–827. Tested in {@code
 * HuberRegressionTest} against R.
 *
 * @param coefficients shape K; copied in and out
 * @param scale s
 * @param lessened how many rows have a weight below one
 * @param converged whether the residuals stood still to {@link #STILL} of their length
 */
public record HuberRegression(
    double[] coefficients, double scale, int lessened, boolean converged) {

  /** Beyond so many scales a residual counts for less. */
  public static final double BEND = 1.345;

  /** The median of |e| over the standard deviation, for normal errors. */
  private static final double NORMAL_MEDIAN = 0.6745;

  /** Residuals that move by less than this part of their length stand still. */
  public static final double STILL = 1e-11;

  private static final int MOST_ROUNDS = 500;

  /** Copies the array. */
  public HuberRegression {
    coefficients = coefficients.clone();
  }

  @Override
  public double[] coefficients() {
    return coefficients.clone();
  }

  /**
   * Fits, from the least-squares fit on; reads the design twice a round, in parallel.
   *
   * @param design the design that was fitted, in plain rows or in deviations from group means
   */
  public static HuberRegression fit(Design design, LinearFit fit) {
    return new Search(design, fit).run();
  }

  /** One search; all lengths in units of the fit's √SSR. */
  private static final class Search {
    private final Design design;
    private final LinearFit fit;
    private final Blocks blocks;
    private final boolean means;
    private final double[] residuals;
    private double scale;

    Search(Design design, LinearFit fit) {
      this.design = design;
      this.fit = fit;
      this.blocks = Blocks.of(design.groups());
      this.means = design.absorbed() > 0;
      this.residuals = new double[design.rows()];
    }

    HuberRegression run() {
      PackedSolver solver = new PackedSolver(fit.rank());
      double[] move = new double[fit.rank()];
      renew(move, true);
      boolean converged = false;
      for (int round = 0; round < MOST_ROUNDS && !converged; round++) {
        scale = median() / NORMAL_MEDIAN;
        if (!(scale > 0) || !solver.solve(products())) {
          break;
        }
        move = solver.move().clone();
        converged = renew(move, false);
      }
      return result(move, converged);
    }

    private HuberRegression result(double[] move, boolean converged) {
      GroupProducts basis = GroupProducts.basis(fit);
      double[] coefficients = new double[fit.columns().size()];
      basis.coefficients(move, coefficients, 0);
      int lessened = 0;
      for (double e : residuals) {
        lessened += weight(e) < 1 ? 1 : 0;
      }
      return new HuberRegression(coefficients, scale * basis.scale(), lessened, converged);
    }

    private double weight(double e) {
      double size = Math.abs(e);
      return size <= BEND * scale ? 1 : BEND * scale / size;
    }

    private double median() {
      double[] sizes = new double[residuals.length];
      for (int i = 0; i < sizes.length; i++) {
        sizes[i] = Math.abs(residuals[i]);
      }
      Arrays.parallelSort(sizes);
      int half = sizes.length / 2;
      return sizes.length % 2 == 1 ? sizes[half] : 0.5 * (sizes[half - 1] + sizes[half]);
    }

    /** Σ w q q′, packed, q less the weighted mean of its group where effects were removed. */
    private double[] products() {
      int size = fit.rank() + 1;
      return blocks.gather(
              fit.columns().size() + 1,
              () -> new Pass(fit, blocks.longest()),
              (pass, from, to, buffer) -> {
                double[][] q = pass.rows.of(design, from, to, buffer);
                for (int i = 0; i < to - from; i++) {
                  pass.weights[i] = weight(residuals[from + i]);
                }
                for (int p = 0; means && p < size; p++) {
                  center(q[p], pass.weights, from, to);
                }
                for (int p = 0; p < size; p++) {
                  for (int i = 0; i < to - from; i++) {
                    q[p][i] *= Math.sqrt(pass.weights[i]);
                  }
                }
                int at = 0;
                for (int p = 0; p < size; p++) {
                  for (int r = 0; r <= p; r++) {
                    pass.sums[at++] += OrthogonalDecomposition.product(q[p], q[r], 0, to - from);
                  }
                }
              },
              Pass::add)
          .sums;
    }

    /** The residuals after a move, into their array; whether they stood still. */
    private boolean renew(double[] move, boolean first) {
      double[] moved =
          blocks.gather(
                  fit.columns().size() + 1,
                  () -> new Pass(fit, blocks.longest()),
                  (pass, from, to, buffer) -> {
                    double[][] q = pass.rows.of(design, from, to, buffer);
                    double[] e = q[move.length];
                    for (int p = 0; p < move.length; p++) {
                      for (int i = 0; i < to - from; i++) {
                        e[i] -= move[p] * q[p][i];
                      }
                    }
                    for (int i = 0; i < to - from; i++) {
                      pass.weights[i] = first ? 1 : weight(residuals[from + i]);
                    }
                    if (means) {
                      center(e, pass.weights, from, to);
                    }
                    for (int i = 0; i < to - from; i++) {
                      double before = residuals[from + i];
                      pass.sums[0] += (e[i] - before) * (e[i] - before);
                      pass.sums[1] += before * before;
                      residuals[from + i] = e[i];
                    }
                  },
                  Pass::add)
              .sums;
      return !first && moved[0] <= STILL * STILL * moved[1];
    }

    /** Subtracts from each group of a block its weighted mean. */
    private void center(double[] values, double[] weights, int from, int to) {
      Groups groups = design.groups();
      for (int g = groups.of(from); g < groups.count() && groups.start(g) < to; g++) {
        int start = groups.start(g) - from;
        int end = groups.end(g) - from;
        double sum = 0;
        double total = 0;
        for (int i = start; i < end; i++) {
          sum += weights[i] * values[i];
          total += weights[i];
        }
        for (int i = start; i < end; i++) {
          values[i] -= sum / total;
        }
      }
    }
  }

  /** What one reading needs and gathers. */
  private static final class Pass {
    private final RotatedRows rows;
    private final double[] weights;
    private final double[] sums;

    Pass(LinearFit fit, int longest) {
      this.rows = new RotatedRows(fit, longest);
      this.weights = new double[longest];
      int size = fit.rank() + 1;
      this.sums = new double[Math.max(2, size * (size + 1) / 2)];
    }

    void add(Pass other) {
      for (int e = 0; e < sums.length; e++) {
        sums[e] += other.sums[e];
      }
    }
  }
}
