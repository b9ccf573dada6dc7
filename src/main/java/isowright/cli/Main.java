package isowright.cli;

/** Being written. */
public final class Main {
  private Main() {}
}
