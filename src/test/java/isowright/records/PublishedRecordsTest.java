package isowright.records;

import static org.assertj.core.api.Assertions.assertThat;

import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;

/** Published open data are read as they are. */
class PublishedRecordsTest {

  private static final Path PUBLISHED = Path.of("src/test/resources/published");

  /** 48 US states, 1970 to 1986: Munnell 1990; Baltagi and Pinnoi 1995. */
  static Reading states() throws RecordsRefused {
    Roles roles =
        new Roles(
            Optional.of("state"),
            Optional.of("year"),
            "gsp",
            Optional.empty(),
            List.of(input("public", "pcap"), input("private", "pc"), input("labour", "emp")),
            List.of(new Roles.Control("unemp", false)),
            Optional.empty(),
            Optional.empty());
    return RecordsReader.read(
        new Source(
            PUBLISHED.resolve("us-states-public-capital.csv"), Optional.empty(), Optional.empty()),
        roles,
        Keep.ALL);
  }

  private static Roles.Input input(String name, String quantity) {
    return new Roles.Input(name, quantity, Optional.empty(), Optional.empty(), Optional.empty());
  }

  @Test
  void statesBecomeABalancedPanel() throws RecordsRefused {
    Reading reading = states();
    Panel panel = reading.panel();
    assertThat(reading.fileRows()).isEqualTo(816);
    assertThat(panel.rows()).isEqualTo(816);
    assertThat(panel.plants()).hasSize(48).startsWith("ALABAMA", "ARIZONA");
    assertThat(panel.periods()).hasSize(17).startsWith("1970").endsWith("1986");
    assertThat(panel.periodNumbers().get(0)).isEqualTo(1970.0);
    assertThat(panel.plantStart(1)).isEqualTo(17);
    assertThat(panel.plantEnd(47)).isEqualTo(816);
    // The first two rows of the file.
    assertThat(panel.output().get(0)).isEqualTo(28418);
    assertThat(panel.quantities().get(0).get(1)).isEqualTo(15501.94);
    assertThat(panel.controls().get(0).get(1)).isEqualTo(5.2);
    assertThat(panel.logQuantities().get(2).get(0)).isEqualTo(Math.log(1010.5));
    assertThat(panel.fileRows().get(0)).isEqualTo(2);
    assertThat(panel.prices()).allMatch(Optional::isEmpty);
    assertThat(reading.remarks()).isEmpty();
    assertThat(reading.setAside()).isEmpty();
    assertThat(reading.sha256()).hasSize(64);
  }
}
