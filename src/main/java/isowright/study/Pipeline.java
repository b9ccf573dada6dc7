package isowright.study;

/** Being written. */
public final class Pipeline {
  private Pipeline() {}
}
