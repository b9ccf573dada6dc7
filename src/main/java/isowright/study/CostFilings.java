package isowright.study;

import isowright.records.Column;
import isowright.records.Panel;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.stream.Collectors;
import java.util.stream.Stream;

/** The filings of records of costs: filed and recorded cost row by row, by period. */
final class CostFilings {

  /** The role of the column of filed costs among the further columns of the records. */
  static final String ROLE = "filed cost";

  /** So many rows are named. */
  private static final int NAMED = 10;

  private final Study.Filing filing;
  private final Panel panel;
  private final Column filed;

  CostFilings(Study.Filing filing, Panel panel) {
    this.filing = filing;
    this.panel = panel;
    // the column of recorded cost itself is no further column: then what is filed is recorded
    this.filed =
        filing
            .cost()
            .flatMap(
                name -> panel.further().stream().filter(c -> c.name().equals(name)).findFirst())
            .orElse(panel.output());
  }

  /**
   * Refuses filed costs with gaps and periods that the records do not have.
   *
   * @throws StudyRefused naming key and rows
   */
  static void check(Study study, Panel panel) throws StudyRefused {
    if (study.filing().isEmpty()) {
      return;
    }
    Study.Filing asked = study.filing().get();
    List<Mistake> mistakes = new ArrayList<>();
    List<String> unknown =
        Stream.of(asked.firstPeriod(), asked.lastPeriod())
            .flatMap(Optional::stream)
            .distinct()
            .filter(period -> !panel.periods().contains(period))
            .toList();
    for (String period : unknown) {
      mistakes.add(
          new Mistake(
              0,
              0,
              "filing.periods",
              "the records used have no period "
                  + period
                  + "; they run from "
                  + panel.periods().get(0)
                  + " to "
                  + panel.periods().get(panel.periods().size() - 1)));
    }
    if (unknown.isEmpty()) {
      new CostFilings(asked, panel).unfiled().ifPresent(mistakes::add);
    }
    if (!mistakes.isEmpty()) {
      throw new StudyRefused(study.file(), KeyPlaces.of(study.file()).located(mistakes));
    }
  }

  private Optional<Mistake> unfiled() {
    List<Integer> rows =
        Arrays.stream(periods())
            .flatMap(period -> Arrays.stream(rows(period)))
            .filter(row -> !(filed(row) > 0) || Double.isInfinite(filed(row)))
            .map(row -> panel.fileRows().get(row))
            .sorted()
            .boxed()
            .toList();
    if (rows.isEmpty()) {
      return Optional.empty();
    }
    return Optional.of(
        new Mistake(
            0,
            0,
            "filing.cost",
            "the column "
                + filed.name()
                + " has no positive value in "
                + (rows.size() == 1 ? "row " : rows.size() + " rows of the periods reviewed: ")
                + rows.stream().limit(NAMED).map(String::valueOf).collect(Collectors.joining(", "))
                + (rows.size() > NAMED ? ", …" : "")
                + "; fill them in, narrow filing.periods, set the plants aside with"
                + " records.keep.without-plants, or take filing.cost out to review recorded cost"));
  }

  Panel panel() {
    return panel;
  }

  /** The periods reviewed. */
  int[] periods() {
    return ReviewStage.periods(filing, panel);
  }

  /** The rows of a period. */
  int[] rows(int period) {
    return FilingRows.of(panel, period);
  }

  double filed(int row) {
    return filed.get(row);
  }

  double recorded(int row) {
    return panel.output().get(row);
  }

  String plant(int row) {
    return panel.plants().get(panel.plantOf(row));
  }

  String periodOf(int row) {
    return panel.periods().get(panel.rowPeriods().get(row));
  }

  String period(int period) {
    return panel.periods().get(period);
  }
}
