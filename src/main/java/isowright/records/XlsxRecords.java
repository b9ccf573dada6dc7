package isowright.records;

import java.io.IOException;
import java.io.InputStream;
import java.nio.file.Files;
import java.security.DigestInputStream;
import java.security.MessageDigest;
import java.util.ArrayList;
import java.util.HexFormat;
import java.util.Iterator;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Set;
import org.apache.poi.EmptyFileException;
import org.apache.poi.UnsupportedFileFormatException;
import org.apache.poi.ooxml.POIXMLException;
import org.apache.poi.openxml4j.exceptions.OpenXML4JException;
import org.apache.poi.openxml4j.exceptions.OpenXML4JRuntimeException;
import org.apache.poi.openxml4j.opc.OPCPackage;
import org.apache.poi.openxml4j.opc.PackageAccess;
import org.apache.poi.openxml4j.opc.PackagePart;
import org.apache.poi.openxml4j.opc.PackageRelationship;
import org.apache.poi.openxml4j.opc.PackageRelationshipTypes;
import org.apache.poi.util.XMLHelper;
import org.apache.poi.xssf.eventusermodel.ReadOnlySharedStringsTable;
import org.apache.poi.xssf.eventusermodel.XSSFReader;
import org.xml.sax.Attributes;
import org.xml.sax.InputSource;
import org.xml.sax.SAXException;
import org.xml.sax.XMLReader;
import org.xml.sax.helpers.DefaultHandler;

/**
 * Reads the cells of one sheet of a workbook as a stream, so that memory does not grow with the
 * sheet. The file is opened for reading only and never written.
 */
final class XlsxRecords implements AutoCloseable {

  private final Source source;
  private final Place place;
  private final OPCPackage archive;
  private final XSSFReader reader;
  private final Outline outline;
  private final String sheet;
  private final String sha256;

  /**
   * Opens the workbook and finds the sheet.
   *
   * @throws RecordsRefused where the file is no readable workbook, or has no such sheet
   */
  XlsxRecords(Source source, Place place) throws RecordsRefused, IOException {
    this.source = source;
    this.place = place;
    Refusals.ifNotWorkbook(source.file(), place);
    this.sha256 = hash();
    try {
      archive = OPCPackage.open(source.file().toFile(), PackageAccess.READ);
    } catch (OpenXML4JException
        | OpenXML4JRuntimeException
        | POIXMLException
        | UnsupportedFileFormatException
        | EmptyFileException e) {
      throw Refusals.damagedWorkbook(place);
    }
    boolean opened = false;
    try {
      ifNoWorkbookInside();
      reader = new XSSFReader(archive);
      outline = outline();
      sheet = chosen();
      opened = true;
    } catch (OpenXML4JException | OpenXML4JRuntimeException | POIXMLException | SAXException e) {
      throw Refusals.damagedWorkbook(place);
    } finally {
      if (!opened) {
        archive.revert();
      }
    }
  }

  /** An archive of parts may be a text document, or a workbook cut short. */
  private void ifNoWorkbookInside() throws RecordsRefused {
    for (PackageRelationship main :
        archive.getRelationshipsByType(PackageRelationshipTypes.CORE_DOCUMENT)) {
      PackagePart part = archive.getPart(main);
      if (part != null && part.getContentType().matches(".*(spreadsheetml|ms-excel).*")) {
        return;
      }
    }
    throw Refusals.of(
        "damaged-workbook",
        "%s has no workbook in it that can be read: it is another document, or damaged. Open it in a spreadsheet program and save it as .xlsx (Excel workbook)."
            .formatted(place.file()));
  }

  private String hash() throws IOException {
    MessageDigest digest = Refusals.sha256();
    try (InputStream in = new DigestInputStream(Files.newInputStream(source.file()), digest)) {
      in.transferTo(java.io.OutputStream.nullOutputStream());
    }
    return HexFormat.of().formatHex(digest.digest());
  }

