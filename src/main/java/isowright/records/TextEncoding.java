package isowright.records;

import java.nio.charset.Charset;
import java.nio.charset.StandardCharsets;

/**
 * How the bytes of a text file stand for characters, recognised from its first bytes: UTF-8, or
 * UTF-16 where a byte-order mark says so. A file without a mark is read as UTF-8, and as
 * windows-1252 when its bytes turn out not to be UTF-8.
 *
 * @param charset the encoding
 * @param markBytes the length of the byte-order mark, 0 where there is none
 */
record TextEncoding(Charset charset, int markBytes) {

  /** What spreadsheet programs of western Europe write when not told to write UTF-8. */
  static final TextEncoding WINDOWS_1252 = new TextEncoding(Charset.forName("windows-1252"), 0);

  /** By the byte-order mark, UTF-8 without one. */
  static TextEncoding of(byte[] first) {
    if (startsWith(first, 0xEF, 0xBB, 0xBF)) {
      return new TextEncoding(StandardCharsets.UTF_8, 3);
    }
    if (startsWith(first, 0xFF, 0xFE)) {
      return new TextEncoding(StandardCharsets.UTF_16LE, 2);
    }
    if (startsWith(first, 0xFE, 0xFF)) {
      return new TextEncoding(StandardCharsets.UTF_16BE, 2);
    }
    return new TextEncoding(StandardCharsets.UTF_8, 0);
  }

  static boolean startsWith(byte[] bytes, int... expected) {
    if (bytes.length < expected.length) {
      return false;
    }
    for (int i = 0; i < expected.length; i++) {
      if ((bytes[i] & 0xFF) != expected[i]) {
        return false;
      }
    }
    return true;
  }

  /** Whether another encoding may be tried: only where the file does not say which it has. */
  boolean guessed() {
    return markBytes == 0 && charset.equals(StandardCharsets.UTF_8);
  }

  String words() {
    if (markBytes > 0) {
      return charset.name() + " (said by the byte-order mark)";
    }
    return charset.name()
        + (guessed() ? " (recognised)" : " (recognised: the bytes are not UTF-8)");
  }
}
