package isowright.technology;

import java.util.List;

/** Constant elasticity of substitution; being written. */
public final class Ces implements Technology {

  /** How the form presents itself to an estimator. */
  public static final ProfiledForm FORM = new Description();

  @Override
  public String form() {
    return "ces";
  }

  @Override
  public List<String> inputs() {
    throw new IllegalStateException();
  }

  @Override
  public double[] base() {
    throw new IllegalStateException();
  }

  @Override
  public List<String> parameterNames() {
    throw new IllegalStateException();
  }

  @Override
  public double[] parameters() {
    throw new IllegalStateException();
  }

  @Override
  public Technology withParameters(double[] p) {
    throw new IllegalStateException();
  }

  @Override
  public Technology shifted(double s) {
    throw new IllegalStateException();
  }

  @Override
  public double logOutput(double[] z) {
    throw new IllegalStateException();
  }

  @Override
  public void logGradient(double[] z, double[] into) {
    throw new IllegalStateException();
  }

  @Override
  public void logHessian(double[] z, double[][] into) {
    throw new IllegalStateException();
  }

  @Override
  public void parameterGradient(double[] z, double[] into) {
    throw new IllegalStateException();
  }

  private static final class Description implements ProfiledForm {
    @Override
    public String name() {
      return "ces";
    }

    @Override
    public List<String> innerNames(List<String> inputs) {
      throw new IllegalStateException();
    }

    @Override
    public double[] start(double[] b) {
      throw new IllegalStateException();
    }

    @Override
    public LinearForm limit() {
      return CobbDouglas.FORM;
    }

    @Override
    public double[] grid() {
      throw new IllegalStateException();
    }

    @Override
    public double[] region() {
      throw new IllegalStateException();
    }

    @Override
    public double substitution(double c) {
      throw new IllegalStateException();
    }

    @Override
    public double curvature(double s) {
      throw new IllegalStateException();
    }

    @Override
    public void evaluate(
        double[][] z, int rows, double[] inner, double c, double[] v, double[][] d) {
      throw new IllegalStateException();
    }

    @Override
    public boolean admissible(double[] inner) {
      throw new IllegalStateException();
    }

    @Override
    public Technology technology(
        List<String> inputs, double[] base, double constant, double[] inner, double c) {
      throw new IllegalStateException();
    }

    @Override
    public double[][] reported(double[] inner, double c) {
      throw new IllegalStateException();
    }

    @Override
    public int scaleIndex() {
      throw new IllegalStateException();
    }
  }
}
