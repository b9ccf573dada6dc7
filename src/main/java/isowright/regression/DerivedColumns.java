package isowright.regression;

import java.util.List;

/**
 * A design whose regressors are worked out from those of another one, block by block: powers,
 * products, or anything known row by row. The response and the groups stay. Nothing is copied but
 * the block at hand.
 *
 * <p>What was removed from the rows of the other design is not removed from what is worked out;
 * {@link Design#likewise} does that. Tested in {@code DerivedColumnsTest}.
 */
public final class DerivedColumns implements Design {

  private final Design design;
  private final List<String> columns;
  private final Derivation derivation;

  /** How the regressors of a block of rows are worked out. */
  @FunctionalInterface
  public interface Derivation {
    /**
     * Works out rows {@code from} to {@code to − 1}.
     *
     * @param regressors the K regressors of the other design, {@code [k][row − from]}; not modified
     * @param into the regressors worked out, overwritten
     */
    void derive(int from, int to, double[][] regressors, double[][] into);
  }

  private DerivedColumns(Design design, List<String> columns, Derivation derivation) {
    this.design = design;
    this.columns = List.copyOf(columns);
    this.derivation = derivation;
  }

  /**
   * The design of what is worked out.
   *
   * @param design the rows it is worked out from
   * @param columns the names of the regressors worked out
   */
  public static Design of(Design design, List<String> columns, Derivation derivation) {
    return new DerivedColumns(design, columns, derivation);
  }

  @Override
  public int rows() {
    return design.rows();
  }

  @Override
  public List<String> columns() {
    return columns;
  }

  @Override
  public Groups groups() {
    return design.groups();
  }

  @Override
  public void fill(int from, int to, double[][] into) {
    int own = design.columns().size();
    double[][] block = new double[own + 1][];
    for (int k = 0; k < own; k++) {
      block[k] = new double[to - from];
    }
    block[own] = into[columns.size()];
    design.fill(from, to, block);
    derivation.derive(from, to, block, into);
  }

  @Override
  public int absorbed() {
    return design.absorbed();
  }

  @Override
  public double absorbedLeverage(int row) {
    return design.absorbedLeverage(row);
  }
}
