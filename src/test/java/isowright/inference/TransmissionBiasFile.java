package isowright.inference;

import isowright.records.Panel;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Locale;

/** Writes the invented plants that the reference script reads. */
final class TransmissionBiasFile {

  private static final Path FILE =
      Path.of("src/test/resources/reference/control-function-data.csv");

  private TransmissionBiasFile() {}

  public static void main(String[] arguments) throws IOException {
    Files.writeString(FILE, text());
  }

  /** 60 plants, 6 periods. */
  static Panel panel() {
    return TransmissionBias.draw(4, 60, 6);
  }

  static String text() {
    Panel panel = panel();
    StringBuilder text = new StringBuilder("plant,period,output,labour,machines,material\n");
    for (int r = 0; r < panel.rows(); r++) {
      text.append(
          String.format(
              Locale.ROOT,
              "%s,%s,%.17g,%.17g,%.17g,%.17g%n",
              panel.plants().get(panel.plantOf(r)),
              panel.periods().get(panel.rowPeriods().get(r)),
              panel.output().get(r),
              panel.quantities().get(0).get(r),
              panel.quantities().get(1).get(r),
              panel.further().get(2).get(r)));
    }
    return text.toString();
  }
}
