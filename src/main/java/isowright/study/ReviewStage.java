package isowright.study;

import isowright.estimation.EstimatedTechnology;
import isowright.inference.Support;
import isowright.records.Panel;
import isowright.review.GapEstimate;
import isowright.review.GapEstimates;
import isowright.study.Findings.Said;
import isowright.study.PlanFindings.Reviewed;
import isowright.study.ReviewChoices.Choice;
import isowright.study.ReviewFindings.Allowed;
import isowright.study.ReviewFindings.Omission;
import isowright.study.ReviewFindings.Order;
import isowright.study.ReviewFindings.Variant;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.stream.Collectors;
import java.util.stream.IntStream;

/**
 * Holds the filed costs of a study against least cost, plant by plant and period by period, for
 * each technology: gaps in parts, the order of plants, the same under other choices, allowances.
 */
final class ReviewStage {

  /** For about so many filings of a technology it is asked what would have to be true. */
  private static final int MOST_NEEDED = 500;

  /**
   * A review.
   *
   * @param reviews filings by technology, period and plant
   * @param findings what follows from them
   */
  record Review(List<Reviewed> reviews, ReviewFindings findings) {
    /** Nothing reviewed. */
    static final Review NONE = new Review(List.of(), ReviewFindings.NONE);

    /** Both; the one where the other is nothing. */
    Review and(Review other) {
      if (reviews.isEmpty() || other.reviews.isEmpty()) {
        return reviews.isEmpty() ? other : this;
      }
      List<Reviewed> all = new ArrayList<>(reviews);
      all.addAll(other.reviews);
      return new Review(all, findings.and(other.findings));
    }
  }

  private final Study.Filing filing;
  private final Panel panel;
  private final List<Candidate> candidates;
  private final List<Choice> choices;
  private final double level;
  private final int filings;

  /** Of so many filings of a technology and period it is asked what would have to be true. */
  private final int needed;

  private final List<Reviewed> reviews = new ArrayList<>();
  private final List<Order> orders = new ArrayList<>();
  private final List<Variant> variants = new ArrayList<>();
  private final List<Omission> omissions = new ArrayList<>();
  private final List<Allowed> allowances = new ArrayList<>();
  private final List<Said> remarks = new ArrayList<>();
  private final GapSpread spread = new GapSpread();
  private final OmissionStage omitted;

  private ReviewStage(
      Study study, Study.Filing filing, CapitalStage.Priced priced, List<Candidate> candidates) {
    this.filing = filing;
    this.panel = priced.inForce();
    this.candidates = candidates.stream().filter(Candidate::usable).toList();
    this.choices = new ReviewChoices(study, filing, priced).all();
    this.level = study.estimation().confidence();
    this.filings =
        Arrays.stream(periods(filing, panel)).map(p -> FilingRows.of(panel, p).length).sum();
    this.needed = Math.max(1, MOST_NEEDED / periods(filing, panel).length);
    this.omitted = new OmissionStage(panel, spread);
  }

  /** The review that a study asks for; nothing where it asks for none. */
  static Review of(Study study, Optional<CapitalStage.Priced> priced, List<Candidate> candidates) {
    return study.filing().isPresent() && priced.isPresent()
        ? new ReviewStage(study, study.filing().get(), priced.get(), candidates).review()
        : Review.NONE;
  }

  /** The periods reviewed, as their first and last index in a panel. */
  static int[] periods(Study.Filing filing, Panel panel) {
    int last = panel.periods().size() - 1;
    int from = filing.firstPeriod().map(panel.periods()::indexOf).orElse(last);
    int to = filing.lastPeriod().map(panel.periods()::indexOf).orElse(last);
    return IntStream.rangeClosed(from, to).toArray();
  }

  private Review review() {
    Support support = Support.of(panel);
    int[] periods = periods(filing, panel);
    for (Candidate candidate : candidates) {
      for (int period : periods) {
        review(candidate, period, support, period == periods[periods.length - 1]);
      }
    }
    remarks.addAll(0, wholeRemarks());
    return new Review(
        reviews,
        new ReviewFindings(
            ReviewReference.asked(filing).words(),
            orders,
            variants,
            omissions,
            spread.spreads(panel),
            allowances,
            filing.allowance(),
            remarks));
  }

  private void review(Candidate candidate, int period, Support support, boolean last) {
    Choice asked = choices.get(0);
    EstimatedTechnology reference = asked.reference().of(candidate, period);
    GapEstimates estimates = GapEstimates.against(reference, level);
    List<HeldFiling> held = held(asked, estimates, period);
    ReviewFigures figures =
        new ReviewFigures(
            panel,
            candidate,
            period,
            reference,
            estimates,
            support,
            filings <= ReviewFigures.MOST_REFITTED,
            level);
    double threshold = smallestNeeded(held, needed);
    reviews.addAll(
        held.parallelStream()
            .map(h -> figures.reviewed(h, size(h) >= threshold))
            .collect(Collectors.toList()));
    figures.direction(held).ifPresent(remarks::add);
    String name = panel.periods().get(period);
    new OrderStage(filing.simulation(), level)
        .order(candidate, name, reference, held)
        .ifPresent(orders::add);
    for (Choice choice : choices) {
      if (choice == asked || choice.forGiven() || candidate.fit().isPresent()) {
        vary(candidate, period, choice, held);
      }
    }
    omissions.addAll(omitted.omissions(candidate, period, asked.reference(), held));
    if (last && filing.allowance().isPresent()) {
      double quantile = filing.allowance().get().quantile();
      allowances.addAll(
          new AllowanceStage(filing.allowance().get())
              .allowed(
                  candidate.name(),
                  name,
                  held.stream()
                      .filter(HeldFiling::answered)
                      .map(
                          h ->
                              new AllowanceStage.Carried(
                                  h.plant(),
                                  h.gap().gap().filed(),
                                  h.gap().gap().gap(),
                                  estimates.quantile(h.gap(), quantile)))
                      .toList()));
    }
  }

