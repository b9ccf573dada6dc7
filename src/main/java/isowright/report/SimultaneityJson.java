package isowright.report;

import isowright.study.SimultaneityFindings;
import java.io.IOException;
import java.util.List;
import java.util.Optional;

/** What was expected before fitting, as it stands in the findings file. */
final class SimultaneityJson {

  private SimultaneityJson() {}

  static void write(JsonFile file, SimultaneityFindings found) throws IOException {
    file.text("free", found.free());
    file.text("expectation", found.expectation());
    file.text("treatment", found.treatment());
    file.list(
        "inputs",
        found.inputs(),
        false,
        input -> {
          file.text("input", input.name());
          file.text("direction", input.direction());
          number(file, "perFree", input.perFree());
          number(file, "withinShare", input.withinShare());
          file.text("shifted", input.shifted());
          file.text("words", input.words());
          number(file, "priceSpread", input.priceSpread());
          number(file, "priceShare", input.priceShare());
          number(file, "correlation", input.correlation());
          if (input.response().isPresent()) {
            file.figure("response", input.response());
          }
          number(file, "p", input.p());
        });
    file.remarks("remarks", List.of());
  }

  private static void number(JsonFile file, String key, Optional<Double> value) throws IOException {
    if (value.isPresent() && Double.isFinite(value.get())) {
      file.number(key, value.get());
    }
  }
}
