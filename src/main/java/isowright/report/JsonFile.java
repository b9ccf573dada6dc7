package isowright.report;

import com.fasterxml.jackson.core.JsonFactory;
import com.fasterxml.jackson.core.JsonGenerator;
import com.fasterxml.jackson.core.StreamWriteFeature;
import com.fasterxml.jackson.core.util.DefaultIndenter;
import com.fasterxml.jackson.core.util.DefaultPrettyPrinter;
import com.fasterxml.jackson.core.util.Separators;
import isowright.study.Figure;
import isowright.study.Figure.Uncertainty;
import isowright.study.Findings.Said;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * Writes a JSON file as people and programs like to read it: two spaces, line feeds, keys in a
 * fixed order, small objects on one line, doubles in the fewest digits that read back to the same
 * double. JSON has no word for NaN and infinity: {@code null} stands for both.
 *
 * <p>Where an interval is open, its end is {@code null}, and the file remembers a remark about it
 * to be written among the nearest remarks.
 */
final class JsonFile {

  private static final JsonFactory FACTORY =
      JsonFactory.builder().enable(StreamWriteFeature.USE_FAST_DOUBLE_WRITER).build();

  private final JsonGenerator out;
  private final Lines lines = new Lines();
  private final List<Said> pending = new ArrayList<>();

  private JsonFile(JsonGenerator out) {
    this.out = out;
    out.setPrettyPrinter(
        new DefaultPrettyPrinter()
            .withSeparators(
                Separators.createDefaultInstance()
                    .withObjectFieldValueSpacing(Separators.Spacing.AFTER)
                    .withObjectEmptySeparator("")
                    .withArrayEmptySeparator(""))
            .withObjectIndenter(lines));
  }

  /** What is written into an object. */
  interface Content {
    /** Writes keys and values. */
    void write() throws IOException;
  }

  /** What a whole file holds. */
  interface Whole {
    /** Writes the file's keys and values. */
    void write(JsonFile file) throws IOException;
  }

  /** A file that holds one object. */
  static byte[] of(Whole whole) {
    ByteArrayOutputStream bytes = new ByteArrayOutputStream(1 << 16);
    try {
      try (JsonGenerator generator = FACTORY.createGenerator(bytes)) {
        JsonFile file = new JsonFile(generator);
        generator.writeStartObject();
        whole.write(file);
        generator.writeEndObject();
      }
      bytes.write("\n".getBytes(StandardCharsets.UTF_8));
      return bytes.toByteArray();
    } catch (IOException e) {
      throw new UncheckedIOException("writing to memory failed", e);
    }
  }

  void text(String key, String value) throws IOException {
    out.writeStringField(key, value);
  }

  void whole(String key, long value) throws IOException {
    out.writeNumberField(key, value);
  }

  void truth(String key, boolean value) throws IOException {
    out.writeBooleanField(key, value);
  }

  void number(String key, double value) throws IOException {
    out.writeFieldName(key);
    number(value);
  }

  void nothing(String key) throws IOException {
    out.writeNullField(key);
  }

  /** An object of several lines. */
  void object(String key, Content content) throws IOException {
    out.writeFieldName(key);
    out.writeStartObject();
    content.write();
    out.writeEndObject();
  }

  /** An object on one line. */
  void line(String key, Content content) throws IOException {
    out.writeFieldName(key);
    line(content);
  }

  /** A list of objects, each on several lines or on one. */
  <T> void list(String key, List<T> items, boolean onOneLine, Each<T> each) throws IOException {
    out.writeArrayFieldStart(key);
    for (T item : items) {
      if (onOneLine) {
        line(() -> each.write(item));
      } else {
        out.writeStartObject();
        each.write(item);
        out.writeEndObject();
      }
    }
    out.writeEndArray();
  }

  /** Writes one object of a list. */
  interface Each<T> {
    /** Writes the keys and values of an item. */
    void write(T item) throws IOException;
  }

  void numbers(String key, double[] values) throws IOException {
    out.writeFieldName(key);
    numbers(values);
  }

  void wholes(String key, List<Integer> values) throws IOException {
    out.writeArrayFieldStart(key);
    for (int value : values) {
      out.writeNumber(value);
    }
    out.writeEndArray();
  }

  void texts(String key, List<String> values) throws IOException {
    out.writeArrayFieldStart(key);
    for (String value : values) {
      out.writeString(value);
    }
    out.writeEndArray();
  }

