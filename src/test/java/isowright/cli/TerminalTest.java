package isowright.cli;

import static org.assertj.core.api.Assertions.assertThat;

import isowright.study.Progress;
import java.io.PrintWriter;
import java.io.StringWriter;
import java.util.Map;
import org.junit.jupiter.api.Test;

/** What is shown where: progress and bold type are for terminals that want them. */
class TerminalTest {

  @Test
  void whatATerminalCanShow() {
    assertThat(Terminal.of(true, Map.of("TERM", "xterm"))).isEqualTo(new Terminal(true, true));
    assertThat(Terminal.of(true, Map.of("NO_COLOR", "1"))).isEqualTo(new Terminal(true, false));
    // by the convention an empty value does not count
    assertThat(Terminal.of(true, Map.of("NO_COLOR", ""))).isEqualTo(new Terminal(true, true));
    assertThat(Terminal.of(true, Map.of("TERM", "dumb"))).isEqualTo(Terminal.NONE);
    assertThat(Terminal.of(false, Map.of())).isEqualTo(Terminal.NONE);
  }

  @Test
  void progressIsForPeopleWhoWatch() {
    PrintWriter err = new PrintWriter(new StringWriter());
    assertThat(ProgressLine.on(new Terminal(true, false), err, false))
        .isInstanceOf(ProgressLine.class);
    assertThat(ProgressLine.on(new Terminal(true, false), err, true)).isSameAs(Progress.SILENT);
    assertThat(ProgressLine.on(Terminal.NONE, err, false)).isSameAs(Progress.SILENT);
  }

  @Test
  void theLineIsRewrittenAndWiped() {
    StringWriter text = new StringWriter();
    ProgressLine line = new ProgressLine(new PrintWriter(text));
    line.stage("reading the records", 1, 4);
    line.stage("fitting", 3, 4);
    line.done();
    String[] shown = text.toString().split("\r", -1);
    assertThat(shown[1]).isEqualTo("[--------------------] 1/4 reading the records");
    assertThat(shown[2]).startsWith("[##########----------] 3/4 fitting").hasSameSizeAs(shown[1]);
    assertThat(shown[3]).isBlank();
    assertThat(text.toString()).doesNotContain("\n").endsWith("\r");
  }
}
