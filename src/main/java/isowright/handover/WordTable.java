package isowright.handover;

import isowright.report.Document.Cell;
import isowright.report.Document.Column;
import isowright.report.Document.Group;
import isowright.report.Document.Row;
import isowright.report.Document.Table;
import isowright.report.Text;
import java.math.BigInteger;
import java.util.stream.IntStream;
import org.apache.poi.xwpf.usermodel.ParagraphAlignment;
import org.apache.poi.xwpf.usermodel.TableWidthType;
import org.apache.poi.xwpf.usermodel.XWPFDocument;
import org.apache.poi.xwpf.usermodel.XWPFParagraph;
import org.apache.poi.xwpf.usermodel.XWPFRun;
import org.apache.poi.xwpf.usermodel.XWPFTable;
import org.apache.poi.xwpf.usermodel.XWPFTable.XWPFBorderType;
import org.apache.poi.xwpf.usermodel.XWPFTableCell;
import org.apache.poi.xwpf.usermodel.XWPFTableRow;
import org.openxmlformats.schemas.wordprocessingml.x2006.main.CTTblGrid;
import org.openxmlformats.schemas.wordprocessingml.x2006.main.CTTblPr;
import org.openxmlformats.schemas.wordprocessingml.x2006.main.STTblLayoutType;

/** A table of the document as a native one; its head repeats on every page. */
final class WordTable {

  private static final String RULE = "B9C0C4";

  private final Table table;
  private final XWPFTable drawn;
  private final int size;
  private final int[] widths;

  private WordTable(XWPFDocument word, Table table) {
    this.table = table;
    this.size = textSize(table.columns().size());
    this.widths = ColumnWidths.of(table, WordReport.TEXT_WIDTH);
    this.drawn = word.createTable(1, table.columns().size() + 1);
  }

  /** Many columns have to be set smaller to fit the page. */
  private static int textSize(int columns) {
    if (columns > 9) {
      return 6;
    }
    return columns > 6 ? 7 : 8;
  }

  static void write(XWPFDocument word, Table table) {
    new WordTable(word, table).fill();
  }

  private void fill() {
    layOut();
    drawn.removeBorders();
    drawn.setTopBorder(XWPFBorderType.SINGLE, 8, 0, WordStyles.INK);
    drawn.setBottomBorder(XWPFBorderType.SINGLE, 8, 0, WordStyles.INK);
    drawn.setInsideHBorder(XWPFBorderType.SINGLE, 2, 0, RULE);
    heads();
    for (Group group : table.groups()) {
      group.heading().ifPresent(this::groupHead);
      group.rows().forEach(this::row);
    }
  }

  private void layOut() {
    drawn.setWidthType(TableWidthType.DXA);
    drawn.setWidth(IntStream.of(widths).sum());
    CTTblPr properties = drawn.getCTTbl().getTblPr();
    properties.addNewTblLayout().setType(STTblLayoutType.FIXED);
    CTTblGrid grid =
        drawn.getCTTbl().getTblGrid() == null
            ? drawn.getCTTbl().addNewTblGrid()
            : drawn.getCTTbl().getTblGrid();
    while (grid.sizeOfGridColArray() > 0) {
      grid.removeGridCol(0);
    }
    for (int width : widths) {
      grid.addNewGridCol().setW(BigInteger.valueOf(width));
    }
  }

  private void wide(XWPFTableCell cell, int width) {
    cell.setWidthType(TableWidthType.DXA);
    cell.setWidth(String.valueOf(width));
  }

  private void heads() {
    XWPFTableRow row = drawn.getRow(0);
    for (int c = 0; c < widths.length; c++) {
      wide(row.getCell(c), widths[c]);
    }
    row.setRepeatHeader(true);
    row.setCantSplitRow(true);
    bold(line(row.getCell(0), true, false), table.corner());
    for (int c = 0; c < table.columns().size(); c++) {
      Column column = table.columns().get(c);
      XWPFTableCell cell = row.getCell(c + 1);
      bold(line(cell, true, column.numbers()), column.heading());
      if (!column.unit().isEmpty()) {
        sized(line(cell, false, column.numbers()).createRun()).setText(column.unit());
      }
    }
  }

  private void bold(XWPFParagraph line, String words) {
    XWPFRun run = sized(line.createRun());
    run.setBold(true);
    run.setText(words);
  }

  private XWPFRun sized(XWPFRun run) {
    run.setFontSize(size);
    return run;
  }

  private void groupHead(String heading) {
    XWPFTableRow row = drawn.createRow();
    row.setCantSplitRow(true);
    for (int c = row.getTableCells().size() - 1; c > 0; c--) {
      row.removeCell(c);
    }
    XWPFTableCell cell = row.getCell(0);
    wide(cell, IntStream.of(widths).sum());
    cell.getCTTc()
        .getTcPr()
        .addNewGridSpan()
        .setVal(BigInteger.valueOf(table.columns().size() + 1L));
    XWPFParagraph line = line(cell, true, false);
    line.setKeepNext(true);
    bold(line, heading);
  }

  private void row(Row row) {
    XWPFTableRow line = drawn.createRow();
    while (line.getTableCells().size() < table.columns().size() + 1) {
      line.createCell();
    }
    line.setCantSplitRow(true);
    for (int c = 0; c < widths.length; c++) {
      wide(line.getCell(c), widths[c]);
    }
    write(line(line.getCell(0), true, false), row.heading());
    for (int c = 0; c < row.cells().size(); c++) {
      cell(line.getCell(c + 1), table.columns().get(c), row.cells().get(c));
    }
  }

  private void cell(XWPFTableCell into, Column column, Cell cell) {
    boolean first = true;
    for (Text text : cell.lines()) {
      write(line(into, first, column.numbers()), text);
      first = false;
    }
  }

  private void write(XWPFParagraph line, Text text) {
    WordText.write(line, text);
    line.getRuns().forEach(this::sized);
  }

  private static XWPFParagraph line(XWPFTableCell cell, boolean first, boolean numbers) {
    XWPFParagraph line =
        first && !cell.getParagraphs().isEmpty()
            ? cell.getParagraphs().get(0)
            : cell.addParagraph();
    line.setStyle(WordStyles.TABLE_TEXT);
    line.setAlignment(numbers ? ParagraphAlignment.RIGHT : ParagraphAlignment.LEFT);
    return line;
  }
}