  /** A filing by another choice: its row, and its least cost. */
  private record Varied(int row, GapEstimates.Least least) {}

  private void vary(Candidate candidate, int period, Choice choice, List<HeldFiling> asked) {
    GapEstimates estimates = GapEstimates.against(choice.reference().of(candidate, period), level);
    List<Varied> varied =
        asked.parallelStream()
            .flatMap(h -> varied(choice, estimates, h).stream())
            .collect(Collectors.toList());
    if (varied.isEmpty()) {
      return;
    }
    spread.note(
        candidate.name(),
        choice.words(),
        varied.stream().mapToInt(Varied::row).toArray(),
        varied.stream().mapToDouble(v -> 1 - v.least().leastCost() / v.least().filed()).toArray());
    GapEstimates.Total total = estimates.total(varied.stream().map(Varied::least).toList());
    variants.add(
        new Variant(
            candidate.name(),
            panel.periods().get(period),
            choice.code(),
            choice.words(),
            choice.money(),
            varied.size(),
            total.filed(),
            ReviewFigures.figure(candidate, total.leastCost()),
            ReviewFigures.figure(candidate, total.gap()),
            ReviewFigures.figure(candidate, total.share())));
  }

  private Optional<Varied> varied(Choice choice, GapEstimates estimates, HeldFiling asked) {
    FilingRows.Filing row = choice.rows().filing(asked.filing().row());
    if (!row.known()) {
      return Optional.empty();
    }
    return estimates
        .least(row.question(), row.filed(), asked.estimate().map(GapEstimate::plan))
        .map(least -> new Varied(row.row(), least));
  }

  private List<HeldFiling> held(Choice choice, GapEstimates estimates, int period) {
    return Arrays.stream(FilingRows.of(panel, period))
        .parallel()
        .mapToObj(row -> held(choice.rows().filing(row), estimates))
        .toList();
  }

  private HeldFiling held(FilingRows.Filing row, GapEstimates estimates) {
    return new HeldFiling(
        row,
        panel.plants().get(panel.plantOf(row.row())),
        row.known()
            ? Optional.of(estimates.of(row.mix(), row.question(), row.filed()))
            : Optional.empty());
  }

  /** The size of the gap below which it is not asked what would have to be true. */
  private static double smallestNeeded(List<HeldFiling> held, int needed) {
    OptionalDouble at =
        held.stream()
            .map(ReviewStage::size)
            .sorted(Comparator.reverseOrder())
            .mapToDouble(size -> size)
            .limit(needed)
            .min();
    return at.orElse(0);
  }

  private static double size(HeldFiling held) {
    return held.answered() ? Math.abs(held.gap().gap().gap()) : -1;
  }

  private List<Said> wholeRemarks() {
    List<Said> all = new ArrayList<>();
    if (filing.smearing()) {
      for (Candidate candidate : candidates) {
        String factor =
            candidate.fit().isPresent()
                ? "is " + ReviewReference.asked(filing).factorWords(candidate)
                : "is not known, there being no residuals, so the technology is taken as it stands";
        all.add(
            Said.of(
                "note",
                "smearing",
                "The smearing factor of " + candidate.name() + " " + factor + "."));
      }
    }
    if (filings > ReviewFigures.MOST_REFITTED
        && candidates.stream().anyMatch(c -> c.replication().isPresent())) {
      all.add(
          Said.of(
              "note",
              "gaps-not-refitted",
              "There are "
                  + filings
                  + " filings; of more than "
                  + ReviewFigures.MOST_REFITTED
                  + " the gaps are not worked out again for plants drawn anew or left out, and"
                  + " their intervals are those of propagation."));
    }
    if (filing.against().kind() == Study.Productivity.Kind.FRONTIER) {
      candidates.forEach(candidate -> frontier(candidate).ifPresent(all::add));
    }
    boolean many =
        Arrays.stream(periods(filing, panel))
            .anyMatch(period -> FilingRows.of(panel, period).length > needed);
    if (many) {
      all.add(
          Said.of(
              "note",
              "needed-for-largest",
              "What would have to be true is asked of the "
                  + needed
                  + " largest gaps of each technology and period."));
    }
    return all;
  }

  private static Optional<Said> frontier(Candidate candidate) {
    String words =
        candidate.fit().isEmpty()
            ? "is taken as given; nothing is known of a frontier above it"
            : PlanCircumstances.inefficient(candidate)
                ? "stands for output without any inefficiency. Inefficiency measured includes what"
                    + " the records do not hold, so distance from a frontier is not waste"
                : "has no inefficiency above the typical plant, so its frontier is the typical"
                    + " plant";
    return Optional.of(
        Said.of(
            "note", "against-frontier", "The technology " + candidate.name() + " " + words + "."));
  }
}
