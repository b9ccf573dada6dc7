package isowright.inference;

import isowright.estimation.EstimatedTechnology;
import isowright.inference.DeltaMethod.Scale;
import isowright.technology.Technology;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.function.Function;
import org.apache.commons.math3.linear.Array2DRowRealMatrix;
import org.apache.commons.math3.linear.RealMatrix;
import org.apache.commons.math3.linear.SingularValueDecomposition;
import org.jspecify.annotations.Nullable;

/**
 * The technologies of several plants with the joint uncertainty of their parameters.
 *
 * <p>Plants with the technology of one fit share its slopes β and have constants c of their own,
 * one for each level. With k_g = cov(c_g, β) and V = var(β), the covariance of two constants is
 * k_g′ V⁺ k_h: a constant is a mean of output less what slopes explain, and the means of two plants
 * have no rows in common, so slopes are all that they share. Standard errors from different fits
 * are added, which bounds that of the whole whatever their correlation.
 *
 * <p>Tested in {@code JointTechnologiesTest}.
 */
public final class JointTechnologies {

  private final List<Member> members;
  private final double confidence;
  private final List<Block> blocks = new ArrayList<>();

  /**
   * The technology of one plant.
   *
   * @param estimated the technology at the plant's level
   * @param fit the fit it comes from; plants with the same word share slopes; empty where it is
   *     taken as known
   * @param level plants of a fit with the same word share the constant too
   */
  public record Member(EstimatedTechnology estimated, String fit, String level) {}

  /** The plants of one fit: which members, with which constants. */
  private record Block(List<Integer> members, List<Integer> constants, List<Member> levels) {}

  /**
   * Gathers plants.
   *
   * @param confidence the level of intervals
   */
  public JointTechnologies(List<Member> members, double confidence) {
    this.members = List.copyOf(members);
    this.confidence = confidence;
    Map<String, Block> byFit = new LinkedHashMap<>();
    for (int p = 0; p < members.size(); p++) {
      Member member = members.get(p);
      if (member.fit().isEmpty()) {
        continue;
      }
      Block block =
          byFit.computeIfAbsent(
              member.fit(),
              name -> new Block(new ArrayList<>(), new ArrayList<>(), new ArrayList<>()));
      int level = -1;
      for (int g = 0; g < block.levels.size(); g++) {
        level = block.levels.get(g).level().equals(member.level()) ? g : level;
      }
      if (level < 0) {
        level = block.levels.size();
        block.levels.add(member);
      }
      block.members.add(p);
      block.constants.add(level);
    }
    blocks.addAll(byFit.values());
  }

  /** Whether technologies of more than one fit are together. */
  public boolean several() {
    return blocks.size() > 1;
  }

  /** The technologies at their estimates. */
  public List<Technology> technologies() {
    return members.stream().map(member -> member.estimated().technology()).toList();
  }

  /** Numbers with their uncertainty; none where every technology is taken as known. */
  public Optional<List<Estimate>> estimates(
      Function<List<Technology>, double[]> numbers, Scale scale) {
    @Nullable List<Estimate> sum = null;
    for (Block block : blocks) {
      Propagation<List<Technology>> propagation = propagation(block);
      List<Estimate> own = propagation.estimates(numbers, scale);
      if (sum != null) {
        List<Estimate> both = new ArrayList<>();
        for (int f = 0; f < own.size(); f++) {
          double standardError = sum.get(f).standardError() + own.get(f).standardError();
          both.add(propagation.estimate(own.get(f).value(), standardError, scale));
        }
        own = both;
      }
      sum = own;
    }
    return Optional.ofNullable(sum);
  }

  private Propagation<List<Technology>> propagation(Block block) {
    int constants = block.levels.size();
    EstimatedTechnology first = block.levels.get(0).estimated();
    double[] parameters = first.technology().parameters();
    int slopes = parameters.length - 1;
    double[] centre = new double[constants + slopes];
    System.arraycopy(parameters, 1, centre, constants, slopes);
    for (int g = 0; g < constants; g++) {
      centre[g] = block.levels.get(g).estimated().technology().parameters()[0];
    }
    return new Propagation<>(
        centre,
        covariance(block, constants, slopes),
        first.degreesOfFreedom(),
        confidence,
        moved -> technologies(block, moved, constants));
  }

  private List<Technology> technologies(Block block, double[] moved, int constants) {
    List<Technology> all = new ArrayList<>(technologies());
    for (int m = 0; m < block.members.size(); m++) {
      double[] parameters = new double[1 + moved.length - constants];
      parameters[0] = moved[block.constants.get(m)];
      System.arraycopy(moved, constants, parameters, 1, parameters.length - 1);
      int p = block.members.get(m);
      all.set(p, all.get(p).withParameters(parameters));
    }
    return all;
  }

  private static double[][] covariance(Block block, int constants, int slopes) {
    double[][] joint = new double[constants + slopes][constants + slopes];
    double[][] own = block.levels.get(0).estimated().covariance();
    double[][] v = new double[slopes][slopes];
    for (int k = 0; k < slopes; k++) {
      v[k] = Arrays.copyOfRange(own[k + 1], 1, slopes + 1);
      System.arraycopy(v[k], 0, joint[constants + k], constants, slopes);
    }
    RealMatrix inverse =
        new SingularValueDecomposition(new Array2DRowRealMatrix(v)).getSolver().getInverse();
    for (int g = 0; g < constants; g++) {
      double[][] of = block.levels.get(g).estimated().covariance();
      double[] k = Arrays.copyOfRange(of[0], 1, slopes + 1);
      joint[g][g] = of[0][0];
      for (int l = 0; l < slopes; l++) {
        joint[g][constants + l] = k[l];
        joint[constants + l][g] = k[l];
      }
      for (int h = 0; h < g; h++) {
        double[] other =
            Arrays.copyOfRange(block.levels.get(h).estimated().covariance()[0], 1, slopes + 1);
        joint[g][h] = new Array2DRowRealMatrix(k).transpose().multiply(inverse).operate(other)[0];
        joint[h][g] = joint[g][h];
      }
    }
    return joint;
  }
}
