package isowright.benchmark;

import isowright.study.Findings;
import isowright.study.Pipeline;
import isowright.study.Progress;
import isowright.study.StudyFile;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Locale;

/**
 * A review of 10,000 filings (1,000 plants in ten years), each with its least cost, the gap in
 * parts with intervals, the efficient scale, the order of plants in every year and the same under
 * every other choice; once cold, as for a user, and once more.
 */
final class ReviewTimes {

  private static final int PLANTS = 1_000;
  private static final Path FOLDER = Path.of("target", "benchmark", "review");

  private ReviewTimes() {}

  static void report(Steps steps) throws Exception {
    WideRecords.write(FOLDER.resolve("records.csv"), PLANTS);
    steps.heading(String.format(Locale.ROOT, "Review of %,d filings", PLANTS * WideRecords.YEARS));
    for (String technology : List.of("ces", "translog")) {
      Path study = Files.writeString(FOLDER.resolve(technology + ".yaml"), study(technology));
      for (String times : List.of("cold", "again")) {
        run(steps, study, technology + ", " + times);
      }
    }
  }

  private static void run(Steps steps, Path file, String name) throws Exception {
    Clock clock = new Clock(steps, name);
    Findings findings = Pipeline.run(StudyFile.read(file), clock);
    if (findings.reviews().size() != PLANTS * WideRecords.YEARS
        || findings.reviews().stream().anyMatch(r -> r.gap().isEmpty())) {
      throw new IllegalStateException("a filing has no gap");
    }
  }

  private static String study(String technology) {
    return """
    title: Ten thousand filings
    records: {file: records.csv, plant: plant, period: year}
    output: {column: output}
    inputs:
      labour: {quantity: labour, price: wage}
      machines: {quantity: machines, price: rental}
      energy: {quantity: energy, price: fuel_price}
    technologies: [%s]
    estimation: {time: trend}
    filing: {periods: [%d, %d]}
    """
        .formatted(technology, 2015, 2015 + WideRecords.YEARS - 1);
  }

  /** Prints the time of the last stage, which is the review. */
  private static final class Clock implements Progress {
    private final Steps steps;
    private final String name;
    private Steps.Mark mark;

    Clock(Steps steps, String name) {
      this.steps = steps;
      this.name = name;
      this.mark = steps.mark();
    }

    @Override
    public void stage(String stage, int number, int of) {
      mark = steps.mark();
    }

    @Override
    public void done() {
      steps.since(mark, name);
    }
  }

  /** Takes no arguments: this part alone. */
  public static void main(String[] arguments) throws Exception {
    report(new Steps(System.out));
  }
}
