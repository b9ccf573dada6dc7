package isowright.report;

import static org.assertj.core.api.Assertions.assertThat;

import isowright.study.Findings;
import isowright.study.FindingsFixture;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Map;
import org.junit.jupiter.api.Test;

/** Writes the reports of the invented studies to {@code target/reports}, to be looked at. */
class ReportLookTest {

  @Test
  void writesEveryReport() throws IOException {
    Path into = Files.createDirectories(Path.of("target/reports"));
    Map<String, Findings> all =
        Map.of(
            "glassworks", FindingsFixture.glassworks(),
            "markup", FindingsFixture.withMarkup(),
            "troubled", FindingsFixture.troubled(),
            "given", FindingsFixture.givenOnly());
    for (Map.Entry<String, Findings> entry : all.entrySet()) {
      Findings findings = entry.getValue();
      Path html = into.resolve(entry.getKey() + ".html");
      Files.writeString(html, HtmlReport.write(findings, ChartsFixture.of(findings)));
      Files.write(into.resolve(entry.getKey() + ".findings.json"), FindingsJson.write(findings));
      Files.write(
          into.resolve(entry.getKey() + ".technology.json"), TechnologyJson.write(findings));
      assertThat(Files.size(html)).isGreaterThan(10_000);
    }
  }
}
