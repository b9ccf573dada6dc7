package isowright.regression;

/** The log-likelihood of {@link ComposedErrors} at a point, its gradient, Hessian and scores. */
final class ComposedLikelihood implements NewtonAscent.Point {

  private final ComposedErrors model;
  private final double[] parameters;
  private final int columns;
  private final boolean decay;
  private final ComposedUnit unit;
  private final double noisePrecision;

  private double value;
  private final double[] gradient;
  private final double[][] hessian;

  /** Σ u u′ over rows and over groups, u the gradient's parts. */
  private final double[][] byUnit;

  private final double[][] byGroup;
  private final double[] unitScore;
  private final double[] groupScore;

  private ComposedLikelihood(ComposedErrors model, double[] parameters) {
    this.model = model;
    this.parameters = parameters.clone();
    this.columns = model.design().columns().size();
    this.decay = model.sharing() == ComposedErrors.Sharing.GROUP_WITH_DECAY;
    this.unit = new ComposedUnit(model.law(), parameters[columns], parameters[columns + 1]);
    this.noisePrecision = Math.exp(-2 * parameters[columns]);
    int size = parameters.length;
    this.gradient = new double[size];
    this.hessian = new double[size][size];
    this.byUnit = new double[size][size];
    this.byGroup = new double[size][size];
    this.unitScore = new double[size];
    this.groupScore = new double[size];
  }

  static ComposedLikelihood of(ComposedErrors model, double[] parameters) {
    Design design = model.design();
    Blocks blocks = Blocks.of(design.groups());
    ComposedLikelihood all =
        blocks.gather(
            design.columns().size() + 1,
            () -> new ComposedLikelihood(model, parameters),
            (part, from, to, buffer) -> {
              design.fill(from, to, buffer);
              part.visit(buffer, from, to);
            },
            ComposedLikelihood::add);
    all.mirror();
    return all;
  }

  private void visit(double[][] block, int from, int to) {
    double[] errors = block[columns];
    for (int k = 0; k < columns; k++) {
      for (int i = 0; i < to - from; i++) {
        errors[i] -= parameters[k] * block[k][i];
      }
    }
    Groups groups = model.design().groups();
    for (int g = groups.of(from); g < groups.count() && groups.start(g) < to; g++) {
      int start = groups.start(g) - from;
      int end = groups.end(g) - from;
      java.util.Arrays.fill(groupScore, 0);
      if (model.sharing() == ComposedErrors.Sharing.NONE) {
        for (int i = start; i < end; i++) {
          unit(block, from, i, i + 1);
        }
      } else {
        unit(block, from, start, end);
      }
      addSquare(byGroup, groupScore);
    }
  }

  /** Takes in the rows of one unit. */
  private void unit(double[][] block, int from, int start, int end) {
    UnitSums sums = new UnitSums(block[columns], from, start, end);
    int rows = end - start;
    value += unit.value(rows, sums.sum, sums.squares, sums.apart(block[columns], start));
    unit.derive(rows, sums.sum, sums.squares);
    int s = columns;
    int r = columns + 1;
    unitScore[s] = unit.first[ComposedUnit.NOISE] + sums.errorSquares * noisePrecision;
    unitScore[r] = unit.first[ComposedUnit.SCALE];
    hessian[s][s] +=
        unit.second[ComposedUnit.NOISE][ComposedUnit.NOISE]
            - 2 * sums.errorSquares * noisePrecision;
    hessian[r][s] += unit.second[ComposedUnit.SCALE][ComposedUnit.NOISE];
    hessian[r][r] += unit.second[ComposedUnit.SCALE][ComposedUnit.SCALE];
    coefficients(block, start, end, sums.share);
    if (decay) {
      decay(sums);
      decayBySlopes(block, from, start, end, sums);
    }
    for (int k = 0; k < unitScore.length; k++) {
      gradient[k] += unitScore[k];
      groupScore[k] += unitScore[k];
    }
    addSquare(byUnit, unitScore);
  }

  private void decay(UnitSums sums) {
    int e = columns + 2;
    unitScore[e] =
        unit.first[ComposedUnit.SUM] * sums.sumEta
            + unit.first[ComposedUnit.SQUARES] * sums.squaresEta;
    hessian[e][e] +=
        mixed(ComposedUnit.SUM, sums) * sums.sumEta
            + mixed(ComposedUnit.SQUARES, sums) * sums.squaresEta
            + unit.first[ComposedUnit.SUM] * sums.sumEtaEta
            + unit.first[ComposedUnit.SQUARES] * sums.squaresEtaEta;
    hessian[e][columns] += mixed(ComposedUnit.NOISE, sums);
    hessian[e][columns + 1] += mixed(ComposedUnit.SCALE, sums);
  }

