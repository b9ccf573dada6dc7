package isowright.leastcost;

/**
 * How far is it proved that no better plan exists?
 *
 * @param global whether no better plan exists anywhere within the limits
 * @param gap how much better, relative, a plan may still be that the search did not reach; 0 where
 *     the search was carried to its end
 * @param parts how many parts of the problem were examined; 1 where nothing was divided
 * @param reason why only a local best is proved; empty where the proof is global
 */
public record Proof(boolean global, double gap, int parts, String reason) {

  /** No better plan exists. */
  static final Proof GLOBAL = new Proof(true, 0, 1, "");
}
