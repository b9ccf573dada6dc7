package isowright.records;

import isowright.records.Remark.Severity;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.Collections;
import java.util.HashMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.stream.Collectors;

/** What follows when every row of a file has been taken in: a refusal, or the reading. */
final class Conclusion {

  private Conclusion() {}

  /** The reading, or the refusal with every error of the file. */
  static Reading of(
      Place place,
      Roles roles,
      Slots slots,
      Money money,
      RowRules rules,
      String sha256,
      Map<String, String> facts,
      List<Remark> remarks)
      throws RecordsRefused {
    List<Remark> unknownPlants = rules.kept().unknownPlants(place, rules.plants().texts());
    if (!unknownPlants.isEmpty()) {
      throw new RecordsRefused(unknownPlants);
    }
    if (rules.rows() == 0) {
      throw Refusals.noRows(place);
    }
    PanelAssembly assembly = new PanelAssembly(roles, slots, rules.store());
    mixedPeriods(place, slots, rules);
    if (roles.plant().isPresent() && roles.period().isPresent()) {
      duplicates(place, assembly, rules);
    }
    rules.complaints().refuseIfAny(place);
    if (rules.store().rows() == 0) {
      throw nothingLeft(place, rules);
    }
    nothingUsed(place, roles, slots, rules.store());
    List<Remark> all = new ArrayList<>(remarks);
    Optional<Double> base = money.baseDeflator(place, slots, rules.deflator(), all);
    all.addAll(rules.setAside().remarks(place));
    unknownMoney(place, slots, rules.store(), all);
    alikePlants(place, roles, rules.plants().texts(), all);
    return new Reading(
        assembly.panel(rules.plants().texts(), base),
        sha256,
        rules.rows(),
        Collections.unmodifiableMap(new LinkedHashMap<>(facts)),
        rules.setAside().all(),
        all);
  }

  private static void mixedPeriods(Place place, Slots slots, RowRules rules) {
    int[] firstRow = {-1, -1, -1};
    for (int r = 0; r < rules.store().rows() && slots.period().isPresent(); r++) {
      int kind = Periods.kind(rules.store().period(r));
      if (firstRow[kind] < 0) {
        firstRow[kind] = r;
      }
    }
    int[] rows = Arrays.stream(firstRow).filter(r -> r >= 0).sorted().toArray();
    if (rows.length < 2) {
      return;
    }
    String examples =
        Arrays.stream(rows)
            .mapToObj(
                r ->
                    "\"%s\" in row %d"
                        .formatted(Periods.text(rules.store().period(r)), rules.store().fileRow(r)))
            .collect(Collectors.joining(", "));
    Slot slot = slots.get(slots.period().orElseThrow());
    rules
        .complaints()
        .add(
            slot.words(),
            rules.store().fileRow(0),
            () ->
                new Remark(
                    Severity.ERROR,
                    "mixed-periods",
                    "%s, %s: found periods of different kinds: %s. Write every period in the same way."
                        .formatted(place.words(), slot.words(), examples),
                    Arrays.stream(rows).map(rules.store()::fileRow).boxed().toList()));
  }

  private static void duplicates(Place place, PanelAssembly assembly, RowRules rules) {
    for (int[] run : assembly.duplicates()) {
      List<Integer> fileRows = new ArrayList<>();
      for (int r = run[0]; r < run[1]; r++) {
        fileRows.add(assembly.fileRow(r));
      }
      String plant = rules.plants().text(assembly.plantCode(run[0]));
      rules
          .complaints()
          .add(
              "rows for the same plant and period",
              fileRows.get(0),
              () ->
                  new Remark(
                      Severity.ERROR,
                      "duplicate-period",
                      "%s: rows %s are all for plant \"%s\" in period %s; a plant has one row in a period. Remove the row that is wrong, or correct its plant or period."
                          .formatted(
                              place.words(),
                              fileRows.stream()
                                      .limit(10)
                                      .map(String::valueOf)
                                      .collect(Collectors.joining(", "))
                                  + (fileRows.size() > 10 ? ", …" : ""),
                              Shown.shortened(plant),
                              Periods.text(assembly.period(run[0]))),
                      fileRows.stream().limit(10).toList()));
    }
  }

  private static RecordsRefused nothingLeft(Place place, RowRules rules) {
    String reasons =
        rules.setAside().all().stream()
            .map(s -> Shown.count(s.count(), "row") + " because " + s.reason())
            .collect(Collectors.joining("; "));
    return Refusals.of(
        "no-usable-rows",
        "%s: none of %s can be used: %s. Correct the file, or the roles and records.keep in the study file."
            .formatted(place.words(), Shown.count(rules.rows(), "row"), reasons));
  }

  /** An input of which no row uses anything explains nothing. */
  private static void nothingUsed(Place place, Roles roles, Slots slots, RowStore store)
      throws RecordsRefused {
    List<Remark> errors = new ArrayList<>();
    for (int i = 0; roles.keepsZeros() && i < roles.inputs().size(); i++) {
      boolean used = false;
      for (int r = 0; r < store.rows() && !used; r++) {
        used = store.number(slots.quantity(i), r) > 0;
      }
      if (!used) {
        errors.add(
            new Remark(
                Severity.ERROR,
                "all-zero",
                "%s, %s: zero in every one of %s used, so that nothing can be learnt of this input. Take it out of the inputs, or correct the column."
                    .formatted(
                        place.words(),
                        slots.get(slots.quantity(i)).words(),
                        Shown.count(store.rows(), "row")),
                List.of()));
      }
    }
    if (!errors.isEmpty()) {
      throw new RecordsRefused(errors);
    }
  }

  private static void unknownMoney(Place place, Slots slots, RowStore store, List<Remark> remarks) {
    for (int s = 0; s < slots.size(); s++) {
      if (store.blanks(s) > 0) {
        remarks.add(
            new Remark(
                Severity.NOTE,
                "blank-money",
                "%s, %s: blank in %s (the first is row %d), which are used all the same; what needs this value cannot be said of them. Fill the cells if the values are known."
                    .formatted(
                        place.words(),
                        slots.get(s).words(),
                        Shown.count(store.blanks(s), "row"),
                        store.firstBlankRow(s)),
                List.of(store.firstBlankRow(s))));
      }
    }
  }

  /** Plants whose names differ only in case or separators: probably one plant written two ways. */
  private static void alikePlants(
      Place place, Roles roles, List<String> plants, List<Remark> remarks) {
    Map<String, String> seen = new HashMap<>(2 * plants.size());
    List<String> pairs = new ArrayList<>();
    for (String plant : plants) {
      String folded = plant.toLowerCase(Locale.ROOT).replace('_', '-').replace(' ', '-');
      String before = seen.putIfAbsent(folded, plant);
      if (before != null) {
        pairs.add("\"" + Shown.shortened(before) + "\" and \"" + Shown.shortened(plant) + "\"");
      }
    }
    if (!pairs.isEmpty() && roles.plant().isPresent()) {
      remarks.add(
          new Remark(
              Severity.WARNING,
              "plants-alike",
              "%s, column \"%s\" (plant): %s of names differ only in capitals or separators and count as different plants: %s%s. Write each plant in one way."
                  .formatted(
                      place.words(),
                      roles.plant().get(),
                      Shown.count(pairs.size(), "pair"),
                      pairs.stream().limit(5).collect(Collectors.joining("; ")),
                      pairs.size() > 5 ? "; …" : ""),
              List.of()));
    }
  }
}
