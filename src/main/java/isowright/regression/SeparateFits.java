package isowright.regression;

import java.util.List;

/**
 * How well does a regression describe the rows when each group has coefficients of its own? Least
 * squares group by group, each with its own constant: the free model of a test whether groups share
 * their slopes (G. C. Chow 1960, Econometrica 28, 591–605).
 *
 * <p>A group with fewer rows than columns is fitted exactly and takes as many parameters as it has
 * rows, so that the sum is that of the least squares space of the free model whatever the groups
 * (F. M. Fisher 1970, Econometrica 38, 361–366). Tested in {@code GroupTransformationsTest}.
 *
 * @param ssr the sum of squared residuals over all groups
 * @param parameters how many parameters are estimated in all, constants among them
 */
public record SeparateFits(double ssr, int parameters) {

  /**
   * Fits each group; reads the design once, in parallel.
   *
   * @param design in levels; a constant among its columns is that of the group
   */
  public static SeparateFits of(Design design) {
    Blocks blocks = Blocks.of(design.groups());
    int columns = design.columns().size();
    Gatherer all =
        blocks.gather(
            columns + 1,
            () -> new Gatherer(design.columns()),
            (gatherer, from, to, buffer) -> {
              design.fill(from, to, buffer);
              gatherer.add(buffer, from, to, design.groups());
            },
            Gatherer::add);
    return new SeparateFits(all.ssr, all.parameters);
  }

  private static final class Gatherer {
    private final List<String> columns;
    private double ssr;
    private int parameters;

    Gatherer(List<String> columns) {
      this.columns = columns;
    }

    void add(double[][] block, int from, int to, Groups groups) {
      int size = columns.size() + 1;
      for (int g = groups.of(from); g < groups.count() && groups.start(g) < to; g++) {
        int at = groups.start(g) - from;
        int rows = groups.end(g) - groups.start(g);
        parameters++;
        if (rows > 1) {
          group(block, at, rows, size);
        }
      }
    }

    private void group(double[][] block, int at, int rows, int size) {
      double[][] own = new double[size][rows];
      double[] squares = new double[size];
      for (int k = 0; k < size; k++) {
        System.arraycopy(block[k], at, own[k], 0, rows);
        squares[k] = OrthogonalDecomposition.sumOfSquares(own[k], 0, rows);
        Effects.center(own[k], 0, rows);
      }
      double total = OrthogonalDecomposition.sumOfSquares(own[size - 1], 0, rows);
      OrthogonalDecomposition decomposition = new OrthogonalDecomposition(size);
      decomposition.add(own, rows);
      RankAnalysis analysis = new RankAnalysis(columns, decomposition, squares, RankRule.STANDARD);
      parameters += analysis.rank();
      if (rows - 1 > analysis.rank()) {
        ssr += Math.max(0, total - analysis.explained());
      }
    }

    void add(Gatherer other) {
      ssr += other.ssr;
      parameters += other.parameters;
    }
  }
}
