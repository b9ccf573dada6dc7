package isowright.charts;

import isowright.study.Figure;
import isowright.study.PlanFindings.Detail;
import isowright.study.PlanFindings.Reviewed;
import isowright.study.PlanFindings.Scale;
import isowright.study.ReviewFindings.Allowed;
import isowright.study.ReviewFindings.Band;
import isowright.study.ReviewFindings.Groups;
import isowright.study.ReviewFindings.Order;
import isowright.study.ReviewFindings.Placed;
import isowright.study.ReviewFindings.Year;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.SplittableRandom;
import java.util.stream.IntStream;

/**
 * Invented filings for tests of charts, as many and as large as wanted; parts of a gap add up, some
 * of them negative, some gaps undivided.
 *
 * @param name before the number of a plant
 * @param size about how large a least cost is
 * @param uncertain whether there are intervals
 * @param reviews the filings
 */
record Filings(String name, double size, boolean uncertain, List<Reviewed> reviews) {

  static Filings of(int plants, String name, double size, boolean uncertain) {
    SplittableRandom random = new SplittableRandom(20240613);
    List<Reviewed> reviews = new ArrayList<>();
    for (int i = 0; i < plants; i++) {
      double least = size * random.nextDouble(0.8, 1.2);
      double unreconciled = size * random.nextDouble(-0.1, 0.1);
      double technical = size * random.nextDouble(-0.2, 0.3);
      double mix = size * random.nextDouble(0, 0.1);
      boolean divided = i % 7 != 6;
      double remainder = divided ? 0 : technical + mix;
      double gap = unreconciled + technical + mix;
      double se = uncertain ? 0.03 * size : 0;
      reviews.add(
          new Reviewed(
              name + (i + 1),
              "2024",
              "ces",
              least + gap,
              least + gap - unreconciled,
              Optional.of(figure(least, se)),
              Optional.of(figure(gap, se)),
              unreconciled,
              divided ? Optional.of(figure(technical, 0.7 * se)) : Optional.empty(),
              divided ? Optional.of(figure(mix, 0.4 * se)) : Optional.empty(),
              "solved",
              Optional.of(
                  new Detail(
                      figure((least + gap) / least, se / least),
                      figure(remainder, divided ? 0 : se),
                      Optional.empty(),
                      Optional.of(
                          new Scale(
                              "found",
                              figure(1.02, 0.01),
                              Optional.of(figure(3 * size, se)),
                              Optional.of(figure(0.01 * size, 0.1 * se)))),
                      List.of())),
              List.of()));
    }
    return new Filings(name, size, uncertain, reviews);
  }

  private static Figure figure(double value, double error) {
    return error > 0
        ? Figure.estimated(value, error, value - 2 * error, value + 2 * error, "delta")
        : Figure.exact(value);
  }

  /** The plants in order, in groups of so many that overlap by one less. */
  Order order(int group) {
    List<Reviewed> sorted =
        reviews.stream()
            .sorted(
                java.util.Comparator.comparingDouble(
                    r -> r.filed() / r.leastCost().orElseThrow().value()))
            .toList();
    int n = sorted.size();
    List<Placed> placed = new ArrayList<>();
    for (int i = 0; i < n; i++) {
      placed.add(
          new Placed(
              sorted.get(i).plant(),
              i + 1,
              sorted.get(i).detail().orElseThrow().ratio(),
              new Band(Math.max(1, i - 1), Math.min(n, i + 3)),
              Optional.empty(),
              List.of()));
    }
    List<List<String>> groups =
        IntStream.rangeClosed(0, n - group)
            .mapToObj(
                from -> sorted.subList(from, from + group).stream().map(Reviewed::plant).toList())
            .toList();
    boolean compared = group > 0 && n > 1;
    return new Order(
        "ces",
        "2024",
        "drawn",
        99,
        1,
        0,
        placed,
        new Groups(compared ? Optional.of(3.1) : Optional.empty(), compared ? groups : List.of()),
        Optional.empty());
  }

  /** An allowance of so many years that follows from nothing. */
  List<Allowed> allowances(int years) {
    List<Allowed> all = new ArrayList<>();
    double filed = reviews.stream().mapToDouble(Reviewed::filed).sum();
    List<Year> lines = new ArrayList<>();
    for (int t = 0; t <= years; t++) {
      double controllable = 0.65 * filed * (1 - 0.02 * t);
      double shift = -0.008 * t * controllable;
      double index = 0.021 * t * filed;
      double sum = 0.35 * filed + controllable + shift + index;
      lines.add(new Year(t, 0.35 * filed, 0.013 * t * filed, controllable, shift, index, sum));
    }
    all.add(new Allowed("P1", "2024", "ces", filed, 1, 1, 0, 1, lines));
    all.add(new Allowed("", "2024", "ces", filed, 1, 1, 0, 1, lines));
    return all;
  }
}
