package isowright.records;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** A lag is a distance in time: a missing period leaves it unknown, whatever row stands before. */
class PeriodStepsTest {

  @TempDir Path folder;

  private Panel panel(String... plantsAndPeriods) throws IOException, RecordsRefused {
    StringBuilder text = new StringBuilder("plant,period,q,a,b,shift\n");
    for (int r = 0; r < plantsAndPeriods.length; r++) {
      text.append(plantsAndPeriods[r]).append(",1,2,3,").append(r % 2 == 0 ? "" : "-" + r);
      text.append('\n');
    }
    Path file = folder.resolve("rows.csv");
    Files.writeString(file, text);
    Roles roles =
        new Roles(
                Optional.of("plant"),
                Optional.of("period"),
                "q",
                Optional.empty(),
                List.of(
                    new Roles.Input("a", "a", Optional.empty(), Optional.empty(), Optional.empty()),
                    new Roles.Input(
                        "b", "b", Optional.empty(), Optional.empty(), Optional.empty())),
                List.of(),
                Optional.empty(),
                Optional.empty())
            .withFurther(List.of("shift"));
    return RecordsReader.read(new Source(file, Optional.empty(), Optional.empty()), roles, Keep.ALL)
        .panel();
  }

  @Test
  void yearsWithAGap() throws Exception {
    PeriodSteps steps =
        PeriodSteps.of(panel("A,2001", "A,2002", "A,2004", "A,2005", "B,2002", "B,2003"));
    assertThat(steps.step()).isEqualTo(1);
    assertThat(List.of(0, 1, 2, 3, 4, 5).stream().map(r -> steps.before(r, 1)))
        .containsExactly(-1, 0, -1, 2, -1, 4);
    assertThat(steps.before(2, 2)).isEqualTo(1);
    assertThat(steps.before(3, 3)).isEqualTo(1);
    assertThat(steps.before(3, 2)).isEqualTo(-1);
    assertThat(steps.before(3, 0)).isEqualTo(3);
  }

  @Test
  void everySecondYear() throws Exception {
    PeriodSteps steps = PeriodSteps.of(panel("A,2000", "A,2002", "A,2006"));
    assertThat(steps.step()).isEqualTo(2);
    assertThat(steps.before(1, 1)).isEqualTo(0);
    assertThat(steps.before(2, 1)).isEqualTo(-1);
    assertThat(steps.before(2, 2)).isEqualTo(1);
  }

  @Test
  void monthsOfAnyLength() throws Exception {
    String[] rows = new String[26];
    for (int m = 0; m < rows.length; m++) {
      rows[m] = "A," + (2019 + m / 12) + "-%02d-01".formatted(m % 12 + 1);
    }
    PeriodSteps steps = PeriodSteps.of(panel(rows));
    assertThat(steps.step()).isEqualTo(1 / 12.0);
    for (int m = 12; m < rows.length; m++) {
      assertThat(steps.before(m, 1)).isEqualTo(m - 1);
      assertThat(steps.before(m, 12)).isEqualTo(m - 12);
    }
  }

  @Test
  void aFurtherColumnMayBeBlankOrNegative() throws Exception {
    Panel panel = panel("A,2001", "A,2002");
    assertThat(panel.further()).hasSize(1);
    assertThat(panel.further().get(0).name()).isEqualTo("shift");
    assertThat(panel.further().get(0).get(0)).isNaN();
    assertThat(panel.further().get(0).get(1)).isEqualTo(-1);
    assertThat(PanelAudit.describe(panel).get(3).role()).isEqualTo("instrument or proxy");
  }
}
