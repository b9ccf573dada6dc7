package isowright.demo;

import isowright.demo.GlassworksGenerator.Row;
import java.io.ByteArrayInputStream;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.LocalDateTime;
import java.util.Date;
import java.util.List;
import java.util.Optional;
import java.util.stream.Collectors;
import java.util.zip.ZipEntry;
import java.util.zip.ZipInputStream;
import java.util.zip.ZipOutputStream;
import org.apache.poi.ss.usermodel.Cell;
import org.apache.poi.ss.usermodel.CellStyle;
import org.apache.poi.ss.usermodel.Font;
import org.apache.poi.ss.usermodel.Sheet;
import org.apache.poi.xssf.usermodel.XSSFWorkbook;

/** Writes the glassworks' rows as a CSV file and as a workbook with the same digits. */
final class GlassworksFiles {

  /** The columns, in the order of the files. */
  static final List<String> COLUMNS =
      List.of(
          "plant",
          "region",
          "year",
          "tonnes",
          "labour_hours",
          "machine_hours",
          "energy_gj",
          "wage",
          "machine_cost",
          "energy_price",
          "ppi",
          "filed_cost",
          "breakdown_rate",
          "furnace_age");

  /** Columns of text; all others hold numbers. */
  static final List<String> TEXT = List.of("plant", "region");

  private static final List<String> NOTES =
      List.of(
          "Records of 14 invented glassworks, 2012 to 2024. No such company exists.",
          "Drawn from known constants by a seeded generator; see README.md beside this file.",
          "Sheet plants: one row a plant and year, the same digits as glassworks.csv.",
          "Money is in EUR of the year; ppi is the producer price index, 2020 = 100.",
          "An empty cell is a value that was not filed.");

  private GlassworksFiles() {}

  static void write(List<Row> rows, Path folder) throws IOException {
    Files.createDirectories(folder);
    Files.writeString(folder.resolve("glassworks.csv"), csv(rows), StandardCharsets.UTF_8);
    ByteArrayOutputStream made = new ByteArrayOutputStream();
    try (XSSFWorkbook workbook = workbook(rows)) {
      workbook.write(made);
    }
    Files.write(folder.resolve("glassworks.xlsx"), withoutClock(made.toByteArray()));
  }

  /** The same archive with one fixed time on every entry, so that two runs give the same bytes. */
  private static byte[] withoutClock(byte[] archive) throws IOException {
    ByteArrayOutputStream out = new ByteArrayOutputStream();
    try (ZipInputStream from = new ZipInputStream(new ByteArrayInputStream(archive));
        ZipOutputStream to = new ZipOutputStream(out)) {
      for (ZipEntry entry = from.getNextEntry(); entry != null; entry = from.getNextEntry()) {
        ZipEntry copy = new ZipEntry(entry.getName());
        copy.setTimeLocal(LocalDateTime.of(2025, 1, 1, 0, 0));
        to.putNextEntry(copy);
        from.transferTo(to);
      }
    }
    return out.toByteArray();
  }

  static String csv(List<Row> rows) {
    StringBuilder text = new StringBuilder(String.join(",", COLUMNS)).append('\n');
    for (Row row : rows) {
      text.append(
              COLUMNS.stream()
                  .map(column -> row.cells().getOrDefault(column, ""))
                  .collect(Collectors.joining(",")))
          .append('\n');
    }
    return text.toString();
  }

  private static XSSFWorkbook workbook(List<Row> rows) {
    XSSFWorkbook workbook = new XSSFWorkbook();
    // Without a fixed date two runs would differ.
    var properties = workbook.getProperties().getCoreProperties();
    Optional<Date> date = Optional.of(new Date(1_735_689_600_000L));
    properties.setCreated(date);
    properties.setModified(date);
    properties.setCreator("Isowright demo generator");

    CellStyle heading = workbook.createCellStyle();
    Font bold = workbook.createFont();
    bold.setBold(true);
    heading.setFont(bold);

    Sheet plants = workbook.createSheet("plants");
    var top = plants.createRow(0);
    for (int c = 0; c < COLUMNS.size(); c++) {
      Cell cell = top.createCell(c);
      cell.setCellValue(COLUMNS.get(c));
      cell.setCellStyle(heading);
      plants.setColumnWidth(c, 15 * 256);
    }
    plants.createFreezePane(3, 1);
    for (int r = 0; r < rows.size(); r++) {
      fill(plants.createRow(r + 1), rows.get(r));
    }
    Sheet notes = workbook.createSheet("notes");
    for (int r = 0; r < NOTES.size(); r++) {
      notes.createRow(r).createCell(0).setCellValue(NOTES.get(r));
    }
    return workbook;
  }

  private static void fill(org.apache.poi.ss.usermodel.Row into, Row row) {
    for (int c = 0; c < COLUMNS.size(); c++) {
      String column = COLUMNS.get(c);
      String value = row.cells().getOrDefault(column, "");
      if (value.isEmpty()) {
        continue;
      }
      if (TEXT.contains(column)) {
        into.createCell(c).setCellValue(value);
      } else {
        into.createCell(c).setCellValue(Double.parseDouble(value));
      }
    }
  }
}
