package isowright.study;

import isowright.estimation.Estimator;
import isowright.study.Study.Productivity;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/**
 * The choices under which a review is carried out: as asked, and each other choice of reference,
 * money and prices that the study leaves open, one at a time.
 */
final class ReviewChoices {

  /**
   * One choice.
   *
   * @param code a short, stable name
   * @param words in words
   * @param reference against what costs are held
   * @param rows the filings at its prices and in its money
   * @param money its money in words
   * @param forGiven whether it differs from what was asked for technologies taken as known, too
   */
  record Choice(
      String code,
      String words,
      ReviewReference reference,
      FilingRows rows,
      String money,
      boolean forGiven) {}

  private final Study study;
  private final Study.Filing filing;
  private final CapitalStage.Priced priced;

  ReviewChoices(Study study, Study.Filing filing, CapitalStage.Priced priced) {
    this.study = study;
    this.filing = filing;
    this.priced = priced;
  }

  /** What was asked, first, and then the others. */
  List<Choice> all() {
    ReviewReference asked = ReviewReference.asked(filing);
    FilingRows rows = FilingRows.of(filing, priced.inForce());
    String money = study.money().words();
    List<Choice> all = new ArrayList<>();
    all.add(new Choice("as-asked", "as asked", asked, rows, money, true));
    for (Productivity.Kind kind : kinds()) {
      for (boolean smearing : new boolean[] {false, true}) {
        ReviewReference other =
            new ReviewReference(new Productivity(kind, Optional.empty()), smearing);
        if (!other.equals(asked)) {
          String code = code(kind);
          all.add(
              new Choice(
                  smearing ? code + "-mean" : code,
                  "against " + other.words(),
                  other,
                  rows,
                  money,
                  false));
        }
      }
    }
    if (priced.inForce().moneyFactor().isPresent()) {
      all.add(
          new Choice(
              "without-deflator",
              "without the deflator, in the money of each period",
              asked,
              FilingRows.nominal(filing, priced.inForce()),
              study.money().currency().orElse("money") + " of the period",
              true));
    }
    priced
        .withoutOwner()
        .ifPresent(
            panel ->
                all.add(
                    new Choice(
                        "without-owner",
                        "without the owner's services",
                        asked,
                        FilingRows.of(filing, panel),
                        money,
                        true)));
    priced
        .recordedPrices()
        .ifPresent(
            panel ->
                all.add(
                    new Choice(
                        "recorded-prices",
                        "at the recorded price of capital in place of its user cost",
                        asked,
                        FilingRows.of(filing, panel),
                        money,
                        true)));
    return all;
  }

  /** A frontier where one was fitted. */
  private List<Productivity.Kind> kinds() {
    List<Productivity.Kind> kinds =
        new ArrayList<>(List.of(Productivity.Kind.TYPICAL, Productivity.Kind.BEST_QUARTER));
    if (study.estimation().estimator() instanceof Estimator.Frontier) {
      kinds.add(Productivity.Kind.FRONTIER);
    }
    return kinds;
  }

  private static String code(Productivity.Kind kind) {
    return switch (kind) {
      case BEST_QUARTER -> "best-quarter";
      case FRONTIER -> "frontier";
      default -> "typical";
    };
  }
}
