package isowright.study;

/** Is told how far a run has come. */
public interface Progress {

  /** Tells nobody. */
  Progress SILENT =
      new Progress() {
        @Override
        public void stage(String name, int number, int stages) {}

        @Override
        public void done() {}
      };

  /**
   * A stage begins.
   *
   * @param name what it does, in a few words
   * @param number its number, from 1
   * @param stages how many there are
   */
  void stage(String name, int number, int stages);

  /** The run has ended, well or not. */
  void done();
}
