package isowright.study;

import isowright.estimation.PanelSample;
import isowright.records.Panel;
import isowright.records.Reading;
import isowright.records.RecordsReader;
import isowright.records.RecordsRefused;
import isowright.study.MatrixFindings.Cell;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.stream.IntStream;
import java.util.stream.Stream;

/**
 * Fits every form of a study under both policies for zeros, where the records hold any. Records
 * without zeros are not read again, and nothing is fitted twice.
 */
final class ZerosStage {

  /** The remark of the reader that a quantity was zero or negative. */
  private static final String SET_ASIDE = "set-aside-quantity-not-positive";

  private ZerosStage() {}

  static Optional<ZerosFindings> findings(
      Study study, Optional<Reading> reading, Optional<Panel> panel) {
    if (reading.isEmpty() || panel.isEmpty() || study.technologies().isEmpty()) {
      return Optional.empty();
    }
    Study.Records asked = study.records().orElseThrow();
    boolean keeps = asked.roles().keepsZeros();
    Optional<Panel> with = keeps ? reading.map(Reading::panel) : again(asked, reading.get());
    return with.filter(p -> !zeros(p).isEmpty()).map(p -> compared(study, keeps, p, panel.get()));
  }

  /** The records with the rows that the reader set aside for zeros. */
  private static Optional<Panel> again(Study.Records asked, Reading reading) {
    if (reading.remarks().stream().noneMatch(r -> r.code().equals(SET_ASIDE))) {
      return Optional.empty();
    }
    try {
      return Optional.of(
          RecordsReader.read(asked.source(), asked.roles().keepingZeros(true), asked.keep())
              .panel());
    } catch (RecordsRefused refused) {
      return Optional.empty(); // the rows that were dropped have faults of their own
    }
  }

  private static Map<String, Integer> zeros(Panel panel) {
    Map<String, Integer> zeros = new LinkedHashMap<>();
    for (int i = 0; i < panel.inputs().size(); i++) {
      if (panel.zeros(i) > 0) {
        zeros.put(panel.inputs().get(i), panel.zeros(i));
      }
    }
    return zeros;
  }

  private static ZerosFindings compared(Study study, boolean keeps, Panel dummy, Panel inForce) {
    MatrixHeadlines headlines = new MatrixHeadlines(study, inForce);
    Stream.Builder<MatrixCell> cells = Stream.builder();
    boolean some = IntStream.range(0, dummy.rows()).anyMatch(r -> !dummy.anyZero(r));
    for (String technology : study.technologies()) {
      if (some) {
        Panel drop = keeps ? PanelSample.of(dummy, r -> !dummy.anyZero(r)) : inForce;
        cells.add(cell(study, technology, ZerosFindings.DROP, drop, !keeps));
      }
      cells.add(cell(study, technology, ZerosFindings.DUMMY, dummy, keeps));
    }
    List<Cell> found =
        cells.build().toList().parallelStream()
            .map(cell -> cell.found(study, headlines, List.of()).cell())
            .toList();
    return new ZerosFindings(
        keeps ? ZerosFindings.DUMMY : ZerosFindings.DROP,
        zeros(dummy),
        MatrixStage.headlines(study, headlines, found),
        found);
  }

  private static MatrixCell cell(
      Study study, String technology, String policy, Panel panel, boolean asAsked) {
    return new MatrixCell(
        technology,
        study.estimation().plantEffects(),
        study.estimation().time(),
        FitStage.standardErrors(study),
        policy,
        panel,
        asAsked);
  }
}
