package isowright.runs;

import java.io.IOException;
import java.io.InputStream;
import java.nio.file.Files;
import java.nio.file.Path;
import java.security.MessageDigest;
import java.security.NoSuchAlgorithmException;
import java.util.HexFormat;

/**
 * The SHA-256 of a file, in hexadecimal: two files of the same fingerprint are the same (FIPS
 * 180-4).
 *
 * <p>Tested in {@code RunRecordTest} against the published example "abc".
 */
final class Fingerprint {

  private static final int BLOCK = 1 << 16;

  private Fingerprint() {}

  static String of(byte[] bytes) {
    return HexFormat.of().formatHex(sha256().digest(bytes));
  }

  /** Read in blocks: records may be large. */
  static String of(Path file) throws IOException {
    MessageDigest digest = sha256();
    byte[] block = new byte[BLOCK];
    try (InputStream in = Files.newInputStream(file)) {
      for (int n = in.read(block); n >= 0; n = in.read(block)) {
        digest.update(block, 0, n);
      }
    }
    return HexFormat.of().formatHex(digest.digest());
  }

  private static MessageDigest sha256() {
    try {
      return MessageDigest.getInstance("SHA-256");
    } catch (NoSuchAlgorithmException impossible) {
      throw new IllegalStateException("every Java platform has SHA-256", impossible);
    }
  }
}
