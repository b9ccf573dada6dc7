package isowright.handover;

import java.io.BufferedOutputStream;
import java.io.ByteArrayInputStream;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.io.InputStream;
import java.io.OutputStream;
import java.nio.charset.StandardCharsets;
import java.util.zip.ZipEntry;
import java.util.zip.ZipInputStream;
import java.util.zip.ZipOutputStream;

/**
 * Takes the value 0 away that a streamed workbook writes behind every formula: it was never
 * calculated, and a spreadsheet that trusts what a file says would show it. Without a value every
 * spreadsheet works the formula out when it opens the file.
 *
 * <p>Entries get the date 1980-01-01, the earliest the format knows, so that the same findings give
 * the same bytes.
 */
final class UncalculatedCells {

  private static final byte[] STALE = "</f><v>0.0</v>".getBytes(StandardCharsets.US_ASCII);
  private static final int KEPT = "</f>".length();
  private static final long EARLIEST = 315_532_800_000L;

  private UncalculatedCells() {}

  static byte[] in(byte[] workbook) throws IOException {
    ByteArrayOutputStream bytes = new ByteArrayOutputStream(workbook.length);
    try (ZipInputStream from = new ZipInputStream(new ByteArrayInputStream(workbook));
        ZipOutputStream to = new ZipOutputStream(bytes)) {
      for (ZipEntry entry = from.getNextEntry(); entry != null; entry = from.getNextEntry()) {
        ZipEntry same = new ZipEntry(entry.getName());
        same.setTime(EARLIEST);
        to.putNextEntry(same);
        if (entry.getName().startsWith("xl/worksheets/sheet")) {
          OutputStream out = new BufferedOutputStream(to, 1 << 16);
          copy(from, out);
          out.flush();
        } else {
          from.transferTo(to);
        }
        to.closeEntry();
      }
    }
    return bytes.toByteArray();
  }

  /** Copies, leaving out what is stale. */
  private static void copy(InputStream from, OutputStream to) throws IOException {
    byte[] block = new byte[1 << 16];
    int matched = 0;
    for (int n = from.read(block); n >= 0; n = from.read(block)) {
      for (int i = 0; i < n; i++) {
        byte b = block[i];
        if (b == STALE[matched]) {
          matched++;
          if (matched == STALE.length) {
            to.write(STALE, 0, KEPT);
            matched = 0;
          }
        } else {
          to.write(STALE, 0, matched);
          matched = b == STALE[0] ? 1 : 0;
          if (matched == 0) {
            to.write(b);
          }
        }
      }
    }
    to.write(STALE, 0, matched);
  }
}
