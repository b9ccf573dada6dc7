package isowright.technology;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;

/**
 * How nested constant elasticity of substitution presents itself to an estimator.
 *
 * <p>Inner parameters: the scale ν (unless returns are held constant), then for every nest the log
 * ratios of its shares to that of its last member, then those of the groups' shares to that of the
 * last group. Curvatures: ρ between groups, then ρ_g of every nest. With M_g the composite of a
 * nest and P_g its tilted share, every derivative inside a nest is ν P_g times that of M_g; both
 * stages are computed by {@link CesRows}.
 *
 * <p>Tested in {@code NonlinearFormsTest}.
 */
final class NestedCesForm implements NonlinearForm {

  private final Optional<Nests> arranged;
  private final boolean constantReturns;

  /**
   * @param arranged the groups; where absent, the last input stands apart from all others
   * @param constantReturns whether ν is held at one
   */
  NestedCesForm(Optional<Nests> arranged, boolean constantReturns) {
    this.arranged = arranged;
    this.constantReturns = constantReturns;
  }

  @Override
  public String name() {
    return "nested-ces";
  }

  @Override
  public Form nested(List<List<String>> groups, List<String> inputs) {
    return new NestedCesForm(Optional.of(Nests.of(inputs, groups)), constantReturns);
  }

  @Override
  public Form restricted(Restriction restriction) {
    return restriction == Restriction.CONSTANT_RETURNS ? new NestedCesForm(arranged, true) : this;
  }

  @Override
  public boolean regularByForm() {
    return true;
  }

  @Override
  public boolean obeys(Restriction restriction) {
    return restriction != Restriction.CONSTANT_RETURNS || constantReturns;
  }

  @Override
  public double[][] restrictions(Restriction restriction, List<String> inputs) {
    Nests nests = nests(inputs.size());
    int shares = nests.count();
    for (int g : nests.nests()) {
      shares += nests.members(g).length;
    }
    return Form.lastIsOne(restriction, constantReturns, shares + nests.nests().length + 3);
  }

  @Override
  public boolean needsNests() {
    return true;
  }

  private Nests nests(int n) {
    return arranged.orElseGet(() -> Nests.lastApart(n));
  }

  @Override
  public List<String> innerNames(List<String> inputs) {
    Nests nests = nests(inputs.size());
    List<String> names = new ArrayList<>();
    if (!constantReturns) {
      names.add("scale");
    }
    List<String> groups = new ArrayList<>();
    for (int g = 0; g < nests.count(); g++) {
      groups.add(nests.name(g, inputs));
      names.addAll(LogRatios.names(Arrays.stream(nests.members(g)).mapToObj(inputs::get).toList()));
    }
    names.addAll(LogRatios.names(groups));
    return List.copyOf(names);
  }

  @Override
  public List<String> curvatureNames(List<String> inputs) {
    return curvatureNames(nests(inputs.size()), inputs);
  }

  @Override
  public NonlinearForm withOneCurvature() {
    return new CesForm(constantReturns);
  }

  static List<String> curvatureNames(Nests nests, List<String> inputs) {
    List<String> names = new ArrayList<>(List.of("rho"));
    for (int g : nests.nests()) {
      names.add("rho:" + nests.name(g, inputs));
    }
    return List.copyOf(names);
  }

  @Override
  public LinearForm limit() {
    return CobbDouglas.FORM;
  }

  /** The Cobb-Douglas limit: δ_g and δ_i|g in proportion to the coefficients, as for CES. */
  @Override
  public List<double[]> starts(double[] cobbDouglasCoefficients) {
    double[] whole = CesForm.start(cobbDouglasCoefficients);
    int n = whole.length;
    double[] shares = LogRatios.shares(whole, 1, n);
    Nests nests = nests(n);
    Stages stages = new Stages(nests);
    double[] inner = new double[stages.size()];
    double[] sums = new double[nests.count()];
    for (int g = 0; g < sums.length; g++) {
      int[] members = nests.members(g);
      int last = members[members.length - 1];
      for (int m = 0; m < members.length; m++) {
        sums[g] += shares[members[m]];
        if (m < members.length - 1) {
          inner[stages.within[g] + m] = Math.log(shares[members[m]] / shares[last]);
        }
      }
    }
    for (int g = 0; g < sums.length - 1; g++) {
      inner[stages.between + g] = Math.log(sums[g] / sums[sums.length - 1]);
    }
    if (!constantReturns) {
      inner[0] = whole[0];
    }
    return List.of(inner);
  }

