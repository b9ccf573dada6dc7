/**
 * Plant records: reading a file into an immutable panel, and saying what is wrong with it.
 *
 * <p><b>Comes in:</b> a CSV or XLSX file and the {@link isowright.records.Roles} of its columns.
 * <b>Goes out:</b> a {@link isowright.records.Panel}, columns of numbers sorted by plant and
 * period, and {@link isowright.records.Remark}s that name file, sheet, row, column, value, rule and
 * remedy.
 *
 * <p><b>Read first:</b> {@link isowright.records.Roles}, {@link isowright.records.RecordsReader},
 * {@link isowright.records.Panel}, {@link isowright.records.PanelAudit}.
 *
 * <p><b>Does not belong here:</b> the study file's syntax, technologies, estimates. This is the
 * only package that knows Tablesaw, POI's reader or CSV.
 */
@NullMarked
package isowright.records;

import org.jspecify.annotations.NullMarked;
