package isowright.cli;

import isowright.study.Progress;

/** The progress of the stages of a study, counted with the one that comes after them: writing. */
final class WithLastStage implements Progress {

  private final Progress shown;
  private int stages = 1;

  WithLastStage(Progress shown) {
    this.shown = shown;
  }

  @Override
  public void stage(String name, int number, int of) {
    stages = of + 1;
    shown.stage(name, number, stages);
  }

  /** The study has been carried out; the run goes on. */
  @Override
  public void done() {}

  /** The last stage begins. */
  void last(String name) {
    shown.stage(name, stages, stages);
  }
}
