package isowright.report;

import isowright.charts.Chart;
import isowright.report.Document.Block;
import isowright.report.Document.Column;
import isowright.report.Document.Group;
import isowright.report.Document.Notice;
import isowright.report.Document.Paragraph;
import isowright.report.Document.Row;
import isowright.report.Document.Section;
import isowright.report.Document.Table;
import isowright.report.Document.Weight;
import isowright.study.FitFindings.Curvature;
import isowright.study.FitFindings.Fitted;
import isowright.study.FitFindings.Given;
import isowright.study.FitFindings.Influential;
import isowright.study.FitFindings.Parameter;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * The technologies fitted: parameters, fit statistics, state, how well they fit, what is
 * influential.
 */
final class FitsSection {

  static final String ID = "technologies";

  /** So many rows of a long list are printed; the findings file has them all. */
  private static final int LONGEST_LIST = 40;

  private FitsSection() {}

  static Section of(Material material) {
    List<Fitted> fits = material.findings().fits();
    List<Block> blocks = new ArrayList<>();
    if (fits.isEmpty()) {
      blocks.add(Paragraph.of("No technology was fitted."));
    } else {
      blocks.add(
          Paragraph.of(
              "Each technology explains the logarithm of output. One column is one technology;"
                  + " standard errors stand in parentheses beneath."));
      blocks.add(FitTable.of(material));
      fits.forEach(fit -> states(fit, blocks));
      fits.forEach(
          fit ->
              blocks.addAll(Material.notices(Terms.technology(fit.technology()), fit.remarks())));
      intervals(material, blocks);
      fits.forEach(fit -> details(material, fit, blocks));
    }
    if (!material.findings().given().isEmpty()) {
      blocks.add(new Section(ID + "-given", "Technologies taken as known", given(material)));
    }
    return new Section(ID, "Technologies", blocks);
  }

  private static void states(Fitted fit, List<Block> blocks) {
    String name = Terms.technology(fit.technology());
    if (!fit.state().equals("estimated")) {
      blocks.add(
          new Notice(
              fit.usable() ? Weight.WARNING : Weight.ERROR,
              Text.strong(name + ": " + Terms.state(fit.state()) + ". ")
                  .then(Terms.stateMeaning(fit.state()))));
    }
  }

  private static void intervals(Material material, List<Block> blocks) {
    List<Group> groups = new ArrayList<>();
    for (Fitted fit : material.usable()) {
      List<Row> rows = new ArrayList<>();
      for (Parameter parameter : fit.parameters()) {
        rows.add(
            Row.of(
                Terms.parameter(parameter.name()),
                List.of(
                    Numbers.value(parameter.figure()),
                    Numbers.interval(parameter.figure()),
                    Double.isNaN(parameter.p())
                        ? "—"
                        : Numbers.p(parameter.p(), Phrases.level(material.confidence())))));
      }
      groups.add(new Group(Optional.of(Terms.technology(fit.technology())), rows));
    }
    if (!groups.isEmpty()) {
      blocks.add(
          new Table(
              "Parameters with their intervals",
              "Parameter",
              List.of(
                  Column.ofNumbers("Value", ""),
                  Column.ofNumbers(Phrases.sentence(material.interval()), ""),
                  Column.ofNumbers("Against zero", "")),
              groups,
              List.of(
                  Text.of(
                      "The last column is the p-value of the null that the parameter is zero, which is"
                          + " not always a question of interest."))));
    }
  }

  private static void details(Material material, Fitted fit, List<Block> blocks) {
    String name = Terms.technology(fit.technology());
    List<Block> inside = new ArrayList<>();
    fit.curvatures().forEach(curvature -> curvature(material, curvature, inside));
    inside.addAll(material.drawings(Chart.Kind.PROFILE, fit.technology()));
    fit.smearing()
        .ifPresent(
            s ->
                inside.add(
                    Paragraph.of(
                        "Predicted logs are turned back into output with the smearing factor "
                            + Numbers.significant(s, 5)
                            + ", the mean of the exponentiated residuals.")));
    inside.addAll(material.drawings(Chart.Kind.ACTUAL_PREDICTED, fit.technology()));
    inside.addAll(material.drawings(Chart.Kind.RESIDUALS, fit.technology()));
    influence(fit, inside);
    plantLevels(fit, inside);
    if (!inside.isEmpty()) {
      blocks.add(new Section(ID + "-" + fit.technology(), name + ": how well it fits", inside));
    }
  }

