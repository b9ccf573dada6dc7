package isowright.study;

import isowright.study.ReviewFindings.Spread;
import java.util.ArrayList;
import java.util.List;
import java.util.TreeMap;

/** Gathers, filing by filing, the lowest and the highest gap that any choice gives. */
final class GapSpread {

  private static final class Range {
    private int choices;
    private double low = Double.POSITIVE_INFINITY;
    private double high = Double.NEGATIVE_INFINITY;
    private String lowBy = "";
    private String highBy = "";
  }

  /** Shares that differ by less are the same, and the choice that came first is named. */
  private static final double SAME = 1e-9;

  /** By row of the panel, so that spreads come in the order of the records. */
  private final TreeMap<Integer, Range> ranges = new TreeMap<>();

  /**
   * Notes the gaps of filings under one technology and choice.
   *
   * @param rows the rows of the filings in the panel
   * @param shares the gap of each as a share of what is filed; NaN where there is none
   */
  void note(String technology, String words, int[] rows, double[] shares) {
    for (int i = 0; i < shares.length; i++) {
      double share = shares[i];
      if (!Double.isNaN(share)) {
        Range range = ranges.computeIfAbsent(rows[i], row -> new Range());
        range.choices++;
        if (share < range.low - SAME) {
          range.low = share;
          range.lowBy = technology + ", " + words;
        }
        if (share > range.high + SAME) {
          range.high = share;
          range.highBy = technology + ", " + words;
        }
      }
    }
  }

  /** The spreads of all filings that had a gap under any choice. */
  List<Spread> spreads(isowright.records.Panel panel) {
    List<Spread> spreads = new ArrayList<>();
    ranges.forEach(
        (row, range) ->
            spreads.add(
                new Spread(
                    panel.plants().get(panel.plantOf(row)),
                    panel.periods().get(panel.rowPeriods().get(row)),
                    range.choices,
                    range.low,
                    range.lowBy,
                    range.high,
                    range.highBy)));
    return spreads;
  }
}