  /** How a first derivative of F changes with η. */
  private double mixed(int variable, UnitSums sums) {
    return unit.second[ComposedUnit.SUM][variable] * sums.sumEta
        + unit.second[ComposedUnit.SQUARES][variable] * sums.squaresEta;
  }

  /** Rows and columns of β, with one another and with s and r. */
  private void coefficients(double[][] block, int start, int end, double[] share) {
    double[] errors = block[columns];
    double[] shared = new double[columns];
    double fullSum = unit.second[ComposedUnit.SUM][ComposedUnit.SUM];
    for (int k = 0; k < columns; k++) {
      double product = 0;
      for (int i = start; i < end; i++) {
        shared[k] += share[i - start] * block[k][i];
        product += errors[i] * block[k][i];
      }
      unitScore[k] = noisePrecision * product - unit.first[ComposedUnit.SUM] * shared[k];
      hessian[columns][k] +=
          -2 * noisePrecision * product
              - unit.second[ComposedUnit.SUM][ComposedUnit.NOISE] * shared[k];
      hessian[columns + 1][k] -= unit.second[ComposedUnit.SUM][ComposedUnit.SCALE] * shared[k];
      for (int l = 0; l <= k; l++) {
        hessian[k][l] +=
            fullSum * shared[k] * shared[l]
                - noisePrecision * OrthogonalDecomposition.product(block[k], block[l], start, end);
      }
    }
  }

  private void decayBySlopes(double[][] block, int from, int start, int end, UnitSums sums) {
    double moved = mixed(ComposedUnit.SUM, sums);
    for (int k = 0; k < columns; k++) {
      double shared = 0;
      double later = 0;
      for (int i = start; i < end; i++) {
        double part = sums.share[i - start] * block[k][i];
        shared += part;
        later += model.since(from + i) * part;
      }
      hessian[columns + 2][k] += unit.first[ComposedUnit.SUM] * later - moved * shared;
    }
  }

  private static void addSquare(double[][] into, double[] u) {
    for (int k = 0; k < u.length; k++) {
      for (int l = 0; l <= k; l++) {
        into[k][l] += u[k] * u[l];
      }
    }
  }

  private void add(ComposedLikelihood other) {
    value += other.value;
    for (int k = 0; k < gradient.length; k++) {
      gradient[k] += other.gradient[k];
      for (int l = 0; l <= k; l++) {
        hessian[k][l] += other.hessian[k][l];
        byUnit[k][l] += other.byUnit[k][l];
        byGroup[k][l] += other.byGroup[k][l];
      }
    }
  }

  private void mirror() {
    for (int k = 0; k < gradient.length; k++) {
      for (int l = 0; l < k; l++) {
        hessian[l][k] = hessian[k][l];
        byUnit[l][k] = byUnit[k][l];
        byGroup[l][k] = byGroup[k][l];
      }
    }
  }

  @Override
  public double value() {
    return value;
  }

  @Override
  public double[] gradient() {
    return gradient.clone();
  }

  @Override
  public double[][] hessian() {
    return Matrices.copy(hessian);
  }

  /** Σ u u′ over units that are independent of one another, u their parts of the gradient. */
  double[][] scoreSquares(boolean overGroups) {
    return Matrices.copy(overGroups ? byGroup : byUnit);
  }

  /** S₁, S₂ and Σ ε² of a unit, with the derivatives of the first two by η. */
  private final class UnitSums {
    private final double[] share;
    private double sum;
    private double squares;
    private double errorSquares;
    private double sumEta;
    private double squaresEta;
    private double sumEtaEta;
    private double squaresEtaEta;

    UnitSums(double[] errors, int from, int start, int end) {
      share = new double[end - start];
      double eta = decay ? parameters[columns + 2] : 0;
      for (int i = start; i < end; i++) {
        double tau = model.since(from + i);
        double g = decay ? Math.exp(-eta * tau) : 1;
        double shared = g * errors[i];
        share[i - start] = g;
        sum += shared;
        squares += g * g;
        errorSquares += errors[i] * errors[i];
        sumEta -= tau * shared;
        squaresEta -= 2 * tau * g * g;
        sumEtaEta += tau * tau * shared;
        squaresEtaEta += 4 * tau * tau * g * g;
      }
    }

    /** Σ (ε − g S₁/S₂)²; exactly zero with one row. */
    private double apart(double[] errors, int start) {
      double apart = 0;
      for (int i = 0; share.length > 1 && i < share.length; i++) {
        double left = errors[start + i] - share[i] * sum / squares;
        apart += left * left;
      }
      return apart;
    }
  }
}
