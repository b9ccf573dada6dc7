package isowright.report;

import isowright.report.Document.Block;
import isowright.report.Document.Cell;
import isowright.report.Document.Column;
import isowright.report.Document.Group;
import isowright.report.Document.Row;
import isowright.report.Document.Section;
import isowright.report.Document.Table;
import isowright.study.CostFindings.Fitted;
import isowright.study.CostFindings.Together;
import isowright.study.Figure;
import isowright.study.FitFindings.Pair;
import java.util.ArrayList;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.function.Function;

/** Several outputs made together: economies of scope and complementarity of costs. */
final class ScopeTable {

  private ScopeTable() {}

  static Optional<Section> of(List<Fitted> fits) {
    List<Fitted> several = fits.stream().filter(fit -> together(fit).isPresent()).toList();
    if (several.isEmpty()) {
      return Optional.empty();
    }
    List<Block> blocks = new ArrayList<>(List.of(table(several)));
    return Optional.of(new Section(CostsSection.ID + "-scope", "Outputs together", blocks));
  }

  private static Optional<Together> together(Fitted fit) {
    return fit.at().flatMap(at -> at.together());
  }

  private static Table table(List<Fitted> fits) {
    List<Row> scope = new ArrayList<>();
    scope.add(row("all outputs apart", fits, t -> t.scope()));
    names(fits, t -> t.byOutput().keySet())
        .forEach(
            name ->
                scope.add(
                    row(
                        name + " apart from the rest",
                        fits,
                        t -> Optional.ofNullable(t.byOutput().get(name)))));
    List<Row> slopes = new ArrayList<>();
    names(fits, t -> t.complementarity().stream().map(ScopeTable::words).toList())
        .forEach(
            name ->
                slopes.add(
                    row(
                        name,
                        fits,
                        t ->
                            t.complementarity().stream()
                                .filter(pair -> words(pair).equals(name))
                                .map(Pair::figure)
                                .findFirst())));
    List<Text> notes = new ArrayList<>();
    notes.add(
        Text.of(
            "Scope: by what share cost would rise if firms apart made the same, each with the fixed"
                + " costs. Complementarity: per cent change of the marginal cost of an output for a"
                + " per cent more of another; below zero, one makes the other cheaper. At the mean"
                + " of the records; intervals beneath."));
    for (Fitted fit : fits) {
      String note = together(fit).map(Together::note).orElse("");
      if (!note.isEmpty()) {
        notes.add(Text.of(Terms.technology(fit.technology()) + ": " + note));
      }
    }
    return new Table(
        "Several outputs made together",
        "Figure",
        fits.stream().map(f -> Column.ofNumbers(Terms.technology(f.technology()), "")).toList(),
        List.of(
            new Group(Optional.of("Economies of scope"), scope),
            new Group(Optional.of("Complementarity of costs"), slopes)),
        notes);
  }

  private static Set<String> names(
      List<Fitted> fits, Function<Together, java.util.Collection<String>> of) {
    Set<String> names = new LinkedHashSet<>();
    fits.forEach(fit -> together(fit).ifPresent(t -> names.addAll(of.apply(t))));
    return names;
  }

  private static String words(Pair pair) {
    return "marginal cost of " + pair.first() + " as " + pair.second() + " rises";
  }

  private static Row row(
      String name, List<Fitted> fits, Function<Together, Optional<Figure>> figure) {
    List<Cell> cells =
        fits.stream().map(fit -> Cells.figure(together(fit).flatMap(figure))).toList();
    return new Row(Text.of(name), cells);
  }
}
