package isowright.records;

import java.util.List;
import java.util.Map;

/**
 * A records file, read.
 *
 * @param panel the usable rows
 * @param sha256 the SHA-256 of the file, in hexadecimal
 * @param fileRows the rows in the file, headings not counted
 * @param facts how the file was read, in the order to print: encoding, byte-order mark, delimiter,
 *     decimal mark, grouping, or sheet; each says whether it was recognised or declared
 * @param setAside rows not used, by reason
 * @param remarks what reading itself found worth saying
 */
public record Reading(
    Panel panel,
    String sha256,
    int fileRows,
    Map<String, String> facts,
    List<SetAside> setAside,
    List<Remark> remarks) {

  /** Copies the lists. */
  public Reading {
    setAside = List.copyOf(setAside);
    remarks = List.copyOf(remarks);
  }

  /**
   * Rows not used.
   *
   * @param reason why, in words
   * @param count how many
   * @param rows the first few, as in the file
   */
  public record SetAside(String reason, int count, List<Integer> rows) {
    /** Copies the rows. */
    public SetAside {
      rows = List.copyOf(rows);
    }
  }
}
