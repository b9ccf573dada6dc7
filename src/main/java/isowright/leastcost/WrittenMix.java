package isowright.leastcost;

import isowright.technology.ConditionalDemand;

/** The least-cost quantities of the free inputs as the form writes them down. */
record WrittenMix(ConditionalDemand.Smooth demand) implements FreeMix {

  @Override
  public Outcome solve(LogQuestion question, boolean[] fixed, double[] z) {
    return switch (demand.logMix(question.logTarget, question.logPrice, fixed, z)) {
      case REACHED -> Outcome.FOUND;
      case TOO_LITTLE -> Outcome.TOO_LITTLE;
      case TOO_MUCH -> Outcome.TOO_MUCH;
    };
  }

  @Override
  public String ended() {
    return "";
  }
}
