package isowright.benchmark;

import isowright.estimation.Estimation;
import isowright.estimation.Fit;
import isowright.estimation.Specification;
import isowright.estimation.Specification.PlantEffects;
import isowright.estimation.Specification.StandardErrors;
import isowright.estimation.Specification.Time;
import isowright.records.Keep;
import isowright.records.Panel;
import isowright.records.Reading;
import isowright.records.RecordsReader;
import isowright.records.Roles;
import isowright.records.Source;
import isowright.technology.Ces;
import isowright.technology.CobbDouglas;
import isowright.technology.Form;
import isowright.technology.Translog;
import java.lang.management.ManagementFactory;
import java.lang.management.MemoryPoolMXBean;
import java.lang.management.MemoryType;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Locale;
import java.util.Optional;

/** A wide study step by step: 1,000,000 rows of 100,000 plants, each step once and cold. */
final class WideStudy {

  private static final int PLANTS = 100_000;
  private static final Path FILE = Path.of("target", "benchmark", "wide.csv");

  private WideStudy() {}

  static void report(Steps steps) throws Exception {
    WideRecords.write(FILE, PLANTS);
    steps.heading(
        String.format(
            Locale.ROOT,
            "Wide study: %d plants × %d years × 3 inputs, a file of %.1f MB",
            PLANTS,
            WideRecords.YEARS,
            Files.size(FILE) / 1e6));
    Reading reading = steps.time("records read", WideStudy::read);
    fit(steps, reading.panel(), CobbDouglas.FORM, PlantEffects.WITHIN);
    fit(steps, reading.panel(), Translog.FORM, PlantEffects.NONE);
    fit(steps, reading.panel(), Ces.FORM, PlantEffects.NONE);
    steps.total();
    steps.line("most heap in use", mostHeap() / 1e6, "MB");
  }

  private static Reading read() throws Exception {
    Roles roles =
        new Roles(
            Optional.of("plant"),
            Optional.of("year"),
            "output",
            Optional.empty(),
            List.of(
                input("labour", "wage"),
                input("machines", "rental"),
                input("energy", "fuel_price")),
            List.of(),
            Optional.empty(),
            Optional.empty());
    return RecordsReader.read(
        new Source(FILE, Optional.empty(), Optional.empty()), roles, Keep.ALL);
  }

  private static Roles.Input input(String name, String price) {
    return new Roles.Input(name, name, Optional.of(price), Optional.empty(), Optional.empty());
  }

  private static void fit(Steps steps, Panel panel, Form form, PlantEffects effects)
      throws Exception {
    Specification specification =
        new Specification(form, effects, Time.TREND, true, StandardErrors.CLUSTERED, 0.95);
    Fit fit =
        steps.time(
            form.name() + ", plant effects " + effects.word() + ", clustered",
            () -> Estimation.fit(panel, specification));
    if (!fit.state().usable()) {
      throw new IllegalStateException(form.name() + " is " + fit.state().word());
    }
  }

  /** The sum of the peaks of all heap pools: an upper bound of the heap in use at any time. */
  private static long mostHeap() {
    return ManagementFactory.getMemoryPoolMXBeans().stream()
        .filter(pool -> pool.getType() == MemoryType.HEAP)
        .map(MemoryPoolMXBean::getPeakUsage)
        .mapToLong(usage -> usage.getUsed())
        .sum();
  }
}
