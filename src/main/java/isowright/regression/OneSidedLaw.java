package isowright.regression;

/** The law of an error that is never negative, with one parameter, its scale σ. */
public enum OneSidedLaw {
  /** The absolute value of a normal variable with standard deviation σ. */
  HALF_NORMAL {
    @Override
    public double mean(double scale) {
      return scale * Math.sqrt(2 / Math.PI);
    }

    @Override
    public double variance(double scale) {
      return scale * scale * (1 - 2 / Math.PI);
    }

    @Override
    double scaleOf(double thirdMoment) {
      return Math.cbrt(thirdMoment / (Math.sqrt(2 / Math.PI) * (4 / Math.PI - 1)));
    }
  },
  /** Exponential with mean σ. */
  EXPONENTIAL {
    @Override
    public double mean(double scale) {
      return scale;
    }

    @Override
    public double variance(double scale) {
      return scale * scale;
    }

    @Override
    double scaleOf(double thirdMoment) {
      return Math.cbrt(thirdMoment / 2);
    }
  };

  /** The mean of the error. */
  public abstract double mean(double scale);

  /** Its variance. */
  public abstract double variance(double scale);

  /** The scale at which the third moment about the mean has this value. */
  abstract double scaleOf(double thirdMoment);
}
