package isowright.records;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import org.junit.jupiter.api.Test;

class PanelAuditTest {

  @Test
  void withinSharesOfTheStatesAreThePublishedOnes() throws RecordsRefused {
    // Within-state shares of the variance of logs, computed with R 4.2 on the data of Baltagi and
    // Pinnoi 1995 and rounded to a tenth of a percent.
    List<Description> columns = PanelAudit.describe(PublishedRecordsTest.states().panel());
    double rounding = 0.0005;
    assertThat(share(columns, "pcap")).isCloseTo(0.013, within(rounding));
    assertThat(share(columns, "pc")).isCloseTo(0.032, within(rounding));
    assertThat(share(columns, "emp")).isCloseTo(0.019, within(rounding));
  }

  private static double share(List<Description> columns, String name) {
    return columns.stream()
        .filter(c -> c.column().equals(name))
        .findFirst()
        .orElseThrow()
        .withinShare()
        .orElseThrow();
  }

  @Test
  void littleVariationWithinTheStatesIsSaidOfEachInput() throws RecordsRefused {
    List<Remark> remarks = PanelAudit.of(PublishedRecordsTest.states());
    assertThat(remarks).extracting(Remark::code).containsOnly("little-variation-within-plants");
    assertThat(remarks).hasSize(3);
    assertThat(remarks.get(0).message())
        .contains("pcap")
        .contains("quantity of public")
        .contains("1.3 %")
        .contains("5 %");
  }
}