  void matrix(String key, double[][] rows) throws IOException {
    out.writeArrayFieldStart(key);
    for (double[] row : rows) {
      numbers(row);
    }
    out.writeEndArray();
  }

  void numbersByName(String key, Map<String, Double> values) throws IOException {
    line(
        key,
        () -> {
          for (Map.Entry<String, Double> entry : values.entrySet()) {
            number(entry.getKey(), entry.getValue());
          }
        });
  }

  void textsByName(String key, Map<String, String> values) throws IOException {
    object(
        key,
        () -> {
          for (Map.Entry<String, String> entry : values.entrySet()) {
            text(entry.getKey(), entry.getValue());
          }
        });
  }

  /**
   * A figure: an object where it is estimated, a number where it is exact, null where there is
   * none.
   */
  void figure(String key, Optional<Figure> figure) throws IOException {
    out.writeFieldName(key);
    if (figure.isEmpty() || !Double.isFinite(figure.get().value())) {
      out.writeNull();
    } else if (figure.get().uncertainty().isEmpty()) {
      number(figure.get().value());
    } else {
      Figure estimated = figure.get();
      line(() -> uncertain(key, estimated));
    }
  }

  void figures(String key, Map<String, Figure> figures) throws IOException {
    object(
        key,
        () -> {
          for (Map.Entry<String, Figure> entry : figures.entrySet()) {
            figure(entry.getKey(), Optional.of(entry.getValue()));
          }
        });
  }

  /** The keys of an estimated figure; those of an exact one with nothing but its value known. */
  void uncertain(String name, Figure figure) throws IOException {
    number("value", figure.value());
    Uncertainty u =
        figure.uncertainty().orElse(new Uncertainty(Double.NaN, Double.NaN, Double.NaN, ""));
    number("se", u.standardError());
    number("low", u.low());
    number("high", u.high());
    if (u.method().isEmpty()) {
      nothing("method");
    } else {
      text("method", u.method());
    }
    remember(name, u.low(), u.high());
  }

  /** Remembers that an interval is open, so that the nearest remarks say why an end is null. */
  void remember(String name, double low, double high) {
    if (Double.isInfinite(low)) {
      pending.add(open(name, "below", "low"));
    }
    if (Double.isInfinite(high)) {
      pending.add(open(name, "above", "high"));
    }
  }

  /** Remembers why a number is null, so that the nearest remarks say it. */
  void remember(String why) {
    pending.add(Said.of("note", "no-number", why));
  }

  private static Said open(String name, String where, String end) {
    return Said.of(
        "note",
        "open-interval",
        "The interval of " + name + " is open " + where + ", so that its " + end + " end is null.");
  }

  /** Remarks, and those remembered since the last ones. */
  void remarks(String key, List<Said> remarks) throws IOException {
    List<Said> all = new ArrayList<>(remarks);
    pending.stream().distinct().forEach(all::add);
    pending.clear();
    list(
        key,
        all,
        false,
        remark -> {
          text("severity", remark.severity());
          text("code", remark.code());
          text("message", remark.message());
          wholes("rows", remark.rows());
        });
  }

  private void numbers(double[] values) throws IOException {
    out.writeStartArray();
    for (double value : values) {
      number(value);
    }
    out.writeEndArray();
  }

  private void number(double value) throws IOException {
    if (Double.isFinite(value)) {
      out.writeNumber(value);
    } else {
      out.writeNull();
    }
  }

  private void line(Content content) throws IOException {
    boolean outer = lines.onOneLine;
    out.writeStartObject();
    lines.onOneLine = true;
    content.write();
    lines.onOneLine = true;
    out.writeEndObject();
    lines.onOneLine = outer;
  }

  /** Breaks lines in objects, save in those that stand on one line. */
  private static final class Lines implements DefaultPrettyPrinter.Indenter {
    private static final DefaultIndenter BROKEN = new DefaultIndenter("  ", "\n");
    private boolean onOneLine = false;

    @Override
    public void writeIndentation(JsonGenerator generator, int level) throws IOException {
      if (onOneLine) {
        generator.writeRaw(' ');
      } else {
        BROKEN.writeIndentation(generator, level);
      }
    }

    @Override
    public boolean isInline() {
      return false;
    }
  }
}
