package isowright.charts;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.awt.Color;
import java.util.List;
import org.junit.jupiter.api.Test;

/**
 * Colours by the formulas of WCAG 2.1 (relative luminance, contrast ratio) and of CIE 1976 (L*).
 */
class StyleTest {

  private static double luminance(Color colour) {
    double[] parts = {colour.getRed(), colour.getGreen(), colour.getBlue()};
    double[] weights = {0.2126, 0.7152, 0.0722};
    double sum = 0;
    for (int i = 0; i < 3; i++) {
      double part = parts[i] / 255;
      sum += weights[i] * (part <= 0.03928 ? part / 12.92 : Math.pow((part + 0.055) / 1.055, 2.4));
    }
    return sum;
  }

  private static double contrastOnPaper(Color colour) {
    return (luminance(Style.PAPER) + 0.05) / (luminance(colour) + 0.05);
  }

  private static double lightness(Color colour) {
    return 116 * Math.cbrt(luminance(colour)) - 16;
  }

  @Test
  void blackAndMiddleGreyAreAsTheFormulasHaveThem() {
    assertThat(contrastOnPaper(Color.BLACK)).isCloseTo(21, within(1e-12));
    // #777777 is the well-known grey just short of 4.5 to 1 (4.48); from memory
    assertThat(contrastOnPaper(new Color(0x777777))).isCloseTo(4.48, within(0.005));
  }

  @Test
  void textHasAContrastOfFourAndAHalf() {
    assertThat(List.of(Style.TEXT, Style.QUIET_TEXT))
        .allSatisfy(colour -> assertThat(contrastOnPaper(colour)).isGreaterThanOrEqualTo(4.5));
  }

  @Test
  void linesAndDotsHaveAContrastOfThree() {
    assertThat(List.of(Style.AXIS, Style.DEEP, Style.WARM, Style.SLATE))
        .allSatisfy(colour -> assertThat(contrastOnPaper(colour)).isGreaterThanOrEqualTo(3));
  }

  @Test
  void coloursOfDataAreApartInGrey() {
    // the comment on the colours states whole numbers: half a unit
    assertThat(lightness(Style.DEEP)).isCloseTo(24, within(0.5));
    assertThat(lightness(Style.WARM)).isCloseTo(48, within(0.5));
    assertThat(lightness(Style.SLATE)).isCloseTo(56, within(0.5));
  }
}
