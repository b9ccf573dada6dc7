package isowright.report;

import isowright.study.PanelFindings;
import isowright.study.PanelFindings.Change;
import isowright.study.PanelFindings.Components;
import java.io.IOException;

/** What a fit found about plants and time, as it stands in the findings file. */
final class PanelJson {

  private PanelJson() {}

  static void write(JsonFile file, PanelFindings panel) throws IOException {
    file.whole("observations", panel.observations());
    file.text("observed", panel.observed());
    if (panel.components().isPresent()) {
      components(file, panel.components().get());
    } else {
      file.nothing("varianceComponents");
    }
    if (panel.change().isPresent()) {
      change(file, panel.change().get());
    } else {
      file.nothing("technicalChange");
    }
  }

  private static void components(JsonFile file, Components components) throws IOException {
    file.line(
        "varianceComponents",
        () -> {
          file.text("method", components.method());
          file.number("row", components.row());
          file.number("plant", components.plant());
          file.number("thetaLeast", components.leastShare());
          file.number("thetaMost", components.mostShare());
          file.truth("truncated", components.truncated());
        });
  }

  private static void change(JsonFile file, Change change) throws IOException {
    file.object(
        "technicalChange",
        () -> {
          file.text("unit", change.unit());
          file.list(
              "percent",
              change.rates(),
              true,
              rate -> {
                file.text("place", rate.place());
                file.text("when", rate.when());
                file.uncertain("technical change " + rate.when(), rate.percent());
              });
          file.list(
              "bias",
              change.biases(),
              true,
              bias -> {
                file.text("input", bias.input());
                file.uncertain("bias of technical change, " + bias.input(), bias.points());
                file.text("verdict", bias.verdict());
              });
          file.text("words", change.words());
        });
  }
}
