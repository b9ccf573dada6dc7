package isowright.handover;

import isowright.charts.Chart;
import java.io.ByteArrayInputStream;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.ByteBuffer;
import org.apache.poi.openxml4j.exceptions.InvalidFormatException;
import org.apache.poi.util.Units;
import org.apache.poi.xwpf.usermodel.Document;
import org.apache.poi.xwpf.usermodel.XWPFParagraph;
import org.apache.poi.xwpf.usermodel.XWPFPicture;

/** A chart as a picture of a paragraph, with its text alternative. */
final class WordPicture {

  /** Where width and height stand in a PNG file: after signature, length and the word IHDR. */
  private static final int SIZE_AT = 16;

  private static final double WIDEST_POINTS = WordReport.TEXT_WIDTH / 20.0;
  private static final double TALLEST_POINTS = 330;

  private WordPicture() {}

  static void write(XWPFParagraph line, Chart chart) {
    byte[] png = chart.png().get();
    ByteBuffer size = ByteBuffer.wrap(png);
    double width = size.getInt(SIZE_AT);
    double height = size.getInt(SIZE_AT + Integer.BYTES);
    double scale = Math.min(WIDEST_POINTS / width, TALLEST_POINTS / height);
    try {
      XWPFPicture picture =
          line.createRun()
              .addPicture(
                  new ByteArrayInputStream(png),
                  Document.PICTURE_TYPE_PNG,
                  chart.name() + ".png",
                  Units.toEMU(width * scale),
                  Units.toEMU(height * scale));
      picture.getCTPicture().getNvPicPr().getCNvPr().setDescr(chart.alternative());
      line.getRuns()
          .get(line.getRuns().size() - 1)
          .getCTR()
          .getDrawingArray(0)
          .getInlineArray(0)
          .getDocPr()
          .setDescr(chart.alternative());
    } catch (InvalidFormatException | IOException e) {
      throw new UncheckedIOException(new IOException("a picture could not be put in", e));
    }
  }
}
