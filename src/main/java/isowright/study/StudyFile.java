package isowright.study;

import isowright.records.Source;
import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.CharBuffer;
import java.nio.charset.CharsetDecoder;
import java.nio.charset.CoderResult;
import java.nio.charset.CodingErrorAction;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.security.MessageDigest;
import java.security.NoSuchAlgorithmException;
import java.util.HexFormat;
import java.util.List;
import java.util.Locale;
import java.util.Optional;

/**
 * Reads a study file: what does it ask, and is it free of mistakes of its own?
 *
 * <p>A study file is YAML 1.2 in UTF-8. Every mistake is found in one pass and told with line,
 * column, key path, what was found, what is allowed and the nearest allowed word: unknown and
 * duplicate keys, wrong types, syntax errors, and settings that contradict one another. Nothing is
 * held against the records here; whether a column exists is a question for the records' reader.
 *
 * <p>Words of the format that this version does not carry out are refused as such, never ignored.
 * Paths in the file are relative to its folder.
 */
public final class StudyFile {

  /** A study takes some kilobytes; a file above this size is something else. */
  private static final long LARGEST = 1 << 20;

  private StudyFile() {}

  /**
   * The study that a file asks for.
   *
   * @param file the study file
   * @throws StudyRefused with every mistake, in the order of the file
   */
  public static Study read(Path file) throws StudyRefused {
    return read(file, Optional.empty());
  }

  /**
   * What a study file asks, put to the records of another study: so that it can be told what in a
   * result comes from records and what from settings.
   *
   * @param file the study file
   * @param records the records that stand in place of its own
   */
  public static Study readOn(Path file, Source records) throws StudyRefused {
    return read(file, Optional.of(records));
  }

  /**
   * The study that a text asks for.
   *
   * @param as the study file that the text would stand in; paths are relative to its folder
   * @param text what the file would say
   */
  public static Study readText(Path as, String text) throws StudyRefused {
    return study(as, text, text.getBytes(StandardCharsets.UTF_8), Optional.empty());
  }

  private static Study read(Path file, Optional<Source> instead) throws StudyRefused {
    byte[] bytes = bytes(file);
    return study(file, text(file, bytes), bytes, instead);
  }

  private static Study study(Path file, String text, byte[] bytes, Optional<Source> instead)
      throws StudyRefused {
    Mistakes mistakes = new Mistakes();
    StudyBinder binder = new StudyBinder(file, sha256(bytes), instead);
    var study = YamlNodes.root(text, mistakes).flatMap(YamlValue::section).flatMap(binder::bind);
    if (!mistakes.none() || study.isEmpty()) {
      throw new StudyRefused(file, mistakes.inOrder());
    }
    return study.get();
  }

  private static byte[] bytes(Path file) throws StudyRefused {
    if (Files.isDirectory(file)) {
      throw refused(file, "this is a folder; name the study file in it, such as study.yaml");
    }
    if (!Files.exists(file)) {
      throw refused(
          file, "there is no such file; check the name and the folder" + neighbours(file));
    }
    try {
      long size = Files.size(file);
      if (size == 0) {
        throw refused(file, "the file is empty; begin with `title:`");
      }
      if (size > LARGEST) {
        throw refused(
            file,
            String.format(
                Locale.ROOT,
                "the file has %,d bytes, and a study file at most %,d; is it the records file?",
                size,
                LARGEST));
      }
      return Files.readAllBytes(file);
    } catch (IOException unreadable) {
      throw refused(
          file, "the file cannot be read (" + unreadable.getMessage() + "); check its permissions");
    }
  }

  /** The study files beside a file that is not there, for a mistyped name. */
  private static String neighbours(Path file) {
    Path folder = file.toAbsolutePath().getParent();
    if (folder == null || !Files.isDirectory(folder)) {
      return "";
    }
    try (var entries = Files.newDirectoryStream(folder, "*.{yaml,yml}")) {
      List<String> names = new java.util.ArrayList<>();
      entries.forEach(entry -> names.add(String.valueOf(entry.getFileName())));
      String wanted = String.valueOf(file.getFileName());
      return YamlValue.nearest(wanted, names);
    } catch (IOException unlisted) {
      return "";
    }
  }

  private static String text(Path file, byte[] bytes) throws StudyRefused {
    CharsetDecoder decoder =
        StandardCharsets.UTF_8
            .newDecoder()
            .onMalformedInput(CodingErrorAction.REPORT)
            .onUnmappableCharacter(CodingErrorAction.REPORT);
    ByteBuffer in = ByteBuffer.wrap(bytes);
    CharBuffer out = CharBuffer.allocate(bytes.length);
    CoderResult result = decoder.decode(in, out, true);
    out.flip();
    String text = out.toString();
    if (result.isError()) {
      int line = 1 + (int) text.chars().filter(c -> c == '\n').count();
      int column = text.length() - text.lastIndexOf('\n');
      Mistake mistake =
          new Mistake(
              line,
              column,
              "",
              String.format(
                  Locale.ROOT,
                  "the byte 0x%02X is not UTF-8; save the file with the encoding UTF-8",
                  bytes[in.position()]));
      throw new StudyRefused(file, List.of(mistake));
    }
    return text.startsWith("\uFEFF") ? text.substring(1) : text;
  }

  static String sha256(byte[] bytes) {
    try {
      return HexFormat.of().formatHex(MessageDigest.getInstance("SHA-256").digest(bytes));
    } catch (NoSuchAlgorithmException impossible) {
      throw new IllegalStateException("every Java platform has SHA-256", impossible);
    }
  }

  private static StudyRefused refused(Path file, String message) {
    return new StudyRefused(file, List.of(new Mistake(0, 0, "", message)));
  }
}