  private static void curvature(Material material, Curvature curvature, List<Block> blocks) {
    String words = Phrases.sentence(curvature.words());
    String interval =
        Numbers.positiveInterval(curvature.substitutionLow(), curvature.substitutionHigh());
    boolean interior = curvature.state().equals("interior");
    Text text =
        Text.of(words + (words.endsWith(".") ? " " : ". "))
            .then(
                "The "
                    + Numbers.level(material.confidence())
                    + " interval of the elasticity of substitution by the profile is "
                    + interval
                    + ".");
    blocks.add(interior ? new Paragraph(text) : new Notice(Weight.WARNING, text));
  }

  private static void influence(Fitted fit, List<Block> blocks) {
    if (fit.influence().isEmpty()) {
      return;
    }
    List<Row> rows = new ArrayList<>();
    for (Influential row : fit.influence()) {
      if (rows.size() < LONGEST_LIST) {
        rows.add(
            Row.of(
                String.valueOf(row.row()),
                List.of(
                    row.plant(),
                    row.period(),
                    Numbers.significant(row.leverage(), 3),
                    Numbers.significant(row.cook(), 3))));
      }
    }
    blocks.add(
        new Table(
            "Most influential rows, " + Terms.technology(fit.technology()),
            "Row in the file",
            List.of(
                Column.ofWords("Plant"),
                Column.ofWords("Period"),
                Column.ofNumbers("Leverage", ""),
                Column.ofNumbers("Cook’s distance", "")),
            List.of(Group.of(rows)),
            List.of()));
  }

  private static void plantLevels(Fitted fit, List<Block> blocks) {
    if (fit.plantLevels().isEmpty()) {
      return;
    }
    List<Row> rows = new ArrayList<>();
    for (Map.Entry<String, Double> level : fit.plantLevels().entrySet()) {
      if (rows.size() < LONGEST_LIST) {
        rows.add(Row.of(level.getKey(), List.of(Numbers.significant(level.getValue(), 3))));
      }
    }
    int left = fit.plantLevels().size() - rows.size();
    blocks.add(
        new Table(
            "Level of each plant, " + Terms.technology(fit.technology()),
            "Plant",
            List.of(Column.ofNumbers("Log output relative to the typical plant", "")),
            List.of(Group.of(rows)),
            left == 0
                ? List.of(Text.of(LEVELS))
                : List.of(
                    Text.of(
                        LEVELS
                            + " "
                            + Phrases.sentence(Phrases.count(left, "plant"))
                            + " more in the findings file."))));
  }

  private static final String LEVELS =
      "At equal inputs. What keeps a plant above or below the typical one is not known from this:"
          + " product, site and age count as well as management.";

  private static List<Block> given(Material material) {
    List<Group> groups = new ArrayList<>();
    List<Block> blocks = new ArrayList<>();
    for (Given given : material.findings().given()) {
      List<Row> rows = new ArrayList<>();
      given
          .parameters()
          .forEach(
              (name, value) ->
                  rows.add(Row.of(Terms.parameter(name), List.of(Numbers.amount(value)))));
      groups.add(
          new Group(Optional.of(given.name() + ", " + Terms.technology(given.technology())), rows));
    }
    blocks.add(
        Paragraph.of(
            "These were stated in the study and not estimated from the records; no uncertainty is"
                + " known for them."));
    blocks.add(
        new Table(
            "Parameters as stated",
            "Parameter",
            List.of(Column.ofNumbers("Value", "")),
            groups,
            List.of()));
    material
        .findings()
        .given()
        .forEach(given -> blocks.addAll(Material.notices(given.name(), given.remarks())));
    return blocks;
  }
}
