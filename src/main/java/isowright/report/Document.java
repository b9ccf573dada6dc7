package isowright.report;

import isowright.charts.Chart;
import java.util.List;
import java.util.Optional;

/**
 * What a report says, apart from how it looks: sections of paragraphs, tables, drawings and
 * notices, from which HTML and, on paper, other formats are rendered. Immutable.
 *
 * <p>Tables and drawings are numbered by their order. Heading levels follow from nesting.
 *
 * @param title the title
 * @param about what kind of document it is, in a line
 * @param facts a few facts to stand under the title
 * @param sections the sections
 */
public record Document(String title, String about, List<Entry> facts, List<Section> sections) {

  /** Copies the lists. */
  public Document {
    facts = List.copyOf(facts);
    sections = List.copyOf(sections);
  }

  /** A piece of a section. */
  public sealed interface Block
      permits Section, Paragraph, Points, Definitions, Notice, Answers, Table, Drawing, Display {
    /** Hands this piece to the reader's matching method. */
    void tell(Reader reader);
  }

  /** Is told every piece in turn; a new kind of piece does not compile until it is rendered. */
  public interface Reader {
    /** A section within a section. */
    void section(Section section);

    /** A paragraph. */
    void paragraph(Paragraph paragraph);

    /** A list. */
    void points(Points points);

    /** Terms and what they mean. */
    void definitions(Definitions definitions);

    /** Something that must not be overlooked. */
    void notice(Notice notice);

    /** The answers in brief. */
    void answers(Answers answers);

    /** A table. */
    void table(Table table);

    /** A chart. */
    void drawing(Drawing drawing);

    /** A formula on a line of its own. */
    void display(Display display);
  }

  /**
   * A section.
   *
   * @param id its identifier, unique in the document
   * @param title its heading
   * @param blocks what it says
   */
  public record Section(String id, String title, List<Block> blocks) implements Block {
    /** Copies the list. */
    public Section {
      blocks = List.copyOf(blocks);
    }

    @Override
    public void tell(Reader reader) {
      reader.section(this);
    }
  }

  /** A paragraph. */
  public record Paragraph(Text text) implements Block {
    /** A paragraph of plain words. */
    public static Paragraph of(String words) {
      return new Paragraph(Text.of(words));
    }

    @Override
    public void tell(Reader reader) {
      reader.paragraph(this);
    }
  }

  /** A list of points, numbered or not. */
  public record Points(boolean numbered, List<Text> points) implements Block {
    /** Copies the list. */
    public Points {
      points = List.copyOf(points);
    }

    @Override
    public void tell(Reader reader) {
      reader.points(this);
    }
  }

  /** A term and what it means. */
  public record Entry(Text term, Text meaning) {
    /** Of plain words. */
    public static Entry of(String term, String meaning) {
      return new Entry(Text.of(term), Text.of(meaning));
    }
  }

  /** Terms and what they mean. */
  public record Definitions(List<Entry> entries) implements Block {
    /** Copies the list. */
    public Definitions {
      entries = List.copyOf(entries);
    }

    @Override
    public void tell(Reader reader) {
      reader.definitions(this);
    }
  }

  /** How much a notice weighs. */
  public enum Weight {
    /** Good to know. */
    NOTE("Note"),
    /** A result may be wrong because of it. */
    WARNING("Warning"),
    /** There is no result because of it. */
    ERROR("No result");

    private final String word;

    Weight(String word) {
      this.word = word;
    }

    /** The word printed before the notice, so that colour is never the only sign. */
    public String word() {
      return word;
    }

    /** The weight of a remark's severity. */
    static Weight of(String severity) {
      return switch (severity) {
        case "error" -> ERROR;
        case "warning" -> WARNING;
        default -> NOTE;
      };
    }
  }

  /**
   * Something that must not be overlooked.
   *
   * @param weight how much it weighs
   * @param text what is said
   */
  public record Notice(Weight weight, Text text) implements Block {
    @Override
    public void tell(Reader reader) {
      reader.notice(this);
    }
  }

