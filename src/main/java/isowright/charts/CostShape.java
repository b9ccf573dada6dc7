package isowright.charts;

/**
 * What an average cost curve does, as far as its points show.
 *
 * @param course how it runs
 * @param least the index of its least value
 * @param marginalBelow whether marginal cost is below average cost at every point
 * @param marginalAbove whether it is above at every point
 */
record CostShape(Course course, int least, boolean marginalBelow, boolean marginalAbove) {

  /** Changes smaller than this share are called none. */
  static final double NOTHING = 0.001;

  /** How a curve runs. */
  enum Course {
    /** Down all the way. */
    FALLS,
    /** Up all the way. */
    RISES,
    /** Down, then up. */
    BOWL,
    /** Hardly at all. */
    LEVEL,
    /** In some other way. */
    OTHER
  }

  /** The shape of a curve of at least two points, all finite. */
  static CostShape of(double[] average, double[] marginal) {
    int least = 0;
    int most = 0;
    boolean down = true;
    boolean up = true;
    boolean bowl = true;
    boolean below = true;
    boolean above = true;
    for (int i = 0; i < average.length; i++) {
      least = average[i] < average[least] ? i : least;
      most = average[i] > average[most] ? i : most;
      below &= marginal[i] < average[i];
      above &= marginal[i] > average[i];
    }
    for (int i = 1; i < average.length; i++) {
      boolean fell = average[i] < average[i - 1];
      boolean rose = average[i] > average[i - 1];
      down &= fell;
      up &= rose;
      bowl &= i <= least ? fell : rose;
    }
    Course course;
    if (average[most] - average[least] <= NOTHING * average[least]) {
      course = Course.LEVEL;
    } else if (down) {
      course = Course.FALLS;
    } else if (up) {
      course = Course.RISES;
    } else {
      course = bowl ? Course.BOWL : Course.OTHER;
    }
    return new CostShape(course, least, below, above);
  }

  /** Whether the least average cost lies between the ends. */
  boolean interior() {
    return course == Course.BOWL;
  }

  /**
   * The shape in words. Returns to scale are spoken of only where nothing is held or limited, since
   * only then does average over marginal cost equal their degree.
   */
  String words(double[] targets, double[] average, boolean unlimited, Setting setting) {
    int last = targets.length - 1;
    String per = Words.perOutput(setting.units());
    String from = Numbers.brief(average[0]);
    String to = Numbers.brief(average[last]);
    String start = Answers.output(targets[0], setting);
    String end = Answers.output(targets[last], setting);
    String ends = ", from " + from + " to " + to + " " + per;
    boolean alike = from.equals(to) && course != Course.BOWL && course != Course.OTHER;
    return switch (alike ? Course.LEVEL : course) {
      case FALLS ->
          "average cost falls up to "
              + end
              + ends
              + (unlimited && marginalBelow ? ": returns to scale exceed one" : "");
      case RISES ->
          "average cost rises from "
              + start
              + " on"
              + ends
              + (unlimited && marginalAbove ? ": returns to scale are below one" : "");
      case BOWL ->
          "average cost is least at about "
              + Answers.output(targets[least], setting)
              + ", "
              + Numbers.brief(average[least])
              + " "
              + per;
      case LEVEL -> "average cost is about " + from + " " + per + " from " + start + " to " + end;
      case OTHER ->
          "average cost is " + from + " at " + start + " and " + to + " " + per + " at " + end;
    };
  }
}
