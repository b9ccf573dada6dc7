package isowright.records;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.BufferedWriter;
import java.io.File;
import java.io.IOException;
import java.lang.reflect.Method;
import java.net.URL;
import java.net.URLClassLoader;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/**
 * A hundred thousand rows are read with little memory, and text files without the workbook reader.
 */
class LargeRecordsTest {

  private static final int PLANTS = 5000;
  private static final int PERIODS = 20;

  @TempDir private Path folder;

  private Source large() throws IOException {
    Path file = folder.resolve("large.csv");
    Random random = new Random(1);
    try (BufferedWriter out = Files.newBufferedWriter(file)) {
      out.write(Glassworks.HEADINGS + "\n");
      for (int t = 0; t < PERIODS; t++) {
        for (int p = 0; p < PLANTS; p++) {
          out.write(
              String.format(
                  Locale.ROOT,
                  "P%05d,%d,%d.25,4100,30.25,2000,%d,7,%d,290000\n",
                  p,
                  2000 + t,
                  1 + random.nextInt(100_000),
                  100_000 + p,
                  100 + t));
        }
      }
    }
    return new Source(file, Optional.empty(), Optional.empty());
  }

  @Test
  void aHundredThousandRowsMakeFewObjects() throws Exception {
    Source source = large();
    RecordsReader.read(source, Glassworks.roles(), Keep.ALL); // loads the classes
    com.sun.management.ThreadMXBean threads =
        (com.sun.management.ThreadMXBean) java.lang.management.ManagementFactory.getThreadMXBean();
    long before = threads.getCurrentThreadAllocatedBytes();
    Panel panel = RecordsReader.read(source, Glassworks.roles(), Keep.ALL).panel();
    long allocated = threads.getCurrentThreadAllocatedBytes() - before;
    int rows = PLANTS * PERIODS;
    assertThat(panel.rows()).isEqualTo(rows);
    assertThat(panel.plants()).hasSize(PLANTS).startsWith("P00000", "P00001");
    assertThat(panel.fileRows().get(1)).isEqualTo(2 + PLANTS);
    // Eight columns of numbers, three logs and a price take 96 bytes a row in the panel and growing
    // arrays about three times the 64 bytes of what is stored; a string for each of the ten cells
    // alone would take 560.
    assertThat(allocated / rows).isLessThan(450);
  }

  @Test
  void textIsReadWithoutLoadingTheWorkbookReader() throws Exception {
    Source source = Glassworks.write(folder, "glass.csv", Glassworks.csv());
    List<URL> path = new ArrayList<>();
    for (String entry : System.getProperty("java.class.path").split(File.pathSeparator)) {
      path.add(Path.of(entry).toUri().toURL());
    }
    List<String> loaded = new ArrayList<>();
    try (URLClassLoader loader =
        new URLClassLoader(path.toArray(new URL[0]), ClassLoader.getPlatformClassLoader()) {
          @Override
          protected Class<?> findClass(String name) throws ClassNotFoundException {
            loaded.add(name);
            return super.findClass(name);
          }
        }) {
      Method read =
          loader.loadClass(Reader.class.getName()).getDeclaredMethod("read", String.class);
      assertThat(read.invoke(null, source.file().toString())).isEqualTo(6);
    }
    assertThat(loaded).anyMatch(name -> name.startsWith("de.siegmar.fastcsv"));
    assertThat(loaded).noneMatch(name -> name.startsWith("org.apache.poi"));
    // Creating a Tablesaw table scans the class path; its columns alone do not.
    assertThat(loaded).doesNotContain("tech.tablesaw.api.Table");
  }

  /** Called through another class loader, so that what it loads can be seen. */
  public static final class Reader {
    private Reader() {}

    /** The number of rows read. */
    public static int read(String file) throws RecordsRefused {
      Source source = new Source(Path.of(file), Optional.empty(), Optional.empty());
      return RecordsReader.read(source, Glassworks.allRoles(), Keep.ALL).panel().rows();
    }
  }
}
