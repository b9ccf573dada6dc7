package isowright.cli;

/** Being written. */
public final class Run {
  private Run() {}
}
