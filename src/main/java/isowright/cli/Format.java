package isowright.cli;

import isowright.handover.WordReport;
import isowright.handover.Workpapers;
import isowright.records.Nearest;
import isowright.records.Panel;
import isowright.report.Document;
import isowright.study.Findings;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.function.Function;
import java.util.function.Supplier;
import java.util.stream.Collectors;

/** What is handed over beside the page, where asked. */
enum Format {
  /** For a word processor. */
  DOCX("docx", "report.docx", handed -> WordReport.write(handed.document().get())),
  /** Workpapers for a spreadsheet. */
  XLSX("xlsx", Workpapers.NAME, handed -> Workpapers.write(handed.findings(), handed.rows().get()));

  /**
   * What formats are written from; documents and rows are had only if one wants them.
   *
   * @param findings everything found
   * @param document the report
   * @param rows the rows used
   */
  record Handed(Findings findings, Supplier<Document> document, Supplier<Optional<Panel>> rows) {}

  private final String word;
  private final String file;
  private final Function<Handed, byte[]> writer;

  Format(String word, String file, Function<Handed, byte[]> writer) {
    this.word = word;
    this.file = file;
    this.writer = writer;
  }

  /** The file's name. */
  String file() {
    return file;
  }

  /** The file of a study. */
  byte[] write(Handed handed) {
    return writer.apply(handed);
  }

  /** The words for all formats. */
  static String words() {
    return Arrays.stream(values()).map(f -> f.word).collect(Collectors.joining(", "));
  }

  /** The formats of these words; what is wrong with them, in a sentence, where anything is. */
  static Optional<String> mistake(List<String> words) {
    List<String> unknown = words.stream().filter(word -> named(word).isEmpty()).toList();
    if (unknown.isEmpty()) {
      return Optional.empty();
    }
    List<String> known = Arrays.stream(values()).map(f -> f.word).toList();
    List<String> sentences = new ArrayList<>();
    for (String word : unknown) {
      sentences.add(
          "`"
              + word
              + "` is not a format"
              + Nearest.word(word, known)
                  .map(near -> "; the nearest is `" + near + "`.")
                  .orElse("."));
    }
    return Optional.of(String.join(" ", sentences) + " Formats: " + words() + ".");
  }

  /** The formats of these words, each once; words without a format are left out. */
  static List<Format> of(List<String> words) {
    return words.stream().map(Format::named).flatMap(Optional::stream).distinct().toList();
  }

  private static Optional<Format> named(String word) {
    return Arrays.stream(values()).filter(f -> f.word.equals(word)).findFirst();
  }
}
