package isowright.cost;

import java.util.List;

/**
 * A cost function e^level times another: the cost of a plant that makes its output at more or less
 * than the cost of others at equal prices. Shares, elasticities and scale economies are those of
 * the other. Tested in {@code RationedCostTest}.
 *
 * @param function the other
 * @param level what is added to ln C
 */
public record LevelledCost(CostFunction function, double level) implements CostFunction {

  @Override
  public String form() {
    return function.form();
  }

  @Override
  public CostArguments arguments() {
    return function.arguments();
  }

  @Override
  public List<String> parameterNames() {
    return function.parameterNames();
  }

  @Override
  public double[] parameters() {
    return function.parameters();
  }

  @Override
  public LevelledCost withParameters(double[] parameters) {
    return new LevelledCost(function.withParameters(parameters), level);
  }

  @Override
  public double logCost(double[] v) {
    return function.logCost(v) + level;
  }

  @Override
  public void gradient(double[] v, double[] into) {
    function.gradient(v, into);
  }

  @Override
  public void hessian(double[] v, double[][] into) {
    function.hessian(v, into);
  }
}
