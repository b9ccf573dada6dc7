package isowright.records;

import java.io.IOException;
import java.nio.charset.Charset;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;

/** Invented records of glassworks, their roles, and files to read them from. */
final class Glassworks {

  static final String HEADINGS =
      "plant,year,tonnes,labour_hours,wage,machine_hours,machine_cost,age,ppi,filed_cost";

  /** Two plants in three years, every cell filled. */
  static final List<String> ROWS =
      List.of(
          "Birch,2021,1000.5,4100,30.25,2000,160000,7,100,290000",
          "Birch,2022,1100,4300,31,2100,172200,8,104,310000",
          "Birch,2023,1150.25,4350,32.5,2150,180600,9,110,325000",
          "Alder,2021,520,2500,28.5,950,77900,3,100,151000",
          "Alder,2022,560,2550,29,990,82170,4,104,158000",
          "Alder,2023,600,2620,30.5,1010,86860,5,110,170000");

  private Glassworks() {}

  /** Plant, period, output, two inputs (one with price, one with spending), filed cost. */
  static Roles roles() {
    return roles(List.of(), Optional.empty());
  }

  static Roles roles(List<Roles.Control> controls, Optional<Roles.Deflator> deflator) {
    return new Roles(
        Optional.of("plant"),
        Optional.of("year"),
        "tonnes",
        Optional.of("t"),
        List.of(
            new Roles.Input(
                "labour", "labour_hours", Optional.of("wage"), Optional.empty(), Optional.of("h")),
            new Roles.Input(
                "machines",
                "machine_hours",
                Optional.empty(),
                Optional.of("machine_cost"),
                Optional.of("h"))),
        controls,
        deflator,
        Optional.of("filed_cost"));
  }

  /** The roles with the control in logs and the deflator, so that every column is used. */
  static Roles allRoles() {
    return roles(
        List.of(new Roles.Control("age", true)), Optional.of(new Roles.Deflator("ppi", "2021")));
  }

  static String csv() {
    return HEADINGS + "\n" + String.join("\n", ROWS) + "\n";
  }

  /** The file with the cell of a row (1 for the first below the headings) replaced. */
  static String csvWith(int row, String heading, String cell) {
    String[] lines = csv().split("\n");
    List<String> headings = List.of(HEADINGS.split(","));
    String[] cells = lines[row].split(",");
    cells[headings.indexOf(heading)] = cell;
    lines[row] = String.join(",", cells);
    return String.join("\n", lines) + "\n";
  }

  static Source write(Path folder, String name, String text) throws IOException {
    return write(folder, name, text, StandardCharsets.UTF_8);
  }

  static Source write(Path folder, String name, String text, Charset charset) throws IOException {
    return write(folder, name, text.getBytes(charset));
  }

  static Source write(Path folder, String name, byte[] bytes) throws IOException {
    Path file = folder.resolve(name);
    Files.write(file, bytes);
    return new Source(file, Optional.empty(), Optional.empty());
  }

  static Source declaring(Source source, char decimal, Character... group) {
    Optional<Character> mark = group.length == 0 ? Optional.empty() : Optional.of(group[0]);
    return new Source(source.file(), source.sheet(), Optional.of(new NumberFormat(decimal, mark)));
  }

  static Reading read(Path folder, String csv) throws IOException, RecordsRefused {
    return RecordsReader.read(write(folder, "glass.csv", csv), allRoles(), Keep.ALL);
  }
}
