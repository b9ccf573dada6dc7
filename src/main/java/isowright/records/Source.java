package isowright.records;

import java.nio.file.Path;
import java.util.Optional;

/**
 * Where records are.
 *
 * @param file a .csv or .xlsx file
 * @param sheet the sheet of a workbook; the first if absent
 * @param numberFormat the declared number format of a CSV file; recognised, and reported, if absent
 */
public record Source(Path file, Optional<String> sheet, Optional<NumberFormat> numberFormat) {}
