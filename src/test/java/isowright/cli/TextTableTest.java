package isowright.cli;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.util.List;
import org.junit.jupiter.api.Test;

/** Tables line up, words to the left and numbers to the right. */
class TextTableTest {

  @Test
  void linesUp() {
    TextTable table = new TextTable(1, "what", "how much");
    table.row("σ", "1.25");
    table.row("output", "12,000");
    assertThat(table.lines("> "))
        .containsExactly("> what    how much", "> σ           1.25", "> output    12,000");
  }

  @Test
  void aShortRowIsADefect() {
    TextTable table = new TextTable(1, "a", "b");
    assertThatThrownBy(() -> table.row("a")).isInstanceOf(IllegalArgumentException.class);
  }

  @Test
  void remarksAreCounted() {
    assertThat(RemarkCounts.words(List.of("note", "error", "note", "warning", "error", "error")))
        .isEqualTo("3 errors, 1 warning, 2 notes");
    assertThat(RemarkCounts.words(List.of())).isEqualTo("none");
  }
}
