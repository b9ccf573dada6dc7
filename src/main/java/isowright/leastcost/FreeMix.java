package isowright.leastcost;

/**
 * The least-cost quantities of some inputs while the others stay where they are: the step that
 * {@link ActiveLimits} repeats until the right limits are active.
 */
interface FreeMix {

  /** How it went. */
  enum Outcome {
    /** The conditions of the free inputs are met. */
    FOUND,
    /** However much is taken of the free inputs, the target is not reached. */
    TOO_LITTLE,
    /** The fixed inputs alone yield the target or more. */
    TOO_MUCH,
    /** No regular stationary point was found. */
    NOT_FOUND
  }

  /**
   * Solves.
   *
   * @param fixed which inputs stay; at least one does not
   * @param z ln x: read where fixed; a start where free, overwritten where found
   */
  Outcome solve(LogQuestion question, boolean[] fixed, double[] z);

  /** In words, where the last search ended, for the plan of a question without an answer. */
  String ended();
}
