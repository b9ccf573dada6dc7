package isowright.regression;

/** Being written. */
public final class LeastSquares {
  private LeastSquares() {}
}
