package isowright.regression;

/** Being written. */
public final class Covariance {
  private Covariance() {}
}
