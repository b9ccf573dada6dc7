package isowright.records;

import isowright.records.Intake.Oddity;
import java.time.LocalDateTime;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.apache.poi.ss.usermodel.DateUtil;
import org.apache.poi.xssf.model.SharedStrings;
import org.xml.sax.Attributes;
import org.xml.sax.SAXException;
import org.xml.sax.helpers.DefaultHandler;

/**
 * Hands the cells of a sheet on as they are parsed. The sheet's part is a list of {@code row}
 * elements of {@code c} elements, each with a type {@code t}, a style {@code s}, a formula {@code
 * f} and a stored value {@code v} (ECMA-376, part 1, section 18.3.1.4).
 */
final class SheetCells extends DefaultHandler {

  private static final NumberSyntax STORED =
      new NumberSyntax(new NumberFormat('.', Optional.empty()));

  private final Intake intake;
  private final SharedStrings strings;
  private final CellStyles styles;
  private final List<String> headings = new ArrayList<>();
  private boolean foundHeadings;
  private boolean inHeadings;
  private int row;
  private int column;
  private String type = "n";
  private int style;
  private boolean formula;
  private boolean anyValue;
  private boolean collecting;
  private final StringBuilder value = new StringBuilder();
  private final StringBuilder formulaText = new StringBuilder();
  private boolean inFormula;
  private boolean inPhonetic;

  SheetCells(Intake intake, SharedStrings strings, CellStyles styles) {
    this.intake = intake;
    this.strings = strings;
    this.styles = styles;
  }

  /** Carries a refusal out of the parser. */
  static final class Refused extends SAXException {
    private static final long serialVersionUID = 1L;
    private final transient RecordsRefused refusal;

    Refused(RecordsRefused refusal) {
      super(refusal);
      this.refusal = refusal;
    }

    RecordsRefused refusal() {
      return refusal;
    }
  }

  boolean foundHeadings() {
    return foundHeadings;
  }

  @Override
  public void startElement(String uri, String name, String qualified, Attributes attributes)
      throws SAXException {
    switch (name) {
      case "row" -> beginRow(attributes.getValue("r"));
      case "c" -> beginCell(attributes);
      case "v" -> {
        collecting = true;
        anyValue = true;
      }
      case "t" -> {
        collecting = type.equals("inlineStr") && !inPhonetic;
        anyValue |= collecting;
      }
      case "rPh" -> inPhonetic = true;
      case "f" -> {
        formula = true;
        inFormula = true;
      }
      default -> {}
    }
  }

  private void beginRow(String number) throws SAXException {
    row = number == null ? row + 1 : whole(number);
    column = -1;
    inHeadings = !foundHeadings;
    if (inHeadings) {
      headings.clear();
    } else {
      intake.beginRow(row);
    }
  }

  private void beginCell(Attributes attributes) throws SAXException {
    String reference = attributes.getValue("r");
    column = reference == null ? column + 1 : column(reference);
    String declared = attributes.getValue("t");
    type = declared == null ? "n" : declared;
    String styled = attributes.getValue("s");
    style = styled == null ? -1 : whole(styled);
    formula = false;
    anyValue = false;
    value.setLength(0);
    formulaText.setLength(0);
  }

  /** The column, from 0, of a reference such as BC17. */
  static int column(String reference) {
    int column = 0;
    for (int i = 0; i < reference.length(); i++) {
      char c = reference.charAt(i);
      if (c < 'A' || c > 'Z') {
        break;
      }
      column = 26 * column + (c - 'A' + 1);
    }
    return column - 1;
  }

  @Override
  public void characters(char[] text, int from, int length) {
    if (collecting) {
      value.append(text, from, length);
    } else if (inFormula) {
      formulaText.append(text, from, length);
    }
  }

  @Override
  public void endElement(String uri, String name, String qualified) throws SAXException {
    switch (name) {
      case "v", "t" -> collecting = false;
      case "f" -> inFormula = false;
      case "rPh" -> inPhonetic = false;
      case "c" -> endCell();
      case "row" -> endRow();
      default -> {}
    }
  }

  private void endCell() throws SAXException {
    if (!anyValue) {
      if (formula) {
        odd(Oddity.FORMULA_WITHOUT_VALUE, "=" + formulaText);
      }
      return;
    }
    switch (type) {
      case "s" -> text(shared(value.toString()));
      case "str", "inlineStr" -> text(value.toString());
      case "b" -> odd(Oddity.TRUTH_VALUE, value.toString().equals("1") ? "TRUE" : "FALSE");
      case "e" -> odd(Oddity.ERROR_VALUE, value.toString());
      case "d" -> text(value.toString());
      default -> number();
    }
  }

  private String shared(String index) throws SAXException {
    int at = whole(index);
    if (at < 0 || at >= strings.getUniqueCount()) {
      throw new SAXException("row " + row + " refers to text " + at + ", which is not there");
    }
    return strings.getItemAt(at).getString();
  }

  private int whole(String digits) throws SAXException {
    try {
      return Integer.parseInt(digits.strip());
    } catch (NumberFormatException e) {
      throw new SAXException("near row " + row + " stands \"" + digits + "\" for a number", e);
    }
  }

  private void text(String text) {
    if (inHeadings) {
      heading(text);
    } else {
      intake.text(column, text.toCharArray(), 0, text.length());
    }
  }

  private void odd(Oddity oddity, String shown) {
    if (inHeadings) {
      heading(shown);
    } else {
      intake.odd(column, oddity, shown);
    }
  }

  private void number() {
    char[] digits = value.toString().strip().toCharArray();
    if (digits.length == 0) {
      return;
    }
    double number = STORED.parse(digits, 0, digits.length);
    if (inHeadings) {
      heading(styles.asSeen(number, style));
      return;
    }
    if (styles.date(style) && DateUtil.isValidExcelDate(number)) {
      LocalDateTime date = DateUtil.getLocalDateTime(number, styles.from1904());
      if (date != null) {
        intake.date(column, date);
        return;
      }
    }
    int styled = style;
    intake.number(column, number, () -> styles.asSeen(number, styled));
  }

  private void heading(String text) {
    while (headings.size() <= column) {
      headings.add("");
    }
    headings.set(column, text.strip());
  }

  private void endRow() throws SAXException {
    if (!inHeadings) {
      // Cells at the end of a row may be left out of the file: the row is as long as the headings.
      intake.endRow(headings.size());
      return;
    }
    if (headings.stream().allMatch(String::isEmpty)) {
      return;
    }
    foundHeadings = true;
    inHeadings = false;
    try {
      intake.headings(row, List.copyOf(headings));
    } catch (RecordsRefused e) {
      throw new Refused(e);
    }
  }
}