  @Override
  public double[] grid() {
    return Ces.FORM.grid();
  }

  @Override
  public void evaluate(
      double[][] z,
      int rows,
      double[] inner,
      double[] curvatures,
      double[] value,
      double[][] derivatives) {
    Stages stages = new Stages(nests(z.length));
    new NestedCesRows(
            stages.nests,
            stages.withinShares(inner),
            stages.betweenShares(inner),
            constantReturns ? 1 : inner[0],
            curvatures)
        .evaluate(z, rows, value, derivatives, !constantReturns);
  }

  @Override
  public boolean admissible(double[] inner) {
    double scale = constantReturns ? 1 : inner[0];
    Stages stages = new Stages(nests(inner.length + (constantReturns ? 1 : 0)));
    return scale > 0
        && scale < Double.POSITIVE_INFINITY
        && LogRatios.admissible(stages.betweenShares(inner))
        && Arrays.stream(stages.withinShares(inner)).allMatch(LogRatios::admissible);
  }

  @Override
  public Technology technology(
      List<String> inputs, double[] base, double constant, double[] inner, double[] curvatures) {
    Nests nests = nests(inputs.size());
    Stages stages = new Stages(nests);
    double[] nestRho = new double[nests.count()];
    int at = 1;
    for (int g : nests.nests()) {
      nestRho[g] = curvatures[at++];
    }
    return new NestedCes(
        new InputScale(inputs, base),
        nests,
        constant,
        stages.withinShares(inner),
        stages.betweenShares(inner),
        curvatures[0],
        nestRho,
        constantReturns ? 1 : inner[0]);
  }

  /** ∂δ_j/∂θ_i = δ_j ([i = j] − δ_i) in every softmax; the other parameters are carried over. */
  @Override
  public double[][] reported(double[] inner, double[] curvatures) {
    int n = inner.length + (constantReturns ? 1 : 0);
    Nests nests = nests(n);
    Stages stages = new Stages(nests);
    int columns = 1 + inner.length + curvatures.length;
    List<double[]> rows = new ArrayList<>();
    rows.add(CesForm.unit(columns, 0));
    double[][] within = stages.withinShares(inner);
    for (int g : nests.nests()) {
      rows.addAll(LogRatios.slopes(within[g], columns, 1 + stages.within[g]));
    }
    rows.addAll(LogRatios.slopes(stages.betweenShares(inner), columns, 1 + stages.between));
    for (int k = 0; k < curvatures.length; k++) {
      rows.add(CesForm.unit(columns, 1 + inner.length + k));
    }
    rows.add(constantReturns ? new double[columns] : CesForm.unit(columns, 1));
    return rows.toArray(double[][]::new);
  }

  /** Where the log ratios of each stage stand among the inner parameters. */
  private final class Stages {

    private final Nests nests;
    private final int[] within;
    private final int between;

    Stages(Nests nests) {
      this.nests = nests;
      this.within = new int[nests.count()];
      int at = constantReturns ? 0 : 1;
      for (int g = 0; g < within.length; g++) {
        within[g] = at;
        at += nests.members(g).length - 1;
      }
      this.between = at;
    }

    int size() {
      return between + nests.count() - 1;
    }

    double[][] withinShares(double[] inner) {
      double[][] shares = new double[within.length][];
      for (int g = 0; g < shares.length; g++) {
        shares[g] = LogRatios.shares(inner, within[g], nests.members(g).length);
      }
      return shares;
    }

    double[] betweenShares(double[] inner) {
      return LogRatios.shares(inner, between, nests.count());
    }
  }
}
