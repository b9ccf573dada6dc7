package isowright.study;

import static org.assertj.core.api.Assertions.assertThat;

import isowright.study.Matrix.Criterion;
import isowright.study.MatrixFindings.Cell;
import isowright.study.MatrixFindings.Criteria;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.junit.jupiter.api.Test;

/** The rule of choice on invented combinations, each case by hand. */
class MatrixChoiceTest {

  private static MatrixCell.Found found(
      String sample, String of, double bic, Map<Criterion, String> faults) {
    return new MatrixCell.Found(
        new Cell(
            "ces",
            "none",
            "none",
            "robust",
            sample,
            "estimated",
            List.of(),
            50,
            Optional.of(new Criteria(of, 4, 0, bic - 8, bic)),
            Optional.empty(),
            Map.of(),
            Map.of(),
            false,
            ""),
        faults,
        List.of());
  }

  private static MatrixCell.Found refused() {
    return new MatrixCell.Found(
        new Cell(
            "ces",
            "random",
            "none",
            "robust",
            "all",
            "refused",
            List.of("no"),
            0,
            Optional.empty(),
            Optional.empty(),
            Map.of(),
            Map.of(),
            false,
            ""),
        Map.of(),
        List.of());
  }

  private static List<String> standings(MatrixChoice choice) {
    return choice.cells().stream().map(Cell::standing).toList();
  }

  @Test
  void onlyLikelihoodsOfTheSameNumbersAreCompared() {
    MatrixChoice choice =
        MatrixChoice.of(
            List.of(Criterion.BIC),
            List.of(
                refused(),
                found("all", "rows", -10, Map.of()),
                found("recent", "rows", -500, Map.of()),
                found("all", "plant means", -600, Map.of()),
                found("all", "differences", -700, Map.of()),
                found("all", "no likelihood", -800, Map.of()),
                found("all", "rows", -12.5, Map.of())));
    assertThat(choice.chosen()).hasValue(6);
    assertThat(standings(choice))
        .containsExactly(
            "not estimated",
            "BIC higher by 2.5",
            "not compared: its likelihood is of the rows of sample recent, not of those of all",
            "not compared: its likelihood is of plant means, not of rows as they stand",
            "not compared: its likelihood is of differences, not of rows as they stand",
            "not compared: its estimator maximises no likelihood",
            "chosen");
    assertThat(choice.words()).contains("6 of 7 combinations were estimated", "least BIC");
  }

  /** What a criterion set aside does not move the comparison to another sample or response. */
  @Test
  void theFirstSampleListedIsCompared() {
    Map<Criterion, String> rejected = Map.of(Criterion.RESET, "rejected");
    MatrixChoice choice =
        MatrixChoice.of(
            List.of(Criterion.RESET, Criterion.BIC),
            List.of(
                found("all", "rows", -90, rejected),
                found("recent", "rows", -500, Map.of()),
                found("all", "differences", -400, Map.of()),
                found("all", "rows", -20, Map.of()),
                found("all", "rows", -20, Map.of())));
    assertThat(choice.chosen()).hasValue(3);
    assertThat(standings(choice).get(4)).isEqualTo("the same BIC, but later in the study file");
    MatrixChoice others =
        MatrixChoice.of(
            List.of(Criterion.RESET, Criterion.BIC),
            List.of(
                found("all", "rows", -90, rejected),
                found("recent", "rows", -500, Map.of()),
                found("all", "differences", -400, Map.of())));
    assertThat(others.chosen()).hasValue(2);
  }

  @Test
  void criteriaFollowOneAnother() {
    List<MatrixCell.Found> all =
        List.of(
            found("all", "rows", -30, Map.of(Criterion.REGULAR_EVERYWHERE, "not regular")),
            found("all", "rows", -20, Map.of()),
            found("all", "rows", -25, Map.of(Criterion.RESET, "RESET rejects the form")),
            found("all", "rows", -10, Map.of()));
    assertThat(MatrixChoice.of(List.of(Criterion.BIC), all).chosen()).hasValue(0);
    assertThat(MatrixChoice.of(List.of(Criterion.REGULAR_EVERYWHERE, Criterion.BIC), all).chosen())
        .hasValue(2);
    MatrixChoice three =
        MatrixChoice.of(List.of(Criterion.REGULAR_EVERYWHERE, Criterion.RESET, Criterion.AIC), all);
    assertThat(three.chosen()).hasValue(1);
    assertThat(standings(three))
        .containsExactly("not regular", "chosen", "RESET rejects the form", "AIC higher by 10.0");
    // The order itself is no criterion that looks at numbers: BIC first leaves one alone.
    assertThat(MatrixChoice.of(List.of(Criterion.BIC, Criterion.REGULAR_EVERYWHERE), all).chosen())
        .isEmpty();
  }

  @Test
  void whatIsLeftOverIsTakenInTheOrderOfTheFile() {
    List<MatrixCell.Found> all =
        List.of(
            found("all", "rows", -1, Map.of(Criterion.REGULAR_AT_MEAN, "not regular")),
            found("all", "rows", -2, Map.of()),
            found("recent", "rows", -3, Map.of()));
    MatrixChoice choice = MatrixChoice.of(List.of(Criterion.REGULAR_AT_MEAN), all);
    assertThat(choice.chosen()).hasValue(1);
    assertThat(standings(choice))
        .containsExactly("not regular", "chosen", "left, but later in the study file");
    assertThat(choice.words()).contains("the first of these in the order of the study file");
  }

  @Test
  void noneIsChosen() {
    MatrixChoice without = MatrixChoice.of(List.of(), List.of(found("all", "rows", -1, Map.of())));
    assertThat(without.chosen()).isEmpty();
    assertThat(without.words()).startsWith("No criteria were laid down");
    assertThat(standings(without)).containsExactly("");
    MatrixChoice nothing = MatrixChoice.of(List.of(Criterion.BIC), List.of(refused()));
    assertThat(nothing.chosen()).isEmpty();
    assertThat(nothing.words()).endsWith("No combination is chosen.");
    MatrixChoice unlikely =
        MatrixChoice.of(
            List.of(Criterion.BIC), List.of(found("all", "no likelihood", -1, Map.of())));
    assertThat(unlikely.chosen()).isEmpty();
    assertThat(unlikely.words()).contains("none of these has a likelihood");
  }
}