  /**
   * One answer in brief.
   *
   * @param question what was asked
   * @param answer the figure, or the words that stand in its place
   * @param unit the unit of the figure; may be empty
   * @param sure its interval or how sure it is; may be empty
   * @param detail what belongs to it; may be empty
   * @param caution what must be known before it is used; may be empty
   */
  public record Answer(
      String question, String answer, String unit, String sure, String detail, String caution) {}

  /** The answers in brief, each with how sure it is. */
  public record Answers(List<Answer> answers) implements Block {
    /** Copies the list. */
    public Answers {
      answers = List.copyOf(answers);
    }

    @Override
    public void tell(Reader reader) {
      reader.answers(this);
    }
  }

  /**
   * A chart with its data.
   *
   * @param chart the chart
   */
  public record Drawing(Chart chart) implements Block {
    @Override
    public void tell(Reader reader) {
      reader.drawing(this);
    }
  }

  /**
   * A formula on a line of its own.
   *
   * @param formula the formula
   */
  public record Display(Formula formula) implements Block {
    /** A formula in the notation of {@link Formula#of}. */
    public static Display of(String notation) {
      return new Display(Formula.of(notation));
    }

    @Override
    public void tell(Reader reader) {
      reader.display(this);
    }
  }

  /**
   * A table. The first column heads the rows.
   *
   * @param caption what the table shows
   * @param corner the heading of the first column
   * @param columns the headings of the others
   * @param groups the rows, in groups
   * @param notes what must be known to read it
   */
  public record Table(
      String caption, String corner, List<Column> columns, List<Group> groups, List<Text> notes)
      implements Block {
    /** Copies the lists and checks that every row has a cell for every column. */
    public Table {
      columns = List.copyOf(columns);
      groups = List.copyOf(groups);
      notes = List.copyOf(notes);
      for (Group group : groups) {
        for (Row row : group.rows()) {
          if (row.cells().size() != columns.size()) {
            throw new IllegalArgumentException(
                "table '" + caption + "', row '" + row.heading().plain() + "': cells and columns");
          }
        }
      }
    }

    @Override
    public void tell(Reader reader) {
      reader.table(this);
    }
  }

  /**
   * A column.
   *
   * @param heading its heading
   * @param unit its unit, printed beneath; may be empty
   * @param numbers whether it holds numbers, which are set flush right
   */
  public record Column(String heading, String unit, boolean numbers) {
    /** A column of numbers. */
    public static Column ofNumbers(String heading, String unit) {
      return new Column(heading, unit, true);
    }

    /** A column of words. */
    public static Column ofWords(String heading) {
      return new Column(heading, "", false);
    }
  }

  /** Rows under a heading of their own, where there is one. */
  public record Group(Optional<String> heading, List<Row> rows) {
    /** Copies the list. */
    public Group {
      rows = List.copyOf(rows);
    }

    /** Rows without a heading of their own. */
    public static Group of(List<Row> rows) {
      return new Group(Optional.empty(), rows);
    }
  }

  /** A row. */
  public record Row(Text heading, List<Cell> cells) {
    /** Copies the list. */
    public Row {
      cells = List.copyOf(cells);
    }

    /** A row of plain cells. */
    public static Row of(String heading, List<String> cells) {
      return new Row(Text.of(heading), cells.stream().map(Cell::of).toList());
    }
  }

  /**
   * A cell of one or more lines.
   *
   * @param lines the lines; the first is the main one
   */
  public record Cell(List<Text> lines) {
    /** Copies the list. */
    public Cell {
      lines = List.copyOf(lines);
    }

    /** A cell of one line. */
    public static Cell of(String line) {
      return new Cell(List.of(Text.of(line)));
    }

    /** A cell with a second, smaller line beneath; no second line where it is empty. */
    public static Cell of(String line, String beneath) {
      return beneath.isEmpty() ? of(line) : new Cell(List.of(Text.of(line), Text.of(beneath)));
    }

    /** A cell in which nothing can stand. */
    public static Cell none() {
      return of("—");
    }
  }
}