  private Outline outline() throws IOException, OpenXML4JException, SAXException {
    Outline found = new Outline();
    try (InputStream in = reader.getWorkbookData()) {
      parse(in, found);
    }
    Iterator<InputStream> sheets = reader.getSheetsData();
    while (sheets.hasNext()) {
      try (InputStream in = sheets.next()) {
        found.sheets.add(((XSSFReader.SheetIterator) sheets).getSheetName());
      }
    }
    return found;
  }

  private String chosen() throws RecordsRefused {
    if (outline.sheets.isEmpty()) {
      throw Refusals.of(
          "no-sheet", "%s has no sheet of cells. Save the records again.".formatted(place.file()));
    }
    if (source.sheet().isEmpty()) {
      return outline.sheets.iterator().next();
    }
    String declared = source.sheet().get();
    for (String name : outline.sheets) {
      if (name.equalsIgnoreCase(declared)) {
        return name;
      }
    }
    throw Refusals.of(
        "no-such-sheet",
        "%s has no sheet \"%s\".%s Its sheets are \"%s\". Correct records.sheet."
            .formatted(
                place.file(),
                Shown.shortened(declared),
                Nearest.word(declared, outline.sheets)
                    .map(n -> " The nearest is \"" + n + "\".")
                    .orElse(""),
                String.join("\", \"", outline.sheets)));
  }

  /** Reads the whole sheet into an intake. */
  <I extends Intake> I read(I intake) throws RecordsRefused, IOException {
    try {
      SheetCells cells =
          new SheetCells(
              intake,
              new ReadOnlySharedStringsTable(archive),
              new CellStyles(reader.getStylesTable(), outline.from1904));
      Iterator<InputStream> sheets = reader.getSheetsData();
      while (sheets.hasNext()) {
        try (InputStream in = sheets.next()) {
          if (((XSSFReader.SheetIterator) sheets).getSheetName().equals(sheet)) {
            parse(in, cells);
            break;
          }
        }
      }
      if (!cells.foundHeadings()) {
        throw Refusals.nothingIn(place.onSheet(sheet));
      }
      return intake;
    } catch (SheetCells.Refused e) {
      throw e.refusal();
    } catch (OpenXML4JException | OpenXML4JRuntimeException | POIXMLException | SAXException e) {
      throw Refusals.damagedWorkbook(place);
    }
  }

  private static void parse(InputStream in, DefaultHandler handler)
      throws IOException, SAXException {
    XMLReader parser;
    try {
      // Set up by POI so that no document type is loaded and no entity expanded.
      parser = XMLHelper.newXMLReader();
    } catch (javax.xml.parsers.ParserConfigurationException e) {
      throw new IllegalStateException("every Java platform has an XML parser", e);
    }
    parser.setContentHandler(handler);
    parser.parse(new InputSource(in));
  }

  /** What the workbook's own part says. */
  private static final class Outline extends DefaultHandler {
    private final Set<String> sheets = new LinkedHashSet<>();
    private boolean from1904;

    @Override
    public void startElement(String uri, String name, String qualified, Attributes attributes) {
      if (name.equals("workbookPr")) {
        String value = attributes.getValue("date1904");
        from1904 = "1".equals(value) || "true".equals(value);
      }
    }
  }

  String sheet() {
    return sheet;
  }

  List<String> sheets() {
    return new ArrayList<>(outline.sheets);
  }

  String sha256() {
    return sha256;
  }

  /** Adds how the file was read. */
  void facts(Map<String, String> facts) {
    int all = outline.sheets.size();
    facts.put(
        "sheet",
        source.sheet().isPresent()
            ? "\"%s\" (declared)".formatted(sheet)
            : "\"%s\" (the first of %d)".formatted(sheet, all));
    facts.put("numbers", "as stored in the workbook; formulas by their stored value");
    if (outline.from1904) {
      facts.put("dates", "counted from 1904 (said by the workbook)");
    }
  }

  @Override
  public void close() {
    archive.revert();
  }
}
