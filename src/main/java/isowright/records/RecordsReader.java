package isowright.records;

/** Being written. */
public final class RecordsReader {
  private RecordsReader() {}
}
