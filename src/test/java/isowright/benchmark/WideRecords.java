package isowright.benchmark;

import java.io.BufferedOutputStream;
import java.io.IOException;
import java.io.OutputStream;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Locale;
import java.util.SplittableRandom;

/**
 * A records file of many plants, drawn from a known CES technology: always the same bytes.
 *
 * <p>Columns {@code plant, year, output, labour, machines, energy, wage, rental, fuel_price}; ten
 * years a plant; inputs vary between plants by a factor of about five and within plants by about a
 * quarter; noise has standard deviation 0.1 in logs, plant productivity 0.2.
 */
final class WideRecords {

  static final int YEARS = 10;

  /** ρ of the technology behind the records: an elasticity of substitution of 0.7. */
  static final double RHO = 3.0 / 7;

  static final double SCALE = 1.03;
  private static final double[] SHARES = {0.45, 0.30, 0.25};
  private static final double[] USUAL = {900, 400, 2500};
  private static final String[] PRICES = {"31.50", "84.00", "10.20"};
  private static final byte[] HEADINGS =
      "plant,year,output,labour,machines,energy,wage,rental,fuel_price\n"
          .getBytes(StandardCharsets.US_ASCII);

  private final SplittableRandom random = new SplittableRandom(14);
  private final byte[] line = new byte[160];
  private int length;

  private WideRecords() {}

  /** Writes plants × {@link #YEARS} rows. */
  static void write(Path file, int plants) throws IOException {
    Files.createDirectories(file.toAbsolutePath().getParent());
    try (OutputStream out = new BufferedOutputStream(Files.newOutputStream(file), 1 << 20)) {
      out.write(HEADINGS);
      new WideRecords().writePlants(out, plants);
    }
  }

  private void writePlants(OutputStream out, int plants) throws IOException {
    double[] mean = new double[SHARES.length];
    for (int p = 0; p < plants; p++) {
      double size = 0.45 * normal();
      double productivity = 0.2 * normal() + 0.1 * size;
      for (int i = 0; i < mean.length; i++) {
        mean[i] = size + 0.15 * normal();
      }
      byte[] name = String.format(Locale.ROOT, "P%06d", p + 1).getBytes(StandardCharsets.US_ASCII);
      for (int t = 0; t < YEARS; t++) {
        row(name, 2015 + t, mean, productivity + 0.01 * t);
        out.write(line, 0, length);
      }
    }
  }

  private void row(byte[] name, int year, double[] mean, double productivity) {
    double[] z = new double[mean.length];
    double sum = 0;
    double level = 0.15 * normal();
    for (int i = 0; i < z.length; i++) {
      z[i] = mean[i] + level + 0.25 * normal();
      sum += SHARES[i] * Math.exp(-RHO * z[i]);
    }
    double logOutput = productivity - SCALE / RHO * Math.log(sum) + 0.1 * normal();
    length = 0;
    append(name);
    line[length++] = ',';
    append(year);
    line[length++] = ',';
    appendThousandths(500 * Math.exp(logOutput));
    for (int i = 0; i < z.length; i++) {
      line[length++] = ',';
      appendThousandths(USUAL[i] * Math.exp(z[i]));
    }
    for (String price : PRICES) {
      line[length++] = ',';
      append(price.getBytes(StandardCharsets.US_ASCII));
    }
    line[length++] = '\n';
  }

  /**
   * Nearly normal, mean 0 and variance 1: the sum of four uniform numbers, which needs no library
   * whose algorithm might change.
   */
  private double normal() {
    double sum =
        random.nextDouble() + random.nextDouble() + random.nextDouble() + random.nextDouble();
    return (sum - 2) * Math.sqrt(3);
  }

  private void append(byte[] text) {
    System.arraycopy(text, 0, line, length, text.length);
    length += text.length;
  }

  private void append(long number) {
    append(Long.toString(number).getBytes(StandardCharsets.US_ASCII));
  }

  private void appendThousandths(double value) {
    long thousandths = Math.round(value * 1000);
    append(thousandths / 1000);
    int rest = (int) (thousandths % 1000);
    line[length++] = '.';
    line[length++] = (byte) ('0' + rest / 100);
    line[length++] = (byte) ('0' + rest / 10 % 10);
    line[length++] = (byte) ('0' + rest % 10);
  }
}
