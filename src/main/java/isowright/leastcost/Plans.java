package isowright.leastcost;

import java.util.Optional;

/** How plans are made for one shape of technology. */
interface Plans {

  /** The least-cost plan; near is the plan of a similar question, if at hand. */
  Plan plan(Question question, Optional<Plan> near);
}
