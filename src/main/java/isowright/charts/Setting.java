package isowright.charts;

import isowright.study.Findings;
import isowright.study.Findings.Units;

/**
 * What all charts of a study share.
 *
 * @param units the units of figures
 * @param confidence the level of intervals
 * @param names the file names given so far
 */
record Setting(Units units, double confidence, Words.Names names) {

  /** For a study. */
  static Setting of(Findings findings) {
    return new Setting(findings.units(), findings.confidence(), new Words.Names());
  }

  /** "95 %". */
  String level() {
    return Words.level(confidence);
  }
}
