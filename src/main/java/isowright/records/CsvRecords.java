package isowright.records;

import de.siegmar.fastcsv.reader.AbstractBaseCsvCallbackHandler;
import de.siegmar.fastcsv.reader.CloseableIterator;
import de.siegmar.fastcsv.reader.CsvParseException;
import de.siegmar.fastcsv.reader.CsvReader;
import de.siegmar.fastcsv.reader.FieldMismatchStrategy;
import java.io.IOException;
import java.io.InputStream;
import java.io.InputStreamReader;
import java.io.Reader;
import java.io.UncheckedIOException;
import java.nio.charset.CharacterCodingException;
import java.nio.charset.CodingErrorAction;
import java.nio.file.Files;
import java.security.DigestInputStream;
import java.security.MessageDigest;
import java.util.ArrayList;
import java.util.HexFormat;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.function.Supplier;

/**
 * Reads the cells of a CSV file. Encoding and delimiter are recognised; the file is decoded
 * strictly, so that a byte that is not a character of the encoding is never silently replaced.
 */
final class CsvRecords {

  private static final int BYTES_LOOKED_AT = 1 << 16;

  private final Source source;
  private final Place place;
  private final char delimiter;
  private final boolean delimiterSaid;
  private TextEncoding encoding;
  private String sha256 = "";

  /**
   * Looks at the beginning of the file.
   *
   * @param expected the headings that are looked for; empty where none is known
   */
  CsvRecords(Source source, Place place, Set<String> expected) throws RecordsRefused, IOException {
    this.source = source;
    this.place = place;
    byte[] first;
    try (InputStream in = Files.newInputStream(source.file())) {
      first = in.readNBytes(BYTES_LOOKED_AT);
    }
    Refusals.ifNotText(place, first);
    encoding = TextEncoding.of(first);
    int mark = encoding.markBytes();
    String beginning = new String(first, mark, first.length - mark, encoding.charset());
    Refusals.ifNothingIn(place, beginning, first.length < BYTES_LOOKED_AT);
    // Some spreadsheet programs write and read a first line that says the delimiter.
    delimiterSaid = beginning.matches("(?s)sep=.(\\R.*)?");
    delimiter = delimiterSaid ? beginning.charAt(4) : Delimiters.recognise(beginning, expected);
  }

  /**
   * Reads the whole file into an intake.
   *
   * @param fresh makes the intake; asked again when the encoding proves wrong half way
   */
  <I extends Intake> I read(Supplier<I> fresh) throws RecordsRefused, IOException {
    try {
      return readOnce(fresh.get());
    } catch (CharacterCodingException e) {
      if (!encoding.guessed()) {
        throw Refusals.notInEncoding(place, encoding);
      }
    }
    encoding = TextEncoding.WINDOWS_1252;
    try {
      return readOnce(fresh.get());
    } catch (CharacterCodingException e) {
      throw Refusals.notInEncoding(place, encoding);
    }
  }

  private <I extends Intake> I readOnce(I intake) throws RecordsRefused, IOException {
    MessageDigest digest = Refusals.sha256();
    Feed feed = new Feed(intake);
    try (InputStream bytes = new DigestInputStream(Files.newInputStream(source.file()), digest)) {
      bytes.skipNBytes(encoding.markBytes());
      Reader decoded =
          new InputStreamReader(
              bytes,
              encoding
                  .charset()
                  .newDecoder()
                  .onMalformedInput(CodingErrorAction.REPORT)
                  .onUnmappableCharacter(CodingErrorAction.REPORT));
      try (Reader characters = new ReadAhead(decoded)) {
        rows(characters, feed, intake);
      }
    } catch (UncheckedIOException e) {
      throw e.getCause();
    } catch (CsvParseException e) {
      if (e.getCause() instanceof IOException cause) {
        throw cause;
      }
      throw Refusals.brokenCsv(place, feed.line);
    }
    if (feed.headings.isEmpty()) {
      throw Refusals.nothingIn(place);
    }
    sha256 = HexFormat.of().formatHex(digest.digest());
    return intake;
  }

  private void rows(Reader characters, Feed feed, Intake intake)
      throws IOException, RecordsRefused {
    try (CsvReader<Boolean> reader =
        CsvReader.builder()
            .fieldSeparator(delimiter)
            .extraFieldStrategy(FieldMismatchStrategy.IGNORE)
            .missingFieldStrategy(FieldMismatchStrategy.IGNORE)
            .allowExtraCharsAfterClosingQuote(false)
            .allowUnclosedQuote(false)
            .build(feed, characters)) {
      if (delimiterSaid) {
        reader.skipLines(1);
      }
      CloseableIterator<Boolean> records = reader.iterator();
      while (records.hasNext()) {
        records.next();
        if (feed.inHeadings) {
          if (feed.headings.stream().allMatch(String::isEmpty)) {
            feed.headings.clear();
            continue;
          }
          feed.inHeadings = false;
          intake.headings(feed.line, feed.headings);
        } else {
          intake.endRow(feed.cells);
          if (!intake.wantsMore()) {
            return;
          }
        }
      }
    }
  }

  /** Hands the cells of each record on as they are parsed, without making strings of them. */
  private static final class Feed extends AbstractBaseCsvCallbackHandler<Boolean> {
    private final Intake intake;
    private final List<String> headings = new ArrayList<>();
    private boolean inHeadings = true;
    private int line;
    private int cells;

    Feed(Intake intake) {
      this.intake = intake;
    }

    @Override
    protected void handleBegin(long startingLineNumber) {
      line = (int) Math.min(startingLineNumber, Integer.MAX_VALUE);
      cells = 0;
      if (!inHeadings) {
        intake.beginRow(line);
      }
    }

    @Override
    protected void handleField(int field, char[] buffer, int from, int length, boolean quoted) {
      cells = field + 1;
      if (inHeadings) {
        headings.add(new String(buffer, from, length).strip());
      } else {
        intake.text(field, buffer, from, length);
      }
    }

    @Override
    protected Boolean buildRecord() {
      return Boolean.TRUE;
    }
  }

  /** The SHA-256 of the file as last read to its end, in hexadecimal. */
  String sha256() {
    return sha256;
  }

  char delimiter() {
    return delimiter;
  }

  /** Adds how the file was read. */
  void facts(Map<String, String> facts) {
    facts.put("encoding", encoding.words());
    facts.put("byte-order mark", encoding.markBytes() > 0 ? "present" : "none");
    facts.put(
        "delimiter",
        Delimiters.words(delimiter) + (delimiterSaid ? " (said by the file)" : " (recognised)"));
  }
}
